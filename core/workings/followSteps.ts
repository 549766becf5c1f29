import type { TermsInUse } from '../constants/usedTerms.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { constantFormula, type Desk } from './desk.ts';
import { differentiate } from './differentiate.ts';
import type { LineCells } from './lineSteps.ts';
import { isNumber } from './plainExpression.ts';

/** How a constant follows the line's terms: cells, null where it does not. */
export interface Follows {
  readonly slope: string | null;
  readonly intercept: string | null;
}

/** Writes the derivatives of the line's terms by the constants and, from their inverse, how the constants follow. */
export function followSteps(
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
