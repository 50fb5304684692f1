//! How many steps the search for a humidity ratio needs; scalar and lanes alike.

use std::println;
use std::vec::Vec;

use super::*;
use crate::Formulation;
use crate::checks::Random;
use crate::mixture::{Helmholtz, IdealGas, RealGas, Steps};
use crate::real::Lanes;
use crate::state::property::tests::{state, states};
use crate::state::property::{dew_point, stable_wet_bulb, wet_bulb};

/// The quantities whose humidity ratio is searched for.
const SEARCHED: [Quantity; 7] = [
    Quantity::SpecificEnthalpy,
    Quantity::SpecificVolume,
    Quantity::Density,
    Quantity::AbsoluteHumidity,
    Quantity::WetBulb,
    Quantity::WetBulbOverLiquid,
    Quantity::WetBulbOverIce,
];

/// Error of the humidity ratio over W + 1e-4, for every searched quantity at every state that has it.
///
/// In air as dense as at −74 °C and 5 MPa a kilogram of vapor takes the room of a kilogram of air: density then tells next to nothing of
/// W, and what is left over is the last bits of the density. Where it tells less than half of what it does in thin air (there 0.61 below),
/// states are passed over.
fn left_over<M: Mixture<f64>>(steps: usize) -> f64 {
    SEARCHED.iter().fold(0.0, |all, &quantity| {
        let (mut most, mut blind) = (0.0, 0);
        for (celsius, pressure, w, gas) in states::<M>() {
            if quantity == Quantity::Density
                && ((1.0 + w) * gas.volume_of_water / gas.volume - 1.0) * (1.0 + 1.6 * w) < 0.3
            {
                blind += 1;
                continue;
            }
            let mixture = M::at(celsius);
            let limit = greatest_humidity_ratio(&mixture, celsius, pressure);
            let Ok(value) = View { mixture, air: state::<M>(celsius, pressure, w, gas) }.value(quantity) else {
                continue;
            };
            let after =
                |steps| humidity_ratio_after::<M, f64>(steps, &mixture, pressure, quantity, value, limit).unwrap();
            let exact = after(12);
            let error = (after(steps) - exact).abs() / (exact.abs() + 1e-4);
            most = if error <= most { most } else { error };
        }
        println!("W from {quantity:?}, {:?}: after {steps} steps {most:e}, {blind} passed over", M::FORMULATION);
        assert!(blind < if M::FORMULATION == Formulation::Helmholtz { 700 } else { 1 });
        if most <= all { all } else { most }
    })
}

/// The constants pass the bound and one step fewer does not. The bound leaves room for what the density's last bit
/// is worth in W.
#[test]
fn ratio_steps_are_enough_and_none_is_idle() {
    let check = |bound: f64, steps: usize, left: &dyn Fn(usize) -> f64| {
        assert!(left(steps) <= bound);
        assert!(left(steps - 1) > bound, "one step fewer does as well: the constant is stale");
    };
    check(1e-10, Steps::TO_150_CELSIUS.humidity_ratio, &|steps| {
        left_over::<RealGas<f64>>(steps).max(left_over::<IdealGas<f64>>(steps))
    });
    check(2e-11, <Helmholtz<f64> as Mixture<f64>>::STEPS.humidity_ratio, &left_over::<Helmholtz<f64>>);
}

/// The list of what is searched for is the one that the constructor goes by.
#[test]
fn searched_quantities() {
    for &quantity in Quantity::ALL {
        assert_eq!(is_searched(quantity), SEARCHED.contains(&quantity), "{quantity:?}");
    }
}

/// In single precision as in double: what is read from a state makes a state again, at dry, saturated and between, to the ends of
/// every range; and vapor beyond saturation is refused, not cut off, also where there is hardly any.
#[test]
fn single_precision_closes_at_saturation() {
    let mut made = 0;
    for &formulation in Formulation::ALL {
        for (celsius, pascals) in (0..=115)
            .flat_map(|i| [20e3_f32, 60e3, 101_325.0, 300e3, 1.1e6].map(|pascals| (-80.0 + 2.0 * i as f32, pascals)))
        {
            let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
            let by = |quantity, value| {
                MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), quantity, value, basis)
            };
            let (_, most) = Quantity::HumidityRatio.limits();
            let limit = by(Quantity::HumidityRatio, most as f32).map_or_else(
                |error| error.value_and_limits().unwrap().2 as f32,
                |air| air.humidity_ratio().kilograms_per_kilogram(),
            );
            for share in [0.0, 0.5, 1.0] {
                let air = by(Quantity::HumidityRatio, share * limit).unwrap();
                for &quantity in Quantity::ALL.iter().filter(|quantity| quantity.fixes_state()) {
                    let Ok(value) = air.value(quantity) else { continue };
                    let again = by(quantity, value);
                    assert!(again.is_ok(), "{formulation:?} {celsius} °C, {pascals} Pa, share {share}: {again:?}");
                    made += 1;
                }
            }
            let beyond = by(Quantity::HumidityRatio, limit * 1.05);
            assert!(beyond.is_err(), "{formulation:?} {celsius} °C, {pascals} Pa: {beyond:?}");
        }
    }
    println!("{made} states made again");
    assert!(made > 40_000);
}

/// Every kernel at one point: what columns compute in lanes and states compute alone.
fn kernels<M: Mixture<R>, R: Real>(celsius: R, pressure: R, share: R) -> Vec<R> {
    let mixture = M::at(celsius);
    let liquid = mixture.saturation(pressure, Surface::Liquid);
    let declared = k::<R>(Quantity::HumidityRatio.limits().1);
    let limit = R::select(saturates(liquid.mole_fraction), liquid.humidity_ratio, declared).at_most(declared);
    let w = share * limit;
    let gas = mixture.gas(pressure, w);
    let mut all = std::vec![
        w,
        gas.volume,
        gas.enthalpy,
        gas.specific_heat,
        gas.compressibility,
        gas.volume_of_water,
        gas.enthalpy_of_water,
        M::melting_temperature(pressure),
        stable_wet_bulb::<M, R>(celsius, pressure, w, gas.enthalpy),
    ];
    for surface in [Surface::Stable, Surface::Liquid, Surface::Ice] {
        let saturation = mixture.saturation(pressure, surface);
        all.extend([
            saturation.mole_fraction,
            saturation.humidity_ratio,
            saturation.log_slope,
            saturation.condensed_enthalpy,
            mixture.pure_saturation_pressure(pressure, surface),
            M::condensed_enthalpy(celsius, pressure, surface),
            dew_point::<M, R>(M::mole_fraction(w), pressure, surface),
            wet_bulb::<M, R>(celsius, pressure, w, gas.enthalpy, surface),
        ]);
    }
    let density = (w + k(1.0)) / gas.volume;
    let trial = celsius - (k::<R>(1.0) - share) * k(20.0);
    for (quantity, value) in [
        (Quantity::HumidityRatio, w),
        (Quantity::WaterMoleFraction, M::mole_fraction(w)),
        (Quantity::VaporPressure, M::mole_fraction(w) * pressure),
        (Quantity::SpecificHumidity, w / (w + k(1.0))),
        (Quantity::RelativeHumidity, share),
        (Quantity::RelativeHumidityOverLiquid, share),
        (Quantity::DegreeOfSaturation, share),
        (Quantity::SpecificEnthalpy, gas.enthalpy),
        (Quantity::SpecificVolume, gas.volume),
        (Quantity::Density, density),
        (Quantity::AbsoluteHumidity, w / gas.volume),
        (Quantity::WetBulb, trial),
        (Quantity::WetBulbOverLiquid, trial),
        (Quantity::WetBulbOverIce, trial),
        (Quantity::DewPoint, trial),
        (Quantity::FrostPoint, trial),
    ] {
        all.push(humidity_ratio::<M, R>(&mixture, pressure, quantity, value, limit).unwrap());
    }
    all
}

/// Scalar, 8 and 32 lanes give the same bits (a NaN is a NaN) in every kernel, at 1024 seeded points of the domain and a little
/// beyond it on all sides.
#[test]
fn lanes_have_the_bits_of_scalars() {
    fn lanes<M: Mixture<Lanes<f64, N>>, const N: usize>(points: &[(f64, f64, f64)]) -> Vec<Vec<f64>> {
        let mut all = Vec::new();
        for chunk in points.chunks_exact(N) {
            let pack = |part: fn(&(f64, f64, f64)) -> f64| Lanes(core::array::from_fn(|i| part(&chunk[i])));
            let values = kernels::<M, Lanes<f64, N>>(pack(|p| p.0), pack(|p| p.1), pack(|p| p.2));
            all.extend((0..N).map(|i| values.iter().map(|value| value.0[i]).collect::<Vec<_>>()));
        }
        all
    }
    let mut random = Random(0x6d6f697374616972);
    let points: Vec<_> = (0..1024)
        .map(|_| (random.between(-90.0, 160.0), random.between(15e3, 1.2e6), random.between(-0.01, 1.02)))
        .collect();
    let mut compared = 0;
    let mut compare = |name: &str, scalar: Vec<Vec<f64>>, others: [Vec<Vec<f64>>; 2]| {
        for other in others {
            assert_eq!(scalar.len(), other.len());
            for (point, (a, b)) in points.iter().zip(scalar.iter().zip(&other)) {
                for (i, (a, b)) in a.iter().zip(b).enumerate() {
                    let same = a.to_bits() == b.to_bits() || (a.is_nan() && b.is_nan());
                    assert!(same, "{name}, kernel {i} at {point:?}: {a:e} {b:e}");
                    compared += 1;
                }
            }
        }
    };
    let scalar: Vec<_> = points.iter().map(|&(t, p, s)| kernels::<RealGas<f64>, f64>(t, p, s)).collect();
    compare("real gas", scalar, [lanes::<RealGas<_>, 8>(&points), lanes::<RealGas<_>, 32>(&points)]);
    let scalar: Vec<_> = points.iter().map(|&(t, p, s)| kernels::<IdealGas<f64>, f64>(t, p, s)).collect();
    compare("ideal gas", scalar, [lanes::<IdealGas<_>, 8>(&points), lanes::<IdealGas<_>, 32>(&points)]);
    let scalar: Vec<_> = points.iter().map(|&(t, p, s)| kernels::<Helmholtz<f64>, f64>(t, p, s)).collect();
    compare("Helmholtz", scalar, [lanes::<Helmholtz<_>, 8>(&points), lanes::<Helmholtz<_>, 32>(&points)]);
    println!("{compared} values compared");
    assert!(compared >= 6 * 1024 * 49);
}
