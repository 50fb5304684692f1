//! The default real gas: IAPWS G8-10 with the residuals of its components expanded in powers of density, so that a solve for density
//! repeats no exponential.

use super::two_component::{HelmholtzMixture, Model, Warmth};
use crate::real::Real;
use crate::substance::{Series, dry_air, water_vapor};

/// Moist air as a virial mixture.
pub type RealGas<R> = HelmholtzMixture<R, Virial>;

/// Virial series evaluated directly from the published equations.
#[derive(Clone, Copy, Debug)]
pub struct Virial;

impl<R: Real> Model<R> for Virial {
    #[cfg(test)]
    const FORMULATION: crate::Formulation = crate::Formulation::RealGas;

    type Air = Series<R, { dry_air::ORDERS }>;
    type Water = Series<R, { water_vapor::ORDERS }>;

    const DENSITY_STEPS: usize = 3;
    const SATURATION_STEPS: usize = 3;
    const PURE_STEPS: usize = 3;

    fn air(at: &Warmth<R>) -> Self::Air {
        Series { ideal: dry_air::ideal(at.kelvins), residual: dry_air::residual(at.kelvins) }
    }

    fn water(at: &Warmth<R>) -> Self::Water {
        Series { ideal: water_vapor::ideal(at.kelvins), residual: water_vapor::residual(at.kelvins) }
    }
}
