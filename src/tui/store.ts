/** Holds the state, applies events to it and tells who listens; effects go to the one who runs them. */
import type { Effect, State } from './state.ts';
import { type Event, update } from './update/update.ts';
import type { World } from './world.ts';

export class Store {
  #state: State;
  readonly #world: World;
  readonly #run: (effect: Effect) => void;
  readonly #listeners = new Set<() => void>();

  constructor(state: State, world: World, run: (effect: Effect) => void) {
    this.#state = state;
    this.#world = world;
    this.#run = run;
  }

  readonly state = (): State => this.#state;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  dispatch(event: Event): void {
    const { state, effects } = update(this.#state, event, this.#world);
    const hasChanged = state !== this.#state;
    this.#state = state;
    if (hasChanged) for (const listener of this.#listeners) listener();
    for (const effect of effects) this.#run(effect);
  }
}
