//! What a coil has to take out of an air to supply it.

use crate::basis::Basis;
use crate::bounds::Quantity;
use crate::error::Error;
use crate::process::coil::account;
use crate::process::measured::Sensed;
use crate::process::{AirStream, parts};
use crate::quantity::{RelativeHumidity, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::state::MoistAir;
use crate::state::condensate::condensed_enthalpy;

/// What a cooling coil is to supply.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Supply<S = f64> {
    /// Dry bulb behind the coil.
    pub dry_bulb: Temperature<S>,
    /// Relative humidity at which a wet coil leaves the air: 0.90 to 0.95 (common practice, no source), 1 for full contact.
    pub coil_leaving: RelativeHumidity<S>,
}

impl<S: Scalar> Supply<S> {
    /// The air behind a wet coil.
    pub(super) fn off_coil(&self, basis: Basis<S>) -> Result<MoistAir<S>, Error> {
        MoistAir::from_dry_bulb(self.dry_bulb, self.coil_leaving, basis)
    }
}

/// What the coil takes out.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct CoilLoad<S = f64> {
    /// Heat per mass of dry air, 0 or more.
    pub heat: SpecificEnthalpy<S>,
    /// Whether water condenses.
    pub wet: bool,
}

/// Heat that a coil has to take out of air, per dry air, to supply it: the larger of that of a dry coil, which leaves the water
/// alone, and that of a wet coil, which leaves the air at the stated relative humidity and drains its water at the supply
/// temperature. Nothing where the air needs no cooling.
///
/// Leaves out the coil itself: how wet it truly is depends on its surface and its water ([`crate::process::coil::with_water`]).
///
/// # Errors
/// As [`MoistAir::from_dry_bulb`] for the supply.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::economizer::{Supply, coil_load};
/// let site: Basis = Basis::real_gas(Pressure::from_kilopascals(101.325));
/// let room = MoistAir::from_dry_bulb(Temperature::from_celsius(24.0), RelativeHumidity::from_percent(50.0), site)?;
/// let to = |t, off| coil_load(&room, Supply {
///     dry_bulb: Temperature::from_celsius(t), coil_leaving: RelativeHumidity::from_percent(off) });
/// assert!(to(12.0, 95.0)?.wet);
/// let dry = to(18.0, 95.0)?;
/// assert!(!dry.wet && (dry.heat.kilojoules_per_kilogram() - 6.15).abs() < 0.01);
/// assert!(to(18.0, 300.0).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn coil_load<S: Scalar>(air: &MoistAir<S>, supply: Supply<S>) -> Result<CoilLoad<S>, Error> {
    let off_coil = supply.off_coil(air.basis())?;
    let (heat, leaving) = load(air, &off_coil);
    let wet = heat > k(0.0) && parts(&leaving).1 < parts(air).1;
    Ok(CoilLoad { heat: SpecificEnthalpy::from_joules_per_kilogram(heat), wet })
}

/// The load and its standard uncertainty. The supply is known.
pub(super) fn load_of<S: Scalar>(air: &Sensed<S>, supply: Supply<S>) -> Result<(S, S), Error> {
    let off_coil = supply.off_coil(air.air.basis())?;
    let (heat, leaving) = load(&air.air, &off_coil);
    if heat <= k(0.0) {
        return Ok((k(0.0), k(0.0)));
    }
    let [_, enthalpy_by_dry_bulb, enthalpy_by_humidity] = air.slopes(Quantity::SpecificEnthalpy)?;
    let [_, ratio_by_dry_bulb, ratio_by_humidity] = air.slopes(Quantity::HumidityRatio)?;
    // What a kilogram of water more takes with it: as condensate on a wet coil, with the supply air on a dry one.
    let carried = if parts(&leaving).1 < parts(&air.air).1 {
        let (celsius, pressure) = (leaving.dry_bulb().celsius(), leaving.pressure().pascals());
        condensed_enthalpy(leaving.formulation(), celsius, pressure, Surface::Stable)
    } else {
        leaving.derivatives(Quantity::SpecificEnthalpy, Quantity::HumidityRatio)?.by_second
    };
    let by_dry_bulb = enthalpy_by_dry_bulb - carried * ratio_by_dry_bulb;
    let by_humidity = enthalpy_by_humidity - carried * ratio_by_humidity;
    Ok((heat, air.uncertainty(by_dry_bulb, by_humidity)))
}

/// The load, J per kg of dry air, and what leaves: with its own water from a dry coil, with what the off-coil state holds from a wet one.
fn load<S: Scalar>(air: &MoistAir<S>, off_coil: &MoistAir<S>) -> (S, MoistAir<S>) {
    let ratio = parts(air).1.at_most(parts(off_coil).1);
    let (celsius, pressure) = (off_coil.dry_bulb().celsius(), off_coil.pressure().pascals());
    let leaving = MoistAir::assemble(celsius, pressure, ratio, off_coil.formulation());
    let stream = AirStream { air: *air, dry_air_flow: k(1.0) };
    let heat = account(&stream, &leaving, celsius).cooling_load.watts();
    (heat.at_least(k(0.0)), leaving)
}
