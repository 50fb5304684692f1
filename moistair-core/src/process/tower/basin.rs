//! How the basin concentrates over time.
//!
//! With the level kept by the make-up, V dC/dt = M C_m − (B + D) C: evaporation leaves the salt behind, blowdown and drift carry it away.
//! Constant flows over a step have an exact solution, so that a step may be as long as the flows are steady.

use super::WaterUse;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::MassFlow;
use crate::real::{Scalar, k, polynomial};

/// Water in circulation and what is dissolved in it; the caller keeps it from step to step.
///
/// ```
/// use moistair_core::MassFlow;
/// use moistair_core::process::tower::{WaterTreatment, water_use, basin::Basin};
/// let flow = MassFlow::<f64>::from_kilograms_per_second;
/// let used = water_use(flow(0.346), flow(15.0), WaterTreatment { drift_fraction: 0.002, cycles_of_concentration: 4.0 })?;
/// let mut basin = Basin::new(8_000.0, 500.0)?;
/// for _hour in 0..1000 {
///     basin = basin.after(3600.0, &used, 500.0)?;
/// }
/// assert!((basin.concentration() - 2000.0).abs() < 1e-6);
/// assert!(Basin::new(0.0, 500.0).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Basin<S = f64> {
    inventory: S,
    concentration: S,
}

impl<S: Scalar> Basin<S> {
    /// From the water in basin, pipes and plant together, kg, and its concentration, mg/kg or any unit that the make-up's is in
    /// too.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn new(inventory: S, concentration: S) -> Result<Self, Error> {
        Ok(Self {
            inventory: checked(Quantity::WaterInventory, inventory)?,
            concentration: checked(Quantity::Concentration, concentration)?,
        })
    }

    /// Water in circulation, kg.
    #[must_use]
    pub fn inventory(&self) -> S {
        self.inventory
    }

    /// Concentration, in the unit given.
    #[must_use]
    pub fn concentration(&self) -> S {
        self.concentration
    }

    /// The basin after a step of so many seconds with steady flows, and make-up of a concentration.
    ///
    /// Exact, C e^−x + (M C_m Δt / V) (1 − e^−x) / x with x = (B + D) Δt / V: one long step and many short ones give the same.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] where the concentration would leave its range.
    pub fn after(&self, seconds: S, flows: &WaterUse<S>, make_up_concentration: S) -> Result<Self, Error> {
        let seconds = checked(Quantity::Duration, seconds)?;
        let fresh = checked(Quantity::Concentration, make_up_concentration)?;
        let flow = |flow: MassFlow<S>| checked(Quantity::WaterFlow, flow.kilograms_per_second());
        let turns = seconds / self.inventory;
        let out = (flow(flows.blowdown)? + flow(flows.drift)?) * turns;
        let brought = flow(flows.make_up)? * fresh * turns;
        let concentration = self.concentration * (-out).exp() + brought * mean_decay(out);
        let (min, max) = Quantity::Concentration.limits();
        if concentration <= k(max) {
            return Ok(Self { concentration, ..*self });
        }
        Err(Error::Infeasible { quantity: Quantity::Concentration, value: concentration.to_f64(), min, max })
    }
}

/// (1 − e^−x) / x, by its series where the difference would cancel.
pub(super) fn mean_decay<S: Scalar>(x: S) -> S {
    if x < k(0.125) {
        let terms = [
            1.0,
            -1.0 / 2.0,
            1.0 / 6.0,
            -1.0 / 24.0,
            1.0 / 120.0,
            -1.0 / 720.0,
            1.0 / 5_040.0,
            -1.0 / 40_320.0,
            1.0 / 362_880.0,
            -1.0 / 3_628_800.0,
        ];
        return polynomial(x, terms);
    }
    (k::<S>(1.0) - (-x).exp()) / x
}
