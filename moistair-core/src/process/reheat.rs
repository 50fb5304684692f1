//! Cooling below the wanted temperature to shed water, then heating back.

use super::coil::{self, CondensateTemperature, Cooling};
use super::sensible::{self, Sensible};
use super::{AirStream, same_formulation};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, RelativeHumidity};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::MoistAir;
use crate::state::property::{DEW_POINT_STEPS, dew_point};

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
    let (lowest, one) = (k::<S>(0.2), k::<S>(1.0));
    let fraction = checked(Quantity::RelativeHumidity, coil_leaving.fraction())?;
    if fraction < lowest || fraction > one {
        return Err(Error::Infeasible {
            quantity: Quantity::RelativeHumidity,
            value: fraction.to_f64(),
            min: lowest.to_f64(),
            max: one.to_f64(),
        });
    }
    let ratio = target.humidity_ratio().kilograms_per_kilogram();
    let pressure = target.pressure().pascals();
    let celsius = with_mixture!(target.formulation(), S, M => {
        let saturated = <M<S> as Mixture<S>>::mole_fraction(ratio) / fraction;
        let over = |surface| dew_point::<M<S>, S, DEW_POINT_STEPS>(saturated, pressure, surface);
        let liquid = over(Surface::Liquid);
        if liquid < <M<S> as Mixture<S>>::melting_temperature(pressure) { over(Surface::Ice) } else { liquid }
    });
    let reached = target.dry_bulb().celsius();
    if !(celsius <= reached) {
        return Err(Error::Infeasible {
            quantity: Quantity::LeavingTemperature,
            value: reached.to_f64(),
            min: celsius.to_f64(),
            max: Quantity::LeavingTemperature.limits().1,
        });
    }
    let off_coil = MoistAir::assemble(celsius, pressure, ratio, target.formulation());
    let cooling = coil::to_state(entering, &off_coil, condensate)?;
    let heating = sensible::to_temperature(&cooling.leaving, target.dry_bulb())?;
    Ok(Reheat { cooling, heating })
}
