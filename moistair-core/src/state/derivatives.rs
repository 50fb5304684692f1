//! Exact partial derivatives of properties with respect to what a state is made of.

use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, NoValue};
use crate::mixture::Mixture;
use crate::real::{Dual, Scalar, k};

use super::MoistAir;
use super::view::View;

/// A property and its partial derivatives with respect to dry bulb, second property and pressure, each while the other two stay.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct PropertyDerivatives<S = f64> {
    /// The property, with the bits of [`MoistAir::value`].
    pub value: S,
    /// Per kelvin of dry bulb.
    pub by_dry_bulb: S,
    /// Per unit of the second property.
    pub by_second: S,
    /// Per pascal.
    pub by_pressure: S,
}

/// Slopes in dry bulb, humidity ratio and pressure.
type Slopes<S> = Dual<S, 3>;

impl<S: Scalar> MoistAir<S> {
    /// Partial derivatives of a property with respect to dry bulb, a second property that fixes the state ([`Quantity::fixes_state`]),
    /// and pressure: those of the constructor with that second property.
    ///
    /// Exact but for rounding: the text of the formulas is differentiated, and a solved quantity by one implicit step at its
    /// root. Range: where both properties have a value.
    ///
    /// Where a property has a kink the derivative is that of one side. *Melting temperature* (stable surface): at it and above, that over
    /// liquid; below, that over ice. The stable *wet bulb* steps where its surface changes: that of the surface it is over. *Saturation*:
    /// that of the formula, towards less vapor, and no step of the limit. At −40 °C, where the limit of vapor changes from ice to
    /// liquid, nothing changes in a property. In *dry air*: towards more vapor.
    ///
    /// # Errors
    /// [`Error::NoValue`] where the property or the second property has none at this state, and for the entropy of dry air, which
    /// rises without bound with the first vapor; [`Error::UnknownSelector`] for a quantity that is no property, or does not fix a
    /// state.
    ///
    /// ```
    /// # use moistair_core::*;
    /// let site = Pressure::from_kilopascals(101.325);
    /// let air: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
    /// // What a sensor's 0.3 K and 2 % are worth in the dew point.
    /// let dew_point = air.derivatives(Quantity::DewPoint, Quantity::RelativeHumidity)?;
    /// let uncertainty = (0.3 * dew_point.by_dry_bulb).hypot(0.02 * dew_point.by_second);
    /// assert!((0.6..0.8).contains(&uncertainty), "{uncertainty}");
    ///
    /// // A temperature alone does not fix a state.
    /// assert!(air.derivatives(Quantity::DewPoint, Quantity::DryBulb).is_err());
    /// # Ok::<(), Error>(())
    /// ```
    pub fn derivatives(&self, property: Quantity, second: Quantity) -> Result<PropertyDerivatives<S>, Error> {
        let mut result = Err(Error::UnknownSelector { code: property.code() });
        self.derivatives_of([property], second, |_, derivatives| result = derivatives)?;
        result
    }

    /// The same of many properties at once: calls `take` for each with its derivatives or the reason why there are none.
    ///
    /// # Errors
    /// As [`MoistAir::derivatives`], for the second property.
    pub fn derivatives_of(
        &self,
        properties: impl IntoIterator<Item = Quantity>,
        second: Quantity,
        mut take: impl FnMut(Quantity, Result<PropertyDerivatives<S>, Error>),
    ) -> Result<(), Error> {
        if !second.fixes_state() {
            return Err(Error::UnknownSelector { code: second.code() });
        }
        with_mixture!(self.formulation, S, M => {
            let view = self.with_slopes::<M<Slopes<S>>>();
            let ratio = ratio_slopes(view.value(second)?);
            for property in properties {
                let result = if property == second {
                    view.value(property).map(itself)
                } else {
                    view.value(property).map(|slopes| chained(slopes, ratio))
                };
                take(property, result.and_then(|derivatives| self.bounded(property, derivatives)));
            }
        });
        Ok(())
    }

    /// The same state, with slopes in dry bulb, humidity ratio and pressure.
    fn with_slopes<M: Mixture<Slopes<S>>>(&self) -> View<M, Slopes<S>> {
        let (celsius, pascals) = (Dual::input(self.celsius, 0), Dual::input(self.pascals, 2));
        let humidity_ratio = Dual::input(self.humidity_ratio, 1);
        let mixture = M::at(celsius);
        let gas = mixture.gas(pascals, humidity_ratio);
        View { mixture, air: MoistAir { celsius, pascals, humidity_ratio, gas, formulation: self.formulation } }
    }

    /// Refuses slopes that are without bound where the vapor vanishes.
    fn bounded(&self, quantity: Quantity, of: PropertyDerivatives<S>) -> Result<PropertyDerivatives<S>, Error> {
        let logarithmic = quantity == Quantity::SpecificEntropy && self.humidity_ratio == k(0.0);
        let finite = [of.by_dry_bulb, of.by_second, of.by_pressure].iter().all(|slope| slope.is_finite());
        if logarithmic || !finite {
            return Err(Error::NoValue { quantity, reason: NoValue::UnboundedSlope });
        }
        Ok(of)
    }
}

/// Slopes of the humidity ratio in dry bulb, second property and pressure: those of the second property turned round.
fn ratio_slopes<S: Scalar>(second: Slopes<S>) -> [S; 3] {
    let [by_dry_bulb, by_ratio, by_pressure] = second.partials;
    [-(by_dry_bulb / by_ratio), k::<S>(1.0) / by_ratio, -(by_pressure / by_ratio)]
}

/// Derivatives while the second property stays, from those while the humidity ratio does.
fn chained<S: Scalar>(slopes: Slopes<S>, ratio: [S; 3]) -> PropertyDerivatives<S> {
    let [by_dry_bulb, by_ratio, by_pressure] = slopes.partials;
    let [ratio_by_dry_bulb, ratio_by_second, ratio_by_pressure] = ratio;
    PropertyDerivatives {
        value: slopes.value,
        by_dry_bulb: by_dry_bulb + by_ratio * ratio_by_dry_bulb,
        by_second: by_ratio * ratio_by_second,
        by_pressure: by_pressure + by_ratio * ratio_by_pressure,
    }
}

/// Of the second property itself.
fn itself<S: Scalar>(slopes: Slopes<S>) -> PropertyDerivatives<S> {
    PropertyDerivatives { value: slopes.value, by_dry_bulb: k(0.0), by_second: k(1.0), by_pressure: k(0.0) }
}

#[cfg(test)]
mod tests;
