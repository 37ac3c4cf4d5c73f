import { newFillForm, readFillForm, type FillForm } from '@/shared/entries/fill-form';
import { longCall } from '@/tests/journal/forecast/plan-examples';

const id = '01940000-0000-7000-8000-0000000000ff';
const form = newFillForm(longCall, [], '2026-12-10T15:30:00.000Z');
const read = (change: Partial<FillForm>) => readFillForm({ ...form, ...change }, { id, input: longCall });
const problemsOf = (change: Partial<FillForm>) => {
  const reading = read(change);
  return reading.kind === 'complete' ? [] : reading.problems.map(({ field }) => field);
};

describe('newFillForm', () => {
  it('proposes the first leg as planned, now, in New York', () => {
    expect(form).toMatchObject({
      kind: 'buy',
      contract: longCall.legs[0]?.id,
      quantity: '1',
      price: '1.20',
      fees: '0.65',
      date: '2026-12-10',
      time: '10:30',
      timeZone: 'America/New_York',
    });
  });
});

describe('readFillForm', () => {
  it('reads local time as an instant', () => {
    expect(read({})).toMatchObject({
      kind: 'complete',
      fill: { tradedAt: '2026-12-10T15:30:00.000Z', price: '1.20', quantity: '1' },
    });
    expect(read({ timeZone: 'Europe/Zurich' })).toMatchObject({ fill: { tradedAt: '2026-12-10T09:30:00.000Z' } });
  });

  it('refuses a time that does not exist, and one that exists twice', () => {
    expect(problemsOf({ date: '2026-03-08', time: '02:30' })).toEqual(['time']);
    expect(problemsOf({ date: '2026-11-01', time: '01:30' })).toEqual(['time']);
    expect(problemsOf({ date: '2026-11-01', time: '01:30', timeZone: 'UTC' })).toEqual([]);
  });

  it.each<[Partial<FillForm>, string]>([
    [{ quantity: '0' }, 'quantity'],
    [{ quantity: '' }, 'quantity'],
    [{ price: '-1' }, 'price'],
    [{ price: 'x' }, 'price'],
    [{ date: '2026-02-30' }, 'time'],
    [{ date: '' }, 'date'],
    [{ time: '25:00' }, 'time'],
    [{ kind: 'expiry', contract: 'shares' }, 'contract'],
  ])('names the field of %p', (change, field) => {
    expect(problemsOf(change)).toContain(field);
  });

  it('ends an expired option at price 0 whatever was typed', () => {
    expect(read({ kind: 'expiry', price: '' })).toMatchObject({ fill: { price: '0' } });
  });

  it('takes a rebate as negative fees', () => {
    expect(read({ fees: '−0.10' })).toMatchObject({ fill: { fees: '-0.10' } });
  });
});
