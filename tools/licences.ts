/**
 * The licences of what the build puts into the program: each must be one that allows it, and its text goes into
 * dist/THIRD-PARTY.txt, as those licences ask. Packages that are only used for development are not in the program and not here.
 */
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** Permissive licences whose only condition is that notice and text come along. */
export const ALLOWED: readonly string[] = [
  '0BSD',
  'Apache-2.0',
  'BSD-2-Clause',
  'BSD-3-Clause',
  'BlueOak-1.0.0',
  'CC0-1.0',
  'ISC',
  'MIT',
];

export const NOTICE_FILE = 'THIRD-PARTY.txt';

export interface BundledPackage {
  readonly name: string;
  readonly version: string;
  readonly licence: string;
  /** Text of its licence files; where it brings none, the copyright its sources state, over the text of the MIT licence. */
  readonly text: string;
}

const PACKAGE = /^(.*node_modules\/(?:@[^/]+\/)?[^/]+)\//;

/** The packages whose files are among the inputs of a build, in the order of their names. */
export function bundledPackages(root: string, inputs: readonly string[]): readonly BundledPackage[] {
  const folders = new Map<string, string[]>();
  for (const input of inputs) {
    const folder = PACKAGE.exec(input)?.[1];
    if (folder !== undefined) folders.set(folder, [...(folders.get(folder) ?? []), input]);
  }
  return [...folders]
    .map(([folder, files]) => readPackage(root, folder, files))
    .sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : a.version < b.version ? -1 : 1));
}

function readPackage(root: string, folder: string, files: readonly string[]): BundledPackage {
  const place = path.join(root, folder);
  const about = JSON.parse(readFileSync(path.join(place, 'package.json'), 'utf8')) as {
    name: string;
    version: string;
    license?: string;
  };
  const licence = about.license ?? 'none stated';
  const texts = readdirSync(place)
    .filter((file) => /^(licen[cs]e|copying|notice)/i.test(file))
    .map((file) => readFileSync(path.join(place, file), 'utf8').trim());
  const text = texts.length > 0 ? texts.join('\n\n') : textFromSources(root, licence, files);
  return { name: about.name, version: about.version, licence, text };
}

/** The words of the MIT licence stand in the licence of this project; only the copyright line above them differs. */
function textFromSources(root: string, licence: string, files: readonly string[]): string {
  const stated = new Set(
    files.flatMap((file) =>
      (readFileSync(path.join(root, file), 'utf8').match(/^[ *]*copyright \(c\) .*$/gim) ?? []).map((line) =>
        line.replace(/^[ *]*/, '').trim(),
      ),
    ),
  );
  if (licence !== 'MIT' || stated.size === 0) return '';
  const own = readFileSync(path.join(root, 'LICENSE'), 'utf8').trim();
  const terms = own.slice(own.indexOf('Permission is hereby granted'));
  return `(The package brings no licence file; its sources state the copyright, its description the licence.)\n\n${[...stated].join('\n')}\n\n${terms}`;
}

/** Packages that may not be in the program, each with the reason. */
export function refusedPackages(packages: readonly BundledPackage[]): readonly string[] {
  return packages.flatMap(({ name, version, licence, text }) => {
    if (!isAllowed(licence)) return [`${name} ${version}: the licence ${licence} is not on the list`];
    return text === '' ? [`${name} ${version}: brings neither the text of its licence nor a copyright`] : [];
  });
}

/** An expression such as `(MIT OR GPL-3.0)` is allowed by one of its choices. */
const isAllowed = (licence: string): boolean =>
  licence
    .replace(/[()]/g, '')
    .split(' OR ')
    .some((choice) => choice.split(' AND ').every((name) => ALLOWED.includes(name.trim())));

export function noticeText(packages: readonly BundledPackage[]): string {
  const rule = '-'.repeat(72);
  const head =
    'This program contains the following packages, each under the licence that stands below its name.\n';
  const blocks = packages.map(
    ({ name, version, licence, text }) => `${rule}\n${name} ${version}\nLicence: ${licence}\n\n${text}\n`,
  );
  return [head, ...blocks].join('\n');
}

/** Writes the notices into the build. Throws, naming the packages, if one may not be there. */
export function writeNotices(root: string, dist: string, inputs: readonly string[]): void {
  const packages = bundledPackages(root, inputs);
  const refused = refusedPackages(packages);
  if (refused.length > 0) throw new Error(`the program must not contain:\n${refused.join('\n')}`);
  writeFileSync(path.join(dist, NOTICE_FILE), noticeText(packages));
}
