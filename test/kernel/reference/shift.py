"""Writes shift.csv beside itself: Doppler shifts and detector shifts by mpmath at 80 digits.

Every reference is evaluated at the doubles in the row. `shift` is an input of `speedOfShift`, `pixels` of
`pixelSpeed`: the doubles nearest to the exact values.
"""
import random
from pathlib import Path

from mpmath import mp, mpf, nstr, sqrt

mp.dps = 80
random.seed(1842)
LIGHT = mpf(299792458)


def log_uniform(low, high):
    return low * (high / low) ** random.random()


rows = []
for index in range(400):
    speed = log_uniform(1e-6, 0.9 * 299792458) * random.choice([-1, 1])
    if index >= 370:  # up to the last doubles below the speed of light
        speed = (299792458 - log_uniform(1e-7, 1e8)) * random.choice([-1, 1])
    wavelength = log_uniform(100e-9, 30e-6)
    resolving_power = random.uniform(1e3, 3e5)
    pixels_per_element = random.uniform(1, 10)
    v, R, s = mpf(speed), mpf(resolving_power), mpf(pixels_per_element)
    z = sqrt((1 + v / LIGHT) / (1 - v / LIGHT)) - 1
    x = v * R * s / LIGHT
    shift, pixels = float(z), float(x)
    stretch = (1 + mpf(shift)) ** 2
    values = [
        z,
        LIGHT * (stretch - 1) / (stretch + 1),
        mpf(wavelength) * z,
        v / LIGHT,
        x,
        mpf(pixels) * LIGHT / (R * s),
    ]
    inputs = [speed, shift, wavelength, resolving_power, pixels_per_element, pixels]
    rows.append([*map(repr, inputs), *(nstr(value, 25) for value in values)])

header = (
    "speed,shift,wavelength,resolvingPower,pixelsPerElement,pixels,"
    "shiftOfSpeed,speedOfShift,lineShift,linearShift,pixelShift,pixelSpeed"
)
Path(__file__).with_suffix(".csv").write_text("\n".join([header, *map(",".join, rows)]) + "\n")
