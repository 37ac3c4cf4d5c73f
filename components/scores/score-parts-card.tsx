import { useState } from 'react';
import { View } from 'react-native';
import { ScorePartsSteps } from '@/components/charts/score-parts';
import { Card } from '@/components/ui/card';
import { formatNumber } from '@/components/ui/number-format';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { type Scores } from '@/shared/scores/scores';

type Kind = 'brier' | 'log';

/** Brier or log score, its parts, and how the market's odds did on the same calls. */
export function ScorePartsCard({ scores }: { scores: Scores }) {
  const [kind, setKind] = useState<Kind>('brier');
  const { odds, market, whose } = scores;
  if (odds.figures === null) return null;
  const { clippedCount } = odds.figures;
  return (
    <Card
      title={kind === 'brier' ? 'Brier score and its parts' : 'Log score and its parts'}
      subtitle={kind === 'brier' ? '0 is perfect, 0.25 is a coin' : '0 is perfect, 0.693 is a coin'}
    >
      <View style={{ gap: 12 }}>
        <Segmented
          label="Score"
          hideLabel
          value={kind}
          options={[
            { value: 'brier', label: 'Brier' },
            { value: 'log', label: 'Log' },
          ]}
          onChange={setKind}
        />
        <ScorePartsSteps name={kind === 'brier' ? 'Brier score' : 'Log score'} parts={odds.figures[kind]} />
        <Txt size="row">{marketSentence(market, kind, whose)}</Txt>
        <Txt size="note" colour="inkSoft">
          {`Resolution: how well the odds tell cases apart. Reliability: how far they lie from what came.${kind === 'log' && clippedCount > 0 ? ` ${clippedCount} odds under 0.01% are scored as 0.01%.` : ''}`}
        </Txt>
      </View>
    </Card>
  );
}

/** The paired comparison in words: "Yours are better by 0.016; chance alone allows ±0.020." */
export function marketSentence(market: Scores['market'], kind: Kind, whose: Scores['whose']): string {
  if (market.figures === null) {
    return market.count === 0
      ? 'No call has market-implied odds to compare with.'
      : `${market.count} calls have market-implied odds: too few to compare.`;
  }
  const { market: score, difference, allowance } = market.figures[kind];
  const place =
    difference === 0 ? 'even' : `${difference < 0 ? 'better' : 'worse'} by ${formatNumber(Math.abs(difference), 3)}`;
  const head = `Market-implied odds on the same ${market.count} calls scored ${formatNumber(score, 3)}. ${whose === 'own' ? 'Yours' : 'Theirs'} are ${place}`;
  return allowance === null
    ? `${head}; the calls move together, so chance cannot be told.`
    : `${head}; chance alone allows ±${formatNumber(allowance, 3)}.`;
}
