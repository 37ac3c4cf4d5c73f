import { render } from '@testing-library/react';
import { SignedAmount } from '@/components/ui/signed-amount';

/** What the eye sees and what the ear hears. */
function both(value: string | number | null, size?: 'figure') {
  const { container } = render(<SignedAmount value={value} currency="USD" size={size} />);
  const seen = container.querySelector('[aria-hidden]');
  return { seen: seen?.textContent, heard: seen?.nextElementSibling?.textContent };
}

describe('SignedAmount', () => {
  it.each([
    ['318.35', '+318.35', 'profit of 318.35 USD'],
    [-1204.5, '−1,204.50', 'loss of 1,204.50 USD'],
    ['0.00', '0.00', 'even, 0.00 USD'],
    [null, '–', 'no amount yet'],
  ])('shows %p as %p and says "%s"', (value, seen, heard) => {
    expect(both(value)).toEqual({ seen, heard });
  });

  it('names the currency beside the big figure, which stands alone', () => {
    expect(both('318.35', 'figure').seen).toBe('+318.35 USD');
  });
});
