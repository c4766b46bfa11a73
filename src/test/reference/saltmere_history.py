"""Makes examples/saltmere-rates.csv and examples/saltmere-panel.csv: invented, exact Vasicek draws.

The seed is one of many, chosen so that the last rate lies near the short end of the Saltmere curve and
the history shows its reversion; a history drawn at random often does not.

Run from the project's root: python3 src/test/reference/saltmere_history.py
"""

import calendar
import math
import random

KAPPA, THETA, SIGMA, RISK, NOISE = 0.5, 0.028, 0.009, -0.25, 0.0006
SEED = 14
MATURITIES = [("3M", 0.25), ("1Y", 1.0), ("3Y", 3.0), ("5Y", 5.0), ("10Y", 10.0), ("20Y", 20.0)]
STEP = 1 / 12


def path(rng, n, start):
    slope = math.exp(-KAPPA * STEP)
    sd = SIGMA * math.sqrt((1 - slope * slope) / (2 * KAPPA))
    rates = [start]
    for _ in range(n - 1):
        rates.append(THETA + slope * (rates[-1] - THETA) + sd * rng.gauss(0, 1))
    return rates


def month_end(i, last=(2026, 11), count=1):
    month = last[0] * 12 + last[1] - 1 - (count - 1 - i)
    year, month = divmod(month, 12)
    return f"{year}-{month + 1:02d}-{calendar.monthrange(year, month + 1)[1]:02d}"


def zero(rate, tau):
    mean = THETA - RISK * SIGMA / KAPPA
    g = (1 - math.exp(-KAPPA * tau)) / KAPPA
    square = (tau - 2 * g + (1 - math.exp(-2 * KAPPA * tau)) / (2 * KAPPA)) / KAPPA**2
    return (mean * (tau - g) + rate * g - 0.5 * SIGMA**2 * square) / tau


def main():
    rng = random.Random(SEED)
    n = 300
    rates = path(rng, n, 0.041)
    head = "# source: invented, drawn by src/test/reference/saltmere_history.py, " + f"seed {SEED}\n"
    with open("examples/saltmere-rates.csv", "w", newline="\n") as out:
        out.write(head + "# step: 1M\ndate,rate_pct\n")
        for i, rate in enumerate(rates):
            cell = f"{100 * rate:.4f}"
            out.write(f"{month_end(i, count=n)},{cell}\n")
    with open("examples/saltmere-panel.csv", "w", newline="\n") as out:
        out.write(head + "# step: 1M\ndate," + ",".join(m + "_pct" for m, _ in MATURITIES) + "\n")
        m = 120
        for i, rate in enumerate(rates[-m:]):
            cells = []
            for j, (_, tau) in enumerate(MATURITIES):
                value = zero(rate, tau) + NOISE * rng.gauss(0, 1)
                cells.append("" if (i * 7 + j) % 61 == 5 else f"{100 * value:.4f}")
            out.write(f"{month_end(i, count=m)}," + ",".join(cells) + "\n")


main()
