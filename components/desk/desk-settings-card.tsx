import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { TextField } from '@/components/ui/field';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { useToast } from '@/components/ui/toast';
import { useEditDeskSettings } from '@/hooks/desk/use-desk';
import { type DeskSettings } from '@/shared/desk/desk-settings';
import { readTypedNumber } from '@/shared/entries/typed-number';

interface Typed {
  readonly name: string;
  readonly currency: string;
  readonly ratePercent: string;
  readonly overnightPercent: string;
  readonly feePerContract: string;
}
const fields: readonly (readonly [keyof Typed, string, string | undefined])[] = [
  ['name', 'Name of the desk', undefined],
  ['currency', 'Currency', undefined],
  ['ratePercent', 'Rate', '% a year'],
  ['overnightPercent', 'Overnight share', '%'],
  ['feePerContract', 'Fee a contract and side', undefined],
];
/** The server names a problem by the stored field. */
const storedName: Record<keyof Typed, string> = {
  name: 'name',
  currency: 'currency',
  ratePercent: 'ratePerYear',
  overnightPercent: 'overnightShare',
  feePerContract: 'feePerContract',
};

const percent = (fraction: number) => String(Number((fraction * 100).toPrecision(10)));

/** What the desk presets for every plan; a lead may change it. */
export function DeskSettingsCard({ settings, canEdit }: { settings: DeskSettings; canEdit: boolean }) {
  return canEdit ? <PresetsForm settings={settings} /> : <Presets settings={settings} />;
}

function Presets({ settings }: { settings: DeskSettings }) {
  const rows = [
    ['Currency', settings.currency],
    ['Rate', `${percent(settings.ratePerYear)}% a year`],
    ['Overnight share', `${percent(settings.overnightShare)}%`],
    ['Fee a contract and side', `${settings.feePerContract} ${settings.currency}`],
  ];
  return (
    <Card title="Presets of every plan" subtitle="The lead of the desk changes them">
      <DataTable
        caption="Presets of every plan"
        columns={[
          { key: 'what', header: 'Preset', flex: 1 },
          { key: 'value', header: 'Value', flex: 1, align: 'right' },
        ]}
        rows={rows.map(([what = '', value = '']) => ({ key: what, cells: { what, value } }))}
      />
    </Card>
  );
}

function PresetsForm({ settings }: { settings: DeskSettings }) {
  const toast = useToast();
  const edit = useEditDeskSettings();
  const [typed, setTyped] = useState<Typed>({
    name: settings.name,
    currency: settings.currency,
    ratePercent: percent(settings.ratePerYear),
    overnightPercent: percent(settings.overnightShare),
    feePerContract: settings.feePerContract,
  });
  const [numberProblem, setNumberProblem] = useState<keyof Typed | null>(null);
  const save = () => {
    const rate = readTypedNumber(typed.ratePercent);
    const overnight = readTypedNumber(typed.overnightPercent);
    setNumberProblem(rate === null ? 'ratePercent' : overnight === null ? 'overnightPercent' : null);
    if (rate === null || overnight === null) return;
    edit.mutate(
      {
        version: settings.version,
        body: {
          name: typed.name,
          currency: typed.currency.trim().toUpperCase(),
          ratePerYear: rate / 100,
          overnightShare: overnight / 100,
          feePerContract: typed.feePerContract.trim(),
        },
      },
      { onSuccess: () => toast.show({ text: 'Desk settings saved.' }) },
    );
  };
  return (
    <Card title="Presets of every plan" subtitle="A plan may change them for itself">
      <View style={{ gap: 12 }}>
        {fields.map(([key, label, suffix]) => (
          <TextField
            key={key}
            label={label}
            suffix={suffix}
            value={typed[key]}
            onChangeText={(text) => setTyped({ ...typed, [key]: text })}
            error={numberProblem === key ? 'Write a number such as 4.25.' : edit.error?.problemOf(storedName[key])}
          />
        ))}
        {edit.error === null ? null : (
          <Txt size="row" colour="rust" role="alert">
            {`${edit.error.message} ${edit.error.action}`}
          </Txt>
        )}
        <View style={{ flexDirection: 'row' }}>
          <Button kind="secondary" label="Save presets" busy={edit.isPending} busyLabel="Saving …" onPress={save} />
        </View>
      </View>
    </Card>
  );
}
