import { Problem } from '../core/problem.ts';

/** The problem that stops a computation; anything else that is thrown goes on, and so does a computation that does not stop. */
export function problemOf(run: () => unknown): Problem {
  try {
    run();
  } catch (error) {
    if (error instanceof Problem) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}
