import { cashFlows } from '@/journal/fills/cash-flow';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { FillStore } from '@/server/fills/fill-store';
import { OutcomeChangeStore } from '@/server/outcomes/outcome-change-store';
import { OutcomeEntity } from '@/server/outcomes/outcome-entity';
import { namesOnDesk } from '@/server/people/people-names';
import { sealedAtOf, SealStore } from '@/server/seals/seal-store';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type Entry, type EntryRow } from '@/shared/entries/entry';

/** Entries as readers see them: names beside ids, seals, fills with their cash, outcomes. */
export class EntryDescriber {
  async rows(scope: DeskScope, entries: readonly EntryEntity[]): Promise<EntryRow[]> {
    const underlyings = new Map(
      (await new UnderlyingStore(scope).list()).map((underlying) => [underlying.id, underlying]),
    );
    const names = await namesOnDesk(scope);
    return entries.map((entry) => {
      const underlying = underlyings.get(entry.underlyingId);
      return {
        id: entry.id,
        version: entry.version,
        state: entry.state,
        trader: { id: entry.traderId, displayName: names.get(entry.traderId) ?? 'former member' },
        underlying: { id: entry.underlyingId, symbol: underlying?.symbol ?? '', currency: underlying?.currency ?? '' },
        structureName: entry.structureName,
        tags: entry.plan.tags,
        createdAt: entry.createdAt.toISOString(),
        sealedAt: entry.sealedAt?.toISOString() ?? null,
        isLateSeal: entry.isLateSeal,
        firstFillAt: entry.firstFillAt?.toISOString() ?? null,
        lastFillAt: entry.lastFillAt?.toISOString() ?? null,
        expirySessionDate: entry.expirySessionDate,
        exitSessionDate: entry.exitSessionDate,
        holdingSessions: entry.holdingSessions,
        strip: entry.strip,
        realisedProfit: entry.realisedProfit === null ? null : toDecimalText(toDecimal(entry.realisedProfit)),
        expectedMean: entry.expectedMean,
        needsLesson: entry.state === 'closed' && entry.lesson === '' && entry.traderId === scope.actor.personId,
      };
    });
  }

  async entry(scope: DeskScope, entry: EntryEntity): Promise<Entry> {
    const [row] = await this.rows(scope, [entry]);
    if (row === undefined) throw new Error('One entry gives one row.');
    const seal = entry.state === 'draft' ? null : await new SealStore(scope).findByEntry(entry.id);
    const fills = await new FillStore(scope).list(entry.id);
    const cash = cashFlows(fills.map(({ fill }) => fill));
    const outcome = await scope.repository(OutcomeEntity).findOne({ entryId: entry.id });
    return {
      row,
      plan: entry.plan,
      planSavedAt: entry.planSavedAt.toISOString(),
      sealed:
        seal === null
          ? null
          : {
              receipt: {
                forecastId: seal.link.id,
                sequence: seal.link.sequence,
                sealedAt: sealedAtOf(seal.link),
                hash: seal.link.hash,
                previousHash: seal.link.previousHash,
                engineVersion: seal.link.engineVersion,
                isLate: entry.isLateSeal,
              },
              // The stored forms are readonly views of what the schemas describe.
              input: seal.content.input as NonNullable<Entry['sealed']>['input'],
              forecast: seal.content.forecast as NonNullable<Entry['sealed']>['forecast'],
            },
      fills: fills.map(({ fill, ...noted }) => ({ ...fill, ...noted, cash: cash.get(fill.id) ?? '0' })),
      outcome: (outcome?.outcome ?? null) as Entry['outcome'], // as above
      history: await new OutcomeChangeStore(scope).list(entry.id),
      lesson: entry.lesson,
      isOwn: entry.traderId === scope.actor.personId,
    };
  }
}
