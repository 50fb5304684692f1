//! Processes in columns: every process by its selector, with numbers in and numbers out.

mod air;
mod books;
mod coil;
mod compression;
mod desiccant;
mod economizer;
mod evaporative;
mod humidify;
mod mixing;
mod reheat;
mod room;
mod row;
mod sensible;
mod sequence;
mod stream;
mod tower;

pub use row::{Field, RowError, Value};
pub use sequence::{MAX_STEPS, SequenceRowError, SequenceRows, Wanted};
pub use stream::MAX_STREAMS;

use row::{Out, Outcome, Places, Row, Source, Walk};

use super::{Column, ColumnMismatch, ColumnReport, NAN, each_row};
use crate::basis::Formulation;
use crate::error::Error;

/// Room for the numbers that any process takes.
pub const MAX_INPUTS: usize = 32 + 6 * MAX_STREAMS;

/// Room for the numbers that any process gives.
pub const MAX_OUTPUTS: usize = 64;

/// The catalogue, trade by trade; each has a hundred codes of its own.
const TRADES: &[&[Entry]] = &[
    air::ENTRIES,
    stream::ENTRIES,
    sensible::ENTRIES,
    coil::ENTRIES,
    mixing::ENTRIES,
    humidify::ENTRIES,
    tower::ENTRIES,
    compression::ENTRIES,
    books::ENTRIES,
    reheat::ENTRIES,
    room::ENTRIES,
    desiccant::ENTRIES,
    evaporative::ENTRIES,
    economizer::ENTRIES,
];

struct Entry {
    code: i32,
    name: &'static str,
    inputs: fn(&mut Walk<'_>),
    outputs: fn(&mut Walk<'_>),
    run: fn(&mut Row<'_>, &mut Out<'_>) -> Outcome,
}

/// A process that works on rows of numbers.
///
/// A state of moist air is three numbers: dry bulb, humidity ratio, pressure; its formulation is that of the call. Values are those of the
/// typed functions in [`crate::process`], bit for bit.
///
/// ```
/// use moistair_core::{Formulation, columns::Process};
/// let heater = Process::from_name("sensible.with_heat").unwrap();
/// assert_eq!(heater.input(3).unwrap().to_string(), "entering.dry_air_flow");
/// assert_eq!(heater.output(0).unwrap().to_string(), "leaving.air.dry_bulb");
///
/// let mut leaving = [0.0; 8];
/// heater.evaluate(Formulation::RealGas, &[20.0, 0.008, 101_325.0, 1.0, 10_000.0], &mut leaving)?;
/// assert!(29.7 < leaving[0] && leaving[0] < 29.9);
/// // More vapor than the air can hold.
/// assert!(heater.evaluate(Formulation::RealGas, &[20.0, 0.8, 101_325.0, 1.0, 10_000.0], &mut leaving).is_err());
/// # Ok::<(), moistair_core::columns::RowError>(())
/// ```
#[derive(Clone, Copy)]
pub struct Process(&'static Entry);

/// How many there are.
const COUNT: usize = {
    let (mut count, mut trade) = (0, 0);
    while trade < TRADES.len() {
        #[allow(clippy::indexing_slicing, reason = "evaluated at compile time")]
        {
            count += TRADES[trade].len();
        }
        trade += 1;
    }
    count
};

impl Process {
    /// All of them, trade by trade, in the order of their codes there.
    #[allow(clippy::indexing_slicing, reason = "evaluated at compile time")]
    pub const ALL: [Self; COUNT] = {
        let mut all = [Self(&TRADES[0][0]); COUNT];
        let (mut place, mut trade) = (0, 0);
        while trade < TRADES.len() {
            let mut entry = 0;
            while entry < TRADES[trade].len() {
                all[place] = Self(&TRADES[trade][entry]);
                place += 1;
                entry += 1;
            }
            trade += 1;
        }
        all
    };

    /// The process with a given code.
    #[must_use]
    pub fn from_code(code: i32) -> Option<Self> {
        Self::ALL.into_iter().find(|process| process.0.code == code)
    }

    /// The process with a given name, such as `coil.to_state`.
    #[must_use]
    pub fn from_name(name: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|process| process.0.name == name)
    }

    /// The stable code, never re-used.
    #[must_use]
    pub const fn code(self) -> i32 {
        self.0.code
    }

    /// The trade and what is done, with a point between them.
    #[must_use]
    pub const fn name(self) -> &'static str {
        self.0.name
    }

    /// How many numbers it takes, with a repeated group counted once.
    #[must_use]
    pub fn input_count(self) -> usize {
        walk(self.0.inputs, &mut |_| ()).0
    }

    /// How many of the last inputs are a group that may stand there any number of times, none and [`MAX_STREAMS`] included: the streams that
    /// are mixed. 0 for most processes.
    #[must_use]
    pub fn repeated(self) -> usize {
        walk(self.0.inputs, &mut |_| ()).1
    }

    /// How many numbers it gives.
    #[must_use]
    pub fn output_count(self) -> usize {
        walk(self.0.outputs, &mut |_| ()).0
    }

    /// What an input is.
    #[must_use]
    pub fn input(self, place: usize) -> Option<Field> {
        field(self.0.inputs, place)
    }

    /// What an output is.
    #[must_use]
    pub fn output(self, place: usize) -> Option<Field> {
        field(self.0.outputs, place)
    }

    /// Whether it takes so many numbers.
    #[must_use]
    pub fn takes(self, count: usize) -> bool {
        let (once, group) = walk(self.0.inputs, &mut |_| ());
        match count.checked_sub(once.saturating_sub(group)) {
            Some(rest) if group > 0 => rest % group == 0 && rest / group <= MAX_STREAMS,
            rest => rest == Some(0),
        }
    }

    /// Runs it on the numbers of a row. Outputs without a meaning there, such as the sensible heat ratio without a load, are NaN.
    ///
    /// # Errors
    /// What the process says; [`RowError::Choice`]; [`RowError::Misfit`] unless there are as many inputs and outputs as it has. What the
    /// outputs hold then is of no use.
    pub fn evaluate(self, formulation: Formulation, inputs: &[f64], outputs: &mut [f64]) -> Result<(), RowError> {
        let row = Row { source: Source::Numbers(inputs.iter()), formulation };
        let room = outputs.len();
        let written = self.run(row, Places::Numbers(outputs.iter_mut()))?;
        if written == room { Ok(()) } else { Err(RowError::Misfit) }
    }

    /// The same where states are at hand as such, each of its own formulation: as many values as [`Process::evaluate`] takes, each state in
    /// place of its three numbers. Returns how many values it gave.
    ///
    /// # Errors
    /// As [`Process::evaluate`].
    pub fn evaluate_values(
        self,
        formulation: Formulation,
        inputs: &[Value],
        outputs: &mut [Value],
    ) -> Result<usize, RowError> {
        let row = Row { source: Source::Values(inputs.iter()), formulation };
        self.run(row, Places::Values(outputs.iter_mut()))
    }

    fn run(self, mut row: Row<'_>, places: Places<'_>) -> Outcome<usize> {
        let mut out = Out { places, written: 0, is_short: false };
        (self.0.run)(&mut row, &mut out)?;
        if row.is_finished() && !out.is_short { Ok(out.written) } else { Err(RowError::Misfit) }
    }
}

impl PartialEq for Process {
    fn eq(&self, other: &Self) -> bool {
        self.code() == other.code()
    }
}

impl Eq for Process {}

impl core::fmt::Debug for Process {
    fn fmt(&self, f: &mut core::fmt::Formatter<'_>) -> core::fmt::Result {
        f.debug_tuple("Process").field(&self.code()).field(&self.name()).finish()
    }
}

/// Visits the fields; returns how many there are and how many of the last repeat.
fn walk(fields: fn(&mut Walk<'_>), visit: &mut dyn FnMut(Field)) -> (usize, usize) {
    let mut count = 0;
    let mut visit = |field| {
        count += 1;
        visit(field);
    };
    let mut walk = Walk::new(&mut visit);
    fields(&mut walk);
    let repeated = walk.repeated;
    (count, repeated)
}

fn field(fields: fn(&mut Walk<'_>), place: usize) -> Option<Field> {
    let (mut found, mut next) = (None, 0);
    walk(fields, &mut |field| {
        if next == place {
            found = Some(field);
        }
        next += 1;
    });
    found
}

/// Columns of what a process takes.
#[derive(Clone, Copy, Debug)]
pub struct ProcessColumns<'a> {
    /// The process.
    pub process: Process,
    /// A column for each input, [`Process::input`] says which.
    pub inputs: &'a [Column<'a>],
    /// Formulation of all states of all rows.
    pub formulation: Formulation,
}

impl ProcessColumns<'_> {
    /// Runs the process on each of `rows` rows, each result into its own output; `None` is an output that is not wanted.
    ///
    /// A bad row costs only itself: NaN in its outputs, its status in `status` if given (0, else [`Error::code`]; 102 for a choice that its
    /// input does not have), the other rows untouched. Nothing is written when the columns do not fit.
    ///
    /// # Errors
    /// [`ColumnMismatch`] if counts or lengths do not fit.
    ///
    /// ```
    /// use moistair_core::{Formulation, columns::{Column, Process, ProcessColumns}};
    /// let (dry_bulb, heat) = ([20.0, 25.0, 30.0], [5_000.0, f64::NAN, 0.0]);
    /// let inputs = [
    ///     Column::new(&dry_bulb),
    ///     Column::constant(&0.008),
    ///     Column::constant(&101_325.0),
    ///     Column::constant(&1.0),
    ///     Column::new(&heat),
    /// ];
    /// let heater = ProcessColumns {
    ///     process: Process::from_name("sensible.with_heat").unwrap(),
    ///     inputs: &inputs,
    ///     formulation: Formulation::RealGas,
    /// };
    /// let (mut leaving, mut status) = ([0.0; 3], [0; 3]);
    /// let mut outputs = [Some(&mut leaving[..]), None, None, None, None, None, None, None];
    /// let report = heater.compute(3, &mut outputs, Some(&mut status))?;
    /// assert!(24.8 < leaving[0] && leaving[0] < 25.0 && leaving[1].is_nan() && leaving[2] == 30.0);
    /// assert_eq!((report.failed, status), (1, [0, 201, 0]));
    ///
    /// // An output of which nothing is said is refused before anything is computed.
    /// assert!(heater.compute(3, &mut [None], None).is_err());
    /// # Ok::<(), moistair_core::columns::ColumnMismatch>(())
    /// ```
    pub fn compute(
        &self,
        rows: usize,
        outputs: &mut [Option<&mut [f64]>],
        status: Option<&mut [i32]>,
    ) -> Result<ColumnReport, ColumnMismatch> {
        self.check(rows, outputs, status.as_deref())?;
        let count = self.process.output_count();
        let (mut numbers, mut values) = ([NAN; MAX_INPUTS], [NAN; MAX_OUTPUTS]);
        Ok(each_row(rows, status, |row| {
            let result = self.row(row, &mut numbers, values.get_mut(..count).unwrap_or_default());
            for (output, value) in outputs.iter_mut().zip(values) {
                if let Some(place) = output.as_deref_mut().and_then(|output| output.get_mut(row)) {
                    *place = if result.is_ok() { value } else { NAN };
                }
            }
            result.map_err(|error| match error {
                RowError::Process(error) => error,
                RowError::Choice(code) => Error::UnknownSelector { code },
                // The check has ruled it out.
                RowError::Misfit => Error::UnknownSelector { code: self.process.code() },
            })
        }))
    }

    fn check(&self, rows: usize, outputs: &[Option<&mut [f64]>], status: Option<&[i32]>) -> Result<(), ColumnMismatch> {
        if !self.process.takes(self.inputs.len()) {
            return Err(ColumnMismatch::InputCount);
        }
        if outputs.len() != self.process.output_count() {
            return Err(ColumnMismatch::OutputCount);
        }
        let fits = |length| length == rows;
        let wanted = outputs.iter().flatten();
        if !(wanted.map(|output| output.len()).all(fits) && status.is_none_or(|column| fits(column.len()))) {
            return Err(ColumnMismatch::OutputLength);
        }
        if !self.inputs.iter().all(|column| column.reaches(rows)) {
            return Err(ColumnMismatch::ShortInput);
        }
        Ok(())
    }

    fn row(&self, row: usize, numbers: &mut [f64], outputs: &mut [f64]) -> Result<(), RowError> {
        for (number, column) in numbers.iter_mut().zip(self.inputs) {
            *number = column.get(row).ok_or(RowError::Misfit)?;
        }
        let numbers = numbers.get(..self.inputs.len()).ok_or(RowError::Misfit)?;
        self.process.evaluate(self.formulation, numbers, outputs)
    }
}

#[cfg(test)]
mod tests;
