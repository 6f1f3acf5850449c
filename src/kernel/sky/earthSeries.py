"""Writes earthSeries.ts beside itself: the Earth about the solar system's barycentre, as a short series of our own.

The motion is sampled once a day with the ephemeris that python3-erfa builds in (epv00, a simplification of VSOP2000 and
ELP, 1.4 mm/s rms against DE405), and fitted by least squares:

    x(t) = sum a_k T^k + sum (c + d T) cos(w t) + (s + u T) sin(w t),   T = t / 10000 d

for the three axes alike. Frequencies are taken from the highest peak of the spectrum of what is left, one after the
other, and corrected by the slopes d, u that the fit gives them, so they are whatever the motion needs and stand for
no argument of the theory. Run with Debian's python3-erfa: /usr/bin/python3 earthSeries.py
"""
from pathlib import Path

import erfa
import numpy as np

AU, DAY, J2000 = 149597870700.0, 86400.0, 2451545.0
FIRST, LAST = -10320, 13320  # days from J2000.0 TDB: October 1971 to June 2036, more than the table of leap seconds
SCALE = 10000.0
FREQUENCIES = 216
POSITION = 3e-8  # weight of a position residual [1/s] against one of velocity

t = np.arange(FIRST, LAST, 1.0)
state = erfa.epv00(J2000, t)[1]
position, velocity = state["p"] * AU, state["v"] * AU / DAY


def columns(frequencies, sloping, t):
    """Position [m] and velocity [m/s] of each unit coefficient."""
    T = t / SCALE
    p = [T**k for k in range(6)]
    v = [k * T ** max(k - 1, 0) / SCALE / DAY for k in range(6)]
    for w, slope in zip(frequencies, sloping):
        c, s = np.cos(w * t), np.sin(w * t)
        p += [c, s]
        v += [-w * s / DAY, w * c / DAY]
        if slope:
            p += [T * c, T * s]
            v += [(c / SCALE - w * T * s) / DAY, (s / SCALE + w * T * c) / DAY]
    return np.array(p).T, np.array(v).T


def fit(frequencies, sloping, thin):
    p, v = columns(frequencies, sloping, t[::thin])
    a = np.vstack([v, p * POSITION])
    b = np.vstack([velocity[::thin], position[::thin] * POSITION])
    size = np.sqrt((a**2).sum(0))
    return np.linalg.lstsq(a / size, b, rcond=1e-13)[0] / size[:, None]


def corrected(frequencies, x):
    """A wrong frequency shows as a slope: (c cos + s sin) of w + dw has the slopes d = s dw, u = -c dw."""
    out = []
    for index, w in enumerate(frequencies):
        c, s, d, u = x[6 + 4 * index : 10 + 4 * index]
        dw = (d @ s - u @ c) / (c @ c + s @ s) / SCALE
        out.append(w + dw if abs(dw) < 3e-5 else w)
    return out


def peaks(residual, count):
    pad = 1 << 18
    window = np.hanning(len(t))
    power = sum(np.abs(np.fft.rfft(residual[:, axis] * window, pad)) ** 2 for axis in range(3))
    power[:8] = 0
    found = []
    for _ in range(count):
        k = int(power.argmax())
        before, here, after = np.log(power[k - 1 : k + 2] + 1e-30)
        found.append((k + 0.5 * (before - after) / (before - 2 * here + after)) * 2 * np.pi / pad)
        power[max(0, k - 40) : k + 40] = 0
    return found


frequencies = [0.0172021, 0.0344042]
for _ in range(4):
    frequencies = corrected(frequencies, fit(frequencies, [True] * len(frequencies), 7))
while len(frequencies) < FREQUENCIES:
    every = [True] * len(frequencies)
    x = fit(frequencies, every, 5)
    residual = velocity - columns(frequencies, every, t)[1] @ x
    frequencies += peaks(residual, 1 if len(frequencies) < 12 else 3 if len(frequencies) < 40 else 6)
    frequencies = corrected(frequencies, fit(frequencies, [True] * len(frequencies), 7))
frequencies = [float(f"{w:.10f}") for w in frequencies]

# A slope that moves the velocity by less than this [m/s] is left out.
every = [True] * len(frequencies)
x = fit(frequencies, every, 3)
slopes = [np.abs(x[8 + 4 * i : 10 + 4 * i]).max() * w / DAY for i, w in enumerate(frequencies)]
order = sorted(range(len(frequencies)), key=lambda i: slopes[i] <= 2e-5)
frequencies, sloping = [frequencies[i] for i in order], [slopes[i] > 2e-5 for i in order]
x = np.round(fit(frequencies, sloping, 3))

p, v = columns(frequencies, sloping, t)
speed = np.sqrt(((velocity - v @ x) ** 2).sum(1))
far = np.sqrt(((position - p @ x) ** 2).sum(1))
print(f"{len(frequencies)} frequencies, {sum(sloping)} with slopes")
print(f"against epv00: {speed.max() * 1e3:.2f} mm/s, {far.max() / 1e3:.3f} km at most; {np.sqrt((speed**2).mean()) * 1e3:.2f} mm/s rms")


def numbers(rows):
    return ",\n".join("  " + ", ".join(str(int(n)) for n in row) for row in rows)


steady, moving, at = [], [], 6
for w, slope in zip(frequencies, sloping):
    width = 4 if slope else 2
    # x: c s [d u], y: c s [d u], z: c s [d u]
    (moving if slope else steady).append((w, x[at : at + width].T.ravel()))
    at += width


def table(name, rows):
    body = "\n".join(f"  {w:.10f}, " + ", ".join(str(int(n)) for n in row) + "," for w, row in rows)
    return f"export const {name} = Float64Array.of(\n{body}\n);\n"


out = f"""/*
 * The Earth about the barycentre of the solar system on the axes of the ICRS, as earthSeries.py fits it: days from J2000.0
 * TDB in, metres out, T in units of {int(SCALE)} d. Against the series that it is fitted to (epv00 of ERFA):
 * {speed.max() * 1e3:.1f} mm/s and {far.max() / 1e3:.2f} km at most.
 */
export const firstDay = {FIRST};
export const lastDay = {LAST};

/** For x, y and z the factors of T^0 ... T^5. */
export const drift = Float64Array.of(
{numbers(x[:6].T)},
);

/** Frequency w [rad/d]; for x, y and z the factors of cos wt, sin wt, T cos wt, T sin wt. */
{table("movingTerms", moving)}
/** Frequency w [rad/d]; for x, y and z the factors of cos wt, sin wt. */
{table("steadyTerms", steady)}"""
Path(__file__).with_suffix(".ts").write_text(out)
