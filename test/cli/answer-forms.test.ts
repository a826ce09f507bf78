import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../../src/answer/answer.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { jsonDocument } from '../../src/cli/render/json-document.ts';
import { interfaceRows } from '../../src/present/interface-rows.ts';
import { mediumRows } from '../../src/present/medium-rows.ts';
import { stackRows } from '../../src/present/stack-rows.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { argumentsOf, QUESTIONS } from './questions.ts';
import { faultsOf, unknownKeys, validDocument } from './schema.ts';

const ask = (question: string, ...more: readonly string[]) => run([...argumentsOf(question), ...more]);
const flat = (text: string): string => text.replace(/\s+/g, ' ');

describe.each(QUESTIONS)('%s', (question) => {
  it('is answered as one JSON document of the published schema, and with no key the schema does not name', async () => {
    const { status, out, err } = await ask(question, '--json');
    expect([status, err]).toEqual([0, '']);
    expect(out).toMatch(/^\{[^\n]*\}\n$/);
    expect(unknownKeys('answer', validDocument('answer', out))).toEqual([]);
  });

  it('fits 72 columns as text, and keeps to ASCII in every form where asked', async () => {
    expectPage((await ask(question)).out);
    for (const form of [[], ['--markdown'], ['--plain'], ['--csv'], ['--json']])
      expectAscii((await ask(question, '--ascii', ...form)).out.replaceAll('\t', ' '));
  });

  it('shows the same digits on every face', async () => {
    const answer = JSON.parse((await ask(question, '--json')).out) as Answer;
    const plain = (await ask(question, '--plain')).out;
    const text = flat((await ask(question)).out);
    const markdown = (await ask(question, '--markdown')).out.replaceAll('\\|', '|');
    const style = { ascii: false };
    const wave = answer.wave.vacuumWavelength_m;
    for (const side of ['from', 'into'] as const) {
      for (const { id, label, symbol, text: shown } of mediumRows(answer[side], wave, style)) {
        expect(plain).toContain(`${side}.${id}\t${shown}\t${label}`);
        expect(text).toMatch(new RegExp(`${escapeRegExp(`${symbol} `)}[^|]*?${escapeRegExp(flat(shown))}`));
        expect(markdown).toContain(` ${symbol} |`);
        expect(markdown).toContain(`| ${shown} |`);
      }
    }
    for (const { id, label, symbol, text: shown } of [
      ...interfaceRows(answer, style),
      ...stackRows(answer, style),
    ]) {
      expect(plain).toMatch(new RegExp(`^(interface|stack)\\.${id}\\t${escapeRegExp(shown)}\\t`, 'm'));
      expect(text).toContain(flat(` ${symbol} ${shown} ${label}`));
      expect(markdown).toContain(`| ${label} ${symbol} | ${shown} |`);
    }
  });

  it('holds the same values in CSV as in JSON, to the last digit', async () => {
    const { schema, version, catalogue, convention, cautions, ...answer } = JSON.parse(
      (await ask(question, '--json')).out,
    ) as Record<string, unknown>;
    const [names = [], values = []] = parseCsv((await ask(question, '--csv')).out);
    expect(names.length).toBe(values.length);
    const record = new Map(names.map((name, i) => [name, values[i]]));
    for (const [path, value] of leaves(answer, '')) {
      if (path === 'energy' && value === null) continue;
      expect(record.get(path), path).toBe(value === null ? '' : String(value));
    }
    expect(record.get('cautions')?.split(';').filter(Boolean)).toHaveLength((cautions as unknown[]).length);
  });
});

describe('numbers that are none', () => {
  it('become null in a document, never NaN or Infinity', () => {
    const body = { a: Number.NaN, b: [Number.POSITIVE_INFINITY, 1], c: { d: Number.NEGATIVE_INFINITY } };
    expect(JSON.parse(jsonDocument({ version: '1' }, body))).toMatchObject({
      a: null,
      b: [null, 1],
      c: { d: null },
    });
  });

  it('never reach anybody, whatever the media, the wave and the angle', async () => {
    const keys = catalogueFromSources().keys();
    const number = fc.oneof(
      fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
      fc.constantFrom(1, 1.5, 1e-19, 1e19, 1e-300, 1e300, 5e-324),
    );
    const signed = fc.tuple(number, fc.boolean()).map(([x, minus]) => (minus ? -x : x));
    const medium = fc.oneof(
      fc.constantFrom(...keys),
      number.map((n) => `n=${n}`),
      fc.tuple(number, number).map(([n, k]) => `n=${n}+${k}i`),
      fc.tuple(signed, number).map(([re, im]) => `eps=${re}+${im}i`),
      fc.tuple(number, number).map(([eps, mu]) => `eps=${eps},mu=${mu}`),
      fc.tuple(number, number).map(([eps, sigma]) => `eps=${eps},sigma=${sigma}`),
    );
    const wave = fc.oneof(
      fc.double({ min: 0.05, max: 1e6, noNaN: true }).map((um) => `${um}um`),
      fc.constantFrom('50nm', '100000km', '10GHz', '1Hz', '24eV'),
    );
    const angle = fc.oneof(
      fc.double({ min: 0, max: 89.9999, noNaN: true }),
      fc.constantFrom(0, 1e-9, 89.999999),
    );
    const beam = fc.constantFrom(
      [],
      ['--power', '1W', '--beam', '1mm'],
      ['--irradiance', '1e30W/m2'],
      ['--field', '1e-30V/m'],
    );
    const bad = /\bNaN\b|Infinity|undefined|\[object|(?<![\d.e])-0(?![.\d])/;
    await fc.assert(
      fc.asyncProperty(
        medium,
        medium,
        wave,
        angle,
        fc.constantFrom('s', 'p', 'unpolarized'),
        beam,
        async (from, into, w, a, pol, energy) => {
          const args = [from, into, w, '--angle', String(a), '--pol', pol, '--extrapolate', ...energy];
          const json = await run([...args, '--json']);
          expect([0, 2, 3]).toContain(json.status);
          if (json.status !== 0) {
            expect(json.out).toBe('');
            expect(json.err).toMatch(/^halfspace: .+; .+\n$/);
            return;
          }
          expect(faultsOf('answer', JSON.parse(json.out))).toEqual([]);
          for (const form of [[], ['--markdown'], ['--plain'], ['--csv']]) {
            const { out } = await run([...args, ...form]);
            expect(out.replace(/exp\(i\(k r - w t\)\)/g, '')).not.toMatch(bad);
          }
        },
      ),
      { numRuns: 400 },
    );
  }, 120_000);
});

function* leaves(value: unknown, path: string): Generator<readonly [string, unknown]> {
  if (Array.isArray(value)) for (const [i, v] of value.entries()) yield* leaves(v, `${path}.${i}`);
  else if (typeof value === 'object' && value !== null)
    for (const [key, v] of Object.entries(value)) yield* leaves(v, path === '' ? key : `${path}.${key}`);
  else yield [path, value];
}

/** RFC 4180. */
function parseCsv(text: string): string[][] {
  const records: string[][] = [];
  let record: string[] = [];
  for (const [, quoted, bare = '', end = ''] of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\n]*))(,|\n)/g)) {
    record.push(quoted === undefined ? bare : quoted.replaceAll('""', '"'));
    if (end === '\n') {
      records.push(record);
      record = [];
    }
  }
  return records;
}

const escapeRegExp = (text: string): string => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
