//! The same air at another pressure: compressed, expanded, or read by an instrument that samples at another pressure. The humidity ratio
//! stays; what it means does not.

use crate::basis::{Basis, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, NoValue, checked_for};
use crate::mixture::Mixture;
use crate::quantity::{DewPoint, FrostPoint, Pressure, Temperature};
use crate::real::Scalar;
use crate::saturation::Surface;

use super::condensate::checked_pressure;
use super::property::saturates;
use super::view::saturation_point;
use super::{MoistAir, SecondProperty};

/// A temperature of saturation, by its own type: [`DewPoint`] over liquid water, [`FrostPoint`] over ice. Sealed.
pub trait SaturationPoint<S: Scalar>: SecondProperty<S> {
    /// From its value, °C.
    fn at_celsius(value: S) -> Self;
}

impl<S: Scalar> SaturationPoint<S> for DewPoint<S> {
    fn at_celsius(value: S) -> Self {
        Self::from_celsius(value)
    }
}

impl<S: Scalar> SaturationPoint<S> for FrostPoint<S> {
    fn at_celsius(value: S) -> Self {
        Self::from_celsius(value)
    }
}

impl<S: Scalar> MoistAir<S> {
    /// This air at another pressure and temperature, with the same humidity ratio: compressed and cooled, or expanded.
    ///
    /// # Errors
    /// [`Error::Unattainable`] where water would condense (its greatest value is then the humidity ratio at saturation there): see
    /// [`AirWithCondensate::from_dry_bulb_and_water`](super::AirWithCondensate::from_dry_bulb_and_water) for what is left.
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    ///
    /// ```
    /// use moistair_core::*;
    /// let room = MoistAir::from_dry_bulb(
    ///     Temperature::from_celsius(20.0), RelativeHumidity::from_percent(10.0), Pressure::from_kilopascals(100.0))?;
    /// // Seven times the pressure, about seven times the relative humidity.
    /// let line: MoistAir = room.at_pressure(Pressure::from_kilopascals(700.0))?;
    /// assert!((line.relative_humidity()?.percent() - 70.0).abs() < 3.0);
    /// assert!(room.at_pressure(Pressure::from_kilopascals(1_100.0)).is_err()); // condenses
    /// # Ok::<(), Error>(())
    /// ```
    pub fn at_temperature_and_pressure(&self, dry_bulb: Temperature<S>, pressure: Pressure<S>) -> Result<Self, Error> {
        Self::restore(dry_bulb, self.humidity_ratio(), self.basis().at_pressure(pressure))
    }

    /// This air at another pressure and the same temperature.
    ///
    /// # Errors
    /// As [`MoistAir::at_temperature_and_pressure`].
    pub fn at_pressure(&self, pressure: Pressure<S>) -> Result<Self, Error> {
        self.at_temperature_and_pressure(self.dry_bulb(), pressure)
    }

    /// Dew point of this air at another pressure: the pressure dew point of a compressed-air line, or the atmospheric one of air in it. Above
    /// the dry bulb it says that water condenses there.
    ///
    /// # Errors
    /// [`Error::NoValue`] for dry air, and below −40 °C (see [`MoistAir::frost_point_at`]); [`Error::NotFinite`], [`Error::OutOfRange`] for
    /// the pressure.
    ///
    /// ```
    /// use moistair_core::*;
    /// let outdoor: MoistAir = MoistAir::from_dry_bulb(
    ///     Temperature::from_celsius(20.0), RelativeHumidity::from_percent(50.0), Pressure::from_kilopascals(100.0))?;
    /// let pressure_dew_point = outdoor.dew_point_at(Pressure::from_kilopascals(800.0))?;
    /// assert!((pressure_dew_point.celsius() - 45.0).abs() < 1.0);
    /// # Ok::<(), Error>(())
    /// ```
    pub fn dew_point_at(&self, pressure: Pressure<S>) -> Result<DewPoint<S>, Error> {
        self.saturation_temperature_at(Quantity::DewPoint, pressure).map(DewPoint::from_celsius)
    }

    /// Frost point of this air at another pressure.
    ///
    /// # Errors
    /// [`Error::NoValue`] for dry air, and outside −100 °C to the melting temperature; [`Error::NotFinite`], [`Error::OutOfRange`] for the
    /// pressure.
    pub fn frost_point_at(&self, pressure: Pressure<S>) -> Result<FrostPoint<S>, Error> {
        self.saturation_temperature_at(Quantity::FrostPoint, pressure).map(FrostPoint::from_celsius)
    }

    /// Dew or frost point at another pressure by a selector, °C.
    ///
    /// # Errors
    /// As [`MoistAir::dew_point_at`]; [`Error::UnknownSelector`] for any other quantity.
    pub fn saturation_temperature_at(&self, quantity: Quantity, pressure: Pressure<S>) -> Result<S, Error> {
        let pressure = checked_pressure(&self.basis().at_pressure(pressure))?;
        surface(quantity)?;
        with_mixture!(self.formulation, S, M => saturation_point::<M<S>, S>(quantity, self.mole_fraction(), pressure).checked(quantity))
    }
}

/// Dew or frost point after a change of pressure: from a pressure dew point to the atmospheric one, or back.
///
/// Below 0 °C a dew point of compressed air is mostly meant over ice; ask which, and take the type of it.
///
/// # Errors
/// [`Error::NoValue`] where the given point is ice above its melting temperature or water above boiling, or the result lies outside its
/// range; [`Error::NotFinite`], [`Error::OutOfRange`].
///
/// ```
/// use moistair_core::*;
/// let line = Basis::real_gas(Pressure::from_kilopascals(800.0));
/// let atmosphere = Pressure::from_kilopascals(101.325);
/// // A refrigeration dryer's 3 °C at 8 bar is a frost point of −20 °C in the free air.
/// let free: FrostPoint = saturation_point_after(DewPoint::from_celsius(3.0), line, atmosphere)?;
/// assert!((free.celsius() + 20.4).abs() < 0.2);
/// let hot = saturation_point_after::<f64, DewPoint, DewPoint>(DewPoint::from_celsius(180.0), line, atmosphere);
/// assert!(hot.is_err()); // boils at 8 bar
/// # Ok::<(), Error>(())
/// ```
pub fn saturation_point_after<S: Scalar, P: SaturationPoint<S>, Q: SaturationPoint<S>>(
    point: P,
    basis: impl Into<Basis<S>>,
    pressure: Pressure<S>,
) -> Result<Q, Error> {
    saturation_temperature_after(P::QUANTITY, point.value(), basis, Q::QUANTITY, pressure).map(Q::at_celsius)
}

/// The same by selectors, °C: [`Quantity::DewPoint`] or [`Quantity::FrostPoint`] in either place.
///
/// # Errors
/// As [`saturation_point_after`]; [`Error::UnknownSelector`] for any other quantity.
pub fn saturation_temperature_after<S: Scalar>(
    quantity: Quantity,
    value: S,
    basis: impl Into<Basis<S>>,
    wanted: Quantity,
    pressure: Pressure<S>,
) -> Result<S, Error> {
    let basis = basis.into();
    let (over, _) = (surface(quantity)?, surface(wanted)?);
    let celsius = checked_for(basis.formulation(), quantity, value)?;
    let (from, to) = (checked_pressure(&basis)?, checked_pressure(&basis.at_pressure(pressure))?);
    with_mixture!(basis.formulation(), S, M => {
        if over == Surface::Ice && celsius > <M<S> as Mixture<S>>::melting_temperature(from) {
            return Err(Error::NoValue { quantity, reason: NoValue::AboveSurfaceRange });
        }
        let mole_fraction = M::<S>::at(celsius).saturation(from, over).mole_fraction;
        if !saturates(mole_fraction) {
            return Err(Error::NoValue { quantity, reason: NoValue::AboveBoiling });
        }
        saturation_point::<M<S>, S>(wanted, mole_fraction, to).checked(wanted)
    })
}

fn surface(quantity: Quantity) -> Result<Surface, Error> {
    match quantity {
        Quantity::DewPoint => Ok(Surface::Liquid),
        Quantity::FrostPoint => Ok(Surface::Ice),
        _ => Err(Error::UnknownSelector { code: quantity.code() }),
    }
}
