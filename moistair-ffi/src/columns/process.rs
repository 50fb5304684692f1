//! Columns of processes.

use core::ffi::c_char;

use moistair_core::columns::{
    Column, ColumnReport, Field, MAX_INPUTS, MAX_OUTPUTS, MAX_STREAMS, Process, ProcessColumns,
};
use moistair_core::{Error, Formulation};

use super::{Extent, apart, check_rows, moistair_column, moistair_column_report, slice};
use crate::memory::{Answer, answer, write};
use crate::state::formulation;
use crate::status::{Failure, moistair_error};
use crate::text::{Text, texts};

/// What a column of a process holds.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_field {
    /// Its name, with those of the records that it stands in, such as "leaving.air.dry_bulb".
    pub name: [c_char; 64],
    /// Its unit, UTF-8, such as "°C"; "choice: " with the meaning of each code; "flag" for 0 or 1.
    pub unit: [c_char; 128],
}

impl moistair_field {
    fn new(field: Field) -> Self {
        let name = field.path().enumerate().flat_map(|(depth, part)| {
            let point = if depth > 0 { "." } else { "" };
            point.bytes().chain(part.bytes())
        });
        Self { name: terminated(name), unit: terminated(field.unit().bytes()) }
    }
}

/// What fits, and the terminator. That all texts fit is tested.
fn terminated<const ROOM: usize>(bytes: impl Iterator<Item = u8>) -> [c_char; ROOM] {
    let mut text = [0; ROOM];
    for (place, byte) in text.iter_mut().take(ROOM - 1).zip(bytes) {
        *place = byte as c_char;
    }
    text
}

impl Answer for moistair_field {
    fn is_finite(&self) -> bool {
        true
    }
}

fn process(selector: i32) -> Result<Process, Failure> {
    Process::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

/// The name of a process, its trade and what is done, such as "coil.to_state": static. Empty for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_process_name(process: i32) -> *const c_char {
    let place = Process::ALL.iter().position(|one| one.code() == process);
    place.and_then(|place| texts!(Process, Text::new, name).get(place)).map_or(c"".as_ptr(), Text::as_ptr)
}

/// How many columns a process takes, with those that repeat counted once; 0 for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_process_input_count(process: i32) -> usize {
    Process::from_code(process).map_or(0, Process::input_count)
}

/// How many of the last columns that a process takes are a group that may stand there any number of times, from none to 32 times: the streams
/// that are mixed. 0 for most processes and for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_process_repeated_count(process: i32) -> usize {
    Process::from_code(process).map_or(0, Process::repeated)
}

/// How many columns a process gives; 0 for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_process_output_count(process: i32) -> usize {
    Process::from_code(process).map_or(0, Process::output_count)
}

/// What a column that a process takes holds.
///
/// process: selector; place: of the column, from 0 to one less than moistair_process_input_count; field: output; error: may be null.
/// Returns 0, 101, 102 (also for a place that it does not have), 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_process_input(
    process: i32,
    place: usize,
    field: *mut moistair_field,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { answer(field, error, || described(process, Process::input, place)) }
}

/// What a column that a process gives holds.
///
/// process: selector; place: of the column, from 0 to one less than moistair_process_output_count; field: output; error: may be null.
/// Returns 0, 101, 102 (also for a place that it does not have), 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_process_output(
    process: i32,
    place: usize,
    field: *mut moistair_field,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { answer(field, error, || described(process, Process::output, place)) }
}

fn described(
    selector: i32,
    field: fn(Process, usize) -> Option<Field>,
    place: usize,
) -> Result<moistair_field, Failure> {
    let missing = || Failure::UnknownSelector(i32::try_from(place).unwrap_or(i32::MAX));
    field(process(selector)?, place).map(moistair_field::new).ok_or_else(missing)
}

/// A process on many rows at once: row by row the same results, bit for bit, as its call for one row. A bad row costs only itself.
///
/// The constants MOISTAIR_PROCESS_… say what each column holds. A state is three columns: dry bulb [°C], humidity ratio [kg/kg], pressure [Pa];
/// its formulation is that of the call. Choices and statuses are whole numbers.
///
/// rows: number of rows, 0 allowed; process: MOISTAIR_PROCESS_…; inputs: the columns that it takes; input_count: how many they are,
/// moistair_process_input_count unless a group repeats; formulation: of all rows; outputs: array with the output column of each result, each with
/// room for rows doubles, null where it is not wanted, NaN where there is no value; output_count: moistair_process_output_count; status:
/// room for the status of each row (102 for a choice that its input does not have), may be null; report: output, may be null; error: the
/// detail of the first row that failed, may be null. Columns to be written may not overlap with any other memory of the call. With no rows
/// the arrays are not read and may be null. Takes up to 50 kB of stack on a machine of 64 bits.
/// Returns 0 when every row is good, else the status of the first row that is not (all outputs and report are written then as well); 101,
/// 102, 103, 104, 105, 107 when an argument is wrong (nothing is written). Where 102 may be either, report tells: it is written only when the rows
/// have been run.
#[unsafe(no_mangle)]
#[allow(clippy::too_many_arguments, reason = "inputs, outputs, status: named by the header")]
pub unsafe extern "C" fn moistair_process_columns(
    rows: usize,
    process: i32,
    inputs: *const moistair_column,
    input_count: usize,
    formulation: i32,
    outputs: *const *mut f64,
    output_count: usize,
    status: *mut i32,
    report: *mut moistair_column_report,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (process, formulation) = (self::process(process)?, self::formulation(formulation)?);
        check_counts(process, input_count, output_count)?;
        check_rows(rows)?;
        // SAFETY: the caller's arrays of columns.
        let (read, written) =
            unsafe { (Inputs::new(rows, inputs, input_count)?, Outputs::new(rows, outputs, output_count)?) };
        let others = [Extent::new(status, rows, true)?, Extent::new(report, 1, true)?, Extent::new(error, 1, true)?];
        apart(&[written.extents(), &others], &[read.extents(), &[read.array, written.array]])?;
        // SAFETY: the caller's memory, not null unless it may be, and aligned; what is written overlaps with nothing.
        let outcome = unsafe { run(process, formulation, rows, &read, &written, status) }?;
        // SAFETY: the caller's pointer.
        unsafe { write(report, moistair_column_report::new(&outcome, rows)) };
        outcome.first.map_or(Ok(()), |(_, error)| {
            Err(match error {
                Error::UnknownSelector { code } => Failure::UnknownSelector(code),
                other => other.into(),
            })
        })
    };
    // SAFETY: the caller's pointer.
    unsafe { crate::memory::report(error, call) }
}

fn check_counts(process: Process, inputs: usize, outputs: usize) -> Result<(), Failure> {
    let (group, gives) = (process.repeated(), process.output_count());
    if !process.takes(inputs) {
        let fewest = process.input_count().saturating_sub(group);
        return Err(Failure::WrongCount { given: inputs, fewest, most: fewest + group * MAX_STREAMS });
    }
    if outputs == gives { Ok(()) } else { Err(Failure::WrongCount { given: outputs, fewest: gives, most: gives }) }
}

/// # Safety
/// `inputs` and `outputs` are checked; they and `status`, which is null or has room for every row, are apart.
unsafe fn run(
    process: Process,
    formulation: Formulation,
    rows: usize,
    inputs: &Inputs,
    outputs: &Outputs,
    status: *mut i32,
) -> Result<ColumnReport, Failure> {
    let mut columns = [Column::new(&[]); MAX_INPUTS];
    for (place, column) in columns.iter_mut().zip(inputs.columns()) {
        // SAFETY: its extent has been accepted.
        *place = unsafe { column.to_core(rows) };
    }
    // SAFETY: null, or as long as there are rows, and apart from everything else.
    let mut places = outputs.columns.map(|column| unsafe { slice(column, rows) });
    let inputs = columns.get(..inputs.count).unwrap_or_default();
    let places = places.get_mut(..outputs.count).unwrap_or_default();
    // SAFETY: as the caller says.
    let status = unsafe { slice(status, rows) };
    Ok(ProcessColumns { process, inputs, formulation }.compute(rows, places, status)?)
}

/// The columns that a call reads.
struct Inputs {
    columns: [moistair_column; MAX_INPUTS],
    extents: [Extent; MAX_INPUTS],
    array: Extent,
    count: usize,
}

impl Inputs {
    /// # Safety
    /// `inputs` points to `count` columns, unless there are no rows.
    unsafe fn new(rows: usize, inputs: *const moistair_column, count: usize) -> Result<Self, Failure> {
        let none = moistair_column { values: core::ptr::null(), stride: 0 };
        let array = Extent::new(inputs, if rows == 0 { 0 } else { count }, false)?;
        let mut read = Self { columns: [none; MAX_INPUTS], extents: [Extent::NONE; MAX_INPUTS], array, count };
        if rows > 0 {
            let places = read.columns.iter_mut().zip(read.extents.iter_mut()).take(count);
            for (place, (column, extent)) in places.enumerate() {
                // SAFETY: the array is not null, aligned, and has that many columns.
                *column = unsafe { inputs.add(place).read() };
                *extent = column.extent(rows)?;
            }
        }
        Ok(read)
    }

    fn columns(&self) -> &[moistair_column] {
        self.columns.get(..self.count).unwrap_or_default()
    }

    fn extents(&self) -> &[Extent] {
        self.extents.get(..self.count).unwrap_or_default()
    }
}

/// The columns that a call writes.
struct Outputs {
    columns: [*mut f64; MAX_OUTPUTS],
    extents: [Extent; MAX_OUTPUTS],
    array: Extent,
    count: usize,
}

impl Outputs {
    /// # Safety
    /// `outputs` points to `count` pointers, unless there are no rows.
    unsafe fn new(rows: usize, outputs: *const *mut f64, count: usize) -> Result<Self, Failure> {
        let array = Extent::new(outputs, if rows == 0 { 0 } else { count }, false)?;
        let columns = [core::ptr::null_mut(); MAX_OUTPUTS];
        let mut written = Self { columns, extents: [Extent::NONE; MAX_OUTPUTS], array, count };
        if rows > 0 {
            let places = written.columns.iter_mut().zip(written.extents.iter_mut()).take(count);
            for (place, (column, extent)) in places.enumerate() {
                // SAFETY: the array is not null, aligned, and has that many pointers.
                *column = unsafe { outputs.add(place).read() };
                *extent = Extent::new(*column, rows, true)?;
            }
        }
        Ok(written)
    }

    fn extents(&self) -> &[Extent] {
        self.extents.get(..self.count).unwrap_or_default()
    }
}

const _: () = assert!(size_of::<moistair_field>() == 192);
