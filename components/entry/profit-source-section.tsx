import { ProfitSteps } from '@/components/charts/profit-steps';
import { sourceCaution, stepsOf } from '@/components/entry/profit-source-words';
import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { Card } from '@/components/ui/card';
import { Txt } from '@/components/ui/text';

/** Where the profit came from, in steps that add up to it. */
export function ProfitSourceSection({ entry }: { entry: SealedEntry }) {
  const { outcome, row, sealed } = entry;
  const { currency, symbol } = row.underlying;
  const sources = outcome?.sources ?? null;
  if (sources === null) {
    return (
      <Card anchor={anchorOf('sources')} title="Where it came from">
        <Txt size="row" colour="inkSoft">
          {outcome?.profit?.isFinal === true
            ? `Waits for the close of ${symbol} in the session of each fill.`
            : 'Told once the position is closed: by move, time, volatility, slippage and fees.'}
        </Txt>
      </Card>
    );
  }
  const caution = sourceCaution(sources, symbol);
  return (
    <Card anchor={anchorOf('sources')} title="Where it came from" subtitle={`In ${currency}; the steps add up exactly`}>
      <ProfitSteps
        expectedMean={outcome?.profit?.expectedMean ?? (sealed.forecast.atExit ?? sealed.forecast.atExpiry).mean.base}
        steps={stepsOf(sources)}
        realised={sources.realisedProfit}
        currency={currency}
      />
      {caution === null ? null : (
        <Txt size="note" colour="inkSoft">
          {caution}
        </Txt>
      )}
    </Card>
  );
}
