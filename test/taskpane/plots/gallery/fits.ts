import type { Fit } from '../../../../core/fit/fit.ts';
import { fitLaw } from '../../../../core/fit/fitLaw.ts';
import type { FitSettings } from '../../../../core/given/given.ts';
import { defaultOptions } from '../../../../core/given/parseOptions.ts';
import { readCells } from '../../../../core/readings/readCells.ts';

/** One row of the gallery: a fit and the titles of its axes, on the straight axes and on those of the sheet. */
export interface GalleryFit {
  readonly id: string;
  readonly fit: Fit;
  readonly straight: { readonly xTitle: string; readonly yTitle: string };
  readonly sheet: { readonly xTitle: string; readonly yTitle: string };
}

const plain: FitSettings = {
  known: new Map(),
  spreadY: { kind: 'none' },
  spreadX: { kind: 'none' },
  options: defaultOptions,
};

/** Scatter between −1 and 1 that is the same at every run (a multiplicative congruential generator). */
function scatter(): () => number {
  let state = 20_011;
  return () => {
    state = (state * 48_271) % 2_147_483_647;
    return (2 * state) / 2_147_483_647 - 1;
  };
}

/** Fits a law to readings y = response(x, noise). */
export function fitOf(
  law: string,
  xs: readonly number[],
  response: (x: number, noise: number) => number,
  settings: Partial<FitSettings> = {},
): Fit {
  const noise = scatter();
  const readings = readCells(
    xs.map((x) => [x]),
    xs.map((x) => [response(x, noise())]),
  );
  return fitLaw(readings, law, { ...plain, ...settings });
}

/** Evenly spaced numbers. */
export function evenly(from: number, to: number, count: number): number[] {
  return Array.from({ length: count }, (_, i) => from + ((to - from) * i) / (count - 1));
}

/** Readings whose line has the shape that a drawing may find difficult, one for each difficulty. */
export function galleryFits(): GalleryFit[] {
  return [
    {
      id: 'linear',
      fit: fitOf('straight line', evenly(0, 100, 11), (x, e) => 0.8 + 0.0312 * x + 0.06 * e, {
        spreadY: { kind: 'absolute', value: 0.05 },
      }),
      straight: { xTitle: 'level / mm', yTitle: 'signal / V' },
      sheet: { xTitle: 'level / mm', yTitle: 'signal / V' },
    },
    {
      id: 'exponential',
      fit: fitOf(
        'C(t) = C0*exp(-k*t)',
        evenly(0, 48, 13),
        (t, e) => 1.9 * Math.exp(-0.06 * t) * (1 + 0.12 * e),
      ),
      straight: { xTitle: 'time / h', yTitle: 'ln C   (C in mg/L)' },
      sheet: { xTitle: 'time / h', yTitle: 'C / (mg/L)' },
    },
    {
      id: 'isotherm',
      fit: fitOf('langmuir', [0.5, 1, 2, 4, 8, 15, 30, 60], (c, e) => ((42 * c) / (9 + c)) * (1 + 0.05 * e), {
        spreadY: { kind: 'relative', fraction: 0.05 },
      }),
      straight: { xTitle: '1/c   (c in mg/L)', yTitle: '1/q   (q in mg/g)' },
      sheet: { xTitle: 'c, at equilibrium / (mg/L)', yTitle: 'q, taken up / (mg/g)' },
    },
    {
      id: 'decades',
      fit: fitOf('exponential', evenly(0, 12, 25), (x, e) => 3e6 * Math.exp(-1.05 * x) * (1 + 0.3 * e), {
        spreadY: { kind: 'relative', fraction: 0.2 },
      }),
      straight: { xTitle: 'dose / (mJ/cm²)', yTitle: 'ln N   (N in 1/mL)' },
      sheet: { xTitle: 'dose / (mJ/cm²)', yTitle: 'N / (1/mL)' },
    },
    {
      id: 'aside',
      fit: fitOf(
        'power',
        [-2, -1, 0, 1, 2, 3, 5, 8, 13, 21],
        (x, e) => 4e-9 * Math.abs(x) ** 1.5 * (1 + 0.1 * e),
        {
          options: { ...defaultOptions, outside: 'set aside' },
        },
      ),
      straight: { xTitle: 'ln h   (h in m)', yTitle: 'ln Q   (Q in m³/s)' },
      sheet: { xTitle: 'h / m', yTitle: 'Q / (m³/s)' },
    },
    {
      id: 'offset',
      fit: fitOf(
        'straight line',
        evenly(1_000_000, 1_000_010, 9),
        (x, e) => 250_000 + 0.02 * (x - 1_000_000) + 0.01 * e,
      ),
      straight: { xTitle: 'counter / pulses', yTitle: 'volume / L' },
      sheet: { xTitle: 'counter / pulses', yTitle: 'volume / L' },
    },
    {
      id: 'many',
      fit: fitOf('straight line', evenly(0, 5000, 100_000), (x, e) => 12 + 0.004 * x + 2 * e ** 9),
      straight: { xTitle: 'time / s', yTitle: 'flow / (L/s)' },
      sheet: { xTitle: 'time / s', yTitle: 'flow / (L/s)' },
    },
  ];
}
