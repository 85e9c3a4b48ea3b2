"""Statistics at 40 digits, for figures that the libraries do not have to ten.

Writes highPrecision.json: the Durbin-Watson statistic and its exact p-value by Imhof's integral, and the CUSUM statistic
of the recursive residuals by exact updating.

Run: /usr/bin/python3 highPrecision.py  (mpmath; under a minute)
"""

import json
from pathlib import Path

import mpmath as mp

mp.mp.dps = 40
here = Path(__file__).parent
NAMES = ["investment", "longley", "nile-trend", "stackloss", "wages", "consumption-lag"]


def load(name):
    data = json.loads((here.parent / f"{name}.json").read_text())
    rows = [[mp.mpf(1)] + [mp.mpf(column[i]) for column in data["X"]] for i in range(data["n"])]
    return rows, [mp.mpf(value) for value in data["y"]]


def recursive_cusum(rows, y):
    n, k = len(rows), len(rows[0])
    P = (sum((mp.matrix(x) * mp.matrix(x).T for x in rows[:k]), mp.zeros(k, k))) ** -1
    c = sum((mp.matrix(x) * v for x, v in zip(rows[:k], y[:k])), mp.zeros(k, 1))
    w = []
    for x, v in zip(rows[k:], y[k:]):
        x = mp.matrix(x)
        Px = P * x
        g = (x.T * Px)[0]
        w.append((v - (x.T * P * c)[0]) / mp.sqrt(1 + g))
        P, c = P - Px * Px.T / (1 + g), c + x * v
    m = n - k
    mean = sum(w) / m
    deviation = mp.sqrt(sum((v - mean) ** 2 for v in w) / (m - 1))
    path = [sum(w[: j + 1]) / (1 + 2 * mp.mpf(j + 1) / m) for j in range(m)]
    return max(abs(v) for v in path) / deviation / mp.sqrt(m)


def durbin_watson(rows, y):
    n, k = len(rows), len(rows[0])
    X = mp.matrix(rows)
    M = mp.eye(n) - X * ((X.T * X) ** -1) * X.T
    e = M * mp.matrix(y)
    d = sum((e[i] - e[i - 1]) ** 2 for i in range(1, n)) / sum(v * v for v in e)
    A = mp.zeros(n, n)
    for i in range(n):
        A[i, i] = 2 if 0 < i < n - 1 else 1
        if i > 0:
            A[i, i - 1] = A[i - 1, i] = -1
    weights = [d - v for v in sorted(mp.eigsy(M * A * M, eigvals_only=True))[k:]]

    def integrand(u):
        angle = sum(mp.atan(2 * a * u) for a in weights) / 2
        return mp.sin(angle) / (u * mp.fprod((1 + 4 * a * a * u * u) ** mp.mpf("0.25") for a in weights))

    mp.mp.dps = 25
    area = mp.quad(integrand, [mp.mpf(10) ** -20, 0.05, 0.1, 0.2, 0.3, 0.5, 0.8, 1.2, 2, 4, 10, 100, mp.inf])
    mp.mp.dps = 40
    return d, mp.mpf(1) / 2 + area / mp.pi


result = {}
for name in NAMES:
    rows, y = load(name)
    d, p = durbin_watson(rows, y)
    result[name] = {"durbinWatson": float(d), "pPositive": float(p), "cusumRecursive": float(recursive_cusum(rows, y))}
here.joinpath("highPrecision.json").write_text(json.dumps(result, indent=1))
