//! Every property, written once over mixture and arithmetic, with where it has a value; the checked reader on top.

use crate::bounds::Quantity;
use crate::error::{Error, NoValue};
use crate::mixture::transport::Transport;
use crate::mixture::{Gas, Mixture, Potentials};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Mask, Real, k};
use crate::saturation::Surface;

use super::MoistAir;
use super::property::{dew_point, saturates, saturation_deficit, stable_wet_bulb, wet_bulb};

/// A state with the temperature functions of its mixture at hand.
pub(super) struct View<M, R> {
    pub mixture: M,
    pub air: MoistAir<R>,
}

/// A property, and where it has no value, by the reason.
pub(super) struct Reading<R: Real> {
    value: R,
    dry_air: R::Mask,
    above_boiling: R::Mask,
    above_range: R::Mask,
    below_range: R::Mask,
}

/// What has a value at every state.
impl<R: Real> From<R> for Reading<R> {
    fn from(value: R) -> Self {
        let never = <R::Mask as Mask>::NONE;
        Self { value, dry_air: never, above_boiling: never, above_range: never, below_range: never }
    }
}

impl<R: Real> Reading<R> {
    /// The same conditions for something formed of the value.
    fn map(self, f: impl FnOnce(R) -> R) -> Self {
        Self { value: f(self.value), ..self }
    }
}

impl<R: Real<Mask = bool>> Reading<R> {
    /// The value, or the reason why there is none.
    pub fn checked(self, quantity: Quantity) -> Result<R, Error> {
        let reason = match self {
            Self { dry_air: true, .. } => NoValue::DryAir,
            Self { above_boiling: true, .. } => NoValue::AboveBoiling,
            Self { above_range: true, .. } => NoValue::AboveSurfaceRange,
            Self { below_range: true, .. } => NoValue::BelowSurfaceRange,
            Self { value, .. } => return Ok(value),
        };
        Err(Error::NoValue { quantity, reason })
    }
}

impl<R: Real> MoistAir<R> {
    /// A property that every state has, and that needs nothing of the mixture at its temperature.
    pub(super) fn plain<M: Mixture<R>>(&self, quantity: Quantity) -> Option<R> {
        let ratio = self.humidity_ratio;
        Some(match quantity {
            Quantity::DryBulb => self.celsius,
            Quantity::Pressure => self.pascals,
            Quantity::HumidityRatio => ratio,
            Quantity::WaterMoleFraction => M::mole_fraction(ratio),
            Quantity::VaporPressure => M::mole_fraction(ratio) * self.pascals,
            Quantity::SpecificHumidity => specific_humidity(ratio),
            Quantity::AbsoluteHumidity => absolute_humidity(ratio, &self.gas),
            Quantity::SpecificEnthalpy => self.gas.enthalpy,
            Quantity::SpecificVolume => self.gas.volume,
            Quantity::Density => density(ratio, &self.gas),
            Quantity::SpecificHeat => self.gas.specific_heat,
            Quantity::CompressibilityFactor => self.gas.compressibility,
            _ => return None,
        })
    }
}

impl<M: Mixture<R>, R: Real<Mask = bool>> View<M, R> {
    /// A property, or the reason why it has no value.
    pub fn value(&self, quantity: Quantity) -> Result<R, Error> {
        match self.reading(quantity) {
            Some(reading) => reading.checked(quantity),
            None => Err(Error::UnknownSelector { code: quantity.code() }),
        }
    }
}

impl<M: Mixture<R>, R: Real> View<M, R> {
    pub fn of(air: MoistAir<R>) -> Self {
        Self { mixture: M::at(air.celsius), air }
    }

    /// A property; `None` for a quantity that is none.
    pub fn reading(&self, quantity: Quantity) -> Option<Reading<R>> {
        if let Some(value) = self.air.plain::<M>(quantity) {
            return Some(value.into());
        }
        let (pressure, ratio) = (self.air.pascals, self.air.humidity_ratio);
        Some(match quantity {
            Quantity::RelativeHumidity => self.saturation(Surface::Stable).map(|most| self.mole_fraction() / most),
            Quantity::RelativeHumidityOverLiquid => {
                self.saturation(Surface::Liquid).map(|most| self.mole_fraction() / most)
            }
            Quantity::DegreeOfSaturation => {
                self.saturation(Surface::Stable).map(|most| ratio / M::humidity_ratio(most))
            }
            Quantity::VaporPressureDeficit => {
                self.saturation(Surface::Stable).map(|most| (most - self.mole_fraction()) * pressure)
            }
            Quantity::SpecificEntropy => self.entropy().into(),
            Quantity::SpeedOfSound => self.speed_of_sound().into(),
            Quantity::SpecificHeatAtConstantVolume => self.specific_heat_at_constant_volume().into(),
            Quantity::ChemicalPotentialOfWater => self.potential_of_water(),
            Quantity::ChemicalPotentialOfDryAir => self.potentials().dry_air.into(),
            Quantity::FugacityOfWater => self.fugacity().into(),
            Quantity::DynamicViscosity => self.transport().viscosity.into(),
            Quantity::ThermalConductivity => self.transport().conductivity.into(),
            Quantity::VaporDiffusivity => self.transport().diffusivity.into(),
            Quantity::PrandtlNumber => self.prandtl_number().into(),
            Quantity::SchmidtNumber => self.schmidt_number().into(),
            Quantity::LewisNumber => self.lewis_number().into(),
            Quantity::SaturationPressure => self.mixture.pure_saturation_pressure(pressure, Surface::Stable).into(),
            Quantity::EnhancementFactor => self
                .saturation(Surface::Stable)
                .map(|most| most * pressure / self.mixture.pure_saturation_pressure(pressure, Surface::Stable)),
            Quantity::WetBulb => self.within_surface(
                quantity,
                stable_wet_bulb::<M, R>(self.air.celsius, pressure, ratio, self.air.gas.enthalpy),
                Surface::Stable,
            ),
            Quantity::WetBulbOverLiquid => self.wet_bulb_over(quantity, Surface::Liquid),
            Quantity::WetBulbOverIce => self.wet_bulb_over(quantity, Surface::Ice),
            Quantity::DewPoint => self.saturation_temperature(quantity, Surface::Liquid),
            Quantity::FrostPoint => self.saturation_temperature(quantity, Surface::Ice),
            _ => return None,
        })
    }

    pub fn entropy(&self) -> R {
        self.mixture.entropy(self.air.pascals, self.air.humidity_ratio, &self.air.gas)
    }

    pub fn speed_of_sound(&self) -> R {
        self.mixture.speed_of_sound(self.air.humidity_ratio, &self.air.gas)
    }

    pub fn specific_heat_at_constant_volume(&self) -> R {
        self.mixture.specific_heat_at_constant_volume(self.air.humidity_ratio, &self.air.gas)
    }

    pub fn potentials(&self) -> Potentials<R> {
        self.mixture.potentials(self.air.pascals, self.air.humidity_ratio, &self.air.gas)
    }

    /// None in dry air: −∞, also where the density of the water underflows.
    fn potential_of_water(&self) -> Reading<R> {
        let value = self.potentials().water;
        let present = k::<R>(0.0).lt(self.air.humidity_ratio).and(k::<R>(f64::MIN).lt(value));
        Reading { dry_air: present.not(), ..value.into() }
    }

    pub fn fugacity(&self) -> R {
        self.mixture.fugacity(self.air.pascals, self.air.humidity_ratio, &self.air.gas)
    }

    pub fn transport(&self) -> Transport<R> {
        let air = k::<R>(1.0) / self.air.gas.volume;
        let kelvins = self.air.celsius + k(ZERO_CELSIUS);
        Transport::of(kelvins, self.air.pascals, self.mole_fraction(), air, air * self.air.humidity_ratio)
    }

    /// Pr = c_p μ / λ, c_p per mass of moist air.
    pub fn prandtl_number(&self) -> R {
        let transport = self.transport();
        self.heat_capacity() * transport.viscosity / transport.conductivity
    }

    /// Sc = μ / (ρ D)
    pub fn schmidt_number(&self) -> R {
        let transport = self.transport();
        transport.viscosity / (self.density() * transport.diffusivity)
    }

    /// Le = λ / (ρ c_p D)
    pub fn lewis_number(&self) -> R {
        let transport = self.transport();
        transport.conductivity / (self.density() * self.heat_capacity() * transport.diffusivity)
    }

    fn density(&self) -> R {
        density(self.air.humidity_ratio, &self.air.gas)
    }

    /// Isobaric, per mass of moist air.
    fn heat_capacity(&self) -> R {
        self.air.gas.specific_heat / (self.air.humidity_ratio + k(1.0))
    }

    fn mole_fraction(&self) -> R {
        M::mole_fraction(self.air.humidity_ratio)
    }

    /// Saturation mole fraction at this temperature and pressure.
    fn saturation(&self, surface: Surface) -> Reading<R> {
        let most = self.mixture.saturation(self.air.pascals, surface).mole_fraction;
        let too_cold = match surface {
            Surface::Liquid => self.air.celsius.lt(k(Quantity::DewPoint.limits().0)),
            _ => <R::Mask as Mask>::NONE,
        };
        let above_boiling = saturates(most).not().and(too_cold.not());
        Reading { above_boiling, below_range: too_cold, ..most.into() }
    }

    fn wet_bulb_over(&self, quantity: Quantity, surface: Surface) -> Reading<R> {
        let MoistAir { celsius, pascals, humidity_ratio, gas, .. } = self.air;
        let value = wet_bulb::<M, R>(celsius, pascals, humidity_ratio, gas.enthalpy, surface);
        let reading = self.within_surface(quantity, value, surface);
        if surface != Surface::Ice {
            return reading;
        }
        // The solve means nothing where the wet bulb would be warmer than ice can be.
        let melting = M::melting_temperature(pascals);
        let (at_melting, slope) = saturation_deficit::<M, R>(melting, pascals, humidity_ratio, gas.enthalpy, surface);
        Reading { above_range: reading.above_range.or(rounding::<R>().lt(-(at_melting / slope))), ..reading }
    }

    fn saturation_temperature(&self, quantity: Quantity, surface: Surface) -> Reading<R> {
        let reading = saturation_point::<M, R>(quantity, self.mole_fraction(), self.air.pascals);
        reading.map(|value| self.not_above_dry_bulb(value, surface))
    }

    fn within_surface(&self, quantity: Quantity, value: R, surface: Surface) -> Reading<R> {
        let (min, max) = range::<M, R>(quantity, surface, self.air.pascals);
        within(self.not_above_dry_bulb(value, surface), min, max)
    }

    /// No state holds more vapor than liquid water allows: over liquid neither wet bulb nor dew point exceeds the dry bulb, though
    /// the last bits of a solve may. Over ice they may exceed it truly.
    fn not_above_dry_bulb(&self, value: R, surface: Surface) -> R {
        let below = value.rounded_to(value.at_most(self.air.celsius));
        match surface {
            Surface::Liquid => below,
            Surface::Ice => value,
            Surface::Stable => R::select(M::melting_temperature(self.air.pascals).le(value), below, value),
        }
    }
}

/// Dew or frost point, °C, of a mole fraction at a pressure.
pub(super) fn saturation_point<M: Mixture<R>, R: Real>(
    quantity: Quantity,
    mole_fraction: R,
    pressure: R,
) -> Reading<R> {
    let surface = if quantity == Quantity::FrostPoint { Surface::Ice } else { Surface::Liquid };
    let value = dew_point::<M, R>(mole_fraction, pressure, surface);
    let (min, max) = range::<M, R>(quantity, surface, pressure);
    Reading { dry_air: k::<R>(0.0).lt(mole_fraction).not(), ..within(value, min, max) }
}

/// Where a temperature over a surface has a meaning.
fn range<M: Mixture<R>, R: Real>(quantity: Quantity, surface: Surface, pressure: R) -> (R, R) {
    let (min, max) = M::FORMULATION.limits(quantity);
    let max = k::<R>(max);
    (k(min), if surface == Surface::Ice { M::melting_temperature(pressure).at_most(max) } else { max })
}

/// What a solved temperature may be off, K.
fn rounding<R: Real>() -> R {
    k::<R>(1e-9).at_least(k::<R>(R::EPSILON) * k(512.0))
}

/// A temperature, if it lies between two; rounding that carried it past an end is taken back.
fn within<R: Real>(value: R, min: R, max: R) -> Reading<R> {
    let inside = (min - rounding()).le(value).and(value.le(max + rounding()));
    let above_range = max.lt(value).and(inside.not());
    let below_range = above_range.or(inside).not();
    Reading { above_range, below_range, ..value.rounded_to(value.at_least(min).at_most(max)).into() }
}

/// Per mass of moist air.
pub(super) fn specific_humidity<R: Real>(humidity_ratio: R) -> R {
    humidity_ratio / (k::<R>(1.0) + humidity_ratio)
}

/// Mass of vapor per volume.
pub(super) fn absolute_humidity<R: Real>(humidity_ratio: R, gas: &Gas<R>) -> R {
    humidity_ratio / gas.volume
}

/// Mass of moist air per volume.
pub(super) fn density<R: Real>(humidity_ratio: R, gas: &Gas<R>) -> R {
    (k::<R>(1.0) + humidity_ratio) / gas.volume
}

#[cfg(test)]
mod tests;
