//! The conductances that explain a measured point.

use super::{
    Arrangement, CoilSurface, CoilWater, CondensateTemperature, WaterCoil, conductance, infeasible, with_water,
};
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::process::AirStream;
use crate::quantity::{Conductance, HeatFlow, Temperature};
use crate::real::{Scalar, k};
use crate::solve;

/// The most transfer units of the air that a rating looks for: no coil has as many.
const MOST_UNITS: f64 = 1e4;

/// Transfer units of the first trial, and doublings from there past the most.
const FIRST_UNITS: f64 = 0.25;
const DOUBLINGS: usize = 16;

/// Share of the span from no to endless surface that a measurement may lie beyond it: there the model itself is no finer.
const NEAR: f64 = 1e-4;

/// What was measured behind a coil.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Measured<S = f64> {
    /// Dry bulb of the leaving air.
    LeavingAir(Temperature<S>),
    /// Temperature of the leaving water.
    LeavingWater(Temperature<S>),
    /// Heat into the air; negative where the coil cools.
    Heat(HeatFlow<S>),
}

/// The conductances of a coil that explain one measured point, at a known ratio of the water side's conductance to the air side's (1 to 5 is
/// common practice, no source); [`with_water`] then predicts other points. At other flows, scale the conductances with them first.
///
/// Bounded work: at most 100 coils, about fifteen. Of several surfaces it is
/// the least; a measurement beyond what endless surface does, by no more than 1e-4 of what it does, is explained by the most.
///
/// # Errors
/// [`Error::Infeasible`] when no conductance explains the measurement, with what a coil without and one with endless surface would give
/// as its limits, and when the coil exchanges nothing; otherwise as [`with_water`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::*};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(27.0), RelativeHumidity::from_percent(50.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(1.0))?;
/// let chilled = |t| CoilWater {
///     flow: MassFlow::from_kilograms_per_second(1.6),
///     entering: Temperature::from_celsius(t),
///     coolant: Coolant::Water,
/// };
/// let measured = |t| Measured::LeavingAir(Temperature::from_celsius(t));
/// let surface = surface_from_rating(&entering, chilled(6.0), measured(11.0), 2.0, Arrangement::Counterflow)?;
/// assert!((surface.air_side.kilowatts_per_kelvin() - 3.0).abs() < 0.1);
/// let warmer = with_water(&entering, surface, chilled(9.0), CondensateTemperature::LeavingAir)?;
/// assert!((13.0..13.8).contains(&warmer.air.leaving.air().dry_bulb().celsius()));
/// // Colder than the water: no coil does that.
/// assert!(surface_from_rating(&entering, chilled(6.0), measured(5.0), 2.0, Arrangement::Counterflow).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn surface_from_rating<S: Scalar>(
    entering: &AirStream<S>,
    water: CoilWater<S>,
    measured: Measured<S>,
    conductance_ratio: S,
    arrangement: Arrangement,
) -> Result<CoilSurface<S>, Error> {
    let ratio = checked(Quantity::ConductanceRatio, conductance_ratio)?;
    let (quantity, wanted) = match measured {
        Measured::LeavingAir(t) => (Quantity::LeavingTemperature, t.celsius()),
        Measured::LeavingWater(t) => (Quantity::CoolantTemperature, t.celsius()),
        Measured::Heat(heat) => (Quantity::HeatFlow, heat.watts()),
    };
    let wanted = checked_for(entering.air().formulation(), quantity, wanted)?;
    let given = |coil: &WaterCoil<S>| match measured {
        Measured::LeavingAir(_) => coil.air.leaving.air().dry_bulb().celsius(),
        Measured::LeavingWater(_) => coil.leaving_water.celsius(),
        Measured::Heat(_) => coil.air.exchange.heat.watts(),
    };
    let one = k::<S>(1.0);
    let capacity = entering.flow()? * entering.air().specific_heat().joules_per_kilogram_kelvin();
    let (_, most) = Quantity::Conductance.limits();
    // By share of the way from no to endless transfer units, x / (1 + x).
    let surface = |way: S| {
        let air_side =
            (capacity * way / (one - way) * (one + one / ratio)).at_most(k::<S>(most).at_most(k::<S>(most) / ratio));
        let conductance = Conductance::from_watts_per_kelvin;
        CoilSurface { air_side: conductance(air_side), water_side: conductance(air_side * ratio), arrangement }
    };
    let outcome =
        |way: S| with_water(entering, surface(way), water, CondensateTemperature::LeavingAir).map(|coil| given(&coil));
    conductance::check(entering, surface(k(0.5)), &water)?;
    let last = k::<S>(MOST_UNITS / (1.0 + MOST_UNITS));
    let none = outcome(k(0.0))?;
    // Where endless surface has no outcome (water would freeze), more of it lies beyond the measured point.
    let endless = outcome(last).unwrap_or_else(|_| match measured {
        Measured::LeavingWater(_) => S::neg_infinity(),
        _ => S::infinity(),
    });
    let sign = if endless > none { one } else { -one };
    let beyond = |way: S| outcome(way).map_or(S::infinity(), |given| sign * (given - wanted));
    // The least surface that does as much: in doubling steps first, since far out the leaving air hardly changes, either way.
    let (mut less, mut more) = (k::<S>(0.0), k::<S>(FIRST_UNITS / (1.0 + FIRST_UNITS)));
    for _ in 0..DOUBLINGS {
        if beyond(more) >= k(0.0) {
            break;
        }
        // From x / (1 + x) to 2 x / (1 + 2 x).
        (less, more) = (more, (more * k(2.0) / (more + one)).at_most(last));
    }
    let near = (endless - none) * sign * k(NEAR);
    let near = if near.is_finite() { near } else { k(0.0) };
    let behind = (none - wanted) * sign;
    if !(endless != none && behind <= k(0.0) && -beyond(more) <= near) {
        return Err(infeasible(quantity, wanted, none.at_most(endless), none.at_least(endless)));
    }
    let way = solve::increasing_by_chords(less, more, S::epsilon() * k(0.25), beyond);
    let found = outcome(way)?;
    // Up to where water would freeze there may be too little.
    let rounding = S::epsilon().sqrt() * (wanted.at_least(-wanted) + none.at_least(-none));
    if (found - wanted) * sign < -rounding - near {
        return Err(infeasible(quantity, wanted, none.at_most(found), none.at_least(found)));
    }
    Ok(surface(way))
}
