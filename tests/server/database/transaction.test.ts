import { QueryFailedError, type DataSource } from 'typeorm';
import { createDataSource } from '@/server/database/data-source';
import { inTransaction } from '@/server/database/transaction';
import { DeskEntity } from '@/server/desk/desk-entity';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(60_000);

let database: TestDatabase;
let dataSource: DataSource;
beforeAll(async () => {
  database = await createTestDatabase();
  dataSource = await createDataSource(database.applicationUrl).initialize();
});
afterAll(async () => {
  await dataSource.destroy();
  await database.drop();
});

const failure = (errno: number) =>
  new QueryFailedError('UPDATE', [], Object.assign(new Error('from the database'), { errno }));
const row = (id: string): DeskEntity => ({
  id,
  version: 1,
  name: 'Desk',
  currency: 'USD',
  ratePerYear: 0,
  overnightShare: 0,
  feePerContract: '0',
  createdAt: new Date('2026-12-09T22:00:00.000Z'),
});
const stored = (id: string) => dataSource.getRepository(DeskEntity).countBy({ id });

describe('a transaction', () => {
  it('keeps all of it, and gives what the work gave', async () => {
    const id = 'all-of-it';
    expect(await inTransaction(dataSource, async (manager) => (await manager.insert(DeskEntity, row(id)), 7))).toBe(7);
    expect(await stored(id)).toBe(1);
  });

  it('keeps nothing after any error, wherever it comes', async () => {
    for (const failing of [0, 1, 2]) {
      const work = inTransaction(dataSource, async (manager) => {
        for (const step of [0, 1, 2]) {
          await manager.insert(DeskEntity, row(`${failing}-${step}`));
          if (step === failing) throw new RangeError('in the middle');
        }
      });
      await expect(work).rejects.toThrow(RangeError);
      for (const step of [0, 1, 2]) expect(await stored(`${failing}-${step}`)).toBe(0);
    }
  });

  it.each([1213, 1205, 1020])('is done again after error %i, from a clean start', async (errno) => {
    const id = `again-${errno}`;
    let tries = 0;
    await inTransaction(dataSource, async (manager) => {
      tries += 1;
      await manager.insert(DeskEntity, row(id)); // would be a duplicate had the try before left anything
      if (tries < 3) throw failure(errno);
    });
    expect([tries, await stored(id)]).toEqual([3, 1]);
  });

  it.each([1213, 1205, 1020])('gives up on error %i after four tries', async (errno) => {
    let tries = 0;
    const work = inTransaction(dataSource, () => {
      tries += 1;
      return Promise.reject(failure(errno));
    });
    await expect(work).rejects.toMatchObject({ driverError: { errno } });
    expect(tries).toBe(4);
  });

  it.each([1062, 1451, 1452, 4025, 1142])('is not done again after error %i', async (errno) => {
    let tries = 0;
    const work = inTransaction(dataSource, () => {
      tries += 1;
      return Promise.reject(failure(errno));
    });
    await expect(work).rejects.toMatchObject({ driverError: { errno } });
    expect(tries).toBe(1);
  });

  it('always gives its connection back', async () => {
    const rounds = Array.from({ length: 40 }, (_, round) =>
      inTransaction(dataSource, () =>
        round % 2 === 0 ? Promise.reject(new RangeError('no')) : Promise.resolve(round),
      ),
    );
    const results = await Promise.allSettled(rounds);
    expect(results.filter(({ status }) => status === 'fulfilled')).toHaveLength(20);
    expect(await stored('all-of-it')).toBe(1);
  });

  it('sees a row that changed under it, and then works on the row as it is', async () => {
    const id = 'changed-under-it';
    await dataSource.getRepository(DeskEntity).insert(row(id));
    let tries = 0;
    await inTransaction(dataSource, async (manager) => {
      tries += 1;
      const seen = await manager.findOneByOrFail(DeskEntity, { id });
      if (tries === 1) await dataSource.getRepository(DeskEntity).update({ id }, { version: 41 }); // someone else
      await manager.update(DeskEntity, { id }, { version: seen.version + 1 });
    });
    expect(tries).toBe(2);
    expect((await dataSource.getRepository(DeskEntity).findOneByOrFail({ id })).version).toBe(42);
  });
});
