/**
 * The header of a batch: which columns are parts of the question, in which unit their bare numbers are, and which are passed
 * on unread.
 *
 * `wave` takes cells with units (`633nm`); `wave_nm`, `wave (nm)`, `wave [nm]` and `wave/nm` take bare numbers. A unit may be
 * written with `per` (`irradiance_W_per_cm2`). Case does not matter in names, and `_` is as good as `-`. A name close to a
 * known one is taken for a slip and refused; `_` in front of a name passes a column on whatever it is called.
 */
import { orList } from '../units/parse-choice.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type Asking, type QuestionColumn, type Trouble, trouble } from './question-column.ts';

export interface HeaderColumn {
  readonly column: QuestionColumn;
  /** Which field of a row it is, from 0. */
  readonly field: number;
  /** Put behind each bare number; empty where the cells bring their own or take none. */
  readonly unit: string;
}

export interface Header {
  readonly names: readonly string[];
  readonly columns: readonly HeaderColumn[];
  /** Names of the columns that are no part of the question. */
  readonly passedOn: readonly string[];
}

export function readHeader(
  names: readonly string[],
  asking: Pick<Asking, 'columns' | 'nearest'>,
): Header | Trouble {
  const columns: HeaderColumn[] = [];
  const passedOn: string[] = [];
  for (const [field, name] of names.entries()) {
    const read = readName(name, asking);
    if (read && 'code' in read) return read;
    if (!read) {
      passedOn.push(name.trim());
      continue;
    }
    const same = columns.find(({ column }) => column.key === read.column.key);
    if (same) {
      const both = `${quoteInput(names[same.field]?.trim() ?? '')} and ${quoteInput(name.trim())}`;
      return trouble(
        'column-twice',
        `the columns ${both} are both the ${same.column.name}`,
        'keep one of them',
      );
    }
    columns.push({ ...read, field });
  }
  return { names: names.map((name) => name.trim()), columns, passedOn };
}

type Read = Omit<HeaderColumn, 'field'>;

/** One name; undefined where it is to be passed on. */
function readName(typed: string, asking: Pick<Asking, 'columns' | 'nearest'>): Read | Trouble | undefined {
  const name = typed.trim();
  if (name.startsWith('_') || name === '') return undefined;
  const folded = fold(name);
  const spellings = asking.columns
    .flatMap((column) => [column.name, ...column.aliases].map((spelling) => ({ column, spelling })))
    .sort((a, b) => b.spelling.length - a.spelling.length);
  const exact = spellings.find(({ spelling }) => spelling === folded);
  if (exact) return { column: exact.column, unit: '' };
  const begun = spellings.find(
    ({ spelling }) => folded.startsWith(spelling) && /^[-/([ ]/.test(folded.slice(spelling.length)),
  );
  if (begun) return withUnit(name, begun.column, name.slice(begun.spelling.length));
  const close = asking.nearest(
    folded,
    spellings.map(({ spelling }) => spelling),
  );
  if (close.length === 0) return undefined;
  return trouble(
    'unknown-column',
    `there is no column ${quoteInput(name)} of a question`,
    `did you mean ${orList(close)}? A column that begins with _ is passed on unread`,
  );
}

/** Case and the kind of dash do not count. */
const fold = (name: string): string => name.toLowerCase().replaceAll('_', '-');

function withUnit(name: string, column: QuestionColumn, rest: string): Read | Trouble {
  const bare = rest
    .replace(/^[-_/ ]+/, '')
    .replace(/^[([]\s*(.*?)\s*[)\]]$/, '$1')
    .replace(/^per_/, '1/')
    .replaceAll('_per_', '/');
  const unit = column.unit(bare);
  if (unit !== undefined) return { column, unit };
  const remedy =
    column.unitNames === ''
      ? `name the column ${column.name}`
      : `units are ${column.unitNames}, as in ${column.name}_UNIT`;
  return trouble(
    'bad-column-unit',
    `in the column ${quoteInput(name)}, ${quoteInput(bare)} is no unit of the ${column.name}`,
    `${remedy}. A column that begins with _ is passed on unread`,
  );
}
