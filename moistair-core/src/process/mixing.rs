//! Adiabatic mixing of any number of streams, with fog and ice where they form.

pub mod outdoor_air;

use super::{AirStream, Exchange, WetStream};
use crate::basis::Basis;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HumidityRatio, MassFlow, Pressure, SpecificEnthalpy};
use crate::real::{Scalar, k};
use crate::state::condensate::checked_pressure;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// What mixing gave.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Mixed<S = f64> {
    /// The mixture, with its fog or ice if any.
    pub leaving: WetStream<S>,
    /// Nothing: mixing is adiabatic.
    pub exchange: Exchange<S>,
}

/// Mixes streams at one pressure: W₃ = Σ ṁ W / Σ ṁ and h₃ = Σ ṁ h / Σ ṁ with all condensate, then phase equilibrium.
///
/// A stream without flow takes no part. A single stream leaves as it came.
///
/// # Errors
/// [`Error::NoFlow`] when nothing flows, [`Error::MixedFormulations`], [`Error::MixedPressures`] (use [`adiabatic_at`]), [`Error::Infeasible`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, mixing};
/// let site = Pressure::from_kilopascals(101.325);
/// let stream = |t, rh| AirStream::new(
///     MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site)?,
///     MassFlow::from_kilograms_per_second(1.0));
/// let mixed = mixing::adiabatic(&[stream(30.0, 90.0)?.into(), stream(-10.0, 80.0)?.into()])?;
/// assert!(mixed.leaving.air().is_wet()); // fog
/// assert!(mixing::adiabatic::<f64>(&[]).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn adiabatic<S: Scalar>(streams: &[WetStream<S>]) -> Result<Mixed<S>, Error> {
    let first = flowing(streams).next().ok_or(Error::NoFlow)?.air().air().pressure();
    if flowing(streams).any(|stream| stream.air().air().pressure() != first) {
        return Err(Error::MixedPressures);
    }
    adiabatic_at(streams, first, Freezing::Equilibrium)
}

/// The same at a stated outlet pressure, and with a choice whether fog freezes.
///
/// # Errors
/// As [`adiabatic`].
pub fn adiabatic_at<S: Scalar>(
    streams: &[WetStream<S>],
    outlet: Pressure<S>,
    freezing: Freezing,
) -> Result<Mixed<S>, Error> {
    let first = flowing(streams).next().ok_or(Error::NoFlow)?;
    let basis: Basis<S> = first.air().air().basis().at_pressure(outlet);
    checked_pressure(&basis)?;
    let zero = k::<S>(0.0);
    let (mut flow, mut water, mut enthalpy) = (zero, zero, zero);
    for stream in flowing(streams) {
        if stream.air().air().formulation() != basis.formulation() {
            return Err(Error::MixedFormulations);
        }
        flow = flow + stream.dry_air_flow;
        water = water + stream.dry_air_flow * stream.air().total_water().kilograms_per_kilogram();
        enthalpy = enthalpy + stream.dry_air_flow * stream.air().specific_enthalpy().joules_per_kilogram();
    }
    let alone = flowing(streams).nth(1).is_none() && first.air().air().pressure() == outlet;
    let air = if alone {
        first.air()
    } else {
        AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(enthalpy / flow),
            HumidityRatio::from_kilograms_per_kilogram(water / flow),
            freezing,
            basis,
        )?
    };
    Ok(Mixed { leaving: WetStream { air, dry_air_flow: flow }, exchange: Exchange::none() })
}

/// The stream of `air` that is left of a total dry-air flow when `part` of it is known: the recirculated air, where the flows of outdoor
/// and supply air are measured.
///
/// # Errors
/// [`Error::Infeasible`] when the part is more than the total; [`Error::NotFinite`], [`Error::OutOfRange`] for the total.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, mixing};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let flow = MassFlow::from_kilograms_per_second;
/// let outdoor = AirStream::new(state(32.0, 45.0)?, flow(1.5))?;
/// let recirculated = mixing::remainder(flow(6.0), &outdoor, state(24.0, 50.0)?)?;
/// assert_eq!(recirculated.dry_air_flow(), flow(4.5));
/// assert!(mixing::remainder(flow(1.0), &outdoor, state(24.0, 50.0)?).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn remainder<S: Scalar>(total: MassFlow<S>, part: &AirStream<S>, air: MoistAir<S>) -> Result<AirStream<S>, Error> {
    let total = checked(Quantity::DryAirFlow, total.kilograms_per_second())?;
    let rest = total - part.dry_air_flow;
    if rest < k(0.0) {
        let (value, max) = (part.dry_air_flow.to_f64(), total.to_f64());
        return Err(Error::Infeasible { quantity: Quantity::DryAirFlow, value, min: 0.0, max });
    }
    AirStream::new(air, MassFlow::from_kilograms_per_second(rest))
}

fn flowing<S: Scalar>(streams: &[WetStream<S>]) -> impl Iterator<Item = &WetStream<S>> {
    streams.iter().filter(|stream| stream.dry_air_flow > k(0.0))
}
