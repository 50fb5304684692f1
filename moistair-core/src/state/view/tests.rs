//! The one text of the properties in its arithmetics: lanes, derivatives, derivatives of lanes.
#![allow(clippy::disallowed_methods, reason = "the seeded points may use the platform's exponential")]

use std::println;
use std::vec::Vec;

use super::*;
use crate::Formulation;
use crate::checks::Random;
use crate::mixture::{IdealGas, RealGas};
use crate::real::{Dual, Lanes};

const N: usize = 8;

fn view<M: Mixture<R>, R: Real>(celsius: R, pascals: R, humidity_ratio: R) -> View<M, R> {
    let mixture = M::at(celsius);
    let gas = mixture.gas(pascals, humidity_ratio);
    // The kernel goes by the type of the mixture.
    View { mixture, air: MoistAir { celsius, pascals, humidity_ratio, gas, formulation: Formulation::RealGas } }
}

fn properties() -> impl Iterator<Item = Quantity> {
    Quantity::ALL.iter().copied().filter(|quantity| quantity.is_property())
}

/// A value with its reasons, as bits; what has no value has none.
type Outcome = (Option<Vec<u64>>, [bool; 4]);

fn outcome(parts: &[f64], missing: [bool; 4]) -> Outcome {
    let any = missing.iter().any(|reason| *reason);
    (
        (!any).then(|| {
            parts.iter().map(|part| if part.is_nan() { f64::NAN.to_bits() } else { part.to_bits() }).collect()
        }),
        missing,
    )
}

fn inputs(value: [f64; 3]) -> [Dual<f64, 3>; 3] {
    core::array::from_fn(|place| Dual::input(value[place], place))
}

/// Every property at seeded points of the domain and beyond saturation: lanes of plain numbers and of derivatives give the bits of those
/// alone, and the same reasons.
#[test]
fn lanes_and_derivatives_run_the_same_text() {
    fn run<M, L, D>(points: &[[f64; 3]]) -> usize
    where
        M: Mixture<f64>,
        L: Mixture<Dual<Lanes<f64, N>, 3>>,
        D: Mixture<Dual<f64, 3>>,
    {
        let mut compared = 0;
        for chunk in points.chunks_exact(N) {
            let lane = |place: usize| Dual::input(Lanes(core::array::from_fn(|i| chunk[i][place])), place);
            let together = view::<L, _>(lane(0), lane(2), lane(1));
            let alone: Vec<_> =
                chunk.iter().map(|point| inputs(*point)).map(|[t, w, p]| view::<D, _>(t, p, w)).collect();
            let plain: Vec<_> = chunk.iter().map(|[t, w, p]| view::<M, _>(*t, *p, *w)).collect();
            for quantity in properties() {
                let lanes = together.reading(quantity).unwrap();
                for i in 0..N {
                    let parts = lanes.value.partials.map(|partial| partial.0[i]);
                    let missing =
                        [lanes.dry_air, lanes.above_boiling, lanes.above_range, lanes.below_range].map(|mask| mask[i]);
                    let ours = outcome(&[lanes.value.value.0[i], parts[0], parts[1], parts[2]], missing);
                    let one = alone[i].reading(quantity).unwrap();
                    let missing = [one.dry_air, one.above_boiling, one.above_range, one.below_range];
                    let parts = one.value.partials;
                    let theirs = outcome(&[one.value.value, parts[0], parts[1], parts[2]], missing);
                    assert_eq!(ours, theirs, "{quantity:?} {:?}", chunk[i]);
                    let value = plain[i].reading(quantity).unwrap();
                    let missing = [value.dry_air, value.above_boiling, value.above_range, value.below_range];
                    let first = theirs.0.as_ref().map(|bits| bits[..1].to_vec());
                    assert_eq!((first, theirs.1), outcome(&[value.value], missing), "{quantity:?} {:?}", chunk[i]);
                    compared += 1;
                }
            }
        }
        compared
    }
    let mut random = Random(0x76696577);
    let points: Vec<[f64; 3]> = (0..512)
        .map(|i| {
            let dry = if i % 16 == 0 { 0.0 } else { 1.0 };
            [random.between(-80.0, 150.0), dry * random.between(-16.0, 0.5).exp(), random.between(20e3, 1.1e6)]
        })
        .collect();
    let compared =
        run::<RealGas<_>, RealGas<_>, RealGas<_>>(&points) + run::<IdealGas<_>, IdealGas<_>, IdealGas<_>>(&points);
    println!("{compared} readings compared");
    assert!(compared > 20_000);
}
