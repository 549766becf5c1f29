import type { Fit } from '../fit/fit.ts';
import { rangeOf } from '../line/rangeOf.ts';
import { checkWords } from '../words/checkWords.ts';
import { caution, type Finding, note } from './finding.ts';

/** Distance to X = 0, in ranges of X, from which an intercept counts as extrapolated. */
const FAR = 0.5;
/** Degrees of freedom below which an estimated scatter is poorly known. */
const FEW = 6;

/** Whether the readings are enough, and reach where the constants are read. */
export function rangeFindings(fit: Fit): Finding[] {
  const { coverage, direct, used, taking } = fit;
  const freedom = coverage.degreesOfFreedom;
  const count = (direct === null ? used : taking).length;
  if (!(freedom > 0)) return [caution(checkWords.noFreedom(count))];
  const found: Finding[] = [];
  if (coverage.distribution === 't' && freedom < FEW) {
    // u(s)/s ≈ 1/√(2ν).
    found.push(note(checkWords.fewReadings(freedom, Math.round(100 / Math.sqrt(2 * freedom)))));
  }
  if (direct === null) found.push(...interceptFindings(fit));
  return found;
}

function interceptFindings({ form, axes, line }: Fit): Finding[] {
  const found: Finding[] = [];
  const [low, high] = rangeOf(axes.horizontal);
  if (line.terms === 2 && axes.horizontal.every((value) => value === low || value === high)) {
    found.push(caution(checkWords.twoPlaces(form.against)));
  }
  const names = form.inIntercept.filter((name) => !form.inSlope.includes(name));
  const away = low > 0 ? low : high < 0 ? -high : 0;
  const times = away / (high - low);
  if (line.terms === 2 && names.length > 0 && times > FAR) {
    found.push(note(checkWords.extrapolated(names, form.against, low, high, times)));
  }
  return found;
}
