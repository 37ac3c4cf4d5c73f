import { fireEvent, render, screen } from '@testing-library/react';
import { ShowAsTable } from '@/components/charts/show-as-table';

describe('ShowAsTable', () => {
  const table = (
    <ShowAsTable
      caption="Calibration by stated odds"
      columns={[
        { key: 'stated', header: 'Stated' },
        { key: 'count', header: 'Count', align: 'right' },
      ]}
      rows={[{ key: 'a', cells: { stated: '70%', count: '46' } }]}
    />
  );

  it('keeps the table closed until it is asked for', () => {
    render(table);
    expect(screen.getByRole('button', { name: /^Show as table/ }).getAttribute('aria-expanded')).toBe('false');
    expect(screen.queryByRole('table')).toBeNull();
  });

  it('opens a table with headers, and closes it again', () => {
    render(table);
    fireEvent.click(screen.getByRole('button', { name: /^Show as table/ }));
    expect(screen.getByRole('table', { name: 'Calibration by stated odds' })).toBeTruthy();
    expect(screen.getByRole('columnheader', { name: 'Count' })).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: /^Hide table/ }));
    expect(screen.queryByRole('table')).toBeNull();
  });
});
