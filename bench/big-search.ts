/** Keys typed into the list of media of the full-screen program, with ten thousand entries of one's own beside the catalogue. */
import { mkdirSync, mkdtempSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { type Line, median, percentile } from './figure.ts';
import { ENVIRONMENT, HOME, PROGRAM } from './program.ts';
import { type Pressed, Screen } from './screen.ts';

const ENTRIES = 10_000;
const SYLLABLES = [
  ...['cor', 'bel', 'dun', 'fer', 'gal', 'hol', 'kal', 'lum'],
  ...['mar', 'nor', 'pol', 'ros', 'sil', 'tan', 'ver', 'zir'],
];
const CLASSES = ['optical glass', 'liquid', 'halide crystal', 'polymer', 'thin film', 'oxide crystal'];

/** Names, names with slips, and conditions; each typed letter by letter and taken back. */
const TYPED = ['fused silica', 'silkor', 'zinc selenied', 'ferdun melt', 'glass n 1.5..1.52', 'not liquid'];

const syllable = (i: number): string => SYLLABLES[i % SYLLABLES.length] ?? '';

/** A data folder with so many made-up melts, one file each. */
function ownFolder(): string {
  const data = mkdtempSync(path.join(HOME, 'own-'));
  const folder = path.join(data, 'halfspace', 'materials');
  mkdirSync(folder, { recursive: true });
  const source = { id: 'melts', type: 'report', title: 'Melts', author: [{ family: 'Bench' }] };
  writeFileSync(path.join(folder, 'bibliography.json'), JSON.stringify([source]));
  for (let i = 0; i < ENTRIES; i++) {
    const word = `${syllable(i)}${syllable(i >> 4)}${syllable(i >> 8)}`;
    const entry = {
      key: `own-${word}-${i}`,
      name: `Own ${word} melt ${i}`,
      aliases: [`${word}${i}`],
      class: CLASSES[i % CLASSES.length],
      transparency_um: [0.3, 2.5],
      fits: [
        {
          parameters: { model: 'sellmeier', offset: 1, poles: [{ B: 1 + (i % 997) / 1000, C_um2: 0.01 }] },
          range_um: [0.3, 2.5],
          reference: 'vacuum',
          source: 'melts',
        },
      ],
    };
    writeFileSync(path.join(folder, `${entry.key}.json`), JSON.stringify(entry));
  }
  return data;
}

export async function bigSearch(): Promise<readonly Line[]> {
  const env = { ...ENVIRONMENT, XDG_DATA_HOME: ownFolder() };
  const screen = new Screen([PROGRAM], { columns: 80, rows: 24, env });
  await screen.sight('keys');
  await screen.settle(2000);
  screen.type('f');
  await screen.settle(2000);
  const pressed: Pressed[] = [];
  for (const text of TYPED) {
    for (const key of [...text, ...Array.from({ length: text.length }, () => '\x7f')]) {
      const one = await screen.press(key);
      if (one) pressed.push(one);
    }
  }
  screen.type('\x03');
  await screen.exited;
  const ms = pressed.map((p) => p.ms);
  const name = `key in the list of ${ENTRIES} own entries`;
  return [
    { name: `${name}, median`, value: median(ms), unit: 'ms' },
    {
      name: `${name}, 99 of 100`,
      value: percentile(ms, 99),
      unit: 'ms',
      target: { atMost: 16 },
      note: `${ms.length} keys, 80x24`,
    },
  ];
}
