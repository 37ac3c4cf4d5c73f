import { createConnection, type Connection } from 'mysql2/promise';
import { addSealed, addUnderlying, completePlan, fill, option } from '@/tests/server/support/journal';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
let connection: Connection;
let other: TestPerson;
beforeAll(async () => {
  app = await startTestApp();
  connection = await createConnection(app.database.migrationUrl);
  const trader = await app.person({ role: 'trader' });
  const mentor = await app.person({ role: 'mentor', deskOf: trader });
  other = await app.person({ role: 'lead' });
  await app.person({ role: 'mentor', deskOf: other });
  await connection.query(
    'INSERT INTO mentorship (id, desk_id, mentor_id, trader_id, accepted_at) VALUES (UUID(), ?, ?, ?, NOW(6))',
    [trader.deskId, mentor.id, trader.id],
  );
  const underlyingId = await addUnderlying(trader);
  await trader
    .post(`/underlyings/${underlyingId}/price-uploads`)
    .attach('file', Buffer.from('Date,Close\n2026-12-07,97.10\n'), 'closes.csv')
    .expect(201);
  const entryId = await addSealed(trader, completePlan(underlyingId));
  const sold = fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T22:00:00.000Z' });
  await trader.post(`/entries/${entryId}/fills`).send(sold).expect(201);
});
afterAll(async () => {
  await connection.end();
  await app.stop();
});

interface Relation {
  readonly name: string;
  readonly tableName: string;
}
const query = async <Row>(sql: string, values: unknown[] = []): Promise<Row[]> => {
  const [rows] = await connection.query(sql, values);
  return rows as Row[]; // a SELECT gives rows
};

describe('a row of one desk', () => {
  it('can hang on no row of another, on every relation of the schema', async () => {
    const relations = await query<Relation>(
      "SELECT CONSTRAINT_NAME AS name, TABLE_NAME AS tableName FROM information_schema.KEY_COLUMN_USAGE WHERE TABLE_SCHEMA = DATABASE() AND COLUMN_NAME = 'desk_id' AND REFERENCED_TABLE_NAME NOT IN ('desk') ORDER BY 1",
    );
    expect(relations.length).toBeGreaterThan(12);
    for (const { name, tableName } of relations) {
      const [sample] = await query<Record<string, unknown>>(`SELECT * FROM \`${tableName}\` LIMIT 1`);
      expect([tableName, sample === undefined]).toEqual([tableName, false]);
      const keyParts = await query<{ columnName: string }>(
        'SELECT COLUMN_NAME AS columnName FROM information_schema.KEY_COLUMN_USAGE WHERE TABLE_SCHEMA = DATABASE() AND CONSTRAINT_NAME = ?',
        [name],
      );
      expect(keyParts.map(({ columnName }) => columnName)).toContain('desk_id');
      const columns = await query<{ columnName: string }>(
        'SELECT COLUMN_NAME AS columnName FROM information_schema.COLUMNS WHERE TABLE_SCHEMA = DATABASE() AND TABLE_NAME = ? ORDER BY ORDINAL_POSITION',
        [tableName],
      );
      const copied = columns.map(({ columnName }) =>
        columnName === 'id'
          ? 'UUID()'
          : columnName === 'desk_id'
            ? connection.escape(other.deskId)
            : `\`${columnName}\``,
      );
      const names = columns.map(({ columnName }) => `\`${columnName}\``).join(', ');
      // The row as it is, moved to the other desk: its parents stay behind.
      const move = `INSERT INTO \`${tableName}\` (${names}) SELECT ${copied.join(', ')} FROM \`${tableName}\` LIMIT 1`;
      await expect(connection.query(move)).rejects.toMatchObject({ errno: 1452 });
    }
  });
});
