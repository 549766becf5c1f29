/** A number read off a fit; what does not exist is NaN and shown as an empty cell. */
export interface ReadOff {
  readonly value: number;
  readonly standardUncertainty: number;
  readonly low: number;
  readonly high: number;
}
