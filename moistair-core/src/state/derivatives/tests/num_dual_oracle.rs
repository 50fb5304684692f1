//! Against `num-dual`: the ideal gas written out anew on its numbers, solves by its implicit derivative; and the volume and the enthalpy
//! of the real gas from the published Helmholtz energies, differentiated twice by it.

use num_dual::{Dual, Dual64, DualNum, implicit_derivative};

use super::*;
use crate::quantity::ZERO_CELSIUS;
use crate::substance::{Term, dry_air, water};

/// Number of `num-dual` over `f64`.
trait Number: DualNum<Primitive = f64> + Copy {}
impl<D: DualNum<Primitive = f64> + Copy> Number for D {}

/// ASHRAE Fundamentals 2021 (SI) ch. 1: Eq. (6) for liquid water, (5) for ice.
fn saturation_pressure<D: Number>(celsius: D) -> D {
    saturation_pressure_over(celsius.re() < 0.01, celsius)
}

fn saturation_pressure_over<D: Number>(over_ice: bool, celsius: D) -> D {
    let t = celsius + ZERO_CELSIUS;
    let liquid = [-5.8002206e3, 1.3914993, -4.8640239e-2, 4.1764768e-5, -1.4452093e-8, 0.0, 6.5459673];
    let ice = [-5.6745359e3, 6.3925247, -9.6778430e-3, 6.2215701e-7, 2.0747825e-9, -9.4840240e-13, 4.1635019];
    let c = if over_ice { ice } else { liquid };
    (t.recip() * c[0] + c[1] + t * c[2] + t.powi(2) * c[3] + t.powi(3) * c[4] + t.powi(4) * c[5] + t.ln() * c[6]).exp()
}

fn vapor_enthalpy<D: Number>(celsius: D) -> D {
    celsius * 1_860.0 + 2_501_000.0
}

fn condensed_enthalpy<D: Number>(celsius: D) -> D {
    if celsius.re() < 0.01 { celsius * 2_100.0 - 333_400.0 } else { celsius * 4_186.0 }
}

fn saturated_ratio<D: Number>(celsius: D, pressure: D) -> D {
    let saturated = saturation_pressure(celsius);
    saturated * 0.621945 / (pressure - saturated)
}

fn enthalpy<D: Number>(celsius: D, ratio: D) -> D {
    celsius * 1_006.0 + ratio * vapor_enthalpy(celsius)
}

/// What is left of the equation of a solved property at a trial value.
fn dew_equation<D: Number>(trial: D, [ratio, pressure]: [D; 2]) -> D {
    saturation_pressure(trial) - pressure * ratio / (ratio + 0.621945)
}

fn wet_bulb_equation<D: Number>(trial: D, [ratio, pressure, energy]: [D; 3]) -> D {
    let saturated = saturated_ratio(trial, pressure);
    energy + (saturated - ratio) * condensed_enthalpy(trial) - enthalpy(trial, saturated)
}

/// Properties of the ideal gas from dry bulb, relative humidity and pressure, with one of them varied.
fn ideal_gas(t: Dual64, humidity: Dual64, p: Dual64, dew_point: f64, wet_bulb: f64) -> [(Quantity, Dual64); 9] {
    let (kelvins, saturated) = (t + ZERO_CELSIUS, saturation_pressure(t));
    let vapor = humidity * saturated;
    let w = vapor * 0.621945 / (p - vapor);
    let h = enthalpy(t, w);
    let v = kelvins * 287.042 / p * (w * 1.607858 + 1.0);
    let dew = implicit_derivative(|x, a: &[_; 2]| dew_equation(x, *a), dew_point, &[w, p]);
    let wet = implicit_derivative(|x, a: &[_; 3]| wet_bulb_equation(x, *a), wet_bulb, &[w, p, h]);
    let (heat, gas_constant) = (w * 1_860.0 + 1_006.0, (w * 1.607858 + 1.0) * 287.042);
    let sound = (heat / (heat - gas_constant) * gas_constant * kelvins / (w + 1.0)).sqrt();
    let warming = (kelvins / ZERO_CELSIUS).ln();
    let saturated_at_zero = saturation_pressure_over(false, 0.0).ln();
    let entropy = warming * 1_006.0 - ((p - vapor) / 101_325.0).ln() * 287.042
        + w * (warming * 1_860.0 - (vapor.ln() - saturated_at_zero) * 461.524 + 2_501_000.0 / ZERO_CELSIUS);
    [
        (Quantity::HumidityRatio, w),
        (Quantity::SpecificEnthalpy, h),
        (Quantity::SpecificVolume, v),
        (Quantity::DewPoint, dew),
        (Quantity::WetBulb, wet),
        (Quantity::SpeedOfSound, sound),
        (Quantity::SpecificEntropy, entropy),
        (Quantity::DegreeOfSaturation, w / saturated_ratio(t, p)),
        (Quantity::VaporPressureDeficit, saturated - vapor),
    ]
}

/// Every derivative by every input, relative to itself: 1e-9, 1e-7 through the wet bulb, of which the value is good to 5e-10 K.
#[test]
fn ideal_gas_against_num_dual() {
    let (mut compared, mut worst) = (0, 0.0_f64);
    let mut random = Random(8);
    for _ in 0..2_000 {
        let (t, rh, p) = (random.between(1.0, 60.0), random.between(0.3, 0.99), random.between(60e3, 120e3));
        let air = made(t, Quantity::RelativeHumidity, rh, p, Formulation::IdealGas).unwrap();
        let (Ok(dew), Ok(wet)) = (air.value(Quantity::DewPoint), air.value(Quantity::WetBulb)) else { continue };
        if dew < 0.02 || wet < 0.02 {
            continue; // the oracle's dew point is over ice there
        }
        for input in 0..3 {
            let seed = |value: f64, place| Dual64::new(value, if place == input { 1.0 } else { 0.0 });
            for (property, expected) in ideal_gas(seed(t, 0), seed(rh, 1), seed(p, 2), dew, wet) {
                let exact = air.derivatives(property, Quantity::RelativeHumidity).unwrap();
                let derivative = [exact.by_dry_bulb, exact.by_second, exact.by_pressure][input];
                // Nothing at all, or of the size of what the input's own scale makes of the value.
                let size = expected.eps.abs().max(1e-3 * (expected.re.abs() + 1.0) / [t, rh, p][input]);
                let tolerance = if property == Quantity::WetBulb { 1e-7 } else { 1e-9 };
                let share = (derivative - expected.eps).abs() / size / tolerance;
                assert!(share <= 1.0, "{property:?} by input {input}: {derivative:e}, {:e} {air:?}", expected.eps);
                worst = worst.max(share);
                compared += 1;
            }
        }
    }
    println!("{compared} derivatives compared with num-dual, at worst {worst:.3} of the tolerance");
    assert!(compared > 20_000);
}

/// `Σ n δᵈ τᵗ exp(−δᶜ)`.
fn residual<D: Number>(terms: &[Term], delta: D, tau: D) -> D {
    terms.iter().fold(D::from(0.0), |sum, term| {
        let cutoff = if term.c == 0 { D::from(0.0) } else { -delta.powi(term.c as i32) };
        sum + delta.powi(term.d as i32) * tau.powf(term.t) * cutoff.exp() * term.n
    })
}

fn oscillators<D: Number>(tau: D, table: &[(f64, f64)]) -> D {
    table.iter().fold(D::from(0.0), |sum, &(n, gamma)| sum + (-(-tau * gamma).exp() + 1.0).ln() * n)
}

/// Ψ = F/T of the mixture per volume: IAPWS G8-10 with R6-95 and Lemmon et al. 2000 as published.
fn helmholtz<D: Number>(kelvins: D, air: D, steam: D) -> D {
    let tau = kelvins.recip() * dry_air::REDUCING_TEMPERATURE;
    let powers = [
        (0.605719400e-7, -3),
        (-0.210274769e-4, -2),
        (-0.158860716e-3, -1),
        (9.74502517439480, 0),
        (10.0986147428912, 1),
    ];
    let ideal = powers.iter().fold(D::from(0.0), |sum, &(n, power)| sum + tau.powi(power) * n)
        + tau.ln() * 2.490888032
        + tau.powf(1.5) * -0.195363420e-3
        + oscillators(tau, &[(0.791309509, 25.36365), (0.212236768, 16.90741)])
        + ((tau * 87.31279).exp() + 2.0 / 3.0).ln() * -0.197938904;
    let delta = air / dry_air::REDUCING_DENSITY;
    let of_air = air * dry_air::GAS_CONSTANT * (delta.ln() + ideal + residual(&dry_air::TERMS, delta, tau));
    let tau = kelvins.recip() * water::CRITICAL_TEMPERATURE;
    let table = [
        (0.012436, 1.28728967),
        (0.97315, 3.53734222),
        (1.2795, 7.74073708),
        (0.96956, 9.24437796),
        (0.24873, 27.5075105),
    ];
    let ideal = tau * 6.6832105275932 + -8.3204464837497 + tau.ln() * 3.00632 + oscillators(tau, &table);
    let delta = steam / water::CRITICAL_DENSITY;
    let of_water = steam * water::GAS_CONSTANT * (delta.ln() + ideal + residual(&water::TERMS, delta, tau));
    let theta = kelvins / 100.0;
    let pair = (theta.powf(-0.237) * 66.5687 - theta.powf(-1.048) * 238.834 - theta.powf(-3.183) * 176.755) * 1e-6;
    let inverse = theta.recip();
    let series = |c: [f64; 5]| c.iter().rev().fold(D::from(0.0), |sum, &c| sum * inverse + c);
    let two_air = series([0.482737e-3, 0.105678e-2, -0.656394e-2, 0.294442e-1, -0.319317e-1]) * 1e-6;
    let two_water = series([-10.728876, 34.7802, -38.3383, 33.406, 0.0]).exp() * -1e-6;
    let kappa = 2.0 * 8.314472 / (dry_air::MOLAR_MASS * water::MOLAR_MASS);
    let third = (air * two_air / dry_air::MOLAR_MASS + steam * two_water / water::MOLAR_MASS) * 0.75;
    of_air + of_water + air * steam * (pair + third) * kappa
}

/// p = ρ F_ρ − F along constant composition, and U = F − T F_T, of Ψ = F/T.
fn pressure_and_energy<D: Number>(kelvins: D, air: D, ratio: D) -> (D, D) {
    let plain = |x: D| Dual::from_re(x);
    let by_density = helmholtz(plain(kelvins), Dual::new(air, D::from(1.0)), Dual::new(air * ratio, ratio));
    let by_kelvins = helmholtz(Dual::new(kelvins, D::from(1.0)), plain(air), plain(air * ratio));
    ((air * by_density.eps - by_density.re) * kelvins, -kelvins * kelvins * by_kelvins.eps)
}

/// Volume and enthalpy of the real gas at temperature, humidity ratio and pressure.
fn real_gas(kelvins: Dual64, ratio: Dual64, pressure: Dual64, density: f64) -> [(Quantity, Dual64); 2] {
    let args = [kelvins, ratio, pressure];
    let left = |air, [kelvins, ratio, pressure]: [_; 3]| pressure_and_energy(kelvins, air, ratio).0 - pressure;
    let air = implicit_derivative(|x, a: &[_; 3]| left(x, *a), density, &args);
    let (_, energy) = pressure_and_energy(kelvins, air, ratio);
    [(Quantity::SpecificVolume, air.recip()), (Quantity::SpecificEnthalpy, (energy + pressure) / air)]
}

/// The default real gas stands within 1e-7 of the equations as published; its slopes within 2e-6 of the largest term of each.
#[test]
fn real_gas_against_num_dual() {
    let (mut compared, mut worst) = (0, 0.0_f64);
    let mut random = Random(9);
    for _ in 0..300 {
        let (t, share, p) = (random.between(-60.0, 80.0), random.between(0.1, 0.95), random.between(60e3, 120e3));
        let ratio = share * limit(t, p, Formulation::RealGas);
        let air = made(t, Quantity::HumidityRatio, ratio, p, Formulation::RealGas).unwrap();
        for input in 0..3 {
            let seed = |value: f64, place| Dual64::new(value, if place == input { 1.0 } else { 0.0 });
            let (kelvins, w, p) = (seed(t + ZERO_CELSIUS, 0), seed(ratio, 1), seed(p, 2));
            for (property, expected) in real_gas(kelvins, w, p, 1.0 / air.gas.volume) {
                let exact = air.derivatives(property, Quantity::HumidityRatio).unwrap();
                let derivative = [exact.by_dry_bulb, exact.by_second, exact.by_pressure][input];
                // ∂h/∂p is what is left of v − T ∂v/∂T.
                let small = property == Quantity::SpecificEnthalpy && input == 2;
                let size = if small { air.gas.volume } else { expected.eps.abs() };
                let error = (derivative - expected.eps).abs() / size;
                assert!(error <= 2e-6, "{property:?} by input {input}: {derivative:e}, {:e} {air:?}", expected.eps);
                worst = worst.max(error);
                compared += 1;
            }
        }
    }
    println!("{compared} derivatives of the real gas compared with num-dual, at worst {worst:e}");
    assert!(compared == 1_800);
}

/// Each operation and function on its own, chained by twos.
#[test]
fn operations_against_num_dual() {
    use crate::real::{Dual, Real};
    let mut random = Random(10);
    for _ in 0..10_000 {
        let [x, y, a, b] = [0.2, 0.3, -2.0, -3.0].map(|low| random.between(low, 3.0));
        let (ours_x, ours_y) = (Dual { value: x, partials: [a] }, Dual { value: y, partials: [b] });
        let (x, y) = (Dual64::new(x, a), Dual64::new(y, b));
        let ours = [
            ours_x + ours_y,
            ours_x - ours_y,
            ours_x * ours_y,
            ours_x / ours_y,
            -ours_x,
            Real::sqrt(ours_x * ours_y),
            Real::exp(ours_x / ours_y),
            Real::ln(ours_x + ours_y),
            Real::atan(ours_x * ours_y),
            ours_x.at_least(ours_y),
            ours_x.at_most(ours_y),
        ];
        let larger = if x.re < y.re { (y, x) } else { (x, y) };
        let theirs = [
            x + y,
            x - y,
            x * y,
            x / y,
            -x,
            (x * y).sqrt(),
            (x / y).exp(),
            (x + y).ln(),
            (x * y).atan(),
            larger.0,
            larger.1,
        ];
        for (place, (ours, theirs)) in ours.into_iter().zip(theirs).enumerate() {
            // The exponent of e^{x/y} reaches 15, and its slope what the quotient's does.
            let size = (a.abs() + b.abs() + 1.0) * (1.0 + theirs.re.abs()) * 30.0;
            assert!((ours.value - theirs.re).abs() <= 32.0 * f64::EPSILON * theirs.re.abs(), "{place}");
            assert!(
                (ours.partials[0] - theirs.eps).abs() <= 32.0 * f64::EPSILON * size,
                "{place}: {ours:?} {theirs:?}"
            );
        }
    }
}
