import { View } from 'react-native';
import { EntryRowCard } from '@/components/journal/entry-row-card';
import { Heading, Txt } from '@/components/ui/text';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { type EntryRow } from '@/shared/entries/entry';

interface Props {
  readonly title: string;
  readonly entries: readonly EntryRow[];
  /** Said where there is none. */
  readonly empty: string;
}

/** The entries of a week, each leading to its page. */
export function WeekEntriesCard({ title, entries, empty }: Props) {
  const colours = useColours();
  return (
    <View style={{ gap: space.sectionGap }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Heading level={2} size="row" weight="semibold">
          {title}
        </Heading>
        <Txt size="note" colour="inkSoft">
          {String(entries.length)}
        </Txt>
      </View>
      <View
        style={{
          backgroundColor: colours.sheet,
          borderColor: colours.rule,
          borderWidth: 1,
          borderRadius: radius.card,
          overflow: 'hidden',
        }}
      >
        {entries.length === 0 ? (
          <Txt size="row" colour="inkSoft" style={{ padding: 16 }}>
            {empty}
          </Txt>
        ) : (
          entries.map((row, index) => (
            <View key={row.id} style={{ borderTopWidth: index === 0 ? 0 : 1, borderColor: colours.rule }}>
              <EntryRowCard row={row} isChosen={false} showsTrader={false} />
            </View>
          ))
        )}
      </View>
    </View>
  );
}
