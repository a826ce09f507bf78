/** Puts the picture on the terminal: state, keys, effects, settings, tied to Ink. */
import { render } from 'ink';
import { isRefusal } from '../medium/refusal.ts';
import type { LogRecord } from '../record/record.ts';
import type { CellWriter, ScreenSize } from '../term/cell-writer.ts';
import { copyText } from '../term/clipboard.ts';
import type { TerminalGuard } from '../term/guard.ts';
import type { KeyStream } from '../term/key-stream.ts';
import { App } from './components/app.tsx';
import { firstState } from './first-state.ts';
import { bindKeys } from './keys/bindings.ts';
import { keptText, Logbook } from './logbook.ts';
import type { Start } from './main.tsx';
import { realWorld } from './real-world.ts';
import { KeptSettings } from './settings/kept-settings.ts';
import { SettingsFile } from './settings/settings-file.ts';
import type { Effect } from './state.ts';
import { Store } from './store.ts';

export interface Terminal {
  readonly guard: TerminalGuard;
  readonly writer: CellWriter;
  readonly keys: KeyStream;
  readonly size: () => ScreenSize;
}

/** After the first frame there is time for what the first keys may need. */
const AFTER_FIRST_FRAME_ms = 50;

export async function showPicture(start: Start, terminal: Terminal): Promise<number> {
  const { guard, writer, keys, size } = terminal;
  const catalogue = start.host.catalogue();
  const { bindings, problems } = bindKeys(start.settings.keys);
  const logbook = new Logbook(start);
  const world = realWorld(
    catalogue,
    bindings,
    start.host.readLayers,
    (question, answer) => logbook.record(question, answer),
    () => store.dispatch({ kind: 'ready' }),
  );
  const first = firstState(start, size(), world, problems);
  const kept = new KeptSettings(
    new SettingsFile(start.settingsFolder, start.canWriteSettings),
    first,
    (text) => store.dispatch({ kind: 'message', message: { tone: 'refused', text } }),
  );
  const store: Store = new Store(first, world, (effect) => run(effect));

  const run = (effect: Effect): void => {
    switch (effect.kind) {
      case 'copy':
        void copy(effect.text);
        return;
      case 'keep':
        keep(effect.record);
        return;
      case 'suspend':
        guard.suspend();
        return;
      case 'redraw':
        writer.repaint();
        return;
      case 'quit':
        void quit(effect.status);
    }
  };
  const copy = async (text: string): Promise<void> => {
    const write = (sequence: string): void => void process.stdout.write(sequence);
    const { message } = await copyText(text, { env: start.host.env, write });
    const shown = text.includes('\n') ? '' : `${text}.  `;
    store.dispatch({ kind: 'message', message: { tone: 'said', text: `${shown}${message}` } });
  };
  const keep = (record: LogRecord): void => {
    const outcome = logbook.keep(record);
    const text = keptText(record, outcome);
    if (isRefusal(outcome)) store.dispatch({ kind: 'unkept', record, text });
    else store.dispatch({ kind: 'message', message: { tone: 'said', text } });
  };
  const quit = async (status: number): Promise<void> => {
    world.stop();
    if (status === 0) await kept.save();
    guard.exit(status);
  };

  keys.onKey((key) => store.dispatch({ kind: 'key', key }));
  keys.onPaste((text) => store.dispatch({ kind: 'paste', text }));
  // Before Ink hears of it: it then lays out a state that knows the new size.
  writer.stream.on('resize', () => store.dispatch({ kind: 'resize', size: size() }));
  const app = render(<App store={store} world={world} />, {
    stdout: writer.stream,
    stdin: keys.silentStdin,
    debug: true,
    patchConsole: false,
    exitOnCtrlC: false,
  });
  guard.onUnmount(() => {
    keys.stop();
    writer.finish();
    app.unmount();
  });
  guard.onSuspend(
    () => writer.pause(),
    () => writer.repaint(),
  );
  guard.onExit(() => kept.saveIfOpen());
  store.subscribe(() => kept.follow(store.state()));
  store.subscribe(() => {
    const { search, question } = store.state();
    if (search) world.prepareFind(question);
  });
  setTimeout(
    () => void world.loadSearch().then(() => store.dispatch({ kind: 'ready' })),
    AFTER_FIRST_FRAME_ms,
  );
  // The guard ends the process.
  return new Promise<number>(() => {});
}
