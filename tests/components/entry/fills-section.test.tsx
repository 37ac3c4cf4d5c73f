import { screen, within } from '@testing-library/react';
import { FillsSection } from '@/components/entry/fills-section';
import { renderScreen, setWidth } from '@/tests/components/support/render-screen';
import { ids, sampleFill, sampleMe, sampleSealed } from '@/tests/components/support/sample-journal';

const shares = sampleFill({
  id: ids.upload,
  kind: 'sell',
  instrument: { kind: 'stock', symbol: 'ZZIX', multiplier: '1' },
  quantity: '300',
  price: '101.00',
  fees: '0.00',
  cash: '30300.00',
  madeBy: ids.entry,
});
const entry = sampleSealed([sampleFill(), shares], { realisedProfit: '-61.95' });
const show = () => renderScreen(<FillsSection entry={entry} />, { 'GET /account/me': sampleMe });

describe('the fills of an entry', () => {
  it('stand in a table with their cash in words, and the total under it, on a wide screen', () => {
    setWidth(1440);
    show();
    const table = screen.getByRole('table', { name: 'Fills in USD' });
    const [, bought, sold, total] = within(table).getAllByRole('row');
    expect(bought?.textContent).toContain('Buy23 Dec 101 call31.201.95');
    expect(bought?.textContent).toContain('loss of 361.95 USD');
    expect(sold?.textContent).toContain('SellZZIX shares300');
    expect(total?.textContent).toMatch(/^Realised so far.*loss of 61\.95 USD/);
  });

  it('stand in a list that needs no sideways scrolling on a phone', () => {
    setWidth(390);
    show();
    expect(screen.queryByRole('table')).toBeNull();
    const [bought] = within(screen.getByRole('list', { name: 'Fills in USD' })).getAllByRole('listitem');
    expect(bought?.textContent).toContain('Buy 3 × 23 Dec 101 call');
    expect(bought?.textContent).toContain('at 1.20, fees 1.95');
    expect(screen.getByText('Realised so far')).toBeTruthy();
  });

  it('can be taken out, except those an exercise made', () => {
    setWidth(390);
    show();
    expect(screen.getByRole('button', { name: 'Take out buy of 23 Dec 101 call' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: /ZZIX shares/ })).toBeNull();
  });
});
