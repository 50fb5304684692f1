//! Humidifying by steam, by evaporating spray, and by wetted media.
//!
//! - [`Steam`]: what the plant delivers, and what throttling makes of it; [`steam`](fn@steam), [`steam_to_humidity_ratio`],
//!   [`steam_to_relative_humidity`]: adding it; [`steam_limit`]: how much the air takes up;
//! - [`spray`](fn@spray): all of the water comes to equilibrium; [`wash`]: a washer, also with chilled water;
//! - [`evaporative`]: wetted media by their saturation effectiveness. With pump, bleed and carry-over: [`super::evaporative`].
//!
//! # Accuracy
//! The balances are those of the formulation. What they leave out: how long a plume of steam or a spray needs to evaporate, droplets that wet
//! the duct, heat through casing and pipes. An effectiveness is as good as the test behind it (ASHRAE 133 for direct coolers).
//!
//! # Caution
//! Water systems can grow and spread *Legionella*; steam burns and stands under pressure; droplets and condensate in ducts grow
//! mould: hygiene rules (such as VDI 6022, ASHRAE 188) and local codes govern design and operation. Nothing here is a safety function.

mod media;
mod spray;
mod steam;
mod washer;

pub(super) mod contact;

pub use media::{EvaporatingWater, evaporative};
pub use spray::spray;
pub use steam::{
    Absorption, Steam, SteamCondition, ThrottledSteam, saturated_steam_enthalpy, steam, steam_limit,
    steam_to_humidity_ratio, steam_to_relative_humidity,
};
pub use washer::{Moistening, Washed, Washer, wash};

use super::{AirStream, Exchange, WetStream, infeasible, parts};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{HumidityRatio, MassFlow, SpecificEnthalpy, Temperature};
use crate::real::{Scalar, k};
use crate::state::{AirWithCondensate, Freezing, MoistAir};

/// What a humidifier did.
#[derive(Clone, Copy, Debug, PartialEq)]
#[must_use]
pub struct Humidified<S = f64> {
    /// The air that leaves, with what it could not take up as liquid or ice.
    pub leaving: WetStream<S>,
    /// Water into the air and the enthalpy that came with it; heat is that of pump, make-up, spray or wall where there is one, else zero.
    pub exchange: Exchange<S>,
    /// Water that became vapor; negative where cold water condensed vapor of the air.
    pub evaporated: MassFlow<S>,
    /// Water that is carried as droplets or ice: condensed steam, or spray that did not evaporate.
    pub carried: MassFlow<S>,
}

/// Of liquid water, on the datum of the air.
pub(super) fn water_enthalpy<S: Scalar>(air: &MoistAir<S>, temperature: Temperature<S>) -> Result<S, Error> {
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
