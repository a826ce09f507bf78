/** Whether a material is meant by words of its names. Its names are folded once: a list that follows every key asks again and again. */
import { foldLoose, foldTight } from '../catalog/fold.ts';
import type { Material } from '../catalog/types.ts';

interface Names {
  /** Every name after a line break, its words after hyphens. */
  readonly loose: string;
  /** Every name after a line break. */
  readonly tight: string;
  /** Key and name alone. */
  readonly main: string;
}

const folded = new WeakMap<Material, Names>();

/** Tells whether every word begins a word of key, name, aliases, formula, code or class, or stands inside key or name. */
export function wordTest(words: readonly string[]): (material: Material) => boolean {
  const sought = words
    .map((typed) => ({ tight: foldTight(typed), loose: foldLoose(typed) }))
    .filter(({ tight }) => tight !== '')
    .map(({ tight, loose }) => ({ inside: tight, beginning: `\n${tight}`, word: `-${loose}` }));
  if (sought.length === 0) return () => true;
  return (material) => {
    const names = namesOf(material);
    return sought.every(
      ({ inside, beginning, word }) =>
        names.main.includes(inside) || names.tight.includes(beginning) || names.loose.includes(word),
    );
  };
}

/** The names ready for `wordTest`. */
export function namesOf(material: Material): Names {
  const known = folded.get(material);
  if (known) return known;
  const { key, name, aliases, formula = '', glassCode = '', class: kind } = material;
  const texts = [key, name, ...aliases, formula, glassCode, kind];
  const lines = (fold: (text: string) => string, of: readonly string[]): string =>
    of.map((text) => `\n${fold(text)}`).join('');
  const names: Names = {
    loose: lines((text) => `-${foldLoose(text).replace(/[^\p{L}\p{N}+*%-]+/gu, '-')}`, texts),
    tight: lines(foldTight, texts),
    main: lines(foldTight, [key, name]),
  };
  folded.set(material, names);
  return names;
}
