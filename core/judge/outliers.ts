import { normalTwoSided } from '../distributions/normal.ts';
import { studentTwoSided } from '../distributions/student.ts';
import type { Line } from '../line/line.ts';

/**
 * Probability that the scatter of n readings throws one as far out as each of these, the number of readings taken into
 * account (Bonferroni). From the externally studentised residual, t with ν − 1 degrees of freedom; from the stated
 * uncertainty, normal, when the scale is known. 1 where there is nothing to judge by, as for a reading that
 * the line passes through by force.
 * @param standardised internally studentised residuals, n
 * @see Cook & Weisberg (1982), Residuals and Influence in Regression, section 2.2.2
 */
export function outlierP(line: Line, standardised: Float64Array): Float64Array {
  const { scale, degreesOfFreedom: nu, residualStandardDeviation: s } = line;
  const n = standardised.length;
  // The probability falls as the residual grows: up to a size that n residuals often have it need not be worked out.
  let common = 0;
  return standardised.map((value) => {
    const size = Math.abs(value);
    if (!Number.isFinite(value) || size <= common) return 1;
    const p =
      scale === 'known'
        ? normalTwoSided(value * s)
        : nu > 1
          ? studentTwoSided(external(value, nu), nu - 1)
          : 1;
    if (n * p < 1) return n * p;
    if (n * p >= 1) common = size;
    return 1;
  });
}

/** Externally studentised residual: measured by the scatter of the other readings. */
function external(standardised: number, nu: number): number {
  const rest = nu - standardised * standardised;
  return rest > 0 ? standardised * Math.sqrt((nu - 1) / rest) : Number.POSITIVE_INFINITY;
}
