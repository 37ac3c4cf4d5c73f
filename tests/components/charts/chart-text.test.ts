import { decimalsForStep, priceText } from '@/components/charts/axis-number';
import { fitMiddle, keepApart, textWidth } from '@/components/charts/chart-text';
import { listWords } from '@/components/charts/list-words';
import { translucent } from '@/components/charts/translucent';

describe('keepApart', () => {
  it('keeps the more important of two labels that would touch', () => {
    const labels = [
      { x: 50, text: 'first' },
      { x: 60, text: 'second' },
      { x: 150, text: 'third' },
    ];
    expect(keepApart(labels).map(({ text }) => text)).toEqual(['first', 'third']);
  });
});

describe('fitMiddle', () => {
  it('keeps all of a label inside the drawing', () => {
    const half = textWidth('label') / 2;
    expect(fitMiddle(0, 'label', 200)).toBe(half);
    expect(fitMiddle(200, 'label', 200)).toBe(200 - half);
    expect(fitMiddle(90, 'label', 200)).toBe(90);
  });
});

describe('decimalsForStep', () => {
  it.each([
    [2.6, 1],
    [22, 0],
    [0.5, 2],
    [0.004, 4],
    [NaN, 2],
  ])('for a step of %p is %p', (step, decimals) => {
    expect(decimalsForStep(step)).toBe(decimals);
  });
});

describe('priceText', () => {
  it('has cents, and more below 1', () => {
    expect([4021.5, 0.0375, 0].map(priceText)).toEqual(['4,021.50', '0.0375', '0.00']);
  });
});

describe('listWords', () => {
  it('joins with commas and a last and', () => {
    expect([[], ['a'], ['a', 'b'], ['a', 'b', 'c']].map(listWords)).toEqual(['', 'a', 'a and b', 'a, b and c']);
  });
});

describe('translucent', () => {
  it('turns a colour and an opacity into rgba', () => {
    expect(translucent('#9C3D14', 0.38)).toBe('rgba(156,61,20,0.380)');
  });
});
