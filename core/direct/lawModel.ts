import type { ColumnFunction, Law } from '../law/law.ts';
import { Problem } from '../problem.ts';
import { directWords } from '../words/directWords.ts';
import { type ResidualModel, sumOfSquaresOf } from './residualModel.ts';

/** Readings with the weight of each squared residual. */
export interface WeightedReadings {
  /** Predictor, n. */
  readonly x: Float64Array;
  /** Response, n. */
  readonly y: Float64Array;
  /** ω: 1, 1/u_y² or 1/y²; n, above 0. */
  readonly omega: Float64Array;
}

/** A law's curve against readings, as a least-squares iteration sees it. */
export interface LawModel extends ResidualModel {
  /** Curve values, unweighted, at θ. */
  fitted(theta: ArrayLike<number>): Float64Array;
  /** Curve values and derivatives by the unknown constants, unweighted. */
  derivatives(theta: ArrayLike<number>): {
    readonly value: Float64Array;
    readonly partials: readonly Float64Array[];
  };
}

/** Places of a law's unknown constants among its `constants`. */
export function unknownPlaces(law: Law): number[] {
  return law.unknown.map((name) => law.constants.indexOf(name));
}

/**
 * The curve of a law.
 * @throws Problem `argument` when the response cannot be isolated
 */
export function curveOf(law: Law): ColumnFunction {
  if (law.curve === null) {
    throw new Problem('argument', 'law', directWords.curveNeeded(law.response, law.equation));
  }
  return law.curve;
}

/**
 * Binds a law to readings and to the values of its known constants.
 * @param constants aligned with `law.constants`; entries of unknown constants are ignored
 * @throws Problem `argument` when the response cannot be isolated
 */
export function lawModel(law: Law, readings: WeightedReadings, constants: ArrayLike<number>): LawModel {
  const { x, y, omega } = readings;
  const n = x.length;
  const curve = curveOf(law);
  const places = unknownPlaces(law).map((place) => place + 2);
  const inputs: (Float64Array | number)[] = [x, y, ...Array.from(constants)];
  const root = omega.map(Math.sqrt);
  const values = new Float64Array(n);

  const place = (theta: ArrayLike<number>): void => {
    for (let k = 0; k < places.length; k++) inputs[places[k] ?? 0] = theta[k] ?? Number.NaN;
  };
  const weigh = (value: Float64Array, residual: Float64Array): number => {
    for (let i = 0; i < n; i++) residual[i] = (root[i] ?? 0) * ((y[i] ?? 0) - (value[i] ?? 0));
    return sumOfSquaresOf(residual);
  };

  return {
    readings: n,
    constants: places.length,
    responseLength: Math.sqrt(sumOfSquaresOf(y.map((response, i) => response * (root[i] ?? 0)))),
    residuals(theta, residual) {
      place(theta);
      return weigh(curve.evaluate(inputs, n, values), residual);
    },
    jacobian(theta, residual, jacobian) {
      place(theta);
      const { value, partials } = curve.gradient(inputs, n, places);
      for (let k = 0; k < places.length; k++) {
        const partial = partials[k];
        for (let i = 0; i < n; i++) {
          const entry = (root[i] ?? 0) * (partial?.[i] ?? 0);
          if (!Number.isFinite(entry)) return Number.POSITIVE_INFINITY;
          jacobian[k * n + i] = entry;
        }
      }
      return weigh(value, residual);
    },
    fitted(theta) {
      place(theta);
      return Float64Array.from(curve.evaluate(inputs, n, values));
    },
    derivatives(theta) {
      place(theta);
      const { value, partials } = curve.gradient(inputs, n, places);
      return {
        value: Float64Array.from(value),
        partials: partials.map((column) => Float64Array.from(column)),
      };
    },
  };
}
