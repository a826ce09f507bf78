/**
 * `displayWidth` in the shape of the `string-width` module, to stand in for it in the bundle: the screen library asks
 * for the width of every text it lays out, and the comparisons of `displayWidth` are several times faster.
 * The default export is what importers of that module expect.
 * Special case: the options of the original are not supported; no importer in the bundle passes any.
 */
import { displayWidth } from './display-width.ts';

// biome-ignore lint/style/noDefaultExport: the module it stands in for has one
export default function stringWidth(text: string): number {
  return typeof text === 'string' ? displayWidth(text) : 0;
}
