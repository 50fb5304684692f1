//! The states that a coil can leave, as a curve of enthalpy over humidity ratio, convex on each surface.

use super::CoilLeaving;
use crate::basis::{Formulation, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::mixture::Mixture;
use crate::process::{capacity, infeasible, parts};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::MoistAir;
use crate::state::condensate::temperature_of_enthalpy;
use crate::state::construct::saturation_rounding;
use crate::state::property::dew_point;

/// The least relative humidity that any coil is taken to leave.
const LEAST_HUMIDITY: f64 = 0.2;

/// The curve of a coil on the way to a target. Its parameter is the temperature of the leaving air where that has a relative humidity, and the
/// apparatus dew point where there is a bypass.
pub(in crate::process) struct Curve<S> {
    formulation: Formulation,
    pressure: S,
    /// x over x_s on the curve.
    fraction: S,
    /// Share of the entering air.
    bypass: S,
    /// Enthalpy and humidity ratio of the entering air.
    entering: (S, S),
    /// Humidity ratio of the target.
    target_ratio: S,
    /// The least parameter.
    pub coldest: S,
}

/// A point of the curve, and how it moves with the parameter.
pub(in crate::process) struct Point<S> {
    pub enthalpy: S,
    pub ratio: S,
    pub enthalpy_slope: S,
    pub ratio_slope: S,
}

impl<S: Scalar> Curve<S> {
    pub fn of(coil: CoilLeaving<S>, entering: &MoistAir<S>, target: &MoistAir<S>) -> Result<Self, Error> {
        let (one, zero) = (k::<S>(1.0), k::<S>(0.0));
        let formulation = target.formulation();
        let (fraction, bypass, coldest) = match coil {
            CoilLeaving::RelativeHumidity(humidity) => {
                let fraction = checked(Quantity::RelativeHumidity, humidity.fraction())?;
                let least = k(LEAST_HUMIDITY);
                if fraction < least || fraction > one {
                    return Err(infeasible(Quantity::RelativeHumidity, fraction, least, one));
                }
                (fraction, zero, k(formulation.limits(Quantity::LeavingTemperature).0))
            }
            CoilLeaving::Bypass { factor, coldest } => {
                let factor = checked(Quantity::BypassFactor, factor)?;
                if factor == one {
                    return Err(infeasible(Quantity::BypassFactor, factor, zero, one - S::epsilon()));
                }
                (one, factor, checked_for(formulation, Quantity::ApparatusDewPoint, coldest.celsius())?)
            }
        };
        Ok(Self {
            formulation,
            pressure: target.pressure().pascals(),
            fraction,
            bypass,
            entering: parts(entering),
            target_ratio: parts(target).1,
            coldest,
        })
    }

    /// The point of a parameter.
    pub fn point(&self, celsius: S, surface: Surface) -> Point<S> {
        let (one, share) = (k::<S>(1.0), k::<S>(1.0) - self.bypass);
        let (h1, w1) = self.entering;
        with_mixture!(self.formulation, S, M => {
            let mixture = M::<S>::at(celsius);
            let saturation = mixture.saturation(self.pressure, surface);
            let mole_fraction = saturation.mole_fraction * self.fraction;
            let ratio = <M<S> as Mixture<S>>::humidity_ratio(mole_fraction);
            let gas = mixture.gas(self.pressure, ratio);
            // d ln W = d ln x / (1 − x), and d ln x is that of saturation.
            let log_slope = saturation.log_slope * (one - saturation.mole_fraction) / (one - mole_fraction);
            let ratio_slope = ratio * log_slope;
            let enthalpy_slope = gas.specific_heat + gas.enthalpy_of_water * ratio_slope;
            Point {
                enthalpy: self.bypass * h1 + share * gas.enthalpy,
                ratio: self.bypass * w1 + share * ratio,
                enthalpy_slope: share * enthalpy_slope,
                ratio_slope: share * ratio_slope,
            }
        })
    }

    /// The parameter at which the coil leaves the humidity ratio of the target.
    pub fn parameter(&self) -> Result<S, Error> {
        let (one, zero) = (k::<S>(1.0), k::<S>(0.0));
        let w1 = self.entering.1;
        let at_surface = (self.target_ratio - self.bypass * w1) / (one - self.bypass);
        if self.bypass > zero && at_surface <= zero {
            // Dry air stays dry, whatever passes.
            let most = if w1 > zero { self.target_ratio / w1 } else { zero };
            return Err(infeasible(Quantity::BypassFactor, self.bypass, zero, most));
        }
        let celsius = self.saturation_temperature(at_surface)?;
        if celsius < self.coldest {
            return Err(infeasible(Quantity::ApparatusDewPoint, celsius, self.coldest, k(self.warmest())));
        }
        Ok(celsius)
    }

    /// Temperature of the air that the coil leaves at the humidity ratio of the target.
    pub fn leaving_temperature(&self) -> Result<S, Error> {
        let parameter = self.parameter()?;
        if self.bypass == k(0.0) {
            return Ok(parameter);
        }
        let point = self.point(parameter, Surface::Stable);
        let ratio = self.target_ratio;
        let celsius = with_mixture!(self.formulation, S, M =>
            temperature_of_enthalpy::<M<S>, S>(point.enthalpy, self.pressure, ratio));
        let air = MoistAir::assemble(parameter, self.pressure, k(0.0), self.formulation);
        let held = capacity(&air, celsius);
        // Nearly saturated air led to a cold surface passes through fog.
        if ratio <= held + saturation_rounding(held) {
            Ok(celsius)
        } else {
            Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), held))
        }
    }

    fn warmest(&self) -> f64 {
        self.formulation.limits(Quantity::ApparatusDewPoint).1
    }

    /// Temperature at which a humidity ratio is at the fraction of saturation over the stable surface.
    fn saturation_temperature(&self, ratio: S) -> Result<S, Error> {
        let (pressure, fraction) = (self.pressure, self.fraction);
        with_mixture!(self.formulation, S, M => {
            let coldest = k::<S>(self.formulation.limits(Quantity::LeavingTemperature).0);
            let driest = M::<S>::at(coldest).saturation(pressure, Surface::Ice).mole_fraction * fraction;
            let mole_fraction = <M<S> as Mixture<S>>::mole_fraction(ratio);
            if mole_fraction < driest {
                let least = <M<S> as Mixture<S>>::humidity_ratio(driest);
                return Err(infeasible(Quantity::HumidityRatio, ratio, least, self.entering.1));
            }
            let saturated = mole_fraction / fraction;
            if saturated > k(Quantity::WaterMoleFraction.limits().1) {
                return Err(infeasible(Quantity::RelativeHumidity, fraction, mole_fraction, k(1.0)));
            }
            let over = |surface| dew_point::<M<S>, S>(saturated, pressure, surface);
            let melting = <M<S> as Mixture<S>>::melting_temperature(pressure);
            let at_melting = M::<S>::at(melting).saturation(pressure, Surface::Liquid).mole_fraction;
            Ok(if saturated < at_melting { over(Surface::Ice).at_most(melting) } else { over(Surface::Liquid) })
        })
    }

    /// The temperature at which the condensate of this pressure melts.
    pub fn melting_temperature(&self) -> S {
        with_mixture!(self.formulation, S, M => <M<S> as Mixture<S>>::melting_temperature(self.pressure))
    }
}
