/** What the application's database account may do, table by table; nothing else, and no table by default. */
export const tableGrants = {
  user: ['SELECT', 'INSERT', 'UPDATE'],
  desk: ['SELECT', 'INSERT', 'UPDATE'],
  membership: ['SELECT', 'INSERT', 'UPDATE', 'DELETE'],
  mentorship: ['SELECT', 'INSERT', 'UPDATE'],
  invitation: ['SELECT', 'INSERT', 'UPDATE'],
  session: ['SELECT', 'INSERT', 'UPDATE', 'DELETE'],
  login_throttle: ['SELECT', 'INSERT', 'UPDATE', 'DELETE'],
  audit_event: ['SELECT', 'INSERT'],
  underlying: ['SELECT', 'INSERT', 'UPDATE'],
  bar: ['SELECT', 'INSERT', 'UPDATE'],
  price_upload: ['SELECT', 'INSERT', 'UPDATE', 'DELETE'],
  entry: ['SELECT', 'INSERT', 'UPDATE', 'DELETE'],
  sealed_forecast: ['SELECT', 'INSERT'],
  sealed_content: ['SELECT', 'INSERT'],
  fill: ['SELECT', 'INSERT', 'DELETE'],
  outcome: ['SELECT', 'INSERT', 'UPDATE'],
  outcome_change: ['SELECT', 'INSERT'],
  weekly_review: ['SELECT', 'INSERT', 'UPDATE'],
  scored_odds: ['SELECT', 'INSERT', 'UPDATE'],
  scored_entry: ['SELECT', 'INSERT', 'UPDATE'],
  migration: ['SELECT'],
} as const;

/** Statements that give an account (`name@host`) exactly these rights on a database. */
export function grantStatements(database: string, account: string): string[] {
  const [name = '', host = '%'] = account.split('@');
  if (!/^[\w-]+$/.test(name) || !/^[\w.%:-]+$/.test(host) || !/^\w+$/.test(database))
    throw new Error('APPLICATION_ACCOUNT must look like name@host.');
  return Object.entries(tableGrants).map(
    ([table, rights]) => `GRANT ${rights.join(', ')} ON \`${database}\`.\`${table}\` TO '${name}'@'${host}'`,
  );
}
