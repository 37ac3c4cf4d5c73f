import { type DeskScope } from '@/server/database/desk-scope';
import { commitmentOf, firstPreviousHash, sealHash } from '@/server/seals/seal-hash';
import { SealedContentEntity } from '@/server/seals/sealed-content-entity';
import { SealedForecastEntity } from '@/server/seals/sealed-forecast-entity';
import { payloadOf, type SealedPayload } from '@/server/seals/sealed-payload';
import { MembershipEntity } from '@/server/people/membership-entity';

export interface NewSeal {
  readonly forecastId: string;
  readonly contentId: string;
  readonly traderId: string;
  readonly entryId: string;
  readonly sealedAt: Date;
  readonly salt: string;
  readonly text: string;
  readonly engineVersion: string;
}

/** The instant of a seal, from its microseconds. */
export const sealedAtOf = ({ sealedAtMicroseconds }: Pick<SealedForecastEntity, 'sealedAtMicroseconds'>): string =>
  new Date(Number(BigInt(sealedAtMicroseconds) / 1000n)).toISOString();

export interface StoredSeal {
  readonly link: SealedForecastEntity;
  readonly content: Omit<SealedPayload, 'closes'>;
}

/** The seals of one desk: they are added and read, never changed. */
export class SealStore {
  constructor(private readonly scope: DeskScope) {}

  private get links() {
    return this.scope.repository(SealedForecastEntity);
  }

  /**
   * Waits until no other seal of the trader is being made; their membership is the lock that exists before the first link does.
   * It must be the first statement of the transaction: what is read before it may be older than the last link.
   */
  async awaitTurn(traderId: string): Promise<void> {
    await this.scope.repository(MembershipEntity).find({ personId: traderId }, { locked: true });
  }

  /** Adds the next link of the trader's chain, computed from what the database then holds; the turn must be the caller's. */
  async append(seal: NewSeal): Promise<SealedForecastEntity> {
    const [last] = await this.links.find({ traderId: seal.traderId }, { order: { sequence: 'DESC' }, take: 1 });
    const place = {
      deskId: this.scope.deskId,
      traderId: seal.traderId,
      sequence: (last?.sequence ?? 0) + 1,
      previousHash: last?.hash ?? firstPreviousHash,
      sealedAtMicroseconds: BigInt(seal.sealedAt.getTime()) * 1000n,
    };
    const commitment = commitmentOf(seal.salt, seal.text);
    const link = {
      id: seal.forecastId,
      traderId: seal.traderId,
      entryId: seal.entryId,
      sequence: place.sequence,
      previousHash: place.previousHash,
      hash: sealHash(place, commitment),
      commitment,
      sealedAtMicroseconds: String(place.sealedAtMicroseconds),
      engineVersion: seal.engineVersion,
    };
    await this.links.insert(link);
    await this.scope
      .repository(SealedContentEntity)
      .insert({ id: seal.contentId, forecastId: seal.forecastId, salt: seal.salt, payload: seal.text });
    await this.assertStored(link.id);
    return { ...link, deskId: this.scope.deskId };
  }

  async findByEntry(entryId: string): Promise<StoredSeal | null> {
    const link = await this.links.findOne({ entryId });
    if (link === null) return null;
    const content = await this.scope.repository(SealedContentEntity).findOne({ forecastId: link.id });
    return content === null ? null : { link, content: payloadOf(content.payload) };
  }

  /** The seals of several entries, by the entry's id. */
  async findByEntries(entryIds: readonly string[]): Promise<Map<string, StoredSeal>> {
    const links = await this.links.query('link').andWhere('link.entryId IN (:...entryIds)', { entryIds }).getMany();
    if (links.length === 0) return new Map();
    const contents = await this.scope
      .repository(SealedContentEntity)
      .query('content')
      .andWhere('content.forecastId IN (:...ids)', { ids: links.map(({ id }) => id) })
      .getMany();
    const payloads = new Map(contents.map(({ forecastId, payload }) => [forecastId, payload]));
    return new Map(
      links.flatMap((link) => {
        const payload = payloads.get(link.id);
        return payload === undefined ? [] : [[link.entryId, { link, content: payloadOf(payload) }] as const];
      }),
    );
  }

  /** What was written must read back as what was hashed, or the seal is not made. */
  private async assertStored(forecastId: string): Promise<void> {
    const link = await this.links.get(forecastId);
    const content = await this.scope.repository(SealedContentEntity).findOne({ forecastId });
    const commitment = content === null ? null : commitmentOf(content.salt, content.payload);
    const hash = sealHash(
      {
        deskId: link.deskId,
        traderId: link.traderId,
        sequence: link.sequence,
        previousHash: link.previousHash,
        sealedAtMicroseconds: BigInt(link.sealedAtMicroseconds),
      },
      link.commitment,
    );
    if (commitment !== link.commitment || hash !== link.hash)
      throw new Error('The seal does not read back as it was written.');
  }
}
