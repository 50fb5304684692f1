//! Coils from their conductances: books on both sides, the second law, limits, order, rating, and where lines meet saturation.

use crate::support::*;
use moistair_core::process::AirStream;
use moistair_core::process::coil::{
    self, Arrangement, CoilRegime, CoilSurface, CoilWater, CondensateTemperature, Coolant, Measured, WaterCoil,
};
use moistair_core::*;
use proptest::prelude::*;

const DRAIN: CondensateTemperature = CondensateTemperature::LeavingAir;

fn surface(outside: f64, inside: f64) -> CoilSurface {
    let conductance = Conductance::from_watts_per_kelvin;
    CoilSurface {
        air_side: conductance(outside),
        water_side: conductance(inside),
        arrangement: Arrangement::Counterflow,
    }
}

fn across(surface: CoilSurface) -> CoilSurface {
    CoilSurface { arrangement: Arrangement::CrossFlow, ..surface }
}

fn water(m: f64, t: f64) -> CoilWater {
    CoilWater { flow: flow(m), entering: celsius(t), coolant: Coolant::Water }
}

fn brine(m: f64, t: f64) -> CoilWater {
    let specific_heat = SpecificHeat::from_joules_per_kilogram_kelvin(3_600.0);
    CoilWater { flow: flow(m), entering: celsius(t), coolant: Coolant::Brine(specific_heat) }
}

/// Enthalpy of the liquid in a coil, J/kg.
fn liquid(water: &CoilWater, t: Temperature, basis: Basis) -> f64 {
    match water.coolant {
        Coolant::Water => liquid_water_enthalpy(t, basis).unwrap().joules_per_kilogram(),
        Coolant::Brine(heat) => heat.joules_per_kilogram_kelvin() * t.celsius(),
    }
}

/// Heat that the water takes up is the heat that the air gives off: to 8 ε of the terms of both books and the resolution of both temperatures.
fn water_closes(entering: &AirStream, water: &CoilWater, done: &WaterCoil) -> Result<(), TestCaseError> {
    let basis = entering.air().basis();
    let m = water.flow.kilograms_per_second();
    let (before, after) = (liquid(water, water.entering, basis), liquid(water, done.leaving_water, basis));
    let heat = done.air.exchange.heat.watts();
    let carried = entering.dry_air_flow().kilograms_per_second()
        * (numbers(&entering.air()).2.abs() + numbers(&done.air.leaving.air()).2.abs());
    let kelvins = done.leaving_water.kelvins().max(entering.air().dry_bulb().kelvins());
    let heat_capacity = entering.air().specific_heat().joules_per_kilogram_kelvin();
    let resolution = kelvins * (m * 4_500.0 + entering.dry_air_flow().kilograms_per_second() * heat_capacity);
    let scale = 8.0 * (m * (before.abs() + after.abs()) + carried + heat.abs()) + 2.0 * resolution;
    let residual = m * (after - before) + heat;
    // The enthalpy of liquid water is rough by up to 2e-7 J/kg (measured in the core): no temperature can be found that is better.
    prop_assert!(residual.abs() <= f64::EPSILON * scale + 2e-7 * m, "{residual} of {heat}: {done:?}");
    Ok(())
}

/// What every coil owes.
fn owes(entering: &AirStream, surface: CoilSurface, water: &CoilWater, done: &WaterCoil) -> Result<(), TestCaseError> {
    holds(&[(*entering).into()], &done.air.leaving.into(), &done.air.exchange)?;
    water_closes(entering, water, done)?;
    let (before, after) = (numbers(&entering.air()), numbers(&done.air.leaving.air()));
    let (cold, warm) = (water.entering.celsius().min(before.0), water.entering.celsius().max(before.0));
    let near = 1e-9..=1.0;
    for t in [after.0, done.leaving_water.celsius(), done.coldest_surface.celsius()] {
        prop_assert!(cold - near.start() <= t && t <= warm + near.start(), "{t} outside {cold} to {warm}: {done:?}");
    }
    prop_assert!(after.1 <= before.1, "a coil never humidifies");
    prop_assert!((0.0..=1.0).contains(&done.dry_fraction), "{done:?}");
    let condensate = done.air.condensate.kilograms_per_second();
    prop_assert!((done.air.regime == CoilRegime::Dry) == (condensate == 0.0), "{done:?}");
    if done.air.regime == CoilRegime::PartlyWet {
        prop_assert!(done.dry_fraction > 0.0, "{done:?}");
    }
    let whole = surface.air_side.watts_per_kelvin().min(surface.water_side.watts_per_kelvin());
    prop_assert!(whole > 0.0 || same_bits(&done.air.leaving.air(), &entering.air()));
    Ok(())
}

fn conductances() -> impl Strategy<Value = f64> {
    prop_oneof![1 => Just(0.0), 1 => Just(1e9), 2 => 1e-6..1.0_f64, 12 => (1.0_f64.ln()..1e6_f64.ln()).prop_map(f64::exp)]
}

fn waters() -> impl Strategy<Value = CoilWater> {
    let m = prop_oneof![1 => Just(0.0), 1 => Just(1e6), 2 => 1e-6..1e-2_f64, 12 => 0.01..50.0_f64];
    let t = prop_oneof![4 => 0.0..30.0_f64, 2 => 30.0..120.0_f64, 1 => Just(0.0), 1 => 0.0..200.0_f64];
    (m, t, prop::bool::weighted(0.3), -70.0..0.0_f64)
        .prop_map(|(m, t, other, colder)| if other { brine(m, (t + colder).max(-40.0)) } else { water(m, t) })
}

#[test]
fn coils_with_water() {
    let seen = core::cell::RefCell::new([0_u32; 4]);
    check((streams(), waters(), conductances(), conductances()), |(entering, water, outside, inside)| {
        let surface = surface(outside, inside);
        if let Ok(done) = coil::with_water(&entering, across(surface), water, DRAIN) {
            owes(&entering, surface, &water, &done)?;
            prop_assert_eq!(done.air.regime, CoilRegime::Dry);
        }
        let done = match coil::with_water(&entering, surface, water, DRAIN) {
            Ok(done) => done,
            Err(error @ Error::Infeasible { quantity, value, min, max }) => {
                // Water that would freeze, or air that would leave too hot: nothing else is refused.
                let freezes = quantity == Quantity::WaterTemperature && value < 0.0 && min == 0.0;
                let boils = quantity == Quantity::LeavingTemperature && max == 150.0;
                prop_assert!(freezes || boils, "{error:?} of {entering:?} {water:?}");
                return Ok(());
            }
            Err(error) => return Err(TestCaseError::fail(format!("{error:?} of {entering:?} {water:?}"))),
        };
        seen.borrow_mut()[done.air.regime as usize] += 1;
        owes(&entering, surface, &water, &done)
    });
    println!("coils, dry, wet, frost, partly wet: {:?}", seen.borrow());
    assert!(seen.borrow().iter().all(|&count| count > 0));
}

/// What air conditioning works with: air of a region, a coil of so many transfer units.
#[derive(Clone, Copy, Debug)]
struct Usual {
    entering: AirStream,
    outside: f64,
    inside: f64,
    water: CoilWater,
}

fn usual() -> impl Strategy<Value = Usual> {
    let basis = (70_000.0..105_000.0_f64, prop::bool::ANY).prop_map(|(pressure, real)| {
        let formulation = if real { Formulation::RealGas } else { Formulation::IdealGas };
        Basis::new(Pressure::from_pascals(pressure), formulation)
    });
    (basis, 12.0..45.0_f64, 0.1..1.0_f64, 0.2..4.0_f64, (0.2..6.0_f64, 0.3..6.0_f64), (0.2..5.0_f64, 0.0..1.0_f64))
        .prop_map(|(basis, t, humidity, m, (units, ratio), (water_flow, cold))| {
            let entering = stream(air_at(t, humidity, basis), m);
            let outside = units * m * entering.air().specific_heat().joules_per_kilogram_kelvin();
            let water = water(m * water_flow, 2.0 + (t - 4.0) * cold);
            Usual { entering, outside, inside: outside * ratio, water }
        })
}

fn done(case: &Usual) -> WaterCoil {
    coil::with_water(&case.entering, surface(case.outside, case.inside), case.water, DRAIN).unwrap()
}

/// More surface, more water, more enthalpy: no less cooling, to 1e-4: the stages know the condensate's heat (1 to 5 % of the load) from
/// where they begin, the books from the leaving air.
#[test]
fn more_of_a_coil_cools_no_less() {
    check((usual(), 1.001..1.5_f64), |(case, more)| {
        let one = done(&case).air.cooling_load.watts();
        let rounding = 1e-4 * one.abs();
        let larger = [
            Usual { outside: case.outside * more, ..case },
            Usual { inside: case.inside * more, ..case },
            Usual {
                water: water(case.water.flow.kilograms_per_second() * more, case.water.entering.celsius()),
                ..case
            },
            Usual {
                entering: stream(warmer(&case, more), case.entering.dry_air_flow().kilograms_per_second()),
                ..case
            },
            Usual {
                entering: stream(moister(&case, more), case.entering.dry_air_flow().kilograms_per_second()),
                ..case
            },
            Usual {
                water: water(case.water.flow.kilograms_per_second(), case.water.entering.celsius() / more),
                ..case
            },
        ];
        for (what, other) in larger.iter().enumerate() {
            let load = done(other).air.cooling_load.watts();
            prop_assert!(load >= one - rounding, "{what}: {load} < {one}: {case:?}");
        }
        Ok(())
    });
}

fn warmer(case: &Usual, more: f64) -> MoistAir {
    let air = case.entering.air();
    MoistAir::restore(celsius(numbers(&air).0 + more), air.humidity_ratio(), air.basis()).unwrap()
}

fn moister(case: &Usual, more: f64) -> MoistAir {
    let air = case.entering.air();
    let (t, w, _) = numbers(&air);
    let most = air_at(t, 1.0, air.basis()).humidity_ratio().kilograms_per_kilogram();
    MoistAir::restore(air.dry_bulb(), ratio((w * more).min(most)), air.basis()).unwrap()
}

/// Entropy of liquid water in equilibrium with saturated air, from the air alone: s_l = (h_l − g_w) / T with the potential of the vapor
/// g_w = ∂(h − T s)/∂W.
fn liquid_entropy(t: f64, basis: Basis) -> f64 {
    let air = at(t, 1.0, basis);
    let (kelvins, w) = (air.dry_bulb().kelvins(), numbers(&air).1);
    let gibbs = |w: f64| {
        let air = MoistAir::restore(celsius(t), ratio(w), basis).unwrap();
        numbers(&air).2 - kelvins * air.specific_entropy().joules_per_kilogram_kelvin()
    };
    // Second order, one-sided: beyond saturation there is no state.
    let step = 1e-3 * w;
    let potential = (3.0 * gibbs(w) - 4.0 * gibbs(w - step) + gibbs(w - 2.0 * step)) / (2.0 * step);
    (liquid_water_enthalpy(celsius(t), basis).unwrap().joules_per_kilogram() - potential) / kelvins
}

/// Entropy of air, water and condensate together does not fall, on the real gas, which is consistent.
#[test]
fn coils_keep_the_second_law() {
    let least = core::cell::Cell::new(f64::INFINITY);
    check((usual(), prop::bool::ANY), |(case, heats)| {
        let basis = Basis::real_gas(case.entering.air().pressure());
        let air = air_at(numbers(&case.entering.air()).0, 0.7, basis);
        let dry_air = case.entering.dry_air_flow().kilograms_per_second();
        let t = if heats { 60.0 } else { case.water.entering.celsius() };
        let case =
            Usual { entering: stream(air, dry_air), water: water(case.water.flow.kilograms_per_second(), t), ..case };
        let done = done(&case);
        let entropy = |air: &MoistAir| air.specific_entropy().joules_per_kilogram_kelvin();
        let leaving = done.air.leaving.air();
        let drained = numbers(&leaving).0;
        let condensate = done.air.condensate.kilograms_per_second();
        let drain = if condensate > 0.0 { condensate * liquid_entropy(drained, basis) } else { 0.0 };
        // d(s) = d(h) / T along the water's range, by Simpson's rule in enthalpy.
        let (t1, t2) = (case.water.entering.kelvins(), done.leaving_water.kelvins());
        let taken = -done.air.exchange.heat.watts();
        let of_water = taken * (1.0 / t1 + 8.0 / (t1 + t2) + 1.0 / t2) / 6.0;
        let gain = dry_air * (entropy(&leaving) - entropy(&case.entering.air())) + drain + of_water;
        let share = gain / (taken.abs() / 300.0);
        least.set(least.get().min(share));
        prop_assert!(gain >= -1e-6 * (taken.abs() / 300.0), "{gain} W/K of {taken} W: {case:?} {done:?}");
        Ok(())
    });
    println!("least entropy gained, of that of the heat: {:e}", least.get());
}

/// No water, no conductance: nothing happens. No air: said so.
#[test]
fn limits_of_a_coil() {
    check(usual(), |case| {
        let same = |other: &Usual| {
            let done = done(other);
            same_bits(&done.air.leaving.air(), &case.entering.air())
                && done.leaving_water == other.water.entering
                && done.air.exchange.heat.watts() == 0.0
        };
        for idle in [
            Usual { water: water(0.0, 5.0), ..case },
            Usual { outside: 0.0, ..case },
            Usual { inside: 0.0, ..case },
            Usual { water: water(1.0, numbers(&case.entering.air()).0), ..case },
        ] {
            prop_assert!(same(&idle), "{:?}", idle);
        }
        let calm = AirStream::new(case.entering.air(), flow(0.0)).unwrap();
        prop_assert_eq!(coil::with_water(&calm, surface(1e3, 1e3), case.water, DRAIN), Err(Error::NoFlow));
        // Little surface: heat in proportion to it.
        let little = |outside: f64| done(&Usual { outside, inside: 3.0 * outside, ..case }).air.cooling_load.watts();
        let proportion = little(1e-5 * case.outside) / little(1e-6 * case.outside);
        prop_assert!((proportion - 10.0).abs() < 1e-3, "{proportion}");
        // Endless surface: the air leaves at the water, or the water at the air's wet bulb or dry bulb, whichever comes first.
        let endless = done(&Usual { outside: 1e9, inside: 1e9, ..case });
        let at_air = numbers(&endless.air.leaving.air()).0 - case.water.entering.celsius();
        let wet_bulb = case.entering.air().wet_bulb().unwrap().celsius();
        let at_water = wet_bulb - endless.leaving_water.celsius();
        // The curve of saturation bends: the streams may come nearest between the ends.
        prop_assert!(at_air > -1e-9, "{endless:?}");
        prop_assert!(at_air < 0.02 || at_water < 0.02 || endless.air.regime != CoilRegime::Dry, "{endless:?}");
        // So much water that it does not warm, so much water side that the surface is at its temperature: the coil by its bypass.
        let units = case.outside
            / (case.entering.dry_air_flow().kilograms_per_second()
                * case.entering.air().specific_heat().joules_per_kilogram_kelvin());
        let flooded = done(&Usual { inside: 1e9, water: water(1e6, case.water.entering.celsius()), ..case });
        let by_bypass = coil::by_bypass_factor(&case.entering, case.water.entering, (-units).exp(), DRAIN).unwrap();
        let (a, b) = (flooded.air.cooling_load.watts(), by_bypass.cooling_load.watts());
        // Air loses a little heat capacity as it dries, which the number of transfer units does not follow; and 1e9 W/K is not endless.
        prop_assert!((a / b - 1.0).abs() < 2e-3, "{a} {b}: {case:?}");
        let off = numbers(&flooded.air.leaving.air()).0 - numbers(&by_bypass.leaving.air()).0;
        prop_assert!(off.abs() < 0.02, "{off}");
        Ok(())
    });
}

/// Equal capacities on both sides are nothing special, and dry counterflow is the closed form.
#[test]
fn dry_effectiveness() {
    check((usual(), 0.999_99..1.000_01_f64, prop::bool::ANY), |(case, near, heats)| {
        let (t, _, _) = numbers(&case.entering.air());
        let capacity = case.entering.dry_air_flow().kilograms_per_second()
            * case.entering.air().specific_heat().joules_per_kilogram_kelvin();
        let air = air_at(t, 0.0, case.entering.air().basis());
        let entering = stream(air, case.entering.dry_air_flow().kilograms_per_second());
        let temperature = if heats { t + 20.0 } else { t - 10.0 };
        for water_capacity in [capacity * near, case.water.flow.kilograms_per_second() * 3_600.0] {
            let water = brine(water_capacity / 3_600.0, temperature);
            let done = coil::with_water(&entering, surface(case.outside, case.inside), water, DRAIN).unwrap();
            // The capacity that the air turns out to have.
            let of_air = done.air.exchange.heat.watts() / (numbers(&done.air.leaving.air()).0 - t);
            let (least, most) = (of_air.min(water_capacity), of_air.max(water_capacity));
            let units = 1.0 / (1.0 / case.outside + 1.0 / case.inside) / least;
            let ratio = least / most;
            let exponential = (-units * (1.0 - ratio)).exp();
            let wanted = if (1.0 - ratio).abs() < 1e-9 {
                units / (1.0 + units)
            } else {
                (1.0 - exponential) / (1.0 - ratio * exponential)
            };
            let effectiveness = done.air.exchange.heat.watts() / (least * (temperature - t));
            prop_assert!((effectiveness - wanted).abs() < 1e-8, "{effectiveness} {wanted} {done:?}");
        }
        Ok(())
    });
}

/// Cross-flow against a march over both directions, both streams unmixed.
#[test]
fn cross_flow_against_a_march() {
    const CELLS: usize = 100;
    let mut worst = 0.0_f64;
    for units in [0.1, 0.3, 0.5, 1.0, 2.0, 3.0] {
        for ratio in [0.05, 0.25, 0.5, 0.75, 1.0, 1.0 / 0.6, 4.0, 20.0] {
            let entering = stream(at(5.0, 0.0, sea_level(Formulation::IdealGas)), 1.0);
            let capacity = 1_006.0_f64;
            let conductance = 2.0 * units * capacity.min(capacity / ratio);
            let heater = brine(capacity / ratio / 3_600.0, 60.0);
            let done = coil::with_water(&entering, across(surface(conductance, conductance)), heater, DRAIN).unwrap();
            // Air along the rows, water down the columns, each cell with the means of its ends.
            let (by_air, by_water) =
                (0.5 * conductance / capacity / CELLS as f64, 0.5 * conductance / (capacity / ratio) / CELLS as f64);
            let mut water = [60.0; CELLS];
            let mut left = 0.0;
            for _ in 0..CELLS {
                let mut air = 5.0;
                for warm in &mut water {
                    let exchanged = (*warm - air) / (1.0 + 0.5 * (by_air + by_water));
                    air += by_air * exchanged;
                    *warm -= by_water * exchanged;
                }
                left += air / CELLS as f64;
            }
            let t = numbers(&done.air.leaving.air()).0;
            worst = worst.max(((t - 5.0) / (left - 5.0) - 1.0).abs());
        }
    }
    println!("cross-flow, heat off by at most {worst:.4}");
    assert!(worst < 0.04, "{worst}");
}

/// No step where a coil begins to wet: at water of the dew point, and as the dry share goes to none and to all.
#[test]
fn dry_and_wet_join() {
    check((usual(), 0.3..1.0_f64), |(case, humidity)| {
        let basis = case.entering.air().basis();
        let m = case.entering.dry_air_flow().kilograms_per_second();
        let t = numbers(&case.entering.air()).0.max(20.0);
        let entering = stream(at(t, humidity, basis), m);
        let dew = entering.air().dew_point().unwrap().celsius();
        let at_water = |t: f64| {
            let water = water(case.water.flow.kilograms_per_second(), t);
            done(&Usual { entering, water, ..case })
        };
        let steps = 100;
        let (low, high) = (dew - 12.0, (dew + 1.0).min(t));
        let mut last: Option<WaterCoil> = None;
        let wide = (high - low.max(0.0)) / f64::from(steps);
        for step in 0..=steps {
            let here = at_water(low.max(0.0) + wide * f64::from(step));
            if let Some(before) = last {
                let (a, b) = (before.air.cooling_load.watts(), here.air.cooling_load.watts());
                // dQ/dt_w: at most that of all air, with the slope of the saturation curve (2 to 8 kJ/(kg K)).
                prop_assert!(
                    a - b <= 9e3 * m * wide + 1e-6 && b <= a * (1.0 + 1e-9) + 1e-9,
                    "{a} {b}: {before:?} {here:?}"
                );
                let (x, y) = (numbers(&before.air.leaving.air()).0, numbers(&here.air.leaving.air()).0);
                prop_assert!((x - y).abs() < 2.0 * wide, "{x} {y}: {before:?} {here:?}");
            }
            last = Some(here);
        }
        for off in [-1e-7, 0.0, 1e-7] {
            let near = at_water(dew + off);
            prop_assert!(near.air.condensate.kilograms_per_second() <= 1e-9 * m, "{near:?}");
        }
        Ok(())
    });
}

/// A coil rated from what it does is that coil, on each kind of measurement, and predicts what it does elsewhere.
#[test]
fn rating_finds_the_coil() {
    let tried = core::cell::Cell::new(0_u32);
    check((usual(), 0.0..8.0_f64, prop::bool::ANY), |(case, warmer, heats)| {
        let temperature = if heats { numbers(&case.entering.air()).0 + 25.0 } else { case.water.entering.celsius() };
        let m = case.water.flow.kilograms_per_second();
        let case = Usual { water: water(m, temperature), ..case };
        let truth = done(&case);
        if truth.air.exchange.heat.watts().abs() < 1.0 {
            return Err(TestCaseError::reject("nothing exchanged"));
        }
        let elsewhere = water(m, temperature + warmer);
        let predicted =
            |surface| coil::with_water(&case.entering, surface, elsewhere, DRAIN).unwrap().air.exchange.heat.watts();
        let expected = predicted(surface(case.outside, case.inside));
        let leaving = truth.air.leaving.air().dry_bulb();
        for measured in [
            Measured::LeavingAir(leaving),
            Measured::LeavingWater(truth.leaving_water),
            Measured::Heat(truth.air.exchange.heat),
        ] {
            let ratio = case.inside / case.outside;
            let found =
                coil::surface_from_rating(&case.entering, case.water, measured, ratio, Arrangement::Counterflow);
            let found = found.map_err(|error| TestCaseError::fail(format!("{error:?} {measured:?} {case:?}")))?;
            let again = coil::with_water(&case.entering, found, case.water, DRAIN).unwrap();
            let off = again.air.leaving.air().dry_bulb().celsius() - leaving.celsius();
            // Far out more surface hardly changes the air, either way: what endless surface does explains it then, to 1e-4.
            let span = (leaving.celsius() - numbers(&case.entering.air()).0).abs();
            prop_assert!(off.abs() < 1e-6 + 2e-4 * span, "{off} K: {measured:?} {found:?} {case:?}");
            // Where endless surface does no more than this one, many explain the point.
            if (found.air_side.watts_per_kelvin() / case.outside - 1.0).abs() < 1e-5 {
                let gap = (predicted(found) - expected).abs();
                prop_assert!(gap <= 1e-4 * truth.air.exchange.heat.watts().abs(), "{gap}");
                tried.set(tried.get() + 1);
            }
        }
        let beyond = if heats { temperature + 0.1 } else { temperature - 0.1 };
        let refused = coil::surface_from_rating(
            &case.entering,
            case.water,
            Measured::LeavingAir(celsius(beyond)),
            2.0,
            Arrangement::Counterflow,
        );
        prop_assert!(
            matches!(refused, Err(Error::Infeasible { quantity: Quantity::LeavingTemperature, .. })),
            "{refused:?}"
        );
        Ok(())
    });
    println!("{} ratings found the coil itself", tried.get());
    assert!(tried.get() > 500);
}

/// What water takes up is what the air gives off, whatever the coil; heat that a meter adds comes back as the difference.
#[test]
fn both_sides_of_a_coil_say_the_same() {
    let worst = core::cell::Cell::new(0.0_f64);
    check((usual(), -1e4..1e4_f64), |(case, added)| {
        let truth = done(&case);
        let load = truth.air.cooling_load.watts();
        let by = |watts: f64| {
            coil::load_by_water(&case.entering, HeatFlow::from_watts(watts), case.water, truth.leaving_water).unwrap()
        };
        // What the last bits of the water's temperatures and enthalpies are worth.
        let enthalpy = |t| liquid(&case.water, t, case.entering.air().basis());
        let terms = 2.0 * (enthalpy(truth.leaving_water) + 4_200.0 * truth.leaving_water.kelvins());
        let worth = f64::EPSILON * (case.water.flow.kilograms_per_second() * terms + 8.0 * (load.abs() + added.abs()));
        let found = by(load);
        let off = found.air_less_water.watts().abs() / worth;
        worst.set(worst.get().max(off));
        prop_assert!(off <= 1.0, "{off}: {found:?} {case:?}");
        prop_assert!((by(load + added).air_less_water.watts() - added).abs() <= 2.0 * worth);
        prop_assert_eq!(by(load + added).load, found.load);
        Ok(())
    });
    println!("air and water apart by at most {:.2} of what the last bits are worth", worst.get());
}

/// There and back is where it was, by way of a third point is the straight way, and a doubled flow gives 2ⁿ.
#[test]
fn conductances_go_with_powers_of_the_flows() {
    let flows = || (0.05..20.0_f64, 0.05..20.0_f64);
    let exponents = (0.0..=1.0_f64, 0.0..=1.0_f64);
    check((usual(), flows(), flows(), flows(), exponents), |(case, a, b, c, (outside, inside))| {
        let exponents = coil::FlowExponents { air_side: outside, water_side: inside };
        let at = |(air, water): (f64, f64)| coil::CoilFlows { air: flow(air), water: flow(water) };
        let whole = surface(case.outside, case.inside);
        let go = |surface: CoilSurface, from, to| surface.at_flows(at(from), at(to), exponents).unwrap();
        let sides = |surface: CoilSurface| [surface.air_side, surface.water_side].map(Conductance::watts_per_kelvin);
        let near = |left: CoilSurface, right: CoilSurface| {
            sides(left).iter().zip(sides(right)).all(|(left, right)| (left / right - 1.0).abs() < 1e-14)
        };
        prop_assert!(near(go(go(whole, a, b), b, a), whole));
        prop_assert!(near(go(go(whole, a, b), b, c), go(whole, a, c)));
        let doubled = sides(go(whole, a, (2.0 * a.0, 2.0 * a.1)));
        for ((doubled, side), exponent) in doubled.iter().zip(sides(whole)).zip([outside, inside]) {
            prop_assert!((doubled / (side * 2.0_f64.powf(exponent)) - 1.0).abs() < 1e-14);
        }
        let more = sides(go(whole, a, (a.0 * 1.5, a.1 * 1.5)));
        prop_assert!(more.iter().zip(sides(whole)).all(|(more, side)| *more >= side));
        prop_assert_eq!(go(whole, a, a), whole);
        Ok(())
    });
    let without = coil::CoilFlows { air: flow(0.0), water: flow(1.0) };
    let with = coil::CoilFlows { air: flow(1.0), water: flow(0.0) };
    let exponents = coil::FlowExponents { air_side: 0.6, water_side: 0.8 };
    let none = surface(3e3, 6e3).at_flows(with, with, exponents).unwrap();
    assert_eq!(none, surface(3e3, 6e3), "the same flows");
    assert!(surface(3e3, 6e3).at_flows(without, with, exponents).is_err(), "found without air");
    let constant = coil::FlowExponents { air_side: 0.0, water_side: 0.8 };
    let still = surface(3e3, 6e3).at_flows(without, with, constant).unwrap();
    assert_eq!(still, surface(3e3, 0.0), "no water conducts nothing");
}

/// Meetings of a line with saturation are those that a scan of the line finds.
#[test]
fn apparatus_dew_points_are_all_found() {
    let seen = core::cell::RefCell::new([0_u32; 3]);
    check((bases(), 5.0..45.0_f64, 0.2..0.95_f64, 0.5..20.0_f64, 0.0..1.0_f64), |(basis, t, share, drop, dry)| {
        let entering = air_at(t, share, basis);
        let (_, w, h) = numbers(&entering);
        let leaving = MoistAir::from_dry_bulb(celsius(t - drop), ratio(w * dry), basis);
        let Ok(leaving) = leaving else { return Err(TestCaseError::reject("no state")) };
        let (t2, w2, h2) = numbers(&leaving);
        let saturated = leaving.relative_humidity().unwrap().fraction() > 0.999;
        if w2 >= w || saturated {
            return Err(TestCaseError::reject("nothing condenses, or no line"));
        }
        let found = coil::apparatus_dew_points(&entering, &leaving).unwrap();
        // How far saturation lies beyond the line, as a share of its length.
        let beyond = |t: f64| {
            let (_, ws, hs) = numbers(&air_at(t, 1.0, basis));
            ((ws - w) * (h - h2) - (hs - h) * (w - w2)) / ((h - h2) * (w - w2))
        };
        let mut crossings = 0;
        let mut closest = f64::INFINITY;
        let steps = 800;
        // Over ice below the melting temperature, over liquid above; a scan in steps sees no pair of meetings within one step.
        let mut last = beyond(t2 - 1e-9);
        for step in 1..=steps {
            let here = beyond(t2 + (-40.0 - t2) * f64::from(step) / f64::from(steps));
            crossings += usize::from((here > 0.0) != (last > 0.0));
            closest = closest.min(here.abs());
            last = here;
        }
        if closest > 0.01 || crossings > 0 {
            prop_assert_eq!(found.count(), crossings.min(2), "{:?} {:?}: {:?}", entering, leaving, found);
            seen.borrow_mut()[found.count()] += 1;
        }
        for met in [found.warmer, found.colder].into_iter().flatten() {
            prop_assert!(beyond(met.dew_point.celsius()).abs() < 1e-8, "{found:?}");
            prop_assert!((0.0..=1.0).contains(&met.bypass_factor));
        }
        Ok(())
    });
    println!("lines that meet saturation nowhere, once, twice: {:?}", seen.borrow());
    assert!(seen.borrow().iter().all(|&count| count > 0));
}

/// Brine below freezing on moist air is flagged as frost; outdoor air below freezing on water is flagged before, and refused where, the
/// water itself would freeze.
#[test]
fn frost_and_freezing_are_said() {
    for formulation in [Formulation::RealGas, Formulation::IdealGas] {
        let site = sea_level(formulation);
        let room = stream(at(20.0, 0.6, site), 1.0);
        let chilled = coil::with_water(&room, surface(3e3, 9e3), brine(1.0, -8.0), DRAIN).unwrap();
        assert_eq!(chilled.air.regime, CoilRegime::Frost);
        assert!(chilled.coldest_surface.celsius() < 0.0 && !chilled.freezing, "{chilled:?}");
        let outdoor = stream(at(-18.0, 0.8, site), 1.0);
        let heating = |m: f64| coil::with_water(&outdoor, surface(2e3, 2e3), water(m, 40.0), DRAIN);
        let warm = heating(2.0).unwrap();
        assert!(!warm.freezing && warm.air.regime == CoilRegime::Dry && warm.air.exchange.heat.watts() > 0.0);
        let slow = heating(0.25).unwrap();
        assert!(
            slow.freezing && slow.leaving_water.celsius() > 0.0 && slow.coldest_surface.celsius() < 0.0,
            "{slow:?}"
        );
        let Err(Error::Infeasible { quantity: Quantity::WaterTemperature, value, min, max }) = heating(0.05) else {
            panic!("water that freezes in the coil")
        };
        assert!(value < min && min == 0.0 && max == 40.0);
    }
}
