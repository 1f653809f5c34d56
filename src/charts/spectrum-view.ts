import type { SpectrumCursor } from './spectrum-cursor.ts';
import type { Window } from './plot-window.ts';
import { createStore, type Store } from './store.ts';

/** What a person has set of a spectrum's view, in the unit of its x axis. */
export interface SpectrumView {
  /** Null for the whole. */
  window: Store<Window | null>;
  cursor: Store<SpectrumCursor>;
}

export const createSpectrumView = (): SpectrumView => ({
  window: createStore<Window | null>(null),
  cursor: createStore<SpectrumCursor>({ kind: 'free', at: null }),
});
