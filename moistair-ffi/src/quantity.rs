//! Selectors of quantities, their names, units and limits.

use core::ffi::c_char;

use moistair_core::Quantity;

use crate::memory::{Answer, answer};
use crate::status::{Failure, moistair_error};
use crate::text::{Text, texts};

/// Number of property selectors: they run from 0 to one less. Later versions may add to them.
pub const MOISTAIR_PROPERTY_COUNT: i32 = 35;

/// Dry-bulb temperature. The range of states; IAPWS G8-10 itself reaches 193.15 to 473.15 K, as the Helmholtz formulation does [°C].
pub const MOISTAIR_DRY_BULB: i32 = 0;
/// Absolute total pressure [Pa].
pub const MOISTAIR_PRESSURE: i32 = 1;
/// Mass of water vapor per mass of dry air [kg/kg].
pub const MOISTAIR_HUMIDITY_RATIO: i32 = 2;
/// Moles of water vapor per mole of moist air [1].
pub const MOISTAIR_WATER_MOLE_FRACTION: i32 = 3;
/// Water mole fraction times total pressure [Pa].
pub const MOISTAIR_VAPOR_PRESSURE: i32 = 4;
/// Mass of water vapor per mass of moist air [kg/kg].
pub const MOISTAIR_SPECIFIC_HUMIDITY: i32 = 5;
/// Mass of water vapor per volume of moist air [kg/m³].
pub const MOISTAIR_ABSOLUTE_HUMIDITY: i32 = 6;
/// Enthalpy per mass of dry air [J/kg].
pub const MOISTAIR_SPECIFIC_ENTHALPY: i32 = 7;
/// Volume per mass of dry air [m³/kg].
pub const MOISTAIR_SPECIFIC_VOLUME: i32 = 8;
/// Mass of moist air per volume [kg/m³].
pub const MOISTAIR_DENSITY: i32 = 9;
/// Isobaric heat capacity per mass of dry air, at constant humidity ratio [J/(kg K)].
pub const MOISTAIR_SPECIFIC_HEAT: i32 = 10;
/// p v / (R T) of the mixture [1].
pub const MOISTAIR_COMPRESSIBILITY_FACTOR: i32 = 11;
/// x_w / x_ws over the stable surface: ice below the melting temperature, liquid above. Over ice it may exceed one [1].
pub const MOISTAIR_RELATIVE_HUMIDITY: i32 = 12;
/// x_w / x_ws over liquid water, supercooled below the melting temperature (WMO convention) [1].
pub const MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID: i32 = 13;
/// W / W_s over the stable surface [1].
pub const MOISTAIR_DEGREE_OF_SATURATION: i32 = 14;
/// (x_ws − x_w) p over the stable surface [Pa].
pub const MOISTAIR_VAPOR_PRESSURE_DEFICIT: i32 = 15;
/// Saturation pressure of pure water over the stable surface [Pa].
pub const MOISTAIR_SATURATION_PRESSURE: i32 = 16;
/// x_ws p over the saturation pressure of pure water [1].
pub const MOISTAIR_ENHANCEMENT_FACTOR: i32 = 17;
/// Thermodynamic wet bulb (adiabatic saturation), over liquid at or above the melting temperature, over ice below. Above the
/// dry bulb where the vapor is supersaturated over ice [°C].
pub const MOISTAIR_WET_BULB: i32 = 18;
/// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature [°C].
pub const MOISTAIR_WET_BULB_OVER_LIQUID: i32 = 19;
/// Thermodynamic wet bulb over ice [°C].
pub const MOISTAIR_WET_BULB_OVER_ICE: i32 = 20;
/// Temperature of saturation over liquid water at the same pressure and composition [°C].
pub const MOISTAIR_DEW_POINT: i32 = 21;
/// Temperature of saturation over ice at the same pressure and composition [°C].
pub const MOISTAIR_FROST_POINT: i32 = 22;
/// Entropy per mass of dry air [J/(kg K)]. Zero: dry air at 0 °C and 101 325 Pa, liquid water at the triple point (0 °C for the ideal gas).
pub const MOISTAIR_SPECIFIC_ENTROPY: i32 = 23;
/// Speed of sound at constant composition [m/s].
pub const MOISTAIR_SPEED_OF_SOUND: i32 = 24;
/// Isochoric heat capacity per mass of dry air, at constant humidity ratio [J/(kg K)].
pub const MOISTAIR_SPECIFIC_HEAT_AT_CONSTANT_VOLUME: i32 = 25;
/// Chemical potential of the water in the gas, per mass of water, on the datum of enthalpy and entropy; none for dry air [J/kg].
pub const MOISTAIR_CHEMICAL_POTENTIAL_OF_WATER: i32 = 26;
/// Chemical potential of the dry air in the gas, per mass of dry air, on the datum of enthalpy and entropy [J/kg].
pub const MOISTAIR_CHEMICAL_POTENTIAL_OF_DRY_AIR: i32 = 27;
/// Fugacity of the water in the gas; zero for dry air [Pa].
pub const MOISTAIR_FUGACITY_OF_WATER: i32 = 28;
/// Dynamic viscosity [Pa s]. Dry air by Lemmon & Jacobsen 2004 (1 %), vapor by IAPWS R12-08 (2 %), mixed by Wilke's rule (a few percent in hot
/// and humid air); below 0 °C the vapor's part extrapolates.
pub const MOISTAIR_DYNAMIC_VISCOSITY: i32 = 29;
/// Thermal conductivity [W/(m K)]. Dry air by Lemmon & Jacobsen 2004 (2 %), vapor by IAPWS R15-11 (2 %), mixed by Wassiljewa's rule with the
/// weights of Mason & Saxena (a few percent in hot and humid air); below 0 °C the vapor's part extrapolates.
pub const MOISTAIR_THERMAL_CONDUCTIVITY: i32 = 30;
/// Diffusivity of water vapor in air [m²/s]. Massman 1998, 0 to 100 °C near atmospheric pressure within about 7 %; elsewhere it extrapolates.
pub const MOISTAIR_VAPOR_DIFFUSIVITY: i32 = 31;
/// c_p μ / λ, with the heat capacity per mass of moist air [1]. Good to a few percent.
pub const MOISTAIR_PRANDTL_NUMBER: i32 = 32;
/// μ / (ρ D), of the vapor in the moist air [1]. Good to about 10 %, mostly that of the diffusivity.
pub const MOISTAIR_SCHMIDT_NUMBER: i32 = 33;
/// Thermal diffusivity over the diffusivity of the vapor, λ / (ρ c_p D) [1]; some define the inverse. Good to about 10 %.
pub const MOISTAIR_LEWIS_NUMBER: i32 = 34;
/// Dry-air mass flow [kg/s].
pub const MOISTAIR_DRY_AIR_MASS_FLOW: i32 = 64;
/// Volume flow at a stated state [m³/s].
pub const MOISTAIR_VOLUME_FLOW: i32 = 65;
/// Reference density of a standard volume flow [kg/m³].
pub const MOISTAIR_STANDARD_DENSITY: i32 = 66;
/// Heat flow, positive into the air [W].
pub const MOISTAIR_HEAT_FLOW: i32 = 67;
/// Flow of liquid water or steam [kg/s].
pub const MOISTAIR_WATER_FLOW: i32 = 68;
/// Temperature of liquid water [°C].
pub const MOISTAIR_WATER_TEMPERATURE: i32 = 69;
/// Specific enthalpy of steam, on the datum of liquid water at the triple point (0 °C for the ideal gas) [J/kg].
pub const MOISTAIR_STEAM_ENTHALPY: i32 = 70;
/// Temperature that a process is to leave [°C].
pub const MOISTAIR_LEAVING_TEMPERATURE: i32 = 71;
/// Apparatus dew point of a coil [°C].
pub const MOISTAIR_APPARATUS_DEW_POINT: i32 = 72;
/// Bypass factor of a coil [1].
pub const MOISTAIR_BYPASS_FACTOR: i32 = 73;
/// Saturation effectiveness of a humidifier [1].
pub const MOISTAIR_SATURATION_EFFECTIVENESS: i32 = 74;
/// Temperature at which condensate leaves [°C].
pub const MOISTAIR_CONDENSATE_TEMPERATURE: i32 = 75;
/// Elevation above mean sea level, range of the standard atmosphere's lowest layer (ISO 2533) [m].
pub const MOISTAIR_ELEVATION: i32 = 76;
/// Drift of a tower as a fraction of the circulating water [1].
pub const MOISTAIR_DRIFT_FRACTION: i32 = 77;
/// Concentration of the circulating water over that of the make-up [1].
pub const MOISTAIR_CYCLES_OF_CONCENTRATION: i32 = 78;
/// Temperature range of the water in a tower [K].
pub const MOISTAIR_TOWER_RANGE: i32 = 79;
/// Total water per dry air, vapor and condensate [kg/kg].
pub const MOISTAIR_TOTAL_WATER: i32 = 80;
/// Specific enthalpy that a process leaves, with its condensate [J/kg].
pub const MOISTAIR_LEAVING_ENTHALPY: i32 = 81;
/// Wet bulb as a psychrometer reads it; over ice not above the melting temperature [°C].
pub const MOISTAIR_PSYCHROMETER_WET_BULB: i32 = 82;
/// Coefficient of a psychrometer, over water that at 0 °C [1/K].
pub const MOISTAIR_PSYCHROMETER_COEFFICIENT: i32 = 83;
/// Transfer units of a tower, K a V / L [1].
pub const MOISTAIR_MERKEL_NUMBER: i32 = 96;
/// Water over dry air in a tower, L/G [1].
pub const MOISTAIR_WATER_TO_AIR_RATIO: i32 = 97;
/// Merkel number of a fill at a water-to-air ratio of one [1].
pub const MOISTAIR_FILL_COEFFICIENT: i32 = 98;
/// How the Merkel number of a fill falls with the water-to-air ratio [1].
pub const MOISTAIR_FILL_EXPONENT: i32 = 99;
/// Height of a fill [m].
pub const MOISTAIR_FILL_HEIGHT: i32 = 100;
/// Water in basin, pipes and plant together [kg].
pub const MOISTAIR_WATER_INVENTORY: i32 = 101;
/// Of a dissolved salt; a conductivity serves as well [mg/kg].
pub const MOISTAIR_CONCENTRATION: i32 = 102;
/// A span of time [s].
pub const MOISTAIR_DURATION: i32 = 103;
/// Effectiveness of a tower as a heat exchanger of enthalpy [1].
pub const MOISTAIR_ENTHALPY_EFFECTIVENESS: i32 = 104;
/// Power of its flow that a conductance goes with [1].
pub const MOISTAIR_FLOW_EXPONENT: i32 = 105;
/// Temperature of a coolant other than water [°C].
pub const MOISTAIR_COOLANT_TEMPERATURE: i32 = 106;
/// Specific heat of a coolant other than water [J/(kg K)].
pub const MOISTAIR_COOLANT_SPECIFIC_HEAT: i32 = 107;
/// Thermal conductance of a coil: heat flow per difference of temperature [W/K].
pub const MOISTAIR_CONDUCTANCE: i32 = 108;
/// Conductance of the water side of a coil over that of its air side [1].
pub const MOISTAIR_CONDUCTANCE_RATIO: i32 = 109;
/// Vapor over all of the water in wet steam, by mass [1].
pub const MOISTAIR_STEAM_QUALITY: i32 = 110;
/// Absolute pressure of steam [Pa].
pub const MOISTAIR_STEAM_PRESSURE: i32 = 111;
/// Temperature of superheated steam [°C].
pub const MOISTAIR_STEAM_TEMPERATURE: i32 = 112;
/// (t1 - t2) over the drive of an indirect evaporative cooler [1].
pub const MOISTAIR_INDIRECT_EFFECTIVENESS: i32 = 113;
/// Power of a pump, which ends as heat in its water [W].
pub const MOISTAIR_PUMP_HEAT: i32 = 114;
/// Moisture that a room gives to its air [kg/s].
pub const MOISTAIR_MOISTURE_GAIN: i32 = 135;
/// Specific enthalpy of that moisture as it comes, from ice to steam [J/kg].
pub const MOISTAIR_MOISTURE_ENTHALPY: i32 = 136;
/// Sensible over total gain of a room [1].
pub const MOISTAIR_SENSIBLE_HEAT_RATIO: i32 = 137;
/// Slope of a process line [J/kg].
pub const MOISTAIR_PROCESS_SLOPE: i32 = 138;
/// Heat of sorption over heat of vaporization [1].
pub const MOISTAIR_SORPTION_HEAT_RATIO: i32 = 139;
/// Drying as a fraction of what a desiccant could do at best [1].
pub const MOISTAIR_DRYING_EFFECTIVENESS: i32 = 140;
/// Effectiveness of a desiccant wheel in one of its two potentials [1].
pub const MOISTAIR_POTENTIAL_EFFECTIVENESS: i32 = 141;
/// Rise of temperature by the heat that a wheel carries over [K].
pub const MOISTAIR_CARRY_OVER_RISE: i32 = 142;
/// Temperature of air in the correlation of a wheel's potentials, 275 to 425 K [°C].
pub const MOISTAIR_DESICCANT_TEMPERATURE: i32 = 143;
/// Dry air from outdoors over the dry air of a mixture [1].
pub const MOISTAIR_OUTDOOR_AIR_FRACTION: i32 = 150;
/// Standard uncertainty of a reading, in the unit of the reading [1].
pub const MOISTAIR_STANDARD_UNCERTAINTY: i32 = 151;
/// Share of a tracer gas, such as carbon dioxide, in dry air [µmol/mol].
pub const MOISTAIR_TRACER_CONCENTRATION: i32 = 152;
/// What a temperature must pass a limit by before a control switches on [K].
pub const MOISTAIR_TEMPERATURE_HYSTERESIS: i32 = 153;
/// What an enthalpy must pass a limit by before a control switches on [J/kg].
pub const MOISTAIR_ENTHALPY_HYSTERESIS: i32 = 154;
/// Heat that a coil takes out per dry air [J/kg].
pub const MOISTAIR_COIL_ENERGY: i32 = 155;

/// Limits of a quantity as an input, both included.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_limits {
    /// The least value allowed.
    pub min: f64,
    /// The greatest value allowed; infinite for a property that is only read.
    pub max: f64,
}

impl Answer for moistair_limits {
    fn is_finite(&self) -> bool {
        self.min <= self.max
    }
}

/// The quantity with a selector.
pub(crate) fn quantity(selector: i32) -> Result<Quantity, Failure> {
    Quantity::from_code(selector).ok_or(Failure::UnknownQuantity(selector))
}

/// The property with a selector.
pub(crate) fn property(selector: i32) -> Result<Quantity, Failure> {
    quantity(selector).and_then(
        |found| {
            if found.is_property() { Ok(found) } else { Err(Failure::UnknownQuantity(selector)) }
        },
    )
}

fn text(table: &'static [Text], selector: i32) -> *const c_char {
    let place = Quantity::ALL.iter().position(|quantity| quantity.code() == selector);
    place.and_then(|place| table.get(place)).map_or(c"".as_ptr(), Text::as_ptr)
}

/// The name of a quantity, such as "dry_bulb": static, lower case, words joined by underscores. Empty for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_quantity_name(quantity: i32) -> *const c_char {
    text(texts!(Quantity, Text::name, name), quantity)
}

/// The unit of a quantity, such as "kg/kg": static, UTF-8. Empty for an unknown selector.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_quantity_unit(quantity: i32) -> *const c_char {
    text(texts!(Quantity, Text::new, unit), quantity)
}

/// The limits of a quantity as an input, in its unit, with the real and the ideal gas.
///
/// quantity: selector of any quantity; limits: output; error: may be null.
/// Returns 0, 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_quantity_limits(
    quantity: i32,
    limits: *mut moistair_limits,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (min, max) = self::quantity(quantity)?.limits();
        Ok(moistair_limits { min, max })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limits, error, call) }
}

/// The limits of a quantity as an input, in its unit, with a formulation: the Helmholtz formulation reaches 200 °C and 5 MPa.
///
/// formulation: MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ; quantity: selector of any quantity; limits: output; error: may be
/// null.
/// Returns 0, 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_formulation_limits(
    formulation: i32,
    quantity: i32,
    limits: *mut moistair_limits,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (min, max) = crate::state::formulation(formulation)?.limits(self::quantity(quantity)?);
        Ok(moistair_limits { min, max })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limits, error, call) }
}
