#!/usr/bin/python3
"""Looks with scipy at what our estimators made of random samples.

  check_estimators.py TABLE.csv    the table of org.wintersill.climatology.extreme.EstimateTable; exits 1 when something differs
"""
import csv
import math
import sys

import numpy as np
from scipy import optimize, special, stats

passed = failed = 0
worst = {}


def check(name, sample, ok, detail, size=0.0):
    global passed, failed
    worst[name] = max(worst.get(name, 0.0), size)
    if ok:
        passed += 1
    else:
        failed += 1
        print(f"FAILED sample {sample}: {name}: {detail}")


def close(name, sample, ours, theirs, tolerance):
    check(name, sample, abs(ours - theirs) <= tolerance, f"ours {ours}, scipy {theirs}", abs(ours - theirs))


def exact_shape(t3):
    """Root of t3 = 2 (1 - 3^-k) / (1 - 2^-k) - 3."""
    return optimize.brentq(lambda k: 2 * np.expm1(-k * math.log(3)) / np.expm1(-k * math.log(2)) - 3 - t3, -0.9, 3, xtol=1e-13)


for row in csv.DictReader(open(sys.argv[1], encoding="utf-8")):
    sample = row["sample"]
    x = np.array([float(v) for v in row["values"].split()])
    n = len(x)
    num = {key: float(value) for key, value in row.items() if key not in ("values", "sample")}
    s = np.sort(x)
    # L-moments from their definition: expectations over all pairs and triples, independent of probability-weighted moments
    pairs = np.abs(s[:, None] - s[None, :]).sum() / (n * (n - 1)) / 2
    i = np.arange(n)
    weights3 = [special.comb(a, 2) - 2 * a * (n - 1 - a) + special.comb(n - 1 - a, 2) for a in i]
    l3 = (np.array(weights3) * s).sum() / special.comb(n, 3) / 3
    close("l2", sample, num["l2"], pairs, 1e-9)
    close("t3", sample, num["t3"], l3 / pairs, 1e-9)
    k = exact_shape(num["t3"])
    close("L-moment shape", sample, num["lm_xi"], -k, 1.5e-5 if -0.1 <= num["t3"] <= 0.5 else 2e-3)
    fitted = stats.genextreme(-num["lm_xi"], num["lm_loc"], num["lm_scale"])
    close("mean of the L-moment fit", sample, fitted.mean(), x.mean(), 1e-7 * (1 + abs(x.mean())))
    # maximum likelihood: same value, and scipy's search from ours finds nothing better within |xi| <= 0.5
    ours = (num["ml_loc"], math.log(num["ml_scale"]), num["ml_xi"])

    def loss(p):
        return math.inf if abs(p[2]) > 0.5 else -stats.genextreme.logpdf(x, -p[2], p[0], math.exp(p[1])).sum()

    close("log-likelihood", sample, num["ml_loglik"], -loss(ours), 1e-6)
    better = optimize.minimize(loss, ours, method="Nelder-Mead", options={"xatol": 1e-9, "fatol": 1e-10, "maxiter": 4000})
    other = optimize.minimize(loss, (x.mean(), math.log(x.std()), 0.0), method="Nelder-Mead",
                              options={"xatol": 1e-9, "fatol": 1e-10, "maxiter": 8000, "maxfev": 8000})
    gain = num["ml_loglik"] + min(better.fun, other.fun)
    check("nothing is likelier", sample, gain > -1e-5, f"scipy gains {-gain}", max(0.0, -gain))
    law = stats.genextreme(-num["ml_xi"], num["ml_loc"], num["ml_scale"])
    close("50-winter level", sample, num["level50"], law.isf(1 / 50), 1e-7 * (1 + abs(num["level50"])))
    close("Cramer-von Mises", sample, num["cvm"], stats.cramervonmises(x, law.cdf).statistic, 1e-9)
    j = np.arange(1, n + 1)
    ad = -n - ((2 * j - 1) / n * (law.logcdf(s) + law.logsf(s[::-1]))).sum()
    close("Anderson-Darling", sample, num["ad"], ad, 1e-7)
    # ranks
    years = 1960.0 + np.arange(n)
    close("Theil-Sen", sample, num["sen"], stats.theilslopes(x, years)[0], 1e-9)
    tau = stats.kendalltau(years, x)
    ties = sum(t * (t - 1) / 2 for t in np.unique(x, return_counts=True)[1])
    total = n * (n - 1) / 2
    close("Mann-Kendall S", sample, num["mk_s"], tau.statistic * math.sqrt(total * (total - ties)), 1e-6)
    plain = stats.kendalltau(years, x, method="asymptotic").pvalue
    without_continuity = 2 * stats.norm.sf(abs(num["mk_s"]) / math.sqrt(num["mk_var"]))
    close("variance of S with ties", sample, without_continuity, plain, 1e-9)
    close("Mann-Kendall p", sample, num["mk_p"],
          2 * stats.norm.sf(max(0.0, abs(num["mk_s"]) - 1) / math.sqrt(num["mk_var"])), 1e-9)

for name, size in worst.items():
    print(f"ok     {name}: largest difference {size:.2g}")
print(f"{passed} passed, {failed} failed")
sys.exit(1 if failed else 0)
