//! On what a state stands: a pressure and a formulation.

use crate::Scalar;
use crate::quantity::Pressure;

/// How moist air is described.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Formulation {
    /// Dry air and water vapor as a virial mixture in equilibrium with IAPWS-95 liquid or R10-06 ice, after IAPWS G8-10.
    #[default]
    RealGas = 0,
    /// The perfect-gas relations of ASHRAE Fundamentals, chapter 1, with Hyland–Wexler saturation: for reproducing
    /// contract and textbook numbers.
    IdealGas = 1,
}

impl Formulation {
    /// The stable code, as on the C face.
    #[must_use]
    pub const fn code(self) -> i32 {
        self as i32
    }

    /// The formulation with a given code.
    #[must_use]
    pub const fn from_code(code: i32) -> Option<Self> {
        match code {
            0 => Some(Self::RealGas),
            1 => Some(Self::IdealGas),
            _ => None,
        }
    }
}

/// A pressure and a formulation. A plain [`Pressure`] converts into the real-gas basis.
///
/// ```
/// use moistair_core::{Basis, Formulation, Pressure};
/// let site = Basis::from(Pressure::from_kilopascals(84.5));
/// assert_eq!(site.formulation(), Formulation::RealGas);
/// ```
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Basis<S = f64> {
    pressure: Pressure<S>,
    formulation: Formulation,
}

impl<S: Scalar> Basis<S> {
    /// A basis; the pressure is checked where a state is made.
    pub const fn new(pressure: Pressure<S>, formulation: Formulation) -> Self {
        Self { pressure, formulation }
    }

    /// The real-gas basis, the default.
    pub const fn real_gas(pressure: Pressure<S>) -> Self {
        Self::new(pressure, Formulation::RealGas)
    }

    /// The ideal-gas (handbook) basis.
    pub const fn ideal_gas(pressure: Pressure<S>) -> Self {
        Self::new(pressure, Formulation::IdealGas)
    }

    /// Absolute pressure.
    pub const fn pressure(self) -> Pressure<S> {
        self.pressure
    }

    /// Formulation.
    #[must_use]
    pub const fn formulation(self) -> Formulation {
        self.formulation
    }

    /// The same formulation at another pressure.
    pub const fn at_pressure(self, pressure: Pressure<S>) -> Self {
        Self::new(pressure, self.formulation)
    }
}

impl<S: Scalar> From<Pressure<S>> for Basis<S> {
    fn from(pressure: Pressure<S>) -> Self {
        Self::real_gas(pressure)
    }
}

/// Runs a generic expression on the mixture of a formulation: the one place where the choice at run time becomes a type.
macro_rules! with_mixture {
    ($formulation:expr, $scalar:ty, $mixture:ident => $body:expr) => {
        match $formulation {
            $crate::Formulation::RealGas => {
                type $mixture<T> = $crate::mixture::RealGas<T>;
                $body
            }
            $crate::Formulation::IdealGas => {
                type $mixture<T> = $crate::mixture::IdealGas<T>;
                $body
            }
        }
    };
}
pub(crate) use with_mixture;
