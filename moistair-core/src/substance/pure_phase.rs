//! One phase of pure water at given temperature and pressure: IAPWS R6-95(2018) solved for its density.

use super::{Fluid, TemperatureOrder, Terms, water, water_vapor};
use crate::real::{Choose, Real, k};
use crate::solve;

/// A phase per kilogram: Gibbs energy and enthalpy [J/kg], volume [m³/kg].
#[derive(Clone, Copy, Debug)]
pub struct PurePhase<R> {
    pub gibbs: R,
    pub enthalpy: R,
    pub volume: R,
}

impl<R: Real> Choose<R> for PurePhase<R> {
    fn choose(mask: R::Mask, a: Self, b: Self) -> Self {
        Self {
            gibbs: R::select(mask, a.gibbs, b.gibbs),
            enthalpy: R::select(mask, a.enthalpy, b.enthalpy),
            volume: R::select(mask, a.volume, b.volume),
        }
    }
}

/// Water as R6-95 has all its phases.
pub type Water<R> = Terms<R, { water::TERMS.len() }>;

/// The phase of water in which the solve for the reduced density δ starts.
pub fn water_at_pressure<R: Real, const STEPS: usize>(
    kelvins: R,
    pascals: R,
    start: impl FnOnce(&Water<R>) -> R,
) -> PurePhase<R> {
    let rt = kelvins * k(water::GAS_CONSTANT);
    let tau = k::<R>(water::CRITICAL_TEMPERATURE) / kelvins;
    let terms = Terms::at(water_vapor::ideal(kelvins), &water::TERMS, tau);
    let delta = solve::repeated(STEPS, start(&terms), |delta| {
        // p = ρ R T (1 + δφʳ_δ) and its slope in density: R6-95 Table 3.
        let residual = terms.residual(delta, TemperatureOrder::Value);
        let pressure = delta * rt * (residual.first + k(1.0)) * k(water::CRITICAL_DENSITY);
        let slope = rt * (residual.first * k(2.0) + residual.second + k(1.0)) * k(water::CRITICAL_DENSITY);
        delta - (pressure - pascals) / slope
    });
    let residual = terms.residual(delta, TemperatureOrder::Value);
    let thermal = terms.residual(delta, TemperatureOrder::First);
    let volume = k::<R>(1.0) / (delta * k(water::CRITICAL_DENSITY));
    let helmholtz = rt * (delta.ln() + terms.ideal(TemperatureOrder::Value) + residual.value);
    let energy = rt * (terms.ideal(TemperatureOrder::First) + thermal.value);
    // With p for ρRT(1 + δφʳ_δ), the Gibbs energy is stationary in what is left of the error of density.
    PurePhase { gibbs: helmholtz + pascals * volume, enthalpy: energy + pascals * volume, volume }
}
