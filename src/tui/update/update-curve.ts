/** What keys do on a curve: the cursor reads values off, Enter asks where it stands. */
import { isRefusal } from '../../medium/refusal.ts';
import { cursorColumnOf, readColumn } from '../../plot/chart-cursor.ts';
import { valueText } from '../../plot/tick-text.ts';
import { parseWave } from '../../units/parse-wave.ts';
import { isProblem, problemText } from '../../units/problem.ts';
import { CURVE_KINDS, type CurveKind } from '../charts.ts';
import type { ActionId } from '../keys/actions.ts';
import { chartOptions, cursorPlace, openChart, readingText } from '../picture/curve-reading.ts';
import { sceneOf } from '../picture/scene.ts';
import { answerOf, askAnew, type State, type Updated } from '../state.ts';
import type { World } from '../world.ts';
import { setAngle } from './question-changes.ts';
import { openPage } from './update-page.ts';

const BIG_STEP = 10;
/** Grazing itself is no angle of incidence. */
const GREATEST_ANGLE_deg = 89.999;

export function openCurve(state: State): State {
  if (!answerOf(state))
    return { ...state, message: { tone: 'refused', text: 'there is no answer to draw a curve of yet' } };
  return { ...state, curve: { kind: 'angle', cursor: null }, message: null };
}

export function actOnCurve(state: State, action: ActionId, world: World): Updated {
  if (action === 'copy') return copyReading(state, world);
  return { state: changed({ ...state, message: null }, action, world), effects: [] };
}

function changed(state: State, action: ActionId, world: World): State {
  switch (action) {
    case 'left':
      return moveCursor(state, -1, world);
    case 'right':
      return moveCursor(state, 1, world);
    case 'page-up':
      return moveCursor(state, -BIG_STEP, world);
    case 'page-down':
      return moveCursor(state, BIG_STEP, world);
    case 'first':
      return moveCursor(state, Number.NEGATIVE_INFINITY, world);
    case 'last':
      return moveCursor(state, Number.POSITIVE_INFINITY, world);
    case 'curves':
      return { ...state, curve: { kind: nextKind(state.curve?.kind), cursor: null } };
    case 'open':
      return askThere(state, world);
    case 'help':
      return openPage(state, 'keys');
    case 'back':
      return { ...state, curve: null };
    default:
      return state;
  }
}

function nextKind(kind: CurveKind | undefined): CurveKind {
  const i = kind === undefined ? -1 : CURVE_KINDS.indexOf(kind);
  return CURVE_KINDS[(i + 1) % CURVE_KINDS.length] ?? 'angle';
}

/** By columns: each column has one value of x, rounded as far as it stays there. */
function moveCursor(state: State, by: number, world: World): State {
  const chart = openChart(state, world);
  if (!state.curve || !chart || isRefusal(chart)) return state;
  const options = chartOptions(state, chart, sceneOf(state, world).plan);
  const from = cursorColumnOf(chart, options, cursorPlace(state, chart));
  const column = Number.isFinite(by) ? from + by : by < 0 ? 0 : options.width;
  const reading = readColumn(chart, options, column);
  return reading ? { ...state, curve: { ...state.curve, cursor: reading.x } } : state;
}

function askThere(state: State, world: World): State {
  const chart = openChart(state, world);
  if (!state.curve || !chart || isRefusal(chart)) return state;
  const { kind } = state.curve;
  const x = cursorPlace(state, chart);
  if (kind === 'field') {
    const text = 'the field is that of this question: there is nothing to ask at a depth';
    return { ...state, message: { tone: 'refused', text } };
  }
  const asked = { ...state, curve: { kind, cursor: null } };
  if (kind === 'angle') {
    const angle_rad = (Math.min(x, GREATEST_ANGLE_deg) * Math.PI) / 180;
    return askAnew(asked, setAngle(state.question, angle_rad), world);
  }
  const text = valueText(Number(x.toPrecision(9)), chart.x, 'shortest', true);
  const wave = parseWave(text);
  if (isProblem(wave)) return { ...state, message: { tone: 'refused', text: problemText(wave) } };
  const { wavelength_m, inAir } = wave;
  return askAnew(asked, { ...state.question, wave: { wavelength_m, inAir, text: wave.text } }, world);
}

function copyReading(state: State, world: World): Updated {
  const text = readingText(state, world);
  return {
    state: { ...state, copied: text, message: { tone: 'said', text: `copied: ${text}` } },
    effects: text === '' ? [] : [{ kind: 'copy', text }],
  };
}
