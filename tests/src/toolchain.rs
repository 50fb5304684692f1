//! The other faces, built from this checkout: the C library with the system's compiler, the wheel in a virtual environment of its own.
//!
//! A missing compiler or Python is an error that names what to install, unless `MOISTAIR_SKIP` (a list of `c` and `python`) says
//! that it may be missing; what is skipped then shows as ignored in the summary.

use std::ffi::OsStr;
use std::path::{Path, PathBuf};
use std::process::Command;
use std::sync::OnceLock;
use std::{env, fs, panic};

use libtest_mimic::{Failed, Trial};

/// A face that needs a tool of the system.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Face {
    /// A C compiler.
    C,
    /// Python 3.9 or later with venv and pip.
    Python,
}

/// Whether the caller said that a face may be left out.
#[must_use]
pub fn skipped(face: Face) -> bool {
    let name = match face {
        Face::C => "c",
        Face::Python => "python",
    };
    env::var("MOISTAIR_SKIP").is_ok_and(|list| list.split(',').any(|part| part.trim() == name))
}

/// The top of the checkout.
#[must_use]
pub fn root() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).parent().map(Path::to_path_buf).unwrap_or_default()
}

/// Where the other faces are built; apart from the running build, so that neither waits for the other's lock.
#[must_use]
pub fn workshop() -> PathBuf {
    let target = env::var_os("CARGO_TARGET_DIR").map_or_else(|| root().join("target"), PathBuf::from);
    let folder = target.join("faces");
    fs::create_dir_all(&folder).unwrap_or_else(|error| panic!("{}: {error}", folder.display()));
    folder
}

/// Runs a command to its end and returns its standard output; panics with everything it printed if it fails.
pub fn run(command: &mut Command) -> Vec<u8> {
    let output = command.output().unwrap_or_else(|error| panic!("{command:?}: {error}"));
    assert!(
        output.status.success(),
        "{command:?} ended with {}\n{}\n{}",
        output.status,
        String::from_utf8_lossy(&output.stdout),
        String::from_utf8_lossy(&output.stderr)
    );
    output.stdout
}

fn first_that_answers(variable: &str, names: &[&str], missing: &str) -> PathBuf {
    let chosen = env::var_os(variable).map(PathBuf::from);
    let candidates = chosen.into_iter().chain(names.iter().map(PathBuf::from));
    for candidate in candidates {
        if Command::new(&candidate).arg("--version").output().is_ok_and(|output| output.status.success()) {
            return candidate;
        }
    }
    panic!("{missing}")
}

/// The C compiler: `CC`, or the system's.
#[must_use]
pub fn c_compiler() -> PathBuf {
    first_that_answers(
        "CC",
        &["cc", "gcc", "clang"],
        "no C compiler: install one (Debian: apt-get install gcc g++), or set MOISTAIR_SKIP=c to go without",
    )
}

/// The C++ compiler: `CXX`, or the system's.
#[must_use]
pub fn cpp_compiler() -> PathBuf {
    first_that_answers(
        "CXX",
        &["c++", "g++", "clang++"],
        "no C++ compiler: install one (Debian: apt-get install g++), or set MOISTAIR_SKIP=c to go without",
    )
}

/// A test that is shown as ignored where the caller allowed its face to be missing.
pub fn trial(name: &'static str, faces: &[Face], test: fn()) -> Trial {
    let ignored = faces.iter().any(|&face| skipped(face));
    let guarded = move || {
        panic::catch_unwind(test).map_err(|payload| {
            let text = payload.downcast_ref::<String>().cloned();
            let text = text.or_else(|| payload.downcast_ref::<&str>().map(|text| (*text).to_owned()));
            Failed::from(text.unwrap_or_else(|| "panicked".to_owned()))
        })
    };
    Trial::test(name, guarded).with_ignored_flag(ignored)
}

/// A cargo command that shares nothing with the one that runs the tests.
#[must_use]
pub fn cargo() -> Command {
    let mut cargo = Command::new(env::var_os("CARGO").unwrap_or_else(|| "cargo".into()));
    cargo.current_dir(root()).env("CARGO_TARGET_DIR", workshop().join("cargo"));
    cargo
}

/// The built C library.
#[derive(Debug)]
pub struct CLibrary {
    /// The C compiler.
    pub compiler: PathBuf,
    /// The C++ compiler.
    pub cpp_compiler: PathBuf,
    /// Folder of the static and the shared library.
    pub folder: PathBuf,
}

/// Builds the C library once per process.
pub fn c_library() -> &'static CLibrary {
    static LIBRARY: OnceLock<CLibrary> = OnceLock::new();
    LIBRARY.get_or_init(|| {
        let (compiler, cpp_compiler) = (c_compiler(), cpp_compiler());
        run(cargo().args(["build", "--release", "--package", "moistair-ffi"]));
        CLibrary { compiler, cpp_compiler, folder: workshop().join("cargo/release") }
    })
}

/// How a C program is linked.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Linking {
    /// Against libmoistair.a.
    Static,
    /// Against libmoistair.so.
    Shared,
}

/// Compiles a C program as C99 without a warning and returns the executable.
pub fn compile_c(source: &Path, linking: Linking) -> PathBuf {
    let library = c_library();
    let stem = source.file_stem().and_then(OsStr::to_str).unwrap_or("program");
    let program = workshop().join(format!("{stem}-{linking:?}"));
    let mut command = Command::new(&library.compiler);
    command
        .args(["-std=c99", "-O2", "-Wall", "-Wextra", "-Werror", "-pedantic"])
        .arg("-I")
        .arg(root().join("moistair-ffi/include"))
        .arg("-o")
        .arg(&program)
        .arg(source);
    match linking {
        Linking::Static => command.arg(library.folder.join("libmoistair.a")).args(["-lpthread", "-ldl", "-lm"]),
        Linking::Shared => command
            .arg("-L")
            .arg(&library.folder)
            .arg("-lmoistair")
            .arg(format!("-Wl,-rpath,{}", library.folder.display())),
    };
    run(&mut command);
    program
}

/// The interpreter of a virtual environment with the wheel of this checkout installed, made once per process.
pub fn python() -> &'static Path {
    static PYTHON: OnceLock<PathBuf> = OnceLock::new();
    PYTHON.get_or_init(|| {
        let system = first_that_answers(
            "PYTHON",
            &["python3", "python"],
            "no Python: install Python 3.9 or later with venv and pip (Debian: apt-get install python3 python3-venv \
             python3-pip), or set MOISTAIR_SKIP=python to go without",
        );
        let environment = workshop().join("venv");
        let interpreter = environment.join("bin/python");
        if !interpreter.exists() {
            run(Command::new(system).args(["-m", "venv"]).arg(&environment));
        }
        let requirements = root().join("tests/requirements.txt");
        run(pip(&interpreter).arg("--requirement").arg(requirements));
        let wheels = workshop().join("wheels");
        let _ = fs::remove_dir_all(&wheels);
        run(Command::new(&interpreter)
            .args(["-m", "maturin", "build", "--release", "--quiet", "--interpreter"])
            .arg(&interpreter)
            .arg("--manifest-path")
            .arg(root().join("moistair-py/Cargo.toml"))
            .arg("--out")
            .arg(&wheels)
            .env("CARGO_TARGET_DIR", workshop().join("cargo"))
            .current_dir(root()));
        let wheel =
            fs::read_dir(&wheels).unwrap().map(|entry| entry.unwrap().path()).next().expect("maturin made a wheel");
        run(pip(&interpreter).args(["--force-reinstall", "--no-deps"]).arg(wheel));
        interpreter
    })
}

fn pip(interpreter: &Path) -> Command {
    let mut command = Command::new(interpreter);
    command.args(["-m", "pip", "install", "--quiet", "--disable-pip-version-check"]);
    command
}

/// Runs the installed package's interpreter from a folder where the sources are not importable.
#[must_use]
pub fn python_command() -> Command {
    let mut command = Command::new(python());
    command.current_dir(workshop()).env_remove("PYTHONPATH").env("PYTHONDONTWRITEBYTECODE", "1");
    command
}
