import { useState } from 'react';
import { View } from 'react-native';
import { Controller, useForm, type Control } from 'react-hook-form';
import { uuidv7 } from 'uuidv7';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { TextField, type TextFieldProps } from '@/components/ui/field';
import { Segmented } from '@/components/ui/segmented';
import { Txt } from '@/components/ui/text';
import { type ApiError } from '@/hooks/client/api-error';
import { readTypedNumber } from '@/shared/entries/typed-number';
import { underlyingFields, type Underlying } from '@/shared/underlyings/underlying';
import { z } from 'zod';

export type UnderlyingValues = Omit<Underlying, 'id' | 'version'>;
interface Typed extends Omit<UnderlyingValues, 'dividendYield'> {
  readonly dividendYieldPercent: string;
}

interface Props {
  readonly initial: UnderlyingValues;
  readonly submitLabel: string;
  readonly isBusy: boolean;
  readonly error: ApiError | null;
  /** The id is the same for every try of one visit, so that a repeated request makes one underlying. */
  readonly onSubmit: (values: UnderlyingValues, id: string) => void;
}

const fieldsSchema = z.strictObject(underlyingFields);

/** What the product must know of an underlying: how it is named, exercised, settled and counted. */
export function UnderlyingForm({ initial, submitLabel, isBusy, error, onSubmit }: Props) {
  const [id] = useState(uuidv7);
  const [problems, setProblems] = useState<Readonly<Record<string, string>>>({});
  const { dividendYield, ...rest } = initial;
  const { control, handleSubmit } = useForm<Typed>({
    defaultValues: { ...rest, dividendYieldPercent: String(Number((dividendYield * 100).toPrecision(8))) },
  });
  const submit = handleSubmit(({ dividendYieldPercent, ...typed }) => {
    const percent = readTypedNumber(dividendYieldPercent);
    const values = {
      ...typed,
      symbol: typed.symbol.trim().toUpperCase(),
      multiplier: typed.multiplier.trim(),
      dividendYield: percent === null ? Number.NaN : percent / 100,
    };
    const parsed = fieldsSchema.safeParse(values);
    if (parsed.success) {
      setProblems({});
      onSubmit(parsed.data, id);
      return;
    }
    setProblems(
      Object.fromEntries(
        parsed.error.issues.map((issue) => [
          issue.path.join('.'),
          issue.path[0] === 'dividendYield' ? 'Write a number from −50 to 50.' : issue.message,
        ]),
      ),
    );
  });
  const problemOf = (field: string) => problems[field] ?? error?.problemOf(field);
  return (
    <Card>
      <View style={{ gap: 16 }}>
        {error === null ? null : (
          <Txt size="row" colour="rust" role="alert">
            {`${error.message} ${error.action}`}
          </Txt>
        )}
        <View style={{ flexDirection: 'row', gap: 12 }}>
          <View style={{ flex: 1 }}>
            <Text control={control} name="symbol" label="Symbol" error={problemOf('symbol')} autoComplete="off" />
          </View>
          <View style={{ flex: 2 }}>
            <Text control={control} name="name" label="Name (optional)" error={problemOf('name')} autoComplete="off" />
          </View>
        </View>
        <Choice
          control={control}
          name="style"
          label="Exercise"
          options={[
            { value: 'american', label: 'American' },
            { value: 'european', label: 'European' },
          ]}
        />
        <Choice
          control={control}
          name="settlement"
          label="Settlement"
          options={[
            { value: 'physical', label: 'Shares' },
            { value: 'cash', label: 'Cash' },
          ]}
        />
        <Choice
          control={control}
          name="settlementTime"
          label="Settled by"
          options={[
            { value: 'pm', label: 'The close' },
            { value: 'am', label: 'The openings' },
          ]}
        />
        <View style={{ flexDirection: 'row', gap: 12 }}>
          <View style={{ flex: 1 }}>
            <Text
              control={control}
              name="multiplier"
              label="Multiplier"
              error={problemOf('multiplier')}
              inputMode="decimal"
              hint="Shares a contract."
            />
          </View>
          <View style={{ flex: 1 }}>
            <Text
              control={control}
              name="dividendYieldPercent"
              label="Dividend yield"
              suffix="%"
              error={problemOf('dividendYield')}
              inputMode="decimal"
              hint="A year, continuous."
            />
          </View>
          <View style={{ flex: 1 }}>
            <Text control={control} name="currency" label="Currency" error={problemOf('currency')} autoComplete="off" />
          </View>
        </View>
        <View style={{ flexDirection: 'row' }}>
          <Button size="main" label={submitLabel} busy={isBusy} busyLabel="Saving …" onPress={submit} />
        </View>
      </View>
    </Card>
  );
}

type TextName = 'symbol' | 'name' | 'multiplier' | 'dividendYieldPercent' | 'currency';

function Text({
  control,
  name,
  ...props
}: { control: Control<Typed>; name: TextName } & Omit<TextFieldProps, 'value' | 'onChangeText'>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <TextField {...props} value={field.value} onChangeText={field.onChange} onBlur={field.onBlur} />
      )}
    />
  );
}

interface ChoiceProps {
  readonly control: Control<Typed>;
  readonly name: 'style' | 'settlement' | 'settlementTime';
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
}

function Choice({ control, name, label, options }: ChoiceProps) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <Segmented<string> label={label} options={options} value={field.value} onChange={field.onChange} />
      )}
    />
  );
}
