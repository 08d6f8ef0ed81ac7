"""Gap path, drift, pair comparisons and expected values of one-way company fixed effects.

Everything is computed from the full design Z = [company dummies, regressors] with dense matrices: row weights
g = Z(Z'Z)^-1 w, cosine-weighted h_j, residual maker M = I - Z(Z'Z)^-1 Z', working correlation R_i. Standard errors
only; quantiles of t are another matter. Run from the project's root: python3 tools/reference/gap_and_drift.py
"""
import csv
import json
import math
from pathlib import Path

import numpy as np

GOLDEN = Path("backend/stats/golden")


def read(file, outcome, regressors):
    with open(GOLDEN / file, newline="") as stream:
        rows = sorted(csv.DictReader(stream), key=lambda row: (row["company"], int(row["year"])))
    company = np.array([row["company"] for row in rows])
    year = np.array([int(row["year"]) for row in rows])
    y = np.array([float(row[outcome]) for row in rows])
    x = np.array([[float(row[name]) for name in regressors] for row in rows])
    return company, year, y, x


def clip_rho(raw, rows):
    return min(0.95, max(0.0, (raw + 1 / rows) / (1 - 3 / rows)))


def rhos(company, year, e):
    """The persistence each company's correlation uses: the larger of the pooled and its own."""
    sums = {}
    for name in np.unique(company):
        at = np.flatnonzero(company == name)
        pairs = [(e[a], e[b]) for a, b in zip(at[:-1], at[1:]) if year[b] - year[a] == 1]
        sums[name] = (sum(a * b for a, b in pairs), sum(a * a for a, _ in pairs), len(at))
    num = sum(s[0] for s in sums.values())
    den = sum(s[1] for s in sums.values())
    pooled = clip_rho(num / den, len(company) / len(sums))
    return {
        name: max(pooled, clip_rho(n / d, t)) if t >= 8 and d > 0 else pooled
        for name, (n, d, t) in sums.items()
    }


class Fit:
    def __init__(self, company, year, y, x):
        self.names = list(np.unique(company))
        self.company, self.year = company, year
        dummies = (company[:, None] == np.array(self.names)[None, :]).astype(float)
        self.z = np.hstack([dummies, x])
        self.q, self.r = np.linalg.qr(self.z)
        self.beta = np.linalg.solve(self.r, self.q.T @ y)
        self.e = y - self.z @ self.beta

    def contrast(self, intercepts=None, slopes=()):
        w = np.zeros(self.z.shape[1])
        for name, weight in (intercepts or {}).items():
            w[self.names.index(name)] = weight
        for k, weight in enumerate(slopes):
            w[len(self.names) + k] = weight
        return w

    def standard_error(self, w, rho, cosines):
        g = self.q @ np.linalg.solve(self.r.T, w)
        years = sorted(set(self.year.tolist()))
        T = len(years)
        p = np.array([years.index(t) + 1 for t in self.year])
        h = [
            math.sqrt(2 / T) * np.cos(math.pi * j * (p - 0.5) / T) * g
            for j in range(1, cosines + 1)
        ]
        mh = [v - self.q @ (self.q.T @ v) for v in h]
        numerator, denominator = 0.0, 0.0
        for name in self.names:
            at = np.flatnonzero(self.company == name)
            lag = np.abs(self.year[at][:, None] - self.year[at][None, :])
            R = rho[name] ** lag
            numerator += g[at] @ R @ g[at]
            denominator += np.mean([v[at] @ R @ v[at] for v in mh])
        c = max(1.0, numerator / (T * denominator))
        return math.sqrt(T * np.mean([(v @ self.e) ** 2 for v in h]) * c)


def case(file, outcome, regressors, own):
    company, year, y, x = read(file, outcome, regressors)
    fit = Fit(company, year, y, x)
    rho = rhos(company, year, fit.e)
    T = len(set(year.tolist()))
    few = max(3, round(0.4 * T ** (2 / 3)))
    many = max(3, math.floor(T / 2.5))
    intercept = dict(zip(fit.names, fit.beta))
    peers = [name for name in fit.names if name != own]
    mine = company == own

    level = intercept[own] - np.mean([intercept[name] for name in peers])
    gap = []
    for t, e in zip(year[mine], fit.e[mine]):
        there = fit.e[(year == t) & ~mine]
        gap.append({"year": int(t), "gap": level + e - there.mean(), "peers": len(there)})

    pairs = {
        name: {
            "estimate": intercept[own] - intercept[name],
            "standardError": fit.standard_error(fit.contrast({own: 1, name: -1}), rho, many),
        }
        for name in peers
    }

    trend = year - year.mean()
    wide = Fit(company, year, y, np.column_stack([x, trend * mine, trend * ~mine]))
    w = wide.contrast(slopes=[0] * x.shape[1] + [1, -1])
    drift = {"estimate": float(w @ wide.beta), "standardError": wide.standard_error(w, rho, many)}

    last = x[mine][-1]
    plans = [last, last * 1.1, last * 3, x[mine].mean(axis=0)]
    expected = []
    for plan in plans:
        w = fit.contrast({own: 1}, plan)
        expected.append(
            {
                "regressors": plan.tolist(),
                "estimate": float(w @ fit.beta),
                "standardError": fit.standard_error(w, rho, few),
            }
        )
    levels = {
        name: fit.standard_error(fit.contrast({name: 1}), rho, few) for name in fit.names
    }
    return {
        "file": file,
        "outcome": outcome,
        "regressors": regressors,
        "own": own,
        "gapPath": gap,
        "pairs": pairs,
        "drift": drift,
        "expected": expected,
        "interceptStandardErrors": levels,
    }


VALUE = ("grunfeld11_value_on_inv_capital.csv", "value", ["inv", "capital"])
UNBALANCED = ("grunfeld10_unbalanced.csv", "inv", ["value", "capital"])
CASES = [case(*VALUE, "C06"), case(*VALUE, "C05"), case(*UNBALANCED, "F01"), case(*UNBALANCED, "F05")]
ABOUT = "tools/reference/gap_and_drift.py, numpy " + np.__version__
text = json.dumps({"about": ABOUT, "cases": CASES}, indent=1, default=float)
(GOLDEN / "gap-drift.json").write_text(text + "\n")
