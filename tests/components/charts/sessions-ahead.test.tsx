import { render, screen } from '@testing-library/react';
import {
  SessionsAhead,
  sessionsAheadSentence,
  sessionsThatFit,
  type SessionAhead,
} from '@/components/charts/sessions-ahead';

const sessions: SessionAhead[] = [
  { date: '2026-12-18', kind: 'full', marks: ['expiry'] },
  { date: '2026-12-21', kind: 'full', marks: ['exDividend', 'expiry'] },
  { date: '2026-12-24', kind: 'early', marks: [] },
  { date: '2026-12-25', kind: 'closed', marks: [] },
];

describe('sessionsAheadSentence', () => {
  it('counts the sessions and names the days that differ', () => {
    expect(sessionsAheadSentence(sessions)).toBe(
      '3 sessions, Fri 18 Dec to Fri 25 Dec; expiry 18 Dec and 21 Dec; ex-dividend 21 Dec; early close 24 Dec; closed 25 Dec.',
    );
  });

  it('says when none is known', () => {
    expect(sessionsAheadSentence([])).toBe('No sessions ahead are known.');
  });
});

describe('SessionsAhead', () => {
  const pieces = () => [...screen.getByRole('img').querySelectorAll('rect')];

  it('draws an early close 0.6 as long and a holiday dashed', () => {
    render(<SessionsAhead sessions={sessions} width={160} />);
    const [full = 0, , early = 0] = pieces().map((piece) => Number(piece.getAttribute('width')));
    expect(early / full).toBeCloseTo(0.6, 9);
    expect(pieces().map((piece) => piece.getAttribute('stroke-dasharray') !== null)).toEqual([
      false,
      false,
      false,
      true,
    ]);
  });

  it('parts the weeks by a rule', () => {
    render(<SessionsAhead sessions={sessions} width={160} />);
    expect(screen.getByRole('img').querySelectorAll('line')).toHaveLength(1);
  });

  it('draws as many days as fit', () => {
    render(<SessionsAhead sessions={sessions} width={60} />);
    expect(pieces()).toHaveLength(sessionsThatFit(60));
    expect(sessionsThatFit(60)).toBe(2);
  });

  it('stands without sessions', () => {
    expect(() => render(<SessionsAhead sessions={[]} width={160} />)).not.toThrow();
  });
});
