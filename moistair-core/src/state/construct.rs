//! A state from its dry bulb and any second property.

use crate::basis::{Basis, with_mixture};
use crate::bounds::Quantity;
use crate::error::{Error, NoValue, checked_for};
use crate::mixture::{Gas, Mixture};
use crate::quantity::*;
use crate::real::{Real, Scalar, k};
use crate::saturation::Surface;
use crate::solve;

use super::MoistAir;
use super::condensate::checked_pressure;
use super::property::saturates;
use super::view::View;

/// A value this close beyond saturation, relative in the humidity ratio, counts as saturated: it is rounding. In single
/// precision it is [`saturation_rounding`].
pub(crate) const SATURATION_TOLERANCE: f64 = 1e-9;

/// A property that fixes a state together with dry bulb and pressure, by its own type. Sealed.
pub trait SecondProperty<S: Scalar>: Copy + sealed::Sealed {
    /// Which property it is.
    const QUANTITY: Quantity;

    /// Its value on the unit of [`Quantity::unit`].
    fn value(self) -> S;
}

mod sealed {
    pub trait Sealed {}
}

macro_rules! second_properties {
    ($($type:ident.$read:ident: $quantity:ident;)*) => {$(
        impl<S> sealed::Sealed for $type<S> {}
        impl<S: Scalar> SecondProperty<S> for $type<S> {
            const QUANTITY: Quantity = Quantity::$quantity;
            fn value(self) -> S {
                self.$read()
            }
        }
    )*};
}

second_properties! {
    RelativeHumidity.fraction: RelativeHumidity;
    RelativeHumidityOverLiquid.fraction: RelativeHumidityOverLiquid;
    WetBulb.celsius: WetBulb;
    WetBulbOverLiquid.celsius: WetBulbOverLiquid;
    WetBulbOverIce.celsius: WetBulbOverIce;
    DewPoint.celsius: DewPoint;
    FrostPoint.celsius: FrostPoint;
    HumidityRatio.kilograms_per_kilogram: HumidityRatio;
    SpecificHumidity.kilograms_per_kilogram: SpecificHumidity;
    AbsoluteHumidity.kilograms_per_cubic_meter: AbsoluteHumidity;
    VaporPressure.pascals: VaporPressure;
    WaterMoleFraction.fraction: WaterMoleFraction;
    DegreeOfSaturation.fraction: DegreeOfSaturation;
    SpecificEnthalpy.joules_per_kilogram: SpecificEnthalpy;
    SpecificVolume.cubic_meters_per_kilogram: SpecificVolume;
    Density.kilograms_per_cubic_meter: Density;
}

impl<S: Scalar> MoistAir<S> {
    /// A state from dry bulb, any second property by its type, and a basis (a pressure, or pressure and formulation).
    ///
    /// Range: dry bulb −80 to 150 °C, 20 to 1100 kPa (200 °C and 5 MPa with the Helmholtz formulation), humidity ratio to 10 kg/kg, vapor up to saturation over liquid water (over
    /// ice below −40 °C, where no liquid lasts). Vapor supersaturated over ice is a valid state. The dry bulb reads back
    /// bit for bit. A second property within 1e-9 beyond saturation in the humidity ratio is taken as saturated (in single precision
    /// within 1.2e-4, and more where vapor outweighs the air).
    ///
    /// # Errors
    /// [`Error::NotFinite`], [`Error::OutOfRange`] for a value outside its declared range, [`Error::Unattainable`] where no state has it,
    /// [`Error::NoValue`] where the property means nothing: relative humidity above boiling, over liquid below −40 °C, frost above melting.
    ///
    /// ```
    /// use moistair_core::{Length, MoistAir, Pressure, RelativeHumidity, Temperature};
    /// let site: Pressure = Pressure::at_elevation(Length::from_meters(1_600.0))?;
    /// let outdoor = MoistAir::from_dry_bulb(Temperature::from_celsius(34.0), RelativeHumidity::from_percent(38.0), site)?;
    /// assert!((outdoor.wet_bulb()?.celsius() - 22.10).abs() < 0.01);
    ///
    /// // A percentage where a fraction is meant is refused, and the message says so.
    /// let slip = MoistAir::from_dry_bulb(Temperature::from_celsius(34.0), RelativeHumidity::from_fraction(38.0), site);
    /// assert!(slip.is_err());
    /// # Ok::<(), moistair_core::Error>(())
    /// ```
    pub fn from_dry_bulb<P: SecondProperty<S>>(
        dry_bulb: Temperature<S>,
        second: P,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        Self::from_dry_bulb_and(dry_bulb, P::QUANTITY, second.value(), basis)
    }

    /// The same with the second property named by a selector, for callers that choose it at run time.
    ///
    /// # Errors
    /// As [`MoistAir::from_dry_bulb`]; [`Error::UnknownSelector`] for a quantity that does not fix a state.
    pub fn from_dry_bulb_and(
        dry_bulb: Temperature<S>,
        quantity: Quantity,
        value: S,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        if !quantity.fixes_state() {
            return Err(Error::UnknownSelector { code: quantity.code() });
        }
        let formulation = basis.formulation();
        let celsius = checked_for(formulation, Quantity::DryBulb, dry_bulb.celsius())?;
        let pressure = checked_pressure(&basis)?;
        let value = checked_for(formulation, quantity, value)?;
        with_mixture!(formulation, S, M => {
            let mixture = M::<S>::at(celsius);
            let (limit, saturated) = capacity(&mixture, celsius, pressure);
            let over_surface = |reason| Err(Error::NoValue { quantity, reason });
            match quantity {
                Quantity::RelativeHumidity | Quantity::RelativeHumidityOverLiquid | Quantity::DegreeOfSaturation
                    if !saturated =>
                {
                    return over_surface(NoValue::AboveBoiling);
                }
                Quantity::RelativeHumidityOverLiquid if !has_liquid(celsius) => {
                    return over_surface(NoValue::BelowSurfaceRange);
                }
                Quantity::FrostPoint | Quantity::WetBulbOverIce
                    if value > <M<S> as Mixture<S>>::melting_temperature(pressure) =>
                {
                    return over_surface(NoValue::AboveSurfaceRange);
                }
                _ => {}
            }
            let ratio = humidity_ratio(&mixture, pressure, quantity, value, limit)
                .ok_or(Error::UnknownSelector { code: quantity.code() })?;
            let inside = |humidity_ratio: S| {
                let gas = mixture.gas(pressure, humidity_ratio);
                Self { celsius, pascals: pressure, humidity_ratio, gas, formulation }
            };
            match settle(ratio, limit, is_searched(quantity)) {
                Some(humidity_ratio) => Ok(inside(humidity_ratio)),
                None => {
                    let end = |humidity_ratio: S| {
                        View { mixture, air: inside(humidity_ratio) }.value(quantity).map(Scalar::to_f64)
                    };
                    let (least, most) = formulation.limits(quantity);
                    // What has no value rises with the vapor: into its range from below, out of it above. If it is past its range at
                    // the dry end, or short of it at the other, no state here has it.
                    let a = match end(k(0.0)) {
                        Err(Error::NoValue { reason: NoValue::DryAir | NoValue::BelowSurfaceRange, .. }) => least,
                        other => other?,
                    };
                    let b = match end(limit) {
                        Err(Error::NoValue { reason: NoValue::AboveSurfaceRange, .. }) => most,
                        other => other?,
                    };
                    let value = value.to_f64();
                    // In dense cold air density hardly changes with the vapor, and its last bits are worth any amount of it.
                    let same = |end: f64| (value - end).abs() <= 32.0 * S::epsilon().to_f64() * end;
                    match quantity {
                        Quantity::Density if same(a) => Ok(inside(k(0.0))),
                        Quantity::Density if same(b) => Ok(inside(limit)),
                        _ => Err(Error::Unattainable { quantity, value, min: a.min(b), max: a.max(b) }),
                    }
                }
            }
        })
    }
}

impl<S: Scalar> MoistAir<S> {
    /// A state from the numbers that define it, as read from a state before and stored, sent or handed through C since. Every state comes
    /// back bit for bit, also one that rounding carried a little beyond saturation.
    ///
    /// # Errors
    /// As [`MoistAir::from_dry_bulb`]: whatever the numbers are, what comes back is a state.
    ///
    /// ```
    /// use moistair_core::{HumidityRatio, MoistAir, Pressure, RelativeHumidity, Temperature};
    /// let site = Pressure::from_kilopascals(95.0);
    /// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(21.0), RelativeHumidity::from_percent(100.0), site)?;
    /// assert_eq!(MoistAir::restore(air.dry_bulb(), air.humidity_ratio(), air.basis())?, air);
    /// assert!(MoistAir::restore(air.dry_bulb(), HumidityRatio::from_grams_per_kilogram(20.0), site).is_err());
    /// # Ok::<(), moistair_core::Error>(())
    /// ```
    pub fn restore(
        dry_bulb: Temperature<S>,
        humidity_ratio: HumidityRatio<S>,
        basis: impl Into<Basis<S>>,
    ) -> Result<Self, Error> {
        let basis = basis.into();
        let air = Self::from_dry_bulb(dry_bulb, humidity_ratio, basis)?;
        let ratio = humidity_ratio.kilograms_per_kilogram();
        if air.humidity_ratio == ratio {
            return Ok(air);
        }
        Ok(Self::assemble(air.celsius, air.pascals, ratio, air.formulation))
    }
}

/// The ratio if it lies between dry and saturated, snapped to the ends when rounding carried it past them.
pub(super) fn settle<S: Scalar>(ratio: S, limit: S, searched: bool) -> Option<S> {
    // In very dry air the last bits of a density or an enthalpy are worth more vapor than any share of it.
    let bits = if searched { S::epsilon() * k(8.0) } else { k(0.0) };
    let tolerance = (limit * k(SATURATION_TOLERANCE)).at_least(saturation_rounding(limit)) + bits;
    if !((-tolerance).le(ratio) && ratio.le(limit + tolerance)) {
        return None;
    }
    Some(ratio.at_least(k(0.0)).at_most(limit))
}

/// How far a process may compute a humidity ratio past saturation, relative: [`SATURATION_TOLERANCE`], in single precision its own rounding.
pub(crate) fn saturation_tolerance<S: Scalar>() -> S {
    k::<S>(SATURATION_TOLERANCE).at_least(S::epsilon() * k(64.0))
}

/// What rounding may carry a saturated humidity ratio past saturation. As much in the mole fraction is more in the humidity
/// ratio where there is little air: d ln W = d ln x / (1 − x).
pub(crate) fn saturation_rounding<S: Scalar>(ratio: S) -> S {
    ratio * (ratio * k(1.6) + k(1.0)) * S::epsilon() * k(1024.0)
}

/// Whether the humidity ratio that goes with a quantity is searched for, not computed.
const fn is_searched(quantity: Quantity) -> bool {
    matches!(
        quantity,
        Quantity::SpecificEnthalpy
            | Quantity::SpecificVolume
            | Quantity::Density
            | Quantity::AbsoluteHumidity
            | Quantity::WetBulb
            | Quantity::WetBulbOverLiquid
            | Quantity::WetBulbOverIce
    )
}

/// Whether liquid water, supercooled if need be, exists at a temperature, °C.
fn has_liquid<R: Real>(celsius: R) -> R::Mask {
    k::<R>(Quantity::DewPoint.limits().0).le(celsius)
}

/// The humidity ratio at saturation over liquid (over ice below −40 °C), or the greatest declared where nothing saturates.
pub(crate) fn greatest_humidity_ratio<M: Mixture<S>, S: Scalar>(mixture: &M, celsius: S, pressure: S) -> S {
    capacity(mixture, celsius, pressure).0
}

/// The same, and whether it is a saturation.
fn capacity<M: Mixture<S>, S: Scalar>(mixture: &M, celsius: S, pressure: S) -> (S, bool) {
    let surface = if has_liquid(celsius) { Surface::Liquid } else { Surface::Ice };
    let saturation = mixture.saturation(pressure, surface);
    let declared = k(Quantity::HumidityRatio.limits().1);
    let saturated = saturates(saturation.mole_fraction);
    (S::select(saturated, saturation.humidity_ratio, declared).at_most(declared), saturated)
}

/// The humidity ratio that goes with a second property; may lie outside what the air can hold. `None` if the quantity does not
/// fix a state.
pub(super) fn humidity_ratio<M: Mixture<R>, R: Real>(
    mixture: &M,
    pressure: R,
    quantity: Quantity,
    value: R,
    limit: R,
) -> Option<R> {
    humidity_ratio_after::<M, R>(M::STEPS.humidity_ratio, mixture, pressure, quantity, value, limit)
}

fn humidity_ratio_after<M: Mixture<R>, R: Real>(
    steps: usize,
    mixture: &M,
    pressure: R,
    quantity: Quantity,
    value: R,
    limit: R,
) -> Option<R> {
    let one = k::<R>(1.0);
    let of_saturation = |surface| mixture.saturation(pressure, surface).mole_fraction;
    let wet_bulb = |surface| {
        let EnergyLine { target, condensed } = EnergyLine::of_wet_bulb::<M>(value, pressure, surface);
        Some(search_ratio_after::<M, R>(steps, mixture, pressure, limit, move |w, gas| {
            (gas.enthalpy - w * condensed - target, gas.enthalpy_of_water - condensed)
        }))
    };
    if let Some(ratio) = vapor_ratio::<M, R>(pressure, quantity, value) {
        return Some(ratio);
    }
    match quantity {
        Quantity::RelativeHumidity => Some(M::humidity_ratio(value * of_saturation(Surface::Stable))),
        Quantity::RelativeHumidityOverLiquid => Some(M::humidity_ratio(value * of_saturation(Surface::Liquid))),
        Quantity::DegreeOfSaturation => Some(value * M::humidity_ratio(of_saturation(Surface::Stable))),
        Quantity::WetBulb => wet_bulb(Surface::Stable),
        Quantity::WetBulbOverLiquid => wet_bulb(Surface::Liquid),
        Quantity::WetBulbOverIce => wet_bulb(Surface::Ice),
        Quantity::SpecificEnthalpy => Some(search_ratio_after::<M, R>(steps, mixture, pressure, limit, |_, gas| {
            (gas.enthalpy - value, gas.enthalpy_of_water)
        })),
        Quantity::SpecificVolume => Some(search_ratio_after::<M, R>(steps, mixture, pressure, limit, |_, gas| {
            (gas.volume - value, gas.volume_of_water)
        })),
        Quantity::Density => Some(search_ratio_after::<M, R>(steps, mixture, pressure, limit, |w, gas| {
            (value * gas.volume - one - w, value * gas.volume_of_water - one)
        })),
        Quantity::AbsoluteHumidity => Some(search_ratio_after::<M, R>(steps, mixture, pressure, limit, |w, gas| {
            (value * gas.volume - w, value * gas.volume_of_water - one)
        })),
        _ => None,
    }
}

/// The humidity ratio that goes with what states the vapor, whatever the dry bulb; `None` for other quantities.
pub(super) fn vapor_ratio<M: Mixture<R>, R: Real>(pressure: R, quantity: Quantity, value: R) -> Option<R> {
    let at_saturation = |surface| M::humidity_ratio(M::at(value).saturation(pressure, surface).mole_fraction);
    Some(match quantity {
        Quantity::HumidityRatio => value,
        Quantity::SpecificHumidity => value / (k::<R>(1.0) - value),
        Quantity::WaterMoleFraction => M::humidity_ratio(value),
        Quantity::VaporPressure => M::humidity_ratio(value / pressure),
        Quantity::DewPoint => at_saturation(Surface::Liquid),
        Quantity::FrostPoint => at_saturation(Surface::Ice),
        _ => return None,
    })
}

/// States of h − W h_c = target.
pub(super) struct EnergyLine<R> {
    pub target: R,
    /// h_c, of the water or ice that the air takes up along the line.
    pub condensed: R,
}

impl<R: Real> EnergyLine<R> {
    /// The states of a thermodynamic wet bulb: h + (W_s − W) h_c = h_s.
    pub fn of_wet_bulb<M: Mixture<R>>(celsius: R, pressure: R, surface: Surface) -> Self {
        let wet = M::at(celsius);
        let saturation = wet.saturation(pressure, surface);
        let saturated = wet.gas(pressure, saturation.humidity_ratio);
        let condensed = saturation.condensed_enthalpy;
        Self { target: saturated.enthalpy - saturation.humidity_ratio * condensed, condensed }
    }
}

/// The root in W of a function that is nearly linear between dry and saturated: the chord, then Newton, kept near the interval.
pub(crate) fn search_ratio<M: Mixture<R>, R: Real>(
    mixture: &M,
    pressure: R,
    limit: R,
    f: impl Fn(R, &Gas<R>) -> (R, R),
) -> R {
    search_ratio_after::<M, R>(M::STEPS.humidity_ratio, mixture, pressure, limit, f)
}

fn search_ratio_after<M: Mixture<R>, R: Real>(
    steps: usize,
    mixture: &M,
    pressure: R,
    limit: R,
    f: impl Fn(R, &Gas<R>) -> (R, R),
) -> R {
    let at = |w| f(w, &mixture.gas(pressure, w));
    let margin = limit * k(0.01);
    let near = |w: R| w.at_least(-margin).at_most(limit + margin);
    let (dry, (saturated, _)) = (at(k(0.0)), at(limit));
    // Over a vanishing interval the chord is noise; the slope at the dry end serves.
    let chord = (saturated - dry.0) / limit;
    let slope = R::select(limit.lt(k(1e-6)), dry.1, chord);
    solve::repeated(steps, near(-(dry.0 / slope)), |w| {
        let (value, slope) = at(w);
        near(w - value / slope)
    })
}

#[cfg(test)]
mod tests;
