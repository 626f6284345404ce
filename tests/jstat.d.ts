/** The functions of jstat that tests take as a second opinion on distributions. */
declare module 'jstat' {
  interface TwoParameters {
    cdf(x: number, a: number, b: number): number
    inv(p: number, a: number, b: number): number
  }
  interface OneParameter {
    cdf(x: number, df: number): number
    inv(p: number, df: number): number
  }
  const jStat: {
    normal: TwoParameters
    studentt: OneParameter
    chisquare: OneParameter
    centralF: TwoParameters
    beta: TwoParameters
    noncentralt: { cdf(x: number, df: number, noncentrality: number): number }
    tukey: { cdf(q: number, groups: number, df: number): number }
    gammaln(x: number): number
  }
  export default jStat
}
