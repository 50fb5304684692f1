"""What several tests share: a plain state of every kind, awkward numbers, a seeded stream of numbers."""

from __future__ import annotations

import os

import numpy as np
from numpy.typing import NDArray

SEA_LEVEL = 101_325.0

#: Names that fix a state beside dry bulb and pressure.
SECOND = (
    "relative_humidity",
    "relative_humidity_over_liquid",
    "wet_bulb",
    "wet_bulb_over_liquid",
    "wet_bulb_over_ice",
    "dew_point",
    "frost_point",
    "humidity_ratio",
    "specific_humidity",
    "absolute_humidity",
    "vapor_pressure",
    "water_mole_fraction",
    "degree_of_saturation",
    "specific_enthalpy",
    "specific_volume",
    "density",
)

ODD = (0.0, -0.0, 1.0, -1.0, 0.5, 20.0, -40.0, 1.03, 101_325.0, 1e-300, 5e-324, -5e-324, 1e300, 1.7e308, 1e-16, 273.15)
ODD += (float("nan"), float("inf"), float("-inf"), np.nextafter(1.0, 2.0), np.nextafter(150.0, 200.0), 150.0, -80.0)

#: How many random calls a fuzz test makes of each kind.
FUZZ = int(os.environ.get("MOISTAIR_CASES", "200"))


def random(seed: int) -> np.random.Generator:
    return np.random.default_rng(seed)


def odd_numbers(rng: np.random.Generator, count: int) -> NDArray[np.float64]:
    """Ordinary numbers of all sizes, awkward ones, and any bits at all."""
    kinds = rng.integers(0, 4, count)
    sizes = 10.0 ** rng.uniform(-6, 6, count) * rng.choice([-1.0, 1.0], count)
    bits = rng.integers(0, 2**64, count, dtype=np.uint64).view(np.float64)
    plain = rng.uniform(-1.0, 2.0, count)
    return np.select([kinds == 0, kinds == 1, kinds == 2], [sizes, bits, plain], rng.choice(ODD, count))


def bits(values: object) -> NDArray[np.uint64]:
    return np.ascontiguousarray(values, dtype=np.float64).view(np.uint64)


def same_bits(a: object, b: object) -> bool:
    return np.array_equal(bits(a), bits(b))


def grid(count: int, seed: int) -> tuple[NDArray[np.float64], NDArray[np.float64], NDArray[np.float64]]:
    """Dry bulb, relative humidity over liquid and pressure of states all over the range."""
    rng = random(seed)
    return rng.uniform(-40.0, 90.0, count), rng.uniform(0.0, 1.0, count), rng.uniform(80e3, 200e3, count)


FORMULATIONS = ("real_gas", "ideal_gas", "helmholtz")
