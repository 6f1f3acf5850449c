"""Writes angle.csv beside itself: sine, cosine and arc tangent by mpmath at 50 digits, at the doubles of each row."""
import math
import random
from pathlib import Path

from mpmath import atan2, cos, mp, mpf, nstr, sin

mp.dps = 50
random.seed(7)
angles = [random.uniform(-math.pi, math.pi) for _ in range(150)]
angles += [random.uniform(-1e6, 1e6) for _ in range(60)]
angles += [k * math.pi / 4 for k in range(-9, 10)] + [10 ** random.uniform(-20, 0) for _ in range(40)]
lines = ["angle,sine,cosine,y,x,arcTangent"]
for angle in angles:
    y, x = random.uniform(-1, 1) * 10 ** random.uniform(-9, 9), random.uniform(-1, 1)
    values = [sin(mpf(angle)), cos(mpf(angle)), atan2(mpf(y), mpf(x))]
    lines.append(",".join([repr(angle), *[nstr(v, 22) for v in values[:2]], repr(y), repr(x), nstr(values[2], 22)]))
Path(__file__).with_suffix(".csv").write_text("\n".join(lines) + "\n")
