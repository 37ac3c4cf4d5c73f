import { View } from 'react-native';
import { Chip } from '@/components/ui/chip';
import { formatDate, formatInstant, formatMoney } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { StateBerry } from '@/components/ui/state-berry';
import { Txt } from '@/components/ui/text';
import { useLayout } from '@/components/ui/use-layout';
import { type SealedEntry } from '@/components/entry/sealed-entry';

/** State, dates and trader at the left; the profit, with what was expected, at the right. */
export function EntryHead({ entry }: { entry: SealedEntry }) {
  const { row, outcome } = entry;
  const profit = outcome?.profit ?? null;
  const atRight = useLayout().kind !== 'phone';
  const align = atRight ? 'right' : 'left';
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'space-between', gap: 12 }}>
      <View style={{ gap: 4, flexShrink: 1, maxWidth: '100%' }}>
        <View style={{ flexDirection: 'row', gap: 8, alignItems: 'center', flexWrap: 'wrap' }}>
          <StateBerry state={row.state} withWord />
          {row.isLateSeal ? <Chip kind="amber" icon="clock" label="late seal" /> : null}
          {row.tags.map((tag) => (
            <Chip key={tag} kind="plain" label={tag} />
          ))}
        </View>
        <Txt size="row" colour="inkSoft">
          {[period(entry), row.trader.displayName].join(' · ')}
        </Txt>
        <Txt size="note" colour="inkSoft">
          {sealWords(entry)}
        </Txt>
      </View>
      {profit === null ? null : (
        <View style={{ alignItems: atRight ? 'flex-end' : 'flex-start' }}>
          <SignedAmount value={profit.realised} currency={row.underlying.currency} size="figure" />
          <Txt size="row" colour="inkSoft" align={align}>
            {`${profit.isFinal ? '' : 'so far; '}expected mean ${formatMoney(profit.expectedMean, { sign: true })} ${row.underlying.currency}`}
          </Txt>
          {profit.percentileHigh === null || !profit.isFinal ? null : (
            <Txt size="row" colour="inkSoft" align={align}>
              {placeInForecast(profit.percentileLow ?? 0, profit.percentileHigh)}
            </Txt>
          )}
        </View>
      )}
    </View>
  );
}

/** "81st of 100 in its forecast"; a point mass gives a range. */
export function placeInForecast(low: number, high: number): string {
  const [from, to] = [Math.round(low * 100), Math.round(high * 100)];
  return from === to ? `${ordinal(to)} of 100 in its forecast` : `${from} to ${to} of 100 in its forecast`;
}

function ordinal(value: number): string {
  const tens = value % 100;
  const ending = tens >= 11 && tens <= 13 ? 'th' : (['th', 'st', 'nd', 'rd'][value % 10] ?? 'th');
  return `${value}${ending}`;
}

/** When it was sealed, against the first fill. */
function sealWords({ sealed: { receipt }, fills }: SealedEntry): string {
  const at = `Sealed ${formatInstant(receipt.sealedAt, 'America/New_York', 'withYear')} New York`;
  if (fills.length === 0) return at;
  return `${at}, ${receipt.isLate ? 'after' : 'before'} the first of ${fills.length} ${fills.length === 1 ? 'fill' : 'fills'}`;
}

function period({ row, sealed }: SealedEntry): string {
  const day = (instant: string) => formatDate(instant.slice(0, 10), 'long');
  if (row.firstFillAt === null) return `Sealed ${day(sealed.receipt.sealedAt)}, no fills`;
  return row.lastFillAt === null || row.state === 'open'
    ? `Open since ${day(row.firstFillAt)}`
    : `${day(row.firstFillAt)} to ${day(row.lastFillAt)}`;
}
