import { describe, expect, it } from 'vitest';
import { answerColumns, valueAt } from '../../src/batch/answer-columns.ts';
import { ByteWriter } from '../../src/batch/byte-writer.ts';
import { CsvBatch } from '../../src/batch/csv-batch.ts';
import type { FixedParts } from '../../src/batch/row-layout.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { makeAsking } from '../../src/cli/asking.ts';
import { isRefusal } from '../../src/medium/refusal.ts';

const catalogue = catalogueFromSources();
const asking = makeAsking(catalogue);

async function answer(
  text: string,
  columns: string,
  fixed: FixedParts,
  bulk = true,
  chunk = 1 << 16,
): Promise<string> {
  const made = answerColumns(columns, () => [], asking.nearest);
  if ('code' in made) throw new Error(made.message);
  const writer = new ByteWriter();
  const batch = new CsvBatch({
    asking,
    fixed,
    columns: made,
    writer,
    bulk,
    marksOutside: false,
    whole: false,
    wording: (t) => t,
    passedOn: () => undefined,
  });
  let out = '';
  const drain = async (): Promise<void> => {
    while ((await batch.run(64)) === 'more') if (batch.fatal) break;
    out += Buffer.from(writer.take()).toString();
  };
  const bytes = Buffer.from(text);
  for (let at = 0; at < bytes.length; at += chunk) {
    batch.push(Buffer.from(bytes.subarray(at, at + chunk)));
    await drain();
  }
  batch.end();
  await drain();
  if (batch.fatal) throw new Error(`${batch.fatal.message}; ${batch.fatal.remedy}`);
  return out;
}
const NONE: FixedParts = { texts: {}, options: {} };
const COLUMNS = 'n1,n2,k2,R,T,Rs,Rp,Ts,Tp,refraction_deg,wave_m,frequency_Hz';

let seed = 7;
const random = (): number => {
  seed = (seed * 1103515245 + 12345) % 2147483648;
  return seed / 2147483648;
};
const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)] as T;

describe('a batch', () => {
  it('gives 200 random questions the very numbers and words of the one-shot answer', async () => {
    const media = [
      'air',
      'vacuum',
      'n-bk7',
      'fused-silica',
      'gold',
      'water',
      'sapphire:e',
      'znse',
      'n=1.5+0.02i',
      'eps=4,sigma=0.01',
      'nonsuch',
    ];
    const rows = Array.from({ length: 200 }, () => [
      pick(media),
      pick(media),
      (0.2 + random() * 3).toFixed(5),
      (random() * 92).toFixed(3),
      pick(['s', 'p', 'unpolarized', '']),
      pick(['', '20', '55.5']),
    ]);
    const made = answerColumns(COLUMNS, () => [], asking.nearest);
    if ('code' in made) throw new Error(made.message);
    const text = `from,into,wave_um,angle_deg,pol,temperature_C\n${rows.map((r) => r.map((c) => (c.includes(',') ? `"${c}"` : c)).join(',')).join('\n')}\n`;
    const lines = (await answer(text, COLUMNS, NONE)).trimEnd().split('\n').slice(1);
    expect(lines).toHaveLength(200);
    let answered = 0;
    const columns = new Map(asking.columns.map((c) => [c.name, c]));
    for (const [i, [from = '', into = '', um, angle, pol = '', temperature = '']] of rows.entries()) {
      const line = lines[i] ?? '';
      const angle_rad = columns.get('angle')?.parse(`${angle}deg`);
      if (typeof angle_rad !== 'number') {
        expect(line).toContain('no angle of incidence');
        continue;
      }
      const one = await asking.answer([from, into, `${um}um`], {
        angle_rad,
        ...(pol && { polarization: pol }),
        ...(temperature && { temperature_K: columns.get('temperature')?.parse(`${temperature}C`) }),
      });
      if (isRefusal(one)) {
        expect(line.replaceAll('""', '"')).toContain(one.message);
        continue;
      }
      answered++;
      const expected = made.map((column) => valueAt(one, column)).map((v) => (v === null ? '' : String(v)));
      expect(line.endsWith(`,${expected.join(',')},`), `${line}\n${expected.join(',')}`).toBe(true);
    }
    expect(answered).toBeGreaterThan(60);
  });

  it('writes plain rows in bulk byte for byte as row by row, in chunks of any size', async () => {
    const waves = Array.from({ length: 3000 }, (_, i) =>
      i % 97 === 0 ? pick(['', 'abc', '"0.5"', '99', '0.5e0', ' 0.5 ']) : (0.25 + random() * 2.4).toFixed(6),
    );
    const text = `wave_um,angle,_note\r\n${waves.map((w, i) => `${w},${(i * 0.0299).toFixed(3)},x${i}`).join('\r\n')}`;
    for (const into of ['n-bk7', 'fused-silica', 'gold'])
      for (const columns of ['n', 'n,k', 'n1,R,T,refraction_deg']) {
        const fixed: FixedParts = { texts: { from: 'air', into }, options: {} };
        const slow = await answer(text, columns, fixed, false);
        expect(await answer(text, columns, fixed)).toBe(slow);
        expect(await answer(text, columns, fixed, true, 1000)).toBe(slow);
      }
  });

  it('reads quotes, blank lines, a byte order mark, a missing last line end; keeps order', async () => {
    const fixed: FixedParts = { texts: { from: 'air', into: 'n=1.5' }, options: {} };
    const text = '\ufeffwave_nm,_note\n\n500,"a, ""b""\nc"\r\n\n600,d\n700,"open\n800,e';
    for (const chunk of [1, 3, 1000]) {
      const out = await answer(text, 'n', fixed, true, chunk);
      expect(out).toBe(
        'wave_nm,_note,n,error\n500,"a, ""b""\nc",1.5,\n600,d,1.5,\n"700,""open",,,"line 7: a quote is opened and never closed; close it, or double it inside quotes"\n800,e,1.5,\n',
      );
    }
  });

  it('says what is wrong with a header', async () => {
    const fixed: FixedParts = { texts: { from: 'air', into: 'n=1.5' }, options: {} };
    for (const [header, said] of [
      ['wave_mn', 'no unit'],
      ['wvae', 'did you mean'],
      ['_x', 'what the wave is'],
      ['wave,wave_nm', 'both the wave'],
      ['wave,into', 'both an option and a column'],
      ['wave,n', 'already has a column'],
    ] as const)
      await expect(answer(`${header}\n`, 'n', fixed), header).rejects.toThrow(said);
    await expect(answer('', 'n', fixed)).rejects.toThrow('empty');
  });
});
