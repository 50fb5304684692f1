//! Adding steam.

mod absorption;
mod supply;

pub use absorption::{Absorption, steam_limit};
pub use supply::{Steam, SteamCondition, ThrottledSteam, saturated_steam_enthalpy};

use super::{AirStream, Humidified, add_water, infeasible, parts};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HumidityRatio, MassFlow, RelativeHumidity, SpecificEnthalpy};
use crate::real::{Scalar, k};
use absorption::first_crossing;

/// Adds steam: W₂ = W₁ + s, h₂ = h₁ + s h_st (ASHRAE Fundamentals 2021 ch. 1, Example 5).
///
/// Steam beyond saturation condenses and is carried: `carried` is then above zero. Humidifying to at most 80 to 90 % relative
/// humidity behind the humidifier is common practice (no source).
///
/// # Errors
/// [`Error::NoFlow`] for steam into no air; [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] outside the range of states.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, humidify};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), WetBulb::from_celsius(8.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(2.0))?;
/// let steam = SpecificEnthalpy::from_kilojoules_per_kilogram(2691.07); // saturated at 110 °C
/// let done = humidify::steam(&entering, MassFlow::from_kilograms_per_second(0.015), steam)?;
/// assert!((done.leaving.air().air().dry_bulb().celsius() - 21.0).abs() < 0.5);
/// // Kilojoules where joules are meant: that would be cold water, not steam.
/// let slip = SpecificEnthalpy::from_joules_per_kilogram(2691.07);
/// assert!(humidify::steam(&entering, MassFlow::from_kilograms_per_second(0.015), slip).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn steam<S: Scalar>(
    entering: &AirStream<S>,
    steam: MassFlow<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    add_water(entering, steam, enthalpy)
}

/// Adds steam up to a humidity ratio.
///
/// # Errors
/// As [`steam`]; [`Error::Infeasible`] for a target below what enters.
pub fn steam_to_humidity_ratio<S: Scalar>(
    entering: &AirStream<S>,
    target: HumidityRatio<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let target = checked(Quantity::HumidityRatio, target.kilograms_per_kilogram())?;
    let (_, ratio) = parts(&entering.air());
    if target < ratio {
        let (_, most) = Quantity::HumidityRatio.limits();
        return Err(infeasible(Quantity::HumidityRatio, target, ratio, k(most)));
    }
    let flow = entering.flow()?;
    steam(entering, MassFlow::from_kilograms_per_second(flow * (target - ratio)), enthalpy)
}

/// Adds steam up to a relative humidity (stable surface).
///
/// # Errors
/// As [`steam`]; [`Error::Infeasible`] where the air enters moister, or never gets there.
pub fn steam_to_relative_humidity<S: Scalar>(
    entering: &AirStream<S>,
    target: RelativeHumidity<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let fraction = checked(Quantity::RelativeHumidity, target.fraction())?;
    let steam_enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    let present = entering.air().relative_humidity()?.fraction();
    let out_of_reach = || infeasible(Quantity::RelativeHumidity, fraction, present, k(1.0));
    if !(present <= fraction && fraction <= k(1.0)) {
        return Err(out_of_reach());
    }
    let per_air = first_crossing(&entering.air(), steam_enthalpy, fraction).ok_or_else(out_of_reach)?;
    let flow = entering.flow()?;
    steam(entering, MassFlow::from_kilograms_per_second(flow * per_air), enthalpy)
}
