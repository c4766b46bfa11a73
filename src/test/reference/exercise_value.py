"""Worth of one right over given flows by quadrature: prints exercise-value.csv. Run: python3 exercise_value.py > exercise-value.csv"""
import random
import mpmath as mp

mp.mp.dps = 34
random.seed(23)


def log_discount(r, th, k, s, t):
    """Vasicek's curve by quadrature of its mean and variance integrals."""
    r, th, k, s, t = map(mp.mpf, (r, th, k, s, t))
    if t == 0:
        return mp.mpf(0)
    if s == 0 and r == th:
        return -r * t
    g = (lambda u: -mp.expm1(-k * u) / k) if k != 0 else (lambda u: u)
    cuts = mp.linspace(0, t, int(2 + abs(k) * t / 4))
    return -mp.quad(lambda u: r * mp.exp(-k * u) - th * mp.expm1(-k * u), cuts) + s * s / 2 * mp.quad(lambda u: g(u) ** 2, cuts)


def setup(curve, a, sigma, decision, times, amounts):
    a, sigma, S = mp.mpf(a), mp.mpf(sigma), mp.mpf(decision)
    y = sigma ** 2 * (-mp.expm1(-2 * a * S) / (2 * a) if a != 0 else S)
    w = [mp.mpf(c) * mp.exp(log_discount(*curve, t)) for c, t in zip(amounts, times)]
    b = [mp.sqrt(y) * (-mp.expm1(-a * (t - S)) / a if a != 0 else t - S) for t in map(mp.mpf, times)]
    return w, b


def value(w, b):
    f = lambda z: mp.fsum(wi * mp.exp(-bi * z - bi * bi / 2) for wi, bi in zip(w, b))
    if max(b) == 0:
        return max(mp.mpf(0), f(0))
    fl = lambda z, ws=[float(x) for x in w], bs=[float(x) for x in b]: sum(u * 2.718281828459045 ** (-v * z - v * v / 2) for u, v in zip(ws, bs))
    low, high, n = -13 - max(b), mp.mpf(13), 3000
    grid = [low + (high - low) * i / n for i in range(n + 1)]
    signs = [fl(float(z)) > 0 for z in grid]
    cuts = [low]
    for i in range(n):
        if signs[i] != signs[i + 1]:
            cuts.append(mp.findroot(f, (grid[i], grid[i + 1]), solver="anderson", tol=1e-50))
    cuts.append(high)
    total = mp.mpf(0)
    for l, h in zip(cuts, cuts[1:]):
        if f((l + h) / 2) > 0:
            total += mp.quad(lambda z: f(z) * mp.npdf(z), mp.linspace(l, h, int(3 + (h - l) / 4)))
    return total


print("# Worth of a right to exchange: E of the positive part of flows seen from the decision, by quadrature.")
print("# source: mpmath %s quadrature between the roots, 34 digits" % mp.__version__)
print("# maker: src/test/reference/exercise_value.py")
print("# tolerance.face: 3e-15")
print("short_rate,long_run_mean,curve_reversion,curve_volatility,mean_reversion,volatility,decision,times,amounts,value")


def show(curve, a, sigma, decision, times, amounts):
    w, b = setup(curve, a, sigma, decision, times, amounts)
    print(",".join([*map(repr, curve), repr(a), repr(sigma), repr(decision), ";".join(map(repr, times)), ";".join(map(repr, amounts)),
                    mp.nstr(value(w, b), 25, strip_zeros=False)]))


def random_case(kind):
    kappa = random.choice([1e-9, 1e-4, 0.03, 0.2, 1.0, 2.0])
    sigma = random.choice([1e-6, 0.002, 0.01, 0.05])
    if random.random() < 0.5:
        curve = (random.uniform(-0.01, 0.08), random.uniform(-0.01, 0.08), kappa, min(sigma, 0.02))
        sigma = curve[3]
    else:
        curve = (0.03, 0.03, 0.0, 0.0)
    S = random.choice([0.25, 1.0, 5.0, 20.0])
    n = {"zero": 1, "bond": random.choice([5, 20]), "mixed": random.choice([4, 9])}[kind]
    gap = random.choice([0.5, 1.0])
    times = [S + gap * (i + 1) for i in range(n)]
    amounts = [random.choice([1.0, 2.5, 4.0]) for _ in range(n)]
    amounts[-1] += 100.0
    if kind == "mixed":
        amounts = [c * (-1) ** i * random.choice([1.0, 10.0]) for i, c in enumerate(amounts)]
    w, b = setup(curve, kappa, sigma, S, times, amounts)
    z = random.choice([0.0, 0.5, -1.0, 3.0, -3.0, 5.0, -5.0])
    strike = float(mp.fsum(wi * mp.exp(-bi * z - bi * bi / 2) for wi, bi in zip(w, b)) / mp.exp(log_discount(*curve, S)))
    side = random.choice([1.0, -1.0])
    show(curve, kappa, sigma, S, [S] + times, [-side * strike] + [side * c for c in amounts])


flat = (0.03, 0.03, 0.0, 0.0)
show(flat, 0.05, 0.01, 1.0, [1.0, 5.0], [5.0, 100.0])
show(flat, 0.05, 0.01, 1.0, [1.0, 5.0], [-80.0, 100.0])
show(flat, 0.0, 0.01, 1.0, [1.0, 5.0], [-90.0, 100.0])
show(flat, 0.05, 0.0, 1.0, [1.0, 5.0], [-80.0, 100.0])
show(flat, -0.03, 0.01, 2.0, [2.0, 3.0, 10.0, 20.0], [10.0, -60.0, 100.0, -50.0])
for kind in ["zero"] * 25 + ["bond"] * 25 + ["mixed"] * 25:
    random_case(kind)
