//! Cooling towers of a given size: how large a duty takes, and what a tower does.

use moistair_core::Length;
use moistair_core::columns::NAN;
use moistair_core::process::tower::fill::{FillLaw, FillTest};
use moistair_core::process::tower::merkel::{self, MerkelNumber, Pinch, Quadrature};
use moistair_core::process::tower::poppe::{self, PoppeRating, Transfer};
use moistair_core::process::tower::{self, HotWater, TowerRating, effectiveness_ntu};

use super::stream::{moistair_exchange, moistair_stream, moistair_wet_stream};
use super::tower::moistair_tower_water;
use super::{celsius, finite, mass_flow};
use crate::memory::{Answer, answer, read};
use crate::state::moistair_state;
use crate::status::{Failure, moistair_error};

/// Merkel integral: eight points of Gauss and Legendre.
pub const MOISTAIR_QUADRATURE_GAUSS_LEGENDRE: i32 = 0;
/// Merkel integral: the same on seven parts of the range, for duties next to the limit or the pinch.
pub const MOISTAIR_QUADRATURE_GAUSS_LEGENDRE_GRADED: i32 = 1;
/// Merkel integral: the four-point rule of the trade, for comparison with contracts.
pub const MOISTAIR_QUADRATURE_FOUR_POINT: i32 = 2;

/// Poppe: Lewis factor of Bosnjakovic.
pub const MOISTAIR_TRANSFER_BOSNJAKOVIC: i32 = 0;
/// Poppe: Lewis factor one.
pub const MOISTAIR_TRANSFER_LEWIS_FACTOR_ONE: i32 = 1;
/// Poppe: evaporation left out of the balances, as Merkel does; a check of the methods, no tower.
pub const MOISTAIR_TRANSFER_EVAPORATION_SUPPRESSED: i32 = 2;

/// The air cools the water.
pub const MOISTAIR_TOWER_COOLING: i32 = 0;
/// The water enters colder than the limit that the air sets, and is warmed.
pub const MOISTAIR_TOWER_REVERSED: i32 = 1;

/// The water that enters a tower.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_hot_water {
    /// Flow [kg/s].
    pub flow: f64,
    /// Temperature [°C], 0 to 200.
    pub temperature: f64,
}

/// The least air that can do a duty.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_pinch {
    /// The greatest L/G [1]; 20 where nothing pinches.
    pub water_to_air: f64,
    /// Water temperature where the enthalpies of air and film meet [°C].
    pub temperature: f64,
}

/// How much transfer a duty takes.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_merkel_number {
    /// Me = K a V / L [1].
    pub number: f64,
    /// L/G, water over dry air [1].
    pub water_to_air: f64,
    /// Where the driving force would vanish with less air.
    pub pinch: moistair_pinch,
    /// Heat that the water gives up [W].
    pub heat_rejected: f64,
    /// Enthalpy of the leaving air [J/kg dry air].
    pub leaving_enthalpy: f64,
}

/// What a tower does to the water.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_tower_rating {
    /// The water, with the temperature at which it leaves.
    pub water: moistair_tower_water,
    /// Heat that the water gives up [W]; negative where the tower is reversed.
    pub heat_rejected: f64,
    /// Enthalpy of the leaving air [J/kg dry air].
    pub leaving_enthalpy: f64,
    /// L/G, water over dry air [1].
    pub water_to_air: f64,
    /// Hot less cold water temperature [K].
    pub range: f64,
    /// Cold water over the wet bulb of the entering air [K].
    pub approach: f64,
    /// Range over range and approach [1]; NaN without either.
    pub effectiveness: f64,
    /// MOISTAIR_TOWER_COOLING or MOISTAIR_TOWER_REVERSED.
    pub status: i32,
    /// 0.
    pub reserved: i32,
}

/// What a tower does to water and air, by Poppe's method.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_poppe_rating {
    /// The air that leaves, with the droplets of its fog.
    pub leaving: moistair_wet_stream,
    /// Heat and water into the air.
    pub exchange: moistair_exchange,
    /// The water, with the temperature at which it leaves.
    pub water: moistair_tower_water,
    /// Water into the air [kg/s]; negative where vapor condenses on the water.
    pub evaporation: f64,
    /// Heat that the water gives up [W]; negative where the tower is reversed.
    pub heat_rejected: f64,
    /// L/G, water over dry air [1].
    pub water_to_air: f64,
    /// Hot less cold water temperature [K].
    pub range: f64,
    /// Cold water over the wet bulb of the entering air [K].
    pub approach: f64,
    /// Range over range and approach [1]; NaN without either.
    pub effectiveness: f64,
    /// MOISTAIR_TOWER_COOLING or MOISTAIR_TOWER_REVERSED.
    pub status: i32,
    /// 1 if the leaving air carries fog, else 0.
    pub is_fogged: i32,
}

/// What a fill transfers: Me = coefficient (L/G)^-exponent.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_fill_law {
    /// c [1], 0.001 to 20.
    pub coefficient: f64,
    /// n [1], 0 to 2.
    pub exponent: f64,
}

/// One test of a fill.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_fill_test {
    /// L/G, water over dry air [1].
    pub water_to_air: f64,
    /// Merkel number found [1].
    pub number: f64,
}

impl From<Pinch> for moistair_pinch {
    fn from(pinch: Pinch) -> Self {
        Self { water_to_air: pinch.water_to_air, temperature: pinch.temperature.celsius() }
    }
}

impl From<MerkelNumber> for moistair_merkel_number {
    fn from(needed: MerkelNumber) -> Self {
        Self {
            number: needed.number,
            water_to_air: needed.water_to_air,
            pinch: needed.pinch.into(),
            heat_rejected: needed.heat_rejected.watts(),
            leaving_enthalpy: needed.leaving_enthalpy.joules_per_kilogram(),
        }
    }
}

impl From<TowerRating> for moistair_tower_rating {
    fn from(rating: TowerRating) -> Self {
        Self {
            water: rating.water.into(),
            heat_rejected: rating.heat_rejected.watts(),
            leaving_enthalpy: rating.leaving_enthalpy.joules_per_kilogram(),
            water_to_air: rating.water_to_air,
            range: rating.range.kelvins(),
            approach: rating.approach.kelvins(),
            effectiveness: rating.effectiveness().unwrap_or(NAN),
            status: rating.status as i32,
            reserved: 0,
        }
    }
}

impl From<PoppeRating> for moistair_poppe_rating {
    fn from(rating: PoppeRating) -> Self {
        Self {
            leaving: rating.leaving.into(),
            exchange: rating.exchange.into(),
            water: rating.water.into(),
            evaporation: rating.evaporation.kilograms_per_second(),
            heat_rejected: rating.heat_rejected.watts(),
            water_to_air: rating.water_to_air,
            range: rating.range.kelvins(),
            approach: rating.approach.kelvins(),
            effectiveness: rating.effectiveness().unwrap_or(NAN),
            status: rating.status as i32,
            is_fogged: rating.is_fogged().into(),
        }
    }
}

impl From<FillLaw> for moistair_fill_law {
    fn from(law: FillLaw) -> Self {
        Self { coefficient: law.coefficient(), exponent: law.exponent() }
    }
}

impl moistair_hot_water {
    fn to_core(self) -> HotWater {
        HotWater { flow: mass_flow(self.flow), temperature: celsius(self.temperature) }
    }
}

impl moistair_fill_law {
    fn to_core(self) -> Result<FillLaw, Failure> {
        Ok(FillLaw::new(self.coefficient, self.exponent)?)
    }
}

impl moistair_fill_test {
    fn to_core(self) -> FillTest {
        FillTest { water_to_air: self.water_to_air, number: self.number }
    }
}

impl Answer for moistair_pinch {
    fn is_finite(&self) -> bool {
        finite([self.water_to_air, self.temperature])
    }
}

impl Answer for moistair_merkel_number {
    fn is_finite(&self) -> bool {
        self.pinch.is_finite() && finite([self.number, self.water_to_air, self.heat_rejected, self.leaving_enthalpy])
    }
}

impl Answer for moistair_tower_rating {
    fn is_finite(&self) -> bool {
        let own = [self.heat_rejected, self.leaving_enthalpy, self.water_to_air, self.range, self.approach];
        self.water.is_finite() && finite(own)
    }
}

impl Answer for moistair_poppe_rating {
    fn is_finite(&self) -> bool {
        let own = [self.evaporation, self.heat_rejected, self.water_to_air, self.range, self.approach];
        self.leaving.is_finite() && self.exchange.is_finite() && self.water.is_finite() && finite(own)
    }
}

impl Answer for moistair_fill_law {
    fn is_finite(&self) -> bool {
        finite([self.coefficient, self.exponent])
    }
}

fn quadrature(selector: i32) -> Result<Quadrature, Failure> {
    match selector {
        MOISTAIR_QUADRATURE_GAUSS_LEGENDRE => Ok(Quadrature::GaussLegendre),
        MOISTAIR_QUADRATURE_GAUSS_LEGENDRE_GRADED => Ok(Quadrature::GaussLegendreGraded),
        MOISTAIR_QUADRATURE_FOUR_POINT => Ok(Quadrature::FourPoint),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

fn transfer(selector: i32) -> Result<Transfer, Failure> {
    match selector {
        MOISTAIR_TRANSFER_BOSNJAKOVIC => Ok(Transfer::Bosnjakovic),
        MOISTAIR_TRANSFER_LEWIS_FACTOR_ONE => Ok(Transfer::LewisFactorOne),
        MOISTAIR_TRANSFER_EVAPORATION_SUPPRESSED => Ok(Transfer::EvaporationSuppressed),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// L/G: the entering water over the dry air.
///
/// entering: the air that enters; water_flow: [kg/s], 0 to 1e6; ratio: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_water_to_air(
    entering: *const moistair_stream,
    water_flow: f64,
    ratio: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(tower::water_to_air_ratio(&unsafe { read(entering) }?.to_core()?, mass_flow(water_flow))?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(ratio, error, call) }
}

/// The limit of cold water: where saturated air has the enthalpy of the entering air; a little below the wet bulb.
///
/// entering: the state that enters; temperature: output [°C]; error: may be null.
/// Returns 0, 1xx, 2xx, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_coldest_water(
    entering: *const moistair_state,
    temperature: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(tower::coldest_water(&unsafe { read(entering) }?.to_core()?)?.celsius())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(temperature, error, call) }
}

/// The greatest ratio of water to air with which a duty can be done at all; the least air is water flow / ratio.
///
/// entering: the state that enters; hot, cold: water temperatures [°C]; pinch: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (cold water at or below its limit, or not below the hot).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_merkel_pinch(
    entering: *const moistair_state,
    hot: f64,
    cold: f64,
    pinch: *mut moistair_pinch,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(merkel::pinch(&unsafe { read(entering) }?.to_core()?, celsius(hot), celsius(cold))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(pinch, error, call) }
}

/// The Merkel number that a duty takes.
///
/// entering: the air that enters; water: the water that is cooled; quadrature: MOISTAIR_QUADRATURE_...; needed: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (beyond the pinch, with the greatest L/G in the error; cold water at or below its limit).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_merkel_number(
    entering: *const moistair_stream,
    water: moistair_tower_water,
    quadrature: i32,
    needed: *mut moistair_merkel_number,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let entering = unsafe { read(entering) }?.to_core()?;
        Ok(merkel::number(&entering, water.to_core(), self::quadrature(quadrature)?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(needed, error, call) }
}

/// The cold water of a tower of a given Merkel number.
///
/// entering: the air that enters; water: the water that enters; number: Merkel number [1], 0 to 20; rating: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, with the greatest number that does not freeze it in the error).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_merkel_rate(
    entering: *const moistair_stream,
    water: moistair_hot_water,
    number: f64,
    rating: *mut moistair_tower_rating,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(merkel::rate(&unsafe { read(entering) }?.to_core()?, water.to_core(), number)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(rating, error, call) }
}

/// The dry-air flow with which a fill does a duty.
///
/// entering: the state that enters; water: the water that is cooled; fill: its law; stream: output, the air that it takes; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the fill is too small with any air, or too large).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_air_for_duty(
    entering: *const moistair_state,
    water: moistair_tower_water,
    fill: moistair_fill_law,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let entering = unsafe { read(entering) }?.to_core()?;
        Ok(merkel::air_for_duty(&entering, water.to_core(), &fill.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// The Merkel number that a duty takes, by effectiveness and transfer units.
///
/// entering: the air that enters; water: the water that is cooled; number: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_effectiveness_number(
    entering: *const moistair_stream,
    water: moistair_tower_water,
    number: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(effectiveness_ntu::number(&unsafe { read(entering) }?.to_core()?, water.to_core())?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(number, error, call) }
}

/// The cold water of a tower of a given Merkel number, by effectiveness and transfer units.
///
/// entering: the air that enters; water: the water that enters; number: Merkel number [1], 0 to 20; rating: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, or enters below the limit of the air).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_effectiveness_rate(
    entering: *const moistair_stream,
    water: moistair_hot_water,
    number: f64,
    rating: *mut moistair_tower_rating,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(effectiveness_ntu::rate(&unsafe { read(entering) }?.to_core()?, water.to_core(), number)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(rating, error, call) }
}

/// The number that a duty takes, by Poppe's method.
///
/// entering: the air that enters; water: the water that is cooled; transfer: MOISTAIR_TRANSFER_...; number: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_poppe_number(
    entering: *const moistair_stream,
    water: moistair_tower_water,
    transfer: i32,
    number: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let entering = unsafe { read(entering) }?.to_core()?;
        Ok(poppe::number(&entering, water.to_core(), self::transfer(transfer)?)?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(number, error, call) }
}

/// Cold water, leaving air and evaporation of a tower of a given number, by Poppe's method.
///
/// entering: the air that enters; water: the water that enters; number: found by the same method [1], 0 to 20; transfer: MOISTAIR_TRANSFER_...;
/// rating: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, or all of it evaporate).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_poppe_rate(
    entering: *const moistair_stream,
    water: moistair_hot_water,
    number: f64,
    transfer: i32,
    rating: *mut moistair_poppe_rating,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let entering = unsafe { read(entering) }?.to_core()?;
        Ok(poppe::rate(&entering, water.to_core(), number, self::transfer(transfer)?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(rating, error, call) }
}

/// The law of a fill through two tests.
///
/// first, second: tests at different L/G; law: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (tests at one L/G, or an exponent outside 0 to 2).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_fill_from_two_tests(
    first: moistair_fill_test,
    second: moistair_fill_test,
    law: *mut moistair_fill_law,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(FillLaw::from_two_tests([first.to_core(), second.to_core()])?.into());
    // SAFETY: the caller's pointers.
    unsafe { answer(law, error, call) }
}

/// Merkel number of a fill at a ratio of water to air.
///
/// fill: its law; water_to_air: L/G [1], 0.001 to 20; number: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_fill_number(
    fill: moistair_fill_law,
    water_to_air: f64,
    number: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(fill.to_core()?.number(water_to_air)?);
    // SAFETY: the caller's pointers.
    unsafe { answer(number, error, call) }
}

/// The height that a Merkel number takes, of a fill tested at a height.
///
/// fill: its law; number: wanted [1], 0 to 20; water_to_air: L/G [1], 0.001 to 20; tested_height: [m], 0 to 100; height: output [m];
/// error: may be null.
/// Returns 0, 1xx, 2xx, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_tower_fill_height(
    fill: moistair_fill_law,
    number: f64,
    water_to_air: f64,
    tested_height: f64,
    height: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(fill.to_core()?.height(number, water_to_air, Length::from_meters(tested_height))?.meters());
    // SAFETY: the caller's pointers.
    unsafe { answer(height, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_hot_water>() == 16 && size_of::<moistair_pinch>() == 16);
    assert!(size_of::<moistair_merkel_number>() == 48 && size_of::<moistair_tower_rating>() == 80);
    assert!(size_of::<moistair_poppe_rating>() == 248);
    assert!(size_of::<moistair_fill_law>() == 16 && size_of::<moistair_fill_test>() == 16);
};
