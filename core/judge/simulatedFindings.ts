import type { Fit } from '../fit/fit.ts';
import { checkWords } from '../words/checkWords.ts';
import { caution, type Finding } from './finding.ts';

/**
 * Where simulated intervals were asked for: the constants whose first-order interval value ± k·u differs from the
 * simulated one by more than half a unit in the second significant digit of the standard uncertainty.
 * @see JCGM 101:2008, clause 8.1.3 (validation of the GUM uncertainty framework)
 */
export function simulatedFindings(fit: Fit): Finding[] {
  if (fit.settings.options.interval !== 'montecarlo') return [];
  const { factor } = fit.coverage;
  return fit.constants.flatMap(({ name, value, standardUncertainty: u, low, high }) => {
    if (!(u > 0) || !Number.isFinite(low) || !Number.isFinite(high)) return [];
    const first = [value - factor * u, value + factor * u] as const;
    const tolerance = 0.5 * 10 ** (Math.floor(Math.log10(u)) - 1);
    const apart = Math.max(Math.abs(first[0] - low), Math.abs(first[1] - high));
    return apart > tolerance ? [caution(checkWords.simulated(name, first, [low, high]))] : [];
  });
}
