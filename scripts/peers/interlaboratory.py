#!/usr/bin/env python3
"""Groups, ranks and outlier statistics from scipy and numpy on random data, as a fixture for the tests.

usage: python3 scripts/peers/interlaboratory.py > tests/stats/fixtures/interlaboratory-scipy.json
Sizes 3 to 120 (set SIZES for more, such as 3,30,2000), with ties, outliers, and large and small scales. Outlier
statistics and ISO 5725-2 figures are written out here from their definitions, with exact fractions for the sums.
"""
import json
import math
import os
from fractions import Fraction

import numpy as np
import scipy
from scipy import stats

rng = np.random.default_rng(20261201)
SIZES = [int(n) for n in os.environ.get("SIZES", "3,8,30,120").split(",")]


def exact_squares(values):
    exact = [Fraction(float(v)) for v in values]
    mean = sum(exact) / len(exact)
    return sum((v - mean) ** 2 for v in exact)


def grubbs(x):
    s = math.sqrt(exact_squares(x) / (len(x) - 1))
    mean = float(sum(map(Fraction, map(float, x))) / len(x))
    return max(max(x) - mean, mean - min(x)) / s


def precision(groups):
    n = [len(g) for g in groups]
    flat = [Fraction(float(v)) for g in groups for v in g]
    total, p = len(flat), len(groups)
    grand = sum(flat) / total
    within = sum(exact_squares(g) for g in groups) / (total - p)
    means = [sum(Fraction(float(v)) for v in g) / len(g) for g in groups]
    between = sum(k * (m - grand) ** 2 for k, m in zip(n, means)) / (p - 1)
    replicates = (total - Fraction(sum(k * k for k in n), total)) / (p - 1)
    left = max(Fraction(0), (between - within) / replicates)
    return [float(grand), math.sqrt(within), math.sqrt(left), math.sqrt(within + left)]


def samples(n):
    x = rng.normal(10, 1, n)
    yield "plain", x
    yield "ties", np.round(x, 0)
    yield "reported", np.round(x, 2)
    wild = np.round(x, 3)
    wild[0] += 500
    yield "outlier", wild
    yield "small", np.round(x, 3) * 1e-9
    yield "large", np.round(x, 3) * 1e9


def case(kind, x):
    y = rng.permutation(x) * 1.1
    groups = [list(map(float, g)) for g in np.array_split(x, max(2, len(x) // 3))]
    out = {"kind": kind, "x": list(map(float, x)), "y": list(map(float, y)), "groups": groups}
    out["precision"] = precision(groups)
    if len(set(out["x"])) > 1:
        out["grubbs"] = grubbs(out["x"])
        out["kruskal"] = [float(v) for v in stats.kruskal(*groups)]
        out["welch"] = [float(v) for v in stats.ttest_ind(x, y, equal_var=False)]
        out["ranks"] = float(stats.mannwhitneyu(x, y, method="auto" if len(x) < 9 else "asymptotic").pvalue)
        out["rho"] = float(stats.spearmanr(x, y)[0])
    return out


if __name__ == "__main__":
    print(json.dumps({
        "source": "random data, seed 20261201 (PCG64)",
        "program": f"scipy {scipy.__version__}, numpy {np.__version__}",
        "script": "scripts/peers/interlaboratory.py",
        "madeOn": "2026-12-01",
        "tolerance": "relative 1e-9",
        "cases": [case(kind, x) for n in SIZES for kind, x in samples(n)],
    }, separators=(",", ":")))
