/**
 * The whole picture of a state, placed but not yet drawn: the plan of the screen, the lines of the head, the visible rows
 * of the three blocks, the notice. Both the drawing and the moving about read it.
 */
import type { State, StopId } from '../state.ts';
import type { World } from '../world.ts';
import { type Arranged, arrangeBlock, compactBlock, EMPTY_BLOCK } from './arrange.ts';
import { type Blocks, blocksOf } from './blocks.ts';
import { flowItems } from './flow.ts';
import type { Block, Row } from './item.ts';
import { type NoticeLine, noticeLines } from './notice.ts';
import { type Plan, planScreen } from './plan.ts';

export const PLACES = ['from', 'interface', 'into'] as const;
export type Place = (typeof PLACES)[number];

export interface Scene {
  readonly plan: Plan;
  readonly head: readonly Row[];
  readonly blocks: Readonly<Record<Place, Arranged>>;
  readonly notice: readonly NoticeLine[];
}

const made = new WeakMap<State, Scene>();

export function sceneOf(state: State, world: World): Scene {
  let scene = made.get(state);
  if (!scene) {
    scene = makeScene(state, world);
    made.set(state, scene);
  }
  return scene;
}

function makeScene(state: State, world: World): Scene {
  const { columns } = state.size;
  const blocks = blocksOf(state, world);
  const wide = [...flowItems(blocks.wave, columns), ...flowItems(blocks.conditions, columns)];
  const notice = noticeLines(state, world, columns);
  const plan = planScreen(state.size, {
    head: wide.length,
    notice: noticeNeeds(state, notice),
    body: longest(blocks),
  });
  const head = plan.kind === 'full' ? wide : flowItems(blocks.wave, columns);
  return {
    plan,
    head: head.slice(0, plan.head),
    blocks: arrangeAll(blocks, plan, state.focus),
    notice: notice.slice(0, plan.notice),
  };
}

/** A page has a line of its own below, whatever else is said. */
function noticeNeeds(state: State, notice: readonly NoticeLine[]): number {
  return Math.max(2, notice.length + (state.page ? 1 : 0));
}

function longest(blocks: Blocks): number {
  return Math.max(
    ...PLACES.map(
      (place) => blocks[place].top.length + blocks[place].body.length + blocks[place].bottom.length,
    ),
  );
}

/** Text of a block is at most this wide: on wide screens it stays near the boundary, where the eye is. */
export const BLOCK_WIDTH = 46;

function arrangeAll(blocks: Blocks, plan: Plan, focus: StopId): Readonly<Record<Place, Arranged>> {
  const arrange = (block: Block, columns: number): Arranged =>
    arrangeBlock(block, plan.body, Math.min(columns, BLOCK_WIDTH) - 1, focus);
  if (plan.kind === 'none') {
    const nothing = arrangeBlock(EMPTY_BLOCK, 0, 0, focus);
    return { from: nothing, interface: nothing, into: nothing };
  }
  if (plan.kind === 'single') {
    const surface = compactBlock(blocks.interface);
    // The conditions have no room above: they stand with the surface.
    const conditions = blocks.conditions.map((item): Row => [item]);
    return {
      from: arrange(compactBlock(blocks.from), plan.columns),
      interface: arrange({ ...surface, body: [...surface.body, ...conditions] }, plan.columns),
      into: arrange(compactBlock(blocks.into), plan.columns),
    };
  }
  return {
    from: arrange(blocks.from, plan.left),
    interface: arrange(blocks.interface, plan.middle),
    into: arrange(blocks.into, plan.right),
  };
}
