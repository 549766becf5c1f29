import { cautionWords } from '../words/cautionWords.ts';
import { compileLaw } from './compileLaw.ts';
import type { Law } from './law.ts';
import { namedLaw, namedLaws } from './namedLaws.ts';

export { type NamedLaw, namedLaw, namedLaws } from './namedLaws.ts';

/** Names of the laws that readings of unknown origin are compared with. */
export const generalLaws: readonly string[] = namedLaws
  .filter(({ general }) => general)
  .map(({ name }) => name);

/** A row of the list of laws. */
export interface LawRow {
  readonly name: string;
  readonly equation: string;
  readonly plot: string;
  readonly against: string;
  readonly slope: string;
  readonly intercept: string;
  readonly use: string;
}

/** Every law of the catalogue with its best straight form when nothing is known. */
export function listLaws(): LawRow[] {
  return namedLaws.map(({ name, equation, use }) => {
    const [form] = compileLaw(name, []).forms;
    const { plot = '', against = '', slope = '', intercept = '' } = form ?? {};
    return { name, equation, plot, against, slope, intercept, use };
  });
}

/** A row of the list of a law's straight forms. */
export interface FormRow {
  readonly form: number;
  readonly plot: string;
  readonly against: string;
  readonly slope: string;
  readonly intercept: string;
  /** Trial constants, joined by commas. */
  readonly trial: string;
  readonly note: string;
}

/** Every straight form of a law, best first. */
export function listForms(law: Law): FormRow[] {
  return law.forms.map(({ number, plot, against, slope, intercept, trials, note }) => ({
    form: number,
    plot,
    against,
    slope,
    intercept,
    trial: trials.join(', '),
    note,
  }));
}

/** What a user of a law must be warned of; null when there is nothing, and for the user's own laws. */
export function cautionOf(law: Law): string | null {
  const word = namedLaw(law.name)?.caution ?? null;
  return word === null ? null : cautionWords[word]();
}
