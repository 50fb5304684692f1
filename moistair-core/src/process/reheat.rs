//! Cooling below the wanted temperature to shed water, then heating back.
//!
//! What a coil can leave is known by one of two characteristics ([`CoilLeaving`]): a relative humidity, or a bypass factor. Both are as good as
//! the measurement behind them (a few tenths of a kelvin) and change with the flow of the air; a coil rated by its conductances is
//! [`super::coil::with_water`].

mod curve;

pub(super) use curve::{Curve, Point};

use super::coil::{self, CondensateTemperature, Cooling};
use super::sensible::{self, Sensible};
use super::{AirStream, infeasible, same_formulation};
use crate::bounds::Quantity;
use crate::error::Error;
use crate::quantity::{HeatFlow, RelativeHumidity, Temperature};
use crate::real::{Scalar, k};
use crate::solve;
use crate::state::MoistAir;

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

/// What a cooling coil can leave, whatever its control.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum CoilLeaving<S = f64> {
    /// Air of a relative humidity (stable surface): 1 for full contact, 0.90 to 0.95 is common practice, no source.
    RelativeHumidity(RelativeHumidity<S>),
    /// A mixture of air that passed untouched and air saturated at the apparatus dew point, straight in enthalpy and humidity ratio.
    Bypass {
        /// Share of the air that passes untouched, below 1.
        factor: S,
        /// The coldest apparatus dew point that the coil can hold.
        coldest: Temperature<S>,
    },
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
    with_coil(entering, target, CoilLeaving::RelativeHumidity(coil_leaving), condensate)
}

/// Reaches a target state by cooling to its humidity ratio on the characteristic of a coil, then heating.
///
/// # Errors
/// [`Error::Infeasible`] names what binds: the humidity ratio (the target is moister than the entering air, or drier than any surface here makes
/// it), the bypass factor (so much entering air passes that the rest would have to be without water, or more), the apparatus dew point (it would
/// lie below the coldest of the coil), the leaving temperature (the target is cooler than what the coil leaves).
/// [`Error::MixedFormulations`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::CondensateTemperature, reheat::{self, CoilLeaving}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let entering = AirStream::new(state(27.0, 55.0)?, MassFlow::from_kilograms_per_second(1.0))?;
/// let coil = |celsius| CoilLeaving::Bypass { factor: 0.1, coldest: Temperature::from_celsius(celsius) };
/// let target = state(20.0, 50.0)?;
/// let done = reheat::with_coil(&entering, &target, coil(4.0), CondensateTemperature::LeavingAir)?;
/// assert!(done.reheat().kilowatts() > 9.0);
/// // With an apparatus dew point of 9 °C the coil cannot get so dry.
/// assert!(reheat::with_coil(&entering, &target, coil(9.0), CondensateTemperature::LeavingAir).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn with_coil<S: Scalar>(
    entering: &AirStream<S>,
    target: &MoistAir<S>,
    coil_leaving: CoilLeaving<S>,
    condensate: CondensateTemperature<S>,
) -> Result<Reheat<S>, Error> {
    same_formulation(&entering.air(), target)?;
    let reached = target.dry_bulb().celsius();
    let curve = Curve::of(coil_leaving, &entering.air(), target)?;
    let celsius = curve.leaving_temperature()?;
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
