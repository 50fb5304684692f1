//! How much steam air takes up: where the line of added steam meets saturation, and where it leaves it.

use super::{AirStream, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::Mixture;
use crate::quantity::{MassFlow, SpecificEnthalpy};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::MoistAir;
use crate::state::condensate::temperature_of_enthalpy;
use crate::state::construct::greatest_humidity_ratio;
use crate::state::property::{dew_point, saturates};

/// How much steam air takes up before it saturates. Not monotone: the line of added steam may miss saturation, and may leave it again.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Absorption<S = f64> {
    /// Up to this flow, nothing where the air enters saturated; of more, a part condenses.
    UpTo(MassFlow<S>),
    /// Up to a flow, and again from another on: between the two a part condenses, beyond them the heat of so much superheated steam keeps
    /// all of it vapor. Both are zero for saturated air that the hottest steam dries from the start on.
    UpToAndFrom {
        /// Where the air first saturates.
        up_to: MassFlow<S>,
        /// Where it is no longer saturated.
        from: MassFlow<S>,
    },
    /// Any flow within the range of states: hot steam warms the air faster than it moistens it.
    Unlimited,
}

impl<S: Scalar> Absorption<S> {
    /// The flow at which the air first saturates, if it does.
    pub fn first_saturation(&self) -> Option<MassFlow<S>> {
        match *self {
            Self::UpTo(up_to) | Self::UpToAndFrom { up_to, .. } => Some(up_to),
            Self::Unlimited => None,
        }
    }

    /// The flow from which on it is no longer saturated, if there is one.
    pub fn unsaturated_again(&self) -> Option<MassFlow<S>> {
        match *self {
            Self::UpToAndFrom { from, .. } => Some(from),
            Self::UpTo(_) | Self::Unlimited => None,
        }
    }
}

/// The steam flow at which the air first saturates, and that from which on it no longer is.
///
/// Bounded work: a grid of 64 points, and two searches of at most 80 evaluations.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`], [`Error::NoFlow`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, humidify::{self, Absorption, Steam}};
/// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), RelativeHumidity::from_percent(30.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let of = |celsius: f64| -> Result<_, Error> {
///     let steam = Steam::superheated(Temperature::from_celsius(celsius), Pressure::from_kilopascals(100.0))?;
///     humidify::steam_limit(&entering, steam.specific_enthalpy())
/// };
/// // Of steam of 1 bar: 15.9 g/s at 200 °C, and more than 162 g/s of it would be taken up again. At 300 °C there is no limit.
/// let limit = of(200.0)?;
/// assert!((limit.first_saturation().unwrap().kilograms_per_second() - 0.0159).abs() < 1e-4);
/// assert!((limit.unsaturated_again().unwrap().kilograms_per_second() - 0.162).abs() < 1e-3);
/// assert_eq!(of(300.0)?, Absorption::Unlimited);
/// assert!(of(20.0).is_err()); // water
/// # Ok::<(), Error>(())
/// ```
pub fn steam_limit<S: Scalar>(entering: &AirStream<S>, enthalpy: SpecificEnthalpy<S>) -> Result<Absorption<S>, Error> {
    let enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    let flow = entering.flow()?;
    let air = entering.air();
    let whole = |per_air: S| MassFlow::from_kilograms_per_second(flow * per_air);
    Ok(match first_crossing(&air, enthalpy, k(1.0)) {
        Some(first) => match leaves_saturation(&air, enthalpy, first) {
            Some(again) => Absorption::UpToAndFrom { up_to: whole(first), from: whole(again) },
            None => Absorption::UpTo(whole(first)),
        },
        None => Absorption::Unlimited,
    })
}

/// Points of the logarithmic grid on which the first crossing is looked for. See the test of this module.
const CROSSING_GRID: u32 = 64;
/// Smallest amount of steam on it, kg per kg of dry air.
const CROSSING_LEAST: f64 = 1e-6;

/// Steps of golden section: 4e-7 of the interval, and the maximum to the square of that.
const GOLDEN_STEPS: u32 = 30;

/// Steam per dry air at which the relative humidity first reaches a fraction.
pub(super) fn first_crossing<S: Scalar>(air: &MoistAir<S>, enthalpy: S, fraction: S) -> Option<S> {
    first_crossing_on(CROSSING_GRID, air, enthalpy, fraction)
}

fn first_crossing_on<S: Scalar>(grid: u32, air: &MoistAir<S>, enthalpy: S, fraction: S) -> Option<S> {
    let (h1, w1) = parts(air);
    let pressure = air.pressure().pascals();
    with_mixture!(air.formulation(), S, M => {
        // x − φ x_ws after adding s: negative while the air can take more. `None` where the air gets too hot.
        let excess = |s: S| {
            let ratio = w1 + s;
            let celsius = temperature_of_enthalpy::<M<S>, S>(h1 + s * enthalpy, pressure, ratio);
            let (coldest, warmest) = air.formulation().limits(Quantity::DryBulb);
            let cool_enough = celsius <= k(warmest);
            if !cool_enough {
                return None;
            }
            let saturated = M::<S>::at(celsius.at_least(k(coldest))).saturation(pressure, Surface::Stable).mole_fraction;
            // Where nothing saturates there is no relative humidity to reach.
            let excess = <M<S> as Mixture<S>>::mole_fraction(ratio) - fraction * saturated;
            Some(S::select(saturates(saturated), excess, k(-1.0)))
        };
        let start = air.dry_bulb().celsius();
        let saturated = M::<S>::at(start).saturation(pressure, Surface::Stable).mole_fraction;
        // To rounding: saturated air takes none.
        let close = k::<S>(1.0) - S::epsilon() * k(64.0);
        if saturates(saturated) && <M<S> as Mixture<S>>::mole_fraction(w1) >= fraction * saturated * close {
            return Some(k(0.0));
        }
        let most = k::<S>(Quantity::HumidityRatio.limits().1) - w1;
        let step = ((most / k(CROSSING_LEAST)).ln() / k(f64::from(grid))).exp();
        let resolution = S::epsilon() * k(CROSSING_LEAST);
        let reached = |s: S| excess(s).is_some_and(|excess| excess >= k(0.0));
        let (mut older, mut below) = ((k::<S>(0.0), -S::infinity()), (k::<S>(0.0), -S::infinity()));
        let mut s = k::<S>(CROSSING_LEAST);
        for _ in 0..=grid {
            let value = excess(s).unwrap_or(-S::infinity());
            // Between points the line may touch saturation and turn back.
            let turned = older.1 <= below.1 && value < below.1;
            let beyond = if turned { greatest(older.0, s, |s| excess(s).unwrap_or(-S::infinity())) } else { s };
            if reached(beyond) {
                // Zero slope: pure halving, the function has no simple one.
                let excess = |s| (excess(s).unwrap_or(k(1.0)), k(0.0));
                return Some(solve::increasing(older.0, beyond, resolution, excess));
            }
            excess(s)?;
            (older, below, s) = (below, (s, value), s * step);
        }
        None
    })
}

/// Steam per dry air beyond the first crossing from which on the air is no longer saturated. Crossings nearer to each other than
/// [`CROSSING_LEAST`] are told as one.
fn leaves_saturation<S: Scalar>(air: &MoistAir<S>, enthalpy: S, first: S) -> Option<S> {
    let (h1, w1) = parts(air);
    let pressure = air.pressure().pascals();
    let (_, warmest) = air.formulation().limits(Quantity::DryBulb);
    with_mixture!(air.formulation(), S, M => {
        let melting = <M<S> as Mixture<S>>::melting_temperature(pressure);
        let melting_ratio = M::<S>::at(melting).saturation(pressure, Surface::Liquid).humidity_ratio;
        // Enthalpy over that of saturated air with all of the water as vapor: above zero nothing condenses. Only states are evaluated, where
        // the gas beyond saturation has none.
        let excess = |s: S| {
            let ratio = w1 + s;
            let fraction = <M<S> as Mixture<S>>::mole_fraction(ratio);
            let dew = |surface| dew_point::<M<S>, S>(fraction, pressure, surface);
            let celsius = if ratio < melting_ratio { dew(Surface::Ice) } else { dew(Surface::Liquid) };
            h1 + s * enthalpy - M::<S>::at(celsius).gas(pressure, ratio).enthalpy
        };
        // To the end of the range of states: the greatest humidity ratio, or saturation at the highest dry bulb.
        let most = greatest_humidity_ratio(&M::<S>::at(k(warmest)), k(warmest), pressure) - w1 - first;
        let (near, end) = (first + k(CROSSING_LEAST), first + most);
        let (least, reached) = (excess(near), excess(end));
        let leaves = near < end && reached > k(0.0);
        // The line leaves saturation once at most: a test tries.
        leaves.then(|| {
            if least > k(0.0) {
                return first;
            }
            solve::between((near, least), (end, reached), S::epsilon() * first.at_least(k(CROSSING_LEAST)), excess)
        })
    })
}

/// Where a function with one maximum between two points is greatest, by golden section.
fn greatest<S: Scalar>(low: S, high: S, f: impl Fn(S) -> S) -> S {
    const GOLDEN: f64 = 0.618_033_988_749_894_8;
    let (mut low, mut high) = (low, high);
    for _ in 0..GOLDEN_STEPS {
        let reach = (high - low) * k(GOLDEN);
        let (left, right) = (high - reach, low + reach);
        if f(left) < f(right) { low = left } else { high = right }
    }
    (low + high) * k(0.5)
}

#[cfg(test)]
mod tests;
