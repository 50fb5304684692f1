//! Viscosity, thermal conductivity and diffusivity of moist air, from those of its components at their partial densities.
//!
//! The same equations serve every formulation: it only says how dense the components are. The mixing rule, not the components, limits the
//! accuracy: a few percent in hot and humid air. Dry air is that of the pure substance, exactly.

use crate::real::{Real, k};
use crate::substance::{dry_air, transport, water_vapor};

/// Transport of momentum, heat and vapor in the gas.
#[derive(Clone, Copy, Debug)]
pub struct Transport<R> {
    /// Dynamic viscosity, Pa s.
    pub viscosity: R,
    /// Thermal conductivity, W/(m K).
    pub conductivity: R,
    /// Diffusivity of water vapor in air, m²/s.
    pub diffusivity: R,
}

impl<R: Real> Transport<R> {
    /// At a temperature, K, pressure, Pa, water mole fraction and partial densities, kg/m³.
    pub fn of(kelvins: R, pressure: R, water_mole_fraction: R, air_density: R, water_density: R) -> Self {
        let air = transport::dry_air::transport(kelvins, air_density);
        let water = transport::water_vapor::transport(kelvins, water_density);
        let fractions = [k::<R>(1.0) - water_mole_fraction, water_mole_fraction];
        let viscosities = [air.viscosity, water.viscosity];
        let molar_masses = [dry_air::MOLAR_MASS, water_vapor::MOLAR_MASS];
        Self {
            viscosity: mix(fractions, viscosities, molar_masses, viscosities),
            conductivity: mix(fractions, viscosities, molar_masses, [air.conductivity, water.conductivity]),
            diffusivity: diffusivity(kelvins, pressure),
        }
    }
}

/// Σᵢ xᵢ vᵢ / Σⱼ xⱼ Φᵢⱼ: for viscosities the rule of Wilke, J. Chem. Phys. 18 (1950) 517; for conductivities that of Wassiljewa with the
/// weights of Mason & Saxena, Phys. Fluids 1 (1958) 361, their factor 1.065 taken as 1, as in Bird, Stewart & Lightfoot, Transport
/// Phenomena.
fn mix<R: Real, const N: usize>(fractions: [R; N], viscosities: [R; N], molar_masses: [f64; N], values: [R; N]) -> R {
    let components = || fractions.into_iter().zip(viscosities).zip(molar_masses);
    components().zip(values).fold(k(0.0), |sum, (((fraction, viscosity), molar_mass), value)| {
        let weight = components().fold(k::<R>(0.0), |weight, ((other_fraction, other_viscosity), other_molar_mass)| {
            weight + other_fraction * interaction(viscosity / other_viscosity, molar_mass / other_molar_mass)
        });
        sum + fraction * value / weight
    })
}

/// Φᵢⱼ = (1 + (μᵢ/μⱼ)^½ (Mⱼ/Mᵢ)^¼)² / √(8 (1 + Mᵢ/Mⱼ)); one for alike.
fn interaction<R: Real>(viscosity_ratio: R, molar_mass_ratio: f64) -> R {
    let ratio = k::<R>(molar_mass_ratio);
    let sum = k::<R>(1.0) + (viscosity_ratio / ratio.sqrt()).sqrt();
    sum * sum / ((ratio + k(1.0)) * k(8.0)).sqrt()
}

/// Massman, Atmos. Environ. 32 (1998) 1111, m²/s: 0.2178 cm²/s at 0 °C and 101 325 Pa, T^1.81 / p (constants from memory). From
/// measurements between 0 and 100 °C near atmospheric pressure, within 7 % (from memory); it extrapolates elsewhere. The correlation of
/// Marrero & Mason 1972 (282 to 450 K) lies 2 % below it at 25 °C and 8 % above it at 150 °C.
fn diffusivity<R: Real>(kelvins: R, pressure: R) -> R {
    ((kelvins * k(1.0 / 273.15)).ln() * k(1.81)).exp() * k(0.2178e-4 * 101_325.0) / pressure
}

#[cfg(test)]
mod tests;
