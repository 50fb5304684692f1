//! What a fill transfers, as a law of the flows, from tests.
//!
//! Me = c (L/G)^−n (Kloppers and Kröger 2005, Heat Transfer Engineering 26(4):35–41, who also give richer forms). The law holds for the
//! fill, the height and the spray of the test, for L/G near those of the test, and for the method (Merkel, effectiveness–NTU, Poppe) that
//! evaluated the test.

use super::{AirStream, infeasible, water_to_air_ratio};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{Length, MassFlow};
use crate::real::{Scalar, k};

/// Me = c (L/G)^−n.
///
/// ```
/// use moistair_core::process::tower::fill::{FillLaw, FillTest};
/// use moistair_core::Length;
/// let tests = [FillTest { water_to_air: 0.8, number: 1.9_f64 }, FillTest { water_to_air: 1.6, number: 1.25 }];
/// let fill = FillLaw::from_two_tests(tests)?;
/// assert!((fill.exponent() - 0.604).abs() < 1e-3);
/// assert!((fill.number(1.6)? - 1.25).abs() < 1e-12);
/// // The same fill, tested at 1.2 m, for a number of 1.6 at L/G 1.2.
/// let height = fill.height(1.6, 1.2, Length::from_meters(1.2))?;
/// assert!((height.meters() - 1.291).abs() < 1e-3);
/// assert!(FillLaw::from_two_tests([tests[0], tests[0]]).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct FillLaw<S = f64> {
    coefficient: S,
    exponent: S,
}

/// One test of a fill: the Merkel number found at a ratio of water to air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct FillTest<S = f64> {
    /// L/G.
    pub water_to_air: S,
    /// Me.
    pub number: S,
}

impl<S: Scalar> FillLaw<S> {
    /// From c and n.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn new(coefficient: S, exponent: S) -> Result<Self, Error> {
        Ok(Self {
            coefficient: checked(Quantity::FillCoefficient, coefficient)?,
            exponent: checked(Quantity::FillExponent, exponent)?,
        })
    }

    /// The law through two tests, a straight line in logarithms.
    ///
    /// # Errors
    /// [`Error::Infeasible`] for tests at one L/G, or such that more air would transfer less: an exponent outside its range, to be
    /// looked for in the tests; [`Error::OutOfRange`], [`Error::NotFinite`].
    pub fn from_two_tests(tests: [FillTest<S>; 2]) -> Result<Self, Error> {
        let [first, second] = tests;
        let logarithms = |test: FillTest<S>| {
            let ratio = checked(Quantity::WaterToAirRatio, test.water_to_air)?;
            Ok((ratio.ln(), checked(Quantity::MerkelNumber, test.number)?.ln()))
        };
        let ((r1, m1), (r2, m2)) = (logarithms(first)?, logarithms(second)?);
        let exponent = (m1 - m2) / (r2 - r1);
        let (min, max) = Quantity::FillExponent.limits();
        if !(k::<S>(min) <= exponent && exponent <= k(max)) {
            // Tests at one ratio fix no exponent.
            let value = if exponent.is_finite() { exponent.to_f64() } else { f64::INFINITY };
            return Err(Error::Infeasible { quantity: Quantity::FillExponent, value, min, max });
        }
        Self::new((m1 + exponent * r1).exp(), exponent)
    }

    /// c, the Merkel number at L/G = 1.
    #[must_use]
    pub fn coefficient(&self) -> S {
        self.coefficient
    }

    /// n; 0.4 to 0.8 for most fills (common practice, no source).
    #[must_use]
    pub fn exponent(&self) -> S {
        self.exponent
    }

    /// Me at a checked ratio.
    pub(super) fn at(&self, water_to_air: S) -> S {
        self.coefficient * (-self.exponent * water_to_air.ln()).exp()
    }

    /// Me at a ratio of water to air.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`] for the ratio; [`Error::Infeasible`] where the law leaves the range of the number.
    pub fn number(&self, water_to_air: S) -> Result<S, Error> {
        let number = self.at(checked(Quantity::WaterToAirRatio, water_to_air)?);
        let (min, max) = Quantity::MerkelNumber.limits();
        if number <= k(max) { Ok(number) } else { Err(infeasible(Quantity::MerkelNumber, number, k(min), k(max))) }
    }

    /// Me with these flows: what [`merkel::rate`](super::merkel::rate) and [`poppe::rate`](super::poppe::rate) take.
    ///
    /// # Errors
    /// As [`FillLaw::number`], and [`Error::NoFlow`].
    pub fn number_with_flows(&self, entering: &AirStream<S>, water: MassFlow<S>) -> Result<S, Error> {
        self.number(water_to_air_ratio(entering, water)?)
    }

    /// The height that a number takes, of the fill that was tested at a height: transfer grows with the height alike.
    ///
    /// # Errors
    /// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] for a height outside its range.
    pub fn height(&self, number: S, water_to_air: S, tested: Length<S>) -> Result<Length<S>, Error> {
        let number = checked(Quantity::MerkelNumber, number)?;
        let tested = checked(Quantity::FillHeight, tested.meters())?;
        let meters = tested * number / self.at(checked(Quantity::WaterToAirRatio, water_to_air)?);
        let (min, max) = Quantity::FillHeight.limits();
        if meters <= k(max) {
            return Ok(Length::from_meters(meters));
        }
        Err(infeasible(Quantity::FillHeight, meters, k(min), k(max)))
    }
}
