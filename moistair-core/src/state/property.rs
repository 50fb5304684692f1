//! What can be read from a state: the solves, written once over mixture and arithmetic, and the readers.

use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::Error;
use crate::mixture::transport::Transport;
use crate::mixture::{Mixture, Steps};
use crate::quantity::{
    ChemicalPotential, Diffusivity, DynamicViscosity, Fugacity, SpecificEntropy, SpecificHeat, Speed,
    ThermalConductivity, ZERO_CELSIUS,
};
use crate::real::{Mask, Real, Scalar, k};
use crate::saturation::{Magnus, Surface};
use crate::solve;
use crate::substance::{ice, liquid_water};

use super::MoistAir;
use super::view::View;

/// Temperature, °C, at which a water mole fraction saturates over a surface.
///
/// ln x_ws is nearly linear in 1/T: Newton in that variable.
pub(crate) fn dew_point<M: Mixture<R>, R: Real>(mole_fraction: R, pressure: R, surface: Surface) -> R {
    dew_point_after::<M, R>(M::STEPS.dew_point, mole_fraction, pressure, surface)
}

fn dew_point_after<M: Mixture<R>, R: Real>(steps: usize, mole_fraction: R, pressure: R, surface: Surface) -> R {
    let target = mole_fraction.ln();
    let (coldest, warmest) = match surface {
        Surface::Ice => ice::RANGE,
        Surface::Liquid | Surface::Stable => liquid_water::RANGE,
    };
    // Beyond the equation of the condensed phase the search would wander, and might end where it looks like a result.
    let within = |kelvins: R| kelvins.at_least(k(coldest + ZERO_CELSIUS)).at_most(k(warmest + ZERO_CELSIUS));
    let start = within(Magnus::over(surface).temperature(target + pressure.ln()) + k(ZERO_CELSIUS));
    let kelvins = solve::repeated(steps, start, |kelvins| {
        let saturation = M::at(kelvins - k(ZERO_CELSIUS)).saturation(pressure, surface);
        // d ln x / dT = (1 − x) d ln W / dT
        let slope = (k::<R>(1.0) - saturation.mole_fraction) * saturation.log_slope;
        let error = saturation.mole_fraction.ln() - target;
        within(kelvins / (k::<R>(1.0) + error / (slope * kelvins)))
    });
    kelvins - k(ZERO_CELSIUS)
}

/// Thermodynamic wet bulb, °C, over liquid or ice: x with h + (W_s(x) − W) h_c(x) = h_s(x)
/// (ASHRAE Fundamentals 2021 ch. 1, Eq. (33), without its approximations).
pub(super) fn wet_bulb<M: Mixture<R>, R: Real>(
    celsius: R,
    pressure: R,
    humidity_ratio: R,
    enthalpy: R,
    surface: Surface,
) -> R {
    wet_bulb_after::<M, R>(M::STEPS, celsius, pressure, humidity_ratio, enthalpy, surface)
}

fn wet_bulb_after<M: Mixture<R>, R: Real>(
    steps: Steps,
    celsius: R,
    pressure: R,
    humidity_ratio: R,
    enthalpy: R,
    surface: Surface,
) -> R {
    let start = wet_bulb_start::<R>(steps.wet_bulb_halvings, celsius, pressure, humidity_ratio, surface);
    solve::repeated(steps.wet_bulb, start, |x| {
        let (deficit, slope) = saturation_deficit::<M, R>(x, pressure, humidity_ratio, enthalpy, surface);
        x - deficit / slope
    })
}

/// h + (W_s − W) h_c − h_s at a trial temperature x, positive left of the wet bulb, and the slope for Newton: that of the
/// deficit times (1 − x_ws), over (1 − x_ws). The deficit has a pole where water boils; the product passes it smoothly.
pub(super) fn saturation_deficit<M: Mixture<R>, R: Real>(
    x: R,
    pressure: R,
    humidity_ratio: R,
    enthalpy: R,
    surface: Surface,
) -> (R, R) {
    let mixture = M::at(x);
    let saturation = mixture.saturation(pressure, surface);
    let saturated = mixture.gas(pressure, saturation.humidity_ratio);
    let missing = saturation.humidity_ratio - humidity_ratio;
    let ratio_slope = saturation.humidity_ratio * saturation.log_slope;
    let deficit = enthalpy + missing * saturation.condensed_enthalpy - saturated.enthalpy;
    let slope = ratio_slope * (saturation.condensed_enthalpy - saturated.enthalpy_of_water)
        + missing * k(condensed_heat_capacity(surface))
        - saturated.specific_heat;
    // d ln(1 − x_ws)/dT = −x_ws d ln W_s/dT
    (deficit, slope - deficit * saturation.mole_fraction * saturation.log_slope)
}

/// Near enough for a slope, J/(kg K).
pub(super) const fn condensed_heat_capacity(surface: Surface) -> f64 {
    match surface {
        Surface::Ice => 2_100.0,
        Surface::Liquid | Surface::Stable => 4_200.0,
    }
}

/// A wet bulb within 2.2 K (the worst in hot steam; 4 K with the Helmholtz formulation, to 5 MPa), by halving the interval of possible ones
/// under rounded perfect-gas constants.
fn wet_bulb_start<R: Real>(halvings: usize, celsius: R, pressure: R, humidity_ratio: R, surface: Surface) -> R {
    let curve = Magnus::over(surface);
    let (coldest, latent_at_zero, heat_capacity) = match surface {
        Surface::Ice => (-105.0, 2_834_000.0, 2_100.0),
        Surface::Liquid | Surface::Stable => (-45.0, 2_501_000.0, 4_200.0),
    };
    let (mut cold, mut warm) = (k::<R>(coldest), celsius + k(2.0));
    for _ in 0..halvings {
        let x = (cold + warm) * k(0.5);
        let saturated = curve.pressure(x);
        let latent = k::<R>(latent_at_zero) + x * k(1_860.0 - heat_capacity);
        let supply = humidity_ratio * (latent + (celsius - x) * k(1_860.0)) + (celsius - x) * k(1_006.0);
        // The wet bulb is warmer if the air at x saturates with less than is supplied.
        let warmer = (saturated * latent * k(0.622)).lt((pressure - saturated) * supply);
        cold = R::select(warmer, x, cold);
        warm = R::select(warmer, warm, x);
    }
    warm
}

/// The wet bulb over the stable surface: liquid where that one is at or above the melting temperature, else ice. Where
/// both exist, near 0 °C, this is the rule; the value steps by 0.3 to 0.4 K where the choice changes.
pub(super) fn stable_wet_bulb<M: Mixture<R>, R: Real>(celsius: R, pressure: R, humidity_ratio: R, enthalpy: R) -> R {
    let melting = M::melting_temperature(pressure);
    let (at_melting, _) = saturation_deficit::<M, R>(melting, pressure, humidity_ratio, enthalpy, Surface::Liquid);
    let over = |surface| wet_bulb::<M, R>(celsius, pressure, humidity_ratio, enthalpy, surface);
    // The choice is that of the exact wet bulb: what lies beyond is rounding.
    let rounded = |value: R, side: fn(R, R) -> R| value.rounded_to(side(value, melting));
    R::pick(
        k::<R>(0.0).le(at_melting),
        || rounded(over(Surface::Liquid), R::at_least),
        || rounded(over(Surface::Ice), R::at_most),
    )
}

/// Whether a saturation exists in the gas phase.
pub(crate) fn saturates<R: Real>(mole_fraction: R) -> R::Mask {
    k::<R>(0.0).lt(mole_fraction).and(mole_fraction.lt(k(1.0)))
}

impl<S: Scalar> MoistAir<S> {
    /// A property by its selector, on the units of [`Quantity::unit`].
    ///
    /// # Errors
    /// [`Error::NoValue`] where the property has no meaning at this state; [`Error::UnknownSelector`] if the quantity is not a
    /// property of a state.
    ///
    /// ```
    /// # use moistair_core::*;
    /// let air = MoistAir::from_dry_bulb(
    ///     Temperature::from_celsius(20.0), HumidityRatio::from_grams_per_kilogram(0.0), Pressure::from_kilopascals(100.0))?;
    /// assert_eq!(air.value(Quantity::VaporPressure)?, 0.0);
    /// assert!(air.value(Quantity::DewPoint).is_err()); // dry air has none; the state is valid all the same
    /// # Ok::<(), Error>(())
    /// ```
    pub fn value(&self, quantity: Quantity) -> Result<S, Error> {
        with_mixture!(self.formulation, S, M => {
            match self.plain::<M<S>>(quantity) {
                Some(value) => Ok(value),
                None => View::<M<S>, S>::of(*self).value(quantity),
            }
        })
    }

    /// Many properties at once: calls `take` for each with its value or the reason why there is none.
    pub fn values(
        &self,
        quantities: impl IntoIterator<Item = Quantity>,
        mut take: impl FnMut(Quantity, Result<S, Error>),
    ) {
        with_mixture!(self.formulation, S, M => {
            let view = View::<M<S>, S>::of(*self);
            for quantity in quantities {
                take(quantity, view.value(quantity));
            }
        });
    }
}

/// Declares the typed readers.
macro_rules! readers {
    ($($(#[$doc:meta])* $method:ident -> $type:ident::$from:ident, $quantity:ident;)*) => {
        impl<S: Scalar> MoistAir<S> {$(
            $(#[$doc])*
            ///
            /// # Errors
            /// [`Error::NoValue`] with the reason where it has no meaning at this state.
            pub fn $method(&self) -> Result<crate::quantity::$type<S>, Error> {
                self.value(Quantity::$quantity).map(crate::quantity::$type::$from)
            }
        )*}
    };
}

readers! {
    /// Relative humidity x_w / x_ws over the stable surface (ice below the melting temperature, liquid above). Above one
    /// where vapor is supersaturated over ice.
    relative_humidity -> RelativeHumidity::from_fraction, RelativeHumidity;
    /// Relative humidity x_w / x_ws over liquid water (down to −40 °C), the convention of WMO-No. 8.
    relative_humidity_over_liquid -> RelativeHumidityOverLiquid::from_fraction, RelativeHumidityOverLiquid;
    /// Degree of saturation W / W_s over the stable surface.
    degree_of_saturation -> DegreeOfSaturation::from_fraction, DegreeOfSaturation;
    /// Vapor pressure deficit (x_ws − x_w) p over the stable surface; negative where supersaturated over ice.
    vapor_pressure_deficit -> VaporPressure::from_pascals, VaporPressureDeficit;
    /// Saturation pressure of pure water over the stable surface.
    saturation_pressure -> VaporPressure::from_pascals, SaturationPressure;
    /// Thermodynamic wet bulb (adiabatic saturation) over the stable surface: over liquid where that wet bulb is at or above the
    /// melting temperature, over ice otherwise. Where the choice changes the value steps by 0.3 to 0.4 K.
    wet_bulb -> WetBulb::from_celsius, WetBulb;
    /// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature.
    wet_bulb_over_liquid -> WetBulbOverLiquid::from_celsius, WetBulbOverLiquid;
    /// Thermodynamic wet bulb over ice.
    wet_bulb_over_ice -> WetBulbOverIce::from_celsius, WetBulbOverIce;
    /// Dew point: always over liquid water, −40 °C and above.
    dew_point -> DewPoint::from_celsius, DewPoint;
    /// Frost point: always over ice, −100 °C to the melting temperature.
    frost_point -> FrostPoint::from_celsius, FrostPoint;
}

impl<S: Scalar> MoistAir<S> {
    /// Specific entropy s per mass of dry air. Zero: dry air at 0 °C and 101 325 Pa, liquid water at the triple point (0 °C for the ideal
    /// gas). Real gas: IAPWS G8-10.
    pub fn specific_entropy(&self) -> SpecificEntropy<S> {
        let value = with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).entropy());
        SpecificEntropy::from_joules_per_kilogram_kelvin(value)
    }

    /// Speed of sound at constant composition. Real gas: IAPWS G8-10; ideal gas: √(γ R T).
    pub fn speed_of_sound(&self) -> Speed<S> {
        let value = with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).speed_of_sound());
        Speed::from_meters_per_second(value)
    }

    /// Dynamic viscosity μ. Dry air by Lemmon & Jacobsen 2004 (1 %), vapor by IAPWS R12-08 (2 %), mixed by Wilke's rule of 1950 (a few percent
    /// in hot and humid air). Below 0 °C the vapor's part extrapolates.
    ///
    /// ```
    /// # use moistair_core::*;
    /// let air: MoistAir = MoistAir::from_dry_bulb(
    ///     Temperature::from_celsius(25.0), RelativeHumidity::from_percent(50.0), Pressure::from_kilopascals(101.325))?;
    /// assert!((air.dynamic_viscosity().micropascal_seconds() - 18.3).abs() < 0.1);
    /// assert!((air.prandtl_number() - 0.71).abs() < 0.01);
    /// # Ok::<(), Error>(())
    /// ```
    pub fn dynamic_viscosity(&self) -> DynamicViscosity<S> {
        DynamicViscosity::from_pascal_seconds(self.transport().viscosity)
    }

    /// Thermal conductivity λ. Dry air by Lemmon & Jacobsen 2004 (2 %), vapor by IAPWS R15-11 (2 %), mixed by Wassiljewa's rule with the
    /// weights of Mason & Saxena 1958, factor 1 (a few percent in hot and humid air). Critical enhancements are left out: below 6e-4. Below
    /// 0 °C the vapor's part extrapolates.
    pub fn thermal_conductivity(&self) -> ThermalConductivity<S> {
        ThermalConductivity::from_watts_per_meter_kelvin(self.transport().conductivity)
    }

    /// Diffusivity D of water vapor in air: Massman 1998 (constants from memory), 0 to 100 °C near atmospheric pressure within about 7 %; it
    /// extrapolates elsewhere.
    pub fn vapor_diffusivity(&self) -> Diffusivity<S> {
        Diffusivity::from_square_meters_per_second(self.transport().diffusivity)
    }

    /// Prandtl number c_p μ / λ, the heat capacity per mass of moist air. Good to a few percent, as viscosity and conductivity are.
    #[must_use]
    pub fn prandtl_number(&self) -> S {
        with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).prandtl_number())
    }

    /// Schmidt number μ / (ρ D) of the vapor in the moist air. Good to about 10 %, mostly that of the diffusivity.
    #[must_use]
    pub fn schmidt_number(&self) -> S {
        with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).schmidt_number())
    }

    /// Lewis number λ / (ρ c_p D): thermal diffusivity over the diffusivity of the vapor (some define the inverse). Good to about 10 %, mostly
    /// that of the diffusivity.
    #[must_use]
    pub fn lewis_number(&self) -> S {
        with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).lewis_number())
    }

    fn transport(&self) -> Transport<S> {
        with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).transport())
    }

    /// Isochoric heat capacity per mass of dry air, at constant humidity ratio. Real gas: −T ∂²f/∂T² of IAPWS G8-10; ideal gas: c_p less the
    /// gas constant.
    pub fn specific_heat_at_constant_volume(&self) -> SpecificHeat<S> {
        let value =
            with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).specific_heat_at_constant_volume());
        SpecificHeat::from_joules_per_kilogram_kelvin(value)
    }

    /// Chemical potential μ_w of the water in the gas, per mass of water, on the datum of enthalpy and entropy: near zero for liquid water at the
    /// triple point. At saturation it is that of the condensed phase (IAPWS G8-10 Table 2); not so for the ideal gas, whose relations do
    /// not stem from one potential.
    ///
    /// # Errors
    /// [`Error::NoValue`] for dry air, where it would be −∞.
    ///
    /// ```
    /// # use moistair_core::*;
    /// let site = Basis::real_gas(Pressure::from_kilopascals(101.325));
    /// let at = |rh| MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), RelativeHumidity::from_percent(rh), site);
    /// // That of liquid water at 20 °C and 101 325 Pa: h − T s = 84.01 − 293.15 × 0.29646 kJ/kg (IAPWS-95).
    /// let saturated: f64 = at(100.0)?.chemical_potential_of_water()?.kilojoules_per_kilogram();
    /// assert!((saturated - -2.90).abs() < 0.01);
    /// assert!(at(50.0)?.chemical_potential_of_water()?.kilojoules_per_kilogram() < saturated);
    /// assert!(at(0.0)?.chemical_potential_of_water().is_err());
    /// # Ok::<(), Error>(())
    /// ```
    pub fn chemical_potential_of_water(&self) -> Result<ChemicalPotential<S>, Error> {
        self.value(Quantity::ChemicalPotentialOfWater).map(ChemicalPotential::from_joules_per_kilogram)
    }

    /// Chemical potential μ_a of the dry air in the gas, per mass of dry air, on the datum of enthalpy and entropy: zero for dry air at 0 °C and
    /// 101 325 Pa. With the water's it makes the Gibbs energy: h − T s = μ_a + W μ_w.
    pub fn chemical_potential_of_dry_air(&self) -> ChemicalPotential<S> {
        let value = with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).potentials().dry_air);
        ChemicalPotential::from_joules_per_kilogram(value)
    }

    /// Fugacity f_w of the water in the gas, zero for dry air; ideal gas: x_w p. Real gas: ρ_w R_w T exp(μʳ_w / R_w T) from the residual
    /// chemical potential of IAPWS G8-10. It goes to ρ_w R_w T at low pressure, which is x_w p to 1.7e-5: so far the gas constants of the
    /// publications for water and dry air lie apart. IAPWS G11-15 has it by a virial equation.
    pub fn fugacity_of_water(&self) -> Fugacity<S> {
        let value = with_mixture!(self.formulation, S, M => View::<M<S>, S>::of(*self).fugacity());
        Fugacity::from_pascals(value)
    }

    /// Enhancement factor: x_ws p over the saturation pressure of pure water, stable surface; 1 for the ideal gas.
    ///
    /// # Errors
    /// [`Error::NoValue`] above the boiling temperature.
    pub fn enhancement_factor(&self) -> Result<S, Error> {
        self.value(Quantity::EnhancementFactor)
    }
}

#[cfg(test)]
pub(crate) mod tests;
