"""Writes kepler.csv beside itself: Kepler's equation by mpmath at 90 digits, at the doubles of each row.

The root of E - e sin E = M is bracketed by bisection, then polished by Newton's steps. `slope` is dE/dM = 1 / (1 - e cos E),
by which a rounding of M moves the root. `sine` and `cosine` are those of the true anomaly.
"""
import random
from pathlib import Path

from mpmath import cos, mp, mpf, nstr, pi, sin, sqrt

mp.dps = 90
random.seed(9)


def root(M, e):
    low, high = M, min(M + e, mpf(pi))
    for _ in range(60):
        middle = (low + high) / 2
        if middle - e * sin(middle) < M:
            low = middle
        else:
            high = middle
    E = (low + high) / 2
    for _ in range(8):
        E -= (E - e * sin(E) - M) / (1 - e * cos(E))
    return E


eccentricities = [0.0, 1e-12, 0.1, 0.3, 0.5, 0.9, 0.99, 0.999, 0.9999, 0.99999, 1 - 2.0**-40, 1 - 2.0**-53]
eccentricities += [random.random() for _ in range(12)] + [1 - 10 ** random.uniform(-6, -1) for _ in range(10)]
lines = ["meanAnomaly,eccentricity,eccentricAnomaly,slope,sine,cosine"]
for e in eccentricities:
    means = [3.141592653589793, 1e-15, 1e-9, 1e-300, 1.0, 0.1, 1e-3]
    means += [10 ** random.uniform(-15, 0.49) for _ in range(5)] + [random.uniform(0, 3.14) for _ in range(3)]
    for M in means:
        E = root(mpf(M), mpf(e))
        r = 1 - mpf(e) * cos(E)
        s, c = sqrt(1 - mpf(e) ** 2) * sin(E) / r, (cos(E) - mpf(e)) / r
        lines.append(",".join([repr(M), repr(e)] + [nstr(x, 25) for x in (E, 1 / r, s, c)]))
Path(__file__).with_suffix(".csv").write_text("\n".join(lines) + "\n")
