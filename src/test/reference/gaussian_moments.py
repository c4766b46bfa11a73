"""Moments of the Gaussian state and its integral by nested definition: prints gaussian-moments.csv."""
import mpmath as mp

mp.mp.dps = 40
STEPS = {"constant": ([], [0.012]), "steps": ([0.7, 2.5, 11.0], [0.005, 0.02, 0.0, 0.013])}


def moments(a, name, s, t):
    ends, values = STEPS[name]
    a, s, t = mp.mpf(a), mp.mpf(s), mp.mpf(t)
    g = (lambda u: -mp.expm1(-a * u) / a) if a != 0 else (lambda u: u)

    def over(f, lo, hi):
        """Integral of sigma(u)^2 f(u), split where sigma jumps."""
        total, start = mp.mpf(0), mp.mpf(0)
        for e, v in zip(list(map(mp.mpf, ends)) + [mp.inf], values):
            b, c = max(lo, start), min(hi, e)
            if b < c:
                total += mp.mpf(v) ** 2 * mp.quad(f, mp.linspace(b, c, int(2 + abs(a) * (c - b) / 4)))
            start = e
        return total

    y = over(lambda u: mp.exp(-2 * a * (s - u)), 0, s)
    var = over(lambda u: mp.exp(-2 * a * (t - u)), s, t)
    cov = over(lambda u: mp.exp(-a * (t - u)) * g(t - u), s, t)
    ivar = over(lambda u: g(t - u) ** 2, s, t)
    mean = mp.quad(lambda u: mp.exp(-a * (t - u)) * y * mp.exp(-2 * a * (u - s)), [s, t]) + cov
    imean = mp.quad(lambda u: g(t - u) * y * mp.exp(-2 * a * (u - s)), [s, t]) + ivar / 2
    zvar = over(lambda u: mp.exp(2 * a * u), s, t)
    return mean, var, imean, ivar, cov, zvar


print("# Moments over a step of the Gaussian short-rate state and its integral, each by quadrature.")
print("# source: mpmath %s quadrature, 40 digits" % mp.__version__)
print("# maker: src/test/reference/gaussian_moments.py")
print("# tolerance.relative: 3e-15")
print("mean_reversion,volatility,from,to,state_mean,state_variance,integral_mean,integral_variance,covariance,martingale_variance")
for a in (-0.05, -1e-9, 0.0, 1e-300, 1e-9, 1e-4, 0.03, 0.2, 1.0, 5.0):
    for name in STEPS:
        for s, t in ((0.0, 0.5), (0.0, 20.0), (0.7, 2.5), (1.0, 1.0625), (3.0, 30.0), (0.1, 11.5)):
            print(",".join([repr(a), name, repr(s), repr(t)] + [mp.nstr(v, 25, strip_zeros=False) for v in moments(a, name, s, t)]))
