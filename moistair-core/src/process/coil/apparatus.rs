//! Where the line of a coil, known by the air on both sides, meets saturation: nowhere, once, or twice.

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
use crate::state::construct::saturation_tolerance;
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

/// Where the line from the entering through the leaving air meets saturation: nowhere, once, or twice.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct ApparatusDewPoints<S = f64> {
    /// The warmer meeting, which is the coil's; `None` for a line that misses saturation.
    pub warmer: Option<Apparatus<S>>,
    /// The colder, where the line comes out of saturation again, down to −40 °C.
    pub colder: Option<Apparatus<S>>,
    /// Where the line comes nearest to saturation, if it misses it; otherwise the warmer meeting.
    pub nearest: Temperature<S>,
}

impl<S: Scalar> ApparatusDewPoints<S> {
    /// How many there are: 0, 1 or 2.
    #[must_use]
    pub fn count(&self) -> usize {
        usize::from(self.warmer.is_some()) + usize::from(self.colder.is_some())
    }
}

/// The apparatus dew point and bypass factor that take the entering to the leaving air, the inverse of [`super::by_bypass_factor`]: the
/// line is straight in enthalpy and humidity ratio.
///
/// The line meets the saturation curve once, twice or not at all; the warmer meeting is the coil's ([`apparatus_dew_points`] gives both).
/// Bounded work, a few hundred evaluations.
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
    let found = apparatus_dew_points(entering, leaving)?;
    let start = leaving.dry_bulb().celsius();
    let coldest = leaving.formulation().limits(Quantity::ApparatusDewPoint).0;
    found.warmer.ok_or(infeasible(Quantity::ApparatusDewPoint, found.nearest.celsius(), k(coldest), start))
}

/// All meetings of the line from the entering through the leaving air with saturation, below the leaving air's dry bulb.
///
/// # Errors
/// [`Error::Infeasible`] when nothing condenses or the air leaves warmer; [`Error::MixedFormulations`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::coil::apparatus_dew_points;
/// let state = |t: f64, rh| MoistAir::from_dry_bulb(
///     Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), Pressure::from_kilopascals(101.325));
/// let found = apparatus_dew_points(&state(27.0, 50.0)?, &state(13.0, 85.0)?)?;
/// assert_eq!(found.count(), 2);
/// assert!(found.colder.unwrap().dew_point < found.warmer.unwrap().dew_point);
/// assert_eq!(apparatus_dew_points(&state(24.0, 50.0)?, &state(22.0, 40.0)?)?.count(), 0);
/// assert!(apparatus_dew_points(&state(24.0, 50.0)?, &state(22.0, 70.0)?).is_err()); // moister
/// # Ok::<(), Error>(())
/// ```
pub fn apparatus_dew_points<S: Scalar>(
    entering: &MoistAir<S>,
    leaving: &MoistAir<S>,
) -> Result<ApparatusDewPoints<S>, Error> {
    same_formulation(entering, leaving)?;
    let (w1, w2) = (parts(entering).1, parts(leaving).1);
    let (start, end) = (leaving.dry_bulb().celsius(), entering.dry_bulb().celsius());
    if w1 <= w2 {
        return Err(infeasible(Quantity::HumidityRatio, w2, k(0.0), w1));
    }
    if start > end {
        let coldest = k(leaving.formulation().limits(Quantity::ApparatusDewPoint).0);
        return Err(infeasible(Quantity::LeavingTemperature, start, coldest, end));
    }
    let ((h1, _), (h2, _)) = (parts(entering), parts(leaving));
    let pressure = leaving.pressure().pascals();
    let line = Line { from: parts(entering), drop: h1 - h2, dried: w1 - w2, leaving_ratio: w2, pressure };
    let coldest = k(leaving.formulation().limits(Quantity::ApparatusDewPoint).0);
    Ok(with_mixture!(leaving.formulation(), S, M => line.meetings::<M<S>>(start, coldest)))
}

/// All meetings with saturation, below a temperature, of the line from a state along a fall of enthalpy and one of humidity ratio.
pub(in crate::process) fn meetings_along<S: Scalar>(
    air: &MoistAir<S>,
    drop: S,
    dried: S,
    start: S,
) -> ApparatusDewPoints<S> {
    let pressure = air.pressure().pascals();
    // There is no leaving air that might be saturated already.
    let line = Line { from: parts(air), drop, dried, leaving_ratio: k(0.0), pressure };
    let coldest = k(air.formulation().limits(Quantity::ApparatusDewPoint).0);
    with_mixture!(air.formulation(), S, M => line.meetings::<M<S>>(start, coldest))
}

/// A line from a state, as enthalpy and humidity ratio, and how far it leads to the leaving air, if there is any.
struct Line<S> {
    from: (S, S),
    drop: S,
    dried: S,
    leaving_ratio: S,
    pressure: S,
}

impl<S: Scalar> Line<S> {
    /// How far saturation at t lies beyond the line, and the slope of that: convex on each surface.
    fn beyond<M: Mixture<S>>(&self, celsius: S, surface: Surface) -> (S, S) {
        let ((h1, w1), drop, dried) = (self.from, self.drop, self.dried);
        let mixture = M::at(celsius);
        let saturation = mixture.saturation(self.pressure, surface);
        let ratio = saturation.humidity_ratio;
        let gas = mixture.gas(self.pressure, ratio);
        let value = (ratio - w1) * drop - (gas.enthalpy - h1) * dried;
        let slope = ratio * saturation.log_slope * (drop - gas.enthalpy_of_water * dried) - gas.specific_heat * dried;
        if saturates(saturation.mole_fraction) { (value, slope) } else { (S::infinity(), S::infinity()) }
    }

    /// The coil that meets saturation at a temperature.
    fn apparatus<M: Mixture<S>>(&self, celsius: S, surface: Surface) -> Apparatus<S> {
        let ((_, w1), w2) = (self.from, self.leaving_ratio);
        let ratio = M::at(celsius).saturation(self.pressure, surface).humidity_ratio.at_most(w2);
        Apparatus { dew_point: Temperature::from_celsius(celsius), bypass_factor: (w2 - ratio) / (w1 - ratio) }
    }

    /// From the leaving air's temperature down, over liquid and then over ice.
    fn meetings<M: Mixture<S>>(&self, start: S, coldest: S) -> ApparatusDewPoints<S> {
        let resolution = solve::temperature_resolution::<S>();
        let w2 = self.leaving_ratio;
        // Saturated air has met the surface, wherever its line leads.
        let at_start = M::at(start).saturation(self.pressure, Surface::Stable);
        let saturated =
            saturates(at_start.mole_fraction) && at_start.humidity_ratio <= w2 * (saturation_tolerance::<S>() + k(1.0));
        let start_air = Apparatus { dew_point: Temperature::from_celsius(start), bypass_factor: k(0.0) };
        let mut found =
            ApparatusDewPoints { warmer: saturated.then_some(start_air), colder: None, nearest: start_air.dew_point };
        let melting = M::melting_temperature(self.pressure);
        let branches = [(Surface::Liquid, melting, start), (Surface::Ice, coldest, start.at_most(melting))];
        for (surface, low, high) in branches.into_iter().filter(|(_, low, high)| low < high) {
            let lowest = solve::increasing(low, high, resolution, |t| (self.beyond::<M>(t, surface).1, k(0.0)));
            if self.beyond::<M>(lowest, surface).0 > k(0.0) {
                if found.warmer.is_none() {
                    found.nearest = Temperature::from_celsius(lowest);
                }
                // A line that went on inside saturation from the other branch would have come out above.
                continue;
            }
            if found.warmer.is_none() {
                let dew_point = solve::increasing(lowest, high, resolution, |t| self.beyond::<M>(t, surface));
                found.warmer = Some(self.apparatus::<M>(dew_point, surface));
                found.nearest = Temperature::from_celsius(dew_point);
            }
            if self.beyond::<M>(low, surface).0 > k(0.0) {
                let dew_point = solve::increasing(low, lowest, resolution, |t| {
                    let (value, slope) = self.beyond::<M>(t, surface);
                    (-value, -slope)
                });
                // Meetings closer than rounding tells apart are one.
                let apart = start - dew_point > S::epsilon().sqrt() * k(100.0) || !saturated;
                found.colder = apart.then(|| self.apparatus::<M>(dew_point, surface));
                return found;
            }
        }
        found
    }
}
