/** The two halves with the surface between them; a half may hold the list of media or its sources instead. */
import { Box } from 'ink';
import type { Side } from '../fields/medium-fields.ts';
import { halfLines } from '../picture/pages.ts';
import { BLOCK_WIDTH, sceneOf } from '../picture/scene.ts';
import { paint } from '../theme.ts';
import { blockView } from '../view/block-view.ts';
import { listView } from '../view/list-view.ts';
import { pageView } from '../view/page-view.ts';
import { type Pen, penOf } from '../view/pen.ts';
import { Lines } from './lines.tsx';
import type { ScreenProps } from './screen.tsx';

export function Halves({ state, world }: ScreenProps) {
  const { plan, blocks } = sceneOf(state, world);
  const pen = penOf(state);
  const rail = new Array<string>(plan.body).fill(paint(pen.glyphs.rail, pen.theme.boundary)).join('\n');
  const widest = Math.min(BLOCK_WIDTH, plan.left);
  return (
    <Box>
      <Box width={plan.left} paddingLeft={plan.left - widest}>
        <Lines text={halfText(state, world, 'from', widest, pen)} />
      </Box>
      <Lines text={rail} />
      <Box width={plan.middle}>
        <Lines text={blockView(blocks.interface, plan.middle, pen).join('\n')} />
      </Box>
      <Lines text={rail} />
      <Lines text={halfText(state, world, 'into', Math.min(BLOCK_WIDTH, plan.right), pen)} />
    </Box>
  );
}

function halfText(
  state: ScreenProps['state'],
  world: ScreenProps['world'],
  side: Side,
  columns: number,
  pen: Pen,
): string {
  const { plan, blocks } = sceneOf(state, world);
  const { search, page } = state;
  if (search?.side === side) return listView(state, search, columns, pen, world).join('\n');
  if (page?.name === 'sources') {
    return pageView(halfLines(state, side, columns), page.top, plan.body, columns, pen).join('\n');
  }
  return blockView(blocks[side], columns, pen).join('\n');
}
