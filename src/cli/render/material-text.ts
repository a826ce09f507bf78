/** All that the catalogue holds of one material, for people, in 72 columns; coefficients and absorption rows on request. */

import { axesOf } from '../../catalog/choose-fit.ts';
import { reflectanceTables } from '../../catalog/cited-sources.ts';
import type { Axis, Fit, Material } from '../../catalog/types.ts';
import { absorptionCoverage, absorptionTexts } from '../../present/absorption-rows.ts';
import { fitRows, fitTitle } from '../../present/fit-rows.ts';
import { bandGapText, handlingRows } from '../../present/handling-rows.ts';
import { lengthRange } from '../../present/length-text.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { coefficientLines } from './coefficients.ts';
import { indexTable } from './index-lines.ts';
import { fitsOf, type MaterialSheet } from './material-sheet.ts';
import { labelled, page, paragraph } from './page.ts';
import { reflectanceLines } from './reflectance-lines.ts';

export function materialText(sheet: MaterialSheet, style: NumberStyle): string {
  const sections = [
    identity(sheet.material),
    indexTable(sheet.lines, style),
    ...fitsOf(sheet).map((fit) => fitSection(fit, sheet, style)),
    transmission(sheet, style),
    handling(sheet.material, style),
    ...reflectanceTables(sheet.material).map((table) =>
      reflectanceLines(table, sheet.sourceOf(table.source), style),
    ),
    note(sheet.material),
  ];
  const shown = sections.filter((lines) => lines.length > 0);
  return page(
    shown.flatMap((lines, i) => (i === 0 ? lines : ['', ...lines])),
    style.ascii,
  );
}

function identity(material: Material): readonly string[] {
  const axes = axesOf(material);
  const crystal = axes.some((axis) => axis !== 'isotropic');
  return [
    ...paragraph(material.name),
    ...labelled('key', material.key),
    ...labelled('formula', material.formula),
    ...labelled('also called', material.aliases.join(', ')),
    ...labelled('class', material.class),
    ...labelled('maker', material.maker),
    ...labelled('glass code', material.glassCode),
    ...labelled(
      'axes',
      crystal ? axes.map((axis) => `${axis} (${material.key}:${short(axis)})`).join(', ') : undefined,
    ),
    ...(material.own ? labelled('entry', 'your own') : []),
  ];
}

/** As it is typed: `sapphire:o`. */
const short = (axis: Axis): string => (axis.length === 1 ? axis : (axis[0] ?? ''));

function fitSection(fit: Fit, sheet: MaterialSheet, style: NumberStyle): readonly string[] {
  return [
    ...paragraph(`Fit ${fitTitle(fit)}`),
    ...fitRows(fit, sheet.material, sheet.sourceOf, style).flatMap(({ label, text }) =>
      labelled(label, text),
    ),
    ...(sheet.full ? coefficientLines(fit.parameters) : []),
  ];
}

function transmission({ material, full }: MaterialSheet, style: NumberStyle): readonly string[] {
  const range = material.transparency_um && lengthRange(material.transparency_um, style);
  const basis = material.transparencyBasis ?? 'to about 10 % over a few mm';
  const rows = [
    ...labelled('transparent', range === undefined ? undefined : `${range} (${basis})`),
    ...labelled('absorption', absorptionCoverage(material, style)),
    ...labelled('band gap', bandGapText(material, style)),
  ];
  const sources = [...new Set((material.absorption ?? []).map((row) => row.source))];
  return rows.length === 0
    ? []
    : [
        'Transmission',
        ...rows,
        ...labelled('source', sources.join('; ')),
        ...(full
          ? absorptionTexts(material, style).flatMap(({ wavelength, value, source, note: remark }) =>
              labelled(
                wavelength,
                [
                  value,
                  ...(sources.length > 1 ? [source] : []),
                  ...(remark === undefined ? [] : [remark]),
                ].join('; '),
              ),
            )
          : []),
      ];
}

function handling(material: Material, style: NumberStyle): readonly string[] {
  const rows = handlingRows(material, style).flatMap(({ label, text }) => labelled(label, text, 22));
  return rows.length === 0 ? [] : ['Handling', ...rows, ...labelled('source', material.factsSource, 22)];
}

const note = (material: Material): readonly string[] =>
  material.note === undefined ? [] : ['Note', ...paragraph(material.note, 2, 0)];
