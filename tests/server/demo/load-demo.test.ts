import { loadDemo } from '@/server/demo/load-demo';
import { entryStates } from '@/shared/entries/entry';
import { startTestApp } from '@/tests/server/support/test-app';

jest.setTimeout(120_000);

const moments = {
  'an evening after a close': '2026-12-09T22:00:00.000Z',
  'a Sunday': '2027-03-14T12:00:00.000Z',
  'an open session': '2028-02-29T16:00:00.000Z',
};

describe.each(Object.entries(moments))('the demo desk loaded on %s', (_, now) => {
  it('has entries in every state, late seals among them, and is loaded once', async () => {
    const app = await startTestApp();
    try {
      const load = () => loadDemo({ configuration: app.configuration, dataSource: app.dataSource, now: new Date(now) });
      expect(await load()).toBe(true);
      const rows: { state: string; number: number; late: number }[] = await app.dataSource.query(
        'SELECT state, CAST(COUNT(*) AS DOUBLE) AS number, CAST(SUM(is_late_seal) AS DOUBLE) AS late FROM entry GROUP BY state',
      );
      expect(rows.map(({ state }) => state).sort()).toEqual([...entryStates].sort());
      expect(rows.reduce((sum, { number }) => sum + number, 0)).toBe(41);
      expect(rows.reduce((sum, { late }) => sum + late, 0)).toBeGreaterThan(0);
      const changed: { number: number }[] = await app.dataSource.query(
        "SELECT CAST(COUNT(*) AS DOUBLE) AS number FROM outcome_change WHERE JSON_VALUE(cause, '$.prices[0].before') IS NOT NULL",
      );
      expect(changed[0]?.number).toBeGreaterThan(0); // the close that was corrected
      expect(await load()).toBe(false);
    } finally {
      await app.stop();
    }
  });

  it('is refused in production', async () => {
    const app = await startTestApp();
    try {
      const configuration = { ...app.configuration, NODE_ENV: 'production' as const };
      await expect(loadDemo({ configuration, dataSource: app.dataSource, now: new Date(now) })).rejects.toThrow(
        'development only',
      );
    } finally {
      await app.stop();
    }
  });
});
