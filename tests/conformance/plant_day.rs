//! The main job, three times: the same bytes.

use std::process::Command;

use moistair_tests::toolchain::{Linking, cargo, compile_c, python_command, root, run};

fn log() -> std::path::PathBuf {
    root().join("moistair-core/examples/plant_day.csv")
}

fn in_rust() -> String {
    let bytes = run(cargo().args(["run", "--release", "--quiet", "--example", "plant_day", "--"]).arg(log()));
    String::from_utf8(bytes).unwrap()
}

fn compare(face: &str, bytes: Vec<u8>) {
    let (rust, other) = (in_rust(), String::from_utf8(bytes).unwrap());
    assert!(rust.lines().count() > 24, "a line for each hour at least:\n{rust}");
    for (number, (ours, theirs)) in rust.lines().zip(other.lines()).enumerate() {
        assert_eq!(ours, theirs, "line {} in Rust and in {face}", number + 1);
    }
    assert!(rust == other, "{face} prints another number of lines");
}

/// The C program, from the linked library.
pub fn in_c() {
    let program = compile_c(&root().join("moistair-ffi/examples/plant_day.c"), Linking::Static);
    compare("C", run(Command::new(program).arg(log())));
}

/// The Python script, from the installed wheel.
pub fn in_python() {
    compare("Python", run(python_command().arg(root().join("moistair-py/examples/plant_day.py")).arg(log())));
}
