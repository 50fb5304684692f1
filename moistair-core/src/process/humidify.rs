//! Humidifying by steam, by evaporating spray, and by wetted media.
//!
//! Water systems can grow and spread *Legionella*; steam burns and stands under pressure; droplets and condensate in ducts grow
//! mould: hygiene rules and local codes govern design and operation.

use super::{AirStream, Exchange, WetStream, infeasible, parts};
use crate::basis::with_mixture;
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::mixture::{Mixture, RealGas};
use crate::quantity::{HumidityRatio, MassFlow, RelativeHumidity, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::saturation::Surface;
use crate::solve;
use crate::state::condensate::{condensed_enthalpy, temperature_of_enthalpy};
use crate::state::construct::{SATURATION_TOLERANCE, greatest_humidity_ratio, search_ratio};
use crate::state::property::saturates;
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// What a humidifier did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Humidified<S = f64> {
    /// The air that leaves, with what it could not take up as liquid or ice.
    pub leaving: WetStream<S>,
    /// Water into the air and the enthalpy that came with it; no heat.
    pub exchange: Exchange<S>,
    /// Water that became vapor; negative where cold water condensed vapor of the air.
    pub evaporated: MassFlow<S>,
    /// Water that is carried as droplets or ice: condensed steam, or spray that did not evaporate.
    pub carried: MassFlow<S>,
}

/// Enthalpy of saturated steam at a temperature, IAPWS-95, on the datum of liquid water at the triple point (0.04 kJ/kg off that
/// of the ideal gas, which is nothing to the purpose). Throttling keeps it.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`]: 0 to 200 °C.
///
/// ```
/// use moistair_core::{Temperature, process::humidify::saturated_steam_enthalpy};
/// // ASHRAE Fundamentals 2021 ch. 1, Example 5: 2691.07 kJ/kg at 110 °C.
/// let steam = saturated_steam_enthalpy(Temperature::from_celsius(110.0_f64))?;
/// assert!((steam.kilojoules_per_kilogram() - 2691.07).abs() < 0.1);
/// assert!(saturated_steam_enthalpy(Temperature::from_celsius(383.15)).is_err()); // kelvins
/// # Ok::<(), moistair_core::Error>(())
/// ```
pub fn saturated_steam_enthalpy<S: Scalar>(temperature: Temperature<S>) -> Result<SpecificEnthalpy<S>, Error> {
    let celsius = checked(Quantity::WaterTemperature, temperature.celsius())?;
    Ok(SpecificEnthalpy::from_joules_per_kilogram(RealGas::at(celsius).saturated_steam_enthalpy()))
}

/// How much steam air takes up before it saturates.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Absorption<S = f64> {
    /// Up to this flow.
    UpTo(MassFlow<S>),
    /// Any flow within the range of states: hot steam warms the air faster than it moistens it.
    Unlimited,
}

/// Adds steam: W₂ = W₁ + s, h₂ = h₁ + s h_st (ASHRAE Fundamentals 2021 ch. 1, Example 5).
///
/// Steam beyond saturation condenses and is carried: `carried` is then above zero. Humidifying to at most 80 to 90 % relative
/// humidity behind the humidifier is common practice (no source).
///
/// # Errors
/// [`Error::NoFlow`] for steam into no air; [`Error::OutOfRange`], [`Error::NotFinite`]; [`Error::Infeasible`] outside the range of states.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::{AirStream, humidify};
/// let site: Pressure = Pressure::from_kilopascals(101.325);
/// let air = MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), WetBulb::from_celsius(8.0), site)?;
/// let entering = AirStream::new(air, MassFlow::from_kilograms_per_second(2.0))?;
/// let steam = SpecificEnthalpy::from_kilojoules_per_kilogram(2691.07); // saturated at 110 °C
/// let done = humidify::steam(&entering, MassFlow::from_kilograms_per_second(0.015), steam)?;
/// assert!((done.leaving.air().air().dry_bulb().celsius() - 21.0).abs() < 0.5);
/// // Kilojoules where joules are meant: that would be cold water, not steam.
/// let slip = SpecificEnthalpy::from_joules_per_kilogram(2691.07);
/// assert!(humidify::steam(&entering, MassFlow::from_kilograms_per_second(0.015), slip).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn steam<S: Scalar>(
    entering: &AirStream<S>,
    steam: MassFlow<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    add_water(entering, steam, enthalpy)
}

/// Adds steam up to a humidity ratio.
///
/// # Errors
/// As [`steam`]; [`Error::Infeasible`] for a target below what enters.
pub fn steam_to_humidity_ratio<S: Scalar>(
    entering: &AirStream<S>,
    target: HumidityRatio<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let target = checked(Quantity::HumidityRatio, target.kilograms_per_kilogram())?;
    let (_, ratio) = parts(&entering.air());
    if target < ratio {
        let (_, most) = Quantity::HumidityRatio.limits();
        return Err(infeasible(Quantity::HumidityRatio, target, ratio, k(most)));
    }
    let flow = entering.flow()?;
    steam(entering, MassFlow::from_kilograms_per_second(flow * (target - ratio)), enthalpy)
}

/// Adds steam up to a relative humidity (stable surface).
///
/// # Errors
/// As [`steam`]; [`Error::Infeasible`] where the air enters moister, or never gets there.
pub fn steam_to_relative_humidity<S: Scalar>(
    entering: &AirStream<S>,
    target: RelativeHumidity<S>,
    enthalpy: SpecificEnthalpy<S>,
) -> Result<Humidified<S>, Error> {
    let fraction = checked(Quantity::RelativeHumidity, target.fraction())?;
    let steam_enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    let present = entering.air().relative_humidity()?.fraction();
    let out_of_reach = || infeasible(Quantity::RelativeHumidity, fraction, present, k(1.0));
    if !(present <= fraction && fraction <= k(1.0)) {
        return Err(out_of_reach());
    }
    let per_air = first_crossing(&entering.air(), steam_enthalpy, fraction).ok_or_else(out_of_reach)?;
    let flow = entering.flow()?;
    steam(entering, MassFlow::from_kilograms_per_second(flow * per_air), enthalpy)
}

/// The steam flow at which the air first saturates. Not monotone: superheated steam may lead past saturation and out again,
/// or never reach it.
///
/// # Errors
/// [`Error::OutOfRange`], [`Error::NotFinite`], [`Error::NoFlow`].
pub fn steam_limit<S: Scalar>(entering: &AirStream<S>, enthalpy: SpecificEnthalpy<S>) -> Result<Absorption<S>, Error> {
    let enthalpy = checked(Quantity::SteamEnthalpy, enthalpy.joules_per_kilogram())?;
    let flow = entering.flow()?;
    Ok(match first_crossing(&entering.air(), enthalpy, k(1.0)) {
        Some(per_air) => Absorption::UpTo(MassFlow::from_kilograms_per_second(flow * per_air)),
        None => Absorption::Unlimited,
    })
}

/// Points of the logarithmic grid on which the first crossing is looked for.
const CROSSING_GRID: u32 = 64;
/// Smallest amount of steam on it, kg per kg of dry air.
const CROSSING_LEAST: f64 = 1e-6;

/// Steps of golden section: 4e-7 of the interval, and the maximum to the square of that.
const GOLDEN_STEPS: u32 = 30;

/// Steam per dry air at which the relative humidity first reaches a fraction.
fn first_crossing<S: Scalar>(air: &MoistAir<S>, enthalpy: S, fraction: S) -> Option<S> {
    let (h1, w1) = parts(air);
    let pressure = air.pressure().pascals();
    with_mixture!(air.formulation(), S, M => {
        // x − φ x_ws after adding s: negative while the air can take more. `None` where the air gets too hot.
        let excess = |s: S| {
            let ratio = w1 + s;
            let celsius = temperature_of_enthalpy::<M<S>, S>(h1 + s * enthalpy, pressure, ratio);
            let (coldest, warmest) = air.formulation().limits(Quantity::DryBulb);
            let cool_enough = celsius <= k(warmest);
            if !cool_enough {
                return None;
            }
            let saturated = M::<S>::at(celsius.at_least(k(coldest))).saturation(pressure, Surface::Stable).mole_fraction;
            // Where nothing saturates there is no relative humidity to reach.
            let excess = <M<S> as Mixture<S>>::mole_fraction(ratio) - fraction * saturated;
            Some(S::select(saturates(saturated), excess, k(-1.0)))
        };
        let start = air.dry_bulb().celsius();
        let saturated = M::<S>::at(start).saturation(pressure, Surface::Stable).mole_fraction;
        // To rounding: saturated air takes none.
        let close = k::<S>(1.0) - S::epsilon() * k(64.0);
        if saturates(saturated) && <M<S> as Mixture<S>>::mole_fraction(w1) >= fraction * saturated * close {
            return Some(k(0.0));
        }
        let most = k::<S>(Quantity::HumidityRatio.limits().1) - w1;
        let step = ((most / k(CROSSING_LEAST)).ln() / k(f64::from(CROSSING_GRID))).exp();
        let resolution = S::epsilon() * k(CROSSING_LEAST);
        let reached = |s: S| excess(s).is_some_and(|excess| excess >= k(0.0));
        let (mut older, mut below) = ((k::<S>(0.0), -S::infinity()), (k::<S>(0.0), -S::infinity()));
        let mut s = k::<S>(CROSSING_LEAST);
        for _ in 0..=CROSSING_GRID {
            let value = excess(s).unwrap_or(-S::infinity());
            // Between points the line may touch saturation and turn back.
            let turned = older.1 <= below.1 && value < below.1;
            let beyond = if turned { greatest(older.0, s, |s| excess(s).unwrap_or(-S::infinity())) } else { s };
            if reached(beyond) {
                // Zero slope: pure halving, the function has no simple one.
                let excess = |s| (excess(s).unwrap_or(k(1.0)), k(0.0));
                return Some(solve::increasing(older.0, beyond, resolution, excess));
            }
            excess(s)?;
            (older, below, s) = (below, (s, value), s * step);
        }
        None
    })
}

/// Where a function with one maximum between two points is greatest, by golden section.
fn greatest<S: Scalar>(low: S, high: S, f: impl Fn(S) -> S) -> S {
    const GOLDEN: f64 = 0.618_033_988_749_894_8;
    let (mut low, mut high) = (low, high);
    for _ in 0..GOLDEN_STEPS {
        let reach = (high - low) * k(GOLDEN);
        let (left, right) = (high - reach, low + reach);
        if f(left) < f(right) { low = left } else { high = right }
    }
    (low + high) * k(0.5)
}

/// Sprays liquid water of any temperature into the air; what equilibrium does not evaporate is carried as droplets.
///
/// h₂ = h₁ + s h_w: nearly along the wet-bulb line. All of the water comes to equilibrium with all of the air; a washer, which
/// circulates many times more, is not modeled here.
///
/// # Errors
/// As [`steam`].
pub fn spray<S: Scalar>(
    entering: &AirStream<S>,
    water: MassFlow<S>,
    temperature: Temperature<S>,
) -> Result<Humidified<S>, Error> {
    let enthalpy = water_enthalpy(&entering.air(), temperature)?;
    add_water(entering, water, enthalpy)
}

/// Temperature of the water that a wetted medium evaporates.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub enum EvaporatingWater<S = f64> {
    /// The wet bulb, where recirculated water settles: the air then moves exactly along its wet-bulb line.
    #[default]
    AtWetBulb,
    /// Once-through water of a stated temperature.
    Given(Temperature<S>),
}

/// Wetted media or full spray of a stated saturation effectiveness ε = (t₁ − t₂) / (t₁ − t*); the water follows from the heat book.
///
/// # Errors
/// [`Error::Infeasible`] for a wet bulb below the melting temperature (the water would freeze), and for water so hot that this
/// effectiveness would need more vapor than the leaving air holds; [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn evaporative<S: Scalar>(
    entering: &AirStream<S>,
    saturation_effectiveness: S,
    water: EvaporatingWater<S>,
) -> Result<Humidified<S>, Error> {
    let effectiveness = checked(Quantity::SaturationEffectiveness, saturation_effectiveness)?;
    let air = entering.air();
    let (celsius, pressure) = (air.dry_bulb().celsius(), air.pressure().pascals());
    let wet_bulb = air.wet_bulb()?.celsius();
    let melting = with_mixture!(air.formulation(), S, M => <M<S> as Mixture<S>>::melting_temperature(pressure));
    if wet_bulb < melting {
        let (_, warmest) = air.formulation().limits(Quantity::WetBulb);
        return Err(infeasible(Quantity::WetBulb, wet_bulb, melting, k(warmest)));
    }
    let water = match water {
        EvaporatingWater::AtWetBulb => condensed_enthalpy(air.formulation(), wet_bulb, pressure, Surface::Liquid),
        EvaporatingWater::Given(temperature) => water_enthalpy(&air, temperature)?,
    };
    if effectiveness == k(0.0) {
        return add_water(entering, MassFlow::from_kilograms_per_second(effectiveness), water);
    }
    let (h1, w1) = parts(&air);
    let leaving = celsius - effectiveness * (celsius - wet_bulb);
    // h(t₂, W₂) − W₂ h_w = h₁ − W₁ h_w
    let (ratio, limit) = with_mixture!(air.formulation(), S, M => {
        let mixture = M::<S>::at(leaving);
        let limit = greatest_humidity_ratio(&mixture, leaving, pressure);
        let ratio = search_ratio(&mixture, pressure, limit, |w, gas| {
            ((gas.enthalpy - h1) - (w - w1) * water, gas.enthalpy_of_water - water)
        });
        (ratio, limit)
    });
    if ratio > limit + limit * k::<S>(SATURATION_TOLERANCE).at_least(S::epsilon() * k(64.0)) {
        return Err(infeasible(Quantity::HumidityRatio, ratio, w1, limit));
    }
    let evaporated = (ratio - w1).at_least(k(0.0));
    add_water(entering, MassFlow::from_kilograms_per_second(entering.flow()? * evaporated), water)
}

fn water_enthalpy<S: Scalar>(air: &MoistAir<S>, temperature: Temperature<S>) -> Result<S, Error> {
    Ok(crate::state::liquid_water_enthalpy(temperature, air.basis())?.joules_per_kilogram())
}

/// Water of a stated enthalpy into the air, then equilibrium.
fn add_water<S: Scalar>(entering: &AirStream<S>, water: MassFlow<S>, enthalpy: S) -> Result<Humidified<S>, Error> {
    let water = checked(Quantity::WaterFlow, water.kilograms_per_second())?;
    let exchange = Exchange::new(k(0.0), water, water * enthalpy);
    let none = MassFlow::from_kilograms_per_second(k(0.0));
    if water == k(0.0) {
        return Ok(Humidified { leaving: (*entering).into(), exchange, evaporated: none, carried: none });
    }
    let flow = entering.flow()?;
    let (h1, w1) = parts(&entering.air());
    let air = AirWithCondensate::from_enthalpy_and_water(
        SpecificEnthalpy::from_joules_per_kilogram(h1 + water * enthalpy / flow),
        HumidityRatio::from_kilograms_per_kilogram(w1 + water / flow),
        Freezing::Equilibrium,
        entering.air().basis(),
    )?;
    let carried = flow * (air.liquid().kilograms_per_kilogram() + air.ice().kilograms_per_kilogram());
    Ok(Humidified {
        leaving: WetStream { air, dry_air_flow: flow },
        exchange,
        evaporated: MassFlow::from_kilograms_per_second(water - carried),
        carried: MassFlow::from_kilograms_per_second(carried),
    })
}
