import { Link, type Href } from 'expo-router';
import { useState, type ReactNode } from 'react';
import { Pressable, StyleSheet, type StyleProp, type ViewStyle } from 'react-native';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly href: Href;
  readonly isChosen?: boolean;
  readonly style?: StyleProp<ViewStyle>;
  readonly children: ReactNode;
}

/** A row that is one link as a whole. */
export function LinkRow({ href, isChosen = false, style, children }: Props) {
  const colours = useColours();
  // A link hands on one plain style object only, so what depends on the press is kept here.
  const [isPressed, setIsPressed] = useState(false);
  const ground = isChosen ? colours.brambleWash : isPressed ? colours.well : undefined;
  return (
    <Link href={href} asChild>
      <Pressable
        role="link"
        aria-current={isChosen ? 'page' : undefined}
        onPressIn={() => setIsPressed(true)}
        onPressOut={() => setIsPressed(false)}
        style={StyleSheet.flatten([{ backgroundColor: ground }, style])}
      >
        {children}
      </Pressable>
    </Link>
  );
}
