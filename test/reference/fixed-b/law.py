"""The fixed-b law of Kiefer and Vogelsang (2005) for the Bartlett kernel, at every level.

t^2 = Z^2 / Q, Z standard normal, independent of Q = sum of lambda_j xi_j^2, where lambda_j are the eigenvalues of the
Bartlett kernel of width b with the mean taken out. So P(t^2 > x^2) = P(Z^2 - x^2 sum lambda_j xi_j^2 > 0), a quadratic
form in normals, which is computed (not simulated) by its inversion integral along the saddlepoint line. The kernel is
taken on T points, twice, and the error of order 1/T^2 removed.

Writes law.json: c(b, z) / z for each b and z, c the two-sided critical value at the level 2 (1 - Phi(z));
and, as a check by other means, tails from a seeded simulation of 100,000 paths with 1,000 steps each.

Run: python3 law.py  (numpy, scipy; about three minutes)
"""

import json
from math import exp, log, pi, sqrt
from pathlib import Path

import numpy as np
from scipy.optimize import brentq
from scipy.special import log_ndtr, ndtr

BS = [0, 0.0025, 0.005, 0.01, 0.02, 0.03, 0.04, 0.05, 0.075, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1]
ZS = [0, 0.5, 1, 1.5, 2, 2.5, 3, 3.5, 4, 5, 6, 8, 11, 15, 20, 28, 38]


def nodes(step):
    t = np.arange(-4.4, 4.4 + step / 2, step)
    u = np.exp(pi / 2 * np.sinh(t))
    return u, step * pi / 2 * np.cosh(t) * u


def log_tail(w, step):
    """log P(sum w_j xi_j^2 > 0)."""
    top = 1 / (2 * w.max())
    c = brentq(lambda s: np.sum(w / (1 - 2 * w * s)) - 1 / s, top * 1e-12, top * (1 - 1e-13), xtol=1e-15, rtol=1e-12)
    a = 2 * w / (1 - 2 * w * c)
    width = 1 / sqrt(np.sum(a**2) / 2 + 1 / c**2)
    u, weight = nodes(step)
    u, weight = u * width, weight * width
    value = np.exp(-0.5 * np.log1p(-1j * a[:, None] * u[None, :]).sum(0)) * c / (c + 1j * u)
    return -0.5 * np.sum(np.log1p(-2 * w * c)) - log(c) + log(np.sum(weight * value.real) / pi)


def eigenvalues(b, points):
    t = np.arange(points)
    kernel = np.maximum(0, 1 - np.abs(t[:, None] - t[None, :]) / (b * points))
    kernel -= kernel.mean(0)[None, :]
    kernel -= kernel.mean(1)[:, None]
    values = np.linalg.eigvalsh(kernel / points)
    return values[values > 1e-14]


def critical(z, values):
    level = log(2) + log_ndtr(-z)
    # Few and small negative weights turn many times at small z: a finer step there.
    step = 1 / 512 if z < 1 else 1 / 128 if z < 3 else 1 / 64
    miss = lambda x: log_tail(np.concatenate([[1.0], -np.exp(2 * x) * values]), step) - level
    return exp(brentq(miss, log(z) - 0.7, log(z) + 5, xtol=1e-12))


def ratios(b):
    if b == 0:
        return [1.0] * len(ZS)
    points = 2400 if b < 0.01 else 1000
    coarse, fine = eigenvalues(b, points // 2), eigenvalues(b, points)
    # c/z is even in z: at 0 it is taken at 0.05, where it differs by less than 0.1 %.
    return [(4 * critical(max(z, 0.05), fine) - critical(max(z, 0.05), coarse)) / 3 / max(z, 0.05) for z in ZS]


def simulated(bs, xs, seed=20050101, paths=100_000, steps=1000):
    """P(|t| > x) = E[2 Phi(-x sqrt Q)], Q from the bridge of seeded random walks."""
    random = np.random.default_rng(seed)
    tails = {b: np.zeros(len(xs)) for b in bs}
    squares = {b: np.zeros(len(xs)) for b in bs}
    for _ in range(paths // 2000):
        e = random.standard_normal((2000, steps))
        s = np.cumsum(e - e.mean(1, keepdims=True), axis=1) / sqrt(steps)
        for b in bs:
            width = round(b * steps)
            lagged = (s[:, : steps - width] * s[:, width:]).sum(1)
            q = 2 / b * ((s**2).sum(1) - lagged) / steps
            p = 2 * ndtr(-np.array(xs)[None, :] * np.sqrt(q)[:, None])
            tails[b] += p.sum(0)
            squares[b] += (p**2).sum(0)
    result = []
    for b in bs:
        mean = tails[b] / paths
        error = np.sqrt((squares[b] / paths - mean**2) / paths)
        result += [{"b": b, "x": x, "tail": float(m), "standardError": float(d)} for x, m, d in zip(xs, mean, error)]
    return result


if __name__ == "__main__":
    table = [[round(r, 5) for r in ratios(b)] for b in BS]
    check = simulated([0.05, 0.2, 0.5, 1.0], [0.7, 1.645, 1.96, 2.576, 4.0, 6.0])
    here = Path(__file__).parent
    here.joinpath("law.json").write_text(json.dumps({"b": BS, "z": ZS, "ratio": table, "simulated": check}))
