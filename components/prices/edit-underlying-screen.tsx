import { useRouter } from 'expo-router';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { UnderlyingForm } from '@/components/prices/underlying-form';
import { useEditUnderlying, useUnderlying } from '@/hooks/underlyings/use-underlyings';

/** Changes what is known of an underlying; sealed forecasts keep what they were made with. */
export function EditUnderlyingScreen({ underlyingId }: { underlyingId: string }) {
  const router = useRouter();
  const edit = useEditUnderlying();
  const { data: detail, error, isPending, refetch } = useUnderlying(underlyingId);
  if (isPending || error)
    return <UnreadyScreen title="Edit underlying" loading="Loading underlying" error={error} onRetry={refetch} />;
  const { id: _, version, ...initial } = detail.underlying;
  const back = () => router.navigate({ pathname: '/prices/[underlyingId]', params: { underlyingId } });
  return (
    <ScreenFrame
      title={`Edit ${initial.symbol}`}
      note="Sealed forecasts keep what they were made with"
      back={{ label: initial.symbol, onPress: back }}
    >
      <UnderlyingForm
        initial={initial}
        submitLabel="Save"
        isBusy={edit.isPending}
        error={edit.error}
        onSubmit={(body) => edit.mutate({ params: { underlyingId }, version, body }, { onSuccess: back })}
      />
    </ScreenFrame>
  );
}
