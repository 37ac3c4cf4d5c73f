import { ScreenFrame } from '@/components/frame/screen-frame';
import { EmptyState } from '@/components/ui/states';

export function NotFoundScreen() {
  return (
    <ScreenFrame title="Nothing here">
      <EmptyState
        title="This page does not exist"
        text="The address may be old, or mistyped."
        action={{ label: 'Go to Today', href: '/' }}
      />
    </ScreenFrame>
  );
}
