import { seededRandom } from '../../../core/constants/random.ts';
import { compare } from '../../../core/judge/compare.ts';
import { generalLaws } from '../../../core/law/catalogue.ts';
import { readingsFrom, settingsFrom } from '../fit/settings.ts';

/** A general law with constants that bend it over the readings' range. */
interface Generator {
  readonly law: string;
  readonly curve: (x: number) => number;
  readonly equation: string;
}

export const generators: readonly Generator[] = [
  { law: 'straight line', equation: '2 + 3 x', curve: (x) => 2 + 3 * x },
  { law: 'power', equation: '2 x^1.5', curve: (x) => 2 * x ** 1.5 },
  { law: 'exponential', equation: '5 exp(−0.25 x)', curve: (x) => 5 * Math.exp(-0.25 * x) },
  { law: 'logarithmic', equation: '1 + 4 ln x', curve: (x) => 1 + 4 * Math.log(x) },
  { law: 'reciprocal', equation: '1/(0.2 + 0.15 x)', curve: (x) => 1 / (0.2 + 0.15 * x) },
  { law: 'saturation', equation: '10 x/(4 + x)', curve: (x) => (10 * x) / (4 + x) },
  { law: 'hyperbolic', equation: '2 + 8/x', curve: (x) => 2 + 8 / x },
  { law: 'root', equation: '1 + 3 √x', curve: (x) => 1 + 3 * Math.sqrt(x) },
  { law: 'square', equation: '3 + 0.4 x²', curve: (x) => 3 + 0.4 * x * x },
  { law: 'inverse exponential', equation: '20 exp(−3/x)', curve: (x) => 20 * Math.exp(-3 / x) },
  { law: 'rise and decay', equation: '4 x exp(−0.3 x)', curve: (x) => 4 * x * Math.exp(-0.3 * x) },
];

const x = [1, 1.5, 2, 3, 4, 5, 6, 7, 8, 9, 10, 12];
/** Relative standard deviation of the scatter. */
const SCATTER = 0.03;

/** How often the law that made the readings was ranked first. */
export interface HitRate {
  readonly law: string;
  readonly equation: string;
  /** Without u_y, and with the shape of the scatter stated (`proportional`): shares of the sets. */
  readonly unstated: number;
  readonly stated: number;
}

/** Ranks all general laws on simulated sets of readings of each; the same on every run. */
export function hitRates(sets: number): HitRate[] {
  const unstated = settingsFrom();
  const stated = settingsFrom({ uY: 'proportional' });
  return generators.map(({ law, equation, curve }, index) => {
    const random = seededRandom(7 + index);
    let [hits, hitsStated] = [0, 0];
    for (let set = 0; set < sets; set++) {
      const y = x.map((at) => curve(at) * (1 + SCATTER * random.normal()));
      const readings = readingsFrom(x, y);
      if (compare(readings, generalLaws, unstated).rows[0]?.law === law) hits++;
      if (compare(readings, generalLaws, stated).rows[0]?.law === law) hitsStated++;
    }
    return { law, equation, unstated: hits / sets, stated: hitsStated / sets };
  });
}

/** The rates as a table of the README. */
export function hitRateTable(rates: readonly HitRate[], sets: number): string {
  const percent = (share: number): string => `${Math.round(100 * share)} %`;
  return [
    `${sets} simulated sets per law: ${x.length} readings from x = ${x[0]} to ${x[x.length - 1]}, ${100 * SCATTER} % scatter.`,
    '',
    '| law behind the readings | ranked first, `u_y` left out | ranked first, `u_y` = `proportional` |',
    '| --- | --- | --- |',
    ...rates.map(
      ({ law, equation, unstated, stated }) =>
        `| ${law}, ${equation} | ${percent(unstated)} | ${percent(stated)} |`,
    ),
    '',
  ].join('\n');
}
