//! Cooling below the wanted temperature to shed water, then heating back.

use super::coil::{self, CondensateTemperature, Cooling};
use super::sensible::{self, Sensible};
use super::{AirStream, infeasible, same_formulation};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, RelativeHumidity};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;
use crate::state::property::dew_point;

/// A coil and the heater behind it.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Reheat<S = f64> {
    /// The coil.
    pub cooling: Cooling<S>,
    /// The heater.
    pub heating: Sensible<S>,
}

impl<S: Scalar> Reheat<S> {
    /// Heat of the heater, positive.
    pub fn reheat(&self) -> HeatFlow<S> {
        self.heating.exchange.heat
    }

    /// Reheat over cooling load: how much of the cooling is undone; `None` without a load.
    #[must_use]
    pub fn reheat_fraction(&self) -> Option<S> {
        let load = self.cooling.cooling_load.watts();
        (load != k(0.0)).then(|| self.reheat().watts() / load)
    }
}

/// Reaches a target state by cooling to its humidity ratio at a coil-leaving relative humidity (1 for full contact, 0.90 to 0.95 is common
/// practice, no source), then heating.
///
/// Codes restrict simultaneous heating and cooling; this reports the reheat and does not judge it.
///
/// # Errors
/// [`Error::Infeasible`] when the target is moister than the entering air, or cooler than the coil would have to leave; the limits
/// name which. [`Error::MixedFormulations`], [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn to_state<S: Scalar>(
    entering: &AirStream<S>,
    target: &MoistAir<S>,
    coil_leaving: RelativeHumidity<S>,
    condensate: CondensateTemperature<S>,
) -> Result<Reheat<S>, Error> {
    same_formulation(&entering.air(), target)?;
    let least = k::<S>(0.2);
    let fraction = checked(Quantity::RelativeHumidity, coil_leaving.fraction())?;
    if fraction < least || fraction > k(1.0) {
        return Err(infeasible(Quantity::RelativeHumidity, fraction, least, k(1.0)));
    }
    let reached = target.dry_bulb().celsius();
    let celsius = off_coil_temperature(&entering.air(), target, fraction)?;
    // A target on the coil's own curve needs no reheat; the solve may place it a rounding above.
    let rounding = solve::temperature_resolution::<S>() * k(32.0);
    if celsius > reached + rounding {
        let (_, warmest) = target.formulation().limits(Quantity::LeavingTemperature);
        return Err(infeasible(Quantity::LeavingTemperature, reached, celsius, k(warmest)));
    }
    let ratio = target.humidity_ratio().kilograms_per_kilogram();
    let off_coil =
        MoistAir::assemble(celsius.at_most(reached), target.pressure().pascals(), ratio, target.formulation());
    let cooling = coil::to_state(entering, &off_coil, condensate)?;
    let heating = sensible::to_temperature(&cooling.leaving, target.dry_bulb())?;
    Ok(Reheat { cooling, heating })
}

/// Temperature at which the water of the target is at a fraction of saturation over the stable surface.
fn off_coil_temperature<S: Scalar>(entering: &MoistAir<S>, target: &MoistAir<S>, fraction: S) -> Result<S, Error> {
    let ratio = target.humidity_ratio().kilograms_per_kilogram();
    let pressure = target.pressure().pascals();
    with_mixture!(target.formulation(), S, M => {
        let coldest = k::<S>(target.formulation().limits(Quantity::LeavingTemperature).0);
        let driest = M::<S>::at(coldest).saturation(pressure, Surface::Ice).mole_fraction * fraction;
        let mole_fraction = <M<S> as Mixture<S>>::mole_fraction(ratio);
        if mole_fraction < driest {
            let most = entering.humidity_ratio().kilograms_per_kilogram();
            return Err(infeasible(Quantity::HumidityRatio, ratio, <M<S> as Mixture<S>>::humidity_ratio(driest), most));
        }
        let saturated = mole_fraction / fraction;
        if saturated > k(Quantity::WaterMoleFraction.limits().1) {
            return Err(infeasible(Quantity::RelativeHumidity, fraction, mole_fraction, k(1.0)));
        }
        let over = |surface| dew_point::<M<S>, S>(saturated, pressure, surface);
        let melting = <M<S> as Mixture<S>>::melting_temperature(pressure);
        let at_melting = M::<S>::at(melting).saturation(pressure, Surface::Liquid).mole_fraction;
        Ok(if saturated < at_melting { over(Surface::Ice).at_most(melting) } else { over(Surface::Liquid) })
    })
}
