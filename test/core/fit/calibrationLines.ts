import { readFileSync } from 'node:fs';

/** A calibration line with 50-digit results, see test/reference/README.md. */
export interface CalibrationLine {
  readonly id: string;
  readonly source: { readonly citation: string };
  readonly columns: readonly { readonly name: string; readonly values: readonly number[] }[];
  readonly published: Readonly<Record<string, string>>;
  readonly highPrecision: {
    readonly knownUncertainty?: LineDigits;
    readonly unknownUncertainty?: LineDigits;
    readonly slope?: string;
    readonly intercept?: string;
    readonly S?: string;
    readonly standardErrors?: {
      readonly expectedInformationAdjustedPoints: {
        readonly u_intercept: string;
        readonly u_slope: string;
        readonly covariance: string;
      };
    };
    readonly inverse?: readonly {
      readonly y0?: string;
      readonly yMean?: string;
      readonly m?: number;
      readonly x0: string;
      readonly u_x0?: string;
      readonly standardError?: string;
      readonly fieller95?: readonly [string, string];
    }[];
    readonly forward?: readonly Prediction[];
    readonly predict?: readonly Prediction[];
  };
}

interface LineDigits {
  readonly intercept: string;
  readonly slope: string;
  readonly u_intercept: string;
  readonly u_slope: string;
  readonly covariance: string;
  readonly correlation: string;
  readonly rSquared: string;
  readonly chiSquared?: string;
  readonly sigma?: string;
}

interface Prediction {
  readonly x0: string;
  readonly y0: string;
  readonly seMean?: string;
  readonly sePrediction?: string;
  readonly conf95?: readonly [string, string];
  readonly pred95?: readonly [string, string];
}

// The file's shape is described in test/reference/README.md.
const lines = JSON.parse(
  readFileSync(new URL('../../reference/B-calibration-lines.json', import.meta.url), 'utf8'),
) as CalibrationLine[];

export function calibrationLine(id: string): CalibrationLine {
  const found = lines.find((line) => line.id === id);
  if (found === undefined) throw new Error(`there is no calibration line ${id}`);
  return found;
}

export function columnOf(line: CalibrationLine, name: string): readonly number[] {
  const column = line.columns.find((one) => one.name === name);
  if (column === undefined) throw new Error(`${line.id} has no column ${name}`);
  return column.values;
}
