/** `halfspace verify`: every published value that the catalogue holds, recomputed on the machine at hand. */
import type { IndexedCatalogue } from '../../catalog/entries.ts';
import { CatalogueFileError, readCheckValues } from '../../catalog/load.ts';
import type { Material } from '../../catalog/types.ts';
import { verifyMaterials, withCheckValues } from '../../catalog/verify.ts';
import { refuse } from '../../medium/refusal.ts';
import type { Command } from '../context.ts';
import { verifyCsv, verifyJson } from '../render/verify-data.ts';
import { type VerifyHead, verifyText } from '../render/verify-text.ts';
import { reportRefusal } from '../report-refusal.ts';

const DISAGREES = 1;

export const run: Command = ({ options }, context) => {
  const catalogue = context.catalogue();
  const started_ms = context.clock().now_ms;
  let checkLines: string;
  try {
    checkLines = readCheckValues();
  } catch (error) {
    if (!(error instanceof CatalogueFileError)) throw error;
    const { message, remedy } = error;
    return reportRefusal(refuse('no-check-values', 4, message, remedy), context);
  }
  const report = verifyMaterials(allMaterials(catalogue, checkLines));
  const head: VerifyHead = {
    catalogueVersion: catalogue.version,
    catalogueDate: catalogue.date,
    catalogueHash: catalogue.hash,
    seconds: (context.clock().now_ms - started_ms) / 1000,
  };
  const full = options.full === true;
  const document = { version: context.version, catalogue: catalogue.hash };
  if (options.json) context.write(verifyJson(report, head, full, document, options.ascii === true));
  else if (options.csv) context.write(verifyCsv(report, options.ascii === true));
  else context.write(verifyText(report, head, full, { ascii: context.ascii }));
  return report.failures.length === 0 ? 0 : DISAGREES;
};

/** The bundled materials with their check values, then the person's own, which carry theirs. */
function* allMaterials(catalogue: IndexedCatalogue, checkLines: string): Generator<Material> {
  yield* withCheckValues(catalogue, checkLines);
  for (const { key, own } of catalogue.entries()) {
    const material = own ? catalogue.material(key) : undefined;
    if (material) yield material;
  }
}
