import { useSyncExternalStore } from 'react';

/**
 * A small choice that outlives the page. Where storage is blocked it lasts as long as the page.
 * `read` turns whatever was stored (by an older version, or by hand) into a valid value.
 */
export function storedChoice<T>(key: string, read: (stored: unknown) => T) {
  const listeners = new Set<() => void>();
  let current = read(load(key));

  const notify = () => {
    for (const listener of listeners) listener();
  };
  if (typeof window !== 'undefined') {
    window.addEventListener('storage', (event) => {
      if (event.key !== key) return;
      current = read(load(key));
      notify();
    });
  }

  const set = (value: T) => {
    current = value;
    try {
      localStorage.setItem(key, typeof value === 'string' ? value : JSON.stringify(value));
    } catch {
      // Blocked or full storage only costs the memory of the choice.
    }
    notify();
  };
  const subscribe = (listener: () => void) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  };
  const get = () => current;
  return { get, set, use: () => useSyncExternalStore(subscribe, get, get) };
}

function load(key: string): unknown {
  try {
    const text = localStorage.getItem(key);
    if (text === null) return null;
    return text.startsWith('{') ? JSON.parse(text) : text;
  } catch {
    return null;
  }
}
