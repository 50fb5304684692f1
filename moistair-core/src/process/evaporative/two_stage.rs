//! Indirect and then direct evaporative cooling.

use super::{AirStream, DirectCooled, DirectCooler, IndirectCooled, IndirectCooler, direct, indirect};
use crate::error::Error;
use crate::quantity::MassFlow;
use crate::real::Scalar;

/// What a two-stage cooler did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct TwoStageCooled<S = f64> {
    /// The first stage, with the books of both streams.
    pub indirect: IndirectCooled<S>,
    /// The second stage, on the primary air that the first leaves.
    pub direct: DirectCooled<S>,
    /// Water that evaporates in both stages.
    pub evaporated: MassFlow<S>,
}

/// Cools the primary air by [`indirect`](super::indirect()), then by [`direct`](super::direct()).
///
/// Colder than the wet bulb that entered, since the first stage lowers it; moister than after the first stage alone.
///
/// # Errors
/// Those of either stage.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, evaporative::*, humidify::EvaporatingWater};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(38.0), RelativeHumidity::from_percent(15.0), site)?;
/// let stream = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let (first, second) = (
///     IndirectCooler {
///         effectiveness: IndirectEffectiveness::OfWetBulb(0.6),
///         exhaust_humidity: RelativeHumidity::from_percent(95.0),
///         pump_heat: HeatFlow::from_watts(100.0),
///         water: EvaporatingWater::AtWetBulb,
///     },
///     DirectCooler {
///         saturation_effectiveness: 0.9,
///         circulating: MassFlow::from_kilograms_per_second(0.5),
///         pump_heat: HeatFlow::from_watts(100.0),
///         make_up: EvaporatingWater::AtWetBulb,
///         treatment: WaterTreatment { drift_fraction: 0.0, cycles_of_concentration: 3.0 },
///     },
/// );
/// let done = two_stage(&stream, &stream, first, second)?;
/// assert!(done.direct.air.leaving.air().air().dry_bulb().celsius() < air.wet_bulb()?.celsius());
/// let none = AirStream::new(air, MassFlow::from_kilograms_per_second(0.0))?;
/// assert!(two_stage(&stream, &none, first, second).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn two_stage<S: Scalar>(
    primary: &AirStream<S>,
    secondary: &AirStream<S>,
    first: IndirectCooler<S>,
    second: DirectCooler<S>,
) -> Result<TwoStageCooled<S>, Error> {
    let cooled = indirect(primary, secondary, first)?;
    let moistened = direct(&cooled.primary, second)?;
    Ok(TwoStageCooled {
        indirect: cooled,
        direct: moistened,
        evaporated: cooled.secondary.evaporated + moistened.air.evaporated,
    })
}
