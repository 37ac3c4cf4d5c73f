"""Writes normal-60-digits.json: tails, densities and quantiles of the standard normal distribution, to 60 digits."""
import json
import random
from pathlib import Path

from mpmath import erfc, exp, findroot, log, mp, mpf, nstr, pi, sqrt

SEED = 20261201
mp.dps = 60
random.seed(SEED)


def upper_tail(x):
    return erfc(x / sqrt(2)) / 2


def number(value):
    return float(nstr(value, 20))


points = [-37.5, -8.3, -5.66, -1.0, -0.67448975, 0.0, 1e-12, 0.5, 0.67448975, 1.0, 2.0, 3.0, 5.0, 5.65, 5.66, 6.0, 7.5, 8.0]
points += [10.0, 15.0, 20.0, 26.0, 30.0, 35.0, 37.0]
points += [round(random.uniform(-9, 37), 6) for _ in range(100)]
tails = [{"x": x, "upperTail": number(upper_tail(mpf(x))), "density": number(exp(-mpf(x) ** 2 / 2) / sqrt(2 * pi))} for x in points]

probabilities = [1e-300, 1e-200, 1e-100, 1e-50, 1e-20, 1e-12, 1e-8, 1e-4, 0.001, 0.01, 0.025, 0.05, 0.1, 0.25, 0.4, 0.499]
probabilities += [0.501, 0.6, 0.75, 0.9, 0.975, 0.99, 0.999, 0.9999, 1 - 1e-8, 1 - 1e-12]
quantiles = []
for p in probabilities:
    tail = min(mpf(p), 1 - mpf(p))
    start = -sqrt(-2 * log(tail)) if tail < 0.1 else (tail - mpf(1) / 2) * sqrt(2 * pi)
    x = findroot(lambda v: log(upper_tail(-v)) - log(tail), start)
    quantiles.append({"probability": p, "x": number(x if p < 0.5 else -x)})

content = {
    "source": "closed forms in mpmath at 60 digits, rounded to doubles",
    "generatedBy": "tests/journal/distributions/normal-60-digits.py",
    "seed": SEED,
    "tails": tails,
    "quantiles": quantiles,
}
lines = json.dumps(content).replace('[{', '[\n{').replace('}, {', '},\n{').replace('}]', '}\n]')
Path(__file__).with_suffix(".json").write_text(lines + "\n")
