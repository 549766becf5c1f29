import { Problem } from '../problem.ts';
import { numberFromText } from '../readings/numberFromText.ts';
import { argumentWords } from '../words/argumentWords.ts';
import { cellText, type Given, isRange, single } from './cellText.ts';
import type { Known } from './given.ts';

const SYMBOL = /^[\p{L}_][\p{L}\p{M}\p{N}_.']*$/u;

function refuse(message: string): never {
  throw new Problem('argument', 'known', message);
}

function numberFor(symbol: string, text: string, what: 'value' | 'standard uncertainty'): number {
  if (text.includes(',')) refuse(argumentWords.decimalComma('known', text));
  const value = numberFromText(text);
  if (Number.isNaN(value)) refuse(argumentWords.knownNumber(symbol, text, what));
  return value;
}

/**
 * Known constants from text `R=1000; V0=12±0.05` (`+/-` for `±`) or from rows *name, value, [standard uncertainty]*.
 * @returns symbols (case-sensitive) with value and standard uncertainty, 0 when none is given
 * @throws Problem `argument` naming the entry that cannot be read or stands twice; `cell` when a cell holds an error
 * @example parseKnown('V0=12±0.05').get('V0') // { value: 12, standardUncertainty: 0.05 }
 */
export function parseKnown(given: Given): Known {
  const known = new Map<string, { value: number; standardUncertainty: number }>();
  const add = (symbol: string, valueText: string, uncertaintyText: string): void => {
    if (!SYMBOL.test(symbol)) refuse(argumentWords.knownSymbol(symbol));
    if (known.has(symbol)) refuse(argumentWords.knownTwice(symbol));
    const value = numberFor(symbol, valueText, 'value');
    const standardUncertainty =
      uncertaintyText === '' ? 0 : numberFor(symbol, uncertaintyText, 'standard uncertainty');
    if (standardUncertainty < 0) refuse(argumentWords.knownNegative(symbol, standardUncertainty));
    known.set(symbol, { value, standardUncertainty });
  };
  const whole = single(given);
  if (isRange(whole)) {
    whole.forEach((row, index) => {
      const cells = row.map((cell) => cellText(cell, 'known'));
      const filled = cells.filter((text) => text !== '').length;
      if (filled === 0) return;
      const [symbol = '', value = '', uncertainty = ''] = cells;
      if (cells.length === 1 && symbol.includes('=')) addEntry(symbol, add);
      else if (filled < 2 || filled > 3) refuse(argumentWords.knownColumns(index + 1, filled));
      else add(symbol, value, uncertainty);
    });
    return known;
  }
  for (const entry of cellText(whole, 'known').split(/[;\n]/))
    if (entry.trim() !== '') addEntry(entry.trim(), add);
  return known;
}

function addEntry(entry: string, add: (symbol: string, value: string, uncertainty: string) => void): void {
  const equals = entry.indexOf('=');
  if (equals < 1) refuse(argumentWords.knownEntry(entry));
  const symbol = entry.slice(0, equals).trim();
  const parts = entry
    .slice(equals + 1)
    .replace('+/-', '±')
    .split('±');
  const [value = '', uncertainty] = parts.map((part) => part.trim());
  if (parts.length > 2) refuse(argumentWords.knownEntry(entry));
  if (uncertainty === '') refuse(argumentWords.knownNumber(symbol, '', 'standard uncertainty'));
  add(symbol, value, uncertainty ?? '');
}
