#!/usr/bin/env python3
"""Writes mean_facts.csv (`mean`) or spread_facts.csv (`spread`): closed forms of bounds on an average at scattered arguments of
every size. Needs mpmath; `check` recomputes both."""
import random
import sys
from mpmath import mp, mpf, log, log1p, sqrt

mp.dps = 120


def shown(value):
    return mp.nstr(value, 25)


def power(source, least, most):
    return float(f"{10 ** source.uniform(least, most):.6e}")


def header(what, command, columns):
    yield f"# {what}"
    yield f"# Python {sys.version.split()[0]}, mpmath 120 digits: python3 generate_facts.py {command} > {command}_facts.csv"
    yield "# Inputs are the doubles nearest to the printed decimals."
    yield columns


def exponents(variance, bound, margin):
    u = bound * margin / variance
    bernstein = margin ** 2 / (2 * (variance + bound * margin / 3))
    bennett = variance / bound ** 2 * ((1 + u) * log1p(u) - u)
    whole = variance + bound ** 2
    x, p = (variance + bound * margin) / whole, variance / whole
    hoeffding = x * log(x / p) + ((1 - x) * log((1 - x) / (1 - p)) if margin < bound else 0)
    return bernstein, bennett, hoeffding


def by_mean():
    yield from header("Exponents of Bernstein's, Bennett's and Hoeffding's bounds from a variance.", "mean",
                      "n,variance,bound,margin,ln_bernstein,ln_bennett,ln_hoeffding")
    source, rows = random.Random(67), 0
    while rows < 200:
        scale = power(source, -40, 40)
        variance, bound = float(f"{scale * scale * power(source, -12, 12):.6e}"), scale
        margin = float(f"{scale * power(source, -8, 0):.6e}") if rows % 10 else bound
        values = exponents(mpf(variance), mpf(bound), mpf(margin))
        trials = int(mp.floor(mpf(10) ** source.uniform(-2, 2.83) / values[2])) + (rows % 5 == 0)
        if 1 <= trials <= 10**15 and trials * values[2] < 689:
            rows += 1
            yield f"{trials},{variance!r},{bound!r},{margin!r}," + ",".join(shown(-trials * value) for value in values)


def by_spread():
    yield from header("Tails and margins of Cantelli's, Chebyshev's, the fourth-moment, Catoni's and the paired bounds.", "spread",
                      "n,deviation,kurtosis,margin,risk,cantelli,chebyshev,fourth,ln_catoni,"
                      "r_cantelli,r_chebyshev,r_fourth,r_catoni,r_paired,ln_paired")
    source = random.Random(71)
    for row in range(200):
        trials = 2 * int(10 ** source.uniform(0, 9 if row % 3 else 3))
        deviation, kurtosis = power(source, -60, 60), 1 + power(source, -3, 9)
        margin = float(f"{deviation * power(source, -1, 2) / trials ** 0.5:.6e}")
        risk = power(source, -300 if row % 2 else -12, -0.01)
        n, s, k, t, r = trials, mpf(deviation), mpf(kurtosis), mpf(margin), mpf(risk)
        twice = -2 * log(r)
        shortfall = mpf(min(1.0, 30 * margin / deviation))
        values = (s * s / (s * s + n * t * t), s * s / (n * t * t), (n * k + 3 * mpf(n) * (n - 1)) * (s / (n * t)) ** 4,
                  -n * t * t / (2 * (s * s + t * t)), s * sqrt((1 - r) / (n * r)), s / sqrt(n * r),
                  s / sqrt(mpf(n)) * ((3 + (k - 3) / n) / r) ** mpf("0.25"),
                  s * sqrt(twice / (n - twice)) if n > twice else mp.inf, sqrt((k + 3) * twice / n),
                  -n / mpf(2) * shortfall ** 2 / (k + 3))
        cells = [shown(value) if value < mp.inf else "Infinity" for value in values]
        yield f"{trials},{deviation!r},{kurtosis!r},{margin!r},{risk!r}," + ",".join(cells)


def check():
    for name, lines in (("mean", by_mean()), ("spread", by_spread())):
        with open(f"{name}_facts.csv", encoding="utf-8") as file:
            table = [line.rstrip("\n") for line in file if not line.startswith("#")]
        if table != [line for line in lines if not line.startswith("#")]:
            sys.exit(f"{name}_facts.csv differs")
        print(f"{name}_facts.csv: {len(table) - 1} rows recomputed; all agree")


if __name__ == "__main__":
    if sys.argv[1] == "check":
        check()
    else:
        print("\n".join({"mean": by_mean, "spread": by_spread}[sys.argv[1]]()))
