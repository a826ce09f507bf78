/** Classes of the catalogue by the words people use: "glass" is every kind of glass, "film" a thin film, "liquids" a liquid. */
import { foldLoose } from '../catalog/fold.ts';

/** True where each word typed begins a word of the class, a plural counting as its singular. */
export function matchesClass(typed: string, materialClass: string): boolean {
  const words = foldLoose(materialClass).split('-');
  const wanted = foldLoose(typed).split('-');
  return (
    wanted[0] !== '' &&
    wanted.every((word) => spellings(word).some((w) => words.some((x) => x.startsWith(w))))
  );
}

function spellings(word: string): readonly string[] {
  const singular = word.length > 3 && word.endsWith('s') ? [word.replace(/(?<=ss)es$|s$/, '')] : [];
  return [word, ...singular.filter((w) => !w.endsWith('s') || word.endsWith('sses'))];
}
