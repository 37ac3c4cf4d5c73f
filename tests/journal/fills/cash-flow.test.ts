import { cashFlows, totalCashFlow } from '@/journal/fills/cash-flow';
import { fillsInOrder, option } from '@/tests/journal/fills/fill-fixtures';

const put = option('put', '97');
const fills = fillsInOrder([
  { kind: 'sell', instrument: put, quantity: '2', price: '0.78', fees: '1.32' },
  { kind: 'buy', instrument: put, quantity: '1', price: '0.40', fees: '-0.05' },
  { kind: 'assignment', instrument: put, quantity: '1', price: '0', fees: '5.00' },
]);

describe('cash flows', () => {
  it('are received for a sale, paid for a purchase, and the fees alone where an option ends at 0', () => {
    expect([...cashFlows(fills)]).toEqual([
      ['f1', '154.68'],
      ['f2', '-39.95'],
      ['f3', '-5'],
    ]);
  });

  it('add up without loss', () => {
    expect(totalCashFlow(fills)).toBe('109.73');
  });

  it('are 0 without fills', () => {
    expect(totalCashFlow([])).toBe('0');
    expect(cashFlows([]).size).toBe(0);
  });

  it('pay a short option that is settled in cash its settlement value', () => {
    const settled = fillsInOrder([
      { kind: 'sell', instrument: put, quantity: '1', price: '0.78', fees: '0' },
      { kind: 'assignment', instrument: put, quantity: '1', price: '2.10', fees: '0' },
    ]);
    expect(cashFlows(settled).get('f2')).toBe('-210');
  });
});
