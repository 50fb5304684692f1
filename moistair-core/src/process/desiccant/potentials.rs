//! What a wheel of silica gel reaches, by the F1–F2 potentials.
//!
//! Heat and water that are exchanged together come apart in two combined potentials, each of which then behaves like the temperature in a
//! rotary heat exchanger (Maclaine-cross and Banks 1972, "Coupled heat and mass transfer in regenerators", Int. J. Heat Mass Transfer 15, 1225).
//! For silica gel, T in kelvins and w in kg/kg (Jurinak 1982, dissertation, University of Wisconsin–Madison):
//!
//! F₁ = −2865/T^1.490 + 4.344 w^0.8624, which runs nearly along lines of enthalpy;
//! F₂ = T^1.490/6360 − 1.127 w^0.07969, which runs roughly along lines of relative humidity.
//!
//! An effectiveness in each says how far the process air gets toward the regeneration air: 0.05 to 0.10 in F₁ and 0.90 to 0.95 in F₂ for good
//! wheels (from memory of the literature). A test of a wheel gives both: [`effectiveness_between`].
//!
//! # Accuracy
//! The constants are from memory of the works named; no published example was at hand to check them. Between air of 30 °C and 14 g/kg and
//! regeneration at 85 °C, F₁ moves by 2 % of its way along a line of enthalpy, F₂ by a fifth along 20 % relative humidity from 20 to 80 °C. The
//! potentials close the balances only roughly: led by them on both sides, that wheel would leave over 10 % of the heat of the water it moves, and
//! 20 % of the water; at 120 °C more than is moved. What they leave over is reported ([`Imbalance`]); the process side is by the potentials and the regeneration side by the balances, so
//! that the books close. Expect 10 % of the drying, at best. Within 275 to 425 K, near standard pressure, for flows that do not differ much; not for
//! other desiccants, purge sectors, or wheels that turn so slowly as to be a batch.
//!
//! # Caution
//! As for every [desiccant](super).

use super::wheel::{WheelStatus, entropy};
use super::{AirStream, Exchange, Vaporization, infeasible, parts, same_formulation, unsaturated};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::process::capacity;
use crate::quantity::{HeatFlow, MassFlow, ZERO_CELSIUS};
use crate::real::{Scalar, k};
use crate::solve;
use crate::state::MoistAir;
use crate::state::construct::saturation_tolerance;

/// How far a wheel leads the process air toward the regeneration air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Effectiveness<S = f64> {
    /// In F₁, the potential near enthalpy: what a wheel carries over, the less the better.
    pub first: S,
    /// In F₂, the potential near relative humidity: what dries, the more the better.
    pub second: S,
}

/// Whether the correlation was made for this.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum CorrelationStatus {
    /// Within its range.
    #[default]
    Within = 0,
    /// The pressure is more than 5 % off 101 325 Pa, for which humidity ratio stands for vapor pressure in it.
    OffStandardPressure = 1,
}

/// What the potentials of both sides leave over, where the regeneration air too is led by them (its effectiveness is that of the process air times the
/// ratio of flows): a measure of how far to trust them.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Imbalance<S = f64> {
    /// Heat that both streams leave with beyond what they entered with.
    pub heat: HeatFlow<S>,
    /// Water, likewise.
    pub water: MassFlow<S>,
}

/// A wheel by its potentials.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct PotentialWheel<S = f64> {
    /// The process air behind the wheel.
    pub process: AirStream<S>,
    /// What it exchanged: the water with the enthalpy of vapor as it enters, the rest as heat.
    pub exchange: Exchange<S>,
    /// The regeneration air behind the wheel, by the balance of both sides.
    pub regeneration: AirStream<S>,
    /// What it exchanged, the opposite.
    pub regeneration_exchange: Exchange<S>,
    /// Water that went from the process to the regeneration air; negative where it went the other way.
    pub removed: MassFlow<S>,
    /// What the potentials leave over; `None` where they give the regeneration side no state.
    pub imbalance: Option<Imbalance<S>>,
    /// Entropy that the wheel produces, W/K.
    pub entropy_production: S,
    /// What that means.
    pub status: WheelStatus,
    /// Whether the correlation was made for this.
    pub correlation: CorrelationStatus,
}

/// The potentials F₁ and F₂ of air.
///
/// # Errors
/// [`Error::OutOfRange`] outside 275 to 425 K; [`Error::Infeasible`] for air without vapor, which has no place in the correlation.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::desiccant::potentials::potentials;
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = |t, w| MoistAir::from_dry_bulb(Temperature::from_celsius(t), HumidityRatio::from_grams_per_kilogram(w), site);
/// // Along a line of enthalpy the first hardly changes.
/// let (warm, cool) = (potentials(&air(45.0, 6.0)?)?, potentials(&air(30.0, 12.0)?)?);
/// assert!((warm.0 - cool.0).abs() < 0.03 * (potentials(&air(85.0, 14.0)?)?.0 - cool.0));
/// assert!(potentials(&air(0.0, 2.0)?).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn potentials<S: Scalar>(air: &MoistAir<S>) -> Result<(S, S), Error> {
    let celsius = checked(Quantity::DesiccantTemperature, air.dry_bulb().celsius())?;
    let (_, ratio) = parts(air);
    if ratio <= k(0.0) {
        let (_, most) = Quantity::HumidityRatio.limits();
        return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), k(most)));
    }
    Ok(of(celsius, ratio))
}

/// 1.490, the power of T in both potentials.
const TEMPERATURE_POWER: f64 = 1.490;
/// −2865 and 4.344 w^0.8624 in F₁.
const FIRST: (f64, f64, f64) = (2865.0, 4.344, 0.8624);
/// 1/6360 and −1.127 w^0.07969 in F₂.
const SECOND: (f64, f64, f64) = (6360.0, 1.127, 0.07969);

/// F₁ and F₂ of a temperature, °C, and a humidity ratio.
pub(super) fn of<S: Scalar>(celsius: S, ratio: S) -> (S, S) {
    let (x, logarithm) = (temperature_term(celsius + k(ZERO_CELSIUS)), ratio.ln());
    let (of_temperature, of_vapor, power) = FIRST;
    (k::<S>(of_vapor) * (logarithm * k(power)).exp() - k::<S>(of_temperature) / x, second(x, logarithm))
}

/// T^1.490.
fn temperature_term<S: Scalar>(kelvins: S) -> S {
    (kelvins.ln() * k(TEMPERATURE_POWER)).exp()
}

/// F₂ of T^1.490 and ln w.
fn second<S: Scalar>(x: S, log_ratio: S) -> S {
    let (of_temperature, of_vapor, power) = SECOND;
    x / k(of_temperature) - k::<S>(of_vapor) * (log_ratio * k(power)).exp()
}

/// ln w of given F₁ and T^1.490; −∞ or less than nothing where F₁ lies below that of dry air.
fn log_ratio<S: Scalar>(first: S, x: S) -> S {
    let (of_temperature, of_vapor, power) = FIRST;
    let vapor = (first + k::<S>(of_temperature) / x) / k(of_vapor);
    if vapor > k(0.0) { vapor.ln() / k(power) } else { -S::infinity() }
}

/// Temperature, °C, and humidity ratio of given potentials. With w from F₁, which falls as T rises, F₂ rises with T: one root in the range,
/// bracketed; at most [`solve::ITERATION_CAP`] evaluations.
pub(super) fn state<S: Scalar>(first: S, second_potential: S) -> Result<(S, S), Error> {
    let (min, max) = Quantity::DesiccantTemperature.limits();
    let (coldest, warmest) = (k::<S>(min + ZERO_CELSIUS), k::<S>(max + ZERO_CELSIUS));
    let excess = |kelvins: S| {
        let x = temperature_term(kelvins);
        let logarithm = log_ratio(first, x);
        let value = second(x, logarithm) - second_potential;
        // d ln w / dx = −2865 / (0.8624 · 4.344 w^0.8624 x²)
        let (of_temperature, of_vapor, power) = FIRST;
        let vapor = (logarithm * k(power)).exp() * k(power * of_vapor);
        let log_slope = k::<S>(-of_temperature) / (vapor * x * x);
        let (of_temperature, of_vapor, power) = SECOND;
        let along = k::<S>(1.0 / of_temperature) - k::<S>(of_vapor * power) * (logarithm * k(power)).exp() * log_slope;
        (value, along * x * k(TEMPERATURE_POWER) / kelvins)
    };
    // In nearly dry air the rounding of the first potential moves the state by more than its own.
    let resolution = solve::temperature_resolution::<S>();
    let margin = resolution * k(1e4);
    let (low, high) = (coldest - margin, warmest + margin);
    let too_hot = excess(high).0 < k(0.0);
    if too_hot || excess(low).0 > k(0.0) {
        // The correlation ends here: which side it is on is all that is known of the temperature.
        let beyond = if too_hot { max + 1.0 } else { min - 1.0 };
        return Err(infeasible(Quantity::DesiccantTemperature, k::<S>(beyond), k(min), k(max)));
    }
    let kelvins = solve::increasing(low, high, resolution, excess).at_least(coldest).at_most(warmest);
    let ratio = log_ratio(first, temperature_term(kelvins)).exp();
    let (_, most) = Quantity::HumidityRatio.limits();
    if !(ratio > k(0.0) && ratio <= k(most)) {
        return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), k(most)));
    }
    Ok((kelvins - k(ZERO_CELSIUS), ratio))
}

/// A wheel between process air and hot regeneration air: Fᵢ,₂ = Fᵢ,₁ + εᵢ (Fᵢ,₈ − Fᵢ,₁) for the process air; the regeneration air by the
/// balances of heat and water. A heater before it is [`sensible`](crate::process::sensible).
///
/// # Errors
/// [`Error::NoFlow`]; [`Error::OutOfRange`] for air outside 275 to 425 K; [`Error::Infeasible`]: of the humidity ratio, where a stream is without
/// vapor, or would be fog behind the wheel; of the desiccant temperature, where the process air would leave outside the correlation;
/// [`Error::MixedFormulations`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, desiccant::potentials::{self, Effectiveness}};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let stream = |t, w, m| AirStream::new(
///     MoistAir::from_dry_bulb(Temperature::from_celsius(t), HumidityRatio::from_grams_per_kilogram(w), site)?,
///     MassFlow::from_kilograms_per_second(m));
/// let good = Effectiveness { first: 0.07, second: 0.92 };
/// let done = potentials::wheel(&stream(30.0, 14.0, 1.0)?, &stream(85.0, 14.0, 1.0)?, good)?;
/// let dried = done.process.air();
/// assert!((4.0..4.1).contains(&dried.humidity_ratio().grams_per_kilogram()) && dried.dry_bulb().celsius() > 60.0);
/// // What the potentials would leave over, were both sides led by them.
/// assert!(done.imbalance.is_some_and(|over| (-3.0..-2.0).contains(&over.heat.kilowatts())));
/// assert!(potentials::wheel(&stream(-5.0, 2.0, 1.0)?, &stream(85.0, 14.0, 1.0)?, good).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn wheel<S: Scalar>(
    process: &AirStream<S>,
    regeneration: &AirStream<S>,
    effectiveness: Effectiveness<S>,
) -> Result<PotentialWheel<S>, Error> {
    let (inlet, hot) = (process.air(), regeneration.air());
    same_formulation(&inlet, &hot)?;
    let share = |effectiveness| checked(Quantity::PotentialEffectiveness, effectiveness);
    let shares = (share(effectiveness.first)?, share(effectiveness.second)?);
    let (flow, hot_flow) = (process.flow()?, regeneration.flow()?);
    let (from, to) = (potentials(&inlet)?, potentials(&hot)?);
    let leaving = if shares == (k(0.0), k(0.0)) {
        inlet
    } else {
        let (celsius, ratio) = state(between(from.0, to.0, shares.0), between(from.1, to.1, shares.1))?;
        air_at(&inlet, celsius, ratio)?
    };
    let ((h1, w1), (h2, w2)) = (parts(&inlet), parts(&leaving));
    let removed = flow * (w1 - w2);
    let water_enthalpy = -removed * Vaporization::of(&inlet)?.vapor;
    let exchange = Exchange::new(flow * (h2 - h1) - water_enthalpy, -removed, water_enthalpy);
    let (h8, w8) = parts(&hot);
    let behind = if leaving == inlet {
        hot
    } else {
        let ratio = w8 + removed / hot_flow;
        if ratio < k(0.0) {
            return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), w8));
        }
        unsaturated(h8 - flow * (h2 - h1) / hot_flow, ratio, &hot)?
    };
    let (process_leaving, regeneration_leaving) = (process.with_air(leaving), regeneration.with_air(behind));
    let imbalance = opposite_side(flow / hot_flow, shares, to, from).map(|(celsius, ratio)| {
        let air = MoistAir::assemble(celsius, hot.pressure().pascals(), ratio, hot.formulation());
        let (h9, w9) = parts(&air);
        Imbalance {
            heat: HeatFlow::from_watts(flow * (h2 - h1) + hot_flow * (h9 - h8)),
            water: MassFlow::from_kilograms_per_second(hot_flow * (w9 - w8) - removed),
        }
    });
    let (entropy_production, status) = entropy([(process, &process_leaving), (regeneration, &regeneration_leaving)]);
    let off = inlet.pressure().pascals() / k(101_325.0) - k(1.0);
    let standard = off.at_least(-off) <= k(0.05);
    Ok(PotentialWheel {
        process: process_leaving,
        exchange,
        regeneration: regeneration_leaving,
        regeneration_exchange: Exchange::new(-exchange.heat.watts(), removed, -water_enthalpy),
        removed: MassFlow::from_kilograms_per_second(removed),
        imbalance,
        entropy_production,
        status,
        correlation: if standard { CorrelationStatus::Within } else { CorrelationStatus::OffStandardPressure },
    })
}

/// `effectiveness` of the way from one value to the other; all of it ends on the other.
fn between<S: Scalar>(from: S, to: S, effectiveness: S) -> S {
    if effectiveness == k(1.0) { to } else { from + effectiveness * (to - from) }
}

/// The state to which the potentials would lead the regeneration air, if there is one.
fn opposite_side<S: Scalar>(flow_ratio: S, shares: (S, S), from: (S, S), to: (S, S)) -> Option<(S, S)> {
    let one = k::<S>(1.0);
    let (first, second) = (shares.0 * flow_ratio, shares.1 * flow_ratio);
    if !(first <= one && second <= one) {
        return None;
    }
    state(between(from.0, to.0, first), between(from.1, to.1, second)).ok()
}

/// Air of a state that the potentials gave, refused beyond saturation and beyond the range of states.
fn air_at<S: Scalar>(like: &MoistAir<S>, celsius: S, ratio: S) -> Result<MoistAir<S>, Error> {
    let (coldest, warmest) = like.formulation().limits(Quantity::DryBulb);
    if celsius < k(coldest) || celsius > k(warmest) {
        return Err(infeasible(Quantity::DryBulb, celsius, k(coldest), k(warmest)));
    }
    let held = capacity(like, celsius);
    if ratio > held * (saturation_tolerance::<S>() + k(1.0)) {
        return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), held));
    }
    Ok(MoistAir::assemble(celsius, like.pressure().pascals(), ratio.at_most(held), like.formulation()))
}

/// The effectivenesses of a wheel from a test: the states of process air before and behind it and of the regeneration air before it.
///
/// The first is a small difference of two nearly equal numbers: states known to 0.3 K and 0.2 g/kg make it no better than ±0.02.
///
/// # Errors
/// As [`potentials`]; [`Error::Infeasible`] where a result lies outside 0 to 1, or both airs that enter have the same potential.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::desiccant::potentials::effectiveness_between;
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = |t, w| MoistAir::from_dry_bulb(Temperature::from_celsius(t), HumidityRatio::from_grams_per_kilogram(w), site);
/// let found = effectiveness_between(&air(30.0, 14.0)?, &air(60.0, 5.0)?, &air(85.0, 14.0)?)?;
/// assert!((0.05..0.12).contains(&found.first) && (0.80..0.90).contains(&found.second), "{found:?}");
/// assert!(effectiveness_between(&air(30.0, 14.0)?, &air(20.0, 6.5)?, &air(85.0, 14.0)?).is_err()); // colder
/// # Ok::<(), Error>(())
/// ```
pub fn effectiveness_between<S: Scalar>(
    process: &MoistAir<S>,
    leaving: &MoistAir<S>,
    regeneration: &MoistAir<S>,
) -> Result<Effectiveness<S>, Error> {
    let (from, reached, to) = (potentials(process)?, potentials(leaving)?, potentials(regeneration)?);
    let share = |from: S, reached: S, to: S| {
        let share = (reached - from) / (to - from);
        if k::<S>(0.0) <= share && share <= k(1.0) {
            return Ok(share);
        }
        let share = if share.is_nan() { S::infinity() } else { share };
        Err(infeasible(Quantity::PotentialEffectiveness, share, k(0.0), k(1.0)))
    };
    Ok(Effectiveness { first: share(from.0, reached.0, to.0)?, second: share(from.1, reached.1, to.1)? })
}
