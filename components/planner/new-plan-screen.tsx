import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { ChoiceRow } from '@/components/ui/choice-row';
import { Card } from '@/components/ui/card';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { formatDate, formatPercent } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { useStartPlan } from '@/hooks/entries/use-start-plan';
import { useUnderlyings } from '@/hooks/underlyings/use-underlyings';

/** The first step of a plan: on which underlying. */
export function NewPlanScreen() {
  const router = useRouter();
  const underlyings = useUnderlyings();
  const plan = useStartPlan((entryId) => router.replace({ pathname: '/plan/[entryId]', params: { entryId } }));
  return (
    <ScreenFrame title="Plan a trade" back={{ label: 'Journal', onPress: () => router.navigate('/journal') }}>
      <View style={{ gap: 12, maxWidth: 680, width: '100%' }}>
        {plan.error === null ? null : <ErrorState error={plan.error} onRetry={plan.reset} />}
        {underlyings.isPending ? <LoadingState label="Loading underlyings" /> : null}
        {underlyings.error === null ? null : <ErrorState error={underlyings.error} onRetry={underlyings.refetch} />}
        {underlyings.data?.length === 0 ? (
          <EmptyState
            title="No underlying yet"
            text="A plan starts from how much something moves. Add an underlying and upload its daily bars."
            action={{ label: 'Add an underlying', onPress: () => router.push('/prices/new') }}
          />
        ) : null}
        {underlyings.data !== undefined && underlyings.data.length > 0 ? (
          <Card title="On which underlying?">
            <View role="list">
              {underlyings.data.map(({ underlying, lastBar, volatility }) => (
                <ChoiceRow
                  key={underlying.id}
                  title={underlying.symbol}
                  detail={underlying.name}
                  value={lastBar === null ? 'no bars' : lastBar.close}
                  note={
                    lastBar === null
                      ? 'type the price in the plan'
                      : `${formatDate(lastBar.sessionDate, 'short')}${volatility === null ? '' : `, ${formatPercent(volatility.dailyVolatility, 2)} a session`}`
                  }
                  disabled={plan.isPending}
                  onPress={() => plan.start(underlying.id)}
                />
              ))}
            </View>
          </Card>
        ) : null}
        <Txt size="note" colour="inkSoft">
          A draft is saved as you type; nothing is binding until you seal it.
        </Txt>
      </View>
    </ScreenFrame>
  );
}
