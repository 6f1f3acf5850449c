"""Writes earth.csv beside itself, by ERFA 2.0 (python3-erfa): run with /usr/bin/python3.

Days from J2000.0 TDB and, for want of another clock, the same number as TT and UT1; the Earth's barycentric position [m]
and velocity [m/s] by epv00; the ICRS components of the axes of date (bias, precession, nutation) by pnm06a; Greenwich
apparent sidereal time [rad] by gst06a; TDB - TT [s] at the geocentre by dtdb.
"""
import random
from pathlib import Path

import erfa

random.seed(3)
J2000, AU = 2451545.0, 149597870700.0
days = sorted([-10227.5, 0.0, 13148.5] + [round(random.uniform(-10227, 13148), 6) for _ in range(90)])
names = ["days", "x", "y", "z", "vx", "vy", "vz", *[f"m{i}{j}" for i in range(3) for j in range(3)], "sidereal", "tdb"]
lines = [",".join(names)]
for t in days:
    state = erfa.epv00(J2000, t)[1]
    numbers = [*(state["p"] * AU), *(state["v"] * AU / 86400.0), *erfa.pnm06a(J2000, t).ravel()]
    numbers += [erfa.gst06a(J2000, t, J2000, t), erfa.dtdb(J2000, t, 0.0, 0.0, 0.0, 0.0)]
    lines.append(",".join(repr(float(n)) for n in [t, *numbers]))
Path(__file__).with_suffix(".csv").write_text("\n".join(lines) + "\n")
