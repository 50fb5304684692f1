//! Outdoor-air fraction: there and back, uncertainty, where it says nothing, what a temperature leaves out.

use crate::checks::Random;
use crate::support::*;
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{
    self, FractionLimits, FractionStatus, OtherFlow, OutdoorAirFraction, Reach,
};
use moistair_core::signal::Quality;
use moistair_core::*;
use proptest::prelude::*;

/// A standard normal number (Box and Muller 1958).
pub fn normal(random: &mut Random) -> f64 {
    let radius = (-2.0 * (1.0 - random.between(0.0, 1.0)).ln()).sqrt();
    radius * (core::f64::consts::TAU * random.between(0.0, 1.0)).cos()
}

/// Mean and standard deviation.
pub fn spread(samples: &[f64]) -> (f64, f64) {
    let count = samples.len() as f64;
    let mean = samples.iter().sum::<f64>() / count;
    (mean, (samples.iter().map(|x| (x - mean) * (x - mean)).sum::<f64>() / (count - 1.0)).sqrt())
}

fn exact(air: &MoistAir) -> MeasuredAir {
    let (t, w, _) = numbers(air);
    MeasuredAir {
        dry_bulb: Reading::new(t, 0.0),
        humidity: Reading::new(w, 0.0),
        humidity_quantity: Quantity::HumidityRatio,
    }
}

fn by(quantity: Quantity, values: [f64; 3], uncertainty: f64) -> OutdoorAirFraction {
    let [outdoor, returned, mixed] = values.map(|value| Reading::new(value, uncertainty));
    outdoor_air::from_readings(quantity, outdoor, returned, mixed, 0.05).unwrap()
}

/// Mixing turned round: the wanted temperature is met, and the fraction comes back as far as a temperature can tell it; by enthalpy and
/// humidity ratio it comes back where there is no fog.
#[test]
fn mixing_turned_round() {
    let cases = bases().prop_flat_map(|basis| (airs_on(basis), airs_on(basis), 0.0..=1.0_f64));
    let worst = std::cell::Cell::new([0.0_f64; 3]);
    let dry = std::cell::Cell::new(0_u32);
    let past = std::cell::Cell::new(0.0_f64);
    check(cases, |(outdoor, returned, fraction)| {
        let Ok(mixed) = outdoor_air::mixed(&outdoor, &returned, fraction) else { return Ok(()) };
        let wet = mixed.leaving.air();
        let t = wet.air().dry_bulb();
        let found = outdoor_air::for_mixed_temperature(&outdoor, &returned, t, FractionLimits::from_least(0.0));
        // A mixture may be warmer than a leaving temperature can be asked for.
        let Ok(found) = found else { return Ok(()) };
        let met = (found.mixed.leaving.air().air().dry_bulb() - t).kelvins().abs();
        let ends = [outdoor.dry_bulb().celsius(), returned.dry_bulb().celsius()];
        let (coldest, warmest) = (ends[0].min(ends[1]), ends[0].max(ends[1]));
        prop_assert!((0.0..=1.0).contains(&found.fraction));
        if (coldest..=warmest).contains(&t.celsius()) {
            let [a, b, c] = worst.get();
            worst.set([a.max(met), b, c]);
            prop_assert!(met <= 1e-11, "{met} K off: {found:?}");
        } else {
            // By the heat of mixing of real gases: much in hot steam at pressure, next to nothing in plants.
            let beyond = (coldest - t.celsius()).max(t.celsius() - warmest);
            let plant = outdoor.pressure().pascals() < 120e3 && warmest < 60.0;
            past.set(if plant { past.get().max(beyond) } else { past.get() });
            prop_assert!(met <= beyond + 1e-9, "{beyond} K past both: {found:?}");
        }
        if wet.is_wet() {
            return Ok(());
        }
        dry.set(dry.get() + 1);
        let basis = outdoor.basis();
        for (slot, quantity) in [(1, Quantity::SpecificEnthalpy), (2, Quantity::HumidityRatio)] {
            let value = |air: &MoistAir| air.value(quantity).unwrap();
            let difference = (value(&outdoor) - value(&returned)).abs();
            let readings = [exact(&outdoor), exact(&returned), exact(&wet.air())];
            let back = outdoor_air::from_air(quantity, &readings[0], &readings[1], &readings[2], basis, 0.05).unwrap();
            let Some(back) = back.fraction else {
                prop_assert!(difference == 0.0);
                continue;
            };
            // What the temperature's last place is worth in this fraction.
            let (capacity, kelvins) = (wet.air().specific_heat().joules_per_kilogram_kelvin(), t.kelvins());
            let size = if slot == 1 {
                value(&outdoor).abs().max(value(&returned).abs()) + capacity * kelvins
            } else {
                value(&outdoor).max(value(&returned))
            };
            let share = (back - fraction).abs() * difference / size / f64::EPSILON;
            let mut most = worst.get();
            most[slot] = most[slot].max(share);
            worst.set(most);
            prop_assert!(share <= 8.0, "{quantity:?} {back} {fraction}: {share}");
        }
        Ok(())
    });
    let [kelvins, enthalpy, ratio] = worst.get();
    println!(
        "mixing turned round: temperature to {kelvins:.1e} K; of {} without fog the fraction by enthalpy to {enthalpy:.1}, by humidity ratio to {ratio:.1} epsilons of the readings",
        dry.get()
    );
    println!("mixtures past both temperatures, to 120 kPa and 60 °C: by {:.1e} K at most", past.get());
    assert!(dry.get() > 100 && past.get() < 1e-3);
}

/// u(x) = √(u_m² + x² u_o² + (1 − x)² u_r²) / |o − r|; for equal uncertainties u √(1 + x² + (1 − x)²) / |Δ|.
#[test]
fn uncertainty_of_the_fraction() {
    let quarter = by(Quantity::DryBulb, [4.0, 24.0, 19.0], 0.2);
    assert_eq!(quarter.fraction, Some(0.25));
    let expected = 0.2 * (1.0_f64 + 0.0625 + 0.5625).sqrt() / 20.0;
    assert!((quarter.standard_uncertainty.unwrap() / expected - 1.0).abs() < 1e-15);

    let mut random = Random(5);
    let mut worst = 0.0_f64;
    // Dry bulbs; humidity ratios; outside [0, 1]; unequal uncertainties.
    let cases = [
        (Quantity::DryBulb, [4.0, 24.0, 19.0], [0.2, 0.2, 0.2]),
        (Quantity::DryBulb, [35.0, 24.0, 26.2], [0.1, 0.2, 0.3]),
        (Quantity::HumidityRatio, [0.002, 0.010, 0.004], [1e-4, 2e-4, 5e-5]),
        (Quantity::TracerConcentration, [420.0, 1_000.0, 900.0], [5.0, 10.0, 10.0]),
        (Quantity::DryBulb, [4.0, 24.0, 25.0], [0.2, 0.3, 0.2]),
    ];
    for (quantity, values, uncertainties) in cases {
        let read = |i: usize, value| Reading::new(value, uncertainties[i]);
        let of = |v: [f64; 3]| {
            outdoor_air::from_readings(quantity, read(0, v[0]), read(1, v[1]), read(2, v[2]), 0.05).unwrap()
        };
        let samples: Vec<f64> = (0..100_000)
            .map(|_| {
                let scattered = [0, 1, 2].map(|i: usize| values[i] + uncertainties[i] * normal(&mut random));
                of(scattered).fraction.unwrap()
            })
            .collect();
        let (_, deviation) = spread(&samples);
        let off = of(values).standard_uncertainty.unwrap() / deviation - 1.0;
        worst = worst.max(off.abs());
        assert!(off.abs() < 0.02, "{quantity:?} {values:?}: {off}");
    }
    println!(
        "uncertainty of the fraction: {} cases of 100000 samples, at worst {:.2} % off",
        cases.len(),
        worst * 100.0
    );
}

/// The same through the derivatives of the states: enthalpies from temperature and relative humidity, on each formulation.
#[test]
fn uncertainty_of_the_fraction_by_states() {
    let mut random = Random(6);
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let truth = [(34.0, 0.40), (24.0, 0.50), (27.0, 0.475)];
        for quantity in [Quantity::SpecificEnthalpy, Quantity::HumidityRatio] {
            let of = |v: [(f64, f64); 3]| {
                let air =
                    v.map(|(t, rh)| MeasuredAir::from_relative_humidity(Reading::new(t, 0.1), Reading::new(rh, 0.004)));
                outdoor_air::from_air(quantity, &air[0], &air[1], &air[2], site, 0.05).unwrap()
            };
            let count = if formulation == Formulation::IdealGas { 100_000 } else { 20_000 };
            let samples: Vec<f64> = (0..count)
                .map(|_| {
                    of(truth.map(|(t, rh)| (t + 0.1 * normal(&mut random), rh + 0.004 * normal(&mut random))))
                        .fraction
                        .unwrap()
                })
                .collect();
            let off = of(truth).standard_uncertainty.unwrap() / spread(&samples).1 - 1.0;
            println!("fraction by {quantity} on {formulation:?}: {count} samples, {:.2} % off", 100.0 * off);
            assert!(off.abs() < 0.02, "{formulation:?} {quantity:?} {off}");
        }
    }
}

/// A status for what a fraction is worth, and never a division by zero.
#[test]
fn statuses_of_the_fraction() {
    use FractionStatus::*;
    let of = |values, u| by(Quantity::DryBulb, values, u).status;
    assert_eq!(of([4.0, 24.0, 19.0], 0.2), Determined);
    assert_eq!(of([22.0, 24.0, 23.5], 0.2), Uncertain);
    // A difference within twice its own uncertainty, however well the mixture is known.
    let sure = |t, u| Reading::new(t, u);
    let near = outdoor_air::from_readings(Quantity::DryBulb, sure(23.0, 0.6), sure(24.0, 0.6), sure(24.0, 0.0), 10.0);
    assert_eq!(near.unwrap().status, Uncertain);
    // Just inside and just beyond twice the uncertainty: at x = −0.03 it is 0.2 √(1 + 0.03² + 1.03²) / 20 = 0.0144.
    assert_eq!(of([4.0, 24.0, 24.5], 0.2), Determined);
    assert_eq!(of([4.0, 24.0, 24.7], 0.2), BelowZero);
    assert_eq!(of([4.0, 24.0, 3.3], 0.2), AboveOne);
    // Exact readings: rounding is no sensor fault.
    let third = by(Quantity::DryBulb, [0.1, 0.3, 0.3 + 1e-17], 0.0);
    assert_eq!((third.status, third.fraction), (Determined, Some(0.0)));
    for same in [[24.0, 24.0, 24.0], [24.0, 24.0, 20.0], [0.0, -0.0, 1.0]] {
        let none = by(Quantity::DryBulb, same, 0.2);
        assert_eq!((none.status, none.fraction, none.standard_uncertainty), (Indeterminate, None, None));
    }
    let repaired = Reading::new(19.0, 0.2).with_quality(Quality::Repaired);
    let of = |mixed| outdoor_air::from_readings(Quantity::DryBulb, sure(4.0, 0.2), sure(24.0, 0.2), mixed, 0.05);
    assert_eq!(of(repaired).unwrap().quality, Quality::Repaired);
    assert!(matches!(of(Reading::missing()), Err(Error::NotFinite { quantity: Quantity::DryBulb })));
    assert!(of(repaired.with_quality(Quality::Refused)).is_err());
    let dew_points =
        outdoor_air::from_readings(Quantity::DewPoint, sure(4.0, 0.2), sure(8.0, 0.2), sure(5.0, 0.2), 0.05);
    assert!(matches!(dew_points, Err(Error::UnknownSelector { .. })));
}

#[test]
fn fraction_of_flows() {
    let of = |outdoor, other| outdoor_air::from_flows(Reading::new(outdoor, 0.05), other, 0.05).unwrap();
    let total = |m| OtherFlow::Total(Reading::new(m, 0.1));
    let beside = |m| OtherFlow::Recirculated(Reading::new(m, 0.1));
    assert_eq!(of(1.5, total(6.0)).fraction, Some(0.25));
    assert_eq!(of(1.5, beside(4.5)).fraction, Some(0.25));
    for nothing in [of(0.0, total(0.0)), of(0.0, beside(0.0)), of(1.0, total(0.0))] {
        assert_eq!((nothing.status, nothing.fraction), (FractionStatus::Indeterminate, None));
    }
    assert_eq!(of(6.5, total(6.0)).status, FractionStatus::AboveOne);
    let mut random = Random(8);
    for other in [total as fn(f64) -> OtherFlow, beside] {
        let samples: Vec<f64> = (0..100_000)
            .map(|_| of(1.5 + 0.05 * normal(&mut random), other(6.0 + 0.1 * normal(&mut random))).fraction.unwrap())
            .collect();
        let off = of(1.5, other(6.0)).standard_uncertainty.unwrap() / spread(&samples).1 - 1.0;
        assert!(off.abs() < 0.02, "{off}");
    }
}

/// What the documentation says of temperatures: about x (1 − x) Δc_p / c_p off without fog, 0.005 at 10 g/kg; in fog far more.
#[test]
fn a_temperature_only_nearly_tells_the_fraction() {
    let mut worst = 0.0_f64;
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let air = |t, w| MoistAir::from_dry_bulb(celsius(t), ratio(w), site).unwrap();
        for x in [0.1, 0.25, 0.5, 0.75, 0.9] {
            let (outdoor, returned) = (air(35.0, 0.018), air(24.0, 0.008));
            let mixed = outdoor_air::mixed(&outdoor, &returned, x).unwrap().leaving.air();
            assert!(!mixed.is_wet());
            let t = |air: &MoistAir| air.dry_bulb().celsius();
            let off = by(Quantity::DryBulb, [t(&outdoor), t(&returned), t(&mixed.air())], 0.0).fraction.unwrap() - x;
            let heat = |air: &MoistAir| air.specific_heat().joules_per_kilogram_kelvin();
            let stated = x * (1.0 - x) * (heat(&outdoor) - heat(&returned)) / heat(&mixed.air());
            // Exact with the constant heat capacities of the ideal gas; the others' rise a little with temperature.
            let tolerance = if formulation == Formulation::IdealGas { 1e-11 } else { 0.1 };
            assert!((off / stated - 1.0).abs() < tolerance, "{off} {stated}");
            worst = worst.max(off.abs());
        }
        // 30 °C, 90 % and −10 °C, 80 % in equal parts fog: the dry bulb says 0.63.
        let (outdoor, returned) = (at(-10.0, 0.8, site), at(30.0, 0.9, site));
        let mixed = outdoor_air::mixed(&outdoor, &returned, 0.5).unwrap().leaving.air();
        assert!(mixed.is_wet());
        let read = by(Quantity::DryBulb, [-10.0, 30.0, mixed.air().dry_bulb().celsius()], 0.0).fraction.unwrap();
        assert!((read - 0.37).abs() < 0.01, "{read}");
        let enthalpies = [outdoor.into(), returned.into(), mixed]
            .map(|air: AirWithCondensate| air.specific_enthalpy().joules_per_kilogram());
        let true_one = by(Quantity::SpecificEnthalpy, enthalpies, 0.0).fraction.unwrap();
        assert!((true_one - 0.5).abs() < 1e-12, "{true_one}");
    }
    println!("fraction by dry bulbs, 10 g/kg apart: at worst {worst:.4} off");
    assert!((0.004..0.005).contains(&worst));
}

/// Within the limits, at them, beyond them; outdoor air colder or warmer; no difference.
#[test]
fn fraction_for_a_mixed_temperature() {
    let site = sea_level(Formulation::RealGas);
    let (cold, room, hot) = (at(5.0, 0.7, site), at(24.0, 0.45, site), at(34.0, 0.4, site));
    let limits = FractionLimits { least: 0.2, most: 0.9 };
    let of =
        |outdoor: &MoistAir, t: f64| outdoor_air::for_mixed_temperature(outdoor, &room, celsius(t), limits).unwrap();
    let last = std::cell::Cell::new(1.0_f64);
    for i in 0..=40 {
        let t = 4.0 + 0.5 * f64::from(i);
        let blend = of(&cold, t);
        assert!((0.2..=0.9).contains(&blend.fraction) && blend.fraction <= last.get());
        last.set(blend.fraction);
        let mixed = blend.mixed.leaving.air().air().dry_bulb().celsius();
        assert_eq!(blend.reach == Reach::Reached, (mixed - t).abs() < 1e-9, "{t}: {blend:?}");
    }
    assert_eq!((of(&cold, 5.0).reach, of(&cold, 5.0).fraction), (Reach::AtMost, 0.9));
    assert_eq!((of(&cold, 24.0).reach, of(&cold, 24.0).fraction), (Reach::AtLeast, 0.2));
    assert!((of(&hot, 29.0).fraction - 0.5).abs() < 0.01);
    assert_eq!((of(&hot, 20.0).reach, of(&hot, 20.0).fraction), (Reach::AtLeast, 0.2));
    assert_eq!((of(&hot, 40.0).reach, of(&hot, 40.0).fraction), (Reach::AtMost, 0.9));
    assert_eq!((of(&room, 20.0).reach, of(&room, 20.0).fraction), (Reach::AtLeast, 0.2));
    let narrow = FractionLimits { least: 0.3, most: 0.3 };
    assert_eq!(outdoor_air::for_mixed_temperature(&cold, &room, celsius(14.0), narrow).unwrap().fraction, 0.3);
    for wrong in [
        FractionLimits { least: 0.5, most: 0.4 },
        FractionLimits { least: f64::NAN, most: 1.0 },
        FractionLimits { least: 0.0, most: 1.1 },
    ] {
        assert!(outdoor_air::for_mixed_temperature(&cold, &room, celsius(14.0), wrong).is_err());
    }
    let elsewhere = at(5.0, 0.7, Basis::real_gas(Pressure::from_pascals(90_000.0)));
    assert_eq!(outdoor_air::mixed(&elsewhere, &room, 0.5), Err(Error::MixedPressures));
}
