//! Direct evaporative cooling with circulating water.

use super::{AirStream, WaterTreatment, WaterUse, infeasible, water_use};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::process::humidify::contact::{Contact, Unbalanced};
use crate::process::humidify::{EvaporatingWater, Humidified, water_enthalpy};
use crate::quantity::{HeatFlow, MassFlow, Temperature};
use crate::real::{Scalar, k};
use crate::solve;

/// Wet-bulb depression, K, below which air counts as saturated.
const SATURATED: f64 = 1e-9;

/// A direct evaporative cooler, or a humidifier of wetted media, with its circulating water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DirectCooler<S = f64> {
    /// ε = (t₁ − t₂) / (t₁ − t_w), where t_w, the temperature of the circulating water, is the wet bulb but for the heat of pump and make-up.
    pub saturation_effectiveness: S,
    /// Water over the medium.
    pub circulating: MassFlow<S>,
    /// Power of the pump, which ends as heat in the water.
    pub pump_heat: HeatFlow<S>,
    /// Temperature of the make-up: that of the circulating water, or stated.
    pub make_up: EvaporatingWater<S>,
    /// Carry-over of droplets as the drift over the circulating water, and the cycles of concentration that the bleed keeps.
    pub treatment: WaterTreatment<S>,
}

/// Whether a direct cooler has anything to do.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum DirectStatus {
    /// Water evaporates.
    Evaporating = 0,
    /// The air enters saturated: nothing evaporates but by the heat of pump and make-up.
    AlreadySaturated = 1,
}

/// What a direct evaporative cooler did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct DirectCooled<S = f64> {
    /// The air with its books: the water taken up and carried over counts with the temperature of the circulating water; heat is that of
    /// the pump, and of make-up and bleed where their temperatures differ.
    pub air: Humidified<S>,
    /// Of the circulating water.
    pub water_temperature: Temperature<S>,
    /// Evaporation, carry-over, bleed (blowdown) and make-up. Where vapor of the air condenses, that leaves with the bleed, beyond what make-up
    /// brings, and `limited_by_drift` is set.
    pub water: WaterUse<S>,
    /// Whether there was anything to do.
    pub status: DirectStatus,
}

/// Cools and humidifies air over a wetted medium whose water circulates.
///
/// t₂ = t₁ − ε (t₁ − t_w); the water settles where the heat that it gives to the air, by Lewis factor one, is that of its pump and of
/// its make-up: P + M (h_m − h_w) for M = E + D + B. Without these t_w is the wet bulb, and the air is that of
/// [`evaporative`](crate::process::humidify::evaporative).
///
/// Bounded work: one search, at most 80 evaluations.
///
/// # Errors
/// [`Error::Infeasible`] where the water would freeze, for more pump heat than the air can take, and at one cycle of concentration;
/// [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, evaporative::*, humidify::EvaporatingWater};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let cooler = DirectCooler {
///     saturation_effectiveness: 0.85,
///     circulating: MassFlow::from_kilograms_per_second(1.0),
///     pump_heat: HeatFlow::from_watts(200.0),
///     make_up: EvaporatingWater::Given(Temperature::from_celsius(15.0)),
///     treatment: WaterTreatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 },
/// };
/// let dry = AirStream::new(state(38.0, 15.0)?, MassFlow::from_kilograms_per_second(2.0))?;
/// let done = direct(&dry, cooler)?;
/// assert!((21.5..22.5).contains(&done.air.leaving.air().air().dry_bulb().celsius()));
/// assert!(done.water.make_up > done.water.evaporation);
/// let frosty = AirStream::new(state(2.0, 20.0)?, MassFlow::from_kilograms_per_second(2.0))?;
/// assert!(direct(&frosty, cooler).is_err()); // the water would freeze
/// # Ok::<(), Error>(())
/// ```
pub fn direct<S: Scalar>(entering: &AirStream<S>, cooler: DirectCooler<S>) -> Result<DirectCooled<S>, Error> {
    let effectiveness = checked(Quantity::SaturationEffectiveness, cooler.saturation_effectiveness)?;
    let pump = checked(Quantity::PumpHeat, cooler.pump_heat.watts())?;
    let make_up = match cooler.make_up {
        EvaporatingWater::AtWetBulb => None,
        EvaporatingWater::Given(temperature) => Some(water_enthalpy(&entering.air(), temperature)?),
    };
    // What condenses on water colder than the dew point leaves with the bleed.
    let used = |evaporated: S| {
        let flow = MassFlow::from_kilograms_per_second;
        let condensed = (-evaporated).at_least(k(0.0));
        let used = water_use(flow(evaporated.at_least(k(0.0))), cooler.circulating, cooler.treatment)?;
        let limited_by_drift = used.limited_by_drift || condensed > k(0.0);
        Ok::<_, Error>(WaterUse { blowdown: used.blowdown + flow(condensed), limited_by_drift, ..used })
    };
    let still = used(k(0.0))?;
    let droplets = still.drift.kilograms_per_second();
    let contact = Contact::new(entering, effectiveness)?;
    let wet_bulb = entering.air().wet_bulb()?.celsius();
    let without_contact = effectiveness == k(0.0) && pump == k(0.0) && make_up.is_none() && droplets == k(0.0);
    let met = if without_contact && contact.melting() <= wet_bulb {
        contact.met(wet_bulb)
    } else {
        let balanced = contact.balanced(|met| {
            let needed = used(met.evaporated).map_or(k(0.0), |water| water.make_up.kilograms_per_second());
            let warmer = make_up.map_or(k(0.0), |enthalpy| enthalpy - met.water_enthalpy);
            pump + needed * warmer - met.heat_of_droplets(&contact, droplets)
        });
        balanced.map_err(|why| match why {
            Unbalanced::Freezes => contact.freezes(),
            Unbalanced::TooMuchHeat => {
                let most = contact.met(contact.warmest()).heat;
                infeasible(Quantity::PumpHeat, pump, k(0.0), most)
            }
        })?
    };
    let alike = k::<S>(SATURATED).at_least(solve::temperature_resolution::<S>() * k(32.0));
    let saturated = entering.air().dry_bulb().celsius() - wet_bulb <= alike;
    Ok(DirectCooled {
        air: contact.leaving(&met, droplets)?,
        water_temperature: Temperature::from_celsius(met.water),
        water: used(met.evaporated)?,
        status: if saturated { DirectStatus::AlreadySaturated } else { DirectStatus::Evaporating },
    })
}
