"""Svensson and Nelson-Siegel zero rates by quadrature of their forwards, not by the closed form."""

import pathlib

import mpmath as mp

mp.mp.dps = 50

SETS = [
    # Gurkaynak, Sack & Wright, Fed data file feds200628.csv, 2013-10-08
    ("0.0424093854440214", "-0.040192010570678", "-0.0593306072006047", "0.0243959006657427",
     "2.29299258787334", "5.96162847847292"),
    ("0.03", "-0.035", "0.02", "0", "1.5", "1.5"),
    ("-0.005", "0.001", "-0.04", "0.06", "0.25", "12"),
    ("0.05", "0.02", "-0.3", "0.3", "4", "4.001"),
]
TIMES = ["1e-9", "0.0027", "0.25", "1", "2.29299258787334", "5", "10", "30", "60", "200"]


def forward(b, t):
    u, v = t / b[4], t / b[5]
    return b[0] + (b[1] + b[2] * u) * mp.exp(-u) + b[3] * v * mp.exp(-v)


rows = []
for names in SETS:
    # The doubles that Java reads, exactly.
    b = [mp.mpf(float(x)) for x in names]
    for name in TIMES:
        t = mp.mpf(float(name))
        cuts = [mp.mpf(0)] + [c for c in (1, 5, 20, 60) if c < t] + [t]
        integral = mp.quad(lambda s: forward(b, s), cuts)
        slope = mp.diff(lambda s: forward(b, s), t)
        rows.append(",".join(names) + f",{name},"
                    + ",".join(mp.nstr(x, 25) for x in (integral / t, forward(b, t), slope)))

path = pathlib.Path(__file__).parents[1] / "resources/ebbline/curve/svensson.csv"
path.parent.mkdir(parents=True, exist_ok=True)
path.write_text(
    "# Zero rates, forwards and slopes of parametric curves; zeros by quadrature of the forward.\n"
    f"# source: mpmath {mp.__version__} quadrature and differences, 50 digits\n"
    "# maker: src/test/reference/svensson.py\n"
    "# tolerance.absolute: 1e-16\n"
    "beta0,beta1,beta2,beta3,tau1,tau2,time,zero,forward,slope\n" + "\n".join(rows) + "\n")
