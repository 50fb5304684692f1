//! Humidifying with steam and with water.

use super::row::{Answer, Argument, Out, Outcome, Row, RowError, Walk, answers, processes};
use crate::process::AirStream;
use crate::process::humidify::{
    Absorption, EvaporatingWater, Humidified, evaporative, saturated_steam_enthalpy, spray, steam, steam_limit,
    steam_to_humidity_ratio, steam_to_relative_humidity,
};
use crate::{HumidityRatio, MassFlow, RelativeHumidity, SpecificEnthalpy, Temperature};

processes! {
    600 "humidify.saturated_steam_enthalpy": (steam_temperature: Temperature) -> "specific_enthalpy" SpecificEnthalpy {
        saturated_steam_enthalpy(steam_temperature)?
    }
    601 "humidify.steam": (entering: AirStream, steam_flow: MassFlow, steam_enthalpy: SpecificEnthalpy) -> Humidified {
        steam(&entering, steam_flow, steam_enthalpy)?
    }
    602 "humidify.steam_to_humidity_ratio":
        (entering: AirStream, humidity_ratio: HumidityRatio, steam_enthalpy: SpecificEnthalpy) -> Humidified {
        steam_to_humidity_ratio(&entering, humidity_ratio, steam_enthalpy)?
    }
    603 "humidify.steam_to_relative_humidity":
        (entering: AirStream, relative_humidity: RelativeHumidity, steam_enthalpy: SpecificEnthalpy) -> Humidified {
        steam_to_relative_humidity(&entering, relative_humidity, steam_enthalpy)?
    }
    604 "humidify.steam_limit": (entering: AirStream, steam_enthalpy: SpecificEnthalpy) -> "steam_flow" Absorption {
        steam_limit(&entering, steam_enthalpy)?
    }
    605 "humidify.spray": (entering: AirStream, water_flow: MassFlow, water_temperature: Temperature) -> Humidified {
        spray(&entering, water_flow, water_temperature)?
    }
    606 "humidify.evaporative":
        (entering: AirStream, saturation_effectiveness: f64, water_temperature: EvaporatingWater) -> Humidified {
        evaporative(&entering, saturation_effectiveness, water_temperature)?
    }
}

answers! {
    Humidified, |x| { leaving: x.leaving, exchange: x.exchange, evaporated: x.evaporated, carried: x.carried }
}

/// Infinite where nothing limits it.
impl Answer for Absorption {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <MassFlow as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        match self {
            Self::UpTo(flow) => flow.write(out),
            Self::Unlimited => f64::INFINITY.write(out),
        }
    }
}

impl Argument for EvaporatingWater {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 wet bulb, 2 given");
        walk.within(name, |walk| walk.number("given", "°C"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, Temperature::read(row)?) {
            (0, _) => Ok(Self::AtWetBulb),
            (2, given) => Ok(Self::Given(given)),
            (other, _) => Err(RowError::Choice(other)),
        }
    }
}
