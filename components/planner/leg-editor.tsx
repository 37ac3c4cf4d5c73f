import { useState } from 'react';
import { View } from 'react-native';
import { useFormContext, useWatch } from 'react-hook-form';
import { PlanField } from '@/components/planner/plan-field';
import { usePlan, useProblemOf } from '@/components/planner/plan-form';
import { Button } from '@/components/ui/button';
import { DateField } from '@/components/ui/date-field';
import { formatDate, formatPercent } from '@/components/ui/number-format';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';

interface Props {
  readonly index: number;
  readonly onRemove: () => void;
}

/** One leg: a line while it is complete, its fields while it is written. A leg with a problem is always open. */
export function LegEditor({ index, onRemove }: Props) {
  const leg = useWatch<DraftPlan, `legs.${number}`>({ name: `legs.${index}` });
  const { preview, detail } = usePlan();
  const hasProblem =
    preview.kind === 'incomplete' && preview.problems.some(({ field }) => field.startsWith(`legs.${index}.`));
  const [isOpen, setIsOpen] = useState(hasProblem);
  // Stays open once it had a problem: the fields must not close under the finger that completes them.
  if (hasProblem && !isOpen) setIsOpen(true);
  const name = `Leg ${index + 1}`;
  const toggle = (
    <Button
      label={isOpen ? `Close ${name.toLowerCase()}` : `Edit ${name.toLowerCase()}`}
      icon={isOpen ? 'check' : 'pencil'}
      kind="text"
      iconOnly
      disabled={hasProblem}
      aria-expanded={isOpen}
      onPress={() => setIsOpen(!isOpen)}
    />
  );
  return (
    <View role="group" aria-label={name} style={{ gap: isOpen ? 12 : 0 }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 4, marginRight: -12 }}>
        <View style={{ flex: 1, flexDirection: 'row', justifyContent: 'space-between', gap: 12 }}>
          <Txt size="row" weight="semibold" style={{ flexShrink: 1 }}>
            {isOpen ? name : legWords(leg)}
          </Txt>
          {isOpen ? null : (
            <Txt size="row" weight="medium" align="right">
              {leg.premium}
            </Txt>
          )}
        </View>
        {toggle}
        <Button label={`Remove ${name.toLowerCase()}`} icon="trash" kind="text" iconOnly onPress={onRemove} />
      </View>
      {isOpen ? <LegFields index={index} leg={leg} name={name} /> : null}
      <LegFigures index={index} currency={detail.underlying.currency} />
    </View>
  );
}

/** "Sell 3 × 23 Dec 97 put". */
function legWords({ side, quantity, expirySessionDate, strikePrice, type }: DraftLeg): string {
  return `${side === 'buy' ? 'Buy' : 'Sell'} ${quantity} × ${formatDate(expirySessionDate, 'short')} ${strikePrice} ${type}`;
}

function LegFields({ index, leg, name }: { index: number; leg: DraftLeg; name: string }) {
  const { setValue } = useFormContext<DraftPlan>();
  const expiryProblem = useProblemOf(`legs.${index}.expirySessionDate`);
  const setExpiry = (value: string) => setValue(`legs.${index}.expirySessionDate`, value, { shouldDirty: true });
  return (
    <>
      <View style={{ flexDirection: 'row', gap: 12, flexWrap: 'wrap' }}>
        <Choice<DraftLeg['side']>
          label={`${name}: side`}
          value={leg.side}
          options={[
            { value: 'buy', label: 'Buy' },
            { value: 'sell', label: 'Sell' },
          ]}
          onChange={(side) => setValue(`legs.${index}.side`, side, { shouldDirty: true })}
        />
        <Choice<DraftLeg['type']>
          label={`${name}: type`}
          value={leg.type}
          options={[
            { value: 'call', label: 'Call' },
            { value: 'put', label: 'Put' },
          ]}
          onChange={(type) => setValue(`legs.${index}.type`, type, { shouldDirty: true })}
        />
      </View>
      <View style={{ flexDirection: 'row', gap: 12 }}>
        <View style={{ flex: 1 }}>
          <PlanField name={`legs.${index}.quantity`} label="Contracts" inputMode="numeric" />
        </View>
        <View style={{ flex: 2 }}>
          <DateField label="Expiry" value={leg.expirySessionDate} onChange={setExpiry} error={expiryProblem} />
        </View>
      </View>
      <View style={{ flexDirection: 'row', gap: 12 }}>
        <View style={{ flex: 1 }}>
          <PlanField name={`legs.${index}.strikePrice`} label="Strike" inputMode="decimal" />
        </View>
        <View style={{ flex: 1 }}>
          <PlanField name={`legs.${index}.premium`} label="Premium" suffix="a share" inputMode="decimal" />
        </View>
      </View>
    </>
  );
}

function Choice<Value extends string>(props: {
  label: string;
  value: Value;
  options: readonly { value: Value; label: string }[];
  onChange: (value: Value) => void;
}) {
  return (
    <View style={{ flexGrow: 1, flexBasis: 140 }}>
      <Segmented {...props} hideLabel />
    </View>
  );
}

/** What the premium says beside what the model says, for one leg. */
function LegFigures({ index, currency }: { index: number; currency: string }) {
  const { preview } = usePlan();
  const leg = preview.kind === 'ready' ? preview.forecast.legs[index] : undefined;
  if (leg === undefined) return null;
  const model = [leg.modelPrice.low, leg.modelPrice.base, leg.modelPrice.high].map((price) => price.toFixed(2));
  const implied =
    leg.impliedDailyVolatility === null
      ? {
          'below-intrinsic': 'premium below intrinsic value',
          'no-time-value': 'premium without time value',
          'above-maximum': 'premium above its maximum',
          'no-time-left': 'no time left',
        }[leg.impliedNone ?? 'no-time-left']
      : `implied ${formatPercent(leg.impliedDailyVolatility, 2)} a session`;
  return (
    <Txt size="note" colour="inkSoft">
      {`Model ${model.join(' / ')} ${currency} a share at low / base / high; ${implied}.`}
    </Txt>
  );
}
