//! Evaporation, drift, blowdown, make-up, and how far the water concentrates: of towers, of humidifiers with bleed, of evaporative coolers.

use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::MassFlow;
use crate::real::{Scalar, k};

/// How a tower, or a humidifier whose water circulates, loses and renews water besides evaporation.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct WaterTreatment<S = f64> {
    /// Drift (carry-over of a humidifier) over the circulating flow. With eliminators 0.000 05 to 0.0002, without up to 0.003 (common practice, no source).
    pub drift_fraction: S,
    /// Concentration of the circulating water over that of the make-up, above one.
    pub cycles_of_concentration: S,
}

/// Evaporation, drift, blowdown and what makes up for them. All positive.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct WaterUse<S = f64> {
    /// Evaporation E.
    pub evaporation: MassFlow<S>,
    /// Drift D.
    pub drift: MassFlow<S>,
    /// Blowdown (bleed) B = E / (C − 1) − D, not below zero.
    pub blowdown: MassFlow<S>,
    /// Make-up M = E + D + B.
    pub make_up: MassFlow<S>,
    /// Drift alone already keeps the concentration below the one wanted: no blowdown is needed.
    pub limited_by_drift: bool,
}

/// Water use for an evaporation, a circulating flow and the treatment; also for humidifiers with bleed.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] at one cycle of concentration, which takes endless blowdown.
///
/// ```
/// use moistair_core::MassFlow;
/// use moistair_core::process::tower::{WaterTreatment, water_use};
/// let flow = MassFlow::<f64>::from_kilograms_per_second;
/// let treatment = WaterTreatment { drift_fraction: 0.002, cycles_of_concentration: 4.0 };
/// let used = water_use(flow(0.346), flow(15.0), treatment)?;
/// assert!((used.make_up.kilograms_per_second() - 0.4613).abs() < 1e-4);
/// assert!(water_use(flow(0.346), flow(15.0), WaterTreatment { cycles_of_concentration: 1.0, ..treatment }).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn water_use<S: Scalar>(
    evaporation: MassFlow<S>,
    circulating: MassFlow<S>,
    treatment: WaterTreatment<S>,
) -> Result<WaterUse<S>, Error> {
    let evaporation = checked(Quantity::WaterFlow, evaporation.kilograms_per_second())?;
    let circulating = checked(Quantity::WaterFlow, circulating.kilograms_per_second())?;
    let fraction = checked(Quantity::DriftFraction, treatment.drift_fraction)?;
    let cycles = checked(Quantity::CyclesOfConcentration, treatment.cycles_of_concentration)?;
    if cycles <= k(1.0) {
        let (_, max) = Quantity::CyclesOfConcentration.limits();
        return Err(Error::Infeasible { quantity: Quantity::CyclesOfConcentration, value: 1.0, min: 1.0, max });
    }
    let drift = circulating * fraction;
    let wanted = evaporation / (cycles - k(1.0)) - drift;
    let blowdown = wanted.at_least(k(0.0));
    let flow = MassFlow::from_kilograms_per_second;
    Ok(WaterUse {
        evaporation: flow(evaporation),
        drift: flow(drift),
        blowdown: flow(blowdown),
        make_up: flow(evaporation + drift + blowdown),
        limited_by_drift: wanted < k(0.0),
    })
}

/// Cycles of concentration as measured: a conductivity or the concentration of a salt that neither precipitates nor is dosed (chloride
/// is usual), of the circulating water over that of the make-up, both in one unit.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] where the circulating water is not the more concentrated, or the
/// make-up has nothing in it.
///
/// ```
/// use moistair_core::process::tower::cycles_of_concentration;
/// assert_eq!(cycles_of_concentration(2000.0, 500.0)?, 4.0);
/// assert!(cycles_of_concentration(400.0, 500.0).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn cycles_of_concentration<S: Scalar>(circulating: S, make_up: S) -> Result<S, Error> {
    let circulating = checked(Quantity::Concentration, circulating)?;
    let make_up = checked(Quantity::Concentration, make_up)?;
    let (min, max) = Quantity::CyclesOfConcentration.limits();
    let cycles = circulating / make_up;
    if k::<S>(min) <= cycles && cycles <= k(max) {
        return Ok(cycles);
    }
    let value = if cycles < k(min) { cycles.to_f64() } else { f64::INFINITY };
    Err(Error::Infeasible { quantity: Quantity::CyclesOfConcentration, value, min, max })
}
