//! A cooling coil and the heater behind it.

use super::row::{answers, processes};
use crate::process::AirStream;
use crate::process::coil::CondensateTemperature;
use crate::process::reheat::{CoilLeaving, Reheat, to_state, with_coil};
use crate::{MoistAir, RelativeHumidity};

processes! {
    1000 "reheat.to_state": (
        entering: AirStream,
        target: MoistAir,
        coil_leaving_relative_humidity: RelativeHumidity,
        condensate_temperature: CondensateTemperature,
    ) -> Reheat {
        to_state(&entering, &target, coil_leaving_relative_humidity, condensate_temperature)?
    }
    1001 "reheat.with_coil": (
        entering: AirStream,
        target: MoistAir,
        coil_leaving: CoilLeaving,
        condensate_temperature: CondensateTemperature,
    ) -> Reheat {
        with_coil(&entering, &target, coil_leaving, condensate_temperature)?
    }
}

answers! {
    Reheat, |x| { cooling: x.cooling, heating: x.heating, reheat: x.reheat(), reheat_fraction: x.reheat_fraction() }
}
