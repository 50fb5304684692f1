//! What a tower of a given size does, and what the methods share to find it.

use super::{AirStream, HotWater, film::Site, infeasible, parts, water_to_air_ratio};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HeatFlow, SpecificEnthalpy, Temperature, TemperatureDifference};
use crate::real::{Scalar, k};
use crate::solve;

use super::TowerWater;

/// Which way the heat goes.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum TowerStatus {
    /// The air cools the water.
    #[default]
    Cooling = 0,
    /// The water enters colder than the limit that the air sets, and is warmed.
    Reversed = 1,
}

/// What a tower does to the water, by a method that follows the enthalpy of the air alone.
///
/// The leaving air is known by its enthalpy only. Evaporation and a leaving state take either the assumption that it is saturated,
/// [`with_air_flow`](super::with_air_flow) on [`TowerRating::water`], or [`poppe`](super::poppe).
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct TowerRating<S = f64> {
    /// The water, with the temperature at which it leaves.
    pub water: TowerWater<S>,
    /// Heat that the water gives up, ṁ_w (h_w1 − h_w2); negative where the tower is reversed.
    pub heat_rejected: HeatFlow<S>,
    /// Enthalpy of the leaving air, h₁ + heat / ṁ_a.
    pub leaving_enthalpy: SpecificEnthalpy<S>,
    /// L/G.
    pub water_to_air: S,
    /// t₁ − t₂ of the water.
    pub range: TemperatureDifference<S>,
    /// Cold water over the wet bulb of the entering air.
    pub approach: TemperatureDifference<S>,
    /// Which way the heat goes.
    pub status: TowerStatus,
}

impl<S: Scalar> TowerRating<S> {
    pub(super) fn new(inlet: &Inlet<S>, cold: S, status: TowerStatus) -> Result<Self, Error> {
        let air = inlet.entering.air();
        let (hot, cold_enthalpy) = (inlet.site.water_enthalpy(inlet.hot), inlet.site.water_enthalpy(cold));
        let drop = hot - cold_enthalpy;
        let cold = Temperature::from_celsius(cold);
        Ok(Self {
            water: TowerWater { flow: inlet.water.flow, hot: inlet.water.temperature, cold },
            heat_rejected: HeatFlow::from_watts(inlet.water.flow.kilograms_per_second() * drop),
            leaving_enthalpy: SpecificEnthalpy::from_joules_per_kilogram(parts(&air).0 + inlet.water_to_air * drop),
            water_to_air: inlet.water_to_air,
            range: inlet.water.temperature - cold,
            approach: cold - Temperature::from(air.wet_bulb()?),
            status,
        })
    }

    /// Range over range and approach; `None` without either.
    #[must_use]
    pub fn effectiveness(&self) -> Option<S> {
        effectiveness(self.range, self.approach)
    }
}

/// Range over range and approach; `None` without either.
pub(super) fn effectiveness<S: Scalar>(
    range: TemperatureDifference<S>,
    approach: TemperatureDifference<S>,
) -> Option<S> {
    let whole = range.kelvins() + approach.kelvins();
    (whole != k(0.0)).then(|| range.kelvins() / whole)
}

/// What enters a tower, checked.
pub(super) struct Inlet<S> {
    pub entering: AirStream<S>,
    pub water: HotWater<S>,
    pub site: Site<S>,
    pub hot: S,
    pub water_to_air: S,
}

impl<S: Scalar> Inlet<S> {
    pub fn new(entering: &AirStream<S>, water: HotWater<S>) -> Result<Self, Error> {
        let site = Site::of(&entering.air());
        let hot = site.checked_water(water.temperature)?;
        let water_to_air = water_to_air_ratio(entering, water.flow)?;
        Ok(Self { entering: *entering, water, site, hot, water_to_air })
    }

    /// The cold water, where the `excess` of a march from it with the given number vanishes.
    pub fn cold_water(&self, limit: S, number: S, resolution: S, excess: impl Fn(S, S) -> S) -> Result<S, Error> {
        self.refuse_frost(limit, number, || {
            let most = excess(self.freezing(), number);
            // So large a tower would freeze the water, or one in between would.
            (most > k(0.0)).then(|| {
                solve::between((k(0.0), k(-1.0)), (number, most), resolution, |number| excess(self.freezing(), number))
            })
        })?;
        Ok(self.search(limit, resolution, |cold| excess(cold, number)))
    }

    /// Between the limit, where nothing happens whatever the size, and the hot water, next to which any tower does more than is asked; not
    /// below freezing.
    pub fn search(&self, limit: S, resolution: S, excess: impl Fn(S) -> S) -> S {
        let (least, most) = (k::<S>(-1.0), k::<S>(1.0));
        if self.hot < limit {
            return solve::between((self.hot, least), (limit, most), resolution, |cold| -excess(cold));
        }
        solve::between((limit.at_least(self.freezing()), least), (self.hot, most), resolution, excess)
    }

    /// Refuses a number larger than the one with which the water leaves at freezing; `largest` finds that, if it is not larger anyway.
    pub fn refuse_frost(&self, limit: S, number: S, largest: impl FnOnce() -> Option<S>) -> Result<(), Error> {
        let freezing = self.freezing();
        if freezing <= limit {
            return Ok(());
        }
        let largest = if freezing < self.hot { largest() } else { Some(k(0.0)) };
        match largest {
            Some(largest) if largest < number => Err(infeasible(Quantity::MerkelNumber, number, k(0.0), largest)),
            _ => Ok(()),
        }
    }

    /// The least temperature of water.
    pub fn freezing(&self) -> S {
        k(Quantity::WaterTemperature.limits().0)
    }
}

/// A transfer number, checked.
pub(super) fn checked_number<S: Scalar>(number: S) -> Result<S, Error> {
    checked(Quantity::MerkelNumber, number)
}
