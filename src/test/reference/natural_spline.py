"""The natural cubic spline in ln P by the full linear system of its coefficients, four a piece."""

import pathlib

import mpmath as mp

mp.mp.dps = 50

CURVES = {
    "even": (["1", "2", "3", "4", "5"], ["-0.02", "-0.045", "-0.068", "-0.1", "-0.13"]),
    "uneven": (["0.0027", "0.25", "0.5", "2", "10", "30"],
               ["-0.0001", "-0.009", "-0.016", "-0.07", "-0.3", "-0.75"]),
    "negative": (["0.5", "1", "7", "8"], ["0.003", "0.008", "0.02", "0.015"]),
    "two": (["1", "30"], ["-0.03", "-1.2"]),
}

rows = []
for label, (names, logs) in CURVES.items():
    t = [mp.mpf(0)] + [mp.mpf(float(x)) for x in names]
    y = [mp.mpf(0)] + [mp.mpf(float(x)) for x in logs]
    n = len(t) - 1
    a = mp.zeros(4 * n)
    b = mp.zeros(4 * n, 1)
    row = 0

    def put(piece, power, value):
        a[row, 4 * piece + power] += value

    for i in range(n):
        h = t[i + 1] - t[i]
        put(i, 0, 1)
        b[row] = y[i]
        row += 1
        for k in range(4):
            put(i, k, h**k)
        b[row] = y[i + 1]
        row += 1
        if i + 1 < n:
            for k in range(1, 4):
                put(i, k, k * h ** (k - 1))
            put(i + 1, 1, -1)
            row += 1
            put(i, 2, 2)
            put(i, 3, 6 * h)
            put(i + 1, 2, -2)
            row += 1
    put(0, 2, 2)
    row += 1
    put(n - 1, 2, 2)
    put(n - 1, 3, 6 * (t[n] - t[n - 1]))
    c = mp.lu_solve(a, b)
    ends = [mp.mpf(float(x)) for x in ("0.001", "0.1", "0.3", "0.75", "1", "1.9", "4.6", "7.2", "15", "29", "40")]
    for at in ends:
        i = max(k for k in range(n + 1) if t[k] <= at)
        if i < n:
            d = at - t[i]
            p = [c[4 * i + k] for k in range(4)]
            value = p[0] + d * (p[1] + d * (p[2] + d * p[3]))
            slope = p[1] + d * (2 * p[2] + d * 3 * p[3])
        else:
            h = t[n] - t[n - 1]
            p = [c[4 * (n - 1) + k] for k in range(4)]
            slope = p[1] + h * (2 * p[2] + h * 3 * p[3])
            value = y[n] + slope * (at - t[n])
        rows.append(f"{label},{' '.join(names)},{' '.join(logs)},{float(at)!r},"
                    f"{mp.nstr(value, 25)},{mp.nstr(-slope, 25)}")

path = pathlib.Path(__file__).parents[1] / "resources/ebbline/curve/natural-spline.csv"
path.parent.mkdir(parents=True, exist_ok=True)
path.write_text(
    "# Natural cubic splines in ln P from 0 at time 0, their tangent beyond the last node.\n"
    f"# source: mpmath {mp.__version__}, dense solution for all coefficients, 50 digits\n"
    "# maker: src/test/reference/natural_spline.py\n"
    "# tolerance.absolute: 1e-15\n"
    "curve,times,logs,time,log_discount,forward\n" + "\n".join(rows) + "\n")
