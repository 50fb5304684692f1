"""What air-handling plant does to moist air.

Dry air is the carrier: its mass flow is the only flow that every process keeps. Each process returns the leaving stream
and the exchange, the heat and water that it gave to the air; `books.balance` checks that they close.

Heat and water are positive into the air. Loads by name (cooling load, condensate, make-up) are positive magnitudes.

Streams of one state or of arrays of states go through the same calls. One row raises where there is no result; of an
array, a row without a result holds NaN and its `status` says why.

Results are estimates for engineering; they are not a safety function. Towers, sprays and humidifiers can spread
Legionella, wet surfaces grow mould, cold coils freeze, steam burns: local codes and licensed practice govern.
"""

from . import (
    books,
    coil,
    compression,
    desiccant,
    economizer,
    evaporative,
    humidify,
    measured,
    mixing,
    reheat,
    room,
    sensible,
    sequence,
    tower,
)
from ._streams import AirStream, AirWithCondensate, Exchange, WetStream, liquid_water_enthalpy

__all__ = [
    "AirStream",
    "AirWithCondensate",
    "Exchange",
    "WetStream",
    "books",
    "coil",
    "compression",
    "desiccant",
    "economizer",
    "evaporative",
    "humidify",
    "liquid_water_enthalpy",
    "measured",
    "mixing",
    "reheat",
    "room",
    "sensible",
    "sequence",
    "tower",
]
