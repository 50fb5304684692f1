//! Heating and cooling at constant humidity ratio.

use super::row::{answers, processes};
use crate::process::AirStream;
use crate::process::sensible::{Sensible, to_temperature, with_heat};
use crate::{HeatFlow, Temperature};

processes! {
    300 "sensible.to_temperature": (entering: AirStream, leaving_temperature: Temperature) -> Sensible {
        to_temperature(&entering, leaving_temperature)?
    }
    301 "sensible.with_heat": (entering: AirStream, heat: HeatFlow) -> Sensible { with_heat(&entering, heat)? }
}

answers! {
    Sensible, |x| { leaving: x.leaving, exchange: x.exchange }
}
