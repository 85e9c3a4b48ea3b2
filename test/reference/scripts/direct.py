"""Every covariance straight from its definition, with dense matrices and mpmath at 60 digits.

No structure is used: hat matrices are n by n, lags are summed one by one, roots of I - H come from eigenvalues.
The doubles of the data files are taken as they are, so that these values say what the exact answer for them is.

Run: python3 direct.py > ../direct.json   (from test/reference/scripts)
"""

import json
import sys
from mpmath import mp, mpf, matrix, eye, zeros, diag, sqrt, floor, sin, cos, pi, eig, eigsy, inverse

mp.dps = 60


def load(name):
    with open(f"../{name}.json") as file:
        data = json.load(file)
    columns = data["X"] if isinstance(data["X"][0], list) else [data["X"]]
    n = data["n"]
    x = matrix(n, len(columns) + 1)
    for i in range(n):
        x[i, 0] = mpf(1)
        for j, column in enumerate(columns):
            x[i, j + 1] = mpf(column[i])
    return data, x, matrix([mpf(value) for value in data["y"]])


def numbers(values):
    return [float(mp.nstr(value, 20)) for value in values]


def roots(v):
    return numbers([sqrt(v[j, j]) for j in range(v.rows)])


class Regression:
    def __init__(self, x, y):
        self.x, self.y, (self.n, self.k) = x, y, (x.rows, x.cols)
        self.a = inverse(x.T * x)
        self.b = self.a * (x.T * y)
        self.e = y - x * self.b
        self.rss = sum(value ** 2 for value in self.e)
        self.h = [(x[i, :] * self.a * x[i, :].T)[0] for i in range(self.n)]
        self.u = [[self.e[i] * x[i, j] for j in range(self.k)] for i in range(self.n)]


def sandwich(r, meat, factor=1):
    return r.a * meat * r.a * factor


def weighted(r, weights):
    meat = zeros(r.k)
    for i, weight in enumerate(weights):
        row = r.x[i, :]
        meat += weight * (row.T * row)
    return sandwich(r, meat)


def white(r):
    n, k, largest = r.n, r.k, max(r.h)
    power = {
        "HC4": lambda h: min(mpf(4), n * h / k),
        "HC4m": lambda h: min(mpf(1), n * h / k) + min(mpf("1.5"), n * h / k),
        "HC5": lambda h: min(n * h / k, max(mpf(4), mpf("0.7") * n * largest / k)) / 2,
    }
    weights = {
        "HC0": [e ** 2 for e in r.e],
        "HC1": [e ** 2 * n / (n - k) for e in r.e],
        "HC2": [e ** 2 / (1 - h) for e, h in zip(r.e, r.h)],
        "HC3": [e ** 2 / (1 - h) ** 2 for e, h in zip(r.e, r.h)],
        **{name: [e ** 2 / (1 - h) ** d(h) for e, h in zip(r.e, r.h)] for name, d in power.items()},
    }
    return {name: roots(weighted(r, w)) for name, w in weights.items()}


def lag_product(rows, lag, k):
    total = zeros(k)
    for t in range(lag, len(rows)):
        for a in range(k):
            for b in range(k):
                total[a, b] += rows[t][a] * rows[t - lag][b]
    return total


def long_run(rows, weights, k):
    meat = lag_product(rows, 0, k) * weights[0]
    for lag in range(1, min(len(weights), len(rows))):
        product = lag_product(rows, lag, k)
        meat += weights[lag] * (product + product.T)
    return meat


def bartlett(lags):
    return [1 - mpf(lag) / (lags + 1) for lag in range(lags + 1)]


def vector_autoregression(rows, k):
    """A with v_t = u_t - A u_(t-1), by least squares without a constant, and the residuals."""
    now, before = matrix(rows[1:]), matrix(rows[:-1])
    a = (inverse(before.T * before) * (before.T * now)).T
    rest = now - before * a.T
    return a, [[rest[t, j] for j in range(k)] for t in range(rest.rows)]


def newey_west_1994(rows, drivers, n, c):
    most = int(floor(c * (mpf(n) / 100) ** (mpf(2) / 9)))
    series = [sum(row[j] for j in drivers) for row in rows]
    g = [sum(series[t] * series[t - lag] for t in range(lag, len(series))) for lag in range(most + 1)]
    s0 = g[0] + 2 * sum(g[1:])
    s1 = 2 * sum(lag * g[lag] for lag in range(1, most + 1))
    return mpf("1.1447") * ((s1 / s0) ** 2 * n) ** (mpf(1) / 3)


def kernel_weights(kernel, bandwidth, n):
    def weight(lag):
        x = mpf(lag) / bandwidth
        if lag == 0:
            return mpf(1)
        if kernel == "bartlett":
            return max(mpf(0), 1 - x)
        if kernel == "parzen":
            return mpf(0) if x >= 1 else (1 - 6 * x ** 2 + 6 * x ** 3 if x <= 0.5 else 2 * (1 - x) ** 3)
        z = 6 * pi * x / 5
        return 3 / z ** 2 * (sin(z) / z - cos(z))
    return [weight(lag) for lag in range(n)]


def andrews_1991(rows, drivers, kernel):
    n = len(rows)
    top, bottom = mpf(0), mpf(0)
    for j in drivers:
        now, before = [row[j] for row in rows[1:]], [row[j] for row in rows[:-1]]
        m1, m0 = sum(now) / len(now), sum(before) / len(before)
        rho = sum((a - m1) * (b - m0) for a, b in zip(now, before)) / sum((b - m0) ** 2 for b in before)
        variance = sum((a - m1 - rho * (b - m0)) ** 2 for a, b in zip(now, before)) / len(now)
        curvature = (1 - rho) ** 6 * (1 + rho) ** 2 if kernel == "bartlett" else (1 - rho) ** 8
        top += 4 * rho ** 2 * variance ** 2 / curvature
        bottom += variance ** 2 / (1 - rho) ** 4
    factor, q = {"bartlett": ("1.1447", 1), "parzen": ("2.6614", 2), "quadratic spectral": ("1.3221", 2)}[kernel]
    return mpf(factor) * (top / bottom * n) ** (mpf(1) / (2 * q + 1))


def through_time(r):
    drivers = range(1, r.k)
    result = {"newey-west": [], "newey-west 1994": [], "andrews 1991": []}
    for lags in (0, 1, 2, 4):
        v = sandwich(r, long_run(r.u, bartlett(lags), r.k))
        result["newey-west"].append({"lags": lags, "unadjusted": roots(v), "adjusted": roots(v * r.n / (r.n - r.k))})
    a, rest = vector_autoregression(r.u, r.k)
    d = inverse(eye(r.k) - a)
    # A root beyond 0.97 calls for a filter held back, which is no part of these definitions.
    steady = max(abs(root) for root in eig(a, left=False, right=False)) <= mpf("0.97")
    for prewhiten in (False, True) if steady else (False,):
        rows = rest if prewhiten else r.u
        coloured = (lambda meat: d * meat * d.T) if prewhiten else (lambda meat: meat)
        factor = mpf(r.n) / (r.n - r.k)
        bandwidth = newey_west_1994(rows, drivers, r.n, 3 if prewhiten else 4)
        meat = coloured(long_run(rows, bartlett(int(floor(bandwidth))), r.k))
        result["newey-west 1994"].append({"prewhiten": prewhiten, "bandwidth": float(bandwidth), "adjusted": roots(sandwich(r, meat, factor))})
        for kernel in ("bartlett", "parzen", "quadratic spectral"):
            bandwidth = andrews_1991(rows, drivers, kernel)
            meat = coloured(long_run(rows, kernel_weights(kernel, bandwidth, len(rows)), r.k))
            result["andrews 1991"].append({"kernel": kernel, "prewhiten": prewhiten, "bandwidth": float(bandwidth), "adjusted": roots(sandwich(r, meat, factor))})
    return result


def inverse_root(m):
    values, vectors = eigsy(m)
    return vectors * diag([0 if value < mpf(10) ** -30 else 1 / sqrt(value) for value in values]) * vectors.T


def members_of(groups):
    return [[i for i, g in enumerate(groups) if g == label] for label in dict.fromkeys(groups)]


def rows_of(m, rows):
    return matrix([[m[i, j] for j in range(m.cols)] for i in rows])


def grouped_meat(r, groups):
    meat = zeros(r.k)
    for rows in members_of(groups):
        s = matrix([sum(r.u[i][j] for i in rows) for j in range(r.k)])
        meat += s * s.T
    return meat


def cr1_factor(r, groups):
    count = len(set(groups))
    return mpf(count) / (count - 1) * (r.n - 1) / (r.n - r.k)


def adjusted_rows(r, groups):
    """For each group its rows and A_g, the symmetric root of (I - H_gg)^-1."""
    found = []
    for rows in members_of(groups):
        xg = rows_of(r.x, rows)
        found.append((rows, inverse_root(eye(len(rows)) - xg * r.a * xg.T)))
    return found


def cr2(r, groups):
    parts = adjusted_rows(r, groups)
    meat = zeros(r.k)
    for rows, root in parts:
        s = rows_of(r.x, rows).T * root * matrix([r.e[i] for i in rows])
        meat += s * s.T
    rest = eye(r.n) - r.x * r.a * r.x.T
    degrees = []
    for coefficient in range(r.k):
        weights = r.x * r.a[:, coefficient]
        p = [rows_of(rest, rows).T * (root * matrix([weights[i] for i in rows])) for rows, root in parts]
        trace = sum((v.T * v)[0] for v in p)
        squares = sum((v.T * w)[0] ** 2 for v in p for w in p)
        degrees.append(trace ** 2 / squares)
    return roots(sandwich(r, meat)), numbers(degrees)


def in_groups(r, groups, second=None):
    se, degrees = cr2(r, groups)
    v = sandwich(r, grouped_meat(r, groups))
    result = {"CR0": roots(v), "CR1": roots(v * cr1_factor(r, groups)), "CR2": se, "CR2DegreesOfFreedom": degrees}
    if second is not None:
        both = list(zip(groups, second))
        total = zeros(r.k)
        for sign, way in ((1, groups), (1, second), (-1, both)):
            total += sign * cr1_factor(r, way) * sandwich(r, grouped_meat(r, way))
        result["two-way CR1"] = roots(total)
    return result


def main():
    results = {}
    for name in ("longley", "investment", "stackloss", "cars", "grunfeld"):
        data, x, y = load(name)
        r = Regression(x, y)
        results[name] = {
            "coefficients": numbers(r.b),
            "classical": roots(r.a * r.rss / (r.n - r.k)),
            "white": white(r),
        }
        if name != "grunfeld":
            results[name]["bellMcCaffrey"] = cr2(r, list(range(r.n)))[1]
        if data["rows"] == "time":
            results[name]["time"] = through_time(r)
        if data["rows"] == "group":
            years = [i % 20 for i in range(r.n)]
            results[name]["groups"] = in_groups(r, data["group"], years)
        print(name, file=sys.stderr)
    with open("../nist/filip.json") as file:
        filip = json.load(file)
    r = Regression(matrix(filip["design_by_row"]), matrix(filip["y"]))
    results["filip"] = {"coefficients": numbers(r.b), "classical": roots(r.a * r.rss / (r.n - r.k)), "white": white(r)}
    print(json.dumps({"source": "mpmath at 60 digits from the definitions, scripts/direct.py", "results": results}, indent=1))


main()
