declare module 'black-scholes' {
  /** @param t years @param v volatility per square root of a year @param r continuous rate */
  export function blackScholes(s: number, k: number, t: number, v: number, r: number, callPut: 'call' | 'put'): number;
}
