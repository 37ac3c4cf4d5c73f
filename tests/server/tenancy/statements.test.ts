import { MoreThan, Not, type FindOptionsWhere } from 'typeorm';
import { DeskScopes } from '@/server/database/desk-scope';
import { DeskEntity } from '@/server/desk/desk-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { addSealed, addUnderlying, completePlan, fill, option, putBar } from '@/tests/server/support/journal';
import { sampleCall, sampleRows } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

describe('every statement on a desk’s table', () => {
  it('carries the desk, on a tour through all endpoints and a whole entry’s life', async () => {
    const trader = await app.person({ role: 'lead' });
    const mentor = await app.person({ role: 'mentor', deskOf: trader });
    await app.dataSource.query(
      'INSERT INTO mentorship (id, desk_id, mentor_id, trader_id, accepted_at) VALUES (UUID(), ?, ?, ?, NOW(6))',
      [trader.deskId, mentor.id, trader.id],
    );
    app.guard.offences.length = 0;
    app.guard.statements.length = 0;
    const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
    const rows = await sampleRows(trader);
    for (const endpoint of endpoints.filter(({ name }) => name !== 'signOut'))
      await sampleCall(endpoint.access.kind === 'public' ? app.anonymous : trader, endpoint, rows);

    const owner = await app.person({ role: 'trader' });
    const underlyingId = await addUnderlying(owner);
    const entryId = await addSealed(owner, completePlan(underlyingId));
    const add = (kind: string, strike: string, price: string) =>
      owner
        .post(`/entries/${entryId}/fills`)
        .send(fill(kind, option('put', strike), { price, tradedAt: '2026-12-09T22:00:00.000Z' }))
        .expect(201);
    await add('sell', '97', '0.78');
    const bought = await add('buy', '97', '0.40');
    await owner.delete(`/entries/${entryId}/fills/${bought.body.fills[1].id}`).expect(200);
    await putBar(owner, { underlyingId, date: '2026-12-08', close: '98' });
    for (const person of [owner, mentor, trader])
      for (const path of ['/entries?search=a&tag=calm&state=open', '/today', '/scores', '/underlyings', '/desk'])
        await person.get(path).expect(200);
    expect(app.guard.statements.length).toBeGreaterThan(300);
    expect(app.guard.offences).toEqual([]);
  });

  it('is seen by the guard when it does not', async () => {
    await app.dataSource.getRepository(UnderlyingEntity).find({ where: { symbol: 'HVYQ' } });
    expect(app.guard.offences).toHaveLength(1);
    app.guard.offences.length = 0;
  });
});

describe('the data layer', () => {
  const condition = (value: unknown) => ({ id: value }) as FindOptionsWhere<PersonEntity>; // what types would refuse

  it.each([undefined, null])('refuses to look for %s instead of taking any row', async (value) => {
    await app.person({ role: 'trader' });
    const people = app.dataSource.getRepository(PersonEntity);
    await expect(people.findOneBy(condition(value))).rejects.toThrow(/Undefined value|Null value/);
    await expect(people.find({ where: [condition(value)] })).rejects.toThrow(/Undefined value|Null value/);
    await expect(people.countBy(condition(value))).rejects.toThrow(/Undefined value|Null value/);
  });

  it.each([undefined, null])('refuses to change or delete where something is %s', async (value) => {
    const { manager } = app.dataSource;
    await expect(manager.update(PersonEntity, condition(value), { displayName: 'x' })).rejects.toThrow();
    await expect(manager.delete(PersonEntity, condition(value))).rejects.toThrow();
    await expect(manager.update(PersonEntity, {}, { displayName: 'x' })).rejects.toThrow();
    await expect(manager.delete(MembershipEntity, {})).rejects.toThrow();
    const [row] = await app.dataSource.query("SELECT COUNT(*) AS number FROM `user` WHERE display_name = 'x'");
    expect(Number(row.number)).toBe(0);
  });

  it('finds nothing of another desk by any condition a caller can write', async () => {
    const owner = await app.person({ role: 'trader' });
    const stranger = await app.person({ role: 'trader' });
    const id = await addUnderlying(owner);
    const scope = new DeskScopes(app.dataSource).of({
      personId: stranger.id,
      displayName: 'x',
      deskId: stranger.deskId,
      role: 'trader',
    });
    const rows = scope.repository(UnderlyingEntity);
    expect(await rows.findOne({ id })).toBeNull();
    expect(await rows.find({ deskId: owner.deskId })).toEqual([]);
    expect(await rows.find({ deskId: Not(stranger.deskId) })).toEqual([]);
    expect(await rows.find([{ id }, { version: MoreThan(0) }])).toEqual([]);
    expect(await rows.update({ id }, { name: 'taken over' })).toBe(0);
    expect(await rows.remove({ id: 'nothing' }).catch(({ errno }: { errno: number }) => errno)).toBe(1142);
    expect(await rows.query('row').andWhere('1 = 1').getMany()).toEqual([]);
    expect(await app.dataSource.getRepository(DeskEntity).countBy({ id: owner.deskId })).toBe(1);
  });
});
