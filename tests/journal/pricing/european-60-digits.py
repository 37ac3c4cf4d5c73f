"""Writes european-60-digits.json: prices, Greeks and odds of European options on two clocks, to 60 digits."""
import json
import random
from pathlib import Path

from mpmath import erfc, exp, log, mp, mpf, nstr, pi, sqrt

SEED = 20261201
mp.dps = 60
random.seed(SEED)
ONE_DAY = mpf(1.0 / 365.0)


def upper(x):
    return erfc(x / sqrt(2)) / 2


def number(value):
    return float(nstr(value, 20))


def value_of(kind, spot, strike, volatility, sessions, years, rate, dividend):
    sign = 1 if kind == "call" else -1
    present_spot = spot * exp(-dividend * years)
    present_strike = strike * exp(-rate * years)
    if volatility == 0 or sessions == 0:
        return {"price": max(sign * (present_spot - present_strike), mpf(0))}
    deviation = volatility * sqrt(sessions)
    d1 = log(present_spot / present_strike) / deviation + deviation / 2
    d2 = d1 - deviation
    density = exp(-d1 * d1 / 2) / sqrt(2 * pi)
    hedge = upper(-sign * d1)
    odds = upper(-sign * d2)
    return {
        "price": sign * (present_spot * hedge - present_strike * odds),
        "delta": sign * exp(-dividend * years) * hedge,
        "gamma": exp(-dividend * years) * density / (spot * deviation),
        "vegaPerDailyPoint": present_spot * density * sqrt(sessions) / 100,
        "rhoPerPercent": sign * years * present_strike * odds / 100,
        "oddsInTheMoney": odds,
        "deviationsOut": max(abs(d1), abs(d2)),
    }


def case_of(kind, spot, strike, volatility, sessions, years, rate, dividend):
    exact = [mpf(x) for x in (spot, strike, volatility, sessions, years, rate, dividend)]
    now = value_of(kind, *exact)
    exact_years = exact[4]
    if sessions <= 1:
        later_sessions, later_years = mpf(0), mpf(0)
    else:
        later_sessions, later_years = exact[3] - 1, max(exact_years - ONE_DAY, mpf(0))
    later = value_of(kind, exact[0], exact[1], exact[2], later_sessions, later_years, exact[5], exact[6])
    now["thetaPerSession"] = later["price"] - now["price"]
    deviations_out = now.pop("deviationsOut")
    option = {
        "type": kind,
        "spotPrice": spot,
        "strikePrice": strike,
        "dailyVolatility": volatility,
        "sessions": sessions,
        "years": years,
        "ratePerYear": rate,
        "dividendYield": dividend,
    }
    return {"option": option, "deviationsOut": round(float(deviations_out), 3), "value": {name: number(x) for name, x in now.items()}}


def random_case(sessions, volatility, deviations):
    spot = random.uniform(5, 500)
    deviation = volatility * sessions**0.5
    strike = spot * float(exp(mpf(deviations * deviation)))
    years = sessions * random.uniform(0.6, 1.6) / 252
    return case_of(
        random.choice(["call", "put"]), spot, strike, volatility, sessions, years,
        random.uniform(-0.02, 0.08), random.choice([0.0, random.uniform(0, 0.05)]),
    )


cases = []
for sessions in (0.001, 0.01, 0.1, 0.5, 1.0, 1.001, 2.0, 5.0, 10.0, 21.0, 45.0):
    for _ in range(6):
        cases.append(random_case(sessions, random.uniform(0.003, 0.06), random.uniform(-4, 4)))
    cases.append(random_case(sessions, random.uniform(0.003, 0.06), random.choice([-1, 1]) * random.uniform(5, 20)))
    cases.append(random_case(sessions, random.uniform(0.003, 0.06), random.choice([-1, 1]) * random.uniform(20, 36)))
# Hardly any deviation, much of it, and two years of a wild stock.
for volatility, sessions in ((1e-6, 1.0), (1e-9, 0.001), (1e-4, 0.001), (0.4, 10.0), (0.5, 30.0), (0.06, 500.0), (0.3, 252.0)):
    for _ in range(4):
        cases.append(random_case(sessions, volatility, random.uniform(-3, 3)))
# A tenth of a percent of a session before expiry, at the money and a tick away.
for strike in (99.95, 100.0, 100.05):
    for kind in ("call", "put"):
        cases.append(case_of(kind, 100.0, strike, 0.015, 0.001, 0.001 / 252, 0.04, 0.0))

content = {
    "source": "closed forms in mpmath at 60 digits, rounded to doubles; theta is a full repricing one session and 1/365 year later",
    "generatedBy": "tests/journal/pricing/european-60-digits.py",
    "seed": SEED,
    "cases": cases,
}
lines = json.dumps(content).replace('[{"option"', '[\n{"option"').replace('}, {"option"', '},\n{"option"').replace("}}]", "}}\n]")
Path(__file__).with_suffix(".json").write_text(lines + "\n")
