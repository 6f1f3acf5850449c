"""Reads lines `utc ra dec lon lat` from standard input; writes altitude, distance from the Moon and its lit part."""

import sys
import warnings

import numpy as np
from astropy import units as u
from astropy.coordinates import AltAz, EarthLocation, SkyCoord, get_moon, get_sun
from astropy.time import Time
from astropy.utils import iers

iers.conf.auto_download = False
iers.conf.iers_degraded_accuracy = "ignore"
warnings.simplefilter("ignore")

for line in sys.stdin:
    utc, ra, dec, lon, lat = map(float, line.split())
    time = Time(utc, format="jd", scale="utc")
    place = EarthLocation.from_geodetic(lon * u.deg, lat * u.deg)
    frame = AltAz(obstime=time, location=place, pressure=0 * u.hPa)
    star = SkyCoord(ra * u.deg, dec * u.deg).transform_to(frame)
    sun, moon = get_sun(time), get_moon(time)
    elongation = sun.separation(moon)
    phase = np.arctan2(sun.distance * np.sin(elongation), moon.distance - sun.distance * np.cos(elongation))
    near = get_moon(time, place).transform_to(frame)
    print(star.alt.deg, near.separation(star).deg, float((1 + np.cos(phase)) / 2))
