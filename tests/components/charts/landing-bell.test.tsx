import { render, screen } from '@testing-library/react';
import { LandingBell, landingBellSentence, type LandingMark } from '@/components/charts/landing-bell';

const marks: LandingMark[] = [
  { kind: 'strike', price: 102, sigma: 0.76, label: 'Strike' },
  { kind: 'stop', price: 98.5, sigma: -0.58, label: 'Stop' },
];
const forecast = { spot: 100, totalDeviation: 0.02598, marks };

describe('landingBellSentence', () => {
  it('names the price range, the levels and the landing', () => {
    expect(landingBellSentence({ ...forecast, landed: { price: 102.5, sigma: 0.95 } })).toBe(
      'Forecast −3σ to +3σ is 92.50 to 108.11; strike 102.00 at +0.76σ, stop 98.50 at −0.58σ; landed at 102.50, at +0.95σ.',
    );
  });

  it('takes prices from the forecast where it has a centre of its own', () => {
    expect(landingBellSentence({ ...forecast, marks: [], priceAtSigma: (sigma) => 50 + sigma })).toBe(
      'Forecast −3σ to +3σ is 47.00 to 53.00.',
    );
  });
});

describe('LandingBell', () => {
  it('puts a level at +1σ over the +1σ tick of the axis', () => {
    render(
      <LandingBell
        spot={100}
        totalDeviation={0.02}
        width={628}
        marks={[{ kind: 'strike', price: 102, sigma: 1, label: 'Strike' }]}
      />,
    );
    const lines = [...screen.getByRole('img').querySelectorAll('line')].map((line) => Number(line.getAttribute('x1')));
    const plusOne = 14 + 600 * (4 / 6);
    expect(lines.filter((x) => Math.abs(x - plusOne) < 1e-9)).toHaveLength(2);
  });

  it('names every level with its price in the key, also one that is off the strip', () => {
    render(
      <LandingBell
        {...forecast}
        width={600}
        marks={[...marks, { kind: 'strike', price: 120, sigma: 7, label: 'Long call' }]}
      />,
    );
    expect(screen.getByText('120.00, past +3σ')).toBeTruthy();
    expect(screen.getByText('98.50')).toBeTruthy();
  });

  it('says in the drawing that the price is past the end', () => {
    render(<LandingBell {...forecast} width={600} now={{ price: 109.2, sigma: 3.42 }} />);
    expect(screen.getByText('now 109.20, +3.42σ, past +3σ')).toBeTruthy();
  });

  it('drops prices that would run into one another on a narrow axis', () => {
    render(<LandingBell spot={123456.7} totalDeviation={0.01} marks={[]} width={240} />);
    const texts = [...document.querySelectorAll('text')].map(({ textContent }) => textContent ?? '');
    expect(texts.filter((text) => text.endsWith('σ'))).toHaveLength(7);
    expect(texts.filter((text) => !text.endsWith('σ'))).toHaveLength(3);
  });

  it('stands without a reading or a level, and with numbers that are not known', () => {
    expect(() =>
      render(<LandingBell spot={NaN} totalDeviation={NaN} marks={[]} now={{ price: NaN, sigma: NaN }} width={300} />),
    ).not.toThrow();
  });
});
