#!/usr/bin/env python3
"""Recomputes a sample of every table here (`check`), writes binomial_large.csv (`large`) or prints Stirling errors (`stirling`). Needs Debian's python3-mpmath."""
import csv
import sys
from mpmath import mp, mpf, erfc, exp, log, log1p, quad, sqrt

mp.dps = 60


def rows(name):
    with open(f"{name}.csv", encoding="utf-8") as file:
        yield from csv.DictReader(line for line in file if not line.startswith("#"))


def ln_mass(n, k, p):
    return mp.loggamma(n + 1) - mp.loggamma(k + 1) - mp.loggamma(n - k + 1) + k * log(p) + (n - k) * log1p(-p)


def ln_upper(n, k, p):
    """ln P(S >= k) by plain summation of the mass, term by term."""
    if k <= 0:
        return mpf(0)
    term = total = mpf(1)
    j, ratio = k, p / (1 - p)
    while j < n and term > total * mpf(10) ** -40:
        term *= ratio * (n - j) / (j + 1)
        total += term
        j += 1
    return ln_mass(n, k, p) + log(total)


def ln_upper_by_integral(n, k, p):
    """ln P(S >= k) from the beta integral, for numbers of trials too large to sum over."""
    q = 1 - p
    slope = ((k - 1) * q - (n - k) * p) / (p * q)
    width = 1 / max(slope, sqrt((k - 1) / p**2 + (n - k) / q**2))
    def integrand(u):
        s = u * width
        return exp((k - 1) * log1p(-s / p) + (n - k) * log1p(s / q))
    ends = [u for u in (0, 1, 2, 4, 8, 16, 32, 64) if u * width < p]
    value = quad(integrand, ends + [min(p / width * (1 - mpf(10) ** -50), mpf(128))]) * width
    return ln_mass(n, k, p) + log(k / p * value)


def kl(x, p):
    first = x * log(x / p) if x else mpf(0)
    return first + ((1 - x) * log((1 - x) / (1 - p)) if x != 1 else mpf(0))


def agree(what, ours, theirs, digits=20):
    theirs = mpf(theirs)
    if abs(ours - theirs) > abs(theirs) * mpf(10) ** -digits + mpf(10) ** -60:
        sys.exit(f"{what}: computed {mp.nstr(ours, 25)}, table {theirs}")


def check():
    seen = 0
    for row in list(rows("normal_tail"))[::8]:
        agree(row, erfc(mpf(float(row["z"])) / sqrt(2)) / 2, row["phibar"])
        seen += 1
    for row in list(rows("normal_quantile"))[::8]:
        p = mpf(float(row["p"]))
        agree(row, erfc(mpf(row["z_upper"]) / sqrt(2)) / 2, p, 18)
        seen += 1
    for row in list(rows("binomial_tail"))[::12]:
        n, k, p = int(row["n"]), int(row["k"]), mpf(float(row["p"]))
        agree(row, ln_mass(n, k, p), row["ln_pmf"])
        if n <= 10**6 and k >= (n + 1) * p:
            agree(row, ln_upper(n, k, p), row["ln_p_ge"])
        seen += 1
    for row in list(rows("bernoulli_kl"))[::8]:
        agree(row, kl(mpf(float(row["p"])), mpf(float(row["q"]))), row["kl"])
        seen += 1
    for row in list(rows("bernoulli_kl_inverse"))[::8]:
        p, c = mpf(float(row["p"])), mpf(float(row["c"]))
        if row["q_lower"] and mpf(row["q_lower"]) > mpf(10) ** -200:
            agree(row, kl(p, mpf(row["q_lower"])), c, 8)
        seen += 1
    for row in list(rows("fixed_plan_binomial"))[::8]:
        check_plan(row)
        seen += 1
    print(f"{seen} rows recomputed; all agree")


def check_plan(row):
    """The printed error probabilities at n_first, from the printed limits."""
    p0, tol, n = mpf(row["p0"]), mpf(row["tol"]), int(row["n_first"])
    if n > 10**5:
        return
    if row["p_above_hi"] and int(row["hi"]) < n:
        agree(row, exp(ln_upper(n, int(row["hi"]) + 1, p0)), row["p_above_hi"], 15)
    if row["p_below_lo"] and int(row["lo"]) > 0:
        agree(row, exp(ln_upper(n, n - int(row["lo"]) + 1, 1 - p0)), row["p_below_lo"], 15)


def large():
    print("# ln P(S >= k) and ln P(S = k) for numbers of trials beyond 1e9, k above the mean.")
    print(f"# Python {sys.version.split()[0]}, mpmath 60 digits, the beta integral by Gauss-Legendre: python3 generate.py large > binomial_large.csv")
    print("# Rates are the doubles nearest to the printed decimals.")
    print("n,k,p,ln_p_ge,ln_pmf")
    for n in (10**10, 10**12, 10**15):
        for text in ("0.5", "0.3", "0.01", "1e-9"):
            p = mpf(float(text))
            for z in (0.01, 0.5, 1.5, 3, 4.5, 7, 20, 36):
                k = int(mp.ceil(n * p + z * sqrt(n * p * (1 - p)))) + 1
                print(f"{n},{k},{text},{mp.nstr(ln_upper_by_integral(n, k, p), 25)},{mp.nstr(ln_mass(n, k, p), 25)}")


def stirling():
    for n in range(1, 16):
        print(n, repr(float(mp.loggamma(n + 1) - log(2 * mp.pi * n) / 2 - n * log(n) + n)))


if __name__ == "__main__":
    {"check": check, "large": large, "stirling": stirling}[sys.argv[1]]()
