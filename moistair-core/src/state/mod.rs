//! A state of moist air.

mod at_pressure;
pub(crate) mod condensate;
pub(crate) mod construct;
mod derivatives;
mod pair;
pub(crate) mod property;
mod psychrometer;
mod view;

use crate::basis::{Basis, Formulation, with_mixture};
use crate::mixture::Gas;
use crate::quantity::*;
use crate::real::Scalar;

pub use at_pressure::{SaturationPoint, saturation_point_after, saturation_temperature_after};
pub use condensate::{AirWithCondensate, Freezing, liquid_water_enthalpy};
pub use construct::SecondProperty;
pub use derivatives::PropertyDerivatives;
pub use psychrometer::{Bulb, Psychrometer, PsychrometerReading};

/// Moist air without condensate, at a dry bulb, pressure and humidity ratio, on a stated formulation.
///
/// Made by [`MoistAir::from_dry_bulb`]. What always has a value is read plainly; what may have none at a valid state
/// returns a `Result`.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct MoistAir<S = f64> {
    celsius: S,
    pascals: S,
    humidity_ratio: S,
    gas: Gas<S>,
    formulation: Formulation,
}

impl<S: Scalar> MoistAir<S> {
    /// From numbers already known to make a state.
    pub(crate) fn assemble(celsius: S, pascals: S, humidity_ratio: S, formulation: Formulation) -> Self {
        use crate::mixture::Mixture;
        let gas = with_mixture!(formulation, S, M => M::<S>::at(celsius).gas(pascals, humidity_ratio));
        Self { celsius, pascals, humidity_ratio, gas, formulation }
    }

    /// Enthalpy of the vapor in this air, ∂h/∂W at constant temperature and pressure.
    pub(crate) fn vapor_enthalpy(&self) -> S {
        self.gas.enthalpy_of_water
    }

    /// Dry-bulb temperature, bit for bit as given.
    pub fn dry_bulb(&self) -> Temperature<S> {
        Temperature::from_celsius(self.celsius)
    }

    /// Absolute pressure.
    pub fn pressure(&self) -> Pressure<S> {
        Pressure::from_pascals(self.pascals)
    }

    /// Formulation.
    #[must_use]
    pub fn formulation(&self) -> Formulation {
        self.formulation
    }

    /// Pressure and formulation.
    pub fn basis(&self) -> Basis<S> {
        Basis::new(self.pressure(), self.formulation)
    }

    /// Humidity ratio W.
    pub fn humidity_ratio(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(self.humidity_ratio)
    }

    /// Specific enthalpy h per mass of dry air. Datum: dry air at 0 °C (273.15 K, 101 325 Pa for the real gas), liquid water at the triple
    /// point (0 °C for the ideal gas).
    pub fn specific_enthalpy(&self) -> SpecificEnthalpy<S> {
        SpecificEnthalpy::from_joules_per_kilogram(self.gas.enthalpy)
    }

    /// Specific volume v per mass of dry air.
    pub fn specific_volume(&self) -> SpecificVolume<S> {
        SpecificVolume::from_cubic_meters_per_kilogram(self.gas.volume)
    }

    /// Isobaric heat capacity per mass of dry air, at constant humidity ratio.
    pub fn specific_heat(&self) -> SpecificHeat<S> {
        SpecificHeat::from_joules_per_kilogram_kelvin(self.gas.specific_heat)
    }

    /// Compressibility factor p v / (R T) of the mixture; 1 for the ideal gas.
    #[must_use]
    pub fn compressibility_factor(&self) -> S {
        self.gas.compressibility
    }
}

/// Readers of properties that every state has.
macro_rules! plain_readers {
    ($($(#[$doc:meta])* $method:ident -> $type:ident::$from:ident, |$air:ident| $value:expr;)*) => {
        impl<S: Scalar> MoistAir<S> {$(
            $(#[$doc])*
            pub fn $method(&self) -> $type<S> {
                let $air = self;
                $type::$from($value)
            }
        )*}
    };
}

plain_readers! {
    /// Specific humidity, per mass of moist air.
    specific_humidity -> SpecificHumidity::from_kilograms_per_kilogram,
        |air| view::specific_humidity(air.humidity_ratio);
    /// Absolute humidity, mass of vapor per volume.
    absolute_humidity -> AbsoluteHumidity::from_kilograms_per_cubic_meter,
        |air| view::absolute_humidity(air.humidity_ratio, &air.gas);
    /// Density of the moist air.
    density -> Density::from_kilograms_per_cubic_meter,
        |air| view::density(air.humidity_ratio, &air.gas);
    /// Water mole fraction x_w.
    water_mole_fraction -> WaterMoleFraction::from_fraction, |air| air.mole_fraction();
    /// Vapor pressure x_w p.
    vapor_pressure -> VaporPressure::from_pascals, |air| air.mole_fraction() * air.pascals;
}

impl<S: Scalar> MoistAir<S> {
    fn mole_fraction(&self) -> S {
        use crate::mixture::Mixture;
        with_mixture!(self.formulation, S, M => <M<S> as Mixture<S>>::mole_fraction(self.humidity_ratio))
    }
}
