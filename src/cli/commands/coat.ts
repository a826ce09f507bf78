/** `halfspace coat FROM INTO WAVE`: antireflection films, V-coats and high reflectors for one pair of media. */
import { coatingReport } from '../../answer/coating-report.ts';
import { type MediumSpec, makeQuestion } from '../../answer/question.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import type { Material } from '../../catalog/types.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { quoteInput } from '../../units/quote-input.ts';
import type { Command } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { questionOptions, readWave } from '../read-question.ts';
import { coatCsv, coatJson } from '../render/coat-data.ts';
import { coatMarkdown } from '../render/coat-markdown.ts';
import { coatText } from '../render/coat-text.ts';
import { reportRefusal } from '../report-refusal.ts';

const LIMIT = 0.005;
const WANTED = 0.995;
const FILM_CLASS = 'thin film';

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const json = options.json === true;
  const refused = (refusal: Refusal): number => reportRefusal(refusal, context);
  const [fromName = '', intoName = '', waveText = ''] = operands;
  const wave = readWave(waveText, options);
  if (isRefusal(wave)) return refused(wave);
  const from = await mediumOf(fromName, catalogue);
  if (isRefusal(from)) return refused(from);
  const into = await mediumOf(intoName, catalogue);
  if (isRefusal(into)) return refused(into);
  const films = await filmsOf(options.films, catalogue);
  if (isRefusal(films)) return refused(films);
  const high = await materialOf(options.highFilm, catalogue);
  if (isRefusal(high)) return refused(high);
  const low = await materialOf(options.lowFilm, catalogue);
  if (isRefusal(low)) return refused(low);
  const stated = questionOptions(options, wave);
  if (isRefusal(stated)) return refused(stated);

  const asked = {
    question: makeQuestion(from, into, wave, stated),
    films,
    limit: options.limit ?? LIMIT,
    mirror: { wanted: options.wantedReflectance ?? WANTED, pairs: options.pairs ?? null, high, low },
  };
  const report = coatingReport(asked, (id) => catalogue.source(id));
  if (isRefusal(report)) return refused(report);
  const style = { ascii: context.ascii };
  const head = { version: context.version, catalogue: catalogue.hash };
  if (json) context.write(coatJson(report, head, options.ascii === true));
  else if (options.csv) context.write(coatCsv(report, options.ascii === true));
  else if (options.markdown) context.write(coatMarkdown(report, style));
  else context.write(coatText(report, { from: fromName, into: intoName, wave: waveText }, style));
  return options.strict && report.cautions.some((c) => c.level !== 'note') ? 1 : 0;
};

async function mediumOf(name: string, catalogue: IndexedCatalogue): Promise<MediumSpec | Refusal> {
  const medium = findMedium(name, catalogue);
  return isRefusal(medium) ? suggestMedia(medium, name, catalogue) : medium;
}

async function materialOf(
  name: string | undefined,
  catalogue: IndexedCatalogue,
): Promise<Material | undefined | Refusal> {
  if (name === undefined) return undefined;
  const medium = await mediumOf(name, catalogue);
  if (isRefusal(medium)) return medium;
  return medium.kind === 'catalogue'
    ? medium.material
    : refuse(
        'film-by-numbers',
        2,
        `${quoteInput(name)} is no material of the catalogue`,
        'design with catalogue films; a stack of any indices is a path: air n=2.3@qw n=1.46@qw n-bk7 633nm',
      );
}

/** Those named, or every film of the catalogue and of the person's own folder. */
async function filmsOf(
  names: readonly string[] | undefined,
  catalogue: IndexedCatalogue,
): Promise<readonly Material[] | Refusal> {
  const found: Material[] = [];
  if (names === undefined) {
    for (const { key, class: kind } of catalogue.entries()) {
      const material = kind === FILM_CLASS ? catalogue.material(key) : undefined;
      if (material) found.push(material);
    }
    return found;
  }
  for (const name of names) {
    const material = await materialOf(name, catalogue);
    if (isRefusal(material)) return material;
    if (material && !found.includes(material)) found.push(material);
  }
  return found;
}
