import { scaleLinear } from 'd3-scale';

/** The strip shows the forecast from −3σ to +3σ. */
const SIGMA_RANGE = 3;

/** From sigmas to pixels: −3σ stands `inset` from the left, +3σ `inset` from the right. */
export function sigmaScale(width: number, inset: number) {
  return scaleLinear([-SIGMA_RANGE, SIGMA_RANGE], [inset, Math.max(inset, width - inset)]);
}

/** Which end of the strip a reading went past, if any. */
export function pastEnd(sigma: number): 'low' | 'high' | null {
  if (sigma > SIGMA_RANGE) return 'high';
  return sigma < -SIGMA_RANGE ? 'low' : null;
}

export const isOnStrip = (sigma: number): boolean => Math.abs(sigma) <= SIGMA_RANGE;

/** A whole or half sigma as an axis or a row names it: "+1½σ", "0σ", "−½σ"; other values with two decimals. */
export function sigmaName(sigma: number): string {
  if (sigma === 0) return '0σ';
  const size = Math.abs(sigma);
  const whole = Math.floor(size);
  const isHalf = size - whole === 0.5;
  const digits = isHalf ? `${whole === 0 ? '' : whole}½` : Number.isInteger(size) ? String(size) : size.toFixed(2);
  return `${sigma < 0 ? '−' : '+'}${digits}σ`;
}
