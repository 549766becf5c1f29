import type { Fit } from '../fit/fit.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { axisColumns, weightColumn } from './axisColumns.ts';
import { bothAxesSteps } from './bothAxesSteps.ts';
import { type Compared, comparisonSteps } from './comparisonSteps.ts';
import { type ConstantCells, constantSteps } from './constantSteps.ts';
import { coverageSteps } from './coverageSteps.ts';
import { derivedSteps } from './derivedSteps.ts';
import type { Desk, ReadingColumns, WorkingsSource } from './desk.ts';
import { directSteps } from './directSteps.ts';
import { givenSteps, readingColumns } from './givenSteps.ts';
import { knownSteps } from './knownSteps.ts';
import { type LineCells, lineSteps } from './lineSteps.ts';
import { textLiteral } from './literals.ts';
import { PlanWriter } from './planWriter.ts';
import type { SheetPlan } from './sheetPlan.ts';
import { type StraightnessCells, straightnessSteps } from './straightnessSteps.ts';

/**
 * Plans a sheet that derives a fit's results anew from the cells of its readings with ordinary spreadsheet functions,
 * step by step with a line of explanation beside each, and compares them with the live functions at the end.
 * @param fit the fit of all readings in the cells
 * @param source where the readings are, and how the live functions are called
 */
export function workings(fit: Fit, source: WorkingsSource): SheetPlan {
  const writer = new PlanWriter(fit.readings.count);
  const { law, form } = fit;
  const equation = law.name === '' ? law.equation : `${law.name}, ${law.equation}`;
  writer.title([
    workingsWords.title(source.title),
    workingsWords.law(equation),
    workingsWords.form(form.plot, form.against),
    workingsWords.recalculates(),
  ]);
  const desk = givenSteps(fit, source, writer);
  const readings = readingColumns(desk);
  if (fit.direct !== null && law.curve !== null) {
    const { constants, factor } = directSteps(desk, readings, law.curve.expression);
    const all = [...constants, ...derivedSteps(desk, constants, factor)];
    finish(desk, lineOfDirect(desk, readings), all);
  } else {
    const line = lineOf(desk, readings);
    const factor = coverageSteps(desk, line.freedom);
    const known = fit.coverage.degreesOfFreedom > 0 ? knownSteps(desk, line) : [];
    const constants = constantSteps(desk, line, known, factor);
    finish(desk, line, [...constants, ...derivedSteps(desk, constants, factor)]);
  }
  return writer.plan();
}

function lineOf(desk: Desk, readings: ReadingColumns): LineCells {
  const axes = axisColumns(desk, readings);
  if (desk.fit.settings.spreadX.kind !== 'none') return bothAxesSteps(desk, axes);
  return lineSteps(desk, weightColumn(desk, axes));
}

/** The line that goes with a direct fit; null where too few readings can be drawn on the straight axes. */
function lineOfDirect(desk: Desk, readings: ReadingColumns): LineCells | null {
  try {
    void desk.fit.line;
  } catch {
    // The direct fit stands without a line: there is none to derive.
    return null;
  }
  return lineOf(desk, readings);
}

function finish(desk: Desk, line: LineCells | null, constants: readonly ConstantCells[]): void {
  const { fit, writer } = desk;
  const straightness = line === null ? null : straightnessSteps(desk, line);
  const sampled = fit.settings.options.interval === 'montecarlo';
  if (sampled) writer.notes(workingsWords.sampledNote());
  comparisonSteps(writer, [
    ...(line === null ? [] : lineCompared(desk, line)),
    ...constants.flatMap((constant) => constantCompared(desk, constant, sampled)),
    ...(straightness === null ? [] : straightnessCompared(desk, straightness)),
  ]);
}

/** One cell of a live function's table. */
function cellOfTable({ source }: Desk, name: string, row: number, column: number): string {
  return `INDEX(${source.call(name, [])},${row},${column})`;
}

function lineCompared(desk: Desk, line: LineCells): Compared[] {
  const pairs: Compared[] = [];
  const add = (label: string, own: string | null, row: number, column: number): void => {
    if (own !== null) pairs.push({ label, own, live: cellOfTable(desk, 'LINE', row, column) });
  };
  add(workingsWords.slope(), line.slope, 2, 2);
  add(workingsWords.standardUncertainty('slope'), line.uSlope, 2, 3);
  add(workingsWords.intercept(), line.intercept, 3, 2);
  add(workingsWords.standardUncertainty('intercept'), line.uIntercept, 3, 3);
  return pairs;
}

function constantCompared({ fit, source }: Desk, cells: ConstantCells, sampled: boolean): Compared[] {
  const { name } = cells;
  const estimate = fit.constants.find((one) => one.name === name);
  const pairs: Compared[] = [];
  const add = (label: string, own: string | null, part: string, value: number | undefined): void => {
    // What the live function leaves empty is not compared.
    if (own === null || !Number.isFinite(value)) return;
    pairs.push({ label, own, live: source.call('CONSTANT', [textLiteral(name), textLiteral(part)]) });
  };
  add(name, cells.value, 'value', estimate?.value);
  add(workingsWords.standardUncertainty(name), cells.standardUncertainty, 'u', estimate?.standardUncertainty);
  if (sampled) return pairs;
  add(workingsWords.low(name), cells.low, 'low', estimate?.low);
  add(workingsWords.high(name), cells.high, 'high', estimate?.high);
  return pairs;
}

function straightnessCompared(desk: Desk, cells: StraightnessCells): Compared[] {
  const live = (row: number): string => cellOfTable(desk, 'STRAIGHTNESS', row, 2);
  const all: readonly (readonly [string, string | null, number])[] = [
    [workingsWords.rSquared(), cells.rSquared, 4],
    [workingsWords.deviation(), cells.deviation, 5],
    [workingsWords.bow(), cells.bow, 6],
  ];
  return all.flatMap(([label, own, row]) => (own === null ? [] : [{ label, own, live: live(row) }]));
}
