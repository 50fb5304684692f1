//! Desiccants: the line of sorption, and wheels.

use super::row::{Answer, Argument, Out, Outcome, Row, RowError, Walk, answers, arguments, processes, statuses};
use crate::columns::NAN;
use crate::process::AirStream;
use crate::process::desiccant::potentials::{
    self, CorrelationStatus, Effectiveness, Imbalance, PotentialWheel, effectiveness_between,
};
use crate::process::desiccant::{
    CarryOver, Regeneration, Sorbed, Sorption, Wheel, WheelStatus, by_effectiveness, to_humidity_ratio, wheel,
};
use crate::{HeatFlow, HumidityRatio, MassFlow, MoistAir, SpecificEnthalpy, Temperature, TemperatureDifference};

processes! {
    1600 "desiccant.to_humidity_ratio": (entering: AirStream, target: HumidityRatio, sorption: Sorption) -> Sorbed {
        to_humidity_ratio(&entering, target, sorption)?
    }
    1601 "desiccant.by_effectiveness":
        (entering: AirStream, effectiveness: f64, driest: HumidityRatio, sorption: Sorption) -> Sorbed {
        by_effectiveness(&entering, effectiveness, driest, sorption)?
    }
    1602 "desiccant.wheel": (
        entering: AirStream,
        target: HumidityRatio,
        sorption: Sorption,
        regeneration: AirStream,
        heater: Regeneration,
    ) -> Wheel {
        wheel(&entering, target, sorption, &regeneration, heater)?
    }
    1603 "desiccant.potentials": (air: MoistAir) -> Potentials {
        let (first, second) = potentials::potentials(&air)?;
        Potentials { first, second }
    }
    1604 "desiccant.wheel_by_potentials":
        (entering: AirStream, regeneration: AirStream, effectiveness: Effectiveness) -> PotentialWheel {
        potentials::wheel(&entering, &regeneration, effectiveness)?
    }
    1605 "desiccant.effectiveness_between": (air: MoistAir, dried: MoistAir, regeneration: MoistAir) -> Effectiveness {
        effectiveness_between(&air, &dried, &regeneration)?
    }
}

arguments! {
    Sorption { heat_ratio: "sorption_heat_ratio", carry_over: "carry_over" }
    Effectiveness { first: "first_effectiveness", second: "second_effectiveness" }
}

statuses! {
    WheelStatus { "0 possible" => Possible, "1 against the second law" => AgainstSecondLaw }
    CorrelationStatus { "0 within" => Within, "1 off standard pressure" => OffStandardPressure }
}

/// F₁ and F₂ of air.
struct Potentials {
    first: f64,
    second: f64,
}

answers! {
    Sorbed, |x| {
        leaving: x.leaving,
        exchange: x.exchange,
        removed: x.removed,
        sorption_heat: x.sorption_heat,
        carried_heat: x.carried_heat,
    }
    Wheel, |x| {
        process: x.process,
        heater: x.heater,
        regeneration: x.regeneration,
        regeneration_exchange: x.regeneration_exchange,
        regeneration_heat: x.regeneration_heat(),
        heat_per_water: x.heat_per_water(),
        entropy_production: x.entropy_production,
        wheel: x.status,
    }
    Potentials, |x| { first: x.first, second: x.second }
    Effectiveness, |x| { first: x.first, second: x.second }
    Imbalance, |x| { heat: x.heat, water: x.water }
    PotentialWheel, |x| {
        process: x.process,
        exchange: x.exchange,
        regeneration: x.regeneration,
        regeneration_exchange: x.regeneration_exchange,
        removed: x.removed,
        imbalance: x.imbalance,
        entropy_production: x.entropy_production,
        wheel: x.status,
        correlation: x.correlation,
    }
}

impl Argument for CarryOver {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 none, 1 heat, 2 rise");
        walk.within(name, |walk| walk.number("value", "W or K"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, row.number()?) {
            (0, _) => Ok(Self::None),
            (1, heat) => Ok(Self::Heat(HeatFlow::from_watts(heat))),
            (2, rise) => Ok(Self::Rise(TemperatureDifference::from_kelvins(rise))),
            (other, _) => Err(RowError::Choice(other)),
        }
    }
}

impl Argument for Regeneration {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 heat, 1 entering temperature, 2 leaving temperature");
        walk.within(name, |walk| walk.number("value", "W or °C"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match row.code()? {
            0 => HeatFlow::read(row).map(Self::Heat),
            1 => Temperature::read(row).map(Self::Entering),
            2 => Temperature::read(row).map(Self::Leaving),
            other => Err(RowError::Choice(other)),
        }
    }
}

/// NaN where there is none.
impl Answer for Option<SpecificEnthalpy> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <SpecificEnthalpy as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        self.unwrap_or(SpecificEnthalpy::from_joules_per_kilogram(NAN)).write(out);
    }
}

/// NaN where there is none.
impl Answer for Option<Imbalance> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <Imbalance as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        let none = Imbalance { heat: HeatFlow::from_watts(NAN), water: MassFlow::from_kilograms_per_second(NAN) };
        self.unwrap_or(none).write(out);
    }
}
