import { useState } from 'react';
import { View } from 'react-native';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { TextField } from '@/components/ui/field';
import { Icon } from '@/components/ui/icon';
import { Txt } from '@/components/ui/text';
import { useSaveLesson } from '@/hooks/entries/use-entries';

/** What the entry taught, in the trader's words. */
export function LessonSection({ entry, startsWriting = false }: { entry: SealedEntry; startsWriting?: boolean }) {
  const [isWriting, setIsWriting] = useState(startsWriting && entry.isOwn && entry.row.needsLesson);
  const isDone = entry.row.state === 'closed' || entry.row.state === 'reviewed' || entry.row.state === 'abandoned';
  if (isWriting) return <LessonForm entry={entry} onDone={() => setIsWriting(false)} />;
  return (
    <Card
      anchor={anchorOf('lesson')}
      title="Lesson"
      action={
        entry.isOwn && isDone ? (
          <Button
            kind="text"
            icon="pencil"
            label={entry.lesson === '' ? 'Write' : 'Edit'}
            onPress={() => setIsWriting(true)}
          />
        ) : undefined
      }
    >
      <Txt size={entry.lesson === '' ? 'row' : 'body'} colour={entry.lesson === '' ? 'inkSoft' : 'ink'}>
        {entry.lesson === '' ? (isDone ? 'Not written yet.' : 'Comes after the close.') : entry.lesson}
      </Txt>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
        <Icon name="info" size={16} colour="inkSoft" />
        <Txt size="note" colour="inkSoft" style={{ flexShrink: 1 }}>
          What one trade can show: little. It counts as one among many in Scores.
        </Txt>
      </View>
    </Card>
  );
}

function LessonForm({ entry, onDone }: { entry: SealedEntry; onDone: () => void }) {
  const [lesson, setLesson] = useState(entry.lesson);
  const save = useSaveLesson();
  return (
    <Card anchor={anchorOf('lesson')} title="Lesson" subtitle="What would you do the same with the outcome unknown?">
      <View style={{ gap: 12 }}>
        <TextField label="Lesson" hideLabel value={lesson} onChangeText={setLesson} multiline lines={4} />
        {save.error === null ? null : (
          <Txt size="row" colour="rust" role="alert">
            {`${save.error.message} ${save.error.action} Your text is still here.`}
          </Txt>
        )}
        <View style={{ flexDirection: 'row', gap: 8 }}>
          <Button
            kind="primary"
            label="Save lesson"
            busy={save.isPending}
            busyLabel="Saving …"
            onPress={() =>
              save.mutate(
                { params: { entryId: entry.row.id }, version: entry.row.version, body: { lesson } },
                { onSuccess: onDone },
              )
            }
          />
          <Button kind="secondary" label="Cancel" onPress={onDone} />
        </View>
      </View>
    </Card>
  );
}
