import { type verifyChain } from '@/scripts/verify-chain.mjs';

/** Whoever can ask the database for rows. */
type Ask = (sql: string, values: unknown[]) => Promise<Parameters<typeof verifyChain>[0]>;

/** The chain of a trader as the independent check wants it. */
export const chainRows = (ask: Ask, traderId: string): ReturnType<Ask> =>
  ask(
    `SELECT f.desk_id AS deskId, f.trader_id AS traderId, f.sequence, f.previous_hash AS previousHash, f.hash, f.commitment,
            f.sealed_at_microseconds AS sealedAtMicroseconds, c.salt, c.payload
     FROM sealed_forecast f LEFT JOIN sealed_content c ON c.desk_id = f.desk_id AND c.forecast_id = f.id
     WHERE f.trader_id = ? ORDER BY f.sequence`,
    [traderId],
  );
