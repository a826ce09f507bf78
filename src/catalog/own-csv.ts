/**
 * A user's measured table as a catalogue entry. The file:
 *   # name: My oil            (lines from # on are comments; name, source, reference, temperature_C, accuracy_n and note
 *   # reference: air           are understood in the form "# word: value", others are ignored)
 *   wavelength_nm,n,k         (or wavelength_um; k may be left out; comma, semicolon or tab between the columns)
 *   400,1.532,0
 * Between the rows n and k run straight in the wavelength; beyond them there is no answer. The key is the file's name.
 */
import type { TableColumn, TableParameters } from '../dispersion/parameters.ts';
import type { Fault } from './check-shape.ts';
import { foldLoose } from './fold.ts';
import { KEY_PATTERN } from './material-shape.ts';
import type { Material, Source } from './types.ts';

export interface OwnTable {
  readonly material: Material;
  readonly source: Source;
}

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;
const UM_PER = { wavelength_um: 1, wavelength_nm: 1e-3 } as const;
const HEADER = 'a header line such as "wavelength_um,n" or "wavelength_nm,n,k"';

/** @param stem the file's name without folder and ending. */
export function readOwnCsv(stem: string, text: string): OwnTable | readonly Fault[] {
  const key = foldLoose(stem);
  if (!new RegExp(KEY_PATTERN).test(key))
    return [
      fault(
        '',
        'has a name that makes no key',
        'name it with letters, digits and hyphens, such as my-oil.csv',
      ),
    ];
  const { comments, rows } = split(text);
  const header = rows[0];
  if (!header) return [fault('', 'has no lines', `begin with ${HEADER}`)];
  const columns = header.fields.map((f) => f.toLowerCase());
  const [first, second, third] = columns;
  const known = first === 'wavelength_um' || first === 'wavelength_nm';
  if (!known || second !== 'n' || columns.length > 3 || (columns.length === 3 && third !== 'k'))
    return [fault(`line ${header.line}`, `reads "${shorten(header.fields.join(','))}"`, `must be ${HEADER}`)];

  const faults: Fault[] = [];
  const data = rows.slice(1).flatMap((row) => {
    const values = numbersOf(row, columns, faults);
    return values ? [{ line: row.line, values }] : [];
  });
  if (faults.length > 0) return faults;
  if (data.length < 2) return [fault('', `has ${data.length} rows of values`, 'give at least two')];
  data.sort((a, b) => at(a.values, 0) - at(b.values, 0));
  const twin = data.find((row, i) => i > 0 && at(row.values, 0) === at(data[i - 1]?.values ?? [], 0));
  if (twin)
    return [
      fault(`line ${twin.line}`, `repeats the wavelength ${at(twin.values, 0)}`, 'keep one of the two'),
    ];

  const facts = readFacts(comments, faults);
  if (faults.length > 0) return faults;
  const scale = UM_PER[first];
  const column = (i: number): TableColumn => ({
    values: data.map((row) => at(row.values, i)),
    along: 'L',
    kind: 'linear',
  });
  const wavelengths = data.map((row) => at(row.values, 0));
  const parameters: TableParameters = {
    model: 'table',
    abscissa: first === 'wavelength_um' ? 'um' : 'nm',
    at: wavelengths,
    n: column(1),
    ...(columns.length === 3 ? { k: column(2) } : {}),
  };
  const sourceId = `own-${key}`;
  const assumed =
    facts.reference === undefined ? 'The file does not state the reference; taken as air.' : undefined;
  const note = [facts.note, assumed].filter((s) => s !== undefined).join(' ');
  return {
    material: {
      key,
      name: facts.name ?? stem,
      aliases: [],
      class: 'own table',
      own: true,
      fits: [
        {
          id: 'table',
          axis: 'isotropic',
          recommended: true,
          parameters,
          range_um: [at(wavelengths, 0) * scale, at(wavelengths, wavelengths.length - 1) * scale],
          reference: facts.reference ?? 'air',
          source: sourceId,
          grade: 'B',
          recalled: false,
          checks: [],
          ...(facts.temperature_C === undefined ? {} : { temperature_C: facts.temperature_C }),
          ...(facts.accuracy_n === undefined ? {} : { accuracy_n: facts.accuracy_n }),
          ...(note === '' ? {} : { note }),
        },
      ],
    },
    source: { id: sourceId, type: 'dataset', title: facts.source ?? `Own table ${stem}.csv` },
  };
}

interface Row {
  readonly line: number;
  readonly fields: readonly string[];
}

function split(text: string): { readonly comments: readonly Row[]; readonly rows: readonly Row[] } {
  const comments: Row[] = [];
  const rows: Row[] = [];
  for (const [i, raw] of text
    .replace(/^\ufeff/, '')
    .split(/\r\n|\n|\r/)
    .entries()) {
    const line = raw.trim();
    if (line === '') continue;
    if (line.startsWith('#')) comments.push({ line: i + 1, fields: [line.slice(1)] });
    else {
      const separator = line.includes('\t') ? '\t' : line.includes(';') ? ';' : ',';
      rows.push({
        line: i + 1,
        fields: line.split(separator).map((f) => f.trim().replace(/^"(.*)"$/, '$1')),
      });
    }
  }
  return { comments, rows };
}

/** The numbers of one row, or undefined with the fault noted. */
function numbersOf(row: Row, columns: readonly string[], faults: Fault[]): readonly number[] | undefined {
  const where = `line ${row.line}`;
  // The first few faults tell the story of a wrong file.
  if (faults.length >= 5) return undefined;
  if (row.fields.length !== columns.length) {
    faults.push(
      fault(where, `has ${row.fields.length} values`, `must have ${columns.length}: ${columns.join(', ')}`),
    );
    return undefined;
  }
  const values: number[] = [];
  for (const [i, field] of row.fields.entries()) {
    const column = columns[i] ?? '';
    const value = NUMBER.test(field) ? Number(field) : Number.NaN;
    const fits = Number.isFinite(value) && (column === 'k' ? value >= 0 : value > 0);
    if (!fits) {
      const want = column === 'k' ? 'a number of at least 0 (k >= 0 absorbs)' : 'a number above 0';
      const comma = /^\d+,\d+$/.test(field) ? `, with a point: ${field.replace(',', '.')}` : '';
      faults.push(fault(`${where}, ${column}`, `is "${shorten(field)}"`, `must be ${want}${comma}`));
      return undefined;
    }
    values.push(value);
  }
  return values;
}

interface Facts {
  name?: string;
  source?: string;
  note?: string;
  reference?: 'air' | 'vacuum';
  temperature_C?: number;
  accuracy_n?: number;
}

function readFacts(comments: readonly Row[], faults: Fault[]): Facts {
  const facts: Facts = {};
  for (const { line, fields } of comments) {
    const match = /^\s*(name|source|note|reference|temperature_C|accuracy_n)\s*:\s*(.*?)\s*$/i.exec(
      fields[0] ?? '',
    );
    const [, word = '', value = ''] = match ?? [];
    if (!match) continue;
    const wrong = (want: string): void => {
      faults.push(fault(`line ${line}, ${word}`, `is "${shorten(value)}"`, `must be ${want}`));
    };
    const number = NUMBER.test(value) ? Number(value) : Number.NaN;
    switch (word.toLowerCase()) {
      case 'name':
      case 'source':
      case 'note':
        if (value === '' || /\p{Cc}/u.test(value)) wrong('a text without control characters');
        else facts[word.toLowerCase() as 'name' | 'source' | 'note'] = value;
        break;
      case 'reference':
        if (value === 'air' || value === 'vacuum') facts.reference = value;
        else wrong('air or vacuum');
        break;
      case 'temperature_c':
        if (number >= -273.15 && Number.isFinite(number)) facts.temperature_C = number;
        else wrong('a temperature in degrees Celsius, a number only');
        break;
      default:
        if (number >= 0 && Number.isFinite(number)) facts.accuracy_n = number;
        else wrong('the standard uncertainty of n, a number of at least 0');
    }
  }
  return facts;
}

const at = (values: readonly number[], i: number): number => values[i] ?? Number.NaN;

const fault = (path: string, message: string, remedy: string): Fault => ({ path, message, remedy });

/** A quotation fit for one line of a message. */
const shorten = (s: string): string => (s.length > 40 ? `${s.slice(0, 40)}...` : s).replace(/\p{Cc}/gu, '?');
