//! A state from two properties of which neither is the dry bulb.
//!
//! Four kinds of property reduce to three problems in the dry bulb t at a given pressure:
//!
//! - what states the *vapor* (humidity ratio, dew point, …) fixes W;
//! - a *relative humidity* φ fixes x_ws(t) = x_w / φ where the vapor is known, and a rising curve W(t) where it is not;
//! - a *wet bulb* and an *enthalpy* fix h(t, W) − W h_c = const, with h_c of the water at the wet bulb, or zero.

use crate::basis::{Basis, Formulation, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, NoValue, Undetermined, checked_for};
use crate::mixture::Mixture;
use crate::quantity::Temperature;
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;

use super::MoistAir;
use super::condensate::{checked_pressure, temperature_of_enthalpy};
use super::construct::{EnergyLine, SecondProperty, vapor_ratio};
use super::property::{dew_point, saturates};

/// K. The fitted functions of the real gas jump by some 1e-9 where their pieces meet, which moves a root by up to 2e-8 K: one that lies in a
/// jump is taken. Far below what any reading tells, far above rounding.
const JUMPS: f64 = 1e-6;

/// What a property says of a state, in the order in which a pair is taken.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
enum Kind {
    /// The humidity ratio, whatever the dry bulb.
    Vapor,
    /// A share of what saturates.
    Humidity,
    /// Adiabatic saturation.
    WetBulb,
    Enthalpy,
}

fn kind(quantity: Quantity) -> Option<Kind> {
    Some(match quantity {
        Quantity::HumidityRatio
        | Quantity::SpecificHumidity
        | Quantity::WaterMoleFraction
        | Quantity::VaporPressure
        | Quantity::DewPoint
        | Quantity::FrostPoint => Kind::Vapor,
        Quantity::RelativeHumidity | Quantity::RelativeHumidityOverLiquid | Quantity::DegreeOfSaturation => {
            Kind::Humidity
        }
        Quantity::WetBulb | Quantity::WetBulbOverLiquid | Quantity::WetBulbOverIce => Kind::WetBulb,
        Quantity::SpecificEnthalpy => Kind::Enthalpy,
        _ => return None,
    })
}

/// A property and its value.
#[derive(Clone, Copy, Debug)]
struct Given<S> {
    quantity: Quantity,
    value: S,
}

/// Why two properties do not fix a state, if they do not.
fn refusal(first: Quantity, second: Quantity) -> Option<Undetermined> {
    if first == second {
        return Some(Undetermined::Twice);
    }
    let (Some(a), Some(b)) = (kind(first), kind(second)) else { return Some(Undetermined::NotOffered) };
    match (a.min(b), a.max(b)) {
        (Kind::Vapor, Kind::Vapor) => Some(Undetermined::VaporOnly),
        (Kind::Vapor, _) | (Kind::Humidity, Kind::WetBulb | Kind::Enthalpy) => None,
        _ => Some(Undetermined::NearlyParallel),
    }
}

impl<S: Scalar> MoistAir<S> {
    /// A state from two properties by their types, neither of them the dry bulb, in any order.
    ///
    /// | with          | vapor | relative humidity | wet bulb | enthalpy |
    /// |---------------|-------|-------------------|----------|----------|
    /// | vapor         | no    | yes               | yes      | yes      |
    /// | relative humidity |   | no                | yes      | yes      |
    /// | wet bulb      |       |                   | no       | no       |
    ///
    /// *Vapor* stands for humidity ratio, specific humidity, water mole fraction, vapor pressure, dew point and frost point; *relative
    /// humidity* for that over the stable surface, that over liquid, and degree of saturation; *wet bulb* for all three. Two of one
    /// kind, or wet bulb and enthalpy, have lines that run into or along each other and fix no state, or only badly.
    ///
    /// No two states have both properties. Just below the melting temperature a wet bulb may be one over ice or one over
    /// supercooled liquid, and the two are different states: the stable [`WetBulb`](crate::WetBulb) is taken over ice there, and
    /// [`WetBulbOverLiquid`](crate::WetBulbOverLiquid) gives the other.
    ///
    /// Range: that of states ([`MoistAir::from_dry_bulb`]); a dry bulb within 1e-9 K beyond it, or a wet bulb as near to that of the end,
    /// is taken for the end (in single precision 5e-4 K). Accuracy: the dry bulb to 1e-11 K, a wet bulb counting for what its own 5e-10 K
    /// are worth; a humidity ratio reads back bit for bit. Work: bounded by 80 evaluations, eight in the middle.
    ///
    /// # Errors
    /// [`Error::Undetermined`] with the reason for a pair that fixes no state; [`Error::UnattainableTogether`] where no state
    /// has both; [`Error::NotFinite`], [`Error::OutOfRange`]; [`Error::NoValue`] for ice above the melting temperature or a wet bulb above
    /// boiling; [`Error::UnknownSelector`] for a quantity that fixes no state with any.
    ///
    /// ```
    /// use moistair_core::*;
    /// let site = Pressure::from_kilopascals(101.325);
    /// // A cold store is kept at a dew point of 2 °C and 85 %.
    /// let store: MoistAir = MoistAir::from_two_properties(DewPoint::from_celsius(2.0), RelativeHumidity::from_percent(85.0), site)?;
    /// assert!((store.dry_bulb().celsius() - 4.30).abs() < 0.01);
    ///
    /// // A dew point and a humidity ratio say the same: the air may have any temperature.
    /// let ratio = HumidityRatio::from_grams_per_kilogram(4.0);
    /// let refused = MoistAir::from_two_properties(DewPoint::from_celsius(2.0), ratio, site);
    /// assert!(matches!(refused, Err(Error::Undetermined { reason: Undetermined::VaporOnly, .. })));
    /// # Ok::<(), Error>(())
    /// ```
    pub fn from_two_properties<P: SecondProperty<S>, Q: SecondProperty<S>>(
        first: P,
        second: Q,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        Self::from_two_properties_and(P::QUANTITY, first.value(), Q::QUANTITY, second.value(), basis)
    }

    /// The same with both properties named by selectors, for callers that choose them at run time.
    ///
    /// # Errors
    /// As [`MoistAir::from_two_properties`].
    pub fn from_two_properties_and(
        first: Quantity,
        first_value: S,
        second: Quantity,
        second_value: S,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        if let Some(other) = [first, second].into_iter().find(|quantity| !quantity.fixes_state()) {
            return Err(Error::UnknownSelector { code: other.code() });
        }
        if let Some(reason) = refusal(first, second) {
            return Err(Error::Undetermined { first, second, reason });
        }
        let pressure = checked_pressure(&basis)?;
        let given = [(first, first_value), (second, second_value)];
        let [a, b] = given.map(|(quantity, value)| {
            checked_for(basis.formulation(), quantity, value).map(|value| Given { quantity, value })
        });
        let (a, b) = (a?, b?);
        let (first, second) = if kind(a.quantity) <= kind(b.quantity) { (a, b) } else { (b, a) };
        with_mixture!(basis.formulation(), S, M => {
            over_ice_is_cold::<M<S>, S>(first, pressure)?;
            over_ice_is_cold::<M<S>, S>(second, pressure)?;
            match kind(first.quantity) {
                Some(Kind::Vapor) => of_vapor::<M<S>, S>(first, second, pressure, basis),
                _ => of_humidity::<M<S>, S>(first, second, pressure, basis),
            }
        })
    }
}

/// Refuses what is over ice where there is none.
fn over_ice_is_cold<M: Mixture<S>, S: Scalar>(given: Given<S>, pressure: S) -> Result<(), Error> {
    let Given { quantity, value } = given;
    match quantity {
        Quantity::FrostPoint | Quantity::WetBulbOverIce if M::melting_temperature(pressure) < value => {
            Err(Error::NoValue { quantity, reason: NoValue::AboveSurfaceRange })
        }
        _ => Ok(()),
    }
}

/// A state of known vapor.
fn of_vapor<M: Mixture<S>, S: Scalar>(
    vapor: Given<S>,
    second: Given<S>,
    pressure: S,
    basis: Basis<S>,
) -> Result<MoistAir<S>, Error> {
    let unknown = Error::UnknownSelector { code: vapor.quantity.code() };
    let ratio = vapor_ratio::<M, S>(pressure, vapor.quantity, vapor.value).ok_or(unknown)?;
    let celsius = if kind(second.quantity) == Some(Kind::Humidity) {
        if ratio == k(0.0) && second.value == k(0.0) {
            let (first, second) = (vapor.quantity, second.quantity);
            return Err(Error::Undetermined { first, second, reason: Undetermined::DryAir });
        }
        saturation_temperature::<M, S>(ratio, second, pressure)
    } else {
        let line = energy_line::<M, S>(second, pressure)?;
        temperature_of_enthalpy::<M, S>(line.target + ratio * line.condensed, pressure, ratio)
    };
    let at = |celsius| state_at(celsius, vapor, basis);
    at(settled::<M, S>(celsius)).or_else(|_| {
        // More vapor than any state holds?
        let _warmest =
            at(k(M::FORMULATION.limits(Quantity::DryBulb).1)).map_err(|error| in_a_pair(error, second.quantity))?;
        at_an_end(
            M::FORMULATION,
            second,
            vapor.quantity,
            at(coldest::<M, S>(second, ratio, pressure)),
            at(hottest::<M, S>(second, pressure)),
        )
    })
}

/// A state of known relative humidity, on the line of a wet bulb or an enthalpy. Along the curve of the relative humidity energy rises
/// with temperature, up to where W or the mole fraction has no bound: beyond that counts as beyond the root.
fn of_humidity<M: Mixture<S>, S: Scalar>(
    humidity: Given<S>,
    second: Given<S>,
    pressure: S,
    basis: Basis<S>,
) -> Result<MoistAir<S>, Error> {
    let line = energy_line::<M, S>(second, pressure)?;
    let excess = |celsius: S| {
        let mixture = M::at(celsius);
        let Humid { ratio, vapor, rate } = Humid::at(&mixture, humidity, pressure);
        let gas = mixture.gas(pressure, ratio);
        let energy = gas.enthalpy - ratio * line.condensed - line.target;
        let air = k::<S>(1.0) - vapor;
        // Per mole of moist air, which passes smoothly where W has its pole. d ln W / dT = (d ln x / dT) / (1 − x)
        let slope = gas.specific_heat * air + ratio * rate * (gas.enthalpy_of_water - line.condensed);
        (energy * air, slope - energy * vapor * rate)
    };
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    let over_liquid = humidity.quantity == Quantity::RelativeHumidityOverLiquid;
    let low = k(if over_liquid { Quantity::DewPoint.limits().0 } else { coldest });
    let celsius = solve::increasing(low, k(warmest), solve::temperature_resolution(), excess);
    let (left_over, slope) = excess(celsius);
    if (left_over / slope).abs() <= rounding::<S>().at_least(k(JUMPS)) {
        return state_at(settled::<M, S>(celsius), humidity, basis).map_err(|error| in_a_pair(error, second.quantity));
    }
    let hot = hottest::<M, S>(humidity, pressure);
    at_an_end(M::FORMULATION, second, humidity.quantity, state_at(low, humidity, basis), state_at(hot, humidity, basis))
}

fn state_at<S: Scalar>(celsius: S, given: Given<S>, basis: Basis<S>) -> Result<MoistAir<S>, Error> {
    MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), given.quantity, given.value, basis)
}

/// The temperature at which a humidity ratio is a given share of saturation.
fn saturation_temperature<M: Mixture<S>, S: Scalar>(ratio: S, humidity: Given<S>, pressure: S) -> S {
    let saturated = match humidity.quantity {
        Quantity::DegreeOfSaturation => M::mole_fraction(ratio / humidity.value),
        _ => M::mole_fraction(ratio) / humidity.value,
    };
    let over = |surface| dew_point::<M, S>(saturated, pressure, surface);
    if humidity.quantity == Quantity::RelativeHumidityOverLiquid {
        return over(Surface::Liquid);
    }
    let melting = M::melting_temperature(pressure);
    if saturated < M::at(melting).saturation(pressure, Surface::Liquid).mole_fraction {
        over(Surface::Ice).at_most(melting)
    } else {
        over(Surface::Liquid).at_least(melting)
    }
}

/// Vapor of a relative humidity or degree of saturation at a temperature.
struct Humid<S> {
    ratio: S,
    /// x_w; NaN where nothing saturates.
    vapor: S,
    /// d ln x_w / dT
    rate: S,
}

impl<S: Scalar> Humid<S> {
    fn at<M: Mixture<S>>(mixture: &M, humidity: Given<S>, pressure: S) -> Self {
        let one = k::<S>(1.0);
        let surface = match humidity.quantity {
            Quantity::RelativeHumidityOverLiquid => Surface::Liquid,
            _ => Surface::Stable,
        };
        let saturation = mixture.saturation(pressure, surface);
        let most = saturation.mole_fraction;
        // d ln x = (1 − x) d ln W, at saturation and at a constant share of the humidity ratio there
        let (ratio, vapor, rate) = if humidity.quantity == Quantity::DegreeOfSaturation {
            let ratio = humidity.value * M::humidity_ratio(most);
            let vapor = M::mole_fraction(ratio);
            (ratio, vapor, (one - vapor) * saturation.log_slope)
        } else {
            let vapor = humidity.value * most;
            (M::humidity_ratio(vapor), vapor, (one - most) * saturation.log_slope)
        };
        let vapor = if saturates(most) && vapor < one { vapor } else { S::nan() };
        Self { ratio, vapor, rate }
    }
}

/// The line of a wet bulb or an enthalpy.
fn energy_line<M: Mixture<S>, S: Scalar>(given: Given<S>, pressure: S) -> Result<EnergyLine<S>, Error> {
    let Given { quantity, value } = given;
    let surface = match quantity {
        Quantity::WetBulb => Surface::Stable,
        Quantity::WetBulbOverLiquid => Surface::Liquid,
        Quantity::WetBulbOverIce => Surface::Ice,
        _ => return Ok(EnergyLine { target: value, condensed: k(0.0) }),
    };
    if !saturates(M::at(value).saturation(pressure, surface).mole_fraction) {
        return Err(Error::NoValue { quantity, reason: NoValue::AboveBoiling });
    }
    Ok(EnergyLine::of_wet_bulb::<M>(value, pressure, surface))
}

/// A solved temperature; where rounding carried it past an end of the range of states, or of that of liquid water at −40 °C (below
/// which air holds less), that end.
fn settled<M: Mixture<S>, S: Scalar>(celsius: S) -> S {
    let (coldest, warmest) = M::FORMULATION.limits(Quantity::DryBulb);
    let ends = [coldest, Quantity::DewPoint.limits().0, warmest].map(k::<S>);
    ends.into_iter().find(|end| (celsius - *end).abs() <= rounding()).unwrap_or(celsius)
}

/// What a solved dry bulb may be off, K.
fn rounding<S: Scalar>() -> S {
    k::<S>(1e-9).at_least(S::epsilon() * k(4096.0))
}

/// The coldest dry bulb at which air holds so much vapor, and has a property.
fn coldest<M: Mixture<S>, S: Scalar>(given: Given<S>, ratio: S, pressure: S) -> S {
    let (coldest, freezing) = (k(M::FORMULATION.limits(Quantity::DryBulb).0), k::<S>(Quantity::DewPoint.limits().0));
    let coldest = if given.quantity == Quantity::RelativeHumidityOverLiquid { freezing } else { coldest };
    if ratio <= k(0.0) {
        return coldest;
    }
    let over = |surface| dew_point::<M, S>(M::mole_fraction(ratio), pressure, surface);
    let dew = over(Surface::Liquid);
    // Below −40 °C ice is the limit, which the air reaches with less vapor.
    if freezing <= dew { dew } else { over(Surface::Ice).at_most(freezing).at_least(coldest) }
}

/// The warmest dry bulb at which a property has a value, or nearly so: a relative humidity ends at boiling.
fn hottest<M: Mixture<S>, S: Scalar>(given: Given<S>, pressure: S) -> S {
    let warmest = k(M::FORMULATION.limits(Quantity::DryBulb).1);
    let boils = !saturates(M::at(warmest).saturation(pressure, Surface::Liquid).mole_fraction);
    if boils && kind(given.quantity) == Some(Kind::Humidity) {
        dew_point::<M, S>(k(0.999_99), pressure, Surface::Liquid)
    } else {
        warmest
    }
}

/// The state at an end of those that have one property, if it has the other but for rounding: where a wet bulb hardly changes, its last
/// bits are worth more of the dry bulb than the solve leaves. Else that no state has both, with the limits of the other; where an end has
/// no value, its declared range ends.
fn at_an_end<S: Scalar>(
    formulation: Formulation,
    given: Given<S>,
    with: Quantity,
    cold: Result<MoistAir<S>, Error>,
    hot: Result<MoistAir<S>, Error>,
) -> Result<MoistAir<S>, Error> {
    let Given { quantity, value } = given;
    let read = |air: Result<MoistAir<S>, Error>| air.and_then(|air| Ok((air, air.value(quantity)?)));
    let (cold, hot) = (read(cold), read(hot));
    for (air, reached) in [cold, hot].into_iter().flatten() {
        if kind(quantity) == Some(Kind::WetBulb) && (reached - value).abs() <= rounding() {
            return Ok(air);
        }
    }
    let (least, most) = formulation.limits(quantity);
    let (at_cold, at_hot) = if kind(quantity) == Some(Kind::Humidity) { (most, least) } else { (least, most) };
    let limit = |end: Result<(MoistAir<S>, S), Error>, otherwise| end.map_or(otherwise, |(_, value)| value.to_f64());
    let (a, b) = (limit(cold, at_cold), limit(hot, at_hot));
    Err(Error::UnattainableTogether { quantity, value: value.to_f64(), with, min: a.min(b), max: a.max(b) })
}

/// What is unattainable at a dry bulb that nobody gave.
fn in_a_pair(error: Error, with: Quantity) -> Error {
    match error {
        Error::Unattainable { quantity, value, min, max } => {
            Error::UnattainableTogether { quantity, value, with, min, max }
        }
        other => other,
    }
}

#[cfg(test)]
mod tests;
