//! What each step does to the air, and which of its numbers can be solved for.

use super::{Loads, Step, StepResult};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::process::books::Ledger;
use crate::process::coil::{self, CoilRegime, CondensateTemperature, Coolant, Cooling, WaterCoil};
use crate::process::desiccant::{self, Sorbed};
use crate::process::evaporative::{self, IndirectCooled, IndirectEffectiveness, IndirectStatus};
use crate::process::humidify::{self, EvaporatingWater, Humidified};
use crate::process::reheat::{self, Reheat};
use crate::process::room::{self, RoomAir};
use crate::process::sensible::{self, Sensible};
use crate::process::{AirStream, Exchange, WetStream, compression, infeasible, mixing};
use crate::quantity::{
    Conductance, HeatFlow, HumidityRatio, MassFlow, Pressure, RelativeHumidity, SpecificEnthalpy, SpecificHeat,
    Temperature,
};
use crate::real::{Scalar, k};
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// What a step did, before its books are closed.
pub(super) struct Done<S> {
    pub leaving: WetStream<S>,
    pub exchange: Exchange<S>,
    pub loads: Loads<S>,
    pub regime: Option<CoilRegime>,
    pub frost: bool,
    pub condenses: bool,
}

impl<S: Scalar> Done<S> {
    fn new(leaving: WetStream<S>, exchange: Exchange<S>, loads: Loads<S>) -> Self {
        Self { leaving, exchange, loads, regime: None, frost: false, condenses: false }
    }

    pub fn result(&self, entering: &WetStream<S>, mixed_in: Option<WetStream<S>>) -> StepResult<S> {
        let mut ledger = Ledger::empty();
        ledger.leaving(&self.leaving);
        ledger.entering(entering);
        if let Some(other) = mixed_in {
            ledger.entering(&other);
        }
        ledger.exchange(&self.exchange);
        ledger.solved(&self.leaving);
        StepResult {
            entering: *entering,
            leaving: self.leaving,
            exchange: self.exchange,
            loads: self.loads,
            regime: self.regime,
            frost: self.frost,
            condenses: self.condenses,
            books: ledger.books(),
        }
    }
}

impl<S: Scalar> From<Sensible<S>> for Done<S> {
    fn from(done: Sensible<S>) -> Self {
        Self::new(done.leaving.into(), done.exchange, heat_loads(done.exchange.heat))
    }
}

impl<S: Scalar> From<Cooling<S>> for Done<S> {
    fn from(done: Cooling<S>) -> Self {
        let loads = if done.cooling_load.watts() < k(0.0) {
            Loads { heating: -done.cooling_load, ..Loads::none() }
        } else {
            Loads {
                cooling: done.cooling_load,
                sensible_cooling: done.sensible,
                latent_cooling: done.latent,
                ..Loads::none()
            }
        };
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange,
            loads: Loads { condensate: done.condensate, ..loads },
            regime: Some(done.regime),
            frost: done.regime == CoilRegime::Frost,
            condenses: false,
        }
    }
}

impl<S: Scalar> From<WaterCoil<S>> for Done<S> {
    fn from(done: WaterCoil<S>) -> Self {
        let air = Self::from(done.air);
        Self { frost: air.frost || done.freezing, ..air }
    }
}

impl<S: Scalar> From<Reheat<S>> for Done<S> {
    fn from(done: Reheat<S>) -> Self {
        let (coil, heater) = (Self::from(done.cooling), Self::from(done.heating));
        Self {
            leaving: heater.leaving,
            exchange: coil.exchange.plus(&heater.exchange),
            loads: coil.loads.plus(&heater.loads),
            ..coil
        }
    }
}

impl<S: Scalar> From<IndirectCooled<S>> for Done<S> {
    fn from(done: IndirectCooled<S>) -> Self {
        let exchange = done.primary_exchange;
        let loads = Loads {
            recovered: exchange.heat,
            condensate: done.condensate,
            secondary_water: done.secondary.exchange.water,
            ..Loads::none()
        };
        Self {
            frost: done.status == IndirectStatus::Frosting,
            condenses: done.condensate.kilograms_per_second() > k(0.0),
            ..Self::new(done.primary.into(), exchange, loads)
        }
    }
}

impl<S: Scalar> From<RoomAir<S>> for Done<S> {
    fn from(done: RoomAir<S>) -> Self {
        let (gains, moisture_gain) = (done.exchange.heat, done.exchange.water);
        Self::new(done.room, done.exchange, Loads { gains, moisture_gain, ..Loads::none() })
    }
}

impl<S: Scalar> From<Sorbed<S>> for Done<S> {
    fn from(done: Sorbed<S>) -> Self {
        let (recovered, recovered_water) = (done.exchange.heat, done.exchange.water);
        Self::new(done.leaving.into(), done.exchange, Loads { recovered, recovered_water, ..Loads::none() })
    }
}

/// Heat by its sign: a heater's or a dry cooler's.
fn heat_loads<S: Scalar>(heat: HeatFlow<S>) -> Loads<S> {
    if heat.watts() < k(0.0) {
        Loads { cooling: -heat, sensible_cooling: -heat, ..Loads::none() }
    } else {
        Loads { heating: heat, ..Loads::none() }
    }
}

fn steamed<S: Scalar>(done: Humidified<S>) -> Done<S> {
    Done::new(done.leaving, done.exchange, Loads { steam: done.exchange.water, ..Loads::none() })
}

/// Media and washers, whose water brings heat and may take vapor out of the air.
fn washed<S: Scalar>(done: Humidified<S>) -> Done<S> {
    let water = done.exchange.water;
    let loads = if water.kilograms_per_second() < k(0.0) {
        Loads { condensate: -water, ..Loads::none() }
    } else {
        Loads { humidifying_water: water, ..Loads::none() }
    };
    Done::new(done.leaving, done.exchange, Loads { water_heat: done.exchange.heat, ..loads })
}

fn sprayed<S: Scalar>(done: Humidified<S>) -> Done<S> {
    Done::new(done.leaving, done.exchange, Loads { humidifying_water: done.exchange.water, ..Loads::none() })
}

impl<S: Scalar> Step<S> {
    /// The stable code of its kind, never re-used.
    #[must_use]
    pub const fn code(&self) -> i32 {
        match self {
            Self::ToTemperature(_) => 1,
            Self::WithHeat(_) => 2,
            Self::CoilToState { .. } => 10,
            Self::CoilToTemperature { .. } => 11,
            Self::CoilByBypassFactor { .. } => 12,
            Self::CoilWithWater { .. } => 13,
            Self::CoilWithReheat { .. } => 14,
            Self::Steam { .. } => 20,
            Self::SteamToHumidityRatio { .. } => 21,
            Self::SteamToRelativeHumidity { .. } => 22,
            Self::Spray { .. } => 23,
            Self::Evaporative { .. } => 24,
            Self::DirectCooler(_) => 25,
            Self::Wash(_) => 26,
            Self::Mix(_) => 30,
            Self::Eliminate => 31,
            Self::Compress { .. } => 40,
            Self::IndirectCooler { .. } => 61,
            Self::Room(_) => 70,
            Self::DesiccantToHumidityRatio { .. } => 80,
            Self::DesiccantByEffectiveness { .. } => 81,
        }
    }

    /// The stream that the step brings in.
    pub(super) fn mixed_in(&self) -> Option<WetStream<S>> {
        if let Self::Mix(other) = *self { Some(other) } else { None }
    }

    pub(super) fn done(&self, entering: &WetStream<S>) -> Result<Done<S>, Error> {
        let gas = || without_droplets(entering);
        Ok(match *self {
            Self::ToTemperature(leaving) if entering.air().is_wet() => evaporated_to(entering, leaving)?,
            Self::ToTemperature(leaving) => sensible::to_temperature(&gas()?, leaving)?.into(),
            Self::WithHeat(heat) if entering.air().is_wet() => evaporated_with(entering, heat)?,
            Self::WithHeat(heat) => sensible::with_heat(&gas()?, heat)?.into(),
            Self::CoilToState { leaving, condensate } => coil::to_state(&gas()?, &leaving, condensate)?.into(),
            Self::CoilToTemperature { leaving, relative_humidity, condensate } => {
                let entering = gas()?;
                coil::to_state(&entering, &off_coil(&entering, leaving, relative_humidity)?, condensate)?.into()
            }
            Self::CoilByBypassFactor { apparatus_dew_point, bypass_factor, condensate } => {
                coil::by_bypass_factor(&gas()?, apparatus_dew_point, bypass_factor, condensate)?.into()
            }
            Self::CoilWithWater { surface, water, condensate } => {
                coil::with_water(&gas()?, surface, water, condensate)?.into()
            }
            Self::CoilWithReheat { target, coil_leaving, condensate } => {
                reheat::to_state(&gas()?, &target, coil_leaving, condensate)?.into()
            }
            Self::Steam { flow, enthalpy } => steamed(humidify::steam(&gas()?, flow, enthalpy)?),
            Self::SteamToHumidityRatio { target, enthalpy } => {
                steamed(humidify::steam_to_humidity_ratio(&gas()?, target, enthalpy)?)
            }
            Self::SteamToRelativeHumidity { target, enthalpy } => {
                steamed(humidify::steam_to_relative_humidity(&gas()?, target, enthalpy)?)
            }
            Self::Spray { flow, temperature } => sprayed(humidify::spray(&gas()?, flow, temperature)?),
            Self::Evaporative { saturation_effectiveness, water } => {
                sprayed(humidify::evaporative(&gas()?, saturation_effectiveness, water)?)
            }
            Self::DirectCooler(cooler) => washed(evaporative::direct(&gas()?, cooler)?.air),
            Self::Wash(washer) => washed(humidify::wash(&gas()?, washer)?.air),
            Self::IndirectCooler { secondary, cooler } => evaporative::indirect(&gas()?, &secondary, cooler)?.into(),
            Self::Room(gains) => room::room_of_supply(&gas()?, &gains)?.into(),
            Self::DesiccantToHumidityRatio { target, sorption } => {
                desiccant::to_humidity_ratio(&gas()?, target, sorption)?.into()
            }
            Self::DesiccantByEffectiveness { effectiveness, driest, sorption } => {
                desiccant::by_effectiveness(&gas()?, effectiveness, driest, sorption)?.into()
            }
            Self::Mix(other) => {
                let done = mixing::adiabatic(&[*entering, other])?;
                Done::new(done.leaving, done.exchange, Loads { mixed_in: other.dry_air_flow(), ..Loads::none() })
            }
            Self::Eliminate => eliminated(entering),
            Self::Compress { pressure, leaving } => {
                let done = compression::to_pressure(entering, pressure, leaving)?;
                Done::new(done.leaving, done.exchange, Loads { compression: done.exchange.heat, ..Loads::none() })
            }
        })
    }

    /// The step with another value of one of its numbers, named by its quantity; [`Error::UnknownSelector`] where it has no such number.
    ///
    /// The conductance of a coil is that of its air side; the water side keeps its proportion to it. A mixed stream has its dry-air flow.
    ///
    /// # Errors
    /// [`Error::UnknownSelector`] with the code of the quantity.
    pub fn with_number(mut self, quantity: Quantity, value: S) -> Result<Self, Error> {
        let celsius = Temperature::from_celsius(value);
        let mass = MassFlow::from_kilograms_per_second(value);
        let watts = HeatFlow::from_watts(value);
        let joules = SpecificEnthalpy::from_joules_per_kilogram(value);
        let unknown = Err(Error::UnknownSelector { code: quantity.code() });
        match (&mut self, quantity) {
            (
                Self::ToTemperature(leaving) | Self::CoilToTemperature { leaving, .. } | Self::Compress { leaving, .. },
                Quantity::LeavingTemperature,
            ) => *leaving = celsius,
            (Self::WithHeat(heat), Quantity::HeatFlow) => *heat = watts,
            (
                Self::CoilToTemperature { relative_humidity: humidity, .. }
                | Self::CoilWithReheat { coil_leaving: humidity, .. }
                | Self::SteamToRelativeHumidity { target: humidity, .. },
                Quantity::RelativeHumidity,
            ) => *humidity = RelativeHumidity::from_fraction(value),
            (
                Self::CoilToState { condensate, .. }
                | Self::CoilToTemperature { condensate, .. }
                | Self::CoilByBypassFactor { condensate, .. }
                | Self::CoilWithWater { condensate, .. }
                | Self::CoilWithReheat { condensate, .. },
                Quantity::CondensateTemperature,
            ) => *condensate = CondensateTemperature::Given(celsius),
            (Self::CoilByBypassFactor { apparatus_dew_point, .. }, Quantity::ApparatusDewPoint) => {
                *apparatus_dew_point = celsius;
            }
            (Self::CoilByBypassFactor { bypass_factor, .. }, Quantity::BypassFactor) => *bypass_factor = value,
            (Self::CoilWithWater { surface, .. }, Quantity::Conductance) => {
                let share = surface.water_side.watts_per_kelvin() / surface.air_side.watts_per_kelvin();
                surface.air_side = Conductance::from_watts_per_kelvin(value);
                surface.water_side = Conductance::from_watts_per_kelvin(value * share);
            }
            (Self::CoilWithWater { water, .. }, Quantity::WaterFlow) => water.flow = mass,
            (Self::CoilWithWater { water, .. }, Quantity::WaterTemperature) if water.coolant == Coolant::Water => {
                water.entering = celsius;
            }
            (Self::CoilWithWater { water, .. }, Quantity::CoolantTemperature) if water.coolant != Coolant::Water => {
                water.entering = celsius;
            }
            (Self::CoilWithWater { water, .. }, Quantity::CoolantSpecificHeat) if water.coolant != Coolant::Water => {
                water.coolant = Coolant::Brine(SpecificHeat::from_joules_per_kilogram_kelvin(value));
            }
            (Self::Steam { flow, .. } | Self::Spray { flow, .. }, Quantity::WaterFlow) => *flow = mass,
            (
                Self::Steam { enthalpy, .. }
                | Self::SteamToHumidityRatio { enthalpy, .. }
                | Self::SteamToRelativeHumidity { enthalpy, .. },
                Quantity::SteamEnthalpy,
            ) => *enthalpy = joules,
            (Self::SteamToHumidityRatio { target, .. }, Quantity::HumidityRatio) => {
                *target = HumidityRatio::from_kilograms_per_kilogram(value);
            }
            (Self::Spray { temperature, .. }, Quantity::WaterTemperature) => *temperature = celsius,
            (Self::Evaporative { saturation_effectiveness, .. }, Quantity::SaturationEffectiveness) => {
                *saturation_effectiveness = value;
            }
            (Self::Evaporative { water, .. }, Quantity::WaterTemperature) => *water = EvaporatingWater::Given(celsius),
            (Self::DirectCooler(cooler), Quantity::SaturationEffectiveness) => cooler.saturation_effectiveness = value,
            (Self::DirectCooler(cooler), Quantity::WaterFlow) => cooler.circulating = mass,
            (Self::DirectCooler(cooler), Quantity::PumpHeat) => cooler.pump_heat = watts,
            (Self::DirectCooler(cooler), Quantity::WaterTemperature) => {
                cooler.make_up = EvaporatingWater::Given(celsius)
            }
            (Self::Wash(washer), Quantity::WaterFlow) => washer.water = mass,
            (Self::Wash(washer), Quantity::WaterTemperature) => washer.temperature = celsius,
            (Self::Wash(washer), Quantity::SaturationEffectiveness) => washer.effectiveness = value,
            (Self::Wash(washer), Quantity::PumpHeat) => washer.pump_heat = watts,
            (Self::IndirectCooler { secondary: other, .. }, Quantity::DryAirFlow) => {
                *other = AirStream::new(other.air(), mass)?;
            }
            (Self::IndirectCooler { cooler, .. }, Quantity::IndirectEffectiveness) => {
                cooler.effectiveness = match cooler.effectiveness {
                    IndirectEffectiveness::OfWetBulb(_) => IndirectEffectiveness::OfWetBulb(value),
                    IndirectEffectiveness::OfDewPoint(_) => IndirectEffectiveness::OfDewPoint(value),
                };
            }
            (Self::IndirectCooler { cooler, .. }, Quantity::PumpHeat) => cooler.pump_heat = watts,
            (Self::Room(gains), Quantity::HeatFlow) => gains.sensible = watts,
            (Self::Room(gains), Quantity::MoistureGain) => gains.moisture = mass,
            (
                Self::DesiccantToHumidityRatio { target: ratio, .. }
                | Self::DesiccantByEffectiveness { driest: ratio, .. },
                Quantity::HumidityRatio,
            ) => {
                *ratio = HumidityRatio::from_kilograms_per_kilogram(value);
            }
            (Self::DesiccantByEffectiveness { effectiveness, .. }, Quantity::DryingEffectiveness) => {
                *effectiveness = value
            }
            (
                Self::DesiccantToHumidityRatio { sorption, .. } | Self::DesiccantByEffectiveness { sorption, .. },
                Quantity::SorptionHeatRatio,
            ) => sorption.heat_ratio = value,
            (Self::Mix(other), Quantity::DryAirFlow) => *other = WetStream::new(other.air(), mass)?,
            (Self::Compress { pressure, .. }, Quantity::Pressure) => *pressure = Pressure::from_pascals(value),
            _ => return unknown,
        }
        Ok(self)
    }
}

/// The gas, for a model that has no droplets.
fn without_droplets<S: Scalar>(entering: &WetStream<S>) -> Result<AirStream<S>, Error> {
    if entering.air().is_wet() { Err(Error::CarriesCondensate) } else { Ok(entering.without_condensate()) }
}

/// What leaves a coil: wet, or dry where the air that enters has no more water than that.
fn off_coil<S: Scalar>(
    entering: &AirStream<S>,
    leaving: Temperature<S>,
    relative_humidity: RelativeHumidity<S>,
) -> Result<MoistAir<S>, Error> {
    let air = entering.air();
    checked_for(air.formulation(), Quantity::LeavingTemperature, leaving.celsius())?;
    let wet = MoistAir::from_dry_bulb(leaving, relative_humidity, air.basis())?;
    if wet.humidity_ratio() <= air.humidity_ratio() {
        return Ok(wet);
    }
    Ok(sensible::to_temperature(entering, leaving)?.leaving.air())
}

/// Heats air with droplets to a temperature, at which they are in equilibrium with it.
fn evaporated_to<S: Scalar>(entering: &WetStream<S>, leaving: Temperature<S>) -> Result<Done<S>, Error> {
    let wet = entering.air();
    let formulation = wet.air().formulation();
    let (start, celsius) = (wet.air().dry_bulb().celsius(), leaving.celsius());
    checked_for(formulation, Quantity::LeavingTemperature, celsius)?;
    if celsius < start {
        let (_, warmest) = formulation.limits(Quantity::LeavingTemperature);
        return Err(infeasible(Quantity::LeavingTemperature, celsius, start, k(warmest)));
    }
    let heated = AirWithCondensate::from_dry_bulb_and_water(
        leaving,
        wet.total_water(),
        Freezing::Equilibrium,
        wet.air().basis(),
    )?;
    let gained = heated.specific_enthalpy().joules_per_kilogram() - wet.specific_enthalpy().joules_per_kilogram();
    let heat = HeatFlow::from_watts(entering.dry_air_flow().kilograms_per_second() * gained);
    Ok(Done::new(entering.with_air(heated), Exchange::of_heat(heat), heat_loads(heat)))
}

/// Heats or cools air with droplets by a heat flow, and lets them come to equilibrium.
fn evaporated_with<S: Scalar>(entering: &WetStream<S>, heat: HeatFlow<S>) -> Result<Done<S>, Error> {
    let wet = entering.air();
    let (watts, flow) = (checked(Quantity::HeatFlow, heat.watts())?, entering.dry_air_flow().kilograms_per_second());
    let leaving = if watts == k(0.0) {
        wet
    } else if flow == k(0.0) {
        return Err(Error::NoFlow);
    } else {
        AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(wet.specific_enthalpy().joules_per_kilogram() + watts / flow),
            wet.total_water(),
            Freezing::Equilibrium,
            wet.air().basis(),
        )?
    };
    Ok(Done::new(entering.with_air(leaving), Exchange::of_heat(heat), heat_loads(heat)))
}

/// Droplets and ice drain at the temperature of the air.
fn eliminated<S: Scalar>(entering: &WetStream<S>) -> Done<S> {
    let (wet, flow) = (entering.air(), entering.dry_air_flow().kilograms_per_second());
    let carried = flow * (wet.liquid().kilograms_per_kilogram() + wet.ice().kilograms_per_kilogram());
    let exchange = Exchange::new(k(0.0), -carried, -(flow * wet.condensate_enthalpy()));
    let condensate = MassFlow::from_kilograms_per_second(carried);
    Done::new(entering.without_condensate().into(), exchange, Loads { condensate, ..Loads::none() })
}
