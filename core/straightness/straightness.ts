import { chiSquaredTail } from '../distributions/tails.ts';
import type { Fit } from '../fit/fit.ts';
import { bow } from './bow.ts';
import { leaveOneOutMisfit } from './leaveOneOutMisfit.ts';
import { aicc, logLikelihood } from './likelihood.ts';
import { misfit } from './misfit.ts';
import { runsP } from './runsP.ts';

/** How straight the readings lie on a law's axes; NaN where a number does not exist. */
export interface Straightness {
  /** Readings on the line, and those that are not. */
  readonly readingsUsed: number;
  readonly readingsSetAside: number;
  readonly degreesOfFreedom: number;
  readonly rSquared: number;
  readonly residualStandardDeviation: number;
  readonly bowPercent: number;
  readonly bowP: number;
  readonly runsP: number;
  readonly misfit: number;
  readonly leaveOneOutMisfit: number;
  readonly logLikelihood: number;
  readonly aicc: number;
  readonly chiSquaredP: number;
}

/**
 * Judges the line of a fit, trial constants at their final values; each number is defined beside the function it comes
 * from. The likelihood and what follows from it need an axis X free of y and no errors in x.
 */
export function straightness(fit: Fit): Straightness {
  const { line, axes } = fit;
  const { percent, p } = bow(line, axes.horizontal, axes.vertical);
  const likelihood = lineLogLikelihood(fit);
  return {
    readingsUsed: fit.used.length,
    readingsSetAside: fit.setAside.length,
    degreesOfFreedom: line.degreesOfFreedom,
    rSquared: line.rSquared,
    residualStandardDeviation: line.residualStandardDeviation,
    bowPercent: percent,
    bowP: p,
    runsP: runsP(axes.horizontal, line.residual),
    misfit: misfit(fit),
    leaveOneOutMisfit: leaveOneOutMisfit(fit),
    logLikelihood: likelihood,
    aicc: aicc(likelihood, freeConstants(fit), fit.used.length),
    chiSquaredP:
      line.scale === 'known' && line.degreesOfFreedom > 0
        ? chiSquaredTail(line.weightedSumOfSquares, line.degreesOfFreedom)
        : Number.NaN,
  };
}

/** Log-likelihood of the readings on the line; NaN when y stands on both axes or x is uncertain. */
export function lineLogLikelihood({ form, settings, line, axes }: Fit): number {
  if (form.responseOnBothAxes || settings.spreadX.kind !== 'none') return Number.NaN;
  return logLikelihood(line, axes.verticalByY);
}

/** Free constants as Akaike's criterion counts them: free terms of the line, trial constants, and an estimated scale. */
export function freeConstants({ form, line }: Fit): number {
  return line.terms + form.trials.length + (line.scale === 'estimated' ? 1 : 0);
}
