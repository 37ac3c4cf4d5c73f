import { whatChanged } from '@/components/entry/what-changed-words';
import { type OutcomeStep } from '@/shared/entries/outcome-history';
import { ids } from '@/tests/components/support/sample-journal';

const move = (endPrice: number, inSigmas: number, isFinal = true) => ({
  sessionDate: '2026-12-09',
  endPrice,
  inSigmas,
  isFinal,
});
const closeOf = (before: string | null, after: string | null): OutcomeStep['cause'] => ({
  kind: 'bar',
  prices: [{ sessionDate: '2026-12-09', field: 'close', before, after }],
});
const step = (changes: Partial<OutcomeStep>): OutcomeStep => ({
  id: ids.entry,
  at: '2026-12-11T22:05:00.000Z',
  cause: closeOf('98.4', '98.1'),
  changes: [],
  ...changes,
});
const odds = (before: boolean | null, after: boolean | null) =>
  ({ kind: 'odds', oddsKey: 'put', statement: '97 put in the money', before, after }) as const;

describe('what changed in an outcome', () => {
  it('is a corrected close with the move before and after', () => {
    const corrected = step({ changes: [{ kind: 'move', before: move(98.4, -0.54), after: move(98.1, -0.61) }] });
    expect(whatChanged([corrected], 'USD')).toEqual([
      {
        key: ids.entry,
        cause: 'The close of 9 December 2026 was corrected from 98.40 to 98.10 on 11 Dec, 17:05',
        effects: ['Move −0.54σ became −0.61σ'],
      },
    ]);
  });

  it('is nothing while answers only come in for the first time', () => {
    const first = step({
      cause: closeOf(null, '98.4'),
      changes: [
        { kind: 'move', before: null, after: move(98.4, -0.54) },
        odds(null, false),
        { kind: 'completeness', before: false, after: true },
      ],
    });
    expect(whatChanged([first], 'USD')).toEqual([]);
  });

  it('is an answer that was no and became yes', () => {
    const [words] = whatChanged([step({ changes: [odds(false, true)] })], 'USD');
    expect(words?.effects).toEqual(['“97 put in the money” no became yes']);
  });

  it('is a fill taken out, and the profit that came back with the next one', () => {
    const fill = { kind: 'buy', contract: '2026-12-18 97 put', quantity: '1', price: '0.4' } as const;
    const words = whatChanged(
      [
        step({
          id: ids.underlying,
          cause: { kind: 'fill', act: 'added', fill },
          changes: [{ kind: 'profit', before: null, after: '38' }],
        }),
        step({
          id: ids.trader,
          cause: { kind: 'fill', act: 'taken-out', fill },
          changes: [{ kind: 'profit', before: '38', after: null }],
        }),
        step({
          id: ids.upload,
          cause: { kind: 'fill', act: 'added', fill: { ...fill, price: '0.45' } },
          changes: [{ kind: 'profit', before: null, after: '33' }],
        }),
      ],
      'USD',
    );
    expect(words.map(({ cause, effects }) => [cause, effects])).toEqual([
      ['Buy 1 × 18 Dec 97 put at 0.45 was added on 11 Dec, 17:05', ['Profit is now +33.00 USD']],
      ['Buy 1 × 18 Dec 97 put at 0.40 was taken out on 11 Dec, 17:05', ['Profit +38.00 USD is no longer known']],
    ]);
  });

  it('is a settlement value that came late, and not one that came the same evening', () => {
    const settled = (at: string) =>
      step({
        at,
        cause: {
          kind: 'settlement',
          prices: [{ sessionDate: '2026-12-18', field: 'settlement', before: null, after: '96.5' }],
        },
        changes: [odds(null, true), { kind: 'completeness', before: false, after: true }],
      });
    expect(whatChanged([settled('2026-12-18T23:00:00.000Z')], 'USD')).toEqual([]);
    expect(whatChanged([settled('2026-12-21T22:00:00.000Z')], 'USD')).toMatchObject([
      {
        cause: 'The settlement value of 18 December 2026, 96.50, came on 21 Dec, 17:00',
        effects: ['“97 put in the money” is now yes', 'Everything is known'],
      },
    ]);
  });
});
