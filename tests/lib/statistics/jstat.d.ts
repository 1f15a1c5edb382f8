/** The few functions of jStat that the tests compare with; the package brings no types. */
declare module 'jstat' {
  export const jStat: {
    readonly normal: { readonly inv: (p: number, mean: number, deviation: number) => number };
    readonly beta: {
      readonly cdf: (x: number, a: number, b: number) => number;
      readonly inv: (p: number, a: number, b: number) => number;
    };
  };
}
