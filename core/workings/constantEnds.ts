import { workingsWords } from '../words/workingsWords.ts';
import type { ClosedForm } from './closedForm.ts';
import type { Desk } from './desk.ts';
import type { LineCells } from './lineSteps.ts';
import { termFormula } from './termFormula.ts';

/** Value ± factor times its standard uncertainty. */
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
export function carriedEnds(
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
