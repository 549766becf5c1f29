import type { Choice, Heading, Place, SpreadEntry } from './choice.ts';
import { constantsOf, isGeneral } from './lawSymbols.ts';

/** Choices made from a choice: each returns a new one and leaves the old one alone. */

export function withLaw(choice: Choice, law: string): Choice {
  if (law === choice.law) return choice;
  // A straight form's number belongs to the law that it was chosen for, and so do a general law's letters.
  const options = new Map(choice.options);
  options.delete('form');
  const letters = [choice.law, law].filter(isGeneral).flatMap(constantsOf);
  const own = (name: string): boolean => !letters.includes(name);
  return {
    ...choice,
    law,
    options,
    known: choice.known.filter(({ name }) => own(name)),
    units: new Map([...(choice.units ?? [])].filter(([name]) => own(name))),
  };
}

export function withOwnLaw(choice: Choice, law: string): Choice {
  const text = law.trim();
  if (text === '' || choice.ownLaws.includes(text)) return choice;
  return { ...choice, ownLaws: [...choice.ownLaws, text] };
}

export function withoutOwnLaw(choice: Choice, law: string): Choice {
  const without = { ...choice, ownLaws: choice.ownLaws.filter((one) => one !== law) };
  return choice.law === law ? withLaw(without, '') : without;
}

export function withKnown(choice: Choice, name: string, text: string): Choice {
  const others = choice.known.filter((entry) => entry.name !== name);
  return { ...choice, known: text.trim() === '' ? others : [...others, { name, text: text.trim() }] };
}

export function withSpread(choice: Choice, axis: 'x' | 'y', spread: SpreadEntry): Choice {
  return axis === 'x' ? { ...choice, spreadX: spread } : { ...choice, spreadY: spread };
}

/** @param value undefined takes the option back to its default */
export function withOption(choice: Choice, name: string, value: string | undefined): Choice {
  const options = new Map(choice.options);
  if (value === undefined) options.delete(name);
  else options.set(name, value);
  return { ...choice, options };
}

export function withUnit(choice: Choice, name: string, unit: string): Choice {
  const units = new Map(choice.units ?? []);
  if (unit.trim() === '') units.delete(name);
  else units.set(name, unit.trim());
  return { ...choice, units };
}

export function withHeading(choice: Choice, axis: 'x' | 'y', heading: Heading): Choice {
  return axis === 'x' ? { ...choice, xHeading: heading } : { ...choice, yHeading: heading };
}

export function swapped(choice: Choice): Choice {
  return {
    ...choice,
    x: choice.y,
    y: choice.x,
    xHeading: choice.yHeading,
    yHeading: choice.xHeading,
    // Words such as "proportional" make sense for y only; stated uncertainties go with their readings.
    spreadX: /equal|proportional/i.test(textOf(choice.spreadY)) ? { kind: 'text', text: '' } : choice.spreadY,
    spreadY: choice.spreadX,
  };
}

function textOf(spread: SpreadEntry): string {
  return spread.kind === 'text' ? spread.text : '';
}

export function withLeftOut(choice: Choice, position: number, out: boolean): Choice {
  const others = choice.leftOut.filter((one) => one !== position);
  return { ...choice, leftOut: out ? [...others, position].sort((a, b) => a - b) : others };
}

/** Takes another column as x or y; when it is the other one of the two, they change places. */
export function withColumn(choice: Choice, axis: 'x' | 'y', place: Place, heading: Heading): Choice {
  const other = axis === 'x' ? choice.y : choice.x;
  if (other.sheet === place.sheet && other.address === place.address) return swapped(choice);
  return { ...withHeading(choice, axis, heading), [axis]: place, leftOut: [] };
}

/** Takes other readings: what was said of single cells beside the old ones does not hold for them. */
export function withReadings(
  choice: Choice,
  readings: Pick<Choice, 'x' | 'y' | 'xHeading' | 'yHeading'>,
): Choice {
  const spread = (entry: SpreadEntry): SpreadEntry =>
    entry.kind === 'range' ? { kind: 'text', text: '' } : entry;
  return {
    ...choice,
    ...readings,
    spreadY: spread(choice.spreadY),
    spreadX: spread(choice.spreadX),
    leftOut: [],
  };
}

/** Whether uncertainties that stood in cells are no longer there. */
export function losesSpread(before: Choice, after: Choice): boolean {
  return (['spreadX', 'spreadY'] as const).some(
    (axis) => before[axis].kind === 'range' && after[axis].kind !== 'range',
  );
}
