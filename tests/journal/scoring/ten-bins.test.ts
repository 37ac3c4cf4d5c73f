import { inTenBins, tenBinOf } from '@/journal/scoring/ten-bins';

describe('tenBinOf', () => {
  it.each([
    [0, 0, 0],
    [0.05, 0, 0],
    [0.1, 1, 0],
    [0.3, 3, 2],
    [0.7, 7, 6],
    [0.95, 9, 9],
    [1, 9, 9],
  ])('puts %d into bin %d closed on the left and %d closed on the right', (probability, left, right) => {
    expect(tenBinOf(probability)).toBe(left);
    expect(tenBinOf(probability, 'right')).toBe(right);
  });

  it.each([-0.1, 1.1, NaN])('refuses %p', (probability) => {
    expect(() => tenBinOf(probability)).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });
});

describe('inTenBins', () => {
  it('keeps empty bins and the order of items', () => {
    const bins = inTenBins([0.95, 0.02, 0.9], (item) => item);
    expect(bins).toHaveLength(10);
    expect([bins[0], bins[5], bins[9]]).toEqual([[0.02], [], [0.95, 0.9]]);
  });
});
