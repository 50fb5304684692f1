//! What holds for every feasible case: books, identity, symmetry, order.

use crate::support::*;
use moistair_core::process::coil::{self, CoilRegime, CondensateTemperature};
use moistair_core::process::humidify::{self, EvaporatingWater};
use moistair_core::process::tower::{self, TowerWater, WaterTreatment};
use moistair_core::process::{AirStream, Exchange, WetStream, books, mixing, reheat, sensible};
use moistair_core::*;
use proptest::prelude::*;

/// A case that the process refuses does not count.
macro_rules! feasible {
    ($result:expr) => {
        match $result {
            Ok(value) => value,
            Err(error) => return Err(TestCaseError::reject(error.to_string())),
        }
    };
}

fn drains() -> impl Strategy<Value = CondensateTemperature> {
    prop_oneof![
        Just(CondensateTemperature::LeavingAir),
        Just(CondensateTemperature::Apparatus),
        (0.0..30.0).prop_map(|t| CondensateTemperature::Given(celsius(t)))
    ]
}

/// Steam from wet to superheated.
fn steams() -> impl Strategy<Value = f64> {
    prop_oneof![1.0e6..2.6e6, 2.55e6..3.6e6]
}

const TREATMENT: WaterTreatment = WaterTreatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 };

#[test]
fn heating_and_cooling() {
    check((streams(), dry_bulbs(), -5e4..5e4_f64), |(entering, t, per_air)| {
        let kept = entering.air().humidity_ratio();
        if let Ok(done) = sensible::to_temperature(&entering, celsius(t)) {
            holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
            prop_assert_eq!(done.leaving.air().humidity_ratio(), kept);
            prop_assert_eq!(done.leaving.air().dry_bulb().celsius(), t);
        }
        let heat = HeatFlow::from_watts(per_air * entering.dry_air_flow().kilograms_per_second());
        let done = feasible!(sensible::with_heat(&entering, heat));
        holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
        prop_assert_eq!(done.leaving.air().humidity_ratio(), kept);
        prop_assert_eq!(done.exchange.heat, heat);
        // There and back: every formulation to the resolution of the absolute temperature.
        let back = sensible::with_heat(&done.leaving, -heat)
            .or_else(|_| sensible::to_temperature(&done.leaving, entering.air().dry_bulb()));
        let (t0, t1) = (entering.air().dry_bulb().celsius(), back.unwrap().leaving.air().dry_bulb().celsius());
        prop_assert!((t0 - t1).abs() < 3e-12, "{t0} {t1}");
        Ok(())
    });
}

#[test]
fn no_heat_changes_nothing() {
    check(streams(), |entering| {
        let done = sensible::with_heat(&entering, HeatFlow::from_watts(0.0)).unwrap();
        prop_assert!(same_bits(&done.leaving.air(), &entering.air()));
        let stay = sensible::to_temperature(&entering, entering.air().dry_bulb()).unwrap();
        prop_assert!(same_bits(&stay.leaving.air(), &entering.air()) && stay.exchange.heat.watts() == 0.0);
        // A little heat never cools, also from saturation.
        let little = sensible::with_heat(&entering, HeatFlow::from_watts(1e-15));
        let (_, warmest) = entering.air().formulation().limits(Quantity::DryBulb);
        if entering.air().dry_bulb().celsius() < warmest {
            prop_assert!(little.unwrap().leaving.air().dry_bulb() >= entering.air().dry_bulb());
        }
        Ok(())
    });
}

#[test]
fn coil_by_bypass_factor() {
    check((streams(), -40.0..60.0_f64, fractions(), drains()), |(entering, apparatus, bypass, drain)| {
        let done = feasible!(coil::by_bypass_factor(&entering, celsius(apparatus), bypass, drain));
        holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
        let (before, after) = (numbers(&entering.air()), numbers(&done.leaving.air()));
        prop_assert!(after.1 <= before.1, "a coil never humidifies");
        prop_assert!(done.condensate.kilograms_per_second() >= 0.0);
        prop_assert!((done.regime == CoilRegime::Dry) == (done.condensate.kilograms_per_second() == 0.0));
        prop_assert!(after.0 <= before.0 + 1e-11 && after.0 >= apparatus - 1e-11, "{apparatus} {before:?} {after:?}");
        if bypass == 1.0 {
            prop_assert!(same_bits(&done.leaving.air(), &entering.air()));
        }
        if bypass == 0.0 {
            prop_assert!((after.0 - apparatus).abs() < 1e-10, "{after:?}");
        }
        let parts = done.sensible.watts() + done.latent.watts();
        let load = done.cooling_load.watts();
        prop_assert!((parts - load).abs() <= 1e-14 * (done.sensible.watts().abs() + done.latent.watts().abs()));
        Ok(())
    });
}

#[test]
fn coil_between_states() {
    check((streams(), -60.0..60.0_f64, fractions(), drains(), 0.0..2e-4_f64), |(entering, t, share, drain, band)| {
        let (_, before, _) = numbers(&entering.air());
        let leaving = air_at(t, share, entering.air().basis());
        if let Ok(done) = coil::to_state(&entering, &leaving, drain) {
            holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
            prop_assert!(same_bits(&done.leaving.air(), &leaving));
        }
        let done = feasible!(coil::between(&entering, &leaving, drain, ratio(band)));
        holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
        prop_assert!(done.condensate.kilograms_per_second() >= 0.0);
        // Noise within the dead band condenses nothing, unless the air leaves at saturation.
        let (_, after, _) = numbers(&leaving);
        if (before - after).abs() <= band && done.condensate.kilograms_per_second() > 0.0 {
            let saturated =
                done.leaving.air().relative_humidity_over_liquid().map_or(1.0, |humidity| humidity.fraction());
            prop_assert!(saturated > 0.999_999, "{saturated}");
        }
        Ok(())
    });
}

#[test]
fn cooling_with_reheat() {
    check((streams(), 0.0..40.0_f64, 0.05..1.0_f64, 0.2..=1.0_f64, drains()), |(entering, t, share, off, drain)| {
        let target = air_at(t, share, entering.air().basis());
        let done = feasible!(reheat::to_state(&entering, &target, RelativeHumidity::from_fraction(off), drain));
        let middle = done.cooling.leaving;
        holds(&[entering.into()], &middle.into(), &done.cooling.exchange)?;
        holds(&[middle.into()], &done.heating.leaving.into(), &done.heating.exchange)?;
        prop_assert!(same_bits(&done.heating.leaving.air(), &target));
        prop_assert!(done.reheat().watts() >= 0.0);
        let reached = middle.air().relative_humidity().unwrap().fraction();
        prop_assert!((reached - off).abs() < 1e-9 || done.reheat().watts() == 0.0, "{reached} {off}");
        Ok(())
    });
}

/// Two to four streams of one formulation and pressure, with whatever they carry.
fn to_mix() -> impl Strategy<Value = Vec<WetStream>> {
    bases().prop_flat_map(|basis| {
        prop::collection::vec(
            (wet_airs_on(basis), flows()).prop_map(|(air, m)| WetStream::new(air, flow(m)).unwrap()),
            2..5,
        )
    })
}

fn water(wet: &AirWithCondensate) -> f64 {
    wet.total_water().kilograms_per_kilogram()
}

/// The same state as far as rounding of enthalpy and water lets it be known: in temperature, and in all water.
fn alike(a: &AirWithCondensate, b: &AirWithCondensate) -> Result<(), TestCaseError> {
    let (t, u) = (a.air().dry_bulb().celsius(), b.air().dry_bulb().celsius());
    prop_assert!((t - u).abs() < 1e-10, "{a:?}\n{b:?}");
    prop_assert!((water(a) - water(b)).abs() <= 1e-14 * water(a), "{a:?}\n{b:?}");
    let ice = (a.ice().kilograms_per_kilogram() - b.ice().kilograms_per_kilogram()).abs();
    prop_assert!(ice <= 1e-12 * (1.0 + 10.0 * water(a)), "{a:?}\n{b:?}");
    Ok(())
}

#[test]
fn mixing_of_streams() {
    check(to_mix(), |streams| {
        let mixed = feasible!(mixing::adiabatic(&streams));
        holds(&streams, &mixed.leaving, &mixed.exchange)?;
        let over = |f: &dyn Fn(&WetStream) -> f64| {
            streams.iter().map(f).fold((f64::INFINITY, f64::NEG_INFINITY), |(a, b), x| (a.min(x), b.max(x)))
        };
        let enthalpy = |stream: &WetStream| stream.air().specific_enthalpy().joules_per_kilogram();
        let (least, most) = over(&enthalpy);
        let inside = least - 1e-9 * most.abs().max(1e4)..=most + 1e-9 * most.abs().max(1e4);
        prop_assert!(inside.contains(&enthalpy(&mixed.leaving)), "enthalpy outside the hull");
        let (least, most) = over(&|stream: &WetStream| water(&stream.air()));
        prop_assert!(
            ((1.0 - 1e-14) * least..=(1.0 + 1e-14) * most).contains(&water(&mixed.leaving.air())),
            "water outside the hull"
        );
        // Order, grouping, scale, idle streams, split streams.
        let reversed: Vec<_> = streams.iter().rev().copied().collect();
        alike(&mixing::adiabatic(&reversed).unwrap().leaving.air(), &mixed.leaving.air())?;
        let scaled: Vec<_> = streams
            .iter()
            .map(|s| WetStream::new(s.air(), flow(s.dry_air_flow().kilograms_per_second() * 4.0)).unwrap())
            .collect();
        prop_assert_eq!(
            mixing::adiabatic(&scaled).unwrap().leaving.air(),
            mixed.leaving.air(),
            "scale, bit for bit by a power of two"
        );
        let mut idle = streams.clone();
        idle.insert(1, WetStream::new(streams[0].air(), flow(0.0)).unwrap());
        prop_assert_eq!(mixing::adiabatic(&idle).unwrap().leaving, mixed.leaving, "a stream without flow");
        let halves: Vec<_> = streams
            .iter()
            .flat_map(|s| {
                [0.3, 0.7]
                    .map(|part| WetStream::new(s.air(), flow(s.dry_air_flow().kilograms_per_second() * part)).unwrap())
            })
            .collect();
        alike(&mixing::adiabatic(&halves).unwrap().leaving.air(), &mixed.leaving.air())?;
        if let Ok(first) = mixing::adiabatic(&streams[..2]) {
            let grouped: Vec<_> = core::iter::once(first.leaving).chain(streams[2..].iter().copied()).collect();
            alike(&mixing::adiabatic(&grouped).unwrap().leaving.air(), &mixed.leaving.air())?;
        }
        Ok(())
    });
}

#[test]
fn copies_mix_to_themselves() {
    check((bases().prop_flat_map(wet_airs_on), 2..6_usize), |(air, copies)| {
        let one = WetStream::new(air, flow(1.7)).unwrap();
        prop_assert_eq!(mixing::adiabatic(&[one]).unwrap().leaving, one, "alone, bit for bit");
        alike(&mixing::adiabatic(&vec![one; copies]).unwrap().leaving.air(), &air)
    });
}

/// Equilibrium of what is in equilibrium, with and without freezing.
#[test]
fn equilibrium_is_kept() {
    let cases = (bases(), dry_bulbs(), fractions(), prop_oneof![Just(0.0), 0.0..0.05, 0.0..9.0], prop::bool::ANY);
    check(cases, |(basis, t, share, surplus, freezes)| {
        let freezing = if freezes { Freezing::Equilibrium } else { Freezing::Supercooled };
        let (_, w, h) = numbers(&air_at(t, share, basis));
        let total = (w + surplus).min(10.0);
        let made = AirWithCondensate::from_enthalpy_and_water(joules(h), ratio(total), freezing, basis);
        let made = feasible!(made);
        sound(&WetStream::new(made, flow(1.0)).unwrap())?;
        let again =
            AirWithCondensate::from_enthalpy_and_water(made.specific_enthalpy(), made.total_water(), freezing, basis);
        alike(&again.unwrap(), &made)?;
        let wanted = h.abs() + total * 3e6 + made.air().dry_bulb().kelvins() * 5e3;
        prop_assert!((made.specific_enthalpy().joules_per_kilogram() - h).abs() <= 1e-14 * wanted, "{made:?} {h}");
        prop_assert!((water(&made) - total).abs() <= 4.0 * f64::EPSILON * total);
        prop_assert!(freezes || made.ice().kilograms_per_kilogram() == 0.0);
        if made.is_wet() && surplus > 1e-9 {
            let ws = air_at(made.air().dry_bulb().celsius(), 1.0, basis).humidity_ratio().kilograms_per_kilogram();
            let saturation = made.air().humidity_ratio().kilograms_per_kilogram() / ws;
            prop_assert!(!freezes || (saturation - 1.0).abs() < 1e-8, "{saturation}");
        }
        Ok(())
    });
}

/// Cooling through the three phases: temperature and ice have no step, whatever the water.
#[test]
fn three_phases_join() {
    check((bases(), 1e-4..0.05_f64, -1.0..1.0_f64), |(basis, surplus, near)| {
        let melted = at(0.01, 1.0, basis);
        let (_, w, h) = numbers(&melted);
        let make = |enthalpy: f64| {
            AirWithCondensate::from_enthalpy_and_water(
                joules(enthalpy),
                ratio(w + surplus),
                Freezing::Equilibrium,
                basis,
            )
            .unwrap()
        };
        let frozen = h - 333.4e3 * surplus;
        for end in [h, frozen, h - 333.4e3 * surplus * near.abs()] {
            let step = 10.0 * near;
            let (a, b) = (make(end + 900.0 * near), make(end + 900.0 * near + step));
            let gap = b.air().dry_bulb().celsius() - a.air().dry_bulb().celsius();
            prop_assert!(gap * step >= 0.0 && gap.abs() <= step.abs() / 1000.0, "{gap} K over {step} J/kg");
            let ice = a.ice().kilograms_per_kilogram() - b.ice().kilograms_per_kilogram();
            prop_assert!(ice.abs() <= step.abs() / 300e3, "{ice} over {step} J/kg");
        }
        Ok(())
    });
}

#[test]
fn steam_and_spray() {
    check((streams(), 0.0..0.05_f64, steams(), 0.0..200.0_f64), |(entering, per_air, enthalpy, t)| {
        let m = flow(per_air * entering.dry_air_flow().kilograms_per_second());
        let sprayed = humidify::spray(&entering, m, celsius(t));
        let steamed = humidify::steam(&entering, m, joules(enthalpy));
        for done in [&sprayed, &steamed].into_iter().flatten() {
            holds(&[entering.into()], &done.leaving, &done.exchange)?;
            let split = done.evaporated.kilograms_per_second() + done.carried.kilograms_per_second();
            prop_assert!((split - m.kilograms_per_second()).abs() <= 1e-15 * split.abs());
            prop_assert!(done.carried.kilograms_per_second() >= 0.0);
        }
        let _ = feasible!(steamed);
        let none = humidify::steam(&entering, flow(0.0), joules(enthalpy)).unwrap();
        prop_assert!(same_bits(&none.leaving.air().air(), &entering.air()) && !none.leaving.air().is_wet());
        prop_assert_eq!(none.exchange, Exchange::none());
        Ok(())
    });
}

#[test]
fn steam_to_a_target() {
    check((streams(), 0.0..1.0_f64, steams(), 0.0..0.02_f64), |(entering, humidity, enthalpy, more)| {
        let (_, w, _) = numbers(&entering.air());
        if let Ok(done) = humidify::steam_to_humidity_ratio(&entering, ratio(w + more), joules(enthalpy)) {
            holds(&[entering.into()], &done.leaving, &done.exchange)?;
            let reached = water(&done.leaving.air());
            prop_assert!((reached - (w + more)).abs() <= 4.0 * f64::EPSILON * reached);
        }
        let target = RelativeHumidity::from_fraction(humidity);
        let done = feasible!(humidify::steam_to_relative_humidity(&entering, target, joules(enthalpy)));
        holds(&[entering.into()], &done.leaving, &done.exchange)?;
        let reached = done.leaving.air().air().relative_humidity().unwrap().fraction();
        prop_assert!((reached - humidity).abs() < 1e-10, "{reached} {humidity}");
        Ok(())
    });
}

/// At the limit the air saturates, a little below it does not, and a little beyond there is fog.
#[test]
fn limit_of_steam() {
    check((streams(), steams()), |(entering, enthalpy)| {
        let limit = feasible!(humidify::steam_limit(&entering, joules(enthalpy)));
        let Some(most) = limit.first_saturation() else {
            // Never fog, also between the points that the search tries.
            for step in 0..60 {
                let per_air = 1e-4 * 1.15_f64.powi(step);
                let m = flow(per_air * entering.dry_air_flow().kilograms_per_second());
                if let Ok(done) = humidify::steam(&entering, m, joules(enthalpy)) {
                    prop_assert!(!done.leaving.air().is_wet(), "{per_air} of {enthalpy} to {entering:?}");
                }
            }
            return Ok(());
        };
        let most = most.kilograms_per_second();
        if entering.air().relative_humidity().is_ok_and(|humidity| humidity.fraction() >= 1.0) {
            prop_assert_eq!(most, 0.0, "saturated already");
            return Ok(());
        }
        let done = feasible!(humidify::steam(&entering, flow(most), joules(enthalpy)));
        let humidity = done.leaving.air().air().relative_humidity().unwrap().fraction();
        prop_assert!((humidity - 1.0).abs() < 1e-10, "{humidity}");
        let less = humidify::steam(&entering, flow(most * 0.999), joules(enthalpy)).unwrap();
        prop_assert!(!less.leaving.air().is_wet());
        Ok(())
    });
}

#[test]
fn wetted_media() {
    let water =
        prop_oneof![Just(EvaporatingWater::AtWetBulb), (0.0..60.0).prop_map(|t| EvaporatingWater::Given(celsius(t)))];
    check((streams(), fractions(), water), |(entering, effectiveness, water)| {
        let done = feasible!(humidify::evaporative(&entering, effectiveness, water));
        holds(&[entering.into()], &done.leaving, &done.exchange)?;
        let air = entering.air();
        let (wet_bulb, t) = (air.wet_bulb().unwrap().celsius(), air.dry_bulb().celsius());
        let wanted = t - effectiveness * (t - wet_bulb);
        let reached = done.leaving.air().air().dry_bulb().celsius();
        prop_assert!((reached - wanted).abs() < 1e-6, "{reached} {wanted}");
        if effectiveness == 0.0 {
            prop_assert!(same_bits(&done.leaving.air().air(), &air));
        }
        if matches!(water, EvaporatingWater::AtWetBulb) {
            // The wet bulb stays.
            let after = done.leaving.air().air().wet_bulb().unwrap().celsius();
            prop_assert!((after - wet_bulb).abs() < 1e-9, "{after} {wet_bulb}");
        }
        Ok(())
    });
}

/// Saturated air takes up nothing.
#[test]
fn saturated_air_takes_nothing() {
    check((bases(), 1.0..60.0_f64, steams()), |(basis, t, enthalpy)| {
        let air = feasible!(MoistAir::from_dry_bulb(celsius(t), RelativeHumidity::from_fraction(1.0), basis));
        let entering = stream(air, 2.0);
        let done = feasible!(humidify::evaporative(&entering, 0.9, EvaporatingWater::AtWetBulb));
        prop_assert!(done.evaporated.kilograms_per_second().abs() < 1e-11, "{done:?}");
        let limit = humidify::steam_limit(&entering, joules(enthalpy)).unwrap();
        prop_assert_eq!(limit.first_saturation(), Some(flow(0.0)));
        Ok(())
    });
}

fn tower_water() -> impl Strategy<Value = TowerWater> {
    (0.1..20.0_f64, 5.0..60.0_f64, 0.0..30.0_f64).prop_map(|(m, cold, range)| TowerWater {
        flow: flow(m),
        hot: celsius(cold + range),
        cold: celsius(cold),
    })
}

#[test]
fn towers() {
    check((streams(), tower_water(), dry_bulbs(), fractions()), |(entering, water, t, share)| {
        let leaving = air_at(t, share, entering.air().basis());
        if let Ok(done) = tower::with_leaving_air(&entering.air(), &leaving, water, TREATMENT) {
            let entering = AirStream::new(entering.air(), done.leaving.dry_air_flow()).unwrap();
            holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
        }
        let done = feasible!(tower::with_air_flow(&entering, water, TREATMENT));
        holds(&[entering.into()], &done.leaving.into(), &done.exchange)?;
        let used = done.water;
        let sum = used.evaporation + used.drift + used.blowdown;
        prop_assert!((sum.kilograms_per_second() / used.make_up.kilograms_per_second() - 1.0).abs() < 1e-15);
        prop_assert!(done.heat_rejected.watts() >= 0.0 && used.evaporation.kilograms_per_second() >= 0.0);
        prop_assert!(done.leaving.air().dry_bulb() <= water.hot);
        Ok(())
    });
}

/// A book that is wrong by 1e-9 of the heat or of the water does not close: the allowance is not too generous.
#[test]
fn wrong_books_do_not_close() {
    check((streams(), 1e-4..0.02_f64, steams()), |(entering, per_air, enthalpy)| {
        let m = per_air * entering.dry_air_flow().kilograms_per_second();
        let done = feasible!(humidify::steam(&entering, flow(m), joules(enthalpy)));
        let right = done.exchange;
        let scale = |x: f64| x * (1.0 + 1e-9);
        let heat =
            Exchange { water_enthalpy_flow: HeatFlow::from_watts(scale(right.water_enthalpy_flow.watts())), ..right };
        let water = Exchange { water: flow(scale(m)), ..right };
        let closes = |exchange| books::balance(&[entering.into()], &done.leaving, &exchange).close();
        prop_assert!(closes(right) && !closes(heat) && !closes(water));
        Ok(())
    });
}

/// Intensive results do not change with the flow, by a power of two bit for bit.
#[test]
fn scale_of_flow() {
    check((airs(), steams(), 0.0..0.01_f64, -2e4..2e4_f64), |(air, enthalpy, per_air, heat)| {
        for scale in [0.25, 64.0] {
            let (one, many) = (stream(air, 1.0), stream(air, scale));
            let steam = |entering: &AirStream, m: f64| {
                humidify::steam(entering, flow(m), joules(enthalpy)).map(|done| done.leaving.air())
            };
            prop_assert_eq!(steam(&one, per_air).ok(), steam(&many, per_air * scale).ok());
            let warm = |entering: &AirStream, q: f64| {
                sensible::with_heat(entering, HeatFlow::from_watts(q)).map(|done| done.leaving.air())
            };
            prop_assert_eq!(warm(&one, heat).ok(), warm(&many, heat * scale).ok());
        }
        Ok(())
    });
}

/// More of the cause, more of the effect.
#[test]
fn monotone() {
    check((bases(), -10.0..50.0_f64, 0.0..1.0_f64, 0.01..0.9_f64, 1.01..1.3_f64), |(basis, t, share, x, more)| {
        let entering = stream(air_at(t, share, basis), 1.0);
        let warmed = |q: f64| {
            sensible::with_heat(&entering, HeatFlow::from_watts(q)).map(|done| done.leaving.air().dry_bulb().celsius())
        };
        if let (Ok(a), Ok(b)) = (warmed(1e4 * x), warmed(1e4 * x * more)) {
            prop_assert!(a < b);
        }
        let cooled = |bypass: f64| {
            coil::by_bypass_factor(&entering, celsius(t - 10.0), bypass, CondensateTemperature::LeavingAir)
        };
        if let (Ok(a), Ok(b)) = (cooled(x / more), cooled(x)) {
            prop_assert!(a.cooling_load.watts() > b.cooling_load.watts(), "load falls with the bypass");
            prop_assert!(a.condensate.kilograms_per_second() >= b.condensate.kilograms_per_second());
        }
        let steamed = |h: f64| {
            humidify::steam(&entering, flow(0.005 * x), joules(h))
                .map(|done| done.leaving.air().air().dry_bulb().celsius())
        };
        if let (Ok(a), Ok(b)) = (steamed(2.6e6), steamed(2.6e6 * more)) {
            prop_assert!(a <= b, "hotter steam leaves warmer air");
        }
        let wetted = |effectiveness: f64| humidify::evaporative(&entering, effectiveness, EvaporatingWater::AtWetBulb);
        if let (Ok(a), Ok(b)) = (wetted(x / more), wetted(x)) {
            prop_assert!(a.evaporated.kilograms_per_second() <= b.evaporated.kilograms_per_second() + 1e-13);
        }
        // One moisture content at higher pressure saturates sooner; one relative humidity holds less water.
        let higher = basis.pressure().pascals() * more;
        if higher <= basis.formulation().limits(Quantity::Pressure).1 && share > 0.0 {
            let dense = air_at(t, share, basis.at_pressure(Pressure::from_pascals(higher)));
            prop_assert!(dense.humidity_ratio() < entering.air().humidity_ratio());
        }
        let warmer = |range: f64| {
            let water = TowerWater { flow: flow(1.0), hot: celsius(t.max(0.0) + range), cold: celsius(t.max(0.0)) };
            tower::with_air_flow(&entering, water, TREATMENT).map(|done| done.water.evaporation.kilograms_per_second())
        };
        if let (Ok(a), Ok(b)) = (warmer(10.0 * x), warmer(10.0 * x * more)) {
            prop_assert!(a < b, "evaporation grows with the range");
        }
        Ok(())
    });
}

/// The inverse of the coil by its bypass factor.
#[test]
fn apparatus_dew_point_is_found() {
    check((streams(), -35.0..40.0_f64, 0.0..0.95_f64), |(entering, apparatus, bypass)| {
        let drain = CondensateTemperature::Apparatus;
        let done = feasible!(coil::by_bypass_factor(&entering, celsius(apparatus), bypass, drain));
        if done.condensate.kilograms_per_second() <= 1e-6 * entering.dry_air_flow().kilograms_per_second() {
            return Err(TestCaseError::reject("a nearly dry coil"));
        }
        let leaving = done.leaving.air();
        let found = coil::apparatus_dew_point(&entering.air(), &leaving).unwrap();
        let t = found.dew_point.celsius();
        // A line may meet saturation twice, or drop droplets on its way; the coil's is then the warmer.
        prop_assert!(t >= apparatus - 1e-6, "{found:?}");
        if (t - apparatus).abs() < 1e-6 {
            prop_assert!((found.bypass_factor - bypass).abs() < 1e-6, "{found:?}");
        }
        // It leads there again.
        let again = coil::by_bypass_factor(&entering, found.dew_point, found.bypass_factor, drain).unwrap();
        let (a, b) = (numbers(&again.leaving.air()), numbers(&leaving));
        prop_assert!((a.0 - b.0).abs() < 1e-6 && (a.1 / b.1 - 1.0).abs() < 1e-7, "{a:?} {b:?}");
        holds(&[entering.into()], &again.leaving.into(), &again.exchange)
    });
}

/// Beyond the range of states the equilibrium is refused with the range in the error, and at both ends of it there is one.
#[test]
fn equilibrium_ends_with_the_range_of_states() {
    let waters = prop_oneof![1e-4..0.5_f64, Just(0.0), Just(1e-300)];
    check((bases(), waters, prop::bool::ANY), |(basis, total, freezes)| {
        let freezing = if freezes { Freezing::Equilibrium } else { Freezing::Supercooled };
        let make =
            |enthalpy: f64| AirWithCondensate::from_enthalpy_and_water(joules(enthalpy), ratio(total), freezing, basis);
        for far in [-5.1e6, 2.9e7] {
            let Err(Error::Infeasible { quantity: Quantity::LeavingEnthalpy, value, min, max }) = make(far) else {
                return Err(TestCaseError::fail(format!("{:?}", make(far))));
            };
            prop_assert!(value == far && (far < min || far > max), "{value} {min} {max}");
            let warmest = feasible!(make(max - 1e-9 * max.abs())).air().dry_bulb().celsius();
            let (_, end) = basis.formulation().limits(Quantity::DryBulb);
            prop_assert!((warmest - end).abs() < 1e-3, "{warmest}");
            prop_assert!(make(max + 1.0 + 1e-6 * max.abs()).is_err());
            let coldest = make(min + 1e-9 * min.abs());
            prop_assert!(coldest.is_ok() || !freezes, "{coldest:?}");
            prop_assert!(make(min - 1.0 - 1e-6 * min.abs()).is_err());
        }
        Ok(())
    });
}

/// Supercooled fog ends at −40 °C: what would be colder is ice or refused, never liquid.
#[test]
fn no_liquid_below_minus_forty() {
    check((bases(), -70.0..-30.0_f64, 0.0..1e-3_f64), |(basis, t, surplus)| {
        let (_, w, h) = numbers(&air_at(t, 1.0, basis));
        let made =
            AirWithCondensate::from_enthalpy_and_water(joules(h), ratio(w + surplus), Freezing::Supercooled, basis);
        let made = feasible!(made);
        sound(&WetStream::new(made, flow(1.0)).unwrap())?;
        prop_assert!(!made.is_wet() || made.air().dry_bulb().celsius() >= -40.0);
        Ok(())
    });
}
