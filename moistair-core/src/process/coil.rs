//! Coils: to a given leaving state, by bypass factor, between two measured states, and from their conductances and their water.
//!
//! A coil with air below freezing on it, or with water that stands still in it, can freeze and burst within minutes: a hard-wired
//! freezestat protects it (trips near 2 to 3 °C, common practice, no source), never a computed temperature. Wet surfaces and pans that do
//! not drain grow mould. Local codes govern.

mod apparatus;
mod conductance;
mod coolant;
mod flows;
mod rating;

pub(super) use apparatus::meetings_along;
pub use apparatus::{Apparatus, ApparatusDewPoints, apparatus_dew_point, apparatus_dew_points};
pub use conductance::{Arrangement, CoilSurface, WaterCoil, with_water};
pub use coolant::{CoilWater, Coolant, LoadByWater, load_by_water};
pub use flows::{CoilFlows, FlowExponents};
pub use rating::{Measured, surface_from_rating};

use super::{AirStream, Exchange, infeasible, melting_temperature, parts, same_formulation};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked, checked_for};
use crate::mixture::Mixture;
use crate::quantity::{HeatFlow, HumidityRatio, MassFlow, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k, power};
use crate::saturation::Surface;
use crate::state::condensate::{condensed_enthalpy, temperature_of_enthalpy};
use crate::state::property::saturates;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// At what temperature the condensate leaves: an assumption. In all it carries about 1 % of the load.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum CondensateTemperature<S = f64> {
    /// That of the leaving air, as the handbook's examples take it.
    #[default]
    LeavingAir,
    /// The apparatus dew point: the stated one, or that of the line between the states.
    Apparatus,
    /// A stated one.
    Given(Temperature<S>),
}

/// Whether and how water condensed.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[repr(i32)]
pub enum CoilRegime {
    /// No condensate.
    Dry = 0,
    /// Liquid condensate.
    Wet = 1,
    /// The surface or the leaving air is below the melting temperature: frost, which no steady state describes.
    Frost = 2,
    /// Liquid condensate on a part of the surface; the part that the air meets first is dry.
    PartlyWet = 3,
}

/// What a cooling coil did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Cooling<S = f64> {
    /// The air that enters.
    pub entering: AirStream<S>,
    /// The air that leaves.
    pub leaving: AirStream<S>,
    /// Heat and water into the air, both negative here.
    pub exchange: Exchange<S>,
    /// Heat taken out by the coil, positive.
    pub cooling_load: HeatFlow<S>,
    /// ṁ (h(t₁, W₂) − h(t₂, W₂)).
    pub sensible: HeatFlow<S>,
    /// The rest of the cooling load.
    pub latent: HeatFlow<S>,
    /// Water that drains, positive.
    pub condensate: MassFlow<S>,
    /// Dry, wet or frosting.
    pub regime: CoilRegime,
}

impl<S: Scalar> Cooling<S> {
    /// Sensible over total; `None` without a load.
    #[must_use]
    pub fn sensible_heat_ratio(&self) -> Option<S> {
        let load = self.cooling_load.watts();
        (load != k(0.0)).then(|| self.sensible.watts() / load)
    }
}

/// Cools to a given leaving state: Q = ṁ ((h₁ − h₂) − (W₁ − W₂) h_c) (ASHRAE Fundamentals 2021 ch. 1, Example 3).
///
/// # Errors
/// [`Error::Infeasible`] when the leaving air is moister or warmer than the entering; [`Error::MixedFormulations`];
/// as [`apparatus_dew_point`] for [`CondensateTemperature::Apparatus`].
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, coil::{self, CondensateTemperature}};
/// let site: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let state = |t, rh| MoistAir::from_dry_bulb(Temperature::from_celsius(t), RelativeHumidity::from_percent(rh), site);
/// let entering = AirStream::from_volume_flow(state(30.0, 50.0)?, VolumeFlow::from_cubic_meters_per_second(5.0))?;
/// let coil = coil::to_state(&entering, &state(10.0, 100.0)?, CondensateTemperature::LeavingAir)?;
/// assert!((coil.cooling_load.kilowatts() - 197.0).abs() < 1.0);
/// assert!(coil::to_state(&entering, &state(29.0, 90.0)?, CondensateTemperature::LeavingAir).is_err()); // moister
/// # Ok::<(), Error>(())
/// ```
pub fn to_state<S: Scalar>(
    entering: &AirStream<S>,
    leaving: &MoistAir<S>,
    condensate: CondensateTemperature<S>,
) -> Result<Cooling<S>, Error> {
    same_formulation(&entering.air(), leaving)?;
    let (celsius, warmest) = (leaving.dry_bulb().celsius(), entering.air().dry_bulb().celsius());
    if celsius > warmest {
        return Err(infeasible(
            Quantity::LeavingTemperature,
            celsius,
            k(leaving.formulation().limits(Quantity::LeavingTemperature).0),
            warmest,
        ));
    }
    let (_, most) = parts(&entering.air());
    let (_, ratio) = parts(leaving);
    if ratio > most {
        return Err(infeasible(Quantity::HumidityRatio, ratio, k(0.0), most));
    }
    let drain = drain_between(entering, leaving, condensate)?;
    Ok(account(entering, leaving, drain))
}

/// A coil known by its apparatus dew point t_a and bypass factor b: W₂ and h₂ lie at b between the surface's and the entering
/// air's (so that heat and water close exactly), the temperature follows. A surface above the dew point leaves the air's
/// water alone.
///
/// # Errors
/// [`Error::Infeasible`] for an apparatus dew point above the entering dry bulb; [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn by_bypass_factor<S: Scalar>(
    entering: &AirStream<S>,
    apparatus_dew_point: Temperature<S>,
    bypass_factor: S,
    condensate: CondensateTemperature<S>,
) -> Result<Cooling<S>, Error> {
    let bypass = checked(Quantity::BypassFactor, bypass_factor)?;
    let air = entering.air();
    let apparatus = checked_for(air.formulation(), Quantity::ApparatusDewPoint, apparatus_dew_point.celsius())?;
    let warmest = air.dry_bulb().celsius();
    if apparatus > warmest {
        return Err(infeasible(
            Quantity::ApparatusDewPoint,
            apparatus,
            k(air.formulation().limits(Quantity::ApparatusDewPoint).0),
            warmest,
        ));
    }
    let leaving = toward_surface(&air, apparatus, bypass)?;
    let drain = drain_temperature(&air, condensate, leaving.dry_bulb().celsius(), apparatus)?;
    let mut cooling = account(entering, &leaving, drain);
    if cooling.regime == CoilRegime::Wet && freezes(&air, apparatus) {
        cooling.regime = CoilRegime::Frost;
    }
    Ok(cooling)
}

/// The bypass factor of a number of equal rows, one behind the other: BFⁿ.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`].
///
/// ```
/// use moistair_core::process::coil::bypass_factor_of_rows;
/// assert_eq!(bypass_factor_of_rows(0.5, 4)?, 0.0625);
/// assert!(bypass_factor_of_rows(1.5, 4).is_err());
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn bypass_factor_of_rows<S: Scalar>(of_one_row: S, rows: u32) -> Result<S, Error> {
    checked(Quantity::BypassFactor, of_one_row).map(|factor| power(factor, rows))
}

/// Air led toward the state at a surface, short of it by the bypass.
fn toward_surface<S: Scalar>(air: &MoistAir<S>, surface: S, bypass: S) -> Result<MoistAir<S>, Error> {
    if bypass == k(1.0) {
        return Ok(*air);
    }
    let pressure = air.pressure().pascals();
    let (enthalpy, ratio) = parts(air);
    let surface_ratio = with_mixture!(air.formulation(), S, M => {
        let saturation = M::<S>::at(surface).saturation(pressure, Surface::Stable);
        S::select(saturates(saturation.mole_fraction), saturation.humidity_ratio, ratio).at_most(ratio)
    });
    let at_surface = MoistAir::assemble(surface, pressure, surface_ratio, air.formulation());
    let between = |at_surface: S, at_inlet: S| at_surface + bypass * (at_inlet - at_surface);
    let target = (between(parts(&at_surface).0, enthalpy), between(surface_ratio, ratio));
    if surface_ratio >= ratio {
        let celsius =
            with_mixture!(air.formulation(), S, M => temperature_of_enthalpy::<M<S>, S>(target.0, pressure, target.1));
        return Ok(MoistAir::assemble(celsius, pressure, ratio, air.formulation()));
    }
    // Nearly saturated air can be led through fog; its droplets drain with the rest.
    let leaving = AirWithCondensate::from_enthalpy_and_water(
        SpecificEnthalpy::from_joules_per_kilogram(target.0),
        HumidityRatio::from_kilograms_per_kilogram(target.1),
        Freezing::Equilibrium,
        air.basis(),
    )?;
    Ok(leaving.air())
}

/// The coil between two measured states. Differences of humidity ratio within `dead_band` are noise of the sensors: the coil then
/// counts as dry and the air keeps the humidity ratio that it enters with, so that noise does not add up to condensate. Only what
/// the leaving air cannot hold at its temperature still condenses. Air that leaves warmer, by noise or by a heater, makes a
/// negative load.
///
/// # Errors
/// [`Error::Infeasible`] when the leaving air is moister by more than the dead band, and as [`to_state`]; [`Error::MixedFormulations`];
/// [`Error::OutOfRange`], [`Error::NotFinite`] for the dead band.
pub fn between<S: Scalar>(
    entering: &AirStream<S>,
    leaving: &MoistAir<S>,
    condensate: CondensateTemperature<S>,
    dead_band: HumidityRatio<S>,
) -> Result<Cooling<S>, Error> {
    same_formulation(&entering.air(), leaving)?;
    let dead_band = checked(Quantity::HumidityRatio, dead_band.kilograms_per_kilogram())?;
    let ((_, before), (_, after)) = (parts(&entering.air()), parts(leaving));
    let (celsius, pressure) = (leaving.dry_bulb().celsius(), leaving.pressure().pascals());
    if before - after > dead_band {
        return Ok(account(entering, leaving, drain_between(entering, leaving, condensate)?));
    }
    if after - before > dead_band {
        return Err(infeasible(Quantity::HumidityRatio, after, k(0.0), before + dead_band));
    }
    let held =
        MoistAir::assemble(celsius, pressure, before.at_most(super::capacity(leaving, celsius)), leaving.formulation());
    Ok(account(entering, &held, drain_between(entering, &held, condensate)?))
}

pub(super) fn account<S: Scalar>(entering: &AirStream<S>, leaving: &MoistAir<S>, drain: S) -> Cooling<S> {
    let (flow, air) = (entering.dry_air_flow, entering.air());
    let ((h1, w1), (h2, w2)) = (parts(&air), parts(leaving));
    let condensate = flow * (w1 - w2);
    let drained = if condensate > k(0.0) {
        condensate * condensed_enthalpy(air.formulation(), drain, air.pressure().pascals(), Surface::Stable)
    } else {
        k(0.0)
    };
    let heat = flow * (h2 - h1) + drained;
    let warm = MoistAir::assemble(air.dry_bulb().celsius(), air.pressure().pascals(), w2, air.formulation());
    let sensible = flow * (parts(&warm).0 - h2);
    let regime = if condensate <= k(0.0) {
        CoilRegime::Dry
    } else if freezes(&air, leaving.dry_bulb().celsius().at_most(drain)) {
        CoilRegime::Frost
    } else {
        CoilRegime::Wet
    };
    Cooling {
        entering: *entering,
        leaving: entering.with_air(*leaving),
        exchange: Exchange::new(heat, -condensate, -drained),
        cooling_load: HeatFlow::from_watts(-heat),
        sensible: HeatFlow::from_watts(sensible),
        latent: HeatFlow::from_watts(-heat - sensible),
        condensate: MassFlow::from_kilograms_per_second(condensate),
        regime,
    }
}

/// Where condensate leaves a coil between two states; of no matter where there is none.
fn drain_between<S: Scalar>(
    entering: &AirStream<S>,
    leaving: &MoistAir<S>,
    choice: CondensateTemperature<S>,
) -> Result<S, Error> {
    let celsius = leaving.dry_bulb().celsius();
    let apparatus = if choice == CondensateTemperature::Apparatus && parts(leaving).1 < parts(&entering.air()).1 {
        apparatus_dew_point(&entering.air(), leaving)?.dew_point.celsius()
    } else {
        celsius
    };
    drain_temperature(leaving, choice, celsius, apparatus)
}

fn drain_temperature<S: Scalar>(
    air: &MoistAir<S>,
    choice: CondensateTemperature<S>,
    leaving: S,
    apparatus: S,
) -> Result<S, Error> {
    match choice {
        CondensateTemperature::LeavingAir => Ok(leaving),
        CondensateTemperature::Apparatus => Ok(apparatus),
        CondensateTemperature::Given(temperature) => {
            checked_for(air.formulation(), Quantity::CondensateTemperature, temperature.celsius())
        }
    }
}

fn freezes<S: Scalar>(air: &MoistAir<S>, celsius: S) -> bool {
    celsius < melting_temperature(air)
}
