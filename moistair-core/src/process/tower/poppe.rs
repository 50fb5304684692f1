//! Poppe's method: the water that evaporates, and the air that leaves, fog included.
//!
//! Heat and vapor leave the film each by its own law, coupled by the Lewis factor, into air that may be unsaturated or full of droplets
//! (Poppe and Rögener 1991, VDI-Wärmeatlas Mi; Kloppers and Kröger 2005, Int. J. Heat Mass Transfer 48:765–777). With dMe = h_D dA / ṁ_w and all
//! enthalpies per mass of dry air:
//!
//! - ṁ_a dW = ṁ_w (W_s − W_d) dMe, where W_d is W in unsaturated air and saturation at the air's temperature in fog;
//! - heat by conduction q = Le (h_s − h − (W_s − W_d) h_v + (W − W_d) h_w), the last term for the droplets;
//! - c_pw dT = (q + (W_s − W_d) (h_v − h_w)) dMe.
//!
//! Both of the published pairs of equations, unsaturated and supersaturated, are these with their W_d. Enthalpy of the air follows from the
//! balance ṁ_a dh = d(ṁ_w h_w), so that heat and water close. Integrated over the number, not over the temperature, for which the equations
//! are singular at the pinch.
//!
//! # Accuracy
//! [`rate`] finds the cold water to 5e-5 K, and the evaporation to 5e-5 of itself, of the exact solution of these equations up to Me 5, L/G 3 and water of 60 °C. It
//! needs a number found by the same method: Poppe's is 7 to 15 % above Merkel's for one test, and for one number its
//! water is some 0.3 K warmer. Where the Lewis factor is not one, heat and vapor settle each at its own rate: from Me 3 on, water
//! that comes in within some 2 K of its limit may leave a larger tower warmer again, by 2.5e-4 K in 15 000 towers. The droplets of fog are taken to move with
//! the air, in equilibrium with it, and to be liquid whatever the temperature.

use core::cell::Cell;

use super::film::Site;
use super::march::{Height, MARCH_STEPS, excess, march, steps};
use super::rating::{Inlet, TowerStatus, checked_number, effectiveness};
use super::{AirStream, Exchange, HotWater, TowerWater, WetStream, infeasible, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::Error;
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, SpecificEnthalpy, Temperature, TemperatureDifference};
use crate::real::{Scalar, k, polynomial};
use crate::saturation::Surface;
use crate::solve;
use crate::state::property::saturates;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// Marches at most for one cold water, each with the evaporation that the last one found; two or three do, save where most of the water
/// evaporates.
pub const PASSES: u32 = 16;

/// To which the cold water is searched for, K: far below what the march is worth.
fn resolution<S: Scalar>() -> S {
    k::<S>(1e-9).at_least(solve::temperature_resolution())
}

/// How long marches are repeated.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Until {
    /// Until it is sure on which side of the solution they are.
    Sign,
    /// Until the evaporation changes nothing any more.
    Settled,
}

/// How heat and vapor share the way from the film into the air.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum Transfer {
    /// Lewis factor of Bosnjakovic, 0.865^(2/3) (r − 1) / ln r with r = (W_s + 0.622) / (W_d + 0.622).
    #[default]
    Bosnjakovic = 0,
    /// Lewis factor one.
    LewisFactorOne = 1,
    /// Lewis factor one, and evaporation left out of the balance of heat and of the water: what Merkel assumes. A check of the one method
    /// against the other; no tower does this.
    EvaporationSuppressed = 2,
}

/// What a tower does to water and air.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct PoppeRating<S = f64> {
    /// The air that leaves, with the droplets of its fog.
    pub leaving: WetStream<S>,
    /// Heat and water into the air; the heat book counts the water as cold water.
    pub exchange: Exchange<S>,
    /// The water, with the temperature at which it leaves.
    pub water: TowerWater<S>,
    /// Water into the air; negative where vapor condenses on the water.
    pub evaporation: MassFlow<S>,
    /// ṁ_w (h_w1 − h_w2); negative where the tower is reversed.
    pub heat_rejected: HeatFlow<S>,
    /// L/G of the entering water.
    pub water_to_air: S,
    /// t₁ − t₂ of the water.
    pub range: TemperatureDifference<S>,
    /// Cold water over the wet bulb of the entering air.
    pub approach: TemperatureDifference<S>,
    /// Which way the heat goes.
    pub status: TowerStatus,
}

impl<S: Scalar> PoppeRating<S> {
    /// Range over range and approach; `None` without either.
    #[must_use]
    pub fn effectiveness(&self) -> Option<S> {
        effectiveness(self.range, self.approach)
    }

    /// Whether the leaving air carries fog: a plume from the outlet on, whatever the air outdoors.
    #[must_use]
    pub fn is_fogged(&self) -> bool {
        self.leaving.air().is_wet()
    }
}

/// The cold water, the leaving air and the evaporation of a tower of a given number.
///
/// # Errors
/// [`Error::Infeasible`] for a number with which the water would freeze (the error holds the greatest that does not), for so little water
/// that all of it would evaporate, and where the leaving air would be no state; [`Error::NoFlow`], [`Error::OutOfRange`],
/// [`Error::NotFinite`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, tower::{HotWater, poppe::{self, Transfer}}};
/// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let outdoor: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(25.0), WetBulb::from_celsius(19.0), site)?;
/// let flow = MassFlow::<f64>::from_kilograms_per_second;
/// let water = HotWater { flow: flow(10.0), temperature: Temperature::from_celsius(38.0) };
/// let rated = poppe::rate(&AirStream::new(outdoor, flow(10.0))?, water, 1.5, Transfer::Bosnjakovic)?;
/// assert!((rated.water.cold.celsius() - 26.487).abs() < 1e-3);
/// assert!((rated.evaporation.kilograms_per_second() - 0.1713).abs() < 1e-4);
/// let little_air = AirStream::new(outdoor, flow(6.0))?;
/// assert!(poppe::rate(&little_air, water, 1.5, Transfer::Bosnjakovic)?.is_fogged());
/// assert!(poppe::rate(&little_air, water, -1.0, Transfer::Bosnjakovic).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn rate<S: Scalar>(
    entering: &AirStream<S>,
    water: HotWater<S>,
    number: S,
    transfer: Transfer,
) -> Result<PoppeRating<S>, Error> {
    rate_in_steps(entering, water, number, transfer, MARCH_STEPS)
}

pub(super) fn rate_in_steps<S: Scalar>(
    entering: &AirStream<S>,
    water: HotWater<S>,
    number: S,
    transfer: Transfer,
    least_steps: u32,
) -> Result<PoppeRating<S>, Error> {
    let number = checked_number(number)?;
    let inlet = Inlet::new(entering, water)?;
    let column = Column::new(&inlet, transfer, least_steps);
    if number == k(0.0) {
        return column.rating(inlet.hot, parts(&entering.air()).1);
    }
    let limit = column.limit()?;
    inlet.refuse_frost(limit, number, || column.number(inlet.freezing(), limit).ok())?;
    let cold = inlet.search(limit, resolution(), |cold| column.climb(cold, number, Until::Sign).excess);
    let humidity_ratio = column.climb(cold, number, Until::Settled).humidity_ratio;
    if column.flow.get() <= column.least_flow() {
        let (least, most) = Quantity::WaterToAirRatio.limits();
        return Err(infeasible(Quantity::WaterToAirRatio, inlet.water_to_air, k(least), k(most)));
    }
    column.rating(cold, humidity_ratio)
}

/// The number that a duty takes, by Poppe's equations: for tests of fills.
///
/// # Errors
/// [`Error::Infeasible`] for water that is not cooled, for cold water that no number up to the greatest reaches with these flows;
/// otherwise as [`rate`].
pub fn number<S: Scalar>(entering: &AirStream<S>, water: TowerWater<S>, transfer: Transfer) -> Result<S, Error> {
    let inlet = Inlet::new(entering, HotWater { flow: water.flow, temperature: water.hot })?;
    let cold = inlet.site.checked_water(water.cold)?;
    if inlet.hot < cold {
        let (min, max) = Quantity::TowerRange.limits();
        return Err(infeasible(Quantity::TowerRange, inlet.hot - cold, k(min), k(max)));
    }
    if inlet.hot == cold {
        return Ok(k(0.0));
    }
    let column = Column::new(&inlet, transfer, MARCH_STEPS);
    let limit = column.limit()?;
    if cold <= limit {
        return Err(infeasible(Quantity::WaterTemperature, cold, limit, inlet.hot));
    }
    column.number(cold, limit)
}

/// A tower from the cold water up.
struct Column<'a, S> {
    inlet: &'a Inlet<S>,
    transfer: Transfer,
    least_steps: u32,
    air: MoistAir<S>,
    enthalpy: S,
    humidity_ratio: S,
    /// Cold water per dry air, as the last march left it.
    flow: Cell<S>,
}

/// What a march arrives at.
#[derive(Clone, Copy)]
struct Top<S> {
    excess: S,
    humidity_ratio: S,
}

/// At one height: how the film drives.
struct Drive<S> {
    /// c_pw dT/dMe
    heat: S,
    /// W_s − W_d
    vapor: S,
}

impl<'a, S: Scalar> Column<'a, S> {
    fn new(inlet: &'a Inlet<S>, transfer: Transfer, least_steps: u32) -> Self {
        let air = inlet.entering.air();
        let (enthalpy, humidity_ratio) = parts(&air);
        Self { inlet, transfer, least_steps, air, enthalpy, humidity_ratio, flow: Cell::new(inlet.water_to_air) }
    }

    /// The water temperature that the entering air does not change: the wet bulb, where the Lewis factor is one.
    fn limit(&self) -> Result<S, Error> {
        let heat = |celsius: S| {
            let water = self.inlet.site.water_enthalpy(celsius);
            self.drive(celsius, water, self.enthalpy, self.humidity_ratio).heat
        };
        let (coldest, warmest) = (Site::<S>::coldest(), self.inlet.site.warmest());
        let (low, high) = (heat(coldest), heat(warmest));
        if low >= k(0.0) {
            return Ok(coldest);
        }
        if high <= k(0.0) {
            return Err(infeasible(Quantity::WaterTemperature, self.inlet.hot, coldest, warmest));
        }
        Ok(solve::between((coldest, low), (warmest, high), solve::temperature_resolution(), heat))
    }

    /// The driving forces between water and air, with the enthalpy of the water.
    fn drive(&self, celsius: S, water_enthalpy: S, enthalpy: S, humidity_ratio: S) -> Drive<S> {
        let film = self.inlet.site.film(celsius);
        let vapor_in_air = self.vapor(enthalpy, humidity_ratio);
        let vapor = film.humidity_ratio - vapor_in_air;
        let droplets = humidity_ratio - vapor_in_air;
        let whole = film.enthalpy - enthalpy;
        if self.transfer == Transfer::EvaporationSuppressed {
            return Drive { heat: whole, vapor };
        }
        let sensible = whole - vapor * film.vapor_enthalpy + droplets * water_enthalpy;
        let lewis = match self.transfer {
            Transfer::Bosnjakovic => bosnjakovic(film.humidity_ratio, vapor_in_air),
            _ => k(1.0),
        };
        Drive { heat: lewis * sensible + vapor * (film.vapor_enthalpy - water_enthalpy), vapor }
    }

    /// W_d, the vapor of air with an enthalpy and water: all of it, or what fog leaves.
    fn vapor(&self, enthalpy: S, humidity_ratio: S) -> S {
        if self.is_far_from_fog(enthalpy, humidity_ratio) {
            return humidity_ratio;
        }
        AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(enthalpy),
            HumidityRatio::from_kilograms_per_kilogram(humidity_ratio),
            Freezing::Supercooled,
            self.inlet.site.basis(),
        )
        // A trial far off the solution may leave the range of states.
        .map_or(humidity_ratio, |wet| wet.air().humidity_ratio().kilograms_per_kilogram())
    }

    /// Spares most heights the equilibrium: one step from the temperature of the entering air, whose heat capacity hardly changes,
    /// and half a kelvin in hand.
    fn is_far_from_fog(&self, enthalpy: S, humidity_ratio: S) -> bool {
        let (entering, pressure) = (self.air.dry_bulb().celsius(), self.air.pressure().pascals());
        with_mixture!(self.air.formulation(), S, M => {
            let gas = M::<S>::at(entering).gas(pressure, humidity_ratio);
            let rise = (enthalpy - gas.enthalpy) / gas.specific_heat;
            let colder = entering + rise - k(0.5);
            let near = k::<S>(-40.0) <= rise && rise <= k(40.0);
            near && Site::<S>::coldest() <= colder && colder <= self.inlet.site.warmest() && {
                let saturation = M::<S>::at(colder).saturation(pressure, Surface::Liquid);
                saturates(saturation.mole_fraction) && humidity_ratio < saturation.humidity_ratio
            }
        })
    }

    /// The march from the cold water, of which `flow` leaves per dry air.
    fn climb_from(&self, cold: S, number: S, flow: S) -> Top<S> {
        let inlet = self.inlet;
        let heat_capacity = inlet.site.water_heat_capacity(inlet.hot, cold);
        let cold_enthalpy = inlet.site.water_enthalpy(cold);
        let foot = Height { celsius: cold, humidity_ratio: self.humidity_ratio };
        let top = march(foot, inlet.hot, number, steps(self.least_steps, number, inlet.water_to_air), |at| {
            let rise = heat_capacity * (at.celsius - cold);
            let water_enthalpy = cold_enthalpy + rise;
            let taken = at.humidity_ratio - self.humidity_ratio;
            let (water, enthalpy) = match self.transfer {
                Transfer::EvaporationSuppressed => (inlet.water_to_air, inlet.water_to_air * rise),
                _ => (flow + taken, flow * rise + taken * water_enthalpy),
            };
            let drive = self.drive(at.celsius, water_enthalpy, self.enthalpy + enthalpy, at.humidity_ratio);
            Height { celsius: drive.heat / heat_capacity, humidity_ratio: water * drive.vapor }
        });
        Top { excess: excess(cold, inlet.hot, top), humidity_ratio: top.humidity_ratio }
    }

    /// The number with which the water leaves at `cold`, above the limit.
    fn number(&self, cold: S, limit: S) -> Result<S, Error> {
        let greatest = k::<S>(Quantity::MerkelNumber.limits().1);
        let at = |number| self.climb(cold, number, Until::Sign).excess;
        let most = at(greatest);
        if most <= k(0.0) {
            return Err(infeasible(Quantity::WaterTemperature, cold, limit, self.inlet.hot));
        }
        Ok(solve::between((k(0.0), k(-1.0)), (greatest, most), resolution(), at))
    }

    /// The march from cold water whose flow is what the evaporation on the way leaves: marches again with what the last one left, from what
    /// the last call left on.
    fn climb(&self, cold: S, number: S, until: Until) -> Top<S> {
        let mut before = S::infinity();
        let mut top = Top { excess: before, humidity_ratio: self.humidity_ratio };
        for pass in 0..PASSES {
            let flow = self.flow.get();
            top = self.climb_from(cold, number, flow);
            note(pass + 1);
            if self.transfer == Transfer::EvaporationSuppressed {
                break;
            }
            let left = self.inlet.water_to_air - (top.humidity_ratio - self.humidity_ratio);
            let left = left.at_least(self.least_flow());
            self.flow.set(left);
            let shift = magnitude(top.excess - before);
            // Each march shifts the result by a tenth or so of what the last one did.
            let sign_is_sure = until == Until::Sign && shift <= magnitude(top.excess) * k(0.25);
            if sign_is_sure || magnitude(left - flow) <= self.inlet.water_to_air * S::epsilon() * k(1024.0) {
                break;
            }
            before = top.excess;
        }
        top
    }

    /// Less water than this has all but evaporated.
    fn least_flow(&self) -> S {
        self.inlet.water_to_air * k(1e-3)
    }

    /// The result: the leaving enthalpy from the balance of the ends, so that heat and water close whatever the march left over.
    fn rating(&self, cold: S, humidity_ratio: S) -> Result<PoppeRating<S>, Error> {
        let inlet = self.inlet;
        let air = inlet.entering.dry_air_flow;
        let flow = inlet.water.flow.kilograms_per_second();
        let cold_enthalpy = inlet.site.water_enthalpy(cold);
        let drop = inlet.site.water_enthalpy(inlet.hot) - cold_enthalpy;
        let taken = humidity_ratio - self.humidity_ratio;
        let carried = match self.transfer {
            Transfer::EvaporationSuppressed => k(0.0),
            _ => taken * cold_enthalpy,
        };
        let leaving = AirWithCondensate::from_enthalpy_and_water(
            SpecificEnthalpy::from_joules_per_kilogram(self.enthalpy + inlet.water_to_air * drop + carried),
            HumidityRatio::from_kilograms_per_kilogram(humidity_ratio),
            Freezing::Supercooled,
            inlet.site.basis(),
        )?;
        let cold = Temperature::from_celsius(cold);
        let range = inlet.water.temperature - cold;
        Ok(PoppeRating {
            leaving: WetStream { air: leaving, dry_air_flow: air },
            exchange: Exchange::new(flow * drop, air * taken, air * carried),
            water: TowerWater { flow: inlet.water.flow, hot: inlet.water.temperature, cold },
            evaporation: MassFlow::from_kilograms_per_second(air * taken),
            heat_rejected: HeatFlow::from_watts(flow * drop),
            water_to_air: inlet.water_to_air,
            range,
            approach: cold - Temperature::from(self.air.wet_bulb()?),
            status: if range.kelvins() < k(0.0) { TowerStatus::Reversed } else { TowerStatus::Cooling },
        })
    }
}

fn magnitude<S: Scalar>(x: S) -> S {
    x.at_least(-x)
}

/// For the test of the cap: the marches so far, and the most for one cold water.
fn note(_pass: u32) {
    #[cfg(test)]
    super::tests::MARCHES.with(|marches| {
        let (all, most) = marches.get();
        marches.set((all + 1, most.max(_pass)));
    });
}

/// 0.865^(2/3) (r − 1) / ln r.
fn bosnjakovic<S: Scalar>(film: S, air: S) -> S {
    let beyond = (film - air) / (air + k(0.622));
    let mean = if -beyond < k(1e-3) && beyond < k(1e-3) {
        // x / ln(1 + x)
        polynomial(beyond, [1.0, 1.0 / 2.0, -1.0 / 12.0, 1.0 / 24.0, -19.0 / 720.0])
    } else {
        beyond / (beyond + k(1.0)).ln()
    };
    mean * k(0.90784297711014495)
}
