import { useRouter, type Href } from 'expo-router';
import { type ReactNode } from 'react';
import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { RuleSection } from '@/components/review/rule-section';
import { WeekEntries } from '@/components/review/week-entries';
import { WeekFiguresCard } from '@/components/review/week-figures-card';
import { WeekOddsCard } from '@/components/review/week-odds-card';
import { Button } from '@/components/ui/button';
import { CautionLine } from '@/components/ui/caution-line';
import { formatDate } from '@/components/ui/number-format';
import { SelectField } from '@/components/ui/select-field';
import { EmptyState } from '@/components/ui/states';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useWeek } from '@/hooks/reviews/use-weekly-review';
import { type ReviewedWeek } from '@/shared/reviews/weekly-review-endpoints';

interface Props {
  /** A date of the week; the latest unless told. */
  readonly week?: string;
  readonly traderId?: string;
}

/** A week looked back at: what was sealed, closed and answered, and the one rule taken from it. */
export function WeeklyReviewScreen({ week, traderId }: Props) {
  const router = useRouter();
  const wanted = { ...(week === undefined ? {} : { week }), ...(traderId === undefined ? {} : { traderId }) };
  const { data, error, isPending, refetch } = useWeek(wanted);
  const back = { label: 'Today', onPress: () => router.navigate('/') };
  if (isPending || error)
    return (
      <UnreadyScreen title="Weekly review" back={back} loading="Loading the week" error={error} onRetry={refetch} />
    );
  return (
    <ScreenFrame title="Weekly review" back={back} note={weekWords(data)} head={<WeekChoice view={data} />}>
      <View style={{ gap: space.cardGap }}>
        <WeekBody view={data} />
        <CautionLine />
      </View>
    </ScreenFrame>
  );
}

function WeekBody({ view }: { view: ReviewedWeek }) {
  const isWide = useLayout().kind === 'wide';
  if (view.trader === null) {
    return (
      <EmptyState
        title="No trader’s weeks to look at"
        text="A trader names you as their mentor on their desk page; then their weeks are here."
        action={{ label: 'See the desk', href: '/desk' }}
      />
    );
  }
  const { sealed, closed, odds } = view;
  // Another week or trader begins with an empty form.
  const rule = <RuleSection key={`${view.week.startSessionDate} ${view.trader.id}`} view={view} />;
  if (sealed.length + closed.length + odds.length === 0) {
    return (
      <>
        <EmptyState
          title="Nothing happened in this week"
          text={
            view.isOwn
              ? 'No plan was sealed, no trade closed and no odds came due. A rule can be written all the same.'
              : 'No plan was sealed, no trade closed and no odds came due.'
          }
        />
        <View style={{ maxWidth: 720 }}>{rule}</View>
      </>
    );
  }
  return (
    <Columns isWide={isWide}>
      <>
        <WeekFiguresCard view={view} />
        <WeekEntries title="Closed" entries={closed} empty="No trade was closed." />
        <WeekEntries title="Sealed" entries={sealed} empty="No plan was sealed." />
      </>
      <>
        {rule}
        <WeekOddsCard view={view} />
      </>
    </Columns>
  );
}

function Columns({ isWide, children }: { isWide: boolean; children: readonly [ReactNode, ReactNode] }) {
  return (
    <View
      style={isWide ? { flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' } : { gap: space.cardGap }}
    >
      {children.map((child, index) => (
        <View key={index} style={[{ gap: space.cardGap, minWidth: 0 }, isWide ? { flex: 1 } : null]}>
          {child}
        </View>
      ))}
    </View>
  );
}

function WeekChoice({ view }: { view: ReviewedWeek }) {
  const router = useRouter();
  const { week, trader, traders } = view;
  const others = trader === null || view.isOwn ? {} : { trader: trader.id };
  const weekAt = (date: string): Href => ({ pathname: '/review', params: { week: date, ...others } });
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: 12 }}>
      <Button kind="secondary" icon="back" label="Week before" href={weekAt(week.previous)} />
      {week.next === null ? null : (
        <Button kind="secondary" trailingIcon="chevron-right" label="Week after" href={weekAt(week.next)} />
      )}
      {traders.length < 2 || trader === null ? null : (
        <View style={{ minWidth: 200 }}>
          <SelectField
            label="Trader"
            value={trader.id}
            options={traders.map(({ id, displayName }) => ({ value: id, label: displayName }))}
            onChange={(id) =>
              router.navigate({ pathname: '/review', params: { week: week.startSessionDate, trader: id } })
            }
          />
        </View>
      )}
    </View>
  );
}

function weekWords({ week, trader, isOwn }: ReviewedWeek): string {
  const dates = `${formatDate(week.startSessionDate, 'weekday')} to ${formatDate(week.endSessionDate, 'weekday')} ${week.endSessionDate.slice(0, 4)}`;
  return [
    dates,
    ...(week.isOver ? [] : ['not over yet']),
    ...(isOwn || trader === null ? [] : [trader.displayName]),
  ].join(' · ');
}
