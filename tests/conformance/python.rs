//! The Python package's own checks, run from the installed wheel.

use moistair_tests::toolchain::{python_command, root, run};

fn printed(output: &[u8]) {
    println!("{}", String::from_utf8_lossy(output));
}

/// pytest, docstring examples included.
pub fn own_tests() {
    let package = root().join("moistair-py");
    printed(&run(python_command()
        .args(["-m", "pytest", "-q", "-p", "no:cacheprovider", "-c"])
        .arg(package.join("pyproject.toml"))
        .arg("--rootdir")
        .arg(&package)
        .arg(package.join("tests"))));
    printed(&run(python_command().args([
        "-m",
        "pytest",
        "-q",
        "-p",
        "no:cacheprovider",
        "--doctest-modules",
        "--pyargs",
        "moistair",
    ])));
}

/// The stubs say what the module holds.
pub fn stubs() {
    printed(&run(python_command().args(["-m", "mypy.stubtest", "moistair"])));
}

/// The examples pass the strict type checker against the stubs.
pub fn typed_examples() {
    let cache = moistair_tests::toolchain::workshop().join("mypy");
    printed(&run(python_command()
        .args(["-m", "mypy", "--strict", "--cache-dir"])
        .arg(cache)
        .arg(root().join("moistair-py/examples"))));
}
