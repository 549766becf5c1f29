import type { Fit } from '../../core/fit/fit.ts';
import { numberLiteral, textLiteral } from '../../core/workings/literals.ts';
import { qualified } from '../host/address.ts';
import type { Choice, Place, SpreadEntry } from '../state/choice.ts';
import { knownText, optionsText } from '../state/settingsFor.ts';

/** The arguments that every fitting function shares, as formulas; empty for one that is left out. */
export interface CallArguments {
  readonly x: string;
  readonly y: string;
  readonly law: string;
  readonly known: string;
  readonly uY: string;
  readonly uX: string;
  readonly options: string;
}

/** A call of one of Tautline's sheet functions, without `=`. @param own what the function takes after the law */
export function sheetCall(name: string, given: CallArguments, own: readonly string[] = []): string {
  const list = [given.x, given.y, given.law, ...own, given.known, given.uY, given.uX, given.options];
  while (list.at(-1) === '') list.pop();
  return `TAUT.${name}(${list.join(',')})`;
}

/** A place in a formula, fixed: `Weir!$A$6:$A$40`; without the sheet's name on the sheet itself. */
export function fixedPlace({ sheet, address }: Place, on: string): string {
  const fixed = address
    .split(':')
    .map((end) =>
      end.replace(
        /^([A-Za-z]+)?(\d+)?$/,
        (_, column?: string, row?: string) =>
          `${column === undefined ? '' : `$${column.toUpperCase()}`}${row === undefined ? '' : `$${row}`}`,
      ),
    )
    .join(':');
  return sheet === on ? fixed : qualified(sheet, fixed);
}

/** The arguments written out: ranges as references, everything else as text or numbers in the formula. */
export function literalArguments(choice: Choice, fit: Fit, on: string): CallArguments {
  const known = knownText(choice, fit.law.known);
  const options = optionsText(choice);
  return {
    x: fixedPlace(choice.x, on),
    y: fixedPlace(choice.y, on),
    law: textLiteral(choice.law),
    known: known === '' ? '' : textLiteral(known),
    uY: spreadArgument(choice.spreadY, on),
    uX: spreadArgument(choice.spreadX, on),
    options: options === '' ? '' : textLiteral(options),
  };
}

/** An uncertainty of the readings as a formula; empty when there is none. */
export function spreadArgument(entry: SpreadEntry, on: string): string {
  if (entry.kind === 'range') return fixedPlace(entry.place, on);
  const text = entry.text.trim();
  if (text === '') return '';
  const value = Number(text);
  return Number.isFinite(value) ? numberLiteral(value) : textLiteral(text);
}
