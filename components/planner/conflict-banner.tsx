import { View } from 'react-native';
import { Banner } from '@/components/ui/banner';
import { Button } from '@/components/ui/button';
import { formatInstant } from '@/components/ui/number-format';
import { useMe } from '@/hooks/account/use-me';
import { type Entry } from '@/shared/entries/entry';

interface Props {
  readonly theirs: Entry;
  readonly onKeepMine: (version: number) => void;
  readonly onTakeTheirs: (theirs: Entry) => void;
}

/** Two tabs or devices wrote the same draft: the person chooses, nothing is overwritten before. */
export function ConflictBanner({ theirs, onKeepMine, onTakeTheirs }: Props) {
  const { data: me } = useMe();
  const at = formatInstant(theirs.planSavedAt, me?.person.timeZone ?? 'UTC');
  const isSealed = theirs.row.state !== 'draft';
  return (
    <View style={{ gap: 8, paddingBottom: 12 }}>
      <Banner
        kind="amber"
        title={isSealed ? 'This plan was sealed elsewhere.' : 'This plan was changed elsewhere.'}
        text={`Another tab or device saved it ${at}. What you typed here is still in this form.`}
      />
      <View style={{ flexDirection: 'row', gap: 8, flexWrap: 'wrap' }}>
        {isSealed ? null : (
          <Button kind="secondary" label="Keep what is here" onPress={() => onKeepMine(theirs.row.version)} />
        )}
        <Button kind="secondary" label="Take the other version" onPress={() => onTakeTheirs(theirs)} />
      </View>
    </View>
  );
}
