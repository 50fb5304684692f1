//! States of moist air and their properties.

use moistair_core::columns::NAN;
use moistair_core::{Basis, Formulation, HumidityRatio, MoistAir, Pressure, Quantity, Temperature};

use crate::memory::{Answer, answer, check, read, report, write};
use crate::quantity::{MOISTAIR_PROPERTY_COUNT, property, quantity};
use crate::status::{Failure, moistair_error};

/// Dry air and water vapor as a virial mixture after IAPWS G8-10: the default.
pub const MOISTAIR_REAL_GAS: i32 = 0;
/// The perfect-gas relations of the ASHRAE handbook, for reproducing contract and textbook numbers.
pub const MOISTAIR_IDEAL_GAS: i32 = 1;
/// IAPWS G8-10 as published, all terms: -80 to 200 °C, to 5 MPa; slower. An unknown selector in a library that was built without it.
pub const MOISTAIR_HELMHOLTZ: i32 = 2;

/// On what a state stands.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_basis {
    /// Absolute pressure [Pa], 20000 to 1100000 (to 5000000 with MOISTAIR_HELMHOLTZ).
    pub pressure: f64,
    /// MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ.
    pub formulation: i32,
    /// Set to 0; not read.
    pub reserved: i32,
}

impl moistair_basis {
    pub(crate) fn to_core(self) -> Result<Basis, Failure> {
        Ok(Basis::new(Pressure::from_pascals(self.pressure), formulation(self.formulation)?))
    }
}

/// A state of moist air: what defines it (dry_bulb, pressure, humidity_ratio, formulation) and what always has a value.
/// As an input only what defines it is read, and checked; the rest is computed anew.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_state {
    /// Dry-bulb temperature [°C].
    pub dry_bulb: f64,
    /// Absolute pressure [Pa].
    pub pressure: f64,
    /// Mass of water vapor per mass of dry air [kg/kg].
    pub humidity_ratio: f64,
    /// Moles of water vapor per mole of moist air [1].
    pub water_mole_fraction: f64,
    /// Water mole fraction times pressure [Pa].
    pub vapor_pressure: f64,
    /// Mass of water vapor per mass of moist air [kg/kg].
    pub specific_humidity: f64,
    /// Mass of water vapor per volume [kg/m³].
    pub absolute_humidity: f64,
    /// Enthalpy per mass of dry air [J/kg].
    pub specific_enthalpy: f64,
    /// Volume per mass of dry air [m³/kg].
    pub specific_volume: f64,
    /// Mass of moist air per volume [kg/m³].
    pub density: f64,
    /// Isobaric heat capacity per mass of dry air [J/(kg K)].
    pub specific_heat: f64,
    /// p v / (R T) of the mixture [1].
    pub compressibility_factor: f64,
    /// MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ.
    pub formulation: i32,
    /// 0.
    pub reserved: i32,
}

impl From<MoistAir> for moistair_state {
    fn from(air: MoistAir) -> Self {
        Self {
            dry_bulb: air.dry_bulb().celsius(),
            pressure: air.pressure().pascals(),
            humidity_ratio: air.humidity_ratio().kilograms_per_kilogram(),
            water_mole_fraction: air.water_mole_fraction().fraction(),
            vapor_pressure: air.vapor_pressure().pascals(),
            specific_humidity: air.specific_humidity().kilograms_per_kilogram(),
            absolute_humidity: air.absolute_humidity().kilograms_per_cubic_meter(),
            specific_enthalpy: air.specific_enthalpy().joules_per_kilogram(),
            specific_volume: air.specific_volume().cubic_meters_per_kilogram(),
            density: air.density().kilograms_per_cubic_meter(),
            specific_heat: air.specific_heat().joules_per_kilogram_kelvin(),
            compressibility_factor: air.compressibility_factor(),
            formulation: air.formulation().code(),
            reserved: 0,
        }
    }
}

impl moistair_state {
    /// The state that the numbers define.
    pub(crate) fn to_core(self) -> Result<MoistAir, Failure> {
        let basis = Basis::new(Pressure::from_pascals(self.pressure), formulation(self.formulation)?);
        let ratio = HumidityRatio::from_kilograms_per_kilogram(self.humidity_ratio);
        Ok(MoistAir::restore(Temperature::from_celsius(self.dry_bulb), ratio, basis)?)
    }
}

impl Answer for moistair_state {
    fn is_finite(&self) -> bool {
        let defining = [self.dry_bulb, self.pressure, self.humidity_ratio, self.water_mole_fraction];
        let vapor = [self.vapor_pressure, self.specific_humidity, self.absolute_humidity, self.specific_enthalpy];
        let gas = [self.specific_volume, self.density, self.specific_heat, self.compressibility_factor];
        [defining, vapor, gas].iter().flatten().all(|number| number.is_finite())
    }
}

pub(crate) fn formulation(selector: i32) -> Result<Formulation, Failure> {
    Formulation::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

/// A state from its dry bulb and any second property.
///
/// dry_bulb: [°C], -80 to 150 (to 200 with MOISTAIR_HELMHOLTZ); property: selector of the second property, one that fixes a state (humidity ratio, relative humidity,
/// wet bulb, dew point, specific enthalpy, …); value: its value in its unit; basis: pressure and formulation; state: output; error: may
/// be null.
/// Returns 0, 101, 102, 103, 201, 202, 203 (no state has the value here; the error holds the limits).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_dry_bulb(
    dry_bulb: f64,
    property: i32,
    value: f64,
    basis: moistair_basis,
    state: *mut moistair_state,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let dry_bulb = Temperature::from_celsius(dry_bulb);
        Ok(MoistAir::from_dry_bulb_and(dry_bulb, quantity(property)?, value, basis.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(state, error, call) }
}

/// A state from two properties of which neither is the dry bulb, in any order.
///
/// One of them states the vapor (humidity ratio, specific humidity, water mole fraction, vapor pressure, dew point, frost point) and the
/// other is a relative humidity (over the stable surface or over liquid, or degree of saturation), a wet bulb, or the specific
/// enthalpy; or one is a relative humidity, and the other a wet bulb or the specific enthalpy. Other pairs fix no state, or only
/// badly. No two states have both properties; just below the melting temperature the stable wet bulb is taken over ice, and
/// MOISTAIR_WET_BULB_OVER_LIQUID gives the state of supercooled liquid. With the dry bulb: moistair_from_dry_bulb. Rows of a column go
/// one by one; those of Rust and Python have the same bits.
///
/// first, second: selectors; first_value, second_value: their values in their units; basis: pressure and formulation; state: output;
/// error: may be null.
/// Returns 0, 101, 102, 103, 201, 202, 209 (the pair fixes no state), 210 (no state has both; the error holds one of the two and its
/// limits beside the other), 311 (a wet bulb above boiling), 313 (ice above the melting temperature).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_two_properties(
    first: i32,
    first_value: f64,
    second: i32,
    second_value: f64,
    basis: moistair_basis,
    state: *mut moistair_state,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (first, second) = (quantity(first)?, quantity(second)?);
        let basis = basis.to_core()?;
        Ok(MoistAir::from_two_properties_and(first, first_value, second, second_value, basis)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(state, error, call) }
}

/// One property of a state.
///
/// state: a state; property: selector below MOISTAIR_PROPERTY_COUNT; value: output in the unit of the property; error: may be null.
/// Returns 0, 101, 102, 103, 31x (the property has no value at this state), 201, 202, 203 (the state is none).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_property(
    state: *const moistair_state,
    property: i32,
    value: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    let call = || Ok(unsafe { read(state) }?.to_core()?.value(self::property(property)?)?);
    // SAFETY: the caller's pointers.
    unsafe { answer(value, error, call) }
}

/// Several properties of a state at once, cheaper than one by one.
///
/// state: a state; mask: which properties, the bit 1 << selector for each; values: output, each property at the place of its selector in its
/// unit, NaN where it has no value; places not asked for are left alone; have: output, the bits of mask that have a value, may be null;
/// error: may be null.
/// Returns 0 (also when a property has no value), 101, 102 (a bit that is no property), 103, 201, 202, 203 (the state is none).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_properties(
    state: *const moistair_state,
    mask: u64,
    values: *mut f64,
    have: *mut u64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check(values)?;
        crate::memory::check_optional(have)?;
        check_mask(mask)?;
        // SAFETY: the caller's pointer.
        let air = unsafe { read(state) }?.to_core()?;
        let mut found = 0;
        air.values(properties(mask), |property, value| {
            let bit = 1_u64 << property.code();
            let value = value.ok().filter(|value| value.is_finite());
            found |= if value.is_some() { bit } else { 0 };
            // SAFETY: the caller has room for every property of the mask.
            unsafe { write(values.add(property.code() as usize), value.unwrap_or(NAN)) };
        });
        // SAFETY: the caller's pointer.
        unsafe { write(have, found) };
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Refuses bits that are no property; the lowest of them is the selector in the error.
pub(crate) fn check_mask(mask: u64) -> Result<(), Failure> {
    let others = properties(mask).fold(mask, |others, property| others & !(1 << property.code()));
    if others == 0 {
        return Ok(());
    }
    Err(Failure::UnknownQuantity(others.trailing_zeros() as i32))
}

/// The properties of a mask, in the order of their selectors.
pub(crate) fn properties(mask: u64) -> impl Iterator<Item = Quantity> {
    Quantity::ALL
        .iter()
        .copied()
        .take_while(|quantity| quantity.is_property())
        .filter(move |quantity| mask >> quantity.code() & 1 == 1)
}

const _: () = {
    assert!(MOISTAIR_PROPERTY_COUNT == moistair_core::PROPERTY_COUNT && MOISTAIR_PROPERTY_COUNT <= 64);
    assert!(MOISTAIR_REAL_GAS == Formulation::RealGas.code() && MOISTAIR_IDEAL_GAS == Formulation::IdealGas.code());
    #[cfg(feature = "helmholtz")]
    assert!(MOISTAIR_HELMHOLTZ == Formulation::Helmholtz.code());
    assert!(
        size_of::<moistair_basis>() == 16 && size_of::<moistair_state>() == 104 && size_of::<moistair_error>() == 32
    );
    assert!(core::mem::offset_of!(moistair_state, formulation) == 96);
    assert!(
        core::mem::offset_of!(moistair_basis, formulation) == 8 && core::mem::offset_of!(moistair_error, code) == 24
    );
};
