import { type Href } from 'expo-router';
import { type ReactNode } from 'react';
import { View } from 'react-native';
import { Banner } from '@/components/ui/banner';
import { BrandMark } from '@/components/ui/brand-mark';
import { Button } from '@/components/ui/button';
import { HiddenText } from '@/components/ui/hidden-text';
import { Icon } from '@/components/ui/icon';
import { Skeleton } from '@/components/ui/skeleton';
import { Heading, Txt } from '@/components/ui/text';
import { type ColourName } from '@/components/ui/theme/colours';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useIsOnline } from '@/components/ui/use-is-online';
import { ApiError } from '@/hooks/client/api-error';

interface Action {
  readonly label: string;
  readonly onPress?: () => unknown;
  readonly href?: Href;
}

/** What is coming, as grey shapes at once; screen readers are told the label. */
export function LoadingState({ label, cards = 2 }: { label: string; cards?: number }) {
  const colours = useColours();
  return (
    <View role="status" aria-busy style={{ gap: space.cardGap }}>
      <HiddenText>{label}</HiddenText>
      {Array.from({ length: cards }, (_, card) => (
        <View
          key={card}
          style={{
            padding: space.cardPadding,
            borderRadius: radius.card,
            borderWidth: 1,
            borderColor: colours.rule,
            backgroundColor: colours.sheet,
          }}
        >
          <Skeleton lines={3} />
        </View>
      ))}
    </View>
  );
}

interface EmptyProps {
  readonly title: string;
  readonly text: string;
  readonly action?: Action;
  readonly secondAction?: Action;
}

/** Nothing here yet: why, and the next sensible action. */
export function EmptyState({ title, text, action, secondAction }: EmptyProps) {
  return (
    <StatePage
      ground="brambleWash"
      picture={<BrandMark size={28} />}
      title={title}
      text={text}
      action={action}
      secondAction={secondAction}
    />
  );
}

interface ErrorProps {
  readonly error: Error | null;
  readonly title?: string;
  readonly onRetry?: () => unknown;
}

/** What happened and what to do, in the server's words where it gave any. */
export function ErrorState({ error, title, onRetry }: ErrorProps) {
  if (error instanceof ApiError && error.code === 'not-allowed') {
    return <NoPermissionState title={error.message} text={error.action} />;
  }
  const text =
    error instanceof ApiError
      ? `${error.message} ${error.action}`
      : 'Something in this page went wrong. What you entered before is kept; try again.';
  return (
    <View role="alert">
      <StatePage
        ground="rustWash"
        picture={<Icon name="warning" size={24} colour="rust" />}
        title={title ?? 'This did not load'}
        text={text}
        action={onRetry === undefined ? undefined : { label: 'Try again', onPress: onRetry }}
      />
    </View>
  );
}

interface NoPermissionProps {
  readonly title?: string;
  /** Who can grant it. */
  readonly text?: string;
  readonly action?: Action;
}

/** Something this person may not see or do here, and who can change that. */
export function NoPermissionState({
  title = 'This is not open to you',
  text = 'The lead of your desk can give you the role for it.',
  action,
}: NoPermissionProps) {
  return (
    <StatePage
      ground="well"
      picture={<Icon name="lock" size={24} />}
      title={title}
      text={text}
      action={action}
      isSecondary
    />
  );
}

/** Says that the connection is gone, and what of the screen still holds; nothing while it is there. */
export function OfflineBanner({
  text = 'What you see may be older. Notes are kept here; sealing waits.',
}: {
  text?: string;
}) {
  return useIsOnline() ? null : <Banner kind="amber" icon="offline" title="Offline." text={text} />;
}

interface PageProps extends EmptyProps {
  readonly picture: ReactNode;
  readonly ground: ColourName;
  readonly isSecondary?: boolean;
}

function StatePage({ picture, ground, title, text, action, secondAction, isSecondary = false }: PageProps) {
  const colours = useColours();
  return (
    <View style={{ paddingVertical: 40, paddingHorizontal: 8, gap: 8, alignItems: 'flex-start', maxWidth: 480 }}>
      <View
        style={{
          width: 56,
          height: 56,
          borderRadius: 28,
          marginBottom: 8,
          alignItems: 'center',
          justifyContent: 'center',
          backgroundColor: colours[ground],
        }}
      >
        {picture}
      </View>
      <Heading level={2} serif size="head">
        {title}
      </Heading>
      <Txt colour="inkSoft">{text}</Txt>
      {action === undefined ? null : (
        <View style={{ paddingTop: 8 }}>
          <Button kind={isSecondary ? 'secondary' : 'primary'} {...action} />
        </View>
      )}
      {secondAction === undefined ? null : (
        <View style={{ paddingTop: 16 }}>
          <Button kind="text" {...secondAction} />
        </View>
      )}
    </View>
  );
}
