"""Moist air and air-handling processes, computed by one Rust core.

Units are SI with °C, fractions instead of percent, Pa, J and kg; enthalpy, volume and heat capacity are per kilogram of
dry air. Numbers and NumPy arrays go through the same calls.

>>> import moistair
>>> outdoor = moistair.MoistAir(
...     dry_bulb=34.0, relative_humidity=0.38, pressure=moistair.pressure_at_elevation(1600.0)
... )
>>> round(outdoor.wet_bulb, 2)
22.1
"""

from . import account, process, signal
from ._at_pressure import saturation_temperature_after
from ._core import (
    NUMERICS_VERSION,
    MoistAir,
    __version__,
    elevation_at_pressure,
    limits,
    pressure_at_elevation,
    temperature_at_elevation,
)
from ._derivatives import PropertyDerivatives
from ._errors import (
    InfeasibleError,
    MoistAirError,
    NotFiniteError,
    NoValueError,
    OutOfRangeError,
    ProcessError,
    UnattainableError,
    UndeterminedError,
    UnknownNameError,
)
from ._quantities import PROPERTIES, QUANTITIES, Quantity

__all__ = [
    "NUMERICS_VERSION",
    "PROPERTIES",
    "QUANTITIES",
    "InfeasibleError",
    "MoistAir",
    "MoistAirError",
    "NoValueError",
    "NotFiniteError",
    "OutOfRangeError",
    "ProcessError",
    "PropertyDerivatives",
    "Quantity",
    "UnattainableError",
    "UndeterminedError",
    "UnknownNameError",
    "__version__",
    "account",
    "elevation_at_pressure",
    "limits",
    "pressure_at_elevation",
    "process",
    "saturation_temperature_after",
    "signal",
    "temperature_at_elevation",
]
