//! Economizer: published figures, no chatter, safe whatever is wrong, margins and confidence that mean what they say.

use crate::checks::Random;
use crate::outdoor_air::{normal, spread};
use crate::support::*;
use moistair_core::process::economizer::{
    self, Decision, Economizer, EconomizerState, Fallback, Reason, Rule, Supply, coil_load,
};
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{FractionLimits, Reach};
use moistair_core::signal::Quality;
use moistair_core::*;
use proptest::prelude::*;

fn settings(rule: Rule) -> Economizer {
    Economizer::new(rule, sea_level(Formulation::RealGas))
}

/// ±0.5 K and ±3 %.
fn air(t: f64, relative_humidity: f64) -> MeasuredAir {
    MeasuredAir::from_relative_humidity(Reading::within(t, 0.5), Reading::within(relative_humidity, 0.03))
}

/// From degrees Fahrenheit and grains per pound.
fn inch_pound(fahrenheit: f64, grains: f64) -> MeasuredAir {
    MeasuredAir {
        dry_bulb: Reading::new(Temperature::from_fahrenheit(fahrenheit).celsius(), 0.0),
        humidity: Reading::new(grains / 7_000.0, 0.0),
        humidity_quantity: Quantity::HumidityRatio,
    }
}

/// The decision of an economizer that has been off for long.
fn first(settings: &Economizer, outdoor: &MeasuredAir, returned: &MeasuredAir) -> Decision {
    settings.decide(&mut EconomizerState::default(), 0.0, outdoor, returned)
}

fn limits_in_place(decision: &Decision) {
    assert!(
        decision.margin.is_finite() && decision.margin_uncertainty >= 0.0 && decision.margin_uncertainty.is_finite()
    );
    assert!((0.0..=1.0).contains(&decision.confidence), "{decision:?}");
}

/// Return air of 76 °F and 68 gr/lb, outdoor air of 78 °F and 60 gr/lb (Taylor and Cheng 2010): on a wet coil outdoor air needs
/// less, though it is warmer; on a dry coil more.
#[test]
fn warmer_outdoor_air_may_need_less_of_a_wet_coil() {
    let (returned, outdoor) = (inch_pound(76.0, 68.0), inch_pound(78.0, 60.0));
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let with = |rule| Economizer {
            dry_bulb_limit: celsius(28.0),
            enthalpy_hysteresis: joules(500.0),
            temperature_hysteresis: TemperatureDifference::from_kelvins(0.5),
            ..Economizer::new(rule, site)
        };
        let decided = |settings: Economizer| first(&settings, &outdoor, &returned);
        assert_eq!(decided(with(Rule::DifferentialDryBulb)).reason, Reason::DryBulbHigh);
        let by_enthalpy = decided(with(Rule::DifferentialEnthalpy));
        assert!(by_enthalpy.enabled && by_enthalpy.confidence == 1.0);
        assert!(decided(with(Rule::DifferentialEnthalpyAndDryBulb)).enabled);
        let supply =
            |t, percent| Supply { dry_bulb: celsius(t), coil_leaving: RelativeHumidity::from_percent(percent) };
        let of = |t| decided(Economizer { supply: supply(t, 95.0), ..with(Rule::LeastCoilEnergy) });
        let wet = of(11.0);
        assert!(wet.enabled && wet.margin_quantity == Quantity::CoilEnergy);
        // On the wet coil the condensate takes a little of the enthalpy with it.
        assert!((wet.margin / by_enthalpy.margin - 1.0).abs() < 0.05, "{wet:?} {by_enthalpy:?}");
        // At 13 °C only the return air is moist enough to condense: less is gained, but some.
        let between = of(13.0);
        assert!(between.enabled && between.margin < 0.6 * wet.margin, "{between:?}");
        let dry = of(18.0);
        assert_eq!((dry.enabled, dry.reason), (false, Reason::CoilEnergyHigh));
        assert!((dry.margin / -1_130.0 - 1.0).abs() < 0.02, "{dry:?}");
    }
}

/// Each rule at, below and above its limit.
#[test]
fn every_rule_by_its_limit() {
    let dry = |rule, t, expected| {
        let decision = first(&settings(rule), &air(t, 0.2), &air(24.0, 0.5));
        assert_eq!((decision.enabled, decision.reason), expected, "{rule:?} {t}");
        limits_in_place(&decision);
    };
    for (t, expected) in [
        (20.0, (true, Reason::Favorable)),
        (23.5, (false, Reason::WithinHysteresis)),
        (24.5, (false, Reason::DryBulbHigh)),
        (-0.5, (false, Reason::FreezeLockout)),
    ] {
        dry(Rule::FixedDryBulb, t, expected);
        dry(Rule::DifferentialDryBulb, t, expected);
        dry(Rule::FixedEnthalpyAndDryBulb, t, expected);
        dry(Rule::DifferentialEnthalpyAndDryBulb, t, expected);
        dry(Rule::DewPointAndDryBulb, t, expected);
    }
    let moist = |rule, rh, reason| {
        let decision = first(&settings(rule), &air(21.0, rh), &air(24.0, 0.5));
        assert_eq!((decision.enabled, decision.reason), (reason == Reason::Favorable, reason), "{rule:?} {rh}");
    };
    for rule in [
        Rule::FixedEnthalpy,
        Rule::DifferentialEnthalpy,
        Rule::FixedEnthalpyAndDryBulb,
        Rule::DifferentialEnthalpyAndDryBulb,
    ] {
        moist(rule, 0.5, Reason::Favorable);
        moist(rule, 0.9, Reason::EnthalpyHigh);
    }
    // 47.2 and 47.8 kJ/kg less half a kilojoule.
    moist(Rule::FixedEnthalpy, 0.65, Reason::WithinHysteresis);
    moist(Rule::FixedEnthalpyAndDryBulb, 0.65, Reason::WithinHysteresis);
    moist(Rule::DifferentialEnthalpy, 0.67, Reason::WithinHysteresis);
    moist(Rule::DifferentialEnthalpyAndDryBulb, 0.67, Reason::WithinHysteresis);
    moist(Rule::DewPointAndDryBulb, 0.5, Reason::Favorable);
    moist(Rule::DewPointAndDryBulb, 0.7, Reason::DewPointHigh);
    moist(Rule::LeastCoilEnergy, 0.5, Reason::Favorable);
    moist(Rule::LeastCoilEnergy, 0.9, Reason::CoilEnergyHigh);
    moist(Rule::DifferentialDryBulb, 0.9, Reason::Favorable);

    // Air without any vapor is below every dew point.
    let bone_dry = first(&settings(Rule::DewPointAndDryBulb), &air(20.0, 0.0), &air(24.0, 0.5));
    assert!(bone_dry.enabled && bone_dry.margin_quantity == Quantity::DryBulb);
}

/// A decision at both conditions is no surer than either, and takes the nearer margin.
#[test]
fn two_conditions() {
    let rule = settings(Rule::FixedEnthalpyAndDryBulb);
    let both = |t, rh| first(&rule, &air(t, rh), &air(24.0, 0.5));
    let one = |which, t, rh| first(&settings(which), &air(t, rh), &air(24.0, 0.5));
    let decision = both(23.2, 0.3);
    assert_eq!(decision.margin_quantity, Quantity::DryBulb);
    assert_eq!(decision.margin, one(Rule::FixedDryBulb, 23.2, 0.3).margin);
    let decision = both(19.0, 0.78);
    assert_eq!(decision.margin_quantity, Quantity::SpecificEnthalpy);
    let close = both(22.4, 0.53);
    let parts = [one(Rule::FixedDryBulb, 22.4, 0.53), one(Rule::FixedEnthalpy, 22.4, 0.53)];
    assert!(close.enabled, "{close:?}");
    assert!(parts.iter().all(|part| close.confidence <= part.confidence));
    assert!((close.confidence - (parts[0].confidence + parts[1].confidence - 1.0)).abs() < 1e-15);
}

/// 28 Btu/lb is 47.2 kJ/kg; away from sea level the limit is the enthalpy of 75 °F and 50 %.
#[test]
fn enthalpy_limits() {
    assert!((economizer::ENTHALPY_LIMIT - 47_244.0).abs() < 10.0);
    let ideal = |pressure| {
        let limit = economizer::enthalpy_limit(Basis::ideal_gas(pressure)).unwrap();
        // On the handbook's datum of 0 °F.
        (limit.joules_per_kilogram() + 17_884.4) / 2_326.0
    };
    let sea: f64 = ideal(Pressure::from_pascals(101_325.0));
    assert!((sea - 28.0).abs() < 0.2, "{sea}");
    let high: f64 = ideal(Pressure::at_elevation(Length::from_feet(6_000.0)).unwrap());
    println!("enthalpy limit: {sea:.2} Btu/lb at sea level, {high:.2} at 6000 ft");
    assert!((high - 30.7).abs() < 0.2, "{high}");
}

/// On until the limit, off until the hysteresis is passed.
#[test]
fn hysteresis() {
    let settings = Economizer { least_time_on: 0.0, least_time_off: 0.0, ..settings(Rule::DifferentialDryBulb) };
    let mut state = EconomizerState::default();
    let mut time = 0.0;
    let mut at = |t: f64| {
        time += 60.0;
        settings.decide(&mut state, time, &air(t, 0.3), &air(24.0, 0.5)).enabled
    };
    let warming = [22.0, 23.0, 23.5, 24.0].map(&mut at);
    assert_eq!(warming, [true; 4]);
    assert!(!at(24.0 + 1e-9));
    assert_eq!([24.0, 23.5, 23.0 + 1e-9].map(&mut at), [false; 3]);
    assert!(at(23.0));
    assert_eq!(state.switches(), 3);
}

/// A day of noisy readings, one a second: within the hysteresis no more switches than without noise; beyond it no more than the least
/// times allow.
#[test]
fn never_chatters() {
    let mut random = Random(3);
    for rule in Rule::ALL {
        for noise in [0.0, 0.2, 3.0] {
            let settings = settings(rule);
            let mut state = EconomizerState::default();
            let (mut since, mut last, mut shortest) = (0.0, false, f64::INFINITY);
            for second in 0..86_400_u32 {
                let hour = f64::from(second) / 3_600.0;
                let t = 21.0 - 6.0 * (core::f64::consts::TAU * (hour - 3.0) / 24.0).cos();
                let mut around = |value: f64| value + noise * random.between(-0.5, 0.5);
                let outdoor = air(around(t), (around(t) * 0.01 + 0.3).clamp(0.0, 1.0));
                let returned = air(around(24.0), 0.5);
                // One in so many seconds is decided: the time runs on.
                if !second.is_multiple_of(5) {
                    continue;
                }
                let time = f64::from(second);
                let decision = settings.decide(&mut state, time, &outdoor, &returned);
                assert_eq!(decision.enabled, state.is_on());
                if decision.enabled != last {
                    shortest = if state.switches() > 1 { shortest.min(time - since) } else { shortest };
                    (since, last) = (time, decision.enabled);
                }
            }
            println!("{rule}: noise ±{:.1} K, {} switches a day, shortest {shortest} s", noise / 2.0, state.switches());
            // On in the small hours of the first day, off in the warm ones, on again.
            assert!(if noise < 1.0 { state.switches() <= 3 } else { state.switches() <= 86_400 / 300 });
            assert!(state.switches() >= 1 && shortest >= 300.0);
        }
    }
}

/// Least times hold a decision; the start, a bad reading and frost do not wait.
#[test]
fn least_times() {
    let settings = Economizer { least_time_on: 600.0, least_time_off: 300.0, ..settings(Rule::DifferentialDryBulb) };
    let mut state = EconomizerState::default();
    let room = air(24.0, 0.5);
    let mut at = |time, t| {
        let decision = settings.decide(&mut state, time, &air(t, 0.3), &room);
        (decision.enabled, decision.reason)
    };
    assert_eq!(at(0.0, 20.0), (true, Reason::Favorable));
    assert_eq!(at(599.0, 26.0), (true, Reason::LeastTimeOn));
    assert_eq!(at(600.0, 26.0), (false, Reason::DryBulbHigh));
    assert_eq!(at(899.0, 20.0), (false, Reason::LeastTimeOff));
    // A clock that stands still, or goes backwards for a moment, ends no wait.
    assert_eq!(at(899.0, 20.0), (false, Reason::LeastTimeOff));
    assert_eq!(at(10.0, 20.0), (false, Reason::LeastTimeOff));
    assert_eq!(at(900.0, 20.0), (true, Reason::Favorable));
    assert_eq!(at(901.0, f64::NAN), (false, Reason::OutdoorDryBulbBad));
    assert_eq!(at(902.0, 20.0), (false, Reason::LeastTimeOff));
    assert_eq!(at(1_300.0, 20.0), (true, Reason::Favorable));
    assert_eq!(at(1_301.0, -1.0), (false, Reason::FreezeLockout));
    // The lockout is left a hysteresis above its limit.
    assert_eq!(at(1_700.0, 0.5), (false, Reason::FreezeLockout));
    assert_eq!(at(1_701.0, 1.0), (true, Reason::Favorable));
    // A clock set back for good: the waiting begins anew there.
    for time in [5.0, 6.0] {
        assert_eq!(at(time, 26.0), (true, Reason::LeastTimeOn));
    }
    assert_eq!(at(7.0, 26.0), (true, Reason::LeastTimeOn));
    assert_eq!(at(606.0, 26.0), (true, Reason::LeastTimeOn));
    assert_eq!(at(607.0, 26.0), (false, Reason::DryBulbHigh));
    for time in [f64::NAN, f64::INFINITY, 1e300] {
        assert_eq!(at(time, 10.0), (false, Reason::ClockInvalid));
    }
}

/// Which of the four readings a rule needs.
fn needs(rule: Rule) -> [bool; 4] {
    match rule {
        Rule::FixedDryBulb => [true, false, false, false],
        Rule::DifferentialDryBulb => [true, false, true, false],
        Rule::FixedEnthalpy | Rule::FixedEnthalpyAndDryBulb | Rule::DewPointAndDryBulb => [true, true, false, false],
        _ => [true; 4],
    }
}

/// Takes reading `slot` out of outdoor and return air.
fn reading(airs: &mut [MeasuredAir; 2], slot: usize) -> &mut Reading {
    let air = &mut airs[slot / 2];
    if slot.is_multiple_of(2) { &mut air.dry_bulb } else { &mut air.humidity }
}

/// A way to spoil a reading.
type Spoil = (&'static str, fn(&mut Reading));

/// Whatever is wrong with any one reading that a rule needs: least outdoor air, at once, with the reason; what it does not need
/// does not matter.
#[test]
fn a_bad_reading_is_safe() {
    const REASONS: [Reason; 4] =
        [Reason::OutdoorDryBulbBad, Reason::OutdoorHumidityBad, Reason::ReturnDryBulbBad, Reason::ReturnHumidityBad];
    let wrong: [Spoil; 8] = [
        ("missing", |r| r.value = f64::NAN),
        ("infinite", |r| r.value = f64::NEG_INFINITY),
        ("low", |r| r.value = -999.0),
        ("high", |r| r.value = 850.0),
        ("refused", |r| r.quality = Quality::Refused),
        ("uncertainty missing", |r| r.standard_uncertainty = f64::NAN),
        ("uncertainty negative", |r| r.standard_uncertainty = -0.1),
        ("uncertainty without bound", |r| r.standard_uncertainty = f64::INFINITY),
    ];
    let mut tried = 0;
    for rule in Rule::ALL {
        for (slot, blamed) in REASONS.into_iter().enumerate() {
            for (name, spoil) in wrong {
                let settings = settings(rule);
                let mut airs = [air(15.0, 0.5), air(24.0, 0.5)];
                let mut state = EconomizerState::default();
                assert!(settings.decide(&mut state, 0.0, &airs[0], &airs[1]).enabled);
                spoil(reading(&mut airs, slot));
                let decision = settings.decide(&mut state, 1.0, &airs[0], &airs[1]);
                limits_in_place(&decision);
                assert_eq!(decision.enabled, !needs(rule)[slot], "{rule:?} {slot} {name}");
                if needs(rule)[slot] {
                    assert_eq!(decision.reason, blamed, "{rule:?} {slot} {name}");
                    assert_eq!((decision.confidence, decision.quality), (0.0, Quality::Refused));
                }
                // By dry bulb, if that is what is wanted and only the humidity is wrong.
                let settings = Economizer { fallback: Fallback::DryBulb, ..settings };
                let decision = settings.decide(&mut state, 1_000.0, &airs[0], &airs[1]);
                let fallback = needs(rule)[slot] && !slot.is_multiple_of(2);
                assert_eq!(decision.fallback, fallback, "{rule:?} {slot} {name}");
                assert_eq!(decision.enabled, !needs(rule)[slot] || fallback, "{rule:?} {slot} {name} {decision:?}");
                if fallback {
                    assert_eq!((decision.margin_quantity, decision.quality), (Quantity::DryBulb, Quality::Repaired));
                }
                tried += 1;
            }
        }
    }
    println!("bad readings: {tried} tried");
}

#[test]
fn settings_that_make_no_sense_are_safe() {
    let good = settings(Rule::LeastCoilEnergy);
    let nan = f64::NAN;
    let wrong = [
        Economizer { basis: Pressure::from_kilopascals(1.0).into(), ..good },
        Economizer { dry_bulb_limit: celsius(nan), ..good },
        Economizer { enthalpy_limit: joules(1e9), ..good },
        Economizer { dew_point_limit: DewPoint::from_celsius(nan), ..good },
        Economizer { supply: Supply { dry_bulb: celsius(nan), ..good.supply }, ..good },
        Economizer { supply: Supply { coil_leaving: RelativeHumidity::from_fraction(1.2), ..good.supply }, ..good },
        Economizer { temperature_hysteresis: TemperatureDifference::from_kelvins(-1.0), ..good },
        Economizer { enthalpy_hysteresis: joules(nan), ..good },
        Economizer { least_time_on: -1.0, ..good },
        Economizer { least_time_off: nan, ..good },
        Economizer { freeze_limit: celsius(300.0), ..good },
    ];
    assert!(good.check().is_ok());
    for settings in wrong {
        assert!(settings.check().is_err(), "{settings:?}");
        let decision = first(&settings, &air(15.0, 0.5), &air(24.0, 0.5));
        assert_eq!((decision.enabled, decision.reason), (false, Reason::SettingsInvalid));
    }
}

/// The margin falls as outdoor air gets warmer or moister and rises with the return air; on every formulation and rule. The
/// confidence of being on rises with it.
#[test]
fn margins_are_monotone() {
    for &formulation in Formulation::ALL {
        for rule in Rule::ALL {
            let settings = Economizer { freeze_limit: celsius(-60.0), ..Economizer::new(rule, sea_level(formulation)) };
            let of = |outdoor: (f64, f64), returned: (f64, f64)| {
                let measured = |(t, w): (f64, f64)| MeasuredAir {
                    dry_bulb: Reading::new(t, 0.3),
                    humidity: Reading::new(w, 3e-4),
                    humidity_quantity: Quantity::HumidityRatio,
                };
                first(&settings, &measured(outdoor), &measured(returned))
            };
            let falls = |series: Vec<Decision>| {
                for pair in series.windows(2) {
                    if pair[0].margin_quantity == pair[1].margin_quantity {
                        assert!(pair[1].margin <= pair[0].margin + 1e-6, "{rule:?} {pair:?}");
                    }
                }
            };
            falls((0..80).map(|i| of((10.0 + 0.25 * f64::from(i), 0.007), (24.0, 0.009))).collect());
            falls((0..80).map(|i| of((22.0, 2e-4 * f64::from(i)), (24.0, 0.009))).collect());
            falls((0..80).map(|i| of((22.0, 0.009), (40.0 - 0.25 * f64::from(i), 0.009))).collect());
            let on =
                |decision: &Decision| if decision.enabled { decision.confidence } else { 1.0 - decision.confidence };
            let series: Vec<_> = (0..80).map(|i| of((10.0 + 0.25 * f64::from(i), 0.007), (24.0, 0.009))).collect();
            // The dry bulb alone falls; the least probability of two conditions steps where the decision turns.
            if !matches!(
                rule,
                Rule::FixedEnthalpyAndDryBulb | Rule::DifferentialEnthalpyAndDryBulb | Rule::DewPointAndDryBulb
            ) {
                for pair in series.windows(2) {
                    assert!(on(&pair[1]) <= on(&pair[0]) + 1e-12, "{rule:?} {pair:?}");
                }
            }
        }
    }
}

/// Uncertainty and confidence against a hundred thousand samples: u within 2 %, the probability within 0.005 (a standard error of 0.0016).
#[test]
fn uncertainty_against_samples() {
    let mut random = Random(9);
    let wet = Supply { dry_bulb: celsius(12.0), coil_leaving: RelativeHumidity::from_percent(95.0) };
    let dry = Supply { dry_bulb: celsius(18.0), ..wet };
    let cases = [
        (Rule::FixedDryBulb, wet, (23.6, 0.5)),
        (Rule::DifferentialDryBulb, wet, (23.6, 0.5)),
        (Rule::FixedEnthalpy, wet, (22.0, 0.57)),
        (Rule::DifferentialEnthalpy, wet, (22.0, 0.60)),
        (Rule::DewPointAndDryBulb, wet, (19.0, 0.64)),
        (Rule::LeastCoilEnergy, wet, (22.0, 0.60)),
        (Rule::LeastCoilEnergy, dry, (23.6, 0.50)),
    ];
    for (rule, supply, outdoor) in cases {
        let settings = Economizer { supply, ..Economizer::new(rule, sea_level(Formulation::IdealGas)) };
        let returned = (24.0, 0.50);
        let (u_t, u_rh) = (0.3, 0.01);
        let mut decided = |scatter: bool| {
            let mut around = |value, u| if scatter { value + u * normal(&mut random) } else { value };
            let mut air = |(t, rh)| {
                MeasuredAir::from_relative_humidity(
                    Reading::new(around(t, u_t), u_t),
                    Reading::new(around(rh, u_rh), u_rh),
                )
            };
            let (outdoor, returned) = (air(outdoor), air(returned));
            first(&settings, &outdoor, &returned)
        };
        let center = decided(false);
        let samples: Vec<f64> = (0..100_000).map(|_| decided(true).margin).collect();
        let off = center.margin_uncertainty / spread(&samples).1 - 1.0;
        let positive = samples.iter().filter(|margin| **margin > 0.0).count() as f64 / samples.len() as f64;
        let stated = if center.enabled { center.confidence } else { 1.0 - center.confidence };
        println!(
            "{rule}: u {:.1} {}, {:.2} % off; probability {stated:.4}, of samples {positive:.4}",
            center.margin_uncertainty,
            center.margin_quantity.unit(),
            100.0 * off
        );
        assert!(off.abs() < 0.02 && (stated - positive).abs() < 0.005);
    }
}

/// How much outdoor air: the least when off; when on what mixes to the wanted temperature, or all that there is.
#[test]
fn outdoor_air_of_a_decision() {
    let site = sea_level(Formulation::RealGas);
    let room = at(24.0, 0.5, site);
    let limits = FractionLimits { least: 0.2, most: 0.9 };
    let of = |rule, t: f64, rh, wanted| {
        let decision = first(&settings(rule), &air(t, rh), &air(24.0, 0.5));
        let blend = decision.outdoor_air(&at(t, rh, site), &room, celsius(wanted), limits).unwrap();
        (decision.enabled, blend.fraction, blend.reach)
    };
    assert_eq!(of(Rule::DifferentialDryBulb, 30.0, 0.4, 14.0), (false, 0.2, Reach::AtLeast));
    let (enabled, fraction, reach) = of(Rule::DifferentialDryBulb, 5.0, 0.7, 14.0);
    assert!(enabled && (fraction - 0.52).abs() < 0.01 && reach == Reach::Reached);
    assert_eq!(of(Rule::DifferentialDryBulb, 20.0, 0.5, 14.0), (true, 0.9, Reach::AtMost));
    // Warmer and much drier outdoor air, which a wet coil has less work with: all of it.
    assert_eq!(of(Rule::DifferentialEnthalpy, 26.0, 0.2, 14.0), (true, 0.9, Reach::AtMost));
    // Both colder than wanted: the warmer one.
    assert_eq!(of(Rule::DifferentialDryBulb, 10.0, 0.5, 26.0), (true, 0.2, Reach::AtLeast));
}

/// What the coil takes out: continuous and rising through dry and wet, never negative, that of the coil to the same state.
#[test]
fn coil_loads() {
    let cases = (bases(), dry_bulbs(), fractions(), 5.0..20.0_f64, 0.8..=1.0_f64);
    check(cases, |(basis, t, share, t_supply, off)| {
        let entering = air_at(t, share, basis);
        let supply = Supply { dry_bulb: celsius(t_supply), coil_leaving: RelativeHumidity::from_fraction(off) };
        let load = coil_load(&entering, supply).unwrap();
        let heat = load.heat.joules_per_kilogram();
        prop_assert!(heat >= 0.0);
        let (_, w, _) = numbers(&entering);
        let off_coil = MoistAir::from_dry_bulb(celsius(t_supply), supply.coil_leaving, basis).unwrap();
        let leaving = MoistAir::restore(celsius(t_supply), ratio(w.min(numbers(&off_coil).1)), basis).unwrap();
        if t > t_supply {
            use moistair_core::process::coil::{CondensateTemperature, to_state};
            let coil = to_state(&stream(entering, 1.0), &leaving, CondensateTemperature::LeavingAir).unwrap();
            prop_assert_eq!(coil.cooling_load.watts(), heat);
            prop_assert_eq!(coil.condensate.kilograms_per_second() > 0.0, load.wet);
        }
        let warmer = MoistAir::restore(celsius((t + 0.01).min(150.0)), ratio(w), basis).unwrap();
        let more = coil_load(&warmer, supply).unwrap().heat.joules_per_kilogram();
        prop_assert!(more >= heat - 1e-6, "{heat} {more}");
        Ok(())
    });
}

/// In single precision the same decisions and nearly the same margins.
#[test]
fn single_precision() {
    for rule in Rule::ALL {
        let double = settings(rule);
        let single = Economizer::<f32>::new(rule, Pressure::from_pascals(101_325.0_f32));
        for i in 0..200 {
            let (t, rh) = (5.0 + 0.125 * f64::from(i), 0.2 + 0.003 * f64::from(i));
            let wide = first(&double, &air(t, rh), &air(24.0, 0.5));
            let narrow_air = |t: f32, rh: f32| {
                MeasuredAir::from_relative_humidity(Reading::within(t, 0.5), Reading::within(rh, 0.03))
            };
            let mut state = EconomizerState::default();
            let narrow = single.decide(&mut state, 0.0, &narrow_air(t as f32, rh as f32), &narrow_air(24.0, 0.5));
            let (enthalpy, slack) = match wide.margin_quantity {
                Quantity::SpecificEnthalpy | Quantity::CoilEnergy => (1_000.0, 0.2),
                _ => (1.0, 1e-4),
            };
            let off = (f64::from(narrow.margin) - wide.margin).abs();
            assert!(off <= slack, "{rule:?} {t} {rh}: {narrow:?} {wide:?}");
            assert!((f64::from(narrow.confidence) - wide.confidence).abs() < 1e-3, "{narrow:?} {wide:?}");
            // Within rounding of a limit they may differ.
            let at_limit = wide.margin.abs() < slack || (wide.margin - enthalpy).abs() < slack;
            assert!(narrow.enabled == wide.enabled || at_limit, "{rule:?} {t} {rh}");
        }
    }
}
