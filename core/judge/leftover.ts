import { FIRST_CONSTANT } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { checkWords } from '../words/checkWords.ts';
import { caution, type Finding, note, stop } from './finding.ts';

/** Standard uncertainties from which the readings and the known constants do not go together. */
const DOUBTFUL = 2;
const CONTRADICTS = 4;

/** Whether the line term in which no unknown stands is what the known constants say it should be. */
export function leftoverFindings({ leftover, form, law }: Fit): Finding[] {
  if (leftover === null || !(leftover.standardUncertainty > 0)) return [];
  const { term, fitted, expected, standardUncertainty } = leftover;
  const ratio = Math.abs(fitted - expected) / standardUncertainty;
  const { uses } = term === 'slope' ? form.slopeOf : form.interceptOf;
  const known = uses
    .map((index) => law.constants[index - FIRST_CONSTANT] ?? '')
    .filter((name) => name !== '');
  if (ratio < DOUBTFUL) return [note(checkWords.leftoverAgrees(term, known, ratio))];
  const text = checkWords.leftover(term, fitted, expected, known, ratio);
  return [ratio >= CONTRADICTS ? stop(text) : caution(text)];
}
