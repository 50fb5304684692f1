//! Signals: check and repair, sample by sample or over columns.

use moistair_core::columns::NAN;
use moistair_core::signal::{self, Kind, Quality, Reason, Unit};
use numpy::PyArrayMethods;
use pyo3::prelude::*;
use pyo3::types::{PyDict, PyTuple};

use crate::column;
use crate::owned::{Samples, coded, keywords, member, number, owned};

const MODULE: &str = "moistair.signal";

/// What is known about a channel: what it carries, in which unit, within which limits.
///
/// Immutable. A channel that makes no sense is not an error here: `is_valid` says so, and `check` then refuses every
/// sample. Limits and resolutions are in the unit of the core (°C, fraction, Pa, m³/s, kg/s, kg/kg, W), whatever the raw unit is.
///
/// Parameters
/// ----------
/// kind : Kind
///     What it carries.
/// unit : Unit
///     Unit of the raw signal.
/// minimum, maximum : float
///     Lowest and highest value allowed, in the unit of the core.
/// interval : float
///     Nominal sample interval, s; a step longer than 1.5 of it is a gap. Zero: no step is a gap.
/// hold : float
///     The last good value stands in for a refused one up to this age of it, s. Zero: never. A stuck signal, fractions in
///     place of percent, and a time that does not increase are not filled.
/// stuck_samples : int
///     A sample is refused as stuck when it is this many in a row within `stuck_resolution` of the first. Zero: no such rule.
///     Choose the row longer than the longest true calm.
/// stuck_resolution : float
///     In the unit of the core, below the smallest step of the signal.
/// reference_resolution : float
///     How far the reference of `check` must move, in its own unit, to prove that the plant is not simply steady.
/// slip_samples : int
///     A channel in percent is refused as fractions after this many samples that speak for it. Zero: never.
///
/// Examples
/// --------
/// >>> from moistair.signal import Channel, ChannelState, Kind, Unit
/// >>> channel = Channel(kind=Kind.RELATIVE_HUMIDITY, unit=Unit.PERCENT, minimum=0.0, maximum=1.0, hold=120.0)
/// >>> state = ChannelState()
/// >>> channel.check(state, time=0.0, raw=45.0).value
/// 0.45
/// >>> held = channel.check(state, time=60.0, raw=float("nan"))
/// >>> held.value, held.reason.name, held.cause.name
/// (0.45, 'HELD', 'MISSING')
/// >>> day = channel.check(ChannelState(), time=[0.0, 60.0, 120.0], raw=[45.0, 101.2, 150.0])
/// >>> day.value
/// array([0.45, 1.  , 1.  ])
/// >>> day.quality
/// array([0, 1, 1], dtype=int32)
#[pyclass(frozen, module = "moistair.signal")]
pub struct Channel {
    channel: signal::Channel,
    settings: Settings,
}

/// The arguments of a channel as given, for readers, equality and pickle.
#[derive(Clone, Copy, PartialEq)]
struct Settings {
    kind: Kind,
    unit: Unit,
    interval: f64,
    hold: f64,
    stuck_samples: u32,
    stuck_resolution: f64,
    reference_resolution: f64,
    slip_samples: u32,
}

#[pymethods]
impl Channel {
    #[new]
    #[pyo3(signature = (*, kind, unit, minimum, maximum, interval=0.0, hold=0.0, stuck_samples=0, stuck_resolution=0.0,
        reference_resolution=0.0, slip_samples=30))]
    #[allow(clippy::too_many_arguments, reason = "each is a keyword of Python")]
    fn new(
        kind: i32,
        unit: i32,
        minimum: f64,
        maximum: f64,
        interval: f64,
        hold: f64,
        stuck_samples: u32,
        stuck_resolution: f64,
        reference_resolution: f64,
        slip_samples: u32,
    ) -> PyResult<Self> {
        let (kind, unit) = (coded(kind, Kind::from_code, "kind")?, coded(unit, Unit::from_code, "unit")?);
        let channel = signal::Channel::new(kind, unit, minimum, maximum)
            .with_interval(interval)
            .with_hold(hold)
            .with_stuck(stuck_resolution, stuck_samples)
            .with_reference_resolution(reference_resolution)
            .with_slip_samples(slip_samples);
        let settings = Settings {
            kind,
            unit,
            interval,
            hold,
            stuck_samples,
            stuck_resolution,
            reference_resolution,
            slip_samples,
        };
        Ok(Self { channel, settings })
    }

    /// What it carries.
    #[getter]
    fn kind<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Kind", self.settings.kind.code())
    }

    /// Unit of the raw signal.
    #[getter]
    fn unit<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Unit", self.settings.unit.code())
    }

    /// Lowest value allowed, in the unit of the core.
    #[getter]
    fn minimum(&self) -> f64 {
        self.channel.min()
    }

    /// Highest value allowed, in the unit of the core.
    #[getter]
    fn maximum(&self) -> f64 {
        self.channel.max()
    }

    /// Nominal sample interval, s.
    #[getter]
    fn interval(&self) -> f64 {
        self.settings.interval
    }

    /// How long a last good value is held, s.
    #[getter]
    fn hold(&self) -> f64 {
        self.settings.hold
    }

    /// How many equal samples in a row are stuck.
    #[getter]
    fn stuck_samples(&self) -> u32 {
        self.settings.stuck_samples
    }

    /// What counts as equal, in the unit of the core.
    #[getter]
    fn stuck_resolution(&self) -> f64 {
        self.settings.stuck_resolution
    }

    /// What counts as a move of the reference, in its own unit.
    #[getter]
    fn reference_resolution(&self) -> f64 {
        self.settings.reference_resolution
    }

    /// How many samples speak for fractions in place of percent.
    #[getter]
    fn slip_samples(&self) -> u32 {
        self.settings.slip_samples
    }

    /// Whether the channel makes sense: limits finite and in order, times and resolutions not negative, unit and kind of one quantity.
    #[getter]
    fn is_valid(&self) -> bool {
        self.channel.is_valid()
    }

    /// Checks a sample, or the samples of a column one after the other. No sample, however wrong, spoils a later one.
    ///
    /// Parameters
    /// ----------
    /// state : ChannelState
    ///     What the channel remembers; changed.
    /// time : float or array_like
    ///     s since any fixed instant.
    /// raw : float or array_like
    ///     Reading in the unit of the channel; NaN when there is none.
    /// reference : float or array_like, optional
    ///     A signal that moves when the plant is not at rest: a sample counts as unchanged only when the reference has moved
    ///     by more than its resolution. A NaN reference has not moved.
    ///
    /// Returns
    /// -------
    /// Checked or CheckedColumns
    ///     Converted to the unit of the core.
    #[pyo3(signature = (state, *, time, raw, reference=None))]
    fn check<'py>(
        &self,
        py: Python<'py>,
        state: &mut ChannelState,
        time: Bound<'py, PyAny>,
        raw: Bound<'py, PyAny>,
        reference: Option<Bound<'py, PyAny>>,
    ) -> PyResult<Bound<'py, PyAny>> {
        let beside = reference.is_some();
        let reference = reference.unwrap_or_else(|| raw.clone());
        let values = [time, raw, reference];
        let Some(samples) = Samples::read(py, &["time", "raw", "reference"], &values)? else {
            let [time, raw, reference] = values;
            let (time, raw, reference) = (number(&time)?, number(&raw)?, number(&reference)?);
            let checked = self.judge(&mut state.0, time, raw, beside.then_some(reference));
            return Ok(Bound::new(py, Checked(checked))?.into_any());
        };
        let [time, raw, reference] = samples.columns()?;
        let rows = samples.len();
        let mut result = Columns::blank(rows)?;
        py.detach(|| {
            for row in 0..rows {
                let at = |column: &moistair_core::columns::Column<'_>| column.get(row).unwrap_or(NAN);
                let checked = self.judge(&mut state.0, at(&time), at(&raw), beside.then(|| at(&reference)));
                result.put(row, &checked);
            }
        });
        Ok(Bound::new(py, result.finish(py)?)?.into_any())
    }

    fn __eq__(&self, other: &Self) -> bool {
        self.channel == other.channel && self.settings == other.settings
    }

    fn __repr__(&self) -> String {
        let (of, s) = (&self.channel, &self.settings);
        format!(
            "Channel(kind={}, unit={}, minimum={:?}, maximum={:?}, interval={:?}, hold={:?}, stuck_samples={}, \
             stuck_resolution={:?}, reference_resolution={:?}, slip_samples={})",
            s.kind.code(),
            s.unit.code(),
            of.min(),
            of.max(),
            s.interval,
            s.hold,
            s.stuck_samples,
            s.stuck_resolution,
            s.reference_resolution,
            s.slip_samples
        )
    }

    fn __getnewargs_ex__<'py>(&self, py: Python<'py>) -> PyResult<(Bound<'py, PyTuple>, Bound<'py, PyDict>)> {
        let s = &self.settings;
        let float = |value: f64| value.into_pyobject(py).map(Bound::into_any);
        let integer = |value: u32| value.into_pyobject(py).map(Bound::into_any);
        let pairs = [
            ("kind", s.kind.code().into_pyobject(py)?.into_any()),
            ("unit", s.unit.code().into_pyobject(py)?.into_any()),
            ("minimum", float(self.channel.min())?),
            ("maximum", float(self.channel.max())?),
            ("interval", float(s.interval)?),
            ("hold", float(s.hold)?),
            ("stuck_samples", integer(s.stuck_samples)?),
            ("stuck_resolution", float(s.stuck_resolution)?),
            ("reference_resolution", float(s.reference_resolution)?),
            ("slip_samples", integer(s.slip_samples)?),
        ];
        Ok((PyTuple::empty(py), keywords(py, &pairs)?))
    }
}

impl Channel {
    fn judge(&self, state: &mut signal::ChannelState, time: f64, raw: f64, reference: Option<f64>) -> signal::Checked {
        match reference {
            Some(reference) => self.channel.check_beside(state, time, raw, reference),
            None => self.channel.check(state, time, raw),
        }
    }
}

/// What a channel remembers from sample to sample. Use one for each channel, in one thread at a time.
#[pyclass(module = "moistair.signal")]
pub struct ChannelState(pub signal::ChannelState);

owned!(ChannelState, {
    #[new]
    fn new() -> Self {
        Self(signal::ChannelState::default())
    }

    /// Last good value, in the unit of the core, and its time, s; None when there is none.
    #[getter]
    fn last_good(&self) -> Option<(f64, f64)> {
        self.0.last_good()
    }
});

/// A checked sample.
#[pyclass(frozen, module = "moistair.signal")]
pub struct Checked(pub signal::Checked);

#[pymethods]
impl Checked {
    /// Value in the unit of the core; None when refused. Always finite and within the limits of the channel.
    #[getter]
    fn value(&self) -> Option<f64> {
        self.0.value()
    }

    /// How far it can be trusted.
    #[getter]
    fn quality<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Quality", self.0.quality().code())
    }

    /// Why.
    #[getter]
    fn reason<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Reason", self.0.reason().code())
    }

    /// What was wrong with the reading: the reason itself, unless that is HELD.
    #[getter]
    fn cause<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        member(py, MODULE, "Reason", self.0.cause().code())
    }

    /// Whether a gap lies before this sample: nothing may be integrated across it.
    #[getter]
    fn after_gap(&self) -> bool {
        self.0.after_gap()
    }

    fn __eq__(&self, other: &Self) -> bool {
        self.parts() == other.parts()
    }

    fn __repr__(&self) -> String {
        let value = self.0.value().map_or_else(|| "None".to_owned(), |value| format!("{value:?}"));
        format!("<Checked {value}: {}, {}>", self.0.quality().text(), self.0.reason().text())
    }

    fn __reduce__<'py>(&self, py: Python<'py>) -> PyResult<(Bound<'py, PyAny>, Parts)> {
        Ok((py.import("moistair._core")?.getattr("restore_checked")?, self.parts()))
    }
}

type Parts = (Option<f64>, i32, i32, i32, bool);

impl Checked {
    fn parts(&self) -> Parts {
        let x = &self.0;
        (x.value(), x.quality().code(), x.reason().code(), x.cause().code(), x.after_gap())
    }
}

/// A checked sample from its parts, for pickle.
#[pyfunction]
pub fn restore_checked(
    value: Option<f64>,
    quality: i32,
    reason: i32,
    cause: i32,
    after_gap: bool,
) -> PyResult<Checked> {
    let checked = signal::Checked::from_codes(value.unwrap_or(NAN), quality, reason, cause, after_gap);
    checked.map(Checked).ok_or_else(|| pyo3::exceptions::PyValueError::new_err("not the parts of a checked sample"))
}

/// Checked samples, one after the other.
///
/// Attributes
/// ----------
/// value : numpy.ndarray
///     In the unit of the core; NaN where refused.
/// quality : numpy.ndarray
///     Codes of `Quality`, int32.
/// reason, cause : numpy.ndarray
///     Codes of `Reason`, int32.
/// after_gap : numpy.ndarray
///     Whether a gap lies before the sample, bool.
#[pyclass(frozen, module = "moistair.signal")]
pub struct CheckedColumns {
    #[pyo3(get)]
    value: Py<PyAny>,
    #[pyo3(get)]
    quality: Py<PyAny>,
    #[pyo3(get)]
    reason: Py<PyAny>,
    #[pyo3(get)]
    cause: Py<PyAny>,
    #[pyo3(get)]
    after_gap: Py<PyAny>,
    pub samples: Vec<signal::Checked>,
}

#[pymethods]
impl CheckedColumns {
    fn __len__(&self) -> usize {
        self.samples.len()
    }

    fn __repr__(&self) -> String {
        format!("<CheckedColumns: {} samples>", self.samples.len())
    }
}

/// Columns being filled.
struct Columns {
    value: Vec<f64>,
    quality: Vec<i32>,
    reason: Vec<i32>,
    cause: Vec<i32>,
    after_gap: Vec<bool>,
    samples: Vec<signal::Checked>,
}

impl Columns {
    fn blank(rows: usize) -> PyResult<Self> {
        let code = || column::blank(rows, 0);
        let mut samples = Vec::new();
        samples.try_reserve_exact(rows).map_err(|_| pyo3::exceptions::PyMemoryError::new_err("not enough memory"))?;
        Ok(Self {
            value: column::blank(rows, NAN)?,
            quality: code()?,
            reason: code()?,
            cause: code()?,
            after_gap: column::blank(rows, false)?,
            samples,
        })
    }

    fn put(&mut self, row: usize, checked: &signal::Checked) {
        set(&mut self.value, row, checked.value_or(NAN));
        set(&mut self.quality, row, checked.quality().code());
        set(&mut self.reason, row, checked.reason().code());
        set(&mut self.cause, row, checked.cause().code());
        set(&mut self.after_gap, row, checked.after_gap());
        self.samples.push(*checked);
    }

    fn finish(self, py: Python<'_>) -> PyResult<CheckedColumns> {
        fn fixed<T: numpy::Element>(py: Python<'_>, column: Vec<T>) -> PyResult<Py<PyAny>> {
            let array = numpy::PyArray1::from_vec(py, column);
            array.try_readwrite().map_err(column::in_use)?.make_nonwriteable();
            Ok(array.into_any().unbind())
        }
        Ok(CheckedColumns {
            value: fixed(py, self.value)?,
            quality: fixed(py, self.quality)?,
            reason: fixed(py, self.reason)?,
            cause: fixed(py, self.cause)?,
            after_gap: fixed(py, self.after_gap)?,
            samples: self.samples,
        })
    }
}

fn set<T>(column: &mut [T], row: usize, value: T) {
    if let Some(place) = column.get_mut(row) {
        *place = value;
    }
}

/// A raw reading in the unit of the core: °C, fraction, Pa, m³/s, kg/s, kg/kg, W, s, J, J/kg.
///
/// A reading that is in that unit already comes back bit for bit, except that −0 becomes 0.
///
/// Parameters
/// ----------
/// raw : float or array_like
///     The reading.
/// unit : Unit
///     Its unit.
///
/// Returns
/// -------
/// float or numpy.ndarray
///
/// Examples
/// --------
/// >>> from moistair.signal import Unit, to_core
/// >>> to_core(212.0, unit=Unit.FAHRENHEIT)
/// 100.0
#[pyfunction]
#[pyo3(signature = (raw, *, unit))]
pub fn to_core<'py>(py: Python<'py>, raw: Bound<'py, PyAny>, unit: i32) -> PyResult<Bound<'py, PyAny>> {
    let unit = coded(unit, Unit::from_code, "unit")?;
    column::map(py, "raw", raw, |value| unit.to_core(value))
}

/// A value in the unit of the core, in another unit: for display, logs and controllers.
///
/// Parameters
/// ----------
/// value : float or array_like
///     In the unit of the core.
/// unit : Unit
///     The unit wanted.
///
/// Returns
/// -------
/// float or numpy.ndarray
///
/// Examples
/// --------
/// >>> from moistair.signal import Unit, from_core
/// >>> from_core(9e6, unit=Unit.KILOWATT_HOUR)
/// 2.5
#[pyfunction]
#[pyo3(signature = (value, *, unit))]
pub fn from_core<'py>(py: Python<'py>, value: Bound<'py, PyAny>, unit: i32) -> PyResult<Bound<'py, PyAny>> {
    let unit = coded(unit, Unit::from_code, "unit")?;
    column::map(py, "value", value, |value| unit.from_core(value))
}

/// Names, codes and texts of the enumerations, for the check that Python's are the same.
#[pyfunction]
pub fn code_table() -> Vec<(&'static str, String, i32, &'static str)> {
    use moistair_core::account::{Added, Rule};
    macro_rules! rows {
        ($($type:ident),*) => {{
            let mut table = Vec::new();
            $(for item in $type::ALL {
                table.push((stringify!($type), format!("{item:?}"), item.code(), item.text()));
            })*
            table
        }};
    }
    rows!(Kind, Unit, Quality, Reason, Rule, Added)
}
