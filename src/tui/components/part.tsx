/** One part of the picture at a time, for small screens. */
import { sceneOf } from '../picture/scene.ts';
import { blockView } from '../view/block-view.ts';
import { listView } from '../view/list-view.ts';
import { pathView } from '../view/path-view.ts';
import { penOf } from '../view/pen.ts';
import { Lines } from './lines.tsx';
import type { ScreenProps } from './screen.tsx';

export function Part({ state, world }: ScreenProps) {
  const { plan, blocks } = sceneOf(state, world);
  const pen = penOf(state);
  const { search } = state;
  const lines = search
    ? listView(state, search, plan.columns, pen, world)
    : blockView(blocks[state.place], plan.columns, pen);
  return <Lines text={[pathView(state, plan.columns, pen), ...lines].join('\n')} />;
}
