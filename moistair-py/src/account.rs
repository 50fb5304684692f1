//! Totals over time, counts, and how well the books close.

use moistair_core::account::{self, Rule};
use moistair_core::columns::{Column, NAN};
use moistair_core::process::books::Books;
use moistair_core::signal::{Quality, Reason};
use moistair_core::{HeatFlow, MassFlow};
use pyo3::exceptions::{PyTypeError, PyValueError};
use pyo3::prelude::*;

use crate::column::{self, Arguments};
use crate::economizer::EconomizerState;
use crate::error::internal;
use crate::owned::{Samples, coded, member, number, owned, qualities, quality_code, restored};
use crate::signal::{ChannelState, Checked, CheckedColumns};

const MODULE: &str = "moistair.account";

/// A compensated sum (Neumaier 1974): what rounding takes from each addition is kept and added at the end.
///
/// Examples
/// --------
/// >>> from moistair.account import Sum
/// >>> total = Sum()
/// >>> [total.add(term) for term in (1.0, 1e100, 1.0, -1e100)]
/// [True, True, True, True]
/// >>> total.value
/// 2.0
#[pyclass(module = "moistair.account")]
pub struct Sum(account::Sum);

owned!(Sum, {
    #[new]
    fn new() -> Self {
        Self(account::Sum::default())
    }

    /// Adds a term; False, and nothing changes, when the term or the new sum is not finite.
    fn add(&mut self, term: f64) -> bool {
        self.0.add(term)
    }

    /// Adds another sum; False, and nothing changes, when the result is not finite.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<bool> {
        let other = other.try_borrow()?.0;
        Ok(slf.try_borrow_mut()?.0.merge(&other))
    }

    /// The sum.
    #[getter]
    fn value(&self) -> f64 {
        self.0.value()
    }
});

/// The total of a rate over time (J from W, kg from kg/s), with its sign parts, its extremes and its coverage.
///
/// Add rates that were computed sample by sample, never a rate of averaged inputs: what moist air does is not linear. The
/// same class gives the mean of a state. Use it in one thread at a time.
///
/// Parameters
/// ----------
/// rule : Rule
///     What the rate does between two samples.
/// longest_step : float
///     The longest step that is bridged, s.
///
/// Examples
/// --------
/// 2 kW for a minute, then −1 kW for a minute; then five minutes without a sample.
///
/// >>> from moistair.account import Rule, Total
/// >>> heat = Total(rule=Rule.STEP, longest_step=90.0)
/// >>> heat.add(time=0.0, rate=2000.0).name
/// 'STARTED'
/// >>> heat.add(time=[60.0, 120.0, 420.0], rate=[-1000.0, 500.0, 500.0])
/// array([1, 1, 3], dtype=int32)
/// >>> heat.total, heat.positive, heat.negative, heat.mean
/// (60000.0, 120000.0, -60000.0, 500.0)
#[pyclass(module = "moistair.account")]
pub struct Total(account::Total);

owned!(Total, {
    #[new]
    #[pyo3(signature = (*, rule, longest_step))]
    fn new(rule: i32, longest_step: f64) -> PyResult<Self> {
        Ok(Self(account::Total::new(coded(rule, Rule::from_code, "rule")?, longest_step)))
    }

    /// Takes the next sample, or the samples of a column one after the other.
    ///
    /// Parameters
    /// ----------
    /// time : float or array_like
    ///     s since any fixed instant.
    /// rate : float or array_like
    ///     A rate that is not finite leaves a hole, none of it counted as zero.
    /// quality : Quality or array_like of int
    ///     Whether the rate can be trusted; good by default.
    ///
    /// Returns
    /// -------
    /// Added or numpy.ndarray
    ///     What became of the time before the sample; an int32 array of codes for a column.
    #[pyo3(signature = (*, time, rate, quality=None))]
    fn add<'py>(
        &mut self,
        py: Python<'py>,
        time: Bound<'py, PyAny>,
        rate: Bound<'py, PyAny>,
        quality: Option<Bound<'py, PyAny>>,
    ) -> PyResult<Bound<'py, PyAny>> {
        let values = [time, rate, quality_or_good(py, quality)?];
        let Some(samples) = Samples::read(py, &NAMES, &values)? else {
            let (time, rate, quality) = sample(&values)?;
            return member(py, MODULE, "Added", self.0.add(time, rate, quality).code());
        };
        let columns = samples.columns()?;
        qualities(&columns[2], samples.len())?;
        let mut added = column::blank(samples.len(), 0)?;
        py.detach(|| {
            for (row, place) in added.iter_mut().enumerate() {
                let (time, rate, quality) = sample_at(&columns, row);
                *place = self.0.add(time, rate, quality).code();
            }
        });
        let shape = [added.len()];
        column::array(py, added, &shape)
    }

    /// Adds a total of another time or place, an hour to a day; False, and nothing changes, when the sum is not finite.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<bool> {
        let other = other.try_borrow()?.0;
        Ok(slf.try_borrow_mut()?.0.merge(&other))
    }

    /// The total: rate × s.
    #[getter]
    fn total(&self) -> f64 {
        self.0.total()
    }

    /// The part with a positive rate, ≥ 0.
    #[getter]
    fn positive(&self) -> f64 {
        self.0.positive()
    }

    /// The part with a negative rate, ≤ 0.
    #[getter]
    fn negative(&self) -> f64 {
        self.0.negative()
    }

    /// Mean rate over the covered time; None when nothing is covered.
    #[getter]
    fn mean(&self) -> Option<f64> {
        self.0.mean()
    }

    /// Lowest rate in the covered time; None when nothing is covered.
    #[getter]
    fn lowest(&self) -> Option<f64> {
        self.0.lowest()
    }

    /// Highest rate in the covered time, a peak demand; None when nothing is covered.
    #[getter]
    fn highest(&self) -> Option<f64> {
        self.0.highest()
    }

    /// Time that the total stands for, s.
    #[getter]
    fn covered_seconds(&self) -> f64 {
        self.0.covered_seconds()
    }

    /// Part of the covered time that rests on repaired samples, s.
    #[getter]
    fn repaired_seconds(&self) -> f64 {
        self.0.repaired_seconds()
    }

    /// Time from the first to the last sample, gaps included, s.
    #[getter]
    fn elapsed_seconds(&self) -> f64 {
        self.0.elapsed_seconds()
    }

    /// Covered over elapsed time, 0 to 1; 0 when no time has passed.
    #[getter]
    fn coverage(&self) -> f64 {
        self.0.coverage()
    }

    /// Covered time over a duration that the caller knows, s: a day, of which a total may have seen a part.
    fn coverage_of(&self, duration: f64) -> f64 {
        self.0.coverage_of(duration)
    }

    /// What the rate does between two samples.
    #[getter]
    fn rule<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Rule", self.0.rule().code())
    }

    /// The longest step that is bridged, s.
    #[getter]
    fn longest_step(&self) -> f64 {
        self.0.longest_step()
    }

    fn __repr__(&self) -> String {
        format!("<Total {:?} over {:?} s, coverage {:.4}>", self.0.total(), self.0.covered_seconds(), self.0.coverage())
    }
});

/// Cuts a total at the multiples of a period: hours, days, demand windows.
///
/// The span between two samples on either side of a boundary is shared out by the rule. A span longer than a period is a gap.
/// Periods that lie in a gap as a whole are not reported.
///
/// Parameters
/// ----------
/// length : float
///     s; each period begins at a multiple of it.
/// rule : Rule
///     What the rate does between two samples.
/// longest_step : float
///     The longest step that is bridged, s.
///
/// Examples
/// --------
/// >>> from moistair.account import Periods, Rule
/// >>> hours = Periods(length=3600.0, rule=Rule.STEP, longest_step=1800.0)
/// >>> (hour,) = hours.add(time=[1800.0, 3000.0, 4200.0], rate=[10.0, 20.0, 30.0])
/// >>> hour.start, hour.total.coverage, hours.current.total
/// (0.0, 0.5, 12000.0)
#[pyclass(module = "moistair.account")]
pub struct Periods(account::Periods);

owned!(Periods, {
    #[new]
    #[pyo3(signature = (*, length, rule, longest_step))]
    fn new(length: f64, rule: i32, longest_step: f64) -> PyResult<Self> {
        let empty = account::Total::new(coded(rule, Rule::from_code, "rule")?, longest_step);
        Ok(Self(account::Periods::new(length, empty)))
    }

    /// Takes the next sample, or the samples of a column one after the other, as `Total.add`; returns the periods that are finished by it.
    #[pyo3(signature = (*, time, rate, quality=None))]
    fn add<'py>(
        &mut self,
        py: Python<'py>,
        time: Bound<'py, PyAny>,
        rate: Bound<'py, PyAny>,
        quality: Option<Bound<'py, PyAny>>,
    ) -> PyResult<Vec<Period>> {
        let values = [time, rate, quality_or_good(py, quality)?];
        let Some(samples) = Samples::read(py, &NAMES, &values)? else {
            let (time, rate, quality) = sample(&values)?;
            return Ok(self.0.add(time, rate, quality).map(Period).into_iter().collect());
        };
        let columns = samples.columns()?;
        qualities(&columns[2], samples.len())?;
        let rows = samples.len();
        Ok(py.detach(|| {
            let rows = (0..rows).map(|row| sample_at(&columns, row));
            rows.filter_map(|(time, rate, quality)| self.0.add(time, rate, quality).map(Period)).collect()
        }))
    }

    /// The period that is not finished yet, as if nothing more came; None when no time of it has passed.
    #[getter]
    fn unfinished(&self) -> Option<Period> {
        self.0.unfinished().map(Period)
    }

    /// Total of the period that is not finished yet.
    #[getter]
    fn current(&self) -> Total {
        Total(*self.0.current())
    }

    /// When that began, s.
    #[getter]
    fn start(&self) -> f64 {
        self.0.start()
    }
});

/// A finished period.
#[pyclass(frozen, module = "moistair.account")]
pub struct Period(account::Period);

#[pymethods]
impl Period {
    /// When it began, s.
    #[getter]
    fn start(&self) -> f64 {
        self.0.start
    }

    /// Its total. Its elapsed time is the whole period.
    #[getter]
    fn total(&self) -> Total {
        Total(self.0.total)
    }

    fn __eq__(&self, other: &Self) -> bool {
        self.0 == other.0
    }

    fn __repr__(&self) -> String {
        format!("<Period from {:?} s: {}>", self.0.start, Total(self.0.total).__repr__())
    }

    fn __reduce__<'py>(&self, py: Python<'py>) -> PyResult<(Bound<'py, PyAny>, (f64, Total))> {
        Ok((py.import("moistair._core")?.getattr("restore_period")?, (self.0.start, Total(self.0.total))))
    }
}

/// A period from its parts, for pickle.
#[pyfunction]
pub fn restore_period(start: f64, total: &Total) -> Period {
    Period(account::Period { start, total: total.0 })
}

/// Counts of checked samples by quality and by reason.
///
/// Examples
/// --------
/// >>> from moistair.account import Counts
/// >>> from moistair.signal import Channel, ChannelState, Kind, Quality, Unit
/// >>> channel = Channel(kind=Kind.TEMPERATURE, unit=Unit.CELSIUS, minimum=-40.0, maximum=60.0)
/// >>> counts = Counts()
/// >>> counts.record(channel.check(ChannelState(), time=[0.0, 60.0], raw=[21.5, -999.0]))
/// >>> counts.samples, counts.quality(Quality.GOOD), counts.share(Quality.REFUSED)
/// (2, 1, 0.5)
#[pyclass(module = "moistair.account")]
pub struct Counts(account::Counts);

owned!(Counts, {
    #[new]
    fn new() -> Self {
        Self(account::Counts::default())
    }

    /// Counts a checked sample, or all of a column.
    fn record(&mut self, checked: &Bound<'_, PyAny>) -> PyResult<()> {
        if let Ok(sample) = checked.cast::<Checked>() {
            self.0.record(&sample.get().0);
        } else if let Ok(columns) = checked.cast::<CheckedColumns>() {
            columns.get().samples.iter().for_each(|sample| self.0.record(sample));
        } else {
            return Err(PyTypeError::new_err("a Checked or a CheckedColumns is expected"));
        }
        Ok(())
    }

    /// Adds the counts of another time or channel.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<()> {
        let other = other.try_borrow()?.0;
        slf.try_borrow_mut()?.0.merge(&other);
        Ok(())
    }

    /// All samples.
    #[getter]
    fn samples(&self) -> u64 {
        self.0.samples()
    }

    /// Samples of this quality.
    fn quality(&self, quality: i32) -> PyResult<u64> {
        Ok(self.0.quality(coded(quality, Quality::from_code, "quality")?))
    }

    /// Samples with this reason.
    fn reason(&self, reason: i32) -> PyResult<u64> {
        Ok(self.0.reason(coded(reason, Reason::from_code, "reason")?))
    }

    /// Samples that were refused for this cause and filled with the last good value.
    fn held_because(&self, cause: i32) -> PyResult<u64> {
        Ok(self.0.held_because(coded(cause, Reason::from_code, "reason")?))
    }

    /// Gaps.
    #[getter]
    fn gaps(&self) -> u64 {
        self.0.gaps()
    }

    /// Share of this quality in all samples, 0 to 1; 0 without samples.
    fn share(&self, quality: i32) -> PyResult<f64> {
        Ok(self.0.share(coded(quality, Quality::from_code, "quality")?))
    }
});

/// The residuals of one book over many samples.
#[pyclass(module = "moistair.account")]
pub struct Residuals(account::Residuals);

owned!(Residuals, {
    #[new]
    fn new() -> Self {
        Self(account::Residuals::default())
    }

    /// Adds the residual of one closed book and the scale that it is judged by. False, and only counted as refused, when either is
    /// not finite, the scale is negative, or it is zero and the residual is not.
    #[pyo3(signature = (*, residual, scale))]
    fn add(&mut self, residual: f64, scale: f64) -> bool {
        self.0.add(residual, scale)
    }

    /// Adds the residuals of another time or place; False, and nothing changes, when a sum is not finite.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<bool> {
        let other = other.try_borrow()?.0;
        Ok(slf.try_borrow_mut()?.0.merge(&other))
    }

    /// Sum of the absolute residuals, in the unit of the book.
    #[getter]
    fn sum_of_residuals(&self) -> f64 {
        self.0.sum_of_residuals()
    }

    /// Sum of the scales, in the unit of the book.
    #[getter]
    fn sum_of_scales(&self) -> f64 {
        self.0.sum_of_scales()
    }

    /// Largest residual relative to its own scale.
    #[getter]
    fn largest_relative(&self) -> f64 {
        self.0.largest_relative()
    }

    /// The same in units of the rounding of numbers, 2⁻⁵²: a book of a few terms that closes leaves a few of them.
    #[getter]
    fn largest_in_epsilons(&self) -> f64 {
        self.0.largest_in_epsilons()
    }

    /// Sum of the absolute residuals relative to the sum of the scales; 0 when that is zero.
    #[getter]
    fn relative(&self) -> f64 {
        self.0.relative()
    }

    /// How many residuals were added.
    #[getter]
    fn samples(&self) -> u64 {
        self.0.samples()
    }

    /// How many were refused.
    #[getter]
    fn refused(&self) -> u64 {
        self.0.refused()
    }
});

/// The residuals of the heat book and of the water book of a process or a plant.
///
/// Examples
/// --------
/// >>> from moistair.account import BooksTotal
/// >>> books = BooksTotal()
/// >>> books.add(heat=1e-9, heat_scale=2e4, water=-2e-19, water_scale=5e-3)
/// True
/// >>> books.heat.largest_relative
/// 5e-14
#[pyclass(module = "moistair.account")]
pub struct BooksTotal(account::BooksTotal);

owned!(BooksTotal, {
    #[new]
    fn new() -> Self {
        Self(account::BooksTotal::default())
    }

    /// Adds the books of a process, and counts them if they close. False when any was refused.
    ///
    /// Parameters
    /// ----------
    /// books : moistair.process.books.Books
    ///     Of one row or of many.
    fn record<'py>(&mut self, py: Python<'py>, books: Bound<'py, PyAny>) -> PyResult<bool> {
        let names = ["heat_residual", "heat_scale", "water_residual", "water_scale", "heat_resolution"];
        let [a, b, c, d, e] = names.map(|name| books.getattr(name));
        let values = [a?, b?, c?, d?, e?];
        let record = |total: &mut account::BooksTotal, numbers: [f64; 5]| {
            let [heat_residual, heat_scale, water_residual, water_scale, heat_resolution] = numbers;
            total.record(&Books {
                heat_residual: HeatFlow::from_watts(heat_residual),
                heat_scale: HeatFlow::from_watts(heat_scale),
                water_residual: MassFlow::from_kilograms_per_second(water_residual),
                water_scale: MassFlow::from_kilograms_per_second(water_scale),
                heat_resolution: HeatFlow::from_watts(heat_resolution),
            })
        };
        let arguments = Arguments::read(py, &names, &values)?;
        let columns = arguments.columns()?;
        let columns: [Column<'_>; 5] = columns.try_into().map_err(|_| internal("five columns expected"))?;
        let rows = arguments.rows;
        Ok(py.detach(|| every(rows, &columns, |numbers| record(&mut self.0, numbers))))
    }

    /// Adds one closed pair of books, each with its scale: W and kg/s, or J and kg. False when either was refused. Columns are added
    /// row by row; False when any was refused.
    #[pyo3(signature = (*, heat, heat_scale, water, water_scale))]
    fn add<'py>(
        &mut self,
        py: Python<'py>,
        heat: Bound<'py, PyAny>,
        heat_scale: Bound<'py, PyAny>,
        water: Bound<'py, PyAny>,
        water_scale: Bound<'py, PyAny>,
    ) -> PyResult<bool> {
        let values = [heat, heat_scale, water, water_scale];
        let Some(samples) = Samples::read(py, &["heat", "heat_scale", "water", "water_scale"], &values)? else {
            let [heat, heat_scale, water, water_scale] = &values;
            return Ok(self.0.add(number(heat)?, number(heat_scale)?, number(water)?, number(water_scale)?));
        };
        let columns: [Column<'_>; 4] = samples.columns()?;
        let rows = samples.len();
        Ok(py.detach(|| every(rows, &columns, |[a, b, c, d]| self.0.add(a, b, c, d))))
    }

    /// Adds the books of another time or place; False, and nothing changes, when a sum is not finite.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<bool> {
        let other = other.try_borrow()?.0;
        Ok(slf.try_borrow_mut()?.0.merge(&other))
    }

    /// How many of the recorded books closed to rounding.
    #[getter]
    fn closed(&self) -> u64 {
        self.0.closed()
    }

    /// The heat book.
    #[getter]
    fn heat(&self) -> Residuals {
        Residuals(*self.0.heat())
    }

    /// The water book.
    #[getter]
    fn water(&self) -> Residuals {
        Residuals(*self.0.water())
    }
});

/// Measured minus computed over many samples: bias and scatter of a sensor against what the others say.
///
/// Examples
/// --------
/// >>> from moistair.account import Deviation
/// >>> mixed = Deviation()
/// >>> mixed.add(measured=[21.0, 22.0], computed=20.0)
/// True
/// >>> mixed.mean, mixed.lowest, mixed.highest
/// (1.5, 1.0, 2.0)
#[pyclass(module = "moistair.account")]
pub struct Deviation(account::Deviation);

owned!(Deviation, {
    #[new]
    fn new() -> Self {
        Self(account::Deviation::default())
    }

    /// Takes a pair in one unit, or the pairs of columns. False, and only counted as refused, when any is not finite.
    #[pyo3(signature = (*, measured, computed))]
    fn add<'py>(
        &mut self,
        py: Python<'py>,
        measured: Bound<'py, PyAny>,
        computed: Bound<'py, PyAny>,
    ) -> PyResult<bool> {
        let values = [measured, computed];
        let Some(samples) = Samples::read(py, &["measured", "computed"], &values)? else {
            let [measured, computed] = &values;
            return Ok(self.0.add(number(measured)?, number(computed)?));
        };
        let columns: [Column<'_>; 2] = samples.columns()?;
        let rows = samples.len();
        Ok(py.detach(|| every(rows, &columns, |[measured, computed]| self.0.add(measured, computed))))
    }

    /// Adds the deviations of another time; False, and nothing changes, when a sum is not finite.
    fn merge(slf: &Bound<'_, Self>, other: &Bound<'_, Self>) -> PyResult<bool> {
        let other = other.try_borrow()?.0;
        Ok(slf.try_borrow_mut()?.0.merge(&other))
    }

    /// The mean, the bias of the measurement; None without samples.
    #[getter]
    fn mean(&self) -> Option<f64> {
        self.0.mean()
    }

    /// The root of the mean square; None without samples.
    #[getter]
    fn root_mean_square(&self) -> Option<f64> {
        self.0.root_mean_square()
    }

    /// The lowest, with its sign; None without samples.
    #[getter]
    fn lowest(&self) -> Option<f64> {
        self.0.lowest()
    }

    /// The highest, with its sign; None without samples.
    #[getter]
    fn highest(&self) -> Option<f64> {
        self.0.highest()
    }

    /// How many pairs were taken.
    #[getter]
    fn samples(&self) -> u64 {
        self.0.samples()
    }

    /// How many were refused.
    #[getter]
    fn refused(&self) -> u64 {
        self.0.refused()
    }
});

/// A structure from its bytes, for pickle.
#[pyfunction]
pub fn restore_owned<'py>(py: Python<'py>, class: &str, byte_order: &str, bytes: &[u8]) -> PyResult<Bound<'py, PyAny>> {
    macro_rules! restore {
        ($($name:ident),*) => {
            match class {
                $(stringify!($name) => Ok(Bound::new(py, $name(restored(byte_order, bytes)?))?.into_any()),)*
                _ => Err(PyValueError::new_err("no such class")),
            }
        };
    }
    restore!(ChannelState, EconomizerState, Sum, Total, Periods, Counts, Residuals, BooksTotal, Deviation)
}

/// Does something with each row, whatever became of the others; whether all of it was taken.
fn every<const N: usize>(rows: usize, columns: &[Column<'_>; N], mut add: impl FnMut([f64; N]) -> bool) -> bool {
    let refused = (0..rows).filter(|row| !add(columns.map(|column| column.get(*row).unwrap_or(NAN)))).count();
    refused == 0
}

const NAMES: [&str; 3] = ["time", "rate", "quality"];

fn quality_or_good<'py>(py: Python<'py>, quality: Option<Bound<'py, PyAny>>) -> PyResult<Bound<'py, PyAny>> {
    quality.map_or_else(|| Ok(Quality::Good.code().into_pyobject(py)?.into_any()), Ok)
}

fn sample(values: &[Bound<'_, PyAny>; 3]) -> PyResult<(f64, f64, Quality)> {
    let [time, rate, quality] = values;
    let quality = quality_code(number(quality)?).ok_or_else(|| PyValueError::new_err("not a quality"))?;
    Ok((number(time)?, number(rate)?, quality))
}

fn sample_at(columns: &[Column<'_>; 3], row: usize) -> (f64, f64, Quality) {
    let [time, rate, quality] = columns.map(|column| column.get(row).unwrap_or(NAN));
    (time, rate, quality_code(quality).unwrap_or(Quality::Refused))
}
