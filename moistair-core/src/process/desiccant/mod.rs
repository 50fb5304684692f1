//! Drying by a desiccant: along the line of adiabatic sorption, and in a wheel that hot air regenerates.
//!
//! - [`to_humidity_ratio`], [`by_effectiveness`]: what air does that gives water to a desiccant, or takes it back, on one side;
//! - [`wheel`]: both sides of a wheel by balances, with the heat that the regeneration takes;
//! - [`potentials`]: what a wheel of silica gel reaches, by the F1–F2 potentials.
//!
//! Sorbed water gives off more heat than it would by condensing, k times as much, which stays in the air:
//! c_p (t₂ − t₁) = (W₁ − W₂) k h_fg. With k = 1 that is nearly the line of the wet bulb run backwards.
//!
//! # Accuracy
//! The line is a heat balance with two figures of the desiccant: k about 1.05 to 1.15 for silica gel, 1.2 and more for zeolites (common practice,
//! no source), and the heat that the matrix carries over from the hot side, which a maker's data give or a test does (ASHRAE 139). Each 0.1 of k is
//! worth 0.25 K per g/kg of drying. Left out: leakage and purge, the shape of the outlet over the angle of the wheel (a mixed mean is
//! given), start-up, aging and fouling. Not for liquid desiccants, whose solution takes up heat and water of its own.
//!
//! # Caution
//! Regeneration air of 60 to 150 °C burns, scorches dust and lint, and can ignite them: makers' instructions, over-temperature cut-outs in hardware
//! and fire codes govern, as they do the solvents and vapors that a desiccant collects and sets free again when it is heated. Wet regeneration exhaust
//! condenses in cold ducts and grows mould there, as supply ducts kept above about 80 to 90 % relative humidity do (common practice, no source).
//! Local codes and licensed practice govern; nothing here is a safety function.

pub mod potentials;

mod wheel;

pub use wheel::{Regeneration, Wheel, WheelStatus, wheel};

use super::{AirStream, Exchange, infeasible, parts, same_formulation, unsaturated};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, TemperatureDifference};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::MoistAir;
use crate::state::condensate::condensed_enthalpy;

/// What a desiccant does beside taking up water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Sorption<S = f64> {
    /// Heat of sorption over heat of vaporization, k: 0.5 to 3.
    pub heat_ratio: S,
    /// Heat that comes with the matrix of a wheel.
    pub carry_over: CarryOver<S>,
}

/// Heat that the matrix of a wheel brings from the regeneration side, beside that of sorption.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum CarryOver<S = f64> {
    /// None: a bed without regeneration, or a well purged wheel.
    #[default]
    None,
    /// A heat flow into the air.
    Heat(HeatFlow<S>),
    /// What warms the leaving air by so much beyond the line of sorption.
    Rise(TemperatureDifference<S>),
}

/// Air that gave water to a desiccant, or took it back.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Sorbed<S = f64> {
    /// The air that leaves.
    pub leaving: AirStream<S>,
    /// The heat carried over, and the water with what is left of its enthalpy: h_v − k h_fg.
    pub exchange: Exchange<S>,
    /// Water that went into the desiccant; negative where it came out.
    pub removed: MassFlow<S>,
    /// Heat of sorption that the air took up, ṁ (W₁ − W₂) k h_fg.
    pub sorption_heat: HeatFlow<S>,
    /// Heat that the matrix carried over.
    pub carried_heat: HeatFlow<S>,
}

/// Leads air along the line of sorption to a humidity ratio: h₂ = h₁ − (W₁ − W₂)(h_v − k h_fg) + q, with the enthalpy of vapor h_v and the
/// heat of vaporization h_fg = h_v − h_w at the entering state. A moister target runs the line backwards, as in regeneration.
///
/// # Errors
/// [`Error::NoFlow`]; [`Error::Infeasible`]: of the dry bulb, for entering air below −40 °C, where no liquid gives a heat of vaporization; of the
/// humidity ratio, where the leaving air would be fog (backwards: it cools as it takes up water); of the leaving enthalpy or temperature outside
/// the range of states. [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, desiccant::{self, CarryOver, Sorption}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(25.0), HumidityRatio::from_grams_per_kilogram(12.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let silica_gel = Sorption { heat_ratio: 1.1, carry_over: CarryOver::None };
/// let done = desiccant::to_humidity_ratio(&entering, HumidityRatio::from_grams_per_kilogram(6.0), silica_gel)?;
/// // 6 g/kg of drying warm the air by 16 K.
/// assert!((done.leaving.air().dry_bulb().celsius() - 41.0).abs() < 0.5);
/// assert!(desiccant::to_humidity_ratio(&entering, HumidityRatio::from_grams_per_kilogram(30.0), silica_gel).is_err()); // fog
/// # Ok::<(), Error>(())
/// ```
pub fn to_humidity_ratio<S: Scalar>(
    entering: &AirStream<S>,
    target: HumidityRatio<S>,
    sorption: Sorption<S>,
) -> Result<Sorbed<S>, Error> {
    let target = checked(Quantity::HumidityRatio, target.kilograms_per_kilogram())?;
    let heat_ratio = checked(Quantity::SorptionHeatRatio, sorption.heat_ratio)?;
    let flow = entering.flow()?;
    let air = entering.air();
    let (enthalpy, ratio) = parts(&air);
    let Vaporization { vapor, heat } = Vaporization::of(&air)?;
    let dried = ratio - target;
    // What goes with the water is what vapor brings less the heat that it leaves behind.
    let kept = enthalpy - dried * (vapor - heat_ratio * heat);
    let carried = match sorption.carry_over {
        CarryOver::None => k(0.0),
        CarryOver::Heat(heat) => checked(Quantity::HeatFlow, heat.watts())?,
        CarryOver::Rise(rise) => {
            let rise = checked(Quantity::CarryOverRise, rise.kelvins())?;
            let adiabatic = unsaturated(kept, target, &air)?;
            let celsius = adiabatic.dry_bulb().celsius() + rise;
            let (coldest, warmest) = air.formulation().limits(Quantity::LeavingTemperature);
            if celsius < k(coldest) || celsius > k(warmest) {
                return Err(infeasible(Quantity::LeavingTemperature, celsius, k(coldest), k(warmest)));
            }
            let warm = MoistAir::assemble(celsius, air.pressure().pascals(), target, air.formulation());
            flow * (parts(&warm).0 - kept)
        }
    };
    let leaving =
        if dried == k(0.0) && carried == k(0.0) { air } else { unsaturated(kept + carried / flow, target, &air)? };
    let removed = flow * dried;
    Ok(Sorbed {
        leaving: entering.with_air(leaving),
        exchange: Exchange::new(carried, -removed, -removed * (vapor - heat_ratio * heat)),
        removed: MassFlow::from_kilograms_per_second(removed),
        sorption_heat: HeatFlow::from_watts(removed * heat_ratio * heat),
        carried_heat: HeatFlow::from_watts(carried),
    })
}

/// Dries by an effectiveness on humidity ratio, (W₁ − W₂)/(W₁ − W_least): `driest` is what the desiccant could reach at best, 0 for the
/// common definition.
///
/// # Errors
/// As [`to_humidity_ratio`]; [`Error::Infeasible`] for air that enters drier than `driest`.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, desiccant::{self, CarryOver, Sorption}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(25.0), HumidityRatio::from_grams_per_kilogram(12.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let wheel = Sorption { heat_ratio: 1.1, carry_over: CarryOver::Rise(TemperatureDifference::from_kelvins(4.0)) };
/// let grams = HumidityRatio::from_grams_per_kilogram;
/// let done = desiccant::by_effectiveness(&entering, 0.5, grams(0.0), wheel)?;
/// assert!((done.leaving.air().humidity_ratio().grams_per_kilogram() - 6.0).abs() < 1e-12);
/// assert!(desiccant::by_effectiveness(&entering, 0.5, grams(13.0), wheel).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn by_effectiveness<S: Scalar>(
    entering: &AirStream<S>,
    effectiveness: S,
    driest: HumidityRatio<S>,
    sorption: Sorption<S>,
) -> Result<Sorbed<S>, Error> {
    let effectiveness = checked(Quantity::DryingEffectiveness, effectiveness)?;
    let driest = checked(Quantity::HumidityRatio, driest.kilograms_per_kilogram())?;
    let (_, ratio) = parts(&entering.air());
    if driest > ratio {
        return Err(infeasible(Quantity::HumidityRatio, driest, k(0.0), ratio));
    }
    let target = (ratio - effectiveness * (ratio - driest)).at_least(driest);
    to_humidity_ratio(entering, HumidityRatio::from_kilograms_per_kilogram(target), sorption)
}

/// Vapor of some air, and what it takes to make it from liquid there.
struct Vaporization<S> {
    vapor: S,
    heat: S,
}

impl<S: Scalar> Vaporization<S> {
    fn of(air: &MoistAir<S>) -> Result<Self, Error> {
        let (celsius, pressure) = (air.dry_bulb().celsius(), air.pressure().pascals());
        let least = k(Quantity::DewPoint.limits().0);
        if celsius < least {
            let (_, warmest) = air.formulation().limits(Quantity::DryBulb);
            return Err(infeasible(Quantity::DryBulb, celsius, least, k(warmest)));
        }
        let vapor = air.vapor_enthalpy();
        let liquid = condensed_enthalpy(air.formulation(), celsius, pressure, Surface::Liquid);
        Ok(Self { vapor, heat: vapor - liquid })
    }
}

#[cfg(test)]
mod tests;
