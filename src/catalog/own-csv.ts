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
import { fault, numbersOf, readFacts, shorten, splitCsv } from './csv-text.ts';
import { foldLoose } from './fold.ts';
import { KEY_PATTERN } from './key-pattern.ts';
import type { Material, Source } from './types.ts';

export interface OwnTable {
  readonly material: Material;
  readonly source: Source;
}

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
  const { comments, rows } = splitCsv(text);
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

const at = (values: readonly number[], i: number): number => values[i] ?? Number.NaN;
