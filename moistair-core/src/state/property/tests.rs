//! The solves over the whole declared domain: how many steps they need, and that no value is read where there is none.

use std::println;

use super::*;
use crate::error::NoValue;
use crate::mixture::{Gas, Helmholtz, IdealGas, RealGas};
use crate::state::construct::greatest_humidity_ratio;

/// Dry bulb, pressure, humidity ratio and gas over the declared domain, from nearly dry to the most vapor that a state holds.
pub fn states<M: Mixture<f64>>() -> impl Iterator<Item = (f64, f64, f64, Gas<f64>)> {
    let shares = [1e-7, 1e-3, 0.02, 0.1, 0.3, 0.6, 0.9, 0.99, 1.0];
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    let grid = (0..).map(move |i| coldest + 2.0 * f64::from(i)).take_while(move |t| *t <= warmest);
    let celsius = grid.chain([-45.0, -39.9, -0.3, -0.05, 0.0, 0.005, 0.01, 0.02]);
    let (_, highest) = M::FORMULATION.limits(Quantity::Pressure);
    celsius.flat_map(move |t| {
        let pressures = [20e3, 60e3, 101_325.0, 300e3, 700e3, 1.1e6, 1.8e6, 2.5e6, 3.5e6, 5e6];
        pressures.into_iter().take_while(move |p| *p <= highest).flat_map(move |p| {
            let mixture = M::at(t);
            let limit = greatest_humidity_ratio(&mixture, t, p);
            shares.map(|share| (t, p, share * limit, mixture.gas(p, share * limit)))
        })
    })
}

/// The state of these numbers.
pub fn state<M: Mixture<f64>>(celsius: f64, pascals: f64, humidity_ratio: f64, gas: Gas<f64>) -> MoistAir<f64> {
    MoistAir { celsius, pascals, humidity_ratio, gas, formulation: M::FORMULATION }
}

/// Where a solve over a surface has a meaning.
fn range<M: Mixture<f64>>(surface: Surface, pressure: f64) -> (f64, f64) {
    match surface {
        Surface::Ice => (-100.0, M::melting_temperature(pressure).min(Quantity::FrostPoint.limits().1)),
        Surface::Liquid | Surface::Stable => (-40.0, 200.0),
    }
}

/// The worst of an error over all states and both surfaces, where the exact value has a meaning.
fn worst<M: Mixture<f64>>(
    exact: impl Fn(f64, f64, f64, f64, Surface) -> f64,
    solved: impl Fn(f64, f64, f64, f64, Surface) -> f64,
) -> f64 {
    let mut most = 0.0;
    for (celsius, pressure, w, gas) in states::<M>() {
        for surface in [Surface::Liquid, Surface::Ice] {
            let (low, high) = range::<M>(surface, pressure);
            let exact = exact(celsius, pressure, w, gas.enthalpy, surface);
            if low <= exact && exact <= high {
                let error = (solved(celsius, pressure, w, gas.enthalpy, surface) - exact).abs();
                most = if error <= most { most } else { error }; // a NaN stays
            }
        }
    }
    most
}

/// Far more steps than needed.
const MANY: Steps = Steps { dew_point: 12, wet_bulb: 12, wet_bulb_halvings: 14, humidity_ratio: 12, temperature: 16 };

fn wet_bulb_left_over<M: Mixture<f64>>(steps: Steps) -> f64 {
    let after = |steps| move |t, p, w, h, surface| wet_bulb_after::<M, f64>(steps, t, p, w, h, surface);
    let left = worst::<M>(after(MANY), after(steps));
    println!(
        "wet bulb, {:?}: after {} halvings and {} steps {left:e} K",
        M::FORMULATION,
        steps.wet_bulb_halvings,
        steps.wet_bulb
    );
    left
}

fn dew_point_left_over<M: Mixture<f64>>(steps: usize) -> f64 {
    let after = |steps| move |_, p, w, _, surface| dew_point_after::<M, f64>(steps, M::mole_fraction(w), p, surface);
    let left = worst::<M>(after(MANY.dew_point), after(steps));
    println!("dew and frost point, {:?}: after {steps} steps {left:e} K", M::FORMULATION);
    left
}

/// The constants of the real and the ideal gas, and those of the Helmholtz formulation, pass the bound and one less of either does not.
#[test]
fn wet_bulb_steps_are_enough_and_none_is_idle() {
    let check = |bound: f64, steps: Steps, left: &dyn Fn(Steps) -> f64| {
        assert!(left(steps) <= bound);
        let stale = "one less does as well: the constant is stale";
        assert!(left(Steps { wet_bulb_halvings: steps.wet_bulb_halvings - 1, ..steps }) > bound, "{stale}");
        assert!(left(Steps { wet_bulb: steps.wet_bulb - 1, ..steps }) > bound, "{stale}");
    };
    check(1e-9, Steps::TO_150_CELSIUS, &|steps| {
        wet_bulb_left_over::<RealGas<f64>>(steps).max(wet_bulb_left_over::<IdealGas<f64>>(steps))
    });
    check(1e-10, <Helmholtz<f64> as Mixture<f64>>::STEPS, &wet_bulb_left_over::<Helmholtz<f64>>);
}

#[test]
fn wet_bulb_start_is_as_good_as_it_says() {
    let steps = Steps { wet_bulb: 0, ..Steps::TO_150_CELSIUS };
    let start = wet_bulb_left_over::<RealGas<f64>>(steps).max(wet_bulb_left_over::<IdealGas<f64>>(steps));
    assert!((1.8..=2.2).contains(&start), "{start}: the claim at `wet_bulb_start` is wrong or stale");
    let steps = Steps { wet_bulb: 0, ..<Helmholtz<f64> as Mixture<f64>>::STEPS };
    let start = wet_bulb_left_over::<Helmholtz<f64>>(steps);
    assert!((3.5..=4.2).contains(&start), "{start}: the claim at `wet_bulb_start` is wrong or stale");
}

#[test]
fn dew_point_steps_are_enough_and_none_is_idle() {
    const BOUND: f64 = 1e-10;
    let check = |steps: usize, left: &dyn Fn(usize) -> f64| {
        assert!(left(steps) <= BOUND);
        assert!(left(steps - 1) > BOUND, "one step fewer does as well: the constant is stale");
    };
    check(Steps::TO_150_CELSIUS.dew_point, &|steps| {
        dew_point_left_over::<RealGas<f64>>(steps).max(dew_point_left_over::<IdealGas<f64>>(steps))
    });
    check(<Helmholtz<f64> as Mixture<f64>>::STEPS.dew_point, &dew_point_left_over::<Helmholtz<f64>>);
}

/// Whatever is read satisfies the equation that defines it; where nothing is read, the reason is the true one.
#[test]
fn what_is_read_solves_its_equation() {
    fn run<M: Mixture<f64>>(name: &str) {
        let (mut read, mut none, mut most) = (0, 0, 0.0_f64);
        let mut solved = |error: f64, quantity, at| {
            assert!(error.abs() < 2e-9, "{name}: {quantity:?} is {error:e} K off at {at:?}");
            most = most.max(error.abs());
            read += 1;
        };
        for (celsius, pressure, w, gas) in states::<M>() {
            let view = View::<M, f64>::of(state::<M>(celsius, pressure, w, gas));
            let at = (celsius, pressure, w);
            let deficit = |x, surface| saturation_deficit::<M, f64>(x, pressure, w, gas.enthalpy, surface);
            for (quantity, surface) in
                [(Quantity::WetBulbOverLiquid, Surface::Liquid), (Quantity::WetBulbOverIce, Surface::Ice)]
            {
                let (low, high) = range::<M>(surface, pressure);
                match view.value(quantity) {
                    Ok(x) => {
                        assert!(low <= x && x <= high, "{name} {quantity:?} {x} at {at:?}");
                        // Vapor supersaturated over ice warms where it deposits: that wet bulb is above the dry bulb.
                        let saturation = view.mixture.saturation(pressure, surface);
                        let warms = saturates(saturation.mole_fraction) && w > saturation.humidity_ratio;
                        assert!(
                            if warms { x >= celsius - 1e-9 } else { x <= celsius + 1e-9 },
                            "{name} {quantity:?} {x} {at:?}"
                        );
                        let (value, slope) = deficit(x, surface);
                        solved(value / slope, quantity, at);
                    }
                    Err(Error::NoValue { reason: NoValue::AboveSurfaceRange, .. }) => {
                        assert!(
                            surface == Surface::Ice && deficit(high, surface).0 > 0.0,
                            "{name} {quantity:?} {at:?}"
                        );
                        none += 1;
                    }
                    Err(Error::NoValue { reason: NoValue::BelowSurfaceRange, .. }) => {
                        assert!(deficit(low, surface).0 < 0.0, "{name} {quantity:?} {at:?}");
                        none += 1;
                    }
                    other => panic!("{name} {quantity:?} {other:?} {at:?}"),
                }
            }
            for (quantity, surface) in [(Quantity::DewPoint, Surface::Liquid), (Quantity::FrostPoint, Surface::Ice)] {
                let (low, high) = range::<M>(surface, pressure);
                let saturated = |x| M::at(x).saturation(pressure, surface);
                match view.value(quantity) {
                    Ok(x) => {
                        assert!(low <= x && x <= high, "{name} {quantity:?} {x} at {at:?}");
                        let saturation = saturated(x);
                        let slope = (1.0 - saturation.mole_fraction) * saturation.log_slope;
                        solved((saturation.mole_fraction / M::mole_fraction(w) - 1.0) / slope, quantity, at);
                    }
                    Err(Error::NoValue { reason: NoValue::AboveSurfaceRange, .. }) => {
                        assert!(
                            surface == Surface::Ice && saturated(high).mole_fraction < M::mole_fraction(w),
                            "{at:?}"
                        );
                        none += 1;
                    }
                    Err(Error::NoValue { reason: NoValue::BelowSurfaceRange, .. }) => {
                        assert!(saturated(low).mole_fraction > M::mole_fraction(w), "{name} {quantity:?} {at:?}");
                        none += 1;
                    }
                    other => panic!("{name} {quantity:?} {other:?} {at:?}"),
                }
            }
        }
        println!("{name}: {read} read, worst {most:e} K; {none} without a value");
        assert!(read > 12_000 && none > 8_000);
    }
    run::<RealGas<f64>>("real gas");
    run::<IdealGas<f64>>("ideal gas");
    run::<Helmholtz<f64>>("Helmholtz");
}

/// The stable wet bulb is the one over liquid at or above the melting temperature, else the one over ice, everywhere.
#[test]
fn stable_wet_bulb_follows_its_rule() {
    fn run<M: Mixture<f64>>() {
        for (celsius, pressure, w, gas) in states::<M>() {
            let melting = M::melting_temperature(pressure);
            let over = |surface| wet_bulb::<M, f64>(celsius, pressure, w, gas.enthalpy, surface);
            let (at_melting, _) = saturation_deficit::<M, f64>(melting, pressure, w, gas.enthalpy, Surface::Liquid);
            let stable = stable_wet_bulb::<M, f64>(celsius, pressure, w, gas.enthalpy);
            let expected = if at_melting >= 0.0 { over(Surface::Liquid) } else { over(Surface::Ice) };
            assert!((stable - expected).abs() < 1e-9, "{celsius} °C {pressure} Pa {w}: {stable} {expected}");
            assert!((at_melting >= 0.0) == (stable >= melting), "{celsius} °C {pressure} Pa {w}: {stable}");
        }
    }
    run::<RealGas<f64>>();
    run::<IdealGas<f64>>();
    run::<Helmholtz<f64>>();
}
