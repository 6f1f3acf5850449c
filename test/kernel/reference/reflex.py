"""Writes reflex.csv beside itself: semi-amplitude, mass, mass function and shift by mpmath at 80 digits.

Every reference is evaluated at the doubles in the row. `amplitude` and `shift` are inputs of the last three columns:
the doubles nearest to the exact K and to the exact shift at K. The mass is found as a root of the mass function
by bisection, not by the closed form that is under test.
"""
import random
from pathlib import Path

from mpmath import cbrt, mp, mpf, nstr, pi, sin, sqrt

mp.dps = 80
random.seed(51)
SOLAR, DAY, LIGHT = 1.3271244e20, 86400.0, mpf(299792458)


def log_uniform(low, high):
    return low * (high / low) ** random.random()


def mass_of(K, P, M, e, i):
    """The root x of (x sin i)^3 / (1 + x)^2 = P K^3 (1 - e^2)^(3/2) / (2 pi GM), which grows with x."""
    f = P * K**3 * sqrt(1 - e**2) ** 3 / (2 * pi * M)
    s = sin(i)
    low, high = mpf(0), mpf(1)
    while (high * s) ** 3 / (1 + high) ** 2 < f:
        high *= 2
    while (high * s) ** 3 / (1 + high) ** 2 > f and high > mpf(10) ** -60:
        low, high = high / 2, high
        if (low * s) ** 3 / (1 + low) ** 2 < f:
            break
        high = low
    for _ in range(130):
        middle = (low + high) / 2
        if (middle * s) ** 3 / (1 + middle) ** 2 < f:
            low = middle
        else:
            high = middle
    return M * (low + high) / 2


rows = []
while len(rows) < 400:
    index = len(rows)
    period = log_uniform(0.1 * DAY, 1e5 * 365.25 * DAY)
    star = log_uniform(0.05, 100) * SOLAR
    planet = star * log_uniform(1e-12, 1)
    eccentricity = random.choice([0.0, random.random(), 1 - log_uniform(1e-4, 1)])
    inclination = random.choice([float(pi / 2), random.uniform(0.001, 3.14), log_uniform(1e-6, 1)])
    if index >= 380:  # companions heavier than their star, nearly parabolic orbits
        planet = star * log_uniform(1, 1e4)
        eccentricity = 1 - log_uniform(1e-12, 1)
    P, M, m, e, i = map(mpf, (period, star, planet, eccentricity, inclination))
    a_star = cbrt((M + m) * P**2 / (4 * pi**2)) * m / (M + m)
    K = 2 * pi * a_star * sin(i) / (P * sqrt(1 - e**2))
    if K > LIGHT / 10:
        continue
    z = sqrt((1 + K / LIGHT) / (1 - K / LIGHT)) - 1
    amplitude, shift = float(K), float(z)
    stretch = (1 + mpf(shift)) ** 2
    K_of_shift = LIGHT * (stretch - 1) / (stretch + 1)
    values = [
        K,
        z,
        mass_of(mpf(amplitude), P, M, e, i),
        P * mpf(amplitude) ** 3 * sqrt(1 - e**2) ** 3 / (2 * pi),
        mass_of(K_of_shift, P, M, e, i),
    ]
    inputs = [period, star, planet, eccentricity, inclination, amplitude, shift]
    rows.append([*map(repr, inputs), *(nstr(value, 25) for value in values)])

header = (
    "period,starMass,planetMass,eccentricity,inclination,amplitude,shift,"
    "reflexAmplitude,planetShift,planetMassOfAmplitude,massFunction,shiftMass"
)
Path(__file__).with_suffix(".csv").write_text("\n".join([header, *map(",".join, rows)]) + "\n")
