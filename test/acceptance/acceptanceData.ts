import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { root } from '../sheet/root.ts';

export type DataCell = number | string | null;

/** A pair of columns of the acceptance sheet. */
export interface AcceptanceData {
  readonly title: string;
  readonly source: string;
  readonly xHeading: string;
  readonly yHeading: string;
  readonly x: readonly DataCell[];
  readonly y: readonly DataCell[];
}

interface ReferenceRecord {
  readonly id: string;
  readonly columns: readonly { readonly name: string; readonly values: readonly number[] }[];
}

function published(file: string, id: string, about: Omit<AcceptanceData, 'x' | 'y'>): AcceptanceData {
  // The files' shape is described in test/reference/README.md.
  const records = JSON.parse(
    readFileSync(join(root, 'test', 'reference', file), 'utf8'),
  ) as ReferenceRecord[];
  const record = records.find((one) => one.id === id);
  const column = (name: string): readonly number[] => {
    const values = record?.columns.find((one) => one.name === name)?.values;
    if (values === undefined) throw new Error(`${file} has no column ${name} of ${id}`);
    return values;
  };
  return { ...about, x: column('x'), y: column('y') };
}

/** The readings of the acceptance sheet: three published sets, and an invented one with a gap, a remark and a blank tail. */
export function acceptanceData() {
  return {
    ozone: published('A-nist-linear.json', 'nist-strd-lls-norris', {
      title: 'Ozone monitors',
      source: 'NIST StRD, Norris',
      xHeading: 'reference monitor',
      yHeading: 'customer monitor',
    }),
    planets: published('D-handbook-laws.json', 'kepler-planets', {
      title: 'Planets',
      source: 'NASA/JPL Solar System Dynamics',
      xHeading: 'semi-major axis, au',
      yHeading: 'period, years',
    }),
    lamp: published('A-nist-straightened.json', 'straight-nist-strd-nls-danwood', {
      title: 'Radiated energy',
      source: 'NIST StRD, DanWood',
      xHeading: 'temperature, 1000 K',
      yHeading: 'energy',
    }),
    bottle: {
      title: 'Bottle test (invented)',
      source: 'invented: free chlorine in a bottle at 12 °C, one reading lost, the last rows not taken yet',
      xHeading: 'minutes',
      yHeading: 'chlorine, mg/L',
      x: [0, 10, 20, 30, 45, 60, 90, 120, null, null, null, null],
      y: [1.02, 0.87, 0.76, 'spilled', 0.51, 0.4, 0.22, 0.135, null, null, null, null],
    },
  } as const satisfies Record<string, AcceptanceData>;
}

export type DataName = keyof ReturnType<typeof acceptanceData>;
