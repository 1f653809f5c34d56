import { useSyncExternalStore } from 'react';

/** A value outside React: what moves with the pointer must not render a page each time. */
export interface Store<Value> {
  get: () => Value;
  set: (next: Value) => void;
  subscribe: (listener: () => void) => () => void;
}

export function createStore<Value>(first: Value): Store<Value> {
  let value = first;
  const listeners = new Set<() => void>();
  return {
    get: () => value,
    set: (next) => {
      if (Object.is(next, value)) return;
      value = next;
      for (const listener of [...listeners]) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

export const useStore = <Value>(store: Store<Value>): Value =>
  useSyncExternalStore(store.subscribe, store.get);
