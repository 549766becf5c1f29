import type { Fit } from '../fit/fit.ts';
import { cautionOf } from '../law/catalogue.ts';
import { checkWords } from '../words/checkWords.ts';
import { agreementFindings } from './agreement.ts';
import { allSteps } from './allSteps.ts';
import { caution, type Finding, note } from './finding.ts';
import { leftoverFindings } from './leftover.ts';
import { logResponse } from './logResponse.ts';
import { otherLawsFindings } from './otherLaws.ts';
import { rangeFindings } from './rangeFindings.ts';
import { drivingFindings, outlyingFindings, setAsideFindings } from './readingFindings.ts';
import { scatters } from './residuals.ts';
import { shapeFindings } from './shapeFindings.ts';
import { simulatedFindings } from './simulatedFindings.ts';
import { testedLine } from './testedLine.ts';

export type { Finding } from './finding.ts';

const order: readonly Finding['level'][] = ['stop', 'caution', 'note'];

/** Percent from which a mean differs enough from a median to be told. */
const LOG_BIAS_TOLD = 0.5;

/**
 * What a careful engineer would say about a fit, one sentence each, most serious first: `stop` where the readings
 * contradict the law or the known constants, `caution` where the result should not be passed on without a look, `note`
 * for what is good to know. Tests speak below p = 0.05; thresholds stand beside each finding.
 */
export function checks(fit: Fit): Finding[] {
  return allSteps(checkSteps(fit));
}

/** As `checks`, pausing between one look at the readings and the next so that the caller can stay responsive. */
export function* checkSteps(fit: Fit): Generator<void, Finding[]> {
  const line = testedLine(fit);
  const exact = line !== null && line.degreesOfFreedom > 0 && !scatters({ line, axes: fit.axes });
  const found: Finding[] = [
    ...leftoverFindings(fit),
    ...(exact ? [note(checkWords.exact())] : yield* scatterSteps(fit)),
    ...(fit.direct?.notes ?? []).map(caution),
    ...setAsideFindings(fit),
    ...rangeFindings(fit),
    ...(fit.form.responseOnBothAxes ? [note(checkWords.bothAxes(fit.law.response))] : []),
    ...lawCaution(fit),
  ];
  return order.flatMap((level) => found.filter((finding) => finding.level === level));
}

/** Findings about readings that scatter: there is nothing to test where they lie on the law exactly. */
function* scatterSteps(fit: Fit): Generator<void, Finding[]> {
  if (!(fit.coverage.degreesOfFreedom > 0)) return [];
  const found = shapeFindings(fit);
  // About a law that does not hold, single readings stand out because of the law.
  const named = found.some(({ level }) => level === 'stop') ? 1 : undefined;
  const looks = [
    otherLawsFindings,
    (of: Fit) => drivingFindings(of, named),
    (of: Fit) => outlyingFindings(of, named),
    agreementFindings,
    simulatedFindings,
    logBiasFindings,
  ];
  for (const look of looks) {
    yield;
    found.push(...look(fit));
  }
  return found;
}

function lawCaution(fit: Fit): Finding[] {
  const text = cautionOf(fit.law);
  return text === null ? [] : [caution(text)];
}

/**
 * Exp of a mean logarithm is a median: the mean of a lognormal response is higher by exp(σ²/2).
 * @see Aitchison & Brown (1957), The Lognormal Distribution, equation 2.7
 */
function logBiasFindings(fit: Fit): Finding[] {
  const { spreadY } = fit.settings;
  if (fit.direct !== null || (spreadY.kind !== 'none' && spreadY.kind !== 'proportional')) return [];
  const c = logResponse(fit);
  if (c === null) return [];
  const s = fit.line.residualStandardDeviation;
  // With proportional weights the scatter is in parts of y already.
  const sigma = spreadY.kind === 'none' ? s / Math.abs(c) : s;
  const percent = 100 * Math.expm1((sigma * sigma) / 2);
  return percent >= LOG_BIAS_TOLD ? [note(checkWords.logBias(fit.form.plot, fit.law.response, percent))] : [];
}
