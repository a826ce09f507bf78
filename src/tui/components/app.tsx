/** The root: follows the store. */
import { useSyncExternalStore } from 'react';
import type { Store } from '../store.ts';
import type { World } from '../world.ts';
import { Screen } from './screen.tsx';

export function App({ store, world }: { readonly store: Store; readonly world: World }) {
  const state = useSyncExternalStore(store.subscribe, store.state);
  return <Screen state={state} world={world} />;
}
