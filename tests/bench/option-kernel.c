// Price, five Greeks and odds of the options of tests/bench/random-options.ts, the plain way: the closed form with the error
// function of the C library, theta as a full repricing one session later. Prints options a second and the sum of all figures.
#define _POSIX_C_SOURCE 199309L
#include <math.h>
#include <stdint.h>
#include <stdio.h>
#include <stdlib.h>
#include <time.h>

#define COUNT 1024

static double direction[COUNT], spot_price[COUNT], strike_price[COUNT], daily_volatility[COUNT], sessions[COUNT];
static double years[COUNT], rate_per_year[COUNT], dividend_yield[COUNT];
static double price[COUNT], delta[COUNT], gamma_[COUNT], vega[COUNT], theta[COUNT], rho[COUNT], odds[COUNT];

static uint32_t state = 20261201u;

static double uniform(void) {
  state = state * 1664525u + 1013904223u;
  return state / 4294967296.0;
}

static double seconds(void) {
  struct timespec now;
  clock_gettime(CLOCK_MONOTONIC, &now);
  return now.tv_sec + now.tv_nsec * 1e-9;
}

static double upper_tail(double x) { return 0.5 * erfc(x * 0.70710678118654752); }

static void value_all(void) {
  for (int i = 0; i < COUNT; i += 1) {
    double sign = direction[i], carry = exp(-dividend_yield[i] * years[i]);
    double spot = spot_price[i] * carry, strike = strike_price[i] * exp(-rate_per_year[i] * years[i]);
    double root = sqrt(sessions[i]), deviation = daily_volatility[i] * root, moneyness = log(spot / strike);
    double d1 = moneyness / deviation + deviation / 2, d2 = d1 - deviation;
    double hedge = upper_tail(-sign * d1), chance = upper_tail(-sign * d2);
    double density = spot * exp(-d1 * d1 / 2) * 0.39894228040143268;
    double now = sign * (spot * hedge - strike * chance), later;
    double elapsed = sessions[i] <= 1 ? years[i] : fmin(1 / 365.0, years[i]);
    double spot_later = spot * exp(dividend_yield[i] * elapsed), strike_later = strike * exp(rate_per_year[i] * elapsed);
    if (sessions[i] <= 1) {
      later = fmax(sign * (spot_later - strike_later), 0);
    } else {
      double left = daily_volatility[i] * sqrt(sessions[i] - 1);
      double l1 = (moneyness + (dividend_yield[i] - rate_per_year[i]) * elapsed) / left + left / 2, l2 = l1 - left;
      later = sign * (spot_later * upper_tail(-sign * l1) - strike_later * upper_tail(-sign * l2));
    }
    price[i] = now;
    delta[i] = sign * carry * hedge;
    gamma_[i] = density / (spot_price[i] * spot_price[i] * deviation);
    vega[i] = density * root * 0.01;
    theta[i] = later - now;
    rho[i] = sign * years[i] * strike * chance * 0.01;
    odds[i] = chance;
  }
}

int main(int argc, char **argv) {
  double limit = argc > 1 ? atof(argv[1]) : 0.06, start, elapsed, sum = 0;
  long done = 0;
  for (int i = 0; i < COUNT; i += 1) {
    direction[i] = i % 2 == 0 ? 1 : -1;
    daily_volatility[i] = 0.005 + 0.045 * uniform();
    sessions[i] = 0.1 + 44.9 * uniform();
    spot_price[i] = 20 + 480 * uniform();
    strike_price[i] = spot_price[i] * exp((6 * uniform() - 3) * daily_volatility[i] * sqrt(sessions[i]));
    years[i] = sessions[i] / 252;
    rate_per_year[i] = 0.05 * uniform();
  }
  value_all();
  start = seconds();
  do {
    for (int round = 0; round < 16; round += 1) value_all();
    done += 16L * COUNT;
    elapsed = seconds() - start;
  } while (elapsed < limit);
  for (int i = 0; i < COUNT; i += 1) sum += price[i] + delta[i] + gamma_[i] + vega[i] + theta[i] + rho[i] + odds[i];
  printf("%.9g %.17g\n", done / elapsed, sum);
  return 0;
}
