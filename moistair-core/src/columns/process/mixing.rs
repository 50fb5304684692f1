//! Adiabatic mixing.

use super::row::{Argument, Outcome, Row, Walk, answers, choices, processes, statuses};
use super::stream::Streams;
use crate::process::AirStream;
use crate::process::measured::{MeasuredAir, Reading};
use crate::process::mixing::outdoor_air::{
    self, Blend, FractionLimits, FractionStatus, OtherFlow, OutdoorAirFraction, Reach,
};
use crate::process::mixing::{Mixed, adiabatic, adiabatic_at, remainder};
use crate::signal::Quality;
use crate::{Basis, Freezing, MassFlow, MoistAir, Pressure, Quantity, Temperature};

processes! {
    500 "mixing.adiabatic": (streams: Streams) -> Mixed { adiabatic(streams.as_slice())? }
    501 "mixing.adiabatic_at": (pressure: Pressure, freezing: Freezing, streams: Streams) -> Mixed {
        adiabatic_at(streams.as_slice(), pressure, freezing)?
    }
    502 "mixing.remainder": (total_flow: MassFlow, part: AirStream, air: MoistAir) -> AirStream {
        remainder(total_flow, &part, air)?
    }
    510 "mixing.outdoor_air_from_readings":
        (quantity: Quantity, outdoor: Reading, returned: Reading, mixed: Reading, acceptable: f64) -> OutdoorAirFraction {
        outdoor_air::from_readings(quantity, outdoor, returned, mixed, acceptable)?
    }
    511 "mixing.outdoor_air_from_air":
        (quantity: Quantity, outdoor: MeasuredAir, returned: MeasuredAir, mixed: MeasuredAir, pressure: Basis, acceptable: f64) -> OutdoorAirFraction {
        outdoor_air::from_air(quantity, &outdoor, &returned, &mixed, pressure, acceptable)?
    }
    512 "mixing.outdoor_air_from_flows": (outdoor: Reading, other: Reading, other_is: FlowKind, acceptable: f64) -> OutdoorAirFraction {
        outdoor_air::from_flows(outdoor, other_is.of(other), acceptable)?
    }
    513 "mixing.outdoor_air_for_temperature":
        (outdoor: MoistAir, returned: MoistAir, wanted_temperature: Temperature, least: f64, most: f64) -> Blend {
        outdoor_air::for_mixed_temperature(&outdoor, &returned, wanted_temperature, FractionLimits { least, most })?
    }
    514 "mixing.with_outdoor_air": (outdoor: MoistAir, returned: MoistAir, fraction: f64) -> Mixed {
        outdoor_air::mixed(&outdoor, &returned, fraction)?
    }
}

/// What the flow beside that of the outdoor air is.
#[derive(Clone, Copy)]
pub(super) enum FlowKind {
    Total,
    Recirculated,
}

impl FlowKind {
    fn of(self, flow: Reading) -> OtherFlow {
        match self {
            Self::Total => OtherFlow::Total(flow),
            Self::Recirculated => OtherFlow::Recirculated(flow),
        }
    }
}

choices! {
    FlowKind { 0 "total" => Total, 1 "recirculated" => Recirculated }
    Quality { 0 "good" => Good, 1 "repaired" => Repaired, 2 "refused" => Refused }
}

statuses! {
    Quality { "0 good" => Good, "1 repaired" => Repaired, "2 refused" => Refused }
    FractionStatus {
        "0 determined" => Determined,
        "1 uncertain" => Uncertain,
        "2 below zero" => BelowZero,
        "3 above one" => AboveOne,
        "4 indeterminate" => Indeterminate,
    }
    Reach { "0 reached" => Reached, "1 at the least" => AtLeast, "2 at the most" => AtMost }
}

impl Argument for Reading {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, |walk| {
            walk.number("value", "unit of the quantity");
            walk.number("standard_uncertainty", "unit of the quantity");
            <Quality as Argument>::describe(walk, "quality");
        });
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        Ok(Self { value: row.number()?, standard_uncertainty: row.number()?, quality: Argument::read(row)? })
    }
}

impl Argument for MeasuredAir {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, |walk| {
            Reading::describe(walk, "dry_bulb");
            Reading::describe(walk, "humidity");
            Quantity::describe(walk, "humidity_quantity");
        });
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        let (dry_bulb, humidity) = (Reading::read(row)?, Reading::read(row)?);
        Ok(Self { dry_bulb, humidity, humidity_quantity: Quantity::read(row)? })
    }
}

answers! {
    Mixed, |x| { leaving: x.leaving, exchange: x.exchange }
    OutdoorAirFraction, |x| {
        fraction: x.fraction,
        standard_uncertainty: x.standard_uncertainty,
        fraction_status: x.status,
        quality: x.quality,
    }
    Blend, |x| { fraction: x.fraction, mixed: x.mixed, reach: x.reach }
}
