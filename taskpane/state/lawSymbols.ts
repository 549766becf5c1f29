import { namedLaw } from '../../core/law/catalogue.ts';
import { parseLaw } from '../../core/law/parseLaw.ts';
import { attempt, valueIn } from './outcome.ts';

/** The equation that a law's text stands for: a catalogue name's, or the text itself. */
export function equationOf(law: string): string {
  return namedLaw(law)?.equation ?? law;
}

/** All constants of a law, known ones included; empty for a text that is no law. */
export function constantsOf(law: string): readonly string[] {
  return valueIn(attempt(() => parseLaw(equationOf(law))))?.constants ?? [];
}

/** Whether a law is one of the catalogue's general ones, whose constants are mere letters. */
export function isGeneral(law: string): boolean {
  return namedLaw(law)?.general ?? false;
}
