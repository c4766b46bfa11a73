"""Zero bonds under Vasicek by quadrature: prints vasicek-bond.csv. Run: python3 vasicek_bond.py > vasicek-bond.csv"""
import itertools
import random
import mpmath as mp

mp.mp.dps = 50
random.seed(11)


def price(kappa, theta, sigma, r, tau):
    """E exp(-int r): mean and variance of the integral, each by Gauss-Legendre quadrature of its own definition."""
    k, th, s, r0, T = map(mp.mpf, (kappa, theta, sigma, r, tau))
    g = (lambda u: -mp.expm1(-k * u) / k) if k != 0 else (lambda u: u)
    cuts = mp.linspace(0, T, int(2 + abs(k) * T / 4))
    mean = mp.quad(lambda u: r0 * mp.exp(-k * u) - th * mp.expm1(-k * u), cuts)
    var = s * s * mp.quad(lambda u: g(u) ** 2, cuts)
    return mp.exp(-mean + var / 2)


print("# Zero-bond prices under Vasicek, by quadrature of the mean and the variance of the integrated rate.")
print("# source: mpmath %s quadrature, 50 digits" % mp.__version__)
print("# maker: src/test/reference/vasicek_bond.py")
print("# tolerance.relative: 5e-15")
print("mean_reversion,long_run_mean,volatility,short_rate,maturity,price")
kappas = [-0.05, -1e-3, -1e-9, -1e-300, 0.0, 1e-300, 1e-9, 1e-6, 1e-3, 0.0999, 0.1, 0.1001, 0.3, 1.0, 5.0]
rows = [(k, th, s, r, t) for k, (th, s, r), t in itertools.product(
    kappas, [(0.1, 0.03, -0.1), (-0.1, 0.03, 0.1), (0.05, 0.01, 0.03), (0.1, 0.0, 0.1)], [0.0027, 1.0, 10.0, 50.0])]
for _ in range(200):
    k = random.choice([random.uniform(-0.05, 5), 10 ** random.uniform(-12, 0)])
    rows.append((k, random.uniform(-0.1, 0.1), random.uniform(0, 0.03), random.uniform(-0.1, 0.1), random.uniform(0, 50)))
for row in rows:
    print(",".join(map(repr, row)) + "," + mp.nstr(price(*row), 25, strip_zeros=False))
