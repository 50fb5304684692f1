//! The standard atmosphere below 11 km: ISO 2533:1975, identical there to the US Standard Atmosphere 1976 (constants from memory,
//! checked against the tables in the tests).

use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_between};
use crate::quantity::{Length, Pressure, Temperature};
use crate::real::{Scalar, k};

const SEA_LEVEL_PRESSURE: f64 = 101_325.0;
const SEA_LEVEL_TEMPERATURE: f64 = 288.15;
/// The same, °C.
const SEA_LEVEL_CELSIUS: f64 = 15.0;
/// K per meter of geopotential altitude.
const LAPSE_RATE: f64 = 0.0065;
/// g₀ / (R L) = 9.80665 / (287.05287 × 0.0065)
const EXPONENT: f64 = 9.80665 / (287.05287 * LAPSE_RATE);
/// Nominal radius of the Earth, m.
const EARTH_RADIUS: f64 = 6_356_766.0;

impl<S: Scalar> Pressure<S> {
    /// Pressure of the standard atmosphere at an elevation, −5 to 11 km, the elevation taken as geopotential altitude, as the
    /// handbook's table and Eq. (3) of ASHRAE Fundamentals ch. 1 do (geometric elevation: 0.05 % more at 5 km).
    ///
    /// A measured pressure is always better: weather moves it by ±3 %. A sea-level (QNH) reading is not the station's.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    ///
    /// ```
    /// use moistair_core::{Length, Pressure};
    /// let p: Pressure = Pressure::at_elevation(Length::from_meters(1_500.0))?;
    /// assert!((p.pascals() - 84_556.0).abs() < 1.0);
    /// assert!(Pressure::at_elevation(Length::from_meters(20_000.0)).is_err());
    /// # Ok::<(), moistair_core::Error>(())
    /// ```
    pub fn at_elevation(elevation: Length<S>) -> Result<Self, Error> {
        Ok(Self::from_pascals(pressure(elevation_of(elevation)?)))
    }

    /// The same with a geometric elevation, converted to geopotential altitude by H = r Z / (r + Z).
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    pub fn at_geometric_elevation(elevation: Length<S>) -> Result<Self, Error> {
        Ok(Self::from_pascals(pressure(geopotential(elevation_of(elevation)?))))
    }
}

impl<S: Scalar> Temperature<S> {
    /// Temperature of the standard atmosphere at an elevation, −5 to 11 km, taken as geopotential altitude: 15 °C less 6.5 K per
    /// kilometer. A mean of middle latitudes, no forecast.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    ///
    /// ```
    /// use moistair_core::{Length, Temperature};
    /// let t: Temperature = Temperature::at_elevation(Length::from_meters(2_000.0))?;
    /// assert!((t.celsius() - 2.0).abs() < 1e-12);
    /// # Ok::<(), moistair_core::Error>(())
    /// ```
    pub fn at_elevation(elevation: Length<S>) -> Result<Self, Error> {
        Ok(Self::from_celsius(celsius(elevation_of(elevation)?)))
    }

    /// The same with a geometric elevation.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    pub fn at_geometric_elevation(elevation: Length<S>) -> Result<Self, Error> {
        Ok(Self::from_celsius(celsius(geopotential(elevation_of(elevation)?))))
    }
}

impl<S: Scalar> Length<S> {
    /// The elevation, as geopotential altitude, at which the standard atmosphere has a pressure: the inverse of [`Pressure::at_elevation`],
    /// to 1e-10 of a meter or so. Of a barometer's reading it is the pressure altitude, off the true one by 250 m in strong weather.
    ///
    /// # Errors
    /// [`Error::NotFinite`]; [`Error::OutOfRange`] outside 22.6 kPa (11 km) to 177.7 kPa (−5 km).
    ///
    /// ```
    /// use moistair_core::{Length, Pressure};
    /// let elevation: Length = Length::elevation_at_pressure(Pressure::from_pascals(84_556.0))?;
    /// assert!((elevation.meters() - 1_500.0).abs() < 0.1);
    /// assert!(Length::elevation_at_pressure(Pressure::from_kilopascals(300.0)).is_err());
    /// # Ok::<(), moistair_core::Error>(())
    /// ```
    pub fn elevation_at_pressure(pressure: Pressure<S>) -> Result<Self, Error> {
        inverse(pressure, |elevation| elevation, |geopotential| geopotential)
    }

    /// The same as a geometric elevation, Z = r H / (r − H).
    ///
    /// # Errors
    /// [`Error::NotFinite`]; [`Error::OutOfRange`] outside 22.7 kPa (11 km) to 177.8 kPa (−5 km).
    pub fn geometric_elevation_at_pressure(pressure: Pressure<S>) -> Result<Self, Error> {
        inverse(pressure, geopotential, geometric)
    }
}

fn elevation_of<S: Scalar>(elevation: Length<S>) -> Result<S, Error> {
    checked(Quantity::Elevation, elevation.meters())
}

/// Geopotential altitude of a geometric elevation.
fn geopotential<S: Scalar>(geometric: S) -> S {
    let radius = k::<S>(EARTH_RADIUS);
    radius * geometric / (radius + geometric)
}

fn geometric<S: Scalar>(geopotential: S) -> S {
    let radius = k::<S>(EARTH_RADIUS);
    radius * geopotential / (radius - geopotential)
}

fn celsius<S: Scalar>(geopotential: S) -> S {
    k::<S>(SEA_LEVEL_CELSIUS) - geopotential * k(LAPSE_RATE)
}

fn pressure<S: Scalar>(geopotential: S) -> S {
    let ratio = k::<S>(1.0) - geopotential * k(LAPSE_RATE / SEA_LEVEL_TEMPERATURE);
    k::<S>(SEA_LEVEL_PRESSURE) * (ratio.ln() * k(EXPONENT)).exp()
}

/// The elevation of a pressure, between those of the ends of the range.
fn inverse<S: Scalar>(
    reading: Pressure<S>,
    to_geopotential: impl Fn(S) -> S,
    from_geopotential: impl Fn(S) -> S,
) -> Result<Length<S>, Error> {
    let (lowest, highest) = Quantity::Elevation.limits();
    let [min, max] = [highest, lowest].map(|elevation| pressure(to_geopotential(k(elevation))));
    let value = checked_between(Quantity::Pressure, reading.pascals(), (min.to_f64(), max.to_f64()))?;
    let ratio = ((value / k(SEA_LEVEL_PRESSURE)).ln() / k(EXPONENT)).exp();
    let elevation = from_geopotential((k::<S>(1.0) - ratio) * k(SEA_LEVEL_TEMPERATURE / LAPSE_RATE));
    Ok(Length::from_meters(elevation.at_least(k(lowest)).at_most(k(highest))))
}
