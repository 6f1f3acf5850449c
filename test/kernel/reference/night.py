"""Writes night.csv and twilight.csv beside itself: altitudes, distances from the Moon and its lit part from 1975 to 2021,
and when the Sun stands 18 deg below the horizon. astropy with its builtin ephemeris and Earth orientation, no network.
"""

import warnings
from pathlib import Path

import numpy as np
from astropy import units as u
from astropy.coordinates import AltAz, EarthLocation, SkyCoord, get_moon, get_sun
from astropy.time import Time
from astropy.utils import iers

iers.conf.auto_download = False
warnings.simplefilter("ignore")

rng = np.random.default_rng(26)
sites = [(-70.7345, -29.2584, 2400), (-155.4747, 19.826, 4145), (5.7122, 43.9308, 650), (18.5, 69.6, 100), (0, -75, 3000)]


def row(utc, ra, dec, site):
    lon, lat, height = site
    time = Time(utc, format="jd", scale="utc")
    place = EarthLocation.from_geodetic(lon * u.deg, lat * u.deg, height * u.m)
    frame = AltAz(obstime=time, location=place, pressure=0 * u.hPa)
    star = SkyCoord(ra * u.deg, dec * u.deg).transform_to(frame)
    moon = get_moon(time, place).transform_to(frame)
    sun = get_sun(time)
    far = get_moon(time)
    elongation = sun.separation(far)
    phase = np.arctan2(sun.distance * np.sin(elongation), far.distance - sun.distance * np.cos(elongation))
    lit = (1 + np.cos(phase)) / 2
    low = sun.transform_to(frame)
    return [utc, ra, dec, lon, lat, star.alt.deg, moon.separation(star).deg, float(lit), low.alt.deg]


def sun_altitude(jd, site):
    time = Time(jd, format="jd", scale="utc")
    place = EarthLocation.from_geodetic(site[0] * u.deg, site[1] * u.deg, site[2] * u.m)
    return get_sun(time).transform_to(AltAz(obstime=time, location=place, pressure=0 * u.hPa)).alt.deg


def crossing(low, high, site):
    falling = sun_altitude(low, site) > -18
    for _ in range(24):
        middle = (low + high) / 2
        if (sun_altitude(middle, site) > -18) == falling:
            low = middle
        else:
            high = middle
    return (low + high) / 2


def write(name, header, rows):
    lines = ["# astropy 5.2.1, builtin ephemeris; degrees, east positive; night.py stands beside", header]
    lines += [",".join(f"{value:.5f}" for value in values) for values in rows]
    (Path(__file__).parent / name).write_text("\n".join(lines) + "\n")


def random_row(index):
    utc = Time(float(rng.uniform(1975, 2021.5)), format="jyear", scale="utc").jd
    ra, z = rng.uniform(0, 360), rng.uniform(-1, 1)
    place = sites[index % len(sites)]
    return row(round(float(utc), 5), round(float(ra), 5), round(float(np.degrees(np.arcsin(z))), 5), place)


def night(date, site):
    jd = Time(date, scale="utc").jd
    noon = jd + 0.5 - site[0] / 360
    return [jd, site[0], site[1], crossing(noon, noon + 0.5, site), crossing(noon + 0.5, noon + 1, site)]


write("night.csv", "utc,ra,dec,lon,lat,altitude,moonDistance,lit,sunAltitude", [random_row(index) for index in range(120)])
dates = ["2010-03-20", "2014-06-21", "2017-09-05", "2019-12-21"]
write("twilight.csv", "date,lon,lat,evening,morning", [night(date, site) for date in dates for site in sites[:3]])
