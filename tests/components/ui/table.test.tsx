import { render, screen, within } from '@testing-library/react';
import { DataTable } from '@/components/ui/table';

const table = (
  <DataTable
    caption="Fills in USD"
    columns={[
      { key: 'contract', header: 'Contract', flex: 2 },
      { key: 'price', header: 'Price', align: 'right' },
    ]}
    rows={[
      { key: 'first', cells: { contract: '20 Nov 57 put', price: '1.12' }, note: 'Replaced on 9 December' },
      { key: 'second', cells: { contract: '20 Nov 55 put', price: '0.60' } },
    ]}
  />
);

describe('DataTable', () => {
  it('is a table named by its caption, with a header to each column and each row', () => {
    render(table);
    const shown = within(screen.getByRole('table', { name: 'Fills in USD' }));
    expect(shown.getAllByRole('columnheader').map((cell) => cell.textContent)).toEqual(['Contract', 'Price']);
    expect(shown.getAllByRole('rowheader').map((cell) => cell.textContent)).toEqual(['20 Nov 57 put', '20 Nov 55 put']);
  });

  it('sets numbers at the right and keeps a note with its row', () => {
    render(table);
    expect(screen.getByRole('cell', { name: '1.12' }).style.textAlign).toBe('right');
    const rows = screen.getAllByRole('row').map((row) => row.textContent);
    expect(rows).toEqual(['ContractPrice', '20 Nov 57 put1.12', 'Replaced on 9 December', '20 Nov 55 put0.60']);
  });
});
