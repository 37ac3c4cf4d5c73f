import { randomUUID } from 'node:crypto';
import { type DataSource } from 'typeorm';
import { createDataSource } from '@/server/database/data-source';
import { tableGrants } from '@/server/database/grants';
import {
  type DeskIds,
  insertDesk,
  insertRow,
  type Row,
  sampleRow,
  sampleRows,
} from '@/tests/server/support/sample-rows';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

/** Tables that belong to no desk, each with its reason. */
const deskless: Readonly<Record<string, string>> = {
  user: 'a person can be on several desks',
  desk: 'the desk itself',
  session: 'a browser, before a desk is chosen',
  login_throttle: 'nobody is signed in yet',
  invitation: 'makes the first desk',
  migration: 'the schema',
};
/** Ids in a desk's table that point outside the desk, or at rows of any kind. */
const freeReferences: Readonly<Record<string, string>> = {
  'membership.user_id': 'ties a person to a desk',
  'audit_event.subject_id': 'names a row of any table, removed ones too',
};
/** Model figures and settings: everything else that counts money is DECIMAL. */
const doubles = [
  'desk.overnight_share',
  'desk.rate_per_year',
  'entry.expected_mean',
  'entry.holding_sessions',
  'scored_entry.expected_deviation',
  'scored_entry.expected_mean',
  'scored_entry.move_deviations',
  'scored_entry.move_place',
  'scored_entry.profit_place_high',
  'scored_entry.profit_place_low',
  'scored_entry.volatility_ratio',
  'scored_odds.market_implied',
  'scored_odds.probability',
  'underlying.dividend_yield',
];

interface ColumnInfo {
  readonly tableName: string;
  readonly name: string;
  readonly type: string;
  readonly fullType: string;
  readonly isNullable: 'YES' | 'NO';
  readonly collation: string | null;
  readonly precision: string | number | null;
  readonly fallback: string | null;
}
interface Reference {
  readonly tableName: string;
  readonly name: string;
  readonly columns: string;
  readonly target: string;
  readonly targetColumns: string;
  readonly onDelete: string;
  readonly onUpdate: string;
}

let database: TestDatabase;
let source: DataSource;
let columns: ColumnInfo[];
let references: Reference[];
let own: DeskIds;
let foreign: DeskIds;

beforeAll(async () => {
  database = await createTestDatabase();
  source = await createDataSource(database.migrationUrl).initialize();
  columns = await source.query(
    `SELECT TABLE_NAME AS tableName, COLUMN_NAME AS name, DATA_TYPE AS type, COLUMN_TYPE AS fullType, IS_NULLABLE AS isNullable,
            COLLATION_NAME AS collation, DATETIME_PRECISION AS \`precision\`, COLUMN_DEFAULT AS fallback
       FROM information_schema.COLUMNS WHERE TABLE_SCHEMA = DATABASE()`,
  );
  references = await source.query(
    `SELECT k.TABLE_NAME AS tableName, k.CONSTRAINT_NAME AS name, GROUP_CONCAT(k.COLUMN_NAME ORDER BY k.ORDINAL_POSITION) AS columns,
            k.REFERENCED_TABLE_NAME AS target, GROUP_CONCAT(k.REFERENCED_COLUMN_NAME ORDER BY k.ORDINAL_POSITION) AS targetColumns,
            MAX(r.DELETE_RULE) AS onDelete, MAX(r.UPDATE_RULE) AS onUpdate
       FROM information_schema.KEY_COLUMN_USAGE k
       JOIN information_schema.REFERENTIAL_CONSTRAINTS r ON r.CONSTRAINT_SCHEMA = k.CONSTRAINT_SCHEMA AND r.CONSTRAINT_NAME = k.CONSTRAINT_NAME
      WHERE k.TABLE_SCHEMA = DATABASE() AND k.REFERENCED_TABLE_NAME IS NOT NULL
      GROUP BY k.TABLE_NAME, k.CONSTRAINT_NAME, k.REFERENCED_TABLE_NAME`,
  );
  own = await insertDesk(source);
  foreign = await insertDesk(source);
});
afterAll(async () => {
  await source.destroy();
  await database.drop();
});

const tables = () => [...new Set(columns.map(({ tableName }) => tableName))];
const deskTables = () => tables().filter((name) => !(name in deskless));
const errorOf = async (table: string, row: Row): Promise<number | null> => {
  try {
    await insertRow(source, table, row);
    return null;
  } catch (error) {
    return (error as { errno: number }).errno; // the driver's number is the point of the question
  }
};

describe('the tables', () => {
  it('each belong to a desk or are on the list of those that do not', () => {
    const withDesk = columns.filter(({ name }) => name === 'desk_id').map(({ tableName }) => tableName);
    expect(deskTables().sort()).toEqual(withDesk.sort());
    expect(tables()).toEqual(expect.arrayContaining(Object.keys(deskless)));
  });

  it('have a sample row each that is accepted as it stands', async () => {
    expect(Object.keys(sampleRows).sort()).toEqual(
      tables()
        .filter((name) => name !== 'migration')
        .sort(),
    );
    const fresh = await insertDesk(source);
    const memberId = randomUUID();
    await insertRow(source, 'user', sampleRow('user', fresh, { id: memberId }));
    const entryId = randomUUID();
    await insertRow(source, 'entry', sampleRow('entry', fresh, { id: entryId }));
    const again: Record<string, Row> = { membership: { user_id: memberId }, sealed_forecast: { entry_id: entryId } };
    for (const table of Object.keys(sampleRows))
      expect([table, await errorOf(table, sampleRow(table, fresh, again[table]))]).toEqual([table, null]);
  });

  it('are InnoDB tables', async () => {
    const engines: { name: string; engine: string }[] = await source.query(
      'SELECT TABLE_NAME AS name, ENGINE AS engine FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE()',
    );
    expect(engines.filter(({ engine }) => engine !== 'InnoDB')).toEqual([]);
  });
});

describe('a table of a desk', () => {
  it('names the desk in every row', () => {
    const loose = columns.filter(
      ({ name, isNullable, collation }) => name === 'desk_id' && !(isNullable === 'NO' && collation === 'ascii_bin'),
    );
    expect(loose).toEqual([]);
  });

  it('has the row’s id as primary key, desk and id as a unique key, and no unique key that does not start with the desk', async () => {
    const keys: { tableName: string; name: string; parts: string }[] = await source.query(
      `SELECT TABLE_NAME AS tableName, INDEX_NAME AS name, GROUP_CONCAT(COLUMN_NAME ORDER BY SEQ_IN_INDEX) AS parts
         FROM information_schema.STATISTICS WHERE TABLE_SCHEMA = DATABASE() AND NON_UNIQUE = 0 GROUP BY TABLE_NAME, INDEX_NAME`,
    );
    for (const table of deskTables()) {
      const parts = keys.filter(({ tableName }) => tableName === table);
      expect([table, parts.find(({ name }) => name === 'PRIMARY')?.parts]).toEqual([table, 'id']);
      const unique = parts.filter(({ name }) => name !== 'PRIMARY').map((key) => key.parts);
      expect(unique).toContain('desk_id,id');
      expect(unique.filter((text) => !text.startsWith('desk_id,'))).toEqual([]);
    }
  });

  it('refers to rows of the same desk only', () => {
    const outward = references.filter(
      ({ tableName, columns: names, target }) =>
        deskTables().includes(tableName) &&
        target !== 'desk' &&
        !names.startsWith('desk_id,') &&
        !(`${tableName}.${names}` in freeReferences),
    );
    expect(outward).toEqual([]);
    for (const { columns: names, targetColumns } of references.filter(({ columns: text }) => text.includes(',')))
      expect([names.split(',')[0], targetColumns.split(',')[0]]).toEqual(['desk_id', 'desk_id']);
  });

  it('has a foreign key under every id it holds of another row', () => {
    const ids = columns.filter(
      ({ tableName, name, fullType }) => deskTables().includes(tableName) && fullType === 'char(36)' && name !== 'id',
    );
    const covered = references.flatMap(({ tableName, columns: names }) =>
      names.split(',').map((name) => `${tableName}.${name}`),
    );
    const bare = ids.map(({ tableName, name }) => `${tableName}.${name}`).filter((name) => !covered.includes(name));
    expect(bare.filter((name) => !(name in freeReferences))).toEqual([]);
  });

  it('refuses a row that refers to a row of another desk, on every relation', async () => {
    const relations = references.filter(({ columns: names }) => names.startsWith('desk_id,'));
    expect(relations.length).toBeGreaterThan(14);
    const foreignId: Record<string, string> = {
      membership: foreign.personId,
      underlying: foreign.underlyingId,
      entry: foreign.entryId,
      sealed_forecast: foreign.forecastId,
      fill: foreign.fillId,
    };
    for (const { tableName, name, columns: names, target } of relations) {
      const column = names.split(',')[1] ?? '';
      const row = sampleRow(tableName, own, { [column]: foreignId[target] ?? null });
      expect([name, await errorOf(tableName, row)]).toEqual([name, 1452]);
    }
  });
});

describe('references', () => {
  it('never carry a removal or a change on to other rows', () => {
    const careless = references.filter(
      ({ onDelete, onUpdate }) => onDelete !== 'RESTRICT' || !['NO ACTION', 'RESTRICT'].includes(onUpdate),
    );
    expect(careless).toEqual([]);
  });
});

describe('columns', () => {
  it('keep instants to the microsecond', () => {
    const times = columns.filter(({ type }) => ['datetime', 'timestamp', 'time'].includes(type));
    expect(times.filter(({ type, precision }) => type !== 'datetime' || Number(precision) !== 6)).toEqual([]);
  });

  it('keep session dates as dates', () => {
    const dates = columns.filter(({ name }) => name.endsWith('session_date'));
    expect(dates.map(({ type }) => type)).toEqual(dates.map(() => 'date'));
    expect(dates.length).toBeGreaterThan(3);
  });

  it('hold money as decimals: floating point is for model figures only', () => {
    const floating = columns.filter(({ type }) => type === 'double' || type === 'float');
    expect(floating.map(({ tableName, name }) => `${tableName}.${name}`).sort()).toEqual(doubles);
  });

  it('compare ids, digests, secrets and symbols byte by byte', () => {
    const exact = columns.filter(
      ({ name, fullType }) =>
        /^char\((36|64|32)\)$/.test(fullType) || /(digest|hash|salt|symbol|email_key|(?<!request)_id)$/.test(name),
    );
    expect(exact.filter(({ collation }) => !/^(ascii|utf8mb4)_bin$/.test(collation ?? ''))).toEqual([]);
    expect(exact.length).toBeGreaterThan(40);
  });

  it('that must hold a value refuse to be empty', async () => {
    const required = columns.filter(({ tableName, isNullable }) => tableName !== 'migration' && isNullable === 'NO');
    for (const { tableName, name } of required) {
      const row = sampleRow(tableName, own, { [name]: null });
      expect([`${tableName}.${name}`, await errorOf(tableName, row)]).toEqual([`${tableName}.${name}`, 1048]);
    }
  });
});

/** One row for each rule of the schema that breaks just that rule. */
const breaches: Readonly<Record<string, Row>> = {
  'desk.ck_desk_overnight_share': { overnight_share: 1.01 },
  'desk.ck_desk_fee': { fee_per_contract: '-0.01' },
  'membership.ck_membership_role': { role: 'owner' },
  'underlying.ck_underlying_style': { style: 'asian' },
  'underlying.ck_underlying_settlement': { settlement: 'other' },
  'underlying.ck_underlying_settlement_time': { settlement_time: 'xx' },
  'underlying.ck_underlying_multiplier': { multiplier: '0' },
  'bar.ck_bar_prices': { close: '0' },
  'bar.ck_bar_source': { source: 'guess' },
  'price_upload.ck_price_upload_state': { state: 'half' },
  'entry.ck_entry_state': { state: 'lost', sealed_at: '2026-12-09 22:00:00.000000' },
  'entry.ck_entry_sealed': { state: 'sealed', sealed_at: null },
  'sealed_forecast.ck_sealed_forecast_sequence': { sequence: 0 },
  'fill.ck_fill_kind': { kind: 'gift' },
  'fill.ck_fill_amounts': { quantity: '0' },
  'weekly_review.ck_weekly_review_action': { action: 'forget' },
  'weekly_review.ck_weekly_review_followed_last': { followed_last: 'maybe' },
  'outcome_change.ck_outcome_change_why': { why: 'whim' },
  'scored_odds.ck_scored_odds_probability': { probability: 1.000001 },
  'scored_entry.ck_scored_entry_horizon': { horizon_class: 'a while' },
  'scored_entry.ck_scored_entry_exit_tag': { exit_tag: 'whim' },
  'scored_entry.ck_scored_entry_places': { move_place: 1.000001, profit_place_low: 0.2, profit_place_high: 0.3 },
};

describe('rules of the schema', () => {
  it('each have a row here that breaks them', async () => {
    const rules: { rule: string }[] = await source.query(
      "SELECT CONCAT(TABLE_NAME, '.', CONSTRAINT_NAME) AS rule FROM information_schema.CHECK_CONSTRAINTS WHERE CONSTRAINT_SCHEMA = DATABASE() AND CHECK_CLAUSE NOT LIKE 'json_valid%'",
    );
    const named = rules.map(({ rule }) => rule).filter((rule) => rule !== 'mentorship.ck_mentorship_pair');
    expect(named.sort()).toEqual(Object.keys(breaches).sort());
  });

  it.each(Object.entries(breaches))('%s refuses such a row', async (rule, changes) => {
    const table = rule.split('.')[0] ?? '';
    expect(await errorOf(table, sampleRow(table, own, changes))).toBe(4025);
  });

  it('mentorship.ck_mentorship_pair refuses a trader as their own mentor', async () => {
    expect(await errorOf('mentorship', sampleRow('mentorship', own, { mentor_id: own.personId }))).toBe(4025);
  });

  it.each([
    ['a price below 0', 'fill', { price: '-1' }],
    ['a high under the low', 'bar', { high: '9', low: '10' }],
    ['a low of 0', 'bar', { low: '0' }],
  ] as const)('refuse %s too', async (_, table, changes) => {
    expect(await errorOf(table, sampleRow(table, own, changes))).toBe(4025);
  });

  it('refuse text where structured content belongs', async () => {
    const structured: { tableName: string; name: string }[] = await source.query(
      "SELECT TABLE_NAME AS tableName, CONSTRAINT_NAME AS name FROM information_schema.CHECK_CONSTRAINTS WHERE CONSTRAINT_SCHEMA = DATABASE() AND CHECK_CLAUSE LIKE 'json_valid%'",
    );
    expect(structured.length).toBeGreaterThan(5);
    for (const { tableName, name } of structured)
      expect([name, await errorOf(tableName, sampleRow(tableName, own, { [name]: '{' }))]).toEqual([name, 4025]);
  });

  it('refuse a second row of the same key', async () => {
    const row = sampleRow('underlying', own);
    expect(await errorOf('underlying', row)).toBeNull();
    expect(await errorOf('underlying', { ...row, id: randomUUID() })).toBe(1062);
    expect(await errorOf('underlying', sampleRow('underlying', foreign, { symbol: row.symbol ?? '' }))).toBeNull();
  });
});

describe('the application’s account', () => {
  let application: DataSource;
  beforeAll(async () => {
    application = await createDataSource(database.applicationUrl).initialize();
  });
  afterAll(() => application.destroy());
  const refusalOf = async (statement: string): Promise<number | null> => {
    try {
      await application.query(statement);
      return null;
    } catch (error) {
      return (error as { errno: number }).errno; // as above
    }
  };

  it('has the rights of the list on each table, and on no other', async () => {
    const given: { name: string; right: string }[] = await application.query(
      'SELECT TABLE_NAME AS name, PRIVILEGE_TYPE AS `right` FROM information_schema.TABLE_PRIVILEGES WHERE TABLE_SCHEMA = DATABASE()',
    );
    const rights = new Map<string, string[]>();
    for (const { name, right } of given) rights.set(name, [...(rights.get(name) ?? []), right].sort());
    expect(Object.fromEntries(rights)).toEqual(
      Object.fromEntries(Object.entries(tableGrants).map(([name, list]) => [name, [...list].sort()])),
    );
    expect(Object.keys(tableGrants).sort()).toEqual(tables().sort());
  });

  it.each(['sealed_forecast', 'sealed_content', 'audit_event', 'outcome_change'])(
    'can only add to %s',
    async (table) => {
      const refused = [
        `UPDATE \`${table}\` SET id = id`,
        `DELETE FROM \`${table}\``,
        `REPLACE INTO \`${table}\` (id) VALUES ('x')`,
        `INSERT INTO \`${table}\` (id) VALUES ('x') ON DUPLICATE KEY UPDATE id = 'y'`,
        `TRUNCATE TABLE \`${table}\``,
        `DROP TABLE \`${table}\``,
        `ALTER TABLE \`${table}\` ADD COLUMN x INT`,
      ];
      for (const statement of refused) expect([statement, await refusalOf(statement)]).toEqual([statement, 1142]);
    },
  );

  it('cannot make tables, triggers or accounts, nor read other databases', async () => {
    expect(await refusalOf('CREATE TABLE x (id INT)')).toBe(1142);
    expect(await refusalOf('CREATE USER x')).toBe(1227);
    expect(await refusalOf('SELECT * FROM mysql.global_priv')).toBe(1142);
    expect(await refusalOf('CREATE TRIGGER x BEFORE INSERT ON bar FOR EACH ROW SET @x = 1')).toBe(1142);
  });
});

describe('rows that only ever grow in number', () => {
  it('refuse a change even to the account that makes tables', async () => {
    const ids = await insertDesk(source);
    await insertRow(source, 'audit_event', sampleRow('audit_event', ids));
    await insertRow(source, 'sealed_content', sampleRow('sealed_content', ids));
    for (const statement of [
      "UPDATE sealed_forecast SET hash = REPEAT('0', 64)",
      'DELETE FROM sealed_forecast',
      "UPDATE sealed_content SET payload = '{}'",
      "UPDATE audit_event SET action = 'x'",
      'DELETE FROM audit_event',
    ])
      await expect(source.query(statement)).rejects.toThrow(/only ever grows|never changed/);
  });
});
