import { workingsWords } from '../words/workingsWords.ts';
import { textLiteral } from './literals.ts';
import type { PlanWriter } from './planWriter.ts';

/** A number of the workings and the call of the live function that returns the same. */
export interface Compared {
  readonly label: string;
  readonly own: string;
  readonly live: string;
}

/** Writes the comparison with the live function, and the closing line with the digits that all agree to. */
export function comparisonSteps(writer: PlanWriter, pairs: readonly Compared[]): void {
  writer.section(workingsWords.comparison());
  const [before, after] = workingsWords.agrees();
  const counts = pairs.map(({ label, own, live }) =>
    writer.comparison(
      label,
      live,
      (_, digits) =>
        `IF(ISNUMBER(${digits}),${textLiteral(before)}&${digits}&${textLiteral(after)},${textLiteral(workingsWords.noLive())})`,
      (value) => digitsFormula(own, value),
    ),
  );
  const list = counts.join(',');
  const [open, close] = workingsWords.verdictAgrees();
  writer.verdict(
    workingsWords.verdict(),
    `IF(COUNT(${list})=0,"",MIN(${list}))`,
    (value) =>
      `IF(ISNUMBER(${value}),${textLiteral(open)}&${value}&${textLiteral(close)},${textLiteral(workingsWords.verdictNone())})`,
  );
}

/** Matching significant digits of two cells, at most 15; empty when the live one holds no number. */
function digitsFormula(own: string, live: string): string {
  const error = `ABS(${live}-${own})`;
  return `IF(ISNUMBER(${live}),IF(${live}=${own},15,MAX(0,MIN(15,INT(-LOG10(${error}/MAX(ABS(${live}),ABS(${own}))))))),"")`;
}
