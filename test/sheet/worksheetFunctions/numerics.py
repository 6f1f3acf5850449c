"""Prints numerics.txt: special functions by mpmath 1.3 at 30 digits, at the doubles of the arguments."""
import mpmath as m

m.mp.dps = 30
print("# function | arguments | value | relative tolerance. Values: mpmath 1.3 at 30 digits, at the doubles of the arguments (numerics.py)")


def add(name, arguments, value, tolerance):
    if value == value and abs(value) >= 1e-290:
        print(f"{name} | {' '.join(repr(each) for each in arguments)} | {float(value)!r} | {tolerance}")


for x in [0.01, 0.3, 0.9, 1.1, 1.5, 2.2, 3.3, 9.7, 10.2, 100.5, 1e8]:
    add("logGamma", [x], m.loggamma(m.mpf(x)), 1e-13)
for x in [-3.7, -0.3, 0.01, 0.5, 1.1, 5.5, 9.7, 24.5, 100.5, 170.6]:
    add("gamma", [x], m.gamma(m.mpf(x)), 2e-14)
for a in [0.01, 0.5, 1.0, 2.5, 10.0, 77.7]:
    for r in [0.01, 0.5, 1.0, 1.5, 5.0]:
        x = a * r
        add("gammaBelow", [a, x], m.gammainc(m.mpf(a), 0, m.mpf(x), regularized=True), 2e-13)
        add("gammaAbove", [a, x], m.gammainc(m.mpf(a), m.mpf(x), m.inf, regularized=True), 2e-13)
for a in [0.1, 0.5, 3.3, 20.0, 500.5]:
    for b in [0.5, 2.0, 30.0]:
        for x in [1e-5, 0.1, 0.5, 0.9]:
            add("betaBelow", [x, a, b], m.betainc(m.mpf(a), m.mpf(b), 0, m.mpf(x), regularized=True), 5e-13)
for x in [1e-10, 0.3, 1.0, 1.9, 3.0, 9.0, 20.0]:
    add("erf", [x], m.erf(m.mpf(x)), 1e-14)
    add("erfc", [x], m.erfc(m.mpf(x)), 1e-13)
for p in [1e-10, 1e-5, 0.01, 0.3, 0.6, 0.975, 0.9999999]:
    add("normalQuantile", [p], m.sqrt(2) * m.erfinv(2 * m.mpf(p) - 1), 2e-14)
for x in [0.1, 1.5, 7.7, 63.2]:
    for n in [0, 1, 5]:
        for name, function in (("besselI", m.besseli), ("besselJ", m.besselj), ("besselK", m.besselk), ("besselY", m.bessely)):
            add(name, [x, float(n)], function(n, m.mpf(x)), 3e-14)
