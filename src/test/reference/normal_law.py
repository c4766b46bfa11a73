"""Standard normal law in 60 digits: prints normal-law.csv. Run: python3 normal_law.py > normal-law.csv"""
import random
import mpmath as mp

mp.mp.dps = 60
random.seed(7)
xs = [-38.0, -37.5, -30.0, -20.0625, -10.0, -5.0, -2.0, -1.0, -0.5, -1e-3, -1e-300, 0.0, 1e-9, 0.3, 1.0, 2.5, 5.0, 7.99, 8.0]
xs += [random.uniform(-38, 8) for _ in range(300)] + [random.uniform(-2, 2) for _ in range(100)]
print("# Standard normal distribution function, density and log distribution function.")
print("# source: the error function of mpmath %s at 60 digits" % mp.__version__)
print("# maker: src/test/reference/normal_law.py")
print("# tolerance.ulp: 3")
print("x,cdf,density,log_cdf")
for x in sorted(xs):
    m = mp.mpf(x)
    cdf = mp.erfc(-m / mp.sqrt(2)) / 2
    print(",".join([repr(x)] + [mp.nstr(v, 25, strip_zeros=False) for v in (cdf, mp.npdf(m), mp.log(cdf))]))
