//! Both sides of a wheel, by balances.

use super::{
    AirStream, Exchange, Sorbed, Sorption, infeasible, parts, same_formulation, to_humidity_ratio, unsaturated,
};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::process::sensible::{self, Sensible};
use crate::quantity::{HeatFlow, HumidityRatio, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::state::MoistAir;

/// What is known of the heater that regenerates a wheel.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Regeneration<S = f64> {
    /// Its heat.
    Heat(HeatFlow<S>),
    /// The temperature of the air between heater and wheel.
    Entering(Temperature<S>),
    /// The temperature of the air behind the wheel.
    Leaving(Temperature<S>),
}

/// Whether a wheel can be what was asked.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum WheelStatus {
    /// Nothing forbids it.
    #[default]
    Possible = 0,
    /// It would destroy entropy: no wheel does this with this regeneration, which has to be hotter, drier or more.
    AgainstSecondLaw = 1,
}

/// A desiccant wheel with the heater of its regeneration.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Wheel<S = f64> {
    /// The side that is dried.
    pub process: Sorbed<S>,
    /// The heater in the regeneration air; its leaving air enters the wheel.
    pub heater: Sensible<S>,
    /// The regeneration air behind the wheel.
    pub regeneration: AirStream<S>,
    /// What the wheel gave to it: the water of the process side, and the heat that the matrix took along, negative.
    pub regeneration_exchange: Exchange<S>,
    /// Entropy that the wheel produces, W/K, from all four states; below zero against the second law.
    pub entropy_production: S,
    /// What that means.
    pub status: WheelStatus,
}

impl<S: Scalar> Wheel<S> {
    /// Heat of the regeneration, positive.
    pub fn regeneration_heat(&self) -> HeatFlow<S> {
        self.heater.exchange.heat
    }

    /// Heat of the regeneration per water removed; `None` where none is. Wheels take 3 to 8 MJ/kg (common practice, no source).
    #[must_use]
    pub fn heat_per_water(&self) -> Option<SpecificEnthalpy<S>> {
        let removed = self.process.removed.kilograms_per_second();
        (removed > k(0.0))
            .then(|| SpecificEnthalpy::from_joules_per_kilogram(self.regeneration_heat().watts() / removed))
    }
}

/// A wheel that dries air to a humidity ratio: the process side by [`to_humidity_ratio`], the regeneration side by the balances of heat and water of both,
/// W₉ = W₈ + ṁ₁ (W₁ − W₂)/ṁ₈ and h₉ = h₈ − ṁ₁ (h₂ − h₁)/ṁ₈.
///
/// Whether a wheel of this size and speed gets so dry is not asked here: [`potentials`](super::potentials) answers that for silica gel. That it would be
/// against the second law is reported.
///
/// # Errors
/// As [`to_humidity_ratio`]; [`Error::NoFlow`] without regeneration air; [`Error::Infeasible`]: of the heat flow or the leaving temperature, where
/// the heater would have to cool; of the humidity ratio, where the regeneration air cannot take the water up.
/// [`Error::MixedFormulations`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, desiccant::{self, CarryOver, Regeneration, Sorption, WheelStatus}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let grams = HumidityRatio::from_grams_per_kilogram;
/// let state = |t, w| MoistAir::from_dry_bulb(Temperature::from_celsius(t), grams(w), site);
/// let stream = |air, m| AirStream::new(air, MassFlow::from_kilograms_per_second(m));
/// let (process, outdoor) = (stream(state(25.0, 12.0)?, 1.0)?, stream(state(30.0, 14.0)?, 0.4)?);
/// let silica_gel = Sorption {
///     heat_ratio: 1.1, carry_over: CarryOver::Rise(TemperatureDifference::from_kelvins(4.0)) };
/// let to = |celsius| {
///     let hot = Regeneration::Entering(Temperature::from_celsius(celsius));
///     desiccant::wheel(&process, grams(6.0), silica_gel, &outdoor, hot)
/// };
/// let done = to(120.0)?;
/// assert!(done.status == WheelStatus::Possible && (35.0..39.0).contains(&done.regeneration_heat().kilowatts()));
/// assert!(to(60.0).is_err()); // so little heat does not drive the water out
/// # Ok::<(), Error>(())
/// ```
pub fn wheel<S: Scalar>(
    process: &AirStream<S>,
    target: HumidityRatio<S>,
    sorption: Sorption<S>,
    regeneration: &AirStream<S>,
    known: Regeneration<S>,
) -> Result<Wheel<S>, Error> {
    same_formulation(&process.air(), &regeneration.air())?;
    let flow = regeneration.flow()?;
    let dried = to_humidity_ratio(process, target, sorption)?;
    let exchange = opposite(&dried.exchange);
    let gained = exchange.heat.watts() + exchange.water_enthalpy_flow.watts();
    let water = exchange.water.kilograms_per_second();
    let (_, ratio) = parts(&regeneration.air());
    let leaving_ratio = ratio + water / flow;
    if leaving_ratio < k(0.0) {
        return Err(infeasible(Quantity::HumidityRatio, leaving_ratio, k(0.0), ratio));
    }
    let heater = heater(regeneration, known, |celsius| {
        let air = regeneration.air();
        // Refused beyond saturation, as behind the wheel.
        MoistAir::restore(
            Temperature::from_celsius(celsius),
            HumidityRatio::from_kilograms_per_kilogram(leaving_ratio),
            air.basis(),
        )
        .map(|leaving| flow * (parts(&leaving).0 - parts(&air).0) - gained)
        .map_err(|_| infeasible(Quantity::HumidityRatio, leaving_ratio, k(0.0), super::super::capacity(&air, celsius)))
    })?;
    let (hot, _) = parts(&heater.leaving.air());
    let leaving = unsaturated(hot + gained / flow, leaving_ratio, &regeneration.air())?;
    let leaving = regeneration.with_air(leaving);
    let (entropy_production, status) = entropy([(process, &dried.leaving), (&heater.leaving, &leaving)]);
    Ok(Wheel {
        process: dried,
        heater,
        regeneration: leaving,
        regeneration_exchange: exchange,
        entropy_production,
        status,
    })
}

/// The heater; `needed` gives its heat for a temperature behind the wheel.
fn heater<S: Scalar>(
    regeneration: &AirStream<S>,
    known: Regeneration<S>,
    needed: impl FnOnce(S) -> Result<S, Error>,
) -> Result<Sensible<S>, Error> {
    let formulation = regeneration.air().formulation();
    let heat = match known {
        Regeneration::Entering(temperature) => {
            let celsius = checked_for(formulation, Quantity::LeavingTemperature, temperature.celsius())?;
            let coldest = regeneration.air().dry_bulb().celsius();
            if celsius < coldest {
                let (_, warmest) = formulation.limits(Quantity::LeavingTemperature);
                return Err(infeasible(Quantity::LeavingTemperature, celsius, coldest, k(warmest)));
            }
            return sensible::to_temperature(regeneration, temperature);
        }
        Regeneration::Leaving(temperature) => {
            needed(checked_for(formulation, Quantity::LeavingTemperature, temperature.celsius())?)?
        }
        Regeneration::Heat(heat) => checked(Quantity::HeatFlow, heat.watts())?,
    };
    let (_, most) = Quantity::HeatFlow.limits();
    if !(k::<S>(0.0) <= heat && heat <= k(most)) {
        return Err(infeasible(Quantity::HeatFlow, heat, k(0.0), k(most)));
    }
    sensible::with_heat(regeneration, HeatFlow::from_watts(heat))
}

fn opposite<S: Scalar>(exchange: &Exchange<S>) -> Exchange<S> {
    Exchange { heat: -exchange.heat, water: -exchange.water, water_enthalpy_flow: -exchange.water_enthalpy_flow }
}

/// Entropy produced between streams that enter and leave, W/K, and whether it is above what rounding may take from nothing.
pub(super) fn entropy<S: Scalar>(sides: [(&AirStream<S>, &AirStream<S>); 2]) -> (S, WheelStatus) {
    let (mut produced, mut scale) = (k::<S>(0.0), k::<S>(0.0));
    for (entering, leaving) in sides {
        let of = |stream: &AirStream<S>| stream.air().specific_entropy().joules_per_kilogram_kelvin();
        let (before, after) = (of(entering), of(leaving));
        let flow = entering.dry_air_flow;
        produced = produced + flow * (after - before);
        let heat_capacity = leaving.air().specific_heat().joules_per_kilogram_kelvin();
        scale = scale + flow * (before.at_least(-before) + after.at_least(-after) + heat_capacity);
    }
    let rounding = scale * S::epsilon() * k(64.0);
    let status = if produced < -rounding { WheelStatus::AgainstSecondLaw } else { WheelStatus::Possible };
    (produced, status)
}
