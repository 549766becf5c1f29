import { Problem } from '../problem.ts';
import { lawWords } from '../words/lawWords.ts';
import { Algebra, bitOf, MOST_SYMBOLS } from './algebra.ts';
import { clearedRelation } from './clearedRelation.ts';
import { columnFunction } from './columnFunction.ts';
import { curveOf, type ImplicitCurve } from './curveOf.ts';
import { type Expression, negate, sumOf } from './expression.ts';
import { findForms, findWideForms, MOST_TRIALS } from './findForms.ts';
import { isLinearIn } from './isLinearIn.ts';
import type { ColumnFunction, Law } from './law.ts';
import { lazy } from './lazy.ts';
import { type NamedLaw, namedLaw, namedLaws } from './namedLaws.ts';
import { nearNames } from './nearNames.ts';
import { toNode } from './nodes.ts';
import { type ParsedLaw, parseLaw } from './parseLaw.ts';
import { printExpression } from './printExpression.ts';
import { requireSettled } from './requireSettled.ts';
import { samplePoints } from './samplePoints.ts';
import { solvedFor } from './strictFunction.ts';

/** Constants that a law may have: two symbols are the readings, three stand for the line's terms and an axis. */
export const MOST_CONSTANTS = MOST_SYMBOLS - 5;
/** Beyond so many unknown constants rounding hides what readings can settle, and no line is found anyway. */
const MOST_CHECKED = 8;
/** Laws remembered, the latest used last. */
const MOST_REMEMBERED = 200;

const remembered = new Map<string, Law | Problem>();

/**
 * Compiles a law: reads it, straightens it, and solves slope and intercept for its constants.
 * @param law catalogue name in any case, or an equation
 * @param known names of the constants whose values are given
 * @returns the law; the same object for the same text and names
 * @throws Problem `argument` for a text that is no law or a known name that is not in it; `unsettled` when readings
 * settle only a combination of the constants; `notStraight` when no form with at most two trial constants exists
 */
export function compileLaw(law: string, known: Iterable<string>): Law {
  const names = [...new Set(known)].sort();
  const key = [law, ...names].join('\n');
  const found = remembered.get(key);
  const compiled = found ?? attempt(law, names);
  remembered.delete(key);
  remembered.set(key, compiled);
  if (remembered.size > MOST_REMEMBERED) {
    for (const oldest of remembered.keys()) {
      remembered.delete(oldest);
      break;
    }
  }
  if (compiled instanceof Problem) throw compiled;
  return compiled;
}

function attempt(law: string, known: readonly string[]): Law | Problem {
  try {
    return compile(law, known);
  } catch (error) {
    if (error instanceof Problem) return error;
    throw error;
  }
}

function compile(text: string, given: readonly string[]): Law {
  const named = namedLaw(text);
  if (named === undefined && !text.includes('=')) throw notALaw(text);
  const parsed = parseLaw(named?.equation ?? text, given);
  const { response, predictor, constants } = parsed;
  if (constants.length > MOST_CONSTANTS) {
    throw new Problem('argument', 'law', lawWords.tooManySymbols(constants.length, MOST_CONSTANTS));
  }
  const builtIn = new Map([...(named?.builtIn ?? [])].filter(([name]) => !given.includes(name)));
  for (const name of given) requireConstant(name, parsed);
  const known = constants.filter((name) => given.includes(name) || builtIn.has(name));
  const unknown = constants.filter((name) => !known.includes(name));
  if (unknown.length === 0) throw new Problem('argument', 'law', lawWords.noUnknowns(known));

  const symbols = [predictor, response, ...constants];
  const g = new Algebra();
  const indexOf = (name: string): number => symbols.indexOf(name);
  const difference = sumOf(parsed.left, negate(parsed.right));
  const equation = g.subtract(toNode(g, parsed.left, indexOf), toNode(g, parsed.right, indexOf));
  if ((equation.mask & bitOf(0)) === 0)
    throw new Problem('argument', 'law', lawWords.predictorMissing(predictor));
  if ((equation.mask & bitOf(1)) === 0)
    throw new Problem('argument', 'law', lawWords.responseMissing(response));

  const strict = columnFunction(difference, symbols);
  const { curve, responseAt } = parsed.explicit
    ? explicitCurve(parsed.right, symbols)
    : curveOf({ g, equation, strict, symbols });
  const { plain, wide, rows } = samplePoints(symbols.length, responseAt);
  if (plain.length + wide.length < 3) throw new Problem('notStraight', 'law', lawWords.nowhere());
  const ground = { g, symbols, plain: plain.length > 0 ? plain : wide, wide };
  const places = unknown.map((name) => ({ name, place: indexOf(name) }));
  if (unknown.length <= MOST_CHECKED) requireSettled(strict, [...plain, ...wide], responseAt, places);

  const linear =
    curve !== null &&
    isLinearIn(
      curve,
      [...plain, ...wide],
      places.map(({ place }) => place),
    );
  const task = { ...ground, unknown: places.map(({ place }) => place), linear, rows, curve };
  const decimal = isDecimal(difference);
  const narrow = findForms(equation, task, decimal);
  // Polynomials and their ratios are solved without a search over the trial constants.
  const solved =
    narrow.length === 0 &&
    (linear || (curve !== null && clearedRelation(curve.expression, symbols, unknown) !== null));
  const forms = solved ? findWideForms(equation, task, decimal) : narrow;
  if (forms.length === 0) {
    throw new Problem('notStraight', 'law', lawWords.notStraight(unknown, 2 + MOST_TRIALS));
  }
  const inverse = lazy(() => solvedFor(equation, 0, ground));
  return {
    name: named?.name ?? '',
    equation: named?.equation ?? equationText(parsed),
    response,
    predictor,
    constants,
    known,
    unknown,
    symbols,
    builtIn,
    curve,
    get inverse() {
      return inverse();
    },
    linearInConstants: linear,
    forms,
    derived: (named?.derived ?? []).filter(({ from }) => unknown.includes(from)),
  };
}

function explicitCurve(right: Expression, symbols: readonly string[]): ImplicitCurve {
  const curve: ColumnFunction = columnFunction(right, symbols);
  return { curve, responseAt: (values) => curve.at(values) };
}

function notALaw(text: string): Problem {
  const name = text.trim();
  if (name === '') return new Problem('argument', 'law', lawWords.empty());
  const near = nearNames(
    name,
    namedLaws.map((one: NamedLaw) => one.name),
  );
  return new Problem('argument', 'law', lawWords.unknownLaw(name, near));
}

/** @throws Problem `argument` for a known name that is no constant of the law */
function requireConstant(name: string, { constants, response, predictor }: ParsedLaw): void {
  if (constants.includes(name)) return;
  const words = name === response || name === predictor ? lawWords.knownVariable : lawWords.knownNotThere;
  throw new Problem('argument', 'known', words(name, constants));
}

/** True when the law is written with powers of 10 or logarithms to base 10. */
function isDecimal(part: Expression): boolean {
  const isTen = (one: Expression): boolean => one.kind === 'number' && one.value === 10;
  switch (part.kind) {
    case 'sum':
      return part.terms.some(isDecimal);
    case 'product':
      return part.factors.some(isDecimal);
    case 'power':
      return isTen(part.base) || isDecimal(part.base) || isDecimal(part.exponent);
    case 'function':
      return (part.name === 'ln' && isTen(part.argument)) || isDecimal(part.argument);
    default:
      return false;
  }
}

function equationText({ left, right, response, predictor, explicit }: ParsedLaw): string {
  const side = (expression: Expression): string => printExpression(expression, 'formula');
  return explicit
    ? `${response}(${predictor}) = ${side(right)}`
    : `${response}(${predictor}): ${side(left)} = ${side(right)}`;
}
