/** A value that can be watched. */
export interface Signal<T> {
  get(): T;
  /** Calls `listener` after every change; returns a function that stops it. */
  subscribe(listener: () => void): () => void;
}

/** A watched value that its maker can change. */
export interface OwnSignal<T> extends Signal<T> {
  set(value: T): void;
}

/** Makes a watched value. */
export function createSignal<T>(first: T): OwnSignal<T> {
  const listeners = new Set<() => void>();
  let value = first;
  return {
    get: () => value,
    set: (next) => {
      if (Object.is(value, next)) return;
      value = next;
      for (const listener of [...listeners]) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
