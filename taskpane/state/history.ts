/** What was chosen before and after, so that every step can be taken back. */
export interface History<T> {
  readonly past: readonly Step<T>[];
  readonly present: T;
  readonly future: readonly Step<T>[];
  /** Steps that carry the same mark as the last one are one step: letters typed into one field. */
  readonly mark: string;
}

/** A state of the past or the future with what leads away from it or to it, for the button's name. */
export interface Step<T> {
  readonly state: T;
  readonly what: string;
}

const MOST_STEPS = 100;

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [], mark: '' };
}

/** @param mark steps with the same mark, one after the other, count as one; empty: a step of its own */
export function advance<T>(history: History<T>, next: T, what: string, mark = ''): History<T> {
  if (mark !== '' && mark === history.mark) return { ...history, present: next, future: [] };
  const past = [...history.past, { state: history.present, what }].slice(-MOST_STEPS);
  return { past, present: next, future: [], mark };
}

export function undo<T>(history: History<T>): History<T> {
  const last = history.past.at(-1);
  if (last === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: last.state,
    future: [{ state: history.present, what: last.what }, ...history.future],
    mark: '',
  };
}

export function redo<T>(history: History<T>): History<T> {
  const [next, ...future] = history.future;
  if (next === undefined) return history;
  return {
    past: [...history.past, { state: history.present, what: next.what }],
    present: next.state,
    future,
    mark: '',
  };
}

/** The same steps with every state changed, when what all of them stand on has changed. */
export function mapHistory<T>(history: History<T>, change: (state: T) => T): History<T> {
  const steps = (list: readonly Step<T>[]) => list.map(({ state, what }) => ({ state: change(state), what }));
  return {
    past: steps(history.past),
    present: change(history.present),
    future: steps(history.future),
    mark: history.mark,
  };
}
