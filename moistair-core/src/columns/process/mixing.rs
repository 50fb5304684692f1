//! Adiabatic mixing.

use super::row::{answers, processes};
use super::stream::Streams;
use crate::process::AirStream;
use crate::process::mixing::{Mixed, adiabatic, adiabatic_at, remainder};
use crate::{Freezing, MassFlow, MoistAir, Pressure};

processes! {
    500 "mixing.adiabatic": (streams: Streams) -> Mixed { adiabatic(streams.as_slice())? }
    501 "mixing.adiabatic_at": (pressure: Pressure, freezing: Freezing, streams: Streams) -> Mixed {
        adiabatic_at(streams.as_slice(), pressure, freezing)?
    }
    502 "mixing.remainder": (total_flow: MassFlow, part: AirStream, air: MoistAir) -> AirStream {
        remainder(total_flow, &part, air)?
    }
}

answers! {
    Mixed, |x| { leaving: x.leaving, exchange: x.exchange }
}
