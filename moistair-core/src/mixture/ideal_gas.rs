//! The perfect-gas relations of ASHRAE Fundamentals 2021 (SI), chapter 1, with Hyland–Wexler saturation.
//!
//! One datum throughout: dry air and liquid water at 0 °C; ice −333.4 + 2.1 t kJ/kg, so that ice sublimes at 2834.4 kJ/kg at 0 °C.
//! The chapter's wet-bulb equation below freezing rounds this to 2830.

use super::{Gas, Mixture, Potentials, Saturation, Steps};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Real, k};
use crate::saturation::{Surface, hyland_wexler_ice, hyland_wexler_liquid};

/// Gas constant of dry air, J/(kg K): text to Eq. (1).
const R_DRY_AIR: f64 = 287.042;
/// Gas constant of water vapor, J/(kg K): text to Eq. (2).
const R_WATER: f64 = 461.524;
/// Zero of the entropy of dry air, Pa.
const STANDARD_PRESSURE: f64 = 101_325.0;
/// Eq. (26): v = R T (1 + 1.607858 W) / p.
const VOLUME_OF_WATER: f64 = 1.607858;
/// Eq. (30): h = 1.006 t + W (2501 + 1.86 t), kJ.
const CP_DRY_AIR: f64 = 1_006.0;
const CP_VAPOR: f64 = 1_860.0;
const H_VAPOR: f64 = 2_501_000.0;
/// h_w = 4.186 t
const CP_LIQUID: f64 = 4_186.0;
/// h_i = −333.4 + 2.1 t
const H_ICE: f64 = -333_400.0;
const CP_ICE: f64 = 2_100.0;
/// Where the two saturation curves cross, °C: the root of Eq. (5) less Eq. (6), computed with 50 digits.
const MELTING: f64 = 0.010000597211848596;

#[derive(Clone, Copy, Debug)]
pub struct IdealGas<R> {
    celsius: R,
    kelvins: R,
}

/// Of the mixture, per kilogram of dry air, J/(kg K): Eq. (26).
fn gas_constant<R: Real>(humidity_ratio: R) -> R {
    (humidity_ratio * k(VOLUME_OF_WATER) + k(1.0)) * k(R_DRY_AIR)
}

impl<R: Real> IdealGas<R> {
    fn vapor_enthalpy(&self) -> R {
        self.celsius * k(CP_VAPOR) + k(H_VAPOR)
    }

    /// Of dry air and of vapor, each at its partial pressure and per kilogram of its own. Dry air is zero at 0 °C and 101 325 Pa, liquid water
    /// at 0 °C: the perfect gas between.
    fn entropies(&self, pressure: R, humidity_ratio: R) -> (R, R) {
        let water_fraction = <Self as Mixture<R>>::mole_fraction(humidity_ratio);
        let zero = k::<R>(ZERO_CELSIUS);
        let warming = (self.kelvins / zero).ln();
        let air_pressure = pressure * (k::<R>(1.0) - water_fraction);
        // Without water the logarithm multiplies nothing.
        let water_pressure = pressure * water_fraction;
        let water_pressure = R::select(k::<R>(0.0).lt(water_pressure), water_pressure, k(1.0));
        let saturation = hyland_wexler_liquid(zero).0;
        let air = warming * k(CP_DRY_AIR) - (air_pressure / k(STANDARD_PRESSURE)).ln() * k(R_DRY_AIR);
        let vapor = warming * k(CP_VAPOR) - (water_pressure.ln() - saturation) * k(R_WATER);
        (air, vapor + k(H_VAPOR / ZERO_CELSIUS))
    }

    /// Of liquid water or ice at this temperature.
    fn condensed(&self, surface: Surface) -> R {
        let (liquid, ice) = (self.celsius * k(CP_LIQUID), self.celsius * k(CP_ICE) + k(H_ICE));
        self.choose(surface, ice, liquid)
    }

    /// Saturation pressure of pure water and the slope of its logarithm.
    fn pure(&self, surface: Surface) -> (R, R) {
        let (liquid, liquid_slope) = hyland_wexler_liquid(self.kelvins);
        let (ice, ice_slope) = hyland_wexler_ice(self.kelvins);
        (self.choose(surface, ice, liquid).exp(), self.choose(surface, ice_slope, liquid_slope))
    }

    fn choose(&self, surface: Surface, ice: R, liquid: R) -> R {
        match surface {
            Surface::Liquid => liquid,
            Surface::Ice => ice,
            Surface::Stable => R::select(self.celsius.lt(k(MELTING)), ice, liquid),
        }
    }
}

impl<R: Real> Mixture<R> for IdealGas<R> {
    const FORMULATION: crate::Formulation = crate::Formulation::IdealGas;
    const STEPS: Steps = Steps::TO_150_CELSIUS;
    const MOLAR_MASS_RATIO: f64 = 0.621945;

    #[inline(always)]
    fn at(celsius: R) -> Self {
        Self { celsius, kelvins: celsius + k(ZERO_CELSIUS) }
    }

    #[inline(always)]
    fn gas(&self, pressure: R, humidity_ratio: R) -> Gas<R> {
        let dry = self.kelvins * k(R_DRY_AIR) / pressure;
        Gas {
            volume: dry * (humidity_ratio * k(VOLUME_OF_WATER) + k(1.0)),
            enthalpy: self.celsius * k(CP_DRY_AIR) + humidity_ratio * self.vapor_enthalpy(),
            specific_heat: humidity_ratio * k(CP_VAPOR) + k(CP_DRY_AIR),
            compressibility: k(1.0),
            volume_of_water: dry * k(VOLUME_OF_WATER),
            enthalpy_of_water: self.vapor_enthalpy(),
        }
    }

    fn entropy(&self, pressure: R, humidity_ratio: R, _gas: &Gas<R>) -> R {
        let (air, vapor) = self.entropies(pressure, humidity_ratio);
        air + humidity_ratio * vapor
    }

    /// √(γ R T) of the mixture.
    fn speed_of_sound(&self, humidity_ratio: R, gas: &Gas<R>) -> R {
        let ratio = gas.specific_heat / self.specific_heat_at_constant_volume(humidity_ratio, gas);
        (ratio * gas_constant(humidity_ratio) * self.kelvins / (humidity_ratio + k(1.0))).sqrt()
    }

    fn specific_heat_at_constant_volume(&self, humidity_ratio: R, gas: &Gas<R>) -> R {
        gas.specific_heat - gas_constant(humidity_ratio)
    }

    /// h − T s of each component at its partial pressure.
    fn potentials(&self, pressure: R, humidity_ratio: R, _gas: &Gas<R>) -> Potentials<R> {
        let (air, vapor) = self.entropies(pressure, humidity_ratio);
        Potentials {
            water: self.vapor_enthalpy() - self.kelvins * vapor,
            dry_air: self.celsius * k(CP_DRY_AIR) - self.kelvins * air,
        }
    }

    fn fugacity(&self, pressure: R, humidity_ratio: R, _gas: &Gas<R>) -> R {
        Self::mole_fraction(humidity_ratio) * pressure
    }

    #[inline(always)]
    fn saturation(&self, pressure: R, surface: Surface) -> Saturation<R> {
        let (pure, slope) = self.pure(surface);
        Saturation {
            mole_fraction: pure / pressure,
            humidity_ratio: pure * k(Self::MOLAR_MASS_RATIO) / (pressure - pure),
            log_slope: slope * pressure / (pressure - pure),
            condensed_enthalpy: self.condensed(surface),
        }
    }

    #[inline(always)]
    fn pure_saturation_pressure(&self, _pressure: R, surface: Surface) -> R {
        self.pure(surface).0
    }

    #[inline(always)]
    fn melting_temperature(_pressure: R) -> R {
        k(MELTING)
    }

    #[inline(always)]
    fn condensed_enthalpy(celsius: R, _pressure: R, surface: Surface) -> R {
        Self::at(celsius).condensed(surface)
    }
}

#[cfg(test)]
mod tests;
