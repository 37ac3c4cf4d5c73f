import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { CalibrationCard } from '@/components/scores/calibration-card';
import { ResolvedList } from '@/components/scores/resolved-list';
import { Card } from '@/components/ui/card';
import { CautionLine } from '@/components/ui/caution-line';
import { formatPercent } from '@/components/ui/number-format';
import { EmptyState } from '@/components/ui/states';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useScores } from '@/hooks/scores/use-scores';
import { type Scores } from '@/shared/scores/score-endpoints';

/** Whether the odds come true: a sentence first, then the curve, the parts of the score, and every resolved forecast. */
export function ScoresScreen() {
  const { data: scores, error, isPending, refetch } = useScores();
  if (isPending || error)
    return <UnreadyScreen title="Scores" loading="Loading scores" error={error} onRetry={refetch} />;
  const pending = `${scores.pendingCount} still to resolve${scores.lateCount > 0 ? `, ${scores.lateCount} sealed late and kept apart` : ''}`;
  return (
    <ScreenFrame title="Scores" note={`${scores.count} resolved, ${pending}`}>
      <View style={{ gap: space.cardGap }}>
        {scores.resolved.length === 0 ? (
          <EmptyState
            title="No odds are resolved yet"
            text="Each sealed forecast states several odds. They resolve at the planned exit and at expiry, once the bars are there."
            action={{ label: 'See the journal', href: '/journal' }}
          />
        ) : (
          <>
            <Sentence scores={scores} />
            <Figures scores={scores} />
            <ResolvedList scores={scores} />
          </>
        )}
        <CautionLine />
      </View>
    </ScreenFrame>
  );
}

function Sentence({ scores }: { scores: Scores }) {
  const text =
    scores.summary?.sentence ??
    `${scores.count} odds are resolved. Rates are shown from 20 on; until then, look at each one below.`;
  return (
    <View style={{ maxWidth: 720, gap: 4 }}>
      <Txt serif size="head">
        {text}
      </Txt>
      {scores.sampleRule === 'provisional' ? (
        <Txt size="row" colour="inkSoft">
          Provisional: under 50 cases a rate says little. Odds of one trade move together, so they count for less than
          their number.
        </Txt>
      ) : null}
    </View>
  );
}

function Figures({ scores }: { scores: Scores }) {
  const isWide = useLayout().kind === 'wide';
  const { summary } = scores;
  if (summary === null) return null;
  const column = isWide ? { flex: 1, minWidth: 0 } : null;
  return (
    <View
      style={isWide ? { flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' } : { gap: space.cardGap }}
    >
      <View style={column}>
        <CalibrationCard summary={summary} />
      </View>
      <View style={column}>
        <Card title="Brier score" subtitle="Mean squared distance of the odds from what happened">
          <View style={{ gap: 12 }}>
            <Txt serif size="figure">
              {summary.meanBrierScore.toFixed(3)}
            </Txt>
            <DataTable
              caption="Parts of the Brier score"
              columns={[
                { key: 'part', header: 'Part', flex: 2 },
                { key: 'value', header: 'Value', align: 'right' },
              ]}
              rows={[
                ['Uncertainty of the events', summary.uncertainty.toFixed(4)],
                ['less resolution (telling cases apart)', summary.resolution.toFixed(4)],
                ['plus reliability (distance from what came)', summary.reliability.toFixed(4)],
                [
                  'Market-implied odds, Brier',
                  summary.marketMeanBrierScore === null ? '–' : summary.marketMeanBrierScore.toFixed(3),
                ],
                ['Mean log score', summary.meanLogScore.toFixed(3)],
                ['Events that happened', formatPercent(summary.baseRate)],
              ].map(([part = '', value = '']) => ({ key: part, cells: { part, value } }))}
            />
            <Txt size="note" colour="inkSoft">
              0 is perfect, always saying 50% scores 0.250. Parts are those of ten bins and add up to within their
              width.
            </Txt>
          </View>
        </Card>
      </View>
    </View>
  );
}
