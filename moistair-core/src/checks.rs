//! Reader of the published check values in `tests/published`, and the tally that a runner keeps: for tests only.
#![allow(clippy::neg_cmp_op_on_partial_ord, reason = "written so that a NaN fails")]

use std::collections::BTreeMap;
use std::string::{String, ToString};
use std::vec::Vec;
use std::{eprintln, println};

/// A comma-separated table: `#` lines of comment, a line of column names, rows; fields may be quoted.
#[derive(Debug)]
pub struct Table {
    columns: Vec<String>,
    rows: Vec<Vec<String>>,
}

/// One row of a [`Table`].
#[derive(Clone, Copy, Debug)]
pub struct Row<'a> {
    columns: &'a [String],
    fields: &'a [String],
}

fn fields(line: &str) -> Vec<String> {
    let (mut fields, mut quoted) = (std::vec![String::new()], false);
    for character in line.chars() {
        match character {
            '"' => quoted = !quoted,
            ',' if !quoted => fields.push(String::new()),
            _ => fields.last_mut().unwrap().push(character),
        }
    }
    fields
}

impl Table {
    /// Reads a table. Panics if a row has not as many fields as there are columns, or if the rows are not as many as the
    /// comment `# rows: n` says.
    pub fn read(text: &str) -> Self {
        let declared: usize =
            text.lines().find_map(|line| line.strip_prefix("# rows: ")).unwrap().trim().parse().unwrap();
        let mut lines = text.lines().filter(|line| !line.starts_with('#'));
        let columns = fields(lines.next().unwrap());
        let rows: Vec<_> = lines.map(fields).collect();
        assert!(rows.iter().all(|row| row.len() == columns.len()), "a row of another length than the line of names");
        assert_eq!(rows.len(), declared, "rows declared in the comment");
        Self { columns, rows }
    }

    /// All rows.
    pub fn rows(&self) -> impl Iterator<Item = Row<'_>> {
        self.rows.iter().map(|fields| Row { columns: &self.columns, fields })
    }
}

impl<'a> Row<'a> {
    /// A field as text.
    pub fn text(&self, column: &str) -> &'a str {
        let index = self.columns.iter().position(|name| name == column);
        &self.fields[index.unwrap_or_else(|| panic!("no column {column}"))]
    }

    /// A field as a number.
    pub fn number(&self, column: &str) -> f64 {
        self.text(column).parse().unwrap_or_else(|_| panic!("{column} of {self:?} is no number"))
    }

    /// One of the inputs `name=value;name=value`.
    pub fn input(&self, name: &str) -> f64 {
        let mut inputs = self.text("inputs").split(';').filter_map(|part| part.trim().split_once('='));
        let (_, value) = inputs.find(|(key, _)| *key == name).unwrap_or_else(|| panic!("no input {name} in {self:?}"));
        value.parse().unwrap()
    }

    /// The published value.
    pub fn value(&self) -> f64 {
        self.number("value")
    }

    /// Half a unit of the last published digit.
    pub fn half_unit(&self) -> f64 {
        half_unit(self.value(), self.number("sig") as i32)
    }
}

/// Half a unit of the last of so many significant digits.
pub fn half_unit(value: f64, digits: i32) -> f64 {
    let exponent: i32 = std::format!("{value:e}").split_once('e').unwrap().1.parse().unwrap();
    half_of_decimal(exponent - digits + 1)
}

/// Half a unit of the last decimal as printed, for tables of fixed decimals.
pub fn half_of_last_decimal(printed: &str) -> f64 {
    let decimals = printed.split_once('.').map_or(0, |(_, decimals)| decimals.len());
    half_of_decimal(-(decimals as i32))
}

fn half_of_decimal(exponent: i32) -> f64 {
    // A hair more, for a value that lies on the half itself.
    std::format!("0.5000001e{exponent}").parse().unwrap()
}

/// What a runner has compared: prints the worst of each kind, and fails if it compared fewer than it says.
#[derive(Debug)]
pub struct Tally {
    name: &'static str,
    worst: BTreeMap<String, (f64, String)>,
    compared: usize,
    failed: usize,
}

impl Tally {
    /// Starts a tally.
    pub fn new(name: &'static str) -> Self {
        Self { name, worst: BTreeMap::new(), compared: 0, failed: 0 }
    }

    /// Compares with a published value.
    pub fn row(&mut self, row: Row<'_>, computed: f64) {
        self.row_within(row, computed, row.half_unit());
    }

    /// Compares with a published value within another tolerance than its print; the caller says why.
    pub fn row_within(&mut self, row: Row<'_>, computed: f64, tolerance: f64) {
        self.within(row.text("quantity"), row.text("id"), computed, row.value(), tolerance);
    }

    /// Compares two numbers.
    pub fn within(&mut self, kind: &str, id: &str, computed: f64, expected: f64, tolerance: f64) {
        self.compared += 1;
        let share = (computed - expected).abs() / tolerance;
        if !(share <= 1.0) {
            self.failed += 1;
            eprintln!("{}: {id} {kind}: {computed:e}, expected {expected:e} ± {tolerance:e}", self.name);
        }
        let worst = self.worst.entry(kind.to_string()).or_insert((-1.0, String::new()));
        if !(share <= worst.0) {
            *worst = (share, id.to_string());
        }
    }

    /// Prints, and fails if a comparison failed or if there were not as many as declared.
    pub fn finish(self, declared: usize) {
        println!("{}: {} values compared", self.name, self.compared);
        for (kind, (share, id)) in &self.worst {
            println!("  {kind}: at worst {share:.3} of the tolerance ({id})");
        }
        assert_eq!(self.failed, 0, "{} of {} comparisons failed", self.failed, self.compared);
        assert!(self.compared >= declared, "{}: {declared} comparisons declared, {} made", self.name, self.compared);
    }
}

/// SplitMix64 (Steele, Lea and Flood 2014, "Fast splittable pseudorandom number generators", fig. 17).
#[derive(Debug)]
pub struct Random(pub u64);

impl Random {
    /// 64 bits.
    pub fn bits(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e3779b97f4a7c15);
        let z = (self.0 ^ (self.0 >> 30)).wrapping_mul(0xbf58476d1ce4e5b9);
        let z = (z ^ (z >> 27)).wrapping_mul(0x94d049bb133111eb);
        z ^ (z >> 31)
    }

    /// A number of the half-open interval.
    pub fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * ((self.bits() >> 11) as f64 / (1_u64 << 53) as f64)
    }
}
