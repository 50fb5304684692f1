//! The README shows the examples as they are, what they print, and the limits of the table.

use std::fs;
use std::path::Path;
use std::process::Command;

use moistair_core::Quantity;
use moistair_tests::toolchain::{Linking, cargo, compile_c, python_command, root, run};

const RUST: &str = "moistair-core/examples/tour.rs";
const C: &str = "moistair-ffi/examples/tour.c";
const PYTHON: &str = "moistair-py/examples/tour.py";

fn readme() -> String {
    fs::read_to_string(root().join("README.md")).unwrap()
}

fn read(path: impl AsRef<Path>) -> String {
    fs::read_to_string(root().join(path)).unwrap()
}

/// The text block that stands for the output of all three tours.
fn printed() -> String {
    let readme = readme();
    let (_, rest) = readme.split_once("```text\n").expect("a text block");
    let (block, _) = rest.split_once("```").expect("its end");
    block.to_owned()
}

/// The code blocks are the example files.
pub fn code() {
    for (language, path) in [("rust", RUST), ("c", C), ("python", PYTHON)] {
        let block = format!("`{path}`\n\n```{language}\n{}\n```", read(path).trim_end());
        assert!(readme().contains(&block), "README.md does not show {path} as it is");
    }
}

/// Each row of the table of limits says what the core checks.
pub fn limits() {
    let readme = readme();
    let rows: Vec<Vec<&str>> = readme
        .lines()
        .skip_while(|line| !line.starts_with("| input |"))
        .skip(2)
        .take_while(|line| line.starts_with('|'))
        .map(|line| line.trim_matches('|').split('|').map(str::trim).collect())
        .collect();
    assert!(rows.len() >= 9, "a table of limits");
    for row in rows {
        let quantity = Quantity::ALL.iter().find(|quantity| quantity.name() == row[0]).expect(row[0]);
        let (min, max) = quantity.limits();
        let number = |text: &str| text.parse::<f64>().expect("a number");
        assert!(number(row[1]) == min && number(row[2]) == max && row[3] == quantity.unit(), "{row:?}: {min} to {max}");
    }
}

fn same(bytes: &[u8], face: &str) {
    assert_eq!(String::from_utf8_lossy(bytes), printed(), "what the tour prints in {face}");
}

/// The Rust tour prints what the README says.
pub fn rust_tour() {
    same(&run(cargo().args(["run", "--release", "--quiet", "--example", "tour"])), "Rust");
}

/// The C tour too.
pub fn c_tour() {
    same(&run(&mut Command::new(compile_c(&root().join(C), Linking::Static))), "C");
}

/// The Python tour too.
pub fn python_tour() {
    same(&run(python_command().arg(root().join(PYTHON))), "Python");
}
