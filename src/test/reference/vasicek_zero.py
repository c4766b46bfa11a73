"""Vasicek zero rates and their slopes, by quadrature of the variance integral and numerical
differentiation at 50 digits. Writes src/test/resources/ebbline/fitting/vasicek-zero.csv.

Run from the project's root: python3 src/test/reference/vasicek_zero.py
"""
import random
import mpmath
from mpmath import mp, mpf

mp.dps = 50


def zero(kappa, b, sigma, r0, tau):
    # dr = (b - kappa (r - r0)) dt + sigma dW; -ln P = E int r - Var(int r)/2, by quadrature.
    n = max(1, int(abs(kappa) * tau) + 1)
    knots = [tau * i / n for i in range(n + 1)]
    g = (lambda t: -mpmath.expm1(-kappa * t) / kappa) if kappa else (lambda t: t)
    drift = mpmath.quad(g, knots)
    variance = mpmath.quad(lambda t: g(t) ** 2, knots)
    return r0 + b * drift / tau - sigma**2 * variance / (2 * tau)


random.seed(7)
rows = []
for kappa in ["-0.3", "-0.05", "-1e-9", "0", "1e-12", "1e-6", "1e-3", "0.02", "0.1", "0.5", "2", "9"]:
    for tau in ["0.01", "0.99", "1.01", "5", "30", "100"]:
        k, t = mpf(kappa), mpf(tau)
        b = mpf("%.6f" % random.uniform(-0.02, 0.02))
        s = mpf("%.6f" % random.uniform(0.001, 0.03))
        r = mpf("%.6f" % random.uniform(-0.02, 0.1))
        z = zero(k, b, s, r, t)
        dk = mpmath.diff(lambda q: zero(q, b, s, r, t), k, h=mpf(10) ** -15) if k else (
            zero(mpf(10) ** -16, b, s, r, t) - zero(-mpf(10) ** -16, b, s, r, t)) / (2 * mpf(10) ** -16)
        db = zero(k, mpf(1), mpf(0), mpf(0), t)
        ds = 2 * (zero(k, mpf(0), mpf(1), mpf(0), t)) * s
        rows.append([kappa, mpmath.nstr(b, 8), mpmath.nstr(s, 8), mpmath.nstr(r, 8), tau]
                    + [mpmath.nstr(x, 20) for x in (z, dk, db, ds)])
with open("src/test/resources/ebbline/fitting/vasicek-zero.csv", "w") as out:
    out.write("# Vasicek zero rates and their slopes in mean reversion, drift today and volatility.\n")
    out.write("# source: quadrature of mean and variance of the integrated rate, 50 digits\n")
    out.write("# maker: src/test/reference/vasicek_zero.py, mpmath %s\n" % mpmath.__version__)
    out.write("# tolerance.rate: 2e-15\n# tolerance.slope: 2e-15\n")
    out.write("mean_reversion,drift,volatility,short_rate,time,zero,by_mean_reversion,by_drift,by_volatility\n")
    for row in rows:
        out.write(",".join(row) + "\n")
