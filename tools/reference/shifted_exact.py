"""Fixed effects in exact rational arithmetic after 1e9 is added to every number of a panel.

The sums x + 1e9 and y + 1e9 are rounded to doubles first, as a program that reads them would; from there on nothing
is rounded. Run from the project's root: python3 tools/reference/shifted_exact.py
"""
import csv
import json
from fractions import Fraction
from pathlib import Path

GOLDEN = Path("backend/stats/golden")
SHIFT = 1e9


def solve(matrix, right):
    """Gauss-Jordan elimination over the rationals."""
    size = len(matrix)
    rows = [list(row) + [value] for row, value in zip(matrix, right)]
    for k in range(size):
        pivot = next(i for i in range(k, size) if rows[i][k] != 0)
        rows[k], rows[pivot] = rows[pivot], rows[k]
        rows[k] = [value / rows[k][k] for value in rows[k]]
        for i in range(size):
            if i != k:
                factor = rows[i][k]
                rows[i] = [a - factor * b for a, b in zip(rows[i], rows[k])]
    return [row[-1] for row in rows]


def case(file, outcome, regressors):
    with open(GOLDEN / file, newline="") as stream:
        rows = list(csv.DictReader(stream))
    columns = [outcome, *regressors]
    groups = {}
    for row in rows:
        shifted = [Fraction(float(row[name]) + SHIFT) for name in columns]
        groups.setdefault(row["company"], []).append(shifted)
    means = {
        name: [sum(column) / len(block) for column in zip(*block)]
        for name, block in groups.items()
    }
    within = [
        [value - mean for value, mean in zip(row, means[name])]
        for name, block in groups.items()
        for row in block
    ]
    size = len(regressors)
    cross = [[sum(row[k] * row[l] for row in within) for l in range(1, size + 1)] for k in range(1, size + 1)]
    right = [sum(row[k] * row[0] for row in within) for k in range(1, size + 1)]
    slopes = solve(cross, right)
    rss = sum((row[0] - sum(b * v for b, v in zip(slopes, row[1:]))) ** 2 for row in within)
    tss = sum(row[0] ** 2 for row in within)
    intercepts = {
        name: mean[0] - sum(b * v for b, v in zip(slopes, mean[1:])) for name, mean in means.items()
    }
    average = sum(intercepts.values()) / len(intercepts)
    return {
        "file": file,
        "outcome": outcome,
        "regressors": regressors,
        "slopes": dict(zip(regressors, map(float, slopes))),
        "residualSquares": float(rss),
        "withinRSquared": float(1 - rss / tss),
        "intercepts": {name: float(value) for name, value in intercepts.items()},
        "deviations": {name: float(value - average) for name, value in intercepts.items()},
    }


CASES = [
    case("grunfeld10.csv", "inv", ["value", "capital"]),
    case("grunfeld11_value_on_inv_capital.csv", "value", ["inv", "capital"]),
    case("grunfeld10_unbalanced.csv", "inv", ["value", "capital"]),
    case("usairlines.csv", "log_cost", ["log_output", "log_price", "load"]),
]
ABOUT = "tools/reference/shifted_exact.py: exact rational arithmetic on the doubles x + 1e9"
text = json.dumps({"about": ABOUT, "shift": SHIFT, "cases": CASES}, indent=1)
(GOLDEN / "shifted.json").write_text(text + "\n")
