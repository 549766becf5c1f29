import { Problem } from '../problem.ts';
import { lawWords } from '../words/lawWords.ts';
import type { ColumnFunction } from './law.ts';
import { randomNumbers } from './samplePoints.ts';
import { singularValues } from './singularValues.ts';

/** Below this part of the largest, a singular value of unit columns counts as zero. */
const RANK_TOLERANCE = 1e-10;
const POINTS = 4;

/** How the curve answers to the unknown constants at one set of constants. */
interface Answers {
  /** ∂y/∂ln θ per unknown, scaled to unit length. */
  readonly columns: readonly Float64Array[];
  readonly norms: readonly number[];
  /** Values of the unknown constants. */
  readonly theta: readonly number[];
}

/**
 * Checks, at random constants and predictors, that the curve changes with every combination of the unknown constants.
 * @param equation left − right, as a function of [predictor, response, ...constants]
 * @param points on the curve
 * @param responseAt the response at [predictor, –, ...constants]
 * @param unknown names with their places among the symbols
 * @throws Problem `unsettled` naming the combination that the readings can settle
 */
export function requireSettled(
  equation: ColumnFunction,
  points: readonly Float64Array[],
  responseAt: (values: Float64Array) => number,
  unknown: readonly { readonly name: string; readonly place: number }[],
): void {
  const deficient: { readonly answers: Answers; readonly nulls: readonly Float64Array[] }[] = [];
  for (const point of points) {
    const answers = answersAt(
      equation,
      point,
      responseAt,
      unknown.map(({ place }) => place),
    );
    if (answers === undefined) continue;
    const silent = answers.norms.indexOf(0);
    const name = unknown[silent]?.name;
    if (name !== undefined) throw new Problem('unsettled', 'law', lawWords.noEffect(name));
    const { values, vectors } = singularValues(answers.columns);
    const least = RANK_TOLERANCE * Math.max(...values);
    const nulls = vectors
      .filter((_, k) => (values[k] ?? 0) <= least)
      .map((vector) => vector.map((entry, k) => entry / (answers.norms[k] ?? 1)));
    if (nulls.length === 0) return;
    deficient.push({ answers, nulls });
    if (deficient.length === POINTS) break;
  }
  const [first] = deficient;
  if (first === undefined) return;
  const involved = unknown.filter((_, k) =>
    first.nulls.some((one) => Math.abs(one[k] ?? 0) > 1e-6 * largest(one)),
  );
  const names = involved.map(({ name }) => name);
  const places = involved.map((one) => unknown.indexOf(one));
  if (first.nulls.length === 1 && names.length === 2) {
    const combination = pairSettled(names, places, deficient);
    if (combination !== undefined) {
      throw new Problem('unsettled', 'law', lawWords.settledProduct(combination, names));
    }
  }
  throw new Problem('unsettled', 'law', lawWords.settledPart(names, first.nulls.length));
}

function answersAt(
  equation: ColumnFunction,
  point: Float64Array,
  responseAt: (values: Float64Array) => number,
  places: readonly number[],
): Answers | undefined {
  const random = randomNumbers(7 + places.length);
  const wanted = 4 * places.length + 8;
  const predictor: number[] = [];
  const response: number[] = [];
  const inputs = Float64Array.from(point);
  for (let attempt = 0; attempt < 4 * wanted && predictor.length < wanted; attempt++) {
    inputs[0] = (point[0] ?? 1) * 20 ** (random() - 0.5);
    const value = responseAt(inputs);
    if (!Number.isFinite(value)) continue;
    predictor.push(inputs[0]);
    response.push(value);
  }
  const columnsIn = [Float64Array.from(predictor), Float64Array.from(response), ...point.subarray(2)];
  const [byResponse, ...byConstants] = equation.gradient(columnsIn, predictor.length, [
    1,
    ...places,
  ]).partials;
  const rows = predictor
    .map((_, i) =>
      byConstants.map(
        (column, k) => ((column[i] ?? 0) * (point[places[k] ?? 0] ?? 0)) / (byResponse?.[i] ?? 0),
      ),
    )
    .map((row) => {
      // Rows of every size count alike: a curve may run over many decades.
      const size = largest(Float64Array.from(row));
      return row.map((entry) => entry / size);
    })
    .filter((row) => row.every(Number.isFinite));
  if (rows.length < places.length) return undefined;
  const raw = places.map((_, k) => Float64Array.from(rows, (row) => row[k] ?? 0));
  const norms = raw.map((column) => Math.hypot(...column));
  const columns = raw.map((column, k) => column.map((entry) => entry / (norms[k] || 1)));
  return { columns, norms, theta: places.map((place) => point[place] ?? 0) };
}

function largest(row: Float64Array): number {
  return row.reduce((most, entry) => Math.max(most, Math.abs(entry)), 0);
}

/** `R·C`, `a/b`, `a + b`: what stays the same along the direction that the readings do not see. */
function pairSettled(
  names: readonly string[],
  places: readonly number[],
  deficient: readonly { readonly answers: Answers; readonly nulls: readonly Float64Array[] }[],
): string | undefined {
  const [first = '', second = ''] = names;
  const [i = 0, j = 0] = places;
  const ratios = deficient.flatMap(({ nulls: [one] }) =>
    one === undefined ? [] : [(one[i] ?? 0) / (one[j] ?? 1)],
  );
  const inThetas = deficient.map(
    ({ answers: { theta } }, k) => ((ratios[k] ?? 0) * (theta[i] ?? 0)) / (theta[j] ?? 1),
  );
  const product = wholeRatio(ratios);
  if (product !== undefined) {
    // d ln a/d ln b = r leaves a·b^(−r) as it is.
    const [p, q] = product;
    const raised = (name: string, exponent: number): string =>
      exponent === 1
        ? name
        : exponent === 2
          ? `${name}²`
          : exponent === 3
            ? `${name}³`
            : `${name}^${exponent}`;
    return p < 0 ? `${raised(first, q)}·${raised(second, -p)}` : `${raised(first, q)}/${raised(second, p)}`;
  }
  const scaled = (name: string, exponent: string, one: readonly number[]): string | undefined =>
    one.every((ratio) => Math.abs(ratio + 1) < 1e-6) ? `${name}·exp(${exponent})` : undefined;
  // d ln a/d b = −1 leaves a·exp(b) as it is.
  const mixed =
    scaled(
      first,
      second,
      ratios.map((ratio, k) => ratio / (deficient[k]?.answers.theta[j] ?? 1)),
    ) ??
    scaled(
      second,
      first,
      ratios.map((ratio, k) => 1 / ratio / (deficient[k]?.answers.theta[i] ?? 1)),
    );
  if (mixed !== undefined) return mixed;
  const sum = wholeRatio(inThetas);
  if (sum === undefined) return undefined;
  const [p, q] = sum;
  const times = (factor: number, name: string): string => (factor === 1 ? name : `${factor}·${name}`);
  return `${times(q, first)} ${p < 0 ? '+' : '−'} ${times(Math.abs(p), second)}`;
}

/** p/q of small whole numbers, when all ratios are the same and such a one. */
function wholeRatio(ratios: readonly number[]): readonly [number, number] | undefined {
  const [ratio] = ratios;
  if (ratio === undefined || !ratios.every((one) => Math.abs(one - ratio) <= 1e-6 * Math.abs(ratio)))
    return undefined;
  for (let q = 1; q <= 4; q++) {
    const p = Math.round(ratio * q);
    if (p !== 0 && Math.abs(p) <= 6 && Math.abs(ratio * q - p) <= 1e-6) return [p, q];
  }
  return undefined;
}
