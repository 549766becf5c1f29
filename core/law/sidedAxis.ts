import type { ColumnFunction, ColumnGradient, Inputs } from './law.ts';

/** What decides on which side of its limit a reading must lie. */
export interface SideRule {
  /** Argument of a logarithm of either sign: y − yf. */
  readonly argument: ColumnFunction;
  /** The law's curve: where all constants have values, a reading must lie on the side on which the curve runs. */
  readonly curve: ColumnFunction | null;
  /** Places of the unknown constants among the inputs. */
  readonly unknown: readonly number[];
  /** Whether, before the constants have values, most readings decide. */
  readonly byMajority: boolean;
}

/** An axis ln|u| that exists for the readings on one side of u = 0 only. */
export class SidedAxis implements ColumnFunction {
  private readonly axis: ColumnFunction;
  private readonly rule: SideRule;

  constructor(axis: ColumnFunction, rule: SideRule) {
    this.axis = axis;
    this.rule = rule;
  }

  get expression(): ColumnFunction['expression'] {
    return this.axis.expression;
  }

  get uses(): readonly number[] {
    return this.axis.uses;
  }

  at(values: ArrayLike<number>): number {
    return this.evaluate(Array.from(values), 1)[0] ?? Number.NaN;
  }

  evaluate(inputs: Inputs, length: number, out = new Float64Array(length)): Float64Array {
    const wrong = this.wrongSide(inputs, length);
    return masked(this.axis.evaluate(inputs, length, out), wrong, length);
  }

  gradient(inputs: Inputs, length: number, wrt: readonly number[]): ColumnGradient {
    const { value, partials } = this.axis.gradient(inputs, length, wrt);
    return { value: masked(value, this.wrongSide(inputs, length), length), partials };
  }

  /** True for rows on the wrong side; null when nothing can be said. */
  private wrongSide(inputs: Inputs, length: number): ((row: number) => boolean) | null {
    const { argument, curve, unknown, byMajority } = this.rule;
    const side = argument.evaluate(inputs, length);
    const settled = unknown.every((place) => {
      const value = inputs[place];
      return value !== undefined && (typeof value !== 'number' || Number.isFinite(value));
    });
    if (settled && curve !== null) {
      const onCurve = [...inputs];
      onCurve[1] = curve.evaluate(inputs, length);
      const wanted = argument.evaluate(onCurve, length);
      return (row) => (side[row] ?? 0) * (wanted[row] ?? 0) < 0;
    }
    if (!byMajority) return null;
    let balance = 0;
    for (let i = 0; i < length; i++) balance += Math.sign(side[i] ?? 0) || 0;
    const most = balance === 0 ? Math.sign(side[0] ?? 0) : balance;
    return (row) => (side[row] ?? 0) * most < 0;
  }
}

function masked(value: Float64Array, wrong: ((row: number) => boolean) | null, length: number): Float64Array {
  if (wrong === null) return value;
  for (let i = 0; i < length; i++) if (wrong(i)) value[i] = Number.NaN;
  return value;
}
