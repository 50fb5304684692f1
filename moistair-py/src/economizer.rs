//! An economizer over the rows of a column, one after the other. `moistair.process.economizer` makes objects of what comes back.

use moistair_core::columns::{Column, NAN};
use moistair_core::process::economizer::{self, Decision, Economizer, Fallback, Reason, Rule, Supply};
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{FractionStatus, Reach};
use moistair_core::signal::Quality;
use moistair_core::{
    Basis, DewPoint, Formulation, Pressure, Quantity, RelativeHumidity, SpecificEnthalpy, Temperature,
    TemperatureDifference,
};
use pyo3::prelude::*;
use pyo3::types::PyList;

use crate::column;
use crate::error::exception;
use crate::owned::{Samples, coded, number, owned, quality_code};

/// What an economizer remembers from call to call. Use one for each economizer, in one thread at a time.
///
/// Attributes
/// ----------
/// is_on : bool
///     Whether the last decision was on.
/// is_frozen : bool
///     Whether the freeze lockout holds.
/// switches : int
///     How often it has switched, on and off.
#[pyclass(module = "moistair.process.economizer")]
pub struct EconomizerState(pub economizer::EconomizerState);

owned!(EconomizerState, {
    #[new]
    fn new() -> Self {
        Self(economizer::EconomizerState::default())
    }

    /// Whether the last decision was on.
    #[getter]
    fn is_on(&self) -> bool {
        self.0.is_on()
    }

    /// Whether the freeze lockout holds.
    #[getter]
    fn is_frozen(&self) -> bool {
        self.0.is_frozen()
    }

    /// How often it has switched, on and off.
    #[getter]
    fn switches(&self) -> u32 {
        self.0.switches()
    }
});

/// The numbers of the settings, in the order of the fields in Python.
type Numbers = [f64; 11];

/// Rule, fallback and formulation.
type Codes = (i32, i32, i32);

fn settings(numbers: Numbers, (rule, fallback, formulation): Codes) -> PyResult<Economizer> {
    let rule = coded(rule, Rule::from_code, "rule")?;
    let fallback = coded(fallback, Fallback::from_code, "fallback")?;
    let formulation = coded(formulation, Formulation::from_code, "formulation")?;
    let [pressure, dry_bulb, enthalpy, dew_point, supply, leaving, kelvins, joules, on, off, freeze] = numbers;
    Ok(Economizer {
        rule,
        basis: Basis::new(Pressure::from_pascals(pressure), formulation),
        dry_bulb_limit: Temperature::from_celsius(dry_bulb),
        enthalpy_limit: SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
        dew_point_limit: DewPoint::from_celsius(dew_point),
        supply: Supply {
            dry_bulb: Temperature::from_celsius(supply),
            coil_leaving: RelativeHumidity::from_fraction(leaving),
        },
        temperature_hysteresis: TemperatureDifference::from_kelvins(kelvins),
        enthalpy_hysteresis: SpecificEnthalpy::from_joules_per_kilogram(joules),
        least_time_on: on,
        least_time_off: off,
        freeze_limit: Temperature::from_celsius(freeze),
        fallback,
    })
}

/// The usual numbers of the settings at a pressure.
#[pyfunction]
pub fn economizer_default(pressure: f64) -> Numbers {
    let usual = Economizer::new(Rule::FixedDryBulb, Pressure::from_pascals(pressure));
    [
        pressure,
        usual.dry_bulb_limit.celsius(),
        usual.enthalpy_limit.joules_per_kilogram(),
        usual.dew_point_limit.celsius(),
        usual.supply.dry_bulb.celsius(),
        usual.supply.coil_leaving.fraction(),
        usual.temperature_hysteresis.kelvins(),
        usual.enthalpy_hysteresis.joules_per_kilogram(),
        usual.least_time_on,
        usual.least_time_off,
        usual.freeze_limit.celsius(),
    ]
}

/// Raises what is wrong with settings.
#[pyfunction]
pub fn economizer_check(py: Python<'_>, numbers: Numbers, codes: Codes) -> PyResult<()> {
    settings(numbers, codes)?.check().map_err(|error| exception(py, &error))
}

/// What a decision is read from: the time, then value, uncertainty and quality of the outdoor dry bulb and humidity and of the return dry
/// bulb and humidity.
const INPUTS: [&str; 13] = [
    "time",
    "outdoor.dry_bulb.value",
    "outdoor.dry_bulb.standard_uncertainty",
    "outdoor.dry_bulb.quality",
    "outdoor.humidity.value",
    "outdoor.humidity.standard_uncertainty",
    "outdoor.humidity.quality",
    "returned.dry_bulb.value",
    "returned.dry_bulb.standard_uncertainty",
    "returned.dry_bulb.quality",
    "returned.humidity.value",
    "returned.humidity.standard_uncertainty",
    "returned.humidity.quality",
];

/// Decides a row, or the rows of columns one after the other; eight numbers or arrays, in the order of the fields in Python.
#[pyfunction]
pub fn economizer_decide<'py>(
    py: Python<'py>,
    numbers: Numbers,
    codes: Codes,
    humidity_quantities: (i32, i32),
    state: &mut EconomizerState,
    values: Vec<Bound<'py, PyAny>>,
) -> PyResult<Bound<'py, PyList>> {
    let settings = settings(numbers, codes)?;
    let quantity = |code| coded(code, Quantity::from_code, "quantity");
    let quantities = [quantity(humidity_quantities.0)?, quantity(humidity_quantities.1)?];
    let mut decide = |row: [f64; 13]| {
        let [time, readings @ ..] = row;
        let [outdoor, returned] = airs(readings, quantities);
        fields(&settings.decide(&mut state.0, time, &outdoor, &returned))
    };
    let results = PyList::empty(py);
    let Some(samples) = Samples::read(py, &INPUTS, &values)? else {
        let mut row = [NAN; 13];
        for (place, value) in row.iter_mut().zip(&values) {
            *place = number(value)?;
        }
        for field in decide(row) {
            results.append(field)?;
        }
        return Ok(results);
    };
    let columns: [Column<'_>; 13] = samples.columns()?;
    let rows = samples.len();
    let mut filled = (0..8).map(|_| column::blank(rows, NAN)).collect::<PyResult<Vec<_>>>()?;
    py.detach(|| {
        for row in 0..rows {
            let fields = decide(columns.map(|column| column.get(row).unwrap_or(NAN)));
            for (column, field) in filled.iter_mut().zip(fields) {
                if let Some(place) = column.get_mut(row) {
                    *place = field;
                }
            }
        }
    });
    for column in filled {
        results.append(column::array(py, column, &[rows])?)?;
    }
    Ok(results)
}

/// A quality that is none refuses its reading.
fn airs(readings: [f64; 12], quantities: [Quantity; 2]) -> [MeasuredAir; 2] {
    let [a, b, c, d, e, f, g, h, i, j, k, l] = readings;
    let reading = |value, standard_uncertainty, quality| {
        let quality = quality_code(quality).unwrap_or(Quality::Refused);
        Reading { value, standard_uncertainty, quality }
    };
    let [of_outdoor, of_returned] = quantities;
    [
        MeasuredAir { dry_bulb: reading(a, b, c), humidity: reading(d, e, f), humidity_quantity: of_outdoor },
        MeasuredAir { dry_bulb: reading(g, h, i), humidity: reading(j, k, l), humidity_quantity: of_returned },
    ]
}

fn fields(decision: &Decision) -> [f64; 8] {
    [
        f64::from(u8::from(decision.enabled)),
        f64::from(decision.reason.code()),
        decision.margin,
        decision.margin_uncertainty,
        f64::from(decision.margin_quantity.code()),
        decision.confidence,
        f64::from(decision.quality.code()),
        f64::from(u8::from(decision.fallback)),
    ]
}

/// Names, codes and texts of the enumerations, for the check that Python's are the same.
#[pyfunction]
pub fn economizer_codes() -> Vec<(&'static str, String, i32, &'static str)> {
    macro_rules! rows {
        ($($type:ident as $name:literal),*) => {{
            let mut table = Vec::new();
            $(for item in $type::ALL {
                table.push(($name, format!("{item:?}"), item.code(), item.text()));
            })*
            table
        }};
    }
    rows!(
        Rule as "EconomizerRule",
        Reason as "EconomizerReason",
        FractionStatus as "FractionStatus",
        Reach as "Reach"
    )
}
