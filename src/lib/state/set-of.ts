/** A set that is replaced, never changed: what watches it watches the whole. */
export const setOf = <T>(items: Iterable<T>): ReadonlySet<T> => new Set(items);
