// Answers option cases with another implementation (npm @quantlib/ql, a port of QuantLib's BlackCalculator): JSON in, JSON out.
// A process of its own, because the package is one large ES module.
import { readFileSync } from 'node:fs';
import { BlackCalculator, Option } from '@quantlib/ql';

const cases = JSON.parse(readFileSync(0, 'utf8'));
const answers = cases.map(({ type, spotPrice, strikePrice, totalDeviation, years, ratePerYear, dividendYield }) => {
  const forward = spotPrice * Math.exp((ratePerYear - dividendYield) * years);
  const discount = Math.exp(-ratePerYear * years);
  const kind = type === 'call' ? Option.Type.Call : Option.Type.Put;
  const calculator = new BlackCalculator().init2(kind, strikePrice, forward, totalDeviation, discount);
  return {
    price: calculator.value(),
    delta: calculator.delta(spotPrice),
    gamma: calculator.gamma(spotPrice),
    // The port gives the call's probability for both kinds.
    oddsInTheMoney: type === 'call' ? calculator.itmCashProbability() : 1 - calculator.itmCashProbability(),
  };
});
process.stdout.write(JSON.stringify(answers));
