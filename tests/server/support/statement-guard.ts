import { type Logger } from 'typeorm';

/** Tables whose rows belong to a desk. */
const deskTables = [
  'membership',
  'mentorship',
  'audit_event',
  'underlying',
  'bar',
  'price_upload',
  'entry',
  'sealed_forecast',
  'sealed_content',
  'fill',
  'outcome',
  'outcome_change',
  'weekly_review',
  'scored_odds',
  'scored_entry',
];

/** Statements that may touch a desk's tables without naming the desk, each with its reason. */
const allowed: readonly { readonly pattern: RegExp; readonly reason: string }[] = [
  {
    pattern: /FROM `membership` .*WHERE .*`user_id` = \?/s,
    reason: 'which desks a person is on, before one is chosen',
  },
  { pattern: /FROM `price_upload` .*`uploaded_at` </s, reason: 'clearing uploads a day old' },
];

/** Notes every statement on a desk's table that does not carry the desk. */
export class StatementGuard implements Logger {
  readonly offences: string[] = [];
  readonly statements: string[] = [];

  logQuery(query: string): void {
    this.statements.push(query);
    const table = deskTables.find((name) => query.includes(`\`${name}\``));
    if (table === undefined || !/^(SELECT|UPDATE|DELETE|INSERT|REPLACE)/i.test(query.trim())) return;
    const namesDesk = /^INSERT/i.test(query.trim())
      ? query.includes('`desk_id`')
      : /`desk_id`\s*=|desk_id = \?/.test(query);
    if (!namesDesk && !allowed.some(({ pattern }) => pattern.test(query))) this.offences.push(query);
  }

  logQueryError(): void {}
  logQuerySlow(): void {}
  logSchemaBuild(): void {}
  logMigration(): void {}
  log(): void {}
}
