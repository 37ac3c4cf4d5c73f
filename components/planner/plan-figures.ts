import { formatMoney, formatOdds } from '@/components/ui/number-format';
import { type ResultFigure } from '@/components/ui/result-bar';
import { type PlanPreview } from '@/hooks/entries/preview-plan';

/** The running result: what the bar at the foot of the planner shows. */
export function planFigures(preview: PlanPreview, currency: string): ResultFigure[] {
  if (preview.kind !== 'ready') {
    return [
      { label: 'Profit', value: '–', note: 'plan incomplete' },
      { label: `Mean, ${currency}`, value: '–', note: `${preview.problems.length} to complete` },
      { label: `Most to lose, ${currency}`, value: '–', note: '' },
    ];
  }
  const { forecast } = preview;
  const { ends } = forecast;
  const distribution = forecast.atExit ?? forecast.atExpiry;
  const { oddsOfProfit: odds, mean } = distribution;
  const range = (low: number, high: number, format: (value: number) => string) =>
    `${format(Math.min(low, high))} to ${format(Math.max(low, high))}`;
  const signed = (value: number) => formatMoney(value, { sign: true });
  // Cents of large amounts would not fit under the mean on a phone, and say nothing.
  const places = Math.max(Math.abs(mean.low), Math.abs(mean.high)) >= 1_000 ? 0 : 2;
  const end = (amount: number | null, odds: number, label: string, tone: 'tide' | 'rust'): ResultFigure => ({
    label: `${label}, ${currency}`,
    value: amount === null ? 'no limit' : signed(amount),
    note: amount === null ? 'at expiry' : `${formatOdds(odds)} of the time`,
    tone,
  });
  return [
    {
      label: distribution.horizon === 'expiry' ? 'Profit at expiry' : 'Profit at exit',
      value: formatOdds(odds.base),
      note: range(odds.low, odds.high, formatOdds),
    },
    {
      label: `Mean, ${currency}`,
      value: signed(mean.base),
      note: range(mean.low, mean.high, (value) => formatMoney(value, { sign: true, places })),
      tone: mean.base >= 0 ? 'tide' : 'rust',
    },
    end(ends.greatestLoss, ends.oddsOfGreatestLoss, 'Most to lose', 'rust'),
    end(ends.greatestGain, ends.oddsOfGreatestGain, 'Most to gain', 'tide'),
    {
      label: ends.breakEvens.length > 1 ? 'Break-evens' : 'Break-even',
      value: ends.breakEvens.length === 0 ? 'none' : ends.breakEvens.map((price) => price.toFixed(2)).join(', '),
      note: 'at expiry, after fees',
    },
  ];
}
