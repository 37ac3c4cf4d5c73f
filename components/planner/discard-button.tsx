import { useRouter } from 'expo-router';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Txt } from '@/components/ui/text';
import { useToast } from '@/components/ui/toast';
import { useLayout } from '@/components/ui/use-layout';
import { useDiscardDraft } from '@/hooks/entries/use-entries';

interface Props {
  readonly entryId: string;
  /** Saves what is pending and gives the version to remove. */
  readonly flush: () => Promise<number>;
}

/** Throws a draft away, after one question. */
export function DiscardButton({ entryId, flush }: Props) {
  const router = useRouter();
  const toast = useToast();
  const isPhone = useLayout().kind === 'phone';
  const discard = useDiscardDraft();
  const [isAsking, setIsAsking] = useState(false);
  const confirm = async () => {
    const version = await flush();
    discard.mutate(
      { params: { entryId }, version },
      {
        onSuccess: () => {
          toast.show({ text: 'Draft discarded.' });
          router.replace('/journal');
        },
      },
    );
  };
  return (
    <>
      <Button kind="text" icon="trash" label="Discard draft" iconOnly={isPhone} onPress={() => setIsAsking(true)} />
      {isAsking ? (
        <Dialog
          title="Discard this draft?"
          onClose={() => setIsAsking(false)}
          actions={
            <>
              <Button kind="secondary" label="Keep it" onPress={() => setIsAsking(false)} />
              <Button
                kind="danger"
                label="Discard"
                busy={discard.isPending}
                busyLabel="Discarding …"
                onPress={confirm}
              />
            </>
          }
        >
          <Txt size="body" colour="inkSoft">
            What was typed here is removed for good. A sealed forecast could not be.
          </Txt>
          {discard.error === null ? null : (
            <Txt size="row" colour="rust" role="alert">
              {`${discard.error.message} ${discard.error.action}`}
            </Txt>
          )}
        </Dialog>
      ) : null}
    </>
  );
}
