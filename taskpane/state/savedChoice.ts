import type { Choice, Heading, KnownEntry, Place, SpreadEntry } from './choice.ts';
import { noChoice } from './noChoice.ts';

/** Grows when what is saved changes its shape. */
const VERSION = 1;

/** A choice as text for the workbook's settings. */
export function saveChoice(choice: Choice): string {
  const { options, units, ...rest } = choice;
  return JSON.stringify({
    version: VERSION,
    choice: { ...rest, options: [...options], units: [...(units ?? [])] },
  });
}

/** A saved choice, part by part: what another version or another hand left unreadable keeps its default. */
export function loadChoice(saved: unknown): Choice | undefined {
  if (typeof saved !== 'string') return undefined;
  let parsed: unknown;
  try {
    parsed = JSON.parse(saved);
  } catch {
    return undefined;
  }
  if (!isRecord(parsed) || parsed['version'] !== VERSION || !isRecord(parsed['choice'])) return undefined;
  const found = parsed['choice'];
  return {
    x: place(found['x']) ?? noChoice.x,
    y: place(found['y']) ?? noChoice.y,
    xHeading: heading(found['xHeading']) ?? noChoice.xHeading,
    yHeading: heading(found['yHeading']) ?? noChoice.yHeading,
    law: text(found['law']),
    ownLaws: list(found['ownLaws']).filter(isText),
    known: list(found['known']).flatMap(knownEntry),
    spreadY: spread(found['spreadY']) ?? noChoice.spreadY,
    spreadX: spread(found['spreadX']) ?? noChoice.spreadX,
    options: pairs(found['options']),
    leftOut: list(found['leftOut']).filter((one): one is number => Number.isSafeInteger(one)),
    units: pairs(found['units']),
  };
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function isText(value: unknown): value is string {
  return typeof value === 'string';
}

function text(value: unknown): string {
  return isText(value) ? value : '';
}

function list(value: unknown): readonly unknown[] {
  return Array.isArray(value) ? value : [];
}

function place(value: unknown): Place | undefined {
  if (!isRecord(value) || !isText(value['sheet']) || !isText(value['address'])) return undefined;
  return { sheet: value['sheet'], address: value['address'] };
}

function heading(value: unknown): Heading | undefined {
  return isRecord(value) ? { name: text(value['name']), unit: text(value['unit']) } : undefined;
}

function knownEntry(value: unknown): KnownEntry[] {
  return isRecord(value) && isText(value['name']) ? [{ name: value['name'], text: text(value['text']) }] : [];
}

function spread(value: unknown): SpreadEntry | undefined {
  if (!isRecord(value)) return undefined;
  const range = place(value['place']);
  if (value['kind'] === 'range' && range !== undefined) return { kind: 'range', place: range };
  return value['kind'] === 'text' ? { kind: 'text', text: text(value['text']) } : undefined;
}

function pairs(value: unknown): ReadonlyMap<string, string> {
  const found = new Map<string, string>();
  for (const pair of list(value)) {
    const [key, held] = list(pair);
    if (isText(key) && isText(held)) found.set(key, held);
  }
  return found;
}
