//! Calls of C beside the same calls of the core: the same bits, whatever goes through structures and selectors.

#![allow(clippy::unwrap_used, clippy::float_cmp, clippy::indexing_slicing, reason = "a test")]

use core::ptr::null_mut;

use moistair::*;
use moistair_core::process::{AirStream, compression};
use moistair_core::{
    AirWithCondensate, Bulb, DewPoint, Formulation, Freezing, FrostPoint, HumidityRatio, Length, MassFlow, MoistAir,
    Pressure, Psychrometer, PsychrometerReading, Quantity, Temperature, saturation_point_after,
};

const FORMULATIONS: [(i32, Formulation); 2] =
    [(MOISTAIR_REAL_GAS, Formulation::RealGas), (MOISTAIR_IDEAL_GAS, Formulation::IdealGas)];

fn celsius(value: f64) -> Temperature {
    Temperature::from_celsius(value)
}

fn pascals(value: f64) -> Pressure {
    Pressure::from_pascals(value)
}

/// The one output of a call that succeeds.
fn output<T: Copy>(zero: T, call: impl FnOnce(*mut T) -> i32) -> T {
    let mut output = zero;
    assert_eq!(call(&mut output), MOISTAIR_OK);
    output
}

fn number(call: impl FnOnce(*mut f64) -> i32) -> f64 {
    output(f64::NAN, call)
}

/// A structure of numbers with nothing in it.
fn blank<T: Copy>() -> T {
    // SAFETY: structures of numbers.
    unsafe { core::mem::zeroed() }
}

fn same(state: &moistair_state, air: &MoistAir) {
    let numbers = (state.dry_bulb, state.pressure, state.humidity_ratio, state.specific_enthalpy);
    let (t, p, w) = (air.dry_bulb(), air.pressure(), air.humidity_ratio());
    let of_core = (t.celsius(), p.pascals(), w.kilograms_per_kilogram(), air.specific_enthalpy().joules_per_kilogram());
    assert_eq!(numbers, of_core);
    assert_eq!(state.formulation, air.formulation().code());
}

#[test]
fn standard_atmosphere() {
    type Call = unsafe extern "C" fn(f64, *mut f64, *mut moistair_error) -> i32;
    // SAFETY: valid places.
    let of = |call: Call, value| number(|out| unsafe { call(value, out, null_mut()) });
    let (height, pressure) = (Length::from_meters(1_600.0), pascals(84_000.0));
    let pairs: [(Call, f64, f64); 6] = [
        (moistair_pressure_at_elevation, 1_600.0, Pressure::at_elevation(height).unwrap().pascals()),
        (
            moistair_pressure_at_geometric_elevation,
            1_600.0,
            Pressure::at_geometric_elevation(height).unwrap().pascals(),
        ),
        (moistair_temperature_at_elevation, 1_600.0, Temperature::at_elevation(height).unwrap().celsius()),
        (
            moistair_temperature_at_geometric_elevation,
            1_600.0,
            Temperature::at_geometric_elevation(height).unwrap().celsius(),
        ),
        (moistair_elevation_at_pressure, 84e3, Length::elevation_at_pressure(pressure).unwrap().meters()),
        (
            moistair_geometric_elevation_at_pressure,
            84e3,
            Length::geometric_elevation_at_pressure(pressure).unwrap().meters(),
        ),
    ];
    for (call, value, expected) in pairs {
        assert_eq!(of(call, value), expected);
    }
}

#[test]
fn psychrometer() {
    for (code, formulation) in FORMULATIONS {
        for (bulb, selector, coefficient, dry, wet) in [
            (Bulb::Water, MOISTAIR_BULB_WATER, MOISTAIR_ASPIRATED_OVER_WATER, 20.0, 15.0),
            (Bulb::Ice, MOISTAIR_BULB_ICE, MOISTAIR_ASPIRATED_OVER_ICE, -5.0, -7.0),
        ] {
            let basis = moistair_basis { pressure: 95e3, formulation: code, reserved: 0 };
            let reading = PsychrometerReading { dry_bulb: celsius(dry), wet_bulb: celsius(wet) };
            let of_core = moistair_core::Basis::new(pascals(95e3), formulation);
            let air = MoistAir::from_psychrometer(Psychrometer::aspirated(bulb), reading, of_core).unwrap();
            // SAFETY: valid places.
            let state = output(blank::<moistair_state>(), |out| unsafe {
                moistair_from_psychrometer(dry, wet, selector, coefficient, basis, out, null_mut())
            });
            same(&state, &air);
            // SAFETY: valid places.
            let shown =
                number(|out| unsafe { moistair_psychrometer_reading(&state, selector, coefficient, out, null_mut()) });
            assert_eq!(shown, air.psychrometer_reading(Psychrometer::aspirated(bulb)).unwrap().wet_bulb.celsius());
        }
    }
    let mut error: moistair_error = blank();
    let basis = moistair_basis { pressure: 95e3, formulation: MOISTAIR_REAL_GAS, reserved: 0 };
    // SAFETY: valid places.
    let status = unsafe {
        let coefficient = MOISTAIR_ASPIRATED_OVER_WATER;
        moistair_from_psychrometer(15.0, 20.0, MOISTAIR_BULB_WATER, coefficient, basis, &mut blank(), &mut error)
    };
    assert_eq!((status, error.quantity), (203, MOISTAIR_PSYCHROMETER_WET_BULB));
    assert_eq!((error.value, error.max), (20.0, 15.0));
}

#[test]
fn other_pressures() {
    for (code, formulation) in FORMULATIONS {
        let basis = moistair_basis { pressure: 101_325.0, formulation: code, reserved: 0 };
        let of_core = moistair_core::Basis::new(pascals(101_325.0), formulation);
        let ratio = HumidityRatio::from_kilograms_per_kilogram;
        let air = MoistAir::from_dry_bulb(celsius(25.0), ratio(0.01), of_core).unwrap();
        // SAFETY: valid places.
        let state = output(blank::<moistair_state>(), |out| unsafe {
            moistair_from_dry_bulb(25.0, MOISTAIR_HUMIDITY_RATIO, 0.01, basis, out, null_mut())
        });
        // SAFETY: valid places.
        let compressed = output(blank::<moistair_state>(), |out| unsafe {
            moistair_at_temperature_and_pressure(&state, 90.0, 8e5, out, null_mut())
        });
        same(&compressed, &air.at_temperature_and_pressure(celsius(90.0), pascals(8e5)).unwrap());
        // SAFETY: valid places.
        let thin =
            output(blank::<moistair_state>(), |out| unsafe { moistair_at_pressure(&state, 5e4, out, null_mut()) });
        same(&thin, &air.at_pressure(pascals(5e4)).unwrap());
        // SAFETY: valid places.
        let dew_point = number(|out| unsafe {
            moistair_saturation_temperature_at(&state, MOISTAIR_DEW_POINT, 8e5, out, null_mut())
        });
        assert_eq!(dew_point, air.dew_point_at(pascals(8e5)).unwrap().celsius());
        let line = of_core.at_pressure(pascals(8e5));
        let free: FrostPoint = saturation_point_after(DewPoint::from_celsius(3.0), line, pascals(1e5)).unwrap();
        // SAFETY: valid places.
        let after = number(|out| unsafe {
            let line = moistair_basis { pressure: 8e5, ..basis };
            moistair_saturation_temperature_after(
                MOISTAIR_DEW_POINT,
                3.0,
                line,
                MOISTAIR_FROST_POINT,
                1e5,
                out,
                null_mut(),
            )
        });
        assert_eq!(after, free.celsius());

        let wet =
            AirWithCondensate::from_dry_bulb_and_water(celsius(-5.0), ratio(0.01), Freezing::Equilibrium, of_core)
                .unwrap();
        // SAFETY: valid places.
        let mixture = output(blank::<moistair_air_with_condensate>(), |out| unsafe {
            moistair_from_dry_bulb_and_water(-5.0, 0.01, MOISTAIR_FREEZING_EQUILIBRIUM, basis, out, null_mut())
        });
        same(&mixture.air, &wet.air());
        assert_eq!((mixture.liquid, mixture.ice), (0.0, wet.ice().kilograms_per_kilogram()));

        let intake = AirStream::new(air, MassFlow::from_kilograms_per_second(2.0)).unwrap();
        let done = compression::to_pressure(&intake.into(), pascals(8e5), celsius(30.0)).unwrap();
        let stream = moistair_stream { air: state, dry_air_flow: 2.0 };
        // SAFETY: valid places.
        let line = unsafe {
            let entering = output(blank::<moistair_wet_stream>(), |out| {
                moistair_wet_stream_from_stream(&stream, 0.0, 0.0, out, null_mut())
            });
            output(blank::<moistair_compressed>(), |out| {
                moistair_compression_to_pressure(&entering, 8e5, 30.0, out, null_mut())
            })
        };
        same(&line.leaving.mixture.air, &done.separated().air());
        assert_eq!(line.condensate, done.condensate.kilograms_per_second());
        assert_eq!(line.exchange.heat, done.exchange.heat.watts());
        assert!(line.condensate > 0.0);
    }
}

/// Each of the new properties by its selector, beside the typed reader of the core.
#[test]
fn transport() {
    for (code, formulation) in FORMULATIONS {
        let basis = moistair_core::Basis::new(pascals(101_325.0), formulation);
        let air = MoistAir::from_dry_bulb(celsius(60.0), DewPoint::from_celsius(40.0), basis).unwrap();
        let basis = moistair_basis { pressure: 101_325.0, formulation: code, reserved: 0 };
        // SAFETY: valid places.
        let state = output(blank::<moistair_state>(), |out| unsafe {
            moistair_from_dry_bulb(60.0, MOISTAIR_DEW_POINT, 40.0, basis, out, null_mut())
        });
        for (selector, expected) in [
            (MOISTAIR_DYNAMIC_VISCOSITY, air.dynamic_viscosity().pascal_seconds()),
            (MOISTAIR_THERMAL_CONDUCTIVITY, air.thermal_conductivity().watts_per_meter_kelvin()),
            (MOISTAIR_VAPOR_DIFFUSIVITY, air.vapor_diffusivity().square_meters_per_second()),
            (MOISTAIR_PRANDTL_NUMBER, air.prandtl_number()),
            (MOISTAIR_SCHMIDT_NUMBER, air.schmidt_number()),
            (MOISTAIR_LEWIS_NUMBER, air.lewis_number()),
        ] {
            // SAFETY: valid places.
            let value = number(|out| unsafe { moistair_property(&state, selector, out, null_mut()) });
            assert_eq!(value, expected, "{selector}");
        }
    }
}

#[test]
fn two_properties() {
    for (selector, formulation) in FORMULATIONS {
        let basis = moistair_basis { pressure: 95e3, formulation: selector, reserved: 0 };
        let of_core = moistair_core::Basis::new(pascals(95e3), formulation);
        let pairs = [
            (MOISTAIR_DEW_POINT, 4.0, MOISTAIR_RELATIVE_HUMIDITY, 0.4),
            (MOISTAIR_SPECIFIC_ENTHALPY, 45e3, MOISTAIR_RELATIVE_HUMIDITY, 0.5),
            (MOISTAIR_WET_BULB, 16.0, MOISTAIR_HUMIDITY_RATIO, 0.008),
        ];
        for (first, a, second, b) in pairs {
            // SAFETY: a valid place.
            let call = |out| unsafe { moistair_from_two_properties(first, a, second, b, basis, out, null_mut()) };
            let [first, second] = [first, second].map(|code| Quantity::from_code(code).unwrap());
            same(&output(blank(), call), &MoistAir::from_two_properties_and(first, a, second, b, of_core).unwrap());
        }
        let mut error = blank::<moistair_error>();
        let mut refused = |second, b| {
            let mut state = blank();
            // SAFETY: valid places.
            unsafe { moistair_from_two_properties(MOISTAIR_DEW_POINT, 20.0, second, b, basis, &mut state, &mut error) };
            (error.code, error.quantity, error.value)
        };
        let (code, quantity, value) = refused(MOISTAIR_HUMIDITY_RATIO, 0.01);
        assert_eq!((code, quantity, value.is_nan()), (MOISTAIR_UNDETERMINED, MOISTAIR_HUMIDITY_RATIO, true));
        assert_eq!(refused(MOISTAIR_WET_BULB, 10.0), (MOISTAIR_UNATTAINABLE_TOGETHER, MOISTAIR_WET_BULB, 10.0));
    }
}

#[test]
fn derivatives() {
    for (_, formulation) in FORMULATIONS {
        let basis = moistair_core::Basis::new(pascals(95e3), formulation);
        let air =
            MoistAir::from_dry_bulb(celsius(24.0), HumidityRatio::from_kilograms_per_kilogram(0.007), basis).unwrap();
        let state = moistair_state::from(air);
        let properties = || Quantity::ALL.iter().copied().filter(|quantity| quantity.is_property());
        let mask = properties().fold(0, |mask, property| mask | 1_u64 << property.code());
        let mut values = [blank::<moistair_property_derivatives>(); MOISTAIR_PROPERTY_COUNT as usize];
        let mut have = 0;
        let second = Quantity::WetBulb;
        // SAFETY: valid places.
        let status =
            unsafe { moistair_derivatives(&state, second.code(), mask, values.as_mut_ptr(), &mut have, null_mut()) };
        assert_eq!(status, MOISTAIR_OK);
        let mut compared = 0;
        for property in properties() {
            let of = values[property.code() as usize];
            match air.derivatives(property, second) {
                Ok(core) => {
                    let ours = [of.value, of.by_dry_bulb, of.by_second, of.by_pressure].map(f64::to_bits);
                    let cores = [core.value, core.by_dry_bulb, core.by_second, core.by_pressure].map(f64::to_bits);
                    assert_eq!(ours, cores, "{property:?}");
                    compared += 1;
                }
                Err(_) => assert!(of.value.is_nan() && have >> property.code() & 1 == 0, "{property:?}"),
            }
        }
        assert!(compared > 20);
    }
}

/// A step of every kind, beside the same step of the core; a chain; what a failing step leaves; a number solved for.
#[test]
fn sequences() {
    use moistair_core::process::coil::{Arrangement, CoilSurface, CoilWater, CondensateTemperature, Coolant};
    use moistair_core::process::desiccant::{CarryOver, Sorption};
    use moistair_core::process::evaporative::{DirectCooler, IndirectCooler, IndirectEffectiveness, WaterTreatment};
    use moistair_core::process::humidify::{EvaporatingWater, Washer};
    use moistair_core::process::room::{MoistureSource, RoomGains};
    use moistair_core::sequence::{Free, Step, StepResult, Target, Total, run, solve};
    use moistair_core::{Conductance, HeatFlow, RelativeHumidity, SpecificEnthalpy, TemperatureDifference};

    for (code, formulation) in FORMULATIONS {
        let basis = moistair_core::Basis::new(pascals(101_325.0), formulation);
        let air = |t, fraction| {
            MoistAir::from_dry_bulb(celsius(t), RelativeHumidity::from_fraction(fraction), basis).unwrap()
        };
        let flow = MassFlow::from_kilograms_per_second;
        let stream = |t, fraction, m| AirStream::new(air(t, fraction), flow(m)).unwrap();
        let c_stream = |t, fraction, m| -> moistair_wet_stream {
            let basis = moistair_basis { pressure: 101_325.0, formulation: code, reserved: 0 };
            // SAFETY: valid places.
            let gas = output(blank(), |out| unsafe {
                moistair_from_dry_bulb(t, MOISTAIR_RELATIVE_HUMIDITY, fraction, basis, out, null_mut())
            });
            let gas = moistair_stream { air: gas, dry_air_flow: m };
            // SAFETY: valid places.
            output(blank(), |out| unsafe { moistair_wet_stream_from_stream(&gas, 0.0, 0.0, out, null_mut()) })
        };
        let of_kind = |kind| moistair_step {
            kind,
            stream: c_stream(20.0, 0.4, 1.0),
            state: c_stream(14.0, 0.9, 1.0).mixture.air,
            surface: moistair_coil_surface {
                air_side: 2e3,
                water_side: 3e3,
                arrangement: MOISTAIR_COUNTERFLOW,
                reserved: 0,
            },
            water: moistair_coil_water { flow: 0.8, entering: 6.0, specific_heat: 0.0 },
            leaving_temperature: 16.0,
            heat_flow: 4e3,
            relative_humidity: 0.93,
            humidity_ratio: if kind == MOISTAIR_STEP_DESICCANT_BY_EFFECTIVENESS { 0.002 } else { 0.013 },
            apparatus_dew_point: 9.0,
            bypass_factor: 0.1,
            condensate_temperature: 11.0,
            water_flow: 1e-3,
            water_temperature: 15.0,
            steam_enthalpy: 2.68e6,
            saturation_effectiveness: 0.8,
            pressure: 1.1e5,
            direct_cooler: moistair_direct_cooler {
                saturation_effectiveness: 0.85,
                circulating: 0.9,
                pump_heat: 200.0,
                make_up_temperature: 15.0,
                treatment: moistair_water_treatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 },
                make_up: MOISTAIR_WATER_AT_GIVEN,
                reserved: 0,
            },
            indirect_cooler: moistair_indirect_cooler {
                effectiveness: 0.6,
                exhaust_humidity: 0.95,
                pump_heat: 150.0,
                water_temperature: 0.0,
                effectiveness_of: MOISTAIR_EFFECTIVENESS_OF_WET_BULB,
                water: MOISTAIR_WATER_AT_WET_BULB,
            },
            washer: moistair_washer {
                water: 2.0,
                temperature: 25.0,
                effectiveness: 0.8,
                pump_heat: 900.0,
                carry_over_fraction: 1e-4,
            },
            gains: moistair_room_gains {
                sensible: 5e3,
                moisture: 1e-3,
                source_value: 32.0,
                source: MOISTAIR_SOURCE_SATURATED_VAPOR,
                reserved: 0,
            },
            sorption: moistair_sorption {
                heat_ratio: 1.1,
                carry_over_value: 4.0,
                carry_over: MOISTAIR_CARRIES_RISE,
                reserved: 0,
            },
            drying_effectiveness: 0.5,
            condensate: MOISTAIR_CONDENSATE_AT_GIVEN,
            evaporating_water: MOISTAIR_WATER_AT_GIVEN,
            ..blank()
        };
        let condensate = CondensateTemperature::Given(celsius(11.0));
        let (relative_humidity, leaving) = (RelativeHumidity::from_fraction(0.93), celsius(16.0));
        let enthalpy = SpecificEnthalpy::from_joules_per_kilogram(2.68e6);
        let surface = CoilSurface {
            air_side: Conductance::from_watts_per_kelvin(2e3),
            water_side: Conductance::from_watts_per_kelvin(3e3),
            arrangement: Arrangement::Counterflow,
        };
        let water = CoilWater { flow: flow(0.8), entering: celsius(6.0), coolant: Coolant::Water };
        let ratio = HumidityRatio::from_kilograms_per_kilogram(0.013);
        let carry_over = CarryOver::Rise(TemperatureDifference::from_kelvins(4.0));
        let sorption = Sorption { heat_ratio: 1.1, carry_over };
        let steps = [
            Step::ToTemperature(leaving),
            Step::WithHeat(HeatFlow::from_watts(4e3)),
            Step::CoilToState { leaving: air(14.0, 0.9), condensate },
            Step::CoilToTemperature { leaving, relative_humidity, condensate },
            Step::CoilByBypassFactor { apparatus_dew_point: celsius(9.0), bypass_factor: 0.1, condensate },
            Step::CoilWithWater { surface, water, condensate },
            Step::CoilWithReheat { target: air(14.0, 0.9), coil_leaving: relative_humidity, condensate },
            Step::Steam { flow: flow(1e-3), enthalpy },
            Step::SteamToHumidityRatio { target: ratio, enthalpy },
            Step::SteamToRelativeHumidity { target: relative_humidity, enthalpy },
            Step::Spray { flow: flow(1e-3), temperature: celsius(15.0) },
            Step::Evaporative { saturation_effectiveness: 0.8, water: EvaporatingWater::Given(celsius(15.0)) },
            Step::Mix(stream(20.0, 0.4, 1.0).into()),
            Step::Eliminate,
            Step::Compress { pressure: pascals(1.1e5), leaving },
            Step::DirectCooler(DirectCooler {
                saturation_effectiveness: 0.85,
                circulating: flow(0.9),
                pump_heat: HeatFlow::from_watts(200.0),
                make_up: EvaporatingWater::Given(celsius(15.0)),
                treatment: WaterTreatment { drift_fraction: 1e-4, cycles_of_concentration: 3.0 },
            }),
            Step::Wash(Washer {
                water: flow(2.0),
                temperature: celsius(25.0),
                effectiveness: 0.8,
                pump_heat: HeatFlow::from_watts(900.0),
                carry_over_fraction: 1e-4,
            }),
            Step::IndirectCooler {
                secondary: stream(20.0, 0.4, 1.0),
                cooler: IndirectCooler {
                    effectiveness: IndirectEffectiveness::OfWetBulb(0.6),
                    exhaust_humidity: RelativeHumidity::from_fraction(0.95),
                    pump_heat: HeatFlow::from_watts(150.0),
                    water: EvaporatingWater::AtWetBulb,
                },
            },
            Step::Room(RoomGains {
                sensible: HeatFlow::from_watts(5e3),
                moisture: flow(1e-3),
                source: MoistureSource::SaturatedVapor(celsius(32.0)),
            }),
            Step::DesiccantToHumidityRatio { target: ratio, sorption },
            Step::DesiccantByEffectiveness {
                effectiveness: 0.5,
                driest: HumidityRatio::from_kilograms_per_kilogram(0.002),
                sorption,
            },
        ];
        let same_result = |done: &moistair_step_result, expected: &StepResult| {
            same(&done.entering.mixture.air, &expected.entering.air().air());
            same(&done.leaving.mixture.air, &expected.leaving.air().air());
            assert_eq!(done.leaving.mixture.liquid, expected.leaving.air().liquid().kilograms_per_kilogram());
            assert_eq!(done.leaving.dry_air_flow, expected.leaving.dry_air_flow().kilograms_per_second());
            assert_eq!(done.exchange.heat, expected.exchange.heat.watts());
            assert_eq!(done.exchange.water, expected.exchange.water.kilograms_per_second());
            assert_eq!(done.exchange.water_enthalpy_flow, expected.exchange.water_enthalpy_flow.watts());
            let (found, loads) = (&done.loads, &expected.loads);
            for (found, expected) in [
                (found.heating, loads.heating),
                (found.cooling, loads.cooling),
                (found.sensible_cooling, loads.sensible_cooling),
                (found.latent_cooling, loads.latent_cooling),
                (found.recovered, loads.recovered),
                (found.gains, loads.gains),
                (found.water_heat, loads.water_heat),
                (found.fan_work, loads.fan_work),
                (found.fan_power, loads.fan_power),
                (found.compression, loads.compression),
            ] {
                assert_eq!(found, expected.watts());
            }
            for (found, expected) in [
                (found.condensate, loads.condensate),
                (found.steam, loads.steam),
                (found.humidifying_water, loads.humidifying_water),
                (found.moisture_gain, loads.moisture_gain),
                (found.recovered_water, loads.recovered_water),
                (found.secondary_water, loads.secondary_water),
                (found.mixed_in, loads.mixed_in),
            ] {
                assert_eq!(found, expected.kilograms_per_second());
            }
            assert_eq!(done.books.heat_residual, expected.books.heat_residual.watts());
            assert_eq!(done.books.close, 1);
            assert_eq!(done.regime, expected.regime.map_or(-1, |regime| regime as i32));
            assert_eq!((done.frost, done.condenses), (i32::from(expected.frost), i32::from(expected.condenses)));
        };
        let same_total = |total: &moistair_sequence_total, expected: &Total| {
            same(&total.leaving.mixture.air, &expected.leaving.air().air());
            assert_eq!(total.exchange.heat, expected.exchange.heat.watts());
            assert_eq!(total.loads.cooling, expected.loads.cooling.watts());
            assert_eq!(total.books.heat_residual, expected.books.heat_residual.watts());
            assert_eq!((total.books.close, total.frost), (1, i32::from(expected.frost)));
        };
        let (entering, c_entering) = (stream(30.0, 0.4, 1.0).into(), c_stream(30.0, 0.4, 1.0));
        let c_run = |steps: &[moistair_step], results: &mut [moistair_step_result], ran: &mut usize, total: *mut _| {
            assert_eq!(steps.len(), results.len());
            // SAFETY: valid places.
            unsafe {
                moistair_sequence_run(
                    &c_entering,
                    steps.as_ptr(),
                    steps.len(),
                    results.as_mut_ptr(),
                    ran,
                    total,
                    null_mut(),
                )
            }
        };
        for step in &steps {
            let mut results = [None];
            let expected = run(&entering, &[*step], &mut results).unwrap();
            let (mut done, mut ran) = ([blank()], 0);
            let total = output(blank(), |out| c_run(&[of_kind(step.code())], &mut done, &mut ran, out));
            assert_eq!(ran, 1);
            same_result(&done[0], &results[0].unwrap());
            same_total(&total, &expected);
        }

        let kinds = [
            MOISTAIR_STEP_MIX,
            MOISTAIR_STEP_COIL_TO_TEMPERATURE,
            MOISTAIR_STEP_WITH_HEAT,
            MOISTAIR_STEP_STEAM,
            MOISTAIR_STEP_COIL_WITH_REHEAT,
        ];
        let mut c_chain = kinds.map(of_kind);
        let mut chain = kinds.map(|kind| *steps.iter().find(|step| step.code() == kind).unwrap());
        let mut results = [None; 5];
        let expected = run(&entering, &chain[..4], &mut results).unwrap();
        let (mut done, mut ran) = ([blank(); 5], 0);
        let total = output(blank(), |out| c_run(&c_chain[..4], &mut done[..4], &mut ran, out));
        assert_eq!(ran, 4);
        same_total(&total, &expected);
        done[..4].iter().zip(&results).for_each(|(done, expected)| same_result(done, &expected.unwrap()));
        // The last step asks for moister air than there is: those before it stand.
        c_chain[4].state = c_stream(25.0, 0.9, 1.0).mixture.air;
        let (mut done, mut untouched) = ([blank(); 5], blank::<moistair_sequence_total>());
        assert_eq!(c_run(&c_chain, &mut done, &mut ran, &mut untouched), MOISTAIR_INFEASIBLE);
        assert_eq!((ran, untouched.loads.mixed_in), (4, 0.0));
        done[..4].iter().zip(&results).for_each(|(done, expected)| same_result(done, &expected.unwrap()));
        // No steps change nothing, and need no memory.
        // SAFETY: valid places, no array.
        let nothing = output(blank::<moistair_sequence_total>(), |out| unsafe {
            moistair_sequence_run(&c_entering, core::ptr::null(), 0, null_mut(), &mut ran, out, null_mut())
        });
        assert_eq!((ran, nothing.leaving.dry_air_flow, nothing.exchange.heat), (0, 1.0, 0.0));
        c_chain[1].kind = 99;
        assert_eq!(c_run(&c_chain, &mut done, &mut ran, &mut untouched), MOISTAIR_UNKNOWN_SELECTOR);
        assert_eq!(ran, 1);

        let mut c_chain = kinds.map(of_kind);
        let free = moistair_free { low: 5.0, high: 90.0, step: 1, quantity: MOISTAIR_LEAVING_TEMPERATURE };
        let target = moistair_target { value: 0.0075, after: -1, property: MOISTAIR_HUMIDITY_RATIO };
        // SAFETY: valid places.
        let solved = output(blank::<moistair_solved>(), |out| unsafe {
            moistair_sequence_solve(
                &c_entering,
                c_chain.as_ptr(),
                4,
                &free,
                &target,
                done.as_mut_ptr(),
                out,
                null_mut(),
            )
        });
        let free = Free { step: 1, number: Quantity::LeavingTemperature, low: 5.0, high: 90.0 };
        let target = Target { after: None, quantity: Quantity::HumidityRatio, value: 0.0075 };
        let expected = solve(&entering, &mut chain[..4], &mut results, free, target).unwrap();
        assert_eq!(
            (solved.status, solved.number, solved.reached),
            (MOISTAIR_SOLVE_SOLVED, expected.number, expected.reached)
        );
        assert_eq!((solved.low, solved.reached_at_low), (expected.low.number, expected.low.reached));
        assert_eq!((solved.high, solved.reached_at_high), (expected.high.number, expected.high.reached));
        assert_eq!((solved.refused, solved.refused_step), (MOISTAIR_INFEASIBLE, 1));
        assert_eq!((solved.residual, solved.evaluations), (expected.residual, expected.evaluations));
        same_total(&solved.total, &expected.total);
        done[..4].iter().zip(&results).for_each(|(done, expected)| same_result(done, &expected.unwrap()));
        c_chain[1].leaving_temperature = solved.number;
        let total = output(blank(), |out| c_run(&c_chain[..4], &mut done[..4], &mut ran, out));
        same_total(&total, &expected.total);
    }
}

/// Rooms and desiccants: what the core gives.
#[test]
fn rooms_and_desiccants() {
    use moistair_core::process::desiccant::{self, CarryOver, Regeneration, Sorption, potentials};
    use moistair_core::process::reheat::CoilLeaving;
    use moistair_core::process::room::{self, MoistureSource, RoomGains};

    let ratio = moistair_core::HumidityRatio::from_kilograms_per_kilogram;
    for (code, formulation) in FORMULATIONS {
        let of_core = moistair_core::Basis::new(pascals(101_325.0), formulation);
        let basis = moistair_basis { pressure: 101_325.0, formulation: code, reserved: 0 };
        let both = |t: f64, w: f64| {
            let air = MoistAir::from_dry_bulb(celsius(t), ratio(w), of_core).unwrap();
            // SAFETY: valid places.
            let state = output(blank::<moistair_state>(), |out| unsafe {
                moistair_from_dry_bulb(t, MOISTAIR_HUMIDITY_RATIO, w, basis, out, null_mut())
            });
            (air, state)
        };
        let ((space, room), (outdoor, outside)) = (both(24.0, 0.0093), both(31.0, 0.014));
        let of_core = RoomGains {
            sensible: moistair_core::HeatFlow::from_watts(3e3),
            moisture: MassFlow::from_kilograms_per_second(1.5e-3),
            source: MoistureSource::SaturatedVapor(celsius(32.0)),
        };
        let gains = moistair_room_gains {
            sensible: 3e3,
            moisture: 1.5e-3,
            source_value: 32.0,
            source: MOISTAIR_SOURCE_SATURATED_VAPOR,
            reserved: 0,
        };
        let expected = room::supply_at_temperature(&space, &of_core, celsius(14.0)).unwrap();
        // SAFETY: valid places.
        let supplied = output(blank::<moistair_room_air>(), |out| unsafe {
            moistair_room_supply_at_temperature(&room, &gains, 14.0, out, null_mut())
        });
        same(&supplied.supply.air, &expected.supply.air());
        assert_eq!(supplied.supply.dry_air_flow, expected.supply.dry_air_flow().kilograms_per_second());
        // SAFETY: valid places.
        let found = output(blank::<moistair_room_dew_points>(), |out| unsafe {
            moistair_room_apparatus_dew_points(&room, 0.65, out, null_mut())
        });
        let expected = room::apparatus_dew_points(&space, 0.65).unwrap();
        assert_eq!((found.count, found.warmer), (2, expected.warmer.unwrap().celsius()));
        let coil =
            moistair_coil_leaving { fraction: 0.1, coldest: 4.0, kind: MOISTAIR_COIL_LEAVES_BYPASS, reserved: 0 };
        let leaving = CoilLeaving::Bypass { factor: 0.1, coldest: celsius(4.0) };
        let expected = room::least_reheat(&space, &of_core, &outdoor, leaving).unwrap();
        // SAFETY: valid places.
        let least = output(blank::<moistair_least_reheat>(), |out| unsafe {
            moistair_room_least_reheat(&room, &gains, &outside, &coil, out, null_mut())
        });
        assert_eq!((least.reheat, least.cause), (expected.reheat.watts(), MOISTAIR_REHEAT_COLDEST_COIL));
        same(&least.coil_leaving, &expected.coil_leaving);

        let stream = |air| AirStream::new(air, MassFlow::from_kilograms_per_second(1.0)).unwrap();
        let [process, other] = [room, outside].map(|air| moistair_stream { air, dry_air_flow: 1.0 });
        let rise = moistair_core::TemperatureDifference::from_kelvins(4.0);
        let how = Sorption { heat_ratio: 1.1, carry_over: CarryOver::Rise(rise) };
        let sorption = moistair_sorption {
            heat_ratio: 1.1,
            carry_over_value: 4.0,
            carry_over: MOISTAIR_CARRIES_RISE,
            reserved: 0,
        };
        let known = Regeneration::Entering(celsius(90.0));
        let expected = desiccant::wheel(&stream(space), ratio(0.005), how, &stream(outdoor), known).unwrap();
        // SAFETY: valid places.
        let wheel = output(blank::<moistair_wheel>(), |out| unsafe {
            let known = MOISTAIR_REGENERATION_ENTERING;
            moistair_desiccant_wheel(&process, 0.005, &sorption, &other, known, 90.0, out, null_mut())
        });
        same(&wheel.regeneration.air, &expected.regeneration.air());
        assert_eq!(wheel.regeneration_heat, expected.regeneration_heat().watts());
        assert_eq!((wheel.status, wheel.entropy_production), (MOISTAIR_WHEEL_POSSIBLE, expected.entropy_production));

        let share = moistair_potentials { first: 0.07, second: 0.9 };
        let hot = moistair_stream { air: wheel.heater.leaving.air, dry_air_flow: 1.0 };
        let effectiveness = potentials::Effectiveness { first: 0.07, second: 0.9 };
        let expected = potentials::wheel(&stream(space), &expected.heater.leaving, effectiveness).unwrap();
        // SAFETY: valid places.
        let turned = output(blank::<moistair_potential_wheel>(), |out| unsafe {
            moistair_desiccant_wheel_by_potentials(&process, &hot, &share, out, null_mut())
        });
        same(&turned.process.air, &expected.process.air());
        assert_eq!(turned.imbalance_heat, expected.imbalance.unwrap().heat.watts());
        assert_eq!(turned.correlation, MOISTAIR_CORRELATION_WITHIN);
    }
}

/// An economizer through C beside that of the core: the same bits, with hysteresis and least times, and safe where a selector names nothing.
#[test]
fn economizer() {
    use moistair_core::process::economizer::{Economizer, EconomizerState, Rule};
    use moistair_core::process::measured::{MeasuredAir, Reading};
    use moistair_core::process::mixing::outdoor_air::{FractionLimits, from_readings};

    let reading =
        |value, standard_uncertainty, quality| moistair_reading { value, standard_uncertainty, quality, reserved: 0 };
    let air = |t, rh, quality| moistair_measured_air {
        dry_bulb: reading(t, 0.3, quality),
        humidity: reading(rh, 0.02, MOISTAIR_QUALITY_GOOD),
        humidity_quantity: MOISTAIR_RELATIVE_HUMIDITY,
        reserved: 0,
    };
    let of_core = |t, rh| MeasuredAir::from_relative_humidity(Reading::new(t, 0.3), Reading::new(rh, 0.02));
    let (mut compared, mut switched) = (0, 0);
    for (code, formulation) in FORMULATIONS {
        let basis = moistair_basis { pressure: 95e3, formulation: code, reserved: 0 };
        let site = moistair_core::Basis::new(pascals(95e3), formulation);
        for rule in Rule::ALL {
            let core = Economizer::new(rule, site);
            // SAFETY: valid places.
            let settings = output(blank::<moistair_economizer>(), |out| unsafe {
                moistair_economizer_new(rule.code(), basis, out, null_mut())
            });
            // SAFETY: a valid place.
            assert_eq!(unsafe { moistair_economizer_check(&settings, null_mut()) }, MOISTAIR_OK);
            let (mut memory, mut state) = (EconomizerState::default(), moistair_economizer_state { words: [0; 6] });
            for step in 0..60 {
                let swing = f64::from(30 - (step % 60_i32 - 30).abs());
                let (t, rh, time) = (8.0 + 0.8 * swing, 0.5, 200.0 * f64::from(step));
                let decided = core.decide(&mut memory, time, &of_core(t, rh), &of_core(24.0, 0.5));
                let (outdoor, returned) = (air(t, rh, 0), air(24.0, 0.5, 0));
                // SAFETY: valid places.
                let decision = output(blank::<moistair_decision>(), |out| unsafe {
                    moistair_economizer_decide(&settings, &mut state, time, &outdoor, &returned, out, null_mut())
                });
                let ours = [decision.margin, decision.margin_uncertainty, decision.confidence].map(f64::to_bits);
                let cores = [decided.margin, decided.margin_uncertainty, decided.confidence].map(f64::to_bits);
                assert_eq!(ours, cores);
                assert_eq!(decision.reason, decided.reason.code());
                assert_eq!(decision.enabled != 0, decided.enabled);
                compared += 1;
                let [warm, room] = [t, 24.0].map(|t| {
                    // SAFETY: valid places.
                    output(blank::<moistair_state>(), |out| unsafe {
                        moistair_from_dry_bulb(t, MOISTAIR_RELATIVE_HUMIDITY, 0.5, basis, out, null_mut())
                    })
                });
                if step % 20 == 0 {
                    // SAFETY: valid places.
                    let blend = output(blank::<moistair_blend>(), |out| unsafe {
                        moistair_economizer_outdoor_air(&decision, &warm, &room, 16.0, 0.2, 0.9, out, null_mut())
                    });
                    let states = [t, 24.0].map(|t| of_core(t, 0.5).state(site).unwrap());
                    let limits = FractionLimits { least: 0.2, most: 0.9 };
                    let expected = decided.outdoor_air(&states[0], &states[1], celsius(16.0), limits).unwrap();
                    assert_eq!(blend.fraction.to_bits(), expected.fraction.to_bits());
                    same(&blend.leaving.mixture.air, &expected.mixed.leaving.air().air());
                }
            }
            switched += memory.switches();

            // Off at once for a quality, a quantity or a rule that names nothing.
            let mut hidden = air(12.0, 0.5, 0);
            hidden.humidity_quantity = 99;
            let strange = moistair_economizer { rule: 77, ..settings };
            let needs_humidity = !matches!(rule, Rule::FixedDryBulb | Rule::DifferentialDryBulb);
            let without = if needs_humidity { MOISTAIR_ECONOMIZER_REASON_OUTDOOR_HUMIDITY_BAD } else { 0 };
            for (settings, outdoor, reason) in [
                (settings, hidden, without),
                (settings, air(12.0, 0.5, 7), MOISTAIR_ECONOMIZER_REASON_OUTDOOR_DRY_BULB_BAD),
                (strange, air(12.0, 0.5, 0), MOISTAIR_ECONOMIZER_REASON_SETTINGS_INVALID),
            ] {
                let returned = air(24.0, 0.5, 0);
                // SAFETY: valid places.
                let decision = output(blank::<moistair_decision>(), |out| unsafe {
                    moistair_economizer_decide(&settings, &mut state, 1e6, &outdoor, &returned, out, null_mut())
                });
                assert_eq!((decision.enabled != 0, decision.reason), (reason == 0, reason));
            }
        }
    }
    println!("economizer: {compared} decisions compared, {switched} switches");
    assert!(switched > 30);

    let found = from_readings(
        Quantity::DryBulb,
        Reading::new(4.0, 0.2),
        Reading::new(24.0, 0.2),
        Reading::new(19.0, 0.2),
        0.05,
    );
    let [outdoor, returned, mixed] = [4.0, 24.0, 19.0].map(|t| reading(t, 0.2, 0));
    // SAFETY: valid places.
    let same_one = output(blank::<moistair_outdoor_air_fraction>(), |out| unsafe {
        moistair_outdoor_air_from_readings(MOISTAIR_DRY_BULB, &outdoor, &returned, &mixed, 0.05, out, null_mut())
    });
    assert_eq!(same_one.fraction, 0.25);
    assert_eq!(same_one.standard_uncertainty, found.unwrap().standard_uncertainty.unwrap());
    assert_eq!(same_one.status, MOISTAIR_FRACTION_DETERMINED);
}
