import { useState } from 'react';
import { View } from 'react-native';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { uuidv7 } from 'uuidv7';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { DateField } from '@/components/ui/date-field';
import { Dialog } from '@/components/ui/dialog';
import { TextField } from '@/components/ui/field';
import { formatDate } from '@/components/ui/number-format';
import { SelectField } from '@/components/ui/select-field';
import { Txt } from '@/components/ui/text';
import { useMe } from '@/hooks/account/use-me';
import { ApiError } from '@/hooks/client/api-error';
import { systemClock } from '@/hooks/client/clock';
import { useAddFill } from '@/hooks/entries/use-entries';
import { type fillKinds } from '@/shared/entries/entry';
import { newFillForm, readFillForm, type FillForm } from '@/shared/entries/fill-form';

const kindOptions: readonly { value: (typeof fillKinds)[number]; label: string }[] = [
  { value: 'buy', label: 'Buy' },
  { value: 'sell', label: 'Sell' },
  { value: 'expiry', label: 'Expired' },
  { value: 'assignment', label: 'Assigned' },
  { value: 'exercise', label: 'Exercised' },
];

/** Types one execution, expiry, exercise or assignment. What is typed stays until it is stored. */
export function AddFillDialog({ entry, onClose }: { entry: SealedEntry; onClose: () => void }) {
  const { data: me } = useMe();
  const { legs } = entry.sealed.input;
  const zones = [...new Set(['America/New_York', me?.person.timeZone ?? 'UTC', 'UTC'])];
  const form = useForm<FillForm>({ defaultValues: newFillForm(entry.sealed.input, entry.fills, systemClock.now()) });
  const [problems, setProblems] = useState<readonly { field: string; message: string }[]>([]);
  const add = useAddFill();
  // The same id until it is stored: a second press or a lost answer never makes two fills.
  const [fillId] = useState(uuidv7);
  const kind = useWatch({ control: form.control, name: 'kind' });
  const isShares = useWatch({ control: form.control, name: 'contract' }) === 'shares';
  const { underlying } = entry.sealed.input;

  const problemOf = (field: string) => problems.find((problem) => problem.field === field)?.message;
  const submit = form.handleSubmit((values) => {
    const reading = readFillForm(values, { id: fillId, input: entry.sealed.input });
    if (reading.kind === 'incomplete') {
      setProblems(reading.problems);
      return;
    }
    setProblems([]);
    add.mutate(
      { params: { entryId: entry.row.id }, body: reading.fill },
      { onSuccess: onClose, onError: (error) => setProblems(error instanceof ApiError ? error.problems : []) },
    );
  });
  const text = (
    name: 'quantity' | 'price' | 'fees' | 'time' | 'underlyingPrice' | 'midPrice',
    label: string,
    extra: { suffix?: string; hint?: string } = {},
  ) => (
    <Controller
      control={form.control}
      name={name}
      render={({ field }) => (
        <TextField
          label={label}
          value={field.value}
          onChangeText={field.onChange}
          onBlur={field.onBlur}
          error={problemOf(name)}
          inputMode={name === 'time' ? 'text' : 'decimal'}
          {...extra}
        />
      )}
    />
  );
  const contracts = [
    ...legs.map((leg) => ({
      value: leg.id,
      label: `${formatDate(leg.expirySessionDate, 'short')} ${leg.strikePrice} ${leg.type}`,
    })),
    { value: 'shares', label: `${underlying.symbol} shares` },
  ];
  return (
    <Dialog
      title="Add fill"
      onClose={onClose}
      actions={
        <>
          <Button kind="secondary" label="Cancel" onPress={onClose} />
          <Button kind="primary" label="Add fill" busy={add.isPending} busyLabel="Adding …" onPress={submit} />
        </>
      }
    >
      <View style={{ gap: 12 }}>
        {add.error === null ? null : (
          <Txt size="row" colour="rust" role="alert">
            {`${add.error.message} ${add.error.action}`}
          </Txt>
        )}
        <Pair>
          <Controller
            control={form.control}
            name="kind"
            render={({ field }) => (
              <SelectField label="What happened" value={field.value} options={kindOptions} onChange={field.onChange} />
            )}
          />
          <Controller
            control={form.control}
            name="contract"
            render={({ field }) => (
              <SelectField
                label="Contract"
                value={field.value}
                options={contracts}
                onChange={field.onChange}
                error={problemOf('contract')}
              />
            )}
          />
        </Pair>
        <Pair>
          {text('quantity', isShares ? 'Shares' : 'Contracts')}
          {kind === 'expiry' ? null : text('price', priceLabel(kind, underlying.settlement), { suffix: 'a share' })}
        </Pair>
        <Pair>
          {text('fees', 'Fees, all together')}
          <Controller
            control={form.control}
            name="timeZone"
            render={({ field }) => (
              <SelectField
                label="Time zone"
                value={field.value}
                options={zones.map((zone) => ({ value: zone, label: zone.replace('_', ' ') }))}
                onChange={field.onChange}
              />
            )}
          />
        </Pair>
        <Pair>
          <Controller
            control={form.control}
            name="date"
            render={({ field }) => (
              <DateField label="Date" value={field.value} onChange={field.onChange} error={problemOf('date')} />
            )}
          />
          {text('time', 'Time', { hint: '24 hours, such as 15:52' })}
        </Pair>
        {kind === 'buy' || kind === 'sell' ? (
          <View style={{ gap: 4 }}>
            <Pair>
              {text('underlyingPrice', `${underlying.symbol} then`)}
              {text('midPrice', 'Mid then', { suffix: 'a share' })}
            </Pair>
            <Txt size="note" colour="inkSoft">
              Both may stay empty. With them the entry can say later what the move brought and what slippage cost.
            </Txt>
          </View>
        ) : null}
        {kind === 'assignment' || kind === 'exercise' ? (
          <Txt size="note" colour="inkSoft">
            {underlying.settlement === 'physical'
              ? 'The option ends at price 0 and the shares appear as a fill of their own at the strike.'
              : 'Settled in cash: type the value the option paid, a share.'}
          </Txt>
        ) : null}
      </View>
    </Dialog>
  );
}

function priceLabel(kind: FillForm['kind'], settlement: 'cash' | 'physical'): string {
  if (kind === 'buy' || kind === 'sell') return 'Price';
  return settlement === 'cash' ? 'Settlement value' : 'Price (0)';
}

function Pair({ children }: { children: React.ReactNode[] }) {
  return (
    <View style={{ flexDirection: 'row', gap: 12 }}>
      {children.map((child, index) =>
        child === null ? null : (
          <View key={index} style={{ flex: 1, minWidth: 0 }}>
            {child}
          </View>
        ),
      )}
    </View>
  );
}
