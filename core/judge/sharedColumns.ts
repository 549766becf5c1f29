import { indices, lawInputs, PREDICTOR, RESPONSE } from '../fit/columns.ts';
import type { DrawnLine } from '../fit/drawLine.ts';
import { type FitTask, takingPart } from '../fit/fitTask.ts';
import { lineWeightOf } from '../fit/lineWeight.ts';
import { scaleOf } from '../fit/spread.ts';
import { straightAxes } from '../fit/straightAxes.ts';
import type { FitSettings } from '../given/given.ts';
import type { ColumnFunction } from '../law/law.ts';
import { fitLine } from '../line/fitLine.ts';
import type { Readings } from '../readings/readings.ts';
import { sumOfLogarithms } from '../straightness/sumOfLogarithms.ts';

/** An axis column with the question whether every reading has a value on it answered. */
interface AxisColumn {
  readonly values: Float64Array;
  readonly complete: boolean;
}

/**
 * Columns that laws compared on the same readings have in common, such as ln y: evaluated once. Axes that hold constants
 * are not shared.
 */
export class SharedColumns {
  private readonly columns = new Map<string, AxisColumn>();
  private readonly logarithms = new Map<string, number>();
  private part: ReturnType<typeof takingPart> | undefined;

  /** The readings that take part, the same for all laws. */
  taking(readings: Readings, settings: FitSettings): Int32Array {
    this.part ??= takingPart(readings, settings);
    return this.part.taking;
  }

  /**
   * The line of a task as `drawLine` draws it, its columns shared where possible.
   * @returns null when the axes hold constants, a reading lies outside them, or the line is none with a free intercept
   * (or none at all) and errors in y only
   */
  draw(task: FitTask): DrawnLine | null {
    const { law, form, settings, x, y } = task;
    const { options, spreadX, spreadY } = settings;
    if (spreadX.kind !== 'none' || (options.intercept === 'held' && !form.proportional)) return null;
    if (!isOfReadings(form.horizontal) || !isOfReadings(form.vertical)) return null;
    const horizontal = this.column(form.horizontal, form.against, task);
    const vertical = this.column(form.vertical, form.plot, task);
    if (!horizontal.complete || !vertical.complete) return null;
    const n = x.length;
    const inputs = lawInputs(x, y, new Float64Array(law.constants.length));
    const axes = straightAxes(form, inputs, n, horizontal.values, vertical.values);
    const line = fitLine(
      horizontal.values,
      vertical.values,
      lineWeightOf(task, axes),
      scaleOf(spreadY),
      form.proportional ? 'absent' : 'free',
    );
    return { task, used: indices(n), outside: NONE, axes, line };
  }

  /** Σ ln |∂Y/∂y| over the readings on a line. */
  jacobian({ task, axes }: DrawnLine): number {
    const { form, law } = task;
    const { expression } = form.vertical;
    if (expression.kind === 'symbol' && expression.name === law.response) return 0;
    if (!isOfReadings(form.vertical)) return sumOfLogarithms(axes.verticalByY);
    const key = keyOf(form.plot, task);
    const found = this.logarithms.get(key) ?? sumOfLogarithms(axes.verticalByY);
    this.logarithms.set(key, found);
    return found;
  }

  private column(axis: ColumnFunction, text: string, task: FitTask): AxisColumn {
    const key = keyOf(text, task);
    const found = this.columns.get(key);
    if (found !== undefined) return found;
    const { x, y, law } = task;
    const values = axis.evaluate(lawInputs(x, y, new Float64Array(law.constants.length)), x.length);
    const column = { values, complete: isComplete(values) };
    this.columns.set(key, column);
    return column;
  }
}

const NONE = new Int32Array(0);

function isOfReadings({ uses }: ColumnFunction): boolean {
  return uses.every((index) => index === PREDICTOR || index === RESPONSE);
}

/** Texts of axes are exact, and mean the same for the same names of the readings. */
function keyOf(text: string, { law }: FitTask): string {
  return `${law.predictor}\n${law.response}\n${text}`;
}

function isComplete(column: Float64Array): boolean {
  for (let i = 0; i < column.length; i++) {
    const value = column[i] as number; // i < length
    if (value - value !== 0) return false;
  }
  return true;
}
