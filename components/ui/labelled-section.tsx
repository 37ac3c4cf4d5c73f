import { type ReactNode } from 'react';
import { View } from 'react-native';
import { Heading, Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';

interface Props {
  readonly label: string;
  /** At the right of the label, such as how many there are. */
  readonly count?: string;
  readonly children: ReactNode;
}

/** A part of a page under a small heading of its own. */
export function LabelledSection({ label, count, children }: Props) {
  return (
    <View style={{ gap: space.sectionGap }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Heading level={2} size="row" weight="semibold">
          {label}
        </Heading>
        {count === undefined ? null : (
          <Txt size="note" colour="inkSoft">
            {count}
          </Txt>
        )}
      </View>
      {children}
    </View>
  );
}
