//! The published standard in full, IAPWS G8-10 with IAPWS-95 (R6-95) and dry air of Lemmon et al. 2000: the yardstick of the real gas.

use super::Steps;
use super::two_component::{HelmholtzMixture, Model, Warmth};
use crate::real::{Real, k};
use crate::substance::critical_region::Complete;
use crate::substance::{Terms, dry_air};

/// Moist air by the equations as published.
pub type Helmholtz<R> = HelmholtzMixture<R, Published>;

/// The equations as published.
#[derive(Clone, Copy, Debug)]
pub struct Published;

impl<R: Real> Model<R> for Published {
    const FORMULATION: crate::Formulation = crate::Formulation::Helmholtz;
    const STEPS: Steps = Steps { dew_point: 3, wet_bulb: 4, wet_bulb_halvings: 6, humidity_ratio: 4, temperature: 5 };

    type Air = Terms<R, { dry_air::TERMS.len() }>;
    type Water = Complete<R>;

    const DENSITY_STEPS: usize = 3;
    const SATURATION_STEPS: usize = 3;
    const PURE_STEPS: usize = 3;

    fn air(at: &Warmth<R>) -> Self::Air {
        let tau = k::<R>(dry_air::REDUCING_TEMPERATURE) / at.kelvins;
        Terms::at(dry_air::ideal(at.kelvins), &dry_air::TERMS, tau)
    }

    fn water(at: &Warmth<R>) -> Self::Water {
        Complete::at(at.kelvins)
    }
}
