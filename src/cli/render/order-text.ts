/** The order check on one page, as text or as Markdown to be pasted into a request. */
import { wrap } from '../../present/wrap.ts';
import { waveWords } from '../../selection/condition-words.ts';
import { type Finding, LEVELS } from '../../selection/order/finding.ts';
import type { OrderReport } from '../../selection/order/order-report.ts';
import { geometryWords, pathWords } from '../../selection/order/path-words.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { PAGE_WIDTH, page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

const LEGEND =
  'stop: settle it before ordering; look: decide, specify or ask; fine: nothing in the data at hand speaks against it, which calls nothing safe.';

export function orderText(report: OrderReport, style: NumberStyle): string {
  const { question, askSupplier, beamCautions } = report;
  const sources = new SourceList();
  const sections = sectionsOf(report, style).flatMap(({ title, findings }) => [
    '',
    title,
    ...findings.flatMap((finding) => findingLines(finding, report, sources)),
  ]);
  return page(
    [
      ...paragraph(`Order check: ${pathWords(question)}`),
      ...paragraph(`${wavesWords(report, style)}, ${geometryWords(question)}`),
      '',
      ...paragraph(`${countWords(report)}. ${LEGEND}`),
      ...sections,
      ...(askSupplier.length > 0 ? ['', 'Ask the supplier'] : []),
      ...askSupplier.flatMap((line) => wrap(`- ${line}`, PAGE_WIDTH, '  ')),
      ...cautionSection(beamCautions),
      '',
      'Sources',
      ...sources.texts.flatMap((text, i) => wrap(`[${i + 1}] ${text}`, PAGE_WIDTH, '    ')),
    ],
    style.ascii,
  );
}

/** Numbered in the order in which they are first named. */
class SourceList {
  readonly texts: string[] = [];
  numberOf({ source }: Finding): number {
    const known = this.texts.indexOf(source.text);
    if (known >= 0) return known + 1;
    this.texts.push(source.text);
    return this.texts.length;
  }
}

const wavesWords = ({ waves }: OrderReport, style: NumberStyle): string =>
  waves.map(({ spec }) => waveWords(spec, style)).join('; ');

const countWords = ({ counts }: OrderReport): string =>
  LEVELS.map((level) => `${counts[level]} ${level}`).join(', ');

interface Section {
  readonly title: string;
  readonly findings: readonly Finding[];
}

/** Graver remarks first. */
function sectionsOf({ waves, general }: OrderReport, style: NumberStyle): readonly Section[] {
  const sorted = (findings: readonly Finding[]): readonly Finding[] =>
    LEVELS.flatMap((level) => findings.filter((f) => f.level === level));
  return [
    ...waves.map(({ spec, findings }) => ({
      title: `At ${waveWords(spec, style)}`,
      findings: sorted(findings),
    })),
    { title: 'At any wave', findings: sorted(general) },
  ];
}

/** The material's name where the page is about several. */
function subjectOf({ about }: Finding, { waves, general }: OrderReport): string {
  const names = new Set([...waves.flatMap((w) => w.findings), ...general].map((f) => f.about));
  names.delete('part');
  return about === 'part' || names.size < 2 ? '' : `${about}: `;
}

const LEVEL_COLUMN = 6;
const TEXT_COLUMN = 20;

function findingLines(finding: Finding, report: OrderReport, sources: SourceList): readonly string[] {
  const { level, topic, text } = finding;
  const body = `${subjectOf(finding, report)}${text} [${sources.numberOf(finding)}]`;
  const [first = '', ...rest] = wrap(body, PAGE_WIDTH - TEXT_COLUMN);
  const head = level.padEnd(LEVEL_COLUMN) + topic;
  return [head.padEnd(TEXT_COLUMN) + first, ...rest.map((line) => ' '.repeat(TEXT_COLUMN) + line)];
}

export function orderMarkdown(report: OrderReport, style: NumberStyle): string {
  const { question, askSupplier, beamCautions } = report;
  const sources = new SourceList();
  const row = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
  const lines = [
    `## Order check: ${pathWords(question)}`,
    '',
    `${wavesWords(report, style)}, ${geometryWords(question)}`,
    '',
    `${countWords(report)}. ${LEGEND}`,
    ...sectionsOf(report, style).flatMap(({ title, findings }) => [
      '',
      `### ${title}`,
      '',
      row(['', '', 'reason', 'source']),
      row(['---', '---', '---', '---']),
      ...findings.map((f) =>
        row([
          f.level === 'fine' ? f.level : `**${f.level}**`,
          f.topic,
          `${subjectOf(f, report)}${f.text}`,
          String(sources.numberOf(f)),
        ]),
      ),
    ]),
    ...(askSupplier.length > 0 ? ['', '### To the supplier', ''] : []),
    ...askSupplier.map((line) => `- ${line}`),
    ...(beamCautions.length > 0
      ? ['', '### Cautions', '', ...beamCautions.map((c) => `- **${c.level}** ${c.text}`)]
      : []),
    '',
    '### Sources',
    '',
    ...sources.texts.map((text, i) => `${i + 1}. ${text}`),
  ];
  return `${(style.ascii ? lines.map(toAscii) : lines).join('\n')}\n`;
}
