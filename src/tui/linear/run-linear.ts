/**
 * The linear layout on a terminal: lines in, lines out, in the terminal's own line editing. Nothing is drawn over, no cursor is
 * placed and no mode is switched, so a screen reader reads everything once and in order.
 */
import { createInterface } from 'node:readline';
import type { Question } from '../../answer/question.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import type { Confirmed } from '../../record/logbook-file.ts';
import type { LogRecord } from '../../record/record.ts';
import { recordText } from '../../record/record-text.ts';
import { designCoatings } from '../coating-designs.ts';
import { firstState } from '../first-state.ts';
import { bindKeys } from '../keys/bindings.ts';
import { keptText, Logbook } from '../logbook.ts';
import type { Start } from '../main.tsx';
import { realWorld } from '../real-world.ts';
import { KeptSettings } from '../settings/kept-settings.ts';
import { SettingsFile } from '../settings/settings-file.ts';
import { beginSession, promptOf, type Reply, reply } from './session.ts';

const INTERRUPTED = 130;
/** A size no line depends on. */
const SIZE = { columns: 80, rows: 24 } as const;

export async function runLinear(start: Start): Promise<number> {
  const logbook = new Logbook(start);
  const catalogue = start.host.catalogue();
  const real = realWorld(
    catalogue,
    bindKeys(start.settings.keys).bindings,
    start.host.readLayers,
    (question, answer) => logbook.record(question, answer),
    () => {},
  );
  // Nothing is drawn meanwhile: a word waits for its coatings.
  const world = { ...real, coatings: (question: Question) => designCoatings(question, catalogue) };
  await real.loadSearch();
  const first = firstState(start, SIZE, world, []);
  const write = (text: string): void => void process.stdout.write(text);
  const kept = new KeptSettings(
    new SettingsFile(start.settingsFolder, start.canWriteSettings),
    first,
    (text) => write(`${text}\n`),
  );
  const lines = createInterface({
    input: process.stdin,
    terminal: false,
    crlfDelay: Number.POSITIVE_INFINITY,
  });
  return new Promise<number>((resolve) => {
    const end = (status: number): void => {
      lines.close();
      process.off('SIGINT', onInterrupt);
      world.stop();
      void kept.save().then(() => resolve(status));
    };
    const onInterrupt = (): void => {
      write('\n');
      end(INTERRUPTED);
    };
    const tell = ({ session, lines: said, keep, isOver }: Reply): void => {
      write(said.map((line) => `${line}\n`).join(''));
      if (keep) write(keptLines(keep, logbook.keep(keep)));
      current = session;
      kept.follow(session.state);
      if (isOver) end(0);
      else write(promptOf(session));
    };
    const begin = beginSession(first);
    let current = begin.session;
    process.on('SIGINT', onInterrupt);
    lines.on('line', (typed) => tell(reply(current, typed, world)));
    lines.on('close', () => end(0));
    tell(begin);
  });
}

/** A record that could not be kept is read out, so that nothing is lost. */
function keptLines(record: LogRecord, outcome: Confirmed | Refusal): string {
  const said = `${keptText(record, outcome)}\n`;
  return isRefusal(outcome) ? recordText(record) + said : said;
}
