"""Volatilities that prices, taken as exact doubles, imply. Run: python3 implied_volatility.py > implied-volatility.csv"""
import random
import mpmath as mp

mp.mp.dps = 60
random.seed(5)

print("# source: bisection and secant on the price in mpmath %s, 60 digits" % mp.__version__)
print("# maker: src/test/reference/implied_volatility.py")
print("# tolerance.relative: 3e-14")
print("law,option,forward,strike,price,deviation")


def cdf(x):
    return mp.erfc(-x / mp.sqrt(2)) / 2


def black(sign, f, k, v):
    m = mp.log(f / k) / v
    return sign * (f * cdf(sign * (m + v / 2)) - k * cdf(sign * (m - v / 2)))


def bachelier(sign, f, k, s):
    d = sign * (f - k) / s
    return sign * (f - k) * cdf(d) + s * mp.npdf(d)


def implied(price, formula, guess):
    """The root in ln v of ln(price out of the money), or of ln(room) near the upper bound."""
    u = mp.log(guess)
    root = mp.findroot(lambda w: formula(mp.e ** w) - price, (u, u + mp.mpf("1e-6")), tol=mp.mpf(10) ** -100 * price ** 2, maxsteps=200)
    return mp.e ** root


def row(law, sign, f, k, v):
    formula = (lambda w: black(sign, f, k, w)) if law == "black" else (lambda w: bachelier(sign, f, k, w))
    price = float(formula(v))
    if price == float(max(0, sign * (f - k))):
        return  # the double holds no time value
    if not 1e-300 < price or not price < 1e300:
        return
    if law == "black" and price >= float(f if sign > 0 else k):
        return
    exact = implied(mp.mpf(price), formula, v)
    print("%s,%s,%r,%r,%r,%s" % (law, "call" if sign > 0 else "put", float(f), float(k), price, mp.nstr(exact, 20)))


count = 0
for law in ("black", "normal"):
    for _ in range(150):
        f = mp.mpf(round(random.uniform(0.001, 0.12), 4)) if random.random() < 0.7 else mp.mpf(random.uniform(1, 200))
        f = mp.mpf(float(f))
        v = mp.mpf(10) ** random.uniform(-6, 0.9)
        depth = random.choice([0, 1e-8, 1e-4, 0.1, 1, 3, 8, 20, 36]) * random.uniform(0.3, 1)
        sign = random.choice([1, -1])
        if law == "black":
            k = mp.mpf(float(f * mp.e ** (sign * depth * v)))
            if not mp.mpf("1e-8") < k < mp.mpf("1e12"):
                continue
            row(law, sign, f, k, v)
        else:
            s = mp.mpf(10) ** random.uniform(-7, -1)
            k = mp.mpf(float(f + sign * depth * s))
            row(law, sign, f, k, s)
    # In the money on figures whose differences are exact.
    for v in ("0.01", "0.2", "1.5"):
        row(law, 1, mp.mpf(1.5), mp.mpf(1.25), mp.mpf(v))
        row(law, -1, mp.mpf(1.25), mp.mpf(1.5), mp.mpf(v))
# Near the upper bound, where the room to it carries the volatility.
for v in (4, 8, 12, 16):
    for k in ("1", "0.5", "2", "1.0625"):
        row("black", 1, mp.mpf(1), mp.mpf(k), mp.mpf(v))
        row("black", -1, mp.mpf(1), mp.mpf(k), mp.mpf(v))
