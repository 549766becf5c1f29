import type { Expression } from '../law/expression.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { plainEnds } from './constantEnds.ts';
import type { ConstantCells } from './constantSteps.ts';
import { refittedDerivative } from './constantUncertainty.ts';
import { coverageSteps } from './coverageSteps.ts';
import { type Desk, type ReadingColumns, rowFormula, sumOfProducts, whenUsed } from './desk.ts';
import { differentiate } from './differentiate.ts';
import type { PlanWriter } from './planWriter.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** Cells of a direct fit: its constants, and the coverage factor where there is one. */
export interface DirectCells {
  readonly constants: readonly ConstantCells[];
  readonly factor: string | null;
}

/**
 * Writes the final iteration of a direct fit: residuals and derivatives at the constants it arrived at, these columns
 * made orthogonal, the step they still ask for, and the covariance.
 * @see Björck (1996), Numerical Methods for Least Squares Problems, 2.4 (modified Gram–Schmidt)
 */
export function directSteps(desk: Desk, columns: ReadingColumns, curve: Expression): DirectCells {
  const { fit, writer } = desk;
  const { law } = fit;
  const names = law.unknown;
  writer.section(workingsWords.direct());
  writer.notes(workingsWords.directHow());
  const arrived = names.map((name) => {
    const value = fit.values[law.constants.indexOf(name)] ?? Number.NaN;
    const cell = writer.given(workingsWords.arrived(name), value, workingsWords.arrivedHow(name));
    desk.constantCells.set(name, cell);
    return cell;
  });
  const { taking, y } = columns;
  const column = (header: string, how: string, formula: (row: number) => string): PlanColumn =>
    writer.column(header, how, (_, row) => whenUsed(taking, row, formula(row)));
  const fitted = column(workingsWords.fitted(law.response), workingsWords.fittedHow(law.response), (row) =>
    rowFormula(desk, columns, curve, row),
  );
  const { kind } = fit.settings.spreadY;
  const root = column(
    workingsWords.rootWeight(),
    workingsWords.rootWeightHow(law.response, columns.uY === null ? kind : 'known'),
    (row) => {
      if (columns.uY !== null) return `1/${columns.uY.at(row)}`;
      return kind === 'proportional' ? `1/ABS(${y.at(row)})` : '1';
    },
  );
  const residual = column(
    workingsWords.weightedResidual(),
    workingsWords.weightedResidualHow(law.response),
    (row) => `${root.at(row)}*(${y.at(row)}-${fitted.at(row)})`,
  );
  const jacobian = names.map((name) => {
    const derivative = differentiate(curve, name);
    return column(
      workingsWords.derivative(law.response, name),
      workingsWords.jacobianHow(name, law.response),
      (row) => `${root.at(row)}*(${rowFormula(desk, columns, derivative, row)})`,
    );
  });
  const { basis, triangle } = orthogonalSteps(writer, jacobian, column);
  const steps = backSubstitution(
    writer,
    triangle,
    basis.map((q, k) =>
      writer.step(
        workingsWords.projection(k + 1),
        sumOfProducts(q, residual),
        workingsWords.projectionHow(k + 1),
      ),
    ),
    (k) => workingsWords.lastStep(names[k] ?? ''),
  );
  const values = names.map((name, k) =>
    writer.step(name, `${arrived[k]}+${steps[k]}`, workingsWords.settledHow(name)),
  );
  names.forEach((name, k) => {
    desk.constantCells.set(name, values[k] ?? '');
  });
  return uncertaintySteps(desk, taking, residual, triangle, values);
}

/** Makes columns orthogonal one after the other, and keeps their lengths and shares. */
function orthogonalSteps(
  writer: PlanWriter,
  jacobian: readonly PlanColumn[],
  column: (header: string, how: string, formula: (row: number) => string) => PlanColumn,
): { readonly basis: PlanColumn[]; readonly triangle: string[][] } {
  const basis: PlanColumn[] = [];
  const triangle: string[][] = [];
  jacobian.forEach((own, k) => {
    let rest = own;
    const shares: string[] = [];
    basis.forEach((q, j) => {
      const share = writer.step(
        workingsWords.overlap(j + 1, k + 1),
        sumOfProducts(q, rest),
        workingsWords.overlapHow(j + 1, k + 1),
      );
      shares.push(share);
      const before = rest;
      rest = column(
        workingsWords.reduced(k + 1, j + 1),
        workingsWords.reducedHow(k + 1, j + 1),
        (row) => `${before.at(row)}-${share}*${q.at(row)}`,
      );
    });
    const length = writer.step(
      workingsWords.overlap(k + 1, k + 1),
      `SQRT(${sumOfProducts(rest, rest)})`,
      workingsWords.overlapHow(k + 1, k + 1),
    );
    triangle.push([...shares, length]);
    const last = rest;
    basis.push(
      column(
        workingsWords.orthogonal(k + 1),
        workingsWords.orthogonalHow(k + 1),
        (row) => `${last.at(row)}/${length}`,
      ),
    );
  });
  return { basis, triangle };
}

/** Solves the triangle from the last unknown to the first. `triangle[k][j]` is row j, column k. */
function backSubstitution(
  writer: PlanWriter,
  triangle: readonly (readonly string[])[],
  right: readonly string[],
  label: (k: number) => string,
): string[] {
  const solved: string[] = [];
  for (let k = right.length - 1; k >= 0; k--) {
    const others = right
      .map((_, j) => (j > k ? `-${triangle[j]?.[k]}*${solved[j]}` : ''))
      .filter((part) => part !== '')
      .join('');
    solved[k] = writer.step(
      label(k),
      `(${right[k]}${others})/${triangle[k]?.[k]}`,
      workingsWords.lastStepHow(),
    );
  }
  return solved;
}

function uncertaintySteps(
  desk: Desk,
  taking: PlanColumn,
  residual: PlanColumn,
  triangle: readonly (readonly string[])[],
  values: readonly string[],
): DirectCells {
  const { fit, writer } = desk;
  const names = fit.law.unknown;
  const squares = writer.step(
    workingsWords.squares(),
    sumOfProducts(residual, residual),
    workingsWords.sumHow('ω r²'),
  );
  const freedom = writer.step(
    workingsWords.freedom(),
    `SUM(${taking.range})-${names.length}`,
    workingsWords.freedomDirectHow(names.length),
  );
  const factor = coverageSteps(desk, freedom);
  if (factor === null) {
    writer.notes(workingsWords.noFreedom());
    const constants = names.map((name, k) => ({
      name,
      value: values[k] ?? '',
      standardUncertainty: null,
      low: null,
      high: null,
      carried: false,
    }));
    return { constants, factor };
  }
  const estimated = fit.coverage.distribution === 't';
  const scale = writer.step(
    workingsWords.scale(),
    estimated ? `${squares}/${freedom}` : '1',
    estimated ? workingsWords.scaleEstimatedHow() : workingsWords.scaleKnownHow(),
  );
  const inverse = inverseSteps(writer, triangle);
  const constants = names.map((name, k) => {
    const row = inverse[k]?.filter((cell) => cell !== '') ?? [];
    const parts = [`${scale}*SUMSQ(${row.join(',')})`];
    const said = [workingsWords.varianceDirect()];
    for (const [known, cell] of desk.uncertaintyCells) {
      const total = refittedDerivative(desk, known, name);
      if (total === null) continue;
      parts.push(`(${total}*${cell})^2`);
      said.push(workingsWords.propagatedKnown(name, known));
    }
    const variance = writer.step(`u²(${name})`, parts.join('+'), workingsWords.varianceConstantHow(said));
    const standardUncertainty = writer.step(
      workingsWords.standardUncertainty(name),
      `SQRT(${variance})`,
      workingsWords.rootHow(`u²(${name})`),
    );
    const value = values[k] ?? '';
    const ends = plainEnds(desk, name, value, standardUncertainty, factor);
    return { name, value, standardUncertainty, ...ends, carried: false };
  });
  return { constants, factor };
}

/** The inverse of the triangle, row by row; empty below the diagonal. */
function inverseSteps(writer: PlanWriter, triangle: readonly (readonly string[])[]): string[][] {
  const size = triangle.length;
  const inverse: string[][] = triangle.map(() => Array.from({ length: size }, () => ''));
  for (let k = 0; k < size; k++) {
    for (let j = k; j >= 0; j--) {
      const own = triangle[j]?.[j];
      const sum = Array.from(
        { length: k - j },
        (_, i) => `${triangle[j + 1 + i]?.[j]}*${inverse[j + 1 + i]?.[k]}`,
      );
      const formula = j === k ? `1/${own}` : `-(${sum.join('+')})/${own}`;
      const row = inverse[j];
      if (row !== undefined) {
        row[k] = writer.step(workingsWords.inverse(j + 1, k + 1), formula, workingsWords.inverseHow());
      }
    }
  }
  return inverse;
}
