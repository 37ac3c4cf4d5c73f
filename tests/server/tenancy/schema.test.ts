import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

/** Tables that are no desk's, each with its reason. */
const withoutDesk: Readonly<Record<string, string>> = {
  user: 'a person can be on several desks',
  desk: 'is the desk itself; its id is what the others carry',
  invitation: 'comes before there is a desk',
  session: 'belongs to a person, who chooses the desk in it',
  login_throttle: 'counts before anyone is known',
  migration: 'the history of the schema',
};
/** Foreign keys that cannot carry the desk, each with its reason. */
const keysWithoutDesk: Readonly<Record<string, string>> = {
  fk_membership_user_id: 'this row is what ties a person to the desk',
};

interface Column {
  readonly tableName: string;
  readonly columnName: string;
  readonly isNullable: string;
  readonly type: string;
}
interface IndexColumn {
  readonly tableName: string;
  readonly indexName: string;
  readonly columnName: string;
}
interface KeyColumn extends IndexColumn {
  readonly target: string;
  readonly targetColumn: string;
}

const columns = (): Promise<Column[]> =>
  app.dataSource.query(
    'SELECT TABLE_NAME AS tableName, COLUMN_NAME AS columnName, IS_NULLABLE AS isNullable, COLUMN_TYPE AS type FROM information_schema.COLUMNS WHERE TABLE_SCHEMA = DATABASE()',
  );
const uniques = (): Promise<IndexColumn[]> =>
  app.dataSource.query(
    "SELECT TABLE_NAME AS tableName, INDEX_NAME AS indexName, COLUMN_NAME AS columnName FROM information_schema.STATISTICS WHERE TABLE_SCHEMA = DATABASE() AND NON_UNIQUE = 0 AND INDEX_NAME <> 'PRIMARY' ORDER BY TABLE_NAME, INDEX_NAME, SEQ_IN_INDEX",
  );
const keys = (): Promise<KeyColumn[]> =>
  app.dataSource.query(
    'SELECT TABLE_NAME AS tableName, CONSTRAINT_NAME AS indexName, COLUMN_NAME AS columnName, REFERENCED_TABLE_NAME AS target, REFERENCED_COLUMN_NAME AS targetColumn FROM information_schema.KEY_COLUMN_USAGE WHERE TABLE_SCHEMA = DATABASE() AND REFERENCED_TABLE_NAME IS NOT NULL ORDER BY TABLE_NAME, CONSTRAINT_NAME, ORDINAL_POSITION',
  );
const deskTables = async () =>
  [...new Set((await columns()).map(({ tableName }) => tableName))].filter((name) => !(name in withoutDesk));

function grouped<Row extends IndexColumn>(rows: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const key = `${row.tableName}.${row.indexName}`;
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  return groups;
}

describe('the schema', () => {
  it('has the desk on every table that is not listed here with a reason', async () => {
    const desks = (await columns()).filter(({ columnName }) => columnName === 'desk_id');
    expect(desks.map(({ tableName }) => tableName).sort()).toEqual((await deskTables()).sort());
    expect(desks.filter(({ isNullable }) => isNullable !== 'NO')).toEqual([]);
  });

  it('has a unique pair of desk and id on each of them, and every other unique index starts with the desk', async () => {
    const tables = await deskTables();
    const indexes = [...grouped(await uniques()).values()].map((parts) => ({
      tableName: parts[0]?.tableName ?? '',
      names: parts.map(({ columnName }) => columnName).join(','),
    }));
    for (const table of tables) expect(indexes).toContainEqual({ tableName: table, names: 'desk_id,id' });
    const others = indexes.filter(
      ({ tableName, names }) => tables.includes(tableName) && !names.startsWith('desk_id,'),
    );
    expect(others).toEqual([]);
  });

  it('ties every child to its parent on the same desk', async () => {
    const tables = await deskTables();
    const loose = [...grouped(await keys()).values()].flatMap((parts) => {
      const [first] = parts;
      if (first === undefined || !tables.includes(first.tableName) || first.indexName in keysWithoutDesk) return [];
      const toDesk = first.target === 'desk' && first.columnName === 'desk_id' && parts.length === 1;
      const carriesDesk = first.columnName === 'desk_id' && first.targetColumn === 'desk_id' && parts.length === 2;
      return toDesk || carriesDesk ? [] : [first.indexName];
    });
    expect(loose).toEqual([]);
    const tied = new Set((await keys()).map(({ tableName }) => tableName));
    expect(tables.filter((table) => !tied.has(table))).toEqual([]);
  });

  it('removes or changes nothing by itself through a foreign key', async () => {
    const rules = await app.dataSource.query(
      "SELECT CONSTRAINT_NAME FROM information_schema.REFERENTIAL_CONSTRAINTS WHERE CONSTRAINT_SCHEMA = DATABASE() AND (DELETE_RULE NOT IN ('RESTRICT', 'NO ACTION') OR UPDATE_RULE NOT IN ('RESTRICT', 'NO ACTION'))",
    );
    expect(rules).toEqual([]);
  });

  it('keeps instants to the microsecond and money exact', async () => {
    const all = await columns();
    expect(all.filter(({ type }) => /^(datetime|timestamp)(?!\(6\))/.test(type))).toEqual([]);
    expect(all.filter(({ type }) => type.startsWith('timestamp'))).toEqual([]);
    const money = /price|fee|close|open|high|low|settlement|quantity|multiplier|profit/;
    const named = all.filter(({ columnName, type }) => money.test(columnName) && /float|double/.test(type));
    expect(named).toEqual([]);
  });
});
