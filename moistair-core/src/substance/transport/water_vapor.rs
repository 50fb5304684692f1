//! Water vapor: viscosity by IAPWS R12-08, thermal conductivity by IAPWS R15-11, both without their critical enhancement, which in the
//! vapor of a state of moist air is below 4e-4 of the conductivity (saturated at 150 °C) and, by R12-08 itself, negligible in the viscosity.
//!
//! Published from 273.16 K up, with an uncertainty of about 2 % in the vapor (from memory of the releases' charts). Below, both
//! extrapolate: their dilute gas goes to zero smoothly, and there is less than 0.6 % of vapor in the air then, at 101 kPa.

use super::Transport;
use crate::real::{Real, k, polynomial};
use crate::substance::water::{CRITICAL_DENSITY, CRITICAL_TEMPERATURE};

/// Hᵢ of R12-08 Table 1.
const DILUTE_VISCOSITY: [f64; 4] = [1.67752, 2.20462, 0.6366564, -0.241605];

/// H_ij of R12-08 Table 2, a line for each power i of 1/T̄ − 1.
const DENSE_VISCOSITY: [[f64; 7]; 6] = [
    [5.20094e-1, 2.22531e-1, -2.81378e-1, 1.61913e-1, -3.25372e-2, 0.0, 0.0],
    [8.50895e-2, 9.99115e-1, -9.06851e-1, 2.57399e-1, 0.0, 0.0, 0.0],
    [-1.08374, 1.88797, -7.72479e-1, 0.0, 0.0, 0.0, 0.0],
    [-2.89555e-1, 1.26613, -4.89837e-1, 0.0, 6.98452e-2, 0.0, -4.35673e-3],
    [0.0, 0.0, -2.57040e-1, 0.0, 0.0, 8.72102e-3, 0.0],
    [0.0, 1.20573e-1, 0.0, 0.0, 0.0, 0.0, -5.93264e-4],
];

/// Lᵢ of R15-11 Table 1.
const DILUTE_CONDUCTIVITY: [f64; 5] = [2.443221e-3, 1.323095e-2, 6.770357e-3, -3.454586e-3, 4.096266e-4];

/// L_ij of R15-11 Table 2, a line for each power i of 1/T̄ − 1.
const DENSE_CONDUCTIVITY: [[f64; 6]; 5] = [
    [1.60397357, -0.646013523, 0.111443906, 0.102997357, -0.0504123634, 0.00609859258],
    [2.33771842, -2.78843778, 1.53616167, -0.463045512, 0.0832827019, -0.00719201245],
    [2.19650529, -4.54580785, 3.55777244, -1.40944978, 0.275418278, -0.0205938816],
    [-1.21051378, 1.60812989, -0.621178141, 0.0716373224, 0.0, 0.0],
    [-2.7203370, 4.57586331, -3.18369245, 1.1168348, -0.19268305, 0.012913842],
];

/// At a temperature, K, and a density, kg/m³.
pub fn transport<R: Real>(kelvins: R, density: R) -> Transport<R> {
    let reduced = kelvins / k(CRITICAL_TEMPERATURE);
    let inverse = k::<R>(1.0) / reduced;
    let density = density / k(CRITICAL_DENSITY);
    // R12-08 Eq. (11), (12)
    let dilute_viscosity = reduced.sqrt() * k(100.0) / polynomial(inverse, DILUTE_VISCOSITY);
    // R15-11 Eq. (16), (17)
    let dilute_conductivity = reduced.sqrt() / polynomial(inverse, DILUTE_CONDUCTIVITY);
    Transport {
        viscosity: dilute_viscosity * dense(inverse, density, &DENSE_VISCOSITY) * k(1e-6),
        conductivity: dilute_conductivity * dense(inverse, density, &DENSE_CONDUCTIVITY) * k(1e-3),
    }
}

/// exp(ρ̄ Σᵢ (1/T̄ − 1)ⁱ Σⱼ c_ij (ρ̄ − 1)ʲ)
fn dense<R: Real, const I: usize, const J: usize>(inverse: R, density: R, coefficients: &[[f64; J]; I]) -> R {
    let (warmth, distance) = (inverse - k(1.0), density - k(1.0));
    let sum = coefficients.iter().rev().fold(k::<R>(0.0), |sum, line| sum * warmth + polynomial(distance, *line));
    (density * sum).exp()
}
