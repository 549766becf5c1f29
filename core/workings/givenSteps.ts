import type { Fit } from '../fit/fit.ts';
import type { Spread } from '../given/given.ts';
import { workingsWords } from '../words/workingsWords.ts';
import type { Desk, ReadingColumns, WorkingsSource } from './desk.ts';
import { whenUsed } from './desk.ts';
import type { PlanWriter } from './planWriter.ts';
import type { PlanColumn } from './sheetPlan.ts';

/** Writes what is given: coverage, known constants, stated uncertainties. */
export function givenSteps(fit: Fit, source: WorkingsSource, writer: PlanWriter): Desk {
  const { law, settings } = fit;
  writer.section(workingsWords.given());
  const coverage = writer.given(
    workingsWords.coverage(),
    settings.options.coverage,
    workingsWords.coverageHow(),
  );
  const constantCells = new Map<string, string>();
  const uncertaintyCells = new Map<string, string>();
  for (const name of law.known) {
    const known = settings.known.get(name);
    const value = known?.value ?? law.builtIn.get(name) ?? Number.NaN;
    const how = known === undefined ? workingsWords.builtInHow(name) : workingsWords.knownHow(name);
    constantCells.set(name, writer.given(workingsWords.known(name), value, how));
    if (known === undefined || known.standardUncertainty === 0) continue;
    const label = workingsWords.knownUncertainty(name);
    const cell = writer.given(label, known.standardUncertainty, workingsWords.knownUncertaintyHow(name));
    uncertaintyCells.set(name, cell);
  }
  return {
    fit,
    source,
    writer,
    constantCells,
    uncertaintyCells,
    coverage,
    statedY: statedSpread(writer, settings.spreadY, law.response),
    statedX: statedSpread(writer, settings.spreadX, law.predictor),
  };
}

function statedSpread(writer: PlanWriter, spread: Spread, symbol: string): string {
  const label = workingsWords.spread(symbol);
  if (spread.kind === 'absolute')
    return writer.given(label, spread.value, workingsWords.spreadAbsolute(symbol));
  if (spread.kind === 'relative')
    return writer.given(label, spread.fraction, workingsWords.spreadRelative(symbol));
  return '';
}

/** Copies the readings by reference: one row per pair of cells. */
export function readingColumns(desk: Desk): ReadingColumns {
  const { fit, source, writer } = desk;
  const { law, settings } = fit;
  writer.section(workingsWords.readings());
  const position = (index: number): number => index + 1;
  writer.column(workingsWords.position(), '', position, 'reading');
  const own: ((position: number) => string)[] = [source.x, source.y];
  if (settings.spreadY.kind === 'each' && source.uY !== null) own.push(source.uY);
  if (settings.spreadX.kind === 'each' && source.uX !== null) own.push(source.uX);
  const complete = (at: number): string =>
    own.map((cell, k) => (k < 2 ? `ISNUMBER(${cell(at)})` : `N(${cell(at)})>0`)).join(',');
  const copied = (cell: (position: number) => string) => (index: number) => {
    const at = position(index);
    return `IF(AND(${complete(at)}),${cell(at)},"")`;
  };
  const x = writer.column(
    law.predictor,
    workingsWords.predictorHow(law.predictor),
    copied(source.x),
    'reading',
  );
  const y = writer.column(law.response, workingsWords.responseHow(law.response), copied(source.y), 'reading');
  const how = settings.options.outside === 'stop' && fit.direct === null;
  const taking = writer.column(
    fit.direct === null ? workingsWords.onLine() : workingsWords.taking(),
    how || fit.direct === null ? workingsWords.onLineHow() : workingsWords.takingHow(),
    (_, row) => `IF(ISNUMBER(${x.at(row)}),1,0)`,
  );
  return {
    x,
    y,
    taking,
    uY: spreadColumn(desk, settings.spreadY, law.response, desk.statedY, y, taking, source.uY),
    uX: spreadColumn(desk, settings.spreadX, law.predictor, desk.statedX, x, taking, source.uX),
  };
}

/** The standard uncertainty of each reading, where one is stated. */
function spreadColumn(
  { writer }: Desk,
  spread: Spread,
  symbol: string,
  stated: string,
  values: PlanColumn,
  taking: PlanColumn,
  cell: ((position: number) => string) | null,
): PlanColumn | null {
  const column = (formula: (index: number, row: number) => string): PlanColumn =>
    writer.column(
      workingsWords.ownUncertainty(symbol),
      workingsWords.ownUncertaintyHow(symbol),
      (index, row) => whenUsed(taking, row, formula(index, row)),
    );
  if (spread.kind === 'absolute') return column(() => stated);
  if (spread.kind === 'relative') return column((_, row) => `${stated}*ABS(${values.at(row)})`);
  if (spread.kind === 'each' && cell !== null) return column((index) => cell(index + 1));
  return null;
}
