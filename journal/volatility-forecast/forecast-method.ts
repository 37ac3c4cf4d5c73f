/** Ways to forecast volatility, the default first; then those it is compared with. */
export const forecastMethods = [
  'pooled',
  'pooled-zero-centre',
  'averages',
  'garch-calibrated',
  'garch-student',
  'garch-normal',
  'filtered-history',
  'ewma-94',
  'window-63',
] as const;
export type ForecastMethod = (typeof forecastMethods)[number];

/** The method used where none is named: docs/decisions/0011-forecast-method.md says why. */
export const defaultForecastMethod: ForecastMethod = 'pooled';

/** What each method does, in two sentences for who trades by it. */
export const forecastMethodExplanations: Readonly<Record<ForecastMethod, string>> = {
  pooled:
    'Volatility is a blend of averages of squared moves over 4 to 512 sessions and of a GARCH model fitted to this series; how much of each, how wide and how fat-tailed is decided by how well each choice would have foretold the past of this series over as many sessions. The centre is the mean move so far, drawn toward 0 as if four years without a trend had come before.',
  'pooled-zero-centre':
    'The same blend of averages over 4 to 512 sessions and of a GARCH model, weighed by how well each choice would have foretold the past of this series. The centre is 0: no trend is assumed.',
  averages:
    'Volatility is a weighted average of fifteen averages of squared moves that fade over 4 to 512 sessions, without a fit. Width, tails and centre are set as in the pooled method.',
  'garch-calibrated':
    'A GARCH(1,1) model fitted to this series says how fast volatility reacts and how fast it returns to its mean. Width, tails and centre are set as in the pooled method.',
  'garch-student':
    'A GARCH(1,1) model with fat-tailed moves is fitted to this series by maximum likelihood: tomorrow is a Student law, longer horizons are normal with the summed variance. The centre is 0.',
  'garch-normal':
    'A GARCH(1,1) model with normal moves is fitted to this series by maximum likelihood: every horizon is normal with the summed variance. The centre is 0.',
  'filtered-history':
    'Past moves over the horizon, each divided by the volatility forecast of its day, are multiplied by the forecast of today and smoothed. So the shape of the law is that of the past of this series, the width that of now.',
  'ewma-94':
    'Squared moves are averaged with weights that fall by 6 % a session. The law is normal about 0 and its variance grows with the number of sessions.',
  'window-63':
    'The sample deviation of the last 63 moves, about their mean. The law is normal about 0 and its variance grows with the number of sessions.',
};
