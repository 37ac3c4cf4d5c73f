/** A `#RRGGBB` colour with an opacity in [0, 1], for grounds that text stands on. */
export function translucent(hex: string, opacity: number): string {
  const channel = (at: number) => parseInt(hex.slice(at, at + 2), 16);
  return `rgba(${channel(1)},${channel(3)},${channel(5)},${opacity.toFixed(3)})`;
}
