//! Steam as delivered, washers and evaporative coolers: books of every stream, limits, between-model checks, order, second law.

use crate::support::*;
use moistair_core::process::evaporative::{self, *};
use moistair_core::process::humidify::{self, EvaporatingWater, Moistening, Steam, SteamCondition, Washer};
use moistair_core::process::{AirStream, Exchange};
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

fn watts(heat: f64) -> HeatFlow {
    HeatFlow::from_watts(heat)
}

fn kilojoules(steam: Steam) -> f64 {
    steam.specific_enthalpy().kilojoules_per_kilogram()
}

fn water_enthalpy(t: f64, basis: Basis) -> f64 {
    liquid_water_enthalpy(celsius(t), basis).unwrap().joules_per_kilogram()
}

fn wet_bulb(air: &MoistAir) -> f64 {
    air.wet_bulb().unwrap().celsius()
}

fn kg(flow: MassFlow) -> f64 {
    flow.kilograms_per_second()
}

/// Pressures of steam, 1 kPa to 1.6 MPa.
fn steam_pressures() -> impl Strategy<Value = f64> {
    (1e3_f64.ln()..1.6e6_f64.ln()).prop_map(|x| x.exp().clamp(1e3, 1.6e6))
}

fn washers() -> impl Strategy<Value = Washer> {
    (0.05..5.0_f64, 0.0..60.0_f64, fractions(), 0.0..2e3_f64, prop_oneof![Just(0.0), 0.0..2e-3_f64]).prop_map(
        |(m, t, effectiveness, pump, carry_over_fraction)| Washer {
            water: flow(m),
            temperature: celsius(t),
            effectiveness,
            pump_heat: watts(pump),
            carry_over_fraction,
        },
    )
}

fn evaporating() -> impl Strategy<Value = EvaporatingWater> {
    prop_oneof![Just(EvaporatingWater::AtWetBulb), (0.0..40.0).prop_map(|t| EvaporatingWater::Given(celsius(t)))]
}

fn direct_coolers() -> impl Strategy<Value = DirectCooler> {
    let drift = prop_oneof![Just(0.0), 0.0..2e-3_f64];
    (0.02..=1.0_f64, 0.0..2e3_f64, evaporating(), drift, 1.05..8.0_f64).prop_map(
        |(saturation_effectiveness, pump, make_up, drift_fraction, cycles_of_concentration)| DirectCooler {
            saturation_effectiveness,
            circulating: flow(0.5),
            pump_heat: watts(pump),
            make_up,
            treatment: WaterTreatment { drift_fraction, cycles_of_concentration },
        },
    )
}

fn indirect_coolers() -> impl Strategy<Value = IndirectCooler> {
    let effectiveness = prop_oneof![
        3 => (0.0..1.2_f64).prop_map(IndirectEffectiveness::OfWetBulb),
        1 => (0.0..=1.0_f64).prop_map(IndirectEffectiveness::OfDewPoint),
    ];
    (effectiveness, 0.5..=1.0_f64, 0.0..500.0_f64, evaporating()).prop_map(|(effectiveness, humidity, pump, water)| {
        IndirectCooler {
            effectiveness,
            exhaust_humidity: RelativeHumidity::from_fraction(humidity),
            pump_heat: watts(pump),
            water,
        }
    })
}

/// Air of any climate, and of what ovens and dryers give.
fn usual_air() -> impl Strategy<Value = AirStream> {
    let air = (bases(), prop_oneof![4 => -20.0..55.0_f64, 1 => 55.0..120.0_f64], fractions());
    (air, 0.3..5.0_f64).prop_map(|((basis, t, share), m)| {
        // Beyond boiling the share is of all water: most of it would be steam.
        let share = if t > 55.0 { 0.2 * share } else { share };
        stream(air_at(t, share, basis), m)
    })
}

/// Two streams of one basis.
fn two_streams() -> impl Strategy<Value = (AirStream, AirStream)> {
    (bases(), 5.0..55.0_f64, fractions(), -5.0..40.0_f64, fractions(), 0.3..3.0_f64, 0.3..8.0_f64).prop_map(
        |(basis, t1, s1, t2, s2, m1, m2)| (stream(air_at(t1, s1, basis), m1), stream(air_at(t2, s2, basis), m2)),
    )
}

/// Forms of one steam agree where they meet; throttling keeps the enthalpy and finds the state again.
#[test]
fn forms_of_steam_agree() {
    let worst = core::cell::Cell::new([0.0_f64; 3]);
    let note = |slot: usize, size: f64| {
        let mut all = worst.get();
        all[slot] = all[slot].max(size);
        worst.set(all);
    };
    check((steam_pressures(), 0.0..1.0_f64, 0.0..400.0_f64, steam_pressures()), |(pascals, quality, t, lower)| {
        let pressure = Pressure::from_pascals(pascals);
        let dry = Steam::saturated_at_pressure(pressure).unwrap();
        let boiling = dry.throttled_to(pressure).unwrap();
        prop_assert!(boiling.quality == 1.0 && boiling.superheat.kelvins() < 1e-5, "{boiling:?}");
        let by_temperature = boiling.temperature.celsius() - boiling.superheat.kelvins();
        if by_temperature <= 200.0 {
            let same = Steam::saturated_at_temperature(celsius(by_temperature)).unwrap();
            prop_assert!((kilojoules(same) - kilojoules(dry)).abs() < 1e-9);
        }
        // The fits of the saturation against the equation itself.
        let edge = Steam::superheated(celsius(by_temperature), pressure).unwrap();
        note(0, (kilojoules(edge) - kilojoules(dry)).abs() * 1e3);
        prop_assert!((kilojoules(edge) - kilojoules(dry)).abs() < 1e-5, "{pascals}");
        prop_assert!((kilojoules(Steam::wet(pressure, 1.0).unwrap()) - kilojoules(dry)).abs() < 1e-9);
        let wet = Steam::wet(pressure, quality);
        if let Ok(wet) = wet {
            let again = wet.throttled_to(pressure).unwrap();
            prop_assert!(
                (again.quality - quality).abs() < 1e-12 && (again.condition == SteamCondition::Wet) == (quality < 1.0)
            );
            // Of less pressure it is drier, and at the most colder.
            if let (true, Ok(expanded)) = (lower < pascals, wet.throttled_to(Pressure::from_pascals(lower))) {
                prop_assert!(expanded.temperature <= again.temperature);
            }
        }
        if t < by_temperature {
            prop_assert_eq!(Steam::superheated(celsius(t), pressure).unwrap_err().code(), 301);
            return Ok(());
        }
        let hot = Steam::superheated(celsius(t), pressure).unwrap();
        prop_assert!(kilojoules(hot) >= kilojoules(dry) - 1e-5);
        let again = hot.throttled_to(pressure).unwrap();
        note(1, (again.temperature.celsius() - t).abs());
        prop_assert!((again.temperature.celsius() - t).abs() < 1e-5, "{again:?} {t}");
        if lower < pascals {
            let expanded = hot.throttled_to(Pressure::from_pascals(lower)).unwrap();
            note(2, (expanded.temperature.celsius() - t).max(0.0));
            // Joule–Thomson: steam cools.
            prop_assert!(
                expanded.temperature.celsius() <= t + 1e-9 && expanded.condition == SteamCondition::Superheated
            );
        }
        Ok(())
    });
    let [edge, again, warmer] = worst.get();
    println!(
        "saturated by two ways: {edge:.2e} J/kg; temperature again: {again:.1e} K; warmed by throttling: {warmer:e} K"
    );
}

/// Steam of the enthalpy of liquid water is spray of that water, bit for bit.
#[test]
fn steam_of_water_is_spray() {
    check((streams(), 1e-4..0.02_f64, 65.0..200.0_f64), |(entering, per_air, t)| {
        let m = flow(per_air * kg(entering.dry_air_flow()));
        let water = joules(water_enthalpy(t, entering.air().basis()));
        prop_assert_eq!(humidify::steam(&entering, m, water), humidify::spray(&entering, m, celsius(t)));
        Ok(())
    });
}

/// Books of the air, and those of the water recomputed from outside.
#[test]
fn washers_balance() {
    check((usual_air(), washers()), |(entering, washer)| {
        let done = feasible!(humidify::wash(&entering, washer));
        holds(&[entering.into()], &done.air.leaving, &done.air.exchange)?;
        let basis = entering.air().basis();
        let (m, water, droplets) =
            (kg(entering.dry_air_flow()), kg(washer.water), kg(washer.water) * washer.carry_over_fraction);
        let left = done.air.leaving.air();
        let taken = m * (left.total_water().kilograms_per_kilogram() - numbers(&entering.air()).1);
        prop_assert!((water - taken - kg(done.leaving_water)).abs() <= 1e-13 * (water + m), "water");
        let leaves = done.leaving_water_temperature.celsius();
        let heat = washer.pump_heat.watts() + water * water_enthalpy(washer.temperature.celsius(), basis)
            - kg(done.leaving_water) * water_enthalpy(leaves, basis);
        let gained = m * (left.specific_enthalpy().joules_per_kilogram() - numbers(&entering.air()).2);
        let scale = water * 2e5 + gained.abs() + m * 1e5;
        prop_assert!((heat - gained).abs() <= 1e-11 * scale, "heat {heat} {gained}");
        let to_water = washer.pump_heat.watts() - gained;
        prop_assert!((done.heat_to_water.watts() - to_water).abs() <= 1e-11 * scale);
        // Below freezing they come to equilibrium with the air.
        let melted = numbers(&left.air()).0 > 0.1;
        prop_assert!(!melted || kg(done.air.carried) >= droplets * (1.0 - 1e-12) - 1e-12 * m, "droplets are carried");
        // The water lies between its own temperature, warmed by the pump, and the wet bulb.
        let warmed = washer.temperature.celsius() + washer.pump_heat.watts() / (water * 4_150.0);
        let (low, high) =
            (washer.temperature.celsius().min(wet_bulb(&entering.air())), warmed.max(wet_bulb(&entering.air())));
        prop_assert!(
            washer.carry_over_fraction > 0.0
                || washer.effectiveness == 0.0
                || (low - 1e-6
                    ..high + 0.05 * (high - low).max(1.0) + 60.0 * f64::from(u8::from(washer.pump_heat.watts() > 0.0)))
                    .contains(&leaves),
            "{low} {leaves} {high}"
        );
        Ok(())
    });
}

/// Full effectiveness is equilibrium: the spray of the same water; none leaves the air alone; much water is an apparatus dew point.
#[test]
fn washers_at_their_limits() {
    check((usual_air(), washers()), |(entering, washer)| {
        let plain = Washer { pump_heat: watts(0.0), carry_over_fraction: 0.0, ..washer };
        let full = feasible!(humidify::wash(&entering, Washer { effectiveness: 1.0, ..plain }));
        let sprayed = feasible!(humidify::spray(&entering, plain.water, plain.temperature));
        let (a, b) = (full.air.leaving.air().air(), sprayed.leaving.air().air());
        prop_assert!((numbers(&a).0 - numbers(&b).0).abs() < 1e-9, "{a:?} {b:?}");
        prop_assert!((numbers(&a).1 - numbers(&b).1).abs() < 1e-9 * (1e-2 + numbers(&b).1));
        prop_assert!((kg(sprayed.carried) - kg(full.leaving_water)).abs() < 1e-8 * (1.0 + kg(entering.dry_air_flow())));
        if let Ok(none) = humidify::wash(&entering, Washer { effectiveness: 0.0, ..plain }) {
            let left = none.air.leaving.air().air();
            prop_assert!((numbers(&left).0 - numbers(&entering.air()).0).abs() < 1e-11);
            prop_assert!((numbers(&left).1 - numbers(&entering.air()).1).abs() < 1e-14 * (1.0 + numbers(&left).1));
            prop_assert!((none.leaving_water_temperature.celsius() - plain.temperature.celsius()).abs() < 1e-9);
        }
        let much = feasible!(humidify::wash(&entering, Washer { water: flow(9e5), ..plain }));
        // Where the water boils away it cools, however much there is.
        prop_assume!(numbers(&much.air.leaving.air().air()).1 < 1.0);
        prop_assert!((much.leaving_water_temperature.celsius() - plain.temperature.celsius()).abs() < 0.02, "{much:?}");
        Ok(())
    });
}

/// Water below the dew point dries the air, water above it moistens.
#[test]
fn washers_dry_below_the_dew_point() {
    check(
        (bases(), 15.0..40.0_f64, 0.3..0.95_f64, 0.1..1.0_f64, 0.5..5.0_f64),
        |(basis, t, share, effectiveness, off)| {
            let entering = stream(air_at(t, share, basis), 1.0);
            let dew = feasible!(entering.air().dew_point()).celsius();
            let washed = |t: f64| {
                let water = flow(1e4);
                humidify::wash(
                    &entering,
                    Washer {
                        water,
                        temperature: celsius(t),
                        effectiveness,
                        pump_heat: watts(0.0),
                        carry_over_fraction: 0.0,
                    },
                )
            };
            let cold = feasible!(washed(dew - off));
            prop_assert!(cold.moistening == Moistening::Dehumidifies && kg(cold.air.evaporated) < 0.0);
            let warm = feasible!(washed(dew + off));
            // Contact counts on temperature, so that next to the dew point the line in humidity may bend across.
            prop_assert!(
                off < 1.0
                    || basis.pressure().pascals() > 3e5
                    || (warm.moistening == Moistening::Humidifies && kg(warm.air.evaporated) > 0.0)
            );
            prop_assert!(cold.heat_to_water.watts() > 0.0);
            Ok(())
        },
    );
}

/// Books of the air; of the circulating water from outside: P + M h_m − B h_w − what leaves with the air.
#[test]
fn direct_coolers_balance() {
    check((usual_air(), direct_coolers()), |(entering, cooler)| {
        let done = feasible!(evaporative::direct(&entering, cooler));
        holds(&[entering.into()], &done.air.leaving, &done.air.exchange)?;
        let basis = entering.air().basis();
        let h_w = water_enthalpy(done.water_temperature.celsius(), basis);
        let h_m = match cooler.make_up {
            EvaporatingWater::AtWetBulb => h_w,
            EvaporatingWater::Given(t) => water_enthalpy(t.celsius(), basis),
        };
        let used = done.water;
        let brought = cooler.pump_heat.watts() + kg(used.make_up) * h_m - kg(used.blowdown) * h_w;
        let (m, left) = (kg(entering.dry_air_flow()), done.air.leaving.air());
        let gained = m * (left.specific_enthalpy().joules_per_kilogram() - numbers(&entering.air()).2);
        let scale = (kg(used.make_up) + 1.0) * 2e5 + gained.abs() + m * 1e5;
        prop_assert!((brought - gained).abs() <= 1e-11 * scale, "heat {brought} {gained} {done:?}");
        let into_air = m * (left.total_water().kilograms_per_kilogram() - numbers(&entering.air()).1);
        let lost = kg(used.make_up) - kg(used.blowdown);
        prop_assert!(
            (into_air - lost).abs() <= 1e-13 * (1.0 + m) * (1.0 + kg(used.make_up)),
            "water {into_air} {lost}"
        );
        // Cycles of concentration: salt that comes leaves with bleed and droplets.
        if !used.limited_by_drift {
            let out = (kg(used.blowdown) + kg(used.drift)) * cooler.treatment.cycles_of_concentration;
            prop_assert!((out - kg(used.make_up)).abs() <= 1e-12 * (out + kg(used.make_up)), "salt");
        }
        Ok(())
    });
}

/// Without pump and carry-over, with make-up as warm as the water, it is the plain medium; saturated air stays as it is.
#[test]
fn direct_coolers_at_their_limits() {
    check((usual_air(), direct_coolers()), |(entering, cooler)| {
        let treatment = WaterTreatment { drift_fraction: 0.0, ..cooler.treatment };
        let plain = DirectCooler { pump_heat: watts(0.0), make_up: EvaporatingWater::AtWetBulb, treatment, ..cooler };
        let done = feasible!(evaporative::direct(&entering, plain));
        let medium =
            humidify::evaporative(&entering, plain.saturation_effectiveness, EvaporatingWater::AtWetBulb).unwrap();
        let (a, b) = (numbers(&done.air.leaving.air().air()), numbers(&medium.leaving.air().air()));
        prop_assert!((a.0 - b.0).abs() < 1e-9 && (a.1 - b.1).abs() < 1e-9 * (1e-2 + b.1), "{a:?} {b:?}");
        prop_assert!((done.water_temperature.celsius() - wet_bulb(&entering.air())).abs() < 1e-9);
        let none = evaporative::direct(&entering, DirectCooler { saturation_effectiveness: 0.0, ..plain }).unwrap();
        prop_assert!(same_bits(&none.air.leaving.air().air(), &entering.air()));
        prop_assert_eq!(none.air.exchange, Exchange::none());
        // The pump warms what an idle medium cannot cool.
        let idle = DirectCooler { saturation_effectiveness: 0.0, pump_heat: watts(10.0), ..plain };
        let refused = evaporative::direct(&entering, idle).unwrap_err();
        prop_assert_eq!((refused.code(), refused.quantity()), (301, Some(Quantity::PumpHeat)));
        let (t, _, _) = numbers(&entering.air());
        let saturated = stream(
            feasible!(MoistAir::from_dry_bulb(
                celsius(t),
                RelativeHumidity::from_fraction(1.0),
                entering.air().basis()
            )),
            1.0,
        );
        let still = feasible!(evaporative::direct(&saturated, plain));
        prop_assert_eq!(still.status, DirectStatus::AlreadySaturated);
        prop_assert!(
            kg(still.air.evaporated).abs() < 1e-9 && (numbers(&still.air.leaving.air().air()).0 - t).abs() < 1e-7
        );
        Ok(())
    });
}

/// Books of both streams together and each.
#[test]
fn indirect_coolers_balance() {
    let seen = core::cell::Cell::new([0_u32; 4]);
    check((two_streams(), indirect_coolers()), |((primary, secondary), cooler)| {
        let done = feasible!(evaporative::indirect(&primary, &secondary, cooler));
        let mut count = seen.get();
        count[done.status as usize] += 1;
        seen.set(count);
        holds(&[primary.into()], &done.primary.into(), &done.primary_exchange)?;
        holds(&[secondary.into()], &done.secondary.leaving, &done.secondary.exchange)?;
        let (t1, _, _) = numbers(&primary.air());
        let (t2, w2, _) = numbers(&done.primary.air());
        let exhaust = numbers(&done.secondary.leaving.air().air());
        if done.status == IndirectStatus::NoDrive {
            prop_assert!(same_bits(&done.primary.air(), &primary.air()));
            prop_assert_eq!(done.secondary.exchange, Exchange::none());
            return Ok(());
        }
        let warmest = t1.max(numbers(&secondary.air()).0);
        prop_assert!(done.heat.watts() >= -1e-9 && t2 <= t1 && exhaust.0 <= warmest + 1e-9, "no heat uphill");
        let pump = done.secondary.exchange.heat.watts() - done.heat.watts();
        prop_assert!((pump - cooler.pump_heat.watts()).abs() <= 1e-9 * (1.0 + done.heat.watts()));
        prop_assert!(kg(done.secondary.evaporated) >= 0.0, "the secondary air is not dried");
        let humidity = feasible!(done.secondary.leaving.air().air().relative_humidity_over_liquid()).fraction();
        prop_assert!((humidity - cooler.exhaust_humidity.fraction()).abs() < 1e-9, "{humidity}");
        let toward = match cooler.effectiveness {
            IndirectEffectiveness::OfWetBulb(e) => t1 - e * (t1 - wet_bulb(&secondary.air())),
            IndirectEffectiveness::OfDewPoint(e) => t1 - e * (t1 - secondary.air().dew_point().unwrap().celsius()),
        };
        if done.status == IndirectStatus::Cooling {
            prop_assert!((t2 - toward).abs() < 1e-9 && w2 == numbers(&primary.air()).1);
        } else {
            // The heat of condensation keeps it warmer.
            prop_assert!(t2 >= toward - 1e-9 && kg(done.condensate) > 0.0);
            prop_assert!(done.primary.air().relative_humidity().unwrap().fraction() > 1.0 - 1e-9);
        }
        Ok(())
    });
    println!("indirect: cooling, no drive, condensing, frosting: {:?}", seen.get());
    assert!(seen.get()[..3].iter().all(|&count| count > 0));
}

/// No effectiveness cools nothing; a secondary stream without drive is left alone; too little of it is refused.
#[test]
fn indirect_coolers_at_their_limits() {
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let (hot, room) = (stream(at(35.0, 0.3, site), 1.0), stream(at(25.0, 0.5, site), 1.0));
        let cooler = |effectiveness| IndirectCooler {
            effectiveness: IndirectEffectiveness::OfWetBulb(effectiveness),
            exhaust_humidity: RelativeHumidity::from_fraction(1.0),
            pump_heat: watts(0.0),
            water: EvaporatingWater::AtWetBulb,
        };
        let none = evaporative::indirect(&hot, &room, cooler(0.0)).unwrap();
        assert!(same_bits(&none.primary.air(), &hot.air()) && none.heat.watts() == 0.0);
        // The secondary air alone saturates at its wet bulb.
        assert!((numbers(&none.secondary.leaving.air().air()).0 - wet_bulb(&room.air())).abs() < 1e-9);
        let full = evaporative::indirect(&hot, &stream(room.air(), 3.0), cooler(1.0)).unwrap();
        assert!((numbers(&full.primary.air()).0 - wet_bulb(&room.air())).abs() < 1e-9, "the secondary's wet bulb");
        let cold = evaporative::indirect(&stream(at(12.0, 0.5, site), 1.0), &room, cooler(0.8)).unwrap();
        assert_eq!(cold.status, IndirectStatus::NoDrive);
        let code = |result: Result<IndirectCooled, Error>| result.unwrap_err();
        let little = stream(room.air(), 0.1);
        let refused = code(evaporative::indirect(&hot, &little, cooler(0.8)));
        assert!(matches!(refused, Error::Infeasible { quantity: Quantity::HeatFlow, .. }), "{refused}");
        let dry_frost = stream(at(5.0, 0.1, site), 1.0);
        let refused = code(evaporative::indirect(&hot, &dry_frost, cooler(0.8)));
        assert!(matches!(refused, Error::Infeasible { quantity: Quantity::WetBulb, .. }), "{refused}");
        let beyond = code(evaporative::indirect(&hot, &stream(room.air(), 3.0), cooler(1.9)));
        assert!(matches!(beyond, Error::Infeasible { quantity: Quantity::IndirectEffectiveness, .. }), "{beyond}");
        // A dew-point cycle, on outdoor air: colder than its wet bulb.
        let dew = IndirectCooler { effectiveness: IndirectEffectiveness::OfDewPoint(0.85), ..cooler(0.0) };
        let done = evaporative::indirect(&hot, &stream(hot.air(), 3.0), dew).unwrap();
        assert!(numbers(&done.primary.air()).0 < wet_bulb(&hot.air()));
        // Hot damp air over a cold room condenses.
        let damp = stream(at(32.0, 0.9, site), 1.0);
        let wet = evaporative::indirect(&damp, &stream(at(22.0, 0.3, site), 4.0), cooler(0.9)).unwrap();
        assert_eq!(wet.status, IndirectStatus::Condensing);
    }
}

/// Two stages: their books, colder than the wet bulb that entered, and what the stages do one by one.
#[test]
fn two_stages_chain() {
    check((two_streams(), indirect_coolers(), direct_coolers()), |((primary, secondary), first, second)| {
        let done = feasible!(evaporative::two_stage(&primary, &secondary, first, second));
        holds(&[primary.into()], &done.indirect.primary.into(), &done.indirect.primary_exchange)?;
        holds(&[done.indirect.primary.into()], &done.direct.air.leaving, &done.direct.air.exchange)?;
        holds(&[secondary.into()], &done.indirect.secondary.leaving, &done.indirect.secondary.exchange)?;
        let by_hand = evaporative::direct(&done.indirect.primary, second).unwrap();
        prop_assert_eq!(by_hand, done.direct);
        let both = kg(done.indirect.secondary.evaporated) + kg(done.direct.air.evaporated);
        prop_assert!((both - kg(done.evaporated)).abs() <= 1e-15 * (1.0 + both));
        Ok(())
    });
    for &formulation in Formulation::ALL {
        let desert = stream(at(40.0, 0.12, sea_level(formulation)), 1.0);
        let first = IndirectCooler {
            effectiveness: IndirectEffectiveness::OfWetBulb(0.6),
            exhaust_humidity: RelativeHumidity::from_fraction(0.95),
            pump_heat: watts(50.0),
            water: EvaporatingWater::AtWetBulb,
        };
        let second = DirectCooler {
            saturation_effectiveness: 0.9,
            circulating: flow(0.4),
            pump_heat: watts(50.0),
            make_up: EvaporatingWater::Given(celsius(20.0)),
            treatment: WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 3.0 },
        };
        let done = evaporative::two_stage(&desert, &desert, first, second).unwrap();
        let left = numbers(&done.direct.air.leaving.air().air()).0;
        println!(
            "{formulation:?}: 40 °C, 12 % leaves two stages at {left:.2} °C; its wet bulb is {:.2}",
            wet_bulb(&desert.air())
        );
        assert!(left < wet_bulb(&desert.air()));
    }
}

/// More of the cause, more of the effect.
#[test]
fn responses_are_monotone() {
    let cases = (bases(), 15.0..45.0_f64, 0.05..0.9_f64, 0.1..0.9_f64, 1.02..1.1_f64);
    check(cases, |(basis, t, share, effectiveness, more)| {
        let entering = stream(air_at(t, share, basis), 1.0);
        let direct = |effectiveness: f64, pump: f64| {
            let cooler = DirectCooler {
                saturation_effectiveness: effectiveness,
                circulating: flow(0.5),
                pump_heat: watts(pump),
                make_up: EvaporatingWater::Given(celsius(15.0)),
                treatment: WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 3.0 },
            };
            evaporative::direct(&entering, cooler)
        };
        let base = feasible!(direct(effectiveness, 100.0));
        let better = feasible!(direct(effectiveness * more, 100.0));
        let warmer = feasible!(direct(effectiveness, 300.0));
        let left = |done: &DirectCooled| numbers(&done.air.leaving.air().air()).0;
        prop_assert!(left(&better) <= left(&base) + 1e-9 || share > 0.8, "a better medium cools more");
        prop_assert!(
            left(&warmer) > left(&base) && warmer.water_temperature > base.water_temperature,
            "a larger pump cools less"
        );
        prop_assert!(
            kg(warmer.air.evaporated) > kg(base.air.evaporated) && kg(warmer.water.make_up) > kg(base.water.make_up)
        );
        let washed = |t: f64, m: f64| {
            let water = Washer {
                water: flow(m),
                temperature: celsius(t),
                effectiveness,
                pump_heat: watts(0.0),
                carry_over_fraction: 0.0,
            };
            humidify::wash(&entering, water)
        };
        let (cold, warm) = (feasible!(washed(8.0, 2.0)), feasible!(washed(8.0 + more, 2.0)));
        prop_assert!(
            kg(cold.air.evaporated) < kg(warm.air.evaporated)
                && cold.leaving_water_temperature < warm.leaving_water_temperature
        );
        let indirect = |effectiveness: f64, m: f64| {
            let cooler = IndirectCooler {
                effectiveness: IndirectEffectiveness::OfWetBulb(effectiveness),
                exhaust_humidity: RelativeHumidity::from_fraction(1.0),
                pump_heat: watts(0.0),
                water: EvaporatingWater::AtWetBulb,
            };
            evaporative::indirect(&entering, &stream(entering.air(), m), cooler)
        };
        let (base, better) = (feasible!(indirect(effectiveness, 4.0)), feasible!(indirect(effectiveness * more, 4.0)));
        prop_assert!(base.heat < better.heat && base.secondary.evaporated < better.secondary.evaporated);
        let more_air = feasible!(indirect(effectiveness, 4.0 * more));
        let exhaust = |done: &IndirectCooled| numbers(&done.secondary.leaving.air().air()).0;
        prop_assert!(exhaust(&more_air) < exhaust(&base), "more secondary air stays colder");
        Ok(())
    });
}

/// Entropy of liquid water in equilibrium with saturated air, s_l = (h_l − g_w) / T, with the potential of the vapor.
fn liquid_entropy(t: f64, basis: Basis) -> f64 {
    let air = at(t, 1.0, basis);
    let potential = air.value(Quantity::ChemicalPotentialOfWater).unwrap();
    (water_enthalpy(t, basis) - potential) / (t + 273.15)
}

fn entropy(air: &MoistAir) -> f64 {
    air.specific_entropy().joules_per_kilogram_kelvin()
}

/// Air and water together make entropy, on the real gas, which is consistent; the pump's heat comes as work, without any.
#[test]
fn second_law() {
    let least = core::cell::Cell::new([f64::INFINITY; 4]);
    let note = |slot: usize, made: f64| {
        let mut all = least.get();
        all[slot] = all[slot].min(made);
        least.set(all);
    };
    let cases = (two_streams(), washers(), indirect_coolers(), 5.0..45.0_f64, 0.05..1.0_f64, 1e-4..0.02_f64);
    check(cases, |((primary, secondary), washer, cooler, t, share, steam)| {
        let basis = Basis::real_gas(Pressure::from_pascals(101_325.0));
        let entering = stream(air_at(t, share, basis), 1.0);
        let (t2, t3) = (numbers(&primary.air()).0.max(5.0), numbers(&secondary.air()).0.max(5.0));
        let plain = Washer { pump_heat: watts(0.0), carry_over_fraction: 0.0, ..washer };
        if let Ok(done) = humidify::wash(&entering, plain) {
            let left = done.air.leaving.air();
            let fog = left.liquid().kilograms_per_kilogram();
            let of_fog = if fog > 0.0 { fog * liquid_entropy(left.air().dry_bulb().celsius(), basis) } else { 0.0 };
            let into_air = entropy(&left.air()) + of_fog - entropy(&entering.air());
            let fallen = kg(done.leaving_water) * liquid_entropy(done.leaving_water_temperature.celsius(), basis);
            let made =
                into_air + fallen - kg(washer.water) * liquid_entropy(washer.temperature.celsius().max(0.1), basis);
            prop_assume!(washer.temperature.celsius() >= 0.1);
            note(0, made);
            prop_assert!(made > -1e-5, "washer {made}");
        }
        let treatment = WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 1e3 };
        let medium = DirectCooler {
            saturation_effectiveness: washer.effectiveness.max(0.01),
            circulating: flow(1.0),
            pump_heat: watts(0.0),
            make_up: EvaporatingWater::AtWetBulb,
            treatment,
        };
        if let Ok(done) = evaporative::direct(&entering, medium) {
            let left = done.air.leaving.air().air();
            let water = kg(done.air.evaporated) * liquid_entropy(done.water_temperature.celsius(), basis);
            let made = entropy(&left) - entropy(&entering.air()) - water;
            note(1, made);
            prop_assert!(made > -1e-5, "direct {made}");
        }
        let (hot, wet) = (
            stream(air_at(t2, share, basis), 1.0),
            stream(air_at(t3, 1.0 - share, basis), kg(secondary.dry_air_flow())),
        );
        let still = IndirectCooler { pump_heat: watts(0.0), water: EvaporatingWater::AtWetBulb, ..cooler };
        if let Ok(done) = evaporative::indirect(&hot, &wet, still) {
            let m = kg(wet.dry_air_flow());
            let drained = if kg(done.condensate) > 0.0 && done.status == IndirectStatus::Condensing {
                kg(done.condensate) * liquid_entropy(numbers(&done.primary.air()).0, basis)
            } else {
                0.0
            };
            let evaporated = kg(done.secondary.evaporated) * liquid_entropy(wet_bulb(&wet.air()).max(0.01), basis);
            let made = entropy(&done.primary.air()) - entropy(&hot.air())
                + drained
                + m * (entropy(&done.secondary.leaving.air().air()) - entropy(&wet.air()))
                - evaporated;
            if done.status != IndirectStatus::Frosting {
                note(2, made);
                prop_assert!(made > -1e-5, "indirect {made} {done:?}");
            }
        }
        // Saturated steam of 100 °C, whose entropy is s_l + (h_g − h_l) / T.
        let vapor = Steam::saturated_at_temperature(celsius(99.9)).unwrap();
        let h_g = vapor.specific_enthalpy();
        if let Ok(done) = humidify::steam(&entering, flow(steam), h_g) {
            let left = done.leaving.air();
            let s_g = steam_entropy(99.9, h_g.joules_per_kilogram());
            let fog = left.liquid().kilograms_per_kilogram();
            let of_fog = if fog > 0.0 { fog * liquid_entropy(left.air().dry_bulb().celsius(), basis) } else { 0.0 };
            let made = entropy(&left.air()) + of_fog - entropy(&entering.air()) - steam * s_g;
            note(3, made / steam);
            prop_assert!(made / steam > -0.5, "steam {made}");
        }
        Ok(())
    });
    println!("least entropy made by washer, direct, indirect [W/K], steam [J/(K kg)]: {:?}", least.get());
}

/// At the pressure of saturation, here near enough that of the air, liquid and vapor have one potential.
fn steam_entropy(t: f64, vapor_enthalpy: f64) -> f64 {
    let basis = Basis::real_gas(Pressure::from_pascals(108_000.0));
    liquid_entropy(t, basis) + (vapor_enthalpy - water_enthalpy(t, basis)) / (t + 273.15)
}
