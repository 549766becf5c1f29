import type { ConstantEstimate, Fit } from '../fit/fit.ts';
import { cautionOf } from '../law/catalogue.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { type StatedResult, statementWords } from '../words/statementWords.ts';
import { bracketForm, type Rounding, rounded, roundingFor, withPower } from './rounding.ts';

/** An uncertainty that is rounding, relative to the value. */
const ROUNDING = 1e-12;

/**
 * A result as one sentence to paste: the value rounded to its uncertainty, the standard uncertainty with two significant
 * digits, the coverage interval, the readings, the law and the method; a second sentence where the law calls for
 * caution. With `style=brackets` the compact form `k = 0.0412(13) 1/h`.
 * @param constant name of a constant that the fit settles or derives
 * @param unit unit of the constant, or the empty string
 * @throws Problem `argument` for another name
 * @see JCGM 100:2008, 7.2.2 to 7.2.6
 */
export function statement(fit: Fit, constant: string, unit: string): string {
  const estimate = fit.constants.find(({ name }) => name === constant);
  if (estimate === undefined) {
    const names = fit.constants.map(({ name }) => name);
    throw new Problem('argument', 'name', fitWords.unknownConstant(constant, names));
  }
  const inUnit = unit.trim() === '' ? '' : ` ${unit.trim()}`;
  const { value, standardUncertainty } = estimate;
  const certain =
    !(standardUncertainty > ROUNDING * Math.abs(value)) || standardUncertainty === Number.POSITIVE_INFINITY;
  const rounding = roundingFor(value, certain ? Number.NaN : standardUncertainty);
  const shownValue = withPower(certain ? plainDigits(value, rounding) : rounded(value, rounding), rounding);
  if (fit.settings.options.style === 'brackets') {
    return certain
      ? statementWords.bracketsAlone(constant, `${shownValue}${inUnit}`)
      : statementWords.brackets(constant, `${bracketForm(value, standardUncertainty)}${inUnit}`);
  }
  const result: StatedResult = {
    name: constant,
    value: `${shownValue}${inUnit}`,
    standardUncertainty: certain
      ? null
      : `${withPower(rounded(standardUncertainty, rounding), rounding)}${inUnit}`,
    interval: intervalOf(estimate, rounding, inUnit),
    probability: 100 * fit.coverage.probability,
    factor: fit.coverage.factor,
    distribution: fit.coverage.distribution,
    degreesOfFreedom: fit.coverage.degreesOfFreedom,
    readings: (fit.direct === null ? fit.used : fit.taking).length,
    law: fit.law.name === '' ? fit.law.equation : `${fit.law.name}, ${fit.law.equation}`,
    method: methodOf(fit),
    setAside: setAsideCount(fit),
  };
  const sentence = certain
    ? statementWords.noUncertainty(result, reasonFor(fit, standardUncertainty))
    : statementWords.sentence(result);
  const caution = cautionOf(fit.law);
  return caution === null ? sentence : `${sentence} ${caution}`;
}

/** Why there is no uncertainty to state. */
function reasonFor({ coverage }: Fit, standardUncertainty: number): 'few' | 'exact' | 'beyond' {
  if (!(coverage.degreesOfFreedom > 0)) return 'few';
  return Number.isFinite(standardUncertainty) ? 'exact' : 'beyond';
}

/** Six significant digits without trailing zeros. */
function plainDigits(value: number, rounding: Rounding): string {
  const text = rounded(value, rounding);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

function intervalOf(
  { low, high }: ConstantEstimate,
  rounding: Rounding,
  inUnit: string,
): StatedResult['interval'] {
  if (!(Number.isFinite(low) && Number.isFinite(high))) return null;
  const end = (value: number): string => withPower(rounded(value, rounding), rounding);
  return { low: end(low), high: end(high), unit: inUnit };
}

/** Readings that take no part at all: those beside the line still count in a direct fit. */
function setAsideCount({ direct, setAside }: Fit): number {
  return direct === null
    ? setAside.length
    : setAside.filter(({ reason }) => reason !== 'outsideDomain').length;
}

/** How the constants were found, in words. */
function methodOf({ law, form, settings, direct }: Fit): string {
  const { response, predictor } = law;
  const { spreadY, spreadX, options, known } = settings;
  const parts: string[] = [];
  if (direct === null) parts.push(statementWords.line(form.plot, form.against));
  else if (form.trials.length > 0) parts.push(statementWords.trial(response, form.trials));
  else parts.push(statementWords.direct(response));
  switch (spreadY.kind) {
    case 'none':
      parts.push(statementWords.equalWeights());
      break;
    case 'equal':
      parts.push(direct === null ? statementWords.equalScatter(response) : statementWords.equalWeights());
      break;
    case 'proportional':
      parts.push(statementWords.proportionalScatter(response));
      break;
    default:
      parts.push(
        spreadX.kind === 'none'
          ? statementWords.stated(response)
          : statementWords.statedBoth(response, predictor),
      );
  }
  if (options.intercept === 'held' && direct === null && !form.proportional)
    parts.push(statementWords.held());
  if (known.size > 0) {
    parts.push(
      statementWords.known(
        [...known].map(([name, { value, standardUncertainty }]) =>
          statementWords.knownItem(name, value, standardUncertainty),
        ),
      ),
    );
  }
  if (options.interval === 'montecarlo' && direct === null) parts.push(statementWords.simulated());
  return parts.join(', ');
}
