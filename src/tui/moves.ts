/**
 * Moving the focus over the picture: arrows go to the nearest stop in that direction, Tab to the next value that can be
 * changed. Stops out of sight are reached as well; their block scrolls.
 */
import { FIELDS, fieldById } from './fields/all-fields.ts';
import type { FieldId } from './fields/field.ts';
import { ITEM_GAP, itemWidth } from './picture/flow.ts';
import type { Row } from './picture/item.ts';
import { PLACES, type Place, type Scene, sceneOf } from './picture/scene.ts';
import { answerOf, FIRST_FOCUS, fieldOfStop, fieldStop, type State, type StopId } from './state.ts';
import type { World } from './world.ts';

export type Direction = 'up' | 'down' | 'left' | 'right';

/** Puts the focus on a stop; the place follows where the stop belongs to one. */
export function focusOn(state: State, stop: StopId, world: World): State {
  const cameFrom = isWordStop(state.focus) ? state.cameFrom : state.focus;
  const moved = { ...state, focus: stop, cameFrom };
  const place = placeOf(stop, sceneOf(moved, world));
  return place ? { ...moved, place } : moved;
}

/** On such a field letters are text; commands come back when the focus leaves it. */
export function isWordStop(stop: StopId): boolean {
  const id = fieldOfStop(stop);
  return id !== undefined && fieldById(id).takesWords === true;
}

/** Leaves a field that takes words for where the focus was before. */
export function leaveWords(state: State, world: World): State {
  return isWordStop(state.focus) ? focusOn(state, state.cameFrom, world) : state;
}

function placeOf(stop: StopId, scene: Scene): Place | undefined {
  return PLACES.find((place) => scene.blocks[place].all.some((row) => hasStop(row, stop)));
}

const hasStop = (row: Row, stop: StopId): boolean => row.some((item) => item.stop === stop);
const isStopRow = (row: Row): boolean => row.some((item) => item.stop !== undefined);
const firstStop = (row: Row | undefined): StopId | undefined =>
  row?.find((item) => item.stop !== undefined)?.stop;

export function moveFocus(state: State, direction: Direction, world: World): State {
  const scene = sceneOf(state, world);
  const line = scene.head.findIndex((row) => hasStop(row, state.focus));
  const place = placeOf(state.focus, scene);
  const target =
    line >= 0
      ? fromHead(state, scene, line, direction)
      : place
        ? fromBlock(state, scene, place, direction)
        : FIRST_FOCUS;
  return target === undefined ? state : focusOn(state, target, world);
}

export function moveToEnd(state: State, end: 'first' | 'last', world: World): State {
  const scene = sceneOf(state, world);
  const place = placeOf(state.focus, scene);
  const rows = (place ? scene.blocks[place].all : scene.head).filter(isStopRow);
  const target = firstStop(end === 'first' ? rows[0] : rows.at(-1));
  return target === undefined ? state : focusOn(state, target, world);
}

/** The next field in the order of the table, or the previous one; round and round. */
export function moveToField(state: State, by: 1 | -1, world: World): State {
  const context = { question: state.question, answer: answerOf(state) };
  const ids = FIELDS.filter((field) => field.applies(context)).map((field) => field.id);
  const at = ids.indexOf(fieldOfStop(state.focus) ?? nearestField(state));
  const next = ids.at((at + by) % ids.length);
  return next ? focusOn(state, fieldStop(next), world) : state;
}

/** From a result, Tab goes on as from the medium it belongs to. */
function nearestField(state: State): FieldId {
  if (state.focus.startsWith('from:')) return 'from';
  return state.focus.startsWith('into:') ? 'into' : 'angle';
}

function fromHead(state: State, scene: Scene, line: number, direction: Direction): StopId | undefined {
  const row = scene.head[line] ?? [];
  const stops = row.filter((item) => item.stop !== undefined);
  const at = stops.findIndex((item) => item.stop === state.focus);
  if (direction === 'left') return stops[at - 1]?.stop;
  if (direction === 'right') return stops[at + 1]?.stop;
  const x = centreOf(row, state.focus);
  const next = scene.head[line + (direction === 'down' ? 1 : -1)];
  if (next) return nearestInRow(next, x);
  if (direction === 'up') return undefined;
  const place = scene.plan.kind === 'full' ? placeAt(scene, x) : state.place;
  return firstStop(scene.blocks[place].all.find(isStopRow));
}

function fromBlock(state: State, scene: Scene, place: Place, direction: Direction): StopId | undefined {
  const { all } = scene.blocks[place];
  const at = all.findIndex((row) => hasStop(row, state.focus));
  if (direction === 'left' || direction === 'right')
    return sideways(state, scene, place, all[at] ?? [], direction);
  const step = direction === 'down' ? 1 : -1;
  for (let i = at + step; i >= 0 && i < all.length; i += step) {
    const stop = firstStop(all[i]);
    if (stop !== undefined) return stop;
  }
  const above = scene.head.at(-1);
  return direction === 'up' && above ? nearestInRow(above, columnOf(scene, place)) : undefined;
}

function sideways(
  state: State,
  scene: Scene,
  place: Place,
  row: Row,
  direction: 'left' | 'right',
): StopId | undefined {
  const by = direction === 'right' ? 1 : -1;
  const stops = row.flatMap((item) => item.stop ?? []);
  const within = stops[stops.indexOf(state.focus) + by];
  if (within !== undefined) return within;
  const next = PLACES[PLACES.indexOf(place) + by];
  if (next === undefined) return undefined;
  const rows = scene.blocks[next].rows;
  const y = scene.plan.kind === 'full' ? scene.blocks[place].rows.indexOf(row) : 0;
  const nearest = rows
    .map((r, i) => ({ stop: firstStop(r), distance: Math.abs(i - y) }))
    .filter((r) => r.stop !== undefined)
    .sort((a, b) => a.distance - b.distance)[0];
  return nearest?.stop;
}

function placeAt({ plan }: Scene, x: number): Place {
  return x < plan.left ? 'from' : x < plan.left + plan.middle + 2 ? 'interface' : 'into';
}

function columnOf({ plan }: Scene, place: Place): number {
  if (plan.kind !== 'full') return 0;
  if (place === 'from') return plan.left / 2;
  return place === 'interface' ? plan.left + plan.middle / 2 : plan.columns - plan.right / 2;
}

function centreOf(row: Row, stop: StopId): number {
  let x = 0;
  for (const item of row) {
    const width = itemWidth(item);
    if (item.stop === stop) return x + width / 2;
    x += width + ITEM_GAP;
  }
  return 0;
}

function nearestInRow(row: Row, x: number): StopId | undefined {
  return row
    .filter((item) => item.stop !== undefined)
    .map((item) => ({ stop: item.stop, distance: Math.abs(centreOf(row, item.stop ?? '') - x) }))
    .sort((a, b) => a.distance - b.distance)[0]?.stop;
}
