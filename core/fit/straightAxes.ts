import type { ColumnFunction, Inputs, StraightForm } from '../law/law.ts';
import { PREDICTOR, RESPONSE } from './columns.ts';
import type { StraightAxes } from './fit.ts';

/**
 * Readings on the straight axes of a form. Derivatives are computed when first asked for: a plain line needs none.
 * @param inputs the law's inputs with columns of `length` used readings
 */
export function straightAxes(
  form: StraightForm,
  inputs: Inputs,
  length: number,
  horizontal: Float64Array,
  vertical: Float64Array,
): StraightAxes {
  const derivatives = (axis: ColumnFunction) => {
    const columns = new Map<number, Float64Array>();
    return (by: typeof PREDICTOR | typeof RESPONSE): Float64Array => {
      const known = columns.get(by);
      if (known !== undefined) return known;
      const column = axis.gradient(inputs, length, [by]).partials[0] ?? new Float64Array(length);
      columns.set(by, column);
      return column;
    };
  };
  const ofVertical = derivatives(form.vertical);
  const ofHorizontal = derivatives(form.horizontal);
  return {
    horizontal,
    vertical,
    get verticalByX() {
      return ofVertical(PREDICTOR);
    },
    get verticalByY() {
      return ofVertical(RESPONSE);
    },
    get horizontalByX() {
      return ofHorizontal(PREDICTOR);
    },
    get horizontalByY() {
      return ofHorizontal(RESPONSE);
    },
  };
}
