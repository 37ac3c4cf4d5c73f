import { useRouter } from 'expo-router';
import { ScrollView, View } from 'react-native';
import { PlaceInYear } from '@/components/charts/place-in-year';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { LinkRow } from '@/components/ui/link-row';
import { formatDate, formatPercent } from '@/components/ui/number-format';
import { EmptyState, ErrorState, LoadingState } from '@/components/ui/states';
import { Heading, Txt } from '@/components/ui/text';
import { radius, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useKeepsJournal } from '@/hooks/account/use-me';
import { useUnderlyings } from '@/hooks/underlyings/use-underlyings';
import { type ListedUnderlying } from '@/shared/underlyings/underlying-endpoints';

/** Underlyings with last close, freshness, and volatility with its place in its own year. */
export function PricesList({ chosenId }: { chosenId: string | null }) {
  const router = useRouter();
  const colours = useColours();
  const keepsJournal = useKeepsJournal();
  const { data: underlyings, error, isPending, refetch } = useUnderlyings();
  const add = () => router.push('/prices/new');
  return (
    <ScrollView style={{ flex: 1 }} contentContainerStyle={{ padding: space.gutterPhone, paddingTop: 24, gap: 12 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center' }}>
        <Heading level={1} size="figure">
          Prices
        </Heading>
        {keepsJournal ? <Button icon="plus" label="Underlying" onPress={add} /> : null}
      </View>
      {isPending ? <LoadingState label="Loading underlyings" /> : null}
      {error === null ? null : <ErrorState error={error} onRetry={refetch} />}
      {underlyings?.length === 0 ? (
        <EmptyState
          title="No underlying yet"
          text="Everything starts from how much something moves in a session. Add what you trade, then upload its daily bars."
          action={keepsJournal ? { label: 'Add an underlying', onPress: add } : undefined}
        />
      ) : null}
      {underlyings !== undefined && underlyings.length > 0 ? (
        <>
          <Txt size="note" colour="inkSoft">
            Volatility of the last 21 sessions and its place of 100 in its own past year; the middle half is shaded.
          </Txt>
          <View
            role="list"
            style={{
              backgroundColor: colours.sheet,
              borderColor: colours.rule,
              borderWidth: 1,
              borderRadius: radius.card,
              overflow: 'hidden',
            }}
          >
            {underlyings.map((listed, index) => (
              <UnderlyingRow
                key={listed.underlying.id}
                listed={listed}
                isChosen={listed.underlying.id === chosenId}
                isFirst={index === 0}
              />
            ))}
          </View>
        </>
      ) : null}
    </ScrollView>
  );
}

interface RowProps {
  readonly listed: ListedUnderlying;
  readonly isChosen: boolean;
  readonly isFirst: boolean;
}

function UnderlyingRow({ listed, isChosen, isFirst }: RowProps) {
  const colours = useColours();
  const { underlying, lastBar, previousClose, sessionsBehind, volatility } = listed;
  const change = lastBar === null || previousClose === null ? null : Number(lastBar.close) / Number(previousClose) - 1;
  return (
    <View role="listitem" style={{ borderTopWidth: isFirst ? 0 : 1, borderColor: colours.rule }}>
      <LinkRow
        href={{ pathname: '/prices/[underlyingId]', params: { underlyingId: underlying.id } }}
        isChosen={isChosen}
        style={{ padding: 12, paddingHorizontal: 16, gap: 6 }}
      >
        <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 24 }}>
          <Txt size="body" weight="semibold">
            {underlying.symbol}
          </Txt>
          <View style={{ flex: 1 }}>
            {lastBar === null ? (
              <Txt size="note" colour="inkSoft">
                no bars yet
              </Txt>
            ) : sessionsBehind > 0 ? (
              <View style={{ alignSelf: 'flex-start' }}>
                <Chip
                  kind="amber"
                  icon="clock"
                  label={`${sessionsBehind} ${sessionsBehind === 1 ? 'session' : 'sessions'} old`}
                />
              </View>
            ) : (
              <Txt size="note" colour="inkSoft">
                {formatDate(lastBar.sessionDate)}
              </Txt>
            )}
          </View>
          {lastBar === null ? null : (
            <Txt size="body" weight="medium">
              {lastBar.close}
            </Txt>
          )}
          {change === null ? null : (
            <Txt size="row" colour={change >= 0 ? 'tide' : 'rust'} style={{ minWidth: 60 }} align="right">
              {formatPercent(change, 2, { sign: true })}
            </Txt>
          )}
        </View>
        {volatility === null ? null : (
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
            <View style={{ flex: 1 }}>
              <PlaceInYear {...volatility} current={volatility.dailyVolatility} />
            </View>
            <Txt size="row">
              <Txt size="row" weight="semibold">
                {formatPercent(volatility.dailyVolatility, 2)}
              </Txt>
              {` ${Math.round(volatility.percentile)}`}
            </Txt>
          </View>
        )}
      </LinkRow>
    </View>
  );
}
