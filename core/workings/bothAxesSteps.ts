import { workingsWords } from '../words/workingsWords.ts';
import { type AxisColumns, expressionColumn } from './axisColumns.ts';
import { constantFormula, type Desk, sumOfProducts, whenUsed } from './desk.ts';
import { differentiate } from './differentiate.ts';
import { heldVariance, type LineCells } from './lineSteps.ts';
import type { PlanColumn } from './sheetPlan.ts';

interface Deviations {
  readonly horizontal: PlanColumn;
  readonly vertical: PlanColumn;
  readonly covariance: PlanColumn;
}

/**
 * Writes the final iteration of a line with errors on both axes.
 * @see York, Evensen, Martínez & Delgado (2004), Am. J. Phys. 72, 367, eq. 13
 */
export function bothAxesSteps(desk: Desk, axes: Omit<AxisColumns, 'weight'>): LineCells {
  const { fit, writer } = desk;
  const { use, horizontal, vertical } = axes;
  const column = (header: string, how: string, formula: (row: number) => string): PlanColumn =>
    writer.column(header, how, (_, row) => whenUsed(use, row, formula(row)));
  const squares = deviationColumns(desk, axes, column);
  writer.section(workingsWords.bothAxes());
  writer.notes(workingsWords.bothAxesHow());
  const before = writer.given(workingsWords.slopeIn(), fit.line.slope, workingsWords.slopeInHow());
  const weight = column(workingsWords.weight(), workingsWords.weightBothHow(), (row) => {
    const [h, v, c] = [squares.horizontal, squares.vertical, squares.covariance].map((one) => one.at(row));
    return `1/(${v}+${before}^2*${h}-2*${before}*${c})`;
  });
  const columns: AxisColumns = { ...axes, weight };
  const count = writer.step(workingsWords.count(), `SUM(${use.range})`, workingsWords.countHow());
  const total = writer.step('Σ w', `SUM(${weight.range})`, workingsWords.totalWeightHow());
  const held = fit.settings.options.intercept === 'held' || fit.form.proportional;
  const heldAt =
    !held || fit.form.proportional
      ? null
      : writer.step(
          workingsWords.intercept(),
          constantFormula(desk, fit.form.interceptOf.expression),
          workingsWords.heldHow(fit.form.intercept),
        );
  const meanX = held
    ? '0'
    : writer.step('X̄', `${sumOfProducts(weight, horizontal)}/${total}`, workingsWords.meanHow('X'));
  const meanY = held
    ? (heldAt ?? '0')
    : writer.step('Ȳ', `${sumOfProducts(weight, vertical)}/${total}`, workingsWords.meanHow('Y'));
  const deviationX = column(
    held ? 'X' : 'X − X̄',
    workingsWords.deviationHow('X'),
    (row) => `${horizontal.at(row)}-${meanX}`,
  );
  const deviationY = column(
    held ? 'Y − a' : 'Y − Ȳ',
    workingsWords.deviationHow('Y'),
    (row) => `${vertical.at(row)}-${meanY}`,
  );
  const beta = column('β', workingsWords.betaHow(), (row) => {
    const [h, v, c] = [squares.horizontal, squares.vertical, squares.covariance].map((one) => one.at(row));
    const [x, y] = [deviationX.at(row), deviationY.at(row)];
    return `${weight.at(row)}*(${x}*${v}+${before}*${y}*${h}-(${before}*${x}+${y})*${c})`;
  });
  const slope = writer.step(
    workingsWords.slope(),
    `${sumOfProducts(weight, beta, deviationY)}/${sumOfProducts(weight, beta, deviationX)}`,
    workingsWords.slopeBothHow(),
  );
  const intercept = held
    ? heldAt
    : writer.step(workingsWords.intercept(), `${meanY}-${slope}*${meanX}`, workingsWords.interceptHow());
  const residual = column(
    workingsWords.residual(),
    workingsWords.residualHow(),
    (row) => `${deviationY.at(row)}-${slope}*${deviationX.at(row)}`,
  );
  const sumOfSquares = writer.step(
    'Σ w r²',
    sumOfProducts(weight, residual, residual),
    workingsWords.sumHow('w r²'),
  );
  const terms = held ? 1 : 2;
  const freedom = writer.step(workingsWords.freedom(), `${count}-${terms}`, workingsWords.freedomHow(terms));
  const scale = writer.step(workingsWords.scale(), '1', workingsWords.scaleKnownHow());
  const spread = writer.step(
    held ? 'Σ w X²' : 'Σ w (X − X̄)²',
    sumOfProducts(weight, deviationX, deviationX),
    workingsWords.sumHow(held ? 'w X²' : 'w (X − X̄)²'),
  );
  const cells = {
    slope,
    intercept,
    held,
    count,
    freedom,
    scale,
    sumOfSquares,
    columns,
    residual,
    total,
    meanX,
    spread,
    deviationX,
    deviationY,
  };
  return { ...cells, ...uncertaintySteps(desk, cells, beta) };
}

/** Variances of X and Y and their covariance at every reading, to first order. */
function deviationColumns(
  desk: Desk,
  axes: Omit<AxisColumns, 'weight'>,
  column: (header: string, how: string, formula: (row: number) => string) => PlanColumn,
): Deviations {
  const { law, form } = desk.fit;
  const { uX, uY } = axes;
  const derivative = (axis: 'X' | 'Y', by: string): PlanColumn | null =>
    expressionColumn(
      desk,
      axes,
      workingsWords.derivative(axis, by),
      workingsWords.derivativeHow(axis, by),
      differentiate((axis === 'X' ? form.horizontal : form.vertical).expression, by),
    );
  const [xx, xy] = [derivative('X', law.predictor), derivative('X', law.response)];
  const [yx, yy] = [derivative('Y', law.predictor), derivative('Y', law.response)];
  const product = (
    [a, b]: readonly [PlanColumn | null, PlanColumn | null],
    u: PlanColumn | null,
    row: number,
  ): string => (a === null || b === null || u === null ? '' : `${a.at(row)}*${b.at(row)}*${u.at(row)}^2`);
  const sum = (
    byX: readonly [PlanColumn | null, PlanColumn | null],
    byY: readonly [PlanColumn | null, PlanColumn | null],
    row: number,
  ): string => {
    const parts = [product(byX, uX, row), product(byY, uY, row)].filter((part) => part !== '');
    return parts.length === 0 ? '0' : parts.join('+');
  };
  return {
    horizontal: column('u²(X)', workingsWords.varianceAxisHow('X'), (row) => sum([xx, xx], [xy, xy], row)),
    vertical: column('u²(Y)', workingsWords.varianceAxisHow('Y'), (row) => sum([yx, yx], [yy, yy], row)),
    covariance: column('u(X, Y)', workingsWords.covarianceAxesHow(), (row) => sum([xx, yx], [xy, yy], row)),
  };
}

function uncertaintySteps(
  desk: Desk,
  line: Pick<LineCells, 'columns' | 'held' | 'meanX' | 'total'>,
  beta: PlanColumn,
): Pick<LineCells, 'varianceSlope' | 'varianceIntercept' | 'covariance' | 'uSlope' | 'uIntercept'> {
  const { fit, writer } = desk;
  const { weight, use } = line.columns;
  if (!(fit.line.degreesOfFreedom > 0)) {
    writer.notes(workingsWords.noFreedom());
    return { varianceSlope: null, varianceIntercept: null, covariance: null, uSlope: null, uIntercept: null };
  }
  const root = (of: string, cell: string): string =>
    writer.step(workingsWords.standardUncertainty(of), `SQRT(${cell})`, workingsWords.rootHow(`u²(${of})`));
  if (line.held) {
    const varianceSlope = writer.step(
      workingsWords.varianceSlope(),
      `1/${sumOfProducts(weight, beta, beta)}`,
      workingsWords.varianceSlopeBothHow(),
    );
    const inherited = fit.form.proportional ? null : heldVariance(desk);
    const none = { varianceSlope, varianceIntercept: null, covariance: null };
    if (inherited === null) return { ...none, uSlope: root('slope', varianceSlope), uIntercept: null };
    const share = `${sumOfProducts(weight, beta)}/${sumOfProducts(weight, beta, beta)}`;
    return {
      ...none,
      uSlope: writer.step(
        workingsWords.standardUncertainty('slope'),
        `SQRT(${varianceSlope}+(${share})^2*${inherited})`,
        workingsWords.rootHow(workingsWords.heldSlopeBothHow()),
      ),
      uIntercept: root('intercept', inherited),
    };
  }
  const meanBeta = writer.step(
    'β̄',
    `${sumOfProducts(weight, beta)}/${line.total}`,
    workingsWords.meanHow('β'),
  );
  const adjusted = writer.column('β − β̄', workingsWords.deviationHow('β'), (_, row) =>
    whenUsed(use, row, `${beta.at(row)}-${meanBeta}`),
  );
  const varianceSlope = writer.step(
    workingsWords.varianceSlope(),
    `1/${sumOfProducts(weight, adjusted, adjusted)}`,
    workingsWords.varianceSlopeBothHow(),
  );
  const varianceIntercept = writer.step(
    workingsWords.varianceIntercept(),
    `1/${line.total}+(${line.meanX}+${meanBeta})^2*${varianceSlope}`,
    workingsWords.varianceInterceptBothHow(),
  );
  const covariance = writer.step(
    workingsWords.covariance(),
    `-(${line.meanX}+${meanBeta})*${varianceSlope}`,
    workingsWords.covarianceBothHow(),
  );
  const uSlope = root('slope', varianceSlope);
  return {
    varianceSlope,
    varianceIntercept,
    covariance,
    uSlope,
    uIntercept: root('intercept', varianceIntercept),
  };
}
