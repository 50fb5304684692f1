"""Moist air where only one substance shows, against pure dry air, water, steam and ice by general-purpose packages.

The tolerances are what the fits of the real gas and the orders of density that it cuts off are worth, two to four times what was
measured, and far inside the accuracy that is declared for it.
"""

from __future__ import annotations

import ast
import sys
from pathlib import Path

import numpy as np
import pytest
from moistair import MoistAir
from moistair.process import AirWithCondensate, liquid_water_enthalpy
from moistair.process.humidify import saturated_steam, saturated_steam_enthalpy, superheated_steam, throttled_steam, wet_steam
from pure_substances import DRY_AIR, WATER, ice
from support import SEA_LEVEL

ZERO_CELSIUS = 273.15

both_packages = pytest.mark.parametrize("water", WATER.values(), ids=WATER)


class Tally:
    """Compares numbers with tolerances; prints how many of each kind, and the worst, past the capture of passing tests."""

    def __init__(self, capture):
        self.capture, self.worst, self.count, self.failed = capture, {}, {}, []

    def within(self, kind, celsius, pascals, difference, tolerance):
        place = f"{celsius:g} °C, {pascals / 1e3:.4g} kPa"
        self.count[kind] = self.count.get(kind, 0) + 1
        if not abs(difference) <= tolerance:
            self.failed.append(f"{kind} at {place}: {difference:.3e}, tolerance {tolerance:.1e}")
        if not abs(difference) <= self.worst.get(kind, (-1.0,))[0]:
            self.worst[kind] = (abs(difference), place, tolerance)

    def finish(self, name, expected):
        with self.capture.disabled():
            print()
            for kind, (size, place, tolerance) in self.worst.items():
                print(f"{name}, {kind}: {self.count[kind]} values, at worst {size:.1e} at {place} (tolerance {tolerance:.0e})")
        assert not self.failed, f"{len(self.failed)} of {expected}: {self.failed[:5]}"
        assert sum(self.count.values()) == expected


@pytest.fixture
def tally(capsys):
    return Tally(capsys)


@pytest.mark.parametrize(
    ("temperatures", "pressures", "tolerances"),
    [
        (np.linspace(-80.0, 100.0, 37), np.linspace(40e3, 120e3, 5), (4e-12, 1e-5, 4e-8, 1e-9, 3e-10)),
        (np.linspace(-80.0, 150.0, 24), np.geomspace(20e3, 1.1e6, 7), (6e-8, 4e-3, 2e-5, 2e-7, 2e-7)),
    ],
    ids=["to 120 kPa", "to 1.1 MPa"],
)
def test_dry_air(tally, temperatures, pressures, tolerances):
    """Lemmon et al. 2000; enthalpy and entropy counted from 0 °C and 101.325 kPa, since its datum is another."""
    datum = DRY_AIR.gas(ZERO_CELSIUS, SEA_LEVEL)
    for t in temperatures:
        for p in pressures:
            air = MoistAir(dry_bulb=t, humidity_ratio=0.0, pressure=p)
            own = DRY_AIR.gas(t + ZERO_CELSIUS, p)
            differences = {
                "density": air.density / own.density - 1.0,
                "enthalpy, J/kg": air.specific_enthalpy - (own.enthalpy - datum.enthalpy),
                "entropy, J/(kg K)": air.specific_entropy - (own.entropy - datum.entropy),
                "specific heat": air.specific_heat / own.specific_heat - 1.0,
                "speed of sound": air.speed_of_sound / own.speed_of_sound - 1.0,
            }
            for (kind, difference), tolerance in zip(differences.items(), tolerances):
                tally.within(kind, t, p, difference, tolerance)
    tally.finish("dry air", 5 * temperatures.size * pressures.size)


def to_pure(fractions, values):
    """The polynomial through the values at mole fractions of water, taken at one."""
    total = 0.0
    for j, value in enumerate(values):
        others = np.delete(fractions, j)
        total += value * np.prod((1.0 - others) / (fractions[j] - others))
    return total


def under(pascals):
    """Which of the two ranges of pressure: condensed phases are fitted at 101.325 kPa and expanded from there."""
    return " to 120 kPa" if pascals <= 120e3 else " to 1.1 MPa"


#: Mole fractions of water up to what the range of states allows, 10 kg/kg. Each four nodes more bring the extrapolation 300 times
#: nearer; with 16 it is below the fits.
FRACTIONS = 0.47 * (1.0 - np.cos(np.pi * np.arange(16) / 15))


@both_packages
def test_steam(tally, water):
    """IAPWS-95 vapor, as the limit of moist air in the mole fraction x of water. Per mole, the mixture's properties are smooth in x, but
    for the entropy of mixing, which is taken off; its gas constants are those of the pure equations."""
    of_air, of_water = DRY_AIR.gas_constant, water.gas_constant
    dry = 1.0 - FRACTIONS
    for t in (62.0, 80.0, 100.0, 120.0, 150.0):
        boiling = water.vapor_beside(t + ZERO_CELSIUS, water.liquid).pressure
        for p in np.geomspace(20e3, 0.98 * boiling, 4):
            air = MoistAir(dry_bulb=t, water_mole_fraction=FRACTIONS, pressure=p)
            ratio = air.humidity_ratio
            masses = ratio[-1] * dry[-1] / FRACTIONS[-1]  # molar mass of water over that of dry air
            inside = np.maximum(FRACTIONS, 1e-300)  # x ln x at zero
            mixing = -of_air * np.log(dry) - ratio * of_water * np.log(inside)

            def per_water(per_dry_air):
                return to_pure(FRACTIONS, per_dry_air * dry) / masses

            own = water.gas(t + ZERO_CELSIUS, p)
            molar_square = (1.0 + FRACTIONS * (masses - 1.0)) * air.speed_of_sound**2
            tally.within("volume", t, p, per_water(air.specific_volume) * own.density - 1.0, 1e-11)
            tally.within("enthalpy, J/kg", t, p, per_water(air.specific_enthalpy) - own.enthalpy, 5e-5)
            tally.within("entropy, J/(kg K)", t, p, per_water(air.specific_entropy - mixing) - own.entropy, 1e-7)
            tally.within("specific heat", t, p, per_water(air.specific_heat) / own.specific_heat - 1.0, 2e-9)
            speed = np.sqrt(to_pure(FRACTIONS, molar_square) / masses)
            tally.within("speed of sound", t, p, speed / own.speed_of_sound - 1.0, 3e-10)
    tally.finish("steam", 5 * 5 * 4)


@both_packages
def test_saturated_steam(tally, water):
    """IAPWS-95 vapor in equilibrium with IAPWS-95 liquid."""
    for t in np.arange(1.0, 200.5, 1.0):
        own = water.vapor_beside(t + ZERO_CELSIUS, water.liquid)
        enthalpy = saturated_steam_enthalpy(steam_temperature=t)
        tally.within("enthalpy, J/kg", t, own.pressure, enthalpy - own.enthalpy, 6e-3)
        if t <= 150.0:
            air = MoistAir(dry_bulb=t, humidity_ratio=0.0, pressure=SEA_LEVEL)
            tolerance = 1e-9 if t <= 100.0 else 3e-9
            kind = "pressure to 100 °C" if t <= 100.0 else "pressure above"
            tally.within(kind, t, own.pressure, air.saturation_pressure / own.pressure - 1.0, tolerance)
    tally.finish("saturated steam", 200 + 150)


@both_packages
def test_superheated_and_throttled_steam(tally, water):
    """IAPWS-95 vapor up to 400 °C and 1.6 MPa; throttled, the temperature at which it has that enthalpy."""
    for p in np.geomspace(1e3, 1.6e6, 13):
        saturated = saturated_steam(steam_pressure=p)
        boiling = throttled_steam(steam_enthalpy=wet_steam(steam_pressure=p, quality=0.9), pressure=p)
        beside = water.vapor_beside(boiling.temperature + ZERO_CELSIUS, water.liquid)
        tally.within("pressure of boiling", boiling.temperature, p, beside.pressure / p - 1.0, 2e-8)
        tally.within("enthalpy of saturated steam, J/kg", boiling.temperature, p, saturated - beside.enthalpy, 1e-2)
        liquid = water.liquid(boiling.temperature + ZERO_CELSIUS, p)
        wet = liquid.enthalpy + 0.9 * (beside.enthalpy - liquid.enthalpy)
        tally.within("enthalpy of wet steam, J/kg", boiling.temperature, p, wet_steam(steam_pressure=p, quality=0.9) - wet, 1e-2)
        for t in np.linspace(boiling.temperature + 0.01, 400.0, 15):
            own = water.gas(t + ZERO_CELSIUS, p)
            enthalpy = superheated_steam(steam_temperature=t, steam_pressure=p)
            tally.within("enthalpy, J/kg", t, p, enthalpy - own.enthalpy, 4e-3)
            duct = throttled_steam(steam_enthalpy=enthalpy, pressure=min(p, SEA_LEVEL))
            after = water.gas(duct.temperature + ZERO_CELSIUS, min(p, SEA_LEVEL))
            assert duct.quality == 1.0
            tally.within("throttled, J/kg", duct.temperature, p, after.enthalpy - own.enthalpy, 4e-3)
    tally.finish("superheated steam", 13 * (3 + 2 * 15))


@pytest.mark.filterwarnings("ignore:Metastable ice")
@both_packages
def test_ice(tally, water):
    """IAPWS R10-06, and IAPWS-95 vapor in equilibrium with it."""
    for t in np.arange(-80.0, -0.5, 1.0):
        own = water.vapor_beside(t + ZERO_CELSIUS, ice)
        air = MoistAir(dry_bulb=t, degree_of_saturation=1.0, pressure=SEA_LEVEL)
        tally.within("pressure of vapor", t, own.pressure, air.saturation_pressure / own.pressure - 1.0, 1e-9)
        for p in (20e3, SEA_LEVEL, 1.1e6):
            air = MoistAir(dry_bulb=t, degree_of_saturation=1.0, pressure=p)
            enthalpy = AirWithCondensate(air, ice=1.0).specific_enthalpy - air.specific_enthalpy
            difference = enthalpy - ice(t + ZERO_CELSIUS, p).enthalpy
            tally.within("enthalpy, J/kg" + under(p), t, p, difference, 1e-2 if p < 120e3 else 4e-2)
    tally.finish("ice", 80 + 3 * 80)


@both_packages
def test_liquid_water(tally, water):
    """IAPWS-95 liquid; from 0 °C down supercooled, beside air that is saturated over it."""
    for p in (20e3, SEA_LEVEL, 500e3, 1.1e6):
        for t in np.arange(0.0, 180.5, 5.0):
            own = water.liquid(t + ZERO_CELSIUS, p)
            enthalpy = liquid_water_enthalpy(water_temperature=t, pressure=p)
            tally.within("enthalpy, J/kg" + under(p), t, p, enthalpy - own.enthalpy, 2e-2 if p < 120e3 else 8e-2)
        for t in np.arange(-36.0, 0.5, 2.0):
            own = water.liquid(t + ZERO_CELSIUS, p)
            air = MoistAir(dry_bulb=t, relative_humidity_over_liquid=1.0, pressure=p)
            enthalpy = AirWithCondensate(air, liquid=1.0).specific_enthalpy - air.specific_enthalpy
            tolerance = 4e-2 if p < 120e3 else 0.1
            tally.within("enthalpy supercooled, J/kg" + under(p), t, p, enthalpy - own.enthalpy, tolerance)
    tally.finish("liquid water", 4 * (37 + 19))


OWN = Path(__file__).parent

#: Nothing else of the general-purpose packages may be imported; of `chemicals.air`, whose other half is not about dry air, by name only.
ALLOWED = {
    "iapws.iapws95": ("IAPWS95",),
    "iapws._iapws": ("_Ice",),
    "chemicals.iapws": ("iapws95_",),
    "chemicals.air": ("lemmon2000_",),
}


def imports(source):
    """(module, name) of every import of a program; the name is empty where a whole module is imported."""
    for node in ast.walk(ast.parse(source)):
        if isinstance(node, ast.Import):
            yield from ((alias.name, "") for alias in node.names)
        elif isinstance(node, ast.ImportFrom):
            yield from ((node.module or "", alias.name) for alias in node.names)


def is_foreign(module):
    return module.split(".")[0] in ("iapws", "chemicals")


def is_allowed(module, name):
    return name.startswith(ALLOWED.get(module, ())) and name != ""


def test_only_pure_substances_are_imported():
    """Of the general-purpose packages only what is listed here, and no module of theirs for humid air comes along."""
    found = [(path.name, *pair) for path in OWN.glob("*.py") for pair in imports(path.read_text(encoding="utf-8"))]
    foreign = [(file, module, name) for file, module, name in found if is_foreign(module)]
    assert len(foreign) >= 20
    assert [one for one in foreign if not is_allowed(*one[1:])] == []
    loaded = [name for name in sys.modules if is_foreign(name)]
    assert {"iapws.iapws95", "iapws._iapws", "chemicals.iapws", "chemicals.air"} <= set(loaded)
    assert [name for name in loaded if "humid" in name.lower()] == []
    assert not any(vars(sys.modules[package]).get("__all__") for package in ("iapws", "chemicals"))  # their fronts did not run


@pytest.mark.parametrize(
    "program",
    ["import iapws", "from iapws import IAPWS95", "from iapws.humidAir import HumidAir", "from chemicals.air import TEOS10_X"],
)
def test_other_imports_are_found(program):
    assert not any(is_allowed(*pair) for pair in imports(program) if is_foreign(pair[0]))
