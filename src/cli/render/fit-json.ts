/** A fit to measured points for programs, with the entry that it makes. */
import type { PointFit } from '../../catalog/fit-points.ts';
import type { FitFacts } from './fit-text.ts';
import { fitWarningText } from './fit-warning.ts';
import { jsonDocument } from './json-document.ts';

export function fitJson(
  fit: PointFit,
  facts: FitFacts,
  entry: Readonly<Record<string, unknown>> | null,
  version: string,
  ascii: boolean,
): string {
  const body = {
    parameters: fit.parameters,
    reference: facts.reference,
    referenceStated: facts.referenceStated,
    temperature_C: facts.temperature_C ?? null,
    range_um: fit.range_um,
    coefficients: fit.coefficients.map(({ name, value, uncertainty }) => ({
      name,
      value,
      uncertainty: uncertainty ?? null,
    })),
    covariance: fit.covariance ?? null,
    freedom: fit.freedom,
    rms_n: fit.rms_n,
    largest_n: fit.largest_n,
    deviation_n: fit.deviation_n ?? null,
    reducedChiSquared: fit.reducedChiSquared ?? null,
    warnings: fit.warnings.map((w) => ({ code: w.code, text: fitWarningText(w, { ascii: true }) })),
    points: fit.points.map((p) => ({
      wavelength_um: p.wavelength_um,
      n: p.n,
      uncertainty_n: p.uncertainty_n ?? null,
      fitted_n: p.fitted_n,
      residual_n: p.residual_n,
    })),
    entry,
  };
  return jsonDocument({ version }, body, ascii);
}
