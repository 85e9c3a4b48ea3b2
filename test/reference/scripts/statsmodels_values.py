"""A second library's figures for the data files: statsmodels (Debian's python3-statsmodels 0.13.5).

Run: python3 statsmodels_values.py > ../statsmodels.json   (from test/reference/scripts)
"""

import json
import numpy as np
import statsmodels
import statsmodels.api as sm


def load(name):
    with open(f"../{name}.json") as file:
        data = json.load(file)
    columns = data["X"] if isinstance(data["X"][0], list) else [data["X"]]
    return data, np.array(data["y"], dtype=float), np.column_stack([np.ones(data["n"])] + [np.array(c, dtype=float) for c in columns])


def errors(fit, kind, **options):
    return fit.get_robustcov_results(cov_type=kind, **options).bse.tolist()


def main():
    results = {}
    for name in ("cars", "stackloss", "investment", "consumption-lag", "wages", "nile-trend", "orange-juice-6-lags",
                 "mtcars", "school-scores-3", "public-schools", "grunfeld", "petersen"):
        data, y, x = load(name)
        fit = sm.OLS(y, x).fit()
        entry = {
            "coefficients": fit.params.tolist(),
            "logLikelihood": fit.llf,
            "rSquared": fit.rsquared,
            "adjustedRSquared": fit.rsquared_adj,
            "classical": fit.bse.tolist(),
            **{version: errors(fit, version) for version in ("HC0", "HC1", "HC2", "HC3")},
        }
        if data["rows"] == "time":
            entry["newey-west"] = [
                {"lags": lags, "adjusted": errors(fit, "HAC", maxlags=lags, use_correction=True),
                 "unadjusted": errors(fit, "HAC", maxlags=lags, use_correction=False)}
                for lags in (1, 3, 6)
            ]
        if data["rows"] == "group":
            labels = {label: index for index, label in enumerate(dict.fromkeys(data["group"]))}
            groups = np.array([labels[label] for label in data["group"]])
            period = 20 if name == "grunfeld" else 10
            times = np.arange(data["n"]) % period
            entry["CR0"] = errors(fit, "cluster", groups=groups, use_correction=False)
            entry["CR1"] = errors(fit, "cluster", groups=groups, use_correction=True)
            entry["two-way CR0"] = errors(fit, "cluster", groups=np.column_stack([groups, times]), use_correction=False)
            # Each group's lagged products within the group alone; groups of equal length stand one after the other.
            entry["newey-west in groups"] = {
                "lags": 2, "unadjusted": errors(fit, "hac-panel", groups=groups, maxlags=2, use_correction=False)}
        results[name] = entry
    print(json.dumps({"source": f"statsmodels {statsmodels.__version__}, scripts/statsmodels_values.py", "results": results}, indent=1))


main()
