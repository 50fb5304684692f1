//! Processes, row by row: the catalogue of the core on what Python holds. `moistair._rows` makes objects of what comes back.

use moistair_core::columns::{Column, Field, NAN, Process, RowError, SequenceRowError, SequenceRows, Value, Wanted};
use moistair_core::{Error, Formulation, MoistAir as Air, Quantity};
use pyo3::exceptions::PyTypeError;
use pyo3::prelude::*;
use pyo3::types::PyList;

use crate::column::{self, Arguments, plain_number};
use crate::error::{exception, exception_at, internal};
use crate::state::{Content, MoistAir, States, restore};

/// Why a row has no result.
enum Failure {
    Row(RowError),
    /// The same of a step of a chain.
    Step(usize, RowError),
    /// A state of this row has failed before, with this status.
    Before(i32),
}

impl From<Error> for Failure {
    fn from(error: Error) -> Self {
        Self::Row(error.into())
    }
}

impl From<RowError> for Failure {
    fn from(error: RowError) -> Self {
        Self::Row(error)
    }
}

impl From<SequenceRowError> for Failure {
    fn from(error: SequenceRowError) -> Self {
        match error {
            SequenceRowError::Step { step, error } => Self::Step(step, error),
            other => Self::Row(other.error()),
        }
    }
}

impl Failure {
    /// The status of the row; `None` for what the Python side rules out.
    fn status(&self) -> Option<i32> {
        match self {
            Self::Row(RowError::Process(error)) | Self::Step(_, RowError::Process(error)) => Some(error.code()),
            Self::Before(status) => Some(*status),
            _ => None,
        }
    }
}

/// What is run on each row.
#[derive(Clone, Copy)]
enum Work<'a> {
    /// A process of the catalogue, and the formulation of what is given without a state.
    Process(Process, Formulation),
    Sequence(SequenceRows<'a>),
    Solve(SequenceRows<'a>, Wanted),
}

/// That, and what it gives.
#[derive(Clone, Copy)]
struct Call<'a> {
    work: Work<'a>,
    layout: &'a str,
}

impl Call<'_> {
    /// Runs it on the arguments of a row.
    fn row(&self, items: &[Value], out: &mut [Value]) -> Result<(), Failure> {
        let written = match self.work {
            Work::Process(process, formulation) => process.evaluate_values(formulation, items, out)?,
            Work::Sequence(rows) => rows.run(items, out)?,
            Work::Solve(rows, wanted) => rows.solve(wanted, items, out)?,
        };
        if written == out.len() { Ok(()) } else { Err(RowError::Misfit.into()) }
    }

    /// Of what is given without a state.
    fn formulation(&self) -> Formulation {
        match self.work {
            Work::Process(_, formulation) => formulation,
            Work::Sequence(rows) | Work::Solve(rows, _) => rows.formulation,
        }
    }

    /// Room for its results.
    fn room(&self) -> Vec<Value> {
        vec![Value::Number(NAN); self.layout.len()]
    }
}

/// Runs a process on numbers, arrays and states; `layout` says what each result is: `N` a number, `S` a state.
///
/// Returns the results and the status. One row raises; of many rows, those without a result hold NaN.
#[pyfunction]
#[pyo3(signature = (name, layout, labels, values, formulation=0))]
pub fn run<'py>(
    py: Python<'py>,
    name: &str,
    layout: &str,
    labels: Bound<'py, PyAny>,
    values: Vec<Bound<'py, PyAny>>,
    formulation: i32,
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let process = Process::from_name(name).ok_or_else(|| internal(format!("no process {name:?}")))?;
    let formulation = Formulation::from_code(formulation).ok_or_else(unfit)?;
    run_rows(py, Call { work: Work::Process(process, formulation), layout }, &labels, &values)
}

/// Runs a chain of steps of these kinds on the entering stream and the numbers of each step; with `wanted`, solves it: the step whose number is
/// free, that quantity, the step whose air is looked at, that property.
#[pyfunction]
#[pyo3(signature = (kinds, layout, labels, values, wanted=None))]
pub fn run_sequence<'py>(
    py: Python<'py>,
    kinds: Vec<i32>,
    layout: &str,
    labels: Bound<'py, PyAny>,
    values: Vec<Bound<'py, PyAny>>,
    wanted: Option<(usize, i32, usize, i32)>,
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let rows = SequenceRows { kinds: &kinds, formulation: Formulation::RealGas };
    let work = match wanted {
        None => Work::Sequence(rows),
        Some((step, number, after, quantity)) => {
            let named = |code| Quantity::from_code(code).ok_or_else(unfit);
            let (number, quantity) = (named(number)?, named(quantity)?);
            Work::Solve(rows, Wanted { step, number, after: Some(after), quantity })
        }
    };
    run_rows(py, Call { work, layout }, &labels, &values)
}

fn run_rows<'py>(
    py: Python<'py>,
    call: Call<'_>,
    labels: &Bound<'py, PyAny>,
    values: &[Bound<'py, PyAny>],
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let plain = values.iter().map(plain_item).collect::<Option<PyResult<Vec<Value>>>>();
    if let Some(items) = plain {
        return run_once(py, &call, &items?);
    }
    let labels = labels.extract::<Vec<String>>()?;
    let (sources, names, flat) = flatten(py, &labels, values)?;
    let names: Vec<&str> = names.iter().map(String::as_str).collect();
    let arguments = Arguments::read(py, &names, &flat)?;
    let table = Table { sources, columns: arguments.columns()? };
    if arguments.shape.is_empty() {
        let mut items = Vec::new();
        table.read(0, &mut items).map_err(|failure| raise(py, &failure))?;
        return run_once(py, &call, &items);
    }
    let mut results = Results::new(call.layout, arguments.rows)?;
    py.detach(|| results.fill(&call, &table));
    results.finish(py, table.formulation().unwrap_or(call.formulation()), &arguments.shape)
}

type Fields = Vec<(String, &'static str)>;

/// The catalogue as (code, name, inputs, how many of the last of them repeat, outputs); fields as (name, unit), a state as three of them.
#[pyfunction]
pub fn process_table() -> Vec<(i32, &'static str, Fields, usize, Fields)> {
    let fields = |field: fn(Process, usize) -> Option<Field>, process| {
        (0..).map_while(|place| field(process, place)).map(|field| (field.to_string(), field.unit())).collect()
    };
    let row = |process: Process| {
        let (inputs, outputs) = (fields(Process::input, process), fields(Process::output, process));
        (process.code(), process.name(), inputs, process.repeated(), outputs)
    };
    Process::ALL.into_iter().map(row).collect()
}

/// A plain number or one state; `None` for what holds an array.
fn plain_item(value: &Bound<'_, PyAny>) -> Option<PyResult<Value>> {
    if let Some(number) = plain_number(value) {
        return Some(number.map(Value::Number));
    }
    match value.cast::<MoistAir>().ok()?.get().content() {
        Content::One(air) => Some(Ok(Value::State(*air))),
        Content::Many(_) => None,
    }
}

fn run_once<'py>(
    py: Python<'py>,
    call: &Call<'_>,
    items: &[Value],
) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
    let mut out = call.room();
    call.row(items, &mut out).map_err(|failure| raise(py, &failure))?;
    if !fits(call.layout, &out) {
        return Err(internal("results do not fit their layout"));
    }
    let results = PyList::empty(py);
    for item in out {
        match item {
            Value::Number(value) => results.append(value)?,
            Value::State(air) => results.append(MoistAir::from(Content::One(air)))?,
        }
    }
    Ok((results, 0_i32.into_pyobject(py)?.into_any()))
}

fn raise(py: Python<'_>, failure: &Failure) -> PyErr {
    match failure {
        Failure::Row(RowError::Process(error)) => exception(py, error),
        Failure::Step(step, RowError::Process(error)) => exception_at(py, error, &format!("step {step} (from 0): ")),
        Failure::Before(code) => internal(format!("a state has failed with status {code}")),
        // The Python side rules that out.
        Failure::Row(_) | Failure::Step(..) => unfit(),
    }
}

fn unfit() -> PyErr {
    PyTypeError::new_err("arguments do not fit this process")
}

fn fits(layout: &str, items: &[Value]) -> bool {
    let kinds = items.iter().map(|item| match item {
        Value::Number(_) => b'N',
        Value::State(_) => b'S',
    });
    kinds.eq(layout.bytes())
}

/// Where the arguments of a row come from, and the columns that they are read from.
struct Table<'a> {
    sources: Vec<Source>,
    columns: Vec<Column<'a>>,
}

/// A number takes one column; a state takes four: dry bulb, humidity ratio, pressure and status.
enum Source {
    Number,
    One(Air),
    Many(Formulation),
}

type Flat<'py> = (Vec<Source>, Vec<String>, Vec<Bound<'py, PyAny>>);

/// Takes states apart into columns.
fn flatten<'py>(py: Python<'py>, labels: &[String], values: &[Bound<'py, PyAny>]) -> PyResult<Flat<'py>> {
    let (mut sources, mut names, mut flat) = (Vec::new(), Vec::new(), Vec::new());
    for (label, value) in labels.iter().zip(values) {
        let Ok(state) = value.cast::<MoistAir>() else {
            sources.push(Source::Number);
            names.push(label.clone());
            flat.push(value.clone());
            continue;
        };
        match state.get().content() {
            Content::One(air) => sources.push(Source::One(*air)),
            Content::Many(states) => {
                sources.push(Source::Many(states.formulation));
                let status = column::array(py, states.status.clone(), &states.shape)?;
                let column = |values: &Vec<f64>| column::array(py, values.clone(), &states.shape);
                flat.push(column(&states.dry_bulb)?);
                flat.push(column(&states.humidity_ratio)?);
                flat.push(column(&states.pressure)?);
                flat.push(status);
                names.extend(core::iter::repeat_n(label.clone(), 4));
            }
        }
    }
    Ok((sources, names, flat))
}

impl Table<'_> {
    /// The arguments of a row.
    fn read(&self, row: usize, items: &mut Vec<Value>) -> Result<(), Failure> {
        items.clear();
        let mut columns = self.columns.iter();
        let mut next = || columns.next().and_then(|column| column.get(row)).ok_or(RowError::Misfit);
        for source in &self.sources {
            items.push(match source {
                Source::Number => Value::Number(next()?),
                Source::One(air) => Value::State(*air),
                Source::Many(formulation) => {
                    let (t, w, p, status) = (next()?, next()?, next()?, next()? as i32);
                    if status != 0 {
                        return Err(Failure::Before(status));
                    }
                    Value::State(restore(t, w, p, *formulation)?)
                }
            });
        }
        Ok(())
    }

    /// Of the first state.
    fn formulation(&self) -> Option<Formulation> {
        let of = |source: &Source| match source {
            Source::Number => None,
            Source::One(air) => Some(air.formulation()),
            Source::Many(formulation) => Some(*formulation),
        };
        self.sources.iter().find_map(of)
    }
}

/// Results of many rows.
struct Results {
    layout: Vec<u8>,
    columns: Vec<Vec<f64>>,
    status: Vec<i32>,
    formulation: Option<Formulation>,
    misfit: bool,
}

impl Results {
    fn new(layout: &str, rows: usize) -> PyResult<Self> {
        let width = layout.bytes().map(|kind| if kind == b'S' { 3 } else { 1 }).sum();
        Ok(Self {
            layout: layout.as_bytes().to_vec(),
            columns: (0..width).map(|_| column::blank(rows, NAN)).collect::<PyResult<_>>()?,
            status: column::blank(rows, 0)?,
            formulation: None,
            misfit: false,
        })
    }

    fn fill(&mut self, call: &Call<'_>, table: &Table<'_>) {
        let (mut items, mut out) = (Vec::new(), call.room());
        for row in 0..self.status.len() {
            let code = match table.read(row, &mut items).and_then(|()| call.row(&items, &mut out)) {
                Ok(()) => {
                    self.store(row, &out);
                    0
                }
                Err(failure) => match failure.status() {
                    Some(status) => status,
                    None => {
                        self.misfit = true;
                        continue;
                    }
                },
            };
            if let Some(place) = self.status.get_mut(row) {
                *place = code;
            }
        }
    }

    fn store(&mut self, row: usize, items: &[Value]) {
        let mut places = self.columns.iter_mut();
        let mut put = |value| {
            if let Some(place) = places.next().and_then(|column| column.get_mut(row)) {
                *place = value;
            }
        };
        for item in items {
            match item {
                Value::Number(value) => put(*value),
                Value::State(air) => {
                    put(air.dry_bulb().celsius());
                    put(air.pressure().pascals());
                    put(air.humidity_ratio().kilograms_per_kilogram());
                    self.formulation = Some(air.formulation());
                }
            }
        }
        self.misfit |= items.len() != self.layout.len();
    }

    fn finish<'py>(
        self,
        py: Python<'py>,
        formulation: Formulation,
        shape: &[usize],
    ) -> PyResult<(Bound<'py, PyList>, Bound<'py, PyAny>)> {
        if self.misfit {
            return Err(unfit());
        }
        let formulation = self.formulation.unwrap_or(formulation);
        let failed = self.status.iter().filter(|code| **code != 0).count();
        let mut columns = self.columns.into_iter();
        let mut next = || columns.next().ok_or_else(|| internal("a column is missing"));
        let results = PyList::empty(py);
        for kind in self.layout {
            if kind == b'S' {
                let (dry_bulb, pressure, humidity_ratio) = (next()?, next()?, next()?);
                let (shape, status) = (shape.to_vec(), self.status.clone());
                let states =
                    States { formulation, shape, dry_bulb, pressure, humidity_ratio, status, failed, settled: false };
                results.append(MoistAir::from(Content::Many(states)))?;
            } else {
                results.append(column::array(py, next()?, shape)?)?;
            }
        }
        Ok((results, column::array(py, self.status, shape)?))
    }
}
