import type { Fit } from '../fit/fit.ts';
import { standardisedResiduals } from '../straightness/studentised.ts';
import { checkWords } from '../words/checkWords.ts';
import { readingWords } from '../words/readingWords.ts';
import { caution, type Finding, note } from './finding.ts';
import { drivingReadings } from './influence.ts';
import { outlierP } from './outliers.ts';
import { scatters } from './residuals.ts';
import { testedLine } from './testedLine.ts';

/** Single readings named in each kind of finding; the rest are counted. */
const NAMED = 3;
const SET_ASIDE_NAMED = 5;
const OUTLYING = 0.05;

/** Readings that drive a constant, the first `named` of them by position. */
export function drivingFindings(fit: Fit, named = NAMED): Finding[] {
  const driving = drivingReadings(fit).sort((p, q) => q.shift - p.shift);
  const found = driving
    .slice(0, named)
    .map(({ index, constant, value, without, shift }) =>
      caution(checkWords.drives(fit.readings.position[index] ?? 0, constant, value, without, shift)),
    );
  if (driving.length > named) found.push(note(checkWords.moreDrive(driving.length - named)));
  return found;
}

/** Readings further from the line than scatter would throw one of so many. */
export function outlyingFindings(fit: Fit, named = NAMED): Finding[] {
  const line = testedLine(fit);
  if (line === null || !scatters({ line, axes: fit.axes })) return [];
  const standardised = standardisedResiduals(line);
  const p = outlierP(line, standardised);
  const outlying = Array.from(fit.used.keys())
    .filter((row) => (p[row] ?? 1) < OUTLYING)
    .sort((a, b) => (p[a] ?? 1) - (p[b] ?? 1));
  const stated = line.scale === 'known';
  const found = outlying
    .slice(0, named)
    .map((row) =>
      caution(
        checkWords.outlying(
          fit.readings.position[fit.used[row] ?? 0] ?? 0,
          (standardised[row] ?? Number.NaN) * (stated ? line.residualStandardDeviation : 1),
          stated,
          p[row] ?? Number.NaN,
        ),
      ),
    );
  if (outlying.length > named) found.push(note(checkWords.moreOutlying(outlying.length - named)));
  return found;
}

/** What the cells excluded, what lies outside the law's domain, and what was taken as blank. */
export function setAsideFindings(fit: Fit): Finding[] {
  const { setAside, readings, direct } = fit;
  const found = setAside
    .slice(0, SET_ASIDE_NAMED)
    .map(({ reason, message }) =>
      direct !== null && reason === 'outsideDomain' ? note(message) : caution(message),
    );
  if (setAside.length > SET_ASIDE_NAMED) {
    found.push(caution(checkWords.moreSetAside(setAside.length - SET_ASIDE_NAMED)));
  }
  if (setAside.some(({ reason }) => reason === 'belowDetection') && falls(fit)) {
    found.push(caution(checkWords.detectionBias(fit.law.response)));
  }
  if (readings.trailingZeros > 0) found.push(note(readingWords.trailingZeros(readings.trailingZeros)));
  return found;
}

/** Whether the response falls from the lowest to the highest predictor. */
function falls({ readings: { x, y } }: Fit): boolean {
  let [low, high] = [0, 0];
  for (let i = 1; i < x.length; i++) {
    if ((x[i] ?? 0) < (x[low] ?? 0)) low = i;
    if ((x[i] ?? 0) > (x[high] ?? 0)) high = i;
  }
  return (y[high] ?? 0) < (y[low] ?? 0);
}
