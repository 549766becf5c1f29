import { workingsWords } from '../words/workingsWords.ts';
import type { AxisColumns } from './axisColumns.ts';
import { constantFormula, type Desk, sumOfProducts, whenUsed } from './desk.ts';
import { differentiate } from './differentiate.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** Cells of a fitted line. */
export interface LineCells {
  readonly slope: string;
  /** The intercept; absent (null) for a line through the origin. */
  readonly intercept: string | null;
  readonly held: boolean;
  readonly count: string;
  readonly freedom: string;
  readonly scale: string;
  readonly sumOfSquares: string;
  /** From the readings alone; absent without degrees of freedom. */
  readonly varianceSlope: string | null;
  readonly varianceIntercept: string | null;
  readonly covariance: string | null;
  readonly uSlope: string | null;
  readonly uIntercept: string | null;
  readonly columns: AxisColumns;
  readonly residual: PlanColumn;
  /** Σ w, weighted mean of X and Σ w (X − X̄)² or, for a held intercept, Σ w X². */
  readonly total: string;
  readonly meanX: string;
  readonly spread: string;
  readonly deviationX: PlanColumn;
  readonly deviationY: PlanColumn;
}

/** Writes the weighted sums and the line that they give. */
export function lineSteps(desk: Desk, columns: AxisColumns): LineCells {
  const { fit, writer } = desk;
  const { horizontal, vertical, weight, use } = columns;
  const held = fit.settings.options.intercept === 'held' || fit.form.proportional;
  writer.section(workingsWords.sums());
  const count = writer.step(workingsWords.count(), `SUM(${use.range})`, workingsWords.countHow());
  const total = writer.step('Σ w', `SUM(${weight.range})`, workingsWords.totalWeightHow());
  const meanX = writer.step('X̄', `${sumOfProducts(weight, horizontal)}/${total}`, workingsWords.meanHow('X'));
  const meanY = writer.step('Ȳ', `${sumOfProducts(weight, vertical)}/${total}`, workingsWords.meanHow('Y'));
  const deviationX = writer.column('X − X̄', workingsWords.deviationHow('X'), (_, row) =>
    whenUsed(use, row, `${horizontal.at(row)}-${meanX}`),
  );
  const deviationY = writer.column('Y − Ȳ', workingsWords.deviationHow('Y'), (_, row) =>
    whenUsed(use, row, `${vertical.at(row)}-${meanY}`),
  );
  const shared = { count, total, meanX, deviationX, deviationY, columns, held };
  return held ? heldLine(desk, shared) : freeLine(desk, shared, meanY);
}

type Shared = Pick<LineCells, 'count' | 'total' | 'meanX' | 'deviationX' | 'deviationY' | 'columns' | 'held'>;

function freeLine(desk: Desk, shared: Shared, meanY: string): LineCells {
  const { writer } = desk;
  const { total, meanX, deviationX, deviationY, columns } = shared;
  const { weight, use } = columns;
  const xx = 'Σ w (X − X̄)²';
  const xy = 'Σ w (X − X̄)(Y − Ȳ)';
  const spread = writer.step(
    xx,
    sumOfProducts(weight, deviationX, deviationX),
    workingsWords.sumHow(xx.slice(2)),
  );
  const product = writer.step(
    xy,
    sumOfProducts(weight, deviationX, deviationY),
    workingsWords.sumHow(xy.slice(2)),
  );
  writer.section(workingsWords.line());
  const slope = writer.step(workingsWords.slope(), `${product}/${spread}`, workingsWords.slopeHow());
  const intercept = writer.step(
    workingsWords.intercept(),
    `${meanY}-${slope}*${meanX}`,
    workingsWords.interceptHow(),
  );
  const residual = writer.column(workingsWords.residual(), workingsWords.residualHow(), (_, row) =>
    whenUsed(use, row, `${deviationY.at(row)}-${slope}*${deviationX.at(row)}`),
  );
  const scatter = scatterSteps(desk, shared, residual, 2);
  const cells = { ...shared, slope, intercept, spread, residual, ...scatter };
  if (!(desk.fit.line.degreesOfFreedom > 0)) {
    writer.notes(workingsWords.noFreedom());
    return { ...cells, ...NOTHING };
  }
  const { scale } = scatter;
  const varianceSlope = writer.step(
    workingsWords.varianceSlope(),
    `${scale}/${spread}`,
    workingsWords.varianceSlopeHow(),
  );
  const varianceIntercept = writer.step(
    workingsWords.varianceIntercept(),
    `${scale}*(1/${total}+${meanX}^2/${spread})`,
    workingsWords.varianceInterceptHow(),
  );
  const covariance = writer.step(
    workingsWords.covariance(),
    `-${scale}*${meanX}/${spread}`,
    workingsWords.covarianceHow(),
  );
  const root = (of: string, cell: string): string =>
    writer.step(workingsWords.standardUncertainty(of), `SQRT(${cell})`, workingsWords.rootHow(`u²(${of})`));
  const uSlope = root('slope', varianceSlope);
  const uIntercept = root('intercept', varianceIntercept);
  writer.step(
    workingsWords.correlation(),
    `${covariance}/(${uSlope}*${uIntercept})`,
    workingsWords.correlationHow(),
  );
  return { ...cells, varianceSlope, varianceIntercept, covariance, uSlope, uIntercept };
}

const NOTHING = {
  varianceSlope: null,
  varianceIntercept: null,
  covariance: null,
  uSlope: null,
  uIntercept: null,
} as const;

function heldLine(desk: Desk, shared: Shared): LineCells {
  const { fit, writer } = desk;
  const { columns } = shared;
  const { weight, horizontal, vertical, use } = columns;
  const { form } = fit;
  const xx = 'Σ w X²';
  const spread = writer.step(xx, sumOfProducts(weight, horizontal, horizontal), workingsWords.sumHow('w X²'));
  writer.section(workingsWords.line());
  const intercept = form.proportional
    ? null
    : writer.step(
        workingsWords.intercept(),
        constantFormula(desk, form.interceptOf.expression),
        workingsWords.heldHow(form.intercept),
      );
  if (intercept === null) writer.notes(workingsWords.absentHow());
  const sumXY = sumOfProducts(weight, horizontal, vertical);
  const top = intercept === null ? sumXY : `(${sumXY}-${intercept}*${sumOfProducts(weight, horizontal)})`;
  const slope = writer.step(
    workingsWords.slope(),
    `${top}/${spread}`,
    intercept === null ? workingsWords.slopeOriginHow() : workingsWords.slopeHeldHow(),
  );
  const residual = writer.column(workingsWords.residual(), workingsWords.residualHow(), (_, row) =>
    whenUsed(
      use,
      row,
      `${vertical.at(row)}-${intercept === null ? '' : `${intercept}-`}${slope}*${horizontal.at(row)}`,
    ),
  );
  const scatter = scatterSteps(desk, shared, residual, 1);
  const cells = { ...shared, slope, intercept, spread, residual, ...scatter };
  if (!(fit.line.degreesOfFreedom > 0)) {
    writer.notes(workingsWords.noFreedom());
    return { ...cells, ...NOTHING };
  }
  const varianceSlope = writer.step(
    workingsWords.varianceSlope(),
    `${scatter.scale}/${spread}`,
    workingsWords.varianceSlopeOneHow(),
  );
  const inherited = intercept === null ? null : heldVariance(desk);
  if (inherited === null) {
    const uSlope = writer.step(
      workingsWords.standardUncertainty('slope'),
      `SQRT(${varianceSlope})`,
      workingsWords.rootHow('u²(slope)'),
    );
    return { ...cells, ...NOTHING, varianceSlope, uSlope };
  }
  const uIntercept = writer.step(
    workingsWords.standardUncertainty('intercept'),
    `SQRT(${inherited})`,
    workingsWords.rootHow('u²(intercept)'),
  );
  const share = `${sumOfProducts(weight, horizontal)}/${spread}`;
  const uSlope = writer.step(
    workingsWords.standardUncertainty('slope'),
    `SQRT(${varianceSlope}+(${share})^2*${inherited})`,
    workingsWords.rootHow(workingsWords.heldSlopeHow()),
  );
  return { ...cells, ...NOTHING, varianceSlope, uSlope, uIntercept };
}

/** u²(a) that a held intercept inherits from uncertain known constants; null when all are exact. */
export function heldVariance(desk: Desk): string | null {
  const { fit, writer, uncertaintyCells } = desk;
  const terms: string[] = [];
  for (const [name, cell] of uncertaintyCells) {
    const derivative = differentiate(fit.form.interceptOf.expression, name);
    if (derivative.kind === 'number' && derivative.value === 0) continue;
    terms.push(`(${constantFormula(desk, derivative)}*${cell})^2`);
  }
  if (terms.length === 0) return null;
  return writer.step(workingsWords.varianceIntercept(), terms.join('+'), workingsWords.heldVarianceHow());
}

function scatterSteps(
  desk: Desk,
  { count, columns }: Shared,
  residual: PlanColumn,
  terms: 1 | 2,
): Pick<LineCells, 'sumOfSquares' | 'freedom' | 'scale'> {
  const { fit, writer } = desk;
  const sumOfSquares = writer.step(
    'Σ w r²',
    sumOfProducts(columns.weight, residual, residual),
    workingsWords.sumHow('w r²'),
  );
  const freedom = writer.step(workingsWords.freedom(), `${count}-${terms}`, workingsWords.freedomHow(terms));
  const estimated = fit.line.scale === 'estimated';
  const scale =
    estimated && !(fit.line.degreesOfFreedom > 0)
      ? ''
      : writer.step(
          workingsWords.scale(),
          estimated ? `${sumOfSquares}/${freedom}` : '1',
          estimated ? workingsWords.scaleEstimatedHow() : workingsWords.scaleKnownHow(),
        );
  return { sumOfSquares, freedom, scale };
}
