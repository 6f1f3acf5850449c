"""Prints those rows of distributions.txt whose source is mpmath 1.3, from the formulas of ISO/IEC 26300-3 section 6.18."""
from mpmath import binomial, betainc, erf, erfc, erfinv, exp, gamma, gammainc, inf, log, mp, mpf, pi, sqrt

mp.dps = 30


def below(z):
    return erfc(-mpf(z) / sqrt(2)) / 2


def quantile(p):
    return sqrt(2) * erfinv(2 * mpf(p) - 1)


def variance(values):
    values = [mpf(each) for each in values]
    mean = sum(values) / len(values)
    return sum((each - mean) ** 2 for each in values) / (len(values) - 1)


def row(section, formula, value):
    print(f"{section} | {formula} |  | ~{float(value)!r} | mpmath 1.3, 30 digits, from the formula of the section")


row("6.18.52", "=NORMDIST(42,40,1.5,TRUE)", below(mpf(2) / mpf("1.5")))
row("6.18.52", "=NORMDIST(0,0,1,FALSE)", 1 / sqrt(2 * pi))
row("6.18.53", "=NORMINV(0.9,63,5)", 63 + 5 * quantile(0.9))
row("6.18.54", "=NORMSDIST(1)", below(1))
row("6.18.54", "=NORMSDIST(-10)", below(-10))
row("6.18.55", "=NORMSINV(0.975)", quantile(0.975))
row("6.18.33", "=GAUSS(1)", erf(1 / sqrt(mpf(2))) / 2)
row("6.18.61", "=PHI(0)", 1 / sqrt(2 * pi))
row("6.18.16", "=CONFIDENCE(0.05,1.5,100)", sqrt(2) * erfinv(1 - mpf(0.05)) * mpf("1.5") / 10)
row("6.18.44", "=LOGNORMDIST(2,0,1,TRUE)", below(log(mpf(2))))
row("6.18.26", "=FISHER(0.5)", log(mpf(3)) / 2)
row("6.18.12", "=CHISQDIST(3,4)", gammainc(2, 0, mpf(1.5), regularized=True))
row("6.18.11", "=CHIDIST(18.307,10)", gammainc(5, mpf("18.307") / 2, inf, regularized=True))
row("6.18.12", "=CHISQ.DIST(3,4,FALSE)", mpf(3) * exp(-mpf(3) / 2) / 4)
row("6.18.31", "=GAMMADIST(2,3,2,TRUE)", gammainc(3, 0, 1, regularized=True))
row("6.18.31", "=GAMMADIST(2,3,2,FALSE)", mpf(4) * exp(-1) / 16)
row("6.18.7", "=BETADIST(0.4,2,3)", betainc(2, 3, 0, mpf(0.4), regularized=True))
row("6.18.21", "=EXPONDIST(0.2,10,TRUE)", 1 - exp(-mpf(0.2) * 10))
row("6.18.21", "=EXPONDIST(0.2,10,FALSE)", 10 * exp(-mpf(0.2) * 10))
row("6.18.86", "=WEIBULL(2,1,2,TRUE)", 1 - exp(mpf(-1)))
row("6.18.86", "=WEIBULL(2,2,2,FALSE)", exp(mpf(-1)))
x = mpf("15.2069")
row("6.18.23", "=FDIST(15.2069,6,4)", betainc(2, 3, 0, 4 / (4 + 6 * x), regularized=True))
t = mpf("1.959999998")
row("6.18.77", "=TDIST(1.959999998,60,2)", betainc(30, mpf(1) / 2, 0, 60 / (60 + t * t), regularized=True))
row("-", "=T.DIST(0.5,3,FALSE)", gamma(2) / (sqrt(3 * pi) * gamma(mpf(3) / 2)) * (1 + mpf("0.25") / 3) ** -2)
row("6.18.62", "=POISSON(2,5,TRUE)", exp(mpf(-5)) * mpf("18.5"))
row("6.18.62", "=POISSON(2,5,FALSE)", exp(mpf(-5)) * mpf("12.5"))
row("6.18.51", "=NEGBINOMDIST(10,5,0.25)", binomial(14, 4) * mpf(0.25) ** 5 * mpf(0.75) ** 10)
row("6.18.37", "=HYPGEOMDIST(1,4,8,20)", mpf(8) * binomial(12, 3) / binomial(20, 4))
observed = [58, 35, 11, 25, 10, 23]
expected = ["45.35", "47.65", "17.56", "18.44", "16.09", "16.91"]
square = sum((mpf(o) - mpf(e)) ** 2 / mpf(e) for o, e in zip(observed, expected))
row("6.18.15", "=CHITEST({58,35;11,25;10,23},{45.35,47.65;17.56,18.44;16.09,16.91})", gammainc(1, square / 2, inf, regularized=True))
differences = [mpf(a - b) for a, b in zip((3, 4, 5, 8, 9, 1, 2, 4, 5), (6, 19, 3, 2, 14, 4, 5, 17, 1))]
paired = sum(differences) / 9 / sqrt(variance(differences) / 9)
row("6.18.81", "=TTEST({3,4,5,8,9,1,2,4,5},{6,19,3,2,14,4,5,17,1},2,1)", betainc(4, mpf(1) / 2, 0, 8 / (8 + paired**2), regularized=True))
first, second = variance([6, 7, 9, 15, 21]), variance([20, 28, 31, 38, 40])
share = betainc(2, 2, 0, first / (first + second), regularized=True)
row("6.18.30", "=FTEST({6,7,9,15,21},{20,28,31,38,40})", 2 * min(share, 1 - share))
sample = [3, 6, 7, 8, 6, 5, 4, 2, 1, 9]
row("6.18.87", "=ZTEST({3,6,7,8,6,5,4,2,1,9},4)", below(-(mpf(sum(sample)) / 10 - 4) / sqrt(variance(sample) / 10)))
