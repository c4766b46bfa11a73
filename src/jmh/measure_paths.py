#!/usr/bin/env python3
"""Times the simulation's path step against plain C, alternating the two in one run, and prints a table for docs/performance.md.

usage: measure_paths.py YARDSTICK BINARIES CLASSPATH [ROUNDS]   (as measure.py)
"""
import os
import statistics
import sys
import time

sys.path.insert(0, sys.argv[1])
import bench  # noqa: E402

home, classpath = os.path.abspath(sys.argv[2]), ":".join(map(os.path.abspath, sys.argv[3].split(":")))
rounds = int(sys.argv[4]) if len(sys.argv) > 4 else 9
os.chdir(home)
c = bench.Proc("exec bin/k5.o3")
java = bench.Proc("exec java -Xms1g -XX:+UseSerialGC -cp '%s' ebbline.bench.Coprocess data" % classpath)
WORK = [("one thread", "mc_zig", "paths"), ("two threads", "mc_zig_t2", "paths_t2"),
        ("mirrored pairs, against C without", "mc_zig", "paths_mirrored"), ("scrambled Sobol, against C's pseudo-random", "mc_zig", "paths_sobol")]
for _, ckernel, kernel in WORK:
    for _ in range(4):
        java.run(kernel)
    c.run(ckernel)
runs = [[(c.run(ckernel), java.run(kernel)) for _, ckernel, kernel in WORK] for _ in range(rounds)]
print("| paths | C, ns a step | ours, ns a step | ratio | spread of the ratio |")
print("| --- | --- | --- | --- | --- |")
for i, (what, _, _) in enumerate(WORK):
    pairs = [r[i] for r in runs]
    ratios = sorted(j[0] / j[1] / (x[0] / x[1]) for x, j in pairs)
    print("| %s | %.3g | %.3g | %.2f | %.2f–%.2f |" % (
        what, statistics.median(x[0] / x[1] for x, _ in pairs), statistics.median(j[0] / j[1] for _, j in pairs),
        statistics.median(ratios), ratios[len(ratios) // 4], ratios[3 * len(ratios) // 4]))
for name, k in (("C", 0), ("ours", 1)):
    gain = statistics.median((r[0][k][0] / r[0][k][1]) / (r[1][k][0] / r[1][k][1]) for r in runs)
    print("two threads, %s: %.2f times one" % (name, gain))
c.quit()
java.quit()
