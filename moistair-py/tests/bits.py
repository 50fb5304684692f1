"""Prints the bits of processes, signals and totals on a seeded grid, for a comparison with the other faces.

usage: bits.py ROWS SEED

Numbers come from SplitMix64 (Steele, Lea & Flood 2014), whose upper 53 bits make a share between 0 and 1, so that any
language can repeat them. A line is `process row status bits…`, the bits of each result in the order of the fields of its
class, as 16 hexadecimal digits; a row without a result has none.
"""

from __future__ import annotations

import dataclasses
import struct
import sys
from collections.abc import Callable, Iterator
from typing import Any

import moistair
from moistair import MoistAir
from moistair._rows import Record
from moistair.process import AirStream, books, coil, humidify, mixing, reheat, sensible, tower

FORMULATIONS = ("real_gas", "ideal_gas", "helmholtz")


def shares(seed: int) -> Iterator[float]:
    """SplitMix64 as numbers in [0, 1)."""
    mask = (1 << 64) - 1
    while True:
        seed = (seed + 0x9E3779B97F4A7C15) & mask
        z = seed
        z = ((z ^ (z >> 30)) * 0xBF58476D1CE4E5B9) & mask
        z = ((z ^ (z >> 27)) * 0x94D049BB133111EB) & mask
        yield ((z ^ (z >> 31)) >> 11) * 2.0**-53


class Row:
    """The inputs of a row, drawn in this order."""

    def __init__(self, row: int, draw: Iterator[float]) -> None:
        def between(low: float, high: float) -> float:
            return low + next(draw) * (high - low)

        self.formulation: Any = FORMULATIONS[row % 3]
        self.pressure = between(80e3, 110e3)
        self.warm = AirStream(self.state(between(20.0, 40.0), between(0.2, 0.9)), dry_air_flow=between(0.5, 5.0))
        self.cold = AirStream(self.state(between(-25.0, 10.0), between(0.2, 0.9)), dry_air_flow=between(0.5, 5.0))
        self.leaving = self.state(between(5.0, 18.0), between(0.8, 1.0))
        self.share = between(0.0, 1.0)
        self.heat = between(-2e4, 4e4)
        self.steam = between(2.5e6, 2.8e6)

    def state(self, dry_bulb: float, humidity: float) -> MoistAir[float]:
        return MoistAir(
            dry_bulb=dry_bulb,
            relative_humidity_over_liquid=humidity,
            pressure=self.pressure,
            formulation=self.formulation,
        )


WATER = {"hot_water": 35.0, "cold_water": 28.0, "drift_fraction": 1e-4, "cycles_of_concentration": 4.0}

CASES: dict[str, Callable[[Row], Any]] = {
    "sensible.to_temperature": lambda r: sensible.to_temperature(r.cold, leaving_temperature=10.0 + 30.0 * r.share),
    "sensible.with_heat": lambda r: sensible.with_heat(r.warm, heat=r.heat),
    "coil.to_state": lambda r: coil.to_state(r.warm, leaving=r.leaving),
    "coil.by_bypass_factor": lambda r: coil.by_bypass_factor(r.warm, apparatus_dew_point=8.0, bypass_factor=r.share),
    "coil.apparatus_dew_point": lambda r: coil.apparatus_dew_point(r.warm.air, leaving=r.leaving),
    "coil.apparatus_dew_points": lambda r: coil.apparatus_dew_points(r.warm.air, leaving=r.leaving),
    "coil.with_water": lambda r: coil.with_water(
        r.warm, air_side=6e3, water_side=2e4 * r.share, water_flow=2.0, entering_water=6.0
    ),
    "coil.surface_from_rating": lambda r: coil.surface_from_rating(
        r.warm, water_flow=2.0, entering_water=6.0, value=6.0 + 10.0 * r.share, measured="leaving_water", conductance_ratio=2.0
    ),
    "coil.load_by_water": lambda r: coil.load_by_water(
        r.warm, load_by_air=r.heat, water_flow=2.0, entering_water=6.0, leaving_water=6.0 + 10.0 * r.share
    ),
    "coil.between": lambda r: coil.between(r.warm, leaving=r.leaving, dead_band=2e-4),
    "reheat.to_state": lambda r: reheat.to_state(r.warm, target=r.leaving, coil_leaving_relative_humidity=1.0),
    "mixing.adiabatic": lambda r: mixing.adiabatic(r.warm, r.cold),
    "mixing.adiabatic_at": lambda r: mixing.adiabatic_at(r.warm, r.cold, pressure=100e3, freezing="supercooled"),
    "humidify.steam": lambda r: humidify.steam(r.cold, steam_flow=0.02 * r.share, steam_enthalpy=r.steam),
    "humidify.steam_limit": lambda r: humidify.steam_limit(r.warm, steam_enthalpy=r.steam),
    "humidify.spray": lambda r: humidify.spray(r.warm, water_flow=0.02 * r.share, water_temperature=15.0),
    "humidify.evaporative": lambda r: humidify.evaporative(r.warm, saturation_effectiveness=r.share),
    "tower.with_air_flow": lambda r: tower.with_air_flow(r.warm, water_flow=1.0 + r.share, **WATER),
    "books.balance": lambda r: books.balance(
        [r.warm, r.cold], leaving=mixing.adiabatic(r.warm, r.cold).leaving, exchange=mixing.adiabatic(r.warm, r.cold).exchange
    ),
}


def numbers(result: Any) -> Iterator[float]:
    """Every number of a result; a state is its dry bulb, pressure, humidity ratio and enthalpy."""
    if isinstance(result, Record):
        for field in dataclasses.fields(result):  # type: ignore[arg-type]
            yield from numbers(getattr(result, field.name))
    elif isinstance(result, MoistAir):
        yield from (result.dry_bulb, result.pressure, result.humidity_ratio, result.specific_enthalpy)
    else:
        yield float(result)


def lines(rows: int, seed: int) -> Iterator[str]:
    draw = shares(seed)
    for row in range(rows):
        inputs = Row(row, draw)
        for name, case in CASES.items():
            try:
                status, values = 0, list(numbers(case(inputs)))
            except moistair.MoistAirError as error:
                status, values = error.code, []
            yield " ".join([name, str(row), str(status), *(struct.pack(">d", value).hex() for value in values)])


if __name__ == "__main__":
    sys.stdout.writelines(line + "\n" for line in lines(int(sys.argv[1]), int(sys.argv[2])))
