//! Checks that need what the crate keeps to itself: how fine an enthalpy is, how much work a search takes.

use super::*;
use crate::basis::Formulation;
use crate::checks::Random;
use crate::mixture::{Helmholtz, IdealGas, RealGas};
use crate::saturation::Surface;
use std::println;

/// A unit in the last place of 273 K.
const KELVIN_UNIT: f64 = f64::EPSILON * 256.0;

/// How far, in units of ε T c_p, the enthalpy of a formulation strays from a smooth function of temperature, beyond the 8 ε of its
/// sensible and latent parts: no solve for a temperature can be better.
fn roughness<M: Mixture<f64>>() -> f64 {
    let mut random = Random(1);
    let mut worst = 0.0_f64;
    for _ in 0..3_000 {
        let within = |random: &mut Random, quantity| {
            let (low, high) = M::FORMULATION.limits(quantity);
            random.between(low, high)
        };
        let celsius = within(&mut random, Quantity::DryBulb);
        let pressure = within(&mut random, Quantity::Pressure);
        let limit = greatest_humidity_ratio(&M::at(celsius), celsius, pressure);
        let ratio = limit * random.between(0.0, 1.0);
        let first = M::at(celsius).gas(pressure, ratio);
        let kelvins = celsius + 273.15;
        for step in 1..8 {
            let further = celsius + f64::from(step) * KELVIN_UNIT;
            let exact = first.enthalpy + (further - celsius) * first.specific_heat;
            let stray = M::at(further).gas(pressure, ratio).enthalpy - exact;
            let dry = M::at(further).gas(pressure, 0.0).enthalpy;
            let parts = dry.abs() + (first.enthalpy - dry).abs();
            let beyond = stray.abs() - 8.0 * f64::EPSILON * parts;
            worst = worst.max(beyond / (f64::EPSILON * kelvins * first.specific_heat));
        }
    }
    worst
}

#[test]
fn roughness_of_enthalpy() {
    let (real, ideal) = (roughness::<RealGas<f64>>(), roughness::<IdealGas<f64>>());
    let helmholtz = roughness::<Helmholtz<f64>>();
    println!(
        "enthalpy is rough by {real:.2} (real gas), {ideal:.2} (ideal gas), {helmholtz:.2} (Helmholtz) units of ε T c_p"
    );
    let (for_real, for_ideal) = (books::resolution(Formulation::RealGas), books::resolution(Formulation::IdealGas));
    assert!(real <= for_real && real > for_real / 2.0, "the allowance is too small, or stale");
    assert!(ideal <= for_ideal);
    let allowed = books::resolution(Formulation::Helmholtz);
    assert!(helmholtz <= allowed && helmholtz > allowed / 2.0, "the allowance is too small, or stale");
}

/// The enthalpy of condensate, J/kg: rougher than that of air, most of all next to the limit of stability of the supercooled liquid.
#[test]
fn roughness_of_condensate() {
    let mut random = Random(2);
    let ranges = [(Surface::Liquid, -37.0, -20.0), (Surface::Liquid, -20.0, 150.0), (Surface::Ice, -80.0, 0.0)];
    let rough = ranges.map(|(surface, low, high)| {
        let mut worst = 0.0_f64;
        for _ in 0..3_000 {
            let (celsius, pressure) = (random.between(low, high), random.between(2e4, 1.1e6));
            let enthalpy = |celsius| <RealGas<f64> as Mixture<f64>>::condensed_enthalpy(celsius, pressure, surface);
            for step in 1..8 {
                // 10^-12 K is worth 4e-9 J/kg and hides nothing here.
                let further = celsius + f64::from(step) * KELVIN_UNIT;
                worst = worst.max((enthalpy(further) - enthalpy(celsius)).abs() - 4e-9);
            }
        }
        worst
    });
    println!("enthalpy of supercooled, cold and warm, ice is rough by {rough:?} J/kg");
    assert!(rough[0] < 1e-6 && rough[1] < 2e-7 && rough[2] < 1e-8);
}

/// The most evaluations of one search, over every process and the whole range of states: the published cap is never reached.
#[test]
fn evaluations_stay_below_the_cap() {
    use crate::process::tower::{TowerWater, WaterTreatment};
    use crate::quantity::{HumidityRatio, SpecificEnthalpy, Temperature};
    use crate::solve::{ITERATION_CAP, tests::MOST_EVALUATIONS};
    use crate::state::Freezing;

    MOST_EVALUATIONS.set(0);
    let mut random = Random(3);
    let mut worst = [("", 0); 11];
    let mut note = |slot: usize, name: &'static str| {
        let taken = MOST_EVALUATIONS.replace(0);
        if taken > worst[slot].1 {
            worst[slot] = (name, taken);
        }
    };
    let cases = std::env::var("MOISTAIR_CASES").map_or(1_500, |cases| cases.parse().unwrap());
    for _ in 0..cases {
        let formulation = Formulation::ALL[(random.bits() % 3) as usize];
        let (_, highest) = formulation.limits(Quantity::Pressure);
        let (coldest, warmest) = formulation.limits(Quantity::DryBulb);
        let pressure = if random.bits() & 1 == 0 { 101_325.0 } else { random.between(2e4, highest) };
        let mut air = || {
            // Round numbers too: a root at 0 °C is the hardest to halve down to.
            let celsius = if random.bits() % 4 == 0 { 0.0 } else { random.between(coldest, warmest) };
            let limit = with_mixture!(formulation, f64, M => greatest_humidity_ratio(&M::<f64>::at(celsius), celsius, pressure));
            let share = random.between(0.0, 1.2).min(1.0);
            (MoistAir::assemble(celsius, pressure, limit * share, formulation), random.between(0.0, 1.0))
        };
        let ((first, x), (second, y)) = (air(), air());
        let stream = AirStream { air: first, dry_air_flow: 1.0 };
        let (enthalpy, water) = (parts(&first).0, parts(&first).1 + 0.1 * x * x * x);
        for freezing in [Freezing::Equilibrium, Freezing::Supercooled] {
            let _ = AirWithCondensate::from_enthalpy_and_water(
                SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
                HumidityRatio::from_kilograms_per_kilogram(water.min(10.0)),
                freezing,
                first.basis(),
            );
        }
        note(0, "equilibrium");
        let _ = mixing::adiabatic(&[stream.into(), AirStream { air: second, dry_air_flow: y }.into()]);
        note(1, "mixing");
        let steam = SpecificEnthalpy::from_joules_per_kilogram(1e6 + 2.5e6 * x);
        let _ = humidify::steam_limit(&stream, steam);
        let _ = humidify::steam(&stream, MassFlow::from_kilograms_per_second(0.05 * y), steam);
        note(2, "steam");
        let _ = coil::apparatus_dew_point(&first, &second);
        let _ = coil::by_bypass_factor(
            &stream,
            Temperature::from_celsius(60.0 * y - 20.0),
            x,
            coil::CondensateTemperature::Apparatus,
        );
        note(3, "coil");
        let conductance = |x: f64| crate::Conductance::from_watts_per_kelvin(x);
        let surface = coil::CoilSurface {
            air_side: conductance(1e4 * x),
            water_side: conductance(1e4 * y),
            arrangement: if random.bits() & 1 == 0 {
                coil::Arrangement::Counterflow
            } else {
                coil::Arrangement::CrossFlow
            },
        };
        let chilled = coil::CoilWater {
            flow: MassFlow::from_kilograms_per_second(5.0 * y * y),
            entering: Temperature::from_celsius(60.0 * x * y),
            coolant: coil::Coolant::Water,
        };
        let _ = coil::with_water(&stream, surface, chilled, coil::CondensateTemperature::Apparatus);
        note(4, "coil with water");
        let measured = coil::Measured::LeavingAir(second.dry_bulb());
        let _ = coil::surface_from_rating(&stream, chilled, measured, 2.0, coil::Arrangement::Counterflow);
        note(5, "rating of a coil");
        let cold = 50.0 * y;
        let water = TowerWater {
            flow: MassFlow::from_kilograms_per_second(3.0 * x),
            hot: Temperature::from_celsius(cold + 30.0 * x),
            cold: Temperature::from_celsius(cold),
        };
        let _ =
            tower::with_air_flow(&stream, water, WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 3.0 });
        note(6, "tower");
        let steam =
            humidify::Steam::from_specific_enthalpy(SpecificEnthalpy::from_joules_per_kilogram(1e6 + 2.2e6 * x));
        let duct = crate::Pressure::from_pascals(crate::real::Real::exp(6.908 + 7.37 * y));
        let _ = steam.and_then(|steam| steam.throttled_to(duct));
        note(7, "throttling");
        let (heat, celsius) = (HeatFlow::from_watts(3e3 * y), Temperature::from_celsius(60.0 * x));
        let washer = humidify::Washer {
            water: MassFlow::from_kilograms_per_second(3.0 * y),
            temperature: celsius,
            effectiveness: x,
            pump_heat: heat,
            carry_over_fraction: 1e-3 * y,
        };
        let _ = humidify::wash(&stream, washer);
        note(8, "washer");
        let direct = evaporative::DirectCooler {
            saturation_effectiveness: x,
            circulating: MassFlow::from_kilograms_per_second(1.0),
            pump_heat: heat,
            make_up: humidify::EvaporatingWater::Given(celsius),
            treatment: WaterTreatment { drift_fraction: 1e-3 * y, cycles_of_concentration: 1.1 + 5.0 * y },
        };
        let _ = evaporative::direct(&stream, direct);
        note(9, "direct cooler");
        let indirect = evaporative::IndirectCooler {
            effectiveness: evaporative::IndirectEffectiveness::OfWetBulb(x),
            exhaust_humidity: crate::RelativeHumidity::from_fraction(1.0 - 0.2 * y),
            pump_heat: heat,
            water: humidify::EvaporatingWater::AtWetBulb,
        };
        let _ = evaporative::indirect(&stream, &AirStream { air: second, dry_air_flow: 5.0 }, indirect);
        note(10, "indirect cooler");
    }
    println!("most evaluations of one search, of {ITERATION_CAP}: {worst:?}");
    assert!(worst.iter().all(|&(_, taken)| taken > 0 && taken < ITERATION_CAP));
}

/// The same text in single precision: near the double results, as far as seven digits go.
#[test]
fn single_precision() {
    use crate::basis::Basis;
    use crate::process::coil::CondensateTemperature;
    use crate::process::humidify::EvaporatingWater;
    use crate::process::tower::{TowerWater, WaterTreatment};
    use crate::quantity::{HumidityRatio, Pressure, RelativeHumidity, SpecificEnthalpy, Temperature};
    use std::vec::Vec;

    fn results<S: Scalar>(formulation: Formulation) -> Vec<f64> {
        let s = |x: f64| k::<S>(x);
        let t = |x: f64| Temperature::from_celsius(s(x));
        let site = Basis::new(Pressure::from_pascals(s(101_325.0)), formulation);
        let air = |x: f64, humidity: f64| {
            MoistAir::from_dry_bulb(t(x), RelativeHumidity::from_fraction(s(humidity)), site).unwrap()
        };
        let stream = |x: f64, humidity: f64| {
            AirStream::new(air(x, humidity), MassFlow::from_kilograms_per_second(s(2.0))).unwrap()
        };
        let steam = SpecificEnthalpy::from_joules_per_kilogram(s(2.7e6));
        let (warm, cold, dry) = (stream(30.0, 0.5), stream(-5.0, 0.8), stream(35.0, 0.2));
        let drain = CondensateTemperature::LeavingAir;
        let heated = sensible::with_heat(&cold, HeatFlow::from_watts(s(4e4))).unwrap();
        let by_bypass = coil::by_bypass_factor(&warm, t(8.0), s(0.15), drain).unwrap();
        let apparatus = coil::apparatus_dew_point(&warm.air(), &by_bypass.leaving.air()).unwrap();
        let chilled = coil::CoilWater {
            flow: MassFlow::from_kilograms_per_second(s(2.5)),
            entering: t(6.0),
            coolant: coil::Coolant::Water,
        };
        let conductance = crate::Conductance::from_kilowatts_per_kelvin;
        let surface = coil::CoilSurface {
            air_side: conductance(s(5.0)),
            water_side: conductance(s(9.0)),
            arrangement: coil::Arrangement::Counterflow,
        };
        let watered = coil::with_water(&warm, surface, chilled, drain).unwrap();
        let measured = coil::Measured::LeavingAir(t(14.0));
        let rated =
            coil::surface_from_rating(&warm, chilled, measured, s(2.0), coil::Arrangement::Counterflow).unwrap();
        let held =
            coil::between(&warm, &air(12.0, 0.95), drain, HumidityRatio::from_grams_per_kilogram(s(0.1))).unwrap();
        let reheated =
            reheat::to_state(&warm, &air(22.0, 0.5), RelativeHumidity::from_fraction(s(0.95)), drain).unwrap();
        let fog = mixing::adiabatic(&[stream(30.0, 0.9).into(), stream(-10.0, 0.8).into()]).unwrap();
        let steamed = humidify::steam(&dry, MassFlow::from_kilograms_per_second(s(0.01)), steam).unwrap();
        let to_half =
            humidify::steam_to_relative_humidity(&dry, RelativeHumidity::from_fraction(s(0.5)), steam).unwrap();
        let wetted = humidify::evaporative(&dry, s(0.85), EvaporatingWater::AtWetBulb).unwrap();
        let water = TowerWater { flow: MassFlow::from_kilograms_per_second(s(2.0)), hot: t(38.0), cold: t(28.0) };
        let treatment = WaterTreatment { drift_fraction: s(1e-4), cycles_of_concentration: s(3.0) };
        let cooled = tower::with_air_flow(&warm, water, treatment).unwrap();
        let bar = |x: f64| crate::Pressure::from_pascals(s(1e5 * x));
        let superheated = humidify::Steam::superheated(t(200.0), bar(4.0)).unwrap();
        let wet_steam = humidify::Steam::wet(bar(4.0), s(0.9)).unwrap();
        let limit = humidify::steam_limit(&dry, SpecificEnthalpy::from_joules_per_kilogram(s(2.76e6))).unwrap();
        let flow = |x: f64| MassFlow::from_kilograms_per_second(s(x));
        let washer = humidify::Washer {
            water: flow(2.0),
            temperature: t(8.0),
            effectiveness: s(0.8),
            pump_heat: HeatFlow::from_watts(s(300.0)),
            carry_over_fraction: s(0.0),
        };
        let washed = humidify::wash(&warm, washer).unwrap();
        let direct = evaporative::DirectCooler {
            saturation_effectiveness: s(0.85),
            circulating: flow(1.0),
            pump_heat: HeatFlow::from_watts(s(300.0)),
            make_up: EvaporatingWater::Given(t(12.0)),
            treatment,
        };
        let indirect = evaporative::IndirectCooler {
            effectiveness: evaporative::IndirectEffectiveness::OfWetBulb(s(0.6)),
            exhaust_humidity: RelativeHumidity::from_fraction(s(0.95)),
            pump_heat: HeatFlow::from_watts(s(100.0)),
            water: EvaporatingWater::AtWetBulb,
        };
        let staged = evaporative::two_stage(&dry, &warm, indirect, direct).unwrap();
        [
            superheated.specific_enthalpy().kilojoules_per_kilogram(),
            superheated.throttled_to(bar(1.0)).unwrap().temperature.celsius(),
            wet_steam.throttled_to(bar(1.0)).unwrap().quality,
            limit.first_saturation().unwrap().kilograms_per_second(),
            washed.leaving_water_temperature.celsius(),
            washed.air.leaving.air().air().dry_bulb().celsius(),
            staged.indirect.heat.kilowatts(),
            staged.indirect.primary.air().dry_bulb().celsius(),
            staged.indirect.secondary.leaving.air().air().dry_bulb().celsius(),
            staged.direct.water_temperature.celsius(),
            staged.direct.water.make_up.kilograms_per_second() * s(1e3),
            watered.air.leaving.air().dry_bulb().celsius(),
            watered.leaving_water.celsius(),
            watered.air.cooling_load.kilowatts(),
            rated.air_side.kilowatts_per_kelvin(),
            heated.leaving.air().dry_bulb().celsius(),
            by_bypass.cooling_load.kilowatts(),
            apparatus.dew_point.celsius(),
            held.cooling_load.kilowatts(),
            reheated.reheat().kilowatts(),
            fog.leaving.air().air().dry_bulb().celsius(),
            fog.leaving.air().liquid().grams_per_kilogram(),
            steamed.leaving.air().air().dry_bulb().celsius(),
            to_half.evaporated.kilograms_per_second() * s(1e3),
            wetted.evaporated.kilograms_per_second() * s(1e3),
            wetted.leaving.air().air().dry_bulb().celsius(),
            cooled.water.make_up.kilograms_per_second() * s(1e3),
            cooled.leaving.air().dry_bulb().celsius(),
        ]
        .map(Scalar::to_f64)
        .to_vec()
    }
    for &formulation in Formulation::ALL {
        let (single, double) = (results::<f32>(formulation), results::<f64>(formulation));
        let off: Vec<f64> = single.iter().zip(&double).map(|(a, b)| (a / b - 1.0).abs()).collect();
        println!("{formulation:?}, single against double precision, relative: {off:.7?}");
        assert!(off.iter().all(|&off| off < 3e-3), "{single:?}\n{double:?}");
    }
}
