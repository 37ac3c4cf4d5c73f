import { randomBytes, randomUUID } from 'node:crypto';
import { type DataSource } from 'typeorm';

export type Row = Readonly<Record<string, string | number | null>>;

const instant = '2026-12-09 22:00:00.000000';
const digest = () => randomBytes(32).toString('hex');

/** Ids that the rows of one desk refer to. */
export interface DeskIds {
  readonly deskId: string;
  readonly personId: string;
  readonly otherPersonId: string;
  readonly underlyingId: string;
  readonly entryId: string;
  readonly forecastId: string;
  readonly fillId: string;
}

export const newDeskIds = (): DeskIds => ({
  deskId: randomUUID(),
  personId: randomUUID(),
  otherPersonId: randomUUID(),
  underlyingId: randomUUID(),
  entryId: randomUUID(),
  forecastId: randomUUID(),
  fillId: randomUUID(),
});

const personRow = (): Row => ({
  id: randomUUID(),
  email: 'someone@example.org',
  email_key: `${randomUUID()}@example.org`,
  display_name: 'Someone',
  time_zone: 'UTC',
  password_hash: '$2b$04$',
  session_epoch: 0,
  disabled_at: null,
  created_at: instant,
});

/** One acceptable new row for each table, in an order in which they can be inserted. */
export const sampleRows: Readonly<Record<string, (ids: DeskIds) => Row>> = {
  user: personRow,
  desk: () => ({
    id: randomUUID(),
    version: 1,
    name: 'Desk',
    currency: 'USD',
    rate_per_year: 0.04,
    overnight_share: 0.3,
    fee_per_contract: '0.65',
    created_at: instant,
  }),
  session: () => ({
    digest: digest(),
    user_id: null,
    content: '{}',
    started_at: instant,
    ends_at: instant,
    ended_at: null,
  }),
  login_throttle: () => ({ key_digest: digest(), failures: 0, blocked_until: instant, window_ends_at: instant }),
  invitation: () => ({ token_digest: digest(), expires_at: instant, used_at: null }),
  membership: ({ deskId, personId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    user_id: personId,
    role: 'trader',
    created_at: instant,
  }),
  mentorship: ({ deskId, personId, otherPersonId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    mentor_id: otherPersonId,
    trader_id: personId,
    accepted_at: instant,
    revoked_at: null,
  }),
  audit_event: ({ deskId, personId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    user_id: personId,
    action: 'sealed',
    subject_id: null,
    details: '{}',
    request_id: 'request',
    at: instant,
  }),
  underlying: ({ deskId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    version: 1,
    symbol: randomBytes(6).toString('hex').toUpperCase(),
    name: 'Invented',
    style: 'european',
    settlement: 'cash',
    settlement_time: 'pm',
    multiplier: '100',
    dividend_yield: 0,
    currency: 'USD',
    created_at: instant,
  }),
  bar: ({ deskId, underlyingId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    underlying_id: underlyingId,
    session_date: randomDate(),
    close: '10.5',
    open: null,
    high: null,
    low: null,
    settlement: null,
    source: 'typed',
    stored_at: instant,
  }),
  price_upload: ({ deskId, underlyingId, personId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    underlying_id: underlyingId,
    user_id: personId,
    file_name: 'closes.csv',
    state: 'preview',
    content: null,
    settled_reading: '{}',
    preview: '{}',
    uploaded_at: instant,
  }),
  entry: ({ deskId, underlyingId, personId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    trader_id: personId,
    underlying_id: underlyingId,
    version: 1,
    state: 'draft',
    plan: '{}',
    plan_saved_at: instant,
    structure_name: 'Call',
    search_text: '',
    strip: null,
    expiry_session_date: null,
    exit_session_date: null,
    holding_sessions: null,
    expected_mean: null,
    sealed_at: null,
    is_late_seal: 0,
    first_fill_at: null,
    last_fill_at: null,
    realised_profit: null,
    lesson: '',
    created_at: instant,
  }),
  sealed_forecast: ({ deskId, personId, entryId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    trader_id: personId,
    entry_id: entryId,
    sequence: 1 + randomBytes(3).readUIntBE(0, 3),
    previous_hash: digest(),
    hash: digest(),
    commitment: digest(),
    sealed_at_microseconds: '1765317600000000',
    engine_version: '1',
  }),
  sealed_content: ({ deskId, forecastId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    forecast_id: forecastId,
    salt: randomBytes(16).toString('hex'),
    payload: '{}',
  }),
  fill: ({ deskId, entryId, fillId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    entry_id: entryId,
    kind: 'buy',
    instrument: '{}',
    quantity: '1',
    price: '1.20',
    fees: '0',
    traded_at: instant,
    time_zone: 'UTC',
    sequence: 1,
    made_by: fillId,
    added_at: instant,
  }),
  outcome: ({ deskId, entryId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    entry_id: entryId,
    outcome: '{}',
    is_complete: 0,
    computed_at: instant,
  }),
  outcome_change: ({ deskId, entryId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    entry_id: entryId,
    why: 'bar',
    cause: '{}',
    changes: '[]',
    at: instant,
  }),
  weekly_review: ({ deskId, personId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    trader_id: personId,
    version: 1,
    week_start_session_date: randomDate(),
    action: 'keep',
    rule_text: 'Seal first.',
    evidence: 'Three of three.',
    followed_last: null,
    saved_at: instant,
  }),
  scored_odds: ({ deskId, personId, entryId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    entry_id: entryId,
    trader_id: personId,
    odds_key: randomBytes(8).toString('hex'),
    statement: '97 put in the money',
    due_session_date: '2026-12-18',
    probability: 0.5,
    market_implied: null,
    happened: null,
    cannot_tell: 0,
    is_late_seal: 0,
  }),
  scored_entry: ({ deskId, personId, underlyingId, entryId }) => ({
    id: randomUUID(),
    desk_id: deskId,
    entry_id: entryId,
    trader_id: personId,
    underlying_id: underlyingId,
    structure_kind: 'bull put',
    horizon_class: '6-30',
    tags: '[]',
    first_session_date: '2026-12-09',
    exit_session_date: '2026-12-18',
    judged_session_date: null,
    is_late_seal: 0,
    is_traded: 0,
    volatility_method: 'typed',
    move_deviations: null,
    move_place: null,
    volatility_ratio: null,
    profit_place_low: null,
    profit_place_high: null,
    expected_mean: 20,
    expected_deviation: 60,
    realised_profit: null,
    profit_from_move: null,
    profit_from_time: null,
    profit_from_volatility: null,
    profit_from_carry: null,
    profit_from_marks: null,
    profit_from_slippage: null,
    profit_from_fees: null,
    is_followed: null,
    exit_tag: null,
  }),
};

function randomDate(): string {
  const day = randomBytes(3).readUIntBE(0, 3) % 20_000;
  return new Date(day * 86_400_000).toISOString().slice(0, 10);
}

/** A sample row with some columns changed. @throws {Error} for a table without a sample. */
export function sampleRow(table: string, ids: DeskIds, changes: Row = {}): Row {
  const make = sampleRows[table];
  if (make === undefined) throw new Error(`There is no sample row for ${table}: add one to sample-rows.ts.`);
  return { ...make(ids), ...changes };
}

export async function insertRow(source: DataSource, table: string, row: Row): Promise<void> {
  const columns = Object.keys(row);
  await source.query(
    `INSERT INTO \`${table}\` (${columns.map((name) => `\`${name}\``).join(', ')}) VALUES (${columns.map(() => '?').join(', ')})`,
    Object.values(row),
  );
}

/** A desk with two members and what their rows refer to. */
export async function insertDesk(source: DataSource): Promise<DeskIds> {
  const ids = newDeskIds();
  const insert = (table: string, changes: Row) => insertRow(source, table, sampleRow(table, ids, changes));
  await insert('user', { id: ids.personId });
  await insert('user', { id: ids.otherPersonId });
  await insert('desk', { id: ids.deskId });
  await insert('membership', {});
  await insert('membership', { user_id: ids.otherPersonId, role: 'mentor' });
  await insert('underlying', { id: ids.underlyingId });
  await insert('entry', { id: ids.entryId });
  await insert('fill', { id: ids.fillId, made_by: null });
  await insert('sealed_forecast', { id: ids.forecastId });
  return ids;
}
