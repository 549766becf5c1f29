import type { WorkingsCase } from './workingsOnSheet.ts';

/** Scatter for the test readings: thirteen values of about unit size, fixed. */
const scatter = [0.3, -1.1, 0.8, 1.4, -0.6, -0.2, 1.0, -1.5, 0.5, 0.1, -0.9, 0.7, -0.4];

/** Readings of a law with relative scatter. */
function readings(
  x: readonly number[],
  law: (x: number) => number,
  relative = 0.01,
): { readonly x: readonly number[]; readonly y: readonly number[] } {
  return { x, y: x.map((value, i) => law(value) * (1 + relative * (scatter[i % scatter.length] ?? 0))) };
}

const oneTo = (count: number): number[] => Array.from({ length: count }, (_, i) => i + 1);
const kelvin = [278, 283, 288, 293, 298, 303, 313, 323, 333, 343];

/** Every law of the catalogue with readings of our own making. */
export const catalogueCases: readonly WorkingsCase[] = [
  { law: 'straight line', ...readings(oneTo(9), (x) => 3 + 0.7 * x) },
  { law: 'power', ...readings(oneTo(10), (x) => 1.7 * x ** 2.4) },
  { law: 'exponential', ...readings(oneTo(12), (x) => 5 * Math.exp(-0.23 * x)) },
  { law: 'logarithmic', ...readings(oneTo(9), (x) => 2 + 1.4 * Math.log(x)) },
  { law: 'reciprocal', ...readings(oneTo(9), (x) => 1 / (0.4 + 0.13 * x)) },
  { law: 'saturation', ...readings([0.5, 1, 2, 3, 5, 8, 13, 20], (x) => (9 * x) / (3.1 + x)) },
  { law: 'hyperbolic', ...readings(oneTo(9), (x) => 2 + 5 / x) },
  { law: 'root', ...readings(oneTo(9), (x) => 1 + 2.2 * Math.sqrt(x)) },
  { law: 'square', ...readings(oneTo(9), (x) => 4 + 0.3 * x * x) },
  { law: 'inverse exponential', ...readings(oneTo(9), (x) => 7 * Math.exp(-1.6 / x)) },
  { law: 'rise and decay', ...readings(oneTo(11), (x) => 2 * x * Math.exp(-0.31 * x)) },
  { law: 'proportional', ...readings(oneTo(8), (x) => 2.6 * x) },
  { law: 'arrhenius', ...readings(kelvin, (t) => 4e9 * Math.exp(-62000 / (8.314462618 * t)), 0.03) },
  { law: 'thermistor', ...readings(kelvin, (t) => 10000 * Math.exp(3900 * (1 / t - 1 / 298.15)), 0.004) },
  {
    law: 'first order',
    ...readings([0, 0.5, 1, 2, 3, 4, 6, 8, 10, 12, 16], (t) => 1.86 * Math.exp(-0.094 * t)),
  },
  { law: 'second order', ...readings([0, 1, 2, 4, 7, 11, 16], (t) => 1 / (1 / 2.3 + 0.21 * t)) },
  {
    law: 'approach',
    ...readings([0, 2, 4, 7, 11, 16, 22, 30], (t) => 21 + (88 - 21) * Math.exp(-t / 9), 0.004),
    known: 'yf=21',
  },
  {
    law: 'approach',
    ...readings([0, 2, 4, 7, 11, 16, 22, 30], (t) => 21 + (88 - 21) * Math.exp(-t / 9), 0.004),
  },
  { law: 'saturating rise', ...readings(oneTo(9), (x) => 6 * (1 - Math.exp(-0.35 * x)), 0.004) },
  {
    law: 'saturating rise',
    ...readings(oneTo(9), (x) => 6 * (1 - Math.exp(-0.15 * x)), 0.004),
    known: 'm=6',
  },
  { law: 'logistic', ...readings(oneTo(10), (x) => 50 / (1 + Math.exp(4 - 0.9 * x))) },
  { law: 'logistic', ...readings(oneTo(8), (x) => 50 / (1 + Math.exp(4 - 0.7 * x)), 0.004), known: 'L=50' },
  {
    law: 'weibull',
    ...readings([100, 200, 300, 400, 550, 700, 900], (t) => 1 - Math.exp(-((t / 450) ** 1.8))),
  },
  { law: 'hill', ...readings([0.5, 1, 2, 3, 5, 8, 12, 20], (x) => (8 * x ** 1.7) / (3.3 ** 1.7 + x ** 1.7)) },
  {
    law: 'hill',
    ...readings([0.5, 1, 2, 3, 5, 8, 12], (x) => (8 * x ** 1.7) / (3.3 ** 1.7 + x ** 1.7), 0.004),
    known: 'm=8',
  },
  { law: 'shifted power', ...readings([0.2, 0.3, 0.4, 0.55, 0.7, 0.9, 1.2], (h) => 3.2 * (h - 0.08) ** 1.6) },
  {
    law: 'shifted power',
    ...readings([0.2, 0.3, 0.4, 0.55, 0.7, 0.9], (h) => 3.2 * (h - 0.08) ** 1.6),
    known: 'h0=0.08',
  },
  { law: 'offset decay', ...readings(oneTo(12), (x) => 0.4 + 3 * Math.exp(-0.5 * x)) },
  { law: 'langmuir', ...readings([0.5, 1, 2, 4, 7, 12, 20], (c) => (2.4 * 0.3 * c) / (1 + 0.3 * c)) },
  { law: 'freundlich', ...readings([0.5, 1, 2, 4, 7, 12, 20], (c) => 1.9 * c ** (1 / 2.2)) },
  { law: 'antoine', ...readings(kelvin, (t) => 10 ** (8.07 - 1730 / (t - 39.7)), 0.003) },
  { law: 'antoine', ...readings(kelvin, (t) => 10 ** (8.07 - 1730 / (t - 39.7)), 0.003), known: 'C=-39.7' },
  { law: 'basquin', ...readings([100, 140, 190, 260, 350], (s) => 4e15 * s ** -4.8, 0.06) },
];

/** Laws of one's own, with weights, known constants, a held intercept, errors on both axes and direct fits. */
export const ownCases: readonly WorkingsCase[] = [
  {
    law: 'V(t) = V0*exp(-t/(R*C))',
    ...readings([0, 1, 2, 3, 5, 7, 10, 14], (t) => 12 * Math.exp(-t / (2 * 3))),
    known: 'R=2±0.03',
    uY: '2%',
  },
  {
    law: 'T(L) = 2*pi*sqrt(L/g)',
    ...readings([0.2, 0.35, 0.5, 0.7, 0.9, 1.2], (l) => 2 * Math.PI * Math.sqrt(l / 9.81), 0.004),
    uY: '0.004',
  },
  {
    law: 'theta(t) = ta + d*exp(-k*t)',
    ...readings([0, 3, 6, 10, 15, 21, 30], (t) => 18.5 + 60 * Math.exp(-t / 14), 0.003),
    known: 'ta=18.5+/-0.4',
    uY: 'equal',
  },
  {
    law: 'Q(h) = c*(h - h0)^b',
    ...readings([0.2, 0.3, 0.4, 0.55, 0.7, 0.9], (h) => 3.2 * (h - 0.08) ** 1.6, 0.01),
    known: 'h0=0.08±0.003',
    uY: 'proportional',
    options: 'coverage=0.99',
  },
  {
    law: 'v(x) = vm*x/(km + x)',
    ...readings([0.5, 1, 2, 3, 5, 8, 13], (x) => (9 * x) / (3.1 + x)),
    uY: [0.05, 0.08, 0.1, 0.12, 0.15, 0.18, 0.2],
  },
  {
    law: 'R(T) = R0*exp(B*(1/T - 1/T0))',
    ...readings(kelvin, (t) => 10000 * Math.exp(3900 * (1 / t - 1 / 298.15)), 0.004),
    known: 'T0=298.15; R0=10000±50',
    options: 'intercept=held',
  },
  {
    law: 'p(z) = p0*exp(-z/H)',
    ...readings([0, 500, 1000, 1600, 2300, 3100], (z) => 101325 * Math.exp(-z / 8100), 0.002),
    options: 'fit=direct',
  },
  {
    law: 'p(z) = p0*exp(-z/H)',
    ...readings([0, 500, 1000, 1600, 2300, 3100], (z) => 101325 * Math.exp(-z / 8100), 0.002),
    known: 'p0=101325±200',
    uY: '150',
    options: 'fit=direct',
  },
  {
    law: 'a(f) = c/f + d*f',
    ...readings([1, 2, 3, 4, 6, 8, 11], (f) => 6 / f + 0.8 * f),
    uY: '3%',
    uX: '0.02',
  },
  {
    law: 'C(t) = C0*exp(-k*t)',
    ...readings([0, 1, 2, 4, 7, 11], (t) => 1.86 * Math.exp(-0.094 * t)),
    known: 'C0=1.86±0.01',
    uY: '0.01',
    uX: '0.05',
  },
  {
    law: 'u(x) = p*x/(q + x)',
    ...readings([0.5, 1, 2, 3, 5, 8, 13], (x) => (9 * x) / (3.1 + x)),
    options: 'interval=montecarlo',
  },
  { law: 'y(x) = 1/(a^2 + a*x)', ...readings(oneTo(7), (x) => 1 / (0.36 + 0.6 * x)), uY: 'equal' },
];

/** Cells that are no readings, readings outside the law's domain, as few readings as constants. */
export const roughCases: readonly WorkingsCase[] = [
  {
    law: 'first order',
    x: [0, 1, 2, 'x', 4, 6, 8, 10, null, null],
    y: [1.86, 1.7, 'spilt', 1.3, 1.27, { error: '#N/A' }, 0.88, 0.73, null, null],
  },
  {
    law: 'exponential',
    x: [0, 1, 2, 3, 4, 5, 6],
    y: [5, 3.9, 3.2, -0.1, 2, 1.6, 1.2],
    options: 'outside=set aside',
  },
  { law: 'power', x: [1, 3], y: [2, 11] },
];
