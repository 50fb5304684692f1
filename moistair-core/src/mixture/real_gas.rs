//! The default real gas: IAPWS G8-10 with the residuals of its components expanded in powers of density, so that a solve for density
//! repeats no exponential.

use super::two_component::{Component, HelmholtzMixture, Model};
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

    fn air(kelvins: R) -> Component<R, Self::Air> {
        Component {
            gas_constant: dry_air::GAS_CONSTANT,
            reducing_density: dry_air::REDUCING_DENSITY,
            ideal: dry_air::ideal(kelvins),
            residual: Series(dry_air::residual(kelvins)),
        }
    }

    fn water(kelvins: R) -> Component<R, Self::Water> {
        Component {
            gas_constant: water_vapor::GAS_CONSTANT,
            reducing_density: water_vapor::REDUCING_DENSITY,
            ideal: water_vapor::ideal(kelvins),
            residual: Series(water_vapor::residual(kelvins)),
        }
    }
}
