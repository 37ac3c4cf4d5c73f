import { useState } from 'react';
import { View } from 'react-native';
import { AddFillDialog } from '@/components/entry/add-fill-dialog';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Dialog } from '@/components/ui/dialog';
import { formatDate, formatInstant, formatMoney } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { useAbandonEntry, useRemoveFill } from '@/hooks/entries/use-entries';
import { type EntryFill } from '@/shared/entries/entry';

const acts: Record<EntryFill['kind'], string> = {
  buy: 'Buy',
  sell: 'Sell',
  expiry: 'Expired',
  assignment: 'Assigned',
  exercise: 'Exercised',
};

/** The fills of an entry, tied to the cent, and the ways to add one, take one out, or say that none will come. */
export function FillsSection({ entry }: { entry: SealedEntry }) {
  const [isAdding, setIsAdding] = useState(false);
  const [removing, setRemoving] = useState<EntryFill | null>(null);
  const { fills, row, isOwn } = entry;
  const abandon = useAbandonEntry();
  const canAdd = isOwn && row.state !== 'abandoned';
  const { currency } = row.underlying;
  return (
    <Card
      title="Fills"
      subtitle={
        fills.length === 0 ? 'None yet' : `${fills.length} ${fills.length === 1 ? 'fill' : 'fills'}, in ${currency}`
      }
      action={
        canAdd ? <Button kind="secondary" icon="plus" label="Add fill" onPress={() => setIsAdding(true)} /> : undefined
      }
    >
      <View style={{ gap: 12 }}>
        {fills.length === 0 ? (
          <Txt size="row" colour="inkSoft">
            {row.state === 'abandoned'
              ? 'This plan was not traded. Its odds are scored all the same.'
              : 'Add each execution as your broker reports it. A plan that is not traded is scored too.'}
          </Txt>
        ) : (
          <DataTable
            caption={`Fills in ${currency}`}
            columns={[
              { key: 'when', header: 'When', align: 'left' },
              { key: 'act', header: 'Act', align: 'left' },
              { key: 'what', header: 'Contract', align: 'left', flex: 2 },
              { key: 'quantity', header: 'Quantity', align: 'right' },
              { key: 'price', header: 'Price', align: 'right' },
              { key: 'fees', header: 'Fees', align: 'right' },
              { key: 'cash', header: 'Cash', align: 'right' },
              ...(canAdd ? [{ key: 'remove', header: '', align: 'right' as const }] : []),
            ]}
            rows={[
              ...fills.map((fill) => ({
                key: fill.id,
                cells: {
                  when: formatInstant(fill.tradedAt, fill.timeZone),
                  act: acts[fill.kind],
                  what: contractWords(fill),
                  quantity: formatMoney(fill.quantity, { places: 0 }),
                  price: formatMoney(fill.price),
                  fees: formatMoney(fill.fees),
                  cash: <SignedAmount value={fill.cash} currency={currency} size="row" />,
                  remove:
                    fill.madeBy === null ? (
                      <Button
                        kind="text"
                        icon="trash"
                        label={`Take out ${acts[fill.kind].toLowerCase()} of ${contractWords(fill)}`}
                        iconOnly
                        onPress={() => setRemoving(fill)}
                      />
                    ) : null,
                },
              })),
              ...(row.realisedProfit === null ? [] : [totalRow(row)]),
            ]}
            minWidth={640}
          />
        )}
        {canAdd && fills.length === 0 ? (
          <View style={{ flexDirection: 'row', gap: 8, flexWrap: 'wrap', alignItems: 'center' }}>
            <Button
              kind="text"
              label="I will not trade this plan"
              busy={abandon.isPending}
              onPress={() => abandon.mutate({ params: { entryId: row.id }, version: row.version })}
            />
            {abandon.error === null ? null : (
              <Txt size="note" colour="rust" role="alert">
                {`${abandon.error.message} ${abandon.error.action}`}
              </Txt>
            )}
          </View>
        ) : null}
      </View>
      {isAdding ? <AddFillDialog entry={entry} onClose={() => setIsAdding(false)} /> : null}
      {removing === null ? null : (
        <RemoveFillDialog entryId={row.id} fill={removing} onClose={() => setRemoving(null)} />
      )}
    </Card>
  );
}

function totalRow({ state, realisedProfit, underlying }: SealedEntry['row']) {
  const bold = state === 'open' ? 'Realised so far' : 'Realised';
  return {
    key: 'total',
    cells: {
      when: (
        <Txt size="row" weight="semibold">
          {bold}
        </Txt>
      ),
      cash: <SignedAmount value={realisedProfit} currency={underlying.currency} size="row" />,
    },
  };
}

/** "23 Dec 97 put", or the shares an exercise made. */
export function contractWords({ instrument }: Pick<EntryFill, 'instrument'>): string {
  return instrument.kind === 'stock'
    ? `${instrument.symbol} shares`
    : `${formatDate(instrument.expirySessionDate, 'short')} ${instrument.strikePrice} ${instrument.type}`;
}

function RemoveFillDialog({ entryId, fill, onClose }: { entryId: string; fill: EntryFill; onClose: () => void }) {
  const remove = useRemoveFill();
  return (
    <Dialog
      title="Take this fill out?"
      onClose={onClose}
      actions={
        <>
          <Button kind="secondary" label="Keep it" onPress={onClose} />
          <Button
            kind="danger"
            label="Take it out"
            busy={remove.isPending}
            onPress={() => remove.mutate({ params: { entryId, fillId: fill.id } }, { onSuccess: onClose })}
          />
        </>
      }
    >
      <Txt size="body" colour="inkSoft">
        {`${acts[fill.kind]} ${fill.quantity} ${contractWords(fill)} at ${fill.price}. For a mistyped fill only; the audit trail keeps it.`}
      </Txt>
      {remove.error === null ? null : (
        <Txt size="row" colour="rust" role="alert">
          {`${remove.error.message} ${remove.error.action}`}
        </Txt>
      )}
    </Dialog>
  );
}
