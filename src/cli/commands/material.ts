/** `halfspace material NAME`: everything the catalogue holds of one substance. */
import { referenceLines } from '../../answer/reference-lines.ts';
import { isRefusal, refuse } from '../../medium/refusal.ts';
import { quoteInput } from '../../units/quote-input.ts';
import type { Command } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { materialJson } from '../render/material-json.ts';
import { materialMarkdown } from '../render/material-markdown.ts';
import type { MaterialSheet } from '../render/material-sheet.ts';
import { materialText } from '../render/material-text.ts';
import { reportRefusal } from '../report-refusal.ts';

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const json = options.json === true;
  // A name of several words is written without quotation marks more often than with.
  const name = operands.join(' ');
  const medium = findMedium(name, catalogue);
  if (isRefusal(medium)) return reportRefusal(await suggestMedia(medium, name, catalogue), context);
  if (medium.kind === 'literal') {
    const message = `${quoteInput(name)} is a medium given by its numbers: the catalogue holds nothing of it`;
    return reportRefusal(refuse('not-in-catalogue', 2, message, 'name a material'), context);
  }
  const { material, axis } = medium;
  const sourceOf = (id: string) => catalogue.source(id);
  const sheet: MaterialSheet = {
    material,
    axis,
    lines: referenceLines(material, sourceOf, axis),
    sourceOf,
    full: options.full === true,
  };
  const style = { ascii: context.ascii };
  if (json) {
    const head = { version: context.version, catalogue: catalogue.hash };
    context.write(materialJson(sheet, head, options.ascii === true));
  } else context.write(options.markdown ? materialMarkdown(sheet, style) : materialText(sheet, style));
  return 0;
};
