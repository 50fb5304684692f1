//! Compressed air.

use super::row::{answers, processes};
use crate::process::WetStream;
use crate::process::compression::{Compressed, to_pressure};
use crate::{Pressure, Temperature};

processes! {
    800 "compression.to_pressure":
        (entering: WetStream, pressure: Pressure, leaving_temperature: Temperature) -> Compressed {
        to_pressure(&entering, pressure, leaving_temperature)?
    }
}

answers! {
    Compressed, |x| { leaving: x.leaving, exchange: x.exchange, condensate: x.condensate }
}
