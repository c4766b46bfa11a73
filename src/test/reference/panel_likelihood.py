"""Log-likelihood of a small panel of yields under Vasicek, as one dense normal density at 80 digits.

The filter goes row by row; this writes down mean and covariance of all cells at once (integrals by
quadrature) and takes the determinant. Writes
src/test/resources/ebbline/fitting/panel/panel-likelihood.csv and panel-small.csv.

Run from the project's root: python3 src/test/reference/panel_likelihood.py
"""
import mpmath
from mpmath import mp, mpf

mp.dps = 80
TAUS = ["0.25", "2", "10"]
STEPS = [1, 1, 2, 1, 3, 1, 1, 1, 6, 1, 1]
times = [mpf(0)]
for s in STEPS:
    times.append(times[-1] + mpf(s) / 12)
cells = []
for i in range(12):
    row = []
    for j in range(3):
        value = mpf(400 + 37 * ((7 * i + 3 * j) % 11) - 20 * i + 60 * j) / 10000
        row.append(None if (i * 3 + j) % 7 == 5 else value)
    cells.append(row)


def yield_parts(k, n, s, tau):
    g = lambda t: -mpmath.expm1(-k * t) / k
    load = g(tau) / tau
    mean = mpmath.quad(lambda t: n * g(t) - s**2 * g(t) ** 2 / 2, [0, tau]) / tau
    return mean, load


def loglik(k, theta, s, lam, h):
    parts = [yield_parts(k, k * theta - lam * s, s, mpf(t)) for t in TAUS]
    index = [(i, j) for i in range(12) for j in range(3) if cells[i][j] is not None]
    size = len(index)
    cov = mpmath.matrix(size, size)
    dev = mpmath.matrix(size, 1)
    for a, (i, j) in enumerate(index):
        dev[a] = cells[i][j] - parts[j][0] - parts[j][1] * theta
        for b, (p, q) in enumerate(index):
            cov[a, b] = parts[j][1] * parts[q][1] * s**2 / (2 * k) * mpmath.exp(-k * abs(times[i] - times[p]))
            if a == b:
                cov[a, b] += h**2
    chol = mpmath.cholesky(cov)
    z = mpmath.lu_solve(chol, dev)
    return -(size * mpmath.log(2 * mpmath.pi) + sum(x * x for x in z)) / 2 - sum(
        mpmath.log(chol[a, a]) for a in range(size))


FOLDER = "src/test/resources/ebbline/fitting/panel/"
HEAD = ("# source: dense normal density of all cells, integrals by quadrature, 80 digits\n"
        "# maker: src/test/reference/panel_likelihood.py, mpmath %s\n" % mpmath.__version__)
with open(FOLDER + "panel-small.csv", "w") as out:
    out.write("# An invented panel with gaps and uneven steps, decimals; time in twelfths of a year.\n" + HEAD)
    out.write("twelfths," + ",".join(TAUS) + "\n")
    for i in range(12):
        out.write("%d," % int(mpmath.nint(times[i] * 12)) + ",".join(
            "" if c is None else mpmath.nstr(c, 6) for c in cells[i]) + "\n")
with open(FOLDER + "panel-likelihood.csv", "w") as out:
    out.write("# Log-likelihood of panel-small.csv under Vasicek.\n" + HEAD + "# tolerance.absolute: 2e-13\n")
    out.write("mean_reversion,long_run_mean,volatility,market_price_of_risk,measurement_sd,log_likelihood\n")
    for k in ["1e-6", "1e-4", "0.01", "0.2", "3"]:
        for lam, h in [("-0.3", "0.004"), ("0.2", "0.02")]:
            value = loglik(mpf(k), mpf("0.045"), mpf("0.011"), mpf(lam), mpf(h))
            out.write(",".join([k, "0.045", "0.011", lam, h, mpmath.nstr(value, 25)]) + "\n")
