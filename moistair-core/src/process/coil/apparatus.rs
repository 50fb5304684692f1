//! The apparatus dew point of a coil known by the air on both sides.

use super::infeasible;
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::Error;
use crate::mixture::Mixture;
use crate::process::{parts, same_formulation};
use crate::quantity::Temperature;
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;
use crate::state::construct::SATURATION_TOLERANCE;
use crate::state::property::saturates;

/// A coil by its bypass.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Apparatus<S = f64> {
    /// Where the line from the entering through the leaving air meets saturation.
    pub dew_point: Temperature<S>,
    /// The share of the air that seems to pass untouched; 0 for air that leaves saturated.
    pub bypass_factor: S,
}

/// The apparatus dew point and bypass factor that take the entering to the leaving air, the inverse of [`super::by_bypass_factor`]: the
/// line is straight in enthalpy and humidity ratio.
///
/// The line meets the saturation curve once, twice or not at all; the warmer meeting is the coil's. Bounded work, a few hundred
/// evaluations.
///
/// # Errors
/// [`Error::Infeasible`] when nothing condenses or the air leaves warmer, and when the line misses saturation, as lines of much
/// dehumidifying do (the value is then the temperature of its nearest approach): such a state takes a coil and reheat.
/// [`Error::MixedFormulations`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::coil::apparatus_dew_point;
/// let state = |t: f64, rh| MoistAir::from_dry_bulb(
///     Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), Pressure::from_kilopascals(101.325));
/// let apparatus = apparatus_dew_point(&state(27.0, 50.0)?, &state(13.0, 95.0)?)?;
/// assert!((apparatus.dew_point.celsius() - 11.95).abs() < 0.1 && (0.06..0.08).contains(&apparatus.bypass_factor));
/// assert!(apparatus_dew_point(&state(24.0, 50.0)?, &state(22.0, 40.0)?).is_err()); // needs reheat
/// # Ok::<(), Error>(())
/// ```
pub fn apparatus_dew_point<S: Scalar>(entering: &MoistAir<S>, leaving: &MoistAir<S>) -> Result<Apparatus<S>, Error> {
    same_formulation(entering, leaving)?;
    let ((h1, w1), (h2, w2)) = (parts(entering), parts(leaving));
    let (drop, dried) = (h1 - h2, w1 - w2);
    let (start, end) = (leaving.dry_bulb().celsius(), entering.dry_bulb().celsius());
    let coldest = k::<S>(leaving.formulation().limits(Quantity::ApparatusDewPoint).0);
    if dried <= k(0.0) {
        return Err(infeasible(Quantity::HumidityRatio, w2, k(0.0), w1));
    }
    if start > end {
        return Err(infeasible(Quantity::LeavingTemperature, start, coldest, end));
    }
    let pressure = leaving.pressure().pascals();
    with_mixture!(leaving.formulation(), S, M => {
        // How far saturation at t lies beyond the line, and the slope of that: convex on each surface.
        let beyond = |celsius: S, surface| {
            let mixture = M::<S>::at(celsius);
            let saturation = mixture.saturation(pressure, surface);
            let ratio = saturation.humidity_ratio;
            let gas = mixture.gas(pressure, ratio);
            let value = (ratio - w1) * drop - (gas.enthalpy - h1) * dried;
            let slope = ratio * saturation.log_slope * (drop - gas.enthalpy_of_water * dried) - gas.specific_heat * dried;
            if saturates(saturation.mole_fraction) { (value, slope) } else { (S::infinity(), S::infinity()) }
        };
        let resolution = solve::temperature_resolution::<S>();
        // Saturated air has met the surface, wherever its line leads.
        let rounding = k::<S>(SATURATION_TOLERANCE).at_least(S::epsilon() * k(64.0));
        let at_start = M::<S>::at(start).saturation(pressure, Surface::Stable);
        if saturates(at_start.mole_fraction) && at_start.humidity_ratio <= w2 * (rounding + k(1.0)) {
            return Ok(Apparatus { dew_point: leaving.dry_bulb(), bypass_factor: k(0.0) });
        }
        let melting = <M<S> as Mixture<S>>::melting_temperature(pressure);
        let branches = [(Surface::Liquid, melting, start), (Surface::Ice, coldest, start.at_most(melting))];
        let mut nearest = start;
        for (surface, low, high) in branches.into_iter().filter(|(_, low, high)| low < high) {
            let lowest = solve::increasing(low, high, resolution, |celsius| (beyond(celsius, surface).1, k(0.0)));
            if beyond(lowest, surface).0 > k(0.0) {
                nearest = lowest;
                continue;
            }
            let dew_point = solve::increasing(lowest, high, resolution, |celsius| beyond(celsius, surface));
            let surface_ratio = M::<S>::at(dew_point).saturation(pressure, surface).humidity_ratio.at_most(w2);
            return Ok(Apparatus {
                dew_point: Temperature::from_celsius(dew_point),
                bypass_factor: (w2 - surface_ratio) / (w1 - surface_ratio),
            });
        }
        Err(infeasible(Quantity::ApparatusDewPoint, nearest, coldest, start))
    })
}
