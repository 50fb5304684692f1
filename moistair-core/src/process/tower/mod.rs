//! Wet cooling towers in counterflow: water that is cooled by evaporating a little of itself into air.
//!
//! - [`with_air_flow`], [`with_leaving_air`]: the overall balance, whatever the tower;
//! - [`merkel`]: how large a tower a duty takes, and what a tower of that size does, by Merkel's method, the basis of contracts;
//! - [`effectiveness_ntu`]: the same as a heat exchanger of enthalpy, without integration;
//! - [`poppe`]: with the water that evaporates and the state of the air, fog included;
//! - [`fill`]: how the size of a fill depends on the flows, from tests;
//! - [`water_use`], [`basin`]: evaporation, drift, blowdown, make-up, and the salt that stays behind.
//!
//! A size found by one method is used with the same method: Poppe's number for one test is 7 to 15 %
//! above Merkel's (Kloppers and Kröger 2005 say why it must not be mixed with it). Heat is carried at the entering pressure; the water is taken to be one temperature across the tower.
//!
//! # Accuracy
//! Against the published equations: see each method. Against towers: as good as the test behind the transfer number; a few tenths of a
//! kelvin of cold water is the best that any of these methods does. Not modeled: crossflow, natural draft and still fans, by-pass and poor
//! distribution of water, spray and rain zones apart from the fill, plume abatement coils, ice.
//!
//! # Caution
//! Towers spread *Legionella* with their drift if they are not treated, cleaned and fitted with drift eliminators: national hygiene rules
//! (such as VDI 2047-2, HSG 274, ASHRAE 188) and licensed practice govern. Basins and fills freeze in winter well before the mean cold
//! water does. Treatment chemicals and blowdown fall under local codes. Nothing here is a safety function.

pub mod basin;
pub mod effectiveness_ntu;
pub mod fill;
pub mod merkel;
pub mod poppe;

mod balance;
mod march;
mod rating;
mod rule_of_thumb;

pub use balance::{TowerBalance, with_air_flow, with_leaving_air};
pub use rating::{TowerRating, TowerStatus};
pub use rule_of_thumb::evaporation_by_rule_of_thumb;

pub use super::water_use::{WaterTreatment, WaterUse, cycles_of_concentration, water_use};
use super::{AirStream, Exchange, WetStream, film, infeasible, parts, same_formulation};
use crate::bounds::Quantity;
use crate::error::{Error, checked};
use crate::quantity::{MassFlow, Temperature};
use crate::real::Scalar;
use crate::state::MoistAir;

/// The water that a tower cools.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TowerWater<S = f64> {
    /// Flow that enters hot.
    pub flow: MassFlow<S>,
    /// Temperature of the hot water.
    pub hot: Temperature<S>,
    /// Temperature of the cold water.
    pub cold: Temperature<S>,
}

/// The water that enters a tower, where the temperature at which it leaves is asked for.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct HotWater<S = f64> {
    /// Flow.
    pub flow: MassFlow<S>,
    /// Temperature.
    pub temperature: Temperature<S>,
}

/// L/G: the entering water over the dry air. Ratios on moist air are 1 to 2 % smaller.
///
/// # Errors
/// [`Error::NoFlow`], [`Error::OutOfRange`], [`Error::NotFinite`].
pub fn water_to_air_ratio<S: Scalar>(entering: &AirStream<S>, water: MassFlow<S>) -> Result<S, Error> {
    let water = checked(Quantity::WaterFlow, water.kilograms_per_second())?;
    checked(Quantity::WaterToAirRatio, water / entering.flow()?)
}

/// The limit of cold water T*: saturated air of that temperature has the enthalpy of the entering air.
///
/// A little below the wet bulb, by 0.2 K in hot dry air, since the wet bulb counts the enthalpy of the water that evaporates and Merkel's
/// method does not. Below 0 °C it says that the water would freeze before the air stops cooling it.
///
/// # Errors
/// [`Error::Infeasible`] where it would lie below −40 °C or above all water here.
///
/// ```
/// use moistair_core::*;
/// use moistair_core::process::tower::coldest_water;
/// let site = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
/// let dry: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(35.0), RelativeHumidity::from_percent(20.0), site)?;
/// assert!((coldest_water(&dry)?.celsius() - 18.71).abs() < 0.01);
/// let arctic: MoistAir = MoistAir::from_dry_bulb(Temperature::from_celsius(-60.0), RelativeHumidity::from_percent(50.0), site)?;
/// assert!(coldest_water(&arctic).is_err());
/// # Ok::<(), Error>(())
/// ```
pub fn coldest_water<S: Scalar>(entering: &MoistAir<S>) -> Result<Temperature<S>, Error> {
    let site = film::Site::of(entering);
    let (h1, _) = parts(entering);
    let celsius = site.temperature_of_enthalpy(h1).ok_or_else(|| {
        let (least, most) = site.enthalpies();
        infeasible(Quantity::SpecificEnthalpy, h1, least, most)
    })?;
    Ok(Temperature::from_celsius(celsius))
}

#[cfg(test)]
mod tests;
