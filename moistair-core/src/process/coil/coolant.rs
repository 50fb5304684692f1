//! What flows through a coil: water, or a brine of given specific heat.

use crate::basis::Formulation;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::process::AirStream;
use crate::quantity::{HeatFlow, MassFlow, SpecificHeat, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::MoistAir;
use crate::state::condensate::condensed_enthalpy;

/// Steps of the secant for the temperature of water from its enthalpy; see the test of this module.
const WATER_STEPS: usize = 4;

/// What flows through a coil.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum Coolant<S = f64> {
    /// Liquid water, 0 to 200 °C, of the enthalpy that the formulation gives it.
    #[default]
    Water,
    /// A liquid of constant specific heat that does not freeze, −40 to 200 °C, such as water with glycol.
    Brine(SpecificHeat<S>),
}

impl<S: Scalar> Coolant<S> {
    /// A temperature of it, checked.
    fn checked(&self, temperature: Temperature<S>) -> Result<S, Error> {
        let quantity = match self {
            Self::Water => Quantity::WaterTemperature,
            Self::Brine(_) => Quantity::CoolantTemperature,
        };
        checked(quantity, temperature.celsius())
    }
}

/// The water, or brine, that enters a coil.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CoilWater<S = f64> {
    /// Its mass flow.
    pub flow: MassFlow<S>,
    /// Its temperature.
    pub entering: Temperature<S>,
    /// What it is.
    pub coolant: Coolant<S>,
}

/// What the water of a coil says of its load.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct LoadByWater<S = f64> {
    /// Heat that the water took up, ṁ (h(t₂) − h(t₁)); negative in a coil that heats.
    pub load: HeatFlow<S>,
    /// The load by the air less that by the water: what the one side gave and the other did not get.
    pub air_less_water: HeatFlow<S>,
}

/// The load of a coil by its water, beside its load by the air.
///
/// A steady coil gives the same on both sides. Tests of coils ask for 5 % (ASHRAE 33, AHRI 410; from memory); meters of a plant, where 0.1 K is 2 % of
/// a rise of 5 K, seldom reach that (common practice, no source).
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`], also for a load beyond its range.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::*};
/// let site: Basis = Basis::new(Pressure::from_kilopascals(101.325), Formulation::RealGas);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(27.0), RelativeHumidity::from_percent(50.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let water = CoilWater {
///     flow: MassFlow::from_kilograms_per_second(1.6),
///     entering: Temperature::from_celsius(6.0),
///     coolant: Coolant::Water,
/// };
/// let by_air = HeatFlow::from_kilowatts(25.0);
/// let found = load_by_water(&entering, by_air, water, Temperature::from_celsius(9.6))?;
/// assert!((found.load.kilowatts() - 24.2).abs() < 0.1 && (found.air_less_water.kilowatts() - 0.8).abs() < 0.1);
/// assert!(load_by_water(&entering, by_air, water, Temperature::from_celsius(-3.0)).is_err()); // ice
/// # Ok::<(), Error>(())
/// ```
pub fn load_by_water<S: Scalar>(
    entering: &AirStream<S>,
    load_by_air: HeatFlow<S>,
    water: CoilWater<S>,
    leaving_water: Temperature<S>,
) -> Result<LoadByWater<S>, Error> {
    let liquid = Liquid::new(&water, &entering.air())?;
    let by_air = checked(Quantity::HeatFlow, load_by_air.watts())?;
    let leaving = water.coolant.checked(leaving_water)?;
    let load = checked(Quantity::HeatFlow, liquid.heat_to(leaving))?;
    Ok(LoadByWater { load: HeatFlow::from_watts(load), air_less_water: HeatFlow::from_watts(by_air - load) })
}

/// The same, checked, with its enthalpy at hand.
#[derive(Clone, Copy, Debug)]
pub(super) struct Liquid<S> {
    pub flow: S,
    pub entering: S,
    enthalpy: S,
    specific_heat: Option<S>,
    pressure: S,
    formulation: Formulation,
}

impl<S: Scalar> Liquid<S> {
    pub fn new(water: &CoilWater<S>, air: &MoistAir<S>) -> Result<Self, Error> {
        let flow = checked(Quantity::WaterFlow, water.flow.kilograms_per_second())?;
        let specific_heat = match water.coolant {
            Coolant::Water => None,
            Coolant::Brine(heat) => Some(checked(Quantity::CoolantSpecificHeat, heat.joules_per_kilogram_kelvin())?),
        };
        let entering = water.coolant.checked(water.entering)?;
        let (pressure, formulation) = (air.pressure().pascals(), air.formulation());
        let liquid = Self { flow, entering, enthalpy: k(0.0), specific_heat, pressure, formulation };
        Ok(Self { enthalpy: liquid.enthalpy_at(entering), ..liquid })
    }

    pub fn is_water(&self) -> bool {
        self.specific_heat.is_none()
    }

    fn enthalpy_at(&self, celsius: S) -> S {
        match self.specific_heat {
            Some(heat) => heat * celsius,
            None => condensed_enthalpy(self.formulation, celsius, self.pressure, Surface::Liquid),
        }
    }

    /// Heat flow that takes it from entering to another temperature.
    pub fn heat_to(&self, celsius: S) -> S {
        self.flow * (self.enthalpy_at(celsius) - self.enthalpy)
    }

    /// Temperature after a heat flow into it: between entering and a limit, beyond which there is no heat to come from.
    pub fn heated(&self, heat: S, limit: S) -> S {
        if self.flow == k(0.0) {
            return self.entering;
        }
        let target = self.enthalpy + heat / self.flow;
        let end = self.enthalpy_at(limit);
        let warms = limit >= self.entering;
        let passed = if warms { target >= end } else { target <= end };
        let returned = if warms { target <= self.enthalpy } else { target >= self.enthalpy };
        match self.specific_heat {
            _ if returned => self.entering,
            _ if passed => limit,
            Some(specific_heat) => target / specific_heat,
            None => self.temperature_of(target),
        }
    }

    /// Temperature of water with an enthalpy: a secant, whose slope is kept to what water's can be.
    fn temperature_of(&self, target: S) -> S {
        const NEAR: f64 = 4_187.0;
        let (mut last, mut last_error) = (self.entering, self.enthalpy - target);
        let mut celsius = last - last_error / k(NEAR);
        for _ in 0..WATER_STEPS {
            let error = self.enthalpy_at(celsius) - target;
            let slope = ((error - last_error) / (celsius - last)).at_least(k(0.9 * NEAR)).at_most(k(1.4 * NEAR));
            let slope = if slope.is_finite() { slope } else { k(NEAR) };
            (last, last_error) = (celsius, error);
            celsius = celsius - error / slope;
        }
        celsius
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::Random;
    use crate::{Pressure, RelativeHumidity};

    /// The constant brings water to the heat that was asked for, to rounding.
    #[test]
    fn water_steps_are_enough() {
        let mut random = Random(21);
        let mut worst = 0.0_f64;
        for case in 0..3_000 {
            let formulation = if case % 2 == 0 { Formulation::RealGas } else { Formulation::IdealGas };
            let basis = crate::Basis::new(Pressure::from_pascals(random.between(2e4, 1.1e6)), formulation);
            let air = MoistAir::from_dry_bulb(
                Temperature::from_celsius(20.0),
                RelativeHumidity::from_fraction(random.between(0.0, 1.0)),
                basis,
            )
            .unwrap();
            let (entering, leaving) = (random.between(0.0, 200.0), random.between(0.0, 150.0));
            let water = CoilWater {
                flow: MassFlow::from_kilograms_per_second(1.0),
                entering: Temperature::from_celsius(entering),
                coolant: Coolant::Water,
            };
            let liquid = Liquid::new(&water, &air).unwrap();
            let limit = if leaving > entering { 150.0 } else { 0.0 };
            worst = worst.max((liquid.heated(liquid.heat_to(leaving), limit) - leaving).abs());
        }
        std::println!("temperature of water after {WATER_STEPS} steps: {worst:e} K");
        assert!(worst < 2e-12);
    }
}
