import { View } from 'react-native';
import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { uuidv7 } from 'uuidv7';
import { PlanField } from '@/components/planner/plan-field';
import { usePlan, useProblemOf } from '@/components/planner/plan-form';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { DateField } from '@/components/ui/date-field';
import { formatMoney, formatPercent } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';

const MOST_LEGS = 20;

/** The legs of the structure, each with side, type, quantity, expiry, strike and premium. */
export function StructureSection() {
  const { control } = useFormContext<DraftPlan>();
  const { fields, append, remove } = useFieldArray({ control, name: 'legs', keyName: 'key' });
  const legs = useWatch<DraftPlan, 'legs'>({ name: 'legs' });
  const problem = useProblemOf('legs');

  const addLeg = () => {
    const last = legs.at(-1);
    append({
      id: uuidv7(),
      side: last?.side === 'buy' ? 'sell' : 'buy',
      type: last?.type ?? 'call',
      strikePrice: '',
      expirySessionDate: last?.expirySessionDate ?? '',
      quantity: last?.quantity ?? '1',
      premium: '',
    });
  };
  return (
    <Card
      title="Structure"
      action={
        <Button
          label="Leg"
          icon="plus"
          kind="text"
          onPress={addLeg}
          disabled={fields.length >= MOST_LEGS}
          accessibilityHint="Adds a leg"
        />
      }
    >
      <View style={{ gap: 16 }}>
        {fields.length === 0 ? (
          <View style={{ gap: 12 }}>
            <Txt size="row" colour="inkSoft">
              A leg is one contract line: buy or sell, call or put, strike, expiry and premium.
            </Txt>
            <Button label="Add the first leg" icon="plus" kind="secondary" onPress={addLeg} />
          </View>
        ) : null}
        {fields.map((field, index) => (
          <View key={field.key} style={{ gap: 12 }}>
            {index > 0 ? <Rule /> : null}
            <LegEditor index={index} onRemove={() => remove(index)} />
          </View>
        ))}
        {problem === undefined ? null : (
          <Txt size="note" colour="rust" role="alert">
            {problem}
          </Txt>
        )}
        <StructureFigures />
      </View>
    </Card>
  );
}

function LegEditor({ index, onRemove }: { index: number; onRemove: () => void }) {
  const { setValue } = useFormContext<DraftPlan>();
  const leg = useWatch<DraftPlan, `legs.${number}`>({ name: `legs.${index}` });
  const { detail } = usePlan();
  const expiryProblem = useProblemOf(`legs.${index}.expirySessionDate`);
  const name = `Leg ${index + 1}`;

  const setExpiry = (value: string) => {
    // One plan has one expiry; the first leg's is taken over by legs that have none of their own yet.
    setValue(`legs.${index}.expirySessionDate`, value, { shouldDirty: true });
  };
  return (
    <View role="group" aria-label={name} style={{ gap: 12 }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}>
        <Txt size="row" weight="semibold">
          {name}
        </Txt>
        <Button label={`Remove ${name.toLowerCase()}`} icon="trash" kind="text" onPress={onRemove} />
      </View>
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
      <LegFigures index={index} currency={detail.underlying.currency} />
    </View>
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

/** Cost, model value and break-evens of the whole structure. */
function StructureFigures() {
  const { preview, detail } = usePlan();
  if (preview.kind !== 'ready') return null;
  const { cost, ends } = preview.forecast;
  const net = Number(cost.netPremium);
  const { currency } = detail.underlying;
  const rows: readonly (readonly [string, string])[] = [
    [net >= 0 ? `To pay, ${currency}` : `To receive, ${currency}`, formatMoney(Math.abs(net))],
    [
      `Model low / base / high, ${currency}`,
      [cost.modelValue.low, cost.modelValue.base, cost.modelValue.high]
        .map((value) => formatMoney(Math.abs(value)))
        .join(' / '),
    ],
    [`Fees to open and to close, ${currency}`, `${formatMoney(cost.feesToOpen)} and ${formatMoney(cost.feesToClose)}`],
    [
      ends.breakEvens.length > 1 ? 'Break-evens at expiry' : 'Break-even at expiry',
      ends.breakEvens.length === 0 ? 'none' : ends.breakEvens.map((price) => price.toFixed(2)).join(' and '),
    ],
  ];
  return (
    <View style={{ gap: 8 }}>
      <Rule />
      {rows.map(([label, value]) => (
        <View key={label} style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12 }}>
          <Txt size="row" colour="inkSoft" style={{ flexShrink: 1 }}>
            {label}
          </Txt>
          <Txt size="row" weight="medium" align="right">
            {value}
          </Txt>
        </View>
      ))}
      {preview.input.underlying.style === 'american' ? (
        <Txt size="note" colour="inkSoft">
          Priced without early exercise, which an American option allows.
        </Txt>
      ) : null}
    </View>
  );
}
