import { Link, type Href } from 'expo-router';
import { useId, useState, type Ref } from 'react';
import { Pressable, type DimensionValue, type View, type TextStyle, type ViewStyle } from 'react-native';
import { HiddenText } from '@/components/ui/hidden-text';
import { Icon } from '@/components/ui/icon';
import { type IconName } from '@/components/ui/icon-shapes';
import { Txt } from '@/components/ui/text';
import { type ColourName, type Colours } from '@/components/ui/theme/colours';
import { radius, sizes } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

const underlined: TextStyle = { textDecorationLine: 'underline' };

type ButtonKind = 'primary' | 'secondary' | 'text' | 'danger';

export interface ButtonProps {
  readonly label: string;
  readonly icon?: IconName;
  readonly kind?: ButtonKind;
  /** Makes it a link: it navigates, and `onPress` is not called. */
  readonly href?: Href;
  readonly onPress?: () => unknown;
  readonly disabled?: boolean;
  /** Work is going on: it stays in place and takes no second press. */
  readonly busy?: boolean;
  readonly busyLabel?: string;
  readonly size?: 'normal' | 'main';
  readonly fullWidth?: boolean;
  /** The label is for screen readers; a square with the icon is shown. */
  readonly iconOnly?: boolean;
  /** Another colour for the words of a text button. */
  readonly tone?: ColourName;
  /** An icon after the label, for text buttons that lead on. */
  readonly trailingIcon?: IconName;
  readonly accessibilityHint?: string;
  readonly 'aria-expanded'?: boolean;
  readonly 'aria-controls'?: string;
  readonly ref?: Ref<View>;
}

const inks: Record<ButtonKind, ColourName> = {
  primary: 'onBramble',
  secondary: 'ink',
  text: 'bramble',
  danger: 'rust',
};

/** A button, or a link that looks like one when it has an `href`. */
export function Button({
  label,
  icon,
  kind = 'secondary',
  href,
  onPress,
  disabled = false,
  busy = false,
  busyLabel,
  size = 'normal',
  fullWidth = false,
  iconOnly = false,
  tone,
  trailingIcon,
  accessibilityHint,
  ref,
  ...aria
}: ButtonProps) {
  const colours = useColours();
  const hintId = useId();
  const isOff = disabled || busy;
  const ink: ColourName = disabled ? 'inkSoft' : (tone ?? (iconOnly && kind === 'text' ? 'ink' : inks[kind]));
  // As state, not as a style function: a link hands its style on as a plain object.
  const [isPressed, setIsPressed] = useState(false);
  const style: ViewStyle = {
    ...shape({ kind, size, fullWidth, iconOnly }),
    ...ground(colours, { kind, disabled, isPressed: isPressed || busy }),
  };
  const press = { onPressIn: () => setIsPressed(true), onPressOut: () => setIsPressed(false) };
  const content = (
    <>
      {icon === undefined ? null : <Icon name={icon} size={kind === 'text' && !iconOnly ? 18 : 20} colour={ink} />}
      {iconOnly ? null : (
        <Txt
          size={kind === 'text' ? 'row' : 'body'}
          weight="semibold"
          colour={ink}
          align="center"
          style={tone === undefined ? null : underlined}
        >
          {busy ? (busyLabel ?? label) : label}
        </Txt>
      )}
      {trailingIcon === undefined ? null : <Icon name={trailingIcon} size={16} colour={ink} />}
      {accessibilityHint === undefined ? null : <HiddenText id={hintId}>{accessibilityHint}</HiddenText>}
    </>
  );
  const described = {
    ...(iconOnly ? { 'aria-label': label } : {}),
    ...(accessibilityHint === undefined ? {} : { 'aria-describedby': hintId }),
    ...aria,
  };
  if (href !== undefined && !isOff) {
    return (
      <Link href={href} asChild>
        <Pressable {...described} {...press} ref={ref} role="link" style={style}>
          {content}
        </Pressable>
      </Link>
    );
  }
  return (
    <Pressable
      {...described}
      {...press}
      ref={ref}
      role="button"
      disabled={isOff}
      aria-busy={busy}
      aria-disabled={isOff}
      onPress={() => void onPress?.()}
      style={style}
    >
      {content}
    </Pressable>
  );
}

// As wide as its words in a column and in a row alike; React Native's types do not know this word of the web.
const fitContentWord: string = 'fit-content';
const fitContent = fitContentWord as DimensionValue;

type Shape = Required<Pick<ButtonProps, 'kind' | 'size' | 'fullWidth' | 'iconOnly'>>;

function shape({ kind, size, fullWidth, iconOnly }: Shape): ViewStyle {
  const height = size === 'main' ? sizes.buttonMain : sizes.button;
  const row: ViewStyle = {
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'center',
    gap: 8,
    minHeight: height,
    borderRadius: radius.control,
    width: fullWidth ? '100%' : fitContent,
  };
  if (iconOnly) return { ...row, width: height };
  // A text action is as tall as its line to the eye and 44 to the finger.
  if (kind === 'text')
    return { ...row, gap: 4, paddingHorizontal: 8, marginHorizontal: fullWidth ? 0 : -8, marginVertical: -12 };
  return { ...row, paddingHorizontal: 16, paddingVertical: 8, borderWidth: 1 };
}

type Ground = { kind: ButtonKind; disabled: boolean; isPressed: boolean };

function ground(colours: Colours, { kind, disabled, isPressed }: Ground): ViewStyle {
  if (kind === 'text') return { borderColor: 'transparent', backgroundColor: isPressed ? colours.well : 'transparent' };
  if (disabled) return { borderColor: colours.rule, backgroundColor: colours.well };
  if (kind === 'primary') {
    const backgroundColor = isPressed ? withAlpha(colours.bramble, 0.85) : colours.bramble;
    return { borderColor: 'transparent', backgroundColor };
  }
  return {
    borderColor: kind === 'danger' ? colours.rust : colours.edge,
    backgroundColor: isPressed ? colours.well : colours.sheet,
  };
}

/** A "#RRGGBB" colour with an opacity of 0 to 1. */
function withAlpha(colour: string, alpha: number): string {
  return `${colour}${Math.round(alpha * 255)
    .toString(16)
    .padStart(2, '0')}`;
}
