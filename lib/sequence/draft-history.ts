/** Undo and redo over states that are never changed, only replaced. */
export interface History<T> {
  /** Oldest first. */
  past: readonly T[];
  present: T;
  /** Next redo last. */
  future: readonly T[];
  /** Edits under the same name that follow one another are one entry. Null: the next edit is an entry of its own. */
  group: string | null;
}

/** Older entries are forgotten. */
export const mostEntries = 200;

export function beginHistory<T>(present: T): History<T> {
  return { past: [], present, future: [], group: null };
}

/** A new present. What could be redone is gone. An edit that changes nothing leaves everything as it is. */
export function record<T>(history: History<T>, present: T, group: string | null = null): History<T> {
  if (present === history.present) return history;
  const continues = group !== null && group === history.group;
  const past = continues ? history.past : [...history.past, history.present].slice(-mostEntries);
  return { past, present, future: [], group };
}

/** Typing elsewhere, or leaving the field, ends the entry. */
export function endGroup<T>(history: History<T>): History<T> {
  return history.group === null ? history : { ...history, group: null };
}

export function undo<T>({ past, present, future, ...rest }: History<T>): History<T> {
  const before = past.at(-1);
  if (before === undefined) return { past, present, future, ...rest };
  return { past: past.slice(0, -1), present: before, future: [...future, present], group: null };
}

export function redo<T>({ past, present, future, ...rest }: History<T>): History<T> {
  const next = future.at(-1);
  if (next === undefined) return { past, present, future, ...rest };
  return { past: [...past, present], present: next, future: future.slice(0, -1), group: null };
}

/** The same change made to every entry, so that undo does not take away what came from elsewhere. */
export function rebase<T>({ past, present, future, group }: History<T>, change: (entry: T) => T): History<T> {
  return { past: past.map(change), present: change(present), future: future.map(change), group };
}
