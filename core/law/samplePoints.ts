/** Points on a law's curve at random constants: values of [predictor, response, ...constants]. */
export interface SamplePoints {
  /** All positive: the region that signs are read from. */
  readonly plain: readonly Float64Array[];
  /** Constants of either sign, predictors over many decades. */
  readonly wide: readonly Float64Array[];
  /** Rows of points with the same constants: the first of each row stands in `plain` or `wide`. */
  readonly rows: readonly (readonly Float64Array[])[];
}

const WANTED = 12;
const ATTEMPTS = 160;
const ROWS = 4;
/** With so many points the search goes no farther afield. */
const FEWEST = 6;
const SCALES = [1, 1, 0.3, 3, 0.1, 10, 100, 0.01];

/** A generator of numbers in (0, 1), the same sequence for the same seed: xorshift of 32 bits (G. Marsaglia, 2003). */
export function randomNumbers(seed: number): () => number {
  let state = seed | 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return ((state >>> 0) + 0.5) / 4294967296;
  };
}

/**
 * Points where the curve has a value.
 * @param count number of symbols, predictor and response among them
 * @param responseAt the response at [predictor, –, ...constants], NaN outside the domain
 */
export function samplePoints(count: number, responseAt: (values: Float64Array) => number): SamplePoints {
  const random = randomNumbers(20_011);
  const draw = (signed: boolean, attempt: number): Float64Array | undefined => {
    const values = new Float64Array(count);
    const scale = SCALES[attempt % SCALES.length] ?? 1;
    for (let i = 0; i < count; i++) {
      // Laws that hold numbers of nature need constants many decades from 1.
      const far = attempt < ATTEMPTS ? 1 : 10 ** ((random() - 0.5) * (attempt / ATTEMPTS) * 4);
      const size = 0.35 * 8 ** random() * (i === 0 ? scale : 1) * far;
      values[i] = signed && random() < 0.4 ? -size : size;
    }
    values[1] = responseAt(values);
    const response = values[1];
    return Number.isFinite(response) && Math.abs(response) < 1e12 && Math.abs(response) > 1e-12
      ? values
      : undefined;
  };
  const collect = (signed: boolean): Float64Array[] => {
    const points: Float64Array[] = [];
    for (
      let attempt = 0;
      attempt < 8 * ATTEMPTS && points.length < (attempt < ATTEMPTS ? WANTED : FEWEST);
      attempt++
    ) {
      const point = draw(signed, attempt);
      if (point !== undefined) points.push(point);
    }
    return points;
  };
  const plain = collect(false);
  const wide = collect(true);
  const rows = [...plain.slice(0, ROWS), ...wide.slice(0, plain.length > 1 ? 0 : ROWS)].map((point) => [
    point,
    ...[0.53, 0.71, 1.37, 1.9].flatMap((factor) => {
      const values = Float64Array.from(point);
      values[0] = (point[0] ?? 0) * factor;
      const response = responseAt(values);
      values[1] = response;
      return Number.isFinite(response) ? [values] : [];
    }),
  ]);
  return { plain, wide, rows };
}
