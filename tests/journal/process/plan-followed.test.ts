import {
  adherenceRate,
  isPlanFollowed,
  isSealedBeforeFill,
  type ProcessMarks,
  processTable,
} from '@/journal/process/plan-followed';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';

const marks: ProcessMarks = {
  isSealedBeforeFill: true,
  isSizeWithinPlan: true,
  isEntryWithinLimit: true,
  exitTag: 'time',
};

describe('isPlanFollowed', () => {
  it('holds when every mark does, or says nothing', () => {
    expect(isPlanFollowed(marks)).toBe(true);
    expect(isPlanFollowed({ ...marks, isEntryWithinLimit: null, exitTag: null })).toBe(true);
  });

  it.each<Partial<ProcessMarks>>([
    { isSealedBeforeFill: false },
    { isSizeWithinPlan: false },
    { isEntryWithinLimit: false },
    { exitTag: 'unplanned' },
  ])('is broken by %p alone', (mark) => {
    expect(isPlanFollowed({ ...marks, ...mark })).toBe(false);
  });
});

describe('isSealedBeforeFill', () => {
  const at = (tradedAt: string) => ({ tradedAt });

  it('compares the seal with the first fill, in whatever order they stand', () => {
    const fills = [at('2026-12-10T16:00:00.000Z'), at('2026-12-10T15:00:00.000Z')];
    expect(isSealedBeforeFill('2026-12-10T15:00:00.000Z', fills)).toBe(true);
    expect(isSealedBeforeFill('2026-12-10T15:00:00.001Z', fills)).toBe(false);
  });

  it('says nothing without fills and refuses a time that is none', () => {
    expect(isSealedBeforeFill('2026-12-10T15:00:00.000Z', [])).toBeNull();
    expect(() => isSealedBeforeFill('then', [])).toThrow(expect.objectContaining({ code: 'instant-invalid' }));
  });
});

describe('process by result', () => {
  const entries = [
    { isFollowed: true, realisedProfit: '318.35' },
    { isFollowed: true, realisedProfit: '-92.64' },
    { isFollowed: true, realisedProfit: '0' },
    { isFollowed: false, realisedProfit: '0.01' },
    { isFollowed: false, realisedProfit: '-588' },
  ];

  it('counts four kinds, a result of nothing among the bad ones', () => {
    expect(processTable(entries)).toEqual({ followedGood: 1, followedBad: 2, leftGood: 1, leftBad: 1 });
  });

  it('gives the rate of plans followed with its Wilson interval and the rule of the sample', () => {
    expect(adherenceRate(entries)).toEqual({
      followed: 3,
      count: 5,
      sampleRule: 'list-only',
      rate: { share: 0.6, ...wilsonInterval({ hits: 3, count: 5 }) },
    });
  });

  it('has no rate without entries', () => {
    expect(adherenceRate([])).toEqual({ followed: 0, count: 0, sampleRule: 'list-only', rate: null });
  });
});
