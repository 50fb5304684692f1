//! IAPWS G8-10 with the residuals of its components expanded in powers of density, evaluated directly from the published equations: the
//! truth of the fits in the tests.

use super::Steps;
use super::two_component::{Model, Warmth};
use crate::real::Real;
use crate::substance::{Series, dry_air, water_vapor};

/// Virial series of the published equations.
#[derive(Clone, Copy, Debug)]
pub struct Virial;

impl<R: Real> Model<R> for Virial {
    const FORMULATION: crate::Formulation = crate::Formulation::RealGas;
    const STEPS: Steps = Steps::TO_150_CELSIUS;
    type Air = Series<R, { dry_air::ORDERS }>;
    type Water = Series<R, { water_vapor::ORDERS }>;
    const DENSITY_STEPS: usize = 2;
    const SATURATION_STEPS: usize = 3;
    const PURE_STEPS: usize = 2;

    fn air(at: &Warmth<R>) -> Self::Air {
        Series { ideal: dry_air::ideal(at.kelvins), residual: dry_air::residual(at.kelvins) }
    }

    fn water(at: &Warmth<R>) -> Self::Water {
        Series { ideal: water_vapor::ideal(at.kelvins), residual: water_vapor::residual(at.kelvins) }
    }
}
