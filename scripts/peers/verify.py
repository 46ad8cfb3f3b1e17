#!/usr/bin/env python3
"""Lines by scipy and by their definitions, for the cases of verify.mjs.

Cases come in on standard input, one a line: number;task;name=value,value,...;name=... and go out as
number;figure=value;... Definitions work in long doubles, or in whole numbers where the data are decimals.
"""
import math
import sys
import warnings
from decimal import Decimal
from fractions import Fraction

import numpy as np
import scipy
from scipy import special, stats

from interlaboratory import precision

warnings.simplefilter("ignore")
LONG = np.longdouble


def numbers(texts):
    return np.array([float(text) for text in texts])


def rank_lines(a):
    x, y = numbers(a["x"]), numbers(a["y"])
    slope, intercept, low, high = stats.theilslopes(y, x, 0.95)
    joint = stats.theilslopes(y, x, 0.95, method="joint")
    repeated = stats.siegelslopes(y, x, method="hierarchical")
    return {
        "theilSen": slope, "theilSenIntercept": intercept, "theilSenLow": low, "theilSenHigh": high,
        "theilSenJoint": joint[1], "repeatedMedian": repeated[0], "repeatedMedianIntercept": repeated[1],
        "height": np.max(np.abs(y)),
    }


def deming_line(x, y, ratio):
    mx, my = x.mean(), y.mean()
    sxx, syy, sxy = ((x - mx) ** 2).sum(), ((y - my) ** 2).sum(), ((x - mx) * (y - my)).sum()
    d = syy - ratio * sxx
    root = np.sqrt(d * d + 4 * ratio * sxy * sxy)
    # The two forms of the root are the same; the one without cancellation keeps its digits.
    slope = (d + root) / (2 * sxy) if d >= 0 else 2 * ratio * sxy / (root - d)
    return slope, my - slope * mx


def student(df):
    """Upper 2.5 % point of t; stats.t.ppf is good to nine digits only, the inverse of the beta integral to more."""
    return math.sqrt(df * (1 / special.betaincinv(df / 2, 0.5, 0.05) - 1))


def deming(a):
    x, y = numbers(a["x"]).astype(LONG), numbers(a["y"]).astype(LONG)
    ratio, n = LONG(float(a["ratio"][0])), len(x)
    slope, intercept = deming_line(x, y, ratio)
    left = np.array([deming_line(np.delete(x, i), np.delete(y, i), ratio) for i in range(n)])
    se = np.sqrt((n - 1) * ((left - left.mean(axis=0)) ** 2).sum(axis=0) / n)
    t = student(n - 2)
    return {
        "slope": slope, "intercept": intercept, "slopeSe": se[0], "interceptSe": se[1],
        "slopeLow": slope - t * se[0], "slopeHigh": slope + t * se[0],
    }


def york(a):
    """York, Evensen, Lopez and Delgado 2004, equations 13, iterated until the slope rests."""
    x, y, ux, uy, r = (numbers(a[key]).astype(LONG) for key in ("x", "y", "ux", "uy", "r"))
    wx, wy = 1 / ux**2, 1 / uy**2
    alpha = np.sqrt(wx * wy)
    b = LONG(np.polyfit(x.astype(float), y.astype(float), 1)[0])
    for _ in range(100000):
        w = wx * wy / (wx + b * b * wy - 2 * b * r * alpha)
        mx, my = (w * x).sum() / w.sum(), (w * y).sum() / w.sum()
        u, v = x - mx, y - my
        beta = w * (u / wy + b * v / wx - (b * u + v) * r / alpha)
        new = (w * beta * v).sum() / (w * beta * u).sum()
        done = abs(new - b) <= 1e-18 * abs(new)
        b = new
        if done:
            break
    w = wx * wy / (wx + b * b * wy - 2 * b * r * alpha)
    mx, my = (w * x).sum() / w.sum(), (w * y).sum() / w.sum()
    u, v = x - mx, y - my
    beta = w * (u / wy + b * v / wx - (b * u + v) * r / alpha)
    adjusted = mx + beta
    centre = (w * adjusted).sum() / w.sum()
    variance = 1 / (w * (adjusted - centre) ** 2).sum()
    intercept = my - b * mx
    return {
        "slope": b, "intercept": intercept, "slopeSe": np.sqrt(variance),
        "interceptSe": np.sqrt(1 / w.sum() + centre**2 * variance), "covariance": -centre * variance,
        "chiSquare": (w * (y - b * x - intercept) ** 2).sum(),
    }


def residual_median(x, y, slope):
    return float(np.median(y.astype(LONG) - LONG(slope) * x.astype(LONG)))


def passing_bablok(a):
    """Passing and Bablok 1983 on all pairs written down; the decimals are made whole numbers, so ties are exact."""
    exponent = min(Decimal(t).as_tuple().exponent for t in a["x"] + a["y"])
    whole = lambda texts: np.array([int(Decimal(t).scaleb(-exponent)) for t in texts], dtype=np.int64)
    px, py = whole(a["x"]), whole(a["y"])
    assert max(abs(px).max(), abs(py).max()) < 2**51
    x, y, n = numbers(a["x"]), numbers(a["y"]), len(px)
    i, j = np.triu_indices(n, 1)
    dx, dy = px[j] - px[i], py[j] - py[i]
    different = (dx != 0) | (dy != 0)
    dx, dy = dx[different], dy[different]
    # A pair above one another: infinite, with the sign of y_i - y_j.
    slopes = np.where(dx == 0, np.sign(-dy) * np.inf, dy / np.where(dx == 0, 1, dx))
    kept = (dx + dy != 0) | (dx == 0)
    below = np.where(dx > 0, dy < -dx, dy > -dx) & kept & (dx != 0) | (slopes == -np.inf)
    shift, s = int(below.sum()), np.sort(slopes[kept])
    total = len(s)
    at = lambda rank: s[rank - 1] if 1 <= rank <= total else math.inf * (1 if rank > total else -1)
    slope = at((total + 1) // 2 + shift) if total % 2 else (at(total // 2 + shift) + at(total // 2 + 1 + shift)) / 2
    spread = stats.norm.ppf(0.975) * math.sqrt(n * (n - 1) * (2 * n + 5) / 18)
    lower = round((total - spread) / 2)
    upper = total - lower + 1
    # A rank M1 below 1 is no rank among the N slopes: so few points give no limit.
    low, high = (at(lower + shift), at(upper + shift)) if lower >= 1 else (-math.inf, math.inf)
    size = np.sort(np.abs(slopes))
    middle = (size[(len(size) - 1) // 2] + size[len(size) // 2]) / 2
    finite = slopes[np.isfinite(slopes)]
    equivariant = -middle if (finite < 0).sum() > (finite > 0).sum() else middle
    return {
        "slope": slope, "intercept": residual_median(x, y, slope), "slopes": total, "shift": shift,
        "lowerRank": lower, "upperRank": upper,
        "slopeLow": low, "slopeHigh": high,
        "interceptLow": residual_median(x, y, high) if math.isfinite(high) else -math.inf,
        "interceptHigh": residual_median(x, y, low) if math.isfinite(low) else math.inf,
        "equivariantSlope": equivariant, "equivariantIntercept": residual_median(x, y, equivariant),
        "height": np.max(np.abs(y)), "vertical": int((dx == 0).sum()),
    }


def iso5725(a):
    """Exact fractions of the doubles given."""
    groups = {}
    for text, group in zip(a["x"], a["group"]):
        groups.setdefault(group, []).append(float(text))
    mean, r, left, big = precision(list(groups.values()))
    return {
        "mean": mean, "repeatabilityVariance": r**2, "betweenVariance": left**2, "reproducibilityVariance": big**2,
    }


def correlation(a):
    """Ranks by scipy; its exact distribution of Kendall's count keeps the digits of small probabilities."""
    x, y = numbers(a["x"]), numbers(a["y"])
    found = {"spearman": stats.spearmanr(x, y)[0], "kendall": stats.kendalltau(x, y)[0]}
    if len(x) < 50 and len(set(x)) == len(set(y)) == len(x):
        found["kendallP"] = stats.kendalltau(x, y, method="exact")[1]
    return found


def exact_line(x, y, w):
    """Weighted line by exact fractions."""
    total = sum(w)
    mx, my = sum(p * q for p, q in zip(w, x)) / total, sum(p * q for p, q in zip(w, y)) / total
    sxx = sum(p * (q - mx) ** 2 for p, q in zip(w, x))
    slope = sum(p * (q - mx) * (v - my) for p, q, v in zip(w, x, y)) / sxx
    intercept = my - slope * mx
    rss = sum(p * (v - intercept - slope * q) ** 2 for p, q, v in zip(w, x, y))
    variance = rss / (len(x) - 2)
    square = 1 - rss / sum(p * (v - my) ** 2 for p, v in zip(w, y))
    return {
        "Intercept": float(intercept), "Slope": float(slope), "ResidualSd": math.sqrt(variance),
        "RSquared": float(square),
        "SlopeSe": math.sqrt(variance / sxx), "InterceptSe": math.sqrt(variance * (1 / total + mx**2 / sxx)),
    }


def exact_lines(a):
    x, y, w = ([Fraction(float(t)) for t in a[key]] for key in ("x", "y", "weights"))
    found = {"ols" + key: value for key, value in exact_line(x, y, [Fraction(1)] * len(x)).items()}
    found.update({"wls" + key: value for key, value in exact_line(x, y, w).items()})
    return found


TASKS = {
    "rankLines": rank_lines, "deming": deming, "york": york, "passingBablok": passing_bablok,
    "iso5725": iso5725, "line": exact_lines, "correlation": correlation,
}


def text(value):
    value = float(value)
    return "NA" if math.isnan(value) else repr(value).replace("inf", "Infinity")


def main():
    for row in sys.stdin:
        index, task, *fields = row.rstrip("\n").split(";")
        inputs = {key: values.split(",") for key, values in (field.split("=") for field in fields)}
        found = TASKS[task](inputs)
        print(index, *(f"{key}={text(value)}" for key, value in found.items()), sep=";")
    print(f"#Python {sys.version.split()[0]}, scipy {scipy.__version__}, numpy {np.__version__}")


main()
