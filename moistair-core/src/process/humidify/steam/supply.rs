//! Steam as the plant delivers it, and what throttling makes of it.

use super::infeasible;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::{Mixture, RealGas};
use crate::quantity::{Pressure, SpecificEnthalpy, Temperature, TemperatureDifference};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::substance::{liquid_water, superheated_steam};

/// Enthalpy of saturated steam at a temperature, IAPWS-95, on the datum of liquid water at the triple point (0.04 kJ/kg off that
/// of the ideal gas, which is nothing to the purpose). Throttling keeps it.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]: 0 to 200 °C.
///
/// ```
/// use moistair_core::{Temperature, process::humidify::saturated_steam_enthalpy};
/// // ASHRAE Fundamentals 2021 ch. 1, Example 5: 2691.07 kJ/kg at 110 °C.
/// let steam = saturated_steam_enthalpy(Temperature::from_celsius(110.0_f64))?;
/// assert!((steam.kilojoules_per_kilogram() - 2691.07).abs() < 0.1);
/// assert!(saturated_steam_enthalpy(Temperature::from_celsius(383.15)).is_err()); // kelvins
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn saturated_steam_enthalpy<S: Scalar>(temperature: Temperature<S>) -> Result<SpecificEnthalpy<S>, Error> {
    let celsius = checked(Quantity::WaterTemperature, temperature.celsius())?;
    Ok(SpecificEnthalpy::from_joules_per_kilogram(RealGas::at(celsius).saturated_steam_enthalpy()))
}

/// Steam, known by its enthalpy: valves, nozzles and insulated pipes keep it.
///
/// Water by IAPWS R6-95, on the datum of liquid water at the triple point, whatever the formulation of the air (0.04 kJ/kg off that of
/// the ideal gas). Saturated at 7 to 201 °C (1 kPa to 1.6 MPa absolute), superheated to 400 °C: within 0.01 J/kg of the
/// release's equation.
///
/// # Caution
/// Steam burns, its pipes and vessels stand under pressure, and condensate in them hammers: codes for pressure equipment govern.
///
/// ```
/// use moistair_core::{Pressure, Temperature};
/// use moistair_core::process::humidify::{Steam, SteamCondition};
/// let bar = |p: f64| Pressure::from_kilopascals(100.0 * p);
/// // Dry saturated steam of 4 bar is superheated by 32 K when it comes into a duct; with 5 % of water it is still wet there.
/// let dry = Steam::saturated_at_pressure(bar(4.0))?.throttled_to(bar(1.013))?;
/// assert!(dry.condition == SteamCondition::Superheated && (dry.superheat.kelvins() - 31.0).abs() < 1.0);
/// let wet = Steam::wet(bar(4.0), 0.95)?.throttled_to(bar(1.013))?;
/// assert!(wet.condition == SteamCondition::Wet && wet.quality > 0.97);
/// assert!(Steam::superheated(Temperature::from_celsius(120.0), bar(4.0)).is_err()); // that is water
/// # Ok::<(), moistair_core::Error>(())
/// ```
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Steam<S = f64> {
    enthalpy: S,
}

/// Whether steam carries water.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum SteamCondition {
    /// Warmer than it boils at this pressure; saturated at the least.
    Superheated = 0,
    /// Vapor and liquid.
    Wet = 1,
}

/// Steam at a pressure.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct ThrottledSteam<S = f64> {
    /// Its temperature.
    pub temperature: Temperature<S>,
    /// Above the temperature of boiling; zero where it is wet.
    pub superheat: TemperatureDifference<S>,
    /// Vapor over all of it by mass; one where it is superheated.
    pub quality: S,
    /// Superheated or wet.
    pub condition: SteamCondition,
}

impl<S: Scalar> Steam<S> {
    /// Dry saturated, of a temperature: 0 to 200 °C.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn saturated_at_temperature(temperature: Temperature<S>) -> Result<Self, Error> {
        saturated_steam_enthalpy(temperature).map(|enthalpy| Self { enthalpy: enthalpy.joules_per_kilogram() })
    }

    /// Dry saturated, of an absolute pressure: 1 kPa to 1.6 MPa. Gauges show the excess over the atmosphere.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn saturated_at_pressure(pressure: Pressure<S>) -> Result<Self, Error> {
        Boiling::at(pressure).map(|boiling| Self { enthalpy: boiling.vapor })
    }

    /// Wet, of an absolute pressure and a quality x, the vapor over all of it by mass: h = h_f + x h_fg.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`]; so little vapor at low pressure is no steam to this library.
    pub fn wet(pressure: Pressure<S>, quality: S) -> Result<Self, Error> {
        let quality = checked(Quantity::SteamQuality, quality)?;
        let boiling = Boiling::at(pressure)?;
        Self::of(boiling.liquid + quality * (boiling.vapor - boiling.liquid))
    }

    /// Superheated, to 400 °C.
    ///
    /// # Errors
    /// [`Error::Infeasible`] below the temperature of boiling; [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn superheated(temperature: Temperature<S>, pressure: Pressure<S>) -> Result<Self, Error> {
        let celsius = checked(Quantity::SteamTemperature, temperature.celsius())?;
        let boiling = Boiling::at(pressure)?;
        if celsius < boiling.celsius {
            return Err(infeasible(Quantity::SteamTemperature, celsius, boiling.celsius, k(HOTTEST)));
        }
        Self::of(superheated_steam::at(celsius, pressure.pascals()).enthalpy)
    }

    /// Of a known enthalpy, on the datum of liquid water at the triple point.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn from_specific_enthalpy(enthalpy: SpecificEnthalpy<S>) -> Result<Self, Error> {
        Self::of(enthalpy.joules_per_kilogram())
    }

    fn of(enthalpy: S) -> Result<Self, Error> {
        checked(Quantity::SteamEnthalpy, enthalpy).map(|enthalpy| Self { enthalpy })
    }

    /// Its enthalpy, for [`steam`](super::steam) and its like.
    pub fn specific_enthalpy(self) -> SpecificEnthalpy<S> {
        SpecificEnthalpy::from_joules_per_kilogram(self.enthalpy)
    }

    /// After throttling to an absolute pressure, such as that of the duct: the enthalpy is kept.
    ///
    /// Bounded work: two searches.
    ///
    /// # Errors
    /// [`Error::Infeasible`] where it would be liquid there, or hotter than 400 °C; [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn throttled_to(self, pressure: Pressure<S>) -> Result<ThrottledSteam<S>, Error> {
        let boiling = Boiling::at(pressure)?;
        let pascals = pressure.pascals();
        let hottest = superheated_steam::at(k::<S>(HOTTEST), pascals).enthalpy;
        if !(boiling.liquid < self.enthalpy && self.enthalpy <= hottest) {
            return Err(infeasible(Quantity::SteamEnthalpy, self.enthalpy, boiling.liquid, hottest));
        }
        if self.enthalpy < boiling.vapor {
            return Ok(ThrottledSteam {
                temperature: Temperature::from_celsius(boiling.celsius),
                superheat: TemperatureDifference::from_kelvins(k(0.0)),
                quality: (self.enthalpy - boiling.liquid) / (boiling.vapor - boiling.liquid),
                condition: SteamCondition::Wet,
            });
        }
        let excess = |celsius: S| superheated_steam::at(celsius, pascals).enthalpy - self.enthalpy;
        let least = excess(boiling.celsius);
        let resolution = solve::temperature_resolution();
        let celsius = if least < k(0.0) {
            let high = (k(HOTTEST), hottest - self.enthalpy);
            solve::between((boiling.celsius, least), high, resolution, excess)
        } else {
            boiling.celsius
        };
        Ok(ThrottledSteam {
            temperature: Temperature::from_celsius(celsius),
            superheat: TemperatureDifference::from_kelvins(celsius - boiling.celsius),
            quality: k(1.0),
            condition: SteamCondition::Superheated,
        })
    }
}

/// °C.
const HOTTEST: f64 = Quantity::SteamTemperature.limits().1;

/// Water boiling at a pressure.
struct Boiling<S> {
    celsius: S,
    /// Enthalpies, J/kg.
    liquid: S,
    vapor: S,
}

impl<S: Scalar> Boiling<S> {
    fn at(pressure: Pressure<S>) -> Result<Self, Error> {
        let pascals = checked(Quantity::SteamPressure, pressure.pascals())?;
        let excess = |celsius: S| {
            let saturated = RealGas::at(celsius).pure_saturation_pressure(pascals, Surface::Liquid);
            (saturated / pascals).ln()
        };
        let (cold, warm) = (k(Quantity::SteamTemperature.limits().0), k(liquid_water::RANGE.1));
        let ends = ((cold, excess(cold)), (warm, excess(warm)));
        let celsius = solve::between(ends.0, ends.1, solve::temperature_resolution(), excess);
        Ok(Self {
            celsius,
            // The fit of the real gas is made for the pressures of air.
            liquid: liquid_water::at(celsius, pascals).enthalpy,
            vapor: RealGas::at(celsius).saturated_steam_enthalpy(),
        })
    }
}
