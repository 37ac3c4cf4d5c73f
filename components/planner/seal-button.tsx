import { useRouter } from 'expo-router';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { useToast } from '@/components/ui/toast';
import { Txt } from '@/components/ui/text';
import { ApiError } from '@/hooks/client/api-error';
import { type PlanPreview } from '@/hooks/entries/preview-plan';
import { useSealEntry } from '@/hooks/entries/use-entries';

interface Props {
  readonly entryId: string;
  readonly preview: PlanPreview;
  /** Saves what is pending and gives the version to seal. */
  readonly flush: () => Promise<number>;
  /** Asked to seal an incomplete plan: show what is missing. */
  readonly onProblems: () => void;
}

/** The way out of the planner: seal, after one question. */
export function SealButton({ entryId, preview, flush, onProblems }: Props) {
  const router = useRouter();
  const toast = useToast();
  const seal = useSealEntry();
  const [isAsking, setIsAsking] = useState(false);
  const [refusal, setRefusal] = useState<ApiError | null>(null);

  const press = () => {
    setRefusal(null);
    if (preview.kind === 'ready') setIsAsking(true);
    else {
      onProblems();
      const [first] = preview.problems;
      toast.show({ text: first === undefined ? 'The plan is not complete.' : first.message });
    }
  };
  const confirm = async () => {
    try {
      const version = await flush();
      await seal.mutateAsync({ params: { entryId }, version });
      setIsAsking(false);
      router.replace({ pathname: '/journal/[entryId]', params: { entryId } });
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      setRefusal(error);
    }
  };
  return (
    <>
      <Button kind="primary" size="main" icon="seal" label="Seal forecast" onPress={press} fullWidth />
      {isAsking ? (
        <Dialog
          title="Seal this forecast?"
          onClose={() => setIsAsking(false)}
          actions={
            <>
              <Button kind="secondary" label="Keep editing" onPress={() => setIsAsking(false)} />
              <Button
                kind="primary"
                icon="seal"
                label="Seal forecast"
                busy={seal.isPending}
                busyLabel="Sealing …"
                onPress={confirm}
              />
            </>
          }
        >
          <Txt size="body" colour="inkSoft">
            Nobody, you included, can change it later. A second thought becomes a new plan with its own seal.
          </Txt>
          {refusal === null ? null : (
            <Txt size="row" colour="rust" role="alert">
              {`Not sealed. ${[refusal.message, ...refusal.problems.map((problem) => problem.message)].join(' ')} ${refusal.action}`}
            </Txt>
          )}
        </Dialog>
      ) : null}
    </>
  );
}
