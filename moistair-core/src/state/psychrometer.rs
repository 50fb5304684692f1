//! The psychrometer: a dry and a wetted thermometer, and the equation of WMO-No. 8 between their readings and the vapor pressure,
//!
//! x_w p = x_ws(t_w) p − A p (t − t_w),
//!
//! over water with A (1 + 0.000 944 t_w), over ice with A. The saturation is this library's, at the pressure of the air.

use crate::basis::{Basis, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, NoValue, checked, checked_for};
use crate::mixture::Mixture;
use crate::quantity::Temperature;
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;

use super::MoistAir;
use super::condensate::checked_pressure;
use super::construct::{greatest_humidity_ratio, settle};
use super::property::saturates;

/// Of an aspirated psychrometer, 1/K: WMO-No. 8, Part I, chapter 4 (from memory).
const ASPIRATED_OVER_WATER: f64 = 6.53e-4;
const ASPIRATED_OVER_ICE: f64 = 5.75e-4;
/// How the coefficient over water rises with the temperature of the bulb, 1/K.
const RISE: f64 = 0.000_944;

/// What the wetted bulb is covered with. Below the melting temperature the wick may hold either; one must look.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Bulb {
    /// Water, supercooled below the melting temperature.
    #[default]
    Water = 0,
    /// Ice.
    Ice = 1,
}

impl Bulb {
    /// The stable code, as on the C face.
    #[must_use]
    pub const fn code(self) -> i32 {
        self as i32
    }

    /// The bulb with a given code.
    #[must_use]
    pub const fn from_code(code: i32) -> Option<Self> {
        match code {
            0 => Some(Self::Water),
            1 => Some(Self::Ice),
            _ => None,
        }
    }

    const fn surface(self) -> Surface {
        match self {
            Self::Water => Surface::Liquid,
            Self::Ice => Surface::Ice,
        }
    }
}

/// A psychrometer: what its bulb is covered with, and its coefficient.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Psychrometer<S = f64> {
    bulb: Bulb,
    coefficient: S,
}

/// What a psychrometer shows. Its wet bulb is not the thermodynamic one of [`MoistAir::wet_bulb`], though an aspirated instrument comes
/// within a few tenths of a kelvin of it.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct PsychrometerReading<S = f64> {
    /// The dry thermometer.
    pub dry_bulb: Temperature<S>,
    /// The wetted thermometer.
    pub wet_bulb: Temperature<S>,
}

impl<S: Scalar> Psychrometer<S> {
    /// An aspirated instrument (Assmann): 6.53e-4 /K over water, 5.75e-4 /K over ice: WMO-No. 8 (coefficients from memory). It holds for
    /// 3 to 5 m/s over shielded bulbs with clean wicks.
    pub fn aspirated(bulb: Bulb) -> Self {
        let coefficient = match bulb {
            Bulb::Water => ASPIRATED_OVER_WATER,
            Bulb::Ice => ASPIRATED_OVER_ICE,
        };
        Self { bulb, coefficient: k(coefficient) }
    }

    /// An instrument of another coefficient, 1/K (over water that at 0 °C), 3e-4 to 2e-3: about 8e-4 in a naturally ventilated
    /// screen, 1.2e-3 in still air (common practice, no source). Below 3 m/s it depends on the draft: calibrate.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`].
    pub fn with_coefficient(bulb: Bulb, coefficient: S) -> Result<Self, Error> {
        Ok(Self { bulb, coefficient: checked(Quantity::PsychrometerCoefficient, coefficient)? })
    }

    /// What the bulb is covered with.
    #[must_use]
    pub fn bulb(&self) -> Bulb {
        self.bulb
    }

    /// The coefficient, 1/K.
    #[must_use]
    pub fn coefficient(&self) -> S {
        self.coefficient
    }

    /// x_w of a reading, and its slope in the wet bulb; NaN where nothing saturates at the wet bulb.
    fn mole_fraction<M: Mixture<S>>(&self, dry_bulb: S, wet_bulb: S, pressure: S) -> (S, S) {
        let saturation = M::at(wet_bulb).saturation(pressure, self.bulb.surface());
        let x = saturation.mole_fraction;
        if !saturates(x) {
            return (S::nan(), S::nan());
        }
        let rise = match self.bulb {
            Bulb::Water => self.coefficient * k(RISE),
            Bulb::Ice => k(0.0),
        };
        let coefficient = self.coefficient + rise * wet_bulb;
        let depression = dry_bulb - wet_bulb;
        // dx/dT = x (1 − x) d ln W/dT
        let slope = x * (k::<S>(1.0) - x) * saturation.log_slope + coefficient - rise * depression;
        (x - coefficient * depression, slope)
    }

    /// The wet bulb in air of a mole fraction; where there is none, the end of what the bulb can read that is next to it.
    fn wet_bulb<M: Mixture<S>>(&self, celsius: S, mole_fraction: S, pressure: S) -> Result<S, (NoValue, S)> {
        let (coldest, warmest) = self.range::<M>(pressure);
        // No water bulb is warmer than the air, which holds no more than liquid water allows.
        let air_limits = self.bulb == Bulb::Water && celsius <= warmest;
        let warmest = if air_limits { celsius } else { warmest };
        let error = |wet_bulb| {
            let (reached, slope) = self.mole_fraction::<M>(celsius, wet_bulb, pressure);
            (reached - mole_fraction, slope)
        };
        let rounding = S::epsilon() * k(512.0);
        if !(coldest <= warmest && error(coldest).0 <= rounding) {
            return Err((NoValue::BelowSurfaceRange, coldest));
        }
        if error(warmest).0 <= k(0.0) {
            return if air_limits { Ok(warmest) } else { Err((NoValue::AboveSurfaceRange, warmest)) };
        }
        let found = solve::increasing(coldest, warmest, solve::temperature_resolution(), error);
        // Short of the mole fraction still: the bulb boils before it gets there.
        if -rounding <= error(found).0 { Ok(found) } else { Err((NoValue::AboveBoiling, found)) }
    }

    /// Readings that the bulb can have.
    fn range<M: Mixture<S>>(&self, pressure: S) -> (S, S) {
        let (coldest, warmest) = Quantity::PsychrometerWetBulb.limits();
        let warmest = match self.bulb {
            Bulb::Water => k(warmest),
            Bulb::Ice => M::melting_temperature(pressure),
        };
        (k(coldest), warmest)
    }
}

impl<S: Scalar> MoistAir<S> {
    /// A state from what a psychrometer shows, by the equation of WMO-No. 8 (coefficients from memory) with the saturation of this library.
    ///
    /// Range: wet bulb −40 to 100 °C; the coefficients are made for weather. Accuracy: that of the instrument, where 0.1 K in the wet
    /// bulb are 0.7 % of relative humidity at 20 °C and 3 % at −10 °C. An ice bulb may read above the dry bulb, where the vapor is
    /// supersaturated over ice.
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`]; [`Error::Unattainable`] with the limits here for a wet bulb that would leave negative
    /// vapor, for one above the dry bulb (over ice: above that of air saturated over liquid), and for ice above its melting temperature;
    /// [`Error::NoValue`] where no reading is possible at all: air colder than −40 °C, or too warm for ice even when dry.
    ///
    /// ```
    /// use moistair_core::*;
    /// let site = Pressure::from_kilopascals(101.325);
    /// let reading = |dry, wet| PsychrometerReading {
    ///     dry_bulb: Temperature::from_celsius(dry), wet_bulb: Temperature::from_celsius(wet) };
    /// let air: MoistAir = MoistAir::from_psychrometer(Psychrometer::aspirated(Bulb::Water), reading(20.0, 15.0), site)?;
    /// assert!((air.relative_humidity()?.percent() - 58.7).abs() < 0.2);
    /// let swapped = MoistAir::from_psychrometer(Psychrometer::aspirated(Bulb::Water), reading(15.0, 20.0), site);
    /// assert!(swapped.is_err());
    /// # Ok::<(), Error>(())
    /// ```
    pub fn from_psychrometer(
        psychrometer: Psychrometer<S>,
        reading: PsychrometerReading<S>,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        const QUANTITY: Quantity = Quantity::PsychrometerWetBulb;
        let basis = basis.into();
        let celsius = checked_for(basis.formulation(), Quantity::DryBulb, reading.dry_bulb.celsius())?;
        let wet_bulb = checked(QUANTITY, reading.wet_bulb.celsius())?;
        let pressure = checked_pressure(&basis)?;
        with_mixture!(basis.formulation(), S, M => {
            let (_, warmest) = psychrometer.range::<M<S>>(pressure);
            let most = greatest_humidity_ratio(&M::<S>::at(celsius), celsius, pressure);
            let (mole_fraction, _) = psychrometer.mole_fraction::<M<S>>(celsius, wet_bulb, pressure);
            let ratio = <M<S> as Mixture<S>>::humidity_ratio(mole_fraction);
            let held = if wet_bulb <= warmest { settle(ratio, most, false) } else { None };
            held.map(|ratio| Self::assemble(celsius, pressure, ratio, basis.formulation())).ok_or_else(|| {
                let end = |ratio| {
                    psychrometer.wet_bulb::<M<S>>(celsius, <M<S> as Mixture<S>>::mole_fraction(ratio), pressure)
                };
                match (end(k(0.0)), end(most)) {
                    (Err((reason @ NoValue::AboveSurfaceRange, _)), _)
                    | (_, Err((reason @ NoValue::BelowSurfaceRange, _))) => Error::NoValue { quantity: QUANTITY, reason },
                    (dry, saturated) => {
                        let [min, max] = [dry, saturated].map(|end| end.unwrap_or_else(|(_, end)| end).to_f64());
                        Error::Unattainable { quantity: QUANTITY, value: wet_bulb.to_f64(), min, max }
                    }
                }
            })
        })
    }

    /// What a psychrometer would show in this air: the inverse of [`MoistAir::from_psychrometer`], to 1e-9 K.
    ///
    /// # Errors
    /// [`Error::NoValue`] where the wet bulb would lie outside −40 to 100 °C, ice above its melting temperature, or water above boiling
    /// (in superheated steam with little air).
    ///
    /// ```
    /// use moistair_core::*;
    /// let site = Pressure::from_kilopascals(101.325);
    /// let air: MoistAir =
    ///     MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), RelativeHumidity::from_percent(50.0), site)?;
    /// let reading = air.psychrometer_reading(Psychrometer::aspirated(Bulb::Water))?;
    /// // Close to the thermodynamic wet bulb, but not the same.
    /// let difference = reading.wet_bulb.celsius() - air.wet_bulb()?.celsius();
    /// assert!(0.01 < difference.abs() && difference.abs() < 0.2);
    /// assert!(air.psychrometer_reading(Psychrometer::aspirated(Bulb::Ice)).is_err()); // too warm for ice
    /// # Ok::<(), Error>(())
    /// ```
    pub fn psychrometer_reading(&self, psychrometer: Psychrometer<S>) -> Result<PsychrometerReading<S>, Error> {
        with_mixture!(self.formulation, S, M => {
            psychrometer.wet_bulb::<M<S>>(self.celsius, self.mole_fraction(), self.pascals)
        })
        .map(|wet_bulb| PsychrometerReading {
            dry_bulb: self.dry_bulb(),
            wet_bulb: Temperature::from_celsius(wet_bulb),
        })
        .map_err(|(reason, _)| Error::NoValue { quantity: Quantity::PsychrometerWetBulb, reason })
    }
}
