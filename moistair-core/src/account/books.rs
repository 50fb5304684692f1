//! How well the books close.

use super::Sum;
use crate::process::books::Books;

/// The residuals of one book over many samples; owned by the caller, zeroed at first.
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Residuals {
    absolute: Sum,
    scale: Sum,
    largest_relative: f64,
    samples: u64,
    refused: u64,
}

impl Residuals {
    /// Adds the residual of one closed book and the scale that it is judged by, the sum of the absolute terms.
    ///
    /// False, and only counted as refused, when either is not finite, the scale is negative, or it is zero and the
    /// residual is not.
    pub fn add(&mut self, residual: f64, scale: f64) -> bool {
        let residual = residual.abs();
        let relative = if residual > 0.0 { residual / scale } else { 0.0 };
        let (mut absolute, mut scales) = (self.absolute, self.scale);
        let usable = relative.is_finite() && scale >= 0.0 && absolute.add(residual) && scales.add(scale);
        if usable {
            (self.absolute, self.scale) = (absolute, scales);
            self.largest_relative = self.largest_relative.max(relative);
            self.samples = self.samples.saturating_add(1);
        } else {
            self.refused = self.refused.saturating_add(1);
        }
        usable
    }

    /// Adds the residuals of another time or place; false, and nothing changes, when a sum is not finite.
    pub fn merge(&mut self, other: &Self) -> bool {
        let mut merged = *self;
        let fits = merged.absolute.merge(&other.absolute) && merged.scale.merge(&other.scale);
        if fits {
            merged.largest_relative = self.largest_relative.max(other.largest_relative);
            merged.samples = self.samples.saturating_add(other.samples);
            merged.refused = self.refused.saturating_add(other.refused);
            *self = merged;
        }
        fits
    }

    /// The sum of the absolute residuals, in the unit of the book.
    #[must_use]
    pub const fn sum_of_residuals(&self) -> f64 {
        self.absolute.value()
    }

    /// The sum of the scales, in the unit of the book.
    #[must_use]
    pub const fn sum_of_scales(&self) -> f64 {
        self.scale.value()
    }

    /// The largest residual relative to its own scale.
    #[must_use]
    pub const fn largest_relative(&self) -> f64 {
        self.largest_relative
    }

    /// The same in units of the rounding of numbers, 2⁻⁵²: a book of a few terms that closes leaves a few of them.
    #[must_use]
    pub fn largest_in_epsilons(&self) -> f64 {
        self.largest_relative / f64::EPSILON
    }

    /// The sum of the absolute residuals relative to the sum of the scales; 0 when that is zero.
    #[must_use]
    pub fn relative(&self) -> f64 {
        let scale = self.sum_of_scales();
        if scale > 0.0 { self.sum_of_residuals() / scale } else { 0.0 }
    }

    /// How many residuals were added.
    #[must_use]
    pub const fn samples(&self) -> u64 {
        self.samples
    }

    /// How many were refused.
    #[must_use]
    pub const fn refused(&self) -> u64 {
        self.refused
    }
}

/// The residuals of the heat book and of the water book of a process or a plant; owned by the caller, zeroed at first.
///
/// ```
/// use moistair_core::account::BooksTotal;
/// let mut books = BooksTotal::default();
/// assert!(books.add(1e-9, 2e4, -2e-19, 5e-3));
/// assert_eq!(books.heat().largest_relative(), 5e-14);
/// assert_eq!(books.water().sum_of_residuals(), 2e-19);
/// // A residual that nothing stands against is not taken; the heat book still is.
/// assert!(!books.add(0.0, 1.0, 1.0, 0.0));
/// assert_eq!((books.heat().samples(), books.water().refused()), (2, 1));
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct BooksTotal {
    heat: Residuals,
    water: Residuals,
    closed: u64,
}

impl BooksTotal {
    /// Adds the books of a process, and counts them if they [close](Books::close). False when either was refused.
    ///
    /// ```
    /// use moistair_core::*;
    /// use moistair_core::account::BooksTotal;
    /// use moistair_core::process::{AirStream, books, sensible};
    /// let site: Pressure = Pressure::from_kilopascals(101.325);
    /// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(15.0), RelativeHumidity::from_percent(60.0), site)?;
    /// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(5.0))?;
    /// let heater = sensible::to_temperature(&entering, Temperature::from_celsius(22.0))?;
    /// let mut total = BooksTotal::default();
    /// assert!(total.record(&books::balance(&[entering.into()], &heater.leaving.into(), &heater.exchange)));
    /// // Heat that nobody supplied.
    /// assert!(total.record(&books::balance(&[entering.into()], &heater.leaving.into(), &process::Exchange::none())));
    /// assert_eq!((total.heat().samples(), total.closed()), (2, 1));
    /// assert!(total.heat().largest_in_epsilons() > 8.0);
    /// # Ok::<(), Error>(())
    /// ```
    pub fn record(&mut self, books: &Books) -> bool {
        let taken = self.add(
            books.heat_residual.watts(),
            books.heat_scale.watts(),
            books.water_residual.kilograms_per_second(),
            books.water_scale.kilograms_per_second(),
        );
        self.closed = self.closed.saturating_add((taken && books.close()).into());
        taken
    }

    /// Adds one closed pair of books, each with its scale: W and kg/s, or J and kg. False when either was refused.
    pub fn add(&mut self, heat: f64, heat_scale: f64, water: f64, water_scale: f64) -> bool {
        let heat = self.heat.add(heat, heat_scale);
        let water = self.water.add(water, water_scale);
        heat && water
    }

    /// Adds the books of another time or place; false, and nothing changes, when a sum is not finite.
    pub fn merge(&mut self, other: &Self) -> bool {
        let mut merged = *self;
        let fits = merged.heat.merge(&other.heat) && merged.water.merge(&other.water);
        if fits {
            merged.closed = self.closed.saturating_add(other.closed);
            *self = merged;
        }
        fits
    }

    /// The heat book.
    #[must_use]
    pub const fn heat(&self) -> &Residuals {
        &self.heat
    }

    /// How many of the [recorded](Self::record) books closed to rounding.
    #[must_use]
    pub const fn closed(&self) -> u64 {
        self.closed
    }

    /// The water book.
    #[must_use]
    pub const fn water(&self) -> &Residuals {
        &self.water
    }
}
