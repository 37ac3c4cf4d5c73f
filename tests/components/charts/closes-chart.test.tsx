import { render, screen } from '@testing-library/react';
import { ClosesChart, closesScales, closesSentence, dateTicks } from '@/components/charts/closes-chart';

const bars = [
  { date: '2026-11-27', close: 98 },
  { date: '2026-11-30', close: 101.5 },
  { date: '2026-12-01', close: 100 },
];

describe('closesSentence', () => {
  it('names the span, its ends, the range and the shaded part', () => {
    expect(closesSentence({ bars, highlightLast: 2, events: [{ date: '2026-11-30', label: 'Results' }] })).toBe(
      '3 closes, 98.00 on 27 November 2026 to 100.00 on 1 December 2026, between 98.00 and 101.50; the last 2 are shaded; Results on 30 Nov.',
    );
  });

  it('handles one close and none', () => {
    expect(closesSentence({ bars: bars.slice(0, 1) })).toBe('One close, 98.00 on 27 November 2026.');
    expect(closesSentence({ bars: [] })).toBe('No closes yet.');
    expect(closesSentence({ bars: [{ date: '2026-12-01', close: NaN }] })).toBe('No closes yet.');
  });
});

describe('ClosesChart', () => {
  it('ends its line in a dot at the last close', () => {
    render(<ClosesChart bars={bars} width={400} />);
    const { x, y } = closesScales(bars, 400);
    const dot = screen.getByRole('img').querySelector('circle');
    expect(Number(dot?.getAttribute('cx'))).toBeCloseTo(x(2), 9);
    expect(Number(dot?.getAttribute('cy'))).toBeCloseTo(y(100), 9);
  });

  it('leaves a gap where a close is missing', () => {
    const holed = [
      ...bars,
      { date: '2026-12-02', close: NaN },
      { date: '2026-12-03', close: 99 },
      { date: '2026-12-04', close: 98 },
    ];
    render(<ClosesChart bars={holed} width={400} />);
    expect(screen.getByRole('img').querySelector('path')?.getAttribute('d')?.match(/M/g)).toHaveLength(2);
  });

  it('shows only events that fall on one of its bars', () => {
    render(
      <ClosesChart
        bars={bars}
        events={[
          { date: '2026-11-30', label: 'Results' },
          { date: '2027-01-04', label: 'Split' },
        ]}
        width={400}
      />,
    );
    expect(screen.getByText(/Results/)).toBeTruthy();
    expect(screen.queryByText(/Split/)).toBeNull();
  });

  it('says that there are no closes instead of drawing axes', () => {
    render(<ClosesChart bars={[]} highlightLast={20} width={400} />);
    expect(screen.getByText('No closes yet')).toBeTruthy();
    expect(screen.getByRole('img').querySelectorAll('line, path')).toHaveLength(0);
  });
});

describe('dateTicks', () => {
  const day = (date: string) => ({ date, close: 1 });
  it('names months by name and a January by its year, years first', () => {
    const over = ['2026-11-30', '2026-12-01', '2027-01-04', '2027-02-01'].map(day);
    expect(dateTicks(over)).toEqual([
      { index: 2, text: '2027' },
      { index: 1, text: 'Dec' },
      { index: 3, text: 'Feb' },
    ]);
  });

  it('names the first and last day of a short span', () => {
    expect(dateTicks(bars).map(({ text }) => text)).toEqual(['27 Nov', '1 Dec']);
    expect(dateTicks([])).toEqual([]);
  });
});
