/**
 * Keeps the last question, the media used and the drawing in the settings file: a while after they changed, and at the end.
 * While keys come, nothing is written.
 */
import { setTimeout as sleep } from 'node:timers/promises';
import type { State } from '../state.ts';
import { plainQuestion } from './plain-question.ts';
import type { SettingsFile } from './settings-file.ts';

const QUIET_ms = 1500;
/** So soon after the first change the file is made ready, so that it can be written at an ending that leaves no time. */
const OPEN_ms = 100;

export class KeptSettings {
  readonly #file: SettingsFile;
  readonly #onProblem: (text: string) => void;
  #kept: State;
  #state: State;
  #timer: NodeJS.Timeout | undefined;
  #opening: Promise<void> | undefined;

  constructor(file: SettingsFile, first: State, onProblem: (text: string) => void) {
    this.#file = file;
    this.#kept = first;
    this.#state = first;
    this.#onProblem = onProblem;
  }

  /** Notes a state; it is written once no other follows. */
  follow(state: State): void {
    this.#state = state;
    if (!this.#hasChanged) return;
    clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.save(), QUIET_ms);
    this.#timer.unref();
    this.#opening ??= sleep(OPEN_ms, undefined, { ref: false }).then(() => this.#open());
  }

  /** Writes what has changed. */
  async save(): Promise<void> {
    clearTimeout(this.#timer);
    if (!this.#hasChanged) return;
    await this.#open();
    const problem = this.#write();
    if (problem !== undefined) this.#onProblem(problem);
  }

  /** As `save`, where that needs no waiting: for endings that leave no time. */
  saveIfOpen(): void {
    if (this.#file.isOpen && this.#hasChanged) this.#write();
  }

  async #open(): Promise<void> {
    const problem = await this.#file.open();
    if (problem !== undefined) this.#onProblem(problem);
  }

  get #hasChanged(): boolean {
    const { answered, recent, preferences } = this.#state;
    return (
      answered !== this.#kept.answered ||
      recent !== this.#kept.recent ||
      preferences.glyphs !== this.#kept.preferences.glyphs
    );
  }

  #write(): string | undefined {
    const state = this.#state;
    const glyphs =
      state.preferences.glyphs === this.#kept.preferences.glyphs ? {} : { glyphs: state.preferences.glyphs };
    this.#kept = state;
    return this.#file.write({ last: plainQuestion(state.answered), recent: state.recent, ...glyphs });
  }
}
