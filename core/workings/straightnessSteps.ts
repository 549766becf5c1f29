import { workingsWords } from '../words/workingsWords.ts';
import { type Desk, sumOfProducts, whenUsed } from './desk.ts';
import type { LineCells } from './lineSteps.ts';

/** Cells of the measures of straightness; null where they do not exist. */
export interface StraightnessCells {
  readonly rSquared: string | null;
  readonly bow: string | null;
  readonly deviation: string | null;
}

/** Writes r squared (errors in y only), the residual standard deviation and the bow. */
export function straightnessSteps(desk: Desk, line: LineCells): StraightnessCells {
  const { fit, writer } = desk;
  const { columns, deviationX, deviationY, total } = line;
  const { weight, use, horizontal, vertical } = columns;
  writer.section(workingsWords.straightness());
  const bothAxes = fit.settings.spreadX.kind !== 'none';
  const whole = line.held
    ? sumOfProducts(weight, vertical, vertical)
    : sumOfProducts(weight, deviationY, deviationY);
  const rSquared = bothAxes
    ? null
    : writer.step(
        workingsWords.rSquared(),
        `1-${line.sumOfSquares}/${whole}`,
        line.held ? workingsWords.rSquaredHeldHow() : workingsWords.rSquaredHow(),
      );
  const deviation =
    fit.line.degreesOfFreedom > 0
      ? writer.step(
          workingsWords.deviation(),
          `SQRT(${line.sumOfSquares}/${line.freedom})`,
          workingsWords.deviationStraightHow(),
        )
      : null;
  // The parabola needs deviations from the mean, which a held line on both axes has none of.
  if (fit.used.length < 4 || (bothAxes && line.held)) return { rSquared, deviation, bow: null };
  const spread = sumOfProducts(weight, deviationX, deviationX);
  const skew = writer.step(
    'α',
    `${sumOfProducts(weight, deviationX, deviationX, deviationX)}/${spread}`,
    workingsWords.bowSkewHow(),
  );
  const mean = writer.step('β', `${spread}/${total}`, workingsWords.bowMeanHow());
  const parabola = writer.column('p', workingsWords.bowShapeHow(), (_, row) =>
    whenUsed(use, row, `${deviationX.at(row)}^2-${skew}*${deviationX.at(row)}-${mean}`),
  );
  const curvature = writer.step(
    workingsWords.curvature(),
    `${sumOfProducts(weight, parabola, line.residual)}/${sumOfProducts(weight, parabola, parabola)}`,
    workingsWords.curvatureHow(),
  );
  const range = `(MAX(${horizontal.range})-MIN(${horizontal.range}))`;
  const bow = writer.step(
    workingsWords.bow(),
    `100*${curvature}*${range}/(4*ABS(${line.slope}))`,
    workingsWords.bowHow(),
  );
  return { rSquared, deviation, bow };
}
