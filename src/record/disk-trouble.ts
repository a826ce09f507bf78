/** What the system says about a file, as a refusal with the path and what to do about it; never a stack trace. */
import { type Refusal, refuse } from '../medium/refusal.ts';

export type LogbookAction = 'write' | 'read';

interface Trouble {
  readonly code: string;
  readonly message: (path: string) => string;
  readonly remedy: string;
}

const ELSEWHERE = 'name another file for the logbook';

const FULL: Trouble = {
  code: 'logbook-disk-full',
  message: (path) => `no room is left for ${path}; the record is not kept`,
  remedy: `free some space there, or ${ELSEWHERE}`,
};
const READ_ONLY: Trouble = {
  code: 'logbook-read-only',
  message: (path) => `${path} is on a file system that is mounted read-only`,
  remedy: ELSEWHERE,
};
const PERMISSION: Trouble = {
  code: 'logbook-permission',
  message: (path) => `the system allows no access to ${path}`,
  remedy: `ask for access to that file and its folder, or ${ELSEWHERE}`,
};
const NO_SUCH_PLACE: Trouble = {
  code: 'logbook-path',
  message: (path) => `${path} cannot be opened: a folder on the way is missing, or is no folder`,
  remedy: `make that folder or mount its disk, or ${ELSEWHERE}`,
};
const FOLDER: Trouble = {
  code: 'logbook-path',
  message: (path) => `${path} is a folder`,
  remedy: 'name a file in it for the logbook',
};
const NO_ANSWER: Trouble = {
  code: 'logbook-disk-failed',
  message: (path) => `the disk with ${path} failed or is no longer mounted`,
  remedy: `look after that disk, then keep the record again, or ${ELSEWHERE}`,
};
const TOO_MANY: Trouble = {
  code: 'logbook-busy',
  message: (path) => `too many files are open to open ${path}`,
  remedy: 'close other programs and try again',
};

const TROUBLES: Readonly<Record<string, Trouble>> = {
  ENOSPC: FULL,
  EDQUOT: FULL,
  EFBIG: FULL,
  EROFS: READ_ONLY,
  EACCES: PERMISSION,
  EPERM: PERMISSION,
  ENOENT: NO_SUCH_PLACE,
  ENOTDIR: NO_SUCH_PLACE,
  EEXIST: NO_SUCH_PLACE,
  ELOOP: NO_SUCH_PLACE,
  ENAMETOOLONG: NO_SUCH_PLACE,
  EINVAL: NO_SUCH_PLACE,
  ERR_INVALID_ARG_VALUE: NO_SUCH_PLACE,
  EISDIR: FOLDER,
  EIO: NO_ANSWER,
  ESTALE: NO_ANSWER,
  ENODEV: NO_ANSWER,
  ENXIO: NO_ANSWER,
  ENOTCONN: NO_ANSWER,
  EHOSTDOWN: NO_ANSWER,
  ETIMEDOUT: NO_ANSWER,
  ESHUTDOWN: NO_ANSWER,
  EMFILE: TOO_MANY,
  ENFILE: TOO_MANY,
};

/** The refusal for an error thrown by a file call. Errors that no file call made are thrown on. */
export function diskTrouble(error: unknown, path: string, action: LogbookAction): Refusal {
  const code = errorCode(error);
  if (code === undefined) throw error;
  const known = Object.hasOwn(TROUBLES, code) ? TROUBLES[code] : undefined;
  if (known) return refuse(known.code, 4, known.message(path), known.remedy);
  return refuse('logbook-failed', 4, `the system could not ${action} ${path} (${code})`, ELSEWHERE);
}

/** The errno name of an error from a file call, e.g. "ENOSPC"; undefined for other errors. */
export function errorCode(error: unknown): string | undefined {
  if (!(error instanceof Error)) return undefined;
  const { code } = error as { code?: unknown };
  return typeof code === 'string' ? code : undefined;
}

/** Fewer bytes were taken than given: on a regular file that means that the room has run out. */
export function shortWrite(path: string, writtenBytes: number, allBytes: number): Refusal {
  return refuse(
    FULL.code,
    4,
    `only ${writtenBytes} of ${allBytes} bytes found room in ${path}; the record is not kept`,
    FULL.remedy,
  );
}
