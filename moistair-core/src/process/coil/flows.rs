//! How the conductances of a coil go with its flows.

use super::{CoilSurface, infeasible};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{Conductance, MassFlow};
use crate::real::{Scalar, k};

/// What flows through a coil.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CoilFlows<S = f64> {
    /// Dry air.
    pub air: MassFlow<S>,
    /// Water or brine.
    pub water: MassFlow<S>,
}

/// UA = UA₀ (ṁ / ṁ₀)ⁿ on each side, n from 0 (the flow is of no matter) to 1.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct FlowExponents<S = f64> {
    /// Of the air side; 0.4 to 0.7 with fins (common practice, no source).
    pub air_side: S,
    /// Of the water side; 0.8 while the water is turbulent (Dittus and Boelter 1930, Univ. Calif. Publ. Eng. 2:443, in any textbook of heat
    /// transfer; from memory), less below a few tenths of the rated flow.
    pub water_side: S,
}

impl<S: Scalar> CoilSurface<S> {
    /// The conductances at other flows than those that they were found at.
    ///
    /// # Accuracy
    /// As good as the exponents: within a few per cent down to half of the flows (common practice, no source). The viscosity of the
    /// water and the wetness of the fins are taken to be those of the point where the conductances were found.
    ///
    /// # Errors
    /// [`Error::Infeasible`] for a conductance beyond its range, as of one that was found without a flow; [`Error::OutOfRange`],
    /// [`Error::NotFinite`].
    ///
    /// ```
    /// use moistair_core::{Conductance, Error, MassFlow};
    /// use moistair_core::process::coil::*;
    /// let flows = |air, water| CoilFlows {
    ///     air: MassFlow::<f64>::from_kilograms_per_second(air),
    ///     water: MassFlow::from_kilograms_per_second(water),
    /// };
    /// let surface = CoilSurface {
    ///     air_side: Conductance::from_kilowatts_per_kelvin(20.0),
    ///     water_side: Conductance::from_kilowatts_per_kelvin(40.0),
    ///     arrangement: Arrangement::Counterflow,
    /// };
    /// let exponents = FlowExponents { air_side: 0.6, water_side: 0.8 };
    /// let part_load = surface.at_flows(flows(6.0, 5.0), flows(6.0, 2.5), exponents)?;
    /// assert!((part_load.air_side.kilowatts_per_kelvin() - 20.0).abs() < 1e-9);
    /// assert!((part_load.water_side.kilowatts_per_kelvin() - 22.97).abs() < 0.01);
    /// assert!(surface.at_flows(flows(6.0, 0.0), flows(6.0, 5.0), exponents).is_err()); // found without water
    /// # Ok::<(), Error>(())
    /// ```
    pub fn at_flows(
        &self,
        found_at: CoilFlows<S>,
        flows: CoilFlows<S>,
        exponents: FlowExponents<S>,
    ) -> Result<Self, Error> {
        let air = |flow: MassFlow<S>| checked(Quantity::DryAirFlow, flow.kilograms_per_second());
        let water = |flow: MassFlow<S>| checked(Quantity::WaterFlow, flow.kilograms_per_second());
        let air_side = at_flow(self.air_side, air(found_at.air)?, air(flows.air)?, exponents.air_side)?;
        let water_side = at_flow(self.water_side, water(found_at.water)?, water(flows.water)?, exponents.water_side)?;
        Ok(Self { air_side, water_side, arrangement: self.arrangement })
    }
}

/// Without a flow nothing is conducted, save where the flow is of no matter.
fn at_flow<S: Scalar>(found: Conductance<S>, found_at: S, flow: S, exponent: S) -> Result<Conductance<S>, Error> {
    let found = checked(Quantity::Conductance, found.watts_per_kelvin())?;
    let exponent = checked(Quantity::FlowExponent, exponent)?;
    let share = if exponent == k(0.0) || flow == found_at {
        k(1.0)
    } else if flow == k(0.0) {
        k(0.0)
    } else {
        (exponent * (flow / found_at).ln()).exp()
    };
    let (conductance, most) = (found * share, k::<S>(Quantity::Conductance.limits().1));
    if conductance <= most {
        return Ok(Conductance::from_watts_per_kelvin(conductance));
    }
    let beyond = if conductance.is_finite() { conductance } else { S::infinity() };
    Err(infeasible(Quantity::Conductance, beyond, k(0.0), most))
}
