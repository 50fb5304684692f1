//! Whether heat and water close over a process, recomputed from what enters, what leaves and what was exchanged.

use super::{Exchange, WetStream};
use crate::basis::Formulation;
use crate::quantity::{HeatFlow, MassFlow};
use crate::real::{Scalar, k};
use crate::state::{AirWithCondensate, MoistAir};

/// How fine a leaving temperature can be solved for, in units of ε T. Equations of state stand on the absolute temperature; all but
/// the ideal gas also sum enthalpies on that scale, and the roughness of the sum, measured in the tests, is part of the limit.
pub(super) const fn resolution(formulation: Formulation) -> f64 {
    match formulation {
        Formulation::RealGas | Formulation::IdealGas => 1.0,
        #[cfg(any(feature = "helmholtz", test))]
        Formulation::Helmholtz => 8.0,
    }
}

/// The two books of a process: what is left over, and what it is measured against.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Books<S = f64> {
    /// Heat out − in − exchanged; zero if the book closes.
    pub heat_residual: HeatFlow<S>,
    /// Sum of the magnitudes of all sensible and latent terms and of the water's enthalpy.
    pub heat_scale: HeatFlow<S>,
    /// Water out − in − exchanged.
    pub water_residual: MassFlow<S>,
    /// Sum of the magnitudes of all water terms.
    pub water_scale: MassFlow<S>,
    /// What the rounding of the leaving temperature is worth: 8 ε T ∂h/∂T, and ε T ∂h/∂T for the ideal gas.
    pub heat_resolution: HeatFlow<S>,
}

impl<S: Scalar> Books<S> {
    /// Whether both close to rounding: 8 ε of the scale, and the resolution of the temperatures.
    #[must_use]
    pub fn close(&self) -> bool {
        let eight = S::epsilon() * k(8.0);
        let within = |residual: S, limit: S| residual.at_least(-residual) <= limit;
        within(self.heat_residual.watts(), self.heat_scale.watts() * eight + self.heat_resolution.watts())
            && within(self.water_residual.kilograms_per_second(), self.water_scale.kilograms_per_second() * eight)
    }
}

/// Balances streams that enter against one that leaves.
///
/// Enthalpies are computed anew from temperature, pressure and humidity ratio, not taken from the process.
pub fn balance<S: Scalar>(entering: &[WetStream<S>], leaving: &WetStream<S>, exchange: &Exchange<S>) -> Books<S> {
    let mut ledger = Ledger::empty();
    ledger.leaving(leaving);
    for stream in entering {
        ledger.entering(stream);
    }
    ledger.exchange(exchange);
    ledger.solved(leaving);
    ledger.books()
}

/// What comes in, goes out and is exchanged, added up.
#[derive(Clone, Copy, Debug)]
pub(crate) struct Ledger<S> {
    heat: S,
    heat_scale: S,
    water: S,
    water_scale: S,
    heat_resolution: S,
}

impl<S: Scalar> Ledger<S> {
    pub fn empty() -> Self {
        let zero = k::<S>(0.0);
        Self { heat: zero, heat_scale: zero, water: zero, water_scale: zero, heat_resolution: zero }
    }

    pub fn entering(&mut self, stream: &WetStream<S>) {
        self.add(stream, k(-1.0));
    }

    pub fn leaving(&mut self, stream: &WetStream<S>) {
        self.add(stream, k(1.0));
    }

    pub fn exchange(&mut self, exchange: &Exchange<S>) {
        let (heat, water) = (exchange.heat.watts(), exchange.water.kilograms_per_second());
        let carried = exchange.water_enthalpy_flow.watts();
        self.heat = self.heat - heat - carried;
        self.heat_scale = self.heat_scale + magnitude(heat) + magnitude(carried);
        self.water = self.water - water;
        self.water_scale = self.water_scale + magnitude(water);
    }

    /// The temperature of this stream was solved for.
    pub fn solved(&mut self, stream: &WetStream<S>) {
        let outlet = stream.air().air();
        let capacity =
            stream.dry_air_flow().kilograms_per_second() * outlet.specific_heat().joules_per_kilogram_kelvin();
        let rounding = S::epsilon() * k(resolution(outlet.formulation()));
        self.heat_resolution = self.heat_resolution + capacity * outlet.dry_bulb().kelvins() * rounding;
    }

    pub fn books(&self) -> Books<S> {
        Books {
            heat_residual: HeatFlow::from_watts(self.heat),
            heat_scale: HeatFlow::from_watts(self.heat_scale),
            water_residual: MassFlow::from_kilograms_per_second(self.water),
            water_scale: MassFlow::from_kilograms_per_second(self.water_scale),
            heat_resolution: HeatFlow::from_watts(self.heat_resolution),
        }
    }

    fn add(&mut self, stream: &WetStream<S>, sign: S) {
        let flow = stream.dry_air_flow().kilograms_per_second();
        let wet = stream.air();
        let air = wet.air();
        let at = |ratio| enthalpy(&air, ratio);
        let ratio = air.humidity_ratio().kilograms_per_kilogram();
        let (sensible, total) = (at(k(0.0)), at(ratio));
        let condensate =
            AirWithCondensate::carrying(air, wet.liquid().kilograms_per_kilogram(), wet.ice().kilograms_per_kilogram())
                .condensate_enthalpy();
        let water = wet.total_water().kilograms_per_kilogram();
        self.heat = self.heat + sign * flow * (total + condensate);
        self.heat_scale =
            self.heat_scale + flow * (magnitude(sensible) + magnitude(total - sensible) + magnitude(condensate));
        self.water = self.water + sign * flow * water;
        self.water_scale = self.water_scale + flow * water;
    }
}

fn enthalpy<S: Scalar>(air: &MoistAir<S>, ratio: S) -> S {
    MoistAir::assemble(air.dry_bulb().celsius(), air.pressure().pascals(), ratio, air.formulation())
        .specific_enthalpy()
        .joules_per_kilogram()
}

fn magnitude<S: Scalar>(x: S) -> S {
    x.at_least(-x)
}
