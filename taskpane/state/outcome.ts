import { Problem } from '../../core/problem.ts';

/** What a computation gave: a value, or the problem that stopped it. */
export type Outcome<T> = { readonly value: T } | { readonly problem: Problem };

/** Computes, keeping a `Problem` as an outcome; anything else that is thrown is a fault and goes on. */
export function attempt<T>(compute: () => T): Outcome<T> {
  try {
    return { value: compute() };
  } catch (error) {
    if (error instanceof Problem) return { problem: error };
    throw error;
  }
}

export function problemIn(outcome: Outcome<unknown> | null): Problem | undefined {
  return outcome !== null && 'problem' in outcome ? outcome.problem : undefined;
}

export function valueIn<T>(outcome: Outcome<T> | null): T | undefined {
  return outcome !== null && 'value' in outcome ? outcome.value : undefined;
}
