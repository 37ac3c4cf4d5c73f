import { Text as SvgText } from 'react-native-svg';
import { type ColourName } from '@/components/ui/theme/colours';
import { sansFace, type TextWeight } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly x: number;
  /** Of the baseline. */
  readonly y: number;
  readonly anchor?: 'start' | 'middle' | 'end';
  readonly weight?: TextWeight;
  readonly colour?: ColourName;
  readonly size?: number;
  /** Clears the lines behind the words, in the colour of the ground. */
  readonly halo?: ColourName;
  readonly children: string;
}

/** A label inside a drawing. */
export function ChartText({
  x,
  y,
  anchor = 'start',
  weight = 'regular',
  colour = 'inkSoft',
  size = 12,
  halo,
  children,
}: Props) {
  const colours = useColours();
  const place = { x, y, textAnchor: anchor, ...sansFace(weight), fontSize: size };
  return (
    <>
      {halo === undefined ? null : (
        <SvgText {...place} fill="none" stroke={colours[halo]} strokeWidth={4} strokeLinejoin="round" aria-hidden>
          {children}
        </SvgText>
      )}
      <SvgText {...place} fill={colours[colour]}>
        {children}
      </SvgText>
    </>
  );
}

/** Width of a label in points, near enough to keep labels apart: the sans face is set about 0.58 em a character. */
export function textWidth(text: string, size = 12): number {
  return text.length * size * 0.58;
}

/** The middle for a label wanted at `x` that keeps all of it between 0 and `width`. */
export function fitMiddle(x: number, text: string, width: number, size = 12): number {
  const half = textWidth(text, size) / 2;
  return Math.min(Math.max(x, half), Math.max(half, width - half));
}

/** Of labels in order of importance, those that do not run into one that was kept before. */
export function keepApart<Label extends { readonly x: number; readonly text: string }>(
  labels: readonly Label[],
  { gap = 6, size = 12 }: { gap?: number; size?: number } = {},
): Label[] {
  const kept: Label[] = [];
  for (const label of labels) {
    const isFree = kept.every(
      (other) => Math.abs(other.x - label.x) >= (textWidth(other.text, size) + textWidth(label.text, size)) / 2 + gap,
    );
    if (isFree) kept.push(label);
  }
  return kept;
}
