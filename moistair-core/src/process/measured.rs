//! Readings with their uncertainty, and air as its sensors see it.
//!
//! A *standard* uncertainty is one standard deviation (JCGM 100:2008, 2.3.1). What a data sheet states as ±a is, unless it says otherwise,
//! taken as equally probable within: a/√3 (JCGM 100:2008, 4.3.7; [`Reading::within`]). Readings count as independent of each other; an
//! error that two of them share, such as that of one pressure, is not looked at.

use crate::basis::Basis;
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::quantity::Temperature;
use crate::real::{Scalar, k};
use crate::signal::{Checked, Quality};
use crate::state::MoistAir;

/// How many standard uncertainties count as beyond doubt: 95 % of a normal distribution lie within (JCGM 100:2008, 6.3.3).
pub const COVERAGE_FACTOR: f64 = 2.0;

/// A reading, its standard uncertainty in the same unit, and how far it can be trusted at all.
///
/// ```
/// use moistair_core::process::measured::Reading;
/// let room = Reading::within(22.0, 0.5); // ±0.5 K by the data sheet
/// assert!((room.standard_uncertainty - 0.2887_f64).abs() < 1e-4);
/// ```
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Reading<S = f64> {
    /// The value in the unit of the core; NaN when there is none.
    pub value: S,
    /// Standard uncertainty, 0 or more.
    pub standard_uncertainty: S,
    /// A refused reading counts as missing whatever its value is.
    pub quality: Quality,
}

impl<S: Scalar> Reading<S> {
    /// A good reading with its standard uncertainty.
    pub fn new(value: S, standard_uncertainty: S) -> Self {
        Self { value, standard_uncertainty, quality: Quality::Good }
    }

    /// A good reading that is equally probable anywhere within ±`half_width`.
    pub fn within(value: S, half_width: S) -> Self {
        Self::new(value, half_width / k::<S>(3.0).sqrt())
    }

    /// No reading.
    pub fn missing() -> Self {
        Self { value: S::nan(), standard_uncertainty: k(0.0), quality: Quality::Refused }
    }

    /// The same with another quality.
    pub fn with_quality(self, quality: Quality) -> Self {
        Self { quality, ..self }
    }

    /// The value of a usable reading and its uncertainty; `NotFinite` for one that is refused or missing.
    pub(super) fn usable(&self, quantity: Quantity, formulation: crate::Formulation) -> Result<(S, S), Error> {
        if self.quality == Quality::Refused {
            return Err(Error::NotFinite { quantity });
        }
        let value = checked_for(formulation, quantity, self.value)?;
        Ok((value, checked(Quantity::StandardUncertainty, self.standard_uncertainty)?))
    }
}

impl Reading<f64> {
    /// A checked sample of a channel, with the standard uncertainty of its sensor.
    pub fn from_checked(sample: &Checked, standard_uncertainty: f64) -> Self {
        Self { value: sample.value_or(f64::NAN), standard_uncertainty, quality: sample.quality() }
    }
}

/// Air as a temperature and a humidity sensor see it.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct MeasuredAir<S = f64> {
    /// Dry bulb, °C.
    pub dry_bulb: Reading<S>,
    /// The humidity, in the unit of its quantity.
    pub humidity: Reading<S>,
    /// What the humidity sensor measures: any quantity that fixes a state ([`Quantity::fixes_state`]).
    pub humidity_quantity: Quantity,
}

impl<S: Scalar> MeasuredAir<S> {
    /// Air of a dry bulb, °C, and a relative humidity, fraction.
    pub fn from_relative_humidity(dry_bulb: Reading<S>, relative_humidity: Reading<S>) -> Self {
        Self { dry_bulb, humidity: relative_humidity, humidity_quantity: Quantity::RelativeHumidity }
    }

    /// Air of which the temperature alone is measured, °C.
    pub fn from_dry_bulb(dry_bulb: Reading<S>) -> Self {
        Self::from_relative_humidity(dry_bulb, Reading::missing())
    }

    /// The worse quality of the two readings.
    #[must_use]
    pub fn quality(&self) -> Quality {
        self.dry_bulb.quality.worst(self.humidity.quality)
    }

    /// The state that the readings make.
    ///
    /// # Errors
    /// As [`MoistAir::from_dry_bulb_and`]; [`Error::NotFinite`] for a refused or missing reading.
    pub fn state(&self, basis: Basis<S>) -> Result<MoistAir<S>, Error> {
        self.sensed(basis).map(|sensed| sensed.air)
    }

    pub(super) fn sensed(&self, basis: Basis<S>) -> Result<Sensed<S>, Error> {
        let formulation = basis.formulation();
        let (celsius, by_dry_bulb) = self.dry_bulb.usable(Quantity::DryBulb, formulation)?;
        let (humidity, by_humidity) = self.humidity.usable(self.humidity_quantity, formulation)?;
        let second = self.humidity_quantity;
        let air = MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), second, humidity, basis)?;
        Ok(Sensed { air, second, by_dry_bulb, by_humidity })
    }
}

/// A state and the standard uncertainties of the two readings that made it.
#[derive(Clone, Copy, Debug)]
pub(super) struct Sensed<S> {
    pub air: MoistAir<S>,
    second: Quantity,
    by_dry_bulb: S,
    by_humidity: S,
}

impl<S: Scalar> Sensed<S> {
    /// A property and its standard uncertainty (JCGM 100:2008, Eq. 10).
    pub fn property(&self, quantity: Quantity) -> Result<(S, S), Error> {
        let [value, by_dry_bulb, by_humidity] = self.slopes(quantity)?;
        Ok((value, self.uncertainty(by_dry_bulb, by_humidity)))
    }

    /// A property, and its derivatives with respect to the two readings.
    pub fn slopes(&self, quantity: Quantity) -> Result<[S; 3], Error> {
        let slopes = self.air.derivatives(quantity, self.second)?;
        Ok([slopes.value, slopes.by_dry_bulb, slopes.by_second])
    }

    /// What the readings' uncertainties come to by these derivatives.
    pub fn uncertainty(&self, by_dry_bulb: S, by_humidity: S) -> S {
        root_of_squares([by_dry_bulb * self.by_dry_bulb, by_humidity * self.by_humidity])
    }
}

/// √(a² + b² + …), scaled so that no square overflows.
pub(super) fn root_of_squares<S: Scalar, const N: usize>(terms: [S; N]) -> S {
    let largest = terms.iter().fold(k::<S>(0.0), |most, &term| most.at_least(term.at_least(-term)));
    if largest <= k(0.0) {
        // All are zero, or no number.
        return terms.iter().fold(k(0.0), |sum, &term| sum + term);
    }
    largest * terms.iter().fold(k::<S>(0.0), |sum, &term| sum + (term / largest) * (term / largest)).sqrt()
}
