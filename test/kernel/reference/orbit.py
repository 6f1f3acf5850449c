"""Writes orbit.csv beside itself: orbit sizes and speeds by mpmath at 60 digits, evaluated at the doubles in the row.

Inputs are random with a fixed seed; the textbook form is used (Newton's Kepler III, then division by the masses).
`axis` is an input of the last two columns: the double nearest to the exact semi-major axis.
"""
import random
from pathlib import Path

from mpmath import cbrt, mp, mpf, nstr, pi, sqrt

mp.dps = 60
random.seed(20240229)
SOLAR, DAY = 1.3271244e20, 86400.0


def log_uniform(low, high):
    return low * (high / low) ** random.random()


rows = []
for index in range(300):
    period = log_uniform(0.1 * DAY, 1e5 * 365.25 * DAY)
    star = log_uniform(0.05, 100) * SOLAR
    planet = 0.0 if index % 50 == 0 else star * log_uniform(1e-12, 1)
    if index >= 280:  # corners of the promised range
        period = random.choice([1.0, 3.15576e16])
        star = random.choice([1e-14, 1e6]) * SOLAR
        planet = random.choice([1e-14, 1e6]) * SOLAR
    P, M, m = mpf(period), mpf(star), mpf(planet)
    a = cbrt((M + m) * P**2 / (4 * pi**2))
    a_star, a_planet = a * m / (M + m), a * M / (M + m)
    axis = float(a)
    v_star, v_planet = 2 * pi * a_star / P, 2 * pi * a_planet / P
    if v_planet >= 299792458 or v_star >= 299792458:
        continue
    A = mpf(axis)
    values = [a, a_star, v_planet, v_star, 2 * pi * sqrt(A**3 / (M + m)), 4 * pi**2 * A**3 / P**2]
    rows.append([repr(period), repr(star), repr(planet), repr(axis), *(nstr(value, 25) for value in values)])

header = "period,starMass,planetMass,axis,semiMajorAxis,starAxis,planetSpeed,starSpeed,orbitalPeriod,totalMass"
Path(__file__).with_suffix(".csv").write_text("\n".join([header, *map(",".join, rows)]) + "\n")
