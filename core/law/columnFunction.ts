import { applyBack, applyColumn, applyScalar } from './columnLoops.ts';
import type { Expression } from './expression.ts';
import type { ColumnFunction, ColumnGradient, Inputs } from './law.ts';
import { operations } from './operations.ts';
import { recordTape, type Step } from './tape.ts';

/** Rows worked on at a time, so that what lies between stays in the cache of the processor. */
const CHUNK = 1024;

/** Working columns that all tapes share: evaluation is never nested. */
const values: Float64Array[] = [];
const adjoints: Float64Array[] = [];

function shared(pool: Float64Array[], index: number): Float64Array {
  while (pool.length <= index) pool.push(new Float64Array(CHUNK));
  // The loop above has just made it.
  return pool[index] as Float64Array;
}

/**
 * Compiles an expression into a function over columns.
 * @param symbols names in the order of the inputs; every symbol of the expression must be among them
 */
export function columnFunction(expression: Expression, symbols: readonly string[]): ColumnFunction {
  const steps = recordTape(expression, (name) => symbols.indexOf(name));
  const uses = [...new Set(steps.filter(isInput).map((step) => step.value))].sort((a, b) => a - b);
  return new TapeFunction(expression, uses, steps);
}

function isInput(step: Step): boolean {
  return step.operation === operations.input;
}

class TapeFunction implements ColumnFunction {
  readonly expression: Expression;
  readonly uses: readonly number[];
  private readonly steps: readonly Step[];
  private readonly scalars: Float64Array;

  constructor(expression: Expression, uses: readonly number[], steps: readonly Step[]) {
    this.expression = expression;
    this.uses = uses;
    this.steps = steps;
    this.scalars = new Float64Array(steps.length);
  }

  at(inputs: ArrayLike<number>): number {
    const { steps, scalars } = this;
    for (let i = 0; i < steps.length; i++) {
      const { operation, a, b, value } = steps[i] as Step; // i < steps.length
      if (operation === operations.constant) scalars[i] = value;
      else if (operation === operations.input) scalars[i] = inputs[value] ?? Number.NaN;
      else scalars[i] = applyScalar(operation, scalars[a] ?? 0, scalars[b] ?? 0);
    }
    return finite(scalars[steps.length - 1] ?? Number.NaN);
  }

  evaluate(inputs: Inputs, length: number, out = new Float64Array(length)): Float64Array {
    const run = new Run(this.steps, this.scalars, inputs, length);
    const last = this.steps.length - 1;
    if (!run.isColumn(last)) return out.fill(finite(this.scalars[last] ?? Number.NaN), 0, length);
    for (let start = 0; start < length; start += CHUNK) {
      const n = Math.min(CHUNK, length - start);
      run.forward(start, n, out);
      onlyFinite(out, start, start + n);
    }
    return out;
  }

  gradient(inputs: Inputs, length: number, wrt: readonly number[]): ColumnGradient {
    const { steps } = this;
    const value = new Float64Array(length);
    const partials = wrt.map(() => new Float64Array(length));
    const run = new Run(steps, this.scalars, inputs, length);
    const wanted = steps.map(() => false);
    for (const [i, { operation, a, b, value: index }] of steps.entries()) {
      wanted[i] =
        operation === operations.input ? wrt.includes(index) : (wanted[a] ?? false) || (wanted[b] ?? false);
    }
    const last = steps.length - 1;
    for (let start = 0; start < length; start += CHUNK) {
      const n = Math.min(CHUNK, length - start);
      run.forward(start, n, value);
      if (!run.isColumn(last)) value.fill(this.scalars[last] ?? Number.NaN, start, start + n);
      for (let i = 0; i <= last; i++) if (wanted[i]) shared(adjoints, i).fill(i === last ? 1 : 0, 0, n);
      for (let i = last; i >= 0; i--) {
        const step = steps[i];
        if (step === undefined || !wanted[i]) continue;
        const adjoint = shared(adjoints, i);
        if (isInput(step)) {
          partials[wrt.indexOf(step.value)]?.set(adjoint.subarray(0, n), start);
          continue;
        }
        const a = run.column(step.a, start, n, value);
        const b = run.column(step.b < 0 ? step.a : step.b, start, n, value);
        const own = run.column(i, start, n, value);
        const rows = {
          a: a.data,
          fromA: a.from,
          b: b.data,
          fromB: b.from,
          out: own.data,
          fromOut: own.from,
          adjoint,
          toA: wanted[step.a] ? shared(adjoints, step.a) : null,
          toB: wanted[step.b] ? shared(adjoints, step.b) : null,
        };
        applyBack(step.operation, rows, n);
      }
    }
    onlyFinite(value, 0, length);
    for (const [k, index] of wrt.entries()) {
      const first = wrt.indexOf(index);
      if (first < k) partials[k]?.set(partials[first] ?? []);
    }
    return { value, partials };
  }
}

function finite(value: number): number {
  return value - value === 0 ? value : Number.NaN;
}

/** Puts NaN in the place of infinities. */
function onlyFinite(column: Float64Array, from: number, to: number): void {
  for (let i = from; i < to; i++) {
    const value = column[i] as number; // inside the column
    if (value - value !== 0) column[i] = Number.NaN;
  }
}

/** One pass over columns: steps that depend on plain numbers alone are computed once. */
class Run {
  private readonly columns: boolean[];
  private filled: boolean[];
  private readonly steps: readonly Step[];
  private readonly scalars: Float64Array;
  private readonly inputs: Inputs;
  private readonly rows: number;

  constructor(steps: readonly Step[], scalars: Float64Array, inputs: Inputs, length: number) {
    this.steps = steps;
    this.scalars = scalars;
    this.inputs = inputs;
    this.rows = Math.min(CHUNK, length);
    this.filled = steps.map(() => false);
    this.columns = [];
    for (const { operation, a, b, value } of steps) {
      const i = this.columns.length;
      if (operation === operations.constant) {
        scalars[i] = value;
        this.columns.push(false);
      } else if (operation === operations.input) {
        const input = inputs[value] ?? Number.NaN;
        this.columns.push(typeof input !== 'number');
        if (typeof input === 'number') scalars[i] = input;
      } else {
        const column = (this.columns[a] ?? false) || (this.columns[b] ?? false);
        this.columns.push(column);
        if (!column) scalars[i] = applyScalar(operation, scalars[a] ?? 0, scalars[b] ?? 0);
      }
    }
  }

  isColumn(step: number): boolean {
    return this.columns[step] ?? false;
  }

  /** Where a step's rows lie: an input's own column, the result's, or a shared working column. */
  column(index: number, start: number, n: number, out: Float64Array): { data: Float64Array; from: number } {
    const step = this.steps[index];
    const input = step !== undefined && isInput(step) ? this.inputs[step.value] : undefined;
    if (input !== undefined && typeof input !== 'number') return { data: input, from: start };
    if (index === this.steps.length - 1) return { data: out, from: start };
    const data = shared(values, index);
    if (!this.isColumn(index) && !this.filled[index]) {
      data.fill(this.scalars[index] ?? Number.NaN, 0, Math.max(n, this.rows));
      this.filled[index] = true;
    }
    return { data, from: 0 };
  }

  /** Rows start … start + n − 1 of every step that is a column; the last step's go into `out`. */
  forward(start: number, n: number, out: Float64Array): void {
    const { steps } = this;
    const last = steps.length - 1;
    for (let i = 0; i <= last; i++) {
      const step = steps[i];
      if (step === undefined || !this.isColumn(i)) continue;
      if (isInput(step)) {
        const input = this.inputs[step.value];
        if (i === last && input !== undefined && typeof input !== 'number') {
          out.set(input.subarray(start, start + n), start);
        }
        continue;
      }
      const a = this.column(step.a, start, n, out);
      const b = this.column(step.b < 0 ? step.a : step.b, start, n, out);
      const own = this.column(i, start, n, out);
      applyColumn(step.operation, a.data, a.from, b.data, b.from, own.data, own.from, n);
    }
  }
}
