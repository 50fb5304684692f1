/*
 * The C interface of moistair.
 *
 * Conventions, the same for every function:
 * - Functions that can fail return a status: 0 (MOISTAIR_OK), 1xx for an argument, 2xx for a value
 *   out of range, 3xx for no result, 9xx for a fault of the library.
 * - SI units with °C; fractions, never percent; energies and volumes per kilogram of dry air.
 * - Structures are plain values of the caller. Inputs come first, then outputs, then an optional place for the detail of
 *   an error. Outputs are written only when the status is 0, except where a function says otherwise.
 * - Selectors are integers and are checked, as are null and misaligned pointers. What a structure holds is checked too: any
 *   bits are taken, none make a call panic, hang, or return NaN with status 0.
 * - Nothing is allocated, no state is kept between calls, no text is formatted. Functions may be called from any thread at any
 *   time, as long as two calls do not write to one structure.
 *
 * A pointer is null or points to as many valid elements as the function says, and what it points to is not changed by another
 * thread during the call. That is all that the functions trust the caller with.
 *
 * Made from the sources; do not edit. MIT OR Apache-2.0
 */

#ifndef MOISTAIR_H
#define MOISTAIR_H

#include <stddef.h>
#include <stdint.h>

/* Version of this header. */
#define MOISTAIR_VERSION_MAJOR 0
#define MOISTAIR_VERSION_MINOR 1
#define MOISTAIR_VERSION_PATCH 0
#define MOISTAIR_VERSION (1000000 * MOISTAIR_VERSION_MAJOR + 1000 * MOISTAIR_VERSION_MINOR + MOISTAIR_VERSION_PATCH)

/* The bit of a property in a mask. */
#define MOISTAIR_BIT(property) ((uint64_t)1 << (property))

// Version of the interface in this header: changes when a program has to be compiled anew.
#define MOISTAIR_ABI_VERSION 1

// Success.
#define MOISTAIR_OK 0

// A pointer is null that may not be.
#define MOISTAIR_NULL_POINTER 101

// A selector that names nothing, or nothing that fits here.
#define MOISTAIR_UNKNOWN_SELECTOR 102

// A pointer is not aligned for its type.
#define MOISTAIR_MISALIGNED 103

// Memory to be written overlaps other memory of the call.
#define MOISTAIR_OVERLAPPING 104

// A count or a stride reaches beyond the address space.
#define MOISTAIR_TOO_LONG 105

// A structure holds what the library cannot have written.
#define MOISTAIR_DAMAGED 106

// There are not as many columns as the process takes or gives.
#define MOISTAIR_WRONG_COUNT 107

// A value is NaN or infinite.
#define MOISTAIR_NOT_FINITE 201

// A value lies outside the declared range of its quantity.
#define MOISTAIR_OUT_OF_RANGE 202

// No state has this value at this dry bulb and pressure.
#define MOISTAIR_UNATTAINABLE 203

// States of different formulations in one process.
#define MOISTAIR_MIXED_FORMULATIONS 205

// Streams at different pressures where one pressure is needed.
#define MOISTAIR_MIXED_PRESSURES 206

// A process on no air at all.
#define MOISTAIR_NO_FLOW 207

// A channel makes no sense: limits that are not in order, or a unit of another kind.
#define MOISTAIR_INVALID_CHANNEL 208

// Two properties that fix no state together, only badly, or whose pair is not offered.
#define MOISTAIR_UNDETERMINED 209

// No state at this pressure has both properties.
#define MOISTAIR_UNATTAINABLE_TOGETHER 210

// Air with droplets or ice where a process knows dry gas only.
#define MOISTAIR_CARRIES_CONDENSATE 211

// The process cannot reach what was asked.
#define MOISTAIR_INFEASIBLE 301

// A sum would not be finite. Nothing was added.
#define MOISTAIR_OVERFLOW 302

// No value: there is no water vapor.
#define MOISTAIR_NO_VALUE_DRY_AIR 310

// No value: the saturation pressure exceeds the total pressure.
#define MOISTAIR_NO_VALUE_ABOVE_BOILING 311

// No value: it would lie below the range of saturation over this surface.
#define MOISTAIR_NO_VALUE_BELOW_SURFACE_RANGE 312

// No value: it would lie above the range of saturation over this surface.
#define MOISTAIR_NO_VALUE_ABOVE_SURFACE_RANGE 313

// Of a derivative: a slope has no bound where the vapor vanishes.
#define MOISTAIR_NO_VALUE_UNBOUNDED_SLOPE 314

// A fault of the library: a result was not a finite number. Nothing was written.
#define MOISTAIR_INTERNAL 901

// Number of property selectors: they run from 0 to one less. Later versions may add to them.
#define MOISTAIR_PROPERTY_COUNT 35

// Dry-bulb temperature. The range of states; IAPWS G8-10 itself reaches 193.15 to 473.15 K, as the Helmholtz formulation does [°C].
#define MOISTAIR_DRY_BULB 0

// Absolute total pressure [Pa].
#define MOISTAIR_PRESSURE 1

// Mass of water vapor per mass of dry air [kg/kg].
#define MOISTAIR_HUMIDITY_RATIO 2

// Moles of water vapor per mole of moist air [1].
#define MOISTAIR_WATER_MOLE_FRACTION 3

// Water mole fraction times total pressure [Pa].
#define MOISTAIR_VAPOR_PRESSURE 4

// Mass of water vapor per mass of moist air [kg/kg].
#define MOISTAIR_SPECIFIC_HUMIDITY 5

// Mass of water vapor per volume of moist air [kg/m³].
#define MOISTAIR_ABSOLUTE_HUMIDITY 6

// Enthalpy per mass of dry air [J/kg].
#define MOISTAIR_SPECIFIC_ENTHALPY 7

// Volume per mass of dry air [m³/kg].
#define MOISTAIR_SPECIFIC_VOLUME 8

// Mass of moist air per volume [kg/m³].
#define MOISTAIR_DENSITY 9

// Isobaric heat capacity per mass of dry air, at constant humidity ratio [J/(kg K)].
#define MOISTAIR_SPECIFIC_HEAT 10

// p v / (R T) of the mixture [1].
#define MOISTAIR_COMPRESSIBILITY_FACTOR 11

// x_w / x_ws over the stable surface: ice below the melting temperature, liquid above. Over ice it may exceed one [1].
#define MOISTAIR_RELATIVE_HUMIDITY 12

// x_w / x_ws over liquid water, supercooled below the melting temperature (WMO convention) [1].
#define MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID 13

// W / W_s over the stable surface [1].
#define MOISTAIR_DEGREE_OF_SATURATION 14

// (x_ws − x_w) p over the stable surface [Pa].
#define MOISTAIR_VAPOR_PRESSURE_DEFICIT 15

// Saturation pressure of pure water over the stable surface [Pa].
#define MOISTAIR_SATURATION_PRESSURE 16

// x_ws p over the saturation pressure of pure water [1].
#define MOISTAIR_ENHANCEMENT_FACTOR 17

// Thermodynamic wet bulb (adiabatic saturation), over liquid at or above the melting temperature, over ice below. Above the
// dry bulb where the vapor is supersaturated over ice [°C].
#define MOISTAIR_WET_BULB 18

// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature [°C].
#define MOISTAIR_WET_BULB_OVER_LIQUID 19

// Thermodynamic wet bulb over ice [°C].
#define MOISTAIR_WET_BULB_OVER_ICE 20

// Temperature of saturation over liquid water at the same pressure and composition [°C].
#define MOISTAIR_DEW_POINT 21

// Temperature of saturation over ice at the same pressure and composition [°C].
#define MOISTAIR_FROST_POINT 22

// Entropy per mass of dry air [J/(kg K)]. Zero: dry air at 0 °C and 101 325 Pa, liquid water at the triple point (0 °C for the ideal gas).
#define MOISTAIR_SPECIFIC_ENTROPY 23

// Speed of sound at constant composition [m/s].
#define MOISTAIR_SPEED_OF_SOUND 24

// Isochoric heat capacity per mass of dry air, at constant humidity ratio [J/(kg K)].
#define MOISTAIR_SPECIFIC_HEAT_AT_CONSTANT_VOLUME 25

// Chemical potential of the water in the gas, per mass of water, on the datum of enthalpy and entropy; none for dry air [J/kg].
#define MOISTAIR_CHEMICAL_POTENTIAL_OF_WATER 26

// Chemical potential of the dry air in the gas, per mass of dry air, on the datum of enthalpy and entropy [J/kg].
#define MOISTAIR_CHEMICAL_POTENTIAL_OF_DRY_AIR 27

// Fugacity of the water in the gas; zero for dry air [Pa].
#define MOISTAIR_FUGACITY_OF_WATER 28

// Dynamic viscosity [Pa s]. Dry air by Lemmon & Jacobsen 2004 (1 %), vapor by IAPWS R12-08 (2 %), mixed by Wilke's rule (a few percent in hot
// and humid air); below 0 °C the vapor's part extrapolates.
#define MOISTAIR_DYNAMIC_VISCOSITY 29

// Thermal conductivity [W/(m K)]. Dry air by Lemmon & Jacobsen 2004 (2 %), vapor by IAPWS R15-11 (2 %), mixed by Wassiljewa's rule with the
// weights of Mason & Saxena (a few percent in hot and humid air); below 0 °C the vapor's part extrapolates.
#define MOISTAIR_THERMAL_CONDUCTIVITY 30

// Diffusivity of water vapor in air [m²/s]. Massman 1998, 0 to 100 °C near atmospheric pressure within about 7 %; elsewhere it extrapolates.
#define MOISTAIR_VAPOR_DIFFUSIVITY 31

// c_p μ / λ, with the heat capacity per mass of moist air [1]. Good to a few percent.
#define MOISTAIR_PRANDTL_NUMBER 32

// μ / (ρ D), of the vapor in the moist air [1]. Good to about 10 %, mostly that of the diffusivity.
#define MOISTAIR_SCHMIDT_NUMBER 33

// Thermal diffusivity over the diffusivity of the vapor, λ / (ρ c_p D) [1]; some define the inverse. Good to about 10 %.
#define MOISTAIR_LEWIS_NUMBER 34

// Dry-air mass flow [kg/s].
#define MOISTAIR_DRY_AIR_MASS_FLOW 64

// Volume flow at a stated state [m³/s].
#define MOISTAIR_VOLUME_FLOW 65

// Reference density of a standard volume flow [kg/m³].
#define MOISTAIR_STANDARD_DENSITY 66

// Heat flow, positive into the air [W].
#define MOISTAIR_HEAT_FLOW 67

// Flow of liquid water or steam [kg/s].
#define MOISTAIR_WATER_FLOW 68

// Temperature of liquid water [°C].
#define MOISTAIR_WATER_TEMPERATURE 69

// Specific enthalpy of steam, on the datum of liquid water at the triple point (0 °C for the ideal gas) [J/kg].
#define MOISTAIR_STEAM_ENTHALPY 70

// Temperature that a process is to leave [°C].
#define MOISTAIR_LEAVING_TEMPERATURE 71

// Apparatus dew point of a coil [°C].
#define MOISTAIR_APPARATUS_DEW_POINT 72

// Bypass factor of a coil [1].
#define MOISTAIR_BYPASS_FACTOR 73

// Saturation effectiveness of a humidifier [1].
#define MOISTAIR_SATURATION_EFFECTIVENESS 74

// Temperature at which condensate leaves [°C].
#define MOISTAIR_CONDENSATE_TEMPERATURE 75

// Elevation above mean sea level, range of the standard atmosphere's lowest layer (ISO 2533) [m].
#define MOISTAIR_ELEVATION 76

// Drift of a tower as a fraction of the circulating water [1].
#define MOISTAIR_DRIFT_FRACTION 77

// Concentration of the circulating water over that of the make-up [1].
#define MOISTAIR_CYCLES_OF_CONCENTRATION 78

// Temperature range of the water in a tower [K].
#define MOISTAIR_TOWER_RANGE 79

// Total water per dry air, vapor and condensate [kg/kg].
#define MOISTAIR_TOTAL_WATER 80

// Specific enthalpy that a process leaves, with its condensate [J/kg].
#define MOISTAIR_LEAVING_ENTHALPY 81

// Wet bulb as a psychrometer reads it; over ice not above the melting temperature [°C].
#define MOISTAIR_PSYCHROMETER_WET_BULB 82

// Coefficient of a psychrometer, over water that at 0 °C [1/K].
#define MOISTAIR_PSYCHROMETER_COEFFICIENT 83

// Transfer units of a tower, K a V / L [1].
#define MOISTAIR_MERKEL_NUMBER 96

// Water over dry air in a tower, L/G [1].
#define MOISTAIR_WATER_TO_AIR_RATIO 97

// Merkel number of a fill at a water-to-air ratio of one [1].
#define MOISTAIR_FILL_COEFFICIENT 98

// How the Merkel number of a fill falls with the water-to-air ratio [1].
#define MOISTAIR_FILL_EXPONENT 99

// Height of a fill [m].
#define MOISTAIR_FILL_HEIGHT 100

// Water in basin, pipes and plant together [kg].
#define MOISTAIR_WATER_INVENTORY 101

// Of a dissolved salt; a conductivity serves as well [mg/kg].
#define MOISTAIR_CONCENTRATION 102

// A span of time [s].
#define MOISTAIR_DURATION 103

// Effectiveness of a tower as a heat exchanger of enthalpy [1].
#define MOISTAIR_ENTHALPY_EFFECTIVENESS 104

// Power of its flow that a conductance goes with [1].
#define MOISTAIR_FLOW_EXPONENT 105

// Temperature of a coolant other than water [°C].
#define MOISTAIR_COOLANT_TEMPERATURE 106

// Specific heat of a coolant other than water [J/(kg K)].
#define MOISTAIR_COOLANT_SPECIFIC_HEAT 107

// Thermal conductance of a coil: heat flow per difference of temperature [W/K].
#define MOISTAIR_CONDUCTANCE 108

// Conductance of the water side of a coil over that of its air side [1].
#define MOISTAIR_CONDUCTANCE_RATIO 109

// Vapor over all of the water in wet steam, by mass [1].
#define MOISTAIR_STEAM_QUALITY 110

// Absolute pressure of steam [Pa].
#define MOISTAIR_STEAM_PRESSURE 111

// Temperature of superheated steam [°C].
#define MOISTAIR_STEAM_TEMPERATURE 112

// (t1 - t2) over the drive of an indirect evaporative cooler [1].
#define MOISTAIR_INDIRECT_EFFECTIVENESS 113

// Power of a pump, which ends as heat in its water [W].
#define MOISTAIR_PUMP_HEAT 114

// Moisture that a room gives to its air [kg/s].
#define MOISTAIR_MOISTURE_GAIN 135

// Specific enthalpy of that moisture as it comes, from ice to steam [J/kg].
#define MOISTAIR_MOISTURE_ENTHALPY 136

// Sensible over total gain of a room [1].
#define MOISTAIR_SENSIBLE_HEAT_RATIO 137

// Slope of a process line [J/kg].
#define MOISTAIR_PROCESS_SLOPE 138

// Heat of sorption over heat of vaporization [1].
#define MOISTAIR_SORPTION_HEAT_RATIO 139

// Drying as a fraction of what a desiccant could do at best [1].
#define MOISTAIR_DRYING_EFFECTIVENESS 140

// Effectiveness of a desiccant wheel in one of its two potentials [1].
#define MOISTAIR_POTENTIAL_EFFECTIVENESS 141

// Rise of temperature by the heat that a wheel carries over [K].
#define MOISTAIR_CARRY_OVER_RISE 142

// Temperature of air in the correlation of a wheel's potentials, 275 to 425 K [°C].
#define MOISTAIR_DESICCANT_TEMPERATURE 143

// Dry air from outdoors over the dry air of a mixture [1].
#define MOISTAIR_OUTDOOR_AIR_FRACTION 150

// Standard uncertainty of a reading, in the unit of the reading [1].
#define MOISTAIR_STANDARD_UNCERTAINTY 151

// Share of a tracer gas, such as carbon dioxide, in dry air [µmol/mol].
#define MOISTAIR_TRACER_CONCENTRATION 152

// What a temperature must pass a limit by before a control switches on [K].
#define MOISTAIR_TEMPERATURE_HYSTERESIS 153

// What an enthalpy must pass a limit by before a control switches on [J/kg].
#define MOISTAIR_ENTHALPY_HYSTERESIS 154

// Heat that a coil takes out per dry air [J/kg].
#define MOISTAIR_COIL_ENERGY 155

// Dry air and water vapor as a virial mixture after IAPWS G8-10: the default.
#define MOISTAIR_REAL_GAS 0

// The perfect-gas relations of the ASHRAE handbook, for reproducing contract and textbook numbers.
#define MOISTAIR_IDEAL_GAS 1

// IAPWS G8-10 as published, all terms: -80 to 200 °C, to 5 MPa; slower. An unknown selector in a library that was built without it.
#define MOISTAIR_HELMHOLTZ 2

// The wetted bulb is covered with water, supercooled below the melting temperature.
#define MOISTAIR_BULB_WATER 0

// The wetted bulb is covered with ice.
#define MOISTAIR_BULB_ICE 1

// Coefficient of an aspirated psychrometer over water at 0 °C [1/K]: WMO-No. 8 (from memory). It holds for 3 to 5 m/s over shielded bulbs.
#define MOISTAIR_ASPIRATED_OVER_WATER 6.53e-4

// Coefficient of an aspirated psychrometer over ice [1/K]: WMO-No. 8 (from memory).
#define MOISTAIR_ASPIRATED_OVER_ICE 5.75e-4

// air.from_psychrometer. Takes 0 dry_bulb [°C], 1 wet_bulb [°C], 2 bulb [choice: 0 water 1 ice], 3 coefficient [1/K], 4 pressure [Pa];
// gives 0–2 air (state).
#define MOISTAIR_PROCESS_AIR_FROM_PSYCHROMETER 100

// air.psychrometer_reading. Takes 0–2 air (state), 3 bulb [choice: 0 water 1 ice], 4 coefficient [1/K]; gives 0 wet_bulb [°C].
#define MOISTAIR_PROCESS_AIR_PSYCHROMETER_READING 101

// air.at_pressure. Takes 0–2 air (state), 3 pressure [Pa]; gives 0–2 air (state).
#define MOISTAIR_PROCESS_AIR_AT_PRESSURE 102

// air.at_temperature_and_pressure. Takes 0–2 air (state), 3 dry_bulb [°C], 4 pressure [Pa]; gives 0–2 air (state).
#define MOISTAIR_PROCESS_AIR_AT_TEMPERATURE_AND_PRESSURE 103

// air.dew_point_at. Takes 0–2 air (state), 3 pressure [Pa]; gives 0 dew_point [°C].
#define MOISTAIR_PROCESS_AIR_DEW_POINT_AT 104

// air.frost_point_at. Takes 0–2 air (state), 3 pressure [Pa]; gives 0 frost_point [°C].
#define MOISTAIR_PROCESS_AIR_FROST_POINT_AT 105

// saturation_temperature_after. Takes 0 given [choice: code of a quantity], 1 value [°C], 2 pressure [Pa], 3 wanted [choice: code of a
// quantity], 4 new_pressure [Pa]; gives 0 wanted [°C].
#define MOISTAIR_PROCESS_SATURATION_TEMPERATURE_AFTER 106

// stream. Takes 0–2 air (state), 3 dry_air_flow [kg/s]; gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
#define MOISTAIR_PROCESS_STREAM 200

// stream.from_volume_flow. Takes 0–2 air (state), 3 volume_flow [m³/s]; gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow
// [m³/s].
#define MOISTAIR_PROCESS_STREAM_FROM_VOLUME_FLOW 201

// stream.from_standard_volume_flow. Takes 0–2 air (state), 3 volume_flow [m³/s], 4 reference_density [kg/m³]; gives 0–2 air (state),
// 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
#define MOISTAIR_PROCESS_STREAM_FROM_STANDARD_VOLUME_FLOW 202

// wet_stream. Takes 0–2 air.air (state), 3 air.liquid [kg/kg], 4 air.ice [kg/kg], 5 dry_air_flow [kg/s]; gives 0–2 air.air (state),
// 3 air.liquid [kg/kg], 4 air.ice [kg/kg], 5 air.total_water [kg/kg], 6 air.specific_enthalpy [J/kg], 7 air.is_wet [flag], 8 dry_air_flow
// [kg/s].
#define MOISTAIR_PROCESS_WET_STREAM 203

// wet_air. Takes 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water
// [kg/kg], 6 specific_enthalpy [J/kg], 7 is_wet [flag].
#define MOISTAIR_PROCESS_WET_AIR 204

// wet_air.from_enthalpy_and_water. Takes 0 specific_enthalpy [J/kg], 1 total_water [kg/kg], 2 freezing [choice: 0 equilibrium 1
// supercooled], 3 pressure [Pa]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water [kg/kg], 6 specific_enthalpy
// [J/kg], 7 is_wet [flag].
#define MOISTAIR_PROCESS_WET_AIR_FROM_ENTHALPY_AND_WATER 205

// wet_air.from_dry_bulb_and_water. Takes 0 dry_bulb [°C], 1 total_water [kg/kg], 2 freezing [choice: 0 equilibrium 1 supercooled],
// 3 pressure [Pa]; gives 0–2 air (state), 3 liquid [kg/kg], 4 ice [kg/kg], 5 total_water [kg/kg], 6 specific_enthalpy [J/kg], 7 is_wet
// [flag].
#define MOISTAIR_PROCESS_WET_AIR_FROM_DRY_BULB_AND_WATER 206

// liquid_water_enthalpy. Takes 0 water_temperature [°C], 1 pressure [Pa]; gives 0 specific_enthalpy [J/kg].
#define MOISTAIR_PROCESS_LIQUID_WATER_ENTHALPY 207

// sensible.to_temperature. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 leaving_temperature [°C]; gives
// 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
// 7 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_SENSIBLE_TO_TEMPERATURE 300

// sensible.with_heat. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 heat [W]; gives 0–2 leaving.air (state),
// 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
// 7 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_SENSIBLE_WITH_HEAT 301

// coil.to_state. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 leaving (state), 7 condensate_temperature [choice: 0
// leaving air, 1 apparatus, 2 given], 8 condensate_temperature.given [°C]; gives 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s],
// 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s], 9 leaving.volume_flow [m³/s], 10 exchange.heat
// [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W], 14 sensible [W], 15 latent [W], 16 condensate
// [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio [1].
#define MOISTAIR_PROCESS_COIL_TO_STATE 400

// coil.by_bypass_factor. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 apparatus_dew_point [°C], 5 bypass_factor [1],
// 6 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 7 condensate_temperature.given [°C]; gives 0–2 entering.air
// (state), 3 entering.dry_air_flow [kg/s], 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s],
// 9 leaving.volume_flow [m³/s], 10 exchange.heat [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W],
// 14 sensible [W], 15 latent [W], 16 condensate [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio
// [1].
#define MOISTAIR_PROCESS_COIL_BY_BYPASS_FACTOR 401

// coil.apparatus_dew_point. Takes 0–2 entering (state), 3–5 leaving (state); gives 0 dew_point [°C], 1 bypass_factor [1].
#define MOISTAIR_PROCESS_COIL_APPARATUS_DEW_POINT 402

// coil.apparatus_dew_points. Takes 0–2 entering (state), 3–5 leaving (state); gives 0 warmer.dew_point [°C], 1 warmer.bypass_factor [1],
// 2 colder.dew_point [°C], 3 colder.bypass_factor [1], 4 nearest [°C].
#define MOISTAIR_PROCESS_COIL_APPARATUS_DEW_POINTS 403

// coil.bypass_factor_of_rows. Takes 0 of_one_row [1], 1 rows [1]; gives 0 bypass_factor [1].
#define MOISTAIR_PROCESS_COIL_BYPASS_FACTOR_OF_ROWS 404

// coil.with_water. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 air_side [W/K], 5 water_side [W/K], 6 arrangement
// [choice: 0 counterflow 1 cross flow], 7 water_flow [kg/s], 8 entering_water [°C], 9 specific_heat [choice: 0 of water, 2 given],
// 10 specific_heat.given [J/(kg K)], 11 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given],
// 12 condensate_temperature.given [°C]; gives 0–2 air.entering.air (state), 3 air.entering.dry_air_flow [kg/s], 4 air.entering.volume_flow
// [m³/s], 5–7 air.leaving.air (state), 8 air.leaving.dry_air_flow [kg/s], 9 air.leaving.volume_flow [m³/s], 10 air.exchange.heat [W],
// 11 air.exchange.water [kg/s], 12 air.exchange.water_enthalpy_flow [W], 13 air.cooling_load [W], 14 air.sensible [W], 15 air.latent [W],
// 16 air.condensate [kg/s], 17 air.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 air.sensible_heat_ratio [1], 19 leaving_water
// [°C], 20 dry_fraction [1], 21 coldest_surface [°C], 22 freezing [flag].
#define MOISTAIR_PROCESS_COIL_WITH_WATER 405

// coil.surface_from_rating. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 entering_water [°C],
// 6 specific_heat [choice: 0 of water, 2 given], 7 specific_heat.given [J/(kg K)], 8 measured [choice: 0 leaving air, 1 leaving water, 2
// heat], 9 value [°C or W], 10 conductance_ratio [1], 11 arrangement [choice: 0 counterflow 1 cross flow]; gives 0 air_side [W/K],
// 1 water_side [W/K].
#define MOISTAIR_PROCESS_COIL_SURFACE_FROM_RATING 406

// coil.between. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 leaving (state), 7 condensate_temperature [choice: 0
// leaving air, 1 apparatus, 2 given], 8 condensate_temperature.given [°C], 9 dead_band [kg/kg]; gives 0–2 entering.air (state),
// 3 entering.dry_air_flow [kg/s], 4 entering.volume_flow [m³/s], 5–7 leaving.air (state), 8 leaving.dry_air_flow [kg/s],
// 9 leaving.volume_flow [m³/s], 10 exchange.heat [W], 11 exchange.water [kg/s], 12 exchange.water_enthalpy_flow [W], 13 cooling_load [W],
// 14 sensible [W], 15 latent [W], 16 condensate [kg/s], 17 regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 sensible_heat_ratio
// [1].
#define MOISTAIR_PROCESS_COIL_BETWEEN 407

// coil.surface_at_flows. Takes 0 air_side [W/K], 1 water_side [W/K], 2 arrangement [choice: 0 counterflow 1 cross flow],
// 3 found_at_air_flow [kg/s], 4 found_at_water_flow [kg/s], 5 air_flow [kg/s], 6 water_flow [kg/s], 7 air_side_exponent [1],
// 8 water_side_exponent [1]; gives 0 air_side [W/K], 1 water_side [W/K].
#define MOISTAIR_PROCESS_COIL_SURFACE_AT_FLOWS 408

// coil.load_by_water. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 load_by_air [W], 5 water_flow [kg/s],
// 6 entering_water [°C], 7 specific_heat [choice: 0 of water, 2 given], 8 specific_heat.given [J/(kg K)], 9 leaving_water [°C]; gives
// 0 load [W], 1 air_less_water [W].
#define MOISTAIR_PROCESS_COIL_LOAD_BY_WATER 409

// mixing.adiabatic. Takes any number of times: 0–2 streams.air.air (state), 3 streams.air.liquid [kg/kg], 4 streams.air.ice [kg/kg],
// 5 streams.dry_air_flow [kg/s]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_MIXING_ADIABATIC 500

// mixing.adiabatic_at. Takes 0 pressure [Pa], 1 freezing [choice: 0 equilibrium 1 supercooled], any number of times: 2–4 streams.air.air
// (state), 5 streams.air.liquid [kg/kg], 6 streams.air.ice [kg/kg], 7 streams.dry_air_flow [kg/s]; gives 0–2 leaving.air.air (state),
// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
// 11 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_MIXING_ADIABATIC_AT 501

// mixing.remainder. Takes 0 total_flow [kg/s], 1–3 part.air (state), 4 part.dry_air_flow [kg/s], 5–7 air (state); gives 0–2 air (state),
// 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
#define MOISTAIR_PROCESS_MIXING_REMAINDER 502

// mixing.outdoor_air_from_readings. Takes 0 quantity [choice: code of a quantity], 1 outdoor.value [unit of the quantity],
// 2 outdoor.standard_uncertainty [unit of the quantity], 3 outdoor.quality [choice: 0 good 1 repaired 2 refused], 4 returned.value [unit
// of the quantity], 5 returned.standard_uncertainty [unit of the quantity], 6 returned.quality [choice: 0 good 1 repaired 2 refused],
// 7 mixed.value [unit of the quantity], 8 mixed.standard_uncertainty [unit of the quantity], 9 mixed.quality [choice: 0 good 1 repaired 2
// refused], 10 acceptable [1]; gives 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2
// below zero, 3 above one, 4 indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
#define MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_READINGS 510

// mixing.outdoor_air_from_air. Takes 0 quantity [choice: code of a quantity], 1 outdoor.dry_bulb.value [unit of the quantity],
// 2 outdoor.dry_bulb.standard_uncertainty [unit of the quantity], 3 outdoor.dry_bulb.quality [choice: 0 good 1 repaired 2 refused],
// 4 outdoor.humidity.value [unit of the quantity], 5 outdoor.humidity.standard_uncertainty [unit of the quantity],
// 6 outdoor.humidity.quality [choice: 0 good 1 repaired 2 refused], 7 outdoor.humidity_quantity [choice: code of a quantity],
// 8 returned.dry_bulb.value [unit of the quantity], 9 returned.dry_bulb.standard_uncertainty [unit of the quantity],
// 10 returned.dry_bulb.quality [choice: 0 good 1 repaired 2 refused], 11 returned.humidity.value [unit of the quantity],
// 12 returned.humidity.standard_uncertainty [unit of the quantity], 13 returned.humidity.quality [choice: 0 good 1 repaired 2 refused],
// 14 returned.humidity_quantity [choice: code of a quantity], 15 mixed.dry_bulb.value [unit of the quantity],
// 16 mixed.dry_bulb.standard_uncertainty [unit of the quantity], 17 mixed.dry_bulb.quality [choice: 0 good 1 repaired 2 refused],
// 18 mixed.humidity.value [unit of the quantity], 19 mixed.humidity.standard_uncertainty [unit of the quantity], 20 mixed.humidity.quality
// [choice: 0 good 1 repaired 2 refused], 21 mixed.humidity_quantity [choice: code of a quantity], 22 pressure [Pa], 23 acceptable [1];
// gives 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2 below zero, 3 above one, 4
// indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
#define MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_AIR 511

// mixing.outdoor_air_from_flows. Takes 0 outdoor.value [unit of the quantity], 1 outdoor.standard_uncertainty [unit of the quantity],
// 2 outdoor.quality [choice: 0 good 1 repaired 2 refused], 3 other.value [unit of the quantity], 4 other.standard_uncertainty [unit of the
// quantity], 5 other.quality [choice: 0 good 1 repaired 2 refused], 6 other_is [choice: 0 total 1 recirculated], 7 acceptable [1]; gives
// 0 fraction [1], 1 standard_uncertainty [1], 2 fraction_status [choice, 0 determined, 1 uncertain, 2 below zero, 3 above one, 4
// indeterminate], 3 quality [choice, 0 good, 1 repaired, 2 refused].
#define MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FROM_FLOWS 512

// mixing.outdoor_air_for_temperature. Takes 0–2 outdoor (state), 3–5 returned (state), 6 wanted_temperature [°C], 7 least [1], 8 most [1];
// gives 0 fraction [1], 1–3 mixed.leaving.air.air (state), 4 mixed.leaving.air.liquid [kg/kg], 5 mixed.leaving.air.ice [kg/kg],
// 6 mixed.leaving.air.total_water [kg/kg], 7 mixed.leaving.air.specific_enthalpy [J/kg], 8 mixed.leaving.air.is_wet [flag],
// 9 mixed.leaving.dry_air_flow [kg/s], 10 mixed.exchange.heat [W], 11 mixed.exchange.water [kg/s], 12 mixed.exchange.water_enthalpy_flow
// [W], 13 reach [choice, 0 reached, 1 at the least, 2 at the most].
#define MOISTAIR_PROCESS_MIXING_OUTDOOR_AIR_FOR_TEMPERATURE 513

// mixing.with_outdoor_air. Takes 0–2 outdoor (state), 3–5 returned (state), 6 fraction [1]; gives 0–2 leaving.air.air (state),
// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
// 11 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_MIXING_WITH_OUTDOOR_AIR 514

// humidify.saturated_steam_enthalpy. Takes 0 steam_temperature [°C]; gives 0 specific_enthalpy [J/kg].
#define MOISTAIR_PROCESS_HUMIDIFY_SATURATED_STEAM_ENTHALPY 600

// humidify.steam. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_flow [kg/s], 5 steam_enthalpy [J/kg]; gives
// 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg],
// 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W],
// 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_STEAM 601

// humidify.steam_to_humidity_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 humidity_ratio [kg/kg],
// 5 steam_enthalpy [J/kg]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_STEAM_TO_HUMIDITY_RATIO 602

// humidify.steam_to_relative_humidity. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 relative_humidity [1],
// 5 steam_enthalpy [J/kg]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg],
// 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s],
// 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_STEAM_TO_RELATIVE_HUMIDITY 603

// humidify.steam_limit. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_enthalpy [J/kg]; gives 0 steam_flow
// [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_STEAM_LIMIT 604

// humidify.spray. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 water_temperature [°C]; gives
// 0–2 leaving.air.air (state), 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg],
// 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W],
// 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_SPRAY 605

// humidify.evaporative. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 saturation_effectiveness [1],
// 5 water_temperature [choice: 0 wet bulb, 2 given], 6 water_temperature.given [°C]; gives 0–2 leaving.air.air (state),
// 3 leaving.air.liquid [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg],
// 7 leaving.air.is_wet [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s],
// 11 exchange.water_enthalpy_flow [W], 12 evaporated [kg/s], 13 carried [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_EVAPORATIVE 606

// humidify.steam_absorption. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 steam_enthalpy [J/kg]; gives 0 up_to
// [kg/s], 1 unsaturated_from [kg/s].
#define MOISTAIR_PROCESS_HUMIDIFY_STEAM_ABSORPTION 607

// humidify.saturated_steam. Takes 0 steam_pressure [Pa]; gives 0 specific_enthalpy [J/kg].
#define MOISTAIR_PROCESS_HUMIDIFY_SATURATED_STEAM 608

// humidify.wet_steam. Takes 0 steam_pressure [Pa], 1 quality [1]; gives 0 specific_enthalpy [J/kg].
#define MOISTAIR_PROCESS_HUMIDIFY_WET_STEAM 609

// humidify.superheated_steam. Takes 0 steam_temperature [°C], 1 steam_pressure [Pa]; gives 0 specific_enthalpy [J/kg].
#define MOISTAIR_PROCESS_HUMIDIFY_SUPERHEATED_STEAM 610

// humidify.throttled_steam. Takes 0 steam_enthalpy [J/kg], 1 pressure [Pa]; gives 0 temperature [°C], 1 superheat [K], 2 quality [1],
// 3 condition [choice, 0 superheated, 1 wet].
#define MOISTAIR_PROCESS_HUMIDIFY_THROTTLED_STEAM 611

// humidify.wash. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 water_temperature [°C],
// 6 effectiveness [1], 7 pump_heat [W], 8 carry_over_fraction [1]; gives 0–2 air.leaving.air.air (state), 3 air.leaving.air.liquid
// [kg/kg], 4 air.leaving.air.ice [kg/kg], 5 air.leaving.air.total_water [kg/kg], 6 air.leaving.air.specific_enthalpy [J/kg],
// 7 air.leaving.air.is_wet [flag], 8 air.leaving.dry_air_flow [kg/s], 9 air.exchange.heat [W], 10 air.exchange.water [kg/s],
// 11 air.exchange.water_enthalpy_flow [W], 12 air.evaporated [kg/s], 13 air.carried [kg/s], 14 leaving_water [kg/s],
// 15 leaving_water_temperature [°C], 16 heat_to_water [W], 17 moistening [choice, 0 humidifies, 1 dehumidifies].
#define MOISTAIR_PROCESS_HUMIDIFY_WASH 612

// tower.water_use. Takes 0 evaporation [kg/s], 1 circulating_flow [kg/s], 2 drift_fraction [1], 3 cycles_of_concentration [1]; gives
// 0 evaporation [kg/s], 1 drift [kg/s], 2 blowdown [kg/s], 3 make_up [kg/s], 4 limited_by_drift [flag].
#define MOISTAIR_PROCESS_TOWER_WATER_USE 700

// tower.with_air_flow. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
// [°C], 7 drift_fraction [1], 8 cycles_of_concentration [1]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s],
// 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 heat_rejected [W],
// 9 water.evaporation [kg/s], 10 water.drift [kg/s], 11 water.blowdown [kg/s], 12 water.make_up [kg/s], 13 water.limited_by_drift [flag],
// 14 range [K], 15 approach [K], 16 effectiveness [1].
#define MOISTAIR_PROCESS_TOWER_WITH_AIR_FLOW 701

// tower.with_leaving_air. Takes 0–2 entering (state), 3–5 leaving (state), 6 water_flow [kg/s], 7 hot_water [°C], 8 cold_water [°C],
// 9 drift_fraction [1], 10 cycles_of_concentration [1]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow [kg/s],
// 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 heat_rejected [W],
// 9 water.evaporation [kg/s], 10 water.drift [kg/s], 11 water.blowdown [kg/s], 12 water.make_up [kg/s], 13 water.limited_by_drift [flag],
// 14 range [K], 15 approach [K], 16 effectiveness [1].
#define MOISTAIR_PROCESS_TOWER_WITH_LEAVING_AIR 702

// tower.water_to_air_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s]; gives 0 water_to_air [1].
#define MOISTAIR_PROCESS_TOWER_WATER_TO_AIR_RATIO 703

// tower.coldest_water. Takes 0–2 air (state); gives 0 water_temperature [°C].
#define MOISTAIR_PROCESS_TOWER_COLDEST_WATER 704

// tower.merkel_pinch. Takes 0–2 air (state), 3 hot_water [°C], 4 cold_water [°C]; gives 0 water_to_air [1], 1 temperature [°C].
#define MOISTAIR_PROCESS_TOWER_MERKEL_PINCH 705

// tower.merkel_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
// [°C], 7 quadrature [choice: 0 Gauss-Legendre 1 Gauss-Legendre graded 2 four points]; gives 0 number [1], 1 water_to_air [1],
// 2 pinch.water_to_air [1], 3 pinch.temperature [°C], 4 heat_rejected [W], 5 leaving_enthalpy [J/kg].
#define MOISTAIR_PROCESS_TOWER_MERKEL_NUMBER 706

// tower.merkel_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 number [1];
// gives 0 cold_water [°C], 1 heat_rejected [W], 2 leaving_enthalpy [J/kg], 3 water_to_air [1], 4 range [K], 5 approach [K],
// 6 effectiveness [1], 7 direction [choice, 0 cooling, 1 reversed].
#define MOISTAIR_PROCESS_TOWER_MERKEL_RATE 707

// tower.air_for_duty. Takes 0–2 air (state), 3 water_flow [kg/s], 4 hot_water [°C], 5 cold_water [°C], 6 coefficient [1], 7 exponent [1];
// gives 0–2 air (state), 3 dry_air_flow [kg/s], 4 volume_flow [m³/s].
#define MOISTAIR_PROCESS_TOWER_AIR_FOR_DUTY 708

// tower.effectiveness_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C],
// 6 cold_water [°C]; gives 0 number [1].
#define MOISTAIR_PROCESS_TOWER_EFFECTIVENESS_NUMBER 709

// tower.effectiveness_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C],
// 6 number [1]; gives 0 cold_water [°C], 1 heat_rejected [W], 2 leaving_enthalpy [J/kg], 3 water_to_air [1], 4 range [K], 5 approach [K],
// 6 effectiveness [1], 7 direction [choice, 0 cooling, 1 reversed].
#define MOISTAIR_PROCESS_TOWER_EFFECTIVENESS_RATE 710

// tower.poppe_number. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 cold_water
// [°C], 7 transfer [choice: 0 Bosnjakovic 1 Lewis factor one 2 evaporation suppressed]; gives 0 number [1].
#define MOISTAIR_PROCESS_TOWER_POPPE_NUMBER 711

// tower.poppe_rate. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 water_flow [kg/s], 5 hot_water [°C], 6 number [1],
// 7 transfer [choice: 0 Bosnjakovic 1 Lewis factor one 2 evaporation suppressed]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid
// [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet
// [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 cold_water
// [°C], 13 evaporation [kg/s], 14 heat_rejected [W], 15 water_to_air [1], 16 range [K], 17 approach [K], 18 effectiveness [1],
// 19 direction [choice, 0 cooling, 1 reversed], 20 is_fogged [flag].
#define MOISTAIR_PROCESS_TOWER_POPPE_RATE 712

// tower.fill_from_two_tests. Takes 0 first_water_to_air [1], 1 first_number [1], 2 second_water_to_air [1], 3 second_number [1]; gives
// 0 coefficient [1], 1 exponent [1].
#define MOISTAIR_PROCESS_TOWER_FILL_FROM_TWO_TESTS 713

// tower.fill_number. Takes 0 coefficient [1], 1 exponent [1], 2 water_to_air [1]; gives 0 number [1].
#define MOISTAIR_PROCESS_TOWER_FILL_NUMBER 714

// tower.fill_height. Takes 0 coefficient [1], 1 exponent [1], 2 number [1], 3 water_to_air [1], 4 tested_height [m]; gives 0 height [m].
#define MOISTAIR_PROCESS_TOWER_FILL_HEIGHT 715

// tower.cycles_of_concentration. Takes 0 circulating [mg/kg], 1 make_up [mg/kg]; gives 0 cycles [1].
#define MOISTAIR_PROCESS_TOWER_CYCLES_OF_CONCENTRATION 716

// tower.evaporation_by_rule_of_thumb. Takes 0 circulating_flow [kg/s], 1 water_range [K]; gives 0 evaporation [kg/s].
#define MOISTAIR_PROCESS_TOWER_EVAPORATION_BY_RULE_OF_THUMB 717

// tower.basin_after. Takes 0 concentration [mg/kg], 1 inventory [kg], 2 duration [s], 3 blowdown [kg/s], 4 drift [kg/s], 5 make_up_flow
// [kg/s], 6 make_up_concentration [mg/kg]; gives 0 concentration [mg/kg].
#define MOISTAIR_PROCESS_TOWER_BASIN_AFTER 718

// compression.to_pressure. Takes 0–2 entering.air.air (state), 3 entering.air.liquid [kg/kg], 4 entering.air.ice [kg/kg],
// 5 entering.dry_air_flow [kg/s], 6 pressure [Pa], 7 leaving_temperature [°C]; gives 0–2 leaving.air.air (state), 3 leaving.air.liquid
// [kg/kg], 4 leaving.air.ice [kg/kg], 5 leaving.air.total_water [kg/kg], 6 leaving.air.specific_enthalpy [J/kg], 7 leaving.air.is_wet
// [flag], 8 leaving.dry_air_flow [kg/s], 9 exchange.heat [W], 10 exchange.water [kg/s], 11 exchange.water_enthalpy_flow [W], 12 condensate
// [kg/s].
#define MOISTAIR_PROCESS_COMPRESSION_TO_PRESSURE 800

// books.balance. Takes 0 exchange.heat [W], 1 exchange.water [kg/s], 2 exchange.water_enthalpy_flow [W], 3–5 leaving.air.air (state),
// 6 leaving.air.liquid [kg/kg], 7 leaving.air.ice [kg/kg], 8 leaving.dry_air_flow [kg/s], any number of times: 9–11 entering.air.air
// (state), 12 entering.air.liquid [kg/kg], 13 entering.air.ice [kg/kg], 14 entering.dry_air_flow [kg/s]; gives 0 heat_residual [W],
// 1 heat_scale [W], 2 water_residual [kg/s], 3 water_scale [kg/s], 4 heat_resolution [W], 5 close [flag].
#define MOISTAIR_PROCESS_BOOKS_BALANCE 900

// reheat.to_state. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 target (state), 7 coil_leaving_relative_humidity
// [1], 8 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 9 condensate_temperature.given [°C]; gives
// 0–2 cooling.entering.air (state), 3 cooling.entering.dry_air_flow [kg/s], 4 cooling.entering.volume_flow [m³/s], 5–7 cooling.leaving.air
// (state), 8 cooling.leaving.dry_air_flow [kg/s], 9 cooling.leaving.volume_flow [m³/s], 10 cooling.exchange.heat [W],
// 11 cooling.exchange.water [kg/s], 12 cooling.exchange.water_enthalpy_flow [W], 13 cooling.cooling_load [W], 14 cooling.sensible [W],
// 15 cooling.latent [W], 16 cooling.condensate [kg/s], 17 cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet],
// 18 cooling.sensible_heat_ratio [1], 19–21 heating.leaving.air (state), 22 heating.leaving.dry_air_flow [kg/s],
// 23 heating.leaving.volume_flow [m³/s], 24 heating.exchange.heat [W], 25 heating.exchange.water [kg/s],
// 26 heating.exchange.water_enthalpy_flow [W], 27 reheat [W], 28 reheat_fraction [1].
#define MOISTAIR_PROCESS_REHEAT_TO_STATE 1000

// reheat.with_coil. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 target (state), 7 coil_leaving [choice: 0 relative
// humidity, 1 bypass], 8 coil_leaving.fraction [1], 9 coil_leaving.coldest [°C], 10 condensate_temperature [choice: 0 leaving air, 1
// apparatus, 2 given], 11 condensate_temperature.given [°C]; gives 0–2 cooling.entering.air (state), 3 cooling.entering.dry_air_flow
// [kg/s], 4 cooling.entering.volume_flow [m³/s], 5–7 cooling.leaving.air (state), 8 cooling.leaving.dry_air_flow [kg/s],
// 9 cooling.leaving.volume_flow [m³/s], 10 cooling.exchange.heat [W], 11 cooling.exchange.water [kg/s],
// 12 cooling.exchange.water_enthalpy_flow [W], 13 cooling.cooling_load [W], 14 cooling.sensible [W], 15 cooling.latent [W],
// 16 cooling.condensate [kg/s], 17 cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly wet], 18 cooling.sensible_heat_ratio [1],
// 19–21 heating.leaving.air (state), 22 heating.leaving.dry_air_flow [kg/s], 23 heating.leaving.volume_flow [m³/s],
// 24 heating.exchange.heat [W], 25 heating.exchange.water [kg/s], 26 heating.exchange.water_enthalpy_flow [W], 27 reheat [W],
// 28 reheat_fraction [1].
#define MOISTAIR_PROCESS_REHEAT_WITH_COIL 1001

// room.supply_at_temperature. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0
// saturated vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7 supply_temperature [°C]; gives 0–2 supply.air
// (state), 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg], 9 room.air.ice
// [kg/kg], 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag], 13 room.dry_air_flow [kg/s],
// 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_ROOM_SUPPLY_AT_TEMPERATURE 1500

// room.supply_at_flow. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7 dry_air_flow [kg/s]; gives 0–2 supply.air (state),
// 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg], 9 room.air.ice [kg/kg],
// 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag], 13 room.dry_air_flow [kg/s],
// 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_ROOM_SUPPLY_AT_FLOW 1501

// room.room_of_supply. Takes 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4 gains.sensible [W], 5 gains.moisture [kg/s],
// 6 gains.moisture_source [choice: 0 saturated vapor, 1 liquid, 2 enthalpy], 7 gains.moisture_source.value [°C or J/kg]; gives
// 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4 supply.volume_flow [m³/s], 5–7 room.air.air (state), 8 room.air.liquid [kg/kg],
// 9 room.air.ice [kg/kg], 10 room.air.total_water [kg/kg], 11 room.air.specific_enthalpy [J/kg], 12 room.air.is_wet [flag],
// 13 room.dry_air_flow [kg/s], 14 exchange.heat [W], 15 exchange.water [kg/s], 16 exchange.water_enthalpy_flow [W].
#define MOISTAIR_PROCESS_ROOM_ROOM_OF_SUPPLY 1502

// room.gains_between. Takes 0–2 supply.air (state), 3 supply.dry_air_flow [kg/s], 4–6 room (state), 7 moisture_source [choice: 0 saturated
// vapor, 1 liquid, 2 enthalpy], 8 moisture_source.value [°C or J/kg]; gives 0 sensible [W], 1 moisture [kg/s].
#define MOISTAIR_PROCESS_ROOM_GAINS_BETWEEN 1503

// room.latent_heat. Takes 0–2 room (state); gives 0 latent_heat [J/kg].
#define MOISTAIR_PROCESS_ROOM_LATENT_HEAT 1504

// room.sensible_heat_ratio. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0
// saturated vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg]; gives 0 sensible_heat_ratio [1].
#define MOISTAIR_PROCESS_ROOM_SENSIBLE_HEAT_RATIO 1505

// room.process_slope. Takes 0 gains.sensible [W], 1 gains.moisture [kg/s], 2 gains.moisture_source [choice: 0 saturated vapor, 1 liquid, 2
// enthalpy], 3 gains.moisture_source.value [°C or J/kg], 4 pressure [Pa]; gives 0 slope [J/kg].
#define MOISTAIR_PROCESS_ROOM_PROCESS_SLOPE 1506

// room.slope_of_ratio. Takes 0–2 room (state), 3 sensible_heat_ratio [1]; gives 0 slope [J/kg].
#define MOISTAIR_PROCESS_ROOM_SLOPE_OF_RATIO 1507

// room.ratio_of_slope. Takes 0–2 room (state), 3 slope [J/kg]; gives 0 sensible_heat_ratio [1].
#define MOISTAIR_PROCESS_ROOM_RATIO_OF_SLOPE 1508

// room.apparatus_dew_points. Takes 0–2 room (state), 3 sensible_heat_ratio [1]; gives 0 warmer [°C], 1 colder [°C].
#define MOISTAIR_PROCESS_ROOM_APPARATUS_DEW_POINTS 1509

// room.limiting_line. Takes 0–2 room (state), 3–5 entering (state), 6 coil_leaving [choice: 0 relative humidity, 1 bypass],
// 7 coil_leaving.fraction [1], 8 coil_leaving.coldest [°C]; gives 0 sensible_heat_ratio [1], 1 slope [J/kg], 2 touches [°C], 3 at_coldest
// [flag].
#define MOISTAIR_PROCESS_ROOM_LIMITING_LINE 1510

// room.least_reheat. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7–9 entering (state), 10 coil_leaving [choice: 0 relative
// humidity, 1 bypass], 11 coil_leaving.fraction [1], 12 coil_leaving.coldest [°C]; gives 0 reheat [W], 1 cause [choice, 0 not needed, 1
// line misses the coil, 2 coldest of the coil], 2–4 supply.air (state), 5 supply.dry_air_flow [kg/s], 6 supply.volume_flow [m³/s],
// 7–9 coil_leaving (state), 10 limit.sensible_heat_ratio [1], 11 limit.slope [J/kg], 12 limit.touches [°C], 13 limit.at_coldest [flag].
#define MOISTAIR_PROCESS_ROOM_LEAST_REHEAT 1511

// room.conditioned. Takes 0–2 room (state), 3 gains.sensible [W], 4 gains.moisture [kg/s], 5 gains.moisture_source [choice: 0 saturated
// vapor, 1 liquid, 2 enthalpy], 6 gains.moisture_source.value [°C or J/kg], 7–9 entering.air (state), 10 entering.dry_air_flow [kg/s],
// 11 coil_leaving [choice: 0 relative humidity, 1 bypass], 12 coil_leaving.fraction [1], 13 coil_leaving.coldest [°C],
// 14 condensate_temperature [choice: 0 leaving air, 1 apparatus, 2 given], 15 condensate_temperature.given [°C]; gives 0–2 room.supply.air
// (state), 3 room.supply.dry_air_flow [kg/s], 4 room.supply.volume_flow [m³/s], 5–7 room.room.air.air (state), 8 room.room.air.liquid
// [kg/kg], 9 room.room.air.ice [kg/kg], 10 room.room.air.total_water [kg/kg], 11 room.room.air.specific_enthalpy [J/kg],
// 12 room.room.air.is_wet [flag], 13 room.room.dry_air_flow [kg/s], 14 room.exchange.heat [W], 15 room.exchange.water [kg/s],
// 16 room.exchange.water_enthalpy_flow [W], 17–19 reheat.cooling.entering.air (state), 20 reheat.cooling.entering.dry_air_flow [kg/s],
// 21 reheat.cooling.entering.volume_flow [m³/s], 22–24 reheat.cooling.leaving.air (state), 25 reheat.cooling.leaving.dry_air_flow [kg/s],
// 26 reheat.cooling.leaving.volume_flow [m³/s], 27 reheat.cooling.exchange.heat [W], 28 reheat.cooling.exchange.water [kg/s],
// 29 reheat.cooling.exchange.water_enthalpy_flow [W], 30 reheat.cooling.cooling_load [W], 31 reheat.cooling.sensible [W],
// 32 reheat.cooling.latent [W], 33 reheat.cooling.condensate [kg/s], 34 reheat.cooling.regime [choice, 0 dry, 1 wet, 2 frost, 3 partly
// wet], 35 reheat.cooling.sensible_heat_ratio [1], 36–38 reheat.heating.leaving.air (state), 39 reheat.heating.leaving.dry_air_flow
// [kg/s], 40 reheat.heating.leaving.volume_flow [m³/s], 41 reheat.heating.exchange.heat [W], 42 reheat.heating.exchange.water [kg/s],
// 43 reheat.heating.exchange.water_enthalpy_flow [W], 44 reheat.reheat [W], 45 reheat.reheat_fraction [1].
#define MOISTAIR_PROCESS_ROOM_CONDITIONED 1512

// desiccant.to_humidity_ratio. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 target [kg/kg], 5 sorption_heat_ratio
// [1], 6 carry_over [choice: 0 none, 1 heat, 2 rise], 7 carry_over.value [W or K]; gives 0–2 leaving.air (state), 3 leaving.dry_air_flow
// [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s], 7 exchange.water_enthalpy_flow [W], 8 removed
// [kg/s], 9 sorption_heat [W], 10 carried_heat [W].
#define MOISTAIR_PROCESS_DESICCANT_TO_HUMIDITY_RATIO 1600

// desiccant.by_effectiveness. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 effectiveness [1], 5 driest [kg/kg],
// 6 sorption_heat_ratio [1], 7 carry_over [choice: 0 none, 1 heat, 2 rise], 8 carry_over.value [W or K]; gives 0–2 leaving.air (state),
// 3 leaving.dry_air_flow [kg/s], 4 leaving.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
// 7 exchange.water_enthalpy_flow [W], 8 removed [kg/s], 9 sorption_heat [W], 10 carried_heat [W].
#define MOISTAIR_PROCESS_DESICCANT_BY_EFFECTIVENESS 1601

// desiccant.wheel. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 target [kg/kg], 5 sorption_heat_ratio [1],
// 6 carry_over [choice: 0 none, 1 heat, 2 rise], 7 carry_over.value [W or K], 8–10 regeneration.air (state), 11 regeneration.dry_air_flow
// [kg/s], 12 heater [choice: 0 heat, 1 entering temperature, 2 leaving temperature], 13 heater.value [W or °C]; gives
// 0–2 process.leaving.air (state), 3 process.leaving.dry_air_flow [kg/s], 4 process.leaving.volume_flow [m³/s], 5 process.exchange.heat
// [W], 6 process.exchange.water [kg/s], 7 process.exchange.water_enthalpy_flow [W], 8 process.removed [kg/s], 9 process.sorption_heat [W],
// 10 process.carried_heat [W], 11–13 heater.leaving.air (state), 14 heater.leaving.dry_air_flow [kg/s], 15 heater.leaving.volume_flow
// [m³/s], 16 heater.exchange.heat [W], 17 heater.exchange.water [kg/s], 18 heater.exchange.water_enthalpy_flow [W], 19–21 regeneration.air
// (state), 22 regeneration.dry_air_flow [kg/s], 23 regeneration.volume_flow [m³/s], 24 regeneration_exchange.heat [W],
// 25 regeneration_exchange.water [kg/s], 26 regeneration_exchange.water_enthalpy_flow [W], 27 regeneration_heat [W], 28 heat_per_water
// [J/kg], 29 entropy_production [1], 30 wheel [choice, 0 possible, 1 against the second law].
#define MOISTAIR_PROCESS_DESICCANT_WHEEL 1602

// desiccant.potentials. Takes 0–2 air (state); gives 0 first [1], 1 second [1].
#define MOISTAIR_PROCESS_DESICCANT_POTENTIALS 1603

// desiccant.wheel_by_potentials. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4–6 regeneration.air (state),
// 7 regeneration.dry_air_flow [kg/s], 8 first_effectiveness [1], 9 second_effectiveness [1]; gives 0–2 process.air (state),
// 3 process.dry_air_flow [kg/s], 4 process.volume_flow [m³/s], 5 exchange.heat [W], 6 exchange.water [kg/s],
// 7 exchange.water_enthalpy_flow [W], 8–10 regeneration.air (state), 11 regeneration.dry_air_flow [kg/s], 12 regeneration.volume_flow
// [m³/s], 13 regeneration_exchange.heat [W], 14 regeneration_exchange.water [kg/s], 15 regeneration_exchange.water_enthalpy_flow [W],
// 16 removed [kg/s], 17 imbalance.heat [W], 18 imbalance.water [kg/s], 19 entropy_production [1], 20 wheel [choice, 0 possible, 1 against
// the second law], 21 correlation [choice, 0 within, 1 off standard pressure].
#define MOISTAIR_PROCESS_DESICCANT_WHEEL_BY_POTENTIALS 1604

// desiccant.effectiveness_between. Takes 0–2 air (state), 3–5 dried (state), 6–8 regeneration (state); gives 0 first [1], 1 second [1].
#define MOISTAIR_PROCESS_DESICCANT_EFFECTIVENESS_BETWEEN 1605

// evaporative.direct. Takes 0–2 entering.air (state), 3 entering.dry_air_flow [kg/s], 4 saturation_effectiveness [1], 5 circulating_flow
// [kg/s], 6 pump_heat [W], 7 make_up_temperature [choice: 0 wet bulb, 2 given], 8 make_up_temperature.given [°C], 9 drift_fraction [1],
// 10 cycles_of_concentration [1]; gives 0–2 air.leaving.air.air (state), 3 air.leaving.air.liquid [kg/kg], 4 air.leaving.air.ice [kg/kg],
// 5 air.leaving.air.total_water [kg/kg], 6 air.leaving.air.specific_enthalpy [J/kg], 7 air.leaving.air.is_wet [flag],
// 8 air.leaving.dry_air_flow [kg/s], 9 air.exchange.heat [W], 10 air.exchange.water [kg/s], 11 air.exchange.water_enthalpy_flow [W],
// 12 air.evaporated [kg/s], 13 air.carried [kg/s], 14 water_temperature [°C], 15 water.evaporation [kg/s], 16 water.drift [kg/s],
// 17 water.blowdown [kg/s], 18 water.make_up [kg/s], 19 water.limited_by_drift [flag], 20 condition [choice, 0 evaporating, 1 already
// saturated].
#define MOISTAIR_PROCESS_EVAPORATIVE_DIRECT 1700

// evaporative.indirect. Takes 0–2 primary.air (state), 3 primary.dry_air_flow [kg/s], 4–6 secondary.air (state), 7 secondary.dry_air_flow
// [kg/s], 8 effectiveness_of [choice: 0 wet bulb, 1 dew point], 9 effectiveness [1], 10 exhaust_humidity [1], 11 pump_heat [W],
// 12 water_temperature [choice: 0 wet bulb, 2 given], 13 water_temperature.given [°C]; gives 0–2 primary.air (state),
// 3 primary.dry_air_flow [kg/s], 4 primary.volume_flow [m³/s], 5 primary_exchange.heat [W], 6 primary_exchange.water [kg/s],
// 7 primary_exchange.water_enthalpy_flow [W], 8–10 secondary.leaving.air.air (state), 11 secondary.leaving.air.liquid [kg/kg],
// 12 secondary.leaving.air.ice [kg/kg], 13 secondary.leaving.air.total_water [kg/kg], 14 secondary.leaving.air.specific_enthalpy [J/kg],
// 15 secondary.leaving.air.is_wet [flag], 16 secondary.leaving.dry_air_flow [kg/s], 17 secondary.exchange.heat [W],
// 18 secondary.exchange.water [kg/s], 19 secondary.exchange.water_enthalpy_flow [W], 20 secondary.evaporated [kg/s], 21 secondary.carried
// [kg/s], 22 heat [W], 23 condensate [kg/s], 24 condition [choice, 0 cooling, 1 no drive, 2 condensing, 3 frosting].
#define MOISTAIR_PROCESS_EVAPORATIVE_INDIRECT 1701

// evaporative.two_stage. Takes 0–2 primary.air (state), 3 primary.dry_air_flow [kg/s], 4–6 secondary.air (state), 7 secondary.dry_air_flow
// [kg/s], 8 effectiveness_of [choice: 0 wet bulb, 1 dew point], 9 effectiveness [1], 10 exhaust_humidity [1], 11 indirect_pump_heat [W],
// 12 water_temperature [choice: 0 wet bulb, 2 given], 13 water_temperature.given [°C], 14 saturation_effectiveness [1],
// 15 circulating_flow [kg/s], 16 pump_heat [W], 17 make_up_temperature [choice: 0 wet bulb, 2 given], 18 make_up_temperature.given [°C],
// 19 drift_fraction [1], 20 cycles_of_concentration [1]; gives 0–2 indirect.primary.air (state), 3 indirect.primary.dry_air_flow [kg/s],
// 4 indirect.primary.volume_flow [m³/s], 5 indirect.primary_exchange.heat [W], 6 indirect.primary_exchange.water [kg/s],
// 7 indirect.primary_exchange.water_enthalpy_flow [W], 8–10 indirect.secondary.leaving.air.air (state),
// 11 indirect.secondary.leaving.air.liquid [kg/kg], 12 indirect.secondary.leaving.air.ice [kg/kg],
// 13 indirect.secondary.leaving.air.total_water [kg/kg], 14 indirect.secondary.leaving.air.specific_enthalpy [J/kg],
// 15 indirect.secondary.leaving.air.is_wet [flag], 16 indirect.secondary.leaving.dry_air_flow [kg/s], 17 indirect.secondary.exchange.heat
// [W], 18 indirect.secondary.exchange.water [kg/s], 19 indirect.secondary.exchange.water_enthalpy_flow [W],
// 20 indirect.secondary.evaporated [kg/s], 21 indirect.secondary.carried [kg/s], 22 indirect.heat [W], 23 indirect.condensate [kg/s],
// 24 indirect.condition [choice, 0 cooling, 1 no drive, 2 condensing, 3 frosting], 25–27 direct.air.leaving.air.air (state),
// 28 direct.air.leaving.air.liquid [kg/kg], 29 direct.air.leaving.air.ice [kg/kg], 30 direct.air.leaving.air.total_water [kg/kg],
// 31 direct.air.leaving.air.specific_enthalpy [J/kg], 32 direct.air.leaving.air.is_wet [flag], 33 direct.air.leaving.dry_air_flow [kg/s],
// 34 direct.air.exchange.heat [W], 35 direct.air.exchange.water [kg/s], 36 direct.air.exchange.water_enthalpy_flow [W],
// 37 direct.air.evaporated [kg/s], 38 direct.air.carried [kg/s], 39 direct.water_temperature [°C], 40 direct.water.evaporation [kg/s],
// 41 direct.water.drift [kg/s], 42 direct.water.blowdown [kg/s], 43 direct.water.make_up [kg/s], 44 direct.water.limited_by_drift [flag],
// 45 direct.condition [choice, 0 evaporating, 1 already saturated], 46 evaporated [kg/s].
#define MOISTAIR_PROCESS_EVAPORATIVE_TWO_STAGE 1702

// economizer.coil_load. Takes 0–2 air (state), 3 supply_temperature [°C], 4 coil_leaving_humidity [1]; gives 0 heat [J/kg], 1 wet [flag].
#define MOISTAIR_PROCESS_ECONOMIZER_COIL_LOAD 1900

// economizer.enthalpy_limit. Takes 0 pressure [Pa]; gives 0 enthalpy_limit [J/kg].
#define MOISTAIR_PROCESS_ECONOMIZER_ENTHALPY_LIMIT 1901

// economizer.outdoor_air. Takes 0 enabled [choice: 0 no 1 yes], 1–3 outdoor (state), 4–6 returned (state), 7 wanted_temperature [°C],
// 8 least [1], 9 most [1]; gives 0 fraction [1], 1–3 mixed.leaving.air.air (state), 4 mixed.leaving.air.liquid [kg/kg],
// 5 mixed.leaving.air.ice [kg/kg], 6 mixed.leaving.air.total_water [kg/kg], 7 mixed.leaving.air.specific_enthalpy [J/kg],
// 8 mixed.leaving.air.is_wet [flag], 9 mixed.leaving.dry_air_flow [kg/s], 10 mixed.exchange.heat [W], 11 mixed.exchange.water [kg/s],
// 12 mixed.exchange.water_enthalpy_flow [W], 13 reach [choice, 0 reached, 1 at the least, 2 at the most].
#define MOISTAIR_PROCESS_ECONOMIZER_OUTDOOR_AIR 1902

// Water below the melting temperature freezes.
#define MOISTAIR_FREEZING_EQUILIBRIUM 0

// Water stays liquid, supercooled, down to -40 °C.
#define MOISTAIR_FREEZING_SUPERCOOLED 1

// Condensate leaves at the temperature of the leaving air.
#define MOISTAIR_CONDENSATE_AT_LEAVING_AIR 0

// Condensate leaves at the apparatus dew point: the given one, or that of the line from the entering to the leaving air.
#define MOISTAIR_CONDENSATE_AT_APPARATUS 1

// Condensate leaves at a given temperature.
#define MOISTAIR_CONDENSATE_AT_GIVEN 2

// No water condensed.
#define MOISTAIR_COIL_DRY 0

// Water condensed as liquid.
#define MOISTAIR_COIL_WET 1

// The coil is cold enough for frost.
#define MOISTAIR_COIL_FROST 2

// Water condensed as liquid on a part of the surface.
#define MOISTAIR_COIL_PARTLY_WET 3

// Air and water against each other, as in coils of four rows and more.
#define MOISTAIR_COUNTERFLOW 0

// Air and water across each other, neither mixed; for coils that stay dry.
#define MOISTAIR_CROSS_FLOW 1

// The dry bulb of the leaving air was measured [°C].
#define MOISTAIR_MEASURED_LEAVING_AIR 0

// The temperature of the leaving water was measured [°C].
#define MOISTAIR_MEASURED_LEAVING_WATER 1

// The heat into the air was measured, negative where the coil cools [W].
#define MOISTAIR_MEASURED_HEAT 2

// Moisture comes as saturated vapor of a temperature [°C], 0 to 200.
#define MOISTAIR_SOURCE_SATURATED_VAPOR 0

// Moisture comes as liquid water of a temperature [°C], 0 to 200, which the heat of the room evaporates.
#define MOISTAIR_SOURCE_LIQUID 1

// Moisture comes with a stated enthalpy [J/kg].
#define MOISTAIR_SOURCE_ENTHALPY 2

// A coil leaves air of a relative humidity.
#define MOISTAIR_COIL_LEAVES_RELATIVE_HUMIDITY 0

// A coil leaves a mixture of air that passed untouched and air saturated at the apparatus dew point.
#define MOISTAIR_COIL_LEAVES_BYPASS 1

// A room needs no reheat.
#define MOISTAIR_REHEAT_NOT_NEEDED 0

// The line of the room misses what any setting of the coil leaves.
#define MOISTAIR_REHEAT_LINE_MISSES_COIL 1

// The line of the room would meet the coil below the coldest that the coil can hold.
#define MOISTAIR_REHEAT_COLDEST_COIL 2

// A wetted medium evaporates water at the wet bulb, where recirculated water settles.
#define MOISTAIR_WATER_AT_WET_BULB 0

// A wetted medium evaporates water of a given temperature.
#define MOISTAIR_WATER_AT_GIVEN 1

// The air takes up water of the washer, or none.
#define MOISTAIR_HUMIDIFIES 0

// Vapor of the air condenses on the water.
#define MOISTAIR_DEHUMIDIFIES 1

// Steam is superheated, or saturated without water.
#define MOISTAIR_STEAM_SUPERHEATED 0

// Steam carries water.
#define MOISTAIR_STEAM_WET 1

// Most streams that one call takes.
#define MOISTAIR_MOST_STREAMS 16

// The effectiveness of an indirect cooler counts toward the wet bulb of the secondary air.
#define MOISTAIR_EFFECTIVENESS_OF_WET_BULB 0

// It counts toward the dew point of the secondary air.
#define MOISTAIR_EFFECTIVENESS_OF_DEW_POINT 1

// Water evaporates.
#define MOISTAIR_EVAPORATING 0

// The air enters saturated: nothing evaporates but by the heat of pump and make-up.
#define MOISTAIR_ALREADY_SATURATED 1

// The primary air is cooled and stays dry.
#define MOISTAIR_INDIRECT_COOLING 0

// The secondary air is no colder than the primary where it is wet: nothing happens.
#define MOISTAIR_INDIRECT_NO_DRIVE 1

// Water condenses out of the primary air.
#define MOISTAIR_INDIRECT_CONDENSING 2

// The same below the melting temperature: frost, which no steady state describes.
#define MOISTAIR_INDIRECT_FROSTING 3

// Merkel integral: eight points of Gauss and Legendre.
#define MOISTAIR_QUADRATURE_GAUSS_LEGENDRE 0

// Merkel integral: the same on seven parts of the range, for duties next to the limit or the pinch.
#define MOISTAIR_QUADRATURE_GAUSS_LEGENDRE_GRADED 1

// Merkel integral: the four-point rule of the trade, for comparison with contracts.
#define MOISTAIR_QUADRATURE_FOUR_POINT 2

// Poppe: Lewis factor of Bosnjakovic.
#define MOISTAIR_TRANSFER_BOSNJAKOVIC 0

// Poppe: Lewis factor one.
#define MOISTAIR_TRANSFER_LEWIS_FACTOR_ONE 1

// Poppe: evaporation left out of the balances, as Merkel does; a check of the methods, no tower.
#define MOISTAIR_TRANSFER_EVAPORATION_SUPPRESSED 2

// The air cools the water.
#define MOISTAIR_TOWER_COOLING 0

// The water enters colder than the limit that the air sets, and is warmed.
#define MOISTAIR_TOWER_REVERSED 1

// Heating or cooling to leaving_temperature, as moistair_sensible_to_temperature.
#define MOISTAIR_STEP_TO_TEMPERATURE 1

// Heating or cooling by heat_flow, as moistair_sensible_with_heat.
#define MOISTAIR_STEP_WITH_HEAT 2

// A coil that leaves state, as moistair_coil_to_state. Reads condensate and condensate_temperature, as all coils do.
#define MOISTAIR_STEP_COIL_TO_STATE 10

// A coil that leaves leaving_temperature and relative_humidity; where that would be moister than what enters, it stays dry and the air
// keeps its humidity ratio.
#define MOISTAIR_STEP_COIL_TO_TEMPERATURE 11

// A coil by apparatus_dew_point and bypass_factor, as moistair_coil_by_bypass_factor.
#define MOISTAIR_STEP_COIL_BY_BYPASS_FACTOR 12

// A coil by surface and water, as moistair_coil_with_water.
#define MOISTAIR_STEP_COIL_WITH_WATER 13

// A coil that leaves relative_humidity and the heater behind it, to state, as moistair_reheat_to_state.
#define MOISTAIR_STEP_COIL_WITH_REHEAT 14

// Steam of water_flow and steam_enthalpy, as moistair_humidify_steam.
#define MOISTAIR_STEP_STEAM 20

// Steam of steam_enthalpy up to humidity_ratio, as moistair_humidify_steam_to_humidity_ratio.
#define MOISTAIR_STEP_STEAM_TO_HUMIDITY_RATIO 21

// Steam of steam_enthalpy up to relative_humidity, as moistair_humidify_steam_to_relative_humidity.
#define MOISTAIR_STEP_STEAM_TO_RELATIVE_HUMIDITY 22

// Water of water_flow and water_temperature sprayed in, as moistair_humidify_spray.
#define MOISTAIR_STEP_SPRAY 23

// Wetted media of saturation_effectiveness; evaporating_water says of what water, as moistair_humidify_evaporative. Reads
// water_temperature for MOISTAIR_WATER_AT_GIVEN only.
#define MOISTAIR_STEP_EVAPORATIVE 24

// Wetted media with circulating water, pump and bleed, by direct_cooler.
#define MOISTAIR_STEP_DIRECT_COOLER 25

// A washer, by washer.
#define MOISTAIR_STEP_WASH 26

// Mixing with stream, as moistair_mixing_adiabatic.
#define MOISTAIR_STEP_MIX 30

// All droplets and ice taken out of the air, at its own temperature: a perfect eliminator.
#define MOISTAIR_STEP_ELIMINATE 31

// Compression or expansion to pressure and leaving_temperature, as moistair_compress_to_pressure.
#define MOISTAIR_STEP_COMPRESS 40

// Indirect evaporative cooling by the gas of stream, the secondary air, and indirect_cooler.
#define MOISTAIR_STEP_INDIRECT_COOLER 61

// A room, by gains; what leaves is its air, as moistair_room_of_supply.
#define MOISTAIR_STEP_ROOM 70

// A desiccant, by sorption to humidity_ratio, as moistair_desiccant_to_humidity_ratio.
#define MOISTAIR_STEP_DESICCANT_TO_HUMIDITY_RATIO 80

// A desiccant of drying_effectiveness toward humidity_ratio, the driest, by sorption, as moistair_desiccant_by_effectiveness.
#define MOISTAIR_STEP_DESICCANT_BY_EFFECTIVENESS 81

// Most steps that a solve takes; a run takes any number.
#define MOISTAIR_MOST_STEPS 32

// The property has its value.
#define MOISTAIR_SOLVE_SOLVED 0

// The property is on one side of its value at both ends of the bracket, or of the part of it in which the chain runs; the nearer end is
// returned.
#define MOISTAIR_SOLVE_NO_CROSSING 1

// The property jumps past its value; the nearer side is returned.
#define MOISTAIR_SOLVE_JUMP 2

// The chain fails between two ends at which it runs; the nearest value found is returned.
#define MOISTAIR_SOLVE_INTERRUPTED 3

// The matrix of a wheel carries no heat over.
#define MOISTAIR_CARRIES_NOTHING 0

// The matrix carries a heat flow into the air [W].
#define MOISTAIR_CARRIES_HEAT 1

// The matrix warms the leaving air by so much beyond the line of sorption [K].
#define MOISTAIR_CARRIES_RISE 2

// The heat of the regeneration is given [W].
#define MOISTAIR_REGENERATION_HEAT 0

// The temperature of the air between heater and wheel is given [°C].
#define MOISTAIR_REGENERATION_ENTERING 1

// The temperature of the air behind the wheel is given [°C].
#define MOISTAIR_REGENERATION_LEAVING 2

// Nothing forbids such a wheel.
#define MOISTAIR_WHEEL_POSSIBLE 0

// Such a wheel would destroy entropy.
#define MOISTAIR_WHEEL_AGAINST_SECOND_LAW 1

// The correlation was made for this.
#define MOISTAIR_CORRELATION_WITHIN 0

// The pressure is more than 5 % off 101 325 Pa, for which the correlation was made.
#define MOISTAIR_CORRELATION_OFF_STANDARD_PRESSURE 1

// As certain as was asked.
#define MOISTAIR_FRACTION_DETERMINED 0

// Less certain than was asked, or from a difference within twice its own uncertainty.
#define MOISTAIR_FRACTION_UNCERTAIN 1

// Below zero by more than twice its uncertainty: a sensor fault.
#define MOISTAIR_FRACTION_BELOW_ZERO 2

// Above one by more than twice its uncertainty: a sensor fault.
#define MOISTAIR_FRACTION_ABOVE_ONE 3

// Outdoor and return air read the same, or no air flows: any fraction would do.
#define MOISTAIR_FRACTION_INDETERMINATE 4

// The mixture has the wanted temperature.
#define MOISTAIR_REACH_REACHED 0

// At the least outdoor air: the nearest that the dampers allow, or held there by an economizer that is off.
#define MOISTAIR_REACH_AT_LEAST 1

// At the most outdoor air: the nearest that the dampers allow, or all of it where an economizer wants air colder than either.
#define MOISTAIR_REACH_AT_MOST 2

// The other flow is that of all the air: the supply air.
#define MOISTAIR_FLOW_TOTAL 0

// The other flow is what outdoor air mixes with: the recirculated air.
#define MOISTAIR_FLOW_RECIRCULATED 1

// Outdoor dry bulb not above the limit.
#define MOISTAIR_ECONOMIZER_RULE_FIXED_DRY_BULB 0

// Outdoor dry bulb not above that of the return air.
#define MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_DRY_BULB 1

// Outdoor enthalpy not above the limit.
#define MOISTAIR_ECONOMIZER_RULE_FIXED_ENTHALPY 2

// Outdoor enthalpy not above that of the return air.
#define MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_ENTHALPY 3

// Outdoor enthalpy and dry bulb not above their limits.
#define MOISTAIR_ECONOMIZER_RULE_FIXED_ENTHALPY_AND_DRY_BULB 4

// Outdoor enthalpy not above that of the return air, dry bulb not above its limit.
#define MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_ENTHALPY_AND_DRY_BULB 5

// Outdoor dew point and dry bulb not above their limits.
#define MOISTAIR_ECONOMIZER_RULE_DEW_POINT_AND_DRY_BULB 6

// The coil takes no more out of outdoor air than out of return air.
#define MOISTAIR_ECONOMIZER_RULE_LEAST_COIL_ENERGY 7

// Least outdoor air when a humidity is missing.
#define MOISTAIR_ECONOMIZER_FALLBACK_LEAST_OUTDOOR_AIR 0

// Decide by dry bulb when a humidity is missing.
#define MOISTAIR_ECONOMIZER_FALLBACK_DRY_BULB 1

// On: outdoor air is favorable.
#define MOISTAIR_ECONOMIZER_REASON_FAVORABLE 0

// On: no longer favorable, but on for less than the least time.
#define MOISTAIR_ECONOMIZER_REASON_LEAST_TIME_ON 1

// Off: the outdoor dry bulb is too high.
#define MOISTAIR_ECONOMIZER_REASON_DRY_BULB_HIGH 2

// Off: the outdoor enthalpy is too high.
#define MOISTAIR_ECONOMIZER_REASON_ENTHALPY_HIGH 3

// Off: the outdoor dew point is too high.
#define MOISTAIR_ECONOMIZER_REASON_DEW_POINT_HIGH 4

// Off: outdoor air would cost the coil as much or more.
#define MOISTAIR_ECONOMIZER_REASON_COIL_ENERGY_HIGH 5

// Off: favorable, but not yet by the hysteresis.
#define MOISTAIR_ECONOMIZER_REASON_WITHIN_HYSTERESIS 6

// Off: favorable, but off for less than the least time.
#define MOISTAIR_ECONOMIZER_REASON_LEAST_TIME_OFF 7

// Off: outdoor air so cold that the dampers stay at their least.
#define MOISTAIR_ECONOMIZER_REASON_FREEZE_LOCKOUT 8

// Off: no usable outdoor dry bulb.
#define MOISTAIR_ECONOMIZER_REASON_OUTDOOR_DRY_BULB_BAD 9

// Off: no usable outdoor humidity, or none at this dry bulb.
#define MOISTAIR_ECONOMIZER_REASON_OUTDOOR_HUMIDITY_BAD 10

// Off: no usable return dry bulb.
#define MOISTAIR_ECONOMIZER_REASON_RETURN_DRY_BULB_BAD 11

// Off: no usable return humidity, or none at this dry bulb.
#define MOISTAIR_ECONOMIZER_REASON_RETURN_HUMIDITY_BAD 12

// Off: the settings make no sense; moistair_economizer_check says which.
#define MOISTAIR_ECONOMIZER_REASON_SETTINGS_INVALID 13

// Off: the time is no number or beyond 1e11 s.
#define MOISTAIR_ECONOMIZER_REASON_CLOCK_INVALID 14

// A temperature, °C.
#define MOISTAIR_KIND_TEMPERATURE 1

// A relative humidity, fraction.
#define MOISTAIR_KIND_RELATIVE_HUMIDITY 2

// An absolute pressure, Pa.
#define MOISTAIR_KIND_PRESSURE 3

// A difference of pressures, Pa.
#define MOISTAIR_KIND_PRESSURE_DIFFERENCE 4

// A volume flow, m³/s.
#define MOISTAIR_KIND_VOLUME_FLOW 5

// A mass flow, kg/s.
#define MOISTAIR_KIND_MASS_FLOW 6

// A command, a position, a share: fraction.
#define MOISTAIR_KIND_FRACTION 7

// A humidity ratio, kg/kg.
#define MOISTAIR_KIND_HUMIDITY_RATIO 8

// A heat flow or an electric power, W.
#define MOISTAIR_KIND_POWER 9

// A time or a duration, s.
#define MOISTAIR_KIND_TIME 10

// An amount of heat or of electric energy, J.
#define MOISTAIR_KIND_ENERGY 11

// An enthalpy per mass of dry air, J/kg.
#define MOISTAIR_KIND_SPECIFIC_ENTHALPY 12

// °C.
#define MOISTAIR_UNIT_CELSIUS 1

// °F.
#define MOISTAIR_UNIT_FAHRENHEIT 2

// K.
#define MOISTAIR_UNIT_KELVIN 3

// 1.
#define MOISTAIR_UNIT_FRACTION 4

// %.
#define MOISTAIR_UNIT_PERCENT 5

// Pa.
#define MOISTAIR_UNIT_PASCAL 6

// hPa, the same as mbar.
#define MOISTAIR_UNIT_HECTOPASCAL 7

// kPa.
#define MOISTAIR_UNIT_KILOPASCAL 8

// bar.
#define MOISTAIR_UNIT_BAR 9

// lbf/in².
#define MOISTAIR_UNIT_POUND_PER_SQUARE_INCH 10

// Inch of mercury at 32 °F: 3386.389 Pa
#define MOISTAIR_UNIT_INCH_OF_MERCURY 11

// m³/s.
#define MOISTAIR_UNIT_CUBIC_METER_PER_SECOND 12

// m³/h.
#define MOISTAIR_UNIT_CUBIC_METER_PER_HOUR 13

// L/s.
#define MOISTAIR_UNIT_LITER_PER_SECOND 14

// ft³/min.
#define MOISTAIR_UNIT_CUBIC_FOOT_PER_MINUTE 15

// kg/s.
#define MOISTAIR_UNIT_KILOGRAM_PER_SECOND 16

// kg/h.
#define MOISTAIR_UNIT_KILOGRAM_PER_HOUR 17

// lb/h.
#define MOISTAIR_UNIT_POUND_PER_HOUR 18

// kg/kg.
#define MOISTAIR_UNIT_KILOGRAM_PER_KILOGRAM 19

// g/kg.
#define MOISTAIR_UNIT_GRAM_PER_KILOGRAM 20

// W.
#define MOISTAIR_UNIT_WATT 21

// kW.
#define MOISTAIR_UNIT_KILOWATT 22

// s.
#define MOISTAIR_UNIT_SECOND 23

// min.
#define MOISTAIR_UNIT_MINUTE 24

// h.
#define MOISTAIR_UNIT_HOUR 25

// J.
#define MOISTAIR_UNIT_JOULE 26

// kWh.
#define MOISTAIR_UNIT_KILOWATT_HOUR 27

// J/kg.
#define MOISTAIR_UNIT_JOULE_PER_KILOGRAM 28

// kJ/kg.
#define MOISTAIR_UNIT_KILOJOULE_PER_KILOGRAM 29

// The reading as it came, converted to the unit of the core.
#define MOISTAIR_QUALITY_GOOD 0

// A usable value that is not quite the reading: clipped to saturation, or the last good value held.
#define MOISTAIR_QUALITY_REPAIRED 1

// No value.
#define MOISTAIR_QUALITY_REFUSED 2

// Nothing to remark.
#define MOISTAIR_REASON_OK 0

// No reading: NaN.
#define MOISTAIR_REASON_MISSING 1

// Below the lowest value that the channel allows.
#define MOISTAIR_REASON_BELOW_RANGE 2

// Above the highest value that the channel allows, for a relative humidity above 1.03.
#define MOISTAIR_REASON_ABOVE_RANGE 3

// A relative humidity slightly above one, taken as exactly one.
#define MOISTAIR_REASON_ABOVE_SATURATION 4

// Unchanged for longer than a living signal would be.
#define MOISTAIR_REASON_STUCK 5

// A good reading after a pause: nothing may be integrated across the pause. A total judges that once more, by the longest step that it bridges.
#define MOISTAIR_REASON_GAP 6

// The time is not later than the time before.
#define MOISTAIR_REASON_TIME_NOT_INCREASING 7

// The time is no number or beyond 1e11 s.
#define MOISTAIR_REASON_TIME_INVALID 8

// Refused, and filled with the last good value; the field cause of moistair_checked says what was wrong.
#define MOISTAIR_REASON_HELD 9

// The channel itself makes no sense: limits the wrong way round, a unit of another quantity.
#define MOISTAIR_REASON_CHANNEL_INVALID 10

// In degrees Celsius the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_CELSIUS 11

// In degrees Fahrenheit the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_FAHRENHEIT 12

// In kelvin the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_KELVIN 13

// A channel in percent that delivers fractions.
#define MOISTAIR_REASON_LOOKS_LIKE_FRACTION 14

// A channel in fractions that delivers percent.
#define MOISTAIR_REASON_LOOKS_LIKE_PERCENT 15

// In pascal the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_PASCAL 16

// In hectopascal (millibar) the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_HECTOPASCAL 17

// In kilopascal the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_KILOPASCAL 18

// In bar the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_BAR 19

// In pounds per square inch the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_POUND_PER_SQUARE_INCH 20

// In inches of mercury the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_INCH_OF_MERCURY 21

// In a unit without a reason of its own, or in each of several units, the reading would be in range.
#define MOISTAIR_REASON_LOOKS_LIKE_OTHER_UNIT 22

// It holds until the next sample: records on change of value, commands, counters.
#define MOISTAIR_RULE_STEP 0

// It runs straight to the next sample: densely sampled, smooth signals.
#define MOISTAIR_RULE_TRAPEZOID 1

// The first sample: there is no time before it.
#define MOISTAIR_ADDED_STARTED 0

// Counted.
#define MOISTAIR_ADDED_COUNTED 1

// Not counted: the rate that would have to cover it was refused.
#define MOISTAIR_ADDED_HOLE 2

// Not counted: longer than the longest step, or the clock was set back.
#define MOISTAIR_ADDED_GAP 3

// The sample's time is not usable; the sample is ignored.
#define MOISTAIR_ADDED_TIME_REFUSED 4

// Not counted: the total would not be finite.
#define MOISTAIR_ADDED_OVERFLOW 5

// Places for counts by quality; the code of a quality is its place.
#define MOISTAIR_QUALITY_SLOTS 4

// Places for counts by reason; the code of a reason is its place.
#define MOISTAIR_REASON_SLOTS 32

// Limits of a quantity as an input, both included.
typedef struct {
    // The least value allowed.
    double min;
    // The greatest value allowed; infinite for a property that is only read.
    double max;
} moistair_limits;

// The detail of an error. Written whenever a place for it is given; after a success code is 0 and quantity is -1.
typedef struct {
    // The offending value in the unit of its quantity; NaN where there is none. For a selector of something else than a quantity
    // (MOISTAIR_UNKNOWN_SELECTOR) the selector given; for MOISTAIR_WRONG_COUNT the count given.
    double value;
    // The least value allowed; NaN where there is none.
    double min;
    // The greatest value allowed; NaN where there is none.
    double max;
    // The status that the function returns.
    int32_t code;
    // The selector of the quantity at fault, also one that is not known or does not fit; -1 where there is none.
    int32_t quantity;
} moistair_error;

// On what a state stands.
typedef struct {
    // Absolute pressure [Pa], 20000 to 1100000 (to 5000000 with MOISTAIR_HELMHOLTZ).
    double pressure;
    // MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ.
    int32_t formulation;
    // Set to 0; not read.
    int32_t reserved;
} moistair_basis;

// A state of moist air: what defines it (dry_bulb, pressure, humidity_ratio, formulation) and what always has a value.
// As an input only what defines it is read, and checked; the rest is computed anew.
typedef struct {
    // Dry-bulb temperature [°C].
    double dry_bulb;
    // Absolute pressure [Pa].
    double pressure;
    // Mass of water vapor per mass of dry air [kg/kg].
    double humidity_ratio;
    // Moles of water vapor per mole of moist air [1].
    double water_mole_fraction;
    // Water mole fraction times pressure [Pa].
    double vapor_pressure;
    // Mass of water vapor per mass of moist air [kg/kg].
    double specific_humidity;
    // Mass of water vapor per volume [kg/m³].
    double absolute_humidity;
    // Enthalpy per mass of dry air [J/kg].
    double specific_enthalpy;
    // Volume per mass of dry air [m³/kg].
    double specific_volume;
    // Mass of moist air per volume [kg/m³].
    double density;
    // Isobaric heat capacity per mass of dry air [J/(kg K)].
    double specific_heat;
    // p v / (R T) of the mixture [1].
    double compressibility_factor;
    // MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ.
    int32_t formulation;
    // 0.
    int32_t reserved;
} moistair_state;

// A property and its partial derivatives, each while the other two inputs stay.
typedef struct {
    // The property, with the bits of moistair_properties.
    double value;
    // Per kelvin of dry bulb.
    double by_dry_bulb;
    // Per unit of the second property.
    double by_second;
    // Per pascal.
    double by_pressure;
} moistair_property_derivatives;

// An input column: the value of row i is values[i * stride]. Stride 1 is a plain array, stride 0 one value for every row, a larger one reads
// a field of an array of records that are a whole number of doubles apart.
typedef struct {
    // The value of row 0; may be null when there are no rows.
    const double *values;
    // Distance from row to row in doubles.
    size_t stride;
} moistair_column;

// How a column call went.
typedef struct {
    // Rows that have no state, or no value for a property that was asked for.
    size_t failed;
    // The first of them, from 0; the number of rows when there is none.
    size_t first_failed;
} moistair_column_report;

// What a column of a process holds.
typedef struct {
    // Its name, with those of the records that it stands in, such as "leaving.air.dry_bulb".
    char name[64];
    // Its unit, UTF-8, such as "°C"; "choice: " with the meaning of each code; "flag" for 0 or 1.
    char unit[128];
} moistair_field;

// Moist air with its dry-air mass flow.
typedef struct {
    // State of the air.
    moistair_state air;
    // Dry-air mass flow [kg/s].
    double dry_air_flow;
} moistair_stream;

// Moist air with the liquid water and ice that it carries.
// As an input air, liquid and ice are read, and checked; the rest is computed anew.
typedef struct {
    // State of the gas.
    moistair_state air;
    // Liquid water per mass of dry air [kg/kg].
    double liquid;
    // Ice per mass of dry air [kg/kg].
    double ice;
    // Vapor, liquid and ice per mass of dry air [kg/kg].
    double total_water;
    // Enthalpy of gas and condensate per mass of dry air [J/kg].
    double specific_enthalpy;
} moistair_air_with_condensate;

// Air that may carry condensate, with its dry-air mass flow. The stream of its gas alone is {mixture.air, dry_air_flow}.
typedef struct {
    // Gas and condensate.
    moistair_air_with_condensate mixture;
    // Dry-air mass flow [kg/s].
    double dry_air_flow;
} moistair_wet_stream;

// What a process gave to the air.
typedef struct {
    // Heat through a surface, into the air [W].
    double heat;
    // Water into the air [kg/s]; negative for condensate.
    double water;
    // Enthalpy that came with that water [W].
    double water_enthalpy_flow;
} moistair_exchange;

// What a heater or a dry cooler did.
typedef struct {
    // The air that leaves.
    moistair_stream leaving;
    // Heat into the air, no water.
    moistair_exchange exchange;
} moistair_sensible;

// What a cooling coil did.
typedef struct {
    // The air that enters, as the books have it.
    moistair_stream entering;
    // The air that leaves.
    moistair_stream leaving;
    // Heat and water into the air, both negative for a wet coil.
    moistair_exchange exchange;
    // Heat taken from the air, positive [W].
    double cooling_load;
    // Sensible part of the load [W].
    double sensible;
    // Latent part of the load [W].
    double latent;
    // Condensate, positive [kg/s].
    double condensate;
    // Sensible part over the load [1]; NaN without a load.
    double sensible_heat_ratio;
    // MOISTAIR_COIL_DRY, MOISTAIR_COIL_WET, MOISTAIR_COIL_FROST or MOISTAIR_COIL_PARTLY_WET.
    int32_t regime;
    // 0.
    int32_t reserved;
} moistair_cooling;

// A coil by its bypass.
typedef struct {
    // Where the line from the entering through the leaving air meets saturation [°C].
    double dew_point;
    // The share of the air that seems to pass untouched [1]; 0 for air that leaves saturated.
    double bypass_factor;
} moistair_apparatus;

// Where the line from the entering through the leaving air meets saturation: nowhere, once, or twice.
typedef struct {
    // The warmer meeting, which is the coil's; NaN for a line that misses saturation.
    moistair_apparatus warmer;
    // The colder, where the line comes out of saturation again; NaN where it does not down to -40 °C.
    moistair_apparatus colder;
    // Where the line comes nearest to saturation, if it misses it; otherwise the warmer meeting [°C].
    double nearest;
    // Number of meetings: 0, 1 or 2.
    int32_t count;
    // 0.
    int32_t reserved;
} moistair_apparatus_dew_points;

// A coil by its conductances at the flows at hand.
typedef struct {
    // From air to metal with the fins' efficiency, for sensible heat [W/K].
    double air_side;
    // From metal to water [W/K].
    double water_side;
    // MOISTAIR_COUNTERFLOW or MOISTAIR_CROSS_FLOW.
    int32_t arrangement;
    // 0.
    int32_t reserved;
} moistair_coil_surface;

// The water, or brine, that enters a coil.
typedef struct {
    // Its mass flow [kg/s].
    double flow;
    // Its temperature [°C]: 0 to 200, and from -40 for a brine.
    double entering;
    // 0 for water; of a brine that does not freeze, 500 to 6000 [J/(kg K)].
    double specific_heat;
} moistair_coil_water;

// What a coil with water in it did.
typedef struct {
    // The air side. A coil that heats has a negative cooling load.
    moistair_cooling air;
    // Temperature of the water that leaves; it takes up the heat that air.exchange takes out [°C].
    double leaving_water;
    // Share of the surface on which nothing condenses [1].
    double dry_fraction;
    // The coldest metal, at one end of the coil [°C].
    double coldest_surface;
    // 1 if the coldest metal is below the melting temperature and there is water in it; else 0. No freezestat.
    int32_t freezing;
    // 0.
    int32_t reserved;
} moistair_water_coil;

// What flows through a coil.
typedef struct {
    // Dry air [kg/s].
    double air;
    // Water or brine [kg/s].
    double water;
} moistair_coil_flows;

// How conductances go with flows: UA = UA0 (flow / flow0)^n on each side.
typedef struct {
    // n of the air side, 0 to 1; 0.4 to 0.7 with fins (common practice, no source) [1].
    double air_side;
    // n of the water side, 0 to 1; 0.8 while the water is turbulent (Dittus and Boelter 1930; from memory) [1].
    double water_side;
} moistair_flow_exponents;

// What the water of a coil says of its load.
typedef struct {
    // Heat that the water took up; negative in a coil that heats [W].
    double load;
    // The load by the air less that by the water [W].
    double air_less_water;
} moistair_load_by_water;

// What a coil and the heater behind it did.
typedef struct {
    // The coil.
    moistair_cooling cooling;
    // The heater.
    moistair_sensible heating;
    // Heat of the heater over the cooling load [1]; NaN without a load.
    double reheat_fraction;
} moistair_reheat;

// What a room gives to its air.
typedef struct {
    // Heat that comes without water [W]; negative in a room that loses heat.
    double sensible;
    // Water [kg/s]; negative where it is taken out.
    double moisture;
    // Temperature [°C] or enthalpy [J/kg] of that water.
    double source_value;
    // How the water comes: MOISTAIR_SOURCE_…
    int32_t source;
    // 0.
    int32_t reserved;
} moistair_room_gains;

// A room and the air that is supplied to it.
typedef struct {
    // The air that is supplied.
    moistair_stream supply;
    // The air of the room, which leaves it; with fog, if the gains are more than the air holds.
    moistair_wet_stream room;
    // The gains.
    moistair_exchange exchange;
} moistair_room_air;

// Where the line of a room meets saturation: nowhere, once, or twice.
typedef struct {
    // The warmer meeting, which is the coil's [°C]; NaN for a line that misses saturation: such a room needs reheat.
    double warmer;
    // The colder, where the line comes out of saturation again [°C]; NaN where it does not down to -40 °C.
    double colder;
    // Number of meetings: 0, 1 or 2.
    int32_t count;
    // 0.
    int32_t reserved;
} moistair_room_dew_points;

// What a cooling coil can leave, whatever its control.
typedef struct {
    // Relative humidity of the leaving air [1], 0.2 to 1; or the bypass factor [1], 0 to below 1.
    double fraction;
    // The coldest apparatus dew point that the coil can hold [°C], -40 to 150; read for MOISTAIR_COIL_LEAVES_BYPASS only.
    double coldest;
    // MOISTAIR_COIL_LEAVES_RELATIVE_HUMIDITY or MOISTAIR_COIL_LEAVES_BYPASS.
    int32_t kind;
    // 0.
    int32_t reserved;
} moistair_coil_leaving;

// The steepest line through a room that a coil still serves without reheat.
typedef struct {
    // Its sensible heat ratio [1]: below it reheat is unavoidable.
    double sensible_heat_ratio;
    // Its slope, change of enthalpy over change of humidity ratio [J/kg].
    double slope;
    // Where it touches the curve of the coil: temperature of the leaving air, or the apparatus dew point of a coil with bypass [°C].
    double touches;
    // 1 if the coldest that the coil can hold binds, 0 if the curvature of saturation does.
    int32_t at_coldest;
    // 0.
    int32_t reserved;
} moistair_limiting_line;

// The least reheat of a room, over all flows of supply air.
typedef struct {
    // The supply behind the heater, at the flow with the least reheat.
    moistair_stream supply;
    // The air that leaves the coil.
    moistair_state coil_leaving;
    // The limit of the room.
    moistair_limiting_line limit;
    // Heat of the heater [W]; 0 where none is needed.
    double reheat;
    // MOISTAIR_REHEAT_NOT_NEEDED, MOISTAIR_REHEAT_LINE_MISSES_COIL or MOISTAIR_REHEAT_COLDEST_COIL.
    int32_t cause;
    // 0.
    int32_t reserved;
} moistair_least_reheat;

// A room and the coil and heater that keep it.
typedef struct {
    // The room and its supply.
    moistair_room_air room;
    // Coil and heater, whose leaving air is the supply.
    moistair_reheat reheat;
} moistair_conditioned;

// What a humidifier did.
typedef struct {
    // The air that leaves, with what it could not take up.
    moistair_wet_stream leaving;
    // Water into the air and its enthalpy; heat is that of pump, make-up, spray or wall where there is one, else 0.
    moistair_exchange exchange;
    // Water that became vapor [kg/s].
    double evaporated;
    // Water carried as droplets or ice [kg/s].
    double carried;
} moistair_humidified;

// How much steam air takes up.
typedef struct {
    // Flow at which the air first saturates, 0 where it enters saturated; infinite where it never does [kg/s].
    double up_to;
    // Flow from which on it is no longer saturated; infinite where there is none [kg/s].
    double unsaturated_from;
} moistair_steam_absorption;

// Steam at a pressure.
typedef struct {
    // [°C]
    double temperature;
    // Above the temperature of boiling; 0 where it is wet [K].
    double superheat;
    // Vapor over all of it by mass; 1 where it is superheated [1].
    double quality;
    // MOISTAIR_STEAM_SUPERHEATED or MOISTAIR_STEAM_WET.
    int32_t condition;
    // 0.
    int32_t reserved;
} moistair_throttled_steam;

// A washer and its water.
typedef struct {
    // Water sprayed [kg/s].
    double water;
    // Its temperature, 0 to 200 [°C].
    double temperature;
    // How far the air comes toward the temperature of the water that leaves, 0 to 1 [1].
    double effectiveness;
    // Power of the pump [W].
    double pump_heat;
    // Droplets that pass the eliminators over the water sprayed, 0 to 0.05 [1].
    double carry_over_fraction;
} moistair_washer;

// What a washer did.
typedef struct {
    // The air with its books.
    moistair_humidified air;
    // Water that falls back [kg/s].
    double leaving_water;
    // Its temperature [°C].
    double leaving_water_temperature;
    // What the water gains, its pump counted, less the enthalpy of what evaporated; negative where the air cools it [W]. Not the load of a chiller.
    double heat_to_water;
    // MOISTAIR_HUMIDIFIES or MOISTAIR_DEHUMIDIFIES.
    int32_t moistening;
    // 0.
    int32_t reserved;
} moistair_washed;

// Whether heat and water close over a process.
typedef struct {
    // Heat out less heat in less heat exchanged [W].
    double heat_residual;
    // Sum of the magnitudes of all heat terms [W].
    double heat_scale;
    // What the last place of the temperatures is worth [W].
    double heat_resolution;
    // Water out less water in less water exchanged [kg/s].
    double water_residual;
    // Sum of the magnitudes of all water terms [kg/s].
    double water_scale;
    // 1 if both close to rounding, else 0.
    int32_t close;
    // 0.
    int32_t reserved;
} moistair_books;

// How a tower loses and renews water besides evaporation.
typedef struct {
    // Drift over the circulating flow [1], 0 to 0.05.
    double drift_fraction;
    // Concentration of the circulating water over that of the make-up [1], above 1.
    double cycles_of_concentration;
} moistair_water_treatment;

// Evaporation, drift, blowdown and what makes up for them, all positive.
typedef struct {
    // Evaporation [kg/s].
    double evaporation;
    // Drift [kg/s].
    double drift;
    // Blowdown [kg/s].
    double blowdown;
    // Make-up [kg/s].
    double make_up;
    // 1 if drift alone keeps the concentration below the one wanted, so that there is no blowdown; else 0.
    int32_t limited_by_drift;
    // 0.
    int32_t reserved;
} moistair_water_use;

// Water in circulation and what is dissolved in it; the caller keeps it from step to step.
typedef struct {
    // Water in basin, pipes and plant together [kg], 0.001 to 1e9.
    double inventory;
    // Concentration [mg/kg, or any unit that the make-up's is in too], 0 to 1e6.
    double concentration;
} moistair_basin;

// The water that a tower cools.
typedef struct {
    // Flow that enters hot [kg/s].
    double flow;
    // Temperature of the hot water [°C], 0 to 200.
    double hot;
    // Temperature of the cold water [°C], 0 to 200.
    double cold;
} moistair_tower_water;

// The overall balance of a cooling tower.
typedef struct {
    // The air that leaves.
    moistair_stream leaving;
    // Heat and water into the air.
    moistair_exchange exchange;
    // Water use.
    moistair_water_use water;
    // Heat that the water gives up, positive [W].
    double heat_rejected;
    // Hot less cold water temperature [K].
    double range;
    // Cold water over the wet bulb of the entering air [K].
    double approach;
    // Range over range and approach [1]; NaN without either.
    double effectiveness;
} moistair_tower_balance;

// A direct evaporative cooler, or a humidifier of wetted media, with its circulating water.
typedef struct {
    // Toward the temperature of the circulating water, 0 to 1 [1].
    double saturation_effectiveness;
    // Water over the medium [kg/s].
    double circulating;
    // Power of the pump [W].
    double pump_heat;
    // Temperature of the make-up, 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only [°C].
    double make_up_temperature;
    // Carry-over and cycles of concentration.
    moistair_water_treatment treatment;
    // Make-up as warm as the circulating water, MOISTAIR_WATER_AT_WET_BULB, or MOISTAIR_WATER_AT_GIVEN.
    int32_t make_up;
    // 0.
    int32_t reserved;
} moistair_direct_cooler;

// What a direct evaporative cooler did.
typedef struct {
    // The air with its books.
    moistair_humidified air;
    // Of the circulating water [°C].
    double water_temperature;
    // Evaporation, carry-over, bleed and make-up.
    moistair_water_use water;
    // MOISTAIR_EVAPORATING or MOISTAIR_ALREADY_SATURATED.
    int32_t condition;
    // 0.
    int32_t reserved;
} moistair_direct_cooled;

// An indirect evaporative cooler.
typedef struct {
    // How far the primary air is cooled, if it stays dry: 0 to 2 toward the wet bulb, 0 to 1 toward the dew point [1].
    double effectiveness;
    // Relative humidity over liquid at which the secondary air leaves, 0 to 1 [1].
    double exhaust_humidity;
    // Power of the pump [W].
    double pump_heat;
    // Of the water that evaporates, 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only [°C].
    double water_temperature;
    // MOISTAIR_EFFECTIVENESS_OF_WET_BULB or MOISTAIR_EFFECTIVENESS_OF_DEW_POINT.
    int32_t effectiveness_of;
    // MOISTAIR_WATER_AT_WET_BULB, of the secondary air, or MOISTAIR_WATER_AT_GIVEN.
    int32_t water;
} moistair_indirect_cooler;

// What an indirect evaporative cooler did.
typedef struct {
    // The primary air that leaves, without its condensate.
    moistair_stream primary;
    // Heat and water into the primary air, none of them above zero.
    moistair_exchange primary_exchange;
    // The secondary air with its books.
    moistair_humidified secondary;
    // Heat through the wall [W].
    double heat;
    // Water that drains from the primary side [kg/s].
    double condensate;
    // MOISTAIR_INDIRECT_COOLING, _NO_DRIVE, _CONDENSING or _FROSTING.
    int32_t condition;
    // 0.
    int32_t reserved;
} moistair_indirect_cooled;

// What a two-stage evaporative cooler did.
typedef struct {
    // The first stage.
    moistair_indirect_cooled indirect;
    // The second stage, on the primary air that the first leaves.
    moistair_direct_cooled direct;
    // Water that evaporates in both [kg/s].
    double evaporated;
} moistair_two_stage_cooled;

// The least air that can do a duty.
typedef struct {
    // The greatest L/G [1]; 20 where nothing pinches.
    double water_to_air;
    // Water temperature where the enthalpies of air and film meet [°C].
    double temperature;
} moistair_pinch;

// How much transfer a duty takes.
typedef struct {
    // Me = K a V / L [1].
    double number;
    // L/G, water over dry air [1].
    double water_to_air;
    // Where the driving force would vanish with less air.
    moistair_pinch pinch;
    // Heat that the water gives up [W].
    double heat_rejected;
    // Enthalpy of the leaving air [J/kg dry air].
    double leaving_enthalpy;
} moistair_merkel_number;

// The water that enters a tower.
typedef struct {
    // Flow [kg/s].
    double flow;
    // Temperature [°C], 0 to 200.
    double temperature;
} moistair_hot_water;

// What a tower does to the water.
typedef struct {
    // The water, with the temperature at which it leaves.
    moistair_tower_water water;
    // Heat that the water gives up [W]; negative where the tower is reversed.
    double heat_rejected;
    // Enthalpy of the leaving air [J/kg dry air].
    double leaving_enthalpy;
    // L/G, water over dry air [1].
    double water_to_air;
    // Hot less cold water temperature [K].
    double range;
    // Cold water over the wet bulb of the entering air [K].
    double approach;
    // Range over range and approach [1]; NaN without either.
    double effectiveness;
    // MOISTAIR_TOWER_COOLING or MOISTAIR_TOWER_REVERSED.
    int32_t status;
    // 0.
    int32_t reserved;
} moistair_tower_rating;

// What a fill transfers: Me = coefficient (L/G)^-exponent.
typedef struct {
    // c [1], 0.001 to 20.
    double coefficient;
    // n [1], 0 to 2.
    double exponent;
} moistair_fill_law;

// What a tower does to water and air, by Poppe's method.
typedef struct {
    // The air that leaves, with the droplets of its fog.
    moistair_wet_stream leaving;
    // Heat and water into the air.
    moistair_exchange exchange;
    // The water, with the temperature at which it leaves.
    moistair_tower_water water;
    // Water into the air [kg/s]; negative where vapor condenses on the water.
    double evaporation;
    // Heat that the water gives up [W]; negative where the tower is reversed.
    double heat_rejected;
    // L/G, water over dry air [1].
    double water_to_air;
    // Hot less cold water temperature [K].
    double range;
    // Cold water over the wet bulb of the entering air [K].
    double approach;
    // Range over range and approach [1]; NaN without either.
    double effectiveness;
    // MOISTAIR_TOWER_COOLING or MOISTAIR_TOWER_REVERSED.
    int32_t status;
    // 1 if the leaving air carries fog, else 0.
    int32_t is_fogged;
} moistair_poppe_rating;

// One test of a fill.
typedef struct {
    // L/G, water over dry air [1].
    double water_to_air;
    // Merkel number found [1].
    double number;
} moistair_fill_test;

// Air that was brought to another pressure and temperature.
typedef struct {
    // Air and all its water at the new pressure and temperature, before a separator; after a perfect one the stream is
    // {leaving.mixture.air, leaving.dry_air_flow}.
    moistair_wet_stream leaving;
    // Work of compression less the heat of cooling, into the air; no water.
    moistair_exchange exchange;
    // Liquid and ice in the leaving air, what a perfect separator drains [kg/s].
    double condensate;
} moistair_compressed;

// What a desiccant does beside taking up water.
typedef struct {
    // Heat of sorption over heat of vaporization [1], 0.5 to 3; about 1.05 to 1.15 for silica gel, 1.2 and more for zeolites.
    double heat_ratio;
    // Heat [W] or rise [K] that the matrix carries over.
    double carry_over_value;
    // MOISTAIR_CARRIES_NOTHING, MOISTAIR_CARRIES_HEAT or MOISTAIR_CARRIES_RISE.
    int32_t carry_over;
    // 0.
    int32_t reserved;
} moistair_sorption;

// One process of a chain. Only what its kind names is read; zero the rest.
typedef struct {
    // The stream that is mixed in, or the secondary air of an indirect cooler.
    moistair_wet_stream stream;
    // A state that leaves.
    moistair_state state;
    // A coil by its conductances.
    moistair_coil_surface surface;
    // The water of a coil.
    moistair_coil_water water;
    // Wetted media with their water.
    moistair_direct_cooler direct_cooler;
    // An indirect evaporative cooler.
    moistair_indirect_cooler indirect_cooler;
    // A washer.
    moistair_washer washer;
    // What a room gives to its air.
    moistair_room_gains gains;
    // A desiccant.
    moistair_sorption sorption;
    // [°C], -80 to 150.
    double leaving_temperature;
    // [W], positive into the air.
    double heat_flow;
    // [1].
    double relative_humidity;
    // [kg/kg].
    double humidity_ratio;
    // [°C], -40 to 150.
    double apparatus_dew_point;
    // [1], 0 to 1.
    double bypass_factor;
    // [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only.
    double condensate_temperature;
    // Of water or steam [kg/s].
    double water_flow;
    // [°C], 0 to 200.
    double water_temperature;
    // [J/kg].
    double steam_enthalpy;
    // [1], 0 to 1.
    double saturation_effectiveness;
    // Absolute [Pa].
    double pressure;
    // [1], 0 to 1.
    double drying_effectiveness;
    // MOISTAIR_STEP_….
    int32_t kind;
    // MOISTAIR_CONDENSATE_AT_…, of coils.
    int32_t condensate;
    // MOISTAIR_WATER_AT_…, of wetted media.
    int32_t evaporating_water;
    // 0.
    int32_t reserved;
} moistair_step;

// What a step, or a chain, asks of the plant by name. Magnitudes, unless they are said to be signed: then into the air.
typedef struct {
    // Heat from heaters and warm coils [W].
    double heating;
    // Heat taken out by coils and dry coolers [W].
    double cooling;
    // The sensible part of that [W].
    double sensible_cooling;
    // The rest of it [W].
    double latent_cooling;
    // Heat from another stream through an indirect cooler, or carried over by a desiccant; signed [W].
    double recovered;
    // Sensible heat of rooms; signed [W].
    double gains;
    // Heat that circulating water brings with it: of its pump, of its make-up, of chilled spray; signed [W].
    double water_heat;
    // Power of fans that reaches the air [W]: 0, as no step is a fan yet.
    double fan_work;
    // Electric power of fans, that part of it included [W]: 0 likewise.
    double fan_power;
    // Of compression and expansion: work less the heat of cooling; signed [W].
    double compression;
    // Water that drains from coils, eliminators, coolers and washers [kg/s].
    double condensate;
    // Steam into the air [kg/s].
    double steam;
    // Liquid water into the air, with what it carries on as droplets [kg/s].
    double humidifying_water;
    // Moisture of rooms; signed [kg/s].
    double moisture_gain;
    // Vapor from a desiccant; signed [kg/s].
    double recovered_water;
    // Water that evaporates into a secondary stream, not into this one [kg/s].
    double secondary_water;
    // Dry air of other streams mixed in [kg/s].
    double mixed_in;
} moistair_loads;

// What one step of a chain did.
typedef struct {
    // The air that enters.
    moistair_wet_stream entering;
    // The air that leaves.
    moistair_wet_stream leaving;
    // Heat and water into the air.
    moistair_exchange exchange;
    // The same by name.
    moistair_loads loads;
    // What enters, with a stream mixed in, against what leaves.
    moistair_books books;
    // Of a coil MOISTAIR_COIL_…; -1 of other steps.
    int32_t regime;
    // 1 if frost forms, or water in a coil may freeze; else 0. No freezestat.
    int32_t frost;
    // 1 if water condenses where no coil drains it: in an indirect cooler; else 0.
    int32_t condenses;
    // 0.
    int32_t reserved;
} moistair_step_result;

// What all steps of a chain did together.
typedef struct {
    // The air that leaves the last step.
    moistair_wet_stream leaving;
    // The sum of all exchanges.
    moistair_exchange exchange;
    // The sum of all loads.
    moistair_loads loads;
    // What enters the first step and is mixed in, against what leaves the last and all that was exchanged.
    moistair_books books;
    // 1 if any step reports frost, else 0.
    int32_t frost;
    // 1 if any step reports condensation, else 0.
    int32_t condenses;
} moistair_sequence_total;

// The number of a step that is free, and where to look for it.
typedef struct {
    // Where to look from, in the unit of the quantity.
    double low;
    // Where to look to; above low.
    double high;
    // The step that it belongs to, from 0.
    int32_t step;
    // Which number, by its quantity, such as MOISTAIR_LEAVING_TEMPERATURE: one that the kind of the step reads. MOISTAIR_CONDUCTANCE is that
    // of the air side of a coil, with the water side in proportion; MOISTAIR_DRY_AIR_FLOW that of a stream mixed in.
    int32_t quantity;
} moistair_free;

// What the air is to have.
typedef struct {
    // The value wanted.
    double value;
    // The step whose leaving air is meant, from 0, at or after the free one; -1 for the last.
    int32_t after;
    // Selector of the property.
    int32_t property;
} moistair_target;

// What a solve found.
typedef struct {
    // The chain with the free number in it.
    moistair_sequence_total total;
    // The free number.
    double number;
    // The property that the air has with it.
    double reached;
    // That less the wanted value.
    double residual;
    // The lower end of the bracket, or of the part of it in which the chain runs.
    double low;
    // The property there.
    double reached_at_low;
    // The upper end.
    double high;
    // The property there.
    double reached_at_high;
    // MOISTAIR_SOLVE_….
    int32_t status;
    // What stopped the chain where it does not run: a status, MOISTAIR_OK for nothing.
    int32_t refused;
    // The step that refused, from 0; -1 for none.
    int32_t refused_step;
    // How often the steps were evaluated for it.
    uint32_t evaluations;
} moistair_solved;

// Air that gave water to a desiccant, or took it back.
typedef struct {
    // The air that leaves.
    moistair_stream leaving;
    // The heat carried over, and the water with what is left of its enthalpy.
    moistair_exchange exchange;
    // Water that went into the desiccant [kg/s]; negative where it came out.
    double removed;
    // Heat of sorption that the air took up [W].
    double sorption_heat;
    // Heat that the matrix carried over [W].
    double carried_heat;
} moistair_sorbed;

// A desiccant wheel with the heater of its regeneration.
typedef struct {
    // The side that is dried.
    moistair_sorbed process;
    // The heater in the regeneration air; its leaving air enters the wheel.
    moistair_sensible heater;
    // The regeneration air behind the wheel.
    moistair_stream regeneration;
    // What the wheel gave to it.
    moistair_exchange regeneration_exchange;
    // Heat of the regeneration [W].
    double regeneration_heat;
    // Heat of the regeneration per water removed [J/kg]; NaN where none is.
    double heat_per_water;
    // Entropy that the wheel produces [W/K]; below zero against the second law.
    double entropy_production;
    // MOISTAIR_WHEEL_POSSIBLE or MOISTAIR_WHEEL_AGAINST_SECOND_LAW.
    int32_t status;
    // 0.
    int32_t reserved;
} moistair_wheel;

// Of the two potentials of air, or of the effectiveness of a wheel in them, one each.
typedef struct {
    // Near enthalpy [1].
    double first;
    // Near relative humidity [1].
    double second;
} moistair_potentials;

// A wheel by its potentials.
typedef struct {
    // The process air behind the wheel.
    moistair_stream process;
    // What it exchanged.
    moistair_exchange exchange;
    // The regeneration air behind the wheel, by the balance of both sides.
    moistair_stream regeneration;
    // What it exchanged.
    moistair_exchange regeneration_exchange;
    // Water that went from the process to the regeneration air [kg/s]; negative where it went the other way.
    double removed;
    // Heat that both streams would leave with beyond what they entered with, were both led by the potentials [W]; NaN where they give no state.
    double imbalance_heat;
    // Water, likewise [kg/s].
    double imbalance_water;
    // Entropy that the wheel produces [W/K].
    double entropy_production;
    // MOISTAIR_WHEEL_POSSIBLE or MOISTAIR_WHEEL_AGAINST_SECOND_LAW.
    int32_t status;
    // MOISTAIR_CORRELATION_WITHIN or MOISTAIR_CORRELATION_OFF_STANDARD_PRESSURE.
    int32_t correlation;
} moistair_potential_wheel;

// A reading, its standard uncertainty and how far it can be trusted at all.
typedef struct {
    // The value in the unit of the library; NaN when there is none.
    double value;
    // One standard deviation, in the same unit, 0 or more. Of a reading that is stated as ± a, a / sqrt(3).
    double standard_uncertainty;
    // MOISTAIR_QUALITY_…; a refused reading counts as missing, whatever its value is.
    int32_t quality;
    // Set to 0; not read.
    int32_t reserved;
} moistair_reading;

// A measured outdoor-air fraction.
typedef struct {
    // Raw, not clamped to 0 … 1 [1]; NaN when indeterminate.
    double fraction;
    // Its standard uncertainty [1]; NaN when indeterminate.
    double standard_uncertainty;
    // What it is worth, MOISTAIR_FRACTION_…
    int32_t status;
    // The worst quality of the readings, MOISTAIR_QUALITY_…
    int32_t quality;
} moistair_outdoor_air_fraction;

// Air as a temperature and a humidity sensor see it.
typedef struct {
    // Dry bulb [°C].
    moistair_reading dry_bulb;
    // The humidity, in the unit of its quantity.
    moistair_reading humidity;
    // What the humidity sensor measures: a selector that fixes a state, such as MOISTAIR_RELATIVE_HUMIDITY.
    int32_t humidity_quantity;
    // Set to 0; not read.
    int32_t reserved;
} moistair_measured_air;

// An outdoor-air fraction and what it mixes.
typedef struct {
    // The mixture: 1 kg/s of dry air.
    moistair_wet_stream leaving;
    // Outdoor-air fraction, within the limits [1].
    double fraction;
    // Whether it has the wanted temperature, MOISTAIR_REACH_…
    int32_t reach;
    // 0.
    int32_t reserved;
} moistair_blend;

// The settings of an economizer. Make them with moistair_economizer_new, then set what differs.
typedef struct {
    // Pressure of the site and formulation.
    moistair_basis basis;
    // Fixed limit of the outdoor dry bulb [°C].
    double dry_bulb_limit;
    // Fixed limit of the outdoor enthalpy [J/kg].
    double enthalpy_limit;
    // Fixed limit of the outdoor dew point [°C].
    double dew_point_limit;
    // What the coil is to supply, for MOISTAIR_ECONOMIZER_RULE_LEAST_COIL_ENERGY: dry bulb [°C].
    double supply_dry_bulb;
    // Relative humidity at which it leaves the air when it is wet [1].
    double supply_coil_leaving;
    // By how much a dry bulb or dew point must be below its limit before it switches on [K]; it switches off at the limit.
    double temperature_hysteresis;
    // The same of an enthalpy or a coil energy [J/kg].
    double enthalpy_hysteresis;
    // Least time on [s]; a bad reading and the freeze lockout do not wait for it.
    double least_time_on;
    // Least time off [s].
    double least_time_off;
    // Below this outdoor dry bulb the dampers stay at their least [°C].
    double freeze_limit;
    // MOISTAIR_ECONOMIZER_RULE_…
    int32_t rule;
    // When a humidity is missing: MOISTAIR_ECONOMIZER_FALLBACK_…
    int32_t fallback;
} moistair_economizer;

// What an economizer remembers from call to call. Zeroed at first: off; may be copied and stored, not looked into.
typedef struct {
    // Zero at first.
    uint64_t words[6];
} moistair_economizer_state;

// What was decided. All numbers are finite, always.
typedef struct {
    // How far the outdoor air is below what it must not exceed: positive speaks for outdoor air. 0 where nothing could be compared.
    double margin;
    // Standard uncertainty of the margin by that of the readings.
    double margin_uncertainty;
    // Probability that the air truly lies on the side that was decided for [1]; 0 where nothing could be compared.
    double confidence;
    // 1 if outdoor air beyond the least may be taken, else 0.
    int32_t enabled;
    // Why, MOISTAIR_ECONOMIZER_REASON_…
    int32_t reason;
    // What the margin is a difference of: MOISTAIR_DRY_BULB, MOISTAIR_SPECIFIC_ENTHALPY, MOISTAIR_DEW_POINT or MOISTAIR_COIL_ENERGY.
    int32_t margin_quantity;
    // The worst quality of the readings that were used, MOISTAIR_QUALITY_…
    int32_t quality;
    // 1 if the dry bulbs alone decided, for want of a humidity; else 0.
    int32_t fallback;
    // 0.
    int32_t reserved;
} moistair_decision;

// What a coil takes out of air.
typedef struct {
    // Heat per mass of dry air, 0 or more [J/kg].
    double heat;
    // 1 if water condenses, else 0.
    int32_t wet;
    // 0.
    int32_t reserved;
} moistair_coil_load;

// What is known about a channel before its first sample. Limits and resolutions are in the unit of the core, which the kinds name.
// Make one with moistair_channel_new, then set what differs.
typedef struct {
    // The lowest value allowed.
    double min;
    // The highest value allowed.
    double max;
    // Samples within this of each other count as unchanged. Below the smallest step of the signal.
    double resolution;
    // How far the reference of moistair_channel_check_beside must move to show that the plant is not simply steady.
    double reference_resolution;
    // How old the last good value may be to stand in for a refused one [s]; 0: never.
    double hold;
    // Nominal sample interval [s]; a step longer than 1.5 of it is a gap; 0: no step is.
    double interval;
    // What the channel carries, MOISTAIR_KIND_…
    int32_t kind;
    // The unit of the raw readings, MOISTAIR_UNIT_…
    int32_t unit;
    // Unchanged samples in a row that are taken as stuck; 0: no such rule.
    uint32_t stuck_samples;
    // Samples after which a channel in percent that delivers fractions is refused; 0: never.
    uint32_t slip_samples;
} moistair_channel;

// What a channel remembers from sample to sample. Zeroed at first; may be copied and stored, not looked into.
typedef struct {
    // Zero at first.
    uint64_t words[12];
} moistair_channel_state;

// A checked sample.
typedef struct {
    // The value in the unit of the core; NaN when refused.
    double value;
    // How far it can be trusted, MOISTAIR_QUALITY_…
    int32_t quality;
    // Why, MOISTAIR_REASON_…
    int32_t reason;
    // What was wrong with the reading: the reason, unless that is MOISTAIR_REASON_HELD.
    int32_t cause;
    // 1 if a gap lies before this sample, so that nothing may be integrated across it; else 0.
    int32_t after_gap;
} moistair_checked;

// Counts of checked samples by quality and by reason. Zeroed at first.
typedef struct {
    // Samples of each quality.
    uint64_t by_quality[MOISTAIR_QUALITY_SLOTS];
    // Samples with each reason.
    uint64_t by_reason[MOISTAIR_REASON_SLOTS];
    // Samples that were filled with the last good value, by what was wrong with the reading.
    uint64_t held_by_cause[MOISTAIR_REASON_SLOTS];
    // Gaps.
    uint64_t after_gap;
} moistair_counts;

// The total over time of a rate. Made by moistair_total_new; may be copied and stored, not looked into.
typedef struct {
    // Made by moistair_total_new.
    uint64_t words[15];
} moistair_total;

// What a total has come to. The unit is that of the rate times s; means and extremes have the unit of the rate.
typedef struct {
    // The total.
    double total;
    // The part with a positive rate.
    double positive;
    // The part with a negative rate, not above 0.
    double negative;
    // Mean rate over the covered time; NaN while nothing is covered.
    double mean;
    // Lowest rate in the covered time; NaN while nothing is covered.
    double lowest;
    // Highest rate in the covered time; NaN while nothing is covered.
    double highest;
    // The time that the total stands for [s].
    double covered_seconds;
    // The part of it that rests on repaired samples [s].
    double repaired_seconds;
    // The time from the first to the last sample, gaps included [s].
    double elapsed_seconds;
    // Covered over elapsed time, 0 to 1; 0 while no time has passed.
    double coverage;
} moistair_total_values;

// A total that is cut at the multiples of a period. Made by moistair_periods_new; may be copied and stored, not looked into.
typedef struct {
    // Made by moistair_periods_new.
    uint64_t words[17];
} moistair_periods;

// A finished period.
typedef struct {
    // When it began [s].
    double start;
    // Its total.
    moistair_total total;
} moistair_period;

// How the books of a process or plant closed over time. Zeroed at first; may be copied and stored, not looked into.
typedef struct {
    // Zero at first.
    uint64_t words[15];
} moistair_books_total;

// The residuals of one book.
typedef struct {
    // Sum of the absolute residuals, in the unit of the book.
    double sum_of_residuals;
    // Sum of the scales, in the unit of the book.
    double sum_of_scales;
    // Largest residual relative to its own scale.
    double largest_relative;
    // The same in units of the rounding of numbers, 2^-52: a book of a few terms that closes leaves a few of them.
    double largest_in_epsilons;
    // Sum of residuals over sum of scales; 0 without scales.
    double relative;
    // Residuals that were added.
    uint64_t samples;
    // Residuals that were refused.
    uint64_t refused;
} moistair_residuals;

// What the books have come to.
typedef struct {
    // The heat book [W].
    moistair_residuals heat;
    // The water book [kg/s].
    moistair_residuals water;
    // Books that closed to rounding.
    uint64_t closed;
} moistair_books_total_values;

// Measured less computed over many samples. Zeroed at first; may be copied and stored, not looked into.
typedef struct {
    // Zero at first.
    uint64_t words[8];
} moistair_deviation;

// What a deviation has come to, in the unit of the values; NaN without samples.
typedef struct {
    // Mean, the bias of the measurement.
    double mean;
    // Root of the mean square.
    double root_mean_square;
    // Lowest, with its sign.
    double lowest;
    // Highest, with its sign.
    double highest;
    // Pairs that were taken.
    uint64_t samples;
    // Pairs that were refused.
    uint64_t refused;
} moistair_deviation_values;

#ifdef __cplusplus
extern "C" {
#endif // __cplusplus

// The MOISTAIR_ABI_VERSION that the library was built with. A program that finds another one than its header says must not go on.
int32_t moistair_abi_version(void);

// The version of the library as 1000000 major + 1000 minor + patch, as MOISTAIR_VERSION is of the header.
int32_t moistair_version(void);

// Changes when any result of any function changes in any bit.
int32_t moistair_numerics_version(void);

// A status in words: English, lower case, static. Unknown codes read "unknown status".
const char *moistair_status_text(int32_t code);

// The name of a quantity, such as "dry_bulb": static, lower case, words joined by underscores. Empty for an unknown selector.
const char *moistair_quantity_name(int32_t quantity);

// The unit of a quantity, such as "kg/kg": static, UTF-8. Empty for an unknown selector.
const char *moistair_quantity_unit(int32_t quantity);

// The limits of a quantity as an input, in its unit, with the real and the ideal gas.
//
// quantity: selector of any quantity; limits: output; error: may be null.
// Returns 0, 101, 102, 103.
int32_t moistair_quantity_limits(int32_t quantity, moistair_limits *limits, moistair_error *error);

// The limits of a quantity as an input, in its unit, with a formulation: the Helmholtz formulation reaches 200 °C and 5 MPa.
//
// formulation: MOISTAIR_REAL_GAS, MOISTAIR_IDEAL_GAS or MOISTAIR_HELMHOLTZ; quantity: selector of any quantity; limits: output; error: may be
// null.
// Returns 0, 101, 102, 103.
int32_t moistair_formulation_limits(int32_t formulation,
                                    int32_t quantity,
                                    moistair_limits *limits,
                                    moistair_error *error);

// A state from its dry bulb and any second property.
//
// dry_bulb: [°C], -80 to 150 (to 200 with MOISTAIR_HELMHOLTZ); property: selector of the second property, one that fixes a state (humidity ratio, relative humidity,
// wet bulb, dew point, specific enthalpy, …); value: its value in its unit; basis: pressure and formulation; state: output; error: may
// be null.
// Returns 0, 101, 102, 103, 201, 202, 203 (no state has the value here; the error holds the limits).
int32_t moistair_from_dry_bulb(double dry_bulb,
                               int32_t property,
                               double value,
                               moistair_basis basis,
                               moistair_state *state,
                               moistair_error *error);

// A state from two properties of which neither is the dry bulb, in any order.
//
// One of them states the vapor (humidity ratio, specific humidity, water mole fraction, vapor pressure, dew point, frost point) and the
// other is a relative humidity (over the stable surface or over liquid, or degree of saturation), a wet bulb, or the specific
// enthalpy; or one is a relative humidity, and the other a wet bulb or the specific enthalpy. Other pairs fix no state, or only
// badly. No two states have both properties; just below the melting temperature the stable wet bulb is taken over ice, and
// MOISTAIR_WET_BULB_OVER_LIQUID gives the state of supercooled liquid. With the dry bulb: moistair_from_dry_bulb. Rows of a column go
// one by one; those of Rust and Python have the same bits.
//
// first, second: selectors; first_value, second_value: their values in their units; basis: pressure and formulation; state: output;
// error: may be null.
// Returns 0, 101, 102, 103, 201, 202, 209 (the pair fixes no state), 210 (no state has both; the error holds one of the two and its
// limits beside the other), 311 (a wet bulb above boiling), 313 (ice above the melting temperature).
int32_t moistair_from_two_properties(int32_t first,
                                     double first_value,
                                     int32_t second,
                                     double second_value,
                                     moistair_basis basis,
                                     moistair_state *state,
                                     moistair_error *error);

// One property of a state.
//
// state: a state; property: selector below MOISTAIR_PROPERTY_COUNT; value: output in the unit of the property; error: may be null.
// Returns 0, 101, 102, 103, 31x (the property has no value at this state), 201, 202, 203 (the state is none).
int32_t moistair_property(const moistair_state *state,
                          int32_t property,
                          double *value,
                          moistair_error *error);

// Several properties of a state at once, cheaper than one by one.
//
// state: a state; mask: which properties, the bit 1 << selector for each; values: output, each property at the place of its selector in its
// unit, NaN where it has no value; places not asked for are left alone; have: output, the bits of mask that have a value, may be null;
// error: may be null.
// Returns 0 (also when a property has no value), 101, 102 (a bit that is no property), 103, 201, 202, 203 (the state is none).
int32_t moistair_properties(const moistair_state *state,
                            uint64_t mask,
                            double *values,
                            uint64_t *have,
                            moistair_error *error);

// Pressure of the standard atmosphere (ISO 2533) at an elevation, taken as geopotential altitude. A measured pressure is better: weather
// moves it by 3 % either way.
//
// elevation: [m] above mean sea level, -5000 to 11000; pressure: output [Pa]; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_pressure_at_elevation(double elevation,
                                       double *pressure,
                                       moistair_error *error);

// Pressure of the standard atmosphere (ISO 2533) at a geometric elevation.
//
// elevation: [m] above mean sea level, -5000 to 11000; pressure: output [Pa]; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_pressure_at_geometric_elevation(double elevation, double *pressure, moistair_error *error);

// Temperature of the standard atmosphere (ISO 2533) at an elevation, taken as geopotential altitude: a mean of middle latitudes.
//
// elevation: [m] above mean sea level, -5000 to 11000; temperature: output [°C]; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_temperature_at_elevation(double elevation,
                                          double *temperature,
                                          moistair_error *error);

// Temperature of the standard atmosphere (ISO 2533) at a geometric elevation.
//
// elevation: [m] above mean sea level, -5000 to 11000; temperature: output [°C]; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_temperature_at_geometric_elevation(double elevation,
                                                    double *temperature,
                                                    moistair_error *error);

// The elevation, as geopotential altitude, at which the standard atmosphere (ISO 2533) has a pressure: of a barometer, the pressure
// altitude.
//
// pressure: [Pa], 22632 (11 km) to 177687 (-5 km); elevation: output [m] above mean sea level; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_elevation_at_pressure(double pressure,
                                       double *elevation,
                                       moistair_error *error);

// The geometric elevation at which the standard atmosphere (ISO 2533) has a pressure.
//
// pressure: [Pa], 22700 (11 km) to 177761 (-5 km); elevation: output [m] above mean sea level; error: may be null.
// Returns 0, 101, 103, 201, 202.
int32_t moistair_geometric_elevation_at_pressure(double pressure,
                                                 double *elevation,
                                                 moistair_error *error);

// A state from what a psychrometer shows, by the equation of WMO-No. 8, x_w p = x_ws(t_w) p - A p (t - t_w), over water with
// A (1 + 0.000944 t_w), and the saturation of the formulation. Its wet bulb is not the thermodynamic one. An ice bulb may read above the dry
// bulb, where the vapor is supersaturated over ice.
//
// dry_bulb: [°C], -80 to 150; wet_bulb: [°C], -40 to 100; bulb: MOISTAIR_BULB_WATER or MOISTAIR_BULB_ICE, one must look; coefficient: A [1/K],
// 0.0003 to 0.002, MOISTAIR_ASPIRATED_OVER_WATER or MOISTAIR_ASPIRATED_OVER_ICE for an aspirated instrument; basis: pressure and formulation;
// state: output; error: may be null.
// Returns 0, 101, 102, 103, 201, 202, 203 (negative vapor, more than the air holds, ice above its melting temperature; the error holds the
// limits here), 31x (no reading is possible: colder than -40 °C, or too warm for ice).
int32_t moistair_from_psychrometer(double dry_bulb,
                                   double wet_bulb,
                                   int32_t bulb,
                                   double coefficient,
                                   moistair_basis basis,
                                   moistair_state *state,
                                   moistair_error *error);

// What the wetted bulb of a psychrometer would show in a state: the inverse of moistair_from_psychrometer.
//
// state: a state; bulb: MOISTAIR_BULB_WATER or MOISTAIR_BULB_ICE; coefficient: [1/K], 0.0003 to 0.002; wet_bulb: output [°C]; error: may be
// null.
// Returns 0, 101, 102, 103, 201, 202, 203, 31x (the wet bulb would lie outside -40 to 100 °C, ice melt, or water boil).
int32_t moistair_psychrometer_reading(const moistair_state *state,
                                      int32_t bulb,
                                      double coefficient,
                                      double *wet_bulb,
                                      moistair_error *error);

// The same air, with the same humidity ratio, at another pressure and temperature.
//
// state: a state; dry_bulb: [°C]; pressure: absolute [Pa]; changed: output, may be state itself; error: may be
// null.
// Returns 0, 101, 102, 103, 201, 202, 203 (water would condense; the error holds the humidity ratio at saturation there).
int32_t moistair_at_temperature_and_pressure(const moistair_state *state,
                                             double dry_bulb,
                                             double pressure,
                                             moistair_state *changed,
                                             moistair_error *error);

// The same air, with the same humidity ratio and temperature, at another pressure.
//
// state: a state; pressure: absolute [Pa]; changed: output, may be state itself; error: may be null.
// Returns 0, 101, 102, 103, 201, 202, 203 (water would condense; the error holds the humidity ratio at saturation there).
int32_t moistair_at_pressure(const moistair_state *state,
                             double pressure,
                             moistair_state *changed,
                             moistair_error *error);

// Dew or frost point of the air of a state at another pressure: the pressure dew point of a line, or the atmospheric one of air in it. Above
// the temperature there it says that water condenses.
//
// state: a state; property: MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; pressure: absolute [Pa]; temperature: output [°C];
// error: may be null.
// Returns 0, 101, 102, 103, 201, 202, 203, 31x (dry air, or outside -40 to 200 °C over liquid, -100 °C to melting over ice).
int32_t moistair_saturation_temperature_at(const moistair_state *state,
                                           int32_t property,
                                           double pressure,
                                           double *temperature,
                                           moistair_error *error);

// Dew or frost point after a change of pressure: from a pressure dew point to the atmospheric one, or back.
//
// property: what is given, MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; value: its value [°C]; basis: pressure that it belongs to, and
// formulation; wanted: MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; pressure: the other, absolute [Pa]; temperature: output
// [°C]; error: may be null.
// Returns 0, 101, 102, 103, 201, 202, 31x (ice above its melting temperature, water above boiling, or the result out of its range).
int32_t moistair_saturation_temperature_after(int32_t property,
                                              double value,
                                              moistair_basis basis,
                                              int32_t wanted,
                                              double pressure,
                                              double *temperature,
                                              moistair_error *error);

// Exact partial derivatives of properties with respect to dry bulb, a second property and pressure: those of moistair_from_dry_bulb with
// that second property. Where a property has a kink, those of one side: at the melting temperature and above over liquid, below over
// ice; at saturation towards less vapor; in dry air towards more.
//
// state: a state; second: selector of the second property, one that fixes a state; mask: which properties, the bit 1 << selector for each;
// values: output, each property at the place of its selector, NaN where it has no value or (entropy of dry air) no slope; places not
// asked for are left alone; have: output, the bits of mask that have derivatives, may be null; error: may be null.
// Returns 0 (also when a property has no value), 101, 102 (a bit that is no property, a second property that fixes no state), 103, 31x
// (the second property has no value at this state), 201, 202, 203 (the state is none).
int32_t moistair_derivatives(const moistair_state *state,
                             int32_t second,
                             uint64_t mask,
                             moistair_property_derivatives *values,
                             uint64_t *have,
                             moistair_error *error);

// Properties of many states at once: row by row the same results, bit for bit, as the calls for one state. A bad row costs only itself.
//
// rows: number of rows, 0 allowed; dry_bulb: [°C]; property: selector of the second property; second: its values; pressure: [Pa]; formulation: of
// all rows; mask: which properties, the bit 1 << selector for each; outputs: array with the output column of each property at the place
// of its selector (places not in mask are not read), each with room for rows doubles, NaN where there is no value; status: room for the
// status of each row, may be null; report: output, may be null; error: the detail of the first row that failed, may be null.
// Columns to be written may not overlap with any other memory of the call.
// Returns 0 when every row is good, else the status of the first row that is not (2xx, 3xx; all outputs are written then as well); 101, 102,
// 103, 104, 105 when an argument is wrong (nothing is written).
int32_t moistair_state_columns(size_t rows,
                               moistair_column dry_bulb,
                               int32_t property,
                               moistair_column second,
                               moistair_column pressure,
                               int32_t formulation,
                               uint64_t mask,
                               double *const *outputs,
                               int32_t *status,
                               moistair_column_report *report,
                               moistair_error *error);

// The name of a process, its trade and what is done, such as "coil.to_state": static. Empty for an unknown selector.
const char *moistair_process_name(int32_t process);

// How many columns a process takes, with those that repeat counted once; 0 for an unknown selector.
size_t moistair_process_input_count(int32_t process);

// How many of the last columns that a process takes are a group that may stand there any number of times, from none to 32 times: the streams
// that are mixed. 0 for most processes and for an unknown selector.
size_t moistair_process_repeated_count(int32_t process);

// How many columns a process gives; 0 for an unknown selector.
size_t moistair_process_output_count(int32_t process);

// What a column that a process takes holds.
//
// process: selector; place: of the column, from 0 to one less than moistair_process_input_count; field: output; error: may be null.
// Returns 0, 101, 102 (also for a place that it does not have), 103.
int32_t moistair_process_input(int32_t process,
                               size_t place,
                               moistair_field *field,
                               moistair_error *error);

// What a column that a process gives holds.
//
// process: selector; place: of the column, from 0 to one less than moistair_process_output_count; field: output; error: may be null.
// Returns 0, 101, 102 (also for a place that it does not have), 103.
int32_t moistair_process_output(int32_t process,
                                size_t place,
                                moistair_field *field,
                                moistair_error *error);

// A process on many rows at once: row by row the same results, bit for bit, as its call for one row. A bad row costs only itself.
//
// The constants MOISTAIR_PROCESS_… say what each column holds. A state is three columns: dry bulb [°C], humidity ratio [kg/kg], pressure [Pa];
// its formulation is that of the call. Choices and statuses are whole numbers.
//
// rows: number of rows, 0 allowed; process: MOISTAIR_PROCESS_…; inputs: the columns that it takes; input_count: how many they are,
// moistair_process_input_count unless a group repeats; formulation: of all rows; outputs: array with the output column of each result, each with
// room for rows doubles, null where it is not wanted, NaN where there is no value; output_count: moistair_process_output_count; status:
// room for the status of each row (102 for a choice that its input does not have), may be null; report: output, may be null; error: the
// detail of the first row that failed, may be null. Columns to be written may not overlap with any other memory of the call. With no rows
// the arrays are not read and may be null. Takes up to 50 kB of stack on a machine of 64 bits.
// Returns 0 when every row is good, else the status of the first row that is not (all outputs and report are written then as well); 101,
// 102, 103, 104, 105, 107 when an argument is wrong (nothing is written). Where 102 may be either, report tells: it is written only when the rows
// have been run.
int32_t moistair_process_columns(size_t rows,
                                 int32_t process,
                                 const moistair_column *inputs,
                                 size_t input_count,
                                 int32_t formulation,
                                 double *const *outputs,
                                 size_t output_count,
                                 int32_t *status,
                                 moistair_column_report *report,
                                 moistair_error *error);

// The name of a process, its trade and what is done, such as "coil.to_state": static. Empty for an unknown selector.
const char *moistair_process_name(int32_t process);

// How many columns a process takes, with those that repeat counted once; 0 for an unknown selector.
size_t moistair_process_input_count(int32_t process);

// How many of the last columns that a process takes are a group that may stand there any number of times, from none to 32 times: the streams
// that are mixed. 0 for most processes and for an unknown selector.
size_t moistair_process_repeated_count(int32_t process);

// How many columns a process gives; 0 for an unknown selector.
size_t moistair_process_output_count(int32_t process);

// What a column that a process takes holds.
//
// process: selector; place: of the column, from 0 to one less than moistair_process_input_count; field: output; error: may be null.
// Returns 0, 101, 102 (also for a place that it does not have), 103.
int32_t moistair_process_input(int32_t process,
                               size_t place,
                               moistair_field *field,
                               moistair_error *error);

// What a column that a process gives holds.
//
// process: selector; place: of the column, from 0 to one less than moistair_process_output_count; field: output; error: may be null.
// Returns 0, 101, 102 (also for a place that it does not have), 103.
int32_t moistair_process_output(int32_t process,
                                size_t place,
                                moistair_field *field,
                                moistair_error *error);

// A process on many rows at once: row by row the same results, bit for bit, as its call for one row. A bad row costs only itself.
//
// The constants MOISTAIR_PROCESS_… say what each column holds. A state is three columns: dry bulb [°C], humidity ratio [kg/kg], pressure [Pa];
// its formulation is that of the call. Choices and statuses are whole numbers.
//
// rows: number of rows, 0 allowed; process: MOISTAIR_PROCESS_…; inputs: the columns that it takes; input_count: how many they are,
// moistair_process_input_count unless a group repeats; formulation: of all rows; outputs: array with the output column of each result, each with
// room for rows doubles, null where it is not wanted, NaN where there is no value; output_count: moistair_process_output_count; status:
// room for the status of each row (102 for a choice that its input does not have), may be null; report: output, may be null; error: the
// detail of the first row that failed, may be null. Columns to be written may not overlap with any other memory of the call. With no rows
// the arrays are not read and may be null. Takes up to 50 kB of stack on a machine of 64 bits.
// Returns 0 when every row is good, else the status of the first row that is not (all outputs and report are written then as well); 101,
// 102, 103, 104, 105, 107 when an argument is wrong (nothing is written). Where 102 may be either, report tells: it is written only when the rows
// have been run.
int32_t moistair_process_columns(size_t rows,
                                 int32_t process,
                                 const moistair_column *inputs,
                                 size_t input_count,
                                 int32_t formulation,
                                 double *const *outputs,
                                 size_t output_count,
                                 int32_t *status,
                                 moistair_column_report *report,
                                 moistair_error *error);

// A stream from its dry-air mass flow.
//
// air: a state; dry_air_flow: [kg/s], 0 to 1e6; stream: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_stream_from_mass_flow(const moistair_state *air,
                                       double dry_air_flow,
                                       moistair_stream *stream,
                                       moistair_error *error);

// A stream from its volume flow at the state of the air.
//
// air: a state; volume_flow: [m³/s], 0 to 1e6; stream: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_stream_from_volume_flow(const moistair_state *air,
                                         double volume_flow,
                                         moistair_stream *stream,
                                         moistair_error *error);

// A stream from a standard volume flow: that of its dry air at a reference density.
//
// air: a state; volume_flow: [m³/s], 0 to 1e6; reference_density: [kg/m³] of dry air, such as 1.2; 0.5 to 2; stream: output; error: may be
// null.
// Returns 0, 1xx, 2xx.
int32_t moistair_stream_from_standard_volume_flow(const moistair_state *air,
                                                  double volume_flow,
                                                  double reference_density,
                                                  moistair_stream *stream,
                                                  moistair_error *error);

// A stream that carries liquid water and ice.
//
// stream: the gas; liquid: [kg/kg] of dry air, 0 to 10; ice: [kg/kg] of dry air, 0 to 10; wet_stream: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_wet_stream_from_stream(const moistair_stream *stream,
                                        double liquid,
                                        double ice,
                                        moistair_wet_stream *wet_stream,
                                        moistair_error *error);

// Vapor and condensate in equilibrium at a temperature, from the water of all phases together: as much vapor as the air holds, the rest ice
// below the melting temperature and liquid from there on (liquid down to -40 °C if supercooled).
//
// dry_bulb: [°C], -80 to 150; total_water: [kg/kg] of dry air, 0 to 10; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or
// MOISTAIR_FREEZING_SUPERCOOLED; basis: pressure and formulation; mixture: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_from_dry_bulb_and_water(double dry_bulb,
                                         double total_water,
                                         int32_t freezing,
                                         moistair_basis basis,
                                         moistair_air_with_condensate *mixture,
                                         moistair_error *error);

// Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together.
//
// specific_enthalpy: [J/kg] of dry air; total_water: [kg/kg] of dry air, 0 to 10; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or
// MOISTAIR_FREEZING_SUPERCOOLED; basis: pressure and formulation; mixture: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (outside the range of states).
int32_t moistair_from_enthalpy_and_water(double specific_enthalpy,
                                         double total_water,
                                         int32_t freezing,
                                         moistair_basis basis,
                                         moistair_air_with_condensate *mixture,
                                         moistair_error *error);

// Specific enthalpy of liquid water on the datum of a basis.
//
// temperature: [°C], 0 to 200; basis: pressure and formulation; specific_enthalpy: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_liquid_water_enthalpy(double temperature,
                                       moistair_basis basis,
                                       double *specific_enthalpy,
                                       moistair_error *error);

// Heats or cools to a temperature at constant humidity ratio.
//
// entering: the stream that enters; leaving_temperature: [°C]; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (saturation would be crossed: use a coil).
int32_t moistair_sensible_to_temperature(const moistair_stream *entering,
                                         double leaving_temperature,
                                         moistair_sensible *done,
                                         moistair_error *error);

// Heats or cools by a heat flow at constant humidity ratio.
//
// entering: the stream that enters; heat: [W], positive into the air; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (heat into no air), 301 (saturation or the range of states would be crossed).
int32_t moistair_sensible_with_heat(const moistair_stream *entering,
                                    double heat,
                                    moistair_sensible *done,
                                    moistair_error *error);

// A cooling coil that leaves a given state.
//
// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may
// be null.
// Returns 0, 1xx, 2xx, 301 (the leaving air is warmer or moister; no apparatus dew point for MOISTAIR_CONDENSATE_AT_APPARATUS).
int32_t moistair_coil_to_state(const moistair_stream *entering,
                               const moistair_state *leaving,
                               int32_t condensate,
                               double condensate_temperature,
                               moistair_cooling *done,
                               moistair_error *error);

// A cooling coil known by its apparatus dew point and bypass factor.
//
// entering: the stream that enters; apparatus_dew_point: [°C], -40 to 150; bypass_factor: [1], 0 to 1; condensate: where the condensate
// temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only;
// done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the apparatus is warmer than the air).
int32_t moistair_coil_by_bypass_factor(const moistair_stream *entering,
                                       double apparatus_dew_point,
                                       double bypass_factor,
                                       int32_t condensate,
                                       double condensate_temperature,
                                       moistair_cooling *done,
                                       moistair_error *error);

// The coil between two measured states. Differences of humidity ratio within a dead band count as noise of the sensors: the air then keeps
// the humidity ratio that it enters with, and only what it cannot hold at the leaving temperature condenses.
//
// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; dead_band: [kg/kg], 0 to
// 10; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the leaving air is moister by more than the dead band; no apparatus dew point for
// MOISTAIR_CONDENSATE_AT_APPARATUS).
int32_t moistair_coil_between(const moistair_stream *entering,
                              const moistair_state *leaving,
                              int32_t condensate,
                              double condensate_temperature,
                              double dead_band,
                              moistair_cooling *done,
                              moistair_error *error);

// The apparatus dew point and bypass factor that take the entering to the leaving air: the inverse of moistair_coil_by_bypass_factor.
//
// entering: the state that enters; leaving: the state that leaves; apparatus: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (nothing condenses, the air leaves warmer, or the line misses saturation: such a state takes a coil and
// reheat).
int32_t moistair_coil_apparatus_dew_point(const moistair_state *entering,
                                          const moistair_state *leaving,
                                          moistair_apparatus *apparatus,
                                          moistair_error *error);

// All meetings of the line from the entering through the leaving air with saturation, below the leaving air's dry bulb.
//
// entering: the state that enters; leaving: the state that leaves; found: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (nothing condenses, or the air leaves warmer).
int32_t moistair_coil_apparatus_dew_points(const moistair_state *entering,
                                           const moistair_state *leaving,
                                           moistair_apparatus_dew_points *found,
                                           moistair_error *error);

// The bypass factor of a number of equal rows, one behind the other.
//
// of_one_row: bypass factor of one of them [1], 0 to 1; rows: how many; bypass_factor: output [1]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_coil_bypass_factor_of_rows(double of_one_row,
                                            uint32_t rows,
                                            double *bypass_factor,
                                            moistair_error *error);

// A coil from its conductances and the water that enters it: dry, wet or partly wet by effectiveness and number of transfer units. It
// cools or heats, as the water is colder or warmer than the air; without water flow or conductance it changes nothing.
//
// entering: the stream that enters; surface: the coil; water: what enters it; condensate: where the condensate temperature comes from,
// MOISTAIR_CONDENSATE_AT_… (the apparatus is the mean surface that condenses); condensate_temperature: [°C], -40 to 150, read for
// MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (water would freeze in the coil; a coil in cross-flow would get wet; the air would leave above the range).
int32_t moistair_coil_with_water(const moistair_stream *entering,
                                 const moistair_coil_surface *surface,
                                 const moistair_coil_water *water,
                                 int32_t condensate,
                                 double condensate_temperature,
                                 moistair_water_coil *done,
                                 moistair_error *error);

// The conductances of a coil that explain one measured point; moistair_coil_with_water then predicts others.
//
// entering: the stream that enters; water: what enters the coil; measured: what the value is, MOISTAIR_MEASURED_…; value: [°C] or [W];
// conductance_ratio: of the water side over the air side [1], 0.001 to 1000; arrangement: MOISTAIR_COUNTERFLOW or MOISTAIR_CROSS_FLOW;
// surface: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (no conductance explains the value: the limits are what no and endless surface would give).
int32_t moistair_coil_surface_from_rating(const moistair_stream *entering,
                                          const moistair_coil_water *water,
                                          int32_t measured,
                                          double value,
                                          double conductance_ratio,
                                          int32_t arrangement,
                                          moistair_coil_surface *surface,
                                          moistair_error *error);

// The conductances of a coil at other flows than those that they were found at: within a few per cent down to half of them (common
// practice, no source).
//
// surface: the coil; found_at: the flows of that; flows: those that its conductances are wanted at; scaled: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (a conductance beyond its range, as of one that was found without a flow).
int32_t moistair_coil_surface_at_flows(const moistair_coil_surface *surface,
                                       moistair_coil_flows found_at,
                                       moistair_coil_flows flows,
                                       moistair_flow_exponents exponents,
                                       moistair_coil_surface *scaled,
                                       moistair_error *error);

// The load of a coil by its water, beside its load by the air. A steady coil gives the same on both sides.
//
// entering: the stream that enters; load_by_air: positive where the coil cools [W]; water: what enters the coil; leaving_water: its
// temperature where it leaves [°C]; found: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_coil_load_by_water(const moistair_stream *entering,
                                    double load_by_air,
                                    const moistair_coil_water *water,
                                    double leaving_water,
                                    moistair_load_by_water *found,
                                    moistair_error *error);

// Reaches a state by cooling to its humidity ratio, then heating. Codes restrict simultaneous heating and cooling.
//
// entering: the stream that enters; target: the state to reach; coil_leaving_relative_humidity: [1] of the air between coil and heater,
// 0.2 to 1; condensate: where the condensate temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150,
// read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the target is moister, or cooler than the coil would leave).
int32_t moistair_reheat_to_state(const moistair_stream *entering,
                                 const moistair_state *target,
                                 double coil_leaving_relative_humidity,
                                 int32_t condensate,
                                 double condensate_temperature,
                                 moistair_reheat *done,
                                 moistair_error *error);

// The flow and the humidity ratio of supply air of a given temperature.
//
// room: the state of the room; gains: what the room gives to the air; supply_temperature: [°C], -80 to 150; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (such air would have to flow backwards or without end, be drier than dry or more than saturated).
int32_t moistair_room_supply_at_temperature(const moistair_state *room,
                                            const moistair_room_gains *gains,
                                            double supply_temperature,
                                            moistair_room_air *done,
                                            moistair_error *error);

// The supply air of a given dry-air flow.
//
// room: the state of the room; gains: what the room gives to the air; dry_air_flow: [kg/s], 0 to 1e6; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (so little air would have to be drier than dry, or the supply would be fog).
int32_t moistair_room_supply_at_flow(const moistair_state *room,
                                     const moistair_room_gains *gains,
                                     double dry_air_flow,
                                     moistair_room_air *done,
                                     moistair_error *error);

// The room that a supply and the gains make.
//
// supply: the stream that is supplied; gains: what the room gives to it; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (more water is taken out than there is; outside the range of states).
int32_t moistair_room_of_supply(const moistair_stream *supply,
                                const moistair_room_gains *gains,
                                moistair_room_air *done,
                                moistair_error *error);

// The gains of a room, from supply and room air.
//
// supply: the stream that is supplied; room: the state of the room; source: how its moisture comes, MOISTAIR_SOURCE_…; source_value:
// temperature [°C] or enthalpy [J/kg] of that moisture; gains: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_room_gains_between(const moistair_stream *supply,
                                    const moistair_state *room,
                                    int32_t source,
                                    double source_value,
                                    moistair_room_gains *gains,
                                    moistair_error *error);

// The latent heat by which a room's gains are told apart: the enthalpy of the vapor in its own air.
//
// room: the state of the room; latent_heat: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_room_latent_heat(const moistair_state *room, double *latent_heat, moistair_error *error);

// Sensible over total gain by moistair_room_latent_heat; below 0 or above 1 where one gain is negative or water evaporates in the room.
//
// room: the state of the room; gains: what the room gives to the air; sensible_heat_ratio: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the gains cancel, or there are none).
int32_t moistair_room_sensible_heat_ratio(const moistair_state *room,
                                          const moistair_room_gains *gains,
                                          double *sensible_heat_ratio,
                                          moistair_error *error);

// Slope of the line of a room, change of enthalpy over change of humidity ratio.
//
// gains: what the room gives to the air; basis: pressure and formulation; slope: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (no moisture: the slope has no bound).
int32_t moistair_room_process_slope(const moistair_room_gains *gains,
                                    moistair_basis basis,
                                    double *slope,
                                    moistair_error *error);

// Slope of the line of a sensible heat ratio through a room.
//
// room: the state of the room; sensible_heat_ratio: [1]; slope: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (a ratio of one, whose slope has no bound).
int32_t moistair_room_slope_of_ratio(const moistair_state *room,
                                     double sensible_heat_ratio,
                                     double *slope,
                                     moistair_error *error);

// Sensible heat ratio of a slope through a room.
//
// room: the state of the room; slope: [J/kg]; sensible_heat_ratio: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (a slope of zero).
int32_t moistair_room_ratio_of_slope(const moistair_state *room,
                                     double slope,
                                     double *sensible_heat_ratio,
                                     moistair_error *error);

// The apparatus dew points of a room that is cooled: where the line of its supply states meets saturation. Not for a room that liquid water cools
// (a ratio below 0): its line runs the other way.
//
// room: the state of the room; sensible_heat_ratio: [1] by moistair_room_latent_heat; found: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (a room of a dew point below -40 °C).
int32_t moistair_room_apparatus_dew_points(const moistair_state *room,
                                           double sensible_heat_ratio,
                                           moistair_room_dew_points *found,
                                           moistair_error *error);

// The limit of a room: the steepest line that a coil still serves without reheat.
//
// room: the state of the room; entering: the state that enters the coil, of account with a bypass; coil: what the coil can leave; limit: output;
// error: may be null.
// Returns 0, 1xx, 2xx, 301 (the coil cannot get as dry as the room, or cannot cool it).
int32_t moistair_room_limiting_line(const moistair_state *room,
                                    const moistair_state *entering,
                                    const moistair_coil_leaving *coil,
                                    moistair_limiting_line *limit,
                                    moistair_error *error);

// The least reheat with which coil and heater keep a room, over all flows of supply air.
//
// room: the state of the room; gains: what the room gives to the air; entering: the state that enters the coil, of account with a bypass; coil: what
// the coil can leave; least: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (no moisture to take out; the coil cannot get as dry as the room, or cannot cool it).
int32_t moistair_room_least_reheat(const moistair_state *room,
                                   const moistair_room_gains *gains,
                                   const moistair_state *entering,
                                   const moistair_coil_leaving *coil,
                                   moistair_least_reheat *least,
                                   moistair_error *error);

// What coil and heater have to do to the air that enters them so that a room is kept at a state.
//
// room: the state of the room; gains: what the room gives to the air; entering: the stream that enters the coil, of the flow of the supply; coil: what
// the coil can leave; condensate: where the condensate temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150,
// read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (as moistair_room_supply_at_flow and moistair_reheat_with_coil).
int32_t moistair_room_conditioned(const moistair_state *room,
                                  const moistair_room_gains *gains,
                                  const moistair_stream *entering,
                                  const moistair_coil_leaving *coil,
                                  int32_t condensate,
                                  double condensate_temperature,
                                  moistair_conditioned *done,
                                  moistair_error *error);

// Reaches a state by cooling to its humidity ratio on the characteristic of a coil, then heating. Codes restrict simultaneous heating and
// cooling.
//
// entering: the stream that enters; target: the state to reach; coil: what the coil can leave; condensate: where the condensate temperature comes
// from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error:
// may be null.
// Returns 0, 1xx, 2xx, 301 (the quantity of the error says what binds: the target is moister; the bypass is too large; the apparatus dew point
// lies below the coldest; the target is cooler than what the coil leaves).
int32_t moistair_reheat_with_coil(const moistair_stream *entering,
                                  const moistair_state *target,
                                  const moistair_coil_leaving *coil,
                                  int32_t condensate,
                                  double condensate_temperature,
                                  moistair_reheat *done,
                                  moistair_error *error);

// Specific enthalpy of saturated steam, IAPWS-95, on the datum of liquid water at the triple point.
//
// temperature: [°C], 0 to 200; specific_enthalpy: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_saturated_steam_enthalpy(double temperature,
                                          double *specific_enthalpy,
                                          moistair_error *error);

// Adds steam; what the air cannot take up is carried.
//
// entering: the stream that enters; steam: [kg/s], 0 to 1e6; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
// output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301.
int32_t moistair_humidify_steam(const moistair_stream *entering,
                                double steam,
                                double steam_enthalpy,
                                moistair_humidified *done,
                                moistair_error *error);

// Adds steam up to a humidity ratio.
//
// entering: the stream that enters; humidity_ratio: [kg/kg]; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
// output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (below what enters).
int32_t moistair_humidify_steam_to_humidity_ratio(const moistair_stream *entering,
                                                  double humidity_ratio,
                                                  double steam_enthalpy,
                                                  moistair_humidified *done,
                                                  moistair_error *error);

// Adds steam up to a relative humidity over the stable surface.
//
// entering: the stream that enters; relative_humidity: [1], 0 to 1; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
// output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (below what enters, or never reached).
int32_t moistair_humidify_steam_to_relative_humidity(const moistair_stream *entering,
                                                     double relative_humidity,
                                                     double steam_enthalpy,
                                                     moistair_humidified *done,
                                                     moistair_error *error);

// The steam flow at which the air first saturates.
//
// entering: the stream that enters; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; limit: output [kg/s], infinite if
// there is none; error: may be null.
// Returns 0, 1xx, 2xx, 207.
int32_t moistair_humidify_steam_limit(const moistair_stream *entering,
                                      double steam_enthalpy,
                                      double *limit,
                                      moistair_error *error);

// The steam flow at which the air first saturates, and that from which on it no longer is: superheated steam may lead into saturation and out
// of it again. Between the two a part of the steam condenses.
//
// entering: the stream that enters; steam_enthalpy: specific enthalpy of the steam [J/kg], 251e3 to 4e6; absorption: output; error: may be
// null.
// Returns 0, 1xx, 2xx, 207.
int32_t moistair_humidify_steam_absorption(const moistair_stream *entering,
                                           double steam_enthalpy,
                                           moistair_steam_absorption *absorption,
                                           moistair_error *error);

// Specific enthalpy of dry saturated steam of a pressure, on the datum of liquid water at the triple point.
//
// pressure: absolute [Pa], 1e3 to 1.6e6; specific_enthalpy: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_steam_saturated(double pressure, double *specific_enthalpy, moistair_error *error);

// Specific enthalpy of wet steam, h = h_f + x h_fg.
//
// pressure: absolute [Pa], 1e3 to 1.6e6; quality: x, vapor over all of it by mass [1]; specific_enthalpy: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_steam_wet(double pressure,
                           double quality,
                           double *specific_enthalpy,
                           moistair_error *error);

// Specific enthalpy of superheated steam.
//
// temperature: [°C], to 400; pressure: absolute [Pa], 1e3 to 1.6e6; specific_enthalpy: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (below the temperature of boiling).
int32_t moistair_steam_superheated(double temperature,
                                   double pressure,
                                   double *specific_enthalpy,
                                   moistair_error *error);

// Steam after throttling, such as to the pressure of the duct: its enthalpy is kept.
//
// specific_enthalpy: of the steam [J/kg], 251e3 to 4e6; pressure: absolute, after it [Pa], 1e3 to 1.6e6; steam: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (liquid, or hotter than 400 °C).
int32_t moistair_steam_throttled(double specific_enthalpy,
                                 double pressure,
                                 moistair_throttled_steam *steam,
                                 moistair_error *error);

// Washes air with water of any temperature: below the dew point it takes water out of the air.
//
// entering: the stream that enters; washer: the washer; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, is hotter than the air takes, or would all evaporate).
int32_t moistair_humidify_wash(const moistair_stream *entering,
                               const moistair_washer *washer,
                               moistair_washed *done,
                               moistair_error *error);

// Sprays liquid water; what equilibrium does not evaporate is carried.
//
// entering: the stream that enters; water: [kg/s], 0 to 1e6; water_temperature: [°C], 0 to 200; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301.
int32_t moistair_humidify_spray(const moistair_stream *entering,
                                double water,
                                double water_temperature,
                                moistair_humidified *done,
                                moistair_error *error);

// A wetted medium or full spray of a known saturation effectiveness.
//
// entering: the stream that enters; saturation_effectiveness: [1], 0 to 1; water: MOISTAIR_WATER_AT_WET_BULB or MOISTAIR_WATER_AT_GIVEN;
// water_temperature: [°C], 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the wet bulb is below freezing), 31x.
int32_t moistair_humidify_evaporative(const moistair_stream *entering,
                                      double saturation_effectiveness,
                                      int32_t water,
                                      double water_temperature,
                                      moistair_humidified *done,
                                      moistair_error *error);

// Mixes streams at one pressure adiabatically, with all condensate, then phase equilibrium.
//
// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: output;
// error: may be null.
// Returns 0, 1xx, 2xx, 205, 206, 207, 301.
int32_t moistair_mixing_adiabatic(const moistair_wet_stream *streams,
                                  size_t count,
                                  moistair_wet_stream *leaving,
                                  moistair_error *error);

// Mixes streams adiabatically at a given outlet pressure.
//
// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; pressure: of the
// outlet [Pa]; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or MOISTAIR_FREEZING_SUPERCOOLED; leaving: output; error: may be null.
// Returns 0, 1xx, 2xx, 205, 207, 301.
int32_t moistair_mixing_adiabatic_at(const moistair_wet_stream *streams,
                                     size_t count,
                                     double pressure,
                                     int32_t freezing,
                                     moistair_wet_stream *leaving,
                                     moistair_error *error);

// The stream of air that is left of a total flow when a part of it is known: the recirculated air behind measured outdoor and supply air.
//
// total_dry_air_flow: [kg/s]; part: the known stream; air: state of the rest; rest: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the part is more than the total).
int32_t moistair_mixing_remainder(double total_dry_air_flow,
                                  const moistair_stream *part,
                                  const moistair_state *air,
                                  moistair_stream *rest,
                                  moistair_error *error);

// Whether heat and water close between streams that enter, one that leaves and what was exchanged.
//
// streams: the streams that enter; those without flow take no part; count: number of streams, to MOISTAIR_MOST_STREAMS; leaving: the
// stream that leaves; exchange: what was exchanged; books: output; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_books_balance(const moistair_wet_stream *streams,
                               size_t count,
                               const moistair_wet_stream *leaving,
                               const moistair_exchange *exchange,
                               moistair_books *books,
                               moistair_error *error);

// Blowdown and make-up for an evaporation; also for humidifiers with bleed.
//
// evaporation: [kg/s], 0 to 1e6; circulating: circulating water [kg/s], 0 to 1e6; treatment: drift and concentration; water: output;
// error: may be null.
// Returns 0, 1xx, 2xx, 301 (one cycle of concentration).
int32_t moistair_tower_water_use(double evaporation,
                                 double circulating,
                                 moistair_water_treatment treatment,
                                 moistair_water_use *water,
                                 moistair_error *error);

// Cycles of concentration as measured: circulating water over make-up, both in one unit.
//
// circulating, make_up: concentrations or conductivities, 0 to 1e6; cycles: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the circulating water is not the more concentrated).
int32_t moistair_tower_cycles_of_concentration(double circulating,
                                               double make_up,
                                               double *cycles,
                                               moistair_error *error);

// Evaporation by the rule of thumb 0.00153 of the circulating flow for each kelvin of range (common practice, no source); the balances give
// from 0.0012 to 0.0023.
//
// circulating: circulating water [kg/s], 0 to 1e6; range: [K], 0 to 200; evaporation: output [kg/s]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_tower_evaporation_by_rule_of_thumb(double circulating,
                                                    double range,
                                                    double *evaporation,
                                                    moistair_error *error);

// A basin after a step with steady flows; exact, so that a step may be as long as the flows are steady.
//
// basin: as it was; seconds: 0 to 1e9; flows: of moistair_tower_water_use, or measured; make_up_concentration: in the unit of the basin's;
// after: output, may be the same place as basin; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the concentration would leave its range).
int32_t moistair_tower_basin_after(const moistair_basin *basin,
                                   double seconds,
                                   const moistair_water_use *flows,
                                   double make_up_concentration,
                                   moistair_basin *after,
                                   moistair_error *error);

// Balance of a tower with a known air flow; the air is taken to leave saturated.
//
// entering: the air that enters; water: the water that is cooled; treatment: drift and concentration; balance: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301.
int32_t moistair_tower_with_air_flow(const moistair_stream *entering,
                                     moistair_tower_water water,
                                     moistair_water_treatment treatment,
                                     moistair_tower_balance *balance,
                                     moistair_error *error);

// Balance of a tower with a known leaving state: the dry-air flow that it takes.
//
// entering: the state that enters; leaving: the state that leaves; water: the water that is cooled; treatment: drift and concentration;
// balance: output; error: may be null.
// Returns 0, 1xx, 2xx, 301.
int32_t moistair_tower_with_leaving_air(const moistair_state *entering,
                                        const moistair_state *leaving,
                                        moistair_tower_water water,
                                        moistair_water_treatment treatment,
                                        moistair_tower_balance *balance,
                                        moistair_error *error);

// Cools and humidifies air over a wetted medium whose water circulates, with its pump, carry-over, bleed and make-up.
//
// entering: the stream that enters; cooler: the cooler; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, more pump heat than the air takes, one cycle of concentration), 31x.
int32_t moistair_evaporative_direct(const moistair_stream *entering,
                                    const moistair_direct_cooler *cooler,
                                    moistair_direct_cooled *done,
                                    moistair_error *error);

// Cools the primary air by a wetted secondary stream behind a wall, without moistening it. The second law is not looked at, and freezing only at the
// wet bulb of the secondary air: beyond it (dew-point cycles) use effectivenesses and flows of a test.
//
// primary, secondary: the streams that enter; cooler: the cooler; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, an effectiveness beyond the dew point of the secondary air, a secondary air that
// cannot take the heat or leaves drier than it can), 31x.
int32_t moistair_evaporative_indirect(const moistair_stream *primary,
                                      const moistair_stream *secondary,
                                      const moistair_indirect_cooler *cooler,
                                      moistair_indirect_cooled *done,
                                      moistair_error *error);

// Cools the primary air indirectly, then directly.
//
// primary, secondary: the streams that enter; first: the indirect stage; second: the direct one; done: output; error: may be null.
// Returns as either stage does.
int32_t moistair_evaporative_two_stage(const moistair_stream *primary,
                                       const moistair_stream *secondary,
                                       const moistair_indirect_cooler *first,
                                       const moistair_direct_cooler *second,
                                       moistair_two_stage_cooled *done,
                                       moistair_error *error);

// L/G: the entering water over the dry air.
//
// entering: the air that enters; water_flow: [kg/s], 0 to 1e6; ratio: output; error: may be null.
// Returns 0, 1xx, 2xx, 207.
int32_t moistair_tower_water_to_air(const moistair_stream *entering,
                                    double water_flow,
                                    double *ratio,
                                    moistair_error *error);

// The limit of cold water: where saturated air has the enthalpy of the entering air; a little below the wet bulb.
//
// entering: the state that enters; temperature: output [°C]; error: may be null.
// Returns 0, 1xx, 2xx, 301.
int32_t moistair_tower_coldest_water(const moistair_state *entering,
                                     double *temperature,
                                     moistair_error *error);

// The greatest ratio of water to air with which a duty can be done at all; the least air is water flow / ratio.
//
// entering: the state that enters; hot, cold: water temperatures [°C]; pinch: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (cold water at or below its limit, or not below the hot).
int32_t moistair_tower_merkel_pinch(const moistair_state *entering,
                                    double hot,
                                    double cold,
                                    moistair_pinch *pinch,
                                    moistair_error *error);

// The Merkel number that a duty takes.
//
// entering: the air that enters; water: the water that is cooled; quadrature: MOISTAIR_QUADRATURE_...; needed: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (beyond the pinch, with the greatest L/G in the error; cold water at or below its limit).
int32_t moistair_tower_merkel_number(const moistair_stream *entering,
                                     moistair_tower_water water,
                                     int32_t quadrature,
                                     moistair_merkel_number *needed,
                                     moistair_error *error);

// The cold water of a tower of a given Merkel number.
//
// entering: the air that enters; water: the water that enters; number: Merkel number [1], 0 to 20; rating: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, with the greatest number that does not freeze it in the error).
int32_t moistair_tower_merkel_rate(const moistair_stream *entering,
                                   moistair_hot_water water,
                                   double number,
                                   moistair_tower_rating *rating,
                                   moistair_error *error);

// The dry-air flow with which a fill does a duty.
//
// entering: the state that enters; water: the water that is cooled; fill: its law; stream: output, the air that it takes; error: may be null.
// Returns 0, 1xx, 2xx, 301 (the fill is too small with any air, or too large).
int32_t moistair_tower_air_for_duty(const moistair_state *entering,
                                    moistair_tower_water water,
                                    moistair_fill_law fill,
                                    moistair_stream *stream,
                                    moistair_error *error);

// The Merkel number that a duty takes, by effectiveness and transfer units.
//
// entering: the air that enters; water: the water that is cooled; number: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301.
int32_t moistair_tower_effectiveness_number(const moistair_stream *entering,
                                            moistair_tower_water water,
                                            double *number,
                                            moistair_error *error);

// The cold water of a tower of a given Merkel number, by effectiveness and transfer units.
//
// entering: the air that enters; water: the water that enters; number: Merkel number [1], 0 to 20; rating: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, or enters below the limit of the air).
int32_t moistair_tower_effectiveness_rate(const moistair_stream *entering,
                                          moistair_hot_water water,
                                          double number,
                                          moistair_tower_rating *rating,
                                          moistair_error *error);

// The number that a duty takes, by Poppe's method.
//
// entering: the air that enters; water: the water that is cooled; transfer: MOISTAIR_TRANSFER_...; number: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301.
int32_t moistair_tower_poppe_number(const moistair_stream *entering,
                                    moistair_tower_water water,
                                    int32_t transfer,
                                    double *number,
                                    moistair_error *error);

// Cold water, leaving air and evaporation of a tower of a given number, by Poppe's method.
//
// entering: the air that enters; water: the water that enters; number: found by the same method [1], 0 to 20; transfer: MOISTAIR_TRANSFER_...;
// rating: output; error: may be null.
// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, or all of it evaporate).
int32_t moistair_tower_poppe_rate(const moistair_stream *entering,
                                  moistair_hot_water water,
                                  double number,
                                  int32_t transfer,
                                  moistair_poppe_rating *rating,
                                  moistair_error *error);

// The law of a fill through two tests.
//
// first, second: tests at different L/G; law: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (tests at one L/G, or an exponent outside 0 to 2).
int32_t moistair_tower_fill_from_two_tests(moistair_fill_test first,
                                           moistair_fill_test second,
                                           moistair_fill_law *law,
                                           moistair_error *error);

// Merkel number of a fill at a ratio of water to air.
//
// fill: its law; water_to_air: L/G [1], 0.001 to 20; number: output [1]; error: may be null.
// Returns 0, 1xx, 2xx, 301.
int32_t moistair_tower_fill_number(moistair_fill_law fill,
                                   double water_to_air,
                                   double *number,
                                   moistair_error *error);

// The height that a Merkel number takes, of a fill tested at a height.
//
// fill: its law; number: wanted [1], 0 to 20; water_to_air: L/G [1], 0.001 to 20; tested_height: [m], 0 to 100; height: output [m];
// error: may be null.
// Returns 0, 1xx, 2xx, 301.
int32_t moistair_tower_fill_height(moistair_fill_law fill,
                                   double number,
                                   double water_to_air,
                                   double tested_height,
                                   double *height,
                                   moistair_error *error);

// Brings air to a pressure and temperature, by whatever machine (compressor with aftercooler, dryer, expansion), and lets its water come to
// equilibrium there; below the melting temperature what condenses is ice. Pressures are absolute. Vessels under pressure can burst, condensate
// freezes: codes for pressure equipment and licensed practice govern, this is no safety function.
//
// entering: the stream that enters; pressure: absolute [Pa]; leaving_temperature: [°C]; done: output; error: may
// be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_compression_to_pressure(const moistair_wet_stream *entering,
                                         double pressure,
                                         double leaving_temperature,
                                         moistair_compressed *done,
                                         moistair_error *error);

// Takes a stream through a chain of processes and adds up heat, water and work.
//
// entering: the stream that enters; steps: array of steps, in the order of the air; may be null for a count of 0; count: how many; results:
// room for what each step did, count elements, may be null; ran: how many steps ran, written whenever it is given and the pointers are good,
// also when a step fails: it is then the place of that step, and the results of those before it have been written; may be null; total: output;
// error: may be null. Memory to be written may not overlap with any other memory of the call.
// Returns 0, 1xx, 2xx, 3xx: the status of the first step that fails. Later steps are not run.
int32_t moistair_sequence_run(const moistair_wet_stream *entering,
                              const moistair_step *steps,
                              size_t count,
                              moistair_step_result *results,
                              size_t *ran,
                              moistair_sequence_total *total,
                              moistair_error *error);

// Finds the number of one step with which the air has a property, and runs the chain with it.
//
// The property need not be monotone: it is enough that it lies on two sides of its value at the ends of the bracket. Where the chain does not
// run at an end, that is drawn in to where it does; where it runs at neither, 15 points between are tried. At most 179 evaluations of the
// steps from the free one on, about ten where the chain runs at both ends. The steps stay as they are: put solved.number into its place.
// The steps are copied to the stack, about 10 KiB.
//
// entering: the stream that enters; steps: array of steps, in the order of the air; count: how many, 1 to MOISTAIR_MOST_STEPS; free: which
// number of which step, and where to look; target: the property and its value; results: room for what each step does with the number
// found, count elements, may be null, written on success; solved: output; error: may be null. Memory to be written may not overlap with
// any other memory of the call.
// Returns 0 (see solved.status), 1xx, 2xx, 3xx: of a wrong argument, of a step before the free one, of the chain at the lower end of the
// bracket when it runs nowhere, or of a step behind the one whose air is looked at.
int32_t moistair_sequence_solve(const moistair_wet_stream *entering,
                                const moistair_step *steps,
                                size_t count,
                                const moistair_free *free,
                                const moistair_target *target,
                                moistair_step_result *results,
                                moistair_solved *solved,
                                moistair_error *error);

// Leads air along the line of sorption to a humidity ratio. A moister target runs the line backwards, as in regeneration.
//
// entering: the stream that enters; target: humidity ratio [kg/kg]; sorption: what the desiccant does; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the leaving air would be fog, or outside the range of states).
int32_t moistair_desiccant_to_humidity_ratio(const moistair_stream *entering,
                                             double target,
                                             const moistair_sorption *sorption,
                                             moistair_sorbed *done,
                                             moistair_error *error);

// Dries by an effectiveness on humidity ratio.
//
// entering: the stream that enters; effectiveness: [1], 0 to 1; driest: humidity ratio that the desiccant could reach at best [kg/kg]; sorption:
// what the desiccant does; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the air enters drier).
int32_t moistair_desiccant_by_effectiveness(const moistair_stream *entering,
                                            double effectiveness,
                                            double driest,
                                            const moistair_sorption *sorption,
                                            moistair_sorbed *done,
                                            moistair_error *error);

// A wheel that dries air to a humidity ratio, both sides by balances, with the heater of its regeneration.
//
// entering: the stream that is dried; target: humidity ratio [kg/kg]; sorption: what the desiccant does; regeneration: the stream that enters the
// heater; known: what of the heater is given, MOISTAIR_REGENERATION_…; value: that [W] or [°C]; done: output; error: may be null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the heater would have to cool; the regeneration air cannot take the water up).
int32_t moistair_desiccant_wheel(const moistair_stream *entering,
                                 double target,
                                 const moistair_sorption *sorption,
                                 const moistair_stream *regeneration,
                                 int32_t known,
                                 double value,
                                 moistair_wheel *done,
                                 moistair_error *error);

// The potentials of air over silica gel.
//
// air: a state, of 275 to 425 K; found: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (air without vapor).
int32_t moistair_desiccant_potentials(const moistair_state *air,
                                      moistair_potentials *found,
                                      moistair_error *error);

// A wheel of silica gel by its potentials: rough, see what they leave over. The heater before it is moistair_sensible_….
//
// entering: the stream that is dried; regeneration: the hot stream; effectiveness: [1] in each potential, 0 to 1; done: output; error: may be
// null.
// Returns 0, 1xx, 2xx, 207 (no flow), 301 (air without vapor, fog, or a result outside 275 to 425 K).
int32_t moistair_desiccant_wheel_by_potentials(const moistair_stream *entering,
                                               const moistair_stream *regeneration,
                                               const moistair_potentials *effectiveness,
                                               moistair_potential_wheel *done,
                                               moistair_error *error);

// The effectiveness of a wheel in each potential, from a test.
//
// air: the state that is dried; dried: that behind the wheel; regeneration: the hot state before the wheel; found: output; error: may be null.
// Returns 0, 1xx, 2xx, 301 (a result outside 0 to 1, air without vapor).
int32_t moistair_desiccant_effectiveness_between(const moistair_state *air,
                                                 const moistair_state *dried,
                                                 const moistair_state *regeneration,
                                                 moistair_potentials *found,
                                                 moistair_error *error);

// The outdoor-air fraction (m - r) / (o - r) from readings of one quantity. Exact by enthalpy, humidity ratio and tracer; by dry
// bulbs nearly, and wrong in fog.
//
// quantity: MOISTAIR_DRY_BULB, MOISTAIR_HUMIDITY_RATIO, MOISTAIR_SPECIFIC_ENTHALPY or MOISTAIR_TRACER_CONCENTRATION; outdoor,
// returned, mixed: readings; acceptable: standard uncertainty of the fraction up to which it counts as determined [1]; found:
// output; error: may be null.
// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx.
int32_t moistair_outdoor_air_from_readings(int32_t quantity,
                                           const moistair_reading *outdoor,
                                           const moistair_reading *returned,
                                           const moistair_reading *mixed,
                                           double acceptable,
                                           moistair_outdoor_air_fraction *found,
                                           moistair_error *error);

// The same from measured states, by enthalpy or humidity ratio, with the uncertainty that the sensors of temperature and humidity
// leave in it.
//
// quantity: MOISTAIR_HUMIDITY_RATIO or MOISTAIR_SPECIFIC_ENTHALPY; outdoor, returned, mixed: measured air without condensate;
// basis: pressure and formulation; acceptable: standard uncertainty of the fraction up to which it counts as determined [1];
// found: output; error: may be null.
// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx, 31x.
int32_t moistair_outdoor_air_from_air(int32_t quantity,
                                      const moistair_measured_air *outdoor,
                                      const moistair_measured_air *returned,
                                      const moistair_measured_air *mixed,
                                      moistair_basis basis,
                                      double acceptable,
                                      moistair_outdoor_air_fraction *found,
                                      moistair_error *error);

// The outdoor-air fraction from measured dry-air flows.
//
// outdoor: [kg/s]; other: [kg/s]; other_is: MOISTAIR_FLOW_TOTAL or MOISTAIR_FLOW_RECIRCULATED; acceptable: standard uncertainty of
// the fraction up to which it counts as determined [1]; found: output; error: may be null.
// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx.
int32_t moistair_outdoor_air_from_flows(const moistair_reading *outdoor,
                                        const moistair_reading *other,
                                        int32_t other_is,
                                        double acceptable,
                                        moistair_outdoor_air_fraction *found,
                                        moistair_error *error);

// The outdoor-air fraction that mixes to a wanted temperature, or comes nearest to it within the limits, with moisture and fog.
//
// outdoor, returned: states; wanted: mixed dry bulb [°C]; least, most: limits of the fraction [1]; blend: output; error: may be null.
// Returns 0, 1xx, 2xx, 205, 206, 301.
int32_t moistair_outdoor_air_for_temperature(const moistair_state *outdoor,
                                             const moistair_state *returned,
                                             double wanted,
                                             double least,
                                             double most,
                                             moistair_blend *blend,
                                             moistair_error *error);

// What a fraction is worth in words: static, lower case. Empty for an unknown code.
const char *moistair_fraction_status_text(int32_t status);

// Usual settings of a rule at a site: the limits of ASHRAE 90.1 (from memory), a supply of 13 °C off a coil at 95 %, hysteresis of
// 1 K and 1 kJ/kg, least times of 300 s, lockout below 0 °C, least outdoor air when a humidity is missing.
//
// rule: MOISTAIR_ECONOMIZER_RULE_…; basis: pressure and formulation; settings: output; error: may be null.
// Returns 0, 1xx, 2xx, 31x.
int32_t moistair_economizer_new(int32_t rule,
                                moistair_basis basis,
                                moistair_economizer *settings,
                                moistair_error *error);

// What is wrong with the settings, if anything.
//
// settings: to be checked; error: may be null.
// Returns 0 (in order), 1xx, 2xx, 31x.
int32_t moistair_economizer_check(const moistair_economizer *settings, moistair_error *error);

// Decides whether outdoor air beyond the least may be taken, and remembers it. Whatever is wrong with settings, time or readings,
// also selectors that name nothing: off, with the reason.
//
// settings: of the economizer; state: its memory, read and written; time: [s] since any fixed instant; outdoor, returned: measured
// air, read as far as the rule needs; decision: output; error: may be null.
// Returns 0 (also for a bad reading), 101, 103.
int32_t moistair_economizer_decide(const moistair_economizer *settings,
                                   moistair_economizer_state *state,
                                   double time,
                                   const moistair_measured_air *outdoor,
                                   const moistair_measured_air *returned,
                                   moistair_decision *decision,
                                   moistair_error *error);

// How much outdoor air to take by a decision: the least when off; when on, what mixes to the wanted temperature. Where that is
// colder than both airs, outdoor air as far as the dampers go; where it is warmer than both, the nearest.
//
// decision: as decided; outdoor, returned: states; wanted: mixed dry bulb [°C]; least, most: limits of the outdoor-air fraction
// [1], the least by ventilation codes; blend: output; error: may be null.
// Returns 0, 1xx, 2xx, 205, 206, 301.
int32_t moistair_economizer_outdoor_air(const moistair_decision *decision,
                                        const moistair_state *outdoor,
                                        const moistair_state *returned,
                                        double wanted,
                                        double least,
                                        double most,
                                        moistair_blend *blend,
                                        moistair_error *error);

// Heat that a coil has to take out of air to supply it: the larger of that of a dry and that of a wet coil, 0 where none is needed.
//
// air: what enters; supply_dry_bulb: behind the coil [°C]; supply_coil_leaving: relative humidity at which a wet coil leaves the
// air [1]; load: output; error: may be null.
// Returns 0, 1xx, 2xx, 31x.
int32_t moistair_economizer_coil_load(const moistair_state *air,
                                      double supply_dry_bulb,
                                      double supply_coil_leaving,
                                      moistair_coil_load *load,
                                      moistair_error *error);

// The fixed enthalpy limit at a pressure: that of air of 75 °F and 50 %, as ASHRAE 90.1 has it away from sea level (from memory).
//
// basis: pressure and formulation; limit: output [J/kg]; error: may be null.
// Returns 0, 1xx, 2xx.
int32_t moistair_economizer_enthalpy_limit(moistair_basis basis,
                                           double *limit,
                                           moistair_error *error);

// The reason of a decision in words: static, lower case. Empty for an unknown code.
const char *moistair_economizer_reason_text(int32_t reason);

// A rule in words: static, lower case. Empty for an unknown code.
const char *moistair_economizer_rule_text(int32_t rule);

// A channel of a kind in a raw unit, with no stuck rule, no hold, no gap rule.
//
// kind: MOISTAIR_KIND_…; unit: MOISTAIR_UNIT_…; min, max: limits in the unit of the core; channel: output; error: may be null.
// Returns 0, 101, 102, 103, 208.
int32_t moistair_channel_new(int32_t kind,
                             int32_t unit,
                             double min,
                             double max,
                             moistair_channel *channel,
                             moistair_error *error);

// Checks one sample and remembers it.
//
// channel: a channel; state: its memory, read and written; time: [s] since any fixed instant; raw: the reading in the unit of the channel, NaN
// if there is none; checked: output; error: may be null.
// Returns 0 (also for a refused sample), 101, 102, 103.
int32_t moistair_channel_check(const moistair_channel *channel,
                               moistair_channel_state *state,
                               double time,
                               double raw,
                               moistair_checked *checked,
                               moistair_error *error);

// Checks one sample beside a reference: a sample counts as unchanged only when the reference has moved since the last one.
//
// channel: a channel; state: its memory, read and written; time: [s] since any fixed instant; raw: the reading in the unit of the channel, NaN
// if there is none; reference: in its own unit; checked: output; error: may be null.
// Returns 0 (also for a refused sample), 101, 102, 103.
int32_t moistair_channel_check_beside(const moistair_channel *channel,
                                      moistair_channel_state *state,
                                      double time,
                                      double raw,
                                      double reference,
                                      moistair_checked *checked,
                                      moistair_error *error);

// A reading in a raw unit, in the unit of the core.
//
// unit: MOISTAIR_UNIT_…; raw: the reading; value: output; error: may be null.
// Returns 0, 101, 102, 103, 201.
int32_t moistair_unit_to_core(int32_t unit, double raw, double *value, moistair_error *error);

// A value in the unit of the core, in another unit: for display, logs and controllers.
//
// unit: MOISTAIR_UNIT_…; value: in the unit of the core; converted: output; error: may be null.
// Returns 0, 101, 102, 103, 201.
int32_t moistair_unit_from_core(int32_t unit, double value, double *converted, moistair_error *error);

// The symbol of a unit, such as "kPa": static, UTF-8. Empty for an unknown code.
const char *moistair_unit_text(int32_t unit);

// A quality in words: static, lower case. Empty for an unknown code.
const char *moistair_quality_text(int32_t quality);

// A reason in words: static, lower case. Empty for an unknown code.
const char *moistair_reason_text(int32_t reason);

// Counts a checked sample.
//
// counts: read and written; checked: the sample; error: may be null.
// Returns 0, 101, 102, 103, 106.
int32_t moistair_counts_record(moistair_counts *counts,
                               const moistair_checked *checked,
                               moistair_error *error);

// Adds the counts of another time or channel.
//
// counts: read and written; other: what is added; error: may be null.
// Returns 0, 101, 103.
int32_t moistair_counts_merge(moistair_counts *counts, const moistair_counts *other, moistair_error *error);

// An empty total.
//
// rule: what the rate does between two samples, MOISTAIR_RULE_…; longest_step: the longest time between samples that is bridged [s],
// infinity bridges all; total: output; error: may be null.
// Returns 0, 101, 102, 103, 201.
int32_t moistair_total_new(int32_t rule,
                           double longest_step,
                           moistair_total *total,
                           moistair_error *error);

// Adds the next sample of a rate. A rate that is refused or not finite leaves a hole, none of it counted as zero.
//
// total: read and written; time: [s] since any fixed instant; rate: in any unit; quality: how far it can be trusted, MOISTAIR_QUALITY_…; added:
// output, what became of the time before the sample, MOISTAIR_ADDED_…, may be null; error: may be null.
// Returns 0, 101, 102, 103.
int32_t moistair_total_add(moistair_total *total,
                           double time,
                           double rate,
                           int32_t quality,
                           int32_t *added,
                           moistair_error *error);

// Adds a total of another time or place: hours into a day.
//
// total: read and written; other: what is added; error: may be null.
// Returns 0, 101, 103, 302.
int32_t moistair_total_merge(moistair_total *total, const moistair_total *other, moistair_error *error);

// What a total has come to.
//
// total: a total; values: output; error: may be null.
// Returns 0, 101, 103, 106.
int32_t moistair_total_read(const moistair_total *total,
                            moistair_total_values *values,
                            moistair_error *error);

// Covered time over a duration that the caller knows: a day, of which a total may have seen a part.
//
// total: a total; duration: [s]; coverage: output [1], 0 for a duration that is not above zero; error: may be null.
// Returns 0, 101, 103, 201 (duration or result not finite).
int32_t moistair_total_coverage_of(const moistair_total *total,
                                   double duration,
                                   double *coverage,
                                   moistair_error *error);

// Periods of a length, each beginning at a multiple of it, so that hours of Unix time are hours of UTC.
//
// length: [s], 0.001 to 1e11; rule, longest_step: as for moistair_total_new; periods: output; error: may be null.
// Returns 0, 101, 102, 103, 201.
int32_t moistair_periods_new(double length,
                             int32_t rule,
                             double longest_step,
                             moistair_periods *periods,
                             moistair_error *error);

// Adds the next sample of a rate, as moistair_total_add does.
//
// periods: read and written; time: [s]; rate: in any unit; quality: MOISTAIR_QUALITY_…; period: output, the finished period when this sample
// is the first beyond it, else left alone; finished: output, 1 if there is one, else 0; error: may be null.
// Returns 0, 101, 102, 103.
int32_t moistair_periods_add(moistair_periods *periods,
                             double time,
                             double rate,
                             int32_t quality,
                             moistair_period *period,
                             int32_t *finished,
                             moistair_error *error);

// The period that is not finished yet, as if it ended without another sample.
//
// periods: the periods; period: output, left alone if no time has passed in it; begun: output, 1 if some has, else 0; error: may be null.
// Returns 0, 101, 103.
int32_t moistair_periods_unfinished(const moistair_periods *periods,
                                    moistair_period *period,
                                    int32_t *begun,
                                    moistair_error *error);

// Adds the books of a process; books that are not finite are only counted as refused.
//
// total: read and written; books: from moistair_books_balance; error: may be null.
// Returns 0, 101, 103.
int32_t moistair_books_total_record(moistair_books_total *total,
                                    const moistair_books *books,
                                    moistair_error *error);

// Adds the books of another time or place.
//
// total: read and written; other: what is added; error: may be null.
// Returns 0, 101, 103, 302.
int32_t moistair_books_total_merge(moistair_books_total *total,
                                   const moistair_books_total *other,
                                   moistair_error *error);

// What the books have come to.
//
// total: the books; values: output; error: may be null.
// Returns 0, 101, 103, 106.
int32_t moistair_books_total_read(const moistair_books_total *total,
                                  moistair_books_total_values *values,
                                  moistair_error *error);

// Takes a measured and a computed value in one unit; a pair that is not finite is only counted as refused.
//
// deviation: read and written; measured, computed: the pair; error: may be null.
// Returns 0, 101, 103.
int32_t moistair_deviation_add(moistair_deviation *deviation,
                               double measured,
                               double computed,
                               moistair_error *error);

// Adds the deviations of another time.
//
// deviation: read and written; other: what is added; error: may be null.
// Returns 0, 101, 103, 302.
int32_t moistair_deviation_merge(moistair_deviation *deviation,
                                 const moistair_deviation *other,
                                 moistair_error *error);

// What a deviation has come to.
//
// deviation: the deviation; values: output; error: may be null.
// Returns 0, 101, 103, 106.
int32_t moistair_deviation_read(const moistair_deviation *deviation,
                                moistair_deviation_values *values,
                                moistair_error *error);

#ifdef __cplusplus
}  // extern "C"
#endif  // __cplusplus

#endif  /* MOISTAIR_H */
