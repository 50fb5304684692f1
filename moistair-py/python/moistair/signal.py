"""Check and repair measured signals, sample by sample or over columns.

A `Channel` says what is known of a signal before the first sample, a `ChannelState` remembers what the samples have shown,
and `Channel.check` turns each raw reading into a value in the unit of the core with a `Quality` and a `Reason`.
"""

from __future__ import annotations

import enum

from ._core import Channel, ChannelState, Checked, CheckedColumns, code_table, from_core, to_core

__all__ = [
    "Channel",
    "ChannelState",
    "Checked",
    "CheckedColumns",
    "Kind",
    "Quality",
    "Reason",
    "Unit",
    "from_core",
    "to_core",
]


_TEXTS = {(kind, code): text for kind, _, code, text in code_table()}


class _Coded(enum.IntEnum):
    """A code of the core."""

    @property
    def text(self) -> str:
        """In words, lower case; the symbol of a unit."""
        return _TEXTS[type(self).__name__, int(self)]


class Kind(_Coded):
    """What a channel carries; the value that leaves a check is in the unit of the core, named with each."""

    TEMPERATURE = 1
    """Temperature."""
    RELATIVE_HUMIDITY = 2
    """Relative humidity."""
    PRESSURE = 3
    """Pressure."""
    PRESSURE_DIFFERENCE = 4
    """Pressure difference."""
    VOLUME_FLOW = 5
    """Volume flow."""
    MASS_FLOW = 6
    """Mass flow."""
    FRACTION = 7
    """Fraction."""
    HUMIDITY_RATIO = 8
    """Humidity ratio."""
    POWER = 9
    """Power."""
    TIME = 10
    """Time."""
    ENERGY = 11
    """Energy."""
    SPECIFIC_ENTHALPY = 12
    """Specific enthalpy."""


class Unit(_Coded):
    """The unit of a raw signal, or of a value that is shown."""

    CELSIUS = 1
    """°C"""
    FAHRENHEIT = 2
    """°F"""
    KELVIN = 3
    """K"""
    FRACTION = 4
    """1"""
    PERCENT = 5
    """%"""
    PASCAL = 6
    """Pa"""
    HECTOPASCAL = 7
    """hPa"""
    KILOPASCAL = 8
    """kPa"""
    BAR = 9
    """bar"""
    POUND_PER_SQUARE_INCH = 10
    """psi"""
    INCH_OF_MERCURY = 11
    """inHg"""
    CUBIC_METER_PER_SECOND = 12
    """m³/s"""
    CUBIC_METER_PER_HOUR = 13
    """m³/h"""
    LITER_PER_SECOND = 14
    """L/s"""
    CUBIC_FOOT_PER_MINUTE = 15
    """ft³/min"""
    KILOGRAM_PER_SECOND = 16
    """kg/s"""
    KILOGRAM_PER_HOUR = 17
    """kg/h"""
    POUND_PER_HOUR = 18
    """lb/h"""
    KILOGRAM_PER_KILOGRAM = 19
    """kg/kg"""
    GRAM_PER_KILOGRAM = 20
    """g/kg"""
    WATT = 21
    """W"""
    KILOWATT = 22
    """kW"""
    SECOND = 23
    """s"""
    MINUTE = 24
    """min"""
    HOUR = 25
    """h"""
    JOULE = 26
    """J"""
    KILOWATT_HOUR = 27
    """kWh"""
    JOULE_PER_KILOGRAM = 28
    """J/kg"""
    KILOJOULE_PER_KILOGRAM = 29
    """kJ/kg"""


class Quality(_Coded):
    """How far a sample can be trusted. The order is the order of severity."""

    GOOD = 0
    """Good."""
    REPAIRED = 1
    """Repaired."""
    REFUSED = 2
    """Refused."""


class Reason(_Coded):
    """Why a sample has the quality that it has.

    Those that begin with LOOKS_LIKE are a hint about the wiring or the configuration: the sample is refused, never
    converted on a guess."""

    OK = 0
    """In order."""
    MISSING = 1
    """Missing."""
    BELOW_RANGE = 2
    """Below the range of the channel."""
    ABOVE_RANGE = 3
    """Above the range of the channel."""
    ABOVE_SATURATION = 4
    """Slightly above saturation, taken as saturated."""
    STUCK = 5
    """Stuck."""
    GAP = 6
    """First reading after a gap."""
    TIME_NOT_INCREASING = 7
    """Time not increasing."""
    TIME_INVALID = 8
    """Time is not a valid number of seconds."""
    HELD = 9
    """Last good value held."""
    CHANNEL_INVALID = 10
    """Channel is not valid."""
    LOOKS_LIKE_CELSIUS = 11
    """Looks like degrees celsius."""
    LOOKS_LIKE_FAHRENHEIT = 12
    """Looks like degrees fahrenheit."""
    LOOKS_LIKE_KELVIN = 13
    """Looks like kelvin."""
    LOOKS_LIKE_FRACTION = 14
    """Looks like a fraction."""
    LOOKS_LIKE_PERCENT = 15
    """Looks like percent."""
    LOOKS_LIKE_PASCAL = 16
    """Looks like pascal."""
    LOOKS_LIKE_HECTOPASCAL = 17
    """Looks like hectopascal."""
    LOOKS_LIKE_KILOPASCAL = 18
    """Looks like kilopascal."""
    LOOKS_LIKE_BAR = 19
    """Looks like bar."""
    LOOKS_LIKE_POUND_PER_SQUARE_INCH = 20
    """Looks like pounds per square inch."""
    LOOKS_LIKE_INCH_OF_MERCURY = 21
    """Looks like inches of mercury."""
    LOOKS_LIKE_OTHER_UNIT = 22
    """Looks like another unit."""
