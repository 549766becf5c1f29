import type { LineTerms, StraightForm } from '../law/law.ts';

/** Which terms of the line the unknown constants are solved from. */
export type TermsInUse = LineTerms | 'combined';

/**
 * Both terms when unknown constants stand in both; `combined` when it is a single one, found by least squares over
 * both terms; otherwise the one term that they stand in.
 * @param held true when the intercept is held, so that only the slope tells anything
 */
export function termsInUse(form: StraightForm, held: boolean): TermsInUse {
  if (form.proportional || held || form.inIntercept.length === 0) return 'slope';
  if (form.inSlope.length === 0) return 'intercept';
  const names = new Set([...form.inSlope, ...form.inIntercept]);
  return names.size === 1 ? 'combined' : 'both';
}

/** The one term that settles a constant alone, or null when it takes both. */
export function singleTermOf(
  form: StraightForm,
  terms: TermsInUse,
  name: string,
): 'slope' | 'intercept' | null {
  if (terms === 'slope' || terms === 'intercept') return terms;
  if (terms === 'combined') return null;
  if (form.inSlope.length === 1 && form.inSlope[0] === name) return 'slope';
  return form.inIntercept.length === 1 && form.inIntercept[0] === name ? 'intercept' : null;
}
