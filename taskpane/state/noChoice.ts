import type { Choice, Place } from './choice.ts';

export const noPlace: Place = { sheet: '', address: '' };

/** Nothing chosen yet. */
export const noChoice: Choice = {
  x: noPlace,
  y: noPlace,
  xHeading: { name: 'x', unit: '' },
  yHeading: { name: 'y', unit: '' },
  law: '',
  ownLaws: [],
  known: [],
  spreadY: { kind: 'text', text: '' },
  spreadX: { kind: 'text', text: '' },
  options: new Map(),
  leftOut: [],
  units: new Map(),
};

export function hasReadings(choice: Choice): boolean {
  return choice.x.address !== '' && choice.y.address !== '';
}
