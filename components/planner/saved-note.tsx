import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { formatInstant } from '@/components/ui/number-format';
import { StateBerry } from '@/components/ui/state-berry';
import { Txt } from '@/components/ui/text';
import { type DraftSaving } from '@/hooks/entries/use-draft-autosave';
import { useMe } from '@/hooks/account/use-me';

/** Where the draft is: saved at what time, being saved, or not yet. */
export function SavedNote({ saving, onRetry }: { saving: DraftSaving; onRetry: () => void }) {
  const { data: me } = useMe();
  const zone = me?.person.timeZone ?? 'UTC';
  return (
    <View role="status" style={{ flexDirection: 'row', alignItems: 'center', gap: 8, flexWrap: 'wrap' }}>
      <StateBerry state="draft" withWord />
      {saving.kind === 'saved' ? (
        <Txt size="note" colour="inkSoft">{`saved ${formatInstant(saving.at, zone, 'time')}`}</Txt>
      ) : null}
      {saving.kind === 'saving' ? (
        <Txt size="note" colour="inkSoft">
          saving …
        </Txt>
      ) : null}
      {saving.kind === 'failed' ? (
        <>
          <Chip kind="amber" icon="offline" label="not saved yet" />
          <Txt size="note" colour="inkSoft">{`${saving.error.message} ${saving.error.action}`}</Txt>
          <Button kind="text" label="Save now" onPress={onRetry} />
        </>
      ) : null}
      {saving.kind === 'conflict' ? <Chip kind="amber" icon="warning" label="changed elsewhere" /> : null}
    </View>
  );
}
