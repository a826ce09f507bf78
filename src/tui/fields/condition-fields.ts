/**
 * The conditions both media are under. A condition that is not set is the fit's own; each half says which that is.
 * A field shows only where a medium of the question takes the condition.
 */
import type { MediumSpec, Question } from '../../answer/question.ts';
import type { ConditionName } from '../../dispersion/evaluator.ts';
import { honours } from '../../dispersion/registry.ts';
import { CELSIUS, NUMBER, PASCAL, PER_CENT } from '../../units/display-unit.ts';
import { formatQuantity } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { parseCo2 } from '../../units/parse-co2.ts';
import { parseFraction } from '../../units/parse-fraction.ts';
import { parsePressure } from '../../units/parse-pressure.ts';
import { parseSalinity } from '../../units/parse-salinity.ts';
import { parseTemperature } from '../../units/parse-temperature.ts';
import { isProblem, type Problem } from '../../units/problem.ts';
import { type Field, type FieldContext, type FieldId, isUnset, stepOnGrid, withShownUnit } from './field.ts';

const ZERO_CELSIUS_K = 273.15;
/** Shown while nothing is set: each fit then takes its own. */
const NOT_SET = 'auto';

interface ConditionKind {
  readonly id: FieldId;
  readonly name: ConditionName;
  readonly label: string;
  readonly hint: string;
  readonly parse: (text: string) => number | Problem;
  readonly write: (value: number, style: NumberStyle) => string;
  /** Unit of a bare number. */
  readonly unit: string;
  readonly step: number;
  readonly range: readonly [number, number];
  /** Where stepping starts while nothing is set. */
  readonly usual: number;
  /** Offset of the grid of steps from the SI value: 273.15 for degrees Celsius. */
  readonly offset?: number;
}

const shortest =
  (unit: Parameters<typeof formatQuantity>[1]) =>
  (value: number, style: NumberStyle): string =>
    formatQuantity(Number(value.toPrecision(9)), unit, 'shortest', { style });

/** 20 °C from 293.15 K, without the noise of the subtraction. */
export function celsiusText(temperature_K: number, style: NumberStyle): string {
  return shortest(CELSIUS)(Number((temperature_K - ZERO_CELSIUS_K).toFixed(4)), style);
}

const KINDS: readonly ConditionKind[] = [
  {
    id: 'temperature',
    name: 'temperature_K',
    label: 'temperature',
    hint: 'of both media: 25C, 298.15K; auto is that of each fit',
    parse: parseTemperature,
    write: celsiusText,
    unit: '1 C',
    step: 1,
    range: [1, 5000],
    usual: ZERO_CELSIUS_K + 20,
    offset: ZERO_CELSIUS_K,
  },
  {
    id: 'pressure',
    name: 'pressure_Pa',
    label: 'pressure',
    hint: 'of the gas: 101.325kPa, 1bar; auto is that of the model',
    parse: parsePressure,
    write: shortest(PASCAL),
    unit: '1 kPa',
    step: 1000,
    range: [0, 1e7],
    usual: 101_325,
  },
  {
    id: 'humidity',
    name: 'humidity',
    label: 'humidity',
    hint: 'relative humidity of the air: 50% or 0.5; auto is dry',
    parse: parseFraction,
    write: shortest(PER_CENT),
    unit: '',
    step: 0.05,
    range: [0, 1],
    usual: 0,
  },
  {
    id: 'co2',
    name: 'co2_ppm',
    label: 'CO2',
    hint: 'of the air, in 1e-6 by volume: 420; auto is that of the model',
    parse: parseCo2,
    write: (value, style) => `${shortest(NUMBER)(value, style)} ${style.ascii ? 'x 1e-6' : '× 10⁻⁶'}`,
    unit: '',
    step: 10,
    range: [0, 1e5],
    usual: 450,
  },
  {
    id: 'salinity',
    name: 'salinity_g_per_kg',
    label: 'salinity',
    hint: 'salt in the water: 35g/kg; auto is that of the model',
    parse: parseSalinity,
    write: (value, style) => `${shortest(NUMBER)(value, style)} g/kg`,
    unit: '1 g/kg',
    step: 1,
    range: [0, 40],
    usual: 35,
  },
  {
    id: 'composition',
    name: 'composition',
    label: 'composition',
    hint: 'share of the second constituent: 0.3 or 30%; auto is that of the fit',
    parse: parseFraction,
    write: shortest(NUMBER),
    unit: '',
    step: 0.01,
    range: [0, 1],
    usual: 0,
  },
];

function takesCondition(medium: MediumSpec, name: ConditionName): boolean {
  return (
    medium.kind === 'catalogue' && medium.material.fits.some((f) => honours(f.parameters).includes(name))
  );
}

function set(question: Question, name: ConditionName, value: number | undefined): Question {
  return { ...question, conditions: { ...question.conditions, [name]: value } };
}

function conditionField(kind: ConditionKind): Field {
  const { name } = kind;
  const current = ({ question }: FieldContext): number | undefined => question.conditions[name];
  return {
    id: kind.id,
    label: kind.label,
    kind: 'text',
    hint: kind.hint,
    applies: ({ question }) =>
      name === 'temperature_K' ||
      question.conditions[name] !== undefined ||
      [question.from, question.into, ...question.layers.map((l) => l.medium)].some((m) =>
        takesCondition(m, name),
      ),
    show: (context, style) => {
      const value = current(context);
      return value === undefined ? NOT_SET : kind.write(value, style);
    },
    draft: (context) => {
      const value = current(context);
      return value === undefined ? '' : kind.write(value, { ascii: true });
    },
    take: (text, { question }) => {
      if (isUnset(text)) return set(question, name, undefined);
      const value = kind.parse(withShownUnit(text, kind.unit));
      return isProblem(value) ? value : set(question, name, value);
    },
    step: (count, context) => {
      const { offset = 0, step, range } = kind;
      const now = current(context) ?? usedValue(context, name) ?? kind.usual;
      const next = stepOnGrid(now - offset, count, step) + offset;
      return set(context.question, name, Math.max(range[0], Math.min(range[1], next)));
    },
  };
}

/** What the models used, while nothing is set. */
function usedValue({ answer }: FieldContext, name: ConditionName): number | undefined {
  return answer?.into[name] ?? answer?.from[name] ?? undefined;
}

export const CONDITION_FIELDS: readonly Field[] = KINDS.map(conditionField);
