import { LandingBell, type LandingMark } from '@/components/charts/landing-bell';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Card } from '@/components/ui/card';
import { formatDate, withDatesInWords } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';

/** Where the underlying landed in the sealed forecast, or where it is now. */
export function LandingSection({ entry }: { entry: SealedEntry }) {
  const { sealed, outcome } = entry;
  const { input, forecast } = sealed;
  const spot = Number(input.spot.price);
  const deviation = forecast.totalDeviation.holding.base;
  const sigmaOf = (price: number) => Math.log(price / spot) / deviation;
  const mark = (kind: LandingMark['kind'], price: number, label: string): LandingMark => ({
    kind,
    price,
    sigma: sigmaOf(price),
    label,
  });
  const marks = [
    ...input.legs.map((leg) =>
      mark('strike', Number(leg.strikePrice), `${leg.side === 'buy' ? 'Long' : 'Short'} ${leg.type}`),
    ),
    ...forecast.ends.breakEvens.map((price) => mark('breakEven', price, 'Break-even')),
    ...(input.targetPrice === null ? [] : [mark('target', Number(input.targetPrice), 'Target')]),
    ...(input.stopPrice === null ? [] : [mark('stop', Number(input.stopPrice), 'Stop')]),
  ];
  const { move, moveSoFar } = outcome ?? { move: null, moveSoFar: null };
  const reading = move ?? moveSoFar;
  return (
    <Card
      anchor={anchorOf('landing')}
      title={move === null ? 'Where it stands' : 'Where it landed'}
      subtitle={subtitle(entry)}
    >
      <LandingBell
        spot={spot}
        totalDeviation={deviation}
        marks={marks}
        landed={move === null ? undefined : { price: move.endPrice, sigma: move.inSigmas }}
        now={move === null && moveSoFar !== null ? { price: moveSoFar.endPrice, sigma: moveSoFar.inSigmas } : undefined}
      />
      {reading === null ? (
        <Txt size="row" colour="inkSoft">
          {`No bar after the seal yet. The planned exit is ${formatDate(forecast.exitSessionDate, 'long')}.`}
        </Txt>
      ) : null}
    </Card>
  );
}

const pricedAt = {
  close: 'at the close of',
  open: 'at the open of',
  settlement: 'at the settlement value of',
  'close-after-exit': 'at the close after the planned exit of',
} as const;

function subtitle({ row, sealed, outcome }: SealedEntry): string {
  const { symbol } = row.underlying;
  if (outcome?.move != null) {
    const sessions = Number(outcome.move.sessions.toFixed(2));
    return `${symbol} ${pricedAt[outcome.move.pricedBy]} ${formatDate(outcome.move.sessionDate, 'long')}, after ${sessions} ${sessions === 1 ? 'session' : 'sessions'}, against the sealed forecast`;
  }
  // A close is waited for on the day of the exit itself; a settlement value may come days later.
  const waiting =
    outcome?.moveWaitsFor != null && sealed.input.underlying.settlementTime === 'am'
      ? `, waiting for ${withDatesInWords(outcome.moveWaitsFor)}`
      : '';
  if (outcome?.moveSoFar != null)
    return `${symbol} at the close of ${formatDate(outcome.moveSoFar.sessionDate, 'long')}; planned exit ${formatDate(sealed.forecast.exitSessionDate, 'long')}${waiting}`;
  return `${symbol} to the planned exit, ${formatDate(sealed.forecast.exitSessionDate, 'long')}`;
}
