//! Equilibrium of moist air with its own condensate: fog, ice fog, and the three phases at the melting temperature.

use crate::basis::{Basis, Formulation, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{HumidityRatio, Pressure, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;

use super::MoistAir;
use super::property::{DEW_POINT_STEPS, dew_point};

/// Newton steps for the temperature that goes with an enthalpy; see the test of this module.
pub(crate) const TEMPERATURE_STEPS: usize = 4;

/// Moist air with the liquid water and ice that it carries, each per mass of dry air.
///
/// Water that is not vapor is carried beside the vapor, never as a relative humidity above one.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct AirWithCondensate<S = f64> {
    air: MoistAir<S>,
    liquid: S,
    ice: S,
    condensate_enthalpy: S,
}

/// Whether water below the melting temperature freezes in equilibrium or stays liquid, as fog does to about −15 °C (common
/// practice, no source).
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Freezing {
    /// Ice below the melting temperature.
    #[default]
    Equilibrium = 0,
    /// No ice: liquid stays supercooled, down to −40 °C.
    Supercooled = 1,
}

impl<S: Scalar> From<MoistAir<S>> for AirWithCondensate<S> {
    fn from(air: MoistAir<S>) -> Self {
        Self { air, liquid: k(0.0), ice: k(0.0), condensate_enthalpy: k(0.0) }
    }
}

impl<S: Scalar> AirWithCondensate<S> {
    /// The gas phase.
    pub fn air(&self) -> MoistAir<S> {
        self.air
    }

    /// Liquid water per mass of dry air.
    pub fn liquid(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(self.liquid)
    }

    /// Ice per mass of dry air.
    pub fn ice(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(self.ice)
    }

    /// Whether there is any condensate.
    #[must_use]
    pub fn is_wet(&self) -> bool {
        self.liquid > k(0.0) || self.ice > k(0.0)
    }

    /// Vapor, liquid and ice together, per mass of dry air.
    pub fn total_water(&self) -> HumidityRatio<S> {
        HumidityRatio::from_kilograms_per_kilogram(
            self.air.humidity_ratio().kilograms_per_kilogram() + self.liquid + self.ice,
        )
    }

    /// Enthalpy of the air and its condensate, per mass of dry air.
    pub fn specific_enthalpy(&self) -> SpecificEnthalpy<S> {
        SpecificEnthalpy::from_joules_per_kilogram(
            self.air.specific_enthalpy().joules_per_kilogram() + self.condensate_enthalpy,
        )
    }

    /// Saturated air that carries stated amounts of liquid and ice at its temperature.
    ///
    /// # Errors
    /// [`Error::OutOfRange`] or [`Error::NotFinite`] for an amount.
    pub fn new(air: MoistAir<S>, liquid: HumidityRatio<S>, ice: HumidityRatio<S>) -> Result<Self, Error> {
        let liquid = checked(Quantity::TotalWater, liquid.kilograms_per_kilogram())?;
        let ice = checked(Quantity::TotalWater, ice.kilograms_per_kilogram())?;
        Ok(Self::carrying(air, liquid, ice))
    }

    fn carrying(air: MoistAir<S>, liquid: S, ice: S) -> Self {
        let (celsius, pressure) = (air.dry_bulb().celsius(), air.pressure().pascals());
        let enthalpy = |surface| condensed_enthalpy(air.formulation(), celsius, pressure, surface);
        // An absent phase adds nothing, and may have no equation here.
        let part = |amount: S, surface| if amount > k(0.0) { amount * enthalpy(surface) } else { k(0.0) };
        let condensate_enthalpy = part(liquid, Surface::Liquid) + part(ice, Surface::Ice);
        Self { air, liquid, ice, condensate_enthalpy }
    }

    /// Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together, per mass of dry air.
    ///
    /// At the melting temperature all three phases coexist over a range of enthalpy. Bounded work: at most
    /// 80 evaluations, usually under ten.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`], or [`Error::Infeasible`] where the result would leave the range of states.
    ///
    /// ```
    /// use moistair_core::*;
    /// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
    /// // The mixture of equal parts of 30 °C, 90 % and −10 °C, 80 % is fog.
    /// let fog = AirWithCondensate::from_enthalpy_and_water(
    ///     SpecificEnthalpy::from_kilojoules_per_kilogram(42.9),
    ///     HumidityRatio::from_grams_per_kilogram(12.84), Freezing::Equilibrium, site)?;
    /// assert!(fog.is_wet() && (15.0..15.6).contains(&fog.air().dry_bulb().celsius()));
    /// # Ok::<(), Error>(())
    /// ```
    pub fn from_enthalpy_and_water(
        enthalpy: SpecificEnthalpy<S>,
        total_water: HumidityRatio<S>,
        freezing: Freezing,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        let enthalpy = checked(Quantity::LeavingEnthalpy, enthalpy.joules_per_kilogram())?;
        let water = checked(Quantity::TotalWater, total_water.kilograms_per_kilogram())?;
        let pressure = checked(Quantity::Pressure, basis.pressure().pascals())?;
        with_mixture!(basis.formulation(), S, M => equilibrium::<M<S>, S>(enthalpy, water, pressure, freezing, basis.formulation()))
    }
}

/// Enthalpy of liquid water or ice on the datum of a formulation.
pub(crate) fn condensed_enthalpy<S: Scalar>(formulation: Formulation, celsius: S, pressure: S, surface: Surface) -> S {
    with_mixture!(formulation, S, M => <M<S> as Mixture<S>>::condensed_enthalpy(celsius, pressure, surface))
}

/// Dry bulb, °C, of air with a given enthalpy, pressure and humidity ratio.
pub(crate) fn temperature_of_enthalpy<M: Mixture<S>, S: Scalar>(enthalpy: S, pressure: S, humidity_ratio: S) -> S {
    let mut celsius = (enthalpy - humidity_ratio * k(2_501_000.0)) / (humidity_ratio * k(1_860.0) + k(1_006.0));
    for _ in 0..TEMPERATURE_STEPS {
        // An enthalpy far outside leads far outside the equations; the caller checks the range.
        celsius = celsius.at_least(k(-120.0)).at_most(k(200.0));
        let gas = M::at(celsius).gas(pressure, humidity_ratio);
        celsius = celsius - (gas.enthalpy - enthalpy) / gas.specific_heat;
    }
    celsius
}

fn equilibrium<M: Mixture<S>, S: Scalar>(
    enthalpy: S,
    water: S,
    pressure: S,
    freezing: Freezing,
    formulation: Formulation,
) -> Result<AirWithCondensate<S>, Error> {
    let state = |celsius, ratio| MoistAir::assemble(celsius, pressure, ratio, formulation);
    let surface = match freezing {
        Freezing::Equilibrium => Surface::Stable,
        Freezing::Supercooled => Surface::Liquid,
    };
    let (coldest, warmest) = Quantity::DryBulb.limits();
    let in_range = |celsius: S| k::<S>(coldest) <= celsius && celsius <= k(warmest);
    let dry_bulb = temperature_of_enthalpy::<M, S>(enthalpy, pressure, water);
    if in_range(dry_bulb) && water <= capacity::<M, S>(dry_bulb, pressure, surface) {
        return Ok(state(dry_bulb, water).into());
    }
    // Wet: saturated air and condensate between the coldest state and the dew point of all the water.
    let melting = M::melting_temperature(pressure);
    let wet = |celsius: S, surface| {
        let mixture = M::at(celsius);
        let saturation = mixture.saturation(pressure, surface);
        let gas = mixture.gas(pressure, saturation.humidity_ratio);
        (saturation, gas)
    };
    if freezing == Freezing::Equilibrium {
        let (saturation, gas) = wet(melting, Surface::Liquid);
        let surplus = water - saturation.humidity_ratio;
        let liquid = M::condensed_enthalpy(melting, pressure, Surface::Liquid);
        let ice = M::condensed_enthalpy(melting, pressure, Surface::Ice);
        let (all_liquid, all_ice) = (gas.enthalpy + surplus * liquid, gas.enthalpy + surplus * ice);
        if surplus > k(0.0) && all_ice <= enthalpy && enthalpy <= all_liquid {
            let frozen = (all_liquid - enthalpy) / (liquid - ice);
            let air = state(melting, saturation.humidity_ratio);
            return Ok(AirWithCondensate::carrying(air, (surplus - frozen).at_least(k(0.0)), frozen));
        }
    }
    let mole_fraction = M::mole_fraction(water);
    let dew = |surface| dew_point::<M, S, DEW_POINT_STEPS>(mole_fraction, pressure, surface);
    // One curve is followed, chosen by the side of the melting temperature on which the result lies.
    let melted = freezing == Freezing::Supercooled || {
        let (saturation, gas) = wet(melting, Surface::Liquid);
        let surplus = water - saturation.humidity_ratio;
        surplus > k(0.0)
            && enthalpy > gas.enthalpy + surplus * M::condensed_enthalpy(melting, pressure, Surface::Liquid)
    };
    let (curve, low, high) = match (melted, freezing) {
        (true, Freezing::Supercooled) => (Surface::Liquid, k(Quantity::DewPoint.limits().0), dew(Surface::Liquid)),
        (true, Freezing::Equilibrium) => (Surface::Liquid, melting, dew(Surface::Liquid)),
        (false, _) => (Surface::Ice, k(coldest), dew(Surface::Ice).at_most(melting)),
    };
    let celsius = solve::increasing(low, high, |celsius| {
        let (saturation, gas) = wet(celsius, curve);
        let surplus = water - saturation.humidity_ratio;
        let ratio_slope = saturation.humidity_ratio * saturation.log_slope;
        (
            gas.enthalpy + surplus * saturation.condensed_enthalpy - enthalpy,
            gas.specific_heat + ratio_slope * (gas.enthalpy_of_water - saturation.condensed_enthalpy),
        )
    });
    let ratio = wet(celsius, curve).0.humidity_ratio;
    let surplus = water - ratio;
    let reached = surplus >= -(water * k(1e-9)) && in_range(celsius) && celsius > low;
    if !reached {
        let reach = |celsius: S, ratio: S| state(celsius, ratio).specific_enthalpy().joules_per_kilogram().to_f64();
        return Err(Error::Infeasible {
            quantity: Quantity::LeavingEnthalpy,
            value: enthalpy.to_f64(),
            min: reach(k(coldest), k(0.0)),
            max: reach(k(warmest), water),
        });
    }
    let air = state(celsius, ratio.at_most(water));
    let surplus = surplus.at_least(k(0.0));
    Ok(match curve {
        Surface::Ice => AirWithCondensate::carrying(air, k(0.0), surplus),
        _ => AirWithCondensate::carrying(air, surplus, k(0.0)),
    })
}

/// Humidity ratio that the gas can hold in equilibrium; without limit where nothing saturates.
fn capacity<M: Mixture<S>, S: Scalar>(celsius: S, pressure: S, surface: Surface) -> S {
    let saturation = M::at(celsius).saturation(pressure, surface);
    if super::property::saturates(saturation.mole_fraction) { saturation.humidity_ratio } else { S::infinity() }
}

/// A pressure of an outlet, checked.
pub(crate) fn checked_pressure<S: Scalar>(pressure: Pressure<S>) -> Result<S, Error> {
    checked(Quantity::Pressure, pressure.pascals())
}

/// Enthalpy per kilogram of liquid water, on the datum of a basis.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]: 0 to 200 °C.
pub fn liquid_water_enthalpy<S: Scalar>(
    temperature: Temperature<S>,
    basis: impl Into<Basis<S>>,
) -> Result<SpecificEnthalpy<S>, Error> {
    let basis = basis.into();
    let celsius = checked(Quantity::WaterTemperature, temperature.celsius())?;
    let pressure = checked_pressure(basis.pressure())?;
    let enthalpy = condensed_enthalpy(basis.formulation(), celsius, pressure, Surface::Liquid);
    Ok(SpecificEnthalpy::from_joules_per_kilogram(enthalpy))
}
