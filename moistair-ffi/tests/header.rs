//! The committed header is what the sources say, both compilers take it without a warning, and it declares what the library exports.
//!
//! After a change of the interface, write it anew with `MOISTAIR_WRITE_HEADER=1 cargo test -p moistair-ffi --test header`.

#![allow(clippy::unwrap_used, clippy::panic, clippy::indexing_slicing, reason = "a test")]

use std::collections::BTreeSet;
use std::path::{Path, PathBuf};
use std::process::{Command, ExitCode};
use std::{env, fs};

use libtest_mimic::Arguments;
use moistair_core::account::{Added, Rule};
use moistair_core::columns::{Field, Process};
use moistair_core::process::economizer;
use moistair_core::process::mixing::outdoor_air::{FractionStatus, Reach};
use moistair_core::signal::{Kind, Quality, Reason, Unit};
use moistair_core::{Error, Quantity};
use moistair_tests::toolchain::{Face, c_compiler, cpp_compiler, trial};

fn main() -> ExitCode {
    if env::var_os("MOISTAIR_WRITE_HEADER").is_some() {
        fs::write(selectors(), rendered_selectors()).unwrap();
        fs::write(header(), rendered()).unwrap();
    }
    let trials = vec![
        trial("selectors_of_processes_are_those_of_the_catalogue", &[], selectors_of_processes),
        trial("committed_header_is_up_to_date", &[], committed_header_is_up_to_date),
        trial("every_code_of_the_core_has_its_constant", &[], every_code_of_the_core_has_its_constant),
        trial("every_status_has_a_text", &[], every_status_has_a_text),
        trial("exports_are_the_declarations", &[Face::C], exports_are_the_declarations),
        trial("header_compiles_strictly", &[Face::C], header_compiles_strictly),
        trial("c_sees_the_same_layout_and_version", &[Face::C], c_sees_the_same_layout_and_version),
        trial("examples_run", &[Face::C], examples_run),
    ];
    libtest_mimic::run(&Arguments::from_args(), trials).exit_code()
}

fn here() -> &'static Path {
    Path::new(env!("CARGO_MANIFEST_DIR"))
}

fn header() -> PathBuf {
    here().join("include/moistair.h")
}

fn committed() -> String {
    fs::read_to_string(header()).unwrap()
}

fn selectors() -> PathBuf {
    here().join("src/columns/selectors.rs")
}

/// A constant for each process of the catalogue, and at which place its columns stand.
fn rendered_selectors() -> String {
    let note = "MOISTAIR_WRITE_HEADER=1 cargo test -p moistair-ffi --test header";
    let mut text = format!("//! Selectors of processes, made from the catalogue; do not edit: `{note}`.\n");
    for process in Process::ALL {
        let name = process.name().to_uppercase().replace('.', "_");
        let group = process.input_count() - process.repeated();
        let inputs = columns(process, Process::input, group);
        let outputs = columns(process, Process::output, usize::MAX);
        let sentence = format!("{}. Takes {inputs}; gives {outputs}.", process.name());
        text += &format!("\n{}pub const MOISTAIR_PROCESS_{name}: i32 = {};\n", wrapped(&sentence), process.code());
    }
    text
}

/// A space at which no line ends.
const JOINED: char = '\u{a0}';

/// The columns with their places; those of a state in one, those from `group` on as one that repeats.
fn columns(process: Process, field: fn(Process, usize) -> Option<Field>, group: usize) -> String {
    let fields: Vec<Field> = (0..).map_while(|place| field(process, place)).collect();
    let names: Vec<String> = fields.iter().map(Field::to_string).collect();
    let (mut parts, mut place) = (Vec::new(), 0);
    while place < fields.len() {
        let begin = if place == group { "any number of times: " } else { "" };
        let state = names[place].strip_suffix(".dry_bulb").filter(|air| {
            let next = names.get(place + 1..place + 3);
            next.is_some_and(|next| next[0] == format!("{air}.humidity_ratio") && next[1] == format!("{air}.pressure"))
        });
        if let Some(air) = state {
            parts.push(format!("{begin}{place}–{}{JOINED}{air} (state)", place + 2));
            place += 3;
        } else {
            parts.push(format!("{begin}{place}{JOINED}{} [{}]", names[place], fields[place].unit()));
            place += 1;
        }
    }
    parts.join(", ")
}

/// A documentation comment, line by line.
fn wrapped(text: &str) -> String {
    let mut lines = vec![String::from("///")];
    for word in text.split(' ') {
        if lines[lines.len() - 1].chars().count() + word.chars().count() > 139 {
            lines.push(String::from("///"));
        }
        *lines.last_mut().unwrap() += &format!(" {word}");
    }
    lines.iter().map(|line| format!("{line}\n").replace(JOINED, " ")).collect()
}

fn selectors_of_processes() {
    assert!(
        rendered_selectors() == fs::read_to_string(selectors()).unwrap(),
        "src/columns/selectors.rs is stale: MOISTAIR_WRITE_HEADER=1 cargo test -p moistair-ffi --test header"
    );
}

/// Macros that follow from Cargo.toml or have arguments.
fn macros() -> String {
    let [major, minor, patch] =
        [env!("CARGO_PKG_VERSION_MAJOR"), env!("CARGO_PKG_VERSION_MINOR"), env!("CARGO_PKG_VERSION_PATCH")];
    format!(
        "
/* Version of this header. */
#define MOISTAIR_VERSION_MAJOR {major}
#define MOISTAIR_VERSION_MINOR {minor}
#define MOISTAIR_VERSION_PATCH {patch}
#define MOISTAIR_VERSION (1000000 * MOISTAIR_VERSION_MAJOR + 1000 * MOISTAIR_VERSION_MINOR + MOISTAIR_VERSION_PATCH)

/* The bit of a property in a mask. */
#define MOISTAIR_BIT(property) ((uint64_t)1 << (property))"
    )
}

/// The head of the header: the conventions, from the documentation of the crate.
fn preamble() -> String {
    let source = fs::read_to_string(here().join("src/lib.rs")).unwrap();
    let lines = source.lines().map_while(|line| line.strip_prefix("//!"));
    let lines = lines.filter(|line| !line.contains("# Safety"));
    let text: String = lines.map(|line| format!(" *{line}\n")).collect();
    let text = text.replace("`MOISTAIR_OK`", "MOISTAIR_OK");
    format!("/*\n{text} *\n * Made from the sources; do not edit. MIT OR Apache-2.0\n */")
}

fn rendered() -> String {
    let mut config = cbindgen::Config::from_file(here().join("cbindgen.toml")).unwrap();
    config.header = Some(preamble());
    config.after_includes = Some(macros());
    let mut builder = cbindgen::Builder::new().with_config(config);
    for file in [
        "version",
        "status",
        "quantity",
        "state",
        "atmosphere",
        "psychrometer",
        "at_pressure",
        "derivatives",
        "columns/mod",
        "columns/selectors",
        "columns/process",
        "process/stream",
        "process/sensible",
        "process/coil",
        "process/water_coil",
        "process/reheat",
        "process/room",
        "process/humidify",
        "process/mixing",
        "process/tower",
        "process/evaporative",
        "process/tower_sizing",
        "process/compression",
        "process/sequence",
        "process/desiccant",
        "process/outdoor_air",
        "process/economizer",
        "signal",
        "account",
    ] {
        builder = builder.with_src(here().join(format!("src/{file}.rs")));
    }
    let mut bytes = Vec::new();
    builder.generate().unwrap().write(&mut bytes);
    String::from_utf8(bytes).unwrap()
}

fn committed_header_is_up_to_date() {
    assert!(
        rendered() == committed(),
        "include/moistair.h is stale: MOISTAIR_WRITE_HEADER=1 cargo test -p moistair-ffi --test header"
    );
}

fn upper_snake(variant: &str) -> String {
    let mut name = String::new();
    for c in variant.chars() {
        if c.is_uppercase() && !name.is_empty() {
            name.push('_');
        }
        name.push(c.to_ascii_uppercase());
    }
    name
}

fn assert_defined(header: &str, name: &str, code: i32) {
    let line = format!("#define MOISTAIR_{name} {code}\n");
    assert!(header.contains(&line), "{line}");
}

fn every_code_of_the_core_has_its_constant() {
    let header = committed();
    for quantity in Quantity::ALL {
        let name = quantity.name().to_uppercase().replace([' ', '-'], "_");
        assert_defined(&header, &name, quantity.code());
    }
    macro_rules! enumeration {
        ($($type:ty: $prefix:literal),*) => {$(
            for one in <$type>::ALL {
                assert_defined(&header, &format!("{}_{}", $prefix, upper_snake(&format!("{one:?}"))), one.code());
            }
        )*};
    }
    for process in Process::ALL {
        let name = process.name().to_uppercase().replace('.', "_");
        assert_defined(&header, &format!("PROCESS_{name}"), process.code());
    }
    enumeration!(Kind: "KIND", Unit: "UNIT", Quality: "QUALITY", Reason: "REASON", Rule: "RULE", Added: "ADDED");
    enumeration!(economizer::Rule: "ECONOMIZER_RULE", economizer::Reason: "ECONOMIZER_REASON");
    enumeration!(economizer::Fallback: "ECONOMIZER_FALLBACK", FractionStatus: "FRACTION", Reach: "REACH");
}

/// Every status of the header has a text, and so has every error of the core.
fn every_status_has_a_text() {
    let header = committed();
    let codes = header.lines().filter_map(|line| line.strip_prefix("#define MOISTAIR_")?.split_once(' '));
    // Selectors of quantities and processes share the range of numbers.
    let quantities: BTreeSet<String> =
        Quantity::ALL.iter().map(|quantity| quantity.name().to_uppercase().replace([' ', '-'], "_")).collect();
    let codes = codes.filter(|(name, _)| !quantities.contains(*name) && !name.starts_with("PROCESS_"));
    let codes: Vec<i32> = codes.filter_map(|(_, value)| value.parse().ok()).filter(|code| *code >= 100).collect();
    assert!(codes.len() > 15);
    let error = Error::Infeasible { quantity: Quantity::DewPoint, value: 0.0, min: 0.0, max: 0.0 };
    for code in codes.into_iter().chain([error.code(), 0]) {
        assert!(moistair::text(code).is_some(), "{code}");
    }
    assert!(moistair::text(1).is_none());
}

/// Names of the functions that the header declares.
fn declared() -> BTreeSet<String> {
    let header = committed();
    let code = header.lines().filter(|line| !line.starts_with("//") && !line.starts_with(" *"));
    let words = code.flat_map(|part| part.split(|c: char| !c.is_alphanumeric() && c != '_' && c != '('));
    words
        .filter(|word| word.starts_with("moistair_"))
        .filter_map(|word| word.split_once('('))
        .map(|(name, _)| name.into())
        .collect()
}

/// The library that cargo built beside this test.
fn library(name: &str) -> PathBuf {
    let path = env::current_exe().unwrap().with_file_name(name);
    assert!(path.exists(), "{} is missing", path.display());
    path
}

fn exports_are_the_declarations() {
    // Not nm: where it loads the plugin of another LLVM, it does not see into objects that carry bitcode.
    for (library, table) in [(library("libmoistair.so"), "--dyn-syms"), (library("libmoistair.a"), "--syms")] {
        let output = Command::new("readelf").args(["--wide", table]).arg(&library).output();
        let output = output.unwrap_or_else(|error| panic!("no readelf ({error}): install binutils"));
        let text = String::from_utf8(output.stdout).unwrap();
        let global = text.lines().filter(|line| line.contains(" FUNC ") && line.contains(" GLOBAL "));
        let symbols = global.filter(|line| !line.contains(" UND ")).filter_map(|line| line.split_whitespace().last());
        let exports: BTreeSet<String> = symbols.filter(|name| name.starts_with("moistair_")).map(Into::into).collect();
        assert!(exports.len() > 10, "{}", String::from_utf8_lossy(&output.stderr));
        assert_eq!(exports, declared(), "{}", library.display());
    }
}

fn run(command: &mut Command) -> String {
    let output = command.output().unwrap();
    let text = String::from_utf8_lossy(&output.stdout).into_owned() + &String::from_utf8_lossy(&output.stderr);
    assert!(output.status.success(), "{command:?}\n{text}");
    text
}

const STRICT: [&str; 5] = ["-Wall", "-Wextra", "-Werror", "-pedantic", "-Wstrict-prototypes"];

fn compiler(standard: &str) -> Command {
    let cpp = standard.starts_with("c++");
    let mut command = Command::new(if cpp { cpp_compiler() } else { c_compiler() });
    let warnings = STRICT.into_iter().filter(|flag| !cpp || *flag != "-Wstrict-prototypes");
    command.arg(format!("-std={standard}")).args(warnings).arg("-I").arg(here().join("include"));
    command
}

fn header_compiles_strictly() {
    for (standard, language) in [("c99", "c"), ("c11", "c"), ("c17", "c"), ("c++17", "c++"), ("c++20", "c++")] {
        run(compiler(standard).args(["-fsyntax-only", "-x", language]).arg(header()));
    }
}

/// Compiles a C file against the static library, without any library but the C library, and returns what it prints.
fn compiled_and_run(source: &str) -> String {
    let name = Path::new(source).file_stem().unwrap().to_str().unwrap();
    let program = env::current_exe().unwrap().with_file_name(format!("moistair-{name}"));
    let mut command = compiler(if source.starts_with("tests") { "c11" } else { "c99" });
    run(command.arg(here().join(source)).arg(library("libmoistair.a")).arg("-o").arg(&program));
    run(&mut Command::new(program))
}

fn c_sees_the_same_layout_and_version() {
    let printed = compiled_and_run("tests/layout.c");
    assert!(printed.contains("layout and version agree"), "{printed}");
}

fn examples_run() {
    let printed = compiled_and_run("examples/states.c");
    assert!(printed.contains("wet bulb"), "{printed}");
    let printed = compiled_and_run("examples/process_columns.c");
    for line in [
        "takes entering.dry_air_flow [kg/s]",
        "gives exchange.heat [W]",
        "120 s: a value is outside the range of its quantity",
    ] {
        assert!(printed.contains(line), "{line} in {printed}");
    }
}
