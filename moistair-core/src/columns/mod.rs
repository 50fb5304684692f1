//! Columns: slices in, slices out, a status for each row. [`StateColumns`] for states, [`ProcessColumns`] for every [`Process`].

mod process;

pub use process::{
    Field, MAX_INPUTS, MAX_OUTPUTS, MAX_STEPS, MAX_STREAMS, Process, ProcessColumns, RowError, SequenceRowError,
    SequenceRows, Value, Wanted,
};

use crate::basis::{Basis, Formulation};
use crate::bounds::Quantity;
use crate::error::Error;
use crate::quantity::{Pressure, Temperature};
use crate::state::MoistAir;

/// The one NaN that stands in an output without a value: quiet, positive, no payload.
pub const NAN: f64 = f64::from_bits(0x7ff8_0000_0000_0000);

/// An input of a column call: one value for every row, or a value for each row at a constant distance in memory.
#[derive(Clone, Copy, Debug)]
pub struct Column<'a> {
    values: &'a [f64],
    stride: usize,
}

impl<'a> Column<'a> {
    /// A value for each row.
    #[must_use]
    pub const fn new(values: &'a [f64]) -> Self {
        Self::strided(values, 1)
    }

    /// One value for every row.
    #[must_use]
    pub const fn constant(value: &'a f64) -> Self {
        Self::strided(core::slice::from_ref(value), 0)
    }

    /// The value of row `i` at `values[i * stride]`: one field of an array of records. Stride 0 is one value for every row.
    #[must_use]
    pub const fn strided(values: &'a [f64], stride: usize) -> Self {
        Self { values, stride }
    }

    /// The value of a row, if the column reaches so far.
    #[must_use]
    pub fn get(&self, row: usize) -> Option<f64> {
        row.checked_mul(self.stride).and_then(|place| self.values.get(place)).copied()
    }

    fn reaches(&self, rows: usize) -> bool {
        rows.checked_sub(1).is_none_or(|last| self.get(last).is_some())
    }
}

/// Columns that fix a state in each row: dry bulb, a second property, pressure.
#[derive(Clone, Copy, Debug)]
pub struct StateColumns<'a> {
    /// Dry bulb, °C.
    pub dry_bulb: Column<'a>,
    /// Which second property, as in [`MoistAir::from_dry_bulb_and`].
    pub property: Quantity,
    /// The second property, in the unit of [`Quantity::unit`].
    pub second: Column<'a>,
    /// Absolute pressure, Pa.
    pub pressure: Column<'a>,
    /// Formulation of all rows.
    pub formulation: Formulation,
}

/// How a column call went.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
#[must_use]
pub struct ColumnReport {
    /// Rows without a state, or with a state but without a value for one of the properties asked for.
    pub failed: usize,
    /// The first of them and what was wrong with it.
    pub first: Option<(usize, Error)>,
}

/// Why a column call does not begin.
#[derive(Clone, Copy, Debug, PartialEq, Eq, thiserror::Error)]
#[non_exhaustive]
pub enum ColumnMismatch {
    /// An input is shorter than the rows asked for.
    #[error("an input column is shorter than the rows asked for")]
    ShortInput,
    /// There are not as many inputs as the process takes.
    #[error("there are not as many input columns as the process takes")]
    InputCount,
    /// An output or the status column does not have one place for each row.
    #[error("an output column does not have one place for each row")]
    OutputLength,
    /// There is not one output for each property, or for each result of the process.
    #[error("there is not one output column for each result")]
    OutputCount,
    /// A property that cannot be read from a state, or a second property that does not fix one.
    #[error("selector {code} does not name what is needed here")]
    UnknownSelector {
        /// Its code.
        code: i32,
    },
}

impl StateColumns<'_> {
    /// Computes `properties` of each of `rows` states, each into its own output.
    ///
    /// A bad row costs only itself: NaN in the outputs that have no value there, its status in `status` if given (0, else
    /// [`Error::code`] of what was wrong first), the other rows untouched. Nothing is written when the columns do not fit.
    /// Results are those of the scalar calls, bit for bit.
    ///
    /// # Errors
    /// [`ColumnMismatch`] if lengths or selectors do not fit.
    ///
    /// ```
    /// use moistair_core::{Formulation, Quantity, columns::{Column, StateColumns}};
    /// let inputs = StateColumns {
    ///     dry_bulb: Column::new(&[20.0, 25.0, f64::NAN]),
    ///     property: Quantity::RelativeHumidity,
    ///     second: Column::constant(&0.5),
    ///     pressure: Column::constant(&101_325.0),
    ///     formulation: Formulation::RealGas,
    /// };
    /// let (mut wet_bulb, mut status) = ([0.0; 3], [0; 3]);
    /// let report = inputs.compute(3, &[Quantity::WetBulb], &mut [&mut wet_bulb], Some(&mut status))?;
    /// assert!(13.0 < wet_bulb[0] && wet_bulb[0] < wet_bulb[1] && wet_bulb[2].is_nan());
    /// assert_eq!((report.failed, status), (1, [0, 0, 201]));
    ///
    /// // An output that is too short is refused before anything is computed.
    /// assert!(inputs.compute(3, &[Quantity::DewPoint], &mut [&mut [0.0; 2]], None).is_err());
    /// # Ok::<(), moistair_core::columns::ColumnMismatch>(())
    /// ```
    pub fn compute(
        &self,
        rows: usize,
        properties: &[Quantity],
        outputs: &mut [&mut [f64]],
        status: Option<&mut [i32]>,
    ) -> Result<ColumnReport, ColumnMismatch> {
        self.check(rows, properties, outputs, status.as_deref())?;
        Ok(each_row(rows, status, |row| self.row(row, properties, outputs)))
    }

    fn check(
        &self,
        rows: usize,
        properties: &[Quantity],
        outputs: &[&mut [f64]],
        status: Option<&[i32]>,
    ) -> Result<(), ColumnMismatch> {
        let mut selectors = properties.iter().filter(|property| !property.is_property());
        if let Some(other) = selectors.next().or((!self.property.fixes_state()).then_some(&self.property)) {
            return Err(ColumnMismatch::UnknownSelector { code: other.code() });
        }
        if outputs.len() != properties.len() {
            return Err(ColumnMismatch::OutputCount);
        }
        let fits = |length| length == rows;
        if !(outputs.iter().all(|output| fits(output.len())) && status.is_none_or(|column| fits(column.len()))) {
            return Err(ColumnMismatch::OutputLength);
        }
        if ![self.dry_bulb, self.second, self.pressure].iter().all(|column| column.reaches(rows)) {
            return Err(ColumnMismatch::ShortInput);
        }
        Ok(())
    }

    /// One row: every output is written, what went wrong first is returned.
    fn row(&self, row: usize, properties: &[Quantity], outputs: &mut [&mut [f64]]) -> Result<(), Error> {
        let mut places = outputs.iter_mut().map(|output| output.get_mut(row));
        let mut write = |value| {
            if let Some(Some(place)) = places.next() {
                *place = value;
            }
        };
        match self.state(row) {
            Ok(air) => {
                let mut result = Ok(());
                air.values(properties.iter().copied(), |_, value| {
                    write(value.unwrap_or(NAN));
                    result = result.and(value.map(|_| ()));
                });
                result
            }
            Err(error) => {
                properties.iter().for_each(|_| write(NAN));
                Err(error)
            }
        }
    }

    fn state(&self, row: usize) -> Result<MoistAir, Error> {
        let missing = |quantity| Error::NotFinite { quantity };
        let dry_bulb = self.dry_bulb.get(row).ok_or(missing(Quantity::DryBulb))?;
        let second = self.second.get(row).ok_or(missing(self.property))?;
        let pressure = self.pressure.get(row).ok_or(missing(Quantity::Pressure))?;
        let basis = Basis::new(Pressure::from_pascals(pressure), self.formulation);
        MoistAir::from_dry_bulb_and(Temperature::from_celsius(dry_bulb), self.property, second, basis)
    }
}

/// Runs row after row and notes how each went.
fn each_row(
    rows: usize,
    mut status: Option<&mut [i32]>,
    mut run: impl FnMut(usize) -> Result<(), Error>,
) -> ColumnReport {
    let mut report = ColumnReport::default();
    for row in 0..rows {
        let result = run(row);
        if let Some(place) = status.as_deref_mut().and_then(|column| column.get_mut(row)) {
            *place = result.err().map_or(0, |error| error.code());
        }
        if let Err(error) = result {
            report.failed += 1;
            report.first = report.first.or(Some((row, error)));
        }
    }
    report
}

#[cfg(test)]
mod tests {
    use super::*;

    const ROWS: usize = 6;
    /// Row by row: usual, dry, hot, NaN, out of range, supersaturated.
    const DRY_BULB: [f64; ROWS] = [20.0, -5.0, 140.0, f64::NAN, 20.0, 20.0];
    const RATIO: [f64; ROWS] = [0.008, 0.0, 0.02, 0.008, -1.0, 0.9];
    const PROPERTIES: [Quantity; 3] = [Quantity::SpecificEnthalpy, Quantity::DewPoint, Quantity::RelativeHumidity];

    fn inputs<'a>(dry_bulb: Column<'a>, second: Column<'a>) -> StateColumns<'a> {
        StateColumns {
            dry_bulb,
            property: Quantity::HumidityRatio,
            second,
            pressure: Column::constant(&101_325.0),
            formulation: Formulation::RealGas,
        }
    }

    fn compute(inputs: &StateColumns) -> (ColumnReport, [[u64; ROWS]; 3], [i32; ROWS]) {
        let (mut a, mut b, mut c, mut status) = ([7.0; ROWS], [7.0; ROWS], [7.0; ROWS], [-1; ROWS]);
        let outputs: &mut [&mut [f64]] = &mut [&mut a, &mut b, &mut c];
        let report = inputs.compute(ROWS, &PROPERTIES, outputs, Some(&mut status)).unwrap();
        (report, [a, b, c].map(|column| column.map(f64::to_bits)), status)
    }

    #[test]
    fn rows_are_scalar_calls_bit_for_bit() {
        let (report, columns, status) = compute(&inputs(Column::new(&DRY_BULB), Column::new(&RATIO)));
        let mut failed = 0;
        for row in 0..ROWS {
            let air = MoistAir::from_dry_bulb_and(
                Temperature::from_celsius(DRY_BULB[row]),
                Quantity::HumidityRatio,
                RATIO[row],
                Pressure::from_pascals(101_325.0),
            );
            let mut first = air.err();
            for (column, property) in columns.iter().zip(PROPERTIES) {
                let value = air.and_then(|air| air.value(property));
                assert_eq!(column[row], value.unwrap_or(NAN).to_bits(), "row {row}, {property:?}");
                first = first.or(value.err());
            }
            assert_eq!(status[row], first.map_or(0, |error| error.code()), "row {row}");
            failed += usize::from(first.is_some());
        }
        assert_eq!(report.failed, failed);
        // Dry air at row 1: an enthalpy, but no dew point.
        assert_eq!((report.first.unwrap().0, status[1]), (1, 310));
        assert_ne!(columns[0][1], NAN.to_bits());
    }

    #[test]
    fn strides_read_a_field_of_records() {
        let mut records = [0.0; 3 * ROWS];
        for row in 0..ROWS {
            (records[3 * row + 1], records[3 * row + 2]) = (DRY_BULB[row], RATIO[row]);
        }
        let strided = inputs(Column::strided(&records[1..], 3), Column::strided(&records[2..], 3));
        let plain = inputs(Column::new(&DRY_BULB), Column::new(&RATIO));
        assert_eq!(compute(&strided).1, compute(&plain).1);
    }

    #[test]
    fn misfits_are_refused_before_anything_is_written() {
        let good = inputs(Column::new(&DRY_BULB), Column::new(&RATIO));
        let mut output = [7.0; ROWS];
        let mut refused = |inputs: &StateColumns, rows, properties: &[Quantity], status: Option<&mut [i32]>| {
            let error = inputs.compute(rows, properties, &mut [&mut output], status).unwrap_err();
            assert!(output.iter().all(|value| value.to_bits() == 7f64.to_bits()));
            error
        };
        let dew_point = [Quantity::DewPoint];
        let short = StateColumns { second: Column::new(&RATIO[1..]), ..good };
        assert_eq!(refused(&short, ROWS, &dew_point, None), ColumnMismatch::ShortInput);
        let far = StateColumns { second: Column::strided(&RATIO, usize::MAX), ..good };
        assert_eq!(refused(&far, ROWS, &dew_point, None), ColumnMismatch::ShortInput);
        assert_eq!(refused(&good, ROWS - 1, &dew_point, None), ColumnMismatch::OutputLength);
        assert_eq!(refused(&good, ROWS, &dew_point, Some(&mut [0; 2])), ColumnMismatch::OutputLength);
        assert_eq!(refused(&good, ROWS, &[], None), ColumnMismatch::OutputCount);
        let flow = refused(&good, ROWS, &[Quantity::HeatFlow], None);
        assert_eq!(flow, ColumnMismatch::UnknownSelector { code: 67 });
        let twice = StateColumns { property: Quantity::DryBulb, ..good };
        assert_eq!(refused(&twice, ROWS, &dew_point, None), ColumnMismatch::UnknownSelector { code: 0 });
    }

    #[test]
    fn no_rows_need_no_columns() {
        let empty = StateColumns { pressure: Column::new(&[]), ..inputs(Column::new(&[]), Column::new(&[])) };
        let report = empty.compute(0, &[Quantity::DewPoint], &mut [&mut []], Some(&mut [])).unwrap();
        assert_eq!(report, ColumnReport::default());
    }
}
