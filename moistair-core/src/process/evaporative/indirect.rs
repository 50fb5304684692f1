//! Indirect evaporative cooling: a wet secondary stream behind a wall.

use super::{AirStream, Exchange, WetStream, infeasible, parts, same_formulation};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_between};
use crate::mixture::Mixture;
use crate::process::humidify::{EvaporatingWater, Humidified, water_enthalpy};
use crate::process::melting_temperature;
use crate::process::sensible::at_same_ratio;
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, RelativeHumidity, SpecificEnthalpy};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::condensate::condensed_enthalpy;
use crate::state::property::saturates;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// How far the primary air is cooled.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum IndirectEffectiveness<S = f64> {
    /// (t₁ − t₂) / (t₁ − t*), of the wet bulb of the *secondary* air. Above one where the working air is cooled on the way before it is
    /// wetted (dew-point cycles), as far as the dew point of the secondary air allows.
    OfWetBulb(S),
    /// (t₁ − t₂) / (t₁ − t_d), of the dew point of the secondary air.
    OfDewPoint(S),
}

/// An indirect evaporative cooler.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct IndirectCooler<S = f64> {
    /// How far the primary air is cooled, if it stays dry.
    pub effectiveness: IndirectEffectiveness<S>,
    /// At which the secondary air leaves, over liquid: near one (common practice, no source).
    pub exhaust_humidity: RelativeHumidity<S>,
    /// Power of the pump, which goes into the secondary air.
    pub pump_heat: HeatFlow<S>,
    /// Temperature of the water that evaporates: the wet bulb of the secondary air, or stated.
    pub water: EvaporatingWater<S>,
}

/// What an indirect cooler came to.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum IndirectStatus {
    /// The primary air is cooled and stays dry.
    Cooling = 0,
    /// The secondary air is no colder than the primary where it is wet: nothing is exchanged, no water used.
    NoDrive = 1,
    /// The primary air is cooled below its dew point, and water condenses out of it.
    Condensing = 2,
    /// The same below the melting temperature: frost, which no steady state describes.
    Frosting = 3,
}

/// What an indirect cooler did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct IndirectCooled<S = f64> {
    /// The primary air that leaves, without its condensate.
    pub primary: AirStream<S>,
    /// Heat and water into the primary air, both negative or zero: the condensate drains at its temperature.
    pub primary_exchange: Exchange<S>,
    /// The secondary air with its books: the heat of the wall and of the pump, and the water that evaporated.
    pub secondary: Humidified<S>,
    /// Heat through the wall, positive.
    pub heat: HeatFlow<S>,
    /// Water that drains from the primary side, positive.
    pub condensate: MassFlow<S>,
    /// What it came to.
    pub status: IndirectStatus,
}

/// Cools the primary air by a wetted secondary stream, without moistening it.
///
/// t₂ = t₁ − ε (t₁ − t*) at constant humidity ratio; where that is below the dew point, the heat of that cooling is kept and equilibrium
/// decides how much of it condenses, so that the air leaves warmer (dry effectiveness understates a wet wall). The secondary air leaves
/// with that heat and that of the pump at the stated humidity, h(t, W) − (W − W_s1) h_w = h_s1 + (Q + P) / ṁ_s, and no drier than a wet wall as
/// warm as the entering primary air makes it.
///
/// Accuracy: an effectiveness model; whether the wall could do it in between (a pinch inside) is not looked at, nor how the effectiveness
/// changes with the flows. Nor is the second law, and freezing only at the wet bulb of the secondary air: in cycles beyond that wet bulb, with
/// little secondary air, a result can be better than any cooler (45 °C, 5 %, dew-point effectiveness 1, 0.32 kg of secondary air per kilogram of
/// primary: −3 °C); use effectivenesses and flows of a test. Maclaine-cross and Banks 1983 give the theory, Duan et al. 2012 (Renew. Sust. Energy Rev. 16:6823)
/// a review. Bounded work: at most two searches of 80 evaluations.
///
/// # Errors
/// [`Error::Infeasible`] where the water would freeze, for an effectiveness beyond the dew point of the secondary air, where the
/// secondary air cannot take the heat, and for an exhaust drier than it can be with that heat; [`Error::MixedFormulations`], [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, evaporative::*, humidify::EvaporatingWater};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let stream = |t, rh, flow| AirStream::new(
///     MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site)?,
///     MassFlow::from_kilograms_per_second(flow));
/// let cooler = IndirectCooler {
///     effectiveness: IndirectEffectiveness::OfWetBulb(0.65),
///     exhaust_humidity: RelativeHumidity::from_percent(95.0),
///     pump_heat: HeatFlow::from_watts(150.0),
///     water: EvaporatingWater::AtWetBulb,
/// };
/// // Outdoor air, cooled by the air that the room gives back.
/// let (outdoor, room) = (stream(35.0, 30.0, 2.0)?, stream(25.0, 50.0, 1.8)?);
/// let done = indirect(&outdoor, &room, cooler)?;
/// assert!((done.primary.air().dry_bulb().celsius() - 23.9).abs() < 0.2);
/// assert_eq!(done.primary.air().humidity_ratio(), outdoor.air().humidity_ratio());
/// let little = AirStream::new(room.air(), MassFlow::from_kilograms_per_second(0.2))?;
/// assert!(indirect(&outdoor, &little, cooler).is_err()); // cannot take the heat
/// # Ok::<(), Error>(())
/// ```
pub fn indirect<S: Scalar>(
    primary: &AirStream<S>,
    secondary: &AirStream<S>,
    cooler: IndirectCooler<S>,
) -> Result<IndirectCooled<S>, Error> {
    let (air, working) = (primary.air(), secondary.air());
    same_formulation(&air, &working)?;
    let (flow, exhaust_flow) = (primary.flow()?, secondary.flow()?);
    let wanted = checked_between(Quantity::RelativeHumidity, cooler.exhaust_humidity.fraction(), (0.0, 1.0))?;
    let pump = checked(Quantity::PumpHeat, cooler.pump_heat.watts())?;
    let wet_bulb = working.wet_bulb()?.celsius();
    let water = match cooler.water {
        EvaporatingWater::AtWetBulb => {
            condensed_enthalpy(working.formulation(), wet_bulb, working.pressure().pascals(), Surface::Liquid)
        }
        EvaporatingWater::Given(temperature) => water_enthalpy(&working, temperature)?,
    };
    let start = air.dry_bulb().celsius();
    let (effectiveness, coldest) = drive(&working, cooler.effectiveness, wet_bulb)?;
    if start <= coldest {
        return Ok(IndirectCooled::without_drive(primary, secondary));
    }
    let melting = melting_temperature(&working);
    if wet_bulb < melting {
        let (_, warmest) = working.formulation().limits(Quantity::WetBulb);
        return Err(infeasible(Quantity::WetBulb, wet_bulb, melting, k(warmest)));
    }
    let leaving = start - effectiveness * (start - coldest);
    limit_of_working_air(&working, cooler.effectiveness, start, wet_bulb, leaving)?;
    let cooled = Cooled::to(&air, leaving)?;
    let heat = flow * cooled.heat;
    let taken = Taken { heat: heat + pump, flow: exhaust_flow, water, humidity: wanted, wall: start, melting };
    let exhaust = exhaust(&working, taken)?;
    let evaporated = exhaust_flow * (parts(&exhaust).1 - parts(&working).1);
    let flow_of = MassFlow::from_kilograms_per_second;
    let condensate = flow * cooled.condensate;
    Ok(IndirectCooled {
        primary: primary.with_air(cooled.air),
        primary_exchange: Exchange::new(-heat, -condensate, -(flow * cooled.condensate_enthalpy)),
        secondary: Humidified {
            leaving: secondary.with_air(exhaust).into(),
            exchange: Exchange::new(heat + pump, evaporated, evaporated * water),
            evaporated: flow_of(evaporated),
            carried: flow_of(k(0.0)),
        },
        heat: HeatFlow::from_watts(heat),
        condensate: flow_of(condensate),
        status: match (cooled.freezes, condensate > k(0.0)) {
            (true, _) => IndirectStatus::Frosting,
            (_, true) => IndirectStatus::Condensing,
            _ => IndirectStatus::Cooling,
        },
    })
}

impl<S: Scalar> IndirectCooled<S> {
    fn without_drive(primary: &AirStream<S>, secondary: &AirStream<S>) -> Self {
        let none = MassFlow::from_kilograms_per_second(k(0.0));
        let leaving = WetStream::from(*secondary);
        Self {
            primary: *primary,
            primary_exchange: Exchange::none(),
            secondary: Humidified { leaving, exchange: Exchange::none(), evaporated: none, carried: none },
            heat: HeatFlow::from_watts(k(0.0)),
            condensate: none,
            status: IndirectStatus::NoDrive,
        }
    }
}

/// The effectiveness, checked, and the temperature toward which it counts, °C.
fn drive<S: Scalar>(
    working: &MoistAir<S>,
    effectiveness: IndirectEffectiveness<S>,
    wet_bulb: S,
) -> Result<(S, S), Error> {
    match effectiveness {
        IndirectEffectiveness::OfWetBulb(value) => Ok((checked(Quantity::IndirectEffectiveness, value)?, wet_bulb)),
        IndirectEffectiveness::OfDewPoint(value) => {
            let value = checked_between(Quantity::IndirectEffectiveness, value, (0.0, 1.0))?;
            Ok((value, working.dew_point()?.celsius()))
        }
    }
}

/// No working air cools below its dew point, and only cooled on the way below its wet bulb.
fn limit_of_working_air<S: Scalar>(
    working: &MoistAir<S>,
    effectiveness: IndirectEffectiveness<S>,
    start: S,
    wet_bulb: S,
    leaving: S,
) -> Result<(), Error> {
    let IndirectEffectiveness::OfWetBulb(value) = effectiveness else { return Ok(()) };
    if value <= k(1.0) {
        return Ok(());
    }
    let dew_point = working.dew_point()?.celsius();
    if leaving < dew_point {
        let most = (start - dew_point) / (start - wet_bulb);
        return Err(infeasible(Quantity::IndirectEffectiveness, value, k(0.0), most));
    }
    Ok(())
}

/// Primary air after the wall, per dry air.
struct Cooled<S> {
    air: MoistAir<S>,
    /// Taken out, J/kg.
    heat: S,
    condensate: S,
    /// Of all of it, J per kilogram of dry air.
    condensate_enthalpy: S,
    freezes: bool,
}

impl<S: Scalar> Cooled<S> {
    /// To a temperature if nothing condenses; else by the heat of that cooling, with the heat capacity at the dew point below it.
    fn to(air: &MoistAir<S>, leaving: S) -> Result<Self, Error> {
        let (h1, w1) = parts(air);
        if let Ok(dry) = at_same_ratio(air, leaving) {
            let none = k(0.0);
            return Ok(Self {
                air: dry,
                heat: h1 - parts(&dry).0,
                condensate: none,
                condensate_enthalpy: none,
                freezes: false,
            });
        }
        let dew_point = air.dew_point()?.celsius();
        let at_dew = MoistAir::assemble(dew_point, air.pressure().pascals(), w1, air.formulation());
        let capacity = at_dew.specific_heat().joules_per_kilogram_kelvin();
        let target = parts(&at_dew).0 - capacity * (dew_point - leaving).at_least(k(0.0));
        let wet = AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(target),
            HumidityRatio::from_kilograms_per_kilogram(w1),
            Freezing::Equilibrium,
            air.basis(),
        )?;
        let ice = wet.ice().kilograms_per_kilogram();
        Ok(Self {
            air: wet.air(),
            heat: h1 - target,
            condensate: wet.liquid().kilograms_per_kilogram() + ice,
            condensate_enthalpy: wet.condensate_enthalpy(),
            freezes: ice > k(0.0),
        })
    }
}

/// What the secondary air takes up.
struct Taken<S> {
    /// W
    heat: S,
    /// Dry air that takes it, kg/s.
    flow: S,
    /// Enthalpy of the water that evaporates.
    water: S,
    /// At which it leaves.
    humidity: S,
    /// The warmest that the wet wall can be, °C.
    wall: S,
    /// Below which the water freezes, °C.
    melting: S,
}

/// The secondary air after it took heat at a stated humidity.
fn exhaust<S: Scalar>(working: &MoistAir<S>, taken: Taken<S>) -> Result<MoistAir<S>, Error> {
    let (h1, w1) = parts(working);
    let (pressure, formulation) = (working.pressure().pascals(), working.formulation());
    let most_ratio = k::<S>(Quantity::HumidityRatio.limits().1);
    let at = |celsius: S, humidity: S| {
        let ratio = with_mixture!(formulation, S, M => {
            let saturated = M::<S>::at(celsius).saturation(pressure, Surface::Liquid).mole_fraction;
            let fraction = (humidity * saturated).at_most(k(Quantity::WaterMoleFraction.limits().1));
            S::select(saturates(saturated), <M<S> as Mixture<S>>::humidity_ratio(fraction), most_ratio)
        });
        MoistAir::assemble(celsius, pressure, ratio.at_most(most_ratio), formulation)
    };
    let heat = taken.heat / taken.flow;
    // Heat that it took to come there, with the water that evaporated on the way.
    let heat_to = |air: &MoistAir<S>| {
        let (h, w) = parts(air);
        h - h1 - (w - w1) * taken.water
    };
    let excess = |celsius: S| heat_to(&at(celsius, taken.humidity)) - heat;
    // Colder water than at the wet bulb leaves the air a little below it.
    let cold = taken.melting;
    let warm = taken.wall.at_least(working.dry_bulb().celsius());
    let (least, most) = (excess(cold), excess(warm));
    if most < k(0.0) {
        let able = (heat_to(&at(warm, taken.humidity)) * taken.flow).at_least(k(0.0));
        return Err(infeasible(Quantity::HeatFlow, taken.heat, k(0.0), able));
    }
    let within = least < k(0.0);
    if !within {
        let (wet_bulb, (_, end)) = (working.wet_bulb()?.celsius(), formulation.limits(Quantity::WetBulb));
        return Err(infeasible(Quantity::WetBulb, wet_bulb, cold, k(end)));
    }
    let celsius = solve::between((cold, least), (warm, most), solve::temperature_resolution(), excess);
    let near = at(celsius, taken.humidity);
    // What the last unit of the temperature leaves over goes into the vapor, so that the book closes.
    let latent = near.vapor_enthalpy() - taken.water;
    let rest = heat_to(&near) - heat;
    let ratio = parts(&near).1 - rest / latent;
    let wall = at(taken.wall, k(1.0));
    // No wet wall of at most that temperature gives so much heat with so little vapor.
    let evaporated = heat * (parts(&wall).1 - w1) / heat_to(&wall);
    if ratio - w1 < evaporated - most_ratio * S::epsilon() {
        let driest = AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(h1 + heat + evaporated * taken.water),
            HumidityRatio::from_kilograms_per_kilogram(w1 + evaporated),
            Freezing::Equilibrium,
            working.basis(),
        )?;
        let least = driest.air().relative_humidity()?.fraction();
        return Err(infeasible(Quantity::RelativeHumidity, taken.humidity, least, k(1.0)));
    }
    Ok(MoistAir::assemble(celsius, pressure, ratio, formulation))
}
