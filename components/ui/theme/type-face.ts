import { type CSSProperties } from 'react';
import { type TextStyle } from 'react-native';
import { fontFamilies, textSizes, type TextSize } from '@/components/ui/theme/metrics';

export type TextWeight = 'regular' | 'medium' | 'semibold';

const sansFallback = "system-ui, -apple-system, 'Segoe UI', Roboto, sans-serif";
const serifFallback = "Georgia, 'Times New Roman', serif";

// One file a weight: the page switches off synthetic bold, so the weight only speaks to the fallback font.
const sansFaces = {
  regular: { fontFamily: `${fontFamilies.sans}, ${sansFallback}`, fontWeight: 400 },
  medium: { fontFamily: `${fontFamilies.sansMedium}, ${sansFallback}`, fontWeight: 500 },
  semibold: { fontFamily: `${fontFamilies.sansSemiBold}, ${sansFallback}`, fontWeight: 600 },
} as const;

export const serifFace = {
  fontFamily: `${fontFamilies.serif}, ${serifFallback}`,
  fontWeight: 400,
  fontVariant: ['lining-nums', 'proportional-nums'],
} satisfies TextStyle;

/** Family and weight of the sans, for React Native styles. */
export const sansFace = (weight: TextWeight) => sansFaces[weight];

/** Size and face of the sans, for elements of the page itself (labels, inputs, tables). */
export function pageText(size: TextSize, weight: TextWeight = 'regular'): CSSProperties {
  const { fontSize, lineHeight } = textSizes[size];
  return { ...sansFaces[weight], fontSize, lineHeight: `${lineHeight}px` };
}
