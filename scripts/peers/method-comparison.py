#!/usr/bin/env python3
"""Lines by ranks and correlations from scipy on random data, as a fixture for the tests.

usage: python3 scripts/peers/method-comparison.py > tests/stats/fixtures/method-comparison-scipy.json
Sizes 3 to 200 (set SIZES for more), with ties, outliers, and large and small scales. Numbers are written so that they
are read back exactly.
"""
import json
import os
import sys
import warnings

import numpy as np
import scipy
from scipy import stats

warnings.simplefilter("ignore")
rng = np.random.default_rng(20261201)
SIZES = [int(n) for n in os.environ.get("SIZES", "3,5,8,13,30,60,200").split(",")]


def samples(n):
    x = rng.uniform(1, 100, n)
    y = 2 + 1.05 * x + rng.normal(0, 3, n)
    yield "plain", x, y
    yield "ties", np.round(x / 10), np.round(y / 10)
    yield "decimals", np.round(x, 1), np.round(y, 1)
    wild = y.copy()
    wild[:: max(2, n // 4)] += 1e4
    yield "outliers", x, wild
    yield "large", x * 1e9, y * 1e12
    yield "small", x * 1e-12, y * 1e-9
    yield "falling", np.round(x, 2), np.round(-0.4 * x + rng.normal(0, 30, n), 2)


def case(kind, x, y):
    if len(set(x)) < 2 or len(set(y)) < 2:
        return None
    ts = stats.theilslopes(y, x, 0.95)
    joint = stats.theilslopes(y, x, 0.9, method="joint")
    rm = stats.siegelslopes(y, x, method="hierarchical")
    tau = stats.kendalltau(x, y)
    rho = stats.spearmanr(x, y)
    r = stats.pearsonr(x, y)
    line = stats.linregress(x, y)
    expected = {
        "theilSen": [ts[0], ts[1], ts[2], ts[3]],
        "theilSenJoint": [joint[0], joint[1], joint[2], joint[3]],
        "repeatedMedian": [rm[0], rm[1]],
        "kendall": tau[0],
        "spearman": [rho[0], rho[1]],
        "pearson": [r[0], r[1]],
        "leastSquares": [line.slope, line.intercept, line.stderr, line.intercept_stderr],
    }
    return {"kind": kind, "x": list(map(float, x)), "y": list(map(float, y)), "expected": expected}


cases = [c for n in SIZES for c in (case(*s) for s in samples(n)) if c]
out = {
    "source": "scipy.stats theilslopes, siegelslopes, kendalltau, spearmanr, pearsonr, linregress on random data",
    "program": f"scipy {scipy.__version__}, numpy {np.__version__}, Python {sys.version.split()[0]}",
    "script": "scripts/peers/method-comparison.py",
    "madeOn": "2026-12-01",
    "cases": cases,
}
json.dump(out, sys.stdout, separators=(",", ":"), default=float)
