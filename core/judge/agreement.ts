import type { Fit } from '../fit/fit.ts';
import { fitCompiled } from '../fit/fitLaw.ts';
import { Problem } from '../problem.ts';
import { checkWords } from '../words/checkWords.ts';
import { caution, type Finding, note } from './finding.ts';

/** Difference in combined standard uncertainties from which it is said, and from which it is a caution. */
const SAID = 1;
const SERIOUS = 2;

/**
 * Whether the line and the direct fit of the same readings agree on the constants: the one that differs the most, in
 * units of √(u² of the one + u² of the other).
 */
export function agreementFindings(fit: Fit): Finding[] {
  const { law, settings, form, direct } = fit;
  if (direct !== null || law.curve === null || settings.spreadX.kind !== 'none' || form.trials.length > 0)
    return [];
  if (settings.options.intercept === 'held' || !(fit.coverage.degreesOfFreedom > 0)) return [];
  try {
    const options = { ...settings.options, fit: 'direct', interval: 'line' } as const;
    const other = fitCompiled(fit.readings, law, { ...settings, options });
    return disagreement(fit, other);
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return [note(checkWords.directFails(error.message))];
  }
}

function disagreement(line: Fit, direct: Fit): Finding[] {
  let most = { name: '', line: 0, direct: 0, ratio: 0 };
  line.constants.forEach((one, k) => {
    const other = direct.constants[k];
    if (other === undefined || one.derived) return;
    const u = Math.hypot(one.standardUncertainty, other.standardUncertainty);
    const ratio = Math.abs(one.value - other.value) / u;
    // Differences that are rounding are none, however exact the readings.
    const apart = Math.abs(one.value - other.value) > 1e-9 * Math.abs(one.value);
    if (apart && Number.isFinite(ratio) && ratio > most.ratio)
      most = { name: one.name, line: one.value, direct: other.value, ratio };
  });
  if (!(most.ratio > SAID)) return [];
  const { law, settings } = line;
  const stated = settings.spreadY.kind !== 'none';
  const text = checkWords.disagree(most.name, most.line, most.direct, most.ratio, law.response, stated);
  return [most.ratio > SERIOUS ? caution(text) : note(text)];
}
