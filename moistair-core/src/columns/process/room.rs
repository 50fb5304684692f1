//! Rooms: supply, gains, their line, and the reheat that it takes.

use super::row::{Answer, Argument, Out, Outcome, Row, RowError, Walk, answers, processes, statuses};
use crate::columns::NAN;
use crate::process::AirStream;
use crate::process::coil::CondensateTemperature;
use crate::process::reheat::CoilLeaving;
use crate::process::room::{
    Conditioned, LeastReheat, LimitingLine, MoistureSource, ReheatCause, RoomAir, RoomDewPoints, RoomGains,
    apparatus_dew_points, conditioned, gains_between, latent_heat, least_reheat, limiting_line, process_slope,
    ratio_of_slope, room_of_supply, sensible_heat_ratio, slope_of_ratio, supply_at_flow, supply_at_temperature,
};
use crate::{Basis, HeatFlow, MassFlow, MoistAir, RelativeHumidity, SpecificEnthalpy, Temperature};

processes! {
    1500 "room.supply_at_temperature": (room: MoistAir, gains: RoomGains, supply_temperature: Temperature) -> RoomAir {
        supply_at_temperature(&room, &gains, supply_temperature)?
    }
    1501 "room.supply_at_flow": (room: MoistAir, gains: RoomGains, dry_air_flow: MassFlow) -> RoomAir {
        supply_at_flow(&room, &gains, dry_air_flow)?
    }
    1502 "room.room_of_supply": (supply: AirStream, gains: RoomGains) -> RoomAir { room_of_supply(&supply, &gains)? }
    1503 "room.gains_between": (supply: AirStream, room: MoistAir, moisture_source: MoistureSource) -> RoomGains {
        gains_between(&supply, &room, moisture_source)?
    }
    1504 "room.latent_heat": (room: MoistAir) -> "latent_heat" SpecificEnthalpy { latent_heat(&room) }
    1505 "room.sensible_heat_ratio": (room: MoistAir, gains: RoomGains) -> "sensible_heat_ratio" f64 {
        sensible_heat_ratio(&room, &gains)?
    }
    1506 "room.process_slope": (gains: RoomGains, pressure: Basis) -> "slope" SpecificEnthalpy {
        process_slope(&gains, pressure)?
    }
    1507 "room.slope_of_ratio": (room: MoistAir, sensible_heat_ratio: f64) -> "slope" SpecificEnthalpy {
        slope_of_ratio(&room, sensible_heat_ratio)?
    }
    1508 "room.ratio_of_slope": (room: MoistAir, slope: SpecificEnthalpy) -> "sensible_heat_ratio" f64 {
        ratio_of_slope(&room, slope)?
    }
    1509 "room.apparatus_dew_points": (room: MoistAir, sensible_heat_ratio: f64) -> RoomDewPoints {
        apparatus_dew_points(&room, sensible_heat_ratio)?
    }
    1510 "room.limiting_line": (room: MoistAir, entering: MoistAir, coil_leaving: CoilLeaving) -> LimitingLine {
        limiting_line(&room, &entering, coil_leaving)?
    }
    1511 "room.least_reheat": (room: MoistAir, gains: RoomGains, entering: MoistAir, coil_leaving: CoilLeaving) -> LeastReheat {
        least_reheat(&room, &gains, &entering, coil_leaving)?
    }
    1512 "room.conditioned": (
        room: MoistAir,
        gains: RoomGains,
        entering: AirStream,
        coil_leaving: CoilLeaving,
        condensate_temperature: CondensateTemperature,
    ) -> Conditioned {
        conditioned(&room, &gains, &entering, coil_leaving, condensate_temperature)?
    }
}

statuses! {
    ReheatCause { "0 not needed" => NotNeeded, "1 line misses the coil" => LineMissesCoil, "2 coldest of the coil" => ColdestCoil }
}

answers! {
    RoomAir, |x| { supply: x.supply, room: x.room, exchange: x.exchange }
    RoomGains, |x| { sensible: x.sensible, moisture: x.moisture }
    RoomDewPoints, |x| { warmer: x.warmer, colder: x.colder }
    LimitingLine, |x| {
        sensible_heat_ratio: x.sensible_heat_ratio,
        slope: x.slope,
        touches: x.touches,
        at_coldest: x.at_coldest,
    }
    LeastReheat, |x| {
        reheat: x.reheat,
        cause: x.cause,
        supply: x.supply,
        coil_leaving: x.coil_leaving,
        limit: x.limit,
    }
    Conditioned, |x| { room: x.room, reheat: x.reheat }
}

impl Argument for RoomGains {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, |walk| {
            <HeatFlow as Argument>::describe(walk, "sensible");
            <MassFlow as Argument>::describe(walk, "moisture");
            <MoistureSource as Argument>::describe(walk, "moisture_source");
        });
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        Ok(Self { sensible: Argument::read(row)?, moisture: Argument::read(row)?, source: Argument::read(row)? })
    }
}

impl Argument for MoistureSource {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 saturated vapor, 1 liquid, 2 enthalpy");
        walk.within(name, |walk| walk.number("value", "°C or J/kg"));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match row.code()? {
            0 => Temperature::read(row).map(Self::SaturatedVapor),
            1 => Temperature::read(row).map(Self::Liquid),
            2 => SpecificEnthalpy::read(row).map(Self::Enthalpy),
            other => Err(RowError::Choice(other)),
        }
    }
}

impl Argument for CoilLeaving {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 relative humidity, 1 bypass");
        walk.within(name, |walk| {
            walk.number("fraction", "1");
            walk.number("coldest", "°C");
        });
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match (row.code()?, row.number()?, Temperature::read(row)?) {
            (0, fraction, _) => Ok(Self::RelativeHumidity(RelativeHumidity::from_fraction(fraction))),
            (1, factor, coldest) => Ok(Self::Bypass { factor, coldest }),
            (other, ..) => Err(RowError::Choice(other)),
        }
    }
}

/// NaN where there is none.
impl Answer for Option<Temperature> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <Temperature as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        self.unwrap_or(Temperature::from_celsius(NAN)).write(out);
    }
}
