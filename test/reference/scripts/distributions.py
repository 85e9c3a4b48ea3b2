"""Tails of the normal, t, F and chi-square laws with mpmath, at 400 digits so that complements keep 100.

Each point is a double; its tail is computed at exactly that double. The points themselves only need to lie where the
tail is about p, so they are found in double precision.

Run: python3 distributions.py > ../distributions.json
"""

import json
import math
from mpmath import mp, mpf, beta, erfc, gamma, exp, sqrt
from scipy import optimize, special

mp.dps = 400

PROBABILITIES = [1e-300, 1e-200, 1e-100, 1e-50, 1e-20, 1e-10, 1e-5, 0.001, 0.01, 0.05, 0.1, 0.3, 0.5, 0.7, 0.9, 0.99, 0.999]
DEGREES = [1, 1.5, 2, 3, 5.75, 10, 30, 100, 1000.5, 10000, 1000000]
PAIRS = [(1, 1), (1, 5), (1, 1000), (1, 1000000), (2, 20.5), (3, 7), (5.75, 3.25), (10, 100), (100, 10),
         (100, 1000000), (1000, 1000), (1000000, 2), (1000000, 1000000)]


def series(first, ratio, digits):
    """first (1 + ratio(0) + ratio(0) ratio(1) + ...), every term positive."""
    term = total = first
    i = 0
    while term > total * mpf(10) ** -digits:
        term *= ratio(i)
        total += term
        i += 1
    return total


def length(ratio, digits):
    """How many terms that takes, counted in double precision, a million at the most."""
    size, i, step = 0.0, 0, 16
    while size > -digits * math.log(10) and i < 1000000:
        size += step * math.log(float(ratio(i + step // 2)))
        i += step
    return i


def beta_lower(a, b, x, y):
    """I_x(a, b), y = 1 - x."""
    def first(a, b, x, y):
        return lambda: x ** a * y ** b / (a * beta(a, b))
    fa, fb, fx, fy = float(a), float(b), float(x), float(y)
    def ratio(a, b, x):
        return lambda i: (a + b + i) / (a + 1 + i) * x
    if length(ratio(fa, fb, fx), 60) <= length(ratio(fb, fa, fy), 380):
        mp.dps = 60
        return series(first(a, b, x, y)(), ratio(a, b, x), 55)
    mp.dps = 400
    return 1 - series(first(b, a, y, x)(), ratio(b, a, y), 380)


def beta_sides(a, b, odds):
    mp.dps = 420
    x, y = odds / (1 + odds), 1 / (1 + odds)
    lower = lambda: beta_lower(a, b, x, y)
    return lower, lambda: beta_lower(b, a, y, x)


def gamma_sides(a, x):
    """P(a, x) by a series of positive terms, and Q(a, x) as its complement."""
    def lower(digits):
        mp.dps = digits
        return series(x ** a * exp(-x) / (a * gamma(a)), lambda i: x / (a + 1 + i), digits - 5)
    return lambda: lower(60), lambda: 1 - lower(400)


LAWS = {
    "t two-sided": lambda t, df: beta_sides(mpf(1) / 2, mpf(df) / 2, mpf(t) ** 2 / mpf(df))[1](),
    "chi-square upper": lambda x, df: gamma_sides(mpf(df) / 2, mpf(x) / 2)[1](),
    "chi-square lower": lambda x, df: gamma_sides(mpf(df) / 2, mpf(x) / 2)[0](),
    "F upper": lambda f, d1, d2: beta_sides(mpf(d1) / 2, mpf(d2) / 2, mpf(d1) * mpf(f) / mpf(d2))[1](),
    "F lower": lambda f, d1, d2: beta_sides(mpf(d1) / 2, mpf(d2) / 2, mpf(d1) * mpf(f) / mpf(d2))[0](),
    "normal upper": lambda z: erfc(mpf(z) / sqrt(mpf(2))) / 2,
}

ROUGH = {
    "t two-sided": lambda t, df: special.betainc(df / 2, 0.5, df / (df + t * t)),
    "chi-square upper": lambda x, df: special.gammaincc(df / 2, x / 2),
    "chi-square lower": lambda x, df: special.gammainc(df / 2, x / 2),
    "F upper": lambda f, d1, d2: special.betainc(d2 / 2, d1 / 2, d2 / (d2 + d1 * f)),
    "F lower": lambda f, d1, d2: special.betainc(d1 / 2, d2 / 2, d1 * f / (d2 + d1 * f)),
}


def rough_point(law, p, df):
    """Where the tail is about p, as a double; None where that is beyond the range of doubles."""
    def gap(s):
        tail = ROUGH[law](math.exp(s), *df)
        return (math.log(tail) if tail > 0 else -800) - math.log(p)
    low, high = -300.0, 300.0
    if gap(low) * gap(high) > 0:
        return None
    return math.exp(optimize.brentq(gap, low, high, xtol=1e-9))


def main():
    points = []

    def add(law, x, df):
        mp.dps = 400
        points.append({"law": law, "df": list(df), "at": x, "tail": float(mp.nstr(LAWS[law](x, *df), 20))})

    for p in PROBABILITIES:
        add("normal upper", -float(special.ndtri(p)), [])
        cases = [(law, [df]) for law in ("t two-sided", "chi-square upper", "chi-square lower") for df in DEGREES]
        cases += [(law, list(pair)) for law in ("F upper", "F lower") for pair in PAIRS]
        for law, df in cases:
            x = rough_point(law, p, df)
            if x is not None:
                add(law, x, df)
    for t in (1e150, 1e200, 3e290):
        # (2 / pi) arctan(1 / t), to the first term of its series: t^2 itself would overflow.
        points.append({"law": "t two-sided", "df": [1], "at": t, "tail": float(mp.nstr(2 / (mp.pi * mpf(t)), 20))})
    print("[\n" + ",\n".join(json.dumps(point) for point in points) + "\n]")


main()
