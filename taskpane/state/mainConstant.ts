import type { Fit } from '../../core/fit/fit.ts';

/**
 * The constant to show: the one that the user asked for if the fit has it, else the one in the slope, which the law is
 * fitted for as a rule. Empty when the fit has none.
 */
export function mainConstant({ form }: Fit, names: readonly string[], wanted = ''): string {
  if (names.includes(wanted)) return wanted;
  return form.inSlope.find((name) => names.includes(name)) ?? names[0] ?? '';
}
