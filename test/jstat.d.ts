/** The part of jstat that tests compare with. */
declare module 'jstat' {
  export const jStat: {
    readonly normal: { inv(probability: number, mean: number, deviation: number): number };
    readonly studentt: { inv(probability: number, degreesOfFreedom: number): number };
  };
}
