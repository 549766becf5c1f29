import { chiSquaredTail } from '../distributions/tails.ts';
import type { Fit } from '../fit/fit.ts';
import type { Line } from '../line/line.ts';
import { bow } from '../straightness/bow.ts';
import { onOwnAxis } from '../straightness/misfit.ts';
import { runsP } from '../straightness/runsP.ts';
import { checkWords } from '../words/checkWords.ts';
import { caution, type Finding, note, stop } from './finding.ts';
import { logResponse } from './logResponse.ts';
import { repeatsTest } from './repeats.ts';
import { scatterTest } from './scatter.ts';
import { testedLine } from './testedLine.ts';

/** Probability below which a test speaks, and below which it leaves no doubt. */
const DOUBTFUL = 0.05;
const CERTAIN = 0.001;
/** Bow in percent from which curvature matters, and from which the law does not hold. */
const SOME_BOW = 1;
const MUCH_BOW = 5;

/** What the residuals say of the law: curvature, lack of fit, runs, unequal scatter, stated uncertainties. */
export function shapeFindings(fit: Fit): Finding[] {
  const line = testedLine(fit);
  if (line === null) return [];
  const curvature = curvatureFinding(fit, line);
  const found = [...curvature, ...repeatsFinding(fit, line)];
  if (!found.some(({ level }) => level === 'stop')) found.push(...runsFinding(fit, line));
  if (curvature.every(({ level }) => level === 'note')) found.push(...scatterFinding(fit, line));
  return [...found, ...chiSquaredFinding(line)];
}

function curvatureFinding({ axes, law, form }: Fit, line: Line): Finding[] {
  const { percent, p } = bow(line, axes.horizontal, axes.vertical);
  if (!(p < DOUBTFUL)) return [];
  const size = Math.abs(percent);
  if (size < SOME_BOW) return [note(checkWords.curvatureSmall(percent, p))];
  const rSquared = form.responseOnBothAxes ? Number.NaN : line.rSquared;
  const text = checkWords.curvature(percent, p, law.name, rSquared);
  return [size >= MUCH_BOW && p < CERTAIN ? stop(text) : caution(text)];
}

function repeatsFinding({ axes, law }: Fit, line: Line): Finding[] {
  const test = repeatsTest(line, axes.horizontal, axes.vertical);
  if (test === null) return [];
  if (!Number.isFinite(test.f)) return [note(checkWords.identicalRepeats())];
  if (!(test.p < DOUBTFUL)) return [];
  const text = checkWords.lackOfFit(test.groups, test.f, test.p, law.name);
  return [test.p < CERTAIN ? stop(text) : caution(text)];
}

function runsFinding({ axes, form }: Fit, line: Line): Finding[] {
  const p = runsP(axes.horizontal, line.residual);
  return p < DOUBTFUL ? [caution(checkWords.runs(p, form.against))] : [];
}

function scatterFinding(fit: Fit, line: Line): Finding[] {
  const { form, law, settings } = fit;
  if (settings.spreadX.kind !== 'none' || form.responseOnBothAxes) return [];
  const { p, direction } = scatterTest(line);
  if (!(p < DOUBTFUL)) return [];
  const plain = settings.spreadY.kind === 'none' && fit.direct === null;
  const advice =
    plain && direction < 0 && logResponse(fit) !== null
      ? checkWords.adviseEqual(law.response)
      : plain && direction > 0 && onOwnAxis(fit)
        ? checkWords.adviseProportional(law.response)
        : checkWords.adviseState();
  return [caution(checkWords.scatter(direction, p, form.plot, advice))];
}

function chiSquaredFinding({ scale, weightedSumOfSquares, degreesOfFreedom }: Line): Finding[] {
  if (scale !== 'known' || !(degreesOfFreedom > 0)) return [];
  const p = chiSquaredTail(weightedSumOfSquares, degreesOfFreedom);
  if (p < DOUBTFUL) return [caution(checkWords.chiSquaredHigh(weightedSumOfSquares, degreesOfFreedom, p))];
  return p > 1 - CERTAIN ? [note(checkWords.chiSquaredLow(weightedSumOfSquares, degreesOfFreedom))] : [];
}
