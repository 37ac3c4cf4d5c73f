import { View } from 'react-native';
import { useFormContext, useWatch } from 'react-hook-form';
import { PlanField } from '@/components/planner/plan-field';
import { usePlan } from '@/components/planner/plan-form';
import { Card } from '@/components/ui/card';
import { formatDate, formatInstant, formatSigma } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type Clock } from '@/hooks/client/clock';
import { type DraftPlan } from '@/shared/entries/draft-plan';

/** Where the plan ends: target and stop as levels of the underlying, and the rule in words. */
export function ExitsSection() {
  const { preview } = usePlan();
  const hint = (level: string | null) => {
    if (preview.kind !== 'ready' || level === null) return undefined;
    const { forecast, input } = preview;
    return `${formatSigma(Math.log(Number(level) / Number(input.spot.price)) / forecast.totalDeviation.holding.base)} of the hold`;
  };
  const input = preview.kind === 'ready' ? preview.input : null;
  return (
    <Card title="Exits" subtitle="Levels of the underlying; touched at any moment up to the planned exit">
      <View style={{ gap: 12 }}>
        <View style={{ flexDirection: 'row', gap: 12 }}>
          <View style={{ flex: 1 }}>
            <PlanField
              name="targetPrice"
              label="Target (optional)"
              inputMode="decimal"
              hint={hint(input?.targetPrice ?? null)}
            />
          </View>
          <View style={{ flex: 1 }}>
            <PlanField
              name="stopPrice"
              label="Stop (optional)"
              inputMode="decimal"
              hint={hint(input?.stopPrice ?? null)}
            />
          </View>
        </View>
        <PlanField
          name="exitRule"
          label="If … then …"
          multiline
          hint="What makes you close, by when, and what happens to each leg at expiry."
        />
      </View>
    </Card>
  );
}

/** Price of the underlying, rate, fee and overnight share: what the desk presets and a plan may change. */
export function AssumptionsSection({ clock }: { clock: Clock }) {
  const { setValue } = useFormContext<DraftPlan>();
  const { detail } = usePlan();
  const spotAt = useWatch<DraftPlan, 'spotAt'>({ name: 'spotAt' });
  const last = detail.bars.at(-1);
  return (
    <Card title="Assumptions" subtitle="Preset by your desk; change them for this plan only">
      <View style={{ gap: 12 }}>
        <PlanField
          name="spotPrice"
          label={`Price of ${detail.underlying.symbol}`}
          inputMode="decimal"
          placeholder={last === undefined ? '' : last.close}
          suffix={detail.underlying.currency}
          hint={
            spotAt !== ''
              ? `Seen ${formatInstant(spotAt, 'America/New_York')} New York`
              : last === undefined
                ? 'No bars yet: type what you see now.'
                : `Empty: the close of ${formatDate(last.sessionDate, 'long')}.`
          }
          onAfterChange={(text) => setValue('spotAt', text.trim() === '' ? '' : clock.now(), { shouldDirty: true })}
        />
        <View style={{ flexDirection: 'row', gap: 12 }}>
          <View style={{ flex: 1 }}>
            <PlanField name="ratePercent" label="Rate" suffix="% a year" inputMode="decimal" />
          </View>
          <View style={{ flex: 1 }}>
            <PlanField name="overnightSharePercent" label="Overnight share" suffix="%" inputMode="decimal" />
          </View>
        </View>
        <PlanField
          name="feePerContract"
          label="Fee a contract and side"
          suffix={detail.underlying.currency}
          inputMode="decimal"
        />
        <Txt size="note" colour="inkSoft">
          The overnight share is the part of a session’s variance that falls before its open.
        </Txt>
      </View>
    </Card>
  );
}
