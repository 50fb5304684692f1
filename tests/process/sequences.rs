//! Chains of processes: the bits of the single calls, books over random chains, numbers solved for, any bits in any argument.

use crate::checks::Random;
use crate::support::*;
use moistair_core::process::coil::{
    self, Arrangement, CoilRegime, CoilSurface, CoilWater, CondensateTemperature, Coolant,
};
use moistair_core::process::desiccant::{self, CarryOver, Sorption};
use moistair_core::process::evaporative::{self, DirectCooler, IndirectCooler, IndirectEffectiveness, WaterTreatment};
use moistair_core::process::humidify::{self, EvaporatingWater, Washer};
use moistair_core::process::room::{self, MoistureSource, RoomGains};
use moistair_core::process::{AirStream, Exchange, WetStream, compression, mixing, reheat, sensible};
use moistair_core::sequence::{
    EVALUATION_CAP, Free, Loads, SequenceError, SolveStatus, Step, StepResult, Target, run, solve,
};
use moistair_core::*;

const LEAVING: CondensateTemperature = CondensateTemperature::LeavingAir;

fn cases() -> u32 {
    std::env::var("MOISTAIR_CASES").map_or(500, |cases| cases.parse().unwrap())
}

fn percent(humidity: f64) -> RelativeHumidity {
    RelativeHumidity::from_percent(humidity)
}

fn watts(heat: f64) -> HeatFlow {
    HeatFlow::from_watts(heat)
}

fn same_stream(a: &WetStream, b: &WetStream) -> bool {
    let bits = |stream: &WetStream| {
        [
            stream.air().liquid().kilograms_per_kilogram(),
            stream.air().ice().kilograms_per_kilogram(),
            stream.dry_air_flow().kilograms_per_second(),
        ]
        .map(f64::to_bits)
    };
    bits(a) == bits(b) && same_bits(&a.air().air(), &b.air().air())
}

/// What each step says of itself stands beside the call of its own.
fn assert_same(result: &StepResult, entering: &WetStream, leaving: &WetStream, exchange: &Exchange) {
    assert!(same_stream(&result.entering, entering) && same_stream(&result.leaving, leaving));
    assert_eq!(result.exchange, *exchange);
    assert!(result.books.close());
}

const GAINS: RoomGains = RoomGains {
    sensible: HeatFlow::from_watts(14_000.0),
    moisture: MassFlow::from_kilograms_per_second(0.0022),
    source: MoistureSource::SaturatedVapor(Temperature::from_celsius(32.0)),
};

/// Outdoor air to return air, cooled, through a heater, and through the room that gives it heat and water.
#[test]
fn summer_chain_is_the_single_calls() {
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let (outdoor, back) = (stream(at(33.0, 0.45, site), 0.6), stream(at(24.5, 0.5, site), 1.4));
        let steps = [
            Step::Mix(back.into()),
            Step::CoilByBypassFactor { apparatus_dew_point: celsius(9.0), bypass_factor: 0.1, condensate: LEAVING },
            Step::WithHeat(watts(1_500.0)),
            Step::Room(GAINS),
        ];
        let mut results = [None; 4];
        let total = run(&outdoor.into(), &steps, &mut results).unwrap();
        let [mixed, cooled, heated, left] = results.map(Option::unwrap);

        let mixture = mixing::adiabatic(&[outdoor.into(), back.into()]).unwrap();
        assert_same(&mixed, &outdoor.into(), &mixture.leaving, &mixture.exchange);
        let mixture = mixture.leaving.without_condensate();
        let coil = coil::by_bypass_factor(&mixture, celsius(9.0), 0.1, LEAVING).unwrap();
        assert_same(&cooled, &mixture.into(), &coil.leaving.into(), &coil.exchange);
        assert_eq!(cooled.regime, Some(CoilRegime::Wet));
        assert!(!cooled.frost && !total.frost && !total.condenses);
        let heater = sensible::with_heat(&coil.leaving, watts(1_500.0)).unwrap();
        assert_same(&heated, &coil.leaving.into(), &heater.leaving.into(), &heater.exchange);
        let room = room::room_of_supply(&heater.leaving, &GAINS).unwrap();
        assert_same(&left, &heater.leaving.into(), &room.room, &room.exchange);

        assert!(same_stream(&total.leaving, &room.room) && total.books.close());
        let loads = Loads {
            heating: watts(1_500.0),
            cooling: coil.cooling_load,
            sensible_cooling: coil.sensible,
            latent_cooling: coil.latent,
            gains: watts(14_000.0),
            condensate: coil.condensate,
            moisture_gain: flow(0.0022),
            mixed_in: flow(1.4),
            ..Loads::none()
        };
        assert_eq!(total.loads, loads);
        // Without room for results, and with more than needed.
        assert_eq!(run(&outdoor.into(), &steps, &mut []).unwrap(), total);
        let mut more = [results[0]; 7];
        assert_eq!(run(&outdoor.into(), &steps, &mut more).unwrap(), total);
        assert!(more[..4] == results && more[4..].iter().all(Option::is_none));
    }
}

/// Every other step beside the call of its own.
#[test]
fn steps_are_the_single_calls() {
    let site = sea_level(Formulation::RealGas);
    let conductance = Conductance::from_watts_per_kelvin;
    let (dry, room_air) = (stream(at(32.0, 0.3, site), 1.2), stream(at(24.0, 0.5, site), 1.0));
    let condensate = CondensateTemperature::Given(celsius(11.0));
    let enthalpy = joules(2.68e6);
    let humid = |done: humidify::Humidified| (done.leaving, done.exchange);
    let cooled = |done: coil::Cooling| (done.leaving.into(), done.exchange);

    let target = at(14.0, 0.9, site);
    let moist = stream(at(28.0, 0.6, site), 1.2);
    let surface =
        CoilSurface { air_side: conductance(2e3), water_side: conductance(3e3), arrangement: Arrangement::Counterflow };
    let water = CoilWater { flow: flow(0.8), entering: celsius(6.0), coolant: Coolant::Water };
    let reheated = reheat::to_state(&moist, &target, percent(93.0), condensate).unwrap();
    let cooler = DirectCooler {
        saturation_effectiveness: 0.85,
        circulating: flow(0.9),
        pump_heat: watts(200.0),
        make_up: EvaporatingWater::Given(celsius(15.0)),
        treatment: WaterTreatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 },
    };
    let washer = |t| Washer {
        water: flow(2.0),
        temperature: celsius(t),
        effectiveness: 0.8,
        pump_heat: watts(900.0),
        carry_over_fraction: 1e-4,
    };
    let indirect = IndirectCooler {
        effectiveness: IndirectEffectiveness::OfWetBulb(0.65),
        exhaust_humidity: percent(95.0),
        pump_heat: watts(150.0),
        water: EvaporatingWater::AtWetBulb,
    };
    let gel = Sorption { heat_ratio: 1.1, carry_over: CarryOver::Rise(TemperatureDifference::from_kelvins(4.0)) };
    let beside = evaporative::indirect(&dry, &room_air, indirect).unwrap();
    let sorbed = |done: desiccant::Sorbed| (done.leaving.into(), done.exchange);
    let compressed = compression::to_pressure(&moist.into(), Pressure::from_kilopascals(300.0), celsius(30.0)).unwrap();
    let with_water = coil::with_water(&moist, surface, water, condensate).unwrap().air;
    let spray = humidify::spray(&dry, flow(2e-3), celsius(15.0)).unwrap();
    let media = humidify::evaporative(&dry, 0.8, EvaporatingWater::AtWetBulb).unwrap();
    let by_steam = humidify::steam_to_humidity_ratio(&dry, ratio(0.013), enthalpy).unwrap();
    let (wet, chilled) = (humidify::wash(&dry, washer(30.0)).unwrap(), humidify::wash(&moist, washer(7.0)).unwrap());
    let drier = desiccant::to_humidity_ratio(&moist, ratio(0.006), gel).unwrap();
    let half = desiccant::by_effectiveness(&moist, 0.5, ratio(0.001), gel).unwrap();
    let both =
        Exchange { heat: reheated.cooling.exchange.heat + reheated.heating.exchange.heat, ..reheated.cooling.exchange };
    let each: [(AirStream, Step, (WetStream, Exchange)); 15] = [
        (
            moist,
            Step::CoilToState { leaving: target, condensate },
            cooled(coil::to_state(&moist, &target, condensate).unwrap()),
        ),
        (moist, Step::CoilWithWater { surface, water, condensate }, cooled(with_water)),
        (
            moist,
            Step::CoilWithReheat { target, coil_leaving: percent(93.0), condensate },
            (reheated.heating.leaving.into(), both),
        ),
        (dry, Step::Steam { flow: flow(1e-3), enthalpy }, humid(humidify::steam(&dry, flow(1e-3), enthalpy).unwrap())),
        (dry, Step::SteamToHumidityRatio { target: ratio(0.013), enthalpy }, humid(by_steam)),
        (dry, Step::Spray { flow: flow(2e-3), temperature: celsius(15.0) }, humid(spray)),
        (dry, Step::Evaporative { saturation_effectiveness: 0.8, water: EvaporatingWater::AtWetBulb }, humid(media)),
        (dry, Step::DirectCooler(cooler), humid(evaporative::direct(&dry, cooler).unwrap().air)),
        (dry, Step::Wash(washer(30.0)), humid(wet.air)),
        (moist, Step::Wash(washer(7.0)), humid(chilled.air)),
        (
            moist,
            Step::Compress { pressure: Pressure::from_kilopascals(300.0), leaving: celsius(30.0) },
            (compressed.leaving, compressed.exchange),
        ),
        (
            dry,
            Step::IndirectCooler { secondary: room_air, cooler: indirect },
            (beside.primary.into(), beside.primary_exchange),
        ),
        (moist, Step::DesiccantToHumidityRatio { target: ratio(0.006), sorption: gel }, sorbed(drier)),
        (
            moist,
            Step::DesiccantByEffectiveness { effectiveness: 0.5, driest: ratio(0.001), sorption: gel },
            sorbed(half),
        ),
        (dry, Step::Room(GAINS), {
            let done = room::room_of_supply(&dry, &GAINS).unwrap();
            (done.room, done.exchange)
        }),
    ];
    for (entering, step, (leaving, exchange)) in each {
        let mut results = [None];
        let total = run(&entering.into(), &[step], &mut results).unwrap();
        assert_same(&results[0].unwrap(), &entering.into(), &leaving, &exchange);
        assert!(total.books.close() && !total.frost, "{step:?}");
    }
    let loads = |step| run(&dry.into(), &[step], &mut []).unwrap().loads;
    let secondary = loads(Step::IndirectCooler { secondary: room_air, cooler: indirect });
    assert_eq!(secondary.secondary_water, beside.secondary.evaporated);
    assert_eq!(chilled.moistening, humidify::Moistening::Dehumidifies);
}

/// What the processes warn of arrives.
#[test]
fn cautions_are_carried_along() {
    let site = sea_level(Formulation::RealGas);
    let frosting =
        Step::CoilByBypassFactor { apparatus_dew_point: celsius(-8.0), bypass_factor: 0.1, condensate: LEAVING };
    let exhaust = stream(at(22.0, 0.45, site), 1.0);
    let total = run(&exhaust.into(), &[frosting, Step::WithHeat(watts(100.0))], &mut []).unwrap();
    assert!(total.frost && !total.condenses);
    let cooler = IndirectCooler {
        effectiveness: IndirectEffectiveness::OfWetBulb(0.9),
        exhaust_humidity: percent(95.0),
        pump_heat: watts(0.0),
        water: EvaporatingWater::AtWetBulb,
    };
    let tropical = stream(at(33.0, 0.85, site), 1.0);
    let total = run(&tropical.into(), &[Step::IndirectCooler { secondary: exhaust, cooler }], &mut []).unwrap();
    assert!(total.condenses && !total.frost && total.loads.condensate.kilograms_per_second() > 0.0);
}

/// Outdoor air mixed with return air, preheated, humidified by steam, heated.
#[test]
fn winter_chain_is_the_single_calls() {
    for &formulation in Formulation::ALL {
        let site = sea_level(formulation);
        let (outdoor, back) = (stream(at(-15.0, 0.8, site), 1.2), stream(at(21.0, 0.35, site), 0.8));
        let steam = humidify::saturated_steam_enthalpy(celsius(105.0)).unwrap();
        let steps = [
            Step::Mix(back.into()),
            Step::ToTemperature(celsius(12.0)),
            Step::SteamToRelativeHumidity { target: percent(60.0), enthalpy: steam },
            Step::ToTemperature(celsius(24.0)),
        ];
        let mut results = [None; 4];
        let total = run(&outdoor.into(), &steps, &mut results).unwrap();
        let [_, first, humidified, second] = results.map(Option::unwrap);
        let mixture = mixing::adiabatic(&[outdoor.into(), back.into()]).unwrap().leaving.without_condensate();
        let preheater = sensible::to_temperature(&mixture, celsius(12.0)).unwrap();
        assert_same(&first, &mixture.into(), &preheater.leaving.into(), &preheater.exchange);
        let moist = humidify::steam_to_relative_humidity(&preheater.leaving, percent(60.0), steam).unwrap();
        assert_same(&humidified, &preheater.leaving.into(), &moist.leaving, &moist.exchange);
        let heater = sensible::to_temperature(&moist.leaving.without_condensate(), celsius(24.0)).unwrap();
        assert_same(&second, &moist.leaving, &heater.leaving.into(), &heater.exchange);
        let heat = preheater.exchange.heat + heater.exchange.heat;
        assert_eq!(
            total.loads,
            Loads { heating: heat, steam: moist.exchange.water, mixed_in: flow(0.8), ..Loads::none() }
        );
        assert!(total.books.close());
    }
}

/// What steps do with droplets: mixing keeps them, heating evaporates them, a coil refuses them, an eliminator drains them.
#[test]
fn droplets_between_steps() {
    let site = sea_level(Formulation::RealGas);
    let (warm, cold) = (stream(at(30.0, 0.9, site), 1.0), stream(at(-10.0, 0.8, site), 1.0));
    let fog = Step::Mix(cold.into());
    let coil = Step::CoilByBypassFactor { apparatus_dew_point: celsius(5.0), bypass_factor: 0.1, condensate: LEAVING };
    let refused = run(&warm.into(), &[fog, coil], &mut [None; 2]).unwrap_err();
    assert_eq!(refused, SequenceError { step: 1, error: Error::CarriesCondensate });
    assert_eq!(refused.error.code(), 211);
    assert!(refused.to_string().starts_with("step 1") && refused.error.quantity().is_none());

    let mut results = [None; 3];
    let total = run(&warm.into(), &[fog, Step::Eliminate, coil], &mut results).unwrap();
    let [mixed, drained, _] = results.map(Option::unwrap);
    assert!(mixed.leaving.air().is_wet() && !drained.leaving.air().is_wet());
    assert!(same_bits(&mixed.leaving.air().air(), &drained.leaving.air().air()));
    let carried = 2.0 * mixed.leaving.air().liquid().kilograms_per_kilogram();
    assert_eq!(drained.loads.condensate, flow(carried));
    assert!(drained.books.close() && total.books.close());

    // A little heat evaporates a part of the fog, more all of it; the water stays.
    for (step, wet) in [
        (Step::WithHeat(watts(2_000.0)), true),
        (Step::WithHeat(watts(30_000.0)), false),
        (Step::ToTemperature(celsius(16.0)), true),
        (Step::ToTemperature(celsius(30.0)), false),
        (Step::WithHeat(watts(-3_000.0)), true),
        (Step::WithHeat(watts(0.0)), true),
    ] {
        let mut results = [None; 2];
        let total = run(&warm.into(), &[fog, step], &mut results).unwrap();
        let [mixed, heated] = results.map(Option::unwrap);
        assert_eq!(total.leaving.air().is_wet(), wet, "{step:?}");
        let water = |stream: &WetStream| stream.air().total_water().kilograms_per_kilogram();
        assert!((water(&mixed.leaving) - water(&heated.leaving)).abs() < 1e-17);
        assert!(heated.books.close() && total.books.close());
    }
    // Cooling fog to a temperature would need a surface on which it drains.
    let cooled = run(&warm.into(), &[fog, Step::ToTemperature(celsius(10.0))], &mut []).unwrap_err();
    assert!(matches!(cooled.error, Error::Infeasible { quantity: Quantity::LeavingTemperature, .. }), "{cooled}");
    // Heated far enough, the fog is the unsaturated mixture that it would have been.
    let clear = run(&warm.into(), &[fog, Step::ToTemperature(celsius(30.0))], &mut []).unwrap().leaving;
    let (w, h) = {
        let (a, b) = (numbers(&warm.air()), numbers(&cold.air()));
        (0.5 * (a.1 + b.1), 0.5 * (a.2 + b.2))
    };
    let heat = run(&warm.into(), &[fog, Step::ToTemperature(celsius(30.0))], &mut []).unwrap().loads.heating.watts();
    let (t, found, gained) = numbers(&clear.air().air());
    assert!(t == 30.0 && (found - w).abs() < 1e-16 && (2.0 * (gained - h) - heat).abs() < 1e-8);
}

/// A coil that would leave moister air than enters it stays dry; its two sides meet.
#[test]
fn coil_to_a_temperature() {
    let site = sea_level(Formulation::RealGas);
    let entering = stream(at(26.0, 0.4, site), 1.0);
    let coil =
        |t: f64| Step::CoilToTemperature { leaving: celsius(t), relative_humidity: percent(95.0), condensate: LEAVING };
    let off = |t: f64| {
        let mut results = [None];
        let total = run(&entering.into(), &[coil(t)], &mut results).unwrap();
        assert_eq!(total.exchange, results[0].unwrap().exchange);
        results[0].unwrap()
    };
    let dry = off(18.0);
    assert_eq!(dry.regime, Some(CoilRegime::Dry));
    let heater = sensible::to_temperature(&entering, celsius(18.0)).unwrap();
    assert!(same_stream(&dry.leaving, &heater.leaving.into()));
    assert_eq!(dry.exchange.heat, heater.exchange.heat);
    let wet = off(8.0);
    assert_eq!(wet.regime, Some(CoilRegime::Wet));
    assert!((wet.leaving.air().air().relative_humidity().unwrap().percent() - 95.0).abs() < 1e-12);
    // Where W(t, 95 %) = W₁ the load has no step.
    let (mut low, mut high) = (8.0, 18.0);
    for _ in 0..60 {
        let middle = 0.5 * (low + high);
        if off(middle).regime == Some(CoilRegime::Dry) { high = middle } else { low = middle }
    }
    let step = off(low).loads.cooling.watts() - off(high).loads.cooling.watts();
    assert!(step.abs() < 1e-6, "{step}");
    let warmer = run(&entering.into(), &[coil(27.0)], &mut []).unwrap_err();
    assert!(matches!(warmer.error, Error::Infeasible { quantity: Quantity::LeavingTemperature, .. }));
}

/// How many kinds of step there are.
const KINDS: u64 = 21;

/// Any of the steps, with numbers that often suit the air at hand.
fn likely_step(random: &mut Random, entering: &WetStream) -> Step {
    let air = entering.air().air();
    let (t, w, _) = numbers(&air);
    let per_air = entering.dry_air_flow().kilograms_per_second();
    let basis = air.basis();
    let condensate = match random.bits() % 3 {
        0 => LEAVING,
        1 => CondensateTemperature::Apparatus,
        _ => CondensateTemperature::Given(celsius(random.between(0.0, 30.0))),
    };
    let air_near = |random: &mut Random, t: f64, spread: f64| {
        let t = (t + random.between(-spread, spread)).clamp(-80.0, 150.0);
        air_at(t, random.between(0.0, 1.0), basis)
    };
    let beside = |random: &mut Random| {
        let other = air_near(random, t, 30.0);
        stream(other, per_air * random.between(0.5, 1.5))
    };
    let sorption = |random: &mut Random| Sorption {
        heat_ratio: random.between(0.9, 1.3),
        carry_over: match random.bits() % 3 {
            0 => CarryOver::None,
            1 => CarryOver::Heat(watts(per_air * random.between(0.0, 5e3))),
            _ => CarryOver::Rise(TemperatureDifference::from_kelvins(random.between(0.0, 6.0))),
        },
    };
    match random.bits() % KINDS {
        15 => Step::DirectCooler(DirectCooler {
            saturation_effectiveness: random.between(0.0, 1.0),
            circulating: flow(per_air * random.between(0.3, 2.0)),
            pump_heat: watts(per_air * random.between(0.0, 300.0)),
            make_up: if random.bits() & 1 == 0 {
                EvaporatingWater::AtWetBulb
            } else {
                EvaporatingWater::Given(celsius(random.between(2.0, 30.0)))
            },
            treatment: WaterTreatment {
                drift_fraction: random.between(0.0, 1e-3),
                cycles_of_concentration: random.between(2.0, 6.0),
            },
        }),
        16 => Step::Wash(Washer {
            water: flow(per_air * random.between(0.5, 3.0)),
            temperature: celsius(random.between(2.0, 50.0)),
            effectiveness: random.between(0.0, 1.0),
            pump_heat: watts(per_air * random.between(0.0, 300.0)),
            carry_over_fraction: random.between(0.0, 1e-3),
        }),
        17 => Step::IndirectCooler {
            secondary: beside(random),
            cooler: IndirectCooler {
                effectiveness: if random.bits() & 1 == 0 {
                    IndirectEffectiveness::OfWetBulb(random.between(0.0, 1.0))
                } else {
                    IndirectEffectiveness::OfDewPoint(random.between(0.0, 0.8))
                },
                exhaust_humidity: percent(random.between(80.0, 100.0)),
                pump_heat: watts(per_air * random.between(0.0, 300.0)),
                water: EvaporatingWater::AtWetBulb,
            },
        },
        18 => Step::Room(RoomGains {
            sensible: watts(per_air * random.between(-1e4, 1.5e4)),
            moisture: flow(per_air * random.between(-5e-4, 3e-3)),
            source: match random.bits() % 3 {
                0 => MoistureSource::SaturatedVapor(celsius(random.between(25.0, 40.0))),
                1 => MoistureSource::Enthalpy(joules(random.between(0.0, 2.7e6))),
                _ => MoistureSource::Liquid(celsius(random.between(5.0, 40.0))),
            },
        }),
        19 => {
            Step::DesiccantToHumidityRatio { target: ratio(w * random.between(0.3, 1.1)), sorption: sorption(random) }
        }
        20 => Step::DesiccantByEffectiveness {
            effectiveness: random.between(0.0, 0.9),
            driest: ratio(w * random.between(0.0, 0.5)),
            sorption: sorption(random),
        },
        0 => Step::ToTemperature(celsius(t + random.between(-10.0, 40.0))),
        1 => Step::WithHeat(watts(per_air * random.between(-1e4, 4e4))),
        2 => Step::CoilToState { leaving: air_near(random, t - 10.0, 10.0), condensate },
        3 => Step::CoilToTemperature {
            leaving: celsius(t - random.between(0.0, 25.0)),
            relative_humidity: percent(random.between(80.0, 100.0)),
            condensate,
        },
        4 => Step::CoilByBypassFactor {
            apparatus_dew_point: celsius((t - random.between(0.0, 40.0)).max(-40.0)),
            bypass_factor: random.between(0.0, 1.0),
            condensate,
        },
        5 => Step::CoilWithWater {
            surface: CoilSurface {
                air_side: Conductance::from_watts_per_kelvin(per_air * random.between(0.0, 5e3)),
                water_side: Conductance::from_watts_per_kelvin(per_air * random.between(0.0, 1e4)),
                arrangement: Arrangement::Counterflow,
            },
            water: CoilWater {
                flow: flow(per_air * random.between(0.2, 3.0)),
                entering: celsius(random.between(3.0, 80.0)),
                coolant: if random.bits() & 1 == 0 {
                    Coolant::Water
                } else {
                    Coolant::Brine(SpecificHeat::from_joules_per_kilogram_kelvin(random.between(3e3, 4e3)))
                },
            },
            condensate,
        },
        6 => Step::CoilWithReheat {
            target: air_near(random, t - 5.0, 10.0),
            coil_leaving: percent(random.between(85.0, 100.0)),
            condensate,
        },
        7 => Step::Steam {
            flow: flow(per_air * random.between(0.0, 0.02)),
            enthalpy: joules(random.between(2.4e6, 3.2e6)),
        },
        8 => Step::SteamToHumidityRatio {
            target: ratio(w + random.between(0.0, 0.01)),
            enthalpy: joules(random.between(2.4e6, 3.2e6)),
        },
        9 => Step::SteamToRelativeHumidity {
            target: percent(random.between(20.0, 100.0)),
            enthalpy: joules(random.between(2.4e6, 2.8e6)),
        },
        10 => Step::Spray {
            flow: flow(per_air * random.between(0.0, 0.01)),
            temperature: celsius(random.between(0.0, 90.0)),
        },
        11 => Step::Evaporative {
            saturation_effectiveness: random.between(0.0, 1.0),
            water: if random.bits() & 1 == 0 {
                EvaporatingWater::AtWetBulb
            } else {
                EvaporatingWater::Given(celsius(random.between(0.0, 40.0)))
            },
        },
        12 => Step::Mix(stream(air_near(random, t, 40.0), random.between(0.0, 3.0 * per_air)).into()),
        13 => Step::Eliminate,
        _ => {
            let (low, high) = air.formulation().limits(Quantity::Pressure);
            let pressure = (air.pressure().pascals() * random.between(0.8, 1.4)).clamp(low, high);
            Step::Compress {
                pressure: Pressure::from_pascals(pressure),
                leaving: celsius(t + random.between(-30.0, 60.0)),
            }
        }
    }
}

fn random_stream(random: &mut Random) -> AirStream {
    let formulation = Formulation::ALL[(random.bits() % Formulation::ALL.len() as u64) as usize];
    let (low, high) = formulation.limits(Quantity::Pressure);
    let pressure = match random.bits() % 4 {
        0 => random.between(low.ln(), high.ln()).exp().clamp(low, high),
        _ => random.between(8e4, 1.1e5),
    };
    let basis = Basis::new(Pressure::from_pascals(pressure), formulation);
    let t = if random.bits().is_multiple_of(4) { random.between(-80.0, 150.0) } else { random.between(-20.0, 45.0) };
    stream(air_at(t, random.between(0.0, 1.0), basis), random.between(-9.0, 4.0).exp())
}

/// A chain that runs, of up to seven steps.
fn likely_chain(random: &mut Random) -> (WetStream, Vec<Step>) {
    let entering: WetStream = random_stream(random).into();
    let (mut steps, mut air) = (Vec::new(), entering);
    let length = 1 + random.bits() % 7;
    for _ in 0..40 {
        if steps.len() as u64 >= length {
            break;
        }
        let step = likely_step(random, &air);
        if let Ok(total) = run(&air, &[step], &mut []) {
            air = total.leaving;
            steps.push(step);
        }
    }
    (entering, steps)
}

fn heats_of(loads: &Loads) -> [f64; 10] {
    [
        loads.heating,
        loads.cooling,
        loads.sensible_cooling,
        loads.latent_cooling,
        loads.recovered,
        loads.gains,
        loads.water_heat,
        loads.fan_work,
        loads.fan_power,
        loads.compression,
    ]
    .map(HeatFlow::watts)
}

fn waters_of(loads: &Loads) -> [f64; 7] {
    [
        loads.condensate,
        loads.steam,
        loads.humidifying_water,
        loads.moisture_gain,
        loads.recovered_water,
        loads.secondary_water,
        loads.mixed_in,
    ]
    .map(MassFlow::kilograms_per_second)
}

/// Heat and water of every step, and of the chain from its ends alone; the sums are the sums; cut anywhere it is two chains.
#[test]
fn books_of_random_chains() {
    let mut random = Random(31);
    let (mut worst, mut worst_ends, mut kinds) = ([0.0_f64; 3], [0.0_f64; 3], std::collections::BTreeMap::new());
    let (mut longest, mut cautions) = (0, (0_u32, 0_u32));
    for _ in 0..cases() {
        let (entering, steps) = likely_chain(&mut random);
        let mut results = vec![None; steps.len()];
        let total = run(&entering, &steps, &mut results).unwrap();
        let slot = entering.air().air().formulation().code() as usize;
        let (mut exchange, mut heats, mut waters) = (Exchange::none(), [0.0; 10], [0.0; 7]);
        let (mut before, mut came) = (entering, entering.dry_air_flow());
        for (step, result) in steps.iter().zip(&results) {
            let result = result.unwrap();
            assert!(same_stream(&result.entering, &before));
            sound(&result.leaving).unwrap_or_else(|error| panic!("{error}"));
            assert!(result.books.close(), "{:.2} of the allowance: {step:?}\n{result:?}", share(&result.books));
            worst[slot] = worst[slot].max(share(&result.books));
            let name = format!("{step:?}");
            *kinds.entry(name.split(['(', ' ']).next().unwrap().to_owned()).or_insert(0) += 1;
            exchange = Exchange {
                heat: exchange.heat + result.exchange.heat,
                water: exchange.water + result.exchange.water,
                water_enthalpy_flow: exchange.water_enthalpy_flow + result.exchange.water_enthalpy_flow,
            };
            let each = result.loads;
            heats = core::array::from_fn(|place| heats[place] + heats_of(&each)[place]);
            waters = core::array::from_fn(|place| waters[place] + waters_of(&each)[place]);
            // Into the air by name and by exchange: the same heat and water.
            let [heating, cooling, _, _, recovered, gains, water_heat, fan_work, fan_power, compression] =
                heats_of(&each);
            let by_name = heating - cooling + recovered + gains + water_heat + fan_work + compression;
            let heat = result.exchange.heat.watts();
            assert!((by_name - heat).abs() <= 4.0 * f64::EPSILON * (heating + cooling), "{step:?}");
            let [condensate, steam, humidifying, moisture, recovered, secondary, mixed] = waters_of(&each);
            let by_name = steam + humidifying + moisture + recovered - condensate;
            assert_eq!(by_name, result.exchange.water.kilograms_per_second(), "{step:?}");
            let magnitudes = [heating, cooling, fan_work, fan_power, condensate, steam, humidifying, secondary, mixed];
            assert!(magnitudes.iter().all(|load| *load >= 0.0), "{step:?} {each:?}");
            let loads = each;
            let parts = loads.sensible_cooling.watts() + loads.latent_cooling.watts() - loads.cooling.watts();
            let scale = loads.sensible_cooling.watts().abs() + loads.latent_cooling.watts().abs();
            assert!(parts.abs() <= 4.0 * f64::EPSILON * scale);
            came = came + loads.mixed_in;
            cautions.0 += u32::from(result.frost);
            cautions.1 += u32::from(result.condenses);
            before = result.leaving;
        }
        assert_eq!(total.exchange, exchange);
        assert_eq!((heats_of(&total.loads), waters_of(&total.loads)), (heats, waters));
        assert!(same_stream(&total.leaving, &before));
        let (came, went) = (came.kilograms_per_second(), total.leaving.dry_air_flow().kilograms_per_second());
        assert!((came - went).abs() <= 1e-14 * came);
        assert!(total.books.close(), "{:.2} of the allowance: {steps:#?}", share(&total.books));
        worst_ends[slot] = worst_ends[slot].max(share(&total.books));
        longest = longest.max(steps.len());

        let cut = (random.bits() as usize) % (steps.len() + 1);
        let first = run(&entering, &steps[..cut], &mut []).unwrap();
        let second = run(&first.leaving, &steps[cut..], &mut []).unwrap();
        assert!(same_stream(&second.leaving, &total.leaving));
    }
    println!("chains of up to {longest} steps, {kinds:?}; frost and condensation {cautions:?}");
    assert!(cautions.0 > 0 && cautions.1 > 0);
    println!(
        "books by formulation, of their allowance: steps {worst:.3?}, whole chains from their ends {worst_ends:.3?}"
    );
    assert!(kinds.len() as u64 == KINDS && longest == 7);
}

/// The coil that gives a room its humidity: outdoor and return air, coil, heater, room. Numbers of its own; checked against the room's
/// balance solved by hand, W_s = W_r − ṁ_w / ṁ.
#[test]
fn coil_leaving_temperature_for_a_room() {
    let site = Basis::ideal_gas(Pressure::from_pascals(101_325.0));
    let (outdoor, back) = (stream(at(32.0, 0.5, site), 0.5), stream(at(24.0, 0.5, site), 1.5));
    let coil =
        Step::CoilToTemperature { leaving: celsius(10.0), relative_humidity: percent(95.0), condensate: LEAVING };
    let gains = RoomGains { sensible: watts(15_000.0), moisture: flow(0.003), ..GAINS };
    let mut steps = [Step::Mix(back.into()), coil, Step::WithHeat(watts(500.0)), Step::Room(gains)];
    let mut results = [None; 4];
    let free = Free { step: 1, number: Quantity::LeavingTemperature, low: 5.0, high: 20.0 };
    let wanted = at(24.0, 0.5, site).humidity_ratio().kilograms_per_kilogram();
    let target = Target { after: None, quantity: Quantity::HumidityRatio, value: wanted };
    let found = solve(&outdoor.into(), &mut steps, &mut results, free, target).unwrap();
    assert_eq!((found.status, found.refused), (SolveStatus::Solved, None));
    println!(
        "coil leaves {:.3} °C, residual {:e} kg/kg, {} evaluations",
        found.number, found.residual, found.evaluations
    );
    assert!(found.residual.abs() < 1e-16);
    // W(t, 95 %) = W_r − 0.003 / 2, by the constructor alone.
    let supply = ratio(wanted - 0.003 / 2.0);
    let saturated = WaterMoleFraction::from_fraction(
        MoistAir::from_dry_bulb(celsius(24.0), supply, site).unwrap().value(Quantity::WaterMoleFraction).unwrap()
            / 0.95,
    );
    let dew = MoistAir::from_dry_bulb(celsius(24.0), saturated, site).unwrap().dew_point().unwrap().celsius();
    assert!((found.number - dew).abs() < 1e-9, "{} {dew}", found.number);
    assert_eq!(steps[1], coil.with_number(Quantity::LeavingTemperature, found.number).unwrap());
    assert_eq!(run(&outdoor.into(), &steps, &mut []).unwrap(), found.total);
    assert_eq!(results[3].unwrap().leaving, found.total.leaving);
    assert_eq!(found.total.leaving.air().air().value(Quantity::HumidityRatio).unwrap(), found.reached);

    // The temperature of the same room: the heater's heat, and air of another step.
    let free = Free { step: 2, number: Quantity::HeatFlow, low: 0.0, high: 1e5 };
    let target = Target { after: Some(3), quantity: Quantity::DryBulb, value: 24.0 };
    let warmed = solve(&outdoor.into(), &mut steps, &mut [], free, target).unwrap();
    assert!(warmed.status == SolveStatus::Solved && warmed.residual.abs() < 1e-12, "{warmed:?}");
    assert!((warmed.total.leaving.air().air().relative_humidity().unwrap().percent() - 50.0).abs() < 1e-9);
}

/// ASHRAE Fundamentals 2021 ch. 1, Example 6 (figures from memory): a room at 25 °C and 19 °C wet bulb, 9 kW, 1.5 g/s of vapor saturated at
/// 30 °C (2555.52 kJ/kg), supply air at 15 °C. Recomputed for the handbook's ideal gas: 0.880 kg/s of dry air enter at a wet bulb of
/// 14.02 °C. The supply temperature is found again from the room's, and the room's wet bulb follows.
#[test]
fn supply_temperature_of_the_handbooks_room() {
    let site = Basis::ideal_gas(Pressure::from_pascals(101_325.0));
    let supply = MoistAir::from_dry_bulb(celsius(15.0), WetBulb::from_celsius(14.02), site).unwrap();
    let warm = sensible::to_temperature(&stream(supply, 0.880), celsius(22.0)).unwrap().leaving;
    let mut steps = [
        Step::ToTemperature(celsius(20.0)),
        Step::Room(RoomGains {
            sensible: HeatFlow::from_kilowatts(9.0),
            moisture: flow(0.0015),
            source: MoistureSource::Enthalpy(SpecificEnthalpy::from_kilojoules_per_kilogram(2555.52)),
        }),
    ];
    let free = Free { step: 0, number: Quantity::LeavingTemperature, low: 0.0, high: 30.0 };
    let target = Target { after: None, quantity: Quantity::DryBulb, value: 25.0 };
    let found = solve(&warm.into(), &mut steps, &mut [], free, target).unwrap();
    let wet_bulb = found.total.leaving.air().air().wet_bulb().unwrap().celsius();
    println!("supply {:.4} °C, room wet bulb {wet_bulb:.4} °C", found.number);
    // The flow has three digits: 0.0005 of 0.880 is worth 0.006 K, the supply's wet bulb 0.005 K.
    assert!((found.number - 15.0).abs() < 0.01 && (wet_bulb - 19.0).abs() < 0.015);
}

/// The properties that a number is looked for by, and how finely they can be.
const WANTED: [Quantity; 5] = [
    Quantity::DryBulb,
    Quantity::HumidityRatio,
    Quantity::SpecificEnthalpy,
    Quantity::RelativeHumidity,
    Quantity::WetBulb,
];

/// A number of a step that may be looked for, its value, and a bracket around it.
fn free_number(random: &mut Random, index: usize, step: &Step, formulation: Formulation) -> Option<(Free, f64)> {
    let (number, value) = match step {
        Step::ToTemperature(t) | Step::CoilToTemperature { leaving: t, .. } | Step::Compress { leaving: t, .. } => {
            (Quantity::LeavingTemperature, t.celsius())
        }
        Step::WithHeat(heat) => (Quantity::HeatFlow, heat.watts()),
        Step::CoilByBypassFactor { apparatus_dew_point, bypass_factor, .. } => match random.bits() & 1 {
            0 => (Quantity::ApparatusDewPoint, apparatus_dew_point.celsius()),
            _ => (Quantity::BypassFactor, *bypass_factor),
        },
        Step::CoilWithWater { surface, water, .. } => match random.bits() % 3 {
            0 => (Quantity::Conductance, surface.air_side.watts_per_kelvin()),
            1 => (Quantity::WaterFlow, water.flow.kilograms_per_second()),
            _ if water.coolant == Coolant::Water => (Quantity::WaterTemperature, water.entering.celsius()),
            _ => (Quantity::CoolantTemperature, water.entering.celsius()),
        },
        Step::CoilWithReheat { coil_leaving, .. } => (Quantity::RelativeHumidity, coil_leaving.fraction()),
        Step::Steam { flow, .. } | Step::Spray { flow, .. } => (Quantity::WaterFlow, flow.kilograms_per_second()),
        Step::SteamToHumidityRatio { target, .. } => (Quantity::HumidityRatio, target.kilograms_per_kilogram()),
        Step::SteamToRelativeHumidity { target, .. } => (Quantity::RelativeHumidity, target.fraction()),
        Step::Evaporative { saturation_effectiveness, .. } => {
            (Quantity::SaturationEffectiveness, *saturation_effectiveness)
        }
        Step::Mix(other) => (Quantity::DryAirFlow, other.dry_air_flow().kilograms_per_second()),
        Step::DirectCooler(cooler) => (Quantity::SaturationEffectiveness, cooler.saturation_effectiveness),
        Step::Wash(washer) => (Quantity::WaterTemperature, washer.temperature.celsius()),
        Step::IndirectCooler { cooler, .. } => match cooler.effectiveness {
            IndirectEffectiveness::OfWetBulb(value) | IndirectEffectiveness::OfDewPoint(value) => {
                (Quantity::IndirectEffectiveness, value)
            }
        },
        Step::Room(gains) => match random.bits() & 1 {
            0 => (Quantity::HeatFlow, gains.sensible.watts()),
            _ => (Quantity::MoistureGain, gains.moisture.kilograms_per_second()),
        },
        Step::DesiccantToHumidityRatio { target, .. } => (Quantity::HumidityRatio, target.kilograms_per_kilogram()),
        Step::DesiccantByEffectiveness { effectiveness, .. } => (Quantity::DryingEffectiveness, *effectiveness),
        _ => return None,
    };
    let (least, most) = formulation.limits(number);
    let width = match number.unit() {
        "°C" => 10.0,
        _ => value.abs().max(1e-3),
    };
    let low = (value - width * random.between(0.1, 1.0)).max(least);
    let high = (value + width * random.between(0.1, 1.0)).min(most);
    (low < value && value < high).then_some((Free { step: index, number, low, high }, value))
}

/// A number that is changed and looked for again by what the air had with it.
#[test]
fn solve_finds_a_known_number_again() {
    let mut random = Random(32);
    let (mut solved, mut statuses, mut evaluations) = (0, [0_u32; 4], (0_u64, 0));
    let (mut elsewhere, mut drawn_in, mut worst) = (0, 0, 0.0_f64);
    while solved < cases() {
        let (entering, mut steps) = likely_chain(&mut random);
        if steps.is_empty() {
            continue;
        }
        let index = (random.bits() as usize) % steps.len();
        let formulation = entering.air().air().formulation();
        let Some((free, known)) = free_number(&mut random, index, &steps[index], formulation) else { continue };
        let after = index + (random.bits() as usize) % (steps.len() - index);
        let quantity = WANTED[(random.bits() % 5) as usize];
        let mut results = vec![None; steps.len()];
        assert!(run(&entering, &steps, &mut results).is_ok());
        let reached = |results: &[Option<StepResult>]| results[after].unwrap().leaving.air().air().value(quantity);
        let Ok(value) = reached(&results) else { continue };
        let original = steps.clone();
        let target = Target { after: Some(after), quantity, value };
        // What comes behind may refuse another root than the known one.
        let Ok(found) = solve(&entering, &mut steps, &mut results, free, target) else {
            assert_eq!(steps, original);
            continue;
        };
        let again = run(&entering, &steps, &mut results).unwrap();
        assert_eq!(again, found.total);
        assert_eq!(reached(&results).unwrap().to_bits(), found.reached.to_bits(), "{free:?}");
        assert_eq!(found.residual, found.reached - value);
        assert!(found.evaluations <= EVALUATION_CAP);
        assert!(free.low <= found.low.number && found.low.number <= found.number);
        assert!(found.number <= found.high.number && found.high.number <= free.high);
        statuses[found.status as usize] += 1;
        drawn_in += u32::from(found.refused.is_some());
        let scale = (found.low.reached - value).abs() + (found.high.reached - value).abs();
        match found.status {
            SolveStatus::Solved => {
                solved += 1;
                evaluations = (evaluations.0 + u64::from(found.evaluations), evaluations.1.max(found.evaluations));
                // To the resolution of the property: of a temperature that is ε T.
                let kelvin = if quantity.unit() == "°C" { 300.0 } else { 0.0 };
                let resolution = f64::EPSILON * (value.abs() + kelvin);
                let off = found.residual.abs();
                if off > 64.0 * resolution {
                    worst = worst.max(off / scale);
                }
                // The same number, where the property tells numbers apart; else another with the same property.
                let slope = (found.low.reached - found.high.reached).abs() / (found.high.number - found.low.number);
                let blur = (1e3 * resolution + off) / slope.max(1e-300);
                if (found.number - known).abs() > 1e-9 * known.abs().max(1.0) + 10.0 * blur {
                    elsewhere += 1;
                }
            }
            // The known number lies inside, so that the property has crossed, unless both ends lie on one side: a turning point.
            SolveStatus::NoCrossing => assert!((found.low.reached - value) * (found.high.reached - value) > 0.0),
            SolveStatus::Jump | SolveStatus::Interrupted => {}
        }
    }
    println!(
        "{solved} numbers found again; by status {statuses:?}, {drawn_in} brackets drawn in; {:.1} evaluations on average, {} at most of \
         {EVALUATION_CAP}; worst residual {worst:.1e} of the bracket; {elsewhere} at another crossing",
        evaluations.0 as f64 / f64::from(solved),
        evaluations.1
    );
    assert!(f64::from(statuses[0]) > 0.8 * f64::from(statuses.iter().sum::<u32>()));
    assert!(f64::from(elsewhere) < 0.05 * f64::from(solved));
}

/// Ends on one side, a bracket that must be drawn in at one end, at both, a jump, a failure inside, a chain that runs nowhere.
#[test]
fn statuses_of_a_solve() {
    let site = sea_level(Formulation::RealGas);
    let entering: WetStream = stream(at(26.0, 0.5, site), 1.0).into();
    let coil =
        Step::CoilToTemperature { leaving: celsius(10.0), relative_humidity: percent(95.0), condensate: LEAVING };
    let free = |low, high| Free { step: 0, number: Quantity::LeavingTemperature, low, high };
    let wanted = |quantity, value| Target { after: None, quantity, value };
    let go = |steps: &mut [Step], free, target| solve(&entering, steps, &mut [], free, target);

    let mut steps = [coil];
    let warm = go(&mut steps, free(5.0, 20.0), wanted(Quantity::DryBulb, 22.0)).unwrap();
    assert_eq!((warm.status, warm.number, warm.residual), (SolveStatus::NoCrossing, 20.0, -2.0));
    assert_eq!((warm.low.number, warm.low.reached, warm.high.reached, warm.refused), (5.0, 5.0, 20.0, None));
    assert_eq!(steps, [coil.with_number(Quantity::LeavingTemperature, 20.0).unwrap()]);

    // A coil leaves nothing warmer than what enters: the upper end is drawn in to 26 °C.
    let drawn = go(&mut steps, free(5.0, 90.0), wanted(Quantity::DryBulb, 27.0)).unwrap();
    assert_eq!(drawn.status, SolveStatus::NoCrossing);
    assert!((26.0 - 1e-9..=26.0).contains(&drawn.high.number), "{drawn:?}");
    let refused = drawn.refused.unwrap();
    assert!(matches!(refused.error, Error::Infeasible { quantity: Quantity::LeavingTemperature, .. }));
    let exact = go(&mut steps, free(5.0, 90.0), wanted(Quantity::DryBulb, 12.0)).unwrap();
    assert!(exact.status == SolveStatus::Solved && exact.number == 12.0 && exact.refused.is_some());

    // At neither end: 26 °C is the most, and air below −40 °C has no dew point that would be asked for.
    let dew = wanted(Quantity::DewPoint, 8.0);
    let both = go(&mut steps, free(-79.0, 90.0), dew).unwrap();
    assert_eq!(both.status, SolveStatus::Solved, "{both:?}");
    assert!(both.residual.abs() < 1e-11 && both.low.number > -79.0 && both.high.number < 90.0);
    let neither = go(&mut steps, free(-79.0, 90.0), wanted(Quantity::DewPoint, 60.0)).unwrap();
    assert_eq!(neither.status, SolveStatus::NoCrossing);
    assert!((26.0 - 1e-8..=26.0).contains(&neither.high.number), "{neither:?}");
    // 95 % over ice is a dew point of −40 °C at −36 °C.
    assert!((-37.0..=-35.0).contains(&neither.low.number), "{neither:?}");

    // The wet bulb passes from ice to water with a step of some tenths of a kelvin.
    let cold: WetStream = stream(at(-2.0, 0.3, site), 1.0).into();
    let mut heater = [Step::ToTemperature(celsius(0.0))];
    let over = |t: f64| {
        let done = run(&cold, &[Step::ToTemperature(celsius(t))], &mut []).unwrap();
        done.leaving.air().air().wet_bulb().unwrap().celsius()
    };
    let (mut below, mut above) = (-2.0, 20.0);
    for _ in 0..60 {
        let middle = 0.5 * (below + above);
        if over(middle) < -0.2 { below = middle } else { above = middle }
    }
    let (under, upper) = (over(below), over(above));
    assert!(upper - under > 0.1, "{under} {upper}");
    let jump = solve(&cold, &mut heater, &mut [], free(-2.0, 20.0), wanted(Quantity::WetBulb, 0.5 * (under + upper)));
    let jump = jump.unwrap();
    assert_eq!(jump.status, SolveStatus::Jump);
    assert!((jump.number - below).abs() < 1e-9 && (jump.residual.abs() - 0.5 * (upper - under)).abs() < 1e-6);

    // Between air that stays dry and air that is heated, a fog that the coil behind refuses.
    let cold: WetStream = stream(at(-10.0, 1.0, site), 1.0).into();
    let moist = stream(at(25.0, 0.95, site), 1.0);
    let mut chain = [
        Step::Mix(moist.into()),
        Step::CoilByBypassFactor { apparatus_dew_point: celsius(-30.0), bypass_factor: 0.99, condensate: LEAVING },
    ];
    let mixed = Free { step: 0, number: Quantity::DryAirFlow, low: 0.0, high: 1e5 };
    let interrupted = solve(&cold, &mut chain, &mut [], mixed, wanted(Quantity::DryBulb, 10.0));
    let interrupted = interrupted.unwrap();
    assert_eq!(interrupted.status, SolveStatus::Interrupted, "{interrupted:?}");
    assert_eq!(interrupted.refused, Some(SequenceError { step: 1, error: Error::CarriesCondensate }));
    // The nearest of the values that ran, no further off than the ends.
    let off = [interrupted.low, interrupted.high].map(|end| (end.reached - 10.0).abs());
    assert!(interrupted.residual.abs() <= off[0].min(off[1]) && !interrupted.total.leaving.air().is_wet());

    // Nowhere: the error of the lower end; and the steps are as they were.
    let fog: WetStream = run(&cold, &[Step::Mix(moist.into())], &mut []).unwrap().leaving;
    let mut steps = [coil];
    let nowhere = solve(&fog, &mut steps, &mut [], free(5.0, 20.0), wanted(Quantity::DryBulb, 7.0)).unwrap_err();
    assert_eq!(nowhere, SequenceError { step: 0, error: Error::CarriesCondensate });
    assert_eq!(steps, [coil]);
    // A chain that fails behind the target does so after the number was found; the steps are as they were.
    let mut steps = [coil, Step::ToTemperature(celsius(-30.0))];
    let target = Target { after: Some(0), quantity: Quantity::DryBulb, value: 9.0 };
    assert_eq!(go(&mut steps, free(5.0, 20.0), target).unwrap_err().step, 1);
    assert_eq!(steps[0], coil);
}

/// What a solve refuses, and on which step.
#[test]
fn refused_solves() {
    let site = sea_level(Formulation::IdealGas);
    let entering: WetStream = stream(at(26.0, 0.5, site), 1.0).into();
    let steps = [Step::ToTemperature(celsius(30.0)), Step::Eliminate, Step::WithHeat(watts(1.0))];
    let free = Free { step: 0, number: Quantity::LeavingTemperature, low: 10.0, high: 40.0 };
    let target = Target { after: None, quantity: Quantity::DryBulb, value: 30.0 };
    let refused = |free, target| {
        let mut given = steps;
        let error = solve(&entering, &mut given, &mut [None; 3], free, target).unwrap_err();
        assert_eq!(given, steps);
        (error.step, error.error.code())
    };
    assert_eq!(refused(Free { step: 3, ..free }, target), (3, 102));
    assert_eq!(refused(Free { step: usize::MAX, ..free }, target), (usize::MAX, 102));
    assert_eq!(refused(Free { step: 1, ..free }, target), (1, 102));
    assert_eq!(refused(Free { step: 2, ..free }, target), (2, 102));
    assert_eq!(refused(Free { number: Quantity::HeatFlow, ..free }, target), (0, 102));
    assert_eq!(refused(Free { low: f64::NAN, ..free }, target), (0, 201));
    assert_eq!(refused(Free { high: 200.0, ..free }, target), (0, 202));
    assert_eq!(refused(Free { high: 10.0, ..free }, target), (0, 202));
    assert_eq!(refused(Free { high: 0.0, ..free }, target), (0, 202));
    assert_eq!(refused(free, Target { after: Some(3), ..target }), (3, 102));
    assert_eq!(
        refused(Free { step: 2, number: Quantity::HeatFlow, ..free }, Target { after: Some(1), ..target }),
        (1, 102)
    );
    assert_eq!(refused(free, Target { quantity: Quantity::HeatFlow, ..target }), (2, 102));
    assert_eq!(refused(free, Target { value: f64::INFINITY, ..target }), (2, 201));
    assert!(solve(&entering, &mut [], &mut [], free, target).is_err());
    // What fails before the free step is not looked through.
    let mut chain = [Step::ToTemperature(celsius(-60.0)), Step::WithHeat(watts(1.0))];
    let heat = Free { step: 1, number: Quantity::HeatFlow, low: 0.0, high: 1e3 };
    assert_eq!(solve(&entering, &mut chain, &mut [], heat, target).unwrap_err().step, 0);
    assert_eq!(run(&entering, &[], &mut []).unwrap().leaving, entering);
}

/// Single precision runs the same text: near the double results, as far as seven digits go.
#[test]
fn single_precision() {
    fn results<S: Scalar>(s: fn(f64) -> S) -> Vec<f64> {
        let t = |x: f64| Temperature::from_celsius(s(x));
        let site = Basis::ideal_gas(Pressure::from_pascals(s(101_325.0)));
        let stream = |x: f64, humidity: f64, flow: f64| {
            let air = MoistAir::from_dry_bulb(t(x), RelativeHumidity::from_fraction(s(humidity)), site).unwrap();
            AirStream::new(air, MassFlow::from_kilograms_per_second(s(flow))).unwrap()
        };
        let mut steps = [
            Step::Mix(stream(24.0, 0.5, 1.5).into()),
            Step::CoilToTemperature {
                leaving: t(10.0),
                relative_humidity: RelativeHumidity::from_fraction(s(0.95)),
                condensate: CondensateTemperature::LeavingAir,
            },
            Step::ToTemperature(t(16.0)),
        ];
        let free = Free { step: 1, number: Quantity::LeavingTemperature, low: s(5.0), high: s(20.0) };
        let target = Target { after: None, quantity: Quantity::HumidityRatio, value: s(0.008) };
        let found = solve(&stream(32.0, 0.5, 0.5).into(), &mut steps, &mut [None; 3], free, target).unwrap();
        assert!(found.status == SolveStatus::Solved && found.total.books.close());
        [
            found.number,
            found.total.loads.cooling.watts(),
            found.total.loads.heating.watts(),
            found.total.loads.condensate.kilograms_per_second(),
            found.total.leaving.air().air().value(Quantity::RelativeHumidity).unwrap(),
        ]
        .map(Scalar::to_f64)
        .to_vec()
    }
    let (single, double) = (results::<f32>(|x| x as f32), results::<f64>(|x| x));
    let off: Vec<f64> = single.iter().zip(&double).map(|(a, b)| (a / b - 1.0).abs()).collect();
    println!("single against double precision, relative: {off:.7?}");
    assert!(off.iter().all(|&off| off < 1e-4), "{single:?}\n{double:?}");
}
