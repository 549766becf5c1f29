import type { Fit } from '../fit/fit.ts';
import type { Expression } from '../law/expression.ts';
import { expressionFormula } from './expressionFormula.ts';
import type { PlanWriter } from './planWriter.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** Where the workings find their inputs, and how they call the live functions. */
export interface WorkingsSource {
  /** What was measured, for the title. */
  readonly title: string;
  /** The cells of a pair, by its 1-based position, as formulas name them: `Weir!$A$6`. */
  readonly x: (position: number) => string;
  readonly y: (position: number) => string;
  /** The cells of a range of uncertainties, where one is given. */
  readonly uY: ((position: number) => string) | null;
  readonly uX: ((position: number) => string) | null;
  /**
   * A call of a live function with the readings, the law and the settings, as a formula without `=`.
   * @param own the function's own arguments, as formulas
   */
  readonly call: (name: string, own: readonly string[]) => string;
}

/** What the parts of the workings share while they are written. */
export interface Desk {
  readonly fit: Fit;
  readonly source: WorkingsSource;
  readonly writer: PlanWriter;
  /** Cells of the constants (known ones first, the others once they are settled), by symbol. */
  readonly constantCells: Map<string, string>;
  /** Cells of the known constants' standard uncertainties, by symbol. */
  readonly uncertaintyCells: Map<string, string>;
  readonly coverage: string;
  /** The stated uncertainty of y or of x: a number or a fraction; empty when there is none. */
  readonly statedY: string;
  readonly statedX: string;
}

/** The table's columns that every part refers to. */
export interface ReadingColumns {
  readonly x: PlanColumn;
  readonly y: PlanColumn;
  readonly uY: PlanColumn | null;
  readonly uX: PlanColumn | null;
  /** 1 where the pair of cells is a reading that takes part. */
  readonly taking: PlanColumn;
}

/** An expression of constants alone as a formula over their cells. */
export function constantFormula(
  { constantCells }: Pick<Desk, 'constantCells'>,
  expression: Expression,
): string {
  return expressionFormula(expression, (name) => constantCells.get(name) ?? 'NA()');
}

/** An expression of the readings and constants as a formula for one row of the table. */
export function rowFormula(
  desk: Pick<Desk, 'constantCells' | 'fit'>,
  { x, y }: Pick<ReadingColumns, 'x' | 'y'>,
  expression: Expression,
  row: number,
): string {
  const { law } = desk.fit;
  return expressionFormula(expression, (name) => {
    if (name === law.predictor) return x.at(row);
    if (name === law.response) return y.at(row);
    return desk.constantCells.get(name) ?? 'NA()';
  });
}

/** A formula for the rows in use only. */
export function whenUsed(use: PlanColumn, row: number, formula: string): string {
  return `IF(${use.at(row)}=0,"",${formula})`;
}

/** Σ of the products of columns. */
export function sumOfProducts(...columns: readonly PlanColumn[]): string {
  return `SUMPRODUCT(${columns.map(({ range }) => range).join(',')})`;
}
