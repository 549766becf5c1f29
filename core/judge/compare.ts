import type { FitSettings } from '../given/given.ts';
import { namedLaw } from '../law/catalogue.ts';
import { compileLaw } from '../law/compileLaw.ts';
import { parseLaw } from '../law/parseLaw.ts';
import { Problem } from '../problem.ts';
import type { Readings } from '../readings/readings.ts';
import { akaikeWeights } from '../straightness/likelihood.ts';
import { judgeWords } from '../words/judgeWords.ts';
import { allSteps } from './allSteps.ts';
import { type JudgedLaw, judgeLaw } from './judgeLaw.ts';
import { SharedColumns } from './sharedColumns.ts';

/** One law of a comparison; '' where a number does not exist. */
export interface ComparedLaw {
  readonly rank: number | '';
  /** As it was asked for: a catalogue name or an equation. */
  readonly law: string;
  /** Akaike weight among the eligible laws, in percent. */
  readonly support: number | '';
  readonly aicc: number | '';
  readonly rSquared: number | '';
  readonly bowPercent: number | '';
  readonly misfit: number | '';
  /** Why the law is not eligible; empty when it is. */
  readonly reason: string;
}

export interface Comparison {
  /** Eligible laws best first, then the others in the order given. */
  readonly rows: readonly ComparedLaw[];
}

/**
 * Ranks laws on the same readings by AICc, the likelihood that of the lines on their straight axes (`judge=line`) or of
 * their direct fits (`judge=direct`). With errors in both axes, where there is no AICc, the order is that of the weighted
 * sum of squares + 2 per constant. Only laws that take every reading are eligible, whatever `outside` says.
 * @param readings complete readings, n
 * @param laws catalogue names and equations, each once; a repeated one counts once
 * @param settings known constants that stand in at least one of the laws; each law takes those it has
 * @throws Problem `argument` for a text that is no law or a known constant that is in none
 * @see Burnham & Anderson (2002), Model Selection and Multimodel Inference, 2nd ed., sections 2.4, 2.9 and 2.11.3
 */
export function compare(readings: Readings, laws: readonly string[], settings: FitSettings): Comparison {
  return allSteps(compareSteps(readings, laws, settings));
}

/** As `compare`, pausing after each law so that the caller can stay responsive. */
export function* compareSteps(
  readings: Readings,
  laws: readonly string[],
  settings: FitSettings,
): Generator<JudgedLaw, Comparison> {
  const { judge } = settings.options;
  if (judge === 'direct' && settings.spreadX.kind !== 'none') {
    throw new Problem('argument', 'options', judgeWords.directNeedsExactX());
  }
  const tasks = [...new Set(laws.map((text) => text.trim()))].map((text) => ({
    text,
    settings: { ...settings, known: knownOf(text, settings) },
  }));
  for (const name of settings.known.keys()) {
    if (!tasks.some((task) => task.settings.known.has(name))) {
      throw new Problem('argument', 'known', judgeWords.knownNowhere(name));
    }
  }
  const judged: JudgedLaw[] = [];
  const columns = new SharedColumns();
  for (const task of tasks) {
    const one = judgeLaw(readings, task.text, task.settings, columns);
    judged.push(one);
    yield one;
  }
  return ranked(judged);
}

/**
 * The known constants that a law has.
 * @throws Problem `argument` when the text is no law
 */
function knownOf(text: string, { known }: FitSettings): FitSettings['known'] {
  try {
    // Compiled laws are remembered. Without known constants a law may still be unsettled, which is a reason of its own.
    if (known.size === 0 || (namedLaw(text) === undefined && !text.includes('='))) {
      compileLaw(text, []);
      return known;
    }
    return knownIn(text, known);
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    if (error.code !== 'argument') return known;
    requireLaw(text, error);
    return known;
  }
}

/** The known constants that stand in a law. */
function knownIn(text: string, known: FitSettings['known']): FitSettings['known'] {
  const { constants } = parseLaw(namedLaw(text)?.equation ?? text, known.keys());
  return new Map([...known].filter(([name]) => constants.includes(name)));
}

/** @throws Problem `argument` of `laws` when the text itself is at fault */
function requireLaw(text: string, problem: Problem): void {
  try {
    if (text.includes('=')) {
      parseLaw(text);
      return;
    }
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
  }
  throw new Problem('argument', 'laws', problem.message);
}

/** Puts judged laws in their order: eligible ones best first with the support each has, then the others. */
export function ranked(judged: readonly JudgedLaw[]): Comparison {
  const eligible = judged
    .filter(({ reason }) => reason === '')
    .sort((a, b) => order(a.criterion, b.criterion));
  const supports = eligible.some((one) => Number.isNaN(one.aicc))
    ? []
    : akaikeWeights(eligible.map((one) => one.aicc));
  const rows = eligible.map((one, index) => ({
    rank: index + 1,
    ...numbersOf(one),
    support: orNothing(100 * (supports[index] ?? Number.NaN)),
  }));
  const others = judged
    .filter(({ reason }) => reason !== '')
    .map((one) => ({ rank: '' as const, ...numbersOf(one), support: '' as const }));
  return { rows: [...rows, ...others] };
}

/** Ascending, equal infinities level. */
function order(a: number, b: number): number {
  return a === b ? 0 : a - b;
}

function numbersOf(one: JudgedLaw): Omit<ComparedLaw, 'rank' | 'support'> {
  return {
    law: one.law,
    aicc: orNothing(one.aicc),
    rSquared: orNothing(one.rSquared),
    bowPercent: orNothing(one.bowPercent),
    misfit: orNothing(one.misfit),
    reason: one.reason,
  };
}

function orNothing(value: number): number | '' {
  return Number.isFinite(value) ? value : '';
}
