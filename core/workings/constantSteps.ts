import { derivativeByKnown } from '../constants/knownEffects.ts';
import { singleTermOf, type TermsInUse, termsInUse } from '../constants/usedTerms.ts';
import type { Fit } from '../fit/fit.ts';
import type { Expression } from '../law/expression.ts';
import { printExpression } from '../law/printExpression.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { type ClosedForm, closedForms, INTERCEPT, SLOPE } from './closedForm.ts';
import { constantFormula, type Desk } from './desk.ts';
import { differentiate } from './differentiate.ts';
import { expressionFormula } from './expressionFormula.ts';
import type { KnownOnLine } from './knownSteps.ts';
import type { LineCells } from './lineSteps.ts';
import { isNumber, plain } from './plainExpression.ts';

/** Cells of one constant of the law. */
export interface ConstantCells {
  readonly name: string;
  readonly value: string;
  readonly standardUncertainty: string | null;
  readonly low: string | null;
  readonly high: string | null;
  /** True when the interval is that of a line term carried through. */
  readonly carried: boolean;
}

/** How a constant follows the line's terms: cells, null where it does not. */
interface Follows {
  readonly slope: string | null;
  readonly intercept: string | null;
}

/** Writes the law's constants from the line: values, standard uncertainties, intervals. */
export function constantSteps(
  desk: Desk,
  line: LineCells,
  known: readonly KnownOnLine[],
  factor: string | null,
): ConstantCells[] {
  const { fit, writer } = desk;
  const { law, form } = fit;
  writer.section(workingsWords.constants());
  const terms = termsInUse(form, fit.settings.options.intercept === 'held');
  const names = law.unknown.filter((name) => form.inSlope.includes(name) || form.inIntercept.includes(name));
  const forms = terms === 'combined' ? null : closedFormsOf(fit, terms, names);
  if (forms === null) {
    for (const name of names) {
      const how = terms === 'combined' ? workingsWords.combinedHow(name) : workingsWords.startHow(name);
      desk.constantCells.set(name, writer.given(name, settledValue(fit, name), how));
    }
  } else {
    for (const { name, expression } of forms) {
      const formula = termFormula(desk, expression, line.slope, line.intercept ?? '0');
      desk.constantCells.set(
        name,
        writer.step(name, formula, workingsWords.solvedHow(name, text(expression))),
      );
    }
  }
  const follows = followSteps(desk, line, terms, names);
  if (forms === null) stepOnce(desk, line, names, follows);
  return names.map((name) => {
    const value = desk.constantCells.get(name) ?? '';
    const by = follows.get(name) ?? { slope: null, intercept: null };
    if (factor === null || line.varianceSlope === null) {
      return { name, value, standardUncertainty: null, low: null, high: null, carried: false };
    }
    const total =
      terms === 'combined'
        ? (one: KnownOnLine) => refittedDerivative(desk, one.name, name)
        : (one: KnownOnLine) => totalDerivative(desk, one, name, by);
    const standardUncertainty = uncertaintyStep(desk, line, known, name, by, total);
    const term = fit.knownEffects.length > 0 ? null : singleTermOf(form, terms, name);
    const closed = forms?.find((one) => one.name === name);
    if (term === null || closed === undefined) {
      const ends = plainEnds(desk, name, value, standardUncertainty, factor);
      return { name, value, standardUncertainty, ...ends, carried: false };
    }
    const ends = carriedEnds(desk, line, closed, term, factor);
    return { name, value, standardUncertainty, ...ends, carried: true };
  });
}

function settledValue({ law, values }: Fit, name: string): number {
  return values[law.constants.indexOf(name)] ?? Number.NaN;
}

function closedFormsOf(fit: Fit, terms: TermsInUse, names: readonly string[]): readonly ClosedForm[] | null {
  const { law, form, line, values } = fit;
  const all = new Map(law.constants.map((name, k) => [name, values[k] ?? Number.NaN]));
  all.set(SLOPE, line.slope);
  all.set(INTERCEPT, line.intercept);
  return closedForms(
    {
      slope: terms === 'intercept' ? null : form.slopeOf.expression,
      intercept: terms === 'slope' ? null : form.interceptOf.expression,
    },
    names,
    all,
  );
}

/** A closed form as a formula, with formulas in place of the line's terms. */
function termFormula(desk: Desk, expression: Expression, slope: string, intercept: string): string {
  return expressionFormula(expression, (name) => {
    if (name === SLOPE) return slope;
    if (name === INTERCEPT) return intercept;
    return desk.constantCells.get(name) ?? 'NA()';
  });
}

function text(expression: Expression): string {
  return printExpression(renamed(expression), 'text');
}

/** The line's terms by the letters that the sheet uses for them. */
function renamed(expression: Expression): Expression {
  switch (expression.kind) {
    case 'symbol':
      if (expression.name === SLOPE) return { kind: 'symbol', name: 'slope' };
      return expression.name === INTERCEPT ? { kind: 'symbol', name: 'intercept' } : expression;
    case 'sum':
      return { kind: 'sum', terms: expression.terms.map(renamed) };
    case 'product':
      return { kind: 'product', factors: expression.factors.map(renamed) };
    case 'power':
      return { kind: 'power', base: renamed(expression.base), exponent: renamed(expression.exponent) };
    case 'function':
      return { ...expression, argument: renamed(expression.argument) };
    default:
      return expression;
  }
}

/** Writes the derivatives of the line's terms by the constants and, from their inverse, how the constants follow. */
function followSteps(
  desk: Desk,
  line: LineCells,
  terms: TermsInUse,
  names: readonly string[],
): Map<string, Follows> {
  const { fit, writer } = desk;
  const { form } = fit;
  const derivative = (term: 'slope' | 'intercept', name: string): string | null => {
    const expression = differentiate((term === 'slope' ? form.slopeOf : form.interceptOf).expression, name);
    if (isNumber(expression, 0)) return null;
    return writer.step(
      workingsWords.byTerm(term, name),
      constantFormula(desk, expression),
      workingsWords.termByHow(term, name),
    );
  };
  const follow = (name: string, term: 'slope' | 'intercept', formula: string | null): string | null =>
    formula === null
      ? null
      : writer.step(workingsWords.byTerm(name, term), formula, workingsWords.constantByHow(name, term));
  const found = new Map<string, Follows>();
  const [first = '', second = ''] = names;
  if (terms === 'slope' || terms === 'intercept') {
    const by = follow(first, terms, `1/${derivative(terms, first)}`);
    found.set(first, { slope: terms === 'slope' ? by : null, intercept: terms === 'intercept' ? by : null });
    return found;
  }
  if (terms === 'combined') {
    const s = derivative('slope', first);
    const i = derivative('intercept', first);
    // Least squares over both terms, measured by their inverse covariance.
    const shift = `(${i}+${line.meanX}*${s})`;
    const square = writer.step(
      workingsWords.determinant(),
      `${line.spread}*${s}^2+${line.total}*${shift}^2`,
      workingsWords.determinantCombinedHow(),
    );
    found.set(first, {
      slope: follow(first, 'slope', `(${line.spread}*${s}+${line.total}*${line.meanX}*${shift})/${square}`),
      intercept: follow(first, 'intercept', `${line.total}*${shift}/${square}`),
    });
    return found;
  }
  const [s0, s1, i0, i1] = [
    derivative('slope', first),
    derivative('slope', second),
    derivative('intercept', first),
    derivative('intercept', second),
  ];
  const products = [
    s0 === null || i1 === null ? '' : `${s0}*${i1}`,
    s1 === null || i0 === null ? '' : `-${s1}*${i0}`,
  ].join('');
  const determinant = writer.step(workingsWords.determinant(), products, workingsWords.determinantHow());
  const over = (cell: string | null, sign = ''): string | null =>
    cell === null ? null : `${sign}${cell}/${determinant}`;
  found.set(first, {
    slope: follow(first, 'slope', over(i1)),
    intercept: follow(first, 'intercept', over(s1, '-')),
  });
  found.set(second, {
    slope: follow(second, 'slope', over(i0, '-')),
    intercept: follow(second, 'intercept', over(s0)),
  });
  return found;
}

/** One Newton step from the stated values: next to nothing while the readings are those that they were settled with. */
function stepOnce(
  desk: Desk,
  line: LineCells,
  names: readonly string[],
  follows: ReadonlyMap<string, Follows>,
): void {
  const { fit, writer } = desk;
  const { form } = fit;
  const slopeLeft = `(${line.slope}-(${constantFormula(desk, form.slopeOf.expression)}))`;
  const interceptLeft = `(${line.intercept ?? '0'}-(${constantFormula(desk, form.interceptOf.expression)}))`;
  const stepped = names.map((name) => {
    const by = follows.get(name);
    const parts = [
      by?.slope ? `${by.slope}*${slopeLeft}` : '',
      by?.intercept ? `${by.intercept}*${interceptLeft}` : '',
    ].filter((part) => part !== '');
    const step = writer.step(workingsWords.stepTo(name), parts.join('+'), workingsWords.stepHow());
    const start = desk.constantCells.get(name) ?? '';
    return [name, writer.step(name, `${start}+${step}`, workingsWords.steppedHow(name))] as const;
  });
  for (const [name, cell] of stepped) desk.constantCells.set(name, cell);
}

function uncertaintyStep(
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
function totalDerivative(desk: Desk, known: KnownOnLine, name: string, by: Follows): string | null {
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

export function plainEnds(
  { writer }: Desk,
  name: string,
  value: string,
  standardUncertainty: string,
  factor: string,
): { readonly low: string; readonly high: string } {
  return {
    low: writer.step(
      workingsWords.low(name),
      `${value}-${factor}*${standardUncertainty}`,
      workingsWords.plainEndHow('−', name),
    ),
    high: writer.step(
      workingsWords.high(name),
      `${value}+${factor}*${standardUncertainty}`,
      workingsWords.plainEndHow('+', name),
    ),
  };
}

/** Both ends of the one line term's interval, carried through the closed form. */
function carriedEnds(
  desk: Desk,
  line: LineCells,
  { name, expression }: ClosedForm,
  term: 'slope' | 'intercept',
  factor: string,
): { readonly low: string; readonly high: string } {
  const { writer } = desk;
  const value = desk.constantCells.get(name) ?? '';
  const variance = term === 'slope' ? line.varianceSlope : line.varianceIntercept;
  const image = (sign: '-' | '+'): string => {
    const cell = term === 'slope' ? line.slope : (line.intercept ?? '0');
    const end = `(${cell}${sign}${factor}*SQRT(${variance}))`;
    return term === 'slope'
      ? termFormula(desk, expression, end, line.intercept ?? '0')
      : termFormula(desk, expression, line.slope, end);
  };
  const ends = (
    [
      ['−', '-'],
      ['+', '+'],
    ] as const
  ).map(([shown, sign]) =>
    writer.step(workingsWords.end(name, shown), image(sign), workingsWords.endHow(term, shown)),
  );
  // Past a value for which the constant does not exist the ends do not enclose it, and there is no interval.
  const enclosed = (pick: 'MIN' | 'MAX'): string =>
    `IF(AND(MIN(${ends})<=${value},${value}<=MAX(${ends})),${pick}(${ends}),"")`;
  const how = workingsWords.carriedEndHow(workingsWords.ofTerm(term), name);
  return {
    low: writer.step(workingsWords.low(name), enclosed('MIN'), how),
    high: writer.step(workingsWords.high(name), enclosed('MAX'), how),
  };
}
