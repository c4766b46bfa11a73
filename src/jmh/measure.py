#!/usr/bin/env python3
"""Times the program's kernels against plain C, alternating the two in one run, and prints a table for docs/performance.md.

usage: measure.py YARDSTICK BINARIES CLASSPATH [ROUNDS]
  YARDSTICK  folder with bench.py
  BINARIES   folder with bin/ and data/, as its build makes them
  CLASSPATH  of the built benchmarks (mvn -B -Pbench test-compile), joined with ':'
"""
import os
import statistics
import sys
import tempfile
import time

sys.path.insert(0, sys.argv[1])
import bench  # noqa: E402

home, classpath = os.path.abspath(sys.argv[2]), ":".join(map(os.path.abspath, sys.argv[3].split(":")))
rounds = int(sys.argv[4]) if len(sys.argv) > 4 else 9
os.chdir(home)
JAVA = "exec java -Xms1g -XX:+UseSerialGC -cp '%s' ebbline.bench.Coprocess data" % classpath
C1, C2, C3, C4 = ("exec bin/k%d.o3" % k for k in (1, 2, 3, 4))
WORK = [  # what, unit, C program, C kernel, ours, target ratio
    ("bonds, walk over nodes", "flow", C1, "pv_walk", "pv_walk", None),
    ("bonds, day table against the C walk", "flow", C1, "pv_walk", "pv_day", 0.25),
    ("bonds, day table against the C day table", "flow", C1, "pv_day", "pv_day", None),
    # C's full_walk makes a key-rate ladder too; the lines after it say what that part and the present values alone take.
    ("bonds, price, yield, durations, convexity, dv01", "flow", C1, "full_walk", "full", 0.5),
    ("(of C's walk, present values and ladder)", "flow", C1, "flows_only", "full", None),
    ("zero-bond option, alone", "option", C2, "zbo", "zbo", 1.0),
    ("zero-bond option, in blocks", "option", C2, "zbo", "zbo_blocks", 0.3),
    ("coupon-bond option, 20 flows, alone", "option", C2, "cbo", "cbo", 1.1),
    ("coupon-bond option, 20 flows, in blocks", "option", C2, "cbo", "cbo_blocks", 0.5),
    ("swaption 10 x 10 semi-annual", "option", C2, "swo", "swo", 1.1),
    ("mean reversion and volatility from 100 swaptions", "calibration", C3, "cal", "cal", 1.0),
    ("32 callable bonds of 20 to 60 dates, 1e-9 with its bound against 1e-7", "bond", C4, "tz40", "callable", 2),
    ("32 callable bonds of 20 to 60 dates, 1e-9 with its bound against 1e-9", "bond", C4, "tz35", "callable", 2),
]


def column(path, j):
    return [float(line.split()[j]) for line in open(path)]


def difference(c, ckernel, java, jkernel):
    """Largest difference of the first results, relative to the larger of 1 and the value."""
    with tempfile.TemporaryDirectory() as scratch:
        paths = [os.path.join(scratch, name) for name in ("c", "java")]
        c.ask("dump %s %s" % (ckernel, paths[0]))
        java.ask("dump %s %s" % (jkernel, paths[1]))
        # Of the full measures the yield is compared: a present value by day differs by the days' rounding.
        pairs = list(zip(column(paths[0], 1 if jkernel == "full" else 0), column(paths[1], 0)))
        return max(abs(x - y) / max(1.0, abs(x)) for x, y in pairs)


procs = {cmd: bench.Proc(cmd) for cmd in (C1, C2, C3, C4, JAVA)}
print("| work | C, ns | ours, ns | ratio | spread of the ratio | target | largest difference |")
print("| --- | --- | --- | --- | --- | --- | --- |")
for what, unit, cmd, ckernel, jkernel, target in WORK:
    c, java = procs[cmd], procs[JAVA]
    off = difference(c, ckernel, java, jkernel)
    start, runs = time.time(), 0
    while runs < 3 or time.time() - start < 3:
        java.run(jkernel)
        runs += 1
    c.run(ckernel)
    pairs = [(c.run(ckernel), java.run(jkernel)) for _ in range(rounds)]
    ratios = sorted(j[0] / j[1] / (x[0] / x[1]) for x, j in pairs)
    print("| %s, per %s | %.3g | %.3g | %.2f | %.2f–%.2f | %s | %.1e |" % (
        what, unit, statistics.median(x[0] / x[1] for x, _ in pairs), statistics.median(j[0] / j[1] for _, j in pairs),
        statistics.median(ratios), ratios[len(ratios) // 4], ratios[3 * len(ratios) // 4],
        "≤ %s" % target if target else "–", off), flush=True)
for p in procs.values():
    p.quit()
