import { type DataSource } from 'typeorm';
import { createDataSource } from '@/server/database/data-source';
import { grantStatements } from '@/server/database/grants';

const LOCK = 'brierbook-migration';
const LOCK_SECONDS = 120;

/** Brings the schema to its newest state, one server at a time, and gives the application's account its rights. */
export async function migrate({
  url,
  applicationAccount,
}: {
  url: string;
  applicationAccount: string;
}): Promise<{ applied: number }> {
  const dataSource = createDataSource(url);
  await dataSource.initialize();
  try {
    return await withLock(dataSource, async () => {
      const applied = await dataSource.runMigrations({ transaction: 'each' });
      const database = new URL(url).pathname.slice(1);
      for (const statement of grantStatements(database, applicationAccount)) await dataSource.query(statement);
      return { applied: applied.length };
    });
  } finally {
    await dataSource.destroy();
  }
}

/** A named lock belongs to one connection, which is kept until the work is done. */
async function withLock<T>(dataSource: DataSource, work: () => Promise<T>): Promise<T> {
  const keeper = dataSource.createQueryRunner();
  try {
    const [row]: { taken: string | number | null }[] = await keeper.query('SELECT GET_LOCK(?, ?) AS taken', [
      LOCK,
      LOCK_SECONDS,
    ]);
    if (Number(row?.taken) !== 1) throw new Error('Another migration is still running.');
    return await work();
  } finally {
    await keeper.query('SELECT RELEASE_LOCK(?)', [LOCK]);
    await keeper.release();
  }
}
