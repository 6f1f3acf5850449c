"""What another library reads of files and writes to them; every value as the hexadecimal of its double.

    otherLibrary.py read FORMAT FILE         prints the columns of a table as JSON
    otherLibrary.py write FOLDER             writes an invented table in every form, and prints it as JSON
"""
import json
import sys
import warnings

import numpy as np
from astropy.table import MaskedColumn, Table

warnings.simplefilter("ignore")


def cell(value):
    if value is np.ma.masked:
        return None
    if isinstance(value, (bool, np.bool_)):
        return bool(value)
    if isinstance(value, (float, np.floating)):
        return None if np.isnan(value) else float(value).hex()
    if isinstance(value, (int, np.integer)):
        return float(value).hex() if abs(int(value)) < 2**53 else str(value)
    return value.decode("utf-8") if isinstance(value, bytes) else str(value)


def columns(table):
    return [
        {"name": name, "unit": str(table[name].unit or ""), "cells": [cell(value) for value in table[name]]}
        for name in table.colnames
    ]


def invented():
    table = Table(masked=True)
    table["Name"] = MaskedColumn(["HD 1", 'a,"b" c', "\u03b1 Cen", "y"], mask=[0, 0, 0, 1], description="Star's name")
    table["P"] = MaskedColumn([1.5, 2.25e-10, 1 / 3, 4.0], mask=[0, 0, 0, 1], unit="d", description="Orbital period")
    table["M"] = MaskedColumn([1, 2, 3, 4], unit="jupiterMass", description="Mass")
    table["e_M"] = MaskedColumn([0.125, 0.25, 0.5, 1.0], unit="jupiterMass", description="Uncertainty")
    table["id"] = MaskedColumn(np.array([1234567890123456789, 2, 3, 4], dtype="int64"), description="Identifier")
    table["v"] = MaskedColumn([1.25, -2.0, 3.5, 4.75], unit="km/s", description="Speed")
    return table


forms = {
    "space.ecsv": dict(format="ascii.ecsv"),
    "comma.ecsv": dict(format="ascii.ecsv", delimiter=","),
    "tabledata.xml": dict(format="votable", tabledata_format="tabledata"),
    "binary.xml": dict(format="votable", tabledata_format="binary"),
    "binary2.xml": dict(format="votable", tabledata_format="binary2"),
    "table.mrt": dict(format="ascii.mrt"),
    "table.ipac": dict(format="ascii.ipac"),
    "rule.txt": dict(format="ascii.fixed_width_two_line"),
    "bars.txt": dict(format="ascii.fixed_width"),
    "frame.rst": dict(format="ascii.rst"),
    "table.csv": dict(format="ascii.csv"),
    "table.tsv": dict(format="ascii.tab"),
}

if sys.argv[1] == "read":
    print(json.dumps(columns(Table.read(sys.argv[3], format=sys.argv[2]))))
else:
    for name, options in forms.items():
        table = invented()
        if name.endswith(".mrt"):
            # That writer rounds to the format that it is given, and only writes ASCII.
            table["Name"][2] = "alf Cen"
            options["formats"] = {"P": ".17e"}
        table.write(f"{sys.argv[2]}/{name}", overwrite=True, **options)
    print(json.dumps(columns(invented())))
