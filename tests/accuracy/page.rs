//! ACCURACY.md: its sections, its text, and what it promises.

use std::fmt::Write;

use moistair_core::{Formulation, Quantity};
use moistair_tests::publications::comparisons;

use crate::sample::Point;
use crate::tables;

/// What the publications say of themselves.
const UNCERTAINTIES: &str = "
## What the publications say of themselves

Not measured here; the figures are from memory of the publications and of handbooks. Viscosity of dry air 1 %, its conductivity 2 % (Lemmon & Jacobsen 2004); viscosity
of steam 2 % (IAPWS R12-08), its conductivity 2 % (R15-11); their mixture by Wilke's and Wassiljewa's rules a few percent in hot and humid air; diffusivity of vapor
in air 7 % between 0 and 100 °C near atmospheric pressure (Massman 1998), and so the Schmidt and Lewis numbers. IAPWS G8-10 speaks of its own uncertainty
in its text.
";

/// States without the dry bulb.
fn pairs() -> String {
    format!(
        "\n## real gas, f64, states from two properties without the dry bulb\n\n\
         Round trips over −80 to 150 °C, 20 to 1100 kPa: what comes back of a state made again from two of its properties. *Condition number*: by how \
         many kelvins the dry bulb moves for an error of one kelvin, or of what one kelvin is worth, in both properties together; over the \
         same range, and in rooms at 101 325 Pa. `tests/properties` holds these figures to bounds.\n\n{}",
        moistair_tests::pairs::table(Formulation::RealGas, 2_000)
    )
}

/// The published equations beside each other, differences that no computing makes smaller.
fn publications() -> String {
    let mut text = String::from(
        "\n## Publications beside each other\n\n\
         How far publications lie apart, the publication less what stands beside it: no computing makes these smaller. The figures of CIPM-2007 and WMO-No. 8 are from memory.\n\n\
         | quantity | publication | beside | range | largest difference | where | points |\n|---|---|---|---|---|---|---|\n",
    );
    for row in comparisons() {
        let _ = writeln!(
            text,
            "| {} | {} | {} | {} | {:.2e} {} | {} | {} |",
            row.quantity, row.publication, row.beside, row.range, row.largest, row.unit, row.place, row.points
        );
    }
    text
}

/// One line of a table.
#[derive(Clone, Debug)]
pub struct Row {
    /// The property.
    pub name: String,
    /// In what the error is told.
    pub unit: &'static str,
    /// The greatest error, and where.
    pub worst: Option<(f64, Point)>,
    /// What 99.9 % of the points do not exceed.
    pub most_of: f64,
    /// Points compared.
    pub count: usize,
    /// Points where one side has a value and the other has none, or takes the other surface.
    pub unlike: usize,
    /// What the greatest error must not exceed.
    pub budget: Option<f64>,
    /// Whatever else belongs to the line.
    pub note: String,
}

/// One table.
#[derive(Clone, Debug)]
pub struct Section {
    /// What against what, where.
    pub title: String,
    /// What it means.
    pub text: String,
    /// What the notes of its lines are.
    pub notes: &'static str,
    /// Its lines.
    pub rows: Vec<Row>,
}

/// All of it.
#[derive(Clone, Debug)]
pub struct Page {
    points: usize,
    sections: Vec<Section>,
}

const HEAD: &str = "\
# Accuracy

Made by `tests/accuracy`; do not edit. Every figure is measured, but for those of the last section.

**What is the truth?** IAPWS G8-10 in full (`Formulation::Helmholtz`), which reproduces the digits that the standard prints (`tests/published`, the unit
tests of `moistair-core`). Publications differ from each other by far more than the first tables show: see “Publications beside each other”.

**How.** Points of low discrepancy (Halton): dry bulb evenly, pressure evenly in its logarithm, vapor from dry to saturated (over liquid; over ice below
−40 °C; to a humidity ratio of 10 above boiling). *Greatest*: over all points, with the place (dry bulb, pressure, share of the vapor that saturates).
*99.9 %*: what all but a thousandth of the points keep. *Unlike*: points where only one side has a value, or where the wet bulb is on the other side of its
step at the melting temperature. *Budget*: a limit that was set; whatever has none is held to the figure printed here. Errors per mass of dry air up to a water mole
fraction of 0.3, per mass of moist air above.
";

impl Page {
    /// Measures everything.
    pub fn measure(points: usize) -> Self {
        Self { points, sections: tables::all(points) }
    }

    /// The page.
    pub fn text(&self) -> String {
        let mut text =
            format!("{HEAD}\nThis page: {} points for each table, fewer where said.\n{}", self.points, self.summary());
        for section in &self.sections {
            let _ = write!(text, "\n## {}\n\n{}\n\n", section.title, section.text);
            let noted = section.rows.iter().any(|row| !row.note.is_empty());
            let budgeted = section.rows.iter().any(|row| row.budget.is_some());
            let mut head = String::from("| property | in | greatest | where | 99.9 % | points | unlike |");
            let mut line = String::from("|---|---|---|---|---|---|---|");
            for (wanted, name) in [(budgeted, "budget"), (noted, section.notes)] {
                if wanted {
                    let _ = write!(head, " {name} |");
                    line.push_str("---|");
                }
            }
            let _ = writeln!(text, "{head}\n{line}");
            for row in &section.rows {
                let (greatest, place) = row.worst.map_or((String::from("–"), String::new()), |(worst, at)| {
                    (format!("{worst:.2e}"), at.to_string())
                });
                let _ = write!(
                    text,
                    "| {} | {} | {greatest} | {place} | {:.1e} | {} | {} |",
                    row.name, row.unit, row.most_of, row.count, row.unlike
                );
                if budgeted {
                    let _ = write!(text, " {} |", row.budget.map_or(String::new(), |budget| format!("{budget:e}")));
                }
                if noted {
                    let _ = write!(text, " {} |", row.note);
                }
                text.push('\n');
            }
        }
        text.push_str(&pairs());
        text.push_str(&publications());
        text.push_str(UNCERTAINTIES);
        text
    }

    /// The figures that most readers come for.
    fn summary(&self) -> String {
        let worst = |section: usize, property: Quantity| {
            let rows = self.sections.get(section).map_or(&[][..], |section| &section.rows);
            let row = rows.iter().find(|row| row.name == property.name());
            row.and_then(|row| row.worst).map_or(f64::NAN, |(worst, _)| worst)
        };
        let mut text = String::from(
            "\n| greatest difference from the standard | real gas | real gas, f32 beside f64 | ideal gas |\n|---|---|---|---|\n",
        );
        for (property, unit) in [
            (Quantity::Density, "relative"),
            (Quantity::SpecificEnthalpy, "J/kg"),
            (Quantity::RelativeHumidity, "relative"),
            (Quantity::DewPoint, "K"),
            (Quantity::WetBulb, "K"),
        ] {
            let [real, single, ideal] = [tables::REAL, tables::SINGLE, tables::IDEAL].map(|at| worst(at, property));
            let _ = writeln!(text, "| {property}, {unit} | {real:.1e} | {single:.1e} | {ideal:.1e} |");
        }
        text
    }

    /// No greatest error exceeds its budget, and every budget has been put to the test.
    pub fn check_budgets(&self) {
        let rows = self.sections.iter().flat_map(|section| section.rows.iter().map(move |row| (section, row)));
        for (section, row) in rows {
            if let Some(budget) = row.budget {
                let (worst, at) = row.worst.expect("a budget is put to the test");
                assert!(
                    worst <= budget,
                    "{}: {} is {worst:e} off at {at}, more than {budget:e}",
                    section.title,
                    row.name
                );
            }
        }
    }

    /// Nothing is worse than a committed page says, to the digits that it prints.
    pub fn check_against(&self, committed: &str) {
        for section in &self.sections {
            let heading = format!("## {}", section.title);
            let table = committed.split(&heading).nth(1).unwrap_or_else(|| panic!("ACCURACY.md has no “{heading}”"));
            let table = table.split("\n## ").next().unwrap_or(table);
            for row in &section.rows {
                let Some((worst, at)) = row.worst else { continue };
                let start = format!("| {} |", row.name);
                let line = table.lines().find(|line| line.starts_with(&start));
                let line = line.unwrap_or_else(|| panic!("ACCURACY.md: no {} under “{heading}”", row.name));
                let printed: f64 = line.split('|').nth(3).and_then(|cell| cell.trim().parse().ok()).unwrap_or(0.0);
                assert!(
                    worst <= printed * 1.005,
                    "{}: {} is {worst:e} off at {at}; ACCURACY.md says {printed:e}",
                    section.title,
                    row.name
                );
            }
        }
    }
}
