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
    let columns: readonly Float64Array[] | undefined;
    return (index: 0 | 1): Float64Array => {
      columns ??= axis.gradient(inputs, length, [PREDICTOR, RESPONSE]).partials;
      return columns[index] ?? new Float64Array(length);
    };
  };
  const ofVertical = derivatives(form.vertical);
  const ofHorizontal = derivatives(form.horizontal);
  return {
    horizontal,
    vertical,
    get verticalByX() {
      return ofVertical(0);
    },
    get verticalByY() {
      return ofVertical(1);
    },
    get horizontalByX() {
      return ofHorizontal(0);
    },
    get horizontalByY() {
      return ofHorizontal(1);
    },
  };
}
