//! The faces against each other: what C and Python say is what the core says, bit for bit, from the linked library and the installed wheel.

mod digest;
mod examples_only_print;
mod grid;
mod plant_day;
mod python;
mod readme;

use std::fs;
use std::path::{Path, PathBuf};
use std::process::{Command, ExitCode};

use libtest_mimic::Arguments;
use moistair_tests::toolchain::{Face, Linking, c_library, compile_c, python_command, root, run, trial, workshop};

fn main() -> ExitCode {
    let arguments = Arguments::from_args();
    let trials = vec![
        trial("digest_of_the_seeded_grid", &[], digest::committed),
        trial("plant_day_only_reads_calls_and_prints", &[], examples_only_print::no_arithmetic),
        trial("arithmetic_in_an_example_is_found", &[], examples_only_print::finds_arithmetic),
        trial("readme_shows_the_examples", &[], readme::code),
        trial("readme_states_the_limits", &[], readme::limits),
        trial("readme_tour_in_rust", &[], readme::rust_tour),
        trial("readme_tour_in_c", &[Face::C], readme::c_tour),
        trial("readme_tour_in_python", &[Face::Python], readme::python_tour),
        trial("c_examples_link_both_ways", &[Face::C], c_examples),
        trial("c_and_core_give_the_same_bits", &[Face::C], c_grid),
        trial("python_and_core_give_the_same_bits", &[Face::Python], python_grid),
        trial("python_own_tests", &[Face::Python], python::own_tests),
        trial("python_stubs_match_the_module", &[Face::Python], python::stubs),
        trial("python_examples_are_well_typed", &[Face::Python], python::typed_examples),
        trial("plant_day_prints_the_same_bytes_in_c", &[Face::C], plant_day::in_c),
        trial("plant_day_prints_the_same_bytes_in_python", &[Face::Python], plant_day::in_python),
    ];
    libtest_mimic::run(&arguments, trials).exit_code()
}

fn c_examples() {
    let library = c_library();
    for source in c_sources() {
        let printed: Vec<_> = [Linking::Static, Linking::Shared]
            .map(|linking| run(Command::new(compile_c(&source, linking)).current_dir(root())))
            .into();
        assert!(!printed[0].is_empty(), "{} prints nothing", source.display());
        assert!(printed[0] == printed[1], "{}: static and shared library differ", source.display());
        run(Command::new(&library.cpp_compiler)
            .args(["-std=c++17", "-fsyntax-only", "-Wall", "-Wextra", "-Werror", "-pedantic", "-x", "c++"])
            .arg("-I")
            .arg(root().join("moistair-ffi/include"))
            .arg(root().join("moistair-ffi/include/moistair.h")));
    }
}

fn c_sources() -> Vec<PathBuf> {
    let folder = root().join("moistair-ffi/examples");
    let mut sources: Vec<_> = fs::read_dir(folder)
        .unwrap()
        .map(|entry| entry.unwrap().path())
        .filter(|path| path.extension().is_some_and(|extension| extension == "c"))
        .collect();
    sources.sort();
    assert!(!sources.is_empty());
    sources
}

fn c_grid() {
    let program = compile_c(&root().join("tests/conformance/grid.c"), Linking::Static);
    for way in ["states", "columns"] {
        grid_through(&format!("C {way}"), way, || Command::new(&program));
    }
}

fn python_grid() {
    for way in ["states", "arrays"] {
        grid_through(&format!("Python {way}"), way, || {
            let mut command = python_command();
            command.arg(root().join("tests/conformance/grid.py"));
            command
        });
    }
}

fn grid_through(face: &str, way: &str, program: impl Fn() -> Command) {
    let inputs = grid::write_inputs();
    let output = workshop().join("grid-results.bin");
    let _ = fs::remove_file(&output);
    run(program().arg(way).arg(&inputs).arg(&output));
    grid::compare(face, &read(&output));
}

fn read(path: &Path) -> Vec<u8> {
    fs::read(path).unwrap_or_else(|error| panic!("{}: {error}", path.display()))
}
