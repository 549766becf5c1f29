import { describe, expect, test } from '@jest/globals';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import type { Law, StraightForm } from '../../../core/law/law.ts';
import { randomNumbers } from '../../../core/law/samplePoints.ts';
import { type TradeLaw, tradeLaws } from './tradeLaws.ts';

/** Points on the law's own curve: predictors spread over its range, constants near those of the table. */
function pointsOf(law: Law, { constants, from, to }: TradeLaw): Float64Array[] {
  const random = randomNumbers(law.equation.length + 3);
  const { curve } = law;
  if (curve === null) throw new Error(`no curve for ${law.equation}`);
  const points: Float64Array[] = [];
  for (let i = 0; i < 40; i++) {
    const values = [
      from + (to - from) * random(),
      Number.NaN,
      ...law.constants.map((name) => (constants[name] ?? Number.NaN) * (0.97 + 0.06 * random())),
    ];
    values[1] = curve.at(values);
    if (Number.isFinite(values[1])) points.push(Float64Array.from(values));
  }
  return points;
}

function termsOf(form: StraightForm): 'both' | 'slope' | 'intercept' {
  if (form.inIntercept.length === 0) return 'slope';
  return form.inSlope.length === 0 ? 'intercept' : 'both';
}

describe.each(tradeLaws.map((one) => [`${one.trade}: ${one.equation}`, one] as const))('%s', (_, one) => {
  const law = compileLaw(one.equation, one.known ?? []);
  const points = pointsOf(law, one);

  test('needs as many trial constants as it should', () => {
    expect(law.forms[0]?.trials).toHaveLength(one.trials);
    expect(points.length).toBeGreaterThan(30);
  });

  test.each(law.forms.map((form) => [`${form.plot} against ${form.against}`, form] as const))(
    '%s is a line',
    (__, form) => {
      let compared = 0;
      for (const point of points) {
        const vertical = form.vertical.at(point);
        const along = form.slopeOf.at(point) * form.horizontal.at(point);
        const offset = form.interceptOf.at(point);
        if (!Number.isFinite(vertical)) continue;
        compared++;
        const size = Math.abs(vertical) + Math.abs(along) + Math.abs(offset);
        expect(Math.abs(vertical - along - offset) / size).toBeLessThan(1e-7);
      }
      expect(compared).toBeGreaterThan(10);
    },
  );

  test.each(law.forms.map((form) => [`${form.plot} against ${form.against}`, form] as const))(
    '%s gives the constants back',
    (__, form) => {
      const wanted = law.unknown.filter((name) => !form.trials.includes(name));
      let compared = 0;
      for (const point of points.slice(0, 12)) {
        const slope = form.slopeOf.at(point);
        const intercept = form.interceptOf.at(point);
        if (!Number.isFinite(slope + intercept)) continue;
        compared++;
        const constants = Array.from(point.subarray(2), (value, k) =>
          wanted.includes(law.constants[k] ?? '') ? Number.NaN : value,
        );
        const solutions = form.solve(slope, intercept, constants, termsOf(form));
        const far = solutions.map((solution) =>
          Math.max(...Array.from(solution, (value, k) => Math.abs(value / (point[k + 2] ?? Number.NaN) - 1))),
        );
        expect(Math.min(...far, Number.POSITIVE_INFINITY)).toBeLessThan(1e-10);
      }
      expect(compared).toBeGreaterThan(6);
    },
  );

  test('forms give the response back from their vertical axis', () => {
    for (const form of law.forms) {
      if (form.responseFrom === null) {
        expect(form.responseOnBothAxes || form.note !== '').toBe(true);
        continue;
      }
      for (const point of points) {
        const onAxis = Float64Array.from(point);
        onAxis[1] = form.vertical.at(point);
        if (!Number.isFinite(onAxis[1])) continue;
        const moved = Float64Array.from(point);
        moved[1] = (point[1] ?? 0) * (1 + 1e-10);
        // Near a limit of the response, rounding of y is rounding of the axis many times over.
        if (Math.abs(form.vertical.at(moved) - onAxis[1]) > 1e-7 * Math.abs(onAxis[1])) continue;
        expect(form.responseFrom.at(onAxis) / (point[1] ?? Number.NaN)).toBeCloseTo(1, 6);
      }
    }
  });
});
