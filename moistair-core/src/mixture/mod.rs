//! Formulations of moist air: what a mixture of dry air and water vapor is, and what it is in equilibrium with.
//!
//! Every property and every solve in `state/` is written once over [`Mixture`].

#[cfg(any(feature = "helmholtz", test))]
mod helmholtz;
mod ideal_gas;
mod real_gas;
pub mod transport;
mod two_component;
#[cfg(test)]
mod virial;

#[cfg(any(feature = "helmholtz", test))]
pub use helmholtz::Helmholtz;
pub use ideal_gas::IdealGas;
pub use real_gas::RealGas;

use crate::Formulation;
use crate::real::Real;
use crate::saturation::Surface;

/// The gas at given temperature, pressure and humidity ratio, per kilogram of dry air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Gas<R> {
    /// v, m³/kg
    pub volume: R,
    /// h, J/kg
    pub enthalpy: R,
    /// ∂h/∂T at constant p and W, J/(kg K)
    pub specific_heat: R,
    /// p v / (R T) of the mixture.
    pub compressibility: R,
    /// ∂v/∂W at constant T and p, m³/kg
    pub volume_of_water: R,
    /// ∂h/∂W at constant T and p, J/kg
    pub enthalpy_of_water: R,
}

/// Equilibrium of the gas with a condensed phase at given temperature and pressure.
#[derive(Clone, Copy, Debug)]
pub struct Saturation<R> {
    /// Water mole fraction; not between zero and one where nothing saturates.
    pub mole_fraction: R,
    /// Humidity ratio.
    pub humidity_ratio: R,
    /// d ln W_s / dT at constant pressure, 1/K.
    pub log_slope: R,
    /// Enthalpy of the condensed phase, J/kg.
    pub condensed_enthalpy: R,
}

/// Chemical potentials of the components of the gas, each per kilogram of that component, J/kg: g = μ_a + W μ_w.
#[derive(Clone, Copy, Debug)]
pub struct Potentials<R> {
    pub water: R,
    pub dry_air: R,
}

/// How many Newton steps the solves in `state/` take: constant, so that the work is. Their tests show each to be enough over the declared
/// range of the formulation, and none to be idle.
#[derive(Clone, Copy, Debug)]
pub struct Steps {
    pub dew_point: usize,
    pub wet_bulb: usize,
    /// Halvings of the interval that the wet bulb starts with.
    pub wet_bulb_halvings: usize,
    /// Humidity ratio from enthalpy, volume or wet bulb.
    pub humidity_ratio: usize,
    /// Temperature from enthalpy.
    pub temperature: usize,
}

impl Steps {
    /// To 150 °C and 1.1 MPa.
    pub const TO_150_CELSIUS: Self =
        Self { dew_point: 3, wet_bulb: 3, wet_bulb_halvings: 8, humidity_ratio: 3, temperature: 4 };
}

/// A formulation. `Self` holds what depends on temperature alone.
pub trait Mixture<R: Real>: Copy {
    /// Which formulation it is.
    const FORMULATION: Formulation;

    /// Steps of the solves over it.
    const STEPS: Steps;

    /// Molar mass of water over that of dry air.
    const MOLAR_MASS_RATIO: f64;

    /// At a temperature, °C.
    fn at(celsius: R) -> Self;

    /// The gas at a pressure [Pa] and humidity ratio.
    fn gas(&self, pressure: R, humidity_ratio: R) -> Gas<R>;

    /// Entropy per kilogram of dry air, J/(kg K), of the gas that [`Mixture::gas`] gave.
    fn entropy(&self, pressure: R, humidity_ratio: R, gas: &Gas<R>) -> R;

    /// Speed of sound of that gas at constant composition, m/s.
    fn speed_of_sound(&self, humidity_ratio: R, gas: &Gas<R>) -> R;

    /// Isochoric heat capacity of that gas at constant humidity ratio, per kilogram of dry air, J/(kg K).
    fn specific_heat_at_constant_volume(&self, humidity_ratio: R, gas: &Gas<R>) -> R;

    /// Chemical potentials in that gas; that of the water is of no meaning where there is none.
    fn potentials(&self, pressure: R, humidity_ratio: R, gas: &Gas<R>) -> Potentials<R>;

    /// Fugacity of the water in that gas, Pa.
    fn fugacity(&self, pressure: R, humidity_ratio: R, gas: &Gas<R>) -> R;

    /// Equilibrium over a surface at a pressure.
    fn saturation(&self, pressure: R, surface: Surface) -> Saturation<R>;

    /// Saturation pressure of pure water over a surface; the stable one is chosen at `pressure`.
    fn pure_saturation_pressure(&self, pressure: R, surface: Surface) -> R;

    /// Temperature at which ice and liquid water coexist under a pressure, °C.
    fn melting_temperature(pressure: R) -> R;

    /// Enthalpy of ice and of liquid water at a temperature and pressure, J/kg.
    fn condensed_enthalpy(celsius: R, pressure: R, surface: Surface) -> R;

    /// Humidity ratio of a water mole fraction.
    #[inline(always)]
    fn humidity_ratio(mole_fraction: R) -> R {
        mole_fraction * crate::real::k(Self::MOLAR_MASS_RATIO) / (crate::real::k::<R>(1.0) - mole_fraction)
    }

    /// Water mole fraction of a humidity ratio.
    #[inline(always)]
    fn mole_fraction(humidity_ratio: R) -> R {
        humidity_ratio / (humidity_ratio + crate::real::k(Self::MOLAR_MASS_RATIO))
    }
}
