//! Columns of states and of processes.

mod process;
mod selectors;

pub use process::*;
pub use selectors::*;

use moistair_core::Quantity;
use moistair_core::columns::{Column, ColumnReport, StateColumns};

use crate::memory::{check, write};
use crate::quantity::{MOISTAIR_PROPERTY_COUNT, quantity};
use crate::state::{check_mask, formulation, properties};
use crate::status::{Failure, moistair_error};

const MOST: usize = MOISTAIR_PROPERTY_COUNT as usize;

/// An input column: the value of row i is values[i * stride]. Stride 1 is a plain array, stride 0 one value for every row, a larger one reads
/// a field of an array of records that are a whole number of doubles apart.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_column {
    /// The value of row 0; may be null when there are no rows.
    pub values: *const f64,
    /// Distance from row to row in doubles.
    pub stride: usize,
}

/// How a column call went.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_column_report {
    /// Rows that have no state, or no value for a property that was asked for.
    pub failed: usize,
    /// The first of them, from 0; the number of rows when there is none.
    pub first_failed: usize,
}

impl moistair_column_report {
    fn new(outcome: &ColumnReport, rows: usize) -> Self {
        Self { failed: outcome.failed, first_failed: outcome.first.map_or(rows, |(row, _)| row) }
    }
}

/// Properties of many states at once: row by row the same results, bit for bit, as the calls for one state. A bad row costs only itself.
///
/// rows: number of rows, 0 allowed; dry_bulb: [°C]; property: selector of the second property; second: its values; pressure: [Pa]; formulation: of
/// all rows; mask: which properties, the bit 1 << selector for each; outputs: array with the output column of each property at the place
/// of its selector (places not in mask are not read), each with room for rows doubles, NaN where there is no value; status: room for the
/// status of each row, may be null; report: output, may be null; error: the detail of the first row that failed, may be null.
/// Columns to be written may not overlap with any other memory of the call.
/// Returns 0 when every row is good, else the status of the first row that is not (2xx, 3xx; all outputs are written then as well); 101, 102,
/// 103, 104, 105 when an argument is wrong (nothing is written).
#[unsafe(no_mangle)]
#[allow(clippy::too_many_arguments, reason = "inputs, outputs, status: named by the header")]
pub unsafe extern "C" fn moistair_state_columns(
    rows: usize,
    dry_bulb: moistair_column,
    property: i32,
    second: moistair_column,
    pressure: moistair_column,
    formulation: i32,
    mask: u64,
    outputs: *const *mut f64,
    status: *mut i32,
    report: *mut moistair_column_report,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (property, formulation) = (quantity(property)?, self::formulation(formulation)?);
        check_mask(mask)?;
        check_rows(rows)?;
        // SAFETY: the caller's array of output columns.
        let selected = unsafe { Selected::new(rows, mask, outputs) }?;
        let reads = [dry_bulb.extent(rows)?, second.extent(rows)?, pressure.extent(rows)?, selected.array];
        let writes = [Extent::new(status, rows, true)?, Extent::new(report, 1, true)?, Extent::new(error, 1, true)?];
        apart(&[&selected.extents, &writes], &[&reads])?;
        // SAFETY: the caller's memory, not null and aligned.
        let inputs = unsafe {
            StateColumns {
                dry_bulb: dry_bulb.to_core(rows),
                property,
                second: second.to_core(rows),
                pressure: pressure.to_core(rows),
                formulation,
            }
        };
        // SAFETY: as above; what is written overlaps with nothing.
        let outcome = unsafe { selected.compute(&inputs, rows, status) }?;
        // SAFETY: the caller's pointer.
        unsafe { write(report, moistair_column_report::new(&outcome, rows)) };
        outcome.first.map_or(Ok(()), |(_, error)| Err(error.into()))
    };
    // SAFETY: the caller's pointer.
    unsafe { crate::memory::report(error, call) }
}

/// A piece of the caller's memory.
#[derive(Clone, Copy)]
struct Extent {
    start: usize,
    bytes: usize,
}

impl Extent {
    const NONE: Self = Self { start: 0, bytes: 0 };

    /// Checked: not null unless it is empty or `optional`, aligned, within the address space.
    fn new<T>(pointer: *const T, count: usize, optional: bool) -> Result<Self, Failure> {
        let bytes = count.checked_mul(size_of::<T>()).filter(|bytes| *bytes <= isize::MAX as usize);
        let bytes = bytes.ok_or(Failure::TooLong)?;
        if bytes == 0 || optional && pointer.is_null() {
            return Ok(Self::NONE);
        }
        check(pointer)?;
        let start = pointer.addr();
        start.checked_add(bytes).map(|_| Self { start, bytes }).ok_or(Failure::TooLong)
    }

    fn overlaps(&self, other: &Self) -> bool {
        let end = |extent: &Self| extent.start.saturating_add(extent.bytes);
        self.start < end(other) && other.start < end(self)
    }
}

/// Everything that is written has to be apart from everything else.
fn apart(writes: &[&[Extent]], reads: &[&[Extent]]) -> Result<(), Failure> {
    let written = writes.iter().copied().flatten();
    let read = reads.iter().copied().flatten();
    let are_apart = written.clone().enumerate().all(|(place, one)| {
        let mut others = written.clone().skip(place + 1).chain(read.clone());
        others.all(|other| !one.overlaps(other))
    });
    if are_apart { Ok(()) } else { Err(Failure::Overlapping) }
}

/// As many doubles as the address space has room for.
fn check_rows(rows: usize) -> Result<(), Failure> {
    if rows > isize::MAX as usize / size_of::<f64>() { Err(Failure::TooLong) } else { Ok(()) }
}

impl moistair_column {
    /// The doubles from the first row to the last.
    fn span(self, rows: usize) -> Result<usize, Failure> {
        let Some(last) = rows.checked_sub(1) else { return Ok(0) };
        last.checked_mul(self.stride).and_then(|distance| distance.checked_add(1)).ok_or(Failure::TooLong)
    }

    fn extent(self, rows: usize) -> Result<Extent, Failure> {
        Extent::new(self.values, self.span(rows)?, false)
    }

    /// # Safety
    /// `extent` has accepted the column.
    unsafe fn to_core<'a>(self, rows: usize) -> Column<'a> {
        let values = match self.span(rows) {
            // SAFETY: as the caller says, that many doubles.
            Ok(span) if span > 0 => unsafe { core::slice::from_raw_parts(self.values, span) },
            _ => &[],
        };
        Column::strided(values, self.stride)
    }
}

/// The output columns that a mask asks for, without gaps.
struct Selected {
    properties: [Quantity; MOST],
    columns: [*mut f64; MOST],
    extents: [Extent; MOST],
    array: Extent,
    count: usize,
}

impl Selected {
    /// # Safety
    /// `outputs` has a pointer at the place of each property of the mask.
    unsafe fn new(rows: usize, mask: u64, outputs: *const *mut f64) -> Result<Self, Failure> {
        let none = rows == 0 || mask == 0;
        let reach = if none { 0 } else { u64::BITS - mask.leading_zeros() };
        let mut selected = Self {
            properties: [Quantity::DryBulb; MOST],
            columns: [core::ptr::null_mut(); MOST],
            extents: [Extent::NONE; MOST],
            array: Extent::new(outputs, reach as usize, false)?,
            count: 0,
        };
        let extents = selected.extents.iter_mut();
        let places = selected.properties.iter_mut().zip(selected.columns.iter_mut()).zip(extents);
        for (property, ((name, column), extent)) in properties(mask).zip(places) {
            if !none {
                // SAFETY: the array is not null, aligned, and reaches beyond the highest property of the mask.
                *column = unsafe { outputs.add(property.code() as usize).read() };
                *extent = Extent::new(*column, rows, false)?;
            }
            *name = property;
            selected.count += 1;
        }
        Ok(selected)
    }

    /// # Safety
    /// The columns and `status` are exclusive.
    unsafe fn compute(self, inputs: &StateColumns, rows: usize, status: *mut i32) -> Result<ColumnReport, Failure> {
        // SAFETY: as the caller says.
        let mut columns = self.columns.map(|column| unsafe { slice(column, rows) }.unwrap_or_default());
        let (properties, columns) = (self.properties.get(..self.count), columns.get_mut(..self.count));
        // SAFETY: as the caller says.
        let status = unsafe { slice(status, rows) };
        Ok(inputs.compute(rows, properties.unwrap_or_default(), columns.unwrap_or_default(), status)?)
    }
}

/// # Safety
/// `pointer` is null or points to `count` elements that nothing else refers to.
unsafe fn slice<'a, T>(pointer: *mut T, count: usize) -> Option<&'a mut [T]> {
    match (pointer.is_null(), count) {
        (true, _) => None,
        (false, 0) => Some(&mut []),
        // SAFETY: as the caller says.
        _ => Some(unsafe { core::slice::from_raw_parts_mut(pointer, count) }),
    }
}

const _: () = assert!(
    size_of::<moistair_column>() == 2 * size_of::<usize>()
        && size_of::<moistair_column_report>() == 2 * size_of::<usize>()
);
