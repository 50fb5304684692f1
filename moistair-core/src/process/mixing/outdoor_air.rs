//! How much of a mixture is outdoor air: from readings of outdoor, return and mixed air, from flows; and how much of it
//! gives a wanted mixed temperature.
//!
//! The fraction is that of the dry air. What mixes in proportion to it is enthalpy with all condensate, total water and, per dry
//! air, a tracer gas: x = (m − r) / (o − r). A temperature only nearly does. The heat capacity per dry air is larger in moister
//! air, so that the fraction by dry bulbs is off by about x (1 − x) Δc_p / c_p: 0.005 at most for two airs that differ by 10 g/kg.
//! Where the mixture fogs, its dry bulb stands above the line by the heat of the fog, and its humidity ratio below: only enthalpy
//! and total water with the fog still give the fraction. Sensors in a mixing box are also subject to stratification, which can
//! exceed all of this by far (common practice, no source); an averaging element belongs there.
//!
//! The raw fraction is returned, never clamped. Its uncertainty is that of the first order, u(x) = √(u_m² + x² u_o² + (1 − x)²
//! u_r²) / |o − r| (JCGM 100:2008, Eq. 10), true while the difference is several times its own uncertainty. Differences of less
//! than 3 to 5 K say little (common practice, no source).
//!
//! The least outdoor air is a matter of ventilation codes, not of this module.

use super::{Mixed, adiabatic};
use crate::basis::{Basis, Formulation};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::process::measured::{COVERAGE_FACTOR, MeasuredAir, Reading, root_of_squares};
use crate::process::{AirStream, infeasible};
use crate::quantity::{MassFlow, Temperature};
use crate::real::{Scalar, k};
use crate::signal::Quality;
use crate::signal::coded::coded_enum;
use crate::solve;
use crate::state::MoistAir;

coded_enum! {
    /// What a measured fraction is worth.
    FractionStatus {
        /// As certain as was asked.
        Determined = 0, "determined";
        /// Less certain than was asked, or from a difference within twice its own uncertainty.
        Uncertain = 1, "uncertain";
        /// Below zero by more than twice its uncertainty: a sensor is wrong, or none of the air is what it is taken for.
        BelowZero = 2, "below zero: a sensor fault";
        /// Above one by more than twice its uncertainty: the same.
        AboveOne = 3, "above one: a sensor fault";
        /// Outdoor and return air read the same, or no air flows: any fraction would do.
        Indeterminate = 4, "indeterminate: nothing tells the airs apart";
    }
}

/// A measured outdoor-air fraction.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct OutdoorAirFraction<S = f64> {
    /// Raw, not clamped to 0 … 1; `None` without a difference.
    pub fraction: Option<S>,
    /// Its standard uncertainty; `None` without a difference.
    pub standard_uncertainty: Option<S>,
    /// What it is worth.
    pub status: FractionStatus,
    /// The worst quality of the readings.
    pub quality: Quality,
}

/// From readings of outdoor, return and mixed air of one quantity: dry bulb, humidity ratio, specific enthalpy or a tracer's concentration.
/// `acceptable` is the standard uncertainty of the fraction up to which it counts as determined.
///
/// # Errors
/// [`Error::UnknownSelector`] for another quantity; [`Error::NotFinite`] for a missing or refused reading, [`Error::OutOfRange`].
///
/// ```
/// use moistair_core::Quantity;
/// use moistair_core::process::measured::Reading;
/// use moistair_core::process::mixing::outdoor_air::{self, FractionStatus};
/// let of = |outdoor: f64, mixed: f64| {
///     let reading = |t| Reading::new(t, 0.2);
///     outdoor_air::from_readings(Quantity::DryBulb, reading(outdoor), reading(24.0), reading(mixed), 0.05)
/// };
/// let winter = of(4.0, 19.0)?;
/// assert_eq!((winter.fraction, winter.status), (Some(0.25), FractionStatus::Determined));
/// assert!((winter.standard_uncertainty.unwrap() - 0.0127).abs() < 1e-4);
/// assert_eq!(of(23.0, 23.5)?.status, FractionStatus::Uncertain);
/// assert_eq!(of(4.0, 27.0)?.status, FractionStatus::BelowZero);
/// assert_eq!(of(24.0, 24.0)?.status, FractionStatus::Indeterminate);
/// assert!(of(f64::NAN, 19.0).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn from_readings<S: Scalar>(
    quantity: Quantity,
    outdoor: Reading<S>,
    returned: Reading<S>,
    mixed: Reading<S>,
    acceptable: S,
) -> Result<OutdoorAirFraction<S>, Error> {
    let tracers =
        [Quantity::DryBulb, Quantity::HumidityRatio, Quantity::SpecificEnthalpy, Quantity::TracerConcentration];
    if !tracers.contains(&quantity) {
        return Err(Error::UnknownSelector { code: quantity.code() });
    }
    let acceptable = checked(Quantity::StandardUncertainty, acceptable)?;
    let read = |reading: &Reading<S>| reading.usable(quantity, Formulation::default());
    let quality = outdoor.quality.worst(returned.quality).worst(mixed.quality);
    Ok(quotient(read(&outdoor)?, read(&returned)?, read(&mixed)?).judged(acceptable, quality))
}

/// The same from measured states, by enthalpy or humidity ratio, with the uncertainty that the sensors of temperature and humidity
/// leave in it by exact derivatives. Readings of air without condensate: in fog this is wrong.
///
/// # Errors
/// As [`from_readings`], for any other quantity than these two; as [`MeasuredAir::state`].
pub fn from_air<S: Scalar>(
    quantity: Quantity,
    outdoor: &MeasuredAir<S>,
    returned: &MeasuredAir<S>,
    mixed: &MeasuredAir<S>,
    basis: Basis<S>,
    acceptable: S,
) -> Result<OutdoorAirFraction<S>, Error> {
    if !matches!(quantity, Quantity::HumidityRatio | Quantity::SpecificEnthalpy) {
        return Err(Error::UnknownSelector { code: quantity.code() });
    }
    let acceptable = checked(Quantity::StandardUncertainty, acceptable)?;
    let read = |air: &MeasuredAir<S>| air.sensed(basis)?.property(quantity);
    let quality = outdoor.quality().worst(returned.quality()).worst(mixed.quality());
    Ok(quotient(read(outdoor)?, read(returned)?, read(mixed)?).judged(acceptable, quality))
}

/// Where flows are measured: which ones, beside that of the outdoor air. Dry-air mass flows, kg/s.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum OtherFlow<S = f64> {
    /// All that the outdoor air is a part of: the supply air.
    Total(Reading<S>),
    /// What it mixes with: the recirculated air.
    Recirculated(Reading<S>),
}

/// From measured dry-air flows: x = o / s, or o / (o + r).
///
/// # Errors
/// [`Error::NotFinite`], [`Error::OutOfRange`]. No total flow has no fraction: [`FractionStatus::Indeterminate`].
///
/// ```
/// use moistair_core::process::measured::Reading;
/// use moistair_core::process::mixing::outdoor_air::{self, FractionStatus, OtherFlow};
/// let supply = OtherFlow::Total(Reading::new(6.0, 0.3));
/// let of = |outdoor| outdoor_air::from_flows(Reading::new(outdoor, 0.1), supply, 0.05);
/// assert_eq!(of(1.5)?.fraction, Some(0.25));
/// assert_eq!(of(7.5)?.status, FractionStatus::AboveOne);
/// assert!(of(-1.0).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn from_flows<S: Scalar>(
    outdoor: Reading<S>,
    other: OtherFlow<S>,
    acceptable: S,
) -> Result<OutdoorAirFraction<S>, Error> {
    let acceptable = checked(Quantity::StandardUncertainty, acceptable)?;
    let read = |reading: &Reading<S>| reading.usable(Quantity::DryAirFlow, Formulation::default());
    let (part, by_part) = read(&outdoor)?;
    let (OtherFlow::Total(reading) | OtherFlow::Recirculated(reading)) = other;
    let (flow, by_flow) = read(&reading)?;
    let estimate = match other {
        OtherFlow::Total(_) => {
            let fraction = part / flow;
            Estimate::new(fraction, [by_part, fraction * by_flow], flow, by_flow, part.at_least(flow))
        }
        OtherFlow::Recirculated(_) => {
            let (total, fraction) = (part + flow, part / (part + flow));
            let parts = [(k::<S>(1.0) - fraction) * by_part, fraction * by_flow];
            Estimate::new(fraction, parts, total, root_of_squares([by_part, by_flow]), total)
        }
    };
    Ok(estimate.judged(acceptable, outdoor.quality.worst(reading.quality)))
}

/// A quotient and what is needed to judge it.
struct Estimate<S> {
    fraction: S,
    standard_uncertainty: S,
    difference: S,
    difference_uncertainty: S,
    rounding: S,
}

/// x = (m − r) / (o − r), each with its uncertainty.
fn quotient<S: Scalar>(outdoor: (S, S), returned: (S, S), mixed: (S, S)) -> Estimate<S> {
    let ((o, by_o), (r, by_r), (m, by_m)) = (outdoor, returned, mixed);
    let difference = o - r;
    let fraction = (m - r) / difference;
    let size = |x: S| x.at_least(-x);
    let parts = [by_m, fraction * by_o, (k::<S>(1.0) - fraction) * by_r];
    let scale = size(o).at_least(size(r)).at_least(size(m));
    Estimate::new(fraction, parts, difference, root_of_squares([by_o, by_r]), scale)
}

impl<S: Scalar> Estimate<S> {
    fn new<const N: usize>(fraction: S, parts: [S; N], difference: S, difference_uncertainty: S, scale: S) -> Self {
        let difference = difference.at_least(-difference);
        let standard_uncertainty = root_of_squares(parts) / difference;
        let rounding = scale * S::epsilon() * k(8.0) / difference;
        Self { fraction, standard_uncertainty, difference, difference_uncertainty, rounding }
    }

    fn judged(self, acceptable: S, quality: Quality) -> OutdoorAirFraction<S> {
        let Self { fraction, standard_uncertainty, difference, difference_uncertainty, rounding } = self;
        if !(fraction.is_finite() && standard_uncertainty.is_finite()) {
            let status = FractionStatus::Indeterminate;
            return OutdoorAirFraction { fraction: None, standard_uncertainty: None, status, quality };
        }
        let coverage = k::<S>(COVERAGE_FACTOR);
        let beyond = coverage * standard_uncertainty + rounding;
        let status = if fraction < -beyond {
            FractionStatus::BelowZero
        } else if fraction > k::<S>(1.0) + beyond {
            FractionStatus::AboveOne
        } else if standard_uncertainty <= acceptable && difference > coverage * difference_uncertainty {
            FractionStatus::Determined
        } else {
            FractionStatus::Uncertain
        };
        let (fraction, standard_uncertainty) = (Some(fraction), Some(standard_uncertainty));
        OutdoorAirFraction { fraction, standard_uncertainty, status, quality }
    }
}

/// Mixtures that [`for_mixed_temperature`] makes at most: 52 halvings of the range of fractions, the six more of its rule, its ends
/// and its result.
pub const MIXTURES: u32 = 61;

/// How far dampers may go.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct FractionLimits<S = f64> {
    /// What ventilation needs, by code; 0 to `most`.
    pub least: S,
    /// Dampers wide open; `least` to 1.
    pub most: S,
}

impl<S: Scalar> FractionLimits<S> {
    /// From the least to all outdoor air.
    pub fn from_least(least: S) -> Self {
        Self { least, most: k(1.0) }
    }

    pub(crate) fn checked(self) -> Result<Self, Error> {
        let (least, most) =
            (checked(Quantity::OutdoorAirFraction, self.least)?, checked(Quantity::OutdoorAirFraction, self.most)?);
        if least > most { Err(infeasible(Quantity::OutdoorAirFraction, least, k(0.0), most)) } else { Ok(self) }
    }
}

coded_enum! {
    /// Whether a fraction gives what was wanted.
    Reach {
        /// The mixture has the wanted temperature.
        Reached = 0, "reached";
        /// At the least outdoor air: the nearest that the dampers allow, or held there by an economizer that is off.
        AtLeast = 1, "not reached, at the least outdoor air";
        /// At the most outdoor air: the nearest that the dampers allow, or all of it where an economizer wants air colder than either.
        AtMost = 2, "not reached, at the most outdoor air";
    }
}

/// A fraction and what it mixes.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Blend<S = f64> {
    /// Outdoor-air fraction, within the limits.
    pub fraction: S,
    /// One kilogram of dry air per second of the mixture.
    pub mixed: Mixed<S>,
    /// Whether it has the wanted temperature.
    pub reach: Reach,
}

/// Mixes so much outdoor air with return air, by [`adiabatic`].
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`] for the fraction; as [`adiabatic`].
pub fn mixed<S: Scalar>(outdoor: &MoistAir<S>, returned: &MoistAir<S>, fraction: S) -> Result<Mixed<S>, Error> {
    let fraction = checked(Quantity::OutdoorAirFraction, fraction)?;
    let stream = |air: &MoistAir<S>, flow| AirStream::new(*air, MassFlow::from_kilograms_per_second(flow));
    adiabatic(&[stream(outdoor, fraction)?.into(), stream(returned, k::<S>(1.0) - fraction)?.into()])
}

/// The outdoor-air fraction that mixes to a wanted temperature, or comes nearest to it within the limits: searched between them on
/// [`adiabatic`], so that moisture and fog are accounted for. The temperature of a mixture runs from one to the other, but for the
/// heat of mixing of real gases: to 120 kPa and 60 °C by less than 1e-3 K, in hot steam at 3 MPa by kelvins. A temperature past
/// both gives the nearer end.
///
/// Accuracy: the temperature is met to 1e-12 K. Work: [`MIXTURES`] mixtures at most. Equal temperatures of outdoor and return air
/// give the least fraction.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`], [`Error::Infeasible`] for limits the wrong way round; as [`adiabatic`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::mixing::outdoor_air::{FractionLimits, Reach, for_mixed_temperature};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let (outdoor, returned) = (state(5.0, 70.0)?, state(24.0, 45.0)?);
/// let to = |t, least| for_mixed_temperature(&outdoor, &returned, Temperature::from_celsius(t), FractionLimits::from_least(least));
/// let mild = to(14.0, 0.2)?;
/// assert!((mild.fraction - 0.525).abs() < 0.005 && mild.reach == Reach::Reached);
/// assert_eq!(to(22.0, 0.2)?.reach, Reach::AtLeast);
/// assert!(to(14.0, 1.2).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn for_mixed_temperature<S: Scalar>(
    outdoor: &MoistAir<S>,
    returned: &MoistAir<S>,
    wanted: Temperature<S>,
    limits: FractionLimits<S>,
) -> Result<Blend<S>, Error> {
    let FractionLimits { least, most } = limits.checked()?;
    let wanted = checked_for(outdoor.formulation(), Quantity::LeavingTemperature, wanted.celsius())?;
    search((least, most), wanted, |fraction| mixed(outdoor, returned, fraction))
}

/// The same on any mixing.
fn search<S: Scalar>(
    (least, most): (S, S),
    wanted: S,
    mixed: impl Fn(S) -> Result<Mixed<S>, Error>,
) -> Result<Blend<S>, Error> {
    let excess = |mixed: &Mixed<S>| mixed.leaving.air().air().dry_bulb().celsius() - wanted;
    let ends = (mixed(least)?, mixed(most)?);
    let at_ends = (excess(&ends.0), excess(&ends.1));
    // Rising fractions may warm or cool: turned so that they warm.
    let warms = if at_ends.0 <= at_ends.1 { k::<S>(1.0) } else { k(-1.0) };
    let (low, high) = (at_ends.0 * warms, at_ends.1 * warms);
    let zero = k::<S>(0.0);
    if low >= zero {
        let reach = if low == zero { Reach::Reached } else { Reach::AtLeast };
        return Ok(Blend { fraction: least, mixed: ends.0, reach });
    }
    if high <= zero {
        let reach = if high == zero { Reach::Reached } else { Reach::AtMost };
        return Ok(Blend { fraction: most, mixed: ends.1, reach });
    }
    let at = |fraction: S| mixed(fraction).map_or(S::nan(), |mixed| excess(&mixed) * warms);
    let fraction = solve::between((least, low), (most, high), S::epsilon(), at);
    Ok(Blend { fraction, mixed: mixed(fraction)?, reach: Reach::Reached })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::Random;
    use crate::process::capacity;
    use crate::quantity::Pressure;
    use std::println;

    /// The most mixtures over the whole range of states.
    #[test]
    fn mixtures_stay_within_their_number() {
        let mut random = Random(4);
        let (mut most, mut found) = (0, 0);
        for _ in 0..2_000 {
            let formulation = if random.bits() & 1 == 0 { Formulation::RealGas } else { Formulation::IdealGas };
            let basis = Basis::new(Pressure::from_pascals(random.between(2e4, 1.1e6)), formulation);
            let mut air = || {
                let celsius = random.between(-80.0, 150.0);
                let plain = MoistAir::assemble(celsius, basis.pressure().pascals(), 0.0, formulation);
                let ratio = capacity(&plain, celsius) * random.between(0.0, 1.2).min(1.0);
                MoistAir::assemble(celsius, basis.pressure().pascals(), ratio, formulation)
            };
            let (outdoor, returned) = (air(), air());
            let share = random.between(0.0, 1.0);
            let (a, b) = (outdoor.dry_bulb().celsius(), returned.dry_bulb().celsius());
            let mixtures = core::cell::Cell::new(0_u32);
            let blend = search((0.0, 1.0), a + (b - a) * share, |fraction| {
                mixtures.set(mixtures.get() + 1);
                mixed(&outdoor, &returned, fraction)
            });
            if blend.is_ok() {
                (most, found) = (most.max(mixtures.get()), found + 1);
            }
        }
        println!("outdoor air for a temperature: {found} found, {most} mixtures at most");
        assert!(most <= MIXTURES && most > MIXTURES - 10 && found > 1_000);
    }
}
