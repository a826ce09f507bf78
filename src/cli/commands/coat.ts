/** `halfspace coat FROM INTO WAVE`: antireflection films, V-coats and high reflectors for one pair of media. */
import { BAND_LIMIT, FILM_CLASS, WANTED_REFLECTANCE } from '../../answer/coating-defaults.ts';
import { coatingReport } from '../../answer/coating-report.ts';
import { type MediumSpec, makeQuestion } from '../../answer/question.ts';
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import type { Command } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { questionOptions, readWave } from '../read-question.ts';
import { coatCsv, coatJson } from '../render/coat-data.ts';
import { coatMarkdown } from '../render/coat-markdown.ts';
import { coatText } from '../render/coat-text.ts';
import { reportRefusal } from '../report-refusal.ts';

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
  const high = await optionalFilm(options.highFilm, catalogue);
  if (isRefusal(high)) return refused(high);
  const low = await optionalFilm(options.lowFilm, catalogue);
  if (isRefusal(low)) return refused(low);
  const stated = questionOptions(options, wave);
  if (isRefusal(stated)) return refused(stated);

  const asked = {
    question: makeQuestion(from, into, wave, stated),
    films,
    limit: options.limit ?? BAND_LIMIT,
    mirror: {
      wanted: options.wantedReflectance ?? WANTED_REFLECTANCE,
      pairs: options.pairs ?? null,
      high,
      low,
    },
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

async function optionalFilm(
  name: string | undefined,
  catalogue: IndexedCatalogue,
): Promise<MediumSpec | undefined | Refusal> {
  return name === undefined ? undefined : mediumOf(name, catalogue);
}

/** Those named, or every film of the catalogue and of the person's own folder. */
async function filmsOf(
  names: readonly string[] | undefined,
  catalogue: IndexedCatalogue,
): Promise<readonly MediumSpec[] | Refusal> {
  const found: MediumSpec[] = [];
  if (names === undefined) {
    for (const { key, class: kind } of catalogue.entries()) {
      const material = kind === FILM_CLASS ? catalogue.material(key) : undefined;
      if (material) found.push({ kind: 'catalogue', material });
    }
    return found;
  }
  for (const name of names) {
    const film = await mediumOf(name, catalogue);
    if (isRefusal(film)) return film;
    found.push(film);
  }
  return found;
}
