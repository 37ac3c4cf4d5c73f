import { View } from 'react-native';
import { EntryRowCard } from '@/components/journal/entry-row-card';
import { radius } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { type EntryRow } from '@/shared/entries/entry';

/** Entries under one another on one sheet, each leading to its page. */
export function EntrySheet({ entries }: { entries: readonly EntryRow[] }) {
  const colours = useColours();
  return (
    <View
      style={{
        backgroundColor: colours.sheet,
        borderColor: colours.rule,
        borderWidth: 1,
        borderRadius: radius.card,
        overflow: 'hidden',
      }}
    >
      {entries.map((row, index) => (
        <View key={row.id} style={{ borderTopWidth: index === 0 ? 0 : 1, borderColor: colours.rule }}>
          <EntryRowCard row={row} isChosen={false} showsTrader={false} />
        </View>
      ))}
    </View>
  );
}
