/** Keeps the `capacity` values used last; a value must not be changed by its users. */
export interface LruCache<V> {
  /** The value kept under a key, made and kept if there is none. */
  get(key: string, make: () => V): V;
}

/** Creates an empty cache. */
export function createLruCache<V>(capacity: number): LruCache<V> {
  const entries = new Map<string, V>();
  return {
    get(key, make) {
      const kept = entries.get(key);
      const value = kept ?? make();
      if (kept !== undefined) entries.delete(key);
      entries.set(key, value);
      if (entries.size > capacity) {
        const [oldest] = entries.keys();
        entries.delete(oldest);
      }
      return value;
    },
  };
}
