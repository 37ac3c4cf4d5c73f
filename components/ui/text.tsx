import { type ReactNode, type Ref } from 'react';
import { StyleSheet, Text, type StyleProp, type TextProps, type TextStyle } from 'react-native';
import { type ColourName } from '@/components/ui/theme/colours';
import { textSizes, type TextSize } from '@/components/ui/theme/metrics';
import { sansFace, serifFace, type TextWeight } from '@/components/ui/theme/type-face';
import { useColours } from '@/components/ui/theme/use-theme';

const sizeStyles = StyleSheet.create(textSizes);
const faceStyles = StyleSheet.create({
  regular: sansFace('regular'),
  medium: sansFace('medium'),
  semibold: sansFace('semibold'),
  serif: serifFace,
});

export interface TxtProps extends Omit<TextProps, 'style' | 'children'> {
  readonly size?: TextSize;
  readonly weight?: TextWeight;
  /** Young Serif, for the product name, page titles and the big figure of a screen. */
  readonly serif?: boolean;
  readonly colour?: ColourName;
  readonly align?: 'left' | 'center' | 'right';
  readonly 'aria-level'?: number;
  readonly style?: StyleProp<TextStyle>;
  readonly children?: ReactNode;
  readonly ref?: Ref<Text>;
}

/** Text in the sizes, faces and colours of the product; inside another text it takes over what it does not name. */
export function Txt({
  size = 'body',
  weight = 'regular',
  serif = false,
  colour = 'ink',
  align,
  style,
  children,
  ...rest
}: TxtProps) {
  const colours = useColours();
  return (
    <Text
      {...rest}
      style={[
        sizeStyles[size],
        serif ? faceStyles.serif : faceStyles[weight],
        { color: colours[colour] },
        align === undefined ? null : { textAlign: align },
        style,
      ]}
    >
      {children}
    </Text>
  );
}

type HeadingProps = Omit<TxtProps, 'role' | 'aria-level'> & { readonly level?: 1 | 2 | 3 | 4 };

const headingLooks: Record<1 | 2 | 3 | 4, Pick<TxtProps, 'size' | 'weight' | 'serif'>> = {
  1: { size: 'title', serif: true },
  2: { size: 'body', weight: 'semibold' },
  3: { size: 'body', weight: 'semibold' },
  4: { size: 'row', weight: 'semibold' },
};

/** A real heading; level 1 is the page's own title, in Young Serif. */
export function Heading({ level = 2, ...rest }: HeadingProps) {
  return <Txt {...headingLooks[level]} {...rest} role="heading" aria-level={level} />;
}
