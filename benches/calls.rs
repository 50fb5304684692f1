//! Calls whose instructions `instructions.sh` counts: each in a function of its own, once for each of some rows. Prints how many rows.

use std::hint::black_box;

use moistair_benches::air;
use moistair_core::process::AirStream;
use moistair_core::process::coil::{self, CondensateTemperature};
use moistair_core::{
    AirWithCondensate, Basis, DewPoint, Formulation, Freezing, HumidityRatio, MassFlow, MoistAir, Pressure, Quantity,
    RelativeHumidity, SpecificEnthalpy, Temperature,
};

const ROWS: usize = 60;

/// What the calls start from.
struct Case {
    dry_bulb: Temperature,
    humidity: RelativeHumidity,
    basis: Basis,
    air: MoistAir,
    dew_point: DewPoint,
    stream: AirStream,
    apparatus: Temperature,
    fog: (SpecificEnthalpy, HumidityRatio),
}

/// Functions whose names the script looks for: `measured_` and the name of the call.
macro_rules! calls {
    ($($name:ident: |$case:ident| $call:expr;)*) => {
        $(#[inline(never)]
        fn $name($case: &Case) {
            let _ = black_box($call);
        })*

        fn count(case: &Case) {
            $($name(black_box(case));)*
        }
    };
}

calls! {
    measured_nothing: |case| case.dry_bulb;
    measured_from_relative_humidity: |case| MoistAir::from_dry_bulb(case.dry_bulb, case.humidity, case.basis);
    measured_saturation_pressure: |case| case.air.value(Quantity::SaturationPressure);
    measured_enthalpy: |case| case.air.value(Quantity::SpecificEnthalpy);
    measured_wet_bulb: |case| case.air.wet_bulb();
    measured_dew_point: |case| case.air.dew_point();
    measured_specific_entropy: |case| case.air.specific_entropy();
    measured_speed_of_sound: |case| case.air.speed_of_sound();
    measured_dynamic_viscosity: |case| case.air.dynamic_viscosity();
    measured_fugacity_of_water: |case| case.air.fugacity_of_water();
    measured_dew_point_derivatives: |case| case.air.derivatives(Quantity::DewPoint, Quantity::RelativeHumidity);
    measured_from_dew_point_and_humidity: |case| {
        MoistAir::from_two_properties(case.dew_point, case.humidity, case.basis)
    };
    measured_equilibrium_fog: |case| {
        AirWithCondensate::from_enthalpy_and_water(case.fog.0, case.fog.1, Freezing::Equilibrium, case.basis)
    };
    measured_coil_by_bypass_factor: |case| {
        coil::by_bypass_factor(&case.stream, case.apparatus, 0.1, CondensateTemperature::LeavingAir)
    };
}

fn main() {
    let formulation = match std::env::args().nth(1).as_deref() {
        Some("ideal") => Formulation::IdealGas,
        Some("real") => Formulation::RealGas,
        Some("helmholtz") => Formulation::Helmholtz,
        _ => panic!("calls ideal|real|helmholtz"),
    };
    let rows = air::rows(ROWS);
    for i in 0..ROWS {
        let basis = Basis::new(Pressure::from_pascals(rows.pressure[i]), formulation);
        let dry_bulb = Temperature::from_celsius(rows.dry_bulb[i]);
        let humidity = RelativeHumidity::from_fraction(rows.relative_humidity[i]);
        let air = MoistAir::from_dry_bulb(dry_bulb, humidity, basis).unwrap();
        let dew_point = air.dew_point().unwrap().celsius();
        let saturated =
            MoistAir::from_dry_bulb(Temperature::from_celsius(dew_point), air.humidity_ratio(), basis).unwrap();
        let water = HumidityRatio::from_kilograms_per_kilogram(air.humidity_ratio().kilograms_per_kilogram() + 0.001);
        count(&Case {
            dry_bulb,
            humidity,
            basis,
            air,
            dew_point: DewPoint::from_celsius(dew_point),
            stream: AirStream::new(air, MassFlow::from_kilograms_per_second(1.0)).unwrap(),
            apparatus: Temperature::from_celsius((dew_point - 5.0).max(-40.0)),
            fog: (saturated.specific_enthalpy(), water),
        });
    }
    println!("{ROWS}");
}
