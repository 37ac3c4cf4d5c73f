import { useState } from 'react';
import { View } from 'react-native';
import { countText, PlaceHistogram } from '@/components/charts/place-histogram';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { EntryDisclosure } from '@/components/scores/entry-disclosure';
import { capital, chanceWords, entriesWord } from '@/components/scores/score-words';
import { TooFew } from '@/components/scores/too-few';
import { Card } from '@/components/ui/card';
import { formatPercent } from '@/components/ui/number-format';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { type ListedEntry, type Scores } from '@/shared/scores/scores';

type Kind = 'moves' | 'profits';

/** Where moves, and profits with their lumps spread, fell in their forecasts. */
export function PlacesCard({ scores }: { scores: Scores }) {
  const [kind, setKind] = useState<Kind>('moves');
  const { count, figures } = scores[kind];
  return (
    <Card
      title="Where outcomes fell in their forecasts"
      subtitle={
        figures === null ? entriesWord(count) : `${entriesWord(count)}; even would be ${countText(figures.due)} in each`
      }
    >
      <View style={{ gap: 10 }}>
        <Segmented
          label="Outcome"
          hideLabel
          value={kind}
          options={[
            { value: 'moves', label: 'Moves' },
            { value: 'profits', label: 'Profits' },
          ]}
          onChange={setKind}
        />
        {figures === null ? (
          <TooFew count={count} what={kind === 'moves' ? 'moves' : 'closed entries'} />
        ) : (
          <>
            <PlaceHistogram {...figures} />
            <Txt size="row" colour="inkSoft">
              {`${capital(chanceWords(figures.test.pValue))} (${figures.test.kind === 'chi-square' ? 'chi-square' : 'Kolmogorov and Smirnov'}, taking entries as independent).`}
            </Txt>
            <ShowAsTable
              caption="Where outcomes fell in their forecasts"
              columns={[
                { key: 'eighth', header: 'Part of the forecast' },
                { key: 'count', header: 'Outcomes', align: 'right' },
                { key: 'chance', header: 'By chance, 90%', align: 'right' },
              ]}
              rows={figures.counts.map((outcomes, index) => ({
                key: String(index),
                cells: {
                  eighth: `${formatPercent(index / figures.counts.length, 1)} to ${formatPercent((index + 1) / figures.counts.length, 1)}`,
                  count: countText(outcomes),
                  chance: `${figures.low} to ${figures.high}`,
                },
              }))}
            />
          </>
        )}
        <EntryDisclosure
          what={kind === 'moves' ? 'places of moves' : 'places of profits'}
          entries={scores.entries.filter((entry) => !entry.isLateSeal && placeOf(entry, kind) !== null)}
          header="Place"
          figureOf={(entry) => placeOf(entry, kind)}
        />
      </View>
    </Card>
  );
}

function placeOf(entry: ListedEntry, kind: Kind): string | null {
  if (kind === 'moves') return entry.movePlace === null ? null : formatPercent(entry.movePlace);
  const { profitPlaceLow: low, profitPlaceHigh: high } = entry;
  if (low === null || high === null) return null;
  const [from, to] = [formatPercent(low), formatPercent(high)];
  return from === to ? from : `${from} to ${to}`;
}
