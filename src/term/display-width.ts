/**
 * Display width: how many terminal columns a text takes, cut into grapheme clusters.
 *
 * Promises: printable ASCII and the narrow scripts this program writes (Latin, Greek, Cyrillic, sub- and superscripts,
 * arrows, mathematics, box drawing, blocks, braille) are measured by comparisons alone; everything else goes through
 * the segmenter and Unicode properties. Ambiguous East Asian width counts as narrow.
 * Special cases: escape sequences, control characters, soft hyphens and lone combining marks take no column;
 * emoji sequences take two; a cluster is as wide as its first visible code point plus its spacing marks.
 */
import { isEastAsianWide } from './east-asian-wide.ts';

export interface Cluster {
  readonly text: string;
  readonly width: number;
}

const ESCAPE_SEQUENCE =
  /(?:\x1b\[|\x9b)[0-?]*[ -/]*[@-~]|\x1b\][^\x07\x1b\x9c]*(?:\x07|\x1b\\|\x9c)|\x1b[PX^_][^\x1b]*\x1b\\|\x1b[ -/]*[0-~]/g;
const VISIBLE =
  /[^\p{Default_Ignorable_Code_Point}\p{Control}\p{Format}\p{Nonspacing_Mark}\p{Enclosing_Mark}\p{Surrogate}]/u;
const SPACING_MARK = /\p{Spacing_Mark}/u;
const MAYBE_EMOJI = /\p{Extended_Pictographic}|\p{Regional_Indicator}|\u20e3/u;
const PICTOGRAPHS = /\p{Extended_Pictographic}/gu;
const UNICODE_SETS_FLAG = 'v';
const UNQUALIFIED_KEYCAP = /^[\d#*]\u20e3$/;

let segmenter: Intl.Segmenter | undefined;
let rgiEmoji: RegExp | undefined;

/**
 * True for a UTF-16 unit that is a whole grapheme cluster, one column wide in every terminal, as long as its neighbours
 * are such units too. False says only "look closer".
 */
export function isPlainNarrow(unit: number): boolean {
  if (unit < 0x7f) return unit >= 0x20;
  if (unit < 0x300) return unit >= 0xa0 && unit !== 0xad;
  if (unit < 0x1e00) return (unit >= 0x370 && unit < 0x483) || (unit >= 0x48a && unit < 0x530);
  if (unit < 0x2070)
    return unit < 0x2000 || (unit >= 0x2010 && unit < 0x2028) || (unit >= 0x2030 && unit < 0x205f);
  if (unit < 0x231a) return unit < 0x20d0 || unit >= 0x2100;
  return (unit >= 0x2500 && unit < 0x25fd) || (unit >= 0x2800 && unit < 0x2900);
}

function isAllPlainNarrow(text: string): boolean {
  for (let i = 0; i < text.length; i++) if (!isPlainNarrow(text.charCodeAt(i))) return false;
  return true;
}

/** Takes escape sequences out of a text. */
export function stripEscapes(text: string): string {
  return text.includes('\x1b') || text.includes('\x9b') ? text.replace(ESCAPE_SEQUENCE, '') : text;
}

/** Columns of a text; escape sequences count nothing. */
export function displayWidth(text: string): number {
  if (isAllPlainNarrow(text)) return text.length;
  const bare = stripEscapes(text);
  if (bare !== text && isAllPlainNarrow(bare)) return bare.length;
  let width = 0;
  for (const { segment } of segments(bare)) width += clusterWidth(segment);
  return width;
}

/** Cuts a text without escape sequences into grapheme clusters with their widths; zero-width clusters are kept. */
export function clusters(text: string): Cluster[] {
  const out: Cluster[] = [];
  if (isAllPlainNarrow(text)) for (const unit of text) out.push({ text: unit, width: 1 });
  else for (const { segment } of segments(text)) out.push({ text: segment, width: clusterWidth(segment) });
  return out;
}

/**
 * True where terminals agree on the width of a cluster: plain narrow units, these with combining marks U+0300 to
 * U+036F, and single wide ideographs, kana or syllables. Emoji, jamo and scripts with spacing marks are not agreed on.
 */
export function isWidthAgreed(cluster: string): boolean {
  const first = cluster.charCodeAt(0);
  if (cluster.length === 1) return isPlainNarrow(first) || isCommonWide(first);
  if (!isPlainNarrow(first)) return false;
  for (let i = 1; i < cluster.length; i++) {
    const unit = cluster.charCodeAt(i);
    if (unit < 0x300 || unit > 0x36f) return false;
  }
  return true;
}

function isCommonWide(unit: number): boolean {
  return (
    (unit >= 0x3041 && unit < 0x3097) ||
    (unit >= 0x30a1 && unit < 0x30fb) ||
    (unit >= 0x4e00 && unit < 0xa000) ||
    (unit >= 0xac00 && unit < 0xd7a4) ||
    (unit >= 0xff01 && unit < 0xff61)
  );
}

function segments(text: string): Intl.Segments {
  segmenter ??= new Intl.Segmenter(undefined, { granularity: 'grapheme' });
  return segmenter.segment(text);
}

function clusterWidth(cluster: string): number {
  const first = cluster.codePointAt(0) ?? 0;
  if (cluster.length === 1 && isPlainNarrow(first)) return 1;
  if (!VISIBLE.test(cluster)) return 0;
  if (MAYBE_EMOJI.test(cluster) && isWideEmoji(cluster)) return 2;
  let width = 0;
  let afterLeadingJamo = false;
  for (const character of cluster) {
    if (!VISIBLE.test(character)) continue;
    const code = character.codePointAt(0) ?? 0;
    const columns = isEastAsianWide(code) ? 2 : 1;
    if (width === 0 || isLeadingJamo(code)) width += columns;
    else if (isInnerJamo(code)) width += afterLeadingJamo ? 0 : columns;
    else if (SPACING_MARK.test(character) || (code >= 0xff00 && code <= 0xffef)) width += columns;
    // A syllable block L V or L V T is drawn in the two columns of its leading jamo.
    afterLeadingJamo = isLeadingJamo(code) || (afterLeadingJamo && isInnerJamo(code));
  }
  return width;
}

const isLeadingJamo = (code: number): boolean =>
  (code >= 0x1100 && code <= 0x115f) || (code >= 0xa960 && code <= 0xa97c);
const isInnerJamo = (code: number): boolean =>
  (code >= 0x1160 && code <= 0x11ff) || (code >= 0xd7b0 && code <= 0xd7fb);

function isWideEmoji(cluster: string): boolean {
  // Made on first need. The property of sequences needs the v flag, which the compile target does not know.
  rgiEmoji ??= new RegExp('^\\p{RGI_Emoji}$', UNICODE_SETS_FLAG);
  if (rgiEmoji.test(cluster) || UNQUALIFIED_KEYCAP.test(cluster)) return true;
  return cluster.includes('\u200d') && (cluster.match(PICTOGRAPHS)?.length ?? 0) >= 2;
}
