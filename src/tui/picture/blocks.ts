/** The three blocks of the picture and the items above it, as they follow from the question alone. */
import type { MediumAnswer } from '../../answer/answer.ts';
import { isRefusal } from '../../medium/refusal.ts';
import type { FieldContext } from '../fields/field.ts';
import type { Side } from '../fields/medium-fields.ts';
import type { State } from '../state.ts';
import type { World } from '../world.ts';
import { halfBlock } from './half-block.ts';
import { conditionItems, waveItems } from './head-items.ts';
import type { Block, Item } from './item.ts';
import { surfaceBlock } from './surface-block.ts';

export interface Blocks {
  readonly wave: readonly Item[];
  readonly conditions: readonly Item[];
  readonly from: Block;
  readonly interface: Block;
  readonly into: Block;
}

/** The blocks of the outcomes seen last: moving about and typing do not make them anew. */
const made = new WeakMap<
  object,
  { readonly ascii: boolean; readonly world: World; readonly blocks: Blocks }
>();

export function blocksOf(state: State, world: World): Blocks {
  const ascii = state.preferences.glyphs === 'ascii';
  const known = made.get(state.question);
  if (known?.ascii === ascii && known.world === world) return known.blocks;
  const blocks = makeBlocks(state, world, ascii);
  made.set(state.question, { ascii, world, blocks });
  return blocks;
}

function makeBlocks({ question, outcome }: State, world: World, ascii: boolean): Blocks {
  const style = { ascii };
  const answer = isRefusal(outcome) ? null : outcome;
  const context: FieldContext = { question, answer };
  const half = (side: Side): Block => {
    const alone = answer ?? aloneAnswer(world, context, side);
    return halfBlock(
      {
        ...context,
        side,
        medium: alone?.[side] ?? null,
        vacuumWavelength_m: alone?.wave.vacuumWavelength_m ?? null,
        sourceOf: (id) => world.source(id),
      },
      style,
    );
  };
  return {
    wave: waveItems(context, style),
    conditions: conditionItems(context, style),
    from: half('from'),
    interface: surfaceBlock(context, world.bindings, style),
    into: half('into'),
  };
}

/** A pair without an answer still has media: each is asked about with itself on both sides. */
function aloneAnswer(
  world: World,
  { question }: FieldContext,
  side: Side,
):
  | ({ readonly [S in Side]: MediumAnswer } & { readonly wave: { readonly vacuumWavelength_m: number } })
  | null {
  const medium = question[side];
  const outcome = world.answer({ ...question, from: medium, into: medium, layers: [], beam: undefined });
  return isRefusal(outcome) ? null : outcome;
}
