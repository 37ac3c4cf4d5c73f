import { View } from 'react-native';
import { LatticeTable } from '@/components/entry/lattice-table';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { formatDate, formatInstant, formatMoney, formatPercent } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { downloadText } from '@/hooks/client/download-text';

/** The frozen plan: words, inputs, legs, and the receipt that proves when it was written. */
export function SealedPlanSection({ entry }: { entry: SealedEntry }) {
  const { sealed, plan, row } = entry;
  const { input, forecast, receipt } = sealed;
  const { currency } = row.underlying;
  const facts: readonly (readonly [string, string, string])[] = [
    [
      row.underlying.symbol,
      input.spot.price,
      input.spot.source === 'bar' ? 'last close' : formatInstant(input.spot.at, 'America/New_York'),
    ],
    [
      'Volatility a session',
      formatPercent(input.volatility.base, 2),
      `${formatPercent(input.volatility.low, 2)} to ${formatPercent(input.volatility.high, 2)}`,
    ],
    [
      'To expiry',
      `${Number(forecast.sessions.toExpiry.toFixed(2))} sessions`,
      formatDate(forecast.expirySessionDate, 'withYear'),
    ],
    [
      'Planned exit',
      `${Number(forecast.sessions.holding.toFixed(2))} sessions`,
      formatDate(forecast.exitSessionDate, 'withYear'),
    ],
    ['Rate', formatPercent(input.ratePerYear, 2), 'a year, continuous'],
    ['Fee', `${formatMoney(input.feePerContract)} ${currency}`, 'a contract and side'],
  ];
  return (
    <Card
      anchor={anchorOf('seal')}
      title="Sealed plan"
      subtitle={`${formatInstant(receipt.sealedAt, 'America/New_York', 'withYear')} New York${receipt.isLate ? ', after the first fill' : ''}`}
    >
      <View style={{ gap: 16 }}>
        {plan.idea === '' ? null : <Words label="Idea" text={plan.idea} />}
        {plan.exitRule === '' ? null : <Words label="Exit rule" text={plan.exitRule} />}
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16 }}>
          {facts.map(([label, value, note]) => (
            <View key={label} style={{ minWidth: 132 }}>
              <Txt size="note" colour="inkSoft">
                {label}
              </Txt>
              <Txt size="row" weight="semibold">
                {value}
              </Txt>
              <Txt size="note" colour="inkSoft">
                {note}
              </Txt>
            </View>
          ))}
        </View>
        <DataTable
          caption={`Planned legs, prices in ${currency} a share`}
          columns={[
            { key: 'leg', header: 'Leg', flex: 2 },
            { key: 'premium', header: 'Premium', align: 'right' },
            { key: 'model', header: 'Model', align: 'right' },
            { key: 'implied', header: 'Implied', align: 'right' },
            { key: 'delta', header: 'Delta', align: 'right' },
          ]}
          rows={input.legs.map((leg, index) => {
            const priced = forecast.legs[index];
            return {
              key: leg.id,
              cells: {
                leg: `${leg.side === 'buy' ? 'Buy' : 'Sell'} ${leg.quantity} × ${leg.strikePrice} ${leg.type}`,
                premium: leg.premium,
                model: priced?.modelPrice.base.toFixed(2) ?? '',
                implied:
                  priced === undefined || priced.impliedDailyVolatility === null
                    ? 'none'
                    : formatPercent(priced.impliedDailyVolatility, 2),
                delta: priced?.greeks.delta.toFixed(2) ?? '',
              },
            };
          })}
        />
        <LatticeTable forecast={forecast} currency={currency} />
        <Rule />
        <View
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            gap: 12,
            alignItems: 'center',
            justifyContent: 'space-between',
          }}
        >
          <Txt size="row" colour="inkSoft" style={{ flexShrink: 1 }}>
            {`Seal ${receipt.sequence}, engine ${receipt.engineVersion}: `}
            <Txt size="row" weight="semibold">
              {`${receipt.hash.slice(0, 8)} … ${receipt.hash.slice(-8)}`}
            </Txt>
            {receipt.sequence > 1 ? `, follows ${receipt.previousHash.slice(0, 8)} …` : ', the first of its chain'}
          </Txt>
          <Button
            kind="text"
            label="Save receipt"
            onPress={() => downloadText(`seal-${receipt.sequence}.json`, JSON.stringify(receipt, null, 2))}
          />
        </View>
      </View>
    </Card>
  );
}

function Words({ label, text }: { label: string; text: string }) {
  return (
    <View style={{ maxWidth: 620 }}>
      <Txt size="note" colour="inkSoft">
        {label}
      </Txt>
      <Txt size="body">{text}</Txt>
    </View>
  );
}
