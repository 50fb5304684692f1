//! The film of saturated air on water, on which towers, washers and wetted media stand.

use super::{infeasible, parts};
use crate::basis::{Basis, Formulation, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{Pressure, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;
use crate::state::condensate::condensed_enthalpy;
use crate::state::property::dew_point;

/// Saturated air at the temperature of the water.
#[derive(Clone, Copy, Debug)]
pub(in crate::process) struct Film<S> {
    /// h_s, J/kg
    pub enthalpy: S,
    /// dh_s/dT, J/(kg K)
    pub slope: S,
    /// W_s
    pub humidity_ratio: S,
    /// Enthalpy of the vapor in it, J/kg
    pub vapor_enthalpy: S,
    /// An estimate of d²h_s/dT²: the latent part grows as W_s does.
    pub curvature: S,
}

/// Pressure and formulation, and the temperatures at which water can lie under such air.
#[derive(Clone, Copy, Debug)]
pub(in crate::process) struct Site<S> {
    formulation: Formulation,
    pressure: S,
    warmest: S,
}

impl<S: Scalar> Site<S> {
    pub fn of(air: &MoistAir<S>) -> Self {
        let (formulation, pressure) = (air.formulation(), air.pressure().pascals());
        let most = k::<S>(Quantity::HumidityRatio.limits().1);
        let full = with_mixture!(formulation, S, M => {
            dew_point::<M<S>, S>(<M<S> as Mixture<S>>::mole_fraction(most), pressure, Surface::Liquid)
        });
        Self { formulation, pressure, warmest: full.at_most(k(formulation.limits(Quantity::DryBulb).1)) }
    }

    pub fn basis(&self) -> Basis<S> {
        Basis::new(Pressure::from_pascals(self.pressure), self.formulation)
    }

    /// The warmest water: the film is a state below it, with a humidity ratio of 10 or the highest dry bulb at it.
    pub fn warmest(&self) -> S {
        self.warmest
    }

    /// Supercooled below the melting temperature, down to −40 °C.
    pub fn coldest() -> S {
        k(Quantity::DewPoint.limits().0)
    }

    /// Held at the ends of the range.
    pub fn film(&self, celsius: S) -> Film<S> {
        let celsius = celsius.at_least(Self::coldest()).at_most(self.warmest);
        with_mixture!(self.formulation, S, M => {
            let mixture = M::<S>::at(celsius);
            let saturation = mixture.saturation(self.pressure, Surface::Liquid);
            let ratio = saturation.humidity_ratio;
            let gas = mixture.gas(self.pressure, ratio);
            let growth = ratio * saturation.log_slope * gas.enthalpy_of_water;
            Film {
                enthalpy: gas.enthalpy,
                slope: gas.specific_heat + growth,
                humidity_ratio: ratio,
                vapor_enthalpy: gas.enthalpy_of_water,
                curvature: growth * saturation.log_slope,
            }
        })
    }

    /// Of saturated air at the ends of the range.
    pub fn enthalpies(&self) -> (S, S) {
        (self.film(Self::coldest()).enthalpy, self.film(self.warmest).enthalpy)
    }

    /// Where saturated air has a given enthalpy, °C.
    pub fn temperature_of_enthalpy(&self, enthalpy: S) -> Option<S> {
        let (least, most) = self.enthalpies();
        (least <= enthalpy && enthalpy <= most).then(|| {
            solve::increasing(Self::coldest(), self.warmest, solve::temperature_resolution(), |celsius| {
                let film = self.film(celsius);
                (film.enthalpy - enthalpy, film.slope)
            })
        })
    }

    /// The temperature of water that enters, checked.
    pub fn checked_water(&self, temperature: Temperature<S>) -> Result<S, Error> {
        let celsius = checked(Quantity::WaterTemperature, temperature.celsius())?;
        if celsius <= self.warmest {
            return Ok(celsius);
        }
        Err(infeasible(Quantity::WaterTemperature, celsius, k(Quantity::WaterTemperature.limits().0), self.warmest))
    }

    pub fn water_enthalpy(&self, celsius: S) -> S {
        condensed_enthalpy(self.formulation, celsius, self.pressure, Surface::Liquid)
    }

    /// Mean heat capacity of the water between two temperatures, over at least one kelvin: the c_pw of every method, so that the heat
    /// given up is that of the enthalpies of the formulation.
    pub fn water_heat_capacity(&self, a: S, b: S) -> S {
        let low = a.at_most(b);
        let high = a.at_least(b).at_least(low + k(1.0));
        (self.water_enthalpy(high) - self.water_enthalpy(low)) / (high - low)
    }
}

/// The limit that the entering air sets, T*, no colder than −40 °C: there the water has long been ice.
pub(in crate::process) fn limit<S: Scalar>(site: &Site<S>, air: &MoistAir<S>) -> Result<S, Error> {
    let (enthalpy, _) = parts(air);
    let (least, most) = site.enthalpies();
    if enthalpy < least {
        return Ok(Site::coldest());
    }
    site.temperature_of_enthalpy(enthalpy).ok_or_else(|| infeasible(Quantity::SpecificEnthalpy, enthalpy, least, most))
}
