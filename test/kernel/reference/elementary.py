"""Writes elementary.csv beside itself: cube roots and sines by mpmath at 50 digits, at the doubles in the row.

Cube roots over the whole range of a double, near powers of 8, and of perfect cubes; sines over 0 to pi, near
multiples of pi/4, and near both ends.
"""
import math
import random
from pathlib import Path

from mpmath import cbrt, mp, mpf, nstr, sin

mp.dps = 50
random.seed(8)

rows = []
for index in range(600):
    x = 10 ** random.uniform(-300, 300)
    angle = random.uniform(0, math.pi)
    if index % 4 == 1:
        x = 8.0 ** random.randint(-300, 300) * (1 + random.choice([-1, 1]) * random.random() * 1e-12)
        angle = random.choice([1, 2, 3]) * math.pi / 4 + random.uniform(-1, 1) * 10 ** random.uniform(-16, -2)
    if index % 4 == 2:
        x = float(random.randint(1, 200000) ** 3)
        angle = 10 ** random.uniform(-40, 0)
    if index % 4 == 3:
        x = random.uniform(1, 8)
        angle = math.pi - 10 ** random.uniform(-15.5, 0)
    rows.append([repr(x), repr(angle), nstr(cbrt(mpf(x)), 25), nstr(sin(mpf(angle)), 25)])
rows.append([repr(1e300), repr(math.nextafter(math.pi, 0)), nstr(cbrt(mpf(1e300)), 25), nstr(sin(mpf(math.nextafter(math.pi, 0))), 25)])

header = "x,angle,cubeRoot,sine"
Path(__file__).with_suffix(".csv").write_text("\n".join([header, *map(",".join, rows)]) + "\n")
