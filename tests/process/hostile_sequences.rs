//! Any bits in any argument of any step of a chain, and in what is looked for.

use crate::checks::Random;
use crate::hostile::{Seen, any_air, finite, number, outlet};
use crate::support::*;
use moistair_core::process::coil::{Arrangement, CoilSurface, CoilWater, CondensateTemperature, Coolant};
use moistair_core::process::desiccant::{CarryOver, Sorption};
use moistair_core::process::evaporative::{DirectCooler, IndirectCooler, IndirectEffectiveness, WaterTreatment};
use moistair_core::process::humidify::{EvaporatingWater, Washer};
use moistair_core::process::room::{MoistureSource, RoomGains};
use moistair_core::process::{AirStream, WetStream};
use moistair_core::sequence::{EVALUATION_CAP, Free, SequenceError, Step, StepResult, Target, Total, run, solve};
use moistair_core::*;

/// A number of any bits, or one that may do.
fn often(random: &mut Random, likely: f64) -> f64 {
    if random.bits().is_multiple_of(3) { number(random) } else { likely * random.between(0.9, 1.1) }
}

fn any_step(random: &mut Random, basis: Basis) -> Step {
    let condensate = match random.bits() % 3 {
        0 => CondensateTemperature::LeavingAir,
        1 => CondensateTemperature::Apparatus,
        _ => CondensateTemperature::Given(celsius(often(random, 10.0))),
    };
    let air = any_air(random);
    let air = MoistAir::restore(air.dry_bulb(), air.humidity_ratio(), basis).unwrap_or(air);
    let wet = AirWithCondensate::new(air, ratio(often(random, 1e-3)), ratio(0.0)).unwrap_or(air.into());
    let beside = AirStream::new(air, flow(often(random, 1.0))).unwrap_or(stream(air, 1.0));
    let kind = random.bits() % NAMES.len() as u64;
    let mut x = |likely| often(random, likely);
    let sorption = |x: &mut dyn FnMut(f64) -> f64| Sorption {
        heat_ratio: x(1.1),
        carry_over: match x(1.0).to_bits() % 3 {
            0 => CarryOver::None,
            1 => CarryOver::Heat(HeatFlow::from_watts(x(1e3))),
            _ => CarryOver::Rise(TemperatureDifference::from_kelvins(x(4.0))),
        },
    };
    match kind {
        15 => Step::DirectCooler(DirectCooler {
            saturation_effectiveness: x(0.8),
            circulating: flow(x(1.0)),
            pump_heat: HeatFlow::from_watts(x(100.0)),
            make_up: EvaporatingWater::Given(celsius(x(15.0))),
            treatment: WaterTreatment { drift_fraction: x(1e-4), cycles_of_concentration: x(3.0) },
        }),
        16 => Step::Wash(Washer {
            water: flow(x(1.0)),
            temperature: celsius(x(20.0)),
            effectiveness: x(0.8),
            pump_heat: HeatFlow::from_watts(x(100.0)),
            carry_over_fraction: x(1e-4),
        }),
        17 => Step::IndirectCooler {
            secondary: beside,
            cooler: IndirectCooler {
                effectiveness: match x(1.0).to_bits() % 2 {
                    0 => IndirectEffectiveness::OfWetBulb(x(0.6)),
                    _ => IndirectEffectiveness::OfDewPoint(x(0.4)),
                },
                exhaust_humidity: RelativeHumidity::from_fraction(x(0.9)),
                pump_heat: HeatFlow::from_watts(x(100.0)),
                water: EvaporatingWater::AtWetBulb,
            },
        },
        18 => Step::Room(RoomGains {
            sensible: HeatFlow::from_watts(x(5e3)),
            moisture: flow(x(1e-3)),
            source: match x(1.0).to_bits() % 3 {
                0 => MoistureSource::SaturatedVapor(celsius(x(32.0))),
                1 => MoistureSource::Enthalpy(joules(x(2.5e6))),
                _ => MoistureSource::Liquid(celsius(x(20.0))),
            },
        }),
        19 => Step::DesiccantToHumidityRatio { target: ratio(x(0.004)), sorption: sorption(&mut x) },
        20 => {
            Step::DesiccantByEffectiveness { effectiveness: x(0.5), driest: ratio(x(1e-4)), sorption: sorption(&mut x) }
        }
        0 => Step::ToTemperature(celsius(x(30.0))),
        1 => Step::WithHeat(HeatFlow::from_watts(x(1e3))),
        2 => Step::CoilToState { leaving: air, condensate },
        3 => {
            let relative_humidity = RelativeHumidity::from_fraction(x(0.9));
            Step::CoilToTemperature { leaving: celsius(x(10.0)), relative_humidity, condensate }
        }
        4 => Step::CoilByBypassFactor { apparatus_dew_point: celsius(x(8.0)), bypass_factor: x(0.1), condensate },
        5 => {
            let coolant = match x(1.0).to_bits() % 2 {
                0 => Coolant::Water,
                _ => Coolant::Brine(SpecificHeat::from_joules_per_kilogram_kelvin(x(3e3))),
            };
            let surface = CoilSurface {
                air_side: Conductance::from_watts_per_kelvin(x(2e3)),
                water_side: Conductance::from_watts_per_kelvin(x(2e3)),
                arrangement: Arrangement::Counterflow,
            };
            let water = CoilWater { flow: flow(x(1.0)), entering: celsius(x(8.0)), coolant };
            Step::CoilWithWater { surface, water, condensate }
        }
        6 => Step::CoilWithReheat { target: air, coil_leaving: RelativeHumidity::from_fraction(x(0.9)), condensate },
        7 => Step::Steam { flow: flow(x(1e-3)), enthalpy: joules(x(2.7e6)) },
        8 => Step::SteamToHumidityRatio { target: ratio(x(0.02)), enthalpy: joules(x(2.7e6)) },
        9 => {
            let target = RelativeHumidity::from_fraction(x(0.9));
            Step::SteamToRelativeHumidity { target, enthalpy: joules(x(2.7e6)) }
        }
        10 => Step::Spray { flow: flow(x(1e-3)), temperature: celsius(x(15.0)) },
        11 => Step::Evaporative { saturation_effectiveness: x(0.8), water: EvaporatingWater::Given(celsius(x(15.0))) },
        12 => Step::Mix(WetStream::new(wet, flow(x(1.0))).unwrap_or(stream(air, 1.0).into())),
        13 => Step::Eliminate,
        _ => Step::Compress { pressure: Pressure::from_pascals(x(1e5)), leaving: celsius(x(40.0)) },
    }
}

fn sound_chain(total: &Total, results: &[Option<StepResult>]) {
    outlet(&total.leaving, &total.exchange);
    // Subnormal flows have no digits left to close with.
    let normal = |stream: &WetStream| stream.dry_air_flow().kilograms_per_second() > 1e-290;
    assert!(total.books.close() || !normal(&total.leaving), "{total:?}");
    for result in results.iter().flatten() {
        outlet(&result.leaving, &result.exchange);
        assert!(result.books.close() || !normal(&result.entering), "{result:?}");
        let loads = result.loads;
        let heats = [loads.heating, loads.cooling, loads.sensible_cooling, loads.latent_cooling, loads.recovered];
        let works = [loads.gains, loads.water_heat, loads.fan_work, loads.fan_power, loads.compression];
        let waters = [loads.condensate, loads.steam, loads.humidifying_water, loads.moisture_gain];
        let others = [loads.recovered_water, loads.secondary_water, loads.mixed_in];
        finite(&heats.map(HeatFlow::watts));
        finite(&works.map(HeatFlow::watts));
        finite(&waters.map(MassFlow::kilograms_per_second));
        finite(&others.map(MassFlow::kilograms_per_second));
    }
}

#[test]
fn no_argument_breaks_a_chain() {
    let mut random = Random(12);
    let mut seen = Seen::default();
    let mut most = 0;
    let cases = std::env::var("MOISTAIR_CASES").map_or(2_000, |cases| cases.parse().unwrap());
    for _ in 0..cases {
        let air = any_air(&mut random);
        let carried = AirWithCondensate::new(air, ratio(often(&mut random, 1e-3)), ratio(0.0));
        let wet = if random.bits().is_multiple_of(4) { carried.unwrap_or(air.into()) } else { air.into() };
        let entering = WetStream::new(wet, flow(often(&mut random, 1.0))).unwrap_or(stream(air, 1.0).into());
        let mut steps: [Step; 4] = core::array::from_fn(|_| any_step(&mut random, air.basis()));
        let mut results = [None; 4];
        let length = 1 + (random.bits() % 4) as usize;
        let steps = &mut steps[..length];
        let names: Vec<_> = steps.iter().map(|step| format!("{step:?}")).collect();
        let step_of = |error: SequenceError| {
            assert!(error.step < length && !error.to_string().is_empty());
            error.error
        };
        for (step, name) in steps.iter().zip(&names) {
            let name = name.split(['(', ' ']).next().unwrap();
            let alone = run(&entering, &[*step], &mut results);
            seen.take(NAMES.iter().find(|known| **known == name).unwrap(), alone.map_err(step_of), |total| {
                sound_chain(total, &results);
            });
        }
        let total = run(&entering, steps, &mut results);
        seen.take("chain", total.map_err(step_of), |total| sound_chain(total, &results));
        let index = |random: &mut Random| match random.bits() % 8 {
            0 => random.bits() as usize,
            _ => (random.bits() % 4) as usize,
        };
        let quantity = |random: &mut Random| Quantity::ALL[(random.bits() % Quantity::ALL.len() as u64) as usize];
        let place = (random.bits() % length as u64) as usize;
        let own = |quantity: &&Quantity| steps[place].with_number(**quantity, 1.0).is_ok();
        let own: Vec<_> = Quantity::ALL.iter().filter(own).collect();
        let free_number = match own[..] {
            [] => quantity(&mut random),
            _ if random.bits().is_multiple_of(8) => quantity(&mut random),
            _ => *own[(random.bits() % own.len() as u64) as usize],
        };
        let (least, most_of_it) = air.formulation().limits(free_number);
        let mut end = |limit: f64| {
            if random.bits().is_multiple_of(3) { limit } else { often(&mut random, limit.clamp(0.0, 30.0)) }
        };
        let (low, high) = (end(least), end(most_of_it));
        let free = Free {
            step: if random.bits().is_multiple_of(16) { index(&mut random) } else { place },
            number: free_number,
            low,
            high,
        };
        let after = index(&mut random);
        let target = Target {
            after: (random.bits() & 1 == 0).then_some(if random.bits().is_multiple_of(16) {
                after
            } else {
                length - 1
            }),
            quantity: match random.bits() % 4 {
                0 => Quantity::DryBulb,
                1 => quantity(&mut random),
                _ => Quantity::ALL[(random.bits() % 35) as usize],
            },
            value: often(&mut random, 15.0),
        };
        let solved = solve(&entering, steps, &mut results, free, target).map_err(|error| error.error);
        seen.take("solve", solved, |solved| {
            sound_chain(&solved.total, &results);
            finite(&[solved.number, solved.reached, solved.low.number, solved.high.number, solved.high.reached]);
            assert!(!solved.residual.is_nan());
            most = most.max(solved.evaluations);
        });
        let made = steps[0].with_number(quantity(&mut random), number(&mut random));
        seen.take("number of a step", made, |_| ());
    }
    println!("most evaluations of a solve: {most} of {EVALUATION_CAP}");
    assert!(most <= EVALUATION_CAP);
    seen.report();
}

const NAMES: [&str; 21] = [
    "ToTemperature",
    "WithHeat",
    "CoilToState",
    "CoilToTemperature",
    "CoilByBypassFactor",
    "CoilWithWater",
    "CoilWithReheat",
    "Steam",
    "SteamToHumidityRatio",
    "SteamToRelativeHumidity",
    "Spray",
    "Evaporative",
    "Mix",
    "Eliminate",
    "Compress",
    "DirectCooler",
    "Wash",
    "IndirectCooler",
    "Room",
    "DesiccantToHumidityRatio",
    "DesiccantByEffectiveness",
];
