//! Merkel's method: the enthalpy of the air is all that drives.
//!
//! Me = K a V / L = ∫ c_pw dT / (h_s(T) − h_a(T)) from the cold to the hot water, with h_a = h₁ + (L/G) c_pw (T − t₂)
//! (Merkel 1925, VDI Forschungsarbeiten 275; Baker and Shryock 1961, J. Heat Transfer 83:339; CTI ATC-105, EN 13741). h_s is the enthalpy of
//! saturated air at the temperature of the water. c_pw is the mean over the range, so that the heat is that of the formulation's enthalpies.
//!
//! It takes heat and mass to move alike (Lewis factor one), neglects the water that evaporates in the balance of heat, and the resistance
//! of the water itself. It gives neither evaporation nor the state of the leaving air. Not for plume, water consumption or natural draft:
//! [`poppe`](super::poppe) is.
//!
//! # Accuracy
//! [`Quadrature`] says what each rule is worth; [`rate`] finds the cold water to 2e-5 K of the exact solution of these equations up to Me 5,
//! L/G 3 and water of 60 °C.

use super::film::{Film, Site, limit};
use super::march::{Height, MARCH_STEPS, excess, march, steps};
use super::rating::{Inlet, TowerRating, TowerStatus, checked_number};
use super::{AirStream, HotWater, TowerWater, infeasible, parts, water_to_air_ratio};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HeatFlow, MassFlow, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::solve;
use crate::state::MoistAir;

/// How the Merkel integral is evaluated.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Quadrature {
    /// Eight points of Gauss and Legendre over the range.
    #[default]
    GaussLegendre = 0,
    /// The same on each of seven parts of the range, narrow where the water is cold, for duties next to the limit or the pinch.
    GaussLegendreGraded = 1,
    /// The rule of the trade, for comparison with contracts: the mean of the values at 0.1, 0.4, 0.6 and 0.9 of the range. It bears
    /// Chebyshev's name, but not his points.
    FourPoint = 2,
}

/// Points and weights on the unit interval, the lower half; computed with 40 digits.
const GAUSS_LEGENDRE: [(f64, f64); 4] = [
    (0.019855071751231884158, 0.050614268145188129576),
    (0.1016667612931866302, 0.11119051722668723527),
    (0.23723379504183550709, 0.15685332293894364367),
    (0.40828267875217509753, 0.18134189168918099148),
];

/// Upper ends of the parts of the graded rule.
const PARTS: [f64; 7] = [1.0 / 256.0, 1.0 / 64.0, 1.0 / 16.0, 1.0 / 4.0, 1.0 / 2.0, 3.0 / 4.0, 1.0];

impl Quadrature {
    /// ∫ f over the unit interval.
    fn integrate<S: Scalar>(self, f: impl Fn(S) -> S) -> S {
        let zero = k::<S>(0.0);
        let gauss = |from: S, width: S| {
            GAUSS_LEGENDRE.iter().fold(zero, |sum, &(point, weight)| {
                let (low, high) = (from + width * k(point), from + width * k(1.0 - point));
                sum + (f(low) + f(high)) * k(weight)
            }) * width
        };
        match self {
            Self::GaussLegendre => gauss(zero, k(1.0)),
            Self::GaussLegendreGraded => {
                PARTS.iter().fold((zero, zero), |(sum, from), &to| (sum + gauss(from, k::<S>(to) - from), k(to))).0
            }
            Self::FourPoint => [0.1, 0.4, 0.6, 0.9].iter().fold(zero, |sum, &point| sum + f(k(point))) * k(0.25),
        }
    }
}

/// How much transfer a duty takes.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct MerkelNumber<S = f64> {
    /// Me = K a V / L.
    pub number: S,
    /// L/G.
    pub water_to_air: S,
    /// Where the driving force would vanish with less air.
    pub pinch: Pinch<S>,
    /// Heat that the water gives up.
    pub heat_rejected: HeatFlow<S>,
    /// Enthalpy of the leaving air.
    pub leaving_enthalpy: SpecificEnthalpy<S>,
}

/// The least air that can do a duty, with a tower without end.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Pinch<S = f64> {
    /// The greatest L/G; at the upper end of its range where nothing pinches.
    pub water_to_air: S,
    /// Water temperature at which the enthalpies of air and film meet: that of the hot water, or between where the line of the air
    /// touches the curve of the film.
    pub temperature: Temperature<S>,
}

impl<S: Scalar> Pinch<S> {
    /// The least dry air for a flow of water.
    pub fn least_air(&self, water: MassFlow<S>) -> MassFlow<S> {
        MassFlow::from_kilograms_per_second(water.kilograms_per_second() / self.water_to_air)
    }
}

/// A range of water under entering air, checked: cold above the limit.
struct Duty<S> {
    site: Site<S>,
    hot: S,
    cold: S,
    /// h₁
    enthalpy: S,
    /// c_pw
    heat_capacity: S,
}

impl<S: Scalar> Duty<S> {
    fn new(air: &MoistAir<S>, hot: Temperature<S>, cold: Temperature<S>) -> Result<Self, Error> {
        let site = Site::of(air);
        let (hot, cold) = (site.checked_water(hot)?, site.checked_water(cold)?);
        if hot < cold {
            let (min, max) = Quantity::TowerRange.limits();
            return Err(infeasible(Quantity::TowerRange, hot - cold, k(min), k(max)));
        }
        let (enthalpy, _) = parts(air);
        if site.film(cold).enthalpy <= enthalpy {
            return Err(infeasible(Quantity::WaterTemperature, cold, limit(&site, air)?, hot));
        }
        Ok(Self { site, hot, cold, enthalpy, heat_capacity: site.water_heat_capacity(hot, cold) })
    }

    /// h_s(T) convex, h_a a line through (t₂, h₁): it touches the curve where h_s'(T) (T − t₂) = h_s(T) − h₁, or meets it at t₁ first.
    fn pinch(&self) -> Pinch<S> {
        let touches = |celsius: S| {
            let Film { enthalpy, slope, curvature, .. } = self.site.film(celsius);
            let above = celsius - self.cold;
            (slope * above - (enthalpy - self.enthalpy), curvature * above)
        };
        let celsius = if touches(self.hot).0 <= k(0.0) {
            self.hot
        } else {
            solve::increasing(self.cold, self.hot, solve::temperature_resolution(), touches)
        };
        let steepest =
            (self.site.film(celsius).enthalpy - self.enthalpy) / (self.heat_capacity * (celsius - self.cold));
        let most = k::<S>(Quantity::WaterToAirRatio.limits().1);
        Pinch {
            // Without a range nothing pinches.
            water_to_air: if self.cold < celsius && steepest <= most { steepest } else { most },
            temperature: Temperature::from_celsius(celsius),
        }
    }

    fn number(&self, water_to_air: S, quadrature: Quadrature) -> S {
        let rise = self.heat_capacity * (self.hot - self.cold);
        quadrature.integrate(|part: S| {
            let film = self.site.film(self.cold + (self.hot - self.cold) * part);
            rise / (film.enthalpy - self.enthalpy - water_to_air * rise * part)
        })
    }
}

/// The greatest ratio of water to air with which a duty can be done at all.
///
/// # Errors
/// [`Error::Infeasible`] where the cold water is not above the limit T*, see [`coldest_water`](super::coldest_water), or the hot water not above
/// the cold; [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn pinch<S: Scalar>(air: &MoistAir<S>, hot: Temperature<S>, cold: Temperature<S>) -> Result<Pinch<S>, Error> {
    Ok(Duty::new(air, hot, cold)?.pinch())
}

/// The Merkel number that a duty takes.
///
/// # Accuracy
/// Of the integral, relative, over 422 duties with wet bulbs of 5 to 28 °C, approaches of 1 to 8 K, ranges of 3 to 25 K and L/G of
/// 0.3 to 2.2, not above 0.9 of the pinch; in brackets those of common cooling practice, with ranges up to 10 K and approaches from 3 K:
///
/// | rule | median | worst |
/// |---|---|---|
/// | Gauss–Legendre | 2e-11 | 2e-4 (1e-8) |
/// | graded | 2e-15 | 4e-12 |
/// | four points | 1e-3 | 4e-2 (2e-3) |
///
/// Next to the pinch the number runs away, and so does the error of any rule: a duty within 5 % of it is better rated than sized.
///
/// # Errors
/// [`Error::Infeasible`] for the cold water at or below its limit T*, for L/G at or beyond the pinch (the error holds the greatest), for water
/// that is not cooled, and for a number beyond its range; [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, tower::{TowerWater, merkel::{self, Quadrature}}};
/// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let outdoor: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(100.0), site)?;
/// let (flow, celsius) = (MassFlow::<f64>::from_kilograms_per_second, Temperature::<f64>::from_celsius);
/// let entering = AirStream::new(outdoor, flow(10.0))?;
/// let duty = TowerWater { flow: flow(12.0), hot: celsius(39.0), cold: celsius(29.0) };
/// let needed = merkel::number(&entering, duty, Quadrature::GaussLegendre)?;
/// assert!((needed.number - 1.60834).abs() < 1e-5);
/// let too_much = TowerWater { flow: flow(25.0), ..duty };
/// assert!(matches!(merkel::number(&entering, too_much, Quadrature::GaussLegendre), Err(Error::Infeasible { .. })));
/// # Ok::<(), Error>(())
/// ```
pub fn number<S: Scalar>(
    entering: &AirStream<S>,
    water: TowerWater<S>,
    quadrature: Quadrature,
) -> Result<MerkelNumber<S>, Error> {
    let air = entering.air();
    let duty = Duty::new(&air, water.hot, water.cold)?;
    let water_to_air = water_to_air_ratio(entering, water.flow)?;
    let pinch = duty.pinch();
    let (least, _) = Quantity::WaterToAirRatio.limits();
    if duty.cold < duty.hot && pinch.water_to_air <= water_to_air {
        return Err(infeasible(Quantity::WaterToAirRatio, water_to_air, k(least), pinch.water_to_air));
    }
    let number = duty.number(water_to_air, quadrature);
    let (min, max) = Quantity::MerkelNumber.limits();
    if !(k::<S>(min) <= number && number <= k(max)) {
        // As near to the pinch as this, rounding can make the driving force vanish at a point.
        let endless = if number > k(max) { number.to_f64() } else { f64::INFINITY };
        return Err(Error::Infeasible { quantity: Quantity::MerkelNumber, value: endless, min, max });
    }
    let drop = duty.site.water_enthalpy(duty.hot) - duty.site.water_enthalpy(duty.cold);
    Ok(MerkelNumber {
        number,
        water_to_air,
        pinch,
        heat_rejected: HeatFlow::from_watts(water.flow.kilograms_per_second() * drop),
        leaving_enthalpy: SpecificEnthalpy::from_joules_per_kilogram(duty.enthalpy + water_to_air * drop),
    })
}

/// The cold water of a tower of a given Merkel number.
///
/// One cold water, and only one, goes with a number: the march from it arrives the warmer, the warmer it starts. It lies between T* and the
/// hot water, on whichever side of it the hot water is.
///
/// # Errors
/// [`Error::Infeasible`] for a number with which the water would freeze (the error holds the greatest that does not) and for water that would
/// boil; [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, tower::{HotWater, TowerStatus, merkel}};
/// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let outdoor: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(100.0), site)?;
/// let (flow, celsius) = (MassFlow::<f64>::from_kilograms_per_second, Temperature::<f64>::from_celsius);
/// let entering = AirStream::new(outdoor, flow(10.0))?;
/// let rated = merkel::rate(&entering, HotWater { flow: flow(12.0), temperature: celsius(39.0) }, 1.60834)?;
/// assert!((rated.water.cold.celsius() - 29.0).abs() < 1e-4);
/// let cold = merkel::rate(&entering, HotWater { flow: flow(12.0), temperature: celsius(10.0) }, 1.60834)?;
/// assert_eq!(cold.status, TowerStatus::Reversed);
/// assert!(cold.water.cold.celsius() > 10.0);
/// # Ok::<(), Error>(())
/// ```
pub fn rate<S: Scalar>(entering: &AirStream<S>, water: HotWater<S>, number: S) -> Result<TowerRating<S>, Error> {
    rate_in_steps(entering, water, number, MARCH_STEPS)
}

pub(super) fn rate_in_steps<S: Scalar>(
    entering: &AirStream<S>,
    water: HotWater<S>,
    number: S,
    least_steps: u32,
) -> Result<TowerRating<S>, Error> {
    let number = checked_number(number)?;
    let inlet = Inlet::new(entering, water)?;
    let air = entering.air();
    let limit = limit(&inlet.site, &air)?;
    let status = if inlet.hot < limit { TowerStatus::Reversed } else { TowerStatus::Cooling };
    if number == k(0.0) || inlet.hot == limit {
        return TowerRating::new(&inlet, inlet.hot, status);
    }
    let (enthalpy, _) = parts(&air);
    let cold = inlet.cold_water(limit, number, solve::temperature_resolution(), |cold, number| {
        climb(&inlet.site, enthalpy, (inlet.hot, cold), inlet.water_to_air, number, least_steps)
    })?;
    TowerRating::new(&inlet, cold, status)
}

/// dT/dN = (h_s(T) − h₁) / c_pw − (L/G) (T − t₂).
fn climb<S: Scalar>(
    site: &Site<S>,
    enthalpy: S,
    (hot, cold): (S, S),
    water_to_air: S,
    number: S,
    least_steps: u32,
) -> S {
    let heat_capacity = site.water_heat_capacity(hot, cold);
    let foot = Height { celsius: cold, humidity_ratio: k(0.0) };
    let top = march(foot, hot, number, steps(least_steps, number, water_to_air), |at| Height {
        celsius: (site.film(at.celsius).enthalpy - enthalpy) / heat_capacity - water_to_air * (at.celsius - cold),
        humidity_ratio: k(0.0),
    });
    excess(cold, hot, top)
}

/// The dry-air flow with which a tower of a given fill does a duty: what the fan must move.
///
/// More air takes less transfer and gives more of it, so that one flow, and only one, fits.
///
/// # Errors
/// As [`number`]; [`Error::Infeasible`] where L/G would leave its range: this fill is too small even with
/// the most air, or does the duty with next to none.
pub fn air_for_duty<S: Scalar>(
    air: &MoistAir<S>,
    water: TowerWater<S>,
    fill: &super::fill::FillLaw<S>,
) -> Result<AirStream<S>, Error> {
    let duty = Duty::new(air, water.hot, water.cold)?;
    let flow = checked(Quantity::WaterFlow, water.flow.kilograms_per_second())?;
    let (least, _) = Quantity::WaterToAirRatio.limits();
    let (low, high) = (k::<S>(least), duty.pinch().water_to_air);
    let most = k::<S>(Quantity::MerkelNumber.limits().1);
    // What the fill has beyond the duty, as the excess of a march: falls with the ratio.
    let lacking = |ratio: S| {
        let number = fill.at(ratio).at_most(most);
        -climb(&duty.site, duty.enthalpy, (duty.hot, duty.cold), ratio, number, MARCH_STEPS)
    };
    let (at_low, at_high) = (lacking(low), lacking(high));
    let enough = at_low < k(0.0) && k::<S>(0.0) < at_high;
    if !enough {
        return Err(infeasible(Quantity::FillCoefficient, fill.coefficient(), k(0.0), most));
    }
    let ratio = solve::between((low, at_low), (high, at_high), high * S::epsilon() * k(16.0), lacking);
    AirStream::new(*air, MassFlow::from_kilograms_per_second(flow / ratio))
}
