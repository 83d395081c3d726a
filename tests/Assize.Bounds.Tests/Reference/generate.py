#!/usr/bin/env python3
"""Recomputes a sample of every table here (`check`), writes binomial_large.csv (`large`), gamma_tail.csv (`gamma`) or log_gamma.csv (`loggamma`), or prints Stirling errors (`stirling`). Needs Debian's python3-mpmath."""
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
    seen += check_counts() + check_continuous()
    print(f"{seen} rows recomputed; all agree")


def ln_gamma_upper(a, x):
    """ln Q(a, x) by Legendre's fraction, backwards from a depth that is doubled until 30 digits stand still."""
    factor = a * log(x) - x - mp.loggamma(a)
    depth, before = 64, None
    while True:
        value = mpf(0)
        for n in range(depth, 0, -1):
            value = n * (a - n) / (x + 2 * n + 1 - a + value)
        value = 1 / (x + 1 - a + value)
        if before is not None and abs(value - before) < mpf(10) ** -35 * abs(value):
            return factor + log(value)
        depth, before = 2 * depth, value


def ln_gamma_lower(a, x):
    """ln P(a, x) by the series of positive terms."""
    term = total = mpf(1)
    k = 0
    while term > total * mpf(10) ** -45:
        k += 1
        term *= x / (a + k)
        total += term
    return a * log(x) - x - mp.loggamma(a + 1) + log(total)


def ln_gamma_tails(a, x):
    if x > a + 1 + sqrt(a):
        upper = ln_gamma_upper(a, x)
        return upper, log1p(-exp(upper))
    lower = ln_gamma_lower(a, x)
    return log1p(-exp(lower)), lower


def check_counts():
    seen = 0
    for row in list(rows("poisson_tail"))[::6]:
        mean, k = mpf(float(row["lambda"])), int(row["k"])
        agree(row, ln_gamma_tails(mpf(k + 1), mean)[0], row["ln_p_le"])
        if k > 0:
            agree(row, ln_gamma_tails(mpf(k), mean)[1], row["ln_p_ge"])
        seen += 1
    for row in list(rows("hypergeometric_tail"))[::6]:
        population, marked, drawn, k = (int(row[name]) for name in ("population", "marked", "drawn", "k"))
        if min(marked, drawn) <= 10**4:
            ways = [mp.exp(ln_choose(marked, s) + ln_choose(population - marked, drawn - s) - ln_choose(population, drawn))
                    for s in range(k, min(marked, drawn) + 1) if 0 <= drawn - s <= population - marked]
            if k > marked * drawn // population and ways:
                agree(row, log(mp.fsum(ways)), row["ln_p_ge"])
            seen += 1
    for row in list(rows("clopper_pearson"))[::6]:
        n, k, risk = int(row["n"]), int(row["k"]), mpf(float(row["alpha"])) / 2
        if 0 < k < n <= 10**6:
            agree(row, exp(ln_upper(n, k, mpf(row["lower"]))) / risk, 1, 15)
            agree(row, exp(ln_upper(n, n - k, mpf(row["one_minus_upper"]))) / risk, 1, 15)
            seen += 1
    return seen


def ln_choose(n, k):
    return mp.loggamma(n + 1) - mp.loggamma(k + 1) - mp.loggamma(n - k + 1)


def student_tail(df, t):
    return mp.betainc(df / 2, mpf(1) / 2, 0, df / (df + t * t), regularized=True) / 2


def check_continuous():
    seen = 0
    for row in list(rows("chi2_tail"))[::8]:
        upper, lower = ln_gamma_tails(mpf(float(row["df"])) / 2, mpf(float(row["x"])) / 2)
        agree(row, upper, row["ln_sf"])
        agree(row, lower, row["ln_cdf"])
        seen += 1
    for row in list(rows("student_t_tail"))[::6]:
        if float(row["df"]) <= 1000:
            agree(row, student_tail(mpf(float(row["df"])), mpf(float(row["t"]))), row["sf"])
            seen += 1
    for row in list(rows("student_t_quantile"))[::4]:
        if float(row["df"]) <= 1000:
            agree(row, student_tail(mpf(float(row["df"])), mpf(row["t"])) / mpf(float(row["upper_p"])), 1, 15)
            seen += 1
    for row in list(rows("kolmogorov_exact"))[::5]:
        n, d = int(row["n"]), mpf(float(row["d"]))
        if n <= 50:
            agree(row, one_sided(n, d), row["p_dplus_ge_d"])
            seen += 1
    return seen


def one_sided(n, d):
    """P(D+ >= d): Z. W. Birnbaum and F. H. Tingey, Ann. Math. Statist. 22 (1951) 592-596."""
    whole = int(mp.floor(n * (1 - d)))
    return mp.fsum(d * mp.binomial(n, j) * (1 - d - mpf(j) / n) ** (n - j) * (d + mpf(j) / n) ** (j - 1) for j in range(whole + 1))


def gamma():
    print("# ln P(X > x), ln P(X <= x) of a gamma law of scale 1.")
    print(f"# Python {sys.version.split()[0]}, mpmath 60 digits, series or Legendre's fraction: python3 generate.py gamma > gamma_tail.csv")
    print("# Inputs are the doubles nearest to the printed decimals.")
    print("shape,x,ln_upper,ln_lower")
    for text in ("1e-10", "1e-6", "0.001", "0.03", "0.2", "0.3", "0.31", "0.49", "0.5", "0.51", "0.7", "0.9", "0.99", "1", "1.01"):
        for x in ("1e-250", "1e-30", "1e-5", "0.01", "0.0999", "0.1", "0.5", "0.999", "1", "1.5", "3", "20", "600"):
            print_gamma(text, x)
    for text in ("2.5", "14.9", "100", "12345.678", "1e6", "3e7", "1e9"):
        a = float(text)
        for z in (-30, -8, -3, -1, -0.1, 0, 0.5, 0.99, 1.01, 2, 6, 30):
            if z > -30 or a > 1000:
                print_gamma(text, repr(a + z * a ** 0.5 if a + z * a ** 0.5 > 0 else a / 1000 / -z))


def print_gamma(shape, x):
    mp.dps = 60 + (mpf(float(x)) < 1) * 40
    upper, lower = ln_gamma_tails(mpf(float(shape)), mpf(float(x)))
    print(f"{shape},{x},{mp.nstr(upper, 25)},{mp.nstr(lower, 25)}")


def loggamma():
    print("# ln Gamma(x), and what Stirling's formula for ln Gamma(x + 1) leaves out.")
    print(f"# Python {sys.version.split()[0]}, mpmath 60 digits: python3 generate.py loggamma > log_gamma.csv")
    print("# Inputs are the doubles nearest to the printed decimals.")
    print("x,ln_gamma,stirling_error")
    for text in ("1e-300", "1e-20", "1e-5", "0.01", "0.1", "0.25", "0.49", "0.4999999999", "0.5", "0.7", "0.9", "0.999", "0.99999999",
                 "1", "1.0000000001", "1.0001", "1.2", "1.4616321449683623", "1.4999", "1.5", "1.5001", "1.7", "1.99", "1.999999999",
                 "2", "2.00000001", "2.01", "2.4999", "2.5", "2.5001", "3", "4.7", "9.99", "14.5", "14.9999", "15", "15.0001", "16.3",
                 "100", "1234.5", "1e6", "1e9", "123456789012.5", "1e15", "1e100", "1e300"):
        x = mpf(float(text))
        mp.dps = 400 if x > 10**20 else 60
        # Beyond 1e20 the remainder is 1/(12x) to far more digits than are printed.
        error = 1 / (12 * x) if x > 10**20 else mp.loggamma(x + 1) - log(2 * mp.pi * x) / 2 - x * log(x) + x
        print(f"{text},{mp.nstr(mp.loggamma(x), 25)},{mp.nstr(error, 25)}")


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
    {"check": check, "large": large, "stirling": stirling, "gamma": gamma, "loggamma": loggamma}[sys.argv[1]]()
