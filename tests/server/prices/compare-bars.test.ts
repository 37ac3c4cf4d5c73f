import { compareBars } from '@/server/prices/compare-bars';

const bar = { row: 2, sessionDate: '2026-01-05', close: '10', open: null, high: null, low: null };
const stored = { close: '10', open: '9', high: '11', low: '8' };
const compare = (file: Partial<typeof bar> | { high: string }, kept: typeof stored | null = stored) =>
  compareBars([{ ...bar, ...file }], new Map(kept === null ? [] : [['2026-01-05', kept]]));

describe('comparing a file with the bars that are kept', () => {
  it('adds a session that is not kept', () => {
    expect(compare({}, null)).toMatchObject({
      added: 1,
      unchanged: 0,
      changes: [],
      writes: [{ sessionDate: '2026-01-05' }],
    });
  });

  it('leaves a bar alone when the file says nothing else of it', () => {
    expect(compare({})).toEqual({ added: 0, unchanged: 1, changes: [], writes: [] });
  });

  it('shows a changed close with both values, and takes the old range out with the old close', () => {
    expect(compare({ close: '12' })).toEqual({
      added: 0,
      unchanged: 0,
      changes: [{ row: 2, sessionDate: '2026-01-05', from: '10', to: '12' }],
      writes: [{ sessionDate: '2026-01-05', prices: { close: '12', open: null, high: null, low: null } }],
    });
  });

  it('shows a changed high beside the prices that stay', () => {
    expect(compare({ high: '12' })).toMatchObject({
      changes: [{ from: 'open 9, high 11, low 8', to: 'open 9, high 12, low 8' }],
      writes: [{ prices: { close: '10', open: '9', high: '12', low: '8' } }],
    });
  });

  it('drops kept prices that cannot stand beside those of the file', () => {
    const kept = { close: '10', open: '10.8', high: '11', low: '8' };
    expect(compare({ high: '10.5' }, kept)).toMatchObject({
      writes: [{ prices: { close: '10', open: null, high: '10.5', low: null } }],
    });
  });
});
