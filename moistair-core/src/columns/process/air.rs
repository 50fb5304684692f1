//! States of moist air from other states and from instruments.

use super::row::{Argument, Outcome, Row, RowError, Walk, choices, processes};
use crate::{
    Basis, Bulb, DewPoint, FrostPoint, MoistAir, Pressure, Psychrometer, PsychrometerReading, Quantity, Temperature,
    saturation_temperature_after,
};

processes! {
    100 "air.from_psychrometer":
        (dry_bulb: Temperature, wet_bulb: Temperature, psychrometer: Psychrometer, pressure: Basis) -> "air" MoistAir {
        MoistAir::from_psychrometer(psychrometer, PsychrometerReading { dry_bulb, wet_bulb }, pressure)?
    }
    101 "air.psychrometer_reading": (air: MoistAir, psychrometer: Psychrometer) -> "wet_bulb" Temperature {
        air.psychrometer_reading(psychrometer)?.wet_bulb
    }
    102 "air.at_pressure": (air: MoistAir, pressure: Pressure) -> "air" MoistAir { air.at_pressure(pressure)? }
    103 "air.at_temperature_and_pressure": (air: MoistAir, dry_bulb: Temperature, pressure: Pressure) -> "air" MoistAir {
        air.at_temperature_and_pressure(dry_bulb, pressure)?
    }
    104 "air.dew_point_at": (air: MoistAir, pressure: Pressure) -> "dew_point" DewPoint { air.dew_point_at(pressure)? }
    105 "air.frost_point_at": (air: MoistAir, pressure: Pressure) -> "frost_point" FrostPoint {
        air.frost_point_at(pressure)?
    }
    106 "saturation_temperature_after":
        (given: Quantity, value: Temperature, pressure: Basis, wanted: Quantity, new_pressure: Pressure) -> "wanted" Temperature {
        saturation_temperature_after(given, value.celsius(), pressure, wanted, new_pressure).map(Temperature::from_celsius)?
    }
}

choices! {
    Bulb { 0 "water" => Water, 1 "ice" => Ice }
}

impl Argument for Psychrometer {
    fn describe(walk: &mut Walk<'_>, _: &'static str) {
        Bulb::describe(walk, "bulb");
        walk.number("coefficient", "1/K");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        Ok(Self::with_coefficient(Bulb::read(row)?, row.number()?)?)
    }
}

impl Argument for Quantity {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: code of a quantity");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        let code = row.code()?;
        Self::from_code(code).ok_or(RowError::Choice(code))
    }
}
