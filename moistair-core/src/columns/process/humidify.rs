//! Humidifying with steam and with water.

use super::row::{Answer, Argument, Out, Outcome, Row, RowError, Walk, answers, arguments, processes, statuses};
use crate::process::AirStream;
use crate::process::humidify::{
    Absorption, EvaporatingWater, Humidified, Moistening, Steam, SteamCondition, ThrottledSteam, Washed, Washer,
    evaporative, saturated_steam_enthalpy, spray, steam, steam_limit, steam_to_humidity_ratio,
    steam_to_relative_humidity, wash,
};
use crate::{HumidityRatio, MassFlow, Pressure, RelativeHumidity, SpecificEnthalpy, Temperature};

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
    607 "humidify.steam_absorption": (entering: AirStream, steam_enthalpy: SpecificEnthalpy) -> SteamAbsorption {
        steam_limit(&entering, steam_enthalpy)?.into()
    }
    608 "humidify.saturated_steam": (steam_pressure: Pressure) -> "specific_enthalpy" SpecificEnthalpy {
        Steam::saturated_at_pressure(steam_pressure)?.specific_enthalpy()
    }
    609 "humidify.wet_steam": (steam_pressure: Pressure, quality: f64) -> "specific_enthalpy" SpecificEnthalpy {
        Steam::wet(steam_pressure, quality)?.specific_enthalpy()
    }
    610 "humidify.superheated_steam":
        (steam_temperature: Temperature, steam_pressure: Pressure) -> "specific_enthalpy" SpecificEnthalpy {
        Steam::superheated(steam_temperature, steam_pressure)?.specific_enthalpy()
    }
    611 "humidify.throttled_steam": (steam_enthalpy: SpecificEnthalpy, pressure: Pressure) -> ThrottledSteam {
        Steam::from_specific_enthalpy(steam_enthalpy)?.throttled_to(pressure)?
    }
    612 "humidify.wash": (entering: AirStream, washer: Washer) -> Washed { wash(&entering, washer)? }
}

/// Both crossings of saturation.
struct SteamAbsorption {
    up_to: Absorption,
    from: MassFlow,
}

impl From<Absorption> for SteamAbsorption {
    fn from(up_to: Absorption) -> Self {
        let never = MassFlow::from_kilograms_per_second(f64::INFINITY);
        Self { up_to, from: up_to.unsaturated_again().unwrap_or(never) }
    }
}

arguments! {
    Washer {
        water: "water_flow",
        temperature: "water_temperature",
        effectiveness: "effectiveness",
        pump_heat: "pump_heat",
        carry_over_fraction: "carry_over_fraction",
    }
}

statuses! {
    Moistening { "0 humidifies" => Humidifies, "1 dehumidifies" => Dehumidifies }
    SteamCondition { "0 superheated" => Superheated, "1 wet" => Wet }
}

answers! {
    SteamAbsorption, |x| { up_to: x.up_to, unsaturated_from: x.from }
    ThrottledSteam, |x| { temperature: x.temperature, superheat: x.superheat, quality: x.quality, condition: x.condition }
    Washed, |x| {
        air: x.air,
        leaving_water: x.leaving_water,
        leaving_water_temperature: x.leaving_water_temperature,
        heat_to_water: x.heat_to_water,
        moistening: x.moistening,
    }
    Humidified, |x| { leaving: x.leaving, exchange: x.exchange, evaporated: x.evaporated, carried: x.carried }
}

/// Infinite where nothing limits it.
impl Answer for Absorption {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <MassFlow as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        self.first_saturation().map_or(f64::INFINITY, MassFlow::kilograms_per_second).write(out);
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
