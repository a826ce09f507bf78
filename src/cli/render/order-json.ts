/** The order check for programs: every finding with level, numbers in words and source; the answers it rests on are not repeated. */

import type { Question } from '../../answer/question.ts';
import type { Finding } from '../../selection/order/finding.ts';
import type { OrderReport } from '../../selection/order/order-report.ts';
import { mediumName } from '../../selection/order/path-words.ts';
import { type DocumentHead, jsonDocument } from './json-document.ts';

export function orderJson(report: OrderReport, head: DocumentHead, ascii: boolean): string {
  const { question, waves, general, counts, askSupplier, beamCautions } = report;
  return jsonDocument(
    head,
    {
      part: partData(question),
      counts,
      waves: waves.map(({ spec, answer, findings }) => ({
        wavelength_m: spec.wavelength_m,
        givenInAir: spec.inAir,
        covered: answer !== null,
        R: answer?.interface.R ?? null,
        T: answer?.stack?.T ?? answer?.interface.T ?? null,
        A: answer?.stack?.A ?? null,
        findings: findings.map(findingData),
      })),
      general: general.map(findingData),
      askSupplier,
      cautions: beamCautions.map(({ code, level, text }) => ({ code, level, text })),
    },
    ascii,
  );
}

function partData({ from, layers, into, incidenceAngle_rad, polarization }: Question) {
  return {
    from: mediumName(from),
    layers: layers.map(({ medium, thickness }) => ({
      medium: mediumName(medium),
      thickness_m: thickness.kind === 'length' ? thickness.thickness_m : null,
      thickness_waves: thickness.kind === 'waves' ? thickness.waves : null,
    })),
    into: mediumName(into),
    incidenceAngle_rad,
    polarization,
  };
}

const findingData = ({ topic, level, about, text, source }: Finding) => ({
  level,
  topic,
  about,
  text,
  source,
});
