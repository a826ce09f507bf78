/** An order check in the words of every face: its headlines, its remarks in sections with graver ones first, numbered sources. */
import { waveWords } from '../selection/condition-words.ts';
import { type Finding, LEVELS, type Level, type Topic } from '../selection/order/finding.ts';
import type { OrderReport } from '../selection/order/order-report.ts';
import { geometryWords, pathWords } from '../selection/order/path-words.ts';
import type { NumberStyle } from '../units/number-style.ts';

export interface OrderRow {
  readonly level: Level;
  readonly topic: Topic;
  /** The reason, with the material's name where the page is about several. */
  readonly text: string;
  /** Number of its source, from 1. */
  readonly source: number;
}

export interface OrderSection {
  readonly title: string;
  readonly rows: readonly OrderRow[];
}

export interface OrderPage {
  /** "Order check: Air, Zinc selenide (CVD) 3 mm, Air" */
  readonly headline: string;
  readonly circumstances: string;
  /** Counts of each level and what the levels mean. */
  readonly summary: string;
  readonly sections: readonly OrderSection[];
  /** In the order in which they are first named. */
  readonly sources: readonly string[];
}

const LEGEND =
  'stop: settle it before ordering; look: decide, specify or ask; fine: nothing in the data at hand speaks against it, which calls nothing safe.';

export function orderPage(report: OrderReport, style: NumberStyle): OrderPage {
  const { question, waves, general } = report;
  const sources: string[] = [];
  const numberOf = ({ source }: Finding): number => {
    if (!sources.includes(source.text)) sources.push(source.text);
    return sources.indexOf(source.text) + 1;
  };
  const section = (title: string, findings: readonly Finding[]): OrderSection => ({
    title,
    rows: LEVELS.flatMap((level) => findings.filter((f) => f.level === level)).map((finding) => ({
      level: finding.level,
      topic: finding.topic,
      text: `${subjectOf(finding, report)}${finding.text}`,
      source: numberOf(finding),
    })),
  });
  const sections = [
    ...waves.map(({ spec, findings }) => section(`At ${waveWords(spec, style)}`, findings)),
    section('At any wave', general),
  ];
  const wavesText = waves.map(({ spec }) => waveWords(spec, style)).join('; ');
  return {
    headline: `Order check: ${pathWords(question)}`,
    circumstances: `${wavesText}, ${geometryWords(question)}`,
    summary: `${countWords(report)}. ${LEGEND}`,
    sections,
    sources,
  };
}

const countWords = ({ counts }: OrderReport): string =>
  LEVELS.map((level) => `${counts[level]} ${level}`).join(', ');

function subjectOf({ about }: Finding, { waves, general }: OrderReport): string {
  const names = new Set([...waves.flatMap((w) => w.findings), ...general].map((f) => f.about));
  names.delete('part');
  return about === 'part' || names.size < 2 ? '' : `${about}: `;
}
