/**
 * Points of time as RFC 3339 text with the offset from UTC, so that a record needs no knowledge of where it was made.
 * The clock is handed in; `systemClock` is the real one.
 */

/** A point of time and the offset that local time has from UTC then, in minutes, positive to the east. */
export interface Moment {
  readonly sinceEpoch_ms: number;
  readonly utcOffset_min: number;
}

export type Clock = () => Moment;

/** The time of the machine, with the offset of its time zone (or of the TZ variable). */
export const systemClock: Clock = () => {
  const now = new Date();
  return { sinceEpoch_ms: now.getTime(), utcOffset_min: -now.getTimezoneOffset() };
};

/** "2026-03-14T09:26:53+01:00": whole seconds, cut and not rounded. */
export function timeStamp({ sinceEpoch_ms, utcOffset_min }: Moment): string {
  const offset_min = Math.round(utcOffset_min);
  const local = new Date(sinceEpoch_ms + offset_min * 60_000).toISOString().replace(/\.\d+Z$/, '');
  const size_min = Math.abs(offset_min);
  const two = (n: number): string => String(n).padStart(2, '0');
  return `${local}${offset_min < 0 ? '-' : '+'}${two(Math.floor(size_min / 60))}:${two(size_min % 60)}`;
}

const STAMP =
  /^\d{4}-(?:0[1-9]|1[0-2])-(?:0[1-9]|[12]\d|3[01])T(?:[01]\d|2[0-3]):[0-5]\d:(?:[0-5]\d|60)(?:\.\d+)?(?:Z|[+-]\d{2}:\d{2})$/;

export function isTimeStamp(text: string): boolean {
  return STAMP.test(text);
}
