//! Processes in columns through C: the bits of the catalogue and of the typed functions, what their columns are called, and what is refused
//! before anything is written.

#![allow(clippy::unwrap_used, clippy::indexing_slicing, clippy::float_cmp, reason = "a test")]

use core::ffi::CStr;
use core::ptr::{null, null_mut};

use moistair::*;
use moistair_core::columns::{Field, MAX_STREAMS, NAN, Process, RowError};
use moistair_core::process::sensible;
use moistair_core::process::{AirStream, coil, compression, humidify, mixing};
use moistair_core::{
    Basis, Error, Formulation, HeatFlow, HumidityRatio, MassFlow, MoistAir, Pressure, SpecificEnthalpy, Temperature,
};
use moistair_tests::checks::Random;
use moistair_tests::plausible::plausible;

const ROWS: usize = 64;

type Fields = fn(Process, usize) -> Option<Field>;

fn fields(process: Process, field: Fields) -> Vec<Field> {
    (0..).map_while(|place| field(process, place)).collect()
}

/// What a process takes, a group that repeats three times.
fn inputs(process: Process) -> Vec<Field> {
    let mut fields = fields(process, Process::input);
    let group = fields[fields.len() - process.repeated()..].to_vec();
    for _ in 0..usize::from(!group.is_empty()) * 2 {
        fields.extend(&group);
    }
    fields
}

/// A call with everything in it, to be spoilt.
struct Call {
    rows: usize,
    process: i32,
    formulation: i32,
    inputs: Vec<moistair_column>,
    outputs: Vec<*mut f64>,
    status: *mut i32,
    report: *mut moistair_column_report,
    error: *mut moistair_error,
}

impl Call {
    /// Columns of rows that lie one after another in memory.
    fn of_records(process: Process, formulation: Formulation, rows: usize, records: &[f64]) -> Self {
        let width = records.len() / rows;
        Self {
            rows,
            process: process.code(),
            formulation: formulation.code(),
            inputs: (0..width).map(|place| moistair_column { values: &records[place], stride: width }).collect(),
            outputs: vec![null_mut(); process.output_count()],
            status: null_mut(),
            report: null_mut(),
            error: null_mut(),
        }
    }

    fn run(&self) -> i32 {
        self.run_with(self.inputs.as_ptr(), self.inputs.len(), self.outputs.as_ptr(), self.outputs.len())
    }

    fn run_with(&self, inputs: *const moistair_column, takes: usize, outputs: *const *mut f64, gives: usize) -> i32 {
        let Self { rows, process, formulation, status, report, error, .. } = *self;
        // SAFETY: each test gives valid memory, or what the library refuses before it looks.
        unsafe {
            moistair_process_columns(rows, process, inputs, takes, formulation, outputs, gives, status, report, error)
        }
    }
}

#[test]
fn every_process_gives_the_bits_of_the_catalogue() {
    let (mut compared, mut good) = (0, 0);
    for (place, process) in Process::ALL.into_iter().enumerate() {
        // Of its own, so that a new process changes no other's rows.
        let mut random = Random(2_207 + process.code() as u64);
        let formulation = Formulation::ALL[place % 3];
        let (fields, gives) = (inputs(process), process.output_count());
        let row = |row| -> Vec<f64> {
            let one = |field: &Field| plausible(process.name(), &field.to_string(), field.unit(), row, &mut random);
            fields.iter().map(one).collect()
        };
        let records: Vec<f64> = (0..ROWS).flat_map(row).collect();
        let (mut results, mut status) = (vec![[7.0; ROWS]; gives], [-1; ROWS]);
        let mut report = moistair_column_report { failed: 77, first_failed: 77 };
        let mut call = Call::of_records(process, formulation, ROWS, &records);
        // Every third result is not wanted.
        let wanted = |output: usize| gives < 3 || output % 3 != place % 3;
        for (output, column) in results.iter_mut().enumerate() {
            call.outputs[output] = if wanted(output) { column.as_mut_ptr() } else { null_mut() };
        }
        (call.status, call.report) = (status.as_mut_ptr(), &mut report);
        let code = call.run();
        let mut failed = 0;
        for (row, numbers) in records.chunks(fields.len()).enumerate() {
            let mut one = vec![0.0; gives];
            let expected = match process.evaluate(formulation, numbers, &mut one) {
                Ok(()) => 0,
                Err(RowError::Process(error)) => error.code(),
                Err(RowError::Choice(_)) => MOISTAIR_UNKNOWN_SELECTOR,
                Err(other) => panic!("{process:?}: {other}"),
            };
            assert_eq!(status[row], expected, "{process:?} row {row}");
            for (output, column) in results.iter().enumerate() {
                let value = if expected == 0 { one[output] } else { NAN };
                let value = if wanted(output) { value } else { 7.0 };
                assert_eq!(column[row].to_bits(), value.to_bits(), "{process:?} row {row} output {output}");
                compared += 1;
            }
            failed += usize::from(expected != 0);
        }
        let first = status.iter().position(|status| *status != 0);
        assert_eq!((report.failed, report.first_failed), (failed, first.unwrap_or(ROWS)), "{process:?}");
        assert_eq!(code, first.map_or(0, |row| status[row]), "{process:?}");
        assert!(failed < ROWS, "{process:?} has no row with a result");
        good += ROWS - failed;
    }
    println!("{} processes: {compared} values compared, {good} rows with a result", Process::ALL.len());
}

fn celsius(value: f64) -> Temperature {
    Temperature::from_celsius(value)
}

/// The states that three numbers are.
fn air(numbers: &[f64], formulation: Formulation) -> Result<MoistAir, Error> {
    let basis = Basis::new(Pressure::from_pascals(numbers[2]), formulation);
    MoistAir::from_dry_bulb(celsius(numbers[0]), HumidityRatio::from_kilograms_per_kilogram(numbers[1]), basis)
}

fn stream(numbers: &[f64], formulation: Formulation) -> Result<AirStream, Error> {
    AirStream::new(air(numbers, formulation)?, MassFlow::from_kilograms_per_second(numbers[3]))
}

fn numbers_of(air: &MoistAir) -> [f64; 3] {
    [air.dry_bulb().celsius(), air.humidity_ratio().kilograms_per_kilogram(), air.pressure().pascals()]
}

fn flows(stream: &AirStream) -> [f64; 2] {
    [stream.dry_air_flow().kilograms_per_second(), stream.volume_flow().cubic_meters_per_second()]
}

/// A process, the numbers that it takes, and its first results by the typed function.
type Typed = (i32, fn(&mut Random) -> Vec<f64>, fn(&[f64], Formulation) -> Result<Vec<f64>, Error>);

fn entering(random: &mut Random) -> [f64; 4] {
    [random.between(-5.0, 35.0), random.between(0.0, 0.012), 101_325.0, random.between(0.0, 3.0)]
}

const TYPED: [Typed; 6] = [
    (
        MOISTAIR_PROCESS_SENSIBLE_WITH_HEAT,
        |r| [&entering(r)[..], &[r.between(-1e4, 4e4)]].concat(),
        |x, f| {
            let done = sensible::with_heat(&stream(x, f)?, HeatFlow::from_watts(x[4]))?;
            Ok([&numbers_of(&done.leaving.air())[..], &flows(&done.leaving)].concat())
        },
    ),
    (
        MOISTAIR_PROCESS_COIL_BY_BYPASS_FACTOR,
        |r| [&entering(r)[..], &[r.between(-5.0, 15.0), r.between(0.0, 0.5), 0.0, 0.0]].concat(),
        |x, f| {
            let drains = coil::CondensateTemperature::LeavingAir;
            let done = coil::by_bypass_factor(&stream(x, f)?, celsius(x[4]), x[5], drains)?;
            let ends = [done.entering, done.leaving];
            let of = |end: &AirStream| [&numbers_of(&end.air())[..], &flows(end)].concat();
            Ok(ends.iter().flat_map(of).collect())
        },
    ),
    (
        MOISTAIR_PROCESS_HUMIDIFY_STEAM,
        |r| [&entering(r)[..], &[r.between(0.0, 0.01), r.between(2.6e6, 2.8e6)]].concat(),
        |x, f| {
            let (flow, steam) =
                (MassFlow::from_kilograms_per_second(x[4]), SpecificEnthalpy::from_joules_per_kilogram(x[5]));
            Ok(numbers_of(&humidify::steam(&stream(x, f)?, flow, steam)?.leaving.air().air()).to_vec())
        },
    ),
    (
        MOISTAIR_PROCESS_MIXING_ADIABATIC,
        |r| {
            let wet = |[t, w, p, flow]: [f64; 4]| [t, w, p, 0.0, 0.0, flow];
            [wet(entering(r)), wet(entering(r))].concat()
        },
        |x, f| {
            let one = |x: &[f64]| stream(&[x[0], x[1], x[2], x[5]], f).map(Into::into);
            Ok(numbers_of(&mixing::adiabatic(&[one(x)?, one(&x[6..])?])?.leaving.air().air()).to_vec())
        },
    ),
    (
        MOISTAIR_PROCESS_COMPRESSION_TO_PRESSURE,
        |r| {
            let [t, w, p, flow] = entering(r);
            vec![t, w, p, 0.0, 0.0, flow, r.between(2e5, 9e5), r.between(5.0, 40.0)]
        },
        |x, f| {
            let entering = stream(&[x[0], x[1], x[2], x[5]], f)?.into();
            let done = compression::to_pressure(&entering, Pressure::from_pascals(x[6]), celsius(x[7]))?;
            Ok(numbers_of(&done.leaving.air().air()).to_vec())
        },
    ),
    (
        MOISTAIR_PROCESS_AIR_AT_PRESSURE,
        |r| [&entering(r)[..3], &[r.between(5e4, 2e5)]].concat(),
        |x, f| Ok(numbers_of(&air(x, f)?.at_pressure(Pressure::from_pascals(x[3]))?).to_vec()),
    ),
];

#[test]
fn columns_are_the_typed_functions() {
    let (mut random, mut compared) = (Random(909), 0);
    for formulation in Formulation::ALL.iter().copied() {
        for (code, draw, typed) in TYPED {
            let process = Process::from_code(code).unwrap();
            let records: Vec<Vec<f64>> = (0..ROWS).map(|_| draw(&mut random)).collect();
            let flat = records.concat();
            let (mut results, mut status) = (vec![[7.0; ROWS]; process.output_count()], [-1; ROWS]);
            let mut call = Call::of_records(process, formulation, ROWS, &flat);
            call.outputs = results.iter_mut().map(|column| column.as_mut_ptr()).collect();
            call.status = status.as_mut_ptr();
            call.run();
            let mut good = 0;
            for (row, numbers) in records.iter().enumerate() {
                let expected = typed(numbers, formulation);
                assert_eq!(status[row], expected.as_ref().err().map_or(0, Error::code), "{process:?} row {row}");
                for (value, column) in expected.iter().flatten().zip(&results) {
                    assert_eq!(column[row].to_bits(), value.to_bits(), "{process:?} row {row}");
                    compared += 1;
                }
                good += usize::from(expected.is_ok());
            }
            assert!(good > ROWS / 4, "{process:?}: only {good} rows have a result");
        }
    }
    println!("{compared} values of typed functions compared");
}

#[test]
fn fields_and_counts_are_those_of_the_catalogue() {
    type Describe = unsafe extern "C" fn(i32, usize, *mut moistair_field, *mut moistair_error) -> i32;
    let text = |text: &[core::ffi::c_char]| {
        assert_eq!(text.last(), Some(&0));
        // SAFETY: terminated, as just seen.
        unsafe { CStr::from_ptr(text.as_ptr()) }.to_str().unwrap().to_owned()
    };
    let mut seen = 0;
    for process in Process::ALL {
        let code = process.code();
        let count = moistair_process_input_count(code);
        assert_eq!((count, moistair_process_output_count(code)), (process.input_count(), process.output_count()));
        assert_eq!(moistair_process_repeated_count(code), process.repeated());
        // SAFETY: a static text.
        let name = unsafe { CStr::from_ptr(moistair_process_name(code)) };
        assert_eq!(name.to_str(), Ok(process.name()));
        let faces: [(Describe, Fields); 2] =
            [(moistair_process_input, Process::input), (moistair_process_output, Process::output)];
        for (describe, field) in faces {
            let all = fields(process, field);
            for (place, field) in all.iter().enumerate() {
                let mut found = moistair_field { name: [1; 64], unit: [1; 128] };
                // SAFETY: a valid place.
                assert_eq!(unsafe { describe(code, place, &mut found, null_mut()) }, MOISTAIR_OK);
                assert_eq!((text(&found.name), text(&found.unit)), (field.to_string(), field.unit().to_owned()));
                seen += 1;
            }
            let mut found = moistair_field { name: [1; 64], unit: [1; 128] };
            // SAFETY: a valid place.
            let beyond = unsafe { describe(code, all.len(), &mut found, null_mut()) };
            assert_eq!((beyond, found.name[0]), (MOISTAIR_UNKNOWN_SELECTOR, 1));
        }
    }
    println!("{seen} fields");
    for unknown in [-1, 0, i32::MAX] {
        let counts = [moistair_process_input_count, moistair_process_output_count, moistair_process_repeated_count];
        assert!(counts.iter().all(|count| count(unknown) == 0));
        // SAFETY: a static text.
        assert!(unsafe { CStr::from_ptr(moistair_process_name(unknown)) }.is_empty());
    }
}

const HEATER: [f64; 5] = [20.0, 0.008, 101_325.0, 1.0, 1e3];

fn heater(records: &[f64]) -> Call {
    let process = Process::from_code(MOISTAIR_PROCESS_SENSIBLE_WITH_HEAT).unwrap();
    Call::of_records(process, Formulation::RealGas, records.len() / HEATER.len(), records)
}

#[test]
fn overlap_is_refused() {
    let records = HEATER.repeat(ROWS);
    let (mut memory, mut status) = ([7.0; 2 * ROWS], [7; ROWS]);
    let start = memory.as_mut_ptr();
    let outputs = |first: *mut f64, second: *mut f64| {
        let mut call = heater(&records);
        (call.outputs[0], call.outputs[6]) = (first, second);
        call
    };
    let apart = || outputs(start, start.wrapping_add(ROWS));
    // Two outputs that share their last and first element, or all.
    assert_eq!(outputs(start, start.wrapping_add(ROWS - 1)).run(), MOISTAIR_OVERLAPPING);
    assert_eq!(outputs(start, start).run(), MOISTAIR_OVERLAPPING);
    // An output and an input; an output and the status, the report, the error; the status and an input.
    let mut call = apart();
    call.inputs[4] = moistair_column { values: start.wrapping_add(2 * ROWS - 1), stride: 0 };
    assert_eq!(call.run(), MOISTAIR_OVERLAPPING);
    assert_eq!(Call { status: start.wrapping_add(ROWS).cast(), ..apart() }.run(), MOISTAIR_OVERLAPPING);
    assert_eq!(Call { report: start.cast(), ..apart() }.run(), MOISTAIR_OVERLAPPING);
    assert_eq!(Call { status: records.as_ptr().cast_mut().cast(), ..apart() }.run(), MOISTAIR_OVERLAPPING);
    // The arrays of columns themselves.
    for array in [0, 1] {
        let mut call = apart();
        let taken: *mut f64 = [call.inputs.as_mut_ptr().cast(), call.outputs.as_mut_ptr().cast()][array];
        (call.rows, call.outputs[3]) = (2, taken);
        assert_eq!(call.run(), MOISTAIR_OVERLAPPING);
    }
    assert!(memory.iter().all(|value| *value == 7.0) && status.iter().all(|status| *status == 7));
    // Apart; inputs may share what they read.
    let mut call = Call { status: status.as_mut_ptr(), ..outputs(memory.as_mut_ptr(), null_mut()) };
    call.inputs[3] = call.inputs[2];
    call.inputs[3].values = &HEATER[3];
    call.inputs[3].stride = 0;
    assert_eq!(call.run(), MOISTAIR_OK);
    assert!(memory[..ROWS].iter().all(|value| *value > 20.9) && status.iter().all(|status| *status == 0));
}

#[test]
fn bad_arguments_are_refused() {
    let records = HEATER.repeat(ROWS);
    let mut memory = [7.0; ROWS];
    let start = memory.as_mut_ptr();
    let mut error = moistair_error { value: 0.0, min: 0.0, max: 0.0, code: 0, quantity: 0 };
    let detail = &raw mut error;
    let call = || {
        let mut call = Call { error: detail, ..heater(&records) };
        call.outputs[0] = start;
        call
    };
    let refused = |code: i32, call: &Call| {
        assert_eq!(call.run(), code);
        // SAFETY: written by the call.
        unsafe { detail.read() }
    };
    let unknown = refused(MOISTAIR_UNKNOWN_SELECTOR, &Call { process: 7, ..call() });
    assert_eq!((unknown.value, unknown.quantity), (7.0, -1));
    let unknown = refused(MOISTAIR_UNKNOWN_SELECTOR, &Call { formulation: 9, ..call() });
    assert_eq!((unknown.value, unknown.quantity), (9.0, -1));
    let mut few = call();
    few.inputs.pop();
    let count = refused(MOISTAIR_WRONG_COUNT, &few);
    assert_eq!((count.value, count.min, count.max), (4.0, 5.0, 5.0));
    let mut many = call();
    many.outputs.push(null_mut());
    let count = refused(MOISTAIR_WRONG_COUNT, &many);
    assert_eq!((count.value, count.min, count.max), (9.0, 8.0, 8.0));
    let mut missing = call();
    missing.inputs[2].values = null();
    refused(MOISTAIR_NULL_POINTER, &missing);
    let mut odd = call();
    odd.inputs[2].values = odd.inputs[2].values.wrapping_byte_add(4);
    refused(MOISTAIR_MISALIGNED, &odd);
    let mut odd = call();
    odd.outputs[1] = start.wrapping_byte_add(4);
    refused(MOISTAIR_MISALIGNED, &odd);
    let mut far = call();
    far.inputs[2].stride = usize::MAX / 2;
    refused(MOISTAIR_TOO_LONG, &far);
    refused(MOISTAIR_TOO_LONG, &Call { rows: usize::MAX, ..call() });
    refused(MOISTAIR_TOO_LONG, &Call { rows: usize::MAX / 8, ..call() });
    refused(MOISTAIR_MISALIGNED, &Call { status: start.wrapping_byte_add(2).cast(), ..call() });
    let call = call();
    assert_eq!(call.run_with(null(), 5, call.outputs.as_ptr(), 8), MOISTAIR_NULL_POINTER);
    assert_eq!(call.run_with(call.inputs.as_ptr(), 5, null(), 8), MOISTAIR_NULL_POINTER);
    assert_eq!(call.run_with(call.inputs.as_ptr(), usize::MAX, call.outputs.as_ptr(), 8), MOISTAIR_WRONG_COUNT);
    assert!(memory.iter().all(|value| *value == 7.0));
}

#[test]
fn streams_that_repeat_and_choices_that_are_not() {
    let process = Process::from_code(MOISTAIR_PROCESS_MIXING_ADIABATIC).unwrap();
    let one = [20.0, 0.005, 101_325.0, 0.0, 0.0, 1.0];
    let mixed = |count: usize| {
        let records = one.repeat(count);
        let mut flow = 7.0;
        let mut call = Call::of_records(process, Formulation::RealGas, 1, &records);
        call.outputs[8] = &mut flow;
        (call.run(), flow)
    };
    assert_eq!((mixed(1), mixed(MAX_STREAMS)), ((MOISTAIR_OK, 1.0), (MOISTAIR_OK, MAX_STREAMS as f64)));
    assert_eq!(mixed(MAX_STREAMS + 1), (MOISTAIR_WRONG_COUNT, 7.0));
    assert_eq!(mixed(0).0, MOISTAIR_NO_FLOW);

    // The rows are run: the report is written, and the detail has the choice.
    let coil = Process::from_code(MOISTAIR_PROCESS_COIL_BY_BYPASS_FACTOR).unwrap();
    let records = [30.0, 0.01, 101_325.0, 1.0, 8.0, 0.1, 9.0, 0.0];
    let mut report = moistair_column_report { failed: 77, first_failed: 77 };
    let mut error = moistair_error { value: 0.0, min: 0.0, max: 0.0, code: 0, quantity: 0 };
    let call = Call::of_records(coil, Formulation::RealGas, 1, &records);
    assert_eq!(Call { report: &mut report, error: &mut error, ..call }.run(), MOISTAIR_UNKNOWN_SELECTOR);
    assert_eq!((report.failed, report.first_failed), (1, 0));
    assert_eq!((error.value, error.quantity, error.code), (9.0, -1, MOISTAIR_UNKNOWN_SELECTOR));
}

#[test]
fn no_rows_need_no_memory() {
    for process in Process::ALL {
        let mut report = moistair_column_report { failed: 7, first_failed: 7 };
        let mut call = Call::of_records(process, Formulation::RealGas, 1, &[]);
        (call.rows, call.report) = (0, &mut report);
        let (takes, gives) = (process.input_count(), process.output_count());
        assert_eq!(call.run_with(null(), takes, null(), gives), MOISTAIR_OK, "{process:?}");
        assert_eq!((report.failed, report.first_failed), (0, 0));
    }
}
