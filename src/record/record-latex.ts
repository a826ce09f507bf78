/**
 * A record as a LaTeX table that needs no package: the asked and the found in one tabular that floats, then cautions, sources,
 * conventions and the command in small print. To be put into a document with \input.
 */
import { latexText } from './latex-text.ts';
import type { LogRecord, RecordRow } from './record.ts';
import { byHeading, doiLink, harmless, harmlessWords, unlinked, versionsText } from './record-parts.ts';
import { shellCommandLines } from './shell-quote.ts';

const COMMAND_WIDTH = 68;

export function recordLatex(record: LogRecord): string {
  const text = (raw: string): string => latexText(harmless(raw));
  const notes = [
    ...record.cautions.map((caution) => `Caution: ${text(caution.text)}`),
    ...record.sources.map((source) => `Source: ${text(unlinked(source))}${doiText(source.doi)}`),
    ...record.conventions.map((convention) => text(convention)),
    `Made with ${text(versionsText(record))}.`,
  ];
  const command = shellCommandLines(harmlessWords(record.commandWords), COMMAND_WIDTH);
  const lines = [
    '\\begin{table}[ht]',
    `\\caption{${text(`${record.program.name} record ${record.id}, ${record.time}`)}}`,
    '\\begin{tabular}{p{0.34\\textwidth}lp{0.4\\textwidth}}',
    '\\hline',
    ...record.asked.flatMap((row) => longRow(text(row.label), text(row.text))),
    '\\hline',
    ...[...byHeading(record.rows)].flatMap(([about, rows]) => [
      ...(about === '' ? [] : [`\\multicolumn{3}{l}{\\textit{${text(about)}}} \\\\`]),
      ...rows.map((row) => foundRow(row, text)),
    ]),
    '\\hline',
    '\\end{tabular}',
    '\\end{table}',
    '{\\footnotesize',
    `\\noindent To record ${record.id}:`,
    ...notes.map((note) => `\\par\\noindent ${note}`),
    ...verbatim(command, text),
    '}',
  ];
  return `${lines.join('\n')}\n`;
}

/** What was asked spans two columns, with the lines broken by LaTeX. */
function longRow(label: string, value: string): readonly string[] {
  return [`${label} & \\multicolumn{2}{p{0.54\\textwidth}}{\\raggedright ${value}\\strut} \\\\`];
}

function foundRow(row: RecordRow, text: (raw: string) => string): string {
  return `${text(row.label)} & ${text(row.symbol)} & ${text(row.text)} \\\\`;
}

function doiText(doi: string | null): string {
  return doi === null ? '' : `, \\texttt{${latexText(doiLink(doi)).replaceAll(/[/:]/g, '$&\\allowbreak{}')}}`;
}

function verbatim(lines: readonly string[], text: (raw: string) => string): readonly string[] {
  return lines.some((line) => line.includes('\\end{verbatim}'))
    ? lines.map((line) => `\\par\\texttt{${text(line)}}`)
    : ['\\begin{verbatim}', ...lines, '\\end{verbatim}'];
}
