import type { Fit } from '../fit/fit.ts';
import type { DerivedConstant } from '../law/law.ts';
import { workingsWords } from '../words/workingsWords.ts';
import { plainEnds } from './constantEnds.ts';
import type { ConstantCells } from './constantSteps.ts';
import type { Desk } from './desk.ts';

/** Writes the constants that the law derives from one of its own, where they exist. */
export function derivedSteps(
  desk: Desk,
  constants: readonly ConstantCells[],
  factor: string | null,
): ConstantCells[] {
  return desk.fit.law.derived.flatMap((derived) => {
    const parent = constants.find(({ name }) => name === derived.from);
    const estimate = desk.fit.constants.find(({ name }) => name === derived.name);
    if (parent === undefined || estimate === undefined || !Number.isFinite(estimate.value)) return [];
    const multiple = multipleOfReciprocal(derived, settledValue(desk.fit, derived.from));
    return multiple === null ? [] : [reciprocalSteps(desk, derived, parent, multiple, factor)];
  });
}

function settledValue({ law, values }: Fit, name: string): number {
  return values[law.constants.indexOf(name)] ?? Number.NaN;
}

/** c of a derived constant that is c divided by its source, as a formula and as text; null for any other kind. */
function multipleOfReciprocal(derived: DerivedConstant, at: number): readonly [string, string] | null {
  const multiple = derived.value(at) * at;
  const others = [at / 2, at * 3].map((source) => derived.value(source) * source);
  if (!others.every((other) => Math.abs(other - multiple) <= 1e-14 * Math.abs(multiple))) return null;
  const named: readonly (readonly [number, string, string])[] = [
    [Math.LN2, 'LN(2)', 'ln 2'],
    [1, '1', '1'],
  ];
  for (const [size, formula, text] of named) {
    if (Math.abs(Math.abs(multiple) - size) > 1e-14 * size) continue;
    return multiple < 0 ? [`-${formula}`, `−${text}`] : [formula, text];
  }
  return null;
}

function reciprocalSteps(
  desk: Desk,
  { name, from }: DerivedConstant,
  parent: ConstantCells,
  [multiple, text]: readonly [string, string],
  factor: string | null,
): ConstantCells {
  const { writer } = desk;
  const value = writer.step(
    name,
    `${multiple}/${parent.value}`,
    workingsWords.derivedHow(name, `${text}/${from}`),
  );
  const { low, high, carried } = parent;
  if (factor === null || parent.standardUncertainty === null) {
    return { name, value, standardUncertainty: null, low: null, high: null, carried };
  }
  const standardUncertainty = writer.step(
    workingsWords.standardUncertainty(name),
    `ABS(${value}/${parent.value})*${parent.standardUncertainty}`,
    workingsWords.derivedUncertaintyHow(name, from),
  );
  if (!carried || low === null || high === null) {
    const ends = plainEnds(desk, name, value, standardUncertainty, factor);
    return { name, value, standardUncertainty, ...ends, carried };
  }
  // An interval of the source that reaches 0 has no image.
  const image = (pick: 'MIN' | 'MAX'): string =>
    `IF(N(${low})*N(${high})>0,${pick}(${multiple}/${low},${multiple}/${high}),"")`;
  const how = workingsWords.carriedEndHow(from, name);
  return {
    name,
    value,
    standardUncertainty,
    low: writer.step(workingsWords.low(name), image('MIN'), how),
    high: writer.step(workingsWords.high(name), image('MAX'), how),
    carried,
  };
}
