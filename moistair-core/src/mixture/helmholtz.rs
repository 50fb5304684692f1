//! The published standard in full, IAPWS G8-10 with IAPWS-95 (R6-95) and dry air of Lemmon et al. 2000: the yardstick of the real gas
//! in the tests.

use super::two_component::{Component, Model};
use crate::real::{Real, k};
use crate::substance::{Terms, dry_air, water, water_vapor};

/// The equations as published.
#[derive(Clone, Copy, Debug)]
pub struct Published;

impl<R: Real> Model<R> for Published {
    const FORMULATION: crate::Formulation = crate::Formulation::RealGas;

    type Air = Terms<R, { dry_air::TERMS.len() }>;
    type Water = Terms<R, { water::TERMS.len() }>;

    const DENSITY_STEPS: usize = 3;
    const SATURATION_STEPS: usize = 3;
    const PURE_STEPS: usize = 3;

    fn air(kelvins: R) -> Component<R, Self::Air> {
        Component {
            gas_constant: dry_air::GAS_CONSTANT,
            reducing_density: dry_air::REDUCING_DENSITY,
            ideal: dry_air::ideal(kelvins),
            residual: Terms::at(&dry_air::TERMS, k::<R>(dry_air::REDUCING_TEMPERATURE) / kelvins),
        }
    }

    fn water(kelvins: R) -> Component<R, Self::Water> {
        Component {
            gas_constant: water_vapor::GAS_CONSTANT,
            reducing_density: water_vapor::REDUCING_DENSITY,
            ideal: water_vapor::ideal(kelvins),
            residual: Terms::at(&water::TERMS, k::<R>(water::CRITICAL_TEMPERATURE) / kelvins),
        }
    }
}
