#!/usr/bin/env python3
"""Writes bentkus.csv (`range`), bentkus_variance.csv (`variance`) or bentkus_steps.csv (`steps`); `check` recomputes the rows up to 1000 trials by another
route. Needs mpmath. Sums are exact up to 2^-2400 of the mass at the mean; every whole u from the mean on is compared."""
import csv
import math
import random
import sys
from fractions import Fraction
from mpmath import mp, mpf, log, log1p, sqrt

mp.dps = 60
ONE = 1 << 2400


def quotient(value):
    return mpf(value.numerator) / mpf(value.denominator)


def ln_mass(n, k, p):
    return (mp.loggamma(n + 1) - mp.loggamma(k + 1) - mp.loggamma(n - k + 1)
            + k * log(quotient(p)) + (n - k) * log(quotient(1 - p)))


def excesses(n, p):
    """For every whole u from the mean on: the sums of (B - u)+ and of (B - u)+^2, over the mass at the first."""
    start = max(0, -(-(n * p.numerator) // p.denominator))
    up, down = p.numerator, p.denominator - p.numerator
    masses, k, term = [], start, ONE
    while k <= n and term:
        masses.append(term)
        term = term * ((n - k) * up) // ((k + 1) * down)
        k += 1
    sums, s0, s1, s2 = [], 0, 0, 0
    for mass in reversed(masses):
        sums.append((s1, s2, s0))
        s0, s1, s2 = s0 + mass, s1 + s0 + mass, s2 + 2 * s1 + s0 + mass
    return start, list(reversed(sums)), (s0, s1, s2)


def first_order(n, p, excess):
    """ln of the least E(B - u)+/(level - u), u >= np, level = np + excess."""
    start, sums, (s0, s1, _) = excesses(n, p)
    mean, level = n * p, n * p + excess
    offset = start - mean
    best = quotient(Fraction(s1 - s0, 1) + offset * s0) / quotient(excess)
    scale, least, at = level.denominator, None, None
    for i in range(min(len(sums), int(level) - start + 1)):
        gap = level.numerator - (start + i) * scale
        if gap > 0:
            value = (sums[i][0] << 64) // gap
            if least is None or value < least:
                least, at = value, i
    if at is not None:
        best = min(best, mpf(sums[at][0]) / quotient(level - start - at))
    return ln_mass(n, start, p) + log(best / ONE)


def second_order(n, variance, bound, margin):
    """ln of the least E(T - u)+^2/(n margin - u)^2 over u >= 0, or of Cantelli's."""
    p = variance / (variance + bound * bound)
    step = bound + variance / bound
    excess = n * margin / step
    start, sums, _ = excesses(n, p)
    level, mean = n * p + excess, n * p
    ratios = [(sums[i][1] << 64) * level.denominator ** 2 // (level.numerator - (start + i) * level.denominator) ** 2
              for i in range(min(len(sums), int(level) - start + 1)) if start + i < level]
    at = ratios.index(min(ratios)) if ratios else -1
    candidates = [in_cell(sums, start, cell, mean, level) for cell in (at - 1, at, at + 1) if -1 <= cell < len(sums)]
    squared = ln_mass(n, start, p) + log(min(value for value in candidates if value is not None) / ONE)
    return min(squared, -log1p(quotient(n * margin * margin / variance)))


def in_cell(sums, start, cell, mean, level):
    """The least over v in (start + cell, start + cell + 1), v >= mean, v < level."""
    low, high = max(Fraction(start + cell), mean), min(Fraction(start + cell + 1), level)
    if low >= high:
        return None
    reference = cell if cell >= 0 else 0
    s1, s2, s0 = sums[reference]
    # Moments of B - level over B > start + cell, from those of B - (start + reference).
    if cell < 0:
        s0 += ONE
    shift = start + reference - level
    m0, m1, m2 = Fraction(s0), s1 + shift * s0, s2 + 2 * shift * s1 + shift * shift * s0
    places = [level - low] + ([level - high] if high < level else [])
    if m1 < 0 and level - high < -m2 / m1 < level - low:
        places.append(-m2 / m1)
    return min(quotient(m2 / (d * d) + 2 * m1 / d + m0) for d in places)


def shown(value):
    return float(mp.nstr(value, 6))


def by_range():
    print("# ln of the least E(B - u)+/(level - u) over u at the mean or beyond, B binomial, level = n(mean + margin); and the same")
    print("# for the failures, from their level n - total on.")
    print(f"# Python {sys.version.split()[0]}, mpmath and whole numbers: python3 generate_bentkus.py range > bentkus.csv")
    print("# Inputs are the doubles nearest to the printed decimals.")
    print("n,mean,margin,ln_upper,total,ln_lower")
    for n, means in ((1, (0.5, 0.1, 0.9)), (2, (0.5, 0.01)), (10, (0.5, 0.1, 0.001, 0.99)), (1000, (0.5, 0.3, 0.01, 1e-6, 0.95)),
                     (10**5, (0.5, 0.1, 1e-4)), (10**7, (0.5, 0.01, 1e-7)), (10**9, (0.5, 0.001, 3e-8, 1e-9))):
        for mean in means:
            for z in (0.3, 1, 3, 6, 13, 30):
                p, q = Fraction(mean), 1 - Fraction(mean)
                spread = sqrt(mpf(mean) * (1 - mpf(mean)) / n)
                margin = shown(z * spread * (1 + z * spread / mpf(mean) / 6))
                if margin >= 1 - mean:
                    continue
                upper = first_order(n, p, n * Fraction(margin))
                total = math.ceil(n * (p - Fraction(margin)))
                lower = f"{total},{mp.nstr(first_order(n, q, n * p - total), 25)}" if 0 <= total < n * p else ","
                print(f"{n},{mean!r},{margin!r},{mp.nstr(upper, 25)},{lower}", flush=True)


def by_variance():
    print("# ln of the least E(T - u)+^2/(n margin - u)^2 over u >= 0, or of Cantelli's bound where that is less.")
    print(f"# Python {sys.version.split()[0]}, mpmath and whole numbers: python3 generate_bentkus.py variance > bentkus_variance.csv")
    print("# Inputs are the doubles nearest to the printed decimals.")
    print("n,variance,bound,margin,ln_tail")
    for n, facts in ((1, ((0.25, 0.5), (0.1, 1.0), (4.0, 1.0))), (2, ((0.25, 0.5), (1e-6, 1.0))),
                     (10, ((0.25, 0.5), (0.01, 1.0), (9.0, 1.0), (1e-12, 3.0))),
                     (1000, ((0.25, 0.5), (0.0025, 0.5), (1e6, 1.0), (1e-8, 1.0), (250.0, 30.0))),
                     (10**5, ((0.25, 0.5), (0.0025, 0.5), (1e-4, 1.0))), (10**7, ((0.25, 0.5), (1e-5, 1.0), (1e-7, 1.0))),
                     (10**9, ((0.25, 0.5), (1e-3, 1.0), (1e-9, 1.0), (1e9, 1.0)))):
        for variance, bound in facts:
            for z in (0.3, 1, 1.3, 3, 6, 13, 30):
                spread = sqrt(mpf(variance) / n)
                margin = shown(z * spread * (1 + z * spread * mpf(bound) / mpf(variance) / 6))
                value = second_order(n, Fraction(variance), Fraction(bound), Fraction(margin)) if margin <= bound else -mp.inf
                if value > -mp.inf:
                    print(f"{n},{variance!r},{bound!r},{margin!r},{mp.nstr(value, 25)}", flush=True)


def by_steps():
    print("# The same two bounds, kind range and kind variance, at margins next to a value of the sum, where they fall by a step.")
    print(f"# Python {sys.version.split()[0]}, mpmath and whole numbers: python3 generate_bentkus.py steps > bentkus_steps.csv")
    print("# Inputs are the doubles nearest to the printed decimals. The mean of kind variance is the variance, its bound is 1.")
    print("kind,n,mean,margin,ln_tail")
    source = random.Random(73)
    for row in range(240):
        n, mean = source.choice((1, 2, 3, 5, 10, 30, 100)), float(f"{10 ** source.uniform(-14, -1):.6e}")
        nudge = 1 + source.choice((0, 1e-16, -1e-16, 1e-15, -1e-15, 1e-13, -1e-12, 1e-9))
        kind = ("range", "variance")[row % 2]
        rate, step = (mean, 1) if row % 2 == 0 else (mean / (mean + 1), 1 + mean)
        margin = (source.randint(1, min(n, 12)) / n - rate) * step * nudge
        if 0 < margin < 1 - mean or kind == "variance" and 0 < margin <= 1:
            facts = n, Fraction(mean), Fraction(margin)
            value = first_order(n, facts[1], n * facts[2]) if kind == "range" else second_order(n, facts[1], Fraction(1), facts[2])
            print(f"{kind},{n},{mean!r},{margin!r},{mp.nstr(value, 25)}", flush=True)


def rows(name):
    with open(f"{name}.csv", encoding="utf-8") as file:
        yield from csv.DictReader(line for line in file if not line.startswith("#"))


def on_grid(n, p, excess, power):
    """ln of the least ratio over a fine grid of u >= 0, each expectation summed anew: never below the table's value."""
    mean, step = n * quotient(p), quotient(excess) / 2000
    masses = [(k, mp.exp(ln_mass(n, k, p))) for k in range(int(mean), n + 1)]
    return log(min(mp.fsum(w * (k - mean - i * step) ** power for k, w in masses if k > mean + i * step)
                   / (quotient(excess) - i * step) ** power for i in range(2000)))


def check():
    seen = 0
    for row in rows("bentkus"):
        if int(row["n"]) <= 10 and float(row["margin"]):
            n, p, margin = int(row["n"]), Fraction(float(row["mean"])), Fraction(float(row["margin"]))
            seen += near(row, on_grid(n, p, n * margin, 1), row["ln_upper"])
            if row["total"]:
                seen += near(row, on_grid(n, 1 - p, n * p - int(row["total"]), 1), row["ln_lower"])
    for row in rows("bentkus_variance"):
        if int(row["n"]) <= 10:
            n, v, b, t = int(row["n"]), *(Fraction(float(row[name])) for name in ("variance", "bound", "margin"))
            squared = on_grid(n, v / (v + b * b), n * t / (b + v / b), 2)
            seen += near(row, min(squared, -log1p(quotient(n * t * t / v))), row["ln_tail"])
    print(f"{seen} rows recomputed; all agree")


def near(row, ours, theirs):
    if not -mpf(10) ** -15 <= ours - mpf(theirs) < 0.01:
        sys.exit(f"{row}: on a grid {mp.nstr(ours, 20)}")
    return 1


if __name__ == "__main__":
    {"check": check, "range": by_range, "variance": by_variance, "steps": by_steps}[sys.argv[1]]()
