import { type ReactNode } from 'react';
import { View } from 'react-native';
import { contractWords, fillActs } from '@/components/entry/fill-words';
import { formatInstant, formatMoney } from '@/components/ui/number-format';
import { Rule } from '@/components/ui/rule';
import { SignedAmount } from '@/components/ui/signed-amount';
import { Txt } from '@/components/ui/text';
import { type EntryFill } from '@/shared/entries/entry';

interface Props {
  readonly fills: readonly EntryFill[];
  readonly currency: string;
  /** What was realised by them; null before the first fill that closes something. */
  readonly realised: string | null;
  readonly realisedLabel: string;
  readonly renderRemove: (fill: EntryFill) => ReactNode;
}

/** The fills where a table has no room: what was done and its cash, when and at what price under it. */
export function FillList({ fills, currency, realised, realisedLabel, renderRemove }: Props) {
  return (
    <View>
      <View role="list" aria-label={`Fills in ${currency}`}>
        {fills.map((fill) => (
          <View key={fill.id} role="listitem">
            <Rule />
            <View style={{ flexDirection: 'row', alignItems: 'center', gap: 4, paddingVertical: 8 }}>
              <View style={{ flex: 1, minWidth: 0 }}>
                <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12 }}>
                  <Txt size="row" weight="medium" style={{ flexShrink: 1 }}>
                    {`${fillActs[fill.kind]} ${formatMoney(fill.quantity, { places: 0 })} × ${contractWords(fill)}`}
                  </Txt>
                  <View style={{ flexShrink: 0 }}>
                    <SignedAmount value={fill.cash} currency={currency} size="row" />
                  </View>
                </View>
                <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12 }}>
                  <Txt size="note" colour="inkSoft" style={{ flexShrink: 1 }}>
                    {formatInstant(fill.tradedAt, fill.timeZone)}
                  </Txt>
                  <Txt size="note" colour="inkSoft" align="right">
                    {`at ${formatMoney(fill.price)}, fees ${formatMoney(fill.fees)}`}
                  </Txt>
                </View>
              </View>
              {renderRemove(fill)}
            </View>
          </View>
        ))}
      </View>
      {realised === null ? null : (
        <>
          <Rule />
          <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12, paddingTop: 8 }}>
            <Txt size="row" weight="semibold">
              {realisedLabel}
            </Txt>
            <SignedAmount value={realised} currency={currency} size="row" />
          </View>
        </>
      )}
    </View>
  );
}
