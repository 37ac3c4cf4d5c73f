import { useRouter } from 'expo-router';
import { useMemo } from 'react';
import { View } from 'react-native';
import { ClosesChart } from '@/components/charts/closes-chart';
import { VolatilityLadder } from '@/components/charts/volatility-ladder';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { MoveTable } from '@/components/prices/move-table';
import { TypeBarCard } from '@/components/prices/type-bar-card';
import { Banner } from '@/components/ui/banner';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { CautionLine } from '@/components/ui/caution-line';
import { formatDate, formatPercent } from '@/components/ui/number-format';
import { EmptyState, ErrorState } from '@/components/ui/states';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useKeepsJournal } from '@/hooks/account/use-me';
import { useStartPlan } from '@/hooks/entries/use-start-plan';
import { useUnderlying } from '@/hooks/underlyings/use-underlyings';
import { annualizedVolatility } from '@/journal/volatility/annualized-volatility';
import { placeInOwnYear } from '@/journal/volatility/place-in-own-year';
import { type CloseMethod, type VolatilityEstimate } from '@/journal/volatility/volatility-method';
import { volatilityLadder } from '@/journal/volatility/volatility-ladder';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

const CHART_BARS = 125;
const HEADLINE_WINDOW = 21;

/** One underlying: how much it moves in a session, by every window, with the closes it rests on. */
export function UnderlyingScreen({ underlyingId, session }: { underlyingId: string; session?: string }) {
  const { data: detail, error, isPending, refetch } = useUnderlying(underlyingId);
  if (isPending || error)
    return <UnreadyScreen title="Underlying" loading="Loading underlying" error={error} onRetry={refetch} />;
  return <Underlying detail={detail} session={session} />;
}

function Underlying({ detail, session }: { detail: UnderlyingDetail; session: string | undefined }) {
  const router = useRouter();
  const { kind: layout } = useLayout();
  const keepsJournal = useKeepsJournal();
  const { underlying, bars } = detail;
  const params = { underlyingId: underlying.id };
  const plan = useStartPlan((entryId) => router.push({ pathname: '/plan/[entryId]', params: { entryId } }));
  const closes = useMemo(() => bars.map((bar) => Number(bar.close)), [bars]);
  const ladder = useMemo(() => (closes.length < 3 ? [] : volatilityLadder(closes)), [closes]);
  const last = bars.at(-1);
  const isWide = layout === 'wide';
  const keeping = (
    <>
      <Button
        kind="secondary"
        icon="upload"
        label="Upload bars"
        onPress={() => router.push({ pathname: '/prices/[underlyingId]/upload', params })}
      />
      <Button
        kind="text"
        icon="pencil"
        label="Edit"
        onPress={() => router.push({ pathname: '/prices/[underlyingId]/edit', params })}
      />
    </>
  );
  const typeBar = keepsJournal ? <TypeBarCard detail={detail} session={session} /> : null;
  const figures = ladder.length > 0 ? <MoveTable ladder={ladder} /> : null;
  return (
    <ScreenFrame
      title={underlying.symbol}
      note={[
        underlying.name,
        `${underlying.style}, ${underlying.settlement === 'cash' ? 'cash-settled' : 'shares delivered'}`,
      ]
        .filter((text) => text !== '')
        .join(' · ')}
      back={isWide ? undefined : { label: 'Prices', onPress: () => router.navigate('/prices') }}
      action={
        keepsJournal ? (
          <View style={{ flexDirection: 'row', gap: 8 }}>
            {isWide ? keeping : null}
            <Button
              kind="primary"
              icon="plus"
              label="Plan a trade"
              busy={plan.isPending}
              onPress={() => plan.start(underlying.id)}
            />
          </View>
        ) : undefined
      }
    >
      <View style={{ gap: space.cardGap }}>
        {plan.error === null ? null : <ErrorState error={plan.error} onRetry={plan.reset} />}
        {keepsJournal && !isWide ? (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 8 }}>{keeping}</View>
        ) : null}
        {detail.sessionsBehind > 0 && last !== undefined ? (
          <Banner
            kind="amber"
            title={`${underlying.symbol} stops at ${formatDate(last.sessionDate, 'long')}.`}
            text={`${detail.sessionsBehind} ${detail.sessionsBehind === 1 ? 'session is' : 'sessions are'} missing; plans and outcomes wait for them.`}
          />
        ) : null}
        {last === undefined ? (
          <EmptyState
            title="No bars yet"
            text="Upload a CSV or XLSX file of daily closes, or type them one by one below."
            action={
              keepsJournal
                ? { label: 'Upload bars', href: { pathname: '/prices/[underlyingId]/upload', params } }
                : undefined
            }
          />
        ) : (
          <>
            <Headline detail={detail} closes={closes} ladder={ladder} />
            <View
              style={
                isWide
                  ? { flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' }
                  : { gap: space.cardGap }
              }
            >
              <View style={[{ gap: space.cardGap, minWidth: 0 }, isWide ? { flex: 1 } : null]}>
                <Card title="Closes" subtitle={`${Math.min(CHART_BARS, bars.length)} sessions, ${underlying.currency}`}>
                  <ClosesChart
                    bars={bars.slice(-CHART_BARS).map((bar) => ({ date: bar.sessionDate, close: Number(bar.close) }))}
                    highlightLast={HEADLINE_WINDOW}
                  />
                </Card>
                {isWide ? figures : null}
              </View>
              <View style={[{ gap: space.cardGap, minWidth: 0 }, isWide ? { flex: 1 } : null]}>
                <LadderCard ladder={ladder} />
                {isWide ? typeBar : figures}
              </View>
            </View>
          </>
        )}
        {isWide && last !== undefined ? null : typeBar}
        <CautionLine />
      </View>
    </ScreenFrame>
  );
}

function Headline({
  detail,
  closes,
  ladder,
}: {
  detail: UnderlyingDetail;
  closes: readonly number[];
  ladder: readonly VolatilityEstimate<CloseMethod>[];
}) {
  const isWide = useLayout().kind === 'wide';
  const last = detail.bars.at(-1);
  const month = ladder.find(({ method }) => method.kind === 'close' && method.window === HEADLINE_WINDOW);
  const place = useMemo(() => placeInOwnYear(closes, HEADLINE_WINDOW), [closes]);
  const figures: readonly (readonly [string, string, string])[] = [
    [
      'Last close',
      last?.close ?? '–',
      last === undefined ? '' : `${formatDate(last.sessionDate, 'weekday')}, ${last.source}`,
    ],
    month === undefined
      ? ['Volatility a session', '–', `needs ${HEADLINE_WINDOW} returns`]
      : [
          'Volatility a session',
          formatPercent(month.dailyVolatility, 2),
          `${formatPercent(month.low, 2)} to ${formatPercent(month.high, 2)}`,
        ],
    [
      'Place in its year',
      place === null ? '–' : `${Math.round(place.percentile)} of 100`,
      place === null ? 'needs more bars' : `${HEADLINE_WINDOW} sessions`,
    ],
    [
      'A year, shown only',
      month === undefined ? '–' : formatPercent(annualizedVolatility(month.dailyVolatility), 1),
      '× √252',
    ],
    ['Bars', String(detail.barCount), last === undefined ? '' : `to ${formatDate(last.sessionDate, 'long')}`],
  ];
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: isWide ? 32 : 0, rowGap: 12 }}>
      {figures.map(([label, value, note]) => (
        <View key={label} style={isWide ? { minWidth: 132 } : { width: '50%', paddingRight: 12 }}>
          <Txt size="note" colour="inkSoft">
            {label}
          </Txt>
          <Txt size="body" weight="semibold">
            {value}
          </Txt>
          <Txt size="note" colour="inkSoft">
            {note}
          </Txt>
        </View>
      ))}
    </View>
  );
}

function LadderCard({ ladder }: { ladder: readonly VolatilityEstimate<CloseMethod>[] }) {
  return (
    <Card title="Volatility ladder" subtitle="One session, with 95% intervals">
      {ladder.length === 0 ? (
        <Txt size="row" colour="inkSoft">
          Needs at least three closes.
        </Txt>
      ) : (
        <VolatilityLadder
          rungs={ladder.map((rung) => ({
            key: rung.method.kind === 'close' ? String(rung.method.window) : 'ewma',
            label:
              rung.method.kind === 'close' ? `${rung.method.window} sessions` : `Weighted, λ ${rung.method.lambda}`,
            dailyVolatility: rung.dailyVolatility,
            low: rung.low,
            high: rung.high,
          }))}
          chosenKey={String(HEADLINE_WINDOW)}
        />
      )}
    </Card>
  );
}
