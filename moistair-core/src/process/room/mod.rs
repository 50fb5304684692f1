//! The room and its line: gains of heat and moisture, the air that carries them away, and when reheat is unavoidable.
//!
//! A room gains sensible heat Q and moisture ṁ_w, which comes with the enthalpy h_w of its source. Supply air takes both up:
//! ṁ (W_r − W₁) = ṁ_w and ṁ (h_r − h₁) = Q + ṁ_w h_w, so that all supply states that serve lie on one line of slope
//! Δh/ΔW = (Q + ṁ_w h_w) / ṁ_w (ASHRAE Fundamentals 2021 ch. 1, Example 6).
//!
//! - [`supply_at_temperature`], [`supply_at_flow`]: what to supply; [`room_of_supply`], [`gains_between`]: the other way round;
//! - [`sensible_heat_ratio`], [`process_slope`] and their conversions;
//! - [`apparatus_dew_points`], [`limiting_line`], [`least_reheat`], [`conditioned`]: what a coil can do about it.
//!
//! # Accuracy
//! Two balances, exact in steady state for a room of one mixed state. Left out: storage of heat and moisture in walls and furniture (which
//! carries hours of gains), stratification and short-circuit of the supply, infiltration other than as a gain, the heat of fan and ducts. Not for
//! displacement ventilation, whose room air is not one state, nor for a transient. Gains are seldom known to 10 %, those of moisture less well.
//!
//! # Caution
//! Supply air colder than the dew point of a space wets its outlets and the surfaces near them, and duct linings kept above about 80 to 90 %
//! relative humidity grow mould (common practice, no source): hygiene rules and local codes govern. Nothing here is a safety function.

mod limit;
mod ratio;

pub use limit::{
    LeastReheat, LimitingLine, ReheatCause, RoomDewPoints, apparatus_dew_points, least_reheat, limiting_line,
};
pub use ratio::{latent_heat, process_slope, ratio_of_slope, sensible_heat_ratio, slope_of_ratio};

use super::coil::CondensateTemperature;
use super::humidify::saturated_steam_enthalpy;
use super::reheat::{self, CoilLeaving, Reheat};
use super::{AirStream, Exchange, WetStream, equilibrium, infeasible, parts, same_formulation, unsaturated};
use crate::basis::{Basis, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::solve;
use crate::state::construct::greatest_humidity_ratio;
use crate::state::{MoistAir, liquid_water_enthalpy};

/// Where the moisture of a room comes from: it decides the enthalpy that it brings.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum MoistureSource<S = f64> {
    /// Saturated vapor of a temperature, 0 to 200 °C: people (about 30 to 34 °C, common practice, no source), open vessels, steam.
    SaturatedVapor(Temperature<S>),
    /// Vapor, liquid or ice of a stated enthalpy.
    Enthalpy(SpecificEnthalpy<S>),
    /// Liquid water of a temperature, 0 to 200 °C, which the room's own heat evaporates: wet floors, sprays.
    Liquid(Temperature<S>),
}

/// What a room gives to its air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct RoomGains<S = f64> {
    /// Heat into the air that comes without water; negative in a room that loses heat.
    pub sensible: HeatFlow<S>,
    /// Water into the air; negative where a cold surface or a desiccant takes it out.
    pub moisture: MassFlow<S>,
    /// Where the water comes from, or where it goes to.
    pub source: MoistureSource<S>,
}

/// A room and the air that is supplied to it.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct RoomAir<S = f64> {
    /// The air that is supplied; [`AirStream::volume_flow`] is that at the supply.
    pub supply: AirStream<S>,
    /// The air of the room, which leaves it; with fog, if the gains are more than the air holds.
    pub room: WetStream<S>,
    /// The gains.
    pub exchange: Exchange<S>,
}

/// Gains as plain numbers.
struct Load<S> {
    /// Sensible heat, W.
    heat: S,
    /// Water, kg/s.
    water: S,
    /// Enthalpy of that water per mass, J/kg.
    water_enthalpy: S,
    /// Heat and the enthalpy of the water, W.
    total: S,
}

impl<S: Scalar> Load<S> {
    fn of(gains: &RoomGains<S>, basis: Basis<S>) -> Result<Self, Error> {
        let heat = checked(Quantity::HeatFlow, gains.sensible.watts())?;
        let water = checked(Quantity::MoistureGain, gains.moisture.kilograms_per_second())?;
        let water_enthalpy = source_enthalpy(gains.source, basis)?;
        Ok(Self { heat, water, water_enthalpy, total: heat + water * water_enthalpy })
    }

    fn exchange(&self) -> Exchange<S> {
        Exchange::new(self.heat, self.water, self.water * self.water_enthalpy)
    }

    /// The heat that changes the temperature of air at a state: all but what the water brings as vapor of that air.
    fn sensible_at(&self, vapor_enthalpy: S) -> S {
        self.heat + self.water * (self.water_enthalpy - vapor_enthalpy)
    }
}

fn source_enthalpy<S: Scalar>(source: MoistureSource<S>, basis: Basis<S>) -> Result<S, Error> {
    match source {
        MoistureSource::SaturatedVapor(temperature) => Ok(saturated_steam_enthalpy(temperature)?.joules_per_kilogram()),
        MoistureSource::Enthalpy(enthalpy) => checked(Quantity::MoistureEnthalpy, enthalpy.joules_per_kilogram()),
        MoistureSource::Liquid(temperature) => Ok(liquid_water_enthalpy(temperature, basis)?.joules_per_kilogram()),
    }
}

/// Newton steps for the flow. The balance is linear in its reciprocal but for the forces between molecules, which count in dense steam.
const FLOW_STEPS: usize = 5;

/// The flow and the humidity ratio of supply air of a given temperature: h(t₁, W_r − ṁ_w/ṁ) = h_r − (Q + ṁ_w h_w)/ṁ.
///
/// # Errors
/// [`Error::Infeasible`]: of the dry-air flow, where supply air of this temperature would have to flow backwards or without end (it is no colder
/// than a room that gains heat, no warmer than one that loses it, or there are no gains at all); of the humidity ratio, where the supply would be
/// drier than dry, or moister than air of this temperature holds. [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::room::{self, MoistureSource, RoomGains};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// // ASHRAE Fundamentals 2021 ch. 1, Example 6: 9 kW, 1.5 g/s of vapor of 30 °C, supply at 15 °C.
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(25.0), WetBulb::from_celsius(19.0), site)?;
/// let gains = RoomGains {
///     sensible: HeatFlow::from_kilowatts(9.0),
///     moisture: MassFlow::from_kilograms_per_second(0.0015),
///     source: MoistureSource::SaturatedVapor(Temperature::from_celsius(30.0)),
/// };
/// let done = room::supply_at_temperature(&air, &gains, Temperature::from_celsius(15.0))?;
/// assert!((done.supply.volume_flow().cubic_meters_per_second() - 0.73).abs() < 0.005);
/// assert!(room::supply_at_temperature(&air, &gains, Temperature::from_celsius(30.0)).is_err()); // cannot cool
/// # Ok::<(), Error>(())
/// ```
pub fn supply_at_temperature<S: Scalar>(
    room: &MoistAir<S>,
    gains: &RoomGains<S>,
    supply: Temperature<S>,
) -> Result<RoomAir<S>, Error> {
    let celsius = checked_for(room.formulation(), Quantity::LeavingTemperature, supply.celsius())?;
    let load = Load::of(gains, room.basis())?;
    let (_, ratio) = parts(room);
    let zero = k::<S>(0.0);
    let (reciprocal, most) = reciprocal_flow(FLOW_STEPS, room, &load, celsius);
    let flow = k::<S>(1.0) / reciprocal;
    let greatest = k::<S>(Quantity::DryAirFlow.limits().1);
    if !(flow > zero && flow <= greatest) {
        // Neither gains nor a difference of temperature: any flow would do.
        let flow = if flow.is_nan() { zero } else { flow };
        return Err(infeasible(Quantity::DryAirFlow, flow, zero, greatest));
    }
    let supplied = ratio - load.water * reciprocal;
    // Rounding alone makes no supply drier than dry.
    let supplied = if supplied < zero && supplied >= -(ratio * S::epsilon() * k(4.0)) { zero } else { supplied };
    let air = MoistAir::restore(supply, HumidityRatio::from_kilograms_per_kilogram(supplied), room.basis())
        .ok()
        .filter(|_| supplied >= zero)
        .ok_or_else(|| infeasible(Quantity::HumidityRatio, supplied, zero, most))?;
    let supply = AirStream { air, dry_air_flow: flow };
    Ok(RoomAir { supply, room: supply.with_air(*room).into(), exchange: load.exchange() })
}

/// 1/ṁ of supply air of a temperature, and the most vapor that such air holds.
fn reciprocal_flow<S: Scalar>(steps: usize, room: &MoistAir<S>, load: &Load<S>, celsius: S) -> (S, S) {
    let (enthalpy, ratio) = parts(room);
    let pressure = room.pressure().pascals();
    with_mixture!(room.formulation(), S, M => {
        let mixture = M::<S>::at(celsius);
        let most = greatest_humidity_ratio(&mixture, celsius, pressure);
        let reciprocal = solve::repeated(steps, k(0.0), |reciprocal: S| {
            let supplied = ratio - load.water * reciprocal;
            // Beyond what air of this temperature can be, its enthalpy is continued along the line at the end.
            let within = supplied.at_least(k(0.0)).at_most(most);
            let gas = mixture.gas(pressure, within);
            let supplied_enthalpy = gas.enthalpy + gas.enthalpy_of_water * (supplied - within);
            let short = supplied_enthalpy - enthalpy + load.total * reciprocal;
            reciprocal - short / load.sensible_at(gas.enthalpy_of_water)
        });
        (reciprocal, most)
    })
}

/// The supply air of a given dry-air flow: W₁ = W_r − ṁ_w/ṁ, h₁ = h_r − (Q + ṁ_w h_w)/ṁ.
///
/// # Errors
/// [`Error::NoFlow`]; [`Error::Infeasible`]: of the dry-air flow, where so little air would have to be drier than dry (the limits name the least
/// flow); of the humidity ratio, where the supply would be fog; of the leaving enthalpy, where it lies outside the range of states.
/// [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::room::{self, MoistureSource, RoomGains};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let gains = RoomGains {
///     sensible: HeatFlow::from_kilowatts(6.0),
///     moisture: MassFlow::from_kilograms_per_hour(3.0),
///     source: MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0)),
/// };
/// let flow = MassFlow::from_kilograms_per_second;
/// let done = room::supply_at_flow(&air, &gains, flow(0.6))?;
/// assert!((14.0..14.4).contains(&done.supply.air().dry_bulb().celsius()));
/// assert!(room::supply_at_flow(&air, &gains, flow(0.05)).is_err()); // would have to be drier than dry
/// # Ok::<(), Error>(())
/// ```
pub fn supply_at_flow<S: Scalar>(
    room: &MoistAir<S>,
    gains: &RoomGains<S>,
    dry_air_flow: MassFlow<S>,
) -> Result<RoomAir<S>, Error> {
    let flow = AirStream::new(*room, dry_air_flow)?.flow()?;
    let load = Load::of(gains, room.basis())?;
    let (enthalpy, ratio) = parts(room);
    let supplied = ratio - load.water / flow;
    if supplied < k(0.0) {
        let (_, most) = Quantity::DryAirFlow.limits();
        // Moisture into a dry room has no flow at all.
        return Err(infeasible(Quantity::DryAirFlow, flow, load.water / ratio, k(most)));
    }
    let supply = AirStream { air: unsaturated(enthalpy - load.total / flow, supplied, room)?, dry_air_flow: flow };
    Ok(RoomAir { supply, room: supply.with_air(*room).into(), exchange: load.exchange() })
}

/// The room that a supply and the gains make: W_r = W₁ + ṁ_w/ṁ, h_r = h₁ + (Q + ṁ_w h_w)/ṁ. A room that gains more water than its air
/// holds carries fog.
///
/// # Errors
/// [`Error::NoFlow`]; [`Error::Infeasible`]: of the moisture gain, where more water is taken out than the supply brings; of the leaving
/// enthalpy, where the room lies outside the range of states. [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, room::{self, MoistureSource, RoomGains}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(14.0), RelativeHumidity::from_percent(90.0), site)?;
/// let supply = AirStream::new(air, MassFlow::from_kilograms_per_second(0.6))?;
/// let gains = |kilowatts, per_hour| RoomGains {
///     sensible: HeatFlow::from_kilowatts(kilowatts),
///     moisture: MassFlow::from_kilograms_per_hour(per_hour),
///     source: MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0)),
/// };
/// let room = room::room_of_supply(&supply, &gains(6.0, 3.0))?.room.air().air();
/// assert!((23.5..24.0).contains(&room.dry_bulb().celsius()));
/// assert!(room::room_of_supply(&supply, &gains(6.0, -30.0)).is_err()); // there is not so much water
/// # Ok::<(), Error>(())
/// ```
pub fn room_of_supply<S: Scalar>(supply: &AirStream<S>, gains: &RoomGains<S>) -> Result<RoomAir<S>, Error> {
    let flow = supply.flow()?;
    let air = supply.air();
    let load = Load::of(gains, air.basis())?;
    let (enthalpy, ratio) = parts(&air);
    let water = ratio + load.water / flow;
    if water < k(0.0) {
        let (_, most) = Quantity::MoistureGain.limits();
        return Err(infeasible(Quantity::MoistureGain, load.water, -(flow * ratio), k(most)));
    }
    let room = if load.total == k(0.0) && load.water == k(0.0) {
        air.into()
    } else {
        equilibrium(enthalpy + load.total / flow, water, &air)?
    };
    Ok(RoomAir { supply: *supply, room: WetStream { air: room, dry_air_flow: flow }, exchange: load.exchange() })
}

/// The gains of a room, from supply and room air: ṁ_w = ṁ (W_r − W₁), Q = ṁ (h_r − h₁) − ṁ_w h_w.
///
/// Differences of measured states: at 10 K and 1 to 2 g/kg between supply and room, 0.3 K and 3 % relative humidity are worth some 4 % of the
/// sensible heat and a third to two thirds of the moisture.
///
/// # Errors
/// [`Error::MixedFormulations`]; as [`RoomGains`] for the source.
pub fn gains_between<S: Scalar>(
    supply: &AirStream<S>,
    room: &MoistAir<S>,
    source: MoistureSource<S>,
) -> Result<RoomGains<S>, Error> {
    same_formulation(&supply.air(), room)?;
    let ((h1, w1), (h2, w2)) = (parts(&supply.air()), parts(room));
    let flow = supply.dry_air_flow;
    let moisture = flow * (w2 - w1);
    let sensible = flow * (h2 - h1) - moisture * source_enthalpy(source, room.basis())?;
    Ok(RoomGains {
        sensible: HeatFlow::from_watts(sensible),
        moisture: MassFlow::from_kilograms_per_second(moisture),
        source,
    })
}

/// A room and the coil and heater that keep it.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Conditioned<S = f64> {
    /// The room and its supply.
    pub room: RoomAir<S>,
    /// Coil and heater, whose leaving air is the supply.
    pub reheat: Reheat<S>,
}

/// What coil and heater have to do to air that enters them so that a room is kept at a state: the supply by [`supply_at_flow`] at the flow
/// of the entering air, the coil and the reheat by [`reheat::with_coil`].
///
/// # Errors
/// As those; [`Error::Infeasible`] names what binds. [`Error::MixedFormulations`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::CondensateTemperature, reheat::CoilLeaving};
/// use moistair_core::process::room::{self, MoistureSource, RoomGains};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let target = state(24.0, 50.0)?;
/// let entering = AirStream::new(state(27.0, 55.0)?, MassFlow::from_kilograms_per_second(0.5))?;
/// let gains = |kilowatts| RoomGains {
///     sensible: HeatFlow::from_kilowatts(kilowatts),
///     moisture: MassFlow::from_kilograms_per_hour(5.4),
///     source: MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0)),
/// };
/// let coil = CoilLeaving::RelativeHumidity(RelativeHumidity::from_percent(95.0));
/// let keep = |kilowatts| room::conditioned(&target, &gains(kilowatts), &entering, coil, CondensateTemperature::LeavingAir);
/// // Much moisture with little heat: the air is cooled further than the room needs, and reheated.
/// assert!(keep(4.0)?.reheat.reheat().kilowatts() > 3.0);
/// assert!(keep(9.0).is_err()); // so much heat takes more air, or the room gets drier
/// # Ok::<(), Error>(())
/// ```
pub fn conditioned<S: Scalar>(
    room: &MoistAir<S>,
    gains: &RoomGains<S>,
    entering: &AirStream<S>,
    coil_leaving: CoilLeaving<S>,
    condensate: CondensateTemperature<S>,
) -> Result<Conditioned<S>, Error> {
    same_formulation(&entering.air(), room)?;
    let room = supply_at_flow(room, gains, entering.dry_air_flow())?;
    let reheat = reheat::with_coil(entering, &room.supply.air(), coil_leaving, condensate)?;
    Ok(Conditioned { room, reheat })
}

#[cfg(test)]
mod tests;
