"""Makes src/test/resources/hardiness/dated-curve.csv: dated curves interpolated by numpy.interp in days of cftime's calendars.

Run from the root of the project: python3 src/test/python/dated_curve.py > src/test/resources/hardiness/dated-curve.csv
The rows of every case carry their year here, written by hand, so that placing them is checked too. The temperatures are invented.
"""
import cftime
import numpy as np

WINTER = [(10, 10, -7.5, -9, -11), (12, 1, -15, -18.5, -21), (1, 20, -21, -24, -26.5), (3, 5, -13, -16, -18.5), (4, 30, -2, -3.1, -4)]
WIDE = [(8, 15, 1, -2, -4)] + WINTER + [(6, 15, 0, -1.5, -3)]
LEAP = [(9, 1, -3, -5, -7), (2, 28, -18, -20, -22), (2, 29, -10, -12, -15), (5, 31, -1, -2, -3)]
SOUTH = [(3, 1, -3, -5, -7), (5, 10, -8, -10, -12.5), (7, 15, -17, -20, -22), (9, 30, -6, -8, -9.5), (11, 30, -1, -2, -3)]
CASES = [
    # name, calendar, first day, last day, rows, year of each row
    ("wide", "standard", (2019, 9, 1), (2020, 5, 31), WIDE, [2019, 2019, 2019, 2020, 2020, 2020, 2020]),
    ("wide", "standard", (2020, 9, 1), (2021, 5, 31), WIDE, [2020, 2020, 2020, 2021, 2021, 2021, 2021]),
    ("wide", "noleap", (2019, 9, 1), (2020, 5, 31), WIDE, [2019, 2019, 2019, 2020, 2020, 2020, 2020]),
    ("wide", "360_day", (2019, 9, 1), (2020, 5, 30), WIDE, [2019, 2019, 2019, 2020, 2020, 2020, 2020]),
    ("held", "standard", (2019, 9, 1), (2020, 5, 31), WINTER, [2019, 2019, 2020, 2020, 2020]),
    ("held", "360_day", (1999, 9, 1), (2000, 5, 30), WINTER, [1999, 1999, 2000, 2000, 2000]),
    ("leap", "standard", (2019, 9, 1), (2020, 5, 31), LEAP, [2019, 2020, 2020, 2020]),
    ("south", "standard", (2020, 3, 1), (2020, 11, 30), SOUTH, [2020] * 5),
    ("south", "noleap", (2021, 3, 1), (2021, 11, 30), SOUTH, [2021] * 5),
]
UNITS = "days since 1970-01-01"


def main():
    print("# made by src/test/python/dated_curve.py with numpy.interp and cftime; invented temperatures in degC")
    print("curve,calendar,year,date,lt10,lt50,lt90")
    for name, calendar, first, last, rows, years in CASES:
        placed = [cftime.date2num(cftime.datetime(y, r[0], r[1], calendar=calendar), UNITS) for r, y in zip(rows, years)]
        begin = int(cftime.date2num(cftime.datetime(*first, calendar=calendar), UNITS))
        end = int(cftime.date2num(cftime.datetime(*last, calendar=calendar), UNITS))
        for day in range(begin, end + 1):
            date = cftime.num2date(day, UNITS, calendar=calendar)
            near = (date.month, date.day) in {(12, 31), (1, 1), (2, 27), (2, 28), (2, 29), (2, 30), (3, 1), (3, 2)}
            if not (near or (day - begin) % 9 == 0 or day == end):
                continue
            values = [np.interp(day, placed, [r[column] for r in rows]) for column in (2, 3, 4)]
            print(f"{name},{calendar},{first[0]},{date.strftime('%Y-%m-%d')}," + ",".join(repr(float(v)) for v in values))


main()
