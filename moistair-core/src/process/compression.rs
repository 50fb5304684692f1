//! Compressed air: what water does when air is compressed, cooled and expanded.
//!
//! Pressures here are absolute; gauges show the excess over the atmosphere. Vessels and lines under pressure can burst, condensate
//! freezes in outdoor lines and after expansion, and blocks or breaks them: codes for pressure equipment and licensed practice govern, and
//! no figure here is a safety function.

use super::{AirStream, Exchange, WetStream};
use crate::error::Error;
use crate::quantity::{HumidityRatio, MassFlow, Pressure, Temperature};
use crate::real::{Scalar, k};
use crate::state::{AirWithCondensate, Freezing};

/// Air that was brought to another pressure and temperature.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Compressed<S = f64> {
    /// Air and all its water, at the new pressure and temperature, before a separator.
    pub leaving: WetStream<S>,
    /// Work of compression less the heat of cooling, into the air (negative where more heat leaves than work enters). No water: what
    /// condenses goes along.
    pub exchange: Exchange<S>,
    /// Liquid and ice in the leaving air: what a perfect separator drains.
    pub condensate: MassFlow<S>,
}

impl<S: Scalar> Compressed<S> {
    /// The air after a perfect separator: saturated, if anything condensed.
    pub fn separated(&self) -> AirStream<S> {
        self.leaving.without_condensate()
    }
}

/// Brings air to a pressure and temperature, by whatever machine, and lets its water come to equilibrium there: compressor with
/// aftercooler, refrigeration dryer, or expansion. Below the melting temperature what condenses is ice: frost, or a blocked line.
///
/// Bounded work, no search. The exchange counts work and heat together; how much of either depends on the machine.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]: 20 to 1100 kPa absolute, −80 to 150 °C (to 5 MPa and 200 °C with the Helmholtz formulation).
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, compression};
/// let kilopascals = Pressure::from_kilopascals;
/// let outdoor: MoistAir = MoistAir::from_dry_bulb(
///     Temperature::from_celsius(30.0), RelativeHumidity::from_percent(60.0), kilopascals(101.325))?;
/// let intake = AirStream::new(outdoor, MassFlow::from_kilograms_per_second(1.0))?;
/// // To 8 bar and 35 °C behind the aftercooler: two thirds of the water are drained there.
/// let line = compression::to_pressure(&intake.into(), kilopascals(800.0), Temperature::from_celsius(35.0))?;
/// assert!((line.condensate.kilograms_per_hour() - 41.0).abs() < 1.0);
/// // Expanded at the tool, the air is dry.
/// let tool = compression::to_pressure(&line.separated().into(), kilopascals(101.325), Temperature::from_celsius(20.0))?;
/// assert!((0.25..0.35).contains(&tool.separated().air().relative_humidity()?.fraction()));
/// assert!(compression::to_pressure(&intake.into(), kilopascals(2_000.0), Temperature::from_celsius(35.0)).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn to_pressure<S: Scalar>(
    entering: &WetStream<S>,
    pressure: Pressure<S>,
    leaving_temperature: Temperature<S>,
) -> Result<Compressed<S>, Error> {
    let (air, flow) = (entering.air(), entering.dry_air_flow);
    let water = air.total_water();
    let basis = air.air().basis().at_pressure(pressure);
    let leaving = AirWithCondensate::from_dry_bulb_and_water(leaving_temperature, water, Freezing::Equilibrium, basis)?;
    let enthalpy = |air: &AirWithCondensate<S>| air.specific_enthalpy().joules_per_kilogram();
    let ratio = HumidityRatio::kilograms_per_kilogram;
    Ok(Compressed {
        leaving: WetStream { air: leaving, dry_air_flow: flow },
        exchange: Exchange::new(flow * (enthalpy(&leaving) - enthalpy(&air)), k(0.0), k(0.0)),
        condensate: MassFlow::from_kilograms_per_second(flow * (ratio(leaving.liquid()) + ratio(leaving.ice()))),
    })
}
