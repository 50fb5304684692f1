//! Spray that evaporates as far as the air takes it.

use super::{AirStream, Humidified, add_water, water_enthalpy};
use crate::error::Error;
use crate::quantity::{MassFlow, Temperature};
use crate::real::Scalar;

/// Sprays liquid water of any temperature into the air; what equilibrium does not evaporate is carried as droplets.
///
/// h₂ = h₁ + s h_w: nearly along the wet-bulb line. All of the water comes to equilibrium with all of the air; a washer, which
/// circulates many times more, is not modeled here.
///
/// # Errors
/// As [`steam`](super::steam()).
pub fn spray<S: Scalar>(
    entering: &AirStream<S>,
    water: MassFlow<S>,
    temperature: Temperature<S>,
) -> Result<Humidified<S>, Error> {
    let enthalpy = water_enthalpy(&entering.air(), temperature)?;
    add_water(entering, water, enthalpy)
}
