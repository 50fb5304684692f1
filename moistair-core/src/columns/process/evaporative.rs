//! Evaporative cooling.

use super::row::{Argument, Outcome, Row, RowError, Walk, answers, arguments, processes, statuses};
use crate::process::AirStream;
use crate::process::evaporative::{
    DirectCooled, DirectCooler, DirectStatus, IndirectCooled, IndirectCooler, IndirectEffectiveness, IndirectStatus,
    TwoStageCooled, direct, indirect, two_stage,
};
use crate::process::humidify::EvaporatingWater;
use crate::{HeatFlow, RelativeHumidity};

processes! {
    1700 "evaporative.direct": (entering: AirStream, cooler: DirectCooler) -> DirectCooled { direct(&entering, cooler)? }
    1701 "evaporative.indirect": (primary: AirStream, secondary: AirStream, cooler: IndirectCooler) -> IndirectCooled {
        indirect(&primary, &secondary, cooler)?
    }
    1702 "evaporative.two_stage":
        (primary: AirStream, secondary: AirStream, first: First, second: DirectCooler) -> TwoStageCooled {
        two_stage(&primary, &secondary, first.0, second)?
    }
}

arguments! {
    DirectCooler {
        saturation_effectiveness: "saturation_effectiveness",
        circulating: "circulating_flow",
        pump_heat: "pump_heat",
        make_up: "make_up_temperature",
        treatment: "treatment",
    }
    IndirectCooler {
        effectiveness: "effectiveness",
        exhaust_humidity: "exhaust_humidity",
        pump_heat: "pump_heat",
        water: "water_temperature",
    }
}

/// The first of two stages: its pump has a name of its own.
struct First(IndirectCooler);

impl Argument for First {
    fn describe(walk: &mut Walk<'_>, _: &'static str) {
        IndirectEffectiveness::describe(walk, "effectiveness");
        <RelativeHumidity as Argument>::describe(walk, "exhaust_humidity");
        <HeatFlow as Argument>::describe(walk, "indirect_pump_heat");
        EvaporatingWater::describe(walk, "water_temperature");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        IndirectCooler::read(row).map(Self)
    }
}

impl Argument for IndirectEffectiveness {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number("effectiveness_of", "choice: 0 wet bulb, 1 dew point");
        walk.number(name, "1");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, row.number()?) {
            (0, value) => Ok(Self::OfWetBulb(value)),
            (1, value) => Ok(Self::OfDewPoint(value)),
            (other, _) => Err(RowError::Choice(other)),
        }
    }
}

statuses! {
    DirectStatus { "0 evaporating" => Evaporating, "1 already saturated" => AlreadySaturated }
    IndirectStatus { "0 cooling" => Cooling, "1 no drive" => NoDrive, "2 condensing" => Condensing, "3 frosting" => Frosting }
}

answers! {
    DirectCooled, |x| { air: x.air, water_temperature: x.water_temperature, water: x.water, condition: x.status }
    IndirectCooled, |x| {
        primary: x.primary,
        primary_exchange: x.primary_exchange,
        secondary: x.secondary,
        heat: x.heat,
        condensate: x.condensate,
        condition: x.status,
    }
    TwoStageCooled, |x| { indirect: x.indirect, direct: x.direct, evaporated: x.evaporated }
}
