//! The published standard in full, IAPWS G8-10 with IAPWS-95 (R6-95) and dry air of Lemmon et al. 2000: the yardstick of the real gas
//! in the tests.

use super::two_component::{Model, Warmth};
use crate::real::{Real, k};
use crate::substance::{Terms, dry_air, water, water_vapor};

/// The equations as published.
#[derive(Clone, Copy, Debug)]
pub struct Published;

impl<R: Real> Model<R> for Published {
    const FORMULATION: crate::Formulation = crate::Formulation::RealGas;

    type Air = Terms<R, { dry_air::TERMS.len() }>;
    type Water = Terms<R, { water::TERMS.len() }>;

    const DENSITY_STEPS: usize = 2;
    const SATURATION_STEPS: usize = 3;
    const PURE_STEPS: usize = 2;

    fn air(at: &Warmth<R>) -> Self::Air {
        let tau = k::<R>(dry_air::REDUCING_TEMPERATURE) / at.kelvins;
        Terms::at(dry_air::ideal(at.kelvins), &dry_air::TERMS, tau)
    }

    fn water(at: &Warmth<R>) -> Self::Water {
        let tau = k::<R>(water::CRITICAL_TEMPERATURE) / at.kelvins;
        Terms::at(water_vapor::ideal(at.kelvins), &water::TERMS, tau)
    }
}
