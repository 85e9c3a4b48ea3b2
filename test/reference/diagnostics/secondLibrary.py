"""Figures of a second, independent library for tests, guards and inference.

Reads the data of the reference files beside this folder and writes secondLibrary.json. Made with Debian's
python3-statsmodels 0.13.5 and numpy 1.24.

Run: /usr/bin/python3 secondLibrary.py
"""

import json
from pathlib import Path

import numpy as np
import statsmodels
import statsmodels.api as sm
import statsmodels.stats.diagnostic as diagnostic
from statsmodels.stats.outliers_influence import OLSInfluence, variance_inflation_factor
from statsmodels.stats.stattools import durbin_watson, jarque_bera
from statsmodels.tsa.adfvalues import mackinnoncrit
from statsmodels.tsa.stattools import adfuller

here = Path(__file__).parent


def load(name):
    data = json.loads((here.parent / f"{name}.json").read_text())
    X = sm.add_constant(np.column_stack([np.array(c, float) for c in data["X"]]))
    return data, sm.OLS(np.array(data["y"], float), X).fit()


def pair(result):
    return {"statistic": float(result[0]), "p": float(result[1])}


def four(result):
    return {"statistic": float(result[0]), "p": float(result[1]), "f": float(result[2]), "pF": float(result[3])}


def curve(fit, use_f, **covariance):
    """RESET by hand: the library's own raises the raw fitted values, whose cubes its solver takes for one another."""
    z = (fit.fittedvalues - fit.fittedvalues.mean()) / fit.fittedvalues.std()
    curved = sm.OLS(fit.model.endog, np.column_stack([fit.model.exog, z**2, z**3])).fit(**covariance)
    result = curved.wald_test(np.eye(len(curved.params))[-2:], use_f=use_f, scalar=True)
    return result.statistic, result.pvalue


def spread(fit):
    e, X = fit.resid, fit.model.exog
    return {
        "koenker": four(diagnostic.het_breuschpagan(e, X)),
        "breusch-pagan": pair(diagnostic.het_breuschpagan(e, X, robust=False)),
        "white": four(diagnostic.het_white(e, X)),
        "white-fitted": four(diagnostic.het_breuschpagan(e, np.column_stack([np.ones(len(e)), fit.fittedvalues, fit.fittedvalues**2]))),
        "jarque-bera": pair(jarque_bera(e)),
        "reset": pair(curve(fit, use_f=True)),
        "resetHC3": pair(curve(fit, use_f=False, cov_type="HC3")),
    }


def follow_on(fit):
    e = fit.resid
    box = diagnostic.acorr_ljungbox(e, lags=[1, 2, 3], return_df=True)
    cusum = diagnostic.breaks_cusumolsresid(e, ddof=fit.model.exog.shape[1])
    return {
        "breusch-godfrey": [four(diagnostic.acorr_breusch_godfrey(fit, nlags=p)) for p in (1, 2, 3)],
        "ljung-box": [pair(row) for row in box.to_numpy()],
        "arch": [four(diagnostic.het_arch(e, nlags=p)) for p in (1, 2)],
        "durbin-watson": float(durbin_watson(e)),
        "cusum": pair(cusum),
        "recursive": [float(w) for w in diagnostic.recursive_olsresiduals(fit, skip=fit.model.exog.shape[1])[4][fit.model.exog.shape[1] :]],
        "unitRoot": {str(p): float(adfuller(e, maxlag=p, regression="n", autolag=None)[0]) for p in (0, 1, 2)},
    }


def influence(fit):
    found = OLSInfluence(fit)
    X = fit.model.exog
    return {
        "outside": found.resid_studentized_external.tolist(),
        "cook": found.cooks_distance[0].tolist(),
        "dffits": found.dffits[0].tolist(),
        "dfbetas": found.dfbetas.tolist(),
        "vif": [float(variance_inflation_factor(X, j)) for j in range(1, X.shape[1])],
        "condition": float(np.linalg.cond(X / np.linalg.norm(X, axis=0))),
    }


def inference(fit):
    k = len(fit.params)
    R, r = np.vstack([np.eye(k)[1] - np.eye(k)[2], np.eye(k)[2]]), np.array([0.5, -0.25])
    robust = fit.get_robustcov_results("HC1")
    new = fit.model.exog[[0, 3]] * np.array([1] + [1.1] * (k - 1))
    frame = fit.get_prediction(new).summary_frame(alpha=0.1)
    mean_robust = robust.get_prediction(new).summary_frame(alpha=0.1)
    wald_f, wald_c = fit.wald_test((R, r), use_f=True, scalar=True), robust.wald_test((R, r), use_f=False, scalar=True)
    return {
        "f": {"statistic": float(wald_f.statistic), "p": float(wald_f.pvalue)},
        "chiSquareHC1": {"statistic": float(wald_c.statistic), "p": float(wald_c.pvalue)},
        "rows": new[:, 1:].tolist(),
        "value": frame["mean"].tolist(),
        "meanLow": frame["mean_ci_lower"].tolist(),
        "meanHigh": frame["mean_ci_upper"].tolist(),
        "rowLow": frame["obs_ci_lower"].tolist(),
        "rowHigh": frame["obs_ci_upper"].tolist(),
        "meanLowHC1": mean_robust["mean_ci_lower"].tolist(),
    }


def figures(name):
    data, fit = load(name)
    result = {"spread": spread(fit), "influence": influence(fit)}
    if fit.model.exog.shape[1] > 2:
        result["inference"] = inference(fit)
    if data["rows"] == "time":
        result["followOn"] = follow_on(fit)
    return result


names = ["investment", "stackloss", "nile-trend", "public-schools", "mtcars", "consumption-lag", "wages"]
surface = {
    f"{trend} {variables} {n}": [float(v) for v in mackinnoncrit(N=variables, regression=trend, nobs=n)]
    for trend in ("c", "ct")
    for variables in (2, 3, 7, 12)
    for n in (25, 96, 1000)
}
here.joinpath("secondLibrary.json").write_text(
    json.dumps({"madeWith": f"statsmodels {statsmodels.__version__}, numpy {np.__version__}", "figures": {n: figures(n) for n in names}, "unitRootPoints": surface}, indent=1, allow_nan=False)
)
