//! Whether the grid misses a crossing, and how often a line of steam crosses saturation.

use std::println;

use super::*;
use crate::Formulation;
use crate::checks::Random;
use crate::quantity::HumidityRatio;
use crate::real::Real;
use crate::state::{AirWithCondensate, Freezing};

fn cases(random: &mut Random) -> (MoistAir<f64>, f64) {
    let formulation = Formulation::ALL[(random.bits() % 2) as usize];
    let pressure = if random.bits() & 1 == 0 { 101_325.0 } else { random.between(2e4, 1.1e6) };
    let (celsius, share) = (random.between(-30.0, 80.0), random.between(0.0, 1.0));
    let limit =
        with_mixture!(formulation, f64, M => greatest_humidity_ratio(&M::<f64>::at(celsius), celsius, pressure));
    (MoistAir::assemble(celsius, pressure, limit * share, formulation), random.between(2.5e6, 3.6e6))
}

fn wanted() -> u32 {
    std::env::var("MOISTAIR_CASES").map_or(400, |cases| cases.parse().unwrap())
}

fn missed(grid: u32) -> u32 {
    let mut random = Random(5);
    let (mut saturating, mut missed) = (0, 0);
    for _ in 0..wanted() {
        let (air, steam) = cases(&mut random);
        let found = |grid| first_crossing_on(grid, &air, steam, 1.0);
        saturating += u32::from(found(1024).is_some());
        missed += u32::from(found(grid).is_some() != found(1024).is_some());
    }
    println!("{grid} points: of {saturating} lines that saturate {missed} are missed");
    assert!(saturating > wanted() / 4);
    missed
}

#[test]
fn grid_is_fine_enough_and_not_finer() {
    assert_eq!(missed(CROSSING_GRID), 0);
    assert!(missed(4) > 0, "a coarse grid does as well: the constant is stale");
}

/// Fogged between the two flows and nowhere else, by the equilibrium of air and water.
#[test]
fn lines_leave_saturation_once() {
    let mut random = Random(6);
    let (mut leaving, mut staying, mut compared) = (0, 0, 0);
    for _ in 0..wanted() {
        let (air, steam) = cases(&mut random);
        let (h1, w1) = parts(&air);
        let Some(first) = first_crossing(&air, steam, 1.0) else { continue };
        let again = leaves_saturation(&air, steam, first);
        leaving += u32::from(again.is_some());
        staying += u32::from(again.is_none());
        for step in 0..200 {
            let s = first + Real::exp(f64::from(step) * 0.069 - 11.5);
            let made = AirWithCondensate::from_enthalpy_and_water(
                SpecificEnthalpy::from_joules_per_kilogram(h1 + s * steam),
                HumidityRatio::from_kilograms_per_kilogram(w1 + s),
                Freezing::Equilibrium,
                air.basis(),
            );
            let beyond = again.is_some_and(|again| s > again);
            let near = again.is_some_and(|again| (s - again).abs() <= 1e-8 * again) || (s - first).abs() < 1e-6;
            if let (Ok(wet), false) = (made, near) {
                assert_eq!(wet.is_wet(), !beyond, "{s} of {steam} to {air:?}: {first} {again:?}");
                compared += 1;
            }
        }
    }
    println!("{leaving} lines leave saturation, {staying} stay; {compared} equilibria compared");
    assert!(leaving > wanted() / 20 && staying > 0 && compared > 50 * wanted());
}
