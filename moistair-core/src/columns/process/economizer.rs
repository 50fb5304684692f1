//! What an economizer is decided by, and what follows from the decision. The decision itself follows one in time: see
//! [`crate::process::economizer`].

use super::row::{Argument, Outcome, Row, RowError, Walk, answers, arguments, processes};
use crate::process::economizer::{CoilLoad, Supply, coil_load, enthalpy_limit, outdoor_air};
use crate::process::mixing::outdoor_air::{Blend, FractionLimits};
use crate::{Basis, MoistAir, SpecificEnthalpy, Temperature};

processes! {
    1900 "economizer.coil_load": (air: MoistAir, supply: Supply) -> CoilLoad { coil_load(&air, supply)? }
    1901 "economizer.enthalpy_limit": (pressure: Basis) -> "enthalpy_limit" SpecificEnthalpy { enthalpy_limit(pressure)? }
    1902 "economizer.outdoor_air":
        (enabled: Flag, outdoor: MoistAir, returned: MoistAir, wanted_temperature: Temperature, least: f64, most: f64) -> Blend {
        outdoor_air(enabled.0, &outdoor, &returned, wanted_temperature, FractionLimits { least, most })?
    }
}

arguments! {
    Supply { dry_bulb: "supply_temperature", coil_leaving: "coil_leaving_humidity" }
}

answers! {
    CoilLoad, |x| { heat: x.heat, wet: x.wet }
}

/// 0 or 1.
pub(super) struct Flag(bool);

impl Argument for Flag {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.number(name, "choice: 0 no 1 yes");
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        match row.code()? {
            0 => Ok(Self(false)),
            1 => Ok(Self(true)),
            other => Err(RowError::Choice(other)),
        }
    }
}
