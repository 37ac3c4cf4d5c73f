import { View } from 'react-native';
import { OddsBand, OddsBandKey } from '@/components/charts/odds-band';
import { ProfitAtExit } from '@/components/charts/profit-at-exit';
import { LatticeTable } from '@/components/entry/lattice-table';
import { oddsStatement } from '@/shared/entries/odds-statement';
import { usePlan } from '@/components/planner/plan-form';
import { Card } from '@/components/ui/card';
import { CautionLine } from '@/components/ui/caution-line';
import { formatDate } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { type Drift } from '@/journal/odds/log-drift';

const driftWords: Record<Drift['kind'], string> = {
  zeroReturn: 'Zero expected return',
  riskNeutral: 'Risk-neutral drift',
  ownView: 'Your own view of the drift',
};

/** Every stated probability with its interval and the market's. */
export function OddsSection() {
  const { preview } = usePlan();
  if (preview.kind !== 'ready') return null;
  const { forecast, input } = preview;
  return (
    <Card title="Odds" subtitle={driftWords[input.drift.kind]}>
      <View style={{ gap: 12 }}>
        {forecast.odds.map((odds, index) => (
          <View key={odds.key} style={{ gap: 12 }}>
            {index > 0 ? <Rule /> : null}
            <OddsBand
              label={oddsStatement(odds, input)}
              low={odds.probability.low}
              estimate={odds.probability.base}
              high={odds.probability.high}
              marketImplied={odds.marketImplied ?? undefined}
            />
          </View>
        ))}
        <OddsBandKey shows={['estimate', 'interval', 'market']} />
        <CautionLine />
      </View>
    </Card>
  );
}

/** The distribution of profit at the planned exit, else at expiry. */
export function ProfitSection() {
  const { preview, detail } = usePlan();
  if (preview.kind !== 'ready') return null;
  const { forecast } = preview;
  const distribution = forecast.atExit ?? forecast.atExpiry;
  const when =
    distribution.horizon === 'exit'
      ? `at the planned exit, ${formatDate(forecast.exitSessionDate, 'short')}`
      : 'at expiry';
  const { currency } = detail.underlying;
  return (
    <Card title={`Profit ${when}`} subtitle={`${currency}, after fees`}>
      <ProfitAtExit
        lumps={distribution.lumps}
        classes={distribution.classes}
        mean={distribution.mean.base}
        currency={currency}
      />
    </Card>
  );
}

/** Profit by move and sessions elapsed. */
export function LatticeSection() {
  const { preview, detail } = usePlan();
  if (preview.kind !== 'ready') return null;
  const { currency } = detail.underlying;
  return (
    <Card title="If it moves, and when" subtitle={`Profit in ${currency}, before closing costs`}>
      <LatticeTable forecast={preview.forecast} currency={currency} />
    </Card>
  );
}
