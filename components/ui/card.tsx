import { type ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { Heading, Txt } from '@/components/ui/text';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly title?: string;
  readonly subtitle?: string;
  /** Stands at the right of the title. */
  readonly action?: ReactNode;
  /** Id of the heading, for links to it; it can then take the focus. */
  readonly anchor?: string;
  readonly padding?: number;
  readonly headingLevel?: 2 | 3 | 4;
  readonly style?: StyleProp<ViewStyle>;
  readonly children?: ReactNode;
}

/** A sheet of the notebook: things that belong together under one head. */
export function Card({
  title,
  subtitle,
  action,
  anchor,
  padding = space.cardPadding,
  headingLevel = 2,
  style,
  children,
}: Props) {
  const colours = useColours();
  return (
    <View
      style={[
        {
          backgroundColor: colours.sheet,
          borderColor: colours.rule,
          borderWidth: 1,
          borderRadius: radius.card,
          padding,
          gap: space.cardGap,
        },
        style,
      ]}
    >
      {title === undefined ? null : (
        <View style={{ flexDirection: 'row', alignItems: 'flex-start', justifyContent: 'space-between', gap: 12 }}>
          <View style={{ flexShrink: 1 }}>
            <Heading
              level={headingLevel}
              size="body"
              weight="semibold"
              {...(anchor === undefined ? {} : { id: anchor, tabIndex: -1 })}
            >
              {title}
            </Heading>
            {subtitle === undefined ? null : (
              <Txt size="row" colour="inkSoft">
                {subtitle}
              </Txt>
            )}
          </View>
          {action}
        </View>
      )}
      {children}
    </View>
  );
}
