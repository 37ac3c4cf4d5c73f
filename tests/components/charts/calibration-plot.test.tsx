import { render, screen } from '@testing-library/react';
import {
  CalibrationPlot,
  calibrationScales,
  calibrationSentence,
  dotRadius,
} from '@/components/charts/calibration-plot';

const bins = [
  { forecast: 0.2, observed: 4 / 17, count: 17, low: 0.06, high: 0.32 },
  { forecast: 0.7, observed: 28 / 46, count: 46, low: 0.61, high: 0.79 },
];

describe('calibrationSentence', () => {
  it('gives a rate from 20 on and only a count below', () => {
    expect(calibrationSentence({ bins })).toBe(
      'Calibration of 63 resolved odds: stated 20%, came true 4 of 17; stated 70%, came true 61% of 46.',
    );
  });

  it('says when nothing is resolved', () => {
    expect(calibrationSentence({ bins: [] })).toBe('No odds are resolved yet.');
  });
});

describe('CalibrationPlot', () => {
  const dots = () => [...screen.getByRole('img').querySelectorAll('circle')];

  it('puts a dot at its stated odds and the share that came true', () => {
    render(<CalibrationPlot bins={bins} width={350} />);
    const { x, y } = calibrationScales(300);
    expect(Number(dots()[1]?.getAttribute('cx'))).toBeCloseTo(x(0.7), 9);
    expect(Number(dots()[1]?.getAttribute('cy'))).toBeCloseTo(y(28 / 46), 9);
  });

  it('draws thin bins open with a dotted outline and says so in the key', () => {
    render(<CalibrationPlot bins={bins} width={350} />);
    expect(dots().map((dot) => dot.getAttribute('stroke-dasharray') !== null)).toEqual([true, false]);
    expect(screen.getByText('fewer than 20')).toBeTruthy();
  });

  it('does not speak of thin bins when there are none', () => {
    render(<CalibrationPlot bins={bins} thinBelow={10} width={350} />);
    expect(screen.queryByText(/fewer than/)).toBeNull();
  });

  it('stands empty and with one bin', () => {
    render(<CalibrationPlot bins={[]} width={350} />);
    expect(screen.getByText('No odds resolved yet')).toBeTruthy();
    expect(() =>
      render(<CalibrationPlot bins={bins.slice(0, 1)} curve={[{ forecast: 0.2, observed: 0.2 }]} width={350} />),
    ).not.toThrow();
  });

  it('keeps the words of the call-out inside the plot', () => {
    render(
      <CalibrationPlot bins={bins} callout={{ forecast: 0.99, observed: 0.01, text: '1 of 90 = 1%' }} width={350} />,
    );
    const words = screen.getByText('1 of 90 = 1%');
    expect(Number(words.getAttribute('x'))).toBeLessThan(342 - 30);
    expect(Number(words.getAttribute('y'))).toBeLessThan(310);
  });
});

describe('dotRadius', () => {
  it('grows with the root of the count', () => {
    expect([0, 1, 16, 100].map(dotRadius)).toEqual([2, 3.15, 6.6, 13.5]);
  });
});
