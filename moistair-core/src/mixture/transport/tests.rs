//! Mixing rules against published examples, the ends of composition, and the range over all states.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use std::println;

use super::*;
use crate::checks::{Table, Tally};
use crate::mixture::{IdealGas, Mixture, RealGas};
use crate::real::Lanes;
use crate::state::property::tests::states;

const RULES: &str = include_str!("../../../../tests/published/transport_mixing_rules.csv");

#[test]
fn mixing_rules_give_the_published_examples() {
    let table = Table::read(RULES);
    let mut tally = Tally::new("mixing rules");
    for row in table.rows() {
        let of = |name: &str| [1, 2, 3].map(|i| row.input(&std::format!("{name}{i}")));
        let values = if row.text("quantity") == "mu mix" { of("mu") } else { of("k") };
        tally.row(row, mix(of("x"), of("mu"), of("M"), values));
    }
    tally.finish(2);
}

/// Either end is the pure substance, bit for bit; x_w = 0.95 is nearer to the vapor than to the air.
#[test]
fn ends_of_composition_are_the_pure_substances() {
    for (kelvins, air_density, water_density) in [(223.15, 1.6, 1e-5), (293.15, 1.2, 0.017), (393.15, 0.9, 1.1)] {
        let of = |x| Transport::<f64>::of(kelvins, 101_325.0, x, air_density, water_density);
        let air = transport::dry_air::transport(kelvins, air_density);
        let water = transport::water_vapor::transport(kelvins, water_density);
        assert_eq!((of(0.0).viscosity, of(0.0).conductivity), (air.viscosity, air.conductivity));
        assert_eq!((of(1.0).viscosity, of(1.0).conductivity), (water.viscosity, water.conductivity));
        let near = |mixed: f64, air: f64, water: f64| (mixed - water).abs() < 0.1 * (air - water).abs();
        assert!(near(of(0.95).viscosity, air.viscosity, water.viscosity));
        assert!((of(0.95).conductivity / water.conductivity - 1.0).abs() < 0.06);
    }
}

/// The correlation of Marrero & Mason 1972, 282 to 450 K (constants from memory), and the differences that are stated.
#[test]
fn diffusivity_beside_another_correlation() {
    let other = |celsius: f64| 1.87e-10 * (celsius + 273.15).powf(2.072);
    let difference = |celsius: f64| other(celsius) / diffusivity(celsius + 273.15, 101_325.0) - 1.0;
    println!("Marrero & Mason over Massman: {:e} at 25 °C, {:e} at 150 °C", difference(25.0), difference(150.0));
    assert!((difference(25.0) + 0.02).abs() < 0.005 && (difference(150.0) - 0.08).abs() < 0.005);
    assert!((diffusivity::<f64>(273.15, 101_325.0) - 0.2178e-4).abs() < 1e-19);
    assert!((diffusivity::<f64>(273.15, 202_650.0) * 2.0 - 0.2178e-4).abs() < 1e-19);
}

/// Over all states both lie between those of the components.
#[test]
fn states_lie_between_their_components() {
    fn run<M: Mixture<f64>>() -> usize {
        let mut compared = 0;
        for (celsius, pressure, w, gas) in states::<M>() {
            let (kelvins, air, water) = (celsius + 273.15, 1.0 / gas.volume, w / gas.volume);
            let mixed = Transport::of(kelvins, pressure, M::mole_fraction(w), air, water);
            let parts =
                (transport::dry_air::transport(kelvins, air), transport::water_vapor::transport(kelvins, water));
            let between =
                |value: f64, a: f64, b: f64| a.min(b) * (1.0 - 1e-14) <= value && value <= a.max(b) * (1.0 + 1e-14);
            assert!(between(mixed.viscosity, parts.0.viscosity, parts.1.viscosity), "{celsius} {pressure} {w}");
            assert!(
                between(mixed.conductivity, parts.0.conductivity, parts.1.conductivity),
                "{celsius} {pressure} {w}"
            );
            assert!(mixed.diffusivity > 0.0);
            compared += 1;
        }
        compared
    }
    println!("states compared: {} and {}", run::<RealGas<f64>>(), run::<IdealGas<f64>>());
}

/// Lanes have the bits of single numbers, single precision has its digits.
#[test]
fn in_every_arithmetic() {
    let all: std::vec::Vec<_> = states::<RealGas<f64>>().collect();
    let (mut compared, mut worst) = (0, 0.0_f64);
    for chunk in all.chunks_exact(8) {
        let pack = |part: fn(f64, f64, f64, f64) -> f64| {
            Lanes::<f64, 8>(core::array::from_fn(|i| part(chunk[i].0, chunk[i].1, chunk[i].2, chunk[i].3.volume)))
        };
        let lanes = Transport::of(
            pack(|celsius, _, _, _| celsius + 273.15),
            pack(|_, pressure, _, _| pressure),
            pack(|_, _, w, _| <RealGas<f64> as Mixture<f64>>::mole_fraction(w)),
            pack(|_, _, _, volume| 1.0 / volume),
            pack(|_, _, w, volume| w / volume),
        );
        for (i, (celsius, pressure, w, gas)) in chunk.iter().enumerate() {
            let (kelvins, x) = (celsius + 273.15, <RealGas<f64> as Mixture<f64>>::mole_fraction(*w));
            let one = Transport::of(kelvins, *pressure, x, 1.0 / gas.volume, w / gas.volume);
            let single = Transport::of(
                kelvins as f32,
                *pressure as f32,
                x as f32,
                (1.0 / gas.volume) as f32,
                (w / gas.volume) as f32,
            );
            for (lane, one, single) in [
                (lanes.viscosity, one.viscosity, single.viscosity),
                (lanes.conductivity, one.conductivity, single.conductivity),
                (lanes.diffusivity, one.diffusivity, single.diffusivity),
            ] {
                assert_eq!(lane.0[i].to_bits(), one.to_bits());
                worst = worst.max((f64::from(single) / one - 1.0).abs());
                compared += 1;
            }
        }
    }
    println!("{compared} values in lanes; single precision at worst {worst:e} off");
    assert!(compared > 15_000 && worst < 5e-6);
}
