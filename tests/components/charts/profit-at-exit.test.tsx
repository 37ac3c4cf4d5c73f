import { render, screen } from '@testing-library/react';
import { ProfitAtExit, profitAtExitSentence, profitScale } from '@/components/charts/profit-at-exit';

const lumps = [
  { profit: -438.9, probability: 0.15 },
  { profit: 161.1, probability: 0.73 },
];
const classes = [
  { from: -400, to: 0, probability: 0.08 },
  { from: 0, to: 150, probability: 0.04 },
];
const picture = { lumps, classes, mean: 39.24, currency: 'USD' };

describe('profitAtExitSentence', () => {
  it('names the lumps, the sides of the rest and the mean', () => {
    expect(profitAtExitSentence(picture)).toBe(
      'Profit in USD: 15% at −438.90; 73% at +161.10; otherwise 8% at a loss and 4% at a profit; mean +39.24.',
    );
  });

  it('says when there is nothing to show', () => {
    expect(profitAtExitSentence({ lumps: [], classes: [], mean: NaN, currency: 'USD' })).toBe(
      'No profit forecast yet.',
    );
  });
});

describe('ProfitAtExit', () => {
  it('sets lumps and classes on one scale of height, classes at least 3 high', () => {
    render(<ProfitAtExit {...picture} width={400} />);
    const heights = [...screen.getByRole('img').querySelectorAll('rect')].map((bar) =>
      Number(bar.getAttribute('height')),
    );
    const [loss = 0, gain = 0, low = 0, high = 0] = heights;
    expect(high / low).toBeCloseTo(0.73 / 0.15, 9);
    expect(loss / high).toBeCloseTo(0.08 / 0.73, 9);
    expect(gain).toBeCloseTo((0.04 / 0.73) * high, 9);
  });

  it('never lets a class fall below 3 points', () => {
    render(<ProfitAtExit {...picture} classes={[{ from: -10, to: 0, probability: 1e-6 }]} width={400} />);
    expect(screen.getByRole('img').querySelector('rect')?.getAttribute('height')).toBe('3');
  });

  it('dots zero where the scale has it', () => {
    render(<ProfitAtExit {...picture} width={400} />);
    const zero = [...screen.getByRole('img').querySelectorAll('line')].at(-1);
    expect(Number(zero?.getAttribute('x1'))).toBeCloseTo(profitScale(picture, 400)(0), 9);
  });

  it('leaves out the weaker of two labels that would collide', () => {
    const close = [
      { profit: 100, probability: 0.6 },
      { profit: 101, probability: 0.3 },
    ];
    render(<ProfitAtExit lumps={close} classes={[]} mean={-500} currency="USD" width={400} />);
    expect(screen.getByText('60%')).toBeTruthy();
    expect(screen.queryByText('30%')).toBeNull();
  });

  it.each([
    ['nothing', [], NaN],
    ['one sure profit of zero', [{ profit: 0, probability: 1 }], 0],
  ])('stands with %s', (_, sure, mean) => {
    expect(() =>
      render(<ProfitAtExit lumps={sure} classes={[]} mean={mean} currency="USD" width={300} />),
    ).not.toThrow();
  });
});
