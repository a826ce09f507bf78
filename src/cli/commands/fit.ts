/** `halfspace fit FILE`: a dispersion formula fitted to measured indices, and a ready entry for the folder of own entries. */
import { basename } from 'node:path';
import { fitEntry } from '../../catalog/fit-entry.ts';
import { FIT_TERMS, fitPoints, isFitFault, type PointFit } from '../../catalog/fit-points.ts';
import { foldLoose, foldTight } from '../../catalog/fold.ts';
import { ownFolderPath } from '../../catalog/own-folder.ts';
import { isPointTable, type PointTable, readPoints } from '../../catalog/points-csv.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { decideGlyphs, decideLinear } from '../../term/ability.ts';
import type { Command, Context } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { readTextFile } from '../read-file.ts';
import { fitJson } from '../render/fit-json.ts';
import { type FitFacts, fitText } from '../render/fit-text.ts';
import { reportRefusal } from '../report-refusal.ts';
import { saveFile } from '../save-file.ts';

const ZERO_CELSIUS_K = 273.15;
const DOUBTFUL = 1;

export const run: Command = ({ operands, options }, context) => {
  const json = options.json === true;
  const [path = ''] = operands;
  const request = { model: options.model ?? 'sellmeier', terms: options.terms ?? 2 } as const;
  const [fewest, most] = FIT_TERMS[request.model];
  if (request.terms < fewest || request.terms > most) {
    const message = `--terms ${request.terms} is too ${request.terms < fewest ? 'few' : 'many'}`;
    const remedy = `a ${request.model} formula takes ${fewest} to ${most} terms here`;
    return reportRefusal(refuse('bad-terms', 2, message, remedy), context);
  }
  const table = readTable(path);
  if (isRefusal(table)) return reportRefusal(table, context);
  const fit = fitPoints(table.points, request);
  if (isFitFault(fit)) return reportRefusal(refuse('no-fit', 3, fit.message, fit.remedy), context);
  if (table.hasExtinction && !options.quiet)
    context.warn('halfspace: the column k is passed over: a fit describes n alone\n');
  const facts = factsOf(table, options);
  const file = options.output === '-' ? undefined : options.output;
  const entry =
    json || options.output !== undefined ? makeEntry(path, table, fit, facts, options, context) : null;
  if (isRefusal(entry)) return reportRefusal(entry, context);

  if (entry && file !== undefined) {
    const trouble = saveFile(file, entryText(entry), { replace: options.force === true });
    if (trouble) return reportRefusal(trouble, context);
  }
  if (json) context.print(fitJson(fit, facts, entry, context.version, options.ascii === true));
  else if (entry && file === undefined) context.print(entryText(entry));
  else context.print(textOf(fit, facts, file, path, options, context));
  return options.strict && fit.warnings.length > 0 ? DOUBTFUL : 0;
};

function readTable(path: string): PointTable | Refusal {
  const text = readTextFile(path);
  if (isRefusal(text)) return text;
  const table = readPoints(text);
  if (isPointTable(table)) return table;
  const [first] = table;
  const name = path === '-' ? 'standard input' : path;
  const place = first?.path === '' ? '' : `, ${first?.path ?? ''}`;
  return refuse('bad-points', 2, `${name}${place} ${first?.message ?? ''}`, first?.remedy ?? '');
}

/** The command line over what the file states. */
function factsOf({ facts }: PointTable, options: OptionValues): FitFacts {
  const reference = options.reference ?? facts.reference;
  return {
    reference: reference ?? 'air',
    referenceStated: reference !== undefined,
    temperature_C:
      options.temperature_K === undefined
        ? facts.temperature_C
        : Number((options.temperature_K - ZERO_CELSIUS_K).toFixed(6)),
  };
}

type Entry = Readonly<Record<string, unknown>>;

const entryText = (entry: Entry): string => `${JSON.stringify(entry, null, 2)}\n`;

/** Null where JSON is asked for and nothing gives the entry a key. */
function makeEntry(
  path: string,
  { facts: stated }: PointTable,
  fit: PointFit,
  { reference, temperature_C }: FitFacts,
  options: OptionValues,
  context: Context,
): Entry | null | Refusal {
  const stem = path === '-' ? '' : basename(path).replace(/\.[^.]*$/, '');
  const key =
    options.key ??
    foldLoose(stem)
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-+|-+$/g, '');
  if (key === '') {
    if (options.output === undefined) return null;
    return refuse('no-key', 2, 'the entry has no key', 'give one with --key, such as --key my-oil');
  }
  const taken = bundledKey(key, context);
  if (taken !== undefined) {
    const message = `the key ${key} names the bundled entry ${taken}, which stays`;
    return refuse('key-taken', 2, message, `give another with --key, such as --key my-${key}`);
  }
  return fitEntry(fit, {
    key,
    name: options.entryName ?? stated.name ?? key,
    reference,
    ...(temperature_C === undefined ? {} : { temperature_C }),
    source:
      options.entrySource ?? stated.source ?? `Points of ${path === '-' ? 'standard input' : basename(path)}`,
  });
}

/** The bundled entry of which the key is a spelling. */
function bundledKey(key: string, context: Context): string | undefined {
  const catalogue = context.catalogue();
  const spelling = catalogue.spellings(foldTight(key)).find((s) => !catalogue.entry(s.key)?.own);
  return spelling?.key;
}

function textOf(
  fit: PointFit,
  facts: FitFacts,
  file: string | undefined,
  path: string,
  options: OptionValues,
  context: Context,
): string {
  const folder = options.catalog ?? ownFolderPath(context.env);
  const stem = path === '-' ? 'my-entry' : basename(path).replace(/\.[^.]*$/, '');
  const chart = context.ascii ? 'ascii' : decideGlyphs(context.env, options.ascii ? 'ascii' : undefined);
  return fitText(
    {
      fit,
      facts,
      entryLine:
        file === undefined
          ? `Add -o ${stem}.json to write this fit as an entry; in ${folder} it is used beside the catalogue.`
          : `Entry written to ${file}; in ${folder} it is used beside the catalogue.`,
      chart: decideLinear(context.env, options.linear === true) ? undefined : chart,
    },
    { ascii: context.ascii },
  );
}
