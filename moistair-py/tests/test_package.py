"""What the wheel carries beside the code, and the program of its description."""

import contextlib
import io
import os
import re
from importlib.metadata import distribution
from pathlib import Path

import moistair

CHECKOUT = Path(__file__).parents[2]
README = CHECKOUT.joinpath("moistair-py", "README.md").read_text(encoding="utf-8")


def test_licenses_are_in_the_wheel():
    wheel = distribution("moistair")
    names = wheel.metadata.get_all("License-File")
    assert sorted(names) == ["LICENSE-APACHE", "LICENSE-MIT"]
    for name in names:
        (packed,) = [path for path in wheel.files if path.name == name]
        assert packed.locate().read_bytes() == CHECKOUT.joinpath(name).read_bytes()
    assert wheel.metadata["License-Expression"] == "MIT OR Apache-2.0"


def test_description_is_the_readme():
    metadata = distribution("moistair").metadata
    assert metadata["Description-Content-Type"].startswith("text/markdown")
    assert (metadata["Description"] or metadata.get_payload()).strip() == README.strip()
    assert metadata["Version"] == moistair.__version__


def test_program_of_the_readme():
    program, printed = re.search(r"```python\n(.*?)```\n+```text\n(.*?)```", README, re.DOTALL).groups()
    output, before = io.StringIO(), os.getcwd()
    os.chdir(CHECKOUT)
    try:
        with contextlib.redirect_stdout(output):
            exec(compile(program, "README.md", "exec"), {})
    finally:
        os.chdir(before)
    assert [line.rstrip() for line in output.getvalue().splitlines()] == printed.splitlines()
