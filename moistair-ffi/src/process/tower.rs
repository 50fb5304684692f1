//! Wet cooling towers.

use moistair_core::TemperatureDifference;
use moistair_core::columns::NAN;
use moistair_core::process::tower::basin::Basin;
use moistair_core::process::tower::{self, TowerBalance, TowerWater, WaterTreatment, WaterUse};

use super::stream::{moistair_exchange, moistair_stream};
use super::{celsius, finite, mass_flow};
use crate::memory::{Answer, answer, read};
use crate::state::moistair_state;
use crate::status::moistair_error;

/// The water that a tower cools.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_tower_water {
    /// Flow that enters hot [kg/s].
    pub flow: f64,
    /// Temperature of the hot water [°C], 0 to 200.
    pub hot: f64,
    /// Temperature of the cold water [°C], 0 to 200.
    pub cold: f64,
}

/// How a tower loses and renews water besides evaporation.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_water_treatment {
    /// Drift over the circulating flow [1], 0 to 0.05.
    pub drift_fraction: f64,
    /// Concentration of the circulating water over that of the make-up [1], above 1.
    pub cycles_of_concentration: f64,
}

/// Evaporation, drift, blowdown and what makes up for them, all positive.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_water_use {
    /// Evaporation [kg/s].
    pub evaporation: f64,
    /// Drift [kg/s].
    pub drift: f64,
    /// Blowdown [kg/s].
    pub blowdown: f64,
    /// Make-up [kg/s].
    pub make_up: f64,
    /// 1 if drift alone keeps the concentration below the one wanted, so that there is no blowdown; else 0.
    pub limited_by_drift: i32,
    /// 0.
    pub reserved: i32,
}

/// Water in circulation and what is dissolved in it; the caller keeps it from step to step.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_basin {
    /// Water in basin, pipes and plant together [kg], 0.001 to 1e9.
    pub inventory: f64,
    /// Concentration [mg/kg, or any unit that the make-up's is in too], 0 to 1e6.
    pub concentration: f64,
}

/// The overall balance of a cooling tower.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_tower_balance {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat and water into the air.
    pub exchange: moistair_exchange,
    /// Water use.
    pub water: moistair_water_use,
    /// Heat that the water gives up, positive [W].
    pub heat_rejected: f64,
    /// Hot less cold water temperature [K].
    pub range: f64,
    /// Cold water over the wet bulb of the entering air [K].
    pub approach: f64,
    /// Range over range and approach [1]; NaN without either.
    pub effectiveness: f64,
}

impl From<WaterUse> for moistair_water_use {
    fn from(water: WaterUse) -> Self {
        Self {
            evaporation: water.evaporation.kilograms_per_second(),
            drift: water.drift.kilograms_per_second(),
            blowdown: water.blowdown.kilograms_per_second(),
            make_up: water.make_up.kilograms_per_second(),
            limited_by_drift: water.limited_by_drift.into(),
            reserved: 0,
        }
    }
}

impl From<TowerBalance> for moistair_tower_balance {
    fn from(balance: TowerBalance) -> Self {
        Self {
            leaving: balance.leaving.into(),
            exchange: balance.exchange.into(),
            water: balance.water.into(),
            heat_rejected: balance.heat_rejected.watts(),
            range: balance.range.kelvins(),
            approach: balance.approach.kelvins(),
            effectiveness: balance.effectiveness().unwrap_or(NAN),
        }
    }
}

impl From<TowerWater> for moistair_tower_water {
    fn from(water: TowerWater) -> Self {
        let TowerWater { flow, hot, cold } = water;
        Self { flow: flow.kilograms_per_second(), hot: hot.celsius(), cold: cold.celsius() }
    }
}

impl From<Basin> for moistair_basin {
    fn from(basin: Basin) -> Self {
        Self { inventory: basin.inventory(), concentration: basin.concentration() }
    }
}

impl moistair_water_use {
    fn to_core(self) -> WaterUse {
        WaterUse {
            evaporation: mass_flow(self.evaporation),
            drift: mass_flow(self.drift),
            blowdown: mass_flow(self.blowdown),
            make_up: mass_flow(self.make_up),
            limited_by_drift: self.limited_by_drift != 0,
        }
    }
}

impl moistair_tower_water {
    pub(super) fn to_core(self) -> TowerWater {
        TowerWater { flow: mass_flow(self.flow), hot: celsius(self.hot), cold: celsius(self.cold) }
    }
}

impl moistair_water_treatment {
    pub(super) fn to_core(self) -> WaterTreatment {
        let Self { drift_fraction, cycles_of_concentration } = self;
        WaterTreatment { drift_fraction, cycles_of_concentration }
    }
}

impl Answer for moistair_tower_water {
    fn is_finite(&self) -> bool {
        finite([self.flow, self.hot, self.cold])
    }
}

impl Answer for moistair_basin {
    fn is_finite(&self) -> bool {
        finite([self.inventory, self.concentration])
    }
}

impl Answer for moistair_water_use {
    fn is_finite(&self) -> bool {
        finite([self.evaporation, self.drift, self.blowdown, self.make_up])
    }
}

impl Answer for moistair_tower_balance {
    fn is_finite(&self) -> bool {
        let own = [self.heat_rejected, self.range, self.approach];
        self.leaving.is_finite() && self.exchange.is_finite() && self.water.is_finite() && finite(own)
    }
}

/// Blowdown and make-up for an evaporation; also for humidifiers with bleed.
///
/// evaporation: [kg/s], 0 to 1e6; circulating: circulating water [kg/s], 0 to 1e6; treatment: drift and concentration; water: output;
/// error: may be null.
/// Returns 0, 1xx, 2xx, 301 (one cycle of concentration).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_water_use(
    evaporation: f64,
    circulating: f64,
    treatment: moistair_water_treatment,
    water: *mut moistair_water_use,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(tower::water_use(mass_flow(evaporation), mass_flow(circulating), treatment.to_core())?.into());
    // SAFETY: the caller's pointers.
    unsafe { answer(water, error, call) }
}

/// Cycles of concentration as measured: circulating water over make-up, both in one unit.
///
/// circulating, make_up: concentrations or conductivities, 0 to 1e6; cycles: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the circulating water is not the more concentrated).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_cycles_of_concentration(
    circulating: f64,
    make_up: f64,
    cycles: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(tower::cycles_of_concentration(circulating, make_up)?);
    // SAFETY: the caller's pointers.
    unsafe { answer(cycles, error, call) }
}

/// Evaporation by the rule of thumb 0.00153 of the circulating flow for each kelvin of range (common practice, no source); the balances give
/// from 0.0012 to 0.0023.
///
/// circulating: circulating water [kg/s], 0 to 1e6; range: [K], 0 to 200; evaporation: output [kg/s]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_evaporation_by_rule_of_thumb(
    circulating: f64,
    range: f64,
    evaporation: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let range = TemperatureDifference::from_kelvins(range);
        Ok(tower::evaporation_by_rule_of_thumb(mass_flow(circulating), range)?.kilograms_per_second())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(evaporation, error, call) }
}

/// A basin after a step with steady flows; exact, so that a step may be as long as the flows are steady.
///
/// basin: as it was; seconds: 0 to 1e9; flows: of moistair_tower_water_use, or measured; make_up_concentration: in the unit of the basin's;
/// after: output, may be the same place as basin; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the concentration would leave its range).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_basin_after(
    basin: *const moistair_basin,
    seconds: f64,
    flows: *const moistair_water_use,
    make_up_concentration: f64,
    after: *mut moistair_basin,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (basin, flows) = (unsafe { read(basin) }?, unsafe { read(flows) }?.to_core());
        Ok(Basin::new(basin.inventory, basin.concentration)?.after(seconds, &flows, make_up_concentration)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(after, error, call) }
}

/// Balance of a tower with a known air flow; the air is taken to leave saturated.
///
/// entering: the air that enters; water: the water that is cooled; treatment: drift and concentration; balance: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_with_air_flow(
    entering: *const moistair_stream,
    water: moistair_tower_water,
    treatment: moistair_water_treatment,
    balance: *mut moistair_tower_balance,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(tower::with_air_flow(&unsafe { read(entering) }?.to_core()?, water.to_core(), treatment.to_core())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(balance, error, call) }
}

/// Balance of a tower with a known leaving state: the dry-air flow that it takes.
///
/// entering: the state that enters; leaving: the state that leaves; water: the water that is cooled; treatment: drift and concentration;
/// balance: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_with_leaving_air(
    entering: *const moistair_state,
    leaving: *const moistair_state,
    water: moistair_tower_water,
    treatment: moistair_water_treatment,
    balance: *mut moistair_tower_balance,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, leaving) = (unsafe { read(entering) }?.to_core()?, unsafe { read(leaving) }?.to_core()?);
        Ok(tower::with_leaving_air(&entering, &leaving, water.to_core(), treatment.to_core())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(balance, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_tower_water>() == 24 && size_of::<moistair_water_treatment>() == 16);
    assert!(size_of::<moistair_basin>() == 16);
    assert!(size_of::<moistair_water_use>() == 40 && size_of::<moistair_tower_balance>() == 208);
};
