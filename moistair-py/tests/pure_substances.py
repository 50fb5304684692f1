"""Water, steam, ice and dry air by general-purpose packages: an independent route to what moist air is made of.

Of `iapws` its IAPWS-95 and its ice, of `chemicals` its IAPWS-95 and its dry air (Lemmon et al. 2000): the Helmholtz energies and their
derivatives, no more. The properties, and the solves for density and equilibrium, are here, to the last digits.
"""

from __future__ import annotations

import math
import sys
from collections.abc import Callable
from dataclasses import dataclass
from importlib.util import find_spec, module_from_spec
from typing import NamedTuple, Protocol


def without_its_front(package: str) -> None:
    """Makes the parts of a package importable without running its front, which imports all of them, those for humid air too."""
    spec = find_spec(package)
    if spec is None:
        raise ModuleNotFoundError(f"no {package}: install what tests/requirements.txt lists")
    sys.modules[package] = module_from_spec(spec)


for package in ("iapws", "chemicals"):
    without_its_front(package)

from chemicals.air import (  # noqa: E402
    lemmon2000_air_A0,
    lemmon2000_air_Ar,
    lemmon2000_air_d2A0_dtau2,
    lemmon2000_air_d2Ar_ddelta2,
    lemmon2000_air_d2Ar_ddeltadtau,
    lemmon2000_air_d2Ar_dtau2,
    lemmon2000_air_dA0_dtau,
    lemmon2000_air_dAr_ddelta,
    lemmon2000_air_dAr_dtau,
)
from chemicals.iapws import (  # noqa: E402
    iapws95_A0,
    iapws95_Ar,
    iapws95_d2A0_dtau2,
    iapws95_d2Ar_ddelta2,
    iapws95_d2Ar_ddeltadtau,
    iapws95_d2Ar_dtau2,
    iapws95_dA0_dtau,
    iapws95_dAr_ddelta,
    iapws95_dAr_dtau,
)
from iapws._iapws import _Ice  # noqa: E402
from iapws.iapws95 import IAPWS95  # noqa: E402

#: φ with φ_δ, φ_τ, φ_δδ, φ_δτ, φ_ττ.
Derivatives = tuple[float, float, float, float, float, float]


class Condensed(Protocol):
    """What equilibrium with a gas asks of a phase."""

    @property
    def potential(self) -> float: ...
    @property
    def density(self) -> float: ...


class Ice(NamedTuple):
    """Ice, SI units; the potential is the Gibbs energy."""

    potential: float
    enthalpy: float
    density: float


@dataclass(frozen=True)
class State:
    """A fluid at a temperature and density: R6-95 Table 3, SI units."""

    kelvins: float
    density: float
    pressure: float
    pressure_by_density: float
    enthalpy: float
    entropy: float
    specific_heat: float
    speed_of_sound: float

    @property
    def potential(self) -> float:
        """Gibbs energy, J/kg."""
        return self.enthalpy - self.kelvins * self.entropy


@dataclass(frozen=True)
class Fluid:
    """A pure fluid by its dimensionless Helmholtz energy φ(τ, δ)."""

    gas_constant: float
    critical_temperature: float
    critical_density: float
    helmholtz: Callable[[float, float], Derivatives]

    def at(self, kelvins: float, density: float) -> State:
        tau, delta = self.critical_temperature / kelvins, density / self.critical_density
        phi, d, t, dd, dt, tt = self.helmholtz(tau, delta)
        energy = self.gas_constant * kelvins
        stiffness = 2.0 * delta * d + delta * delta * dd
        coupling = delta * d - delta * tau * dt
        heat = -tau * tau * tt
        return State(
            kelvins=kelvins,
            density=density,
            pressure=density * energy * delta * d,
            pressure_by_density=energy * stiffness,
            enthalpy=energy * (tau * t + delta * d),
            entropy=self.gas_constant * (tau * t - phi),
            specific_heat=self.gas_constant * (heat + coupling * coupling / stiffness),
            speed_of_sound=math.sqrt(energy * (stiffness + coupling * coupling / heat)),
        )

    def under(self, kelvins: float, pascals: float, start: float) -> State:
        """The state at a temperature and pressure whose density is near a start."""
        state = self.at(kelvins, start)
        for _ in range(50):
            step = (pascals - state.pressure) / state.pressure_by_density
            state = self.at(kelvins, state.density + step)
            if abs(step) <= 1e-13 * state.density:
                break
        return state

    def gas(self, kelvins: float, pascals: float) -> State:
        return self.under(kelvins, pascals, pascals / (self.gas_constant * kelvins))

    def liquid(self, kelvins: float, pascals: float) -> State:
        return self.under(kelvins, pascals, 1_000.0 if kelvins < 400.0 else 930.0)

    def vapor_beside(self, kelvins: float, condensed: Callable[[float, float], Condensed]) -> State:
        """The gas in equilibrium with a condensed phase: Newton in ln p."""
        pascals = 611.2 * math.exp(17.62 * (kelvins - 273.15) / (kelvins - 30.03))
        for _ in range(50):
            gas, other = self.gas(kelvins, pascals), condensed(kelvins, pascals)
            step = (gas.potential - other.potential) * gas.density / ((1.0 - gas.density / other.density) * pascals)
            pascals *= math.exp(-step)
            if abs(step) <= 1e-12:
                break
        return self.gas(kelvins, pascals)


def ice(kelvins: float, pascals: float) -> Ice:
    """IAPWS R10-06."""
    properties = _Ice(kelvins, pascals / 1e6)
    return Ice(1e3 * properties["g"], 1e3 * properties["h"], properties["rho"])


def _water_of_iapws(tau: float, delta: float) -> Derivatives:
    ideal, residual = _IAPWS95._phi0(tau, delta), _IAPWS95._phir(tau, delta)
    return tuple(float(ideal["fio" + of] + residual["fir" + of]) for of in ("", "d", "t", "dd", "dt", "tt"))


def _water_of_chemicals(tau: float, delta: float) -> Derivatives:
    return (
        iapws95_A0(tau, delta) + iapws95_Ar(tau, delta),
        1.0 / delta + iapws95_dAr_ddelta(tau, delta),
        iapws95_dA0_dtau(tau, delta) + iapws95_dAr_dtau(tau, delta),
        -1.0 / (delta * delta) + iapws95_d2Ar_ddelta2(tau, delta),
        iapws95_d2Ar_ddeltadtau(tau, delta),
        iapws95_d2A0_dtau2(tau, delta) + iapws95_d2Ar_dtau2(tau, delta),
    )


def _air_of_chemicals(tau: float, delta: float) -> Derivatives:
    return (
        lemmon2000_air_A0(tau, delta) + lemmon2000_air_Ar(tau, delta),
        1.0 / delta + lemmon2000_air_dAr_ddelta(tau, delta),
        lemmon2000_air_dA0_dtau(tau, delta) + lemmon2000_air_dAr_dtau(tau, delta),
        -1.0 / (delta * delta) + lemmon2000_air_d2Ar_ddelta2(tau, delta),
        lemmon2000_air_d2Ar_ddeltadtau(tau, delta),
        lemmon2000_air_d2A0_dtau2(tau, delta) + lemmon2000_air_d2Ar_dtau2(tau, delta),
    )


_IAPWS95 = IAPWS95()

#: IAPWS-95 by either package: R, T_c and ρ_c of R6-95.
WATER = {
    "iapws": Fluid(461.51805, 647.096, 322.0, _water_of_iapws),
    "chemicals": Fluid(461.51805, 647.096, 322.0, _water_of_chemicals),
}

#: kg/mol: IAPWS G8-10 takes this of dry air where the paper has 28.9586e-3, also for the density that reduces.
MOLAR_MASS_OF_AIR = 28.96546e-3

#: Lemmon et al. 2000.
DRY_AIR = Fluid(8.31451 / MOLAR_MASS_OF_AIR, 132.6312, 10_447.7 * MOLAR_MASS_OF_AIR, _air_of_chemicals)
