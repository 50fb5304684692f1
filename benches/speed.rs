//! Time per state beside that of what a user would otherwise write: on one core, all in turns in one run.
//!
//!     cargo bench -p moistair-benches [-- --quick]
//!
//! Nothing is asserted about time. That the rivals compute the same as the library's ideal gas is: a ratio between different results says
//! nothing.

use std::hint::black_box;
use std::path::Path;

use moistair_benches::air::{self, FULL_STATE, Outputs, Rows};
use moistair_benches::race::{Contender, Race};
use moistair_benches::rivals::{self, CCaller, CLoop, NumPy};
use moistair_core::columns::{Column, StateColumns};
use moistair_core::{Basis, Formulation, MoistAir, Pressure, Quantity, Scalar, Temperature};

/// How far a rival's results may lie from the library's: relative, and of temperatures in K.
const SAME: f64 = 1e-9;

/// A plain loop as one compiles it, told to use this processor, and with everything allowed.
const C_LOOPS: [(&str, &[&str]); 3] = [
    ("C loop, -O3", &["-O3"]),
    ("C loop, -O3 -march=native", &["-O3", "-march=native"]),
    ("C loop, -Ofast -march=native, fixed steps", &["-Ofast", "-march=native", "-DFIXED_STEPS"]),
];
const NUMPY: &str = "NumPy script";

const FORMULATIONS: [(Formulation, &str); 2] =
    [(Formulation::IdealGas, "ideal gas"), (Formulation::RealGas, "real gas")];

fn main() {
    // Without --bench it is a test run, which only wants to know that all this still works.
    let has = |flag: &str| std::env::args().any(|argument| argument == flag);
    let quick = has("--quick") || !has("--bench");
    let workshop = Path::new(env!("CARGO_TARGET_TMPDIR"));

    println!("{} {}, one core", std::env::consts::ARCH, std::env::consts::OS);
    println!("C compiler: {}", rivals::c_compiler().map_or_else(|missing| missing, |(_, version)| version));
    println!("NumPy: {}", rivals::numpy().map_or_else(|missing| missing, |(_, version)| version));
    if quick {
        full_state(4_000, 3, workshop);
        selectors(100, 3);
    } else {
        full_state(4_000, 15, workshop);
        full_state(100_000, 7, workshop);
        selectors(500, 9);
    }
}

fn full_state(count: usize, rounds: usize, workshop: &Path) {
    println!("\nFull state from dry bulb, relative humidity and pressure: {count} rows\n");
    let rows = &air::rows(count);
    let mut race = Race::default();
    let mut skipped = vec![];
    let truth = enter_library(&mut race, rows);
    enter_rivals(&mut race, &mut skipped, rows, &truth, workshop);
    let rounds = race.run(rounds);

    let references = [C_LOOPS[0].0, C_LOOPS[2].0, NUMPY].map(|name| race.find(name));
    println!("\n{:<44}{:>18}{:>27}", format!("medians of {rounds} rounds"), "ns per state", "time over that of");
    println!("{:<44}{:>9}{:>9}{:>9}{:>9}{:>9}", "", "median", "least", "C -O3", "C -Ofast", "NumPy");
    for contender in &race.contenders {
        let [plain, fast, numpy] = references.map(|reference| ratio(contender, reference));
        let (median, least) = (contender.median(), contender.least());
        println!("{:<44}{median:>9.1}{least:>9.1}{plain:>9}{fast:>9}{numpy:>9}", contender.name);
    }
    for (name, why) in skipped {
        println!("{name:<44}  skipped: {why}");
    }
}

fn ratio(contender: &Contender, reference: Option<&Contender>) -> String {
    reference.map_or_else(|| "-".to_owned(), |reference| format!("{:.2}", contender.ratio(reference)))
}

/// The library's own calls; returns the results of the ideal gas.
fn enter_library<'a>(race: &mut Race<'a>, rows: &'a Rows) -> Outputs {
    let count = rows.dry_bulb.len();
    for (formulation, name) in FORMULATIONS {
        let mut outputs = air::outputs(count);
        race.enter(format!("{name}, Rust, state by state"), count, move || states(formulation, rows, &mut outputs));
        let mut outputs = air::outputs(count);
        race.enter(format!("{name}, Rust, columns"), count, move || columns(formulation, rows, &mut outputs));
        let single = Single::new(rows);
        let mut outputs = vec![0.0; count * FULL_STATE.len()];
        race.enter(format!("{name}, Rust, state by state, f32"), count, move || {
            single.states(formulation, &mut outputs)
        });
    }
    let mut truth = air::outputs(count);
    states(Formulation::IdealGas, rows, &mut truth);
    truth
}

fn enter_rivals<'a>(
    race: &mut Race<'a>,
    skipped: &mut Vec<(String, String)>,
    rows: &'a Rows,
    truth: &Outputs,
    workshop: &'a Path,
) {
    let count = rows.dry_bulb.len();
    for (formulation, name) in FORMULATIONS {
        for (way, text) in [("call_states", "state by state"), ("call_columns", "columns")] {
            let name = format!("{name}, from C, {text}");
            match CCaller::new(workshop) {
                Ok(caller) => {
                    let mut outputs = air::outputs(count);
                    if formulation == Formulation::IdealGas {
                        caller.run(way, formulation, rows, &mut outputs);
                        check(&name, truth, &outputs);
                    }
                    race.enter(name, count, move || caller.run(way, formulation, rows, &mut outputs));
                }
                Err(why) => skipped.push((name, why)),
            }
        }
    }
    for (name, flags) in C_LOOPS {
        match CLoop::new(flags, workshop) {
            Ok(plain) => {
                let mut outputs = air::outputs(count);
                plain.run(rows, &mut outputs);
                check(name, truth, &outputs);
                race.enter(name, count, move || plain.run(rows, &mut outputs));
            }
            Err(why) => skipped.push((name.to_owned(), why)),
        }
    }
    let mut outputs = air::outputs(count);
    match NumPy::new(rows, &mut outputs, workshop) {
        Ok(mut script) => {
            check(NUMPY, truth, &outputs);
            race.enter_timed(NUMPY, count, move |passes| script.run(passes));
        }
        Err(why) => skipped.push((NUMPY.to_owned(), why)),
    }
}

/// That a rival computes the same.
fn check(name: &str, truth: &Outputs, outputs: &Outputs) {
    let mut most: f64 = 0.0;
    for (quantity, (ours, theirs)) in FULL_STATE.into_iter().zip(truth.iter().zip(outputs)) {
        let difference = air::difference(quantity, ours, theirs);
        assert!(difference <= SAME, "{name}: {} differs by {difference:e} from the ideal gas", quantity.name());
        most = most.max(difference);
    }
    println!("{name}: within {most:.1e} of the ideal gas (relative, or K)");
}

fn states(formulation: Formulation, rows: &Rows, outputs: &mut Outputs) {
    for i in 0..rows.dry_bulb.len() {
        let basis = Basis::new(Pressure::from_pascals(rows.pressure[i]), formulation);
        let humidity = moistair_core::RelativeHumidity::from_fraction(rows.relative_humidity[i]);
        let air = MoistAir::from_dry_bulb(Temperature::from_celsius(rows.dry_bulb[i]), humidity, basis).unwrap();
        let mut column = outputs.iter_mut();
        air.values(FULL_STATE, |_, value| {
            if let Some(column) = column.next() {
                column[i] = value.unwrap();
            }
        });
    }
}

fn columns(formulation: Formulation, rows: &Rows, outputs: &mut Outputs) {
    let inputs = StateColumns {
        dry_bulb: Column::new(&rows.dry_bulb),
        property: Quantity::RelativeHumidity,
        second: Column::new(&rows.relative_humidity),
        pressure: Column::new(&rows.pressure),
        formulation,
    };
    let mut places = outputs.each_mut().map(|column| column.as_mut_slice());
    let report = inputs.compute(rows.dry_bulb.len(), &FULL_STATE, &mut places, None).unwrap();
    assert_eq!(report.failed, 0);
}

/// The rows in single precision.
struct Single([Vec<f32>; 3]);

impl Single {
    fn new(rows: &Rows) -> Self {
        let narrow = |column: &Vec<f64>| column.iter().map(|value| *value as f32).collect();
        Self([narrow(&rows.dry_bulb), narrow(&rows.relative_humidity), narrow(&rows.pressure)])
    }

    fn states(&self, formulation: Formulation, outputs: &mut [f32]) {
        let [dry_bulb, humidity, pressure] = &self.0;
        for (i, outputs) in outputs.chunks_exact_mut(FULL_STATE.len()).enumerate() {
            let basis = Basis::new(Pressure::from_pascals(pressure[i]), formulation);
            let humidity = moistair_core::RelativeHumidity::from_fraction(humidity[i]);
            let air = MoistAir::from_dry_bulb(Temperature::from_celsius(dry_bulb[i]), humidity, basis).unwrap();
            let mut places = outputs.iter_mut();
            air.values(FULL_STATE, |_, value| {
                if let Some(place) = places.next() {
                    *place = value.unwrap();
                }
            });
        }
    }
}

/// What a state costs by its second property, and a property by its reader.
fn selectors(count: usize, rounds: usize) {
    let rows = air::rows(count);
    let (mut makes, mut reads) = (Race::default(), Race::default());
    for (formulation, name) in FORMULATIONS {
        let double = states_of(&rows, formulation, |value| value);
        let single = states_of(&rows, formulation, |value| value as f32);
        enter_selectors(&mut makes, &mut reads, &format!("{name}, f64"), double);
        enter_selectors(&mut makes, &mut reads, &format!("{name}, f32"), single);
    }
    print_selectors("A state from dry bulb, pressure and", makes, rounds);
    print_selectors("Of a state, its", reads, rounds);
}

fn states_of<S: Scalar>(rows: &Rows, formulation: Formulation, number: fn(f64) -> S) -> Vec<MoistAir<S>> {
    let state = |i: usize| {
        let basis = Basis::new(Pressure::from_pascals(number(rows.pressure[i])), formulation);
        let dry_bulb = Temperature::from_celsius(number(rows.dry_bulb[i]));
        let humidity = number(rows.relative_humidity[i]);
        MoistAir::from_dry_bulb_and(dry_bulb, Quantity::RelativeHumidity, humidity, basis).unwrap()
    };
    (0..rows.dry_bulb.len()).map(state).collect()
}

/// Each quantity on the states that have it.
fn enter_selectors<S: Scalar>(makes: &mut Race, reads: &mut Race, label: &str, states: Vec<MoistAir<S>>) {
    for quantity in Quantity::ALL.iter().copied().filter(|quantity| quantity.is_property()) {
        let name = format!("{}|{label}", quantity.name());
        let having: Vec<_> = states.iter().filter_map(|air| Some((*air, air.value(quantity).ok()?))).collect();
        if quantity.fixes_state() {
            let having = having.clone();
            makes.enter(name.clone(), having.len(), move || {
                for (air, value) in &having {
                    let made = MoistAir::from_dry_bulb_and(air.dry_bulb(), black_box(quantity), *value, air.basis());
                    let _ = black_box(made);
                }
            });
        }
        reads.enter(name, having.len(), move || {
            for (air, _) in &having {
                let _ = black_box(air.value(black_box(quantity)));
            }
        });
    }
}

fn print_selectors(title: &str, mut race: Race, rounds: usize) {
    let rounds = race.run(rounds);
    let labels = ["ideal gas, f64", "ideal gas, f32", "real gas, f64", "real gas, f32"];
    println!(
        "\n{:<44}{}   (ns, median of {rounds} rounds)",
        title,
        labels.map(|label| format!("{label:>16}")).concat()
    );
    for quantity in Quantity::ALL.iter().map(|quantity| quantity.name()) {
        let times = labels.map(|label| race.find(&format!("{quantity}|{label}")).map(Contender::median));
        if times.iter().any(Option::is_some) {
            let times = times.map(|time| time.map_or_else(|| "-".to_owned(), |time| format!("{time:.1}")));
            println!("{quantity:<44}{}", times.map(|time| format!("{time:>16}")).concat());
        }
    }
}
