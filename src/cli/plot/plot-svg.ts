/** A plot as a picture for a notebook: its charts below each other, then what was asked, what stands there, where it comes from. */
import { svgPage } from '../../plot/svg-page.ts';
import type { DocumentHead } from '../render/json-document.ts';
import type { PlotPage } from './plot-page.ts';

export function plotSvg(page: PlotPage, head: DocumentHead): string {
  const { headline, charts, here, notes, cautions, sources } = page;
  const serious = cautions.filter(({ level }) => level !== 'note');
  return svgPage(charts, {
    caption: [
      here === undefined ? `${headline}.` : `${headline}: ${here}.`,
      ...notes.map((note) => `${note}.`),
      ...serious.map(({ text }) => `Caution: ${text}.`),
      ...sources,
      `halfspace ${head.version}, catalogue ${head.catalogue ?? ''}`,
    ],
  });
}
