/** The points of a plot for programs: columns in SI units at full precision, null (in CSV nothing) where there is no value. */
import type { Answer } from '../../answer/answer.ts';
import { questionLine } from '../../present/question-line.ts';
import { ASCII } from '../../units/number-style.ts';
import { csvTable } from '../render/csv-table.ts';
import { type DocumentHead, jsonDocument } from '../render/json-document.ts';
import type { Curve, Plot } from './plot-curves.ts';

type Column = readonly [name: string, values: readonly number[]];

export function plotJson(answer: Answer, plot: Plot, head: DocumentHead, ascii: boolean): string {
  const { wave, geometry, interface: surface } = answer;
  const body = {
    plot: plot.kind,
    question: questionLine(answer, ASCII),
    wave,
    geometry,
    marks: {
      brewsterAngle_rad: surface.brewsterAngle_rad,
      pseudoBrewsterAngle_rad: surface.pseudoBrewsterAngle_rad,
      criticalAngle_rad: surface.criticalAngle_rad,
    },
    curves: plot.curves.map((curve) => ({
      kind: curve.kind,
      ...besides(curve),
      columns: Object.fromEntries(columnsOf(curve)),
    })),
    notes: plot.notes,
    cautions: answer.cautions,
  };
  return jsonDocument(head, body, ascii);
}

/** What is no column. */
function besides(curve: Curve): object {
  switch (curve.kind) {
    case 'angle':
      return {};
    case 'wave':
      return { outsideData: curve.outside };
    case 'index':
      return { medium: curve.name };
    case 'field':
      return { faces: curve.faces };
  }
}

export function columnsOf(curve: Curve): readonly Column[] {
  switch (curve.kind) {
    case 'angle':
      return [
        ['incidenceAngle_rad', curve.angle_rad],
        ['Rs', curve.Rs],
        ['Rp', curve.Rp],
        ['Ts', curve.Ts],
        ['Tp', curve.Tp],
      ];
    case 'wave':
      return [
        ['vacuumWavelength_m', curve.wavelength_m],
        ['R', curve.R],
        ['T', curve.T],
      ];
    case 'index':
      return [
        ['vacuumWavelength_m', curve.wavelength_m],
        ['n', curve.n],
        ['k', curve.k],
        ['groupIndex', curve.groupIndex],
      ];
    case 'field':
      return [
        ['position_m', curve.position_m],
        ['layer', curve.layer],
        ...(curve.s ? [['intensityS', curve.s] as const] : []),
        ...(curve.p ? [['intensityP', curve.p] as const] : []),
      ];
  }
}

/**
 * One table: curves over the same points stand side by side, those of several media told apart by their number. A curve with
 * fewer points has empty cells between them.
 */
export function plotCsv(curves: readonly Curve[], ascii: boolean): string {
  const [first, ...others] = curves;
  if (!first) return '';
  const [points, ...powers] = columnsOf(first);
  const rowOf = new Map(points?.[1].map((x, row) => [x, row]));
  const count = points?.[1].length ?? 0;
  const besides = others.flatMap((curve, i) => {
    const [own, ...values] = columnsOf(curve);
    const name = (text: string): string => (others.length > 1 ? `${text}_${i + 1}` : text);
    return values.map(([text, column]): Column => {
      const cells = new Array<number>(count).fill(Number.NaN);
      own?.[1].forEach((x, j) => {
        cells[rowOf.get(x) ?? count] = column[j] ?? Number.NaN;
      });
      return [name(text), cells];
    });
  });
  const columns = [...(points ? [points] : []), ...powers, ...besides];
  const rows = Array.from({ length: count }, (_, i) => columns.map(([, values]) => values[i]));
  return csvTable(
    columns.map(([name]) => name),
    rows,
    ascii,
  );
}
