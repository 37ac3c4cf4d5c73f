import { View } from 'react-native';
import { EntryDisclosure } from '@/components/scores/entry-disclosure';
import { entriesWord } from '@/components/scores/score-words';
import { TooFew } from '@/components/scores/too-few';
import { Card } from '@/components/ui/card';
import { formatPercent } from '@/components/ui/number-format';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { type Scores } from '@/shared/scores/scores';

/** Plan followed or not, by result: kept apart, since a good result of a plan left teaches the wrong thing. */
export function ProcessCard({ scores }: { scores: Scores }) {
  const { count, figures, followedGood, followedBad, leftGood, leftBad } = scores.process;
  return (
    <Card title="Plan and result" subtitle={`${entriesWord(count)} closed and judged`}>
      <View style={{ gap: 10 }}>
        <DataTable
          caption="Plan followed or not, by result"
          columns={[
            { key: 'plan', header: 'Plan', flex: 2 },
            { key: 'good', header: 'Profit', align: 'right' },
            { key: 'bad', header: 'No profit', align: 'right' },
          ]}
          rows={[
            { key: 'followed', cells: { plan: 'Followed', good: String(followedGood), bad: String(followedBad) } },
            { key: 'left', cells: { plan: 'Not followed', good: String(leftGood), bad: String(leftBad) } },
          ]}
        />
        {figures === null ? (
          <TooFew count={count} what="closed entries" />
        ) : (
          <Txt size="row">
            {`Followed ${formatPercent(figures.share)} of the time, 95% interval ${formatPercent(figures.low)} to ${formatPercent(figures.high)}.`}
          </Txt>
        )}
        <EntryDisclosure
          what="plans not followed"
          entries={scores.entries.filter(({ isFollowed, isLateSeal }) => !isLateSeal && isFollowed === false)}
          header="Left by"
          figureOf={({ exitTag }) => exitTag ?? '–'}
        />
      </View>
    </Card>
  );
}
