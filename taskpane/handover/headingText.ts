import { handoverWords } from '../../core/words/handoverWords.ts';
import type { Heading } from '../state/choice.ts';

/** A quantity with its unit, as an axis says it: `time / h`; the law's symbol where the column has no name. */
export function headingText({ name, unit }: Heading, symbol: string): string {
  return handoverWords.axisTitle(name === '' ? symbol : name, unit);
}
