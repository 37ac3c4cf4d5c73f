import { View } from 'react-native';
import { capital, horizonWords } from '@/components/scores/score-words';
import { Button } from '@/components/ui/button';
import { DateField } from '@/components/ui/date-field';
import { SelectField } from '@/components/ui/select-field';
import { useLayout } from '@/components/ui/use-layout';
import { type ScoreFilter, scoreFilterSchema } from '@/shared/scores/score-filter';
import { type Scores } from '@/shared/scores/scores';

interface Props {
  readonly filter: ScoreFilter;
  readonly choices: Scores['choices'];
  readonly onFilter: (filter: ScoreFilter) => void;
}

interface SelectedField {
  readonly name: Exclude<keyof ScoreFilter, 'from' | 'to' | 'evenIfFew'>;
  readonly label: string;
  /** What stands there while nothing is chosen. */
  readonly every: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
}

/** Which entries the page is about; every figure follows. */
export function ScoreFilters({ filter, choices, onFilter }: Props) {
  const isPhone = useLayout().kind === 'phone';
  const change = (changes: Readonly<Record<string, string | undefined>>) => {
    const wanted = Object.entries({ ...filter, ...changes }).filter(([, value]) => value !== undefined && value !== '');
    const read = scoreFilterSchema.safeParse(Object.fromEntries(wanted));
    if (read.success) onFilter(read.data);
  };
  const byTrader: SelectedField = {
    name: 'traderId',
    label: 'Trader',
    every: 'Every trader',
    options: choices.traders.map(({ id, displayName }) => ({ value: id, label: displayName })),
  };
  const byEntry: readonly SelectedField[] = [
    {
      name: 'underlyingId',
      label: 'Underlying',
      every: 'Every underlying',
      options: choices.underlyings.map(({ id, symbol }) => ({ value: id, label: symbol })),
    },
    {
      name: 'structureKind',
      label: 'Structure',
      every: 'Every structure',
      options: choices.structureKinds.map((kind) => ({ value: kind, label: capital(kind) })),
    },
    {
      name: 'horizonClass',
      label: 'Horizon',
      every: 'Every horizon',
      options: choices.horizonClasses.map((value) => ({ value, label: horizonWords[value] })),
    },
    {
      name: 'tag',
      label: 'Tag',
      every: 'Every tag',
      options: choices.tags.map((value) => ({ value, label: value })),
    },
    {
      name: 'traded',
      label: 'Traded',
      every: 'Traded or not',
      options: [
        { value: 'yes', label: 'Traded' },
        { value: 'no', label: 'Not traded' },
      ],
    },
  ];
  const fields = choices.traders.length > 1 ? [byTrader, ...byEntry] : byEntry;
  const cell = isPhone ? ({ width: '48%', flexGrow: 1 } as const) : ({ width: 176, flexGrow: 1 } as const);
  const isNarrowed = Object.keys(filter).length > 0;
  return (
    <View
      role="group"
      aria-label="Which entries"
      style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8, alignItems: 'flex-end' }}
    >
      {fields.map(({ name, label, every, options }) => (
        <View key={name} style={cell}>
          <SelectField
            label={label}
            hideLabel
            value={filter[name] ?? ''}
            options={[{ value: '', label: every }, ...options]}
            onChange={(value) => change({ [name]: value })}
          />
        </View>
      ))}
      <View style={{ flexDirection: 'row', gap: 8, ...(isPhone ? { width: '100%' } : { width: 360, flexGrow: 2 }) }}>
        <View style={{ flex: 1, minWidth: 0 }}>
          <DateField
            label="Exit from"
            value={filter.from ?? ''}
            max={filter.to}
            onChange={(from) => change({ from })}
          />
        </View>
        <View style={{ flex: 1, minWidth: 0 }}>
          <DateField label="Exit to" value={filter.to ?? ''} min={filter.from} onChange={(to) => change({ to })} />
        </View>
      </View>
      {isNarrowed ? <Button kind="secondary" label="Show all" onPress={() => onFilter({})} /> : null}
    </View>
  );
}
