//! What a user would otherwise write, compiled and run with what the system has. What it has not is an `Err` that says so.

use std::ffi::{c_int, c_void};
use std::io::{BufRead, BufReader, Write};
use std::path::{Path, PathBuf};
use std::process::{Child, ChildStdin, ChildStdout, Command, Stdio};
use std::time::Duration;
use std::{env, fs};

use libloading::Library;
use moistair_core::Formulation;

use crate::air::{FULL_STATE, Outputs, Rows};

fn folder() -> &'static Path {
    Path::new(env!("CARGO_MANIFEST_DIR"))
}

fn first_of(variable: &str, names: &[&str], arguments: &[&str], missing: &str) -> Result<(PathBuf, String), String> {
    let chosen = env::var_os(variable).map(PathBuf::from).into_iter();
    for candidate in chosen.chain(names.iter().map(PathBuf::from)) {
        let output = Command::new(&candidate).args(arguments).output();
        if let Some(output) = output.ok().filter(|output| output.status.success()) {
            let text = String::from_utf8_lossy(&output.stdout);
            return Ok((candidate, text.lines().next().unwrap_or_default().to_owned()));
        }
    }
    Err(missing.to_owned())
}

/// The C compiler and what it calls itself.
pub fn c_compiler() -> Result<(PathBuf, String), String> {
    first_of("CC", &["cc", "gcc", "clang"], &["--version"], "no C compiler")
}

/// A Python that has NumPy, and the version of it.
pub fn numpy() -> Result<(PathBuf, String), String> {
    let ask = "import numpy; print('NumPy', numpy.__version__)";
    first_of("PYTHON", &["python3", "python"], &["-c", ask], "no python3 with NumPy; PYTHON=... names another")
}

/// A C source of this folder as a loaded shared object. Linked without the flags: some of them would have the linker add code that
/// changes how the whole process rounds subnormals.
fn compile(source: &str, flags: &[&str], workshop: &Path) -> Result<Library, String> {
    let (compiler, _) = c_compiler()?;
    // A name of its own for each set of flags: what is loaded once under a name stays.
    let file = |extension| workshop.join([source, &flags.concat(), extension].concat());
    let (object, shared) = (file(".o"), file(".so"));
    let run = |command: &mut Command| match command.output() {
        Ok(output) if output.status.success() => Ok(()),
        Ok(output) => Err(String::from_utf8_lossy(&output.stderr).lines().next().unwrap_or_default().to_owned()),
        Err(error) => Err(error.to_string()),
    };
    let always = ["-std=c99", "-fPIC", "-c"];
    let header = folder().join("../moistair-ffi/include");
    let mut object_command = Command::new(&compiler);
    object_command.args(flags).args(always).arg("-I").arg(header).arg(folder().join(source));
    run(object_command.arg("-o").arg(&object))?;
    run(Command::new(&compiler).arg("-shared").arg(&object).arg("-o").arg(&shared).arg("-lm"))?;
    // SAFETY: made a moment ago from a source of this folder, which has no initializers.
    unsafe { Library::new(&shared) }.map_err(|error| error.to_string())
}

fn places(outputs: &mut Outputs) -> [*mut f64; FULL_STATE.len()] {
    outputs.each_mut().map(|column| column.as_mut_ptr())
}

type PlainLoop = unsafe extern "C" fn(usize, *const f64, *const f64, *const f64, *const *mut f64);

/// plain_loop.c, compiled with some flags.
pub struct CLoop(Library);

impl CLoop {
    pub fn new(flags: &[&str], workshop: &Path) -> Result<Self, String> {
        compile("plain_loop.c", flags, workshop).map(Self)
    }

    pub fn run(&self, rows: &Rows, outputs: &mut Outputs) {
        // SAFETY: the types are those of the source; every column has as many rows as the first.
        unsafe {
            let plain_loop = self.0.get::<PlainLoop>(b"plain_loop").expect("plain_loop.c has plain_loop");
            let (t, rh, p) = (&rows.dry_bulb, &rows.relative_humidity, &rows.pressure);
            plain_loop(t.len(), t.as_ptr(), rh.as_ptr(), p.as_ptr(), places(outputs).as_ptr());
        }
    }
}

/// The functions of the C interface, by address.
#[repr(C)]
struct Functions([*const c_void; 3]);

type Caller =
    unsafe extern "C" fn(*const Functions, c_int, usize, *const f64, *const f64, *const f64, *const *mut f64) -> c_int;

/// c_caller.c: a C program's calls of this library.
pub struct CCaller(Library);

impl CCaller {
    pub fn new(workshop: &Path) -> Result<Self, String> {
        compile("c_caller.c", &["-O2"], workshop).map(Self)
    }

    /// By `call_states` or `call_columns`.
    pub fn run(&self, way: &str, formulation: Formulation, rows: &Rows, outputs: &mut Outputs) {
        let functions = Functions([
            moistair::moistair_from_dry_bulb as *const c_void,
            moistair::moistair_properties as *const c_void,
            moistair::moistair_state_columns as *const c_void,
        ]);
        // SAFETY: the types are those of the source; every column has as many rows as the first.
        let status = unsafe {
            let call = self.0.get::<Caller>(way).expect("c_caller.c has both ways");
            let (t, rh, p) = (&rows.dry_bulb, &rows.relative_humidity, &rows.pressure);
            let inputs = (t.as_ptr(), rh.as_ptr(), p.as_ptr());
            call(&functions, formulation.code(), t.len(), inputs.0, inputs.1, inputs.2, places(outputs).as_ptr())
        };
        assert_eq!(status, 0, "{way}: a row failed");
    }
}

/// plain_numpy.py, waiting for its turn.
pub struct NumPy {
    process: Child,
    input: ChildStdin,
    output: BufReader<ChildStdout>,
}

impl NumPy {
    /// Starts it on these rows and reads its results.
    pub fn new(rows: &Rows, outputs: &mut Outputs, workshop: &Path) -> Result<Self, String> {
        let (python, _) = numpy()?;
        let count = rows.dry_bulb.len();
        let (inputs, results) = (workshop.join("rows.bin"), workshop.join("results.bin"));
        let columns = [&rows.dry_bulb, &rows.relative_humidity, &rows.pressure];
        let bytes: Vec<u8> = columns.into_iter().flatten().flat_map(|value| value.to_ne_bytes()).collect();
        let failed = |error: std::io::Error| error.to_string();
        fs::write(&inputs, bytes).map_err(failed)?;
        let mut process = Command::new(python)
            .arg(folder().join("plain_numpy.py"))
            .arg(inputs)
            .arg(count.to_string())
            .arg(&results)
            .stdin(Stdio::piped())
            .stdout(Stdio::piped())
            .spawn()
            .map_err(failed)?;
        let (Some(input), Some(output)) = (process.stdin.take(), process.stdout.take()) else {
            return Err("no pipe to python3".to_owned());
        };
        let mut numpy = Self { process, input, output: BufReader::new(output) };
        numpy.line()?;
        let bytes = fs::read(results).map_err(failed)?;
        let mut values = bytes.chunks_exact(8).filter_map(|word| Some(f64::from_ne_bytes(word.try_into().ok()?)));
        outputs.iter_mut().flatten().for_each(|place| *place = values.next().unwrap_or(f64::NAN));
        Ok(numpy)
    }

    fn line(&mut self) -> Result<String, String> {
        let mut line = String::new();
        self.output.read_line(&mut line).map_err(|error| error.to_string())?;
        if line.is_empty() { Err("plain_numpy.py ended early".to_owned()) } else { Ok(line) }
    }

    /// The time that so many passes take, by its own clock.
    pub fn run(&mut self, passes: usize) -> Duration {
        writeln!(self.input, "{passes}").expect("plain_numpy.py reads");
        let seconds = self.line().expect("plain_numpy.py answers");
        Duration::from_secs_f64(seconds.trim().parse().expect("plain_numpy.py prints seconds"))
    }
}

impl Drop for NumPy {
    fn drop(&mut self) {
        let _ = self.process.kill();
        let _ = self.process.wait();
    }
}
