import type { Expression } from '../law/expression.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { type Desk, type ReadingColumns, rowFormula, whenUsed } from './desk.ts';
import { differentiate } from './differentiate.ts';
import { isNumber } from './plainExpression.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** The readings on the straight axes. */
export interface AxisColumns extends ReadingColumns {
  /** 1 where the reading is on the line. */
  readonly use: PlanColumn;
  readonly horizontal: PlanColumn;
  readonly vertical: PlanColumn;
  readonly weight: PlanColumn;
}

/** Writes X and Y of every reading on the line. */
export function axisColumns(desk: Desk, columns: ReadingColumns): Omit<AxisColumns, 'weight'> {
  const { fit, writer } = desk;
  const { form, settings } = fit;
  writer.section(workingsWords.axes());
  const horizontalOf = (row: number): string => rowFormula(desk, columns, form.horizontal.expression, row);
  const verticalOf = (row: number): string => rowFormula(desk, columns, form.vertical.expression, row);
  const strict = settings.options.outside === 'stop' && form.trials.length === 0;
  const { taking } = columns;
  const use = strict
    ? taking
    : writer.column(workingsWords.onLine(), workingsWords.onLineDomainHow(), (_, row) => {
        const both = `ISNUMBER(${horizontalOf(row)})*ISNUMBER(${verticalOf(row)})`;
        return `IF(${taking.at(row)}=0,0,1*${both})`;
      });
  const horizontal = writer.column(
    workingsWords.horizontal(form.against),
    workingsWords.horizontalHow(form.against),
    (_, row) => whenUsed(use, row, horizontalOf(row)),
  );
  const vertical = writer.column(
    workingsWords.vertical(form.plot),
    workingsWords.verticalHow(form.plot),
    (_, row) => whenUsed(use, row, verticalOf(row)),
  );
  return { ...columns, use, horizontal, vertical };
}

/** A column with an expression of the readings; null where the expression is zero. */
export function expressionColumn(
  desk: Desk,
  columns: Omit<AxisColumns, 'weight'>,
  header: string,
  how: string,
  expression: Expression,
): PlanColumn | null {
  if (isNumber(expression, 0)) return null;
  return desk.writer.column(header, how, (_, row) =>
    whenUsed(columns.use, row, rowFormula(desk, columns, expression, row)),
  );
}

/** Writes the weight of every reading on the line (errors in y only). */
export function weightColumn(desk: Desk, columns: Omit<AxisColumns, 'weight'>): AxisColumns {
  const { fit, writer } = desk;
  const { law, settings } = fit;
  const { use, y, uY } = columns;
  const { kind } = settings.spreadY;
  if (kind === 'none') {
    const weight = writer.column(workingsWords.weight(), workingsWords.weightOneHow(), (_, row) =>
      whenUsed(use, row, '1'),
    );
    return { ...columns, weight };
  }
  const byResponse = verticalByResponse(desk, columns);
  const how =
    kind === 'equal'
      ? workingsWords.weightEqualHow(law.response)
      : kind === 'proportional'
        ? workingsWords.weightProportionalHow(law.response)
        : workingsWords.weightKnownHow(law.response);
  const scatter = (row: number): string => {
    const derivative = byResponse.at(row);
    if (kind === 'equal') return derivative;
    return `(${kind === 'proportional' ? y.at(row) : (uY?.at(row) ?? 'NA()')}*${derivative})`;
  };
  const weight = writer.column(workingsWords.weight(), how, (_, row) =>
    whenUsed(use, row, `1/${scatter(row)}^2`),
  );
  return { ...columns, weight };
}

/** ∂Y/∂y at every reading on the line. */
function verticalByResponse(desk: Desk, columns: Omit<AxisColumns, 'weight'>): PlanColumn {
  const { law, form } = desk.fit;
  const derivative = differentiate(form.vertical.expression, law.response);
  return desk.writer.column(
    workingsWords.derivative('Y', law.response),
    workingsWords.derivativeHow('Y', law.response),
    (_, row) => whenUsed(columns.use, row, rowFormula(desk, columns, derivative, row)),
  );
}
