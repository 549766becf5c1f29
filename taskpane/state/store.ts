/** One value that views follow. */
export interface Store<T> {
  get(): T;
  /** Replaces some parts and tells everyone who follows. */
  set(parts: Partial<T>): void;
  follow(heard: () => void): () => void;
}

export function createStore<T extends object>(initial: T): Store<T> {
  let value = initial;
  const followers = new Set<() => void>();
  return {
    get: () => value,
    set(parts) {
      value = { ...value, ...parts };
      for (const heard of [...followers]) heard();
    },
    follow(heard) {
      followers.add(heard);
      return () => {
        followers.delete(heard);
      };
    },
  };
}
