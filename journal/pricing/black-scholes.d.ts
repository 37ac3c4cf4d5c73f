declare module 'black-scholes' {
  /** Published as one CommonJS object, so that it is taken whole. */
  const blackScholesPackage: {
    /** @param t years @param v volatility per square root of a year @param r continuous rate */
    readonly blackScholes: (s: number, k: number, t: number, v: number, r: number, callPut: 'call' | 'put') => number;
  };
  export default blackScholesPackage;
}
