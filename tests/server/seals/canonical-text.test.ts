import fc from 'fast-check';
import { fromCanonicalText, type SealedValue, toCanonicalText } from '@/server/seals/canonical-text';

describe('toCanonicalText', () => {
  it('sorts keys and writes numbers as marked text', () => {
    expect(toCanonicalText({ b: 0.1, a: ['x', true, null], c: -0 })).toBe('{"a":["x",true,null],"b":"#0.1","c":"#0"}');
  });

  it('keeps text that looks like a number apart from a number', () => {
    const value = { text: '#1', number: 1, plain: '1' };
    expect(toCanonicalText(value)).toBe('{"number":"#1","plain":"1","text":"##1"}');
    expect(fromCanonicalText(toCanonicalText(value))).toEqual(value);
  });

  it('writes composed and decomposed letters the same way', () => {
    expect(toCanonicalText({ idea: 'Zu\u0308rich' })).toBe(toCanonicalText({ idea: 'Z\u00fcrich' }));
  });

  it.each([NaN, Infinity, -Infinity])('refuses %p', (value) => {
    expect(() => toCanonicalText({ value })).toThrow(TypeError);
  });

  it('gives back every value it was given', () => {
    const finite = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value + 0);
    const text = fc.string({ unit: 'grapheme' }).map((value) => value.normalize('NFC'));
    const { tree } = fc.letrec<{ tree: SealedValue }>((tie) => ({
      tree: fc.oneof(
        finite,
        text,
        fc.boolean(),
        fc.constant(null),
        fc.array(tie('tree')),
        fc.dictionary(
          text.filter((key) => key !== '__proto__'),
          tie('tree'),
        ),
      ),
    }));
    fc.assert(
      fc.property(tree, (value) => {
        expect(fromCanonicalText(toCanonicalText(value))).toEqual(value);
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });
});
