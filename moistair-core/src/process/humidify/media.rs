//! Wetted media: air of known contact with the water that it evaporates.

use super::contact::ratio_of_heat;
use super::{AirStream, Humidified, add_water, infeasible, parts, water_enthalpy};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::process::melting_temperature;
use crate::quantity::{MassFlow, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::condensate::condensed_enthalpy;
use crate::state::construct::{greatest_humidity_ratio, saturation_tolerance};

/// Temperature of the water that a wetted medium evaporates.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum EvaporatingWater<S = f64> {
    /// The wet bulb, where recirculated water settles: the air then moves exactly along its wet-bulb line.
    #[default]
    AtWetBulb,
    /// Once-through water of a stated temperature.
    Given(Temperature<S>),
}

/// Wetted media or full spray of a stated saturation effectiveness ε = (t₁ − t₂) / (t₁ − t*); the water follows from the heat book.
///
/// # Errors
/// [`Error::Infeasible`] for a wet bulb below the melting temperature (the water would freeze), and for water so hot that this
/// effectiveness would need more vapor than the leaving air holds; [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn evaporative<S: Scalar>(
    entering: &AirStream<S>,
    saturation_effectiveness: S,
    water: EvaporatingWater<S>,
) -> Result<Humidified<S>, Error> {
    let effectiveness = checked(Quantity::SaturationEffectiveness, saturation_effectiveness)?;
    let air = entering.air();
    let (celsius, pressure) = (air.dry_bulb().celsius(), air.pressure().pascals());
    let wet_bulb = air.wet_bulb()?.celsius();
    let melting = melting_temperature(&air);
    if wet_bulb < melting {
        let (_, warmest) = air.formulation().limits(Quantity::WetBulb);
        return Err(infeasible(Quantity::WetBulb, wet_bulb, melting, k(warmest)));
    }
    let water = match water {
        EvaporatingWater::AtWetBulb => condensed_enthalpy(air.formulation(), wet_bulb, pressure, Surface::Liquid),
        EvaporatingWater::Given(temperature) => water_enthalpy(&air, temperature)?,
    };
    if effectiveness == k(0.0) {
        return add_water(entering, MassFlow::from_kilograms_per_second(effectiveness), water);
    }
    let (_, w1) = parts(&air);
    let leaving = celsius - effectiveness * (celsius - wet_bulb);
    let (ratio, limit) = with_mixture!(air.formulation(), S, M => {
        let mixture = M::<S>::at(leaving);
        let limit = greatest_humidity_ratio(&mixture, leaving, pressure);
        (ratio_of_heat(&mixture, &air, limit, water, k(0.0)), limit)
    });
    if ratio > limit + limit * saturation_tolerance::<S>() {
        return Err(infeasible(Quantity::HumidityRatio, ratio, w1, limit));
    }
    let evaporated = (ratio - w1).at_least(k(0.0));
    add_water(entering, MassFlow::from_kilograms_per_second(entering.flow()? * evaporated), water)
}
