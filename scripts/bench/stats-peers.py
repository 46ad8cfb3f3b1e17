#!/usr/bin/python3
"""Times functions of scipy on the data of the benchmark.

usage: stats-peers.py folder, with lines "function n bandwidth" on standard input. Prints the version, then a line
"function n ms ms ..." for each. What takes seconds is timed once.
"""
import sys
import time

import numpy
import scipy
from scipy import stats

CALLS = {
    "theilslopes": lambda x, y: stats.theilslopes(y, x),
    "siegelslopes": lambda x, y: stats.siegelslopes(y, x),
    "kendalltau": stats.kendalltau,
}


def clock():
    return 1000 * time.perf_counter()


def times(call):
    batch = 1

    def sample():
        since = clock()
        for _ in range(batch):
            call()
        return clock() - since

    begun = clock()
    while clock() - begun < 100:
        took = sample()
        if took > 2000:
            return [took]
        if took < 2:
            batch *= 2
    found = []
    since = clock()
    while len(found) < 5 or (len(found) < 41 and clock() - since < 400):
        found.append(sample() / batch)
    return found


print(f"scipy {scipy.__version__}, numpy {numpy.__version__}, Python {sys.version.split()[0]}")
for line in sys.stdin:
    name, n = line.split()[:2]
    x, y = (numpy.fromfile(f"{sys.argv[1]}/{axis}-{n}.bin") for axis in "xy")
    print(name, n, *(f"{ms:.6f}" for ms in times(lambda: CALLS[name](x, y))))
