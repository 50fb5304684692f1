//! Evaporation before anything is known.

use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{MassFlow, TemperatureDifference};
use crate::real::{Scalar, k};

/// Evaporation by the rule of thumb 0.00153 of the circulating flow for each kelvin of range (common practice, no source): to set a
/// valve before anything is known.
///
/// The balance gives from 0.0012 per kelvin at a wet bulb of 10 °C to 0.0023 in air of 35 °C with a wet bulb of 18 °C: use
/// [`with_air_flow`](super::with_air_flow) or [`poppe`](super::poppe) where the number matters.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn evaporation_by_rule_of_thumb<S: Scalar>(
    circulating: MassFlow<S>,
    range: TemperatureDifference<S>,
) -> Result<MassFlow<S>, Error> {
    let circulating = checked(Quantity::WaterFlow, circulating.kilograms_per_second())?;
    let range = checked(Quantity::TowerRange, range.kelvins())?;
    Ok(MassFlow::from_kilograms_per_second(circulating * range * k(0.000_85 * 1.8)))
}
