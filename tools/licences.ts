/**
 * The licences of what the build puts into the program: each must be one that allows it, and its text goes into
 * dist/THIRD-PARTY.txt, as those licences ask. Packages that are only used for development are not in the program and not here.
 */
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
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
  /** Text of its licence files; empty where it brings none. */
  readonly text: string;
}

const PACKAGE = /^(.*node_modules\/(?:@[^/]+\/)?[^/]+)\//;

/** The packages whose files are among the inputs of a build, in the order of their names. */
export function bundledPackages(root: string, inputs: readonly string[]): readonly BundledPackage[] {
  const folders = new Set(inputs.flatMap((input) => PACKAGE.exec(input)?.[1] ?? []));
  return [...folders]
    .map((folder) => readPackage(path.join(root, folder)))
    .sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : a.version < b.version ? -1 : 1));
}

function readPackage(folder: string): BundledPackage {
  const about = JSON.parse(readFileSync(path.join(folder, 'package.json'), 'utf8')) as {
    name: string;
    version: string;
    license?: string;
  };
  const texts = existsSync(folder)
    ? readdirSync(folder).filter((file) => /^(licen[cs]e|copying|notice)/i.test(file))
    : [];
  return {
    name: about.name,
    version: about.version,
    licence: about.license ?? 'none stated',
    text: texts.map((file) => readFileSync(path.join(folder, file), 'utf8').trim()).join('\n\n'),
  };
}

/** Packages that may not be in the program, each with the reason. */
export function refusedPackages(packages: readonly BundledPackage[]): readonly string[] {
  return packages
    .filter(({ licence }) => !isAllowed(licence))
    .map(({ name, version, licence }) => `${name} ${version}: the licence ${licence} is not on the list`);
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
    ({ name, version, licence, text }) =>
      `${rule}\n${name} ${version}\nLicence: ${licence}\n\n${text === '' ? '(the package brings no text of its licence)' : text}\n`,
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
