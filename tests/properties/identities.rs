//! Thermodynamic identities, by central differences of what states read: no property can be off by itself.

use moistair_core::*;
use proptest::prelude::*;

use crate::support::{cases, from_ratio, greatest_ratio, place, ratio, warmest};

/// Steps of the differences: K, and relative in pressure and humidity ratio.
const KELVINS: f64 = 0.02;
const RELATIVE: f64 = 1e-4;

/// What a state reads, per kilogram of dry air where there is a choice.
#[derive(Clone, Copy, Debug)]
struct Read {
    kelvins: f64,
    pascals: f64,
    ratio: f64,
    volume: f64,
    enthalpy: f64,
    entropy: f64,
    cp: f64,
    cv: f64,
    sound: f64,
    water: f64,
    dry_air: f64,
    fugacity: f64,
}

fn read(air: &MoistAir) -> Read {
    Read {
        kelvins: air.dry_bulb().kelvins(),
        pascals: air.pressure().pascals(),
        ratio: ratio(air),
        volume: air.specific_volume().cubic_meters_per_kilogram(),
        enthalpy: air.specific_enthalpy().joules_per_kilogram(),
        entropy: air.specific_entropy().joules_per_kilogram_kelvin(),
        cp: air.specific_heat().joules_per_kilogram_kelvin(),
        cv: air.specific_heat_at_constant_volume().joules_per_kilogram_kelvin(),
        sound: air.speed_of_sound().meters_per_second(),
        water: air.chemical_potential_of_water().map_or(f64::NAN, |x| x.joules_per_kilogram()),
        dry_air: air.chemical_potential_of_dry_air().joules_per_kilogram(),
        fugacity: air.fugacity_of_water().pascals(),
    }
}

/// A state with its neighbors on both sides in temperature, pressure and humidity ratio.
#[derive(Clone, Copy, Debug)]
struct Around {
    formulation: Formulation,
    here: Read,
    temperature: [Read; 2],
    pressure: [Read; 2],
    ratio: [Read; 2],
}

impl Around {
    fn of_temperature(&self, part: fn(&Read) -> f64) -> f64 {
        slope(&self.temperature, part, |read| read.kelvins)
    }

    fn of_pressure(&self, part: fn(&Read) -> f64) -> f64 {
        slope(&self.pressure, part, |read| read.pascals)
    }

    fn of_ratio(&self, part: fn(&Read) -> f64) -> f64 {
        slope(&self.ratio, part, |read| read.ratio)
    }
}

fn slope(ends: &[Read; 2], part: fn(&Read) -> f64, variable: fn(&Read) -> f64) -> f64 {
    (part(&ends[1]) - part(&ends[0])) / (variable(&ends[1]) - variable(&ends[0]))
}

/// Moist states away from the ends of the domain, with a gram per kilogram at least: in drier air differences by W drown in rounding.
fn around() -> impl Strategy<Value = Around> {
    place().prop_filter_map("a state with neighbors", |(celsius, basis, share)| {
        let (coldest, warmest) = (-80.0 + 2.0 * KELVINS, warmest(basis) - 2.0 * KELVINS);
        let celsius = celsius.clamp(coldest, warmest);
        let w = (0.05 + 0.9 * share) * greatest_ratio(celsius, basis).min(9.0);
        let (low, high) = basis.formulation().limits(Quantity::Pressure);
        let pascals = basis.pressure().pascals().clamp(low * (1.0 + 2.0 * RELATIVE), high * (1.0 - 2.0 * RELATIVE));
        let at = |t: f64, p: f64, w: f64| {
            from_ratio(t, w, basis.at_pressure(Pressure::from_pascals(p))).ok().map(|air| read(&air))
        };
        let both = |f: &dyn Fn(f64) -> Option<Read>| Some([f(-1.0)?, f(1.0)?]);
        (w > 1e-3).then_some(())?;
        Some(Around {
            formulation: basis.formulation(),
            here: at(celsius, pascals, w)?,
            temperature: both(&|sign| at(celsius + sign * KELVINS, pascals, w))?,
            pressure: both(&|sign| at(celsius, pascals * (1.0 + sign * RELATIVE), w))?,
            ratio: both(&|sign| at(celsius, pascals, w * (1.0 + sign * RELATIVE)))?,
        })
    })
}

/// The handbook rounds its gas constants to six digits and 1/ε apart from ε.
fn rounded(formulation: Formulation) -> f64 {
    if formulation == Formulation::IdealGas { 4e-6 } else { 0.0 }
}

fn near(name: &str, a: f64, b: f64, relative: f64) -> Result<(), TestCaseError> {
    prop_assert!((a - b).abs() <= relative * (a.abs() + b.abs()), "{name}: {a:e} {b:e}");
    Ok(())
}

proptest! {
    #![proptest_config(cases(2_000))]

    /// Gibbs energy from its components (Euler), and their balance at constant temperature and pressure (Gibbs and Duhem).
    #[test]
    fn components(around in around()) {
        let here = around.here;
        let gibbs = here.enthalpy - here.kelvins * here.entropy;
        let sum = here.dry_air + here.ratio * here.water;
        let size = here.enthalpy.abs() + (here.kelvins * here.entropy).abs() + 4e5 + 3e6 * here.ratio;
        prop_assert!((gibbs - sum).abs() <= 16.0 * f64::EPSILON * size, "{gibbs} {sum}");
        let (of_air, of_water) = (around.of_ratio(|x| x.dry_air), around.of_ratio(|x| x.water));
        prop_assert!(of_water > 0.0, "stable: {of_water}");
        near("Gibbs and Duhem", of_air, -here.ratio * of_water, 2e-7 + rounded(around.formulation))?;
    }

    /// Maxwell relations: ∂s/∂p = −∂v/∂T, ∂μ_w/∂p = ∂v/∂W, ∂μ_w/∂T = −∂s/∂W; and T ∂s/∂T = c_p = ∂h/∂T.
    #[test]
    fn maxwell(around in around()) {
        let slack = 1e-6 + 2.0 * rounded(around.formulation);
        near("∂s/∂p", around.of_pressure(|x| x.entropy), -around.of_temperature(|x| x.volume), slack)?;
        near("∂μ_w/∂p", around.of_pressure(|x| x.water), around.of_ratio(|x| x.volume), slack)?;
        near("∂μ_w/∂T", around.of_temperature(|x| x.water), -around.of_ratio(|x| x.entropy), 1e-6)?;
        near("T ∂s/∂T", around.here.kelvins * around.of_temperature(|x| x.entropy), around.here.cp, 1e-7)?;
        near("∂h/∂T", around.of_temperature(|x| x.enthalpy), around.here.cp, 1e-7)?;
    }

    /// c_p − c_v = −T (∂v/∂T)² / (∂v/∂p), and w² = (c_p/c_v) v² / ((1 + W) (−∂v/∂p)).
    #[test]
    fn heat_capacities_and_sound(around in around()) {
        let here = around.here;
        let (of_temperature, of_pressure) = (around.of_temperature(|x| x.volume), around.of_pressure(|x| x.volume));
        prop_assert!(of_pressure < 0.0 && here.cv > 0.0 && here.cp > here.cv);
        let difference = -here.kelvins * of_temperature * of_temperature / of_pressure;
        let slack = 1e-6 + rounded(around.formulation);
        near("c_p − c_v", here.cp - here.cv, difference, slack)?;
        let square = here.cp / here.cv * here.volume * here.volume / (-of_pressure * (1.0 + here.ratio));
        near("w²", here.sound * here.sound, square, slack)?;
    }

    /// Fugacity is the chemical potential by another name: RT ln(f₂/f₁) = μ₂ − μ₁ at the same temperature.
    #[test]
    fn fugacity(around in around()) {
        let gas_constant = if around.formulation == Formulation::IdealGas { 461.524 } else { 461.51805 };
        for [a, b] in [around.pressure, around.ratio] {
            let of_fugacity = gas_constant * a.kelvins * (b.fugacity / a.fugacity).ln();
            prop_assert!((of_fugacity - (b.water - a.water)).abs() < 1e-7, "{of_fugacity} {a:?} {b:?}");
        }
        prop_assert!(0.0 < around.here.fugacity);
    }
}

/// At low pressure the fugacity is the vapor pressure, as far as the gas constants of the publications agree.
#[test]
fn fugacity_of_thin_air() {
    for &formulation in Formulation::ALL {
        let basis = Basis::new(Pressure::from_pascals(20e3), formulation);
        let air = from_ratio(150.0, 0.1, basis).unwrap();
        let coefficient = air.fugacity_of_water().pascals() / air.vapor_pressure().pascals();
        println!("{formulation:?}: f / (x_w p) = {coefficient} at 150 °C, 20 kPa");
        assert!((coefficient - 1.0).abs() < 1e-3);
        let dry = from_ratio(20.0, 0.0, basis).unwrap();
        assert_eq!(dry.fugacity_of_water().pascals().to_bits(), 0.0_f64.to_bits());
        let none = Error::NoValue { quantity: Quantity::ChemicalPotentialOfWater, reason: NoValue::DryAir };
        assert_eq!(dry.chemical_potential_of_water().unwrap_err(), none);
    }
}

/// The datum: dry air at 0 °C and 101 325 Pa has neither enthalpy nor entropy, and so no chemical potential.
#[test]
fn datum_of_the_chemical_potentials() {
    for &formulation in Formulation::ALL {
        let dry = from_ratio(0.0, 0.0, Basis::new(Pressure::from_pascals(101_325.0), formulation)).unwrap();
        let potential = dry.chemical_potential_of_dry_air().joules_per_kilogram();
        println!("{formulation:?}: μ_a = {potential:e} J/kg at the datum");
        assert!(potential.abs() < 1e-3);
    }
}
