//! How much work the searches take, and single precision.

use super::*;
use crate::basis::Formulation;
use crate::checks::Random;
use crate::quantity::{Pressure, RelativeHumidity};
use crate::solve::{ITERATION_CAP, tests::MOST_EVALUATIONS};
use std::println;
use std::vec::Vec;

fn cases(short: u32) -> u32 {
    std::env::var("MOISTAIR_CASES").map_or(short, |cases| cases.parse().unwrap())
}

fn any_room(random: &mut Random, formulation: Formulation) -> MoistAir {
    let (coldest, warmest) = formulation.limits(Quantity::DryBulb);
    let (low, high) = formulation.limits(Quantity::Pressure);
    let celsius = if random.bits() & 1 == 0 { random.between(10.0, 40.0) } else { random.between(coldest, warmest) };
    let pressure = if random.bits() & 1 == 0 { 101_325.0 } else { random.between(low, high) };
    let limit =
        with_mixture!(formulation, f64, M => greatest_humidity_ratio(&M::<f64>::at(celsius), celsius, pressure));
    MoistAir::assemble(celsius, pressure, limit * random.between(0.0, 1.2).min(1.0), formulation)
}

fn any_gains(random: &mut Random) -> RoomGains {
    RoomGains {
        sensible: HeatFlow::from_watts(random.between(-1e4, 3e4)),
        moisture: MassFlow::from_kilograms_per_second(random.between(-2e-3, 8e-3)),
        source: match random.bits() % 3 {
            0 => MoistureSource::SaturatedVapor(Temperature::from_celsius(random.between(0.0, 150.0))),
            1 => MoistureSource::Liquid(Temperature::from_celsius(random.between(0.0, 100.0))),
            _ => MoistureSource::Enthalpy(SpecificEnthalpy::from_joules_per_kilogram(random.between(-4e5, 3.5e6))),
        },
    }
}

/// What the balance of the supply leaves over after some steps, of its terms: at worst, of the supplies that there are.
fn left_over(steps: usize) -> f64 {
    let mut random = Random(21);
    let mut worst = 0.0_f64;
    for _ in 0..cases(20_000) {
        let formulation = Formulation::ALL[(random.bits() % 3) as usize];
        let room = any_room(&mut random, formulation);
        let load = Load::of(&any_gains(&mut random), room.basis()).unwrap();
        let (coldest, warmest) = formulation.limits(Quantity::LeavingTemperature);
        let celsius = (room.dry_bulb().celsius() + random.between(-40.0, 40.0)).max(coldest).min(warmest);
        let (reciprocal, most) = reciprocal_flow(steps, &room, &load, celsius);
        let (enthalpy, ratio) = parts(&room);
        let supplied = ratio - load.water * reciprocal;
        if reciprocal > 0.0 && (0.0..=most).contains(&supplied) {
            let supply = parts(&MoistAir::assemble(celsius, room.pressure().pascals(), supplied, formulation)).0;
            let short = supply - enthalpy + load.total * reciprocal;
            let scale = 3e5 + 2.5e6 * (ratio + supplied) + (load.total * reciprocal).abs();
            worst = worst.max((short / scale).abs());
        }
    }
    println!("supply after {steps} steps leaves over {worst:e}");
    worst
}

#[test]
fn flow_steps_are_enough_and_none_is_idle() {
    const BOUND: f64 = 1e-15;
    assert!(left_over(FLOW_STEPS) <= BOUND);
    assert!(left_over(FLOW_STEPS - 1) > BOUND, "one step fewer does as well: the constant is stale");
}

/// The searches of the limit and of the meetings stay below the published cap.
#[test]
fn evaluations_stay_below_the_cap() {
    let mut random = Random(22);
    let (mut found, mut worst) = ([0_u32; 3], [0_u32; 3]);
    for _ in 0..cases(2_000) {
        let formulation = Formulation::ALL[(random.bits() % 3) as usize];
        let room = any_room(&mut random, formulation);
        let entering = any_room(&mut random, formulation).at_pressure(room.pressure()).unwrap_or(room);
        let gains = any_gains(&mut random);
        let coil = if random.bits() & 1 == 0 {
            CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(random.between(0.8, 1.0)))
        } else {
            let coldest = Temperature::from_celsius(random.between(-40.0, 15.0));
            CoilLeaving::Bypass { factor: random.between(0.0, 0.4), coldest }
        };
        let ratio = random.between(-1.0, 2.0);
        let searches: [&dyn Fn() -> bool; 3] = [
            &|| apparatus_dew_points(&room, ratio).is_ok(),
            &|| limiting_line(&room, &entering, coil).is_ok(),
            &|| least_reheat(&room, &gains, &entering, coil).is_ok(),
        ];
        for ((search, found), worst) in searches.iter().zip(&mut found).zip(&mut worst) {
            MOST_EVALUATIONS.set(0);
            *found += u32::from(search());
            *worst = MOST_EVALUATIONS.get().max(*worst);
        }
    }
    println!(
        "dew points, limits, reheats: {found:?} found, most evaluations of one search, of {ITERATION_CAP}: {worst:?}"
    );
    assert!(found.iter().all(|&found| found > 100));
    assert!(worst.iter().all(|&worst| worst > 0 && worst < ITERATION_CAP));
}

/// The same text in single precision.
#[test]
fn single_precision() {
    fn results<S: Scalar>(formulation: Formulation) -> Vec<f64> {
        let s = |x: f64| k::<S>(x);
        let site = Basis::new(Pressure::from_pascals(s(101_325.0)), formulation);
        let state = |t: f64, humidity: f64| {
            let humidity = RelativeHumidity::from_fraction(s(humidity));
            MoistAir::from_dry_bulb(Temperature::from_celsius(s(t)), humidity, site).unwrap()
        };
        let gains = |kilowatts: f64, grams: f64| RoomGains {
            sensible: HeatFlow::from_kilowatts(s(kilowatts)),
            moisture: MassFlow::from_kilograms_per_second(s(grams * 1e-3)),
            source: MoistureSource::SaturatedVapor(Temperature::from_celsius(s(32.0))),
        };
        let (room, entering) = (state(24.0, 0.5), state(27.0, 0.55));
        let supply = supply_at_temperature(&room, &gains(6.0, 0.9), Temperature::from_celsius(s(14.0))).unwrap().supply;
        let by_flow =
            supply_at_flow(&room, &gains(6.0, 0.9), MassFlow::from_kilograms_per_second(s(0.6))).unwrap().supply;
        let again = room_of_supply(&by_flow, &gains(6.0, 0.9)).unwrap().room.air().air();
        let coil = CoilLeaving::Bypass { factor: s(0.1), coldest: Temperature::from_celsius(s(3.0)) };
        let limit = limiting_line(&room, &entering, coil).unwrap();
        let least = least_reheat(&room, &gains(3.0, 1.5), &entering, coil).unwrap();
        [
            supply.dry_air_flow().kilograms_per_second(),
            supply.air().humidity_ratio().grams_per_kilogram(),
            by_flow.air().dry_bulb().celsius(),
            again.dry_bulb().celsius(),
            apparatus_dew_points(&room, s(0.8)).unwrap().warmer.unwrap().celsius(),
            limit.sensible_heat_ratio,
            least.reheat.kilowatts(),
        ]
        .map(Scalar::to_f64)
        .to_vec()
    }
    for &formulation in Formulation::ALL {
        let (single, double) = (results::<f32>(formulation), results::<f64>(formulation));
        let off: Vec<f64> = single.iter().zip(&double).map(|(a, b)| (a / b - 1.0).abs()).collect();
        println!("{formulation:?}, room, single against double precision, relative: {off:.7?}");
        assert!(off.iter().all(|&off| off < 1e-3), "{single:?}\n{double:?}");
    }
}
