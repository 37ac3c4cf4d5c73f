import { View } from 'react-native';
import { OddsBand, OddsBandKey } from '@/components/charts/odds-band';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Card } from '@/components/ui/card';
import { formatDate, withDatesInWords } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { type Entry } from '@/shared/entries/entry';
import { oddsStatement } from '@/shared/entries/odds-statement';

/** Each stated probability with its outcome and Brier score beside the market's odds; pending ones say for what they wait. */
export function OddsOutcomeSection({ entry }: { entry: SealedEntry }) {
  const { sealed, outcome } = entry;
  const resolved = new Map(outcome?.odds.map((item) => [item.odds.key, item]) ?? []);
  const scores = [...resolved.values()].flatMap(({ brierScore }) => (brierScore === null ? [] : [brierScore]));
  const mean = scores.length === 0 ? null : scores.reduce((sum, score) => sum + score, 0) / scores.length;
  return (
    <Card
      anchor={anchorOf('odds')}
      title="Odds and what happened"
      subtitle={
        mean === null
          ? 'None is resolved yet'
          : `${scores.length} of ${sealed.forecast.odds.length} resolved, mean Brier ${mean.toFixed(2)}`
      }
    >
      <View style={{ gap: 12 }}>
        {sealed.forecast.odds.map((odds, index) => {
          const result = resolved.get(odds.key);
          const happened = result?.happened ?? null;
          const isPending = happened === null && (result?.cannotTell ?? null) === null;
          return (
            <View key={odds.key} style={{ gap: 8 }}>
              {index > 0 ? <Rule /> : null}
              <OddsBand
                label={oddsStatement(odds, sealed.input)}
                low={odds.probability.low}
                estimate={odds.probability.base}
                high={odds.probability.high}
                marketImplied={odds.marketImplied ?? undefined}
                outcome={happened === null ? undefined : happened ? 1 : 0}
                due={isPending ? formatDate(odds.dueSessionDate, 'short') : undefined}
                footNote={footNote(result)}
              />
            </View>
          );
        })}
        <OddsBandKey shows={['estimate', 'interval', 'market', 'outcome']} />
      </View>
    </Card>
  );
}

type Resolved = NonNullable<Entry['outcome']>['odds'][number];

/** The score once there is one, else what is waited for or why there will be none. */
function footNote(result: Resolved | undefined): string | undefined {
  if (result === undefined) return undefined;
  if (result.cannotTell !== null) return result.cannotTell;
  if (result.brierScore === null)
    return result.waitsFor === null ? undefined : withDatesInWords(`waits for ${result.waitsFor}`);
  const score = (value: number) => value.toFixed(value < 0.1 ? 3 : 2);
  const market = result.marketBrierScore === null ? '' : `, market ${score(result.marketBrierScore)}`;
  return `Brier ${score(result.brierScore)}${market}${result.monitoredBy === 'closes' ? ', judged by closes' : ''}`;
}
