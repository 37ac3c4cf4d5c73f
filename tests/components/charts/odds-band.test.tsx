import { render, screen } from '@testing-library/react';
import { OddsBand, OddsBandKey, oddsBandSentence } from '@/components/charts/odds-band';

const odds = { label: 'Profit at expiry', low: 0.69, estimate: 0.77, high: 0.84, marketImplied: 0.7, resampled: 0.76 };

describe('oddsBandSentence', () => {
  it('gives the estimate, its interval and the other odds', () => {
    expect(oddsBandSentence(odds)).toBe(
      'Profit at expiry 77%, 69% to 84% from low to high volatility; market-implied 70%, resampled 76%.',
    );
  });

  it('says what happened, or when it will be known', () => {
    const { label, low, estimate, high } = odds;
    const bare = { label, low, estimate, high };
    expect(oddsBandSentence({ ...bare, outcome: 1 })).toMatch(/; it came true\.$/);
    expect(oddsBandSentence({ ...bare, outcome: 0 })).toMatch(/; it did not come true\.$/);
    expect(oddsBandSentence({ ...bare, due: '18 Dec' })).toMatch(/; due 18 Dec\.$/);
  });

  it('reads the interval upward when low volatility gives the higher odds', () => {
    expect(oddsBandSentence({ label: 'A', low: 0.4, estimate: 0.3, high: 0.2 })).toContain('20% to 40%');
  });

  it('does not invent odds that are not known', () => {
    expect(oddsBandSentence({ label: 'A', low: NaN, estimate: NaN, high: NaN })).toBe('A: not known.');
  });
});

describe('OddsBand', () => {
  const shapes = (selector: string) => [...screen.getByRole('img').querySelectorAll(selector)];

  it('spans the interval and sets the estimate by the scale', () => {
    render(<OddsBand {...odds} width={112} />);
    const [, interval, estimate] = shapes('rect').map((rect) => ({
      x: Number(rect.getAttribute('x')),
      width: Number(rect.getAttribute('width')),
    }));
    expect(interval?.x).toBeCloseTo(75, 9);
    expect(interval?.width).toBeCloseTo(15, 9);
    expect(estimate?.x).toBeCloseTo(83 - 1.5, 9);
  });

  it('puts the outcome at the end that came true, joined to the estimate', () => {
    render(<OddsBand label="A" low={0.3} estimate={0.4} high={0.5} outcome={1} width={112} />);
    expect(shapes('circle').map((dot) => Number(dot.getAttribute('cx')))).toEqual([106, 106]);
    const miss = shapes('line').at(-1);
    expect(Number(miss?.getAttribute('x1'))).toBeCloseTo(46, 9);
    expect(Number(miss?.getAttribute('x2'))).toBe(106);
    expect(screen.getByText('yes')).toBeTruthy();
  });

  it('draws no interval, estimate or miss for odds that are not known', () => {
    render(<OddsBand label="A" low={NaN} estimate={NaN} high={NaN} outcome={0} width={112} />);
    expect(shapes('rect')).toHaveLength(1);
    expect(screen.getByText('not known')).toBeTruthy();
  });

  it('moves the interval under the band beside a foot note', () => {
    render(<OddsBand label="A" low={0.32} estimate={0.36} high={0.4} outcome={1} footNote="Brier 0.41" width={112} />);
    expect(screen.getByText('low to high 32% to 40%')).toBeTruthy();
    expect(screen.getByText('Brier 0.41')).toBeTruthy();
    expect(screen.queryByText(/32% to 40% →/)).toBeNull();
  });

  it('keeps a very narrow interval visible', () => {
    render(<OddsBand label="A" low={0} estimate={0.001} high={0.002} width={112} />);
    expect(Number(shapes('rect')[1]?.getAttribute('width'))).toBeGreaterThanOrEqual(4);
  });
});

describe('OddsBandKey', () => {
  it('names only the marks that are shown', () => {
    render(<OddsBandKey shows={['estimate', 'outcome']} />);
    expect(screen.getByText('estimate')).toBeTruthy();
    expect(screen.getByText('what happened')).toBeTruthy();
    expect(screen.queryByText('resampled')).toBeNull();
  });
});
