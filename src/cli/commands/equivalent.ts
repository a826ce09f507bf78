/** `halfspace equivalent GLASS`: glasses of other makers in its place; a code of six digits names all that bear it. */
import type { Material } from '../../catalog/types.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { glassEquivalents, glassPlace } from '../../selection/glass-equivalents.ts';
import { makeSurvey } from '../../selection/survey.ts';
import type { Command } from '../context.ts';
import { findGlass, findMakers } from '../find-glass.ts';
import { equivalentCsv, equivalentJson } from '../render/equivalent-data.ts';
import { carriersOf, type EquivalentPage, equivalentText } from '../render/equivalent-text.ts';
import { reportRefusal } from '../report-refusal.ts';

const NEAREST = 12;

export const run: Command = async ({ operands, options }, context) => {
  const json = options.json === true;
  const catalogue = context.catalogue();
  const survey = makeSurvey(catalogue);
  const sought = await findGlass(operands.join(' '), catalogue, survey);
  if (isRefusal(sought)) return reportRefusal(sought, context);
  const makers = options.maker === undefined ? undefined : findMakers(options.maker, survey);
  if (isRefusal(makers)) return reportRefusal(makers, context);

  const itself = sought.kind === 'glass' ? sought.material : undefined;
  const carriers = sought.kind === 'code' ? sought.carriers : [];
  const unwanted = (m: Material): boolean => {
    if (makers) return !makers.includes(m.maker ?? '');
    return itself?.maker !== undefined && m.maker === itself.maker;
  };
  const page: EquivalentPage = {
    sought,
    carriers: carriersOf(
      carriers.flatMap((material) => {
        const place = makers && unwanted(material) ? undefined : glassPlace(survey, material);
        return place ? [{ material, place }] : [];
      }),
      sought.place,
    ),
    others: glassEquivalents(survey, sought.place, {
      except: (m) => m === itself || carriers.includes(m) || unwanted(m),
      within_n_d: options.within,
      Vd: options.abbeRange,
      limit: NEAREST,
    }),
    from: makers?.join(', ') ?? (itself?.maker === undefined ? 'all makers' : 'other makers'),
  };
  const ascii = options.ascii === true;
  if (json)
    context.write(equivalentJson(page, { version: context.version, catalogue: catalogue.hash }, ascii));
  else
    context.write(options.csv ? equivalentCsv(page, ascii) : equivalentText(page, { ascii: context.ascii }));
  return 0;
};
