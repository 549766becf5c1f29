import type { Fit } from '../../core/fit/fit.ts';

/** The constant to show first: the one in the slope, which the law is fitted for as a rule. */
export function mainConstant({ form, constants }: Fit): string {
  const names = constants.map(({ name }) => name);
  return form.inSlope.find((name) => names.includes(name)) ?? names[0] ?? '';
}
