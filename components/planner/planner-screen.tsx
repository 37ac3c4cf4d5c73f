import { useRouter } from 'expo-router';
import { useEffect, useMemo, useState } from 'react';
import { View } from 'react-native';
import { FormProvider, useForm, type UseFormReturn } from 'react-hook-form';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { ConflictBanner } from '@/components/planner/conflict-banner';
import { DiscardButton } from '@/components/planner/discard-button';
import { PlanContext } from '@/components/planner/plan-form';
import { PlannerSteps } from '@/components/planner/planner-steps';
import { PlannerColumns } from '@/components/planner/planner-columns';
import { SavedNote } from '@/components/planner/saved-note';
import { SealButton } from '@/components/planner/seal-button';
import { useLayout } from '@/components/ui/use-layout';
import { previewPlan } from '@/hooks/entries/preview-plan';
import { useDraftAutosave } from '@/hooks/entries/use-draft-autosave';
import { useEntry, useKeepEntry } from '@/hooks/entries/use-entries';
import { useUnderlying } from '@/hooks/underlyings/use-underlyings';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type Entry } from '@/shared/entries/entry';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

/** Writes a plan: every change shows its price and odds at once and is saved by itself. */
export function PlannerScreen({ entryId }: { entryId: string }) {
  const entry = useEntry(entryId);
  if (entry.isPending || entry.error)
    return <UnreadyScreen title="Plan" loading="Loading plan" error={entry.error} onRetry={entry.refetch} />;
  return <PlannerForEntry entry={entry.data} />;
}

function PlannerForEntry({ entry }: { entry: Entry }) {
  const detail = useUnderlying(entry.plan.underlyingId);
  if (detail.isPending || detail.error)
    return <UnreadyScreen title="Plan" loading="Loading prices" error={detail.error} onRetry={detail.refetch} />;
  return <Planner key={entry.row.id} entry={entry} detail={detail.data} />;
}

function Planner({ entry, detail }: { entry: Entry; detail: UnderlyingDetail }) {
  const router = useRouter();
  const { kind: layout } = useLayout();
  const form = useForm<DraftPlan>({ defaultValues: entry.plan });
  const keep = useKeepEntry();
  const autosave = useDraftAutosave(entry, keep);
  const [showsProblems, setShowsProblems] = useState(false);
  const draft = useDraft(form, autosave.changed);
  const preview = useMemo(() => previewPlan(draft, detail), [draft, detail]);
  const context = useMemo(() => ({ detail, preview, showsProblems }), [detail, preview, showsProblems]);

  const name = preview.kind === 'ready' ? preview.forecast.structureName : 'new plan';
  const title = `${detail.underlying.symbol} ${name}`;
  const seal = (
    <SealButton
      entryId={entry.row.id}
      preview={preview}
      flush={autosave.flush}
      onProblems={() => setShowsProblems(true)}
    />
  );
  const Layout = layout === 'wide' ? PlannerColumns : PlannerSteps;
  return (
    <FormProvider {...form}>
      <PlanContext value={context}>
        <ScreenFrame
          title={`Plan: ${title}`}
          back={{ label: 'Journal', onPress: () => router.navigate('/journal') }}
          note={<SavedNote saving={autosave.saving} onRetry={() => void autosave.flush()} />}
          action={<DiscardButton entryId={entry.row.id} flush={autosave.flush} />}
          hideBottomBar
          scrolls={false}
        >
          {autosave.saving.kind === 'conflict' ? (
            <ConflictBanner
              theirs={autosave.saving.theirs}
              onKeepMine={(version) => {
                autosave.acceptVersion(version);
                autosave.changed(form.getValues());
              }}
              onTakeTheirs={(theirs) => {
                autosave.acceptVersion(theirs.row.version);
                form.reset(theirs.plan);
                keep(theirs);
              }}
            />
          ) : null}
          <View style={{ flex: 1 }}>
            <Layout seal={seal} onLeaveStep={() => setShowsProblems(true)} />
          </View>
        </ScreenFrame>
      </PlanContext>
    </FormProvider>
  );
}

/** The draft as it stands; each change goes to `changed`. */
function useDraft(form: UseFormReturn<DraftPlan>, changed: (draft: DraftPlan) => void): DraftPlan {
  const [draft, setDraft] = useState(() => structuredClone(form.getValues()));
  useEffect(
    () =>
      form.subscribe({
        formState: { values: true },
        callback: ({ values }) => {
          const copy = structuredClone(values);
          setDraft(copy);
          changed(copy);
        },
      }),
    [form, changed],
  );
  return draft;
}
