//! Chains of processes, whose steps are known beforehand and whose numbers come row by row.

use super::row::{Answer, Argument, Out, Outcome, Places, Row, RowError, Source, Value, Walk, answers, statuses};
use crate::basis::Formulation;
use crate::bounds::Quantity;
use crate::process::WetStream;
use crate::process::coil::CoilRegime;
use crate::sequence::{
    End, Free, Loads, Sequence, SequenceError, SolveStatus, Solved, Step, StepResult, Target, Total, solve,
};

/// The most steps of a chain that is solved.
pub const MAX_STEPS: usize = 32;

/// A chain by the kinds of its steps; the numbers of the steps come in rows of values, with the same bits as from [`crate::sequence`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::columns::{SequenceRows, Value};
/// let air = MoistAir::from_dry_bulb(
///     Temperature::from_celsius(5.0), RelativeHumidity::from_percent(70.0), Pressure::from_kilopascals(101.325))?;
/// // Heating to a temperature (1), then by a heat flow (2): one number each.
/// let rows = SequenceRows { kinds: &[1, 2], formulation: Formulation::RealGas };
/// let number = Value::Number;
/// // The stream: its gas, liquid, ice and dry-air flow.
/// let inputs = [Value::State(air), number(0.0), number(0.0), number(1.0), number(20.0), number(1_000.0)];
/// let mut outputs = [number(0.0); 200];
/// let given = rows.run(&inputs, &mut outputs)?;
/// let Value::State(leaving) = outputs[7] else { panic!("behind the seven values of what enters") };
/// assert_eq!(leaving.dry_bulb().celsius(), 20.0);
/// assert!(rows.run(&inputs[..5], &mut outputs).is_err() && rows.run(&inputs, &mut outputs[..given - 1]).is_err());
/// # Ok::<(), Box<dyn core::error::Error>>(())
/// ```
#[derive(Clone, Copy, Debug)]
pub struct SequenceRows<'a> {
    /// The kinds in the order of the air, as of [`Step::code`].
    pub kinds: &'a [i32],
    /// Of values that come without a state.
    pub formulation: Formulation,
}

/// Which number of a chain to look for, and by what.
#[derive(Clone, Copy, Debug)]
pub struct Wanted {
    /// The step whose number is free, from 0.
    pub step: usize,
    /// Which number.
    pub number: Quantity,
    /// The step whose leaving air is looked at; the last if `None`.
    pub after: Option<usize>,
    /// Which property.
    pub quantity: Quantity,
}

/// Why a chain has no result for a row.
#[derive(Clone, Copy, Debug, PartialEq, thiserror::Error)]
#[non_exhaustive]
pub enum SequenceRowError {
    /// The entering air is none, or the values are not as many as the chain takes and gives.
    #[error(transparent)]
    Row(RowError),
    /// A step refuses the air or its own numbers.
    #[error("step {step} (from 0): {error}")]
    Step {
        /// Which, from 0.
        step: usize,
        /// Why.
        #[source]
        error: RowError,
    },
}

impl SequenceRowError {
    /// What is wrong, wherever it is.
    #[must_use]
    pub const fn error(&self) -> RowError {
        match *self {
            Self::Row(error) | Self::Step { error, .. } => error,
        }
    }

    fn at(step: usize) -> impl Fn(RowError) -> Self {
        move |error| Self::Step { step, error }
    }
}

impl From<RowError> for SequenceRowError {
    fn from(error: RowError) -> Self {
        Self::Row(error)
    }
}

impl From<SequenceError> for SequenceRowError {
    fn from(failed: SequenceError) -> Self {
        Self::Step { step: failed.step, error: failed.error.into() }
    }
}

impl SequenceRows<'_> {
    /// Runs the chain on the values of the entering stream and of each step in turn. Gives those of what each step did and of the total, and
    /// says how many they are.
    ///
    /// # Errors
    /// [`SequenceRowError`]; what the outputs hold then is of no use.
    pub fn run(self, inputs: &[Value], outputs: &mut [Value]) -> Result<usize, SequenceRowError> {
        let mut row = self.row(inputs);
        let mut out = room(outputs);
        let mut sequence = Sequence::new(&WetStream::read(&mut row)?);
        for (index, kind) in self.kinds.iter().enumerate() {
            let step = read(*kind, &mut row).map_err(SequenceRowError::at(index))?;
            let done = sequence.pass(&step).map_err(|error| SequenceRowError::at(index)(error.into()))?;
            done.write(&mut out);
        }
        sequence.total().write(&mut out);
        Ok(finished(&row, &out)?)
    }

    /// Solves the chain for a number, on the ends of the bracket, the value wanted, the values of the entering stream and of each step in
    /// turn. Gives those of what was found, of what each step then does and of the total, and says how many they are.
    ///
    /// # Errors
    /// As [`SequenceRows::run`]; [`RowError::Misfit`] for more than [`MAX_STEPS`] steps.
    pub fn solve(self, wanted: Wanted, inputs: &[Value], outputs: &mut [Value]) -> Result<usize, SequenceRowError> {
        let mut row = self.row(inputs);
        let (low, high, value) = (row.number()?, row.number()?, row.number()?);
        let entering = WetStream::read(&mut row)?;
        let mut steps = [Step::Eliminate; MAX_STEPS];
        let chain = steps.get_mut(..self.kinds.len()).ok_or(RowError::Misfit)?;
        for (index, (step, kind)) in chain.iter_mut().zip(self.kinds).enumerate() {
            *step = read(*kind, &mut row).map_err(SequenceRowError::at(index))?;
        }
        let free = Free { step: wanted.step, number: wanted.number, low, high };
        let target = Target { after: wanted.after, quantity: wanted.quantity, value };
        let solved = solve(&entering, chain, &mut [], free, target)?;
        let mut out = room(outputs);
        solved.write(&mut out);
        let mut sequence = Sequence::new(&entering);
        for (step, process) in chain.iter().enumerate() {
            let done = sequence.pass(process).map_err(|error| SequenceError { step, error })?;
            done.write(&mut out);
        }
        sequence.total().write(&mut out);
        Ok(finished(&row, &out)?)
    }

    fn row<'a>(&self, inputs: &'a [Value]) -> Row<'a> {
        Row { source: Source::Values(inputs.iter()), formulation: self.formulation }
    }
}

fn room(outputs: &mut [Value]) -> Out<'_> {
    Out { places: Places::Values(outputs.iter_mut()), written: 0, is_short: false }
}

fn finished(row: &Row<'_>, out: &Out<'_>) -> Outcome<usize> {
    if row.is_finished() && !out.is_short { Ok(out.written) } else { Err(RowError::Misfit) }
}

/// A step of a kind, from its values in the order in which they stand here.
fn read(kind: i32, row: &mut Row<'_>) -> Outcome<Step> {
    Ok(match kind {
        1 => Step::ToTemperature(Argument::read(row)?),
        2 => Step::WithHeat(Argument::read(row)?),
        10 => Step::CoilToState { leaving: Argument::read(row)?, condensate: Argument::read(row)? },
        11 => Step::CoilToTemperature {
            leaving: Argument::read(row)?,
            relative_humidity: Argument::read(row)?,
            condensate: Argument::read(row)?,
        },
        12 => Step::CoilByBypassFactor {
            apparatus_dew_point: Argument::read(row)?,
            bypass_factor: Argument::read(row)?,
            condensate: Argument::read(row)?,
        },
        13 => Step::CoilWithWater {
            surface: Argument::read(row)?,
            water: Argument::read(row)?,
            condensate: Argument::read(row)?,
        },
        14 => Step::CoilWithReheat {
            target: Argument::read(row)?,
            coil_leaving: Argument::read(row)?,
            condensate: Argument::read(row)?,
        },
        20 => Step::Steam { flow: Argument::read(row)?, enthalpy: Argument::read(row)? },
        21 => Step::SteamToHumidityRatio { target: Argument::read(row)?, enthalpy: Argument::read(row)? },
        22 => Step::SteamToRelativeHumidity { target: Argument::read(row)?, enthalpy: Argument::read(row)? },
        23 => Step::Spray { flow: Argument::read(row)?, temperature: Argument::read(row)? },
        24 => Step::Evaporative { saturation_effectiveness: Argument::read(row)?, water: Argument::read(row)? },
        25 => Step::DirectCooler(Argument::read(row)?),
        26 => Step::Wash(Argument::read(row)?),
        30 => Step::Mix(Argument::read(row)?),
        31 => Step::Eliminate,
        40 => Step::Compress { pressure: Argument::read(row)?, leaving: Argument::read(row)? },
        61 => Step::IndirectCooler { secondary: Argument::read(row)?, cooler: Argument::read(row)? },
        70 => Step::Room(Argument::read(row)?),
        80 => Step::DesiccantToHumidityRatio { target: Argument::read(row)?, sorption: Argument::read(row)? },
        81 => Step::DesiccantByEffectiveness {
            effectiveness: Argument::read(row)?,
            driest: Argument::read(row)?,
            sorption: Argument::read(row)?,
        },
        other => return Err(RowError::Choice(other)),
    })
}

answers! {
    Loads, |x| {
        heating: x.heating,
        cooling: x.cooling,
        sensible_cooling: x.sensible_cooling,
        latent_cooling: x.latent_cooling,
        recovered: x.recovered,
        gains: x.gains,
        water_heat: x.water_heat,
        fan_work: x.fan_work,
        fan_power: x.fan_power,
        compression: x.compression,
        condensate: x.condensate,
        steam: x.steam,
        humidifying_water: x.humidifying_water,
        moisture_gain: x.moisture_gain,
        recovered_water: x.recovered_water,
        secondary_water: x.secondary_water,
        mixed_in: x.mixed_in,
    }
    StepResult, |x| {
        entering: x.entering,
        leaving: x.leaving,
        exchange: x.exchange,
        loads: x.loads,
        regime: x.regime,
        frost: x.frost,
        condenses: x.condenses,
        books: x.books,
    }
    Total, |x| { leaving: x.leaving, exchange: x.exchange, loads: x.loads, frost: x.frost, condenses: x.condenses, books: x.books }
    End, |x| { number: x.number, reached: x.reached }
    Solved, |x| {
        how: x.status,
        number: x.number,
        reached: x.reached,
        residual: x.residual,
        low: x.low,
        high: x.high,
        refused: x.refused,
        evaluations: f64::from(x.evaluations),
    }
}

statuses! {
    SolveStatus {
        "0 solved" => Solved,
        "1 no crossing" => NoCrossing,
        "2 jump" => Jump,
        "3 interrupted" => Interrupted,
    }
}

/// −1 for a step that is no coil.
impl Answer for Option<CoilRegime> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        <CoilRegime as Answer>::describe(walk, name);
    }

    fn write(&self, out: &mut Out<'_>) {
        match self {
            Some(regime) => regime.write(out),
            None => (-1.0_f64).write(out),
        }
    }
}

/// The code of the error and the step; 0 and −1 where nothing refused.
impl Answer for Option<SequenceError> {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.within(name, |walk| {
            walk.number("code", "1");
            walk.number("step", "1");
        });
    }

    fn write(&self, out: &mut Out<'_>) {
        let (code, step) =
            self.map_or((0, -1), |refused| (refused.error.code(), i32::try_from(refused.step).unwrap_or(i32::MAX)));
        f64::from(code).write(out);
        f64::from(step).write(out);
    }
}
