import type { Heading } from './choice.ts';

/** Longer texts above a column are remarks rather than its name. */
const LONGEST = 48;

/**
 * A header cell's text as name and unit: `time / h`, `C / (mg/L)`, `T (°C)`, `p [bar]`, `flow, L/s`.
 * @example parseHeading('C / (mg/L)') // { name: 'C', unit: 'mg/L' }
 */
export function parseHeading(text: string): Heading | undefined {
  const trimmed = text.trim().replace(/\s+/g, ' ');
  if (trimmed === '' || trimmed.length > LONGEST) return undefined;
  const slash = /^([^/,]+?) ?\/ ?(.+)$/.exec(trimmed);
  const bracket = /^(.+?) ?(?:\(([^()]+)\)|\[([^[\]]+)\])$/.exec(trimmed);
  // In `T (m/s)` the slash belongs to the unit.
  if (slash?.[1] !== undefined && slash[2] !== undefined && !/[([][^)\]]*$/.test(slash[1])) {
    return { name: slash[1], unit: slash[2].replace(/^\((.+)\)$/, '$1') };
  }
  if (bracket?.[1] !== undefined) return { name: bracket[1], unit: bracket[2] ?? bracket[3] ?? '' };
  const comma = /^(.+?), ?([^ ,]{1,10})$/.exec(trimmed);
  if (comma?.[1] !== undefined && comma[2] !== undefined) return { name: comma[1], unit: comma[2] };
  return { name: trimmed, unit: '' };
}

/** A quantity as an axis shows it: `time / h`, `C / (mg/L)`. */
export function headingText({ name, unit }: Heading): string {
  if (unit === '') return name;
  return `${name} / ${/[/ ·*]/.test(unit) ? `(${unit})` : unit}`;
}
