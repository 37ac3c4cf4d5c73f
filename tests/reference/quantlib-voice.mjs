// Answers option cases with another implementation (npm @quantlib/ql, a port of QuantLib's BlackCalculator): JSON in, JSON out.
// A process of its own, because the package is one large ES module.
import { readFileSync } from 'node:fs';
import { BlackCalculator, Option } from '@quantlib/ql';

const cases = JSON.parse(readFileSync(0, 'utf8'));

function calculatorOf({ type, spotPrice, strikePrice, dailyVolatility, ratePerYear, dividendYield }, sessions, years) {
  const forward = spotPrice * Math.exp((ratePerYear - dividendYield) * years);
  const discount = Math.exp(-ratePerYear * years);
  const kind = type === 'call' ? Option.Type.Call : Option.Type.Put;
  return new BlackCalculator().init2(kind, strikePrice, forward, dailyVolatility * Math.sqrt(sessions), discount);
}

const answers = cases.map((option) => {
  const { type, spotPrice, sessions, years, yearsPerNextSession } = option;
  const now = calculatorOf(option, sessions, years);
  const direction = type === 'call' ? 1 : -1;
  const priceLater =
    sessions > 1
      ? calculatorOf(option, sessions - 1, Math.max(years - yearsPerNextSession, 0)).value()
      : Math.max(direction * (spotPrice - option.strikePrice), 0);
  return {
    price: now.value(),
    delta: now.delta(spotPrice),
    gamma: now.gamma(spotPrice),
    // Its volatility is per square root of the time it is given: sessions for vega, years for rho.
    vegaPerDailyPoint: now.vega(sessions) / 100,
    thetaPerSession: priceLater - now.value(),
    rhoPerPercent: now.rho(years) / 100,
    // The port gives the call's probability for both kinds.
    oddsInTheMoney: type === 'call' ? now.itmCashProbability() : 1 - now.itmCashProbability(),
  };
});
process.stdout.write(JSON.stringify(answers));
