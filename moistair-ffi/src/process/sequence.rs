//! A chain of processes, and a chain solved for one of its numbers.
//!
//! Each step is the process of its kind, with the same bits as the function for that alone. What droplets and ice do on their way: mixing,
//! compression and the eliminator take them; heating evaporates what the air then holds; every other step refuses them
//! (MOISTAIR_CARRIES_CONDENSATE): put an eliminator before it.

use moistair_core::sequence::{self, Free, Loads, Sequence, SolveStatus, Solved, Step, StepResult, Target, Total};
use moistair_core::{HeatFlow, Pressure, RelativeHumidity};

use super::coil::condensate;
use super::desiccant::moistair_sorption;
use super::evaporative::{moistair_direct_cooler, moistair_indirect_cooler};
use super::humidify::{evaporating_water, moistair_washer};
use super::mixing::moistair_books;
use super::room::moistair_room_gains;
use super::stream::{moistair_exchange, moistair_wet_stream};
use super::water_coil::{moistair_coil_surface, moistair_coil_water};
use super::{celsius, enthalpy, finite, mass_flow, ratio};
use crate::memory::{Answer, answer, check, check_optional, read, write};
use crate::quantity::quantity;
use crate::state::moistair_state;
use crate::status::{Failure, moistair_error};

/// Heating or cooling to leaving_temperature, as moistair_sensible_to_temperature.
pub const MOISTAIR_STEP_TO_TEMPERATURE: i32 = 1;
/// Heating or cooling by heat_flow, as moistair_sensible_with_heat.
pub const MOISTAIR_STEP_WITH_HEAT: i32 = 2;
/// A coil that leaves state, as moistair_coil_to_state. Reads condensate and condensate_temperature, as all coils do.
pub const MOISTAIR_STEP_COIL_TO_STATE: i32 = 10;
/// A coil that leaves leaving_temperature and relative_humidity; where that would be moister than what enters, it stays dry and the air
/// keeps its humidity ratio.
pub const MOISTAIR_STEP_COIL_TO_TEMPERATURE: i32 = 11;
/// A coil by apparatus_dew_point and bypass_factor, as moistair_coil_by_bypass_factor.
pub const MOISTAIR_STEP_COIL_BY_BYPASS_FACTOR: i32 = 12;
/// A coil by surface and water, as moistair_coil_with_water.
pub const MOISTAIR_STEP_COIL_WITH_WATER: i32 = 13;
/// A coil that leaves relative_humidity and the heater behind it, to state, as moistair_reheat_to_state.
pub const MOISTAIR_STEP_COIL_WITH_REHEAT: i32 = 14;
/// Steam of water_flow and steam_enthalpy, as moistair_humidify_steam.
pub const MOISTAIR_STEP_STEAM: i32 = 20;
/// Steam of steam_enthalpy up to humidity_ratio, as moistair_humidify_steam_to_humidity_ratio.
pub const MOISTAIR_STEP_STEAM_TO_HUMIDITY_RATIO: i32 = 21;
/// Steam of steam_enthalpy up to relative_humidity, as moistair_humidify_steam_to_relative_humidity.
pub const MOISTAIR_STEP_STEAM_TO_RELATIVE_HUMIDITY: i32 = 22;
/// Water of water_flow and water_temperature sprayed in, as moistair_humidify_spray.
pub const MOISTAIR_STEP_SPRAY: i32 = 23;
/// Wetted media of saturation_effectiveness; evaporating_water says of what water, as moistair_humidify_evaporative. Reads
/// water_temperature for MOISTAIR_WATER_AT_GIVEN only.
pub const MOISTAIR_STEP_EVAPORATIVE: i32 = 24;
/// Wetted media with circulating water, pump and bleed, by direct_cooler.
pub const MOISTAIR_STEP_DIRECT_COOLER: i32 = 25;
/// A washer, by washer.
pub const MOISTAIR_STEP_WASH: i32 = 26;
/// Mixing with stream, as moistair_mixing_adiabatic.
pub const MOISTAIR_STEP_MIX: i32 = 30;
/// All droplets and ice taken out of the air, at its own temperature: a perfect eliminator.
pub const MOISTAIR_STEP_ELIMINATE: i32 = 31;
/// Compression or expansion to pressure and leaving_temperature, as moistair_compress_to_pressure.
pub const MOISTAIR_STEP_COMPRESS: i32 = 40;
/// Indirect evaporative cooling by the gas of stream, the secondary air, and indirect_cooler.
pub const MOISTAIR_STEP_INDIRECT_COOLER: i32 = 61;
/// A room, by gains; what leaves is its air, as moistair_room_of_supply.
pub const MOISTAIR_STEP_ROOM: i32 = 70;
/// A desiccant, by sorption to humidity_ratio, as moistair_desiccant_to_humidity_ratio.
pub const MOISTAIR_STEP_DESICCANT_TO_HUMIDITY_RATIO: i32 = 80;
/// A desiccant of drying_effectiveness toward humidity_ratio, the driest, by sorption, as moistair_desiccant_by_effectiveness.
pub const MOISTAIR_STEP_DESICCANT_BY_EFFECTIVENESS: i32 = 81;

/// Most steps that a solve takes; a run takes any number.
pub const MOISTAIR_MOST_STEPS: i32 = 32;

/// The property has its value.
pub const MOISTAIR_SOLVE_SOLVED: i32 = 0;
/// The property is on one side of its value at both ends of the bracket, or of the part of it in which the chain runs; the nearer end is
/// returned.
pub const MOISTAIR_SOLVE_NO_CROSSING: i32 = 1;
/// The property jumps past its value; the nearer side is returned.
pub const MOISTAIR_SOLVE_JUMP: i32 = 2;
/// The chain fails between two ends at which it runs; the nearest value found is returned.
pub const MOISTAIR_SOLVE_INTERRUPTED: i32 = 3;

/// One process of a chain. Only what its kind names is read; zero the rest.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_step {
    /// The stream that is mixed in, or the secondary air of an indirect cooler.
    pub stream: moistair_wet_stream,
    /// A state that leaves.
    pub state: moistair_state,
    /// A coil by its conductances.
    pub surface: moistair_coil_surface,
    /// The water of a coil.
    pub water: moistair_coil_water,
    /// Wetted media with their water.
    pub direct_cooler: moistair_direct_cooler,
    /// An indirect evaporative cooler.
    pub indirect_cooler: moistair_indirect_cooler,
    /// A washer.
    pub washer: moistair_washer,
    /// What a room gives to its air.
    pub gains: moistair_room_gains,
    /// A desiccant.
    pub sorption: moistair_sorption,
    /// [°C], -80 to 150.
    pub leaving_temperature: f64,
    /// [W], positive into the air.
    pub heat_flow: f64,
    /// [1].
    pub relative_humidity: f64,
    /// [kg/kg].
    pub humidity_ratio: f64,
    /// [°C], -40 to 150.
    pub apparatus_dew_point: f64,
    /// [1], 0 to 1.
    pub bypass_factor: f64,
    /// [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only.
    pub condensate_temperature: f64,
    /// Of water or steam [kg/s].
    pub water_flow: f64,
    /// [°C], 0 to 200.
    pub water_temperature: f64,
    /// [J/kg].
    pub steam_enthalpy: f64,
    /// [1], 0 to 1.
    pub saturation_effectiveness: f64,
    /// Absolute [Pa].
    pub pressure: f64,
    /// [1], 0 to 1.
    pub drying_effectiveness: f64,
    /// MOISTAIR_STEP_….
    pub kind: i32,
    /// MOISTAIR_CONDENSATE_AT_…, of coils.
    pub condensate: i32,
    /// MOISTAIR_WATER_AT_…, of wetted media.
    pub evaporating_water: i32,
    /// 0.
    pub reserved: i32,
}

/// What a step, or a chain, asks of the plant by name. Magnitudes, unless they are said to be signed: then into the air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_loads {
    /// Heat from heaters and warm coils [W].
    pub heating: f64,
    /// Heat taken out by coils and dry coolers [W].
    pub cooling: f64,
    /// The sensible part of that [W].
    pub sensible_cooling: f64,
    /// The rest of it [W].
    pub latent_cooling: f64,
    /// Heat from another stream through an indirect cooler, or carried over by a desiccant; signed [W].
    pub recovered: f64,
    /// Sensible heat of rooms; signed [W].
    pub gains: f64,
    /// Heat that circulating water brings with it: of its pump, of its make-up, of chilled spray; signed [W].
    pub water_heat: f64,
    /// Power of fans that reaches the air [W]: 0, as no step is a fan yet.
    pub fan_work: f64,
    /// Electric power of fans, that part of it included [W]: 0 likewise.
    pub fan_power: f64,
    /// Of compression and expansion: work less the heat of cooling; signed [W].
    pub compression: f64,
    /// Water that drains from coils, eliminators, coolers and washers [kg/s].
    pub condensate: f64,
    /// Steam into the air [kg/s].
    pub steam: f64,
    /// Liquid water into the air, with what it carries on as droplets [kg/s].
    pub humidifying_water: f64,
    /// Moisture of rooms; signed [kg/s].
    pub moisture_gain: f64,
    /// Vapor from a desiccant; signed [kg/s].
    pub recovered_water: f64,
    /// Water that evaporates into a secondary stream, not into this one [kg/s].
    pub secondary_water: f64,
    /// Dry air of other streams mixed in [kg/s].
    pub mixed_in: f64,
}

/// What one step of a chain did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_step_result {
    /// The air that enters.
    pub entering: moistair_wet_stream,
    /// The air that leaves.
    pub leaving: moistair_wet_stream,
    /// Heat and water into the air.
    pub exchange: moistair_exchange,
    /// The same by name.
    pub loads: moistair_loads,
    /// What enters, with a stream mixed in, against what leaves.
    pub books: moistair_books,
    /// Of a coil MOISTAIR_COIL_…; -1 of other steps.
    pub regime: i32,
    /// 1 if frost forms, or water in a coil may freeze; else 0. No freezestat.
    pub frost: i32,
    /// 1 if water condenses where no coil drains it: in an indirect cooler; else 0.
    pub condenses: i32,
    /// 0.
    pub reserved: i32,
}

/// What all steps of a chain did together.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_sequence_total {
    /// The air that leaves the last step.
    pub leaving: moistair_wet_stream,
    /// The sum of all exchanges.
    pub exchange: moistair_exchange,
    /// The sum of all loads.
    pub loads: moistair_loads,
    /// What enters the first step and is mixed in, against what leaves the last and all that was exchanged.
    pub books: moistair_books,
    /// 1 if any step reports frost, else 0.
    pub frost: i32,
    /// 1 if any step reports condensation, else 0.
    pub condenses: i32,
}

/// The number of a step that is free, and where to look for it.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_free {
    /// Where to look from, in the unit of the quantity.
    pub low: f64,
    /// Where to look to; above low.
    pub high: f64,
    /// The step that it belongs to, from 0.
    pub step: i32,
    /// Which number, by its quantity, such as MOISTAIR_LEAVING_TEMPERATURE: one that the kind of the step reads. MOISTAIR_CONDUCTANCE is that
    /// of the air side of a coil, with the water side in proportion; MOISTAIR_DRY_AIR_FLOW that of a stream mixed in.
    pub quantity: i32,
}

/// What the air is to have.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_target {
    /// The value wanted.
    pub value: f64,
    /// The step whose leaving air is meant, from 0, at or after the free one; -1 for the last.
    pub after: i32,
    /// Selector of the property.
    pub property: i32,
}

/// What a solve found.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_solved {
    /// The chain with the free number in it.
    pub total: moistair_sequence_total,
    /// The free number.
    pub number: f64,
    /// The property that the air has with it.
    pub reached: f64,
    /// That less the wanted value.
    pub residual: f64,
    /// The lower end of the bracket, or of the part of it in which the chain runs.
    pub low: f64,
    /// The property there.
    pub reached_at_low: f64,
    /// The upper end.
    pub high: f64,
    /// The property there.
    pub reached_at_high: f64,
    /// MOISTAIR_SOLVE_….
    pub status: i32,
    /// What stopped the chain where it does not run: a status, MOISTAIR_OK for nothing.
    pub refused: i32,
    /// The step that refused, from 0; -1 for none.
    pub refused_step: i32,
    /// How often the steps were evaluated for it.
    pub evaluations: u32,
}

impl moistair_step {
    fn to_core(self) -> Result<Step, Failure> {
        let relative_humidity = RelativeHumidity::from_fraction(self.relative_humidity);
        let leaving = celsius(self.leaving_temperature);
        let drain = || condensate(self.condensate, self.condensate_temperature);
        let (flow, enthalpy) = (mass_flow(self.water_flow), enthalpy(self.steam_enthalpy));
        Ok(match self.kind {
            MOISTAIR_STEP_TO_TEMPERATURE => Step::ToTemperature(leaving),
            MOISTAIR_STEP_WITH_HEAT => Step::WithHeat(HeatFlow::from_watts(self.heat_flow)),
            MOISTAIR_STEP_COIL_TO_STATE => Step::CoilToState { leaving: self.state.to_core()?, condensate: drain()? },
            MOISTAIR_STEP_COIL_TO_TEMPERATURE => {
                Step::CoilToTemperature { leaving, relative_humidity, condensate: drain()? }
            }
            MOISTAIR_STEP_COIL_BY_BYPASS_FACTOR => Step::CoilByBypassFactor {
                apparatus_dew_point: celsius(self.apparatus_dew_point),
                bypass_factor: self.bypass_factor,
                condensate: drain()?,
            },
            MOISTAIR_STEP_COIL_WITH_WATER => Step::CoilWithWater {
                surface: self.surface.to_core()?,
                water: self.water.to_core(),
                condensate: drain()?,
            },
            MOISTAIR_STEP_COIL_WITH_REHEAT => Step::CoilWithReheat {
                target: self.state.to_core()?,
                coil_leaving: relative_humidity,
                condensate: drain()?,
            },
            MOISTAIR_STEP_STEAM => Step::Steam { flow, enthalpy },
            MOISTAIR_STEP_STEAM_TO_HUMIDITY_RATIO => {
                Step::SteamToHumidityRatio { target: ratio(self.humidity_ratio), enthalpy }
            }
            MOISTAIR_STEP_STEAM_TO_RELATIVE_HUMIDITY => {
                Step::SteamToRelativeHumidity { target: relative_humidity, enthalpy }
            }
            MOISTAIR_STEP_SPRAY => Step::Spray { flow, temperature: celsius(self.water_temperature) },
            MOISTAIR_STEP_EVAPORATIVE => Step::Evaporative {
                saturation_effectiveness: self.saturation_effectiveness,
                water: evaporating_water(self.evaporating_water, self.water_temperature)?,
            },
            MOISTAIR_STEP_MIX => Step::Mix(self.stream.to_core()?),
            MOISTAIR_STEP_ELIMINATE => Step::Eliminate,
            MOISTAIR_STEP_COMPRESS => Step::Compress { pressure: Pressure::from_pascals(self.pressure), leaving },
            MOISTAIR_STEP_DIRECT_COOLER => Step::DirectCooler(self.direct_cooler.to_core()?),
            MOISTAIR_STEP_WASH => Step::Wash(self.washer.to_core()),
            MOISTAIR_STEP_INDIRECT_COOLER => Step::IndirectCooler {
                secondary: self.stream.to_core()?.without_condensate(),
                cooler: self.indirect_cooler.to_core()?,
            },
            MOISTAIR_STEP_ROOM => Step::Room(self.gains.to_core()?),
            MOISTAIR_STEP_DESICCANT_TO_HUMIDITY_RATIO => Step::DesiccantToHumidityRatio {
                target: ratio(self.humidity_ratio),
                sorption: self.sorption.to_core()?,
            },
            MOISTAIR_STEP_DESICCANT_BY_EFFECTIVENESS => Step::DesiccantByEffectiveness {
                effectiveness: self.drying_effectiveness,
                driest: ratio(self.humidity_ratio),
                sorption: self.sorption.to_core()?,
            },
            _ => return Err(Failure::UnknownSelector(self.kind)),
        })
    }
}

impl From<Loads> for moistair_loads {
    fn from(loads: Loads) -> Self {
        Self {
            heating: loads.heating.watts(),
            cooling: loads.cooling.watts(),
            sensible_cooling: loads.sensible_cooling.watts(),
            latent_cooling: loads.latent_cooling.watts(),
            recovered: loads.recovered.watts(),
            gains: loads.gains.watts(),
            water_heat: loads.water_heat.watts(),
            fan_work: loads.fan_work.watts(),
            fan_power: loads.fan_power.watts(),
            compression: loads.compression.watts(),
            condensate: loads.condensate.kilograms_per_second(),
            steam: loads.steam.kilograms_per_second(),
            humidifying_water: loads.humidifying_water.kilograms_per_second(),
            moisture_gain: loads.moisture_gain.kilograms_per_second(),
            recovered_water: loads.recovered_water.kilograms_per_second(),
            secondary_water: loads.secondary_water.kilograms_per_second(),
            mixed_in: loads.mixed_in.kilograms_per_second(),
        }
    }
}

impl From<StepResult> for moistair_step_result {
    fn from(done: StepResult) -> Self {
        Self {
            entering: done.entering.into(),
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            loads: done.loads.into(),
            books: done.books.into(),
            regime: done.regime.map_or(-1, |regime| regime as i32),
            frost: done.frost.into(),
            condenses: done.condenses.into(),
            reserved: 0,
        }
    }
}

impl From<Total> for moistair_sequence_total {
    fn from(total: Total) -> Self {
        Self {
            leaving: total.leaving.into(),
            exchange: total.exchange.into(),
            loads: total.loads.into(),
            books: total.books.into(),
            frost: total.frost.into(),
            condenses: total.condenses.into(),
        }
    }
}

impl From<Solved> for moistair_solved {
    fn from(solved: Solved) -> Self {
        Self {
            total: solved.total.into(),
            number: solved.number,
            reached: solved.reached,
            residual: solved.residual,
            low: solved.low.number,
            reached_at_low: solved.low.reached,
            high: solved.high.number,
            reached_at_high: solved.high.reached,
            status: solved.status as i32,
            refused: solved.refused.map_or(0, |refused| refused.error.code()),
            refused_step: solved.refused.map_or(-1, |refused| place(refused.step)),
            evaluations: solved.evaluations,
        }
    }
}

impl Answer for moistair_loads {
    fn is_finite(&self) -> bool {
        finite([self.heating, self.cooling, self.sensible_cooling, self.latent_cooling, self.recovered])
            && finite([self.gains, self.water_heat, self.fan_work, self.fan_power, self.compression])
            && finite([self.condensate, self.steam, self.humidifying_water, self.moisture_gain])
            && finite([self.recovered_water, self.secondary_water, self.mixed_in])
    }
}

impl Answer for moistair_step_result {
    fn is_finite(&self) -> bool {
        let streams = self.entering.is_finite() && self.leaving.is_finite();
        streams && self.exchange.is_finite() && self.loads.is_finite() && self.books.is_finite()
    }
}

impl Answer for moistair_sequence_total {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite() && self.loads.is_finite() && self.books.is_finite()
    }
}

impl Answer for moistair_solved {
    fn is_finite(&self) -> bool {
        let ends = finite([self.low, self.reached_at_low, self.high, self.reached_at_high]);
        self.total.is_finite() && ends && finite([self.number, self.reached, self.residual])
    }
}

/// A place in the chain as C sees it.
fn place(step: usize) -> i32 {
    i32::try_from(step).unwrap_or(i32::MAX)
}

/// A place in the chain from C; one that no chain has for a negative one.
fn step(place: i32) -> usize {
    usize::try_from(place).unwrap_or(usize::MAX)
}

/// The caller's array of steps, and a place for each result.
struct Steps {
    steps: *const moistair_step,
    results: *mut moistair_step_result,
    count: usize,
}

impl Steps {
    fn new(steps: *const moistair_step, count: usize, results: *mut moistair_step_result) -> Result<Self, Failure> {
        if count > isize::MAX as usize / size_of::<moistair_step_result>() {
            return Err(Failure::TooLong);
        }
        if count > 0 {
            check(steps)?;
            check_optional(results)?;
        }
        Ok(Self { steps, results, count })
    }

    /// # Safety
    /// The place is below the count, the array is as long as the caller says.
    unsafe fn step(&self, place: usize) -> Result<Step, Failure> {
        // SAFETY: not null, aligned, inside the array.
        unsafe { self.steps.add(place).read() }.to_core()
    }

    /// # Safety
    /// As [`Steps::step`].
    unsafe fn take(&self, place: usize, result: StepResult) -> Result<(), Failure> {
        let result = moistair_step_result::from(result);
        if !result.is_finite() {
            return Err(Failure::Internal);
        }
        if !self.results.is_null() {
            // SAFETY: not null, aligned, inside the array.
            unsafe { self.results.add(place).write(result) };
        }
        Ok(())
    }
}

/// Takes a stream through a chain of processes and adds up heat, water and work.
///
/// entering: the stream that enters; steps: array of steps, in the order of the air; may be null for a count of 0; count: how many; results:
/// room for what each step did, count elements, may be null; ran: how many steps ran, written whenever it is given and the pointers are good,
/// also when a step fails: it is then the place of that step, and the results of those before it have been written; may be null; total: output;
/// error: may be null. Memory to be written may not overlap with any other memory of the call.
/// Returns 0, 1xx, 2xx, 3xx: the status of the first step that fails. Later steps are not run.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sequence_run(
    entering: *const moistair_wet_stream,
    steps: *const moistair_step,
    count: usize,
    results: *mut moistair_step_result,
    ran: *mut usize,
    total: *mut moistair_sequence_total,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check_optional(ran)?;
        let steps = Steps::new(steps, count, results)?;
        // SAFETY: the caller's pointer.
        let mut sequence = Sequence::new(&unsafe { read(entering) }?.to_core()?);
        for place in 0..steps.count {
            // SAFETY: the caller's pointers and array.
            unsafe {
                write(ran, place);
                let done = sequence.pass(&steps.step(place)?)?;
                steps.take(place, done)?;
            }
        }
        // SAFETY: the caller's pointer.
        unsafe { write(ran, steps.count) };
        Ok(sequence.total().into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(total, error, call) }
}

/// Finds the number of one step with which the air has a property, and runs the chain with it.
///
/// The property need not be monotone: it is enough that it lies on two sides of its value at the ends of the bracket. Where the chain does not
/// run at an end, that is drawn in to where it does; where it runs at neither, 15 points between are tried. At most 179 evaluations of the
/// steps from the free one on, about ten where the chain runs at both ends. The steps stay as they are: put solved.number into its place.
/// The steps are copied to the stack, about 10 KiB.
///
/// entering: the stream that enters; steps: array of steps, in the order of the air; count: how many, 1 to MOISTAIR_MOST_STEPS; free: which
/// number of which step, and where to look; target: the property and its value; results: room for what each step does with the number
/// found, count elements, may be null, written on success; solved: output; error: may be null. Memory to be written may not overlap with
/// any other memory of the call.
/// Returns 0 (see solved.status), 1xx, 2xx, 3xx: of a wrong argument, of a step before the free one, of the chain at the lower end of the
/// bracket when it runs nowhere, or of a step behind the one whose air is looked at.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sequence_solve(
    entering: *const moistair_wet_stream,
    steps: *const moistair_step,
    count: usize,
    free: *const moistair_free,
    target: *const moistair_target,
    results: *mut moistair_step_result,
    solved: *mut moistair_solved,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        if count > MOISTAIR_MOST_STEPS as usize {
            return Err(Failure::TooLong);
        }
        let given = Steps::new(steps, count, results)?;
        // SAFETY: the caller's pointers.
        let (entering, free, target) = unsafe { (read(entering)?.to_core()?, read(free)?, read(target)?) };
        let mut all = [Step::Eliminate; MOISTAIR_MOST_STEPS as usize];
        for (place, step) in all.iter_mut().enumerate().take(count) {
            // SAFETY: the caller's array.
            *step = unsafe { given.step(place) }?;
        }
        let chain = all.get_mut(..count).unwrap_or_default();
        let (number, quantity) = (quantity(free.quantity)?, quantity(target.property)?);
        let free = Free { step: step(free.step), number, low: free.low, high: free.high };
        let after = if target.after == -1 { None } else { Some(step(target.after)) };
        let target = Target { after, quantity, value: target.value };
        let solved = sequence::solve(&entering, chain, &mut [], free, target).map_err(|failed| failed.error)?;
        let solved = moistair_solved::from(solved);
        if !solved.is_finite() {
            return Err(Failure::Internal);
        }
        let mut sequence = Sequence::new(&entering);
        for (place, step) in chain.iter().enumerate() {
            // SAFETY: the caller's array.
            unsafe { given.take(place, sequence.pass(step)?) }?;
        }
        Ok(solved)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(solved, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_step>() == 608 && core::mem::offset_of!(moistair_step, kind) == 592);
    assert!(size_of::<moistair_loads>() == 136 && size_of::<moistair_step_result>() == 512);
    assert!(core::mem::offset_of!(moistair_step_result, regime) == 496);
    assert!(size_of::<moistair_sequence_total>() == 360 && size_of::<moistair_solved>() == 432);
    assert!(size_of::<moistair_free>() == 24 && size_of::<moistair_target>() == 16);
    assert!(sequence::EVALUATION_CAP == 179);
    assert!(Step::<f64>::Eliminate.code() == MOISTAIR_STEP_ELIMINATE);
    assert!(SolveStatus::Solved as i32 == MOISTAIR_SOLVE_SOLVED);
    assert!(SolveStatus::NoCrossing as i32 == MOISTAIR_SOLVE_NO_CROSSING);
    assert!(SolveStatus::Jump as i32 == MOISTAIR_SOLVE_JUMP);
    assert!(SolveStatus::Interrupted as i32 == MOISTAIR_SOLVE_INTERRUPTED);
};
