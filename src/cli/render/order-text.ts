/** The order check on one page, as text or as Markdown to be pasted into a request. */
import { type OrderRow, orderPage } from '../../present/order-page.ts';
import { wrap } from '../../present/wrap.ts';
import type { OrderReport } from '../../selection/order/order-report.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { PAGE_WIDTH, page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

export function orderText(report: OrderReport, style: NumberStyle): string {
  const { askSupplier, beamCautions } = report;
  const { headline, circumstances, summary, sections, sources } = orderPage(report, style);
  return page(
    [
      ...paragraph(headline),
      ...paragraph(circumstances),
      '',
      ...paragraph(summary),
      ...sections.flatMap(({ title, rows }) => ['', title, ...rows.flatMap(rowLines)]),
      ...(askSupplier.length > 0 ? ['', 'Ask the supplier'] : []),
      ...askSupplier.flatMap((line) => wrap(`- ${line}`, PAGE_WIDTH, '  ')),
      ...cautionSection(beamCautions),
      '',
      'Sources',
      ...sources.flatMap((text, i) => wrap(`[${i + 1}] ${text}`, PAGE_WIDTH, '    ')),
    ],
    style.ascii,
  );
}

const LEVEL_COLUMN = 6;
const TEXT_COLUMN = 20;

function rowLines({ level, topic, text, source }: OrderRow): readonly string[] {
  const [first = '', ...rest] = wrap(`${text} [${source}]`, PAGE_WIDTH - TEXT_COLUMN);
  const head = level.padEnd(LEVEL_COLUMN) + topic;
  return [head.padEnd(TEXT_COLUMN) + first, ...rest.map((line) => ' '.repeat(TEXT_COLUMN) + line)];
}

export function orderMarkdown(report: OrderReport, style: NumberStyle): string {
  const { askSupplier, beamCautions } = report;
  const { headline, circumstances, summary, sections, sources } = orderPage(report, style);
  const row = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
  const lines = [
    `## ${headline}`,
    '',
    circumstances,
    '',
    summary,
    ...sections.flatMap(({ title, rows }) => [
      '',
      `### ${title}`,
      '',
      row(['', '', 'reason', 'source']),
      row(['---', '---', '---', '---']),
      ...rows.map(({ level, topic, text, source }) =>
        row([level === 'fine' ? level : `**${level}**`, topic, text, String(source)]),
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
    ...sources.map((text, i) => `${i + 1}. ${text}`),
  ];
  return `${(style.ascii ? lines.map(toAscii) : lines).join('\n')}\n`;
}
