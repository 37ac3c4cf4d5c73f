import { View } from 'react-native';
import { IntervalRows } from '@/components/charts/interval-rows';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { EntryDisclosure } from '@/components/scores/entry-disclosure';
import { TooFew } from '@/components/scores/too-few';
import { Card } from '@/components/ui/card';
import { formatNumber, formatPercent, formatSigma } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type Scores } from '@/shared/scores/scores';

/** How often moves stayed inside the sealed bands. */
export function CoverageCard({ scores }: { scores: Scores }) {
  const { count, figures } = scores.coverage;
  return (
    <Card title="Band coverage" subtitle="Moves inside the sealed bands, 95% intervals">
      <View style={{ gap: 10 }}>
        {figures === null ? (
          <TooFew count={count} what="moves" />
        ) : (
          <>
            <IntervalRows
              from={Math.min(0.5, ...figures.bands.map(({ low }) => Math.floor(low * 10) / 10))}
              to={1}
              rows={figures.bands.map(({ deviations, stated, hits, observed, low, high }) => ({
                label: `±${deviations}σ`,
                seen: observed,
                low,
                high,
                due: stated,
                value: `${hits} of ${count}`,
                under: `due ${formatNumber(stated * count, 1)}`,
              }))}
            />
            <Txt size="note" colour="inkSoft">
              Tick: due. Dot: seen, with the interval of what may stand behind it.
            </Txt>
            <ShowAsTable
              caption="Moves inside the sealed bands"
              columns={[
                { key: 'band', header: 'Band' },
                { key: 'due', header: 'Due', align: 'right' },
                { key: 'seen', header: 'Seen', align: 'right' },
                { key: 'interval', header: '95% interval', align: 'right', flex: 2 },
                { key: 'chance', header: 'p', align: 'right' },
              ]}
              rows={figures.bands.map(({ deviations, stated, observed, low, high, pValue }) => ({
                key: String(deviations),
                cells: {
                  band: `±${deviations}σ`,
                  due: formatPercent(stated, 1),
                  seen: formatPercent(observed, 1),
                  interval: `${formatPercent(low, 1)} to ${formatPercent(high, 1)}`,
                  chance: formatNumber(pValue, 3),
                },
              }))}
            />
          </>
        )}
        <EntryDisclosure
          what="moves beyond 1σ"
          entries={scores.entries.filter(
            ({ moveDeviations, isLateSeal }) => !isLateSeal && Math.abs(moveDeviations ?? 0) > 1,
          )}
          header="Move"
          figureOf={({ moveDeviations }) => (moveDeviations === null ? '' : formatSigma(moveDeviations))}
        />
      </View>
    </Card>
  );
}
