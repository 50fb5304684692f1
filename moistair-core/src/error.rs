//! What can be wrong, with the quantity, its value and its limits.

use core::fmt;

use crate::basis::Formulation;
use crate::bounds::Quantity;
use crate::real::k;

/// Why a call gives no result. `Copy`, and formats its text only when asked to.
#[derive(Clone, Copy, Debug, PartialEq, thiserror::Error)]
#[non_exhaustive]
pub enum Error {
    /// A value is NaN or infinite.
    #[error("{quantity} is not a finite number")]
    NotFinite {
        /// Which input.
        quantity: Quantity,
    },
    /// A value lies outside the declared range of its quantity.
    #[error("{quantity} {value}{} is outside {min} to {max}{}{}", Unit(*.quantity), Unit(*.quantity), .quantity.likely_slip(*.value))]
    OutOfRange {
        /// Which input.
        quantity: Quantity,
        /// Its value.
        value: f64,
        /// The least value allowed.
        min: f64,
        /// The greatest value allowed.
        max: f64,
    },
    /// A value is in its declared range, but no state has it at this dry bulb and pressure.
    #[error("{quantity} {value}{} has no state here: at this dry bulb and pressure it lies between {min} and {max}{}{}", Unit(*.quantity), Unit(*.quantity), .quantity.likely_slip(*.value))]
    Unattainable {
        /// Which input.
        quantity: Quantity,
        /// Its value.
        value: f64,
        /// The value of dry air here, or of the other end of the attainable range.
        min: f64,
        /// The value at saturation, or at the other end.
        max: f64,
    },
    /// The state is valid, but this property has no meaning there.
    #[error("{quantity} has no value at this state: {reason}")]
    NoValue {
        /// Which property.
        quantity: Quantity,
        /// Why.
        reason: NoValue,
    },
    /// Two states of different formulations in one process.
    #[error("states of different formulations cannot be combined: their enthalpies stand on different datums")]
    MixedFormulations,
    /// Two streams at different pressures where one is needed.
    #[error("states at different pressures need the pressure of the outlet, none was given")]
    MixedPressures,
    /// A process on no air at all.
    #[error("the dry-air mass flow is zero: heat or water would have nothing to go to")]
    NoFlow,
    /// Air with droplets or ice where a process knows dry gas only.
    #[error("the air carries droplets or ice, which this process does not describe: take them out before it")]
    CarriesCondensate,
    /// A process cannot do what was asked; the value and the limits that bind it.
    #[error("{quantity} {value}{} cannot be reached by this process: {min} to {max}{}", Unit(*.quantity), Unit(*.quantity))]
    Infeasible {
        /// What was asked for.
        quantity: Quantity,
        /// Its value.
        value: f64,
        /// The least that can be reached.
        min: f64,
        /// The most that can be reached.
        max: f64,
    },
    /// Two properties that fix no state together, or only badly.
    #[error("{first} and {second} make no state: {reason}")]
    Undetermined {
        /// One of them.
        first: Quantity,
        /// The other.
        second: Quantity,
        /// Why.
        reason: Undetermined,
    },
    /// Of two properties each is in its declared range, but no state at this pressure has both.
    #[error("{quantity} {value}{} has no state together with this {with}: at this pressure it lies between {min} and {max}{}{}", Unit(*.quantity), Unit(*.quantity), .quantity.likely_slip(*.value))]
    UnattainableTogether {
        /// The one of which the limits are given.
        quantity: Quantity,
        /// Its value.
        value: f64,
        /// The other property.
        with: Quantity,
        /// Its least value at states that have the other.
        min: f64,
        /// Its greatest.
        max: f64,
    },
    /// A selector that names nothing, or nothing that fits here.
    #[error("selector {code} does not name what is needed here")]
    UnknownSelector {
        /// The selector as given.
        code: i32,
    },
}

/// The unit behind a number, with the space between them; nothing for a quantity of unit one.
struct Unit(Quantity);

impl fmt::Display for Unit {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self.0.unit() {
            "1" => Ok(()),
            unit => write!(f, " {unit}"),
        }
    }
}

/// Why two properties fix no state.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[non_exhaustive]
pub enum Undetermined {
    /// One property, given twice.
    Twice,
    /// Both state how much vapor there is, and nothing else.
    VaporOnly,
    /// Their lines run along each other.
    NearlyParallel,
    /// Without vapor, both hold at every temperature.
    DryAir,
    /// A pair that this library does not solve.
    NotOffered,
}

impl Undetermined {
    /// The reason in words.
    #[must_use]
    pub const fn text(self) -> &'static str {
        match self {
            Self::Twice => "it is one property, given twice",
            Self::VaporOnly => "both say how much vapor there is, which air of any temperature may hold",
            Self::NearlyParallel => {
                "the states of one lie nearly along those of the other, so that the least error would move the result far"
            }
            Self::DryAir => "air without vapor has them at every temperature",
            Self::NotOffered => "this pair is not offered",
        }
    }
}

impl fmt::Display for Undetermined {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.pad(self.text())
    }
}

/// Why a property has no value at a valid state.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[non_exhaustive]
#[repr(i32)]
pub enum NoValue {
    /// There is no water vapor.
    DryAir = 0,
    /// The saturation pressure exceeds the total pressure: nothing saturates here.
    AboveBoiling = 1,
    /// The value would lie below the range of saturation over this surface.
    BelowSurfaceRange = 2,
    /// The value would lie above the range of saturation over this surface.
    AboveSurfaceRange = 3,
    /// Of a derivative: the slope has no bound where the vapor vanishes.
    UnboundedSlope = 4,
}

impl NoValue {
    /// The reason in words.
    #[must_use]
    pub const fn text(self) -> &'static str {
        match self {
            Self::DryAir => "there is no water vapor",
            Self::AboveBoiling => "the saturation pressure exceeds the total pressure, so that nothing saturates",
            Self::BelowSurfaceRange => "it would lie below the range of saturation over this surface",
            Self::AboveSurfaceRange => "it would lie above the range of saturation over this surface",
            Self::UnboundedSlope => "a slope has no bound where the vapor vanishes",
        }
    }
}

impl core::fmt::Display for NoValue {
    fn fmt(&self, f: &mut core::fmt::Formatter<'_>) -> core::fmt::Result {
        f.pad(self.text())
    }
}

impl Error {
    /// The stable code, as on the C face: 2xx a value, 3xx no result. Never re-used.
    #[must_use]
    pub const fn code(&self) -> i32 {
        match self {
            Self::UnknownSelector { .. } => 102,
            Self::NotFinite { .. } => 201,
            Self::OutOfRange { .. } => 202,
            Self::Unattainable { .. } => 203,
            Self::MixedFormulations => 205,
            Self::MixedPressures => 206,
            Self::NoFlow => 207,
            Self::Undetermined { .. } => 209,
            Self::UnattainableTogether { .. } => 210,
            Self::CarriesCondensate => 211,
            Self::Infeasible { .. } => 301,
            Self::NoValue { reason, .. } => 310 + *reason as i32,
        }
    }

    /// The quantity at fault, where there is one.
    #[must_use]
    pub const fn quantity(&self) -> Option<Quantity> {
        match *self {
            Self::NotFinite { quantity }
            | Self::OutOfRange { quantity, .. }
            | Self::Unattainable { quantity, .. }
            | Self::UnattainableTogether { quantity, .. }
            | Self::Undetermined { second: quantity, .. }
            | Self::Infeasible { quantity, .. }
            | Self::NoValue { quantity, .. } => Some(quantity),
            _ => None,
        }
    }

    /// The offending value and its limits (value, min, max), where there are any.
    #[must_use]
    pub const fn value_and_limits(&self) -> Option<(f64, f64, f64)> {
        match *self {
            Self::OutOfRange { value, min, max, .. }
            | Self::Unattainable { value, min, max, .. }
            | Self::UnattainableTogether { value, min, max, .. }
            | Self::Infeasible { value, min, max, .. } => Some((value, min, max)),
            _ => None,
        }
    }
}

/// `value` if it is finite and within the declared range of its quantity, where that does not depend on the formulation.
pub(crate) fn checked<S: crate::Scalar>(quantity: Quantity, value: S) -> Result<S, Error> {
    checked_between(quantity, value, quantity.limits())
}

/// `value` if it is finite and within the range of its quantity that a formulation declares.
pub(crate) fn checked_for<S: crate::Scalar>(
    formulation: Formulation,
    quantity: Quantity,
    value: S,
) -> Result<S, Error> {
    checked_between(quantity, value, formulation.limits(quantity))
}

/// `value` if it is finite and between two limits, both included.
pub(crate) fn checked_between<S: crate::Scalar>(
    quantity: Quantity,
    value: S,
    (min, max): (f64, f64),
) -> Result<S, Error> {
    if !value.is_finite() {
        return Err(Error::NotFinite { quantity });
    }
    // In the arithmetic of the value: in single precision 0.05 lies above the limit 0.05, and is meant to lie on it.
    if !(k::<S>(min) <= value && value <= k(max)) {
        return Err(Error::OutOfRange { quantity, value: value.to_f64(), min, max });
    }
    Ok(value)
}
