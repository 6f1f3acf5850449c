"""Writes air.csv beside itself: refractivity and air and vacuum wavelengths by mpmath at 50 digits.

Every reference is evaluated at the doubles in the row; `wavelength` is taken once as the vacuum and once as the air
wavelength. The vacuum wavelength is found as a root by the secant method, not by the iteration under test.
"""
import random
from pathlib import Path

from mpmath import findroot, mp, mpf, nstr

mp.dps = 50
random.seed(1996)


def ciddor(square):
    return mpf("0.05792105") / (mpf("238.0185") - square) + mpf("0.00167917") / (mpf("57.362") - square)


def morton(square):
    return (
        mpf("8.34254e-5")
        + mpf("0.02406147") / (130 - square)
        + mpf("1.5998e-4") / (mpf("38.9") - square)
    )


rows = []
for index in range(300):
    wavelength = [2e-7, 2.5e-6][index] if index < 2 else 200e-9 * 12.5 ** random.random()
    given = mpf(wavelength)
    values = []
    for formula in (ciddor, morton):
        index_at = lambda vacuum: 1 + formula((mpf("1e-6") / vacuum) ** 2)
        vacuum = findroot(lambda x: x / index_at(x) - given, (given, given * mpf("1.0003")), solver="secant", tol=1e-80)
        values += [index_at(given) - 1, given / index_at(given), vacuum]
    rows.append([repr(wavelength), *(nstr(value, 25) for value in values)])

header = (
    "wavelength,refractivityCiddor1996,airCiddor1996,vacuumCiddor1996,"
    "refractivityMorton2000,airMorton2000,vacuumMorton2000"
)
Path(__file__).with_suffix(".csv").write_text("\n".join([header, *map(",".join, rows)]) + "\n")
