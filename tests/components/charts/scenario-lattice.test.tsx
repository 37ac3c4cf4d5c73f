import { act, fireEvent, render, screen, within } from '@testing-library/react';
import { rovingCell } from '@/components/charts/roving-cell';
import {
  latticeCellWords,
  latticeOpacity,
  latticeReadOut,
  likelihoodEdge,
  ScenarioLattice,
} from '@/components/charts/scenario-lattice';

const props = {
  rows: [
    { sigma: 1, price: 104.86 },
    { sigma: 0, price: 100 },
    { sigma: -1, price: 95.37 },
  ],
  columns: [{ label: 'now' }, { label: '6' }],
  profit: [
    [141, 160],
    [39, 105],
    [-177, -194],
  ],
  likelihood: [
    [0, 0.3],
    [1, 0.58],
    [0, 0.12],
  ],
  current: [1, 0],
  largestLoss: 438.9,
  largestGain: 161.1,
  unit: 'USD',
} as const;

const cell = { row: { sigma: -1, price: 95.37 }, column: '6 sessions', profit: -194.4, likelihood: 0.12, unit: 'USD' };

describe('ScenarioLattice', () => {
  it('is a table whose cells have a row and a column header', () => {
    render(<ScenarioLattice {...props} />);
    const table = screen.getByRole('grid', { name: 'Profit by move and time, USD' });
    expect(
      within(table)
        .getAllByRole('columnheader')
        .map((head) => head.getAttribute('aria-label')),
    ).toEqual(['now', '6 sessions']);
    expect(
      within(table)
        .getAllByRole('rowheader')
        .map(({ textContent }) => textContent),
    ).toEqual(['+1σ104.86', '0σ100.00', '−1σ95.37']);
    expect(within(table).getAllByRole('gridcell', { name: /likelihood/ })).toHaveLength(6);
  });

  it('has one tab stop, at where it is now', () => {
    render(<ScenarioLattice {...props} />);
    const stops = [...document.querySelectorAll('[role=gridcell]')].filter(
      (element) => element.getAttribute('tabindex') === '0',
    );
    expect(stops.map(({ textContent }) => textContent)).toEqual(['+39']);
    expect(stops[0]?.getAttribute('aria-current')).toBe('true');
  });

  it('walks the cells by arrow keys and reads out the one in focus', () => {
    render(<ScenarioLattice {...props} />);
    const now = screen.getByText('+39');
    act(() => now.focus());
    fireEvent.keyDown(now, { key: 'ArrowDown' });
    fireEvent.keyDown(document.activeElement as Element, { key: 'ArrowRight' });
    expect(document.activeElement?.getAttribute('aria-label')).toBe(
      '−1σ at 95.37, 6 sessions: loss 194 USD, likelihood 12%',
    );
    expect(screen.getByText('−1σ, 95.37, 6 sessions: −194, likelihood 12%')).toBeTruthy();
    fireEvent.keyDown(document.activeElement as Element, { key: 'ArrowRight' });
    expect(document.activeElement?.textContent).toBe('−194');
  });

  it('draws nothing without rows or columns', () => {
    expect(render(<ScenarioLattice {...props} rows={[]} />).container.innerHTML).toBe('');
    expect(render(<ScenarioLattice {...props} columns={[]} />).container.innerHTML).toBe('');
  });

  it('stands when values are missing', () => {
    render(<ScenarioLattice {...props} profit={[[1]]} likelihood={[]} />);
    expect(screen.getAllByRole('gridcell', { name: /not known/ })).toHaveLength(5);
  });
});

describe('the words of a cell', () => {
  it('show the signed amount and speak of a loss or a profit', () => {
    expect(latticeReadOut(cell)).toBe('−1σ, 95.37, 6 sessions: −194, likelihood 12%');
    expect(latticeCellWords(cell)).toBe('−1σ at 95.37, 6 sessions: loss 194 USD, likelihood 12%');
    expect(latticeCellWords({ ...cell, profit: 39 }, true)).toContain('profit 39 USD, likelihood 12%, where it is now');
  });
});

describe('latticeOpacity', () => {
  it('runs from 0.04 to 0.38 at the largest loss, and gains come up 1.8 times faster', () => {
    expect(latticeOpacity(0, 438.9, 161.1)).toBeCloseTo(0.04, 12);
    expect(latticeOpacity(-438.9, 438.9, 161.1)).toBeCloseTo(0.38, 12);
    expect(latticeOpacity(-1000, 438.9, 161.1)).toBeCloseTo(0.38, 12);
    expect(latticeOpacity(100, 438.9, 161.1)).toBeCloseTo(0.04 + (0.34 * 180) / 438.9, 12);
  });

  it('reads gains against the largest gain when nothing can be lost', () => {
    expect(latticeOpacity(50, 0, 180)).toBeCloseTo(0.04 + 0.34 * 0.5, 12);
    expect(latticeOpacity(50, 0, 0)).toBeCloseTo(0.04, 12);
  });
});

describe('likelihoodEdge', () => {
  it('is 17 points times the likelihood, from 1 to 7, and none under 0.5%', () => {
    expect([0.004, 0.005, 0.2, 0.9, NaN].map(likelihoodEdge)).toEqual([0, 1, 3.4000000000000004, 7, 0]);
  });
});

describe('rovingCell', () => {
  const size = { rows: 3, columns: 2 };
  it('stays inside the grid', () => {
    expect(rovingCell('ArrowUp', { row: 0, column: 0 }, size)).toEqual({ row: 0, column: 0 });
    expect(rovingCell('End', { row: 1, column: 0 }, size)).toEqual({ row: 1, column: 1 });
    expect(rovingCell('PageDown', { row: 0, column: 1 }, size)).toEqual({ row: 2, column: 1 });
  });

  it('leaves other keys alone', () => {
    expect(rovingCell('a', { row: 0, column: 0 }, size)).toBeNull();
    expect(rovingCell('Tab', { row: 0, column: 0 }, size)).toBeNull();
  });
});
