import { View } from 'react-native';
import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { uuidv7 } from 'uuidv7';
import { LegEditor } from '@/components/planner/leg-editor';
import { usePlan, useProblemOf } from '@/components/planner/plan-form';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatMoney } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { Txt } from '@/components/ui/text';
import { type DraftPlan } from '@/shared/entries/draft-plan';

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
