import { useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { AddFillDialog } from '@/components/entry/add-fill-dialog';
import { FillList } from '@/components/entry/fill-list';
import { contractWords, fillActs } from '@/components/entry/fill-words';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { Dialog } from '@/components/ui/dialog';
import { formatInstant, formatMoney } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { useLayout } from '@/components/ui/use-layout';
import { useAbandonEntry, useRemoveFill } from '@/hooks/entries/use-entries';
import { type EntryFill } from '@/shared/entries/entry';

/** Under this width of the screen the table would scroll sideways; a list has room. */
const TABLE_FROM = 760;

/** The fills of an entry, tied to the cent, and the ways to add one, take one out, or say that none will come. */
export function FillsSection({ entry }: { entry: SealedEntry }) {
  const [isAdding, setIsAdding] = useState(false);
  const [removing, setRemoving] = useState<EntryFill | null>(null);
  const { fills, row, isOwn } = entry;
  const abandon = useAbandonEntry();
  const canAdd = isOwn && row.state !== 'abandoned';
  const { currency } = row.underlying;
  const renderRemove = (fill: EntryFill) =>
    canAdd && fill.madeBy === null ? (
      <Button
        kind="text"
        icon="trash"
        label={`Take out ${fillActs[fill.kind].toLowerCase()} of ${contractWords(fill)}`}
        iconOnly
        onPress={() => setRemoving(fill)}
      />
    ) : null;
  return (
    <Card
      anchor={anchorOf('fills')}
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
          <FillTable entry={entry} renderRemove={renderRemove} />
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

interface FillTableProps {
  readonly entry: SealedEntry;
  readonly renderRemove: (fill: EntryFill) => ReactNode;
}

function FillTable({ entry: { fills, row }, renderRemove }: FillTableProps) {
  const { width } = useLayout();
  const { currency } = row.underlying;
  const { realisedProfit } = row;
  const realisedLabel = row.state === 'open' ? 'Realised so far' : 'Realised';
  if (width < TABLE_FROM)
    return <FillList {...{ fills, currency, realisedLabel, renderRemove }} realised={realisedProfit} />;
  const total = {
    key: 'total',
    cells: {
      when: (
        <Txt size="row" weight="semibold">
          {realisedLabel}
        </Txt>
      ),
      cash: <SignedAmount value={realisedProfit} currency={currency} size="row" />,
    },
  };
  return (
    <DataTable
      caption={`Fills in ${currency}`}
      columns={[
        { key: 'when', header: 'When', flex: 2 },
        { key: 'act', header: 'Act' },
        { key: 'what', header: 'Contract', flex: 2 },
        { key: 'quantity', header: 'Quantity', align: 'right' },
        { key: 'price', header: 'Price', align: 'right' },
        { key: 'fees', header: 'Fees', align: 'right' },
        { key: 'cash', header: 'Cash', align: 'right', flex: 1.5 },
        { key: 'remove', header: '', align: 'right', width: 52 },
      ]}
      rows={[
        ...fills.map((fill) => ({
          key: fill.id,
          cells: {
            when: formatInstant(fill.tradedAt, fill.timeZone),
            act: fillActs[fill.kind],
            what: contractWords(fill),
            quantity: formatMoney(fill.quantity, { places: 0 }),
            price: formatMoney(fill.price),
            fees: formatMoney(fill.fees),
            cash: <SignedAmount value={fill.cash} currency={currency} size="row" />,
            remove: renderRemove(fill),
          },
        })),
        ...(realisedProfit === null ? [] : [total]),
      ]}
      minWidth={640}
    />
  );
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
        {`${fillActs[fill.kind]} ${fill.quantity} ${contractWords(fill)} at ${fill.price}. For a mistyped fill only; the audit trail keeps it.`}
      </Txt>
      {remove.error === null ? null : (
        <Txt size="row" colour="rust" role="alert">
          {`${remove.error.message} ${remove.error.action}`}
        </Txt>
      )}
    </Dialog>
  );
}
