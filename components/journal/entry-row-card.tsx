import { View } from 'react-native';
import { LandingStrip } from '@/components/charts/landing-strip';
import { Chip } from '@/components/ui/chip';
import { formatDate, formatSigma } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { StateBerry } from '@/components/ui/state-berry';
import { LinkRow } from '@/components/ui/link-row';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { type EntryRow } from '@/shared/entries/entry';

interface Props {
  readonly row: EntryRow;
  readonly isChosen: boolean;
  /** A mentor sees whose entry it is. */
  readonly showsTrader: boolean;
}

/** One entry in the journal: what, when, state, landing strip, profit; one target that leads to it. */
export function EntryRowCard({ row, isChosen, showsTrader }: Props) {
  const href =
    row.state === 'draft'
      ? ({ pathname: '/plan/[entryId]', params: { entryId: row.id } } as const)
      : ({ pathname: '/journal/[entryId]', params: { entryId: row.id } } as const);
  return (
    <LinkRow
      href={href}
      isChosen={isChosen}
      style={{ padding: space.rowPadding, paddingHorizontal: space.cardPadding, gap: 4 }}
    >
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12, minHeight: 24 }}>
        <Txt size="body" style={{ flexShrink: 1 }}>
          <Txt size="body" weight="semibold">
            {row.underlying.symbol}
          </Txt>
          {` ${row.structureName}`}
        </Txt>
        <View style={{ flexShrink: 0 }}>
          <Amount row={row} />
        </View>
      </View>
      <View
        style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 8, alignItems: 'center', minHeight: 24 }}
      >
        <Txt size="row" colour="inkSoft" style={{ flexShrink: 1 }}>
          {showsTrader ? `${row.trader.displayName} · ${dates(row)}` : dates(row)}
        </Txt>
        <View style={{ flexDirection: 'row', gap: 8, alignItems: 'center' }}>
          {row.isLateSeal ? <Chip kind="amber" icon="clock" label="late seal" /> : null}
          {row.needsLesson ? <Chip kind="amber" label="lesson due" /> : null}
          <StateBerry state={row.state} withWord />
        </View>
      </View>
      <Strip row={row} />
    </LinkRow>
  );
}

function Amount({ row }: { row: EntryRow }) {
  // A position that was only opened has realised nothing yet; 0.00 would read like a result.
  const isOnlyOpened = row.state === 'open' && Number(row.realisedProfit) === 0;
  if (row.realisedProfit !== null && !isOnlyOpened) {
    return <SignedAmount value={row.realisedProfit} currency={row.underlying.currency} size="body" />;
  }
  return (
    <Txt size="row" colour="inkSoft">
      {row.state === 'draft' ? 'plan' : isOnlyOpened ? 'running' : 'no fills'}
    </Txt>
  );
}

function Strip({ row }: { row: EntryRow }) {
  if (row.strip === null) return null;
  const { strikes, breakEvens, target, stop, landed, now } = row.strip;
  const isGrey = row.state === 'draft' || row.state === 'abandoned';
  const reading = landed ?? now;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12 }}>
      <View style={{ flex: 1 }}>
        <LandingStrip
          sigmaMarks={{ strikes, breakEvens, target: target ?? undefined, stop: stop ?? undefined }}
          landed={landed ?? undefined}
          now={landed === null ? (now ?? undefined) : undefined}
          tone={isGrey ? 'grey' : 'forecast'}
        />
      </View>
      <View style={{ width: 56 }}>
        <Txt size="row" align="right">
          {reading === null ? '' : formatSigma(reading)}
        </Txt>
      </View>
    </View>
  );
}

function dates(row: EntryRow): string {
  const day = (date: string) => formatDate(date, 'short');
  if (row.state === 'draft') {
    return row.exitSessionDate === null
      ? `Draft of ${day(row.createdAt.slice(0, 10))}`
      : `Plan for ${day(row.exitSessionDate)}`;
  }
  // Where a flag stands beside the dates, it needs the room of the sessions.
  const hasFlag = row.isLateSeal || row.needsLesson;
  const sessions = row.holdingSessions === null || hasFlag ? '' : `, ${sessionWords(row.holdingSessions)}`;
  const from = row.firstFillAt ?? row.sealedAt;
  if (row.lastFillAt !== null && from !== null && row.state !== 'open') {
    return `${day(from.slice(0, 10))} to ${day(row.lastFillAt.slice(0, 10))}${sessions}`;
  }
  return from === null
    ? ''
    : `${row.firstFillAt === null ? 'Sealed' : 'Open since'} ${day(from.slice(0, 10))}${sessions}`;
}

function sessionWords(sessions: number): string {
  const rounded = Number(sessions.toFixed(2));
  return `${rounded} ${rounded === 1 || rounded < 1 ? 'session' : 'sessions'}`;
}
