//! Heating and cooling at constant humidity ratio.

use super::{AirStream, Exchange, capacity, infeasible, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::quantity::{HeatFlow, Temperature};
use crate::real::{Scalar, k};
use crate::state::MoistAir;
use crate::state::condensate::temperature_of_enthalpy;

/// Leaving stream and exchange of a process without water.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Sensible<S = f64> {
    /// The air that leaves.
    pub leaving: AirStream<S>,
    /// Heat into the air, no water.
    pub exchange: Exchange<S>,
}

/// Heats or cools to a temperature: Q = ṁ (h₂ − h₁), W₂ = W₁.
///
/// # Errors
/// [`Error::Infeasible`] when the air would be cooled past saturation (its limits are then the dew or frost point and the
/// range of states): use [`super::coil`] there. [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, sensible};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// // ASHRAE Fundamentals 2021 ch. 1, Example 2: 10 m³/s saturated at 2 °C to 40 °C takes 490 kW.
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(2.0), RelativeHumidity::from_percent(100.0), site)?;
/// let entering = AirStream::from_volume_flow(air, VolumeFlow::from_cubic_meters_per_second(10.0))?;
/// let heater = sensible::to_temperature(&entering, Temperature::from_celsius(40.0))?;
/// assert!((heater.exchange.heat.kilowatts() - 490.0).abs() < 1.0);
/// assert!(sensible::to_temperature(&entering, Temperature::from_celsius(-10.0)).is_err()); // saturated air cannot
/// # Ok::<(), Error>(())
/// ```
pub fn to_temperature<S: Scalar>(entering: &AirStream<S>, leaving: Temperature<S>) -> Result<Sensible<S>, Error> {
    let celsius = checked_for(entering.air().formulation(), Quantity::LeavingTemperature, leaving.celsius())?;
    let air = at_same_ratio(&entering.air(), celsius)?;
    let heat = entering.dry_air_flow * (parts(&air).0 - parts(&entering.air()).0);
    Ok(Sensible { leaving: entering.with_air(air), exchange: Exchange::new(heat, k(0.0), k(0.0)) })
}

/// Heats or cools by a heat flow.
///
/// # Errors
/// [`Error::NoFlow`] for heat into no air; [`Error::Infeasible`] when saturation or the range of states would be crossed.
pub fn with_heat<S: Scalar>(entering: &AirStream<S>, heat: HeatFlow<S>) -> Result<Sensible<S>, Error> {
    let watts = checked(Quantity::HeatFlow, heat.watts())?;
    let exchange = Exchange::new(watts, k(0.0), k(0.0));
    if watts == k(0.0) {
        return Ok(Sensible { leaving: *entering, exchange });
    }
    let air = entering.air();
    let (enthalpy, ratio) = parts(&air);
    let target = enthalpy + watts / entering.flow()?;
    let solved = with_mixture!(air.formulation(), S, M =>
        temperature_of_enthalpy::<M<S>, S>(target, air.pressure().pascals(), ratio));
    // Rounding never turns a little heat into cooling, nor saturated air into fog.
    let start = air.dry_bulb().celsius();
    let celsius = if watts > k(0.0) { solved.at_least(start) } else { solved.at_most(start) };
    at_same_ratio(&air, celsius).map(|air| Sensible { leaving: entering.with_air(air), exchange }).map_err(|_| {
        let (_, warmest) = air.formulation().limits(Quantity::LeavingTemperature);
        let coldest = coldest_without_condensate(&air);
        let heat_to = |celsius: f64| {
            let end = MoistAir::assemble(k(celsius), air.pressure().pascals(), ratio, air.formulation());
            entering.dry_air_flow * (parts(&end).0 - enthalpy)
        };
        infeasible(Quantity::HeatFlow, watts, heat_to(coldest), heat_to(warmest))
    })
}

/// The air at another temperature and the same humidity ratio, refused beyond saturation.
pub(super) fn at_same_ratio<S: Scalar>(air: &MoistAir<S>, celsius: S) -> Result<MoistAir<S>, Error> {
    let ratio = air.humidity_ratio().kilograms_per_kilogram();
    let pressure = air.pressure().pascals();
    let (coldest, warmest) = air.formulation().limits(Quantity::LeavingTemperature);
    let in_range = k::<S>(coldest) <= celsius && celsius <= k(warmest);
    if in_range && (celsius >= air.dry_bulb().celsius() || ratio <= capacity(air, celsius)) {
        return Ok(MoistAir::assemble(celsius, pressure, ratio, air.formulation()));
    }
    Err(Error::Infeasible {
        quantity: Quantity::LeavingTemperature,
        value: celsius.to_f64(),
        min: coldest_without_condensate(air),
        max: warmest,
    })
}

/// The dew point, the frost point below −40 °C, the end of the range below that.
fn coldest_without_condensate<S: Scalar>(air: &MoistAir<S>) -> f64 {
    let dew_point = air.dew_point().map(|dew| dew.celsius());
    let coldest = dew_point.or_else(|_| air.frost_point().map(|frost| frost.celsius()));
    let (end, _) = air.formulation().limits(Quantity::LeavingTemperature);
    coldest.map_or(end, |dew| dew.to_f64().max(end))
}
