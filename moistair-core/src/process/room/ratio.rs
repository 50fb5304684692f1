//! Sensible heat ratio and slope of the room line, by one definition of the latent heat.

use super::{Load, RoomGains};
use crate::basis::Basis;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::process::infeasible;
use crate::quantity::SpecificEnthalpy;
use crate::real::{Scalar, k};
use crate::state::MoistAir;

/// The latent heat by which a room's gains are told apart: the enthalpy h_v of the vapor in its own air, (∂h/∂W) at its temperature and
/// pressure; 2546 kJ/kg at 24 °C.
///
/// What a gain brings beyond it is sensible, wherever the water comes from: SHR = 1 − ṁ_w h_v / (Q + ṁ_w h_w), so that the ratio and
/// the slope of the line say the same. Other definitions differ in the latent part: 2501 kJ/kg by 2 %, the heat of vaporization by 4 %; with the
/// enthalpy of the source (ASHRAE Fundamentals 2021 ch. 1, Example 6: 0.701, here 0.702) lines of one ratio would differ by source.
pub fn latent_heat<S: Scalar>(room: &MoistAir<S>) -> SpecificEnthalpy<S> {
    SpecificEnthalpy::from_joules_per_kilogram(room.vapor_enthalpy())
}

/// Sensible over total gain by [`latent_heat`]; below 0 or above 1 where one gain is negative or water evaporates in the room, and never clamped.
///
/// # Errors
/// [`Error::Infeasible`] where the gains cancel, and without any; [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::room::{MoistureSource, RoomGains, sensible_heat_ratio};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let room = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let gains = |kilowatts, per_hour, source| RoomGains {
///     sensible: HeatFlow::from_kilowatts(kilowatts), moisture: MassFlow::from_kilograms_per_hour(per_hour), source };
/// let people = MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0));
/// assert!((sensible_heat_ratio(&room, &gains(6.0, 3.0, people))? - 0.739).abs() < 0.001);
/// // Evaporating water takes its heat from the room.
/// let water = MoistureSource::Liquid(Temperature::from_celsius(15.0));
/// assert!(sensible_heat_ratio(&room, &gains(1.0, 3.0, water))? < 0.0);
/// assert!(sensible_heat_ratio(&room, &gains(0.0, 0.0, people)).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn sensible_heat_ratio<S: Scalar>(room: &MoistAir<S>, gains: &RoomGains<S>) -> Result<S, Error> {
    let load = Load::of(gains, room.basis())?;
    quotient(Quantity::SensibleHeatRatio, load.sensible_at(room.vapor_enthalpy()), load.total)
}

/// Slope of the room line, Δh/ΔW = (Q + ṁ_w h_w)/ṁ_w.
///
/// # Errors
/// [`Error::Infeasible`] without moisture: the line is then horizontal in humidity ratio, its slope without bound.
/// [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn process_slope<S: Scalar>(
    gains: &RoomGains<S>,
    basis: impl Into<Basis<S>>,
) -> Result<SpecificEnthalpy<S>, Error> {
    let load = Load::of(gains, basis.into())?;
    quotient(Quantity::ProcessSlope, load.total, load.water).map(SpecificEnthalpy::from_joules_per_kilogram)
}

/// Slope of the line of a sensible heat ratio through a room: h_v / (1 − SHR).
///
/// # Errors
/// [`Error::Infeasible`] for a ratio of one, whose slope has no bound; [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::room::{ratio_of_slope, slope_of_ratio};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let room = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let slope = slope_of_ratio(&room, 0.75)?;
/// assert!((slope.kilojoules_per_kilogram() - 2545.64 / 0.25).abs() < 0.01);
/// assert!((ratio_of_slope(&room, slope)? - 0.75).abs() < 1e-14);
/// assert!(slope_of_ratio(&room, 1.0).is_err()); // no moisture: no slope
/// # Ok::<(), Error>(())
/// ```
pub fn slope_of_ratio<S: Scalar>(room: &MoistAir<S>, sensible_heat_ratio: S) -> Result<SpecificEnthalpy<S>, Error> {
    let ratio = checked(Quantity::SensibleHeatRatio, sensible_heat_ratio)?;
    quotient(Quantity::ProcessSlope, room.vapor_enthalpy(), k::<S>(1.0) - ratio)
        .map(SpecificEnthalpy::from_joules_per_kilogram)
}

/// Sensible heat ratio of a slope through a room: 1 − h_v / slope.
///
/// # Errors
/// [`Error::Infeasible`] for a slope of zero, that of gains which cancel; [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn ratio_of_slope<S: Scalar>(room: &MoistAir<S>, slope: SpecificEnthalpy<S>) -> Result<S, Error> {
    let slope = checked(Quantity::ProcessSlope, slope.joules_per_kilogram())?;
    quotient(Quantity::SensibleHeatRatio, slope - room.vapor_enthalpy(), slope)
}

/// A quotient within the limits of its quantity, refused beyond them.
fn quotient<S: Scalar>(quantity: Quantity, numerator: S, denominator: S) -> Result<S, Error> {
    let value = numerator / denominator;
    let (min, max) = quantity.limits();
    if k::<S>(min) <= value && value <= k(max) {
        return Ok(value);
    }
    // Nothing over nothing is as good as anything over nothing.
    let value = if value.is_nan() { S::infinity() } else { value };
    Err(infeasible(quantity, value, k(min), k(max)))
}
