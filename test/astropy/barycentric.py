"""Barycentric corrections and times by astropy, a general library of astronomy: rows of JSON in, rows of JSON out.

In: [UTC in days from J2000.0, RA, dec, longitude, latitude (deg), height (m), pm RA*, pm dec (mas/yr), parallax (mas),
epoch (Julian year)]. Out: [c z_B in m/s, BJD_TDB - JD_UTC in s]. With the ephemeris that is built in, UT1 - UTC = 0, and
nothing fetched from the network.
"""
import json
import sys
import warnings

warnings.simplefilter("ignore")

import numpy as np
from astropy import units as u
from astropy.coordinates import EarthLocation, SkyCoord, solar_system_ephemeris
from astropy.time import Time
from astropy.utils import iers

iers.conf.auto_download = False
iers.conf.auto_max_age = None
iers.conf.iers_degraded_accuracy = "ignore"
solar_system_ephemeris.set("builtin")

out = []
for utc, ra, dec, longitude, latitude, height, east, north, parallax, epoch in json.load(sys.stdin):
    site = EarthLocation.from_geodetic(longitude * u.deg, latitude * u.deg, height * u.m)
    time = Time(2451545.0, utc, format="jd", scale="utc", location=site)
    time.delta_ut1_utc = 0.0
    still = SkyCoord(ra * u.deg, dec * u.deg)
    star = still
    if parallax > 0:
        star = SkyCoord(
            ra * u.deg,
            dec * u.deg,
            distance=(1000 / parallax) * u.pc,
            pm_ra_cosdec=east * u.mas / u.yr,
            pm_dec=north * u.mas / u.yr,
            radial_velocity=0 * u.km / u.s,
            obstime=Time(epoch, format="jyear", scale="tdb"),
        )
    speed = star.radial_velocity_correction("barycentric", obstime=time).to_value(u.m / u.s)
    light = time.light_travel_time(still, kind="barycentric").to_value(u.s)
    tdb = ((time.tdb.jd1 - time.jd1) + (time.tdb.jd2 - time.jd2)) * 86400.0
    out.append([float(speed), float(np.asarray(tdb + light))])
json.dump(out, sys.stdout)
