import { derivativeByKnown } from '../constants/knownEffects.ts';
import type { Expression } from '../law/expression.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { constantFormula, type Desk } from './desk.ts';
import { differentiate } from './differentiate.ts';
import type { Follows } from './followSteps.ts';
import type { KnownOnLine } from './knownSteps.ts';
import type { LineCells } from './lineSteps.ts';
import { isNumber, plain } from './plainExpression.ts';

/** Writes the standard uncertainty of a constant by the law of propagation. @see JCGM 100:2008, 5.2.2 */
export function uncertaintyStep(
  desk: Desk,
  line: LineCells,
  known: readonly KnownOnLine[],
  name: string,
  by: Follows,
  totalOf: (known: KnownOnLine) => string | null,
): string {
  const { writer } = desk;
  const parts: string[] = [];
  const said: string[] = [];
  const add = (formula: string, text: string): void => {
    parts.push(formula);
    said.push(text);
  };
  if (by.slope !== null) add(`${by.slope}^2*${line.varianceSlope}`, workingsWords.propagated(name, 'slope'));
  if (by.slope !== null && by.intercept !== null && line.covariance !== null) {
    add(`2*${by.slope}*${by.intercept}*${line.covariance}`, workingsWords.propagatedBoth(name));
  }
  if (by.intercept !== null && line.varianceIntercept !== null) {
    add(`${by.intercept}^2*${line.varianceIntercept}`, workingsWords.propagated(name, 'intercept'));
  }
  for (const one of known) {
    const total = totalOf(one);
    if (total === null) continue;
    add(`(${total}*${desk.uncertaintyCells.get(one.name)})^2`, workingsWords.propagatedKnown(name, one.name));
  }
  const variance = writer.step(`u²(${name})`, parts.join('+'), workingsWords.varianceConstantHow(said));
  return writer.step(
    workingsWords.standardUncertainty(name),
    `SQRT(${variance})`,
    workingsWords.rootHow(`u²(${name})`),
  );
}

/** dθ/dκ in all: through the line fitted anew, and through κ standing in the terms' own expressions. */
export function totalDerivative(desk: Desk, known: KnownOnLine, name: string, by: Follows): string | null {
  const { fit, writer } = desk;
  const { form } = fit;
  const through = (follows: string | null, lineBy: string | null, expression: Expression): string => {
    const own = differentiate(expression, known.name);
    if (follows === null || (lineBy === null && isNumber(own, 0))) return '';
    const less = isNumber(own, 0) ? '' : `-(${constantFormula(desk, plain(own))})`;
    return `${follows}*(${lineBy ?? ''}${less})`;
  };
  const parts = [
    through(by.slope, known.slopeBy, form.slopeOf.expression),
    through(by.intercept, known.interceptBy, form.interceptOf.expression),
  ].filter((part) => part !== '');
  if (parts.length === 0) return null;
  return writer.step(`d${name}/d${known.name}`, parts.join('+'), workingsWords.totalHow(name, known.name));
}

/** dθ/dκ found by fitting anew, as a number. */
export function refittedDerivative({ fit, writer }: Desk, known: string, name: string): string | null {
  const effect = fit.knownEffects.find((one) => one.name === known);
  if (effect === undefined) return null;
  const place = fit.law.constants.indexOf(name);
  const value = derivativeByKnown(effect, ({ values }) => values[place] ?? Number.NaN);
  return writer.given(`d${name}/d${known}`, value, workingsWords.refittedHow(name, known));
}
