import type { LineTerms, StraightForm } from '../law/law.ts';

/** How a form's line is fitted while its constants are sought: which terms are free, and where the others stand. */
export interface LineUse {
  /** Terms of the line that are fitted. */
  readonly free: LineTerms | 'neither';
  /** Sets of terms from which the constants may be solved. */
  readonly solveFrom: readonly LineTerms[];
}

/** A term is free when an unknown constant stands in it; the others are held where known and trial constants put them. */
export function lineUseOf(form: StraightForm): LineUse {
  const slope = form.inSlope.length > 0;
  const intercept = form.inIntercept.length > 0 && !form.proportional;
  if (slope && intercept) {
    const single = new Set([...form.inSlope, ...form.inIntercept]).size === 1;
    return { free: 'both', solveFrom: single ? ['slope', 'intercept'] : ['both'] };
  }
  if (slope) return { free: 'slope', solveFrom: ['slope'] };
  if (intercept) return { free: 'intercept', solveFrom: ['intercept'] };
  return { free: 'neither', solveFrom: [] };
}
