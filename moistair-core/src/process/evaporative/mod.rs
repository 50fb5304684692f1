//! Evaporative cooling: direct, indirect, and one behind the other.
//!
//! - [`direct`](fn@direct): wetted media with circulating water, its pump, bleed, carry-over and make-up;
//! - [`indirect`](fn@indirect): a wet secondary stream cools the primary through a wall;
//! - [`two_stage`](fn@two_stage): indirect, then direct.
//!
//! # Accuracy
//! Effectiveness models: what leaves is as good as the test that gave the effectiveness (ASHRAE 133 for direct, ASHRAE 143 for indirect
//! coolers) and holds near its flows. Heat and water close on both streams whatever it is. Not modeled: drying out of the medium, heat through
//! the casing, fouling, fans, how the effectiveness changes with the flows.
//!
//! # Caution
//! Wet media, sumps and droplets can grow and spread *Legionella*, moist ducts grow mould: hygiene rules (such as VDI 6022, ASHRAE 188)
//! and local codes govern; water freezes in winter. Humidity behind a direct stage of 80 to 90 % at most is common practice (no source).
//! Nothing here is a safety function.

mod direct;
mod indirect;
mod two_stage;

pub use super::water_use::{WaterTreatment, WaterUse, cycles_of_concentration, water_use};
pub use direct::{DirectCooled, DirectCooler, DirectStatus, direct};
pub use indirect::{IndirectCooled, IndirectCooler, IndirectEffectiveness, IndirectStatus, indirect};
pub use two_stage::{TwoStageCooled, two_stage};

use super::{AirStream, Exchange, WetStream, infeasible, parts, same_formulation};
