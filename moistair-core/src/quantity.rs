//! Quantities with their units in the names of constructors and readers; all conversion of units stands here.
//!
//! Each is a plain number in one base unit, and a distinct type: a swapped argument does not compile.
//!
//! ```
//! use moistair_core::Temperature;
//! let rise = Temperature::from_celsius(21.5) - Temperature::from_celsius(18.0);
//! assert_eq!(rise.kelvins(), 3.5);
//! ```
//!
//! ```compile_fail
//! use moistair_core::Temperature;
//! let nonsense = Temperature::from_celsius(21.5) + Temperature::from_celsius(18.0);
//! ```
//!
//! ```compile_fail
//! use moistair_core::{MoistAir, Pressure, RelativeHumidity, Temperature};
//! let site = Pressure::from_kilopascals(101.325);
//! let swapped = MoistAir::from_dry_bulb(RelativeHumidity::from_percent(50.0), Temperature::from_celsius(20.0), site);
//! ```

use core::ops::{Add, Neg, Sub};

use crate::real::{Scalar, k};

/// 0 °C in kelvins, exact (ITS-90).
pub(crate) const ZERO_CELSIUS: f64 = 273.15;

macro_rules! quantity {
    (
        $(#[$doc:meta])* $name:ident: $from:ident, $read:ident
        $(; $from2:ident, $read2:ident, $factor:expr)*
    ) => {
        $(#[$doc])*
        #[derive(Clone, Copy, Debug, PartialEq, PartialOrd)]
        #[must_use]
        pub struct $name<S = f64>(S);

        impl<S: Scalar> $name<S> {
            #[doc = concat!("From a value in the base unit, ", stringify!($read), "; any number is accepted here and checked where it is used.")]
            #[inline]
            pub const fn $from(value: S) -> Self {
                Self(value)
            }

            #[doc = concat!("The value in ", stringify!($read), ", bit for bit as given.")]
            #[inline]
            #[must_use]
            pub const fn $read(self) -> S {
                self.0
            }
            $(
                #[doc = concat!("From a value in ", stringify!($read2), ".")]
                #[inline]
                pub fn $from2(value: S) -> Self {
                    Self(value * k($factor))
                }

                #[doc = concat!("The value in ", stringify!($read2), ".")]
                #[inline]
                #[must_use]
                pub fn $read2(self) -> S {
                    self.0 / k($factor)
                }
            )*
        }
    };
}

/// Temperatures other than the dry bulb that fix a state: own types over the same scale.
macro_rules! temperature {
    ($($(#[$doc:meta])* $name:ident;)*) => {$(
        quantity!($(#[$doc])* $name: from_celsius, celsius);

        impl<S: Scalar> $name<S> {
            /// From a value in kelvins.
            #[inline]
            pub fn from_kelvins(value: S) -> Self {
                Self(value - k(ZERO_CELSIUS))
            }

            /// The value in kelvins.
            #[inline]
            #[must_use]
            pub fn kelvins(self) -> S {
                self.0 + k(ZERO_CELSIUS)
            }

            /// From a value in degrees Fahrenheit.
            #[inline]
            pub fn from_fahrenheit(value: S) -> Self {
                Self((value - k(32.0)) / k(1.8))
            }

            /// The value in degrees Fahrenheit.
            #[inline]
            #[must_use]
            pub fn fahrenheit(self) -> S {
                self.0 * k(1.8) + k(32.0)
            }
        }
    )*};
}

temperature! {
    /// A temperature on the Celsius scale: the dry bulb of air, the temperature of water.
    Temperature;
    /// Thermodynamic wet bulb (adiabatic saturation): over liquid at or above the melting temperature, over ice below.
    WetBulb;
    /// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature.
    WetBulbOverLiquid;
    /// Thermodynamic wet bulb over ice.
    WetBulbOverIce;
    /// Dew point, always over liquid water.
    DewPoint;
    /// Frost point, always over ice.
    FrostPoint;
}

macro_rules! as_temperature {
    ($($name:ident),*) => {$(
        impl<S> From<$name<S>> for Temperature<S> {
            fn from(value: $name<S>) -> Self {
                Self(value.0)
            }
        }
    )*};
}
as_temperature!(WetBulb, WetBulbOverLiquid, WetBulbOverIce, DewPoint, FrostPoint);

quantity!(
    /// A difference of temperatures.
    TemperatureDifference: from_kelvins, kelvins
);
quantity!(
    /// An absolute pressure.
    Pressure: from_pascals, pascals; from_kilopascals, kilopascals, 1_000.0; from_hectopascals, hectopascals, 100.0
);
quantity!(
    /// A length, such as an elevation above mean sea level.
    Length: from_meters, meters; from_feet, feet, 0.3048
);
quantity!(
    /// Relative humidity x_w / x_ws over the stable surface: ice below the melting temperature, liquid above.
    RelativeHumidity: from_fraction, fraction; from_percent, percent, 0.01
);
quantity!(
    /// Relative humidity x_w / x_ws over liquid water at all temperatures, as instruments and weather records report it.
    RelativeHumidityOverLiquid: from_fraction, fraction; from_percent, percent, 0.01
);
quantity!(
    /// Humidity ratio W, mass of water vapor per mass of dry air.
    HumidityRatio: from_kilograms_per_kilogram, kilograms_per_kilogram; from_grams_per_kilogram, grams_per_kilogram, 0.001
);
quantity!(
    /// Specific humidity, mass of water vapor per mass of moist air.
    SpecificHumidity: from_kilograms_per_kilogram, kilograms_per_kilogram; from_grams_per_kilogram, grams_per_kilogram, 0.001
);
quantity!(
    /// Absolute humidity, mass of water vapor per volume of moist air.
    AbsoluteHumidity: from_kilograms_per_cubic_meter, kilograms_per_cubic_meter; from_grams_per_cubic_meter, grams_per_cubic_meter, 0.001
);
quantity!(
    /// Vapor pressure, water mole fraction times total pressure.
    VaporPressure: from_pascals, pascals; from_kilopascals, kilopascals, 1_000.0; from_hectopascals, hectopascals, 100.0
);
quantity!(
    /// Water mole fraction, moles of vapor per mole of moist air.
    WaterMoleFraction: from_fraction, fraction
);
quantity!(
    /// Degree of saturation W / W_s over the stable surface.
    DegreeOfSaturation: from_fraction, fraction
);
quantity!(
    /// Enthalpy per mass of dry air (of water where it is water's).
    SpecificEnthalpy: from_joules_per_kilogram, joules_per_kilogram; from_kilojoules_per_kilogram, kilojoules_per_kilogram, 1_000.0
);
quantity!(
    /// Volume per mass of dry air.
    SpecificVolume: from_cubic_meters_per_kilogram, cubic_meters_per_kilogram
);
quantity!(
    /// Heat capacity per mass of dry air.
    SpecificHeat: from_joules_per_kilogram_kelvin, joules_per_kilogram_kelvin
);
quantity!(
    /// Entropy per mass of dry air.
    SpecificEntropy: from_joules_per_kilogram_kelvin, joules_per_kilogram_kelvin
);
quantity!(
    /// Chemical potential per mass of the component that it belongs to.
    ChemicalPotential: from_joules_per_kilogram, joules_per_kilogram; from_kilojoules_per_kilogram, kilojoules_per_kilogram, 1_000.0
);
quantity!(
    /// Fugacity, a vapor pressure corrected for the forces between molecules.
    Fugacity: from_pascals, pascals; from_kilopascals, kilopascals, 1_000.0
);
quantity!(
    /// A speed, such as that of sound.
    Speed: from_meters_per_second, meters_per_second
);
quantity!(
    /// Dynamic viscosity.
    DynamicViscosity: from_pascal_seconds, pascal_seconds; from_micropascal_seconds, micropascal_seconds, 1e-6
);
quantity!(
    /// Thermal conductivity.
    ThermalConductivity: from_watts_per_meter_kelvin, watts_per_meter_kelvin; from_milliwatts_per_meter_kelvin, milliwatts_per_meter_kelvin, 1e-3
);
quantity!(
    /// Diffusivity, of matter or of heat.
    Diffusivity: from_square_meters_per_second, square_meters_per_second; from_square_millimeters_per_second, square_millimeters_per_second, 1e-6
);
quantity!(
    /// Mass of moist air per volume.
    Density: from_kilograms_per_cubic_meter, kilograms_per_cubic_meter
);
quantity!(
    /// Mass flow: of dry air where air is meant, of water where water is.
    MassFlow: from_kilograms_per_second, kilograms_per_second; from_kilograms_per_hour, kilograms_per_hour, 1.0 / 3600.0
);
quantity!(
    /// Volume flow at a stated state.
    VolumeFlow: from_cubic_meters_per_second, cubic_meters_per_second; from_cubic_meters_per_hour, cubic_meters_per_hour, 1.0 / 3600.0
);
quantity!(
    /// Heat flow, positive into the air unless its name says otherwise.
    HeatFlow: from_watts, watts; from_kilowatts, kilowatts, 1_000.0
);

quantity!(
    /// Thermal conductance, heat flow per difference of temperature.
    Conductance: from_watts_per_kelvin, watts_per_kelvin; from_kilowatts_per_kelvin, kilowatts_per_kelvin, 1_000.0
);

impl<S: Scalar> Sub for Temperature<S> {
    type Output = TemperatureDifference<S>;
    fn sub(self, other: Self) -> TemperatureDifference<S> {
        TemperatureDifference(self.0 - other.0)
    }
}

impl<S: Scalar> Add<TemperatureDifference<S>> for Temperature<S> {
    type Output = Self;
    fn add(self, difference: TemperatureDifference<S>) -> Self {
        Self(self.0 + difference.0)
    }
}

impl<S: Scalar> Sub<TemperatureDifference<S>> for Temperature<S> {
    type Output = Self;
    fn sub(self, difference: TemperatureDifference<S>) -> Self {
        Self(self.0 - difference.0)
    }
}

macro_rules! sums {
    ($($name:ident),*) => {$(
        impl<S: Scalar> Add for $name<S> {
            type Output = Self;
            fn add(self, other: Self) -> Self {
                Self(self.0 + other.0)
            }
        }

        impl<S: Scalar> Sub for $name<S> {
            type Output = Self;
            fn sub(self, other: Self) -> Self {
                Self(self.0 - other.0)
            }
        }

        impl<S: Scalar> Neg for $name<S> {
            type Output = Self;
            fn neg(self) -> Self {
                Self(-self.0)
            }
        }
    )*};
}
sums!(TemperatureDifference, MassFlow, VolumeFlow, HeatFlow);
