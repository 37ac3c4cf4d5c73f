declare module 'jstat' {
  interface OneParameter {
    cdf(x: number, parameter: number): number;
    pdf(x: number, parameter: number): number;
    inv(probability: number, parameter: number): number;
  }
  interface TwoParameters {
    cdf(x: number, first: number, second: number): number;
    pdf(x: number, first: number, second: number): number;
    inv(probability: number, first: number, second: number): number;
  }
  /** Published as one CommonJS object, so that it is taken whole. */
  const jstat: {
    readonly jStat: {
      normal: TwoParameters;
      chisquare: OneParameter;
      studentt: OneParameter;
      centralF: TwoParameters;
      lowRegGamma(a: number, x: number): number;
      gammaln(x: number): number;
      ibeta(x: number, a: number, b: number): number;
    };
  };
  export default jstat;
}
