import { plural, shown } from './plain.ts';

/** A probability as a sentence shows it. */
export function probability(p: number): string {
  return p < 0.001 ? 'p below 0.001' : `p = ${shown(Number(p.toPrecision(2)))}`;
}

/** A number of standard uncertainties. */
function times(value: number): string {
  return value < 9.95 ? value.toFixed(1) : shown(Number(value.toPrecision(2)));
}

/** What is said of laws that are compared and of single readings. */
export const judgeWords = {
  needsReadings: (need: number, have: number): string =>
    `needs ${plural(need, 'reading')} to be compared; there ${have === 1 ? 'is' : 'are'} ${have}`,
  outside: (axis: string, position: number, value: number, throughOrigin: string): string =>
    `${axis}: reading ${position} is ${shown(value)}${throughOrigin === '' ? '' : `; the law ${throughOrigin} cannot pass through the origin`}`,
  outsideBoth: (
    axis: string,
    position: number,
    [predictor, x]: readonly [string, number],
    [response, y]: readonly [string, number],
    throughOrigin: boolean,
  ): string =>
    `${axis}: reading ${position} is ${predictor} = ${shown(x)}, ${response} = ${shown(y)}${throughOrigin ? '; this law cannot pass through the origin' : ''}`,
  bothAxes: (response: string): string =>
    `${response} stands on both straight axes, so the law cannot be judged beside others; use judge=direct`,
  noLikelihood: (): string => 'at one of these readings the straight axes say nothing about y',
  directNeedsExactX: (): string =>
    'options: judge=direct must go without u_x, because the direct fit takes x as exact.',
  knownNowhere: (name: string): string =>
    `known must name constants of the laws that are compared, but '${name}' is in none of them.`,
  judgesDisagree: (
    line: { readonly law: string; readonly support: number | '' },
    direct: { readonly law: string; readonly support: number | '' },
    supportOfLine: number | '',
    stated: boolean,
  ): string => {
    const loser =
      supportOfLine === '' ? '' : `, where ${line.law} has ${shown(Number(supportOfLine.toPrecision(2)))} %`;
    const first = `On the straight axes ${line.law} is supported best${percent(line.support)}`;
    return stated
      ? `${first}, by the direct fits ${direct.law}${percent(direct.support)}${loser}: straight axes carry the stated uncertainties to first order only, so trust the direct fits.`
      : `${first}, with one rule of scatter in y for every law ${direct.law}${percent(direct.support)}${loser}: what tells the laws apart here may be the shape of the scatter, not of the curve; state u_y if you know it.`;
  },
  outlying: (deviations: number, stated: boolean, p: number): string =>
    `Outlying: ${times(Math.abs(deviations))} ${stated ? 'stated uncertainties' : 'standard deviations'} from the line (${probability(p)}).`,
  highLeverage: (leverage: number, against: string, value: number): string =>
    `High leverage: at ${against} = ${shown(value)} it alone holds ${shown(Math.round(100 * leverage))} % of its place on the line.`,
  drives: (constant: string, value: number, without: number, shift: number): string =>
    `Drives the result: without it ${constant} would change from ${shown(value)} to ${shown(without)}, by ${times(shift)} standard uncertainties.`,
};

function percent(support: number | ''): string {
  return support === '' ? '' : ` (${shown(Number(support.toPrecision(3)))} %)`;
}
