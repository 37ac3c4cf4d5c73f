import { View } from 'react-native';
import { TextField } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { type EntryFilter } from '@/hooks/entries/use-entries';
import { useUnderlyings } from '@/hooks/underlyings/use-underlyings';
import { entryStates, entryStateSchema } from '@/shared/entries/entry';

interface Props {
  readonly filter: EntryFilter;
  readonly onChange: (filter: EntryFilter) => void;
}

const stateLabels: Record<(typeof entryStates)[number], string> = {
  draft: 'Drafts',
  sealed: 'Sealed',
  open: 'Open',
  closed: 'Closed',
  reviewed: 'Reviewed',
  abandoned: 'Abandoned',
};

/** Search by words, and choose by state and underlying. */
export function JournalFilters({ filter, onChange }: Props) {
  const { data: underlyings = [] } = useUnderlyings();
  return (
    <View style={{ gap: 8 }}>
      <TextField
        label="Search entries"
        hideLabel
        placeholder="Search entries"
        value={filter.search ?? ''}
        onChangeText={(search) => onChange({ ...filter, search: search === '' ? undefined : search })}
      />
      <View style={{ flexDirection: 'row', gap: 8 }}>
        <View style={{ flex: 1 }}>
          <SelectField
            label="State"
            hideLabel
            value={filter.state ?? ''}
            options={[
              { value: '', label: 'Every state' },
              ...entryStates.map((value) => ({ value, label: stateLabels[value] })),
            ]}
            onChange={(value) => {
              const state = entryStateSchema.safeParse(value);
              onChange({ ...filter, state: state.success ? state.data : undefined });
            }}
          />
        </View>
        <View style={{ flex: 1 }}>
          <SelectField
            label="Underlying"
            hideLabel
            value={filter.underlyingId ?? ''}
            options={[
              { value: '', label: 'Every underlying' },
              ...underlyings.map(({ underlying }) => ({ value: underlying.id, label: underlying.symbol })),
            ]}
            onChange={(value) => onChange({ ...filter, underlyingId: value === '' ? undefined : value })}
          />
        </View>
      </View>
    </View>
  );
}
