//! What air-handling plant does to moist air.
//!
//! Dry air is the carrier: its mass flow is the only flow that every process keeps. Each process returns the leaving
//! stream and the [`Exchange`]: the heat and the water that it gave to the air, on one datum of enthalpy. [`books`] checks
//! that they close, from the temperature, pressure and humidity ratio of the outlet alone.
//!
//! Signs: heat and water are positive *into the air*. Loads by name (cooling load, condensate, make-up) are positive magnitudes.
//!
//! Results are estimates for engineering; they are not a safety function. Towers, sprays and humidifiers can spread
//! *Legionella*, wet surfaces grow mould, cold coils freeze, steam burns: local codes and licensed practice govern.

pub mod books;
pub mod coil;
pub mod compression;
pub mod desiccant;
pub mod economizer;
pub mod evaporative;
mod film;
pub mod humidify;
pub mod measured;
pub mod mixing;
pub mod reheat;
pub mod room;
pub mod sensible;
pub mod tower;
pub mod water_use;

use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{Density, HeatFlow, HumidityRatio, MassFlow, SpecificEnthalpy, VolumeFlow};
use crate::real::{Scalar, k};
use crate::state::construct::greatest_humidity_ratio;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// Moist air with its dry-air mass flow.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct AirStream<S = f64> {
    air: MoistAir<S>,
    dry_air_flow: S,
}

impl<S: Scalar> AirStream<S> {
    /// From a dry-air mass flow.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`] for a negative or absurd flow.
    pub fn new(air: MoistAir<S>, dry_air_flow: MassFlow<S>) -> Result<Self, Error> {
        Ok(Self { air, dry_air_flow: checked(Quantity::DryAirFlow, dry_air_flow.kilograms_per_second())? })
    }

    /// From a volume flow measured at the state of this air.
    ///
    /// # Errors
    /// As [`AirStream::new`].
    pub fn from_volume_flow(air: MoistAir<S>, flow: VolumeFlow<S>) -> Result<Self, Error> {
        let flow = checked(Quantity::VolumeFlow, flow.cubic_meters_per_second())?;
        Self::new(air, MassFlow::from_kilograms_per_second(flow / air.specific_volume().cubic_meters_per_kilogram()))
    }

    /// From a standard volume flow: that of the dry air at a stated reference density, such as 1.2 kg/m³.
    ///
    /// # Errors
    /// As [`AirStream::new`].
    pub fn from_standard_volume_flow(
        air: MoistAir<S>,
        flow: VolumeFlow<S>,
        reference: Density<S>,
    ) -> Result<Self, Error> {
        let flow = checked(Quantity::VolumeFlow, flow.cubic_meters_per_second())?;
        let density = checked(Quantity::StandardDensity, reference.kilograms_per_cubic_meter())?;
        Self::new(air, MassFlow::from_kilograms_per_second(flow * density))
    }

    /// State of the air.
    pub fn air(&self) -> MoistAir<S> {
        self.air
    }

    /// Dry-air mass flow.
    pub fn dry_air_flow(&self) -> MassFlow<S> {
        MassFlow::from_kilograms_per_second(self.dry_air_flow)
    }

    /// Volume flow at the state of this air.
    pub fn volume_flow(&self) -> VolumeFlow<S> {
        VolumeFlow::from_cubic_meters_per_second(
            self.dry_air_flow * self.air.specific_volume().cubic_meters_per_kilogram(),
        )
    }

    pub(crate) fn with_air(&self, air: MoistAir<S>) -> Self {
        Self { air, dry_air_flow: self.dry_air_flow }
    }

    /// Dry-air flow, refused at zero.
    fn flow(&self) -> Result<S, Error> {
        if self.dry_air_flow > k(0.0) { Ok(self.dry_air_flow) } else { Err(Error::NoFlow) }
    }
}

/// Air that may carry condensate, with its dry-air mass flow.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct WetStream<S = f64> {
    air: AirWithCondensate<S>,
    dry_air_flow: S,
}

impl<S: Scalar> WetStream<S> {
    /// From a dry-air mass flow.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`] for the flow.
    pub fn new(air: AirWithCondensate<S>, dry_air_flow: MassFlow<S>) -> Result<Self, Error> {
        Ok(Self { air, dry_air_flow: checked(Quantity::DryAirFlow, dry_air_flow.kilograms_per_second())? })
    }

    /// Air and condensate.
    pub fn air(&self) -> AirWithCondensate<S> {
        self.air
    }

    /// Dry-air mass flow.
    pub fn dry_air_flow(&self) -> MassFlow<S> {
        MassFlow::from_kilograms_per_second(self.dry_air_flow)
    }

    pub(crate) fn with_air(&self, air: AirWithCondensate<S>) -> Self {
        Self { air, dry_air_flow: self.dry_air_flow }
    }

    /// The stream of the gas alone.
    pub fn without_condensate(&self) -> AirStream<S> {
        AirStream { air: self.air.air(), dry_air_flow: self.dry_air_flow }
    }
}

impl<S: Scalar> From<AirStream<S>> for WetStream<S> {
    fn from(stream: AirStream<S>) -> Self {
        Self { air: stream.air.into(), dry_air_flow: stream.dry_air_flow }
    }
}

/// What a process gave to the air.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Exchange<S = f64> {
    /// Heat through a surface or a heater, into the air.
    pub heat: HeatFlow<S>,
    /// Water into the air; negative for condensate.
    pub water: MassFlow<S>,
    /// Enthalpy that came with that water.
    pub water_enthalpy_flow: HeatFlow<S>,
}

impl<S: Scalar> Exchange<S> {
    /// Nothing exchanged.
    pub fn none() -> Self {
        Self::new(k(0.0), k(0.0), k(0.0))
    }

    pub(crate) fn new(heat: S, water: S, water_enthalpy_flow: S) -> Self {
        Self {
            heat: HeatFlow::from_watts(heat),
            water: MassFlow::from_kilograms_per_second(water),
            water_enthalpy_flow: HeatFlow::from_watts(water_enthalpy_flow),
        }
    }

    /// Heat alone.
    pub(crate) fn of_heat(heat: HeatFlow<S>) -> Self {
        Self { heat, ..Self::none() }
    }

    /// Both together.
    pub(crate) fn plus(&self, other: &Self) -> Self {
        Self {
            heat: self.heat + other.heat,
            water: self.water + other.water,
            water_enthalpy_flow: self.water_enthalpy_flow + other.water_enthalpy_flow,
        }
    }
}

/// Specific enthalpy and humidity ratio of a state as plain numbers.
fn parts<S: Scalar>(air: &MoistAir<S>) -> (S, S) {
    (air.specific_enthalpy().joules_per_kilogram(), air.humidity_ratio().kilograms_per_kilogram())
}

fn same_formulation<S: Scalar>(a: &MoistAir<S>, b: &MoistAir<S>) -> Result<(), Error> {
    if a.formulation() == b.formulation() { Ok(()) } else { Err(Error::MixedFormulations) }
}

pub(crate) fn infeasible<S: Scalar>(quantity: Quantity, value: S, min: S, max: S) -> Error {
    Error::Infeasible { quantity, value: value.to_f64(), min: min.to_f64(), max: max.to_f64() }
}

/// The temperature at which water melts at the pressure of this air, °C.
fn melting_temperature<S: Scalar>(air: &MoistAir<S>) -> S {
    let pressure = air.pressure().pascals();
    with_mixture!(air.formulation(), S, M => <M<S> as Mixture<S>>::melting_temperature(pressure))
}

/// The most vapor that air of this pressure and formulation holds at another temperature.
fn capacity<S: Scalar>(air: &MoistAir<S>, celsius: S) -> S {
    let pressure = air.pressure().pascals();
    with_mixture!(air.formulation(), S, M => greatest_humidity_ratio(&M::<S>::at(celsius), celsius, pressure))
}

/// Vapor and condensate of an enthalpy and a total water that a process leaves, at the pressure of some air.
fn equilibrium<S: Scalar>(enthalpy: S, water: S, air: &MoistAir<S>) -> Result<AirWithCondensate<S>, Error> {
    let within = |quantity: Quantity, value: S| {
        let (min, max) = quantity.limits();
        if value < k(min) || value > k(max) { Err(infeasible(quantity, value, k(min), k(max))) } else { Ok(()) }
    };
    within(Quantity::TotalWater, water)?;
    within(Quantity::LeavingEnthalpy, enthalpy)?;
    AirWithCondensate::from_enthalpy_and_water(
        SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
        HumidityRatio::from_kilograms_per_kilogram(water),
        Freezing::Equilibrium,
        air.basis(),
    )
}

/// The same, refused where it would be fog.
fn unsaturated<S: Scalar>(enthalpy: S, ratio: S, air: &MoistAir<S>) -> Result<MoistAir<S>, Error> {
    let wet = equilibrium(enthalpy, ratio, air)?;
    if wet.is_wet() {
        return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), parts(&wet.air()).1));
    }
    Ok(wet.air())
}

#[cfg(test)]
mod tests;
