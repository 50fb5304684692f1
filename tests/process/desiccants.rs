//! Desiccants: the line of sorption, wheels by balances and by potentials: books, limits, order, the second law.

use crate::support::*;
use moistair_core::process::desiccant::potentials::{self, CorrelationStatus, Effectiveness};
use moistair_core::process::desiccant::{self, CarryOver, Regeneration, Sorption, WheelStatus};
use moistair_core::process::{AirStream, sensible};
use moistair_core::*;
use proptest::prelude::*;
use std::cell::Cell;

fn kelvins(t: f64) -> TemperatureDifference {
    TemperatureDifference::from_kelvins(t)
}

fn sorptions() -> impl Strategy<Value = Sorption> {
    let carried = prop_oneof![
        2 => Just(CarryOver::None),
        2 => (-1e3..2e4_f64).prop_map(|heat| CarryOver::Heat(HeatFlow::from_watts(heat))),
        2 => (-5.0..20.0_f64).prop_map(|rise| CarryOver::Rise(kelvins(rise))),
    ];
    (0.5..2.0_f64, carried).prop_map(|(heat_ratio, carry_over)| Sorption { heat_ratio, carry_over })
}

/// Air of a plant, of a dry-air flow.
fn plant(formulation: Formulation, t: f64, humidity: f64, m: f64) -> AirStream {
    stream(at(t, humidity, sea_level(formulation)), m)
}

fn formulations() -> impl Strategy<Value = Formulation> {
    prop::sample::select(Formulation::ALL)
}

#[test]
fn line_of_sorption() {
    let seen = Cell::new([0_u32; 2]);
    check((streams(), 0.0..1.3_f64, sorptions()), |(entering, share, sorption)| {
        let (_, w, _) = numbers(&entering.air());
        let target = (w * share).min(10.0);
        match desiccant::to_humidity_ratio(&entering, ratio(target), sorption) {
            Ok(done) => {
                let mut count = seen.get();
                count[usize::from(target > w)] += 1;
                seen.set(count);
                holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
                prop_assert_eq!(done.leaving.air().humidity_ratio().kilograms_per_kilogram(), target);
                let m = entering.dry_air_flow().kilograms_per_second();
                prop_assert!(
                    (done.removed.kilograms_per_second() - m * (w - target)).abs() <= 1e-15 * m * (w + target)
                );
                if let CarryOver::Rise(rise) = sorption.carry_over {
                    let alone = Sorption { carry_over: CarryOver::None, ..sorption };
                    let without = desiccant::to_humidity_ratio(&entering, ratio(target), alone).unwrap();
                    let found = done.leaving.air().dry_bulb() - without.leaving.air().dry_bulb();
                    prop_assert!((found.kelvins() - rise.kelvins()).abs() < 1e-8, "{found:?} {rise:?}");
                }
            }
            Err(Error::Infeasible { value, min, max, .. }) => {
                prop_assert!(value < min || value > max, "{value} {min} {max}")
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?} {entering:?}"))),
        }
        Ok(())
    });
    println!("dried, moistened: {:?}", seen.get());
    assert!(seen.get().iter().all(|&count| count > 0));
}

/// c_p (t₂ − t₁) = (W₁ − W₂) k h_fg of the ideal gas in its own numbers; with k = 1 nearly along the wet bulb.
#[test]
fn closed_form_of_the_ideal_gas() {
    check((0.0..60.0_f64, 0.1..0.95_f64, 0.0..1.0_f64, 0.5..2.0_f64), |(t, humidity, share, heat_ratio)| {
        let entering = plant(Formulation::IdealGas, t, humidity, 2.0);
        let (_, w, _) = numbers(&entering.air());
        let line = |heat_ratio| {
            let sorption = Sorption { heat_ratio, carry_over: CarryOver::None };
            desiccant::to_humidity_ratio(&entering, ratio(w * share), sorption)
        };
        let Ok(done) = line(heat_ratio) else { return Ok(()) };
        let vaporization = 2_501_000.0 + 1_860.0 * t - 4_186.0 * t;
        let warmed = w * (1.0 - share) * heat_ratio * vaporization / (1_006.0 + 1_860.0 * w * share);
        let (leaving, _, _) = numbers(&done.leaving.air());
        prop_assert!((leaving - t - warmed).abs() < 1e-10, "{leaving} {warmed}");
        prop_assert!((done.sorption_heat.watts() - 2.0 * w * (1.0 - share) * heat_ratio * vaporization).abs() < 1e-7);
        if let Ok(one) = line(1.0) {
            let wet_bulb = |air: MoistAir| air.wet_bulb().unwrap().celsius();
            let (before, after) = (wet_bulb(entering.air()), wet_bulb(one.leaving.air()));
            if before > 0.5 && after > 0.5 {
                // The water leaves at the air's temperature and not at the wet bulb: some tenths of a kelvin.
                prop_assert!((before - after).abs() < 0.02 * warmed.max(1.0) + 0.1, "{before} {after}");
            }
        }
        Ok(())
    });
}

#[test]
fn effectiveness_on_humidity_ratio() {
    check(
        (formulations(), 10.0..40.0_f64, 0.2..0.9_f64, 0.0..1.0_f64, 0.0..1.0_f64),
        |(formulation, t, humidity, one, other)| {
            let entering = plant(formulation, t, humidity, 1.0);
            let (_, w, _) = numbers(&entering.air());
            let sorption = Sorption { heat_ratio: 1.1, carry_over: CarryOver::None };
            let dry =
                |x: f64| desiccant::by_effectiveness(&entering, x, ratio(0.25 * w), sorption).unwrap().leaving.air();
            prop_assert!(same_bits(&dry(0.0), &entering.air()), "none changes nothing");
            prop_assert!((numbers(&dry(1.0)).1 / (0.25 * w) - 1.0).abs() < 1e-14, "all of it reaches the driest");
            let (less, more) = (numbers(&dry(one.min(other))), numbers(&dry(one.max(other))));
            prop_assert!(less.1 >= more.1 && less.0 <= more.0, "drier is warmer");
            let hotter = Sorption { heat_ratio: 1.3, ..sorption };
            let stronger = desiccant::by_effectiveness(&entering, one, ratio(0.25 * w), hotter).unwrap().leaving.air();
            prop_assert!(numbers(&stronger).0 >= numbers(&dry(one)).0, "more heat of sorption is warmer");
            Ok(())
        },
    );
}

/// Both sides of a wheel close, and together they exchange nothing; what the three ways of stating the heater find is one wheel.
#[test]
fn wheels() {
    let seen = Cell::new([0_u32; 2]);
    let cases = (
        formulations(),
        (15.0..40.0_f64, 0.3..0.9_f64),
        (10.0..40.0_f64, 0.2..0.9_f64),
        0.2..1.5_f64,
        (0.2..1.0_f64, 50.0..140.0_f64),
        sorptions(),
    );
    check(cases, |(formulation, (t1, x1), (t7, x7), flow_ratio, (share, hot), sorption)| {
        let (process, outdoor) = (plant(formulation, t1, x1, 1.0), plant(formulation, t7, x7, flow_ratio));
        let (_, w, _) = numbers(&process.air());
        let known = Regeneration::Entering(celsius(hot));
        let done = match desiccant::wheel(&process, ratio(w * share), sorption, &outdoor, known) {
            Ok(done) => done,
            Err(Error::Infeasible { value, min, max, .. }) => {
                prop_assert!(value < min || value > max, "{value} {min} {max}");
                return Ok(());
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?}"))),
        };
        holds(&[process.into()], &done.process.leaving.into(), &done.process.exchange)?;
        holds(&[outdoor.into()], &done.heater.leaving.into(), &done.heater.exchange)?;
        holds(&[done.heater.leaving.into()], &done.regeneration.into(), &done.regeneration_exchange)?;
        let (one, other) = (done.process.exchange, done.regeneration_exchange);
        prop_assert_eq!(
            (
                one.heat.watts() + other.heat.watts(),
                one.water.kilograms_per_second() + other.water.kilograms_per_second(),
                one.water_enthalpy_flow.watts() + other.water_enthalpy_flow.watts()
            ),
            (0.0, 0.0, 0.0)
        );
        // The second law, from the states alone.
        let entropy = |stream: &AirStream| {
            stream.dry_air_flow().kilograms_per_second() * stream.air().specific_entropy().joules_per_kilogram_kelvin()
        };
        let produced = entropy(&done.process.leaving) + entropy(&done.regeneration)
            - entropy(&process)
            - entropy(&done.heater.leaving);
        prop_assert!((produced - done.entropy_production).abs() < 1e-10, "{produced} {}", done.entropy_production);
        let against = done.status == WheelStatus::AgainstSecondLaw;
        prop_assert!(against == (produced < 0.0) || produced.abs() < 1e-9);
        let mut count = seen.get();
        count[usize::from(against)] += 1;
        seen.set(count);
        // By its heat, and by the temperature behind it.
        let heat = Regeneration::Heat(done.regeneration_heat());
        let by_heat = desiccant::wheel(&process, ratio(w * share), sorption, &outdoor, heat).unwrap();
        let behind = numbers(&done.regeneration.air()).0;
        prop_assert!((numbers(&by_heat.regeneration.air()).0 - behind).abs() < 1e-9);
        if let Ok(by_leaving) =
            desiccant::wheel(&process, ratio(w * share), sorption, &outdoor, Regeneration::Leaving(celsius(behind)))
        {
            prop_assert!((by_leaving.regeneration_heat().watts() - done.regeneration_heat().watts()).abs() < 1e-5);
            prop_assert!((numbers(&by_leaving.regeneration.air()).0 - behind).abs() < 1e-9);
        }
        Ok(())
    });
    println!("wheels possible, against the second law: {:?}", seen.get());
    assert!(seen.get().iter().all(|&count| count > 0));
}

fn effectivenesses() -> impl Strategy<Value = Effectiveness> {
    (0.0..0.3_f64, 0.3..1.0_f64).prop_map(|(first, second)| Effectiveness { first, second })
}

#[test]
fn wheels_by_potentials() {
    let seen = Cell::new([0_u32; 2]);
    let over = Cell::new([0.0_f64; 2]);
    let cases = (
        formulations(),
        (10.0..40.0_f64, 0.2..0.95_f64),
        (45.0..120.0_f64, 0.005..0.02_f64),
        0.4..1.0_f64,
        effectivenesses(),
        0.0..0.2_f64,
    );
    check(cases, |(formulation, (t1, x1), (t8, w8), flow_ratio, effectiveness, more)| {
        let process = plant(formulation, t1, x1, 1.0);
        let hot = MoistAir::from_dry_bulb(celsius(t8), ratio(w8), sea_level(formulation)).unwrap();
        let hot = stream(hot, flow_ratio);
        let done = match potentials::wheel(&process, &hot, effectiveness) {
            Ok(done) => done,
            Err(Error::Infeasible { value, min, max, .. }) => {
                prop_assert!(value < min || value > max, "{value} {min} {max}");
                return Ok(());
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?}"))),
        };
        holds(&[process.into()], &done.process.into(), &done.exchange)?;
        holds(&[hot.into()], &done.regeneration.into(), &done.regeneration_exchange)?;
        prop_assert_eq!(done.correlation, CorrelationStatus::Within);
        let removed = numbers(&process.air()).1 - numbers(&done.process.air()).1;
        prop_assert!((removed - done.removed.kilograms_per_second()).abs() < 1e-15);
        // What comes out of a test goes in again.
        let found = potentials::effectiveness_between(&process.air(), &done.process.air(), &hot.air());
        if let Ok(found) = found {
            prop_assert!((found.first - effectiveness.first).abs() < 1e-8, "{found:?}");
            prop_assert!((found.second - effectiveness.second).abs() < 1e-8, "{found:?}");
        }
        // Left over: the difference to the regeneration side by its own potentials, which closes with the books.
        if let Some(left) = done.imbalance {
            prop_assert!(left.heat.watts().is_finite() && left.water.kilograms_per_second().is_finite());
            let dried = done.removed.kilograms_per_second();
            if dried > 3e-3 && effectiveness.first < 0.1 && flow_ratio > 0.9 {
                let [heat, water] = over.get();
                over.set([
                    heat.max((left.heat.watts() / (2.5e6 * dried)).abs()),
                    water.max((left.water.kilograms_per_second() / dried).abs()),
                ]);
            }
        }
        let mut count = seen.get();
        count[usize::from(done.status == WheelStatus::AgainstSecondLaw)] += 1;
        seen.set(count);
        // A better wheel dries more, if the hot side is the drier in the second potential.
        let (from, to) = (potentials::potentials(&process.air()).unwrap(), potentials::potentials(&hot.air()).unwrap());
        let better = Effectiveness { second: (effectiveness.second + more).min(1.0), ..effectiveness };
        if let (true, Ok(better)) = (to.1 > from.1, potentials::wheel(&process, &hot, better)) {
            prop_assert!(numbers(&better.process.air()).1 <= numbers(&done.process.air()).1 + 1e-12);
            prop_assert!(numbers(&better.process.air()).0 >= numbers(&done.process.air()).0 - 1e-9);
        }
        Ok(())
    });
    let [heat, water] = over.get();
    println!(
        "wheels possible, against the second law: {:?}; left over at most: {heat:.2} of the heat of the water, {water:.2} of the water",
        seen.get()
    );
    assert!(seen.get()[0] > 100);
}

/// None of either potential: the air stays. All of both: the process air leaves as the regeneration air enters, and the other way round.
#[test]
fn ends_of_the_potentials() {
    check(
        (formulations(), 10.0..40.0_f64, 0.2..0.9_f64, 45.0..120.0_f64, 0.005..0.02_f64),
        |(formulation, t1, x1, t8, w8)| {
            let process = plant(formulation, t1, x1, 1.0);
            let hot = stream(MoistAir::from_dry_bulb(celsius(t8), ratio(w8), sea_level(formulation)).unwrap(), 1.0);
            let by = |first, second| potentials::wheel(&process, &hot, Effectiveness { first, second }).unwrap();
            let none = by(0.0, 0.0);
            prop_assert!(
                same_bits(&none.process.air(), &process.air()) && same_bits(&none.regeneration.air(), &hot.air())
            );
            prop_assert_eq!(none.removed.kilograms_per_second(), 0.0);
            let all = by(1.0, 1.0);
            for (leaving, entering) in [(all.process, hot), (all.regeneration, process)] {
                let (a, b) = (numbers(&leaving.air()), numbers(&entering.air()));
                prop_assert!((a.0 - b.0).abs() < 1e-7 && (a.1 - b.1).abs() < 1e-10, "{a:?} {b:?}");
            }
            let left = all.imbalance.unwrap();
            prop_assert!(left.heat.watts().abs() < 1e-3 && left.water.kilograms_per_second().abs() < 1e-10);
            Ok(())
        },
    );
}

/// The correlation is refused outside its range, and marked away from the pressure that it was made for.
#[test]
fn range_of_the_correlation() {
    let site = sea_level(Formulation::RealGas);
    let good = Effectiveness { first: 0.07, second: 0.92 };
    let (process, hot) = (stream(at(30.0, 0.5, site), 1.0), stream(at(85.0, 0.03, site), 1.0));
    assert!(potentials::wheel(&process, &hot, good).is_ok());
    let code = |process: &AirStream, hot: &AirStream| potentials::wheel(process, hot, good).unwrap_err();
    let cold = stream(at(1.8, 0.5, site), 1.0);
    assert!(matches!(code(&cold, &hot), Error::OutOfRange { quantity: Quantity::DesiccantTemperature, .. }));
    let dry = stream(at(30.0, 0.0, site), 1.0);
    assert!(matches!(code(&dry, &hot), Error::Infeasible { quantity: Quantity::HumidityRatio, .. }));
    let idle = stream(at(85.0, 0.03, site), 0.0);
    assert_eq!(code(&process, &idle), Error::NoFlow);
    // Cold dry air against hot moist air: no state of the range has both potentials.
    let frosty = stream(at(2.0, 0.95, site), 1.0);
    let steamy = stream(at(90.0, 0.5, site), 1.0);
    for first in [0.0, 0.5, 1.0] {
        for second in [0.0, 0.5, 1.0] {
            let asked = Effectiveness { first, second };
            if let Err(error) = potentials::wheel(&frosty, &steamy, asked) {
                assert!(matches!(error, Error::Infeasible { .. }), "{error:?}");
            }
        }
    }
    let mountain = Basis::real_gas(Pressure::from_pascals(80_000.0));
    let (process, hot) = (stream(at(30.0, 0.5, mountain), 1.0), stream(at(85.0, 0.03, mountain), 1.0));
    assert_eq!(potentials::wheel(&process, &hot, good).unwrap().correlation, CorrelationStatus::OffStandardPressure);
}

/// Along a line of enthalpy the first potential hardly changes, along a relative humidity the second not much: the constants are what they are said to be.
#[test]
fn potentials_run_along_their_lines() {
    let site = sea_level(Formulation::IdealGas);
    let of = |air: &MoistAir| potentials::potentials(air).unwrap();
    let (from, to) =
        (of(&at(30.0, 0.52, site)), of(&MoistAir::from_dry_bulb(celsius(85.0), ratio(0.014), site).unwrap()));
    let start = at(30.0, 0.45, site);
    let (mut first, mut second) = (0.0_f64, 0.0_f64);
    for step in 1..=15 {
        let air = MoistAir::from_dry_bulb(celsius(30.0 + f64::from(step)), start.specific_enthalpy(), site).unwrap();
        first = first.max(((of(&air).0 - of(&start).0) / (to.0 - from.0)).abs());
        let warmer = at(20.0 + 4.0 * f64::from(step), 0.2, site);
        second = second.max(((of(&warmer).1 - of(&at(20.0, 0.2, site)).1) / (to.1 - from.1)).abs());
    }
    println!("potentials move by {first:.3} along an enthalpy, by {second:.3} along a relative humidity, of their way");
    assert!(first < 0.03 && second < 0.25 && second > 0.1);
}

/// The heater before a wheel by potentials is the usual one.
#[test]
fn regeneration_heat_of_a_wheel_by_potentials() {
    let outdoor = plant(Formulation::RealGas, 32.0, 0.45, 0.8);
    let heater = sensible::to_temperature(&outdoor, celsius(85.0)).unwrap();
    let process = plant(Formulation::RealGas, 26.0, 0.55, 0.8);
    let done = potentials::wheel(&process, &heater.leaving, Effectiveness { first: 0.07, second: 0.9 }).unwrap();
    let per_water = heater.exchange.heat.watts() / done.removed.kilograms_per_second();
    println!("regeneration of a wheel by potentials: {:.2} MJ per kilogram of water", per_water * 1e-6);
    assert!((3e6..10e6).contains(&per_water));
}
