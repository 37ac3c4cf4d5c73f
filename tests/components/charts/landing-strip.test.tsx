import { render, screen } from '@testing-library/react';
import { LandingStrip, landingStripSentence, placeWords } from '@/components/charts/landing-strip';
import { sigmaName, sigmaScale } from '@/components/charts/sigma-scale';

const marks = { strikes: [0.76], target: 0.91, stop: -0.58 };

describe('landingStripSentence', () => {
  it('names the range, every level and where it landed', () => {
    expect(landingStripSentence({ sigmaMarks: marks, landed: 0.95 })).toBe(
      'Forecast −3σ to +3σ; strike at +0.76σ, target +0.91σ, stop −0.58σ; landed at +0.95σ.',
    );
  });

  it('joins several strikes and says where the price is now', () => {
    expect(landingStripSentence({ sigmaMarks: { strikes: [-0.9, -0.6, 1] }, now: 0.2 })).toBe(
      'Forecast −3σ to +3σ; strikes at −0.90σ, −0.60σ and +1.00σ; now at +0.20σ.',
    );
  });

  it('says that a reading went past the strip', () => {
    expect(placeWords(3.42)).toBe('past +3σ, at +3.42σ');
    expect(placeWords(-3.1)).toBe('past −3σ, at −3.10σ');
    expect(placeWords(3)).toBe('at +3.00σ');
  });

  it('says that a grey forecast was not traded and needs no marks', () => {
    expect(landingStripSentence({ sigmaMarks: { strikes: [] }, tone: 'grey' })).toBe(
      'Forecast that was not traded, −3σ to +3σ.',
    );
  });
});

describe('LandingStrip', () => {
  const strip = (reading: Parameters<typeof landingStripSentence>[0]) => {
    render(<LandingStrip {...reading} width={312} />);
    return screen.getByRole('img');
  };

  it('puts +1σ where the scale has it: two thirds of the way between the insets', () => {
    const ticks = strip({ sigmaMarks: { strikes: [1] } }).querySelectorAll('line');
    expect(ticks).toHaveLength(1);
    expect(Number(ticks[0]?.getAttribute('x1'))).toBeCloseTo(6 + 300 * (4 / 6), 9);
  });

  it('draws a landing on the strip as a dot at its sigma', () => {
    const dots = strip({ sigmaMarks: { strikes: [] }, landed: -1.5 }).querySelectorAll('circle');
    expect([...dots].map((dot) => Number(dot.getAttribute('cx')))).toEqual([81, 81]);
  });

  it('draws an arrowhead and no dot past 3σ', () => {
    const image = strip({ sigmaMarks: { strikes: [] }, landed: 3.4 });
    expect(image.querySelectorAll('circle')).toHaveLength(0);
    expect(image.querySelectorAll('path')).toHaveLength(1);
  });

  it('leaves levels beyond its ends out of the drawing and keeps them in the sentence', () => {
    const image = strip({ sigmaMarks: { strikes: [-4], target: 5 } });
    expect(image.querySelectorAll('line, path')).toHaveLength(0);
    expect(image.getAttribute('aria-label')).toContain('strike at −4.00σ, target +5.00σ');
  });

  it('paints each strip with a gradient of its own, strongest at no move', () => {
    render(
      <>
        <LandingStrip sigmaMarks={marks} width={100} />
        <LandingStrip sigmaMarks={marks} width={100} />
      </>,
    );
    const ids = [...document.querySelectorAll('linearGradient')].map(({ id }) => id);
    expect(new Set(ids).size).toBe(2);
    const stops = [...(document.querySelector('linearGradient')?.querySelectorAll('stop') ?? [])];
    const opacities = stops.map((stop) => Number(stop.getAttribute('stop-opacity')));
    expect(opacities).toHaveLength(13);
    expect(Math.max(...opacities)).toBeCloseTo(0.72, 9);
    expect(opacities[6]).toBe(Math.max(...opacities));
  });
});

describe('sigmaScale', () => {
  it('runs from inset to inset', () => {
    const x = sigmaScale(200, 14);
    expect([x(-3), x(0), x(3)]).toEqual([14, 100, 186]);
  });
});

describe('sigmaName', () => {
  it.each([
    [0, '0σ'],
    [0.5, '+½σ'],
    [-1.5, '−1½σ'],
    [2, '+2σ'],
    [-0.25, '−0.25σ'],
  ])('names %p as %p', (sigma, name) => {
    expect(sigmaName(sigma)).toBe(name);
  });
});
