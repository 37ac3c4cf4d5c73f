import { useMemo } from 'react';
import { View } from 'react-native';
import { useFormContext, useWatch } from 'react-hook-form';
import { VolatilityLadder } from '@/components/charts/volatility-ladder';
import { PlanField } from '@/components/planner/plan-field';
import { usePlan, useProblemOf } from '@/components/planner/plan-form';
import { Card } from '@/components/ui/card';
import { formatPercent } from '@/components/ui/number-format';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { useLayout } from '@/components/ui/use-layout';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { volatilityLadder } from '@/journal/volatility/volatility-ladder';
import { volatilityWindows, type DraftPlan } from '@/shared/entries/draft-plan';

const rungKey = (draft: DraftPlan['volatility']) =>
  draft.source === 'window' ? `window-${draft.window}` : draft.source === 'ewma' ? 'ewma' : 'typed';

/** How much the underlying moves in a session: the windows side by side, or a typed figure with its reason. */
export function MoveSection() {
  const { setValue } = useFormContext<DraftPlan>();
  const volatility = useWatch<DraftPlan, 'volatility'>({ name: 'volatility' });
  const { preview } = usePlan();
  const rungs = useLadderRungs();
  const problem = useProblemOf('volatility.source');
  const isTyped = volatility.source === 'typed';
  const { kind: layout } = useLayout();

  const choose = (key: string) => {
    const window = volatilityWindows.find((value) => key === `window-${value}`);
    const source = window === undefined ? 'ewma' : 'window';
    setValue('volatility', { ...volatility, source, window: window ?? volatility.window }, { shouldDirty: true });
  };
  const implied = preview.kind === 'ready' ? preview.forecast.impliedDailyVolatility : null;

  return (
    <Card title="How much does it move in one session?" subtitle="Its 95% interval goes into every odds figure.">
      <View style={{ gap: 12 }}>
        {rungs.length > 0 ? (
          <VolatilityLadder
            rungs={rungs}
            chosenKey={isTyped ? null : rungKey(volatility)}
            onChoose={choose}
            rungHeight={layout === 'wide' ? 28 : undefined}
            implied={implied === null ? undefined : { mid: implied }}
          />
        ) : (
          <Txt size="row" colour="inkSoft">
            There are too few bars for a volatility. Add bars on Prices, or type it.
          </Txt>
        )}
        <Segmented
          label="Where the volatility comes from"
          options={[
            { value: 'prices', label: 'From prices' },
            { value: 'typed', label: 'My own figure' },
          ]}
          value={isTyped ? 'typed' : 'prices'}
          onChange={(value) =>
            setValue('volatility.source', value === 'typed' ? 'typed' : 'window', { shouldDirty: true })
          }
        />
        {isTyped ? <TypedVolatility /> : null}
        {problem === undefined ? null : (
          <Txt size="note" colour="rust" role="alert">
            {problem}
          </Txt>
        )}
      </View>
    </Card>
  );
}

function TypedVolatility() {
  return (
    <View style={{ gap: 12 }}>
      <View style={{ flexDirection: 'row', gap: 12 }}>
        {(['low', 'base', 'high'] as const).map((which) => (
          <View key={which} style={{ flex: 1 }}>
            <PlanField
              name={`volatility.${which}Percent`}
              label={{ low: 'Low', base: 'Base', high: 'High' }[which]}
              suffix="%"
              inputMode="decimal"
            />
          </View>
        ))}
      </View>
      <PlanField name="volatility.reason" label="Why this figure" multiline />
    </View>
  );
}

/** The ladder over the closes known at the moment of the spot price. */
function useLadderRungs() {
  const { detail } = usePlan();
  const spotAt = useWatch<DraftPlan, 'spotAt'>({ name: 'spotAt' });
  return useMemo(() => {
    const known =
      spotAt === ''
        ? detail.bars
        : detail.bars.filter((bar) => (usOptionsCalendar.sessionOn(bar.sessionDate)?.closesAt ?? '9') <= spotAt);
    if (known.length < 3) return [];
    return volatilityLadder(known.map((bar) => Number(bar.close))).map((rung) => ({
      key: rung.method.kind === 'close' ? `window-${rung.method.window}` : 'ewma',
      label: rung.method.kind === 'close' ? `${rung.method.window} sessions` : `Weighted, λ ${rung.method.lambda}`,
      dailyVolatility: rung.dailyVolatility,
      low: rung.low,
      high: rung.high,
    }));
  }, [detail.bars, spotAt]);
}

/** How long the position is held, and what the underlying is expected to do meanwhile. */
export function HoldSection() {
  const { setValue } = useFormContext<DraftPlan>();
  const holding = useWatch<DraftPlan, 'holding'>({ name: 'holding' });
  const drift = useWatch<DraftPlan, 'drift'>({ name: 'drift' });
  const { preview } = usePlan();
  const forecast = preview.kind === 'ready' ? preview.forecast : null;

  return (
    <Card title="How long do you hold?">
      <View style={{ gap: 12 }}>
        <Segmented
          label="Planned exit"
          options={[
            { value: 'toExpiry', label: 'To expiry' },
            { value: 'sessions', label: 'Sessions' },
          ]}
          value={holding}
          onChange={(value) => setValue('holding', value, { shouldDirty: true })}
        />
        {holding === 'sessions' ? (
          <PlanField
            name="holdingSessions"
            label="Sessions"
            inputMode="decimal"
            hint="From the price of the underlying to the planned exit; fractions count."
          />
        ) : null}
        {forecast === null || preview.kind !== 'ready' ? null : (
          <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12, flexWrap: 'wrap' }}>
            <Txt size="row" colour="inkSoft">
              {`${formatPercent(preview.input.volatility.base, 2)} × √${Number(forecast.sessions.holding.toFixed(2))}`}
            </Txt>
            <Txt size="row" weight="semibold">
              {`${formatPercent(forecast.totalDeviation.holding.base, 2)}, ±${(
                forecast.totalDeviation.holding.base * Number(preview.input.spot.price)
              ).toFixed(2)} on ${preview.input.spot.price}`}
            </Txt>
          </View>
        )}
        <Segmented
          label="Drift behind the odds"
          options={[
            { value: 'zeroReturn', label: 'Zero return' },
            { value: 'riskNeutral', label: 'Risk-neutral' },
            { value: 'ownView', label: 'My view' },
          ]}
          value={drift.kind}
          onChange={(kind) => setValue('drift.kind', kind, { shouldDirty: true })}
        />
        {drift.kind === 'ownView' ? (
          <>
            <PlanField
              name="drift.expectedReturnPercent"
              label="Expected change over the hold"
              suffix="%"
              inputMode="decimal"
            />
            <PlanField name="drift.reason" label="Why you expect it" multiline />
          </>
        ) : (
          <Txt size="note" colour="inkSoft">
            Prices always use the risk-neutral drift.
          </Txt>
        )}
      </View>
    </Card>
  );
}
