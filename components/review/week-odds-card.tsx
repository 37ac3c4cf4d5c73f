import { View } from 'react-native';
import { Card } from '@/components/ui/card';
import { LinkRow } from '@/components/ui/link-row';
import { formatOdds } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { type ReviewedWeek } from '@/shared/reviews/weekly-review-endpoints';

/** The odds that were answered in a week, each with its score and leading to its entry. */
export function WeekOddsCard({ view: { odds, meanBrierScore } }: { view: ReviewedWeek }) {
  const colours = useColours();
  return (
    <Card
      title="Odds and what happened"
      subtitle={
        meanBrierScore === null
          ? `${odds.length} answered; a mean score is shown from 20 on`
          : `${odds.length} answered, mean Brier ${meanBrierScore.toFixed(3)}`
      }
    >
      {odds.length === 0 ? (
        <Txt size="row" colour="inkSoft">
          No odds came due.
        </Txt>
      ) : (
        <View role="list">
          {odds.map(({ entryId, key, entryName, statement, probability, happened, brierScore }, index) => (
            <View
              key={`${entryId} ${key}`}
              role="listitem"
              style={{ borderTopWidth: index === 0 ? 0 : 1, borderColor: colours.rule }}
            >
              <LinkRow
                href={{ pathname: '/journal/[entryId]', params: { entryId, section: 'odds' } }}
                style={{ minHeight: 44, paddingVertical: 8, flexDirection: 'row', gap: 12, alignItems: 'center' }}
              >
                <View style={{ flex: 1, minWidth: 0 }}>
                  <Txt size="row" weight="medium">
                    {statement}
                  </Txt>
                  <Txt size="note" colour="inkSoft">
                    {entryName}
                  </Txt>
                </View>
                <View>
                  <Txt size="row" weight="semibold" align="right">
                    {`${formatOdds(probability)} → ${happened ? 'yes' : 'no'}`}
                  </Txt>
                  <Txt size="note" colour="inkSoft" align="right">
                    {`Brier ${brierScore.toFixed(brierScore < 0.1 ? 3 : 2)}`}
                  </Txt>
                </View>
              </LinkRow>
            </View>
          ))}
        </View>
      )}
    </Card>
  );
}
