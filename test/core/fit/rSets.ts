import { readFileSync } from 'node:fs';

/** What a published or recomputed fit of one law to one data set says; see test/reference/README.md. */
export interface ReferenceLine {
  readonly coefficients: { readonly c0?: number; readonly c1: number };
  readonly standardErrors: { readonly c0?: number; readonly c1: number };
  readonly rSquared: number;
  readonly sigma: number;
  readonly predict: readonly ReferencePrediction[];
  readonly natural: {
    readonly parameters: Readonly<Record<string, number>>;
    readonly deltaMethodStandardErrors: Readonly<Record<string, number>>;
  };
}

export interface ReferencePrediction {
  readonly x: number;
  readonly Yfit: number;
  readonly seFit: number;
  readonly conf95: readonly [number, number];
  readonly pred95: readonly [number, number];
  readonly backTransformed?: {
    readonly y: number;
    readonly conf95: readonly [number, number];
    readonly pred95: readonly [number, number];
  };
}

export interface ReferenceDirect {
  readonly converged?: boolean;
  readonly error?: string;
  readonly coefficients: Readonly<Record<string, number>>;
  readonly standardErrors: Readonly<Record<string, number>>;
  readonly sigma: number;
  readonly relativeOffset: number;
  readonly predict: readonly {
    readonly x: number;
    readonly fit: number;
    readonly seFit: number;
    readonly conf95: readonly [number, number];
    readonly pred95: readonly [number, number];
  }[];
}

export interface ReferenceLaw {
  readonly law: string;
  readonly axes: { readonly Y: string; readonly X: string };
  readonly ols: ReferenceLine;
  readonly wls?: ReferenceLine & { readonly weights: string };
  readonly direct?: ReferenceDirect;
}

export interface ReferenceSet {
  readonly id: string;
  readonly name: string;
  readonly source: { readonly citation: string };
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly laws: readonly ReferenceLaw[];
}

/** The sets of C and D (R data sets, handbook tables) and the straightened NIST sets. */
export function referenceSets(): ReferenceSet[] {
  return ['A-nist-straightened', 'C-r-data-sets', 'D-handbook-laws'].flatMap((file) => {
    const text = readFileSync(new URL(`../../reference/${file}.json`, import.meta.url), 'utf8');
    // The files' shape is described in test/reference/README.md.
    const records = JSON.parse(text) as {
      id: string;
      name: string;
      source: { citation: string };
      columns: { name: string; values: number[] }[];
      reference: { laws: ReferenceLaw[] };
    }[];
    return records.map(({ id, name, source, columns, reference }) => ({
      id,
      name,
      source,
      x: columns.find((column) => column.name === 'x')?.values ?? [],
      y: columns.find((column) => column.name === 'y')?.values ?? [],
      laws: reference.laws,
    }));
  });
}

/** Our law and axes for a law of the reference files, with our symbols for its parameters. */
export const ourLaws: Readonly<
  Record<
    string,
    { readonly law: string; readonly plot: string; readonly symbols: Readonly<Record<string, string>> }
  >
> = {
  linear: { law: 'straight line', plot: 'y against x', symbols: { a: 'a', b: 'b' } },
  power: { law: 'power', plot: 'ln y against ln x', symbols: { a: 'p', b: 'q' } },
  exponential: { law: 'exponential', plot: 'ln y against x', symbols: { a: 'p', b: 'q' } },
  square: { law: 'y(x) = (a + b*x)^2', plot: '√y against x', symbols: { a: 'a', b: 'b' } },
  saturation_reciprocal: { law: 'saturation', plot: '1/y against 1/x', symbols: { a: 'p', b: 'q' } },
  saturation_ratio: { law: 'saturation', plot: 'x/y against x', symbols: { a: 'p', b: 'q' } },
  saturation_swapped: { law: 'saturation', plot: 'y against y/x', symbols: { a: 'p', b: 'q' } },
  logarithmic: { law: 'logarithmic', plot: 'y against ln x', symbols: { a: 'a', b: 'b' } },
  root: { law: 'root', plot: 'y against √x', symbols: { a: 'a', b: 'b' } },
  hyperbola: { law: 'hyperbolic', plot: 'y against 1/x', symbols: { a: 'a', b: 'b' } },
  arrhenius: { law: 'inverse exponential', plot: 'ln y against 1/x', symbols: { a: 'p', b: 'q' } },
  reciprocal: { law: 'reciprocal', plot: '1/y against x', symbols: { a: 'a', b: 'b' } },
  proportional: { law: 'proportional', plot: 'y against x', symbols: { b: 'b' } },
  gamow: { law: 'y(x) = a*exp(b/sqrt(x))', plot: 'ln y against 1/√x', symbols: { a: 'a', b: 'b' } },
  rydberg: { law: 'y(x) = 1/(a + b/x^2)', plot: '1/y against 1/x²', symbols: { a: 'a', b: 'b' } },
};
