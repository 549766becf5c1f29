import { listLaws } from '../../core/law/catalogue.ts';
import { parseLaw } from '../../core/law/parseLaw.ts';
import { attempt, valueIn } from './outcome.ts';

type ListedLaw = ReturnType<typeof listLaws>[number];

let listed: readonly ListedLaw[] | undefined;

/** The laws that can be asked for by name, listed once. */
export function cataloguedLaws(): readonly ListedLaw[] {
  listed ??= listLaws();
  return listed;
}

/** The law of that name, in any case. */
export function lawNamed(name: string): ListedLaw | undefined {
  const wanted = name.trim().toLowerCase();
  return cataloguedLaws().find((law) => law.name.toLowerCase() === wanted);
}

/** The equation that a law's text stands for. */
export function equationOf(law: string): string {
  return lawNamed(law)?.equation ?? law;
}

/** All constants of a law, known ones included; empty for a text that is no law. */
export function constantsOf(law: string): readonly string[] {
  return valueIn(attempt(() => parseLaw(equationOf(law))))?.constants ?? [];
}
