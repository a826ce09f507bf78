/** Waves, media, options and command lines as people type them, and as nobody would. */
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { COMMANDS, optionsOf } from '../../src/cli/command-table.ts';
import { type OptionKey, optionSpec } from '../../src/cli/options.ts';
import { isProblem } from '../../src/units/problem.ts';
import { allUnits } from '../../src/units/unit-table.ts';
import type { Random } from './random.ts';

const catalogue = catalogueFromSources();
export const KEYS: readonly string[] = catalogue.keys();
const NAMES = catalogue.entries().flatMap((e) => [e.name, e.formula ?? e.key, ...e.aliases]);
const SYMBOLS = allUnits().map((u) => u.symbol);

const sometimesDamaged = (r: Random, text: string): string => (r.chance(0.15) ? r.damaged(text) : text);

/** Most inputs must be right, or nothing behind the readers is ever reached. */
const OFTEN = 0.8;

export function wave(r: Random): string {
  if (r.chance(OFTEN)) {
    return r.pick([
      () => `${300 + r.below(1500)}nm`,
      () => `${(0.3 + 12 * r.next()).toFixed(3)}um`,
      () => `${(10 ** (6 * r.next())).toPrecision(4)}GHz`,
      () =>
        r.pick([
          'd-line',
          'C-line',
          '10GHz',
          '474THz',
          '1.96eV',
          '15800cm-1',
          '10.6um',
          '121.6nm',
          '1e8m',
          '50nm',
        ]),
    ])();
  }
  const text = r.pick([
    () => `${r.number()}${r.pick(SYMBOLS)}`,
    () => `${r.number()} ${r.pick(SYMBOLS)}`,
    () => 'HeNe',
  ])();
  return sometimesDamaged(r, text);
}

export function medium(r: Random): string {
  if (r.chance(OFTEN)) {
    return r.pick([
      () => r.pick(KEYS),
      () => r.pick(KEYS),
      () => r.pick(['air', 'vacuum', 'water', 'gold', 'n-bk7', 'sapphire:o', 'sapphire:e', 'fused-silica']),
      () => `n=${(1 + 3 * r.next()).toFixed(3)}`,
      () => `n=${(4 * r.next()).toFixed(3)}+${(10 ** (9 * r.next() - 6)).toPrecision(3)}i`,
      () =>
        `eps=${(-20 + 40 * r.next()).toFixed(2)}+${r.next().toFixed(3)}i,mu=${(0.5 + 3 * r.next()).toFixed(2)}`,
      () => `eps=${(1 + 80 * r.next()).toFixed(2)},sigma=${(10 ** (8 * r.next())).toPrecision(2)}`,
    ])();
  }
  const text = r.pick([
    () => r.pick(NAMES),
    () => `${r.pick(KEYS)}:${r.pick(['o', 'e', 'x', 'y', 'z', 'ordinary', 'q'])}`,
    () => `n=${r.number()}`,
    () => `n=${r.number()}${r.pick(['+', '-', ''])}${r.number()}i`,
    () => `eps=${r.number()},tand=${r.number()}`,
    () => `eps=${r.number()},sigma=${r.number()},mu=${r.number()}`,
  ])();
  return sometimesDamaged(r, text);
}

const layer = (r: Random): string =>
  sometimesDamaged(
    r,
    `${medium(r)}@${r.pick(['qw', 'hw', `${r.number()}nm`, `${r.number()}um`, '5mm', r.number()])}`,
  );

const VALUES = [
  ...[
    '0',
    '1',
    '3',
    '45',
    '45deg',
    '89.99',
    '20C',
    '300K',
    '77K',
    '50%',
    '0.3',
    '1atm',
    '980hPa',
    '400',
    '35',
  ],
  ...[
    '30fs',
    '5mm',
    '1W',
    '10mJ',
    '80MHz',
    '1..2',
    '400nm..700nm',
    '633nm',
    'gaussian',
    'flat',
    's',
    'p',
    'unpolarized',
  ],
  ...[
    'wave=1nm',
    'angle=0.5deg,n=1e-4',
    'thickness=1%',
    'temperature=1C',
    '1e9W/cm2',
    '1kV/m',
    '1GHz',
    '3e-20m2/W',
    '0.1nm',
  ],
  ...[
    'glass',
    'liquid',
    'never',
    'n',
    'R',
    '1.5',
    '2',
    '10',
    '1e-3',
    'schott',
    'air',
    'sapphire:o',
    '0.25',
    '1ps',
    '1um',
  ],
];

/** One of the values above that the option takes; undefined where none of a few does. */
function rightValue(r: Random, key: OptionKey): string | undefined {
  const spec = optionSpec(key);
  if (!('parse' in spec)) return undefined;
  const parse = spec.parse as (text: string) => unknown;
  return Array.from({ length: 60 }, () => r.pick(VALUES)).find((text) => !isProblem(parse(text)));
}

/** A text for one reader: what it takes, what another one takes, or what none does. */
export function valueText(r: Random, reader: string): string {
  const text = r.pick([
    () => (reader === 'medium' || reader === 'layers' ? medium(r) : wave(r)),
    () => r.pick(VALUES),
    () => layer(r),
    () => `${r.number()}${r.pick(['', ' '])}${r.pick(SYMBOLS)}`,
    () =>
      `${r.pick(['wave', 'angle', 'n', 'n1', 'thickness', 'temperature'])}=${r.number()}..${r.number()}:${r.number()}`,
    () => r.number(),
  ])();
  return r.chance(0.4) ? r.damaged(text) : text;
}

function optionText(r: Random, key: OptionKey): readonly string[] {
  const { name, ...spec } = optionSpec(key);
  if (!('parse' in spec)) return [`--${name}`];
  const choices = 'choices' in spec ? (spec.choices as readonly string[]) : [];
  const value = r.pick([
    () => (choices.length > 0 ? r.pick(choices) : r.number()),
    () => `${r.number()}${r.pick(SYMBOLS)}`,
    () =>
      `${r.pick(['wave', 'angle', 'n', 'n1', 'thickness', 'temperature'])}=${r.number()}${r.pick(['', '%', 'nm', 'deg', 'C'])}`,
    () => wave(r),
    () => medium(r),
    () => r.pick(['', '0', '45', '20C', '300K', '50%', '1atm', '30fs', '5mm', '1W', '1..2', 'gaussian']),
  ])();
  const given = r.chance(OFTEN) ? (rightValue(r, key) ?? value) : sometimesDamaged(r, value);
  return r.chance(0.5) ? [`--${name}=${given}`] : [`--${name}`, given];
}

/** These touch files, the clock or the terminal: other targets and tests look after them. */
const OUTSIDE: ReadonlySet<string> = new Set([
  'catalog',
  'output',
  'log',
  'log-file',
  'svg',
  'help',
  'version',
]);
const COMMANDS_INSIDE = COMMANDS.filter(({ name }) =>
  [
    'answer',
    'cite',
    'material',
    'find',
    'match',
    'compare',
    'crystal',
    'equivalent',
    'coat',
    'order-check',
  ].includes(name),
);

/** Arguments of a command that touches nothing outside. */
export function commandLine(r: Random): readonly string[] {
  const { name } = r.chance(0.6) ? COMMANDS_INSIDE[0]! : r.pick(COMMANDS_INSIDE);
  const options = optionsOf(name).filter((key) => !OUTSIDE.has(optionSpec(key).name));
  const operands =
    name === 'answer'
      ? [
          medium(r),
          ...r.many(0, 2, () => (r.chance(0.5) ? layer(r) : '')).filter((t) => t !== ''),
          medium(r),
          wave(r),
        ]
      : r.many(0, 3, () => r.pick([() => medium(r), () => wave(r), () => conditions(r)])());
  const given = r.many(0, 3, () => optionText(r, r.pick(options))).flat();
  const form = r.chance(0.5) ? ['--json'] : [];
  return [...(name === 'answer' ? [] : [name]), ...operands, ...given, ...form].filter(
    (t) => !t.includes('\0'),
  );
}

export function conditions(r: Random): string {
  const part = (): string =>
    r.pick([
      () => `${r.pick(['n', 'ng', 'gvd', 'dn', 'vd'])} ${r.number()}..${r.number()}`,
      () => `${r.pick(['n', 'ng', 'vd'])}${r.pick(['>', '<', '=', ':', ' '])}${r.number()}`,
      () => `clear ${wave(r)}..${wave(r)}`,
      () => `at ${wave(r)}`,
      () => `loss ${r.number()}% thick ${r.number()}mm`,
      () =>
        `${r.pick(['class', 'not'])} ${r.pick(['liquid', 'crystal', 'glass', 'toxic', 'hygroscopic', 'zzz'])}`,
      () => r.pick(NAMES),
    ])();
  return sometimesDamaged(r, r.many(0, 4, part).join(' '));
}

/** CSV of a batch: a header, right or nearly, and rows. */
export function batchTable(r: Random): string {
  const columns = r.many(1, 6, () =>
    sometimesDamaged(
      r,
      r.pick([
        'from',
        'into',
        'wave_nm',
        'wave',
        'path',
        'angle_deg',
        'pol',
        'temperature_C',
        'power_mW',
        'wave (um)',
        '_note',
        'x',
      ]),
    ),
  );
  const cell = (name: string): string => {
    const text = /from|into/.test(name) ? medium(r) : name === 'wave' ? wave(r) : r.number();
    return r.chance(0.1) ? `"${text.replaceAll('"', r.pick(['""', '"']))}"` : text;
  };
  const rows = r.many(0, 6, () =>
    columns
      .slice(0, r.chance(0.1) ? 1 : 9)
      .map(cell)
      .join(','),
  );
  const text = [columns.join(','), ...rows].join(r.pick(['\n', '\r\n']));
  return r.chance(0.2) ? r.damaged(text) : text;
}
