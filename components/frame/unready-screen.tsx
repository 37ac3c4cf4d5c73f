import { ScreenFrame } from '@/components/frame/screen-frame';
import { ErrorState, LoadingState } from '@/components/ui/states';

interface Props {
  readonly title: string;
  readonly back?: { readonly label: string; readonly onPress: () => unknown };
  /** What is on its way, for screen readers. */
  readonly loading: string;
  /** Null while it is on its way. */
  readonly error: Error | null;
  readonly onRetry: () => unknown;
}

/** A screen whose data is on its way or did not come: title, landmark and the way back are there all the same. */
export function UnreadyScreen({ title, back, loading, error, onRetry }: Props) {
  return (
    <ScreenFrame title={title} back={back}>
      {error === null ? <LoadingState label={loading} /> : <ErrorState error={error} onRetry={onRetry} />}
    </ScreenFrame>
  );
}
