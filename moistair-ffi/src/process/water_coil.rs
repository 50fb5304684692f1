//! Coils known by their conductances and their water.
//!
//! A coil with air below freezing on it, or with water that stands still in it, can freeze and burst within minutes: a hard-wired
//! freezestat protects it, never a computed temperature. Wet surfaces and pans that do not drain grow mould. Local codes govern.

use moistair_core::process::coil::{
    self, Arrangement, CoilFlows, CoilSurface, CoilWater, Coolant, FlowExponents, LoadByWater, Measured, WaterCoil,
};
use moistair_core::{Conductance, HeatFlow, SpecificHeat};

use super::coil::{condensate, moistair_cooling};
use super::stream::moistair_stream;
use super::{celsius, finite, mass_flow};
use crate::memory::{Answer, answer, read};
use crate::status::{Failure, moistair_error};

/// Air and water against each other, as in coils of four rows and more.
pub const MOISTAIR_COUNTERFLOW: i32 = 0;
/// Air and water across each other, neither mixed; for coils that stay dry.
pub const MOISTAIR_CROSS_FLOW: i32 = 1;

/// The dry bulb of the leaving air was measured [°C].
pub const MOISTAIR_MEASURED_LEAVING_AIR: i32 = 0;
/// The temperature of the leaving water was measured [°C].
pub const MOISTAIR_MEASURED_LEAVING_WATER: i32 = 1;
/// The heat into the air was measured, negative where the coil cools [W].
pub const MOISTAIR_MEASURED_HEAT: i32 = 2;

/// A coil by its conductances at the flows at hand.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_coil_surface {
    /// From air to metal with the fins' efficiency, for sensible heat [W/K].
    pub air_side: f64,
    /// From metal to water [W/K].
    pub water_side: f64,
    /// MOISTAIR_COUNTERFLOW or MOISTAIR_CROSS_FLOW.
    pub arrangement: i32,
    /// 0.
    pub reserved: i32,
}

/// The water, or brine, that enters a coil.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_coil_water {
    /// Its mass flow [kg/s].
    pub flow: f64,
    /// Its temperature [°C]: 0 to 200, and from -40 for a brine.
    pub entering: f64,
    /// 0 for water; of a brine that does not freeze, 500 to 6000 [J/(kg K)].
    pub specific_heat: f64,
}

/// What a coil with water in it did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_water_coil {
    /// The air side. A coil that heats has a negative cooling load.
    pub air: moistair_cooling,
    /// Temperature of the water that leaves; it takes up the heat that air.exchange takes out [°C].
    pub leaving_water: f64,
    /// Share of the surface on which nothing condenses [1].
    pub dry_fraction: f64,
    /// The coldest metal, at one end of the coil [°C].
    pub coldest_surface: f64,
    /// 1 if the coldest metal is below the melting temperature and there is water in it; else 0. No freezestat.
    pub freezing: i32,
    /// 0.
    pub reserved: i32,
}

/// What flows through a coil.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_coil_flows {
    /// Dry air [kg/s].
    pub air: f64,
    /// Water or brine [kg/s].
    pub water: f64,
}

/// How conductances go with flows: UA = UA0 (flow / flow0)^n on each side.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_flow_exponents {
    /// n of the air side, 0 to 1; 0.4 to 0.7 with fins (common practice, no source) [1].
    pub air_side: f64,
    /// n of the water side, 0 to 1; 0.8 while the water is turbulent (Dittus and Boelter 1930; from memory) [1].
    pub water_side: f64,
}

/// What the water of a coil says of its load.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_load_by_water {
    /// Heat that the water took up; negative in a coil that heats [W].
    pub load: f64,
    /// The load by the air less that by the water [W].
    pub air_less_water: f64,
}

impl From<LoadByWater> for moistair_load_by_water {
    fn from(found: LoadByWater) -> Self {
        Self { load: found.load.watts(), air_less_water: found.air_less_water.watts() }
    }
}

impl Answer for moistair_load_by_water {
    fn is_finite(&self) -> bool {
        finite([self.load, self.air_less_water])
    }
}

impl moistair_coil_flows {
    fn to_core(self) -> CoilFlows {
        CoilFlows { air: mass_flow(self.air), water: mass_flow(self.water) }
    }
}

impl From<WaterCoil> for moistair_water_coil {
    fn from(done: WaterCoil) -> Self {
        Self {
            air: done.air.into(),
            leaving_water: done.leaving_water.celsius(),
            dry_fraction: done.dry_fraction,
            coldest_surface: done.coldest_surface.celsius(),
            freezing: done.freezing.into(),
            reserved: 0,
        }
    }
}

impl Answer for moistair_water_coil {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.leaving_water, self.dry_fraction, self.coldest_surface])
    }
}

impl From<CoilSurface> for moistair_coil_surface {
    fn from(surface: CoilSurface) -> Self {
        Self {
            air_side: surface.air_side.watts_per_kelvin(),
            water_side: surface.water_side.watts_per_kelvin(),
            arrangement: surface.arrangement as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_coil_surface {
    fn is_finite(&self) -> bool {
        finite([self.air_side, self.water_side])
    }
}

impl moistair_coil_surface {
    pub(super) fn to_core(self) -> Result<CoilSurface, Failure> {
        let conductance = Conductance::from_watts_per_kelvin;
        Ok(CoilSurface {
            air_side: conductance(self.air_side),
            water_side: conductance(self.water_side),
            arrangement: arrangement(self.arrangement)?,
        })
    }
}

impl moistair_coil_water {
    pub(super) fn to_core(self) -> CoilWater {
        let coolant = if self.specific_heat == 0.0 {
            Coolant::Water
        } else {
            Coolant::Brine(SpecificHeat::from_joules_per_kilogram_kelvin(self.specific_heat))
        };
        CoilWater { flow: mass_flow(self.flow), entering: celsius(self.entering), coolant }
    }
}

fn arrangement(selector: i32) -> Result<Arrangement, Failure> {
    match selector {
        MOISTAIR_COUNTERFLOW => Ok(Arrangement::Counterflow),
        MOISTAIR_CROSS_FLOW => Ok(Arrangement::CrossFlow),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

fn measured(selector: i32, value: f64) -> Result<Measured, Failure> {
    match selector {
        MOISTAIR_MEASURED_LEAVING_AIR => Ok(Measured::LeavingAir(celsius(value))),
        MOISTAIR_MEASURED_LEAVING_WATER => Ok(Measured::LeavingWater(celsius(value))),
        MOISTAIR_MEASURED_HEAT => Ok(Measured::Heat(HeatFlow::from_watts(value))),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// A coil from its conductances and the water that enters it: dry, wet or partly wet by effectiveness and number of transfer units. It
/// cools or heats, as the water is colder or warmer than the air; without water flow or conductance it changes nothing.
///
/// entering: the stream that enters; surface: the coil; water: what enters it; condensate: where the condensate temperature comes from,
/// MOISTAIR_CONDENSATE_AT_… (the apparatus is the mean surface that condenses); condensate_temperature: [°C], -40 to 150, read for
/// MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (water would freeze in the coil; a coil in cross-flow would get wet; the air would leave above the range).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_with_water(
    entering: *const moistair_stream,
    surface: *const moistair_coil_surface,
    water: *const moistair_coil_water,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_water_coil,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        let (entering, surface, water) = unsafe { (read(entering)?.to_core()?, read(surface)?, read(water)?) };
        Ok(coil::with_water(&entering, surface.to_core()?, water.to_core(), condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The conductances of a coil that explain one measured point; moistair_coil_with_water then predicts others.
///
/// entering: the stream that enters; water: what enters the coil; measured: what the value is, MOISTAIR_MEASURED_…; value: [°C] or [W];
/// conductance_ratio: of the water side over the air side [1], 0.001 to 1000; arrangement: MOISTAIR_COUNTERFLOW or MOISTAIR_CROSS_FLOW;
/// surface: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (no conductance explains the value: the limits are what no and endless surface would give).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_surface_from_rating(
    entering: *const moistair_stream,
    water: *const moistair_coil_water,
    measured: i32,
    value: f64,
    conductance_ratio: f64,
    arrangement: i32,
    surface: *mut moistair_coil_surface,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (measured, arrangement) = (self::measured(measured, value)?, self::arrangement(arrangement)?);
        // SAFETY: the caller's pointers.
        let (entering, water) = unsafe { (read(entering)?.to_core()?, read(water)?.to_core()) };
        Ok(coil::surface_from_rating(&entering, water, measured, conductance_ratio, arrangement)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(surface, error, call) }
}

/// The conductances of a coil at other flows than those that they were found at: within a few per cent down to half of them (common
/// practice, no source).
///
/// surface: the coil; found_at: the flows of that; flows: those that its conductances are wanted at; scaled: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (a conductance beyond its range, as of one that was found without a flow).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_surface_at_flows(
    surface: *const moistair_coil_surface,
    found_at: moistair_coil_flows,
    flows: moistair_coil_flows,
    exponents: moistair_flow_exponents,
    scaled: *mut moistair_coil_surface,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let surface = unsafe { read(surface)?.to_core()? };
        let exponents = FlowExponents { air_side: exponents.air_side, water_side: exponents.water_side };
        Ok(surface.at_flows(found_at.to_core(), flows.to_core(), exponents)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(scaled, error, call) }
}

/// The load of a coil by its water, beside its load by the air. A steady coil gives the same on both sides.
///
/// entering: the stream that enters; load_by_air: positive where the coil cools [W]; water: what enters the coil; leaving_water: its
/// temperature where it leaves [°C]; found: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_load_by_water(
    entering: *const moistair_stream,
    load_by_air: f64,
    water: *const moistair_coil_water,
    leaving_water: f64,
    found: *mut moistair_load_by_water,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, water) = unsafe { (read(entering)?.to_core()?, read(water)?.to_core()) };
        Ok(coil::load_by_water(&entering, HeatFlow::from_watts(load_by_air), water, celsius(leaving_water))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_coil_flows>() == 16 && size_of::<moistair_flow_exponents>() == 16);
    assert!(size_of::<moistair_load_by_water>() == 16);
    assert!(size_of::<moistair_coil_surface>() == 24 && size_of::<moistair_coil_water>() == 24);
    assert!(size_of::<moistair_water_coil>() == 328 && core::mem::offset_of!(moistair_water_coil, freezing) == 320);
    assert!(Arrangement::Counterflow as i32 == MOISTAIR_COUNTERFLOW);
    assert!(Arrangement::CrossFlow as i32 == MOISTAIR_CROSS_FLOW);
};
