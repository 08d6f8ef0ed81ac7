"""Expected values, bands of the market value, familiar ranges and values that reach a target, by definition.

Everything is computed from the full design Z = [company dummies, year dummies but the first, regressors] with dense
matrices. Year effects are normalised afterwards: c_t = d_t - mean(d), a_i = alpha_i + mean(d). A contrast is written in
the coefficients of Z; nothing is centred and nothing is taken from a stored form. The value that reaches a target is
found as the roots of a polynomial in it. Run from the project's root: python3 tools/reference/prediction.py
"""
import csv
import json
import math
from pathlib import Path

import numpy as np
import scipy
from scipy.stats import t as student

GOLDEN = Path("backend/stats/golden")


def read(file, outcome, regressors, log, lag):
    """Rows as the model reads them, and each company's regressors by year, not lagged, in the panel's measure."""
    with open(GOLDEN / file, newline="") as stream:
        cells = sorted(csv.DictReader(stream), key=lambda row: (row["company"], int(row["year"])))
    by_year = {
        (row["company"], int(row["year"])): [float(row[name]) for name in regressors] for row in cells
    }
    rows = []
    for row in cells:
        company, year = row["company"], int(row["year"])
        source = by_year.get((company, year - lag))
        if source is not None:
            rows.append((company, year, float(row[outcome]), source))
    company = np.array([row[0] for row in rows])
    year = np.array([row[1] for row in rows])
    y = np.array([row[2] for row in rows])
    x = np.array([row[3] for row in rows])
    return company, year, np.log(y) if log else y, np.log(x) if log else x, by_year


def clip_rho(raw, rows):
    return min(0.95, max(0.0, (raw + 1 / rows) / (1 - 3 / rows)))


class Fit:
    def __init__(self, company, year, y, x, years):
        self.company, self.year, self.y, self.x = company, year, y, x
        self.names = sorted(set(company.tolist()))
        self.years = sorted(set(year.tolist()))
        self.T = len(self.years)
        columns = [(company == name).astype(float) for name in self.names]
        self.dummies = self.years[1:] if years else []
        columns += [(year == t).astype(float) for t in self.dummies]
        self.z = np.column_stack(columns + [x])
        self.q, self.r = np.linalg.qr(self.z)
        self.beta = np.linalg.solve(self.r, self.q.T @ y)
        # One step of refinement: normal equations of the residuals.
        self.beta += np.linalg.solve(self.r, self.q.T @ (y - self.z @ self.beta))
        self.e = y - self.z @ self.beta
        self.b = self.beta[-x.shape[1]:]
        self.rho = self.persistence()
        self.cosines = max(3, round(0.4 * self.T ** (2 / 3)))

    def persistence(self):
        sums = {}
        for name in self.names:
            at = np.flatnonzero(self.company == name)
            pairs = [
                (self.e[a], self.e[b])
                for a, b in zip(at[:-1], at[1:])
                if self.year[b] - self.year[a] == 1
            ]
            sums[name] = (sum(a * b for a, b in pairs), sum(a * a for a, _ in pairs), len(at))
        pooled = clip_rho(
            sum(s[0] for s in sums.values()) / sum(s[1] for s in sums.values()),
            len(self.company) / len(sums),
        )
        return {
            name: max(pooled, clip_rho(n / d, rows)) if rows >= 8 and d > 0 else pooled
            for name, (n, d, rows) in sums.items()
        }

    def year_weights(self, weights):
        """Coefficients of Z that make sum of weights[t] * c_t, c normalised to sum to zero over the years."""
        w = np.zeros(self.z.shape[1])
        total = sum(weights.values())
        for k, t in enumerate(self.dummies):
            w[len(self.names) + k] = weights.get(t, 0) - total / self.T
        return w

    def intercept_weights(self, name):
        w = np.zeros(self.z.shape[1])
        w[self.names.index(name)] = 1
        for k in range(len(self.dummies)):
            w[len(self.names) + k] = 1 / self.T
        return w

    def slope_weights(self, x):
        w = np.zeros(self.z.shape[1])
        w[-self.x.shape[1]:] = x
        return w

    def error(self, w):
        """Standard error of w'beta, its calibration, and h_j'e of every cosine."""
        g = self.q @ np.linalg.solve(self.r.T, w)
        p = np.array([self.years.index(t) + 1 for t in self.year])
        h = [
            math.sqrt(2 / self.T) * np.cos(math.pi * j * (p - 0.5) / self.T) * g
            for j in range(1, self.cosines + 1)
        ]
        mh = [v - self.q @ (self.q.T @ v) for v in h]
        numerator, denominator = 0.0, 0.0
        for name in self.names:
            at = np.flatnonzero(self.company == name)
            R = self.rho[name] ** np.abs(self.year[at][:, None] - self.year[at][None, :])
            numerator += g[at] @ R @ g[at]
            denominator += np.mean([v[at] @ R @ v[at] for v in mh])
        c = max(1.0, numerator / (self.T * denominator))
        lambdas = np.array([v @ self.e for v in h])
        return math.sqrt(self.T * np.mean(lambdas**2) * c), c, lambdas


def case(label, file, outcome, regressors, own, *, years=False, log=False, lag=0, confidence=0.95):
    company, year, y, x, by_year = read(file, outcome, regressors, log, lag)
    fit = Fit(company, year, y, x, years)
    mine = np.flatnonzero(company == own)
    last = mine[-1]
    last_year = int(year[last])
    held = np.array(by_year[(own, last_year)])
    rho = fit.rho[own]
    smear = float(np.mean(np.exp(fit.e))) if log else None
    scale = np.log if log else (lambda v: np.asarray(v, dtype=float))
    back = np.exp if log else (lambda v: v)
    quantile = student.ppf(1 - (1 - confidence) / 2, fit.cosines)

    effect_of = {
        "last": {fit.years[-1]: 1.0},
        "mean-of-last-three": {t: 1 / 3 for t in fit.years[-3:]},
    }
    given = 0.05 if log else 25.0

    # Weights of the estimated part, and the constant beside it.
    def contrast(values, h, start, choice):
        share = rho**h if start == "carry-the-gap" else 0.0
        w = (1 - share) * fit.intercept_weights(own)
        w = w + fit.slope_weights(values - share * x[last])
        constant = share * y[last]
        if years:
            if choice == "given":
                constant += given
            else:
                w = w + fit.year_weights(effect_of[choice])
            w = w - share * fit.year_weights({last_year: 1.0})
        return w, constant

    own_years = year[mine]
    rows = len(mine)
    lags = np.abs(own_years[:, None] - own_years[None, :])
    f = float((rho**lags).sum() / rows)
    s2 = float((fit.e[mine] ** 2).sum() / (rows - f))
    band_df = max(2.0, rows * (1 - rho**2) / (1 + rho**2) - 1)
    band_quantile = student.ppf(0.9, band_df)

    demeaned = np.vstack([x[company == name] - x[company == name].mean(axis=0) for name in fit.names])
    owner = np.concatenate([company[company == name] for name in fit.names])
    inverse = np.linalg.inv(demeaned.T @ demeaned)
    leverages = np.einsum("ij,jk,ik->i", demeaned, inverse, demeaned)
    own_mean = x[mine].mean(axis=0)

    plans = {1: held * 1.05, 3: held * np.array([1.3, 0.9]), 5: held * np.array([2.5, 1.8])}
    predictions = []
    for h, plan in plans.items():
        values = scale(plan)
        distance = values - own_mean
        entry = {
            "year": last_year + h,
            "regressors": plan.tolist(),
            "leverage": float(distance @ inverse @ distance),
            "looks": [],
        }
        for start in ["model-level", "carry-the-gap"]:
            for choice in ["last", "mean-of-last-three", "given"] if years else ["last"]:
                w, constant = contrast(values, h, start, choice)
                point = float(w @ fit.beta) + constant
                se, c, lambdas = fit.error(w)
                factor = smear if log and start == "model-level" else 1.0
                ahead = s2 * (1 - rho ** (2 * h))
                if start == "model-level":
                    shared = float((rho ** (last_year + h - own_years)).sum())
                    variance = max(s2 * (1 - 2 / rows * shared) + se**2, ahead)
                else:
                    variance = ahead + se**2
                sd = math.sqrt(variance)
                look = {
                    "start": start,
                    "yearEffect": {"given": given} if choice == "given" else choice,
                    "point": point,
                    "standardError": se,
                    "estimate": float(back(point)) * factor,
                    "low": float(back(point - quantile * se)) * factor,
                    "high": float(back(point + quantile * se)) * factor,
                    "bandStandardError": sd,
                    "bandLow": float(back(point - band_quantile * sd)),
                    "bandHigh": float(back(point + band_quantile * sd)),
                    "fromLast": float(np.log(back(point) * factor) - y[last] if log else point - y[last]),
                    "reach": [],
                }
                if years and choice != "given":
                    change = fit.year_weights(effect_of[choice]) - fit.year_weights({last_year: 1.0})
                    none = choice == "last" and fit.years[-1] == last_year
                    look["yearEffectChange"] = {
                        "estimate": 0.0 if none else float(change @ fit.beta),
                        "standardError": 0.0 if none else fit.error(change)[0],
                    }
                for k in range(len(regressors)):
                    target = look["estimate"] * (1.01 if k == 0 else 0.97)
                    wanted = math.log(target / factor) if log else target
                    xi = values[k] + (wanted - point) / fit.b[k]
                    zero = values.copy()
                    zero[k] = 0.0
                    w0, constant = contrast(zero, h, start, choice)
                    unit = np.zeros(len(regressors))
                    unit[k] = 1.0
                    w1 = fit.slope_weights(unit)
                    _, c, _ = fit.error(w0 + xi * w1)
                    l0, l1 = fit.error(w0)[2], fit.error(w1)[2]
                    a0 = float(w0 @ fit.beta) + constant - wanted
                    a1 = float(w1 @ fit.beta)
                    scaling = quantile**2 * c * fit.T
                    quadratic = [
                        a1 * a1 - scaling * np.mean(l1 * l1),
                        2 * (a0 * a1 - scaling * np.mean(l0 * l1)),
                        a0 * a0 - scaling * np.mean(l0 * l0),
                    ]
                    roots = np.roots(quadratic)
                    if np.iscomplex(roots).any():
                        found = {"kind": "every-value"}
                    else:
                        low, high = sorted(float(back(root)) for root in roots.real)
                        found = (
                            {"kind": "interval", "low": low, "high": high}
                            if quadratic[0] > 0
                            else {"kind": "rays", "upTo": low, "from": high}
                        )
                    look["reach"].append(
                        {"regressor": k, "target": target, "value": float(back(xi)), "range": found}
                    )
                entry["looks"].append(look)
        predictions.append(entry)
    return {
        "label": label,
        "file": file,
        "outcome": outcome,
        "regressors": regressors,
        "own": own,
        "specification": {
            "effects": "company,year" if years else "company",
            "form": "log" if log else "levels",
            "lag": lag,
            "confidence": confidence,
        },
        "slopes": fit.b.tolist(),
        "persistence": rho,
        "errorVariance": s2,
        "bandDegreesOfFreedom": band_df,
        "smear": smear,
        "held": held.tolist(),
        "largestOwnLeverage": float(leverages[owner == own].max()),
        "largestLeverage": float(leverages.max()),
        "predictions": predictions,
    }


VALUE = ("grunfeld11_value_on_inv_capital.csv", "value", ["inv", "capital"])
UNBALANCED = ("grunfeld10_unbalanced.csv", "inv", ["value", "capital"])
BALANCED = ("grunfeld10.csv", "inv", ["value", "capital"])
CASES = [
    case("levels", *VALUE, "C06"),
    case("levels, a persistent company", *VALUE, "C05"),
    case("year effects, balanced", *VALUE, "C05", years=True),
    case("year effects, a high confidence", *VALUE, "C06", years=True, confidence=0.99),
    case("year effects, unbalanced", *UNBALANCED, "F05", years=True),
    case("year effects, own years end early", *UNBALANCED, "F07", years=True),
    case("levels, well determined slopes", *BALANCED, "F01"),
    case("levels, a low confidence", *BALANCED, "F02", confidence=0.6),
    case("log", *BALANCED, "F03", log=True),
    case("lag", *UNBALANCED, "F05", lag=1),
    case("year effects, log and lag", *UNBALANCED, "F07", years=True, log=True, lag=1),
]
ABOUT = f"tools/reference/prediction.py, numpy {np.__version__}, t quantiles from scipy {scipy.__version__}"
text = json.dumps({"about": ABOUT, "cases": CASES}, indent=1, default=float)
(GOLDEN / "prediction-paths.json").write_text(text + "\n")
