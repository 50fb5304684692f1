//! What is compared with what.

use moistair_core::*;

use crate::measure::{self, Errors, Measured, over};
use crate::page::{Row, Section};
use crate::sample::{EVERYDAY, Point, ROOMS, Region, WHOLE};

/// The yardstick: the published standard.
const STANDARD: Formulation = Formulation::Helmholtz;

fn properties() -> Vec<Quantity> {
    let by_definition = [Quantity::DryBulb, Quantity::Pressure, Quantity::HumidityRatio];
    Quantity::ALL.iter().copied().filter(|q| q.is_property() && !by_definition.contains(q)).collect()
}

/// The limits that the default formulation has to keep in [`EVERYDAY`].
fn budget_of_real_gas(property: Quantity) -> Option<f64> {
    Some(match property {
        Quantity::SpecificVolume | Quantity::Density => 1e-7,
        Quantity::SpecificEnthalpy => 0.1,
        Quantity::SpecificEntropy => 1e-3,
        Quantity::SpecificHeat => 1e-6,
        // The error of the saturation mole fraction.
        Quantity::RelativeHumidity | Quantity::RelativeHumidityOverLiquid => 3e-8,
        Quantity::DewPoint
        | Quantity::FrostPoint
        | Quantity::WetBulb
        | Quantity::WetBulbOverLiquid
        | Quantity::WetBulbOverIce => 1e-6,
        _ => return None,
    })
}

/// The limits of single precision in [`ROOMS`].
fn budget_of_single(property: Quantity) -> Option<f64> {
    match property {
        Quantity::HumidityRatio => Some(5e-6),
        Quantity::WetBulb => Some(1e-3),
        _ => None,
    }
}

/// Places of sections in the list of all.
pub const REAL: usize = 0;
/// The ideal gas.
pub const IDEAL: usize = 3;
/// Single precision, of the real gas.
pub const SINGLE: usize = 4;

/// What makes a figure smaller than an error is.
fn note(property: Quantity) -> &'static str {
    match property {
        Quantity::WaterMoleFraction | Quantity::VaporPressure | Quantity::SpecificHumidity => {
            "from the humidity ratio alone"
        }
        Quantity::DynamicViscosity | Quantity::ThermalConductivity | Quantity::VaporDiffusivity => {
            "the same correlation on both sides"
        }
        _ => "",
    }
}

/// All sections, measured.
pub fn all(points: usize) -> Vec<Section> {
    let mut sections = vec![
        against_standard(Formulation::RealGas, EVERYDAY, points, budget_of_real_gas),
        against_standard(Formulation::RealGas, WHOLE, points, |_| None),
        inputs(EVERYDAY, points / 4),
        against_standard(Formulation::IdealGas, EVERYDAY, points, |_| None),
    ];
    for (formulation, region) in [
        (Formulation::RealGas, ROOMS),
        (Formulation::RealGas, WHOLE),
        (Formulation::IdealGas, ROOMS),
        (STANDARD, ROOMS),
    ] {
        let budget =
            if region.name == ROOMS.name && formulation == Formulation::RealGas { budget_of_single } else { |_| None };
        sections.push(single_precision(
            formulation,
            region,
            points / if formulation == STANDARD { 10 } else { 1 },
            budget,
        ));
    }
    sections
}

fn name(formulation: Formulation) -> &'static str {
    match formulation {
        Formulation::RealGas => "real gas",
        Formulation::IdealGas => "ideal gas",
        _ => "Helmholtz",
    }
}

fn rows(properties: &[Quantity], measured: Measured, budget: impl Fn(Quantity) -> Option<f64>) -> Vec<Row> {
    let row = |(property, errors): (&Quantity, &Errors)| Row {
        name: property.name().to_owned(),
        unit: measure::unit(*property),
        worst: errors.worst(),
        most_of: errors.most_of(),
        count: errors.count(),
        unlike: errors.unlike,
        budget: budget(*property),
        note: String::new(),
    };
    properties.iter().zip(&measured).map(row).collect()
}

/// Whether the wet bulb over the stable surface is one over liquid.
fn is_over_liquid<S: Scalar>(air: &MoistAir<S>, wet_bulb: S) -> bool {
    air.wet_bulb_over_liquid().is_ok_and(|over_liquid| over_liquid.celsius() == wet_bulb)
}

/// Adds the errors of one state against another.
fn compare<S: Scalar>(properties: &[Quantity], air: &MoistAir<S>, truth: &MoistAir, at: Point, errors: &mut Measured) {
    let ratio = truth.humidity_ratio().kilograms_per_kilogram();
    for (property, errors) in properties.iter().zip(errors) {
        match (air.value(*property), truth.value(*property)) {
            (Ok(value), Ok(exact))
                if *property == Quantity::WetBulb && is_over_liquid(air, value) != is_over_liquid(truth, exact) =>
            {
                errors.unlike += 1;
            }
            (Ok(value), Ok(exact)) => errors.add(measure::error(*property, value.to_f64(), exact, ratio), at),
            (Err(_), Err(_)) => {}
            _ => errors.unlike += 1,
        }
    }
}

fn against_standard(
    formulation: Formulation,
    region: Region,
    points: usize,
    budget: impl Fn(Quantity) -> Option<f64>,
) -> Section {
    let properties = &properties();
    let measured = over(region, points, properties.len(), |point, errors| {
        let ratio = point.humidity_ratio(STANDARD);
        let state = |formulation| MoistAir::from_dry_bulb(point.dry_bulb(), ratio, point.basis(formulation));
        match (state(formulation), state(STANDARD)) {
            (Ok(air), Ok(truth)) => compare(properties, &air, &truth, point, errors),
            _ => errors.iter_mut().for_each(|errors| errors.unlike += 1),
        }
    });
    let meaning = match formulation {
        Formulation::RealGas => "How far the fits of the default are from the published standard",
        _ => {
            "How far the handbook's perfect gas is from the published standard: what the model leaves out, not an error of computing"
        }
    };
    let mut rows = rows(properties, measured, budget);
    rows.iter_mut().zip(properties).for_each(|(row, property)| row.note = note(*property).to_owned());
    Section {
        title: format!("{}, f64, against Helmholtz: {}", name(formulation), region.name),
        text: format!("{meaning}, at the same dry bulb, pressure and humidity ratio."),
        notes: "note",
        rows,
    }
}

fn single_precision(
    formulation: Formulation,
    region: Region,
    points: usize,
    budget: impl Fn(Quantity) -> Option<f64>,
) -> Section {
    let mut properties = properties();
    properties.insert(0, Quantity::HumidityRatio);
    let properties = &properties;
    let measured = over(region, points, properties.len(), |point, errors| {
        // The same numbers in both, those that single precision can hold.
        let (celsius, pascals, share) = (point.celsius as f32, point.pascals as f32, point.share as f32);
        let single = MoistAir::<f32>::from_dry_bulb(
            Temperature::from_celsius(celsius),
            RelativeHumidity::from_fraction(share),
            Basis::new(Pressure::from_pascals(pascals), formulation),
        );
        let double = MoistAir::<f64>::from_dry_bulb(
            Temperature::from_celsius(f64::from(celsius)),
            RelativeHumidity::from_fraction(f64::from(share)),
            Basis::new(Pressure::from_pascals(f64::from(pascals)), formulation),
        );
        match (single, double) {
            (Ok(air), Ok(truth)) => compare(properties, &air, &truth, point, errors),
            (Err(_), Err(_)) => {}
            _ => errors.iter_mut().for_each(|errors| errors.unlike += 1),
        }
    });
    Section {
        title: format!("{}, f32 against f64: {}", name(formulation), region.name),
        text: "What single precision costs: states from the same dry bulb and relative humidity.".to_owned(),
        notes: "",
        rows: rows(properties, measured, budget),
    }
}

/// The error of the humidity ratio when a state comes from another second property: that of the property times the condition number.
fn inputs(region: Region, points: usize) -> Section {
    let others: Vec<_> = Quantity::ALL.iter().copied().filter(|q| q.fixes_state()).collect();
    let measured = over(region, points, others.len(), |point, errors| {
        let state = |quantity, value, formulation| {
            MoistAir::<f64>::from_dry_bulb_and(point.dry_bulb(), quantity, value, point.basis(formulation))
        };
        let ratio = point.humidity_ratio(STANDARD).kilograms_per_kilogram();
        let Ok(truth) = state(Quantity::HumidityRatio, ratio, STANDARD) else { return };
        for (quantity, errors) in others.iter().zip(errors) {
            let Ok(value) = truth.value(*quantity) else { continue };
            match state(*quantity, value, Formulation::RealGas) {
                Ok(air) => {
                    let computed = air.humidity_ratio().kilograms_per_kilogram();
                    errors.add((computed - ratio).abs() / ratio, point);
                }
                Err(_) => errors.unlike += 1,
            }
        }
    });
    let mut rows = rows(&others, measured, |_| None);
    for (row, quantity) in rows.iter_mut().zip(&others) {
        row.unit = "relative";
        if let Some((_, point)) = row.worst {
            row.note = condition(*quantity, point);
        }
    }
    Section {
        title: format!("real gas, f64, from other second properties: {}", region.name),
        text: "Error of the humidity ratio when the state comes from its dry bulb and another property, whose value is that of \
               Helmholtz: the error of the property times the condition number, which stands beside for the worst point (\"at an end\": next \
               to dry or saturated, where no difference can be taken on both sides)."
            .to_owned(),
        notes: "condition number",
        rows,
    }
}

/// Relative change of the humidity ratio with the property: per relative change, or per kelvin.
fn condition(quantity: Quantity, point: Point) -> String {
    let state = |quantity, value| {
        MoistAir::<f64>::from_dry_bulb_and(point.dry_bulb(), quantity, value, point.basis(Formulation::RealGas))
    };
    let ratio = point.humidity_ratio(STANDARD).kilograms_per_kilogram();
    let slope = || {
        let value = state(Quantity::HumidityRatio, ratio).ok()?.value(quantity).ok()?;
        let in_kelvins = quantity.unit() == "°C";
        let step = if in_kelvins { 1e-4 } else { value.abs() * 1e-6 };
        let at = |value| state(quantity, value).ok().map(|air| air.humidity_ratio().kilograms_per_kilogram());
        let change = (at(value + step)? - at(value - step)?) / (2.0 * step * ratio);
        Some(if in_kelvins { format!("{:.2e} per K", change.abs()) } else { format!("{:.2e}", (change * value).abs()) })
    };
    slope().unwrap_or_else(|| "at an end".to_owned())
}
