import { fireEvent, render, screen } from '@testing-library/react';
import { ladderScale, ladderSentence, VolatilityLadder, type LadderRung } from '@/components/charts/volatility-ladder';

const rungs: LadderRung[] = [
  { key: '10', label: '10 sessions', dailyVolatility: 0.0141, low: 0.0098, high: 0.0258 },
  { key: '20', label: '20 sessions', dailyVolatility: 0.015, low: 0.0114, high: 0.0219 },
  { key: 'e', label: 'Weighted', dailyVolatility: 0.0149, low: 0.012, high: 0.02 },
];

describe('VolatilityLadder as a choice', () => {
  it('is a radio group with the chosen rung as its only tab stop', () => {
    render(<VolatilityLadder rungs={rungs} chosenKey="20" onChoose={() => undefined} width={400} />);
    const radios = screen.getAllByRole('radio');
    expect(radios.map((radio) => radio.getAttribute('aria-checked'))).toEqual(['false', 'true', 'false']);
    expect(radios.map((radio) => radio.tabIndex)).toEqual([-1, 0, -1]);
    expect(radios[1]?.getAttribute('aria-label')).toBe('20 sessions: 1.50% a session, interval 1.14% to 2.19%');
  });

  it.each([
    ['ArrowDown', 'e'],
    ['ArrowUp', '10'],
    ['End', 'e'],
    ['Home', '10'],
  ])('moves the choice and the focus by %s', (key, expected) => {
    const onChoose = jest.fn();
    render(<VolatilityLadder rungs={rungs} chosenKey="20" onChoose={onChoose} width={400} />);
    fireEvent.keyDown(screen.getAllByRole('radio')[1] as Element, { key });
    expect(onChoose.mock.calls).toEqual([[expected]]);
    expect(document.activeElement?.getAttribute('aria-label')).toMatch(expected === 'e' ? /^Weighted/ : /^10 sessions/);
  });

  it('goes round from the last rung to the first', () => {
    const onChoose = jest.fn();
    render(<VolatilityLadder rungs={rungs} chosenKey="e" onChoose={onChoose} width={400} />);
    fireEvent.keyDown(screen.getAllByRole('radio')[2] as Element, { key: 'ArrowDown' });
    expect(onChoose.mock.calls).toEqual([['10']]);
  });

  it('chooses the rung that is pressed', () => {
    const onChoose = jest.fn();
    render(<VolatilityLadder rungs={rungs} chosenKey="20" onChoose={onChoose} width={400} />);
    fireEvent.click(screen.getByText('Weighted'));
    expect(onChoose.mock.calls).toEqual([['e']]);
  });

  it('can be reached by keyboard while no rung is chosen', () => {
    render(<VolatilityLadder rungs={rungs} chosenKey={null} onChoose={() => undefined} width={400} />);
    expect(screen.getAllByRole('radio').map((radio) => radio.tabIndex)).toEqual([0, -1, -1]);
  });
});

describe('VolatilityLadder as a picture', () => {
  it('speaks as one image with every rung and the market', () => {
    render(
      <VolatilityLadder rungs={rungs} chosenKey="20" implied={{ bid: 0.0197, mid: 0.0209, ask: 0.0221 }} width={400} />,
    );
    expect(screen.queryAllByRole('radio')).toHaveLength(0);
    const label = screen.getByRole('img').getAttribute('aria-label');
    expect(label).toContain('20 sessions: 1.50% a session, interval 1.14% to 2.19%, chosen;');
    expect(label).toContain('Market-implied: 2.09% a session, bid 1.97% to ask 2.21%.');
  });

  it('runs rails at the low and high of the chosen rung', () => {
    render(<VolatilityLadder rungs={rungs} chosenKey="20" width={400} />);
    const x = ladderScale(rungs, undefined, 400);
    const rails = [...document.querySelectorAll('line')].slice(0, 2).map((line) => Number(line.getAttribute('x1')));
    expect(rails[0]).toBeCloseTo(x(0.0114), 9);
    expect(rails[1]).toBeCloseTo(x(0.0219), 9);
  });

  it('draws nothing without rungs or a market', () => {
    const { container } = render(<VolatilityLadder rungs={[]} chosenKey={null} width={400} />);
    expect(container.innerHTML).toBe('');
    expect(ladderSentence([], null)).toBe('No volatility yet.');
  });
});

describe('ladderScale', () => {
  it('leaves 5% beyond the lowest and the highest value', () => {
    const [low = 0, high = 0] = ladderScale(rungs, undefined, 400).domain();
    expect(low).toBeCloseTo(0.0098 - 0.05 * 0.016, 12);
    expect(high).toBeCloseTo(0.0258 + 0.05 * 0.016, 12);
  });

  it('has room around a single value', () => {
    const only = [{ key: 'a', label: 'A', dailyVolatility: 0.02, low: NaN, high: NaN }];
    const [low = 0, high = 0] = ladderScale(only, undefined, 400).domain();
    expect(low).toBeLessThan(0.02);
    expect(high).toBeGreaterThan(0.02);
  });
});
