/** What Footing uses of jstat, which brings no types: rough quantiles, refined in distributions.ts. */
declare module "jstat" {
  interface Jstat {
    readonly normal: { inv(p: number, mean: number, deviation: number): number };
    readonly chisquare: { inv(p: number, degreesOfFreedom: number): number };
    readonly studentt: { inv(p: number, degreesOfFreedom: number): number };
    readonly centralF: { inv(p: number, df1: number, df2: number): number };
  }
  const jstat: Jstat;
  export default jstat;
}
