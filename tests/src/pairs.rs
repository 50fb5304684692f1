//! How well two properties without the dry bulb fix a state: what a round trip loses, and what an error of a property does to the dry
//! bulb. The table that the documentation of accuracy shows.

use std::fmt::Write;

use moistair_core::{Basis, Error, Formulation, MoistAir, NoValue, Pressure, Quantity, Temperature, Undetermined};

use crate::checks::Random;

/// The pairs that fix a state, each once.
pub fn offered() -> Vec<(Quantity, Quantity)> {
    let fixing: Vec<_> = Quantity::ALL.iter().copied().filter(|quantity| quantity.fixes_state()).collect();
    let pairs = fixing.iter().enumerate().flat_map(|(i, a)| fixing.iter().skip(i + 1).map(move |b| (*a, *b)));
    pairs.filter(|(a, b)| !is_refused(*a, *b)).collect()
}

/// Whether a pair is refused whatever its values.
pub fn is_refused(first: Quantity, second: Quantity) -> bool {
    let basis: Basis = Basis::real_gas(Pressure::from_pascals(f64::NAN));
    let result = MoistAir::from_two_properties_and(first, f64::NAN, second, f64::NAN, basis);
    matches!(result, Err(Error::Undetermined { .. } | Error::UnknownSelector { .. }))
}

/// ∂t/∂a and ∂t/∂b at constant pressure, by the exact derivatives of both turned round; none where the lines run along each other.
pub fn sensitivity(air: &MoistAir, first: Quantity, second: Quantity) -> Result<[f64; 2], Error> {
    let a = air.derivatives(first, Quantity::HumidityRatio)?;
    let b = air.derivatives(second, Quantity::HumidityRatio)?;
    let determinant = a.by_dry_bulb * b.by_second - a.by_second * b.by_dry_bulb;
    let by = [b.by_second / determinant, -a.by_second / determinant];
    if by.iter().all(|slope| slope.is_finite()) {
        Ok(by)
    } else {
        Err(Error::NoValue { quantity: second, reason: NoValue::DryAir })
    }
}

/// What one kelvin is worth in a property: of a temperature one kelvin; of an enthalpy or a relative humidity what one kelvin of
/// dry bulb makes of it; of what states the vapor, one kelvin of dew point, or of frost point where there is no dew point.
fn one_kelvin(air: &MoistAir, quantity: Quantity) -> Result<f64, Error> {
    if quantity.unit() == "°C" {
        return Ok(1.0);
    }
    let of = air.derivatives(quantity, Quantity::HumidityRatio)?;
    if of.by_dry_bulb != 0.0 {
        return Ok(of.by_dry_bulb.abs());
    }
    let dew_point = air.derivatives(Quantity::DewPoint, quantity);
    let point = dew_point.or_else(|_| air.derivatives(Quantity::FrostPoint, quantity))?;
    Ok(1.0 / point.by_second)
}

/// The condition number: by how many kelvins the dry bulb moves for an error of one kelvin, or what one kelvin is worth, in both
/// properties together.
pub fn condition(air: &MoistAir, first: Quantity, second: Quantity) -> Result<f64, Error> {
    let [by_first, by_second] = sensitivity(air, first, second)?;
    Ok((by_first * one_kelvin(air, first)?).abs() + (by_second * one_kelvin(air, second)?).abs())
}

/// The error of the dry bulb, K, and of the humidity ratio, relative, after a state has been made again from two of its properties. None
/// where one has no value, or where the stable wet bulb is over the other surface than its value alone says.
pub fn round_trip(air: &MoistAir, first: Quantity, second: Quantity) -> Option<Result<[f64; 2], Error>> {
    let (a, b) = (air.value(first).ok()?, air.value(second).ok()?);
    if [(first, a), (second, b)].iter().any(|(quantity, value)| is_ambiguous(air, *quantity, *value)) {
        return None;
    }
    let back = match MoistAir::from_two_properties_and(first, a, second, b, air.basis()) {
        Ok(back) => back,
        Err(Error::Undetermined { reason: Undetermined::DryAir, .. }) => return None,
        Err(error) => return Some(Err(error)),
    };
    let ratio = |air: &MoistAir| air.humidity_ratio().kilograms_per_kilogram();
    let kelvins = (back.dry_bulb().celsius() - air.dry_bulb().celsius()).abs();
    Some(Ok([kelvins, (ratio(&back) - ratio(air)).abs() / ratio(air).max(f64::MIN_POSITIVE)]))
}

fn is_ambiguous(air: &MoistAir, quantity: Quantity, value: f64) -> bool {
    // The stable wet bulb goes by the surface; below the melting temperature a pair takes it over ice.
    let over = if value < 0.02 { Quantity::WetBulbOverIce } else { Quantity::WetBulbOverLiquid };
    let read = || air.value(over).is_ok_and(|other| (other - value).abs() < 1e-8);
    quantity == Quantity::WetBulb && (value.abs() < 0.1 || !read())
}

/// A seeded state of the declared domain, of at least 1e-6 of the vapor that it can hold.
fn anywhere(random: &mut Random, formulation: Formulation) -> Option<MoistAir> {
    let celsius = random.between(-80.0, 150.0);
    let pascals = random.between(20e3_f64.ln(), 1.1e6_f64.ln()).exp();
    let share =
        if random.bits().is_multiple_of(2) { random.between(0.0, 1.0) } else { random.between(-13.8, 0.0).exp() };
    let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
    let by =
        |ratio| MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), Quantity::HumidityRatio, ratio, basis);
    let most = by(10.0).map_or_else(|error| error.value_and_limits().map(|(_, _, most)| most), |_| Some(10.0))?;
    by(share * most).ok()
}

/// A seeded state of a room or a plant: 5 to 40 °C, 20 to 90 %, 101 325 Pa.
fn indoors(random: &mut Random, formulation: Formulation) -> Option<MoistAir> {
    let basis = Basis::new(Pressure::from_pascals(101_325.0), formulation);
    let celsius = Temperature::from_celsius(random.between(5.0, 40.0));
    MoistAir::from_dry_bulb_and(celsius, Quantity::RelativeHumidity, random.between(0.2, 0.9), basis).ok()
}

/// What a pair is worth.
#[derive(Clone, Copy, Debug)]
pub struct Pair {
    /// One property.
    pub first: Quantity,
    /// The other.
    pub second: Quantity,
    /// Round trips made.
    pub states: usize,
    /// The worst error of the dry bulb in a round trip, K.
    pub kelvins: f64,
    /// The worst relative error of the humidity ratio.
    pub vapor: f64,
    /// The largest condition number over the declared domain.
    pub condition: f64,
    /// The largest from 5 to 40 °C, 20 to 90 %, 101 325 Pa.
    pub condition_indoors: f64,
}

/// Every pair over so many states of the declared domain.
///
/// # Panics
/// If a state does not come back.
pub fn measure(formulation: Formulation, states: usize) -> Vec<Pair> {
    let larger = |a: f64, b: f64| if b <= a { a } else { b }; // a NaN stays
    let measured = |(first, second)| {
        let mut random = Random(0x70616972);
        let mut pair =
            Pair { first, second, states: 0, kelvins: 0.0, vapor: 0.0, condition: 0.0, condition_indoors: 0.0 };
        for _ in 0..states {
            let tried = anywhere(&mut random, formulation);
            if let Some((air, errors)) = tried.and_then(|air| Some((air, round_trip(&air, first, second)?))) {
                let [kelvins, vapor] = errors.unwrap_or_else(|error| panic!("{first} and {second}: {error}, {air:?}"));
                pair.states += 1;
                pair.kelvins = larger(pair.kelvins, kelvins);
                pair.vapor = larger(pair.vapor, vapor);
                pair.condition = larger(pair.condition, condition(&air, first, second).unwrap_or(0.0));
            }
            if let Some(air) = indoors(&mut random, formulation) {
                let condition = condition(&air, first, second).unwrap_or(0.0);
                pair.condition_indoors = larger(pair.condition_indoors, condition);
            }
        }
        pair
    };
    offered().into_iter().map(measured).collect()
}

/// The table in Markdown.
pub fn table(formulation: Formulation, states: usize) -> String {
    let small = |number: f64| if number == 0.0 { String::from("0") } else { format!("{number:.0e}") };
    let mut text = String::from(
        "| pair | states | round trip: dry bulb, K | humidity ratio, relative | condition number | 5 to 40 °C, 20 to 90 % |\n|---|---|---|---|---|---|\n",
    );
    for pair in measure(formulation, states) {
        let Pair { first, second, states, kelvins, vapor, condition, condition_indoors } = pair;
        let indoors = if condition_indoors > 0.0 { format!("{condition_indoors:.1}") } else { String::from("–") };
        let (kelvins, vapor) = (small(kelvins), small(vapor));
        let row = format!("| {first} and {second} | {states} | {kelvins} | {vapor} | {condition:.1} | {indoors} |");
        writeln!(text, "{row}").unwrap_or_default();
    }
    text
}
