import { useRouter } from 'expo-router';
import { useDeferredValue, useState } from 'react';
import { FlatList, View, type ViewStyle } from 'react-native';
import { LandingStripKey } from '@/components/charts/landing-strip';
import { EntryRowCard } from '@/components/journal/entry-row-card';
import { JournalFilters } from '@/components/journal/journal-filters';
import { FileLinks } from '@/components/take-away/file-links';
import { Button } from '@/components/ui/button';
import { Rule } from '@/components/ui/rule';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Txt } from '@/components/ui/text';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useKeepsJournal, useMe } from '@/hooks/account/use-me';
import { useEntries, type EntryFilter } from '@/hooks/entries/use-entries';
import { type EntryRow } from '@/shared/entries/entry';

type Item =
  | { readonly kind: 'month'; readonly key: string; readonly label: string }
  | {
      readonly kind: 'entry';
      readonly key: string;
      readonly row: EntryRow;
      readonly isFirst: boolean;
      readonly isLast: boolean;
    };

/** Entries, newest first under their months; the next page loads when the end comes in sight. */
export function JournalList({ chosenId }: { chosenId: string | null }) {
  const router = useRouter();
  const colours = useColours();
  const { data: me } = useMe();
  const [filter, setFilter] = useState<EntryFilter>({});
  const entries = useEntries(useDeferredValue(filter));
  const isFiltered = Object.values(filter).some((value) => value !== undefined && value !== '');
  const keepsJournal = useKeepsJournal();

  const rows = entries.data?.pages.flatMap((page) => page.entries) ?? [];

  const head = (
    <View style={{ gap: 12, paddingBottom: 12 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center' }}>
        <Heading level={1} size="figure">
          Journal
        </Heading>
        {keepsJournal ? (
          <Button kind="primary" icon="plus" label="Plan" href="/plan/new" onPress={() => router.push('/plan/new')} />
        ) : null}
      </View>
      <JournalFilters filter={filter} onChange={setFilter} />
      {rows.length > 0 ? <LandingStripKey /> : null}
    </View>
  );
  const body = () => {
    if (entries.isPending) return <LoadingState label="Loading entries" />;
    if (entries.error) return <ErrorState error={entries.error} onRetry={entries.refetch} />;
    if (isFiltered) return <EmptyState title="No entry fits" text="Change the search or the state above." />;
    return keepsJournal ? (
      <EmptyState
        title="Your journal is empty"
        text="It fills with the plans you seal. Start with one: pick an underlying and write the odds down."
        action={{ label: 'Plan a trade', onPress: () => router.push('/plan/new') }}
      />
    ) : (
      <EmptyState title="Nothing to read yet" text="Sealed entries of the traders you mentor appear here." />
    );
  };
  return (
    <FlatList
      style={{ flex: 1 }}
      contentContainerStyle={{ padding: space.gutterPhone, paddingTop: 24 }}
      data={withMonths(rows)}
      keyExtractor={(item) => item.key}
      ListHeaderComponent={head}
      ListEmptyComponent={body()}
      onEndReached={() => {
        if (entries.hasNextPage && !entries.isFetchingNextPage) void entries.fetchNextPage();
      }}
      onEndReachedThreshold={1}
      renderItem={({ item }) =>
        item.kind === 'month' ? (
          <View style={{ paddingTop: 12, paddingBottom: 8 }}>
            <Txt size="row" weight="semibold" role="heading" aria-level={2}>
              {item.label}
            </Txt>
          </View>
        ) : (
          <View
            style={[{ backgroundColor: colours.sheet, borderColor: colours.rule, overflow: 'hidden' }, cardEdges(item)]}
          >
            <EntryRowCard
              row={item.row}
              isChosen={item.row.id === chosenId}
              showsTrader={me?.person.id !== item.row.trader.id}
            />
          </View>
        )
      }
      ListFooterComponent={
        entries.isFetchingNextPage ? (
          <LoadingState label="Loading more entries" />
        ) : rows.length > 0 && !entries.hasNextPage ? (
          <View style={{ paddingTop: 12, gap: 12 }}>
            <Rule />
            <Txt
              size="note"
              colour="inkSoft"
            >{`${rows.length} ${rows.length === 1 ? 'entry' : 'entries'}. Take ${rows.length === 1 ? 'it' : 'them'} away as a file:`}</Txt>
            <FileLinks filter={filter} />
          </View>
        ) : null
      }
    />
  );
}

const monthOf = new Intl.DateTimeFormat('en-GB', { month: 'long', year: 'numeric', timeZone: 'UTC' });

/** Rows of a month stand in one card: only its first and last have round corners, hairlines lie between. */
function cardEdges({ isFirst, isLast }: { isFirst: boolean; isLast: boolean }): ViewStyle {
  const top = isFirst ? radius.card : 0;
  const bottom = isLast ? radius.card : 0;
  return {
    borderLeftWidth: 1,
    borderRightWidth: 1,
    borderTopWidth: 1,
    borderBottomWidth: isLast ? 1 : 0,
    borderTopLeftRadius: top,
    borderTopRightRadius: top,
    borderBottomLeftRadius: bottom,
    borderBottomRightRadius: bottom,
  };
}

function withMonths(rows: readonly EntryRow[]): Item[] {
  const items: Item[] = [];
  const monthOfRow = (row: EntryRow | undefined) => row?.createdAt.slice(0, 7);
  for (const [index, row] of rows.entries()) {
    const month = row.createdAt.slice(0, 7);
    const isFirst = monthOfRow(rows[index - 1]) !== month;
    if (isFirst) items.push({ kind: 'month', key: month, label: monthOf.format(new Date(`${month}-15T00:00:00Z`)) });
    items.push({ kind: 'entry', key: row.id, row, isFirst, isLast: monthOfRow(rows[index + 1]) !== month });
  }
  return items;
}
