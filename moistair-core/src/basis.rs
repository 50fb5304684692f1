//! On what a state stands: a pressure and a formulation.

use crate::Scalar;
use crate::bounds::Quantity;
use crate::quantity::Pressure;

/// How moist air is described.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[non_exhaustive]
#[repr(i32)]
pub enum Formulation {
    /// Dry air and water vapor as a virial mixture in equilibrium with IAPWS-95 liquid or R10-06 ice, after IAPWS G8-10, its functions of
    /// temperature fitted: −80 to 150 °C, 20 kPa to 1.1 MPa. How far it is from the Helmholtz formulation stands in ACCURACY.md.
    #[default]
    RealGas = 0,
    /// The perfect-gas relations of ASHRAE Fundamentals, chapter 1, with Hyland–Wexler saturation: for reproducing
    /// contract and textbook numbers.
    IdealGas = 1,
    /// IAPWS G8-10 as published: the Helmholtz energies of IAPWS-95 water and of dry air of Lemmon et al. 2000 with all their terms,
    /// in equilibrium with IAPWS-95 liquid or R10-06 ice. Slower by an order of magnitude; −80 to 200 °C, 20 kPa to 5 MPa. The yardstick of
    /// the real gas, and for compressed and for hot air. Only with the Cargo feature `helmholtz`, a default.
    #[cfg(any(feature = "helmholtz", test))]
    Helmholtz = 2,
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
            #[cfg(any(feature = "helmholtz", test))]
            2 => Some(Self::Helmholtz),
            _ => None,
        }
    }

    /// The formulations of this build, in the order of their codes.
    pub const ALL: &'static [Self] = &[
        Self::RealGas,
        Self::IdealGas,
        #[cfg(any(feature = "helmholtz", test))]
        Self::Helmholtz,
    ];

    /// The declared range of a quantity as an input with this formulation, both ends included: that of [`Quantity::limits`], and for the
    /// Helmholtz formulation to 200 °C and 5 MPa.
    ///
    /// ```
    /// # use moistair_core::{Formulation, Quantity};
    /// assert_eq!(Formulation::RealGas.limits(Quantity::Pressure), (20e3, 1.1e6));
    /// # #[cfg(feature = "helmholtz")]
    /// assert_eq!(Formulation::Helmholtz.limits(Quantity::Pressure), (20e3, 5e6));
    /// ```
    #[must_use]
    pub const fn limits(self, quantity: Quantity) -> (f64, f64) {
        match self {
            Self::RealGas | Self::IdealGas => quantity.limits(),
            #[cfg(any(feature = "helmholtz", test))]
            Self::Helmholtz => quantity.limits_of_helmholtz(),
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

    /// The Helmholtz basis, IAPWS G8-10 as published.
    #[cfg(any(feature = "helmholtz", test))]
    pub const fn helmholtz(pressure: Pressure<S>) -> Self {
        Self::new(pressure, Formulation::Helmholtz)
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
            #[cfg(any(feature = "helmholtz", test))]
            $crate::Formulation::Helmholtz => {
                type $mixture<T> = $crate::mixture::Helmholtz<T>;
                $body
            }
        }
    };
}
pub(crate) use with_mixture;
