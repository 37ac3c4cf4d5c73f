import { render, screen } from '@testing-library/react';
import { ordinal, PlaceInYear, placeInYearSentence } from '@/components/charts/place-in-year';

const place = {
  percentile: 52.4,
  lowerQuartile: 0.012,
  upperQuartile: 0.016,
  current: 0.015,
  lowest: 0.01,
  highest: 0.02,
};

describe('placeInYearSentence', () => {
  it('gives the volatility, its place, the range and the middle half', () => {
    expect(placeInYearSentence(place)).toBe(
      '1.50% a session, 52nd of 100 in its past year: 1.00% to 2.00%, the middle half 1.20% to 1.60%.',
    );
  });

  it('says when the place is not known', () => {
    expect(placeInYearSentence({ ...place, percentile: NaN })).toBe('Place in its past year not known.');
  });
});

describe('PlaceInYear', () => {
  const dot = () => Number(screen.getByRole('img').querySelector('circle')?.getAttribute('cx'));

  it('puts the dot between the lowest and the highest of the year', () => {
    render(<PlaceInYear {...place} width={112} />);
    expect(dot()).toBeCloseTo(56, 9);
  });

  it('keeps a value beyond the year at the end', () => {
    render(<PlaceInYear {...place} current={0.03} width={112} />);
    expect(dot()).toBe(106);
  });

  it('stands when the year has one value, or none', () => {
    render(<PlaceInYear {...place} lowest={0.015} highest={0.015} width={112} />);
    expect(dot()).toBeCloseTo(56, 9);
    const none = { percentile: NaN, lowerQuartile: NaN, upperQuartile: NaN, current: NaN, lowest: NaN, highest: NaN };
    expect(() => render(<PlaceInYear {...none} width={112} />)).not.toThrow();
  });
});

describe('ordinal', () => {
  it.each([
    [1, '1st'],
    [2, '2nd'],
    [3, '3rd'],
    [11, '11th'],
    [12, '12th'],
    [13, '13th'],
    [52, '52nd'],
    [100, '100th'],
  ])('of %p is %p', (whole, text) => {
    expect(ordinal(whole)).toBe(text);
  });
});
