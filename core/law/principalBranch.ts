import type { Node } from './algebra.ts';
import type { ColumnFunction, ColumnGradient, Inputs } from './law.ts';
import { RESPONSE_BIT } from './relations.ts';

/** Agreement between a response and what its axis gives back. */
const TOLERANCE = 1e-6;
const FOLDING = new Set(['sin', 'cos', 'tan', 'abs', 'cosh']);

/** True where different responses may have the same value on the axis: y², sin y. */
export function folds(node: Node): boolean {
  if ((node.mask & RESPONSE_BIT) === 0) return false;
  const [base, exponent] = node.parts;
  const within = base !== undefined && (base.mask & RESPONSE_BIT) !== 0;
  if (node.kind === 'function' && FOLDING.has(node.name)) return true;
  if (node.kind === 'power' && within && exponent?.kind === 'number' && exponent.value % 2 === 0) return true;
  return node.parts.some(folds);
}

/** A vertical axis that exists only where the response is the one that its value leads back to. */
export class PrincipalBranch implements ColumnFunction {
  private readonly axis: ColumnFunction;
  private readonly back: ColumnFunction;

  constructor(axis: ColumnFunction, back: ColumnFunction) {
    this.axis = axis;
    this.back = back;
  }

  get expression(): ColumnFunction['expression'] {
    return this.axis.expression;
  }

  get uses(): readonly number[] {
    return this.axis.uses;
  }

  at(values: ArrayLike<number>): number {
    const value = this.axis.at(values);
    const onAxis = Float64Array.from(values);
    onAxis[1] = value;
    return agrees(this.back.at(onAxis), values[1] ?? Number.NaN) ? value : Number.NaN;
  }

  evaluate(inputs: Inputs, length: number, out = new Float64Array(length)): Float64Array {
    const response = inputs[1];
    // The result may be written over the response.
    const kept = response === out ? Float64Array.from(out) : response;
    return this.masked(this.axis.evaluate(inputs, length, out), kept, inputs, length);
  }

  gradient(inputs: Inputs, length: number, wrt: readonly number[]): ColumnGradient {
    const { value, partials } = this.axis.gradient(inputs, length, wrt);
    return { value: this.masked(value, inputs[1], inputs, length), partials };
  }

  private masked(
    value: Float64Array,
    response: Float64Array | number | undefined,
    inputs: Inputs,
    length: number,
  ): Float64Array {
    const moved = [...inputs];
    moved[1] = value;
    const back = this.back.evaluate(moved, length);
    for (let i = 0; i < length; i++) {
      const here = typeof response === 'number' ? response : (response?.[i] ?? Number.NaN);
      if (!agrees(back[i] ?? Number.NaN, here)) value[i] = Number.NaN;
    }
    return value;
  }
}

function agrees(back: number, response: number): boolean {
  return Math.abs(back - response) <= TOLERANCE * Math.abs(response);
}
