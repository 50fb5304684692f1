//! The catalogue by itself, and every process of it as numbers, as values and in columns.

mod plausible;

use std::collections::BTreeSet;
use std::string::{String, ToString};
use std::vec::Vec;
use std::{format, println, vec};

use plausible::plausible;

use super::*;
use crate::checks::Random;
use crate::{Basis, HumidityRatio, MoistAir, Pressure, Temperature};

const ROWS: usize = 24;

fn inputs(process: Process) -> Vec<Field> {
    (0..process.input_count()).map(|place| process.input(place).unwrap()).collect()
}

fn outputs(process: Process) -> Vec<Field> {
    (0..process.output_count()).map(|place| process.output(place).unwrap()).collect()
}

#[test]
fn codes_and_names_are_unique_and_fields_have_names_and_units() {
    let mut codes = BTreeSet::new();
    let mut names = BTreeSet::new();
    let mut fields = 0;
    for process in Process::ALL {
        assert!(codes.insert(process.code()) && names.insert(process.name()), "{process:?} is there twice");
        assert_eq!(Process::from_code(process.code()), Some(process));
        assert_eq!(Process::from_name(process.name()), Some(process));
        assert!(process.input_count() - process.repeated() + 6 * MAX_STREAMS <= MAX_INPUTS, "{process:?}");
        assert!(process.output_count() <= MAX_OUTPUTS, "{process:?}");
        for list in [inputs(process), outputs(process)] {
            let names: BTreeSet<String> = list.iter().map(Field::to_string).collect();
            assert_eq!(names.len(), list.len(), "{process:?}: two fields of one name: {names:?}");
            assert!(list.iter().all(|field| !field.to_string().is_empty() && !field.unit().is_empty()), "{process:?}");
            fields += list.len();
        }
        assert!(process.input(process.input_count()).is_none() && process.output(process.output_count()).is_none());
    }
    println!("{} processes with {fields} fields", codes.len());
    assert!(Process::from_code(0).is_none() && Process::from_name("").is_none());
}

/// Each trade has its hundred of codes, in order.
#[test]
fn codes_of_a_trade_stand_together() {
    for entries in TRADES {
        let hundred = entries[0].code / 100;
        assert!(entries.iter().all(|entry| entry.code / 100 == hundred));
        assert!(entries.windows(2).all(|pair| pair[0].code < pair[1].code));
    }
}

/// The numbers of a row as values: each state in one.
fn values_of(numbers: &[f64], fields: &[Field], formulation: Formulation) -> Result<Vec<Value>, Error> {
    let (mut values, mut place) = (vec![], 0);
    while place < numbers.len() {
        if !is_state(fields, place) {
            values.push(Value::Number(numbers[place]));
            place += 1;
            continue;
        }
        let (celsius, ratio) = (Temperature::from_celsius(numbers[place]), numbers[place + 1]);
        let basis = Basis::new(Pressure::from_pascals(numbers[place + 2]), formulation);
        values.push(Value::State(MoistAir::restore(
            celsius,
            HumidityRatio::from_kilograms_per_kilogram(ratio),
            basis,
        )?));
        place += 3;
    }
    Ok(values)
}

fn is_state(fields: &[Field], place: usize) -> bool {
    let names: Vec<_> = fields.iter().skip(place).take(3).map(Field::to_string).collect();
    let prefix = names[0].strip_suffix("dry_bulb").filter(|prefix| !prefix.is_empty());
    prefix.is_some_and(|prefix| names[1..] == [format!("{prefix}humidity_ratio"), format!("{prefix}pressure")])
}

fn numbers_of(values: &[Value]) -> Vec<f64> {
    let mut numbers = vec![];
    for value in values {
        match value {
            Value::Number(number) => numbers.push(*number),
            Value::State(air) => numbers.extend([
                air.dry_bulb().celsius(),
                air.humidity_ratio().kilograms_per_kilogram(),
                air.pressure().pascals(),
            ]),
        }
    }
    numbers
}

/// Columns, numbers and values give one result with the same bits and the same status, and every process has rows with a result.
#[test]
fn columns_are_rows_and_rows_are_values_bit_for_bit() {
    let (mut good, mut compared) = (0, 0);
    for (place, process) in Process::ALL.into_iter().enumerate() {
        // Of its own, so that a new process changes no other's rows.
        let mut random = Random(1405 + process.code() as u64);
        let formulation = Formulation::ALL[place % 2];
        let mut fields = inputs(process);
        let group = fields[fields.len() - process.repeated()..].to_vec();
        for _ in 0..usize::from(!group.is_empty()) * 2 {
            fields.extend(&group);
        }
        assert!(process.takes(fields.len()) && !process.takes(fields.len() + 1));
        let mut column = |field: &Field| -> Vec<f64> {
            let name = field.to_string();
            (0..ROWS).map(|row| plausible(process.name(), &name, field.unit(), row, &mut random)).collect()
        };
        let columns: Vec<Vec<f64>> = fields.iter().map(&mut column).collect();
        let views: Vec<_> = columns.iter().map(|column| Column::new(column)).collect();
        let call = ProcessColumns { process, inputs: &views, formulation };
        let count = process.output_count();
        let (mut results, mut status) = (vec![vec![7.0; ROWS]; count], [-1; ROWS]);
        let mut places: Vec<_> = results.iter_mut().map(|column| Some(&mut column[..])).collect();
        let report = call.compute(ROWS, &mut places, Some(&mut status)).unwrap();
        let (mut failed, mut first) = (0, None);
        for row in 0..ROWS {
            let numbers: Vec<f64> = columns.iter().map(|column| column[row]).collect();
            let mut one = vec![0.0; count];
            let outcome = process.evaluate(formulation, &numbers, &mut one);
            let values = values_of(&numbers, &fields, formulation).map_err(RowError::from).and_then(|values| {
                let mut room = [Value::Number(NAN); MAX_OUTPUTS];
                let written = process.evaluate_values(formulation, &values, &mut room)?;
                Ok(numbers_of(&room[..written]))
            });
            let code = match outcome {
                Ok(()) => 0,
                Err(RowError::Process(error)) => error.code(),
                Err(RowError::Choice(_)) => 102,
                Err(RowError::Misfit) => panic!("{process:?} row {row}"),
            };
            assert_eq!(status[row], code, "{process:?} row {row}");
            // States come first where they are restored first: what else is wrong with the row then shows later.
            assert_eq!(values.is_ok(), outcome.is_ok(), "{process:?} row {row}");
            for (output, result) in results.iter().enumerate() {
                let expected = if code == 0 { one[output] } else { NAN };
                assert_eq!(result[row].to_bits(), expected.to_bits(), "{process:?} row {row} output {output}");
                compared += 1;
            }
            if let Ok(values) = values {
                let bits = |numbers: &[f64]| numbers.iter().map(|number| number.to_bits()).collect::<Vec<_>>();
                assert_eq!(bits(&values), bits(&one), "{process:?} row {row}");
                good += 1;
            } else {
                failed += 1;
                first = first.or(Some(row));
            }
        }
        assert_eq!((report.failed, report.first.map(|(row, _)| row)), (failed, first), "{process:?}");
        assert!(failed < ROWS, "{process:?} has no row with a result: {:?}", report.first);
    }
    println!("{compared} values compared, {good} rows with a result");
}

#[test]
fn misfits_are_refused_before_anything_is_written() {
    let process = Process::from_name("sensible.with_heat").unwrap();
    let numbers = [20.0, 0.008, 101_325.0, 1.0, 1e3];
    let constant: Vec<_> = numbers.iter().map(Column::constant).collect();
    let mut output = [7.0; 3];
    let mut refused = |inputs: &[Column], rows, count, status: Option<&mut [i32]>| {
        let mut outputs: Vec<Option<&mut [f64]>> = (0..count).map(|_| None).collect();
        if let Some(first) = outputs.first_mut() {
            *first = Some(&mut output);
        }
        let call = ProcessColumns { process, inputs, formulation: Formulation::RealGas };
        let error = call.compute(rows, &mut outputs, status).unwrap_err();
        assert!(output.iter().all(|value| value.to_bits() == 7f64.to_bits()));
        error
    };
    assert_eq!(refused(&constant[1..], 3, 8, None), ColumnMismatch::InputCount);
    assert_eq!(refused(&constant, 3, 7, None), ColumnMismatch::OutputCount);
    assert_eq!(refused(&constant, 2, 8, None), ColumnMismatch::OutputLength);
    assert_eq!(refused(&constant, 3, 8, Some(&mut [0; 2])), ColumnMismatch::OutputLength);
    let short = [constant[0], constant[1], constant[2], constant[3], Column::new(&numbers[..2])];
    assert_eq!(refused(&short, 3, 8, None), ColumnMismatch::ShortInput);

    let mut room = [0.0; 9];
    let mut misfit = |inputs: &[f64], outputs: usize| {
        process.evaluate(Formulation::RealGas, inputs, &mut room[..outputs]) == Err(RowError::Misfit)
    };
    assert!(misfit(&numbers[..4], 8) && misfit(&[20.0, 0.008, 101_325.0, 1.0, 1e3, 1.0], 8));
    assert!(misfit(&numbers, 7) && misfit(&numbers, 9) && !misfit(&numbers, 8));
}

#[test]
fn streams_up_to_the_most() {
    let process = Process::from_name("mixing.adiabatic").unwrap();
    let stream = [20.0, 0.005, 101_325.0, 0.0, 0.0, 1.0];
    let mixed = |count: usize| {
        let (numbers, mut outputs) = (stream.repeat(count), vec![0.0; process.output_count()]);
        process.evaluate(Formulation::RealGas, &numbers, &mut outputs).map(|()| outputs)
    };
    assert_eq!(mixed(0), Err(RowError::Process(Error::NoFlow)));
    assert!(mixed(MAX_STREAMS).is_ok() && process.takes(6 * MAX_STREAMS));
    assert_eq!(mixed(MAX_STREAMS + 1), Err(RowError::Misfit));
    assert!(!process.takes(6 * (MAX_STREAMS + 1)) && !process.takes(5));
}
