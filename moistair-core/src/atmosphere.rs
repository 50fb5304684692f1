//! The standard atmosphere below 11 km: ISO 2533:1975, identical there to the US Standard Atmosphere 1976 (constants from memory,
//! checked against the tables in the tests).

use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{Length, Pressure};
use crate::real::{Scalar, k};

const SEA_LEVEL_PRESSURE: f64 = 101_325.0;
const SEA_LEVEL_TEMPERATURE: f64 = 288.15;
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
        Ok(at_geopotential(checked(Quantity::Elevation, elevation.meters())?))
    }

    /// The same with a geometric elevation, converted to geopotential altitude by H = r Z / (r + Z).
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    pub fn at_geometric_elevation(elevation: Length<S>) -> Result<Self, Error> {
        let z = checked(Quantity::Elevation, elevation.meters())?;
        let radius = k::<S>(EARTH_RADIUS);
        Ok(at_geopotential(radius * z / (radius + z)))
    }
}

fn at_geopotential<S: Scalar>(meters: S) -> Pressure<S> {
    let ratio = k::<S>(1.0) - meters * k(LAPSE_RATE / SEA_LEVEL_TEMPERATURE);
    Pressure::from_pascals(k::<S>(SEA_LEVEL_PRESSURE) * (ratio.ln() * k(EXPONENT)).exp())
}
