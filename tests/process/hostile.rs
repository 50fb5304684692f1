//! Any bits in any argument: a result of finite numbers that is a state, or an error that says why; never a panic, never endless.

use crate::checks::Random;
use crate::support::*;
use moistair_core::process::coil::{
    self, Arrangement, CoilFlows, CoilSurface, CoilWater, CondensateTemperature, Coolant, FlowExponents, Measured,
};
use moistair_core::process::compression;
use moistair_core::process::desiccant::potentials::{self, Effectiveness};
use moistair_core::process::desiccant::{self, CarryOver, Regeneration, Sorption};
use moistair_core::process::economizer::{self, Economizer, EconomizerState, Fallback, Rule, Supply};
use moistair_core::process::evaporative::{
    self, DirectCooled, DirectCooler, IndirectCooled, IndirectCooler, IndirectEffectiveness,
};
use moistair_core::process::humidify::{self, EvaporatingWater, Steam, Washer};
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{self, FractionLimits, OtherFlow};
use moistair_core::process::reheat::CoilLeaving;
use moistair_core::process::room::{self, MoistureSource, RoomGains};
use moistair_core::process::tower::basin::Basin;
use moistair_core::process::tower::fill::{FillLaw, FillTest};
use moistair_core::process::tower::merkel::{self, Quadrature};
use moistair_core::process::tower::poppe::{self, Transfer};
use moistair_core::process::tower::{self, HotWater, TowerWater, WaterTreatment, WaterUse, effectiveness_ntu};
use moistair_core::process::{AirStream, Exchange, WetStream, mixing, reheat, sensible};
use moistair_core::signal::Quality;
use moistair_core::*;
use std::collections::BTreeMap;

/// Every class of `f64`, limits of quantities and their neighbors, common slips of units, and random bits.
pub fn number(random: &mut Random) -> f64 {
    const CLASSES: [f64; 42] = [
        f64::NAN,
        f64::INFINITY,
        f64::NEG_INFINITY,
        0.0,
        -0.0,
        5e-324,
        -5e-324,
        1e-310,
        f64::MIN_POSITIVE,
        f64::EPSILON,
        f64::MAX,
        f64::MIN,
        1e-12,
        -1e-12,
        1.0,
        0.999_999_999_999_999_9,
        1.000_000_000_000_000_2,
        0.5,
        -1.0,
        2.0,
        0.02,
        10.0,
        50.0,
        100.0,
        -40.0,
        -80.0,
        0.01,
        150.0,
        99.97,
        200.0,
        374.0,
        -100.0,
        293.15,
        101.325,
        1_013.25,
        20_000.0,
        101_325.0,
        1.1e6,
        251_000.0,
        2.7e6,
        4e6,
        1e9,
    ];
    match random.bits() % 4 {
        0 => f64::from_bits(random.bits()),
        1 => {
            let quantity = Quantity::ALL[(random.bits() % Quantity::ALL.len() as u64) as usize];
            let limits = Formulation::ALL[(random.bits() % Formulation::ALL.len() as u64) as usize].limits(quantity);
            let end = if random.bits() & 1 == 0 { limits.0 } else { limits.1 };
            f64::from_bits(end.to_bits().wrapping_add(random.bits() % 3).wrapping_sub(1))
        }
        2 => random.between(-1.0, 60.0),
        _ => CLASSES[(random.bits() % CLASSES.len() as u64) as usize],
    }
}

pub fn any_air(random: &mut Random) -> MoistAir {
    loop {
        let formulation = Formulation::ALL[(random.bits() % Formulation::ALL.len() as u64) as usize];
        let pressure = if random.bits() & 1 == 0 { 101_325.0 } else { number(random) };
        let basis = Basis::new(Pressure::from_pascals(pressure), formulation);
        let quantity = Quantity::ALL[(random.bits() % Quantity::ALL.len() as u64) as usize];
        let t = if random.bits() & 1 == 0 {
            number(random)
        } else {
            random.between(-80.0, formulation.limits(Quantity::DryBulb).1)
        };
        let made = MoistAir::from_dry_bulb_and(celsius(t), quantity, number(random), basis).or_else(|_| {
            MoistAir::from_dry_bulb_and(celsius(t), Quantity::RelativeHumidity, random.between(0.0, 1.0), basis)
        });
        if let Ok(air) = made {
            return air;
        }
    }
}

/// Calls made, results given, and errors by their code.
#[derive(Default)]
pub struct Seen(BTreeMap<&'static str, (u32, BTreeMap<i32, u32>)>);

impl Seen {
    pub fn take<T>(&mut self, process: &'static str, result: Result<T, Error>, check: impl FnOnce(&T)) {
        let (given, errors) = self.0.entry(process).or_default();
        match result {
            Ok(done) => {
                *given += 1;
                check(&done);
            }
            Err(error) => {
                *errors.entry(error.code()).or_default() += 1;
                assert!(!error.to_string().is_empty());
                if let Some((value, min, max)) = error.value_and_limits() {
                    assert!(!value.is_nan() && !min.is_nan() && !max.is_nan(), "{process}: {error:?}");
                }
            }
        }
    }
}

impl Seen {
    /// Prints, and fails where a process always did the same.
    pub fn report(&self) {
        for (process, (given, errors)) in &self.0 {
            println!("{process}: {given} results, errors by code {errors:?}");
            assert!(*given > 0, "{process} never gave a result: nothing was tried");
            assert!(!errors.is_empty() || *process == "Eliminate", "{process} never refused: nothing was tried");
        }
    }
}

fn usual_steam() -> Steam {
    Steam::saturated_at_temperature(celsius(110.0)).unwrap()
}

#[track_caller]
pub fn finite(numbers: &[f64]) {
    assert!(numbers.iter().all(|x| x.is_finite()), "{numbers:?}");
}

#[track_caller]
pub fn outlet(leaving: &WetStream, exchange: &Exchange) {
    sound(leaving).unwrap_or_else(|error| panic!("{error}"));
    let water = exchange.water.kilograms_per_second();
    finite(&[
        exchange.heat.watts(),
        water,
        exchange.water_enthalpy_flow.watts(),
        leaving.dry_air_flow().kilograms_per_second(),
    ]);
}

#[test]
fn no_argument_breaks_a_process() {
    let mut random = Random(11);
    let mut seen = Seen::default();
    let mut decisions = [0_u32; 2];
    let cases = std::env::var("MOISTAIR_CASES").map_or(2_000, |cases| cases.parse().unwrap());
    for _ in 0..cases {
        let (first, second) = (any_air(&mut random), any_air(&mut random));
        let second = if random.bits() & 3 == 0 {
            second
        } else {
            MoistAir::restore(second.dry_bulb(), second.humidity_ratio(), first.basis()).unwrap_or(second)
        };
        let mut x = || number(&mut random);
        let volume = VolumeFlow::from_cubic_meters_per_second(x());
        seen.take("volume flow", AirStream::from_volume_flow(first, volume), |s| {
            finite(&[s.dry_air_flow().kilograms_per_second()])
        });
        let standard =
            AirStream::from_standard_volume_flow(first, volume, Density::from_kilograms_per_cubic_meter(x()));
        seen.take("standard volume flow", standard, |s| finite(&[s.dry_air_flow().kilograms_per_second()]));
        let asked = AirStream::new(first, flow(x()));
        let entering = asked.unwrap_or_else(|_| stream(first, 1.0));
        seen.take("dry-air flow", asked, |s| finite(&[s.volume_flow().cubic_meters_per_second()]));

        let to = sensible::to_temperature(&entering, celsius(x()));
        seen.take("heater to temperature", to, |done| outlet(&done.leaving.into(), &done.exchange));
        let with = sensible::with_heat(&entering, HeatFlow::from_watts(x()));
        seen.take("heater with heat", with, |done| outlet(&done.leaving.into(), &done.exchange));

        for choice in [
            CondensateTemperature::LeavingAir,
            CondensateTemperature::Apparatus,
            CondensateTemperature::Given(celsius(x())),
        ] {
            let cooled = |done: &coil::Cooling| {
                outlet(&done.leaving.into(), &done.exchange);
                finite(&[done.cooling_load.watts(), done.sensible.watts(), done.latent.watts()]);
                assert!(done.condensate.kilograms_per_second() >= 0.0);
            };
            seen.take("coil to state", coil::to_state(&entering, &second, choice), cooled);
            seen.take("coil between", coil::between(&entering, &second, choice, ratio(x())), cooled);
            seen.take("coil by bypass", coil::by_bypass_factor(&entering, celsius(x()), x(), choice), cooled);
            let off = RelativeHumidity::from_fraction(x());
            seen.take("reheat", reheat::to_state(&entering, &second, off, choice), |done| {
                cooled(&done.cooling);
                outlet(&done.heating.leaving.into(), &done.heating.exchange);
            });
        }
        seen.take("apparatus dew point", coil::apparatus_dew_point(&first, &second), |found| {
            finite(&[found.dew_point.celsius(), found.bypass_factor]);
            assert!((0.0..=1.0).contains(&found.bypass_factor), "{found:?}");
        });

        seen.take("apparatus dew points", coil::apparatus_dew_points(&first, &second), |found| {
            finite(&[found.nearest.celsius()]);
            for met in [found.warmer, found.colder].into_iter().flatten() {
                finite(&[met.dew_point.celsius()]);
                assert!((0.0..=1.0).contains(&met.bypass_factor), "{found:?}");
            }
        });
        let rows = x() as u32;
        seen.take("bypass of rows", coil::bypass_factor_of_rows(x(), rows), |factor| {
            assert!((0.0..=1.0).contains(factor))
        });
        // Hardly any five random numbers make a coil: most of them are given a usual value half of the time.
        let mut or = |usual: f64| if random.bits() & 1 == 0 { number(&mut random) } else { usual };
        let conductance = Conductance::from_watts_per_kelvin;
        let coolant = if or(1.0) > 0.5 {
            Coolant::Water
        } else {
            Coolant::Brine(SpecificHeat::from_joules_per_kilogram_kelvin(or(3_600.0)))
        };
        let water = CoilWater { flow: flow(or(1.0)), entering: celsius(or(7.0)), coolant };
        for arrangement in [Arrangement::Counterflow, Arrangement::CrossFlow] {
            let surface = CoilSurface { air_side: conductance(or(3e3)), water_side: conductance(or(6e3)), arrangement };
            let drain = CondensateTemperature::Apparatus;
            seen.take("coil with water", coil::with_water(&entering, surface, water, drain), |done| {
                outlet(&done.air.leaving.into(), &done.air.exchange);
                finite(&[done.leaving_water.celsius(), done.coldest_surface.celsius(), done.air.cooling_load.watts()]);
                assert!((0.0..=1.0).contains(&done.dry_fraction), "{done:?}");
            });
            for measured in [
                Measured::LeavingAir(celsius(or(12.0))),
                Measured::LeavingWater(celsius(or(12.0))),
                Measured::Heat(HeatFlow::from_watts(or(-2e4))),
            ] {
                let rated = coil::surface_from_rating(&entering, water, measured, or(2.0), arrangement);
                seen.take("rating of a coil", rated, |surface| {
                    let [outside, inside] = [surface.air_side, surface.water_side].map(Conductance::watts_per_kelvin);
                    finite(&[outside, inside]);
                    assert!(outside >= 0.0 && inside >= 0.0);
                });
            }
        }
        let surface = CoilSurface {
            air_side: conductance(or(3e3)),
            water_side: conductance(or(6e3)),
            arrangement: Arrangement::Counterflow,
        };
        let found_at = CoilFlows { air: flow(or(1.0)), water: flow(or(2.0)) };
        let flows = CoilFlows { air: flow(or(0.5)), water: flow(or(0.0)) };
        let exponents = FlowExponents { air_side: or(0.6), water_side: or(0.8) };
        seen.take("coil at flows", surface.at_flows(found_at, flows, exponents), |surface| {
            let sides = [surface.air_side, surface.water_side].map(Conductance::watts_per_kelvin);
            assert!(sides.iter().all(|side| (0.0..=1e9).contains(side)), "{sides:?}");
        });
        let by_air = HeatFlow::from_watts(or(2e4));
        seen.take("load by water", coil::load_by_water(&entering, by_air, water, celsius(or(12.0))), |found| {
            finite(&[found.load.watts(), found.air_less_water.watts()])
        });
        let source = match random.bits() % 3 {
            0 => MoistureSource::SaturatedVapor(celsius(number(&mut random))),
            1 => MoistureSource::Liquid(celsius(number(&mut random))),
            _ => MoistureSource::Enthalpy(joules(number(&mut random))),
        };
        let mut or = |usual: f64| if random.bits() & 1 == 0 { number(&mut random) } else { usual };
        let source = if or(0.0) == 0.0 { MoistureSource::SaturatedVapor(celsius(30.0)) } else { source };
        let gains = RoomGains { sensible: HeatFlow::from_watts(or(5e3)), moisture: flow(or(1e-3)), source };
        let room_air = |done: &room::RoomAir| {
            outlet(&done.room, &done.exchange);
            outlet(&done.supply.into(), &Exchange::none());
        };
        seen.take(
            "room supply at a temperature",
            room::supply_at_temperature(&first, &gains, celsius(or(12.0))),
            room_air,
        );
        seen.take("room supply at a flow", room::supply_at_flow(&first, &gains, flow(or(1.0))), room_air);
        seen.take("room of a supply", room::room_of_supply(&entering, &gains), room_air);
        seen.take("gains of a room", room::gains_between(&entering, &second, source), |gains| {
            finite(&[gains.sensible.watts(), gains.moisture.kilograms_per_second()]);
        });
        seen.take("sensible heat ratio", room::sensible_heat_ratio(&first, &gains), |ratio| finite(&[*ratio]));
        seen.take("slope of a room", room::process_slope(&gains, first.basis()), |h| {
            finite(&[h.joules_per_kilogram()])
        });
        seen.take("slope of a ratio", room::slope_of_ratio(&first, or(0.8)), |h| finite(&[h.joules_per_kilogram()]));
        seen.take("ratio of a slope", room::ratio_of_slope(&first, joules(or(1e7))), |ratio| finite(&[*ratio]));
        seen.take("dew points of a room", room::apparatus_dew_points(&first, or(0.8)), |found| {
            for met in [found.warmer, found.colder].into_iter().flatten() {
                finite(&[met.celsius()]);
            }
        });
        for coil in [
            CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(or(0.95))),
            CoilLeaving::Bypass { factor: or(0.1), coldest: celsius(or(5.0)) },
        ] {
            let inlet = second.at_pressure(first.pressure()).unwrap_or(second);
            seen.take("limiting line", room::limiting_line(&first, &inlet, coil), |limit| {
                finite(&[limit.sensible_heat_ratio, limit.slope.joules_per_kilogram(), limit.touches.celsius()]);
            });
            seen.take("least reheat", room::least_reheat(&first, &gains, &inlet, coil), |least| {
                finite(&[least.reheat.watts(), least.supply.dry_air_flow().kilograms_per_second()]);
                outlet(&least.supply.into(), &Exchange::none());
                outlet(&stream(least.coil_leaving, 1.0).into(), &Exchange::none());
                assert!(least.reheat.watts() >= 0.0);
            });
            let drain = CondensateTemperature::LeavingAir;
            let through = AirStream::new(inlet, entering.dry_air_flow()).unwrap();
            seen.take("reheat behind a coil", reheat::with_coil(&through, &first, coil, drain), |done| {
                outlet(&done.cooling.leaving.into(), &done.cooling.exchange);
                outlet(&done.heating.leaving.into(), &done.heating.exchange);
            });
            seen.take("room conditioned", room::conditioned(&first, &gains, &through, coil, drain), |done| {
                room_air(&done.room);
                outlet(&done.reheat.heating.leaving.into(), &done.reheat.heating.exchange);
            });
        }
        for carry_over in [
            CarryOver::None,
            CarryOver::Heat(HeatFlow::from_watts(or(1e3))),
            CarryOver::Rise(TemperatureDifference::from_kelvins(or(4.0))),
        ] {
            let sorption = Sorption { heat_ratio: or(1.1), carry_over };
            let sorbed = |done: &desiccant::Sorbed| {
                outlet(&done.leaving.into(), &done.exchange);
                finite(&[done.removed.kilograms_per_second(), done.sorption_heat.watts(), done.carried_heat.watts()]);
            };
            let target = ratio(or(0.5 * numbers(&first).1));
            seen.take("desiccant", desiccant::to_humidity_ratio(&entering, target, sorption), sorbed);
            let by_effectiveness = desiccant::by_effectiveness(&entering, or(0.5), ratio(or(0.0)), sorption);
            seen.take("desiccant by effectiveness", by_effectiveness, sorbed);
            let other = AirStream::new(second, flow(or(1.0))).unwrap_or_else(|_| stream(second, 1.0));
            for known in [
                Regeneration::Heat(HeatFlow::from_watts(or(3e4))),
                Regeneration::Entering(celsius(or(100.0))),
                Regeneration::Leaving(celsius(or(50.0))),
            ] {
                seen.take("desiccant wheel", desiccant::wheel(&entering, target, sorption, &other, known), |done| {
                    sorbed(&done.process);
                    outlet(&done.heater.leaving.into(), &done.heater.exchange);
                    outlet(&done.regeneration.into(), &done.regeneration_exchange);
                    finite(&[done.entropy_production]);
                });
            }
        }
        let share = Effectiveness { first: or(0.1), second: or(0.9) };
        let hot = stream(
            MoistAir::from_dry_bulb(
                celsius(40.0 + 80.0 * or(0.5).clamp(0.0, 1.0).max(0.0)),
                ratio(5e-4),
                first.basis(),
            )
            .unwrap(),
            1.0,
        );
        seen.take("wheel by potentials", potentials::wheel(&entering, &hot, share), |done| {
            outlet(&done.process.into(), &done.exchange);
            outlet(&done.regeneration.into(), &done.regeneration_exchange);
            finite(&[done.entropy_production, done.removed.kilograms_per_second()]);
            if let Some(left) = done.imbalance {
                finite(&[left.heat.watts(), left.water.kilograms_per_second()]);
            }
        });
        seen.take("potentials", potentials::potentials(&first), |(one, two)| finite(&[*one, *two]));
        let tested = potentials::effectiveness_between(&first, &second, &hot.air());
        seen.take("effectiveness of a wheel", tested, |found| finite(&[found.first, found.second]));
        let mut x = || number(&mut random);

        let carried = AirWithCondensate::new(second, ratio(x()), ratio(x()));
        seen.take("carried water", carried, |wet| finite(&[wet.specific_enthalpy().joules_per_kilogram()]));
        let other = WetStream::new(carried.unwrap_or_else(|_| second.into()), flow(x()));
        seen.take("wet stream", other, |s| finite(&[s.dry_air_flow().kilograms_per_second()]));
        let other = other.unwrap_or_else(|_| stream(second, 1.0).into());
        seen.take("mixing", mixing::adiabatic(&[entering.into(), other]), |done| outlet(&done.leaving, &done.exchange));
        for freezing in [Freezing::Equilibrium, Freezing::Supercooled] {
            let at = mixing::adiabatic_at(&[other, entering.into()], Pressure::from_pascals(x()), freezing);
            seen.take("mixing at a pressure", at, |done| outlet(&done.leaving, &done.exchange));
            let made = AirWithCondensate::from_enthalpy_and_water(joules(x()), ratio(x()), freezing, first.basis());
            seen.take("equilibrium", made, |wet| outlet(&WetStream::new(*wet, flow(1.0)).unwrap(), &Exchange::none()));
        }

        // Hardly any nine random numbers make a fraction: half of them are usual.
        let mut or = |usual: f64| if random.bits() & 1 == 0 { number(&mut random) } else { usual };
        let mut reading = |usual: f64, uncertainty: f64| {
            let quality = if or(0.0) == 1.0 { Quality::Refused } else { Quality::Good };
            Reading::new(or(usual), or(uncertainty)).with_quality(quality)
        };
        let readings = [reading(4.0, 0.2), reading(24.0, 0.2), reading(19.0, 0.2)];
        let flows = [reading(1.5, 0.1), reading(6.0, 0.1)];
        let mut measured = |t: f64, rh: f64| MeasuredAir::from_relative_humidity(reading(t, 0.2), reading(rh, 0.01));
        let airs = [measured(16.0, 0.5), measured(24.0, 0.5), measured(18.0, 0.5)];
        let quantity = Quantity::ALL[(or(0.0).to_bits() % Quantity::ALL.len() as u64) as usize];
        let airs =
            airs.map(|air| if or(0.0) == 0.0 { air } else { MeasuredAir { humidity_quantity: quantity, ..air } });
        let sound = |done: &outdoor_air::OutdoorAirFraction| {
            finite(&[done.fraction.unwrap_or(0.0), done.standard_uncertainty.unwrap_or(0.0)]);
            assert!(done.standard_uncertainty.is_none_or(|u| u >= 0.0), "{done:?}");
        };
        let [outdoor, returned, mixed] = readings;
        let wanted = or(0.05);
        for by in [Quantity::DryBulb, Quantity::TracerConcentration, quantity] {
            let found = outdoor_air::from_readings(by, outdoor, returned, mixed, wanted);
            seen.take("fraction of readings", found, sound);
        }
        for other in [OtherFlow::Total(flows[1]), OtherFlow::Recirculated(flows[1])] {
            seen.take("fraction of flows", outdoor_air::from_flows(flows[0], other, wanted), sound);
        }
        let site = second.basis();
        for by in [Quantity::SpecificEnthalpy, Quantity::HumidityRatio] {
            let found = outdoor_air::from_air(by, &airs[0], &airs[1], &airs[2], site, wanted);
            seen.take("fraction of states", found, sound);
        }
        let limits = FractionLimits { least: or(0.2), most: or(1.0) };
        let blend = |done: &outdoor_air::Blend| {
            outlet(&done.mixed.leaving, &done.mixed.exchange);
            assert!(limits.least <= done.fraction && done.fraction <= limits.most, "{done:?}");
        };
        let blended = outdoor_air::for_mixed_temperature(&first, &second, celsius(or(14.0)), limits);
        seen.take("fraction for a temperature", blended, blend);
        let supply = Supply { dry_bulb: celsius(or(13.0)), coil_leaving: RelativeHumidity::from_fraction(or(0.95)) };
        seen.take("coil load", economizer::coil_load(&first, supply), |load| {
            finite(&[load.heat.joules_per_kilogram()]);
            assert!(load.heat.joules_per_kilogram() >= 0.0);
        });
        let mut state = EconomizerState::default();
        for _ in 0..2 {
            let rule = Rule::ALL[(or(0.0).to_bits() % Rule::ALL.len() as u64) as usize];
            let usual = Economizer::new(rule, site);
            let mut rarely = |usual: f64| if or(0.0) == 0.0 { usual } else { or(usual) };
            let settings = Economizer {
                supply,
                dry_bulb_limit: celsius(rarely(23.0)),
                enthalpy_limit: joules(rarely(47e3)),
                dew_point_limit: DewPoint::from_celsius(rarely(13.0)),
                temperature_hysteresis: TemperatureDifference::from_kelvins(rarely(1.0)),
                enthalpy_hysteresis: joules(rarely(1e3)),
                least_time_on: rarely(0.0),
                least_time_off: rarely(0.0),
                freeze_limit: celsius(rarely(0.0)),
                fallback: if rarely(0.0) == 0.0 { Fallback::DryBulb } else { Fallback::LeastOutdoorAir },
                ..usual
            };
            seen.take("economizer settings", settings.check(), |()| ());
            let decision = settings.decide(&mut state, rarely(0.0), &airs[0], &airs[1]);
            finite(&[decision.margin, decision.margin_uncertainty, decision.confidence]);
            assert!((0.0..=1.0).contains(&decision.confidence) && decision.margin_uncertainty >= 0.0, "{decision:?}");
            // On only with a usable outdoor dry bulb.
            let usable = airs[0].dry_bulb.quality != Quality::Refused && airs[0].dry_bulb.value.is_finite();
            assert!(!decision.enabled || (usable && settings.check().is_ok()), "{decision:?}");
            let blended = decision.outdoor_air(&first, &second, celsius(rarely(14.0)), limits);
            seen.take("outdoor air of a decision", blended, blend);
            decisions[usize::from(decision.enabled)] += 1;
        }
        let mut x = || number(&mut random);

        let compressed = compression::to_pressure(&other, Pressure::from_pascals(x()), celsius(x()));
        seen.take("compression", compressed, |done| {
            outlet(&done.leaving, &done.exchange);
            assert!(done.condensate.kilograms_per_second() >= 0.0);
        });
        let (target, water) = (Pressure::from_pascals(x()), ratio(x()));
        for freezing in [Freezing::Equilibrium, Freezing::Supercooled] {
            let basis = second.basis().at_pressure(target);
            let made = AirWithCondensate::from_dry_bulb_and_water(celsius(x()), water, freezing, basis);
            seen.take("condensate at a temperature", made, |wet| {
                outlet(&WetStream::new(*wet, flow(1.0)).unwrap(), &Exchange::none());
            });
        }
        seen.take("air at another pressure", first.at_temperature_and_pressure(celsius(x()), target), |air| {
            outlet(&stream(*air, 1.0).into(), &Exchange::none());
        });
        let points = [Quantity::DewPoint, Quantity::FrostPoint, Quantity::WetBulb];
        let (given, wanted) = (points[(x().to_bits() % 3) as usize], points[(x().to_bits() % 3) as usize]);
        seen.take("point at another pressure", first.saturation_temperature_at(given, target), |t| finite(&[*t]));
        let after = saturation_temperature_after(given, x(), first.basis(), wanted, Pressure::from_pascals(x()));
        seen.take("point after a change of pressure", after, |t| finite(&[*t]));

        let humid = |done: &humidify::Humidified| {
            outlet(&done.leaving, &done.exchange);
            finite(&[done.evaporated.kilograms_per_second()]);
            assert!(done.carried.kilograms_per_second() >= 0.0);
        };
        let steam = if x() < 1.0 { joules(x()) } else { joules(2.7e6) };
        seen.take("steam", humidify::steam(&entering, flow(x()), steam), humid);
        seen.take("steam to humidity ratio", humidify::steam_to_humidity_ratio(&entering, ratio(x()), steam), humid);
        let wanted = RelativeHumidity::from_fraction(x());
        seen.take("steam to relative humidity", humidify::steam_to_relative_humidity(&entering, wanted, steam), humid);
        seen.take("limit of steam", humidify::steam_limit(&entering, steam), |limit| {
            let flows = [limit.first_saturation(), limit.unsaturated_again()];
            assert!(flows.into_iter().flatten().all(|m| m.kilograms_per_second() >= 0.0));
            finite(&flows.map(|m| m.map_or(0.0, MassFlow::kilograms_per_second)));
        });
        seen.take("enthalpy of steam", humidify::saturated_steam_enthalpy(celsius(x())), |h| {
            finite(&[h.joules_per_kilogram()])
        });
        let supply = |steam: &Steam| finite(&[steam.specific_enthalpy().joules_per_kilogram()]);
        let pascals = if x() < 1.0 { x() } else { 3e5 };
        let pressure = Pressure::from_pascals(pascals);
        seen.take("saturated steam", Steam::saturated_at_pressure(Pressure::from_pascals(x())), supply);
        seen.take("steam by temperature", Steam::saturated_at_temperature(celsius(x())), supply);
        seen.take("wet steam", Steam::wet(pressure, x()), supply);
        let hot = if x() < 1.0 { x() } else { 250.0 };
        let superheated = Steam::superheated(celsius(hot), pressure);
        seen.take("superheated steam", superheated, supply);
        let known = Steam::from_specific_enthalpy(joules(x()));
        seen.take("steam by enthalpy", known, supply);
        let some = superheated.or(known).or(Steam::from_specific_enthalpy(steam)).unwrap_or(usual_steam());
        seen.take("throttling", some.throttled_to(Pressure::from_pascals(x())), |state| {
            finite(&[state.temperature.celsius(), state.superheat.kelvins()]);
            assert!((0.0..=1.0).contains(&state.quality) && state.superheat.kelvins() >= 0.0);
        });
        seen.take("enthalpy of water", liquid_water_enthalpy(celsius(x()), first.basis()), |h| {
            finite(&[h.joules_per_kilogram()])
        });
        seen.take("spray", humidify::spray(&entering, flow(x()), celsius(x())), humid);
        for water in [EvaporatingWater::AtWetBulb, EvaporatingWater::Given(celsius(x()))] {
            seen.take("wetted media", humidify::evaporative(&entering, x(), water), humid);
        }
        let mut or = |usual: f64| if random.bits() & 1 == 0 { number(&mut random) } else { usual };
        let washer = Washer {
            water: flow(or(1.0)),
            temperature: celsius(or(12.0)),
            effectiveness: or(0.8),
            pump_heat: HeatFlow::from_watts(or(200.0)),
            carry_over_fraction: or(1e-3),
        };
        seen.take("washer", humidify::wash(&entering, washer), |done| {
            humid(&done.air);
            finite(&[done.leaving_water_temperature.celsius(), done.heat_to_water.watts()]);
            assert!(done.leaving_water.kilograms_per_second() >= 0.0);
        });
        let mut water =
            |t: f64| if t < 20.0 { EvaporatingWater::AtWetBulb } else { EvaporatingWater::Given(celsius(or(t))) };
        let (make_up, evaporating) = (water(if second.dry_bulb().celsius() < 20.0 { 5.0 } else { 25.0 }), water(30.0));
        let mut or = |usual: f64| if random.bits() & 1 == 0 { number(&mut random) } else { usual };
        let direct = DirectCooler {
            saturation_effectiveness: or(0.8),
            circulating: flow(or(1.0)),
            pump_heat: HeatFlow::from_watts(or(200.0)),
            make_up,
            treatment: WaterTreatment { drift_fraction: or(1e-4), cycles_of_concentration: or(3.0) },
        };
        let cooled = |done: &DirectCooled| {
            humid(&done.air);
            finite(&[done.water_temperature.celsius(), done.water.make_up.kilograms_per_second()]);
        };
        seen.take("direct evaporative cooling", evaporative::direct(&entering, direct), cooled);
        let indirect = IndirectCooler {
            effectiveness: if or(1.0) > 0.5 {
                IndirectEffectiveness::OfWetBulb(or(0.7))
            } else {
                IndirectEffectiveness::OfDewPoint(or(0.7))
            },
            exhaust_humidity: RelativeHumidity::from_fraction(or(0.95)),
            pump_heat: HeatFlow::from_watts(or(200.0)),
            water: evaporating,
        };
        let working = AirStream::new(second, flow(or(2.0))).unwrap_or_else(|_| stream(second, 2.0));
        let both = |done: &IndirectCooled| {
            outlet(&done.primary.into(), &done.primary_exchange);
            humid(&done.secondary);
            finite(&[done.heat.watts(), done.condensate.kilograms_per_second()]);
        };
        seen.take("indirect evaporative cooling", evaporative::indirect(&entering, &working, indirect), both);
        seen.take("two-stage cooling", evaporative::two_stage(&entering, &working, indirect, direct), |done| {
            both(&done.indirect);
            cooled(&done.direct);
        });
        let mut x = || number(&mut random);

        let treatment = WaterTreatment { drift_fraction: x(), cycles_of_concentration: x() };
        seen.take("water use", tower::water_use(flow(x()), flow(x()), treatment), |used| {
            finite(&[used.make_up.kilograms_per_second()])
        });
        let treatment =
            if x() < 1.0 { treatment } else { WaterTreatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 } };
        let water = TowerWater { flow: flow(x()), hot: celsius(x()), cold: celsius(x()) };
        let cooled = |done: &tower::TowerBalance| {
            outlet(&done.leaving.into(), &done.exchange);
            finite(&[
                done.heat_rejected.watts(),
                done.water.make_up.kilograms_per_second(),
                done.range.kelvins(),
                done.approach.kelvins(),
            ]);
        };
        seen.take("tower with air flow", tower::with_air_flow(&entering, water, treatment), cooled);
        let hot = HotWater { flow: flow(x()), temperature: celsius(x()) };
        let rated = |done: &tower::TowerRating| {
            finite(&[
                done.water.cold.celsius(),
                done.heat_rejected.watts(),
                done.leaving_enthalpy.joules_per_kilogram(),
                done.approach.kelvins(),
            ]);
        };
        let transfer = [Transfer::Bosnjakovic, Transfer::LewisFactorOne, Transfer::EvaporationSuppressed];
        let transfer = transfer[(x().to_bits() % 3) as usize];
        let rule = [Quadrature::GaussLegendre, Quadrature::GaussLegendreGraded, Quadrature::FourPoint];
        let rule = rule[(x().to_bits() % 3) as usize];
        seen.take("Merkel rating", merkel::rate(&entering, hot, x()), rated);
        seen.take("transfer units rating", effectiveness_ntu::rate(&entering, hot, x()), rated);
        seen.take("Poppe rating", poppe::rate(&entering, hot, x(), transfer), |done| {
            outlet(&done.leaving, &done.exchange);
            finite(&[done.water.cold.celsius(), done.heat_rejected.watts(), done.approach.kelvins()]);
        });
        let number = |number: &f64| assert!((0.0..=20.0).contains(number), "{number}");
        seen.take("Merkel sizing", merkel::number(&entering, water, rule), |done| {
            number(&done.number);
            finite(&[done.pinch.water_to_air, done.leaving_enthalpy.joules_per_kilogram()]);
        });
        seen.take("transfer units sizing", effectiveness_ntu::number(&entering, water), number);
        seen.take("Poppe sizing", poppe::number(&entering, water, transfer), number);
        seen.take("pinch", merkel::pinch(&first, water.hot, water.cold), |pinch| {
            finite(&[pinch.water_to_air, pinch.temperature.celsius()]);
        });
        seen.take("limit of cold water", tower::coldest_water(&first), |t| finite(&[t.celsius()]));
        let law = FillLaw::new(x(), x());
        seen.take("fill law", law, |law| finite(&[law.coefficient(), law.exponent()]));
        let mut near = || if x() < 1.0 { x() } else { 1.5 };
        let tests = [(); 2].map(|()| FillTest { water_to_air: near(), number: near() });
        seen.take("fill law from tests", FillLaw::from_two_tests(tests), |law| finite(&[law.coefficient()]));
        let law = law.unwrap_or(FillLaw::new(1.5, 0.6).unwrap());
        seen.take("number of a fill", law.number(x()), number);
        seen.take("height of a fill", law.height(x(), x(), Length::from_meters(x())), |z| finite(&[z.meters()]));
        seen.take("air for a duty", merkel::air_for_duty(&first, water, &law), |air| {
            finite(&[air.dry_air_flow().kilograms_per_second()]);
        });
        seen.take("cycles of concentration", tower::cycles_of_concentration(x(), x()), |cycles| finite(&[*cycles]));
        let range = TemperatureDifference::from_kelvins(x());
        seen.take("evaporation by rule of thumb", tower::evaporation_by_rule_of_thumb(flow(x()), range), |e| {
            finite(&[e.kilograms_per_second()]);
        });
        let flows = WaterUse {
            evaporation: flow(x()),
            drift: flow(x()),
            blowdown: flow(x()),
            make_up: flow(x()),
            limited_by_drift: false,
        };
        let basin = Basin::new(x(), x());
        seen.take("basin", basin, |basin| finite(&[basin.concentration()]));
        let basin = basin.unwrap_or(Basin::new(1e4, 500.0).unwrap());
        seen.take("basin later", basin.after(x(), &flows, x()), |basin| finite(&[basin.concentration()]));
        seen.take("tower with leaving air", tower::with_leaving_air(&first, &second, water, treatment), cooled);
    }
    println!("economizer: {} decisions off, {} on", decisions[0], decisions[1]);
    assert!(decisions.iter().all(|count| *count > 0));
    seen.report();
}
