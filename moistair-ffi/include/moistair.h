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

/*
 Version of the interface in this header: changes when a program has to be compiled anew.
 */
#define MOISTAIR_ABI_VERSION 1

/*
 Success.
 */
#define MOISTAIR_OK 0

/*
 A pointer is null that may not be.
 */
#define MOISTAIR_NULL_POINTER 101

/*
 A selector that names nothing, or nothing that fits here.
 */
#define MOISTAIR_UNKNOWN_SELECTOR 102

/*
 A pointer is not aligned for its type.
 */
#define MOISTAIR_MISALIGNED 103

/*
 Memory to be written overlaps other memory of the call.
 */
#define MOISTAIR_OVERLAPPING 104

/*
 A count or a stride reaches beyond the address space.
 */
#define MOISTAIR_TOO_LONG 105

/*
 A value is NaN or infinite.
 */
#define MOISTAIR_NOT_FINITE 201

/*
 A value lies outside the declared range of its quantity.
 */
#define MOISTAIR_OUT_OF_RANGE 202

/*
 No state has this value at this dry bulb and pressure.
 */
#define MOISTAIR_UNATTAINABLE 203

/*
 The result would hold more vapor than saturation allows.
 */
#define MOISTAIR_SUPERSATURATED 204

/*
 States of different formulations in one process.
 */
#define MOISTAIR_MIXED_FORMULATIONS 205

/*
 Streams at different pressures where one pressure is needed.
 */
#define MOISTAIR_MIXED_PRESSURES 206

/*
 A process on no air at all.
 */
#define MOISTAIR_NO_FLOW 207

/*
 The process cannot reach what was asked.
 */
#define MOISTAIR_INFEASIBLE 301

/*
 No value: there is no water vapor.
 */
#define MOISTAIR_NO_VALUE_DRY_AIR 310

/*
 No value: the saturation pressure exceeds the total pressure.
 */
#define MOISTAIR_NO_VALUE_ABOVE_BOILING 311

/*
 No value: it would lie below the range of saturation over this surface.
 */
#define MOISTAIR_NO_VALUE_BELOW_SURFACE_RANGE 312

/*
 No value: it would lie above the range of saturation over this surface.
 */
#define MOISTAIR_NO_VALUE_ABOVE_SURFACE_RANGE 313

/*
 A fault of the library: a result was not a finite number. Nothing was written.
 */
#define MOISTAIR_INTERNAL 901

/*
 Number of property selectors: they run from 0 to one less. Later versions may add to them.
 */
#define MOISTAIR_PROPERTY_COUNT 23

/*
 Dry-bulb temperature. The range of states; the formulations themselves reach 193.15 to 473.15 K (IAPWS G8-10) [°C].
 */
#define MOISTAIR_DRY_BULB 0

/*
 Absolute total pressure [Pa].
 */
#define MOISTAIR_PRESSURE 1

/*
 Mass of water vapor per mass of dry air [kg/kg].
 */
#define MOISTAIR_HUMIDITY_RATIO 2

/*
 Moles of water vapor per mole of moist air [1].
 */
#define MOISTAIR_WATER_MOLE_FRACTION 3

/*
 Water mole fraction times total pressure [Pa].
 */
#define MOISTAIR_VAPOR_PRESSURE 4

/*
 Mass of water vapor per mass of moist air [kg/kg].
 */
#define MOISTAIR_SPECIFIC_HUMIDITY 5

/*
 Mass of water vapor per volume of moist air [kg/m³].
 */
#define MOISTAIR_ABSOLUTE_HUMIDITY 6

/*
 Enthalpy per mass of dry air [J/kg].
 */
#define MOISTAIR_SPECIFIC_ENTHALPY 7

/*
 Volume per mass of dry air [m³/kg].
 */
#define MOISTAIR_SPECIFIC_VOLUME 8

/*
 Mass of moist air per volume [kg/m³].
 */
#define MOISTAIR_DENSITY 9

/*
 Isobaric heat capacity per mass of dry air, at constant humidity ratio [J/(kg K)].
 */
#define MOISTAIR_SPECIFIC_HEAT 10

/*
 p v / (R T) of the mixture [1].
 */
#define MOISTAIR_COMPRESSIBILITY_FACTOR 11

/*
 x_w / x_ws over the stable surface: ice below the melting temperature, liquid above. Over ice it may exceed one [1].
 */
#define MOISTAIR_RELATIVE_HUMIDITY 12

/*
 x_w / x_ws over liquid water, supercooled below the melting temperature (WMO convention) [1].
 */
#define MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID 13

/*
 W / W_s over the stable surface [1].
 */
#define MOISTAIR_DEGREE_OF_SATURATION 14

/*
 (x_ws − x_w) p over the stable surface [Pa].
 */
#define MOISTAIR_VAPOR_PRESSURE_DEFICIT 15

/*
 Saturation pressure of pure water over the stable surface [Pa].
 */
#define MOISTAIR_SATURATION_PRESSURE 16

/*
 x_ws p over the saturation pressure of pure water [1].
 */
#define MOISTAIR_ENHANCEMENT_FACTOR 17

/*
 Thermodynamic wet bulb (adiabatic saturation), over liquid at or above the melting temperature, over ice below [°C].
 */
#define MOISTAIR_WET_BULB 18

/*
 Thermodynamic wet bulb over liquid water, supercooled below the melting temperature [°C].
 */
#define MOISTAIR_WET_BULB_OVER_LIQUID 19

/*
 Thermodynamic wet bulb over ice [°C].
 */
#define MOISTAIR_WET_BULB_OVER_ICE 20

/*
 Temperature of saturation over liquid water at the same pressure and composition [°C].
 */
#define MOISTAIR_DEW_POINT 21

/*
 Temperature of saturation over ice at the same pressure and composition [°C].
 */
#define MOISTAIR_FROST_POINT 22

/*
 Dry-air mass flow [kg/s].
 */
#define MOISTAIR_DRY_AIR_MASS_FLOW 32

/*
 Volume flow at a stated state [m³/s].
 */
#define MOISTAIR_VOLUME_FLOW 33

/*
 Reference density of a standard volume flow [kg/m³].
 */
#define MOISTAIR_STANDARD_DENSITY 34

/*
 Heat flow, positive into the air [W].
 */
#define MOISTAIR_HEAT_FLOW 35

/*
 Flow of liquid water or steam [kg/s].
 */
#define MOISTAIR_WATER_FLOW 36

/*
 Temperature of liquid water [°C].
 */
#define MOISTAIR_WATER_TEMPERATURE 37

/*
 Specific enthalpy of steam, on the datum of liquid water at the triple point (0 °C for the ideal gas) [J/kg].
 */
#define MOISTAIR_STEAM_ENTHALPY 38

/*
 Temperature that a process is to leave [°C].
 */
#define MOISTAIR_LEAVING_TEMPERATURE 39

/*
 Apparatus dew point of a coil [°C].
 */
#define MOISTAIR_APPARATUS_DEW_POINT 40

/*
 Bypass factor of a coil [1].
 */
#define MOISTAIR_BYPASS_FACTOR 41

/*
 Saturation effectiveness of a humidifier [1].
 */
#define MOISTAIR_SATURATION_EFFECTIVENESS 42

/*
 Temperature at which condensate leaves [°C].
 */
#define MOISTAIR_CONDENSATE_TEMPERATURE 43

/*
 Elevation above mean sea level, range of the standard atmosphere's lowest layer (ISO 2533) [m].
 */
#define MOISTAIR_ELEVATION 44

/*
 Drift of a tower as a fraction of the circulating water [1].
 */
#define MOISTAIR_DRIFT_FRACTION 45

/*
 Concentration of the circulating water over that of the make-up [1].
 */
#define MOISTAIR_CYCLES_OF_CONCENTRATION 46

/*
 Temperature range of the water in a tower [K].
 */
#define MOISTAIR_TOWER_RANGE 47

/*
 Total water per dry air, vapor and condensate [kg/kg].
 */
#define MOISTAIR_TOTAL_WATER 48

/*
 Specific enthalpy that a process leaves, with its condensate [J/kg].
 */
#define MOISTAIR_LEAVING_ENTHALPY 49

/*
 Dry air and water vapor as a virial mixture after IAPWS G8-10: the default.
 */
#define MOISTAIR_REAL_GAS 0

/*
 The perfect-gas relations of the ASHRAE handbook, for reproducing contract and textbook numbers.
 */
#define MOISTAIR_IDEAL_GAS 1

/*
 Limits of a quantity as an input, both included.
 */
typedef struct {
    /*
     The least value allowed.
     */
    double min;
    /*
     The greatest value allowed; infinite for a property that is only read.
     */
    double max;
} moistair_limits;

/*
 The detail of an error. Written whenever a place for it is given; after a success code is 0 and quantity is -1.
 */
typedef struct {
    /*
     The offending value in the unit of its quantity; NaN where there is none.
     */
    double value;
    /*
     The least value allowed; NaN where there is none.
     */
    double min;
    /*
     The greatest value allowed; NaN where there is none.
     */
    double max;
    /*
     The status that the function returns.
     */
    int32_t code;
    /*
     The selector of the quantity at fault; -1 where there is none. For MOISTAIR_UNKNOWN_SELECTOR the selector given.
     */
    int32_t quantity;
} moistair_error;

/*
 On what a state stands.
 */
typedef struct {
    /*
     Absolute pressure [Pa], 20000 to 1100000.
     */
    double pressure;
    /*
     MOISTAIR_REAL_GAS or MOISTAIR_IDEAL_GAS.
     */
    int32_t formulation;
    /*
     Set to 0; not read.
     */
    int32_t reserved;
} moistair_basis;

/*
 A state of moist air: what defines it (dry_bulb, pressure, humidity_ratio, formulation) and what always has a value.
 As an input only what defines it is read, and checked; the rest is computed anew.
 */
typedef struct {
    /*
     Dry-bulb temperature [°C].
     */
    double dry_bulb;
    /*
     Absolute pressure [Pa].
     */
    double pressure;
    /*
     Mass of water vapor per mass of dry air [kg/kg].
     */
    double humidity_ratio;
    /*
     Moles of water vapor per mole of moist air [1].
     */
    double water_mole_fraction;
    /*
     Water mole fraction times pressure [Pa].
     */
    double vapor_pressure;
    /*
     Mass of water vapor per mass of moist air [kg/kg].
     */
    double specific_humidity;
    /*
     Mass of water vapor per volume [kg/m³].
     */
    double absolute_humidity;
    /*
     Enthalpy per mass of dry air [J/kg].
     */
    double specific_enthalpy;
    /*
     Volume per mass of dry air [m³/kg].
     */
    double specific_volume;
    /*
     Mass of moist air per volume [kg/m³].
     */
    double density;
    /*
     Isobaric heat capacity per mass of dry air [J/(kg K)].
     */
    double specific_heat;
    /*
     p v / (R T) of the mixture [1].
     */
    double compressibility_factor;
    /*
     MOISTAIR_REAL_GAS or MOISTAIR_IDEAL_GAS.
     */
    int32_t formulation;
    /*
     0.
     */
    int32_t reserved;
} moistair_state;

/*
 An input column: the value of row i is values[i * stride]. Stride 1 is a plain array, stride 0 one value for every row, a larger one reads
 a field of an array of records that are a whole number of doubles apart.
 */
typedef struct {
    /*
     The value of row 0; may be null when there are no rows.
     */
    const double *values;
    /*
     Distance from row to row in doubles.
     */
    size_t stride;
} moistair_column;

/*
 How a column call went.
 */
typedef struct {
    /*
     Rows that have no state, or no value for a property that was asked for.
     */
    size_t failed;
    /*
     The first of them, from 0; the number of rows when there is none.
     */
    size_t first_failed;
} moistair_column_report;

#ifdef __cplusplus
extern "C" {
#endif // __cplusplus

/*
 The MOISTAIR_ABI_VERSION that the library was built with. A program that finds another one than its header says must not go on.
 */
int32_t moistair_abi_version(void);

/*
 The version of the library as 1000000 major + 1000 minor + patch, as MOISTAIR_VERSION is of the header.
 */
int32_t moistair_version(void);

/*
 Changes when any result of any function changes in any bit.
 */
int32_t moistair_numerics_version(void);

/*
 A status in words: English, lower case, static. Unknown codes read "unknown status".
 */
const char *moistair_status_text(int32_t code);

/*
 The name of a quantity, such as "dry_bulb": static, lower case, words joined by underscores. Empty for an unknown selector.
 */
const char *moistair_quantity_name(int32_t quantity);

/*
 The unit of a quantity, such as "kg/kg": static, UTF-8. Empty for an unknown selector.
 */
const char *moistair_quantity_unit(int32_t quantity);

/*
 The limits of a quantity as an input, in its unit.

 quantity: selector of any quantity; limits: output; error: may be null.
 Returns 0, 101, 102, 103.
 */
int32_t moistair_quantity_limits(int32_t quantity, moistair_limits *limits, moistair_error *error);

/*
 Pressure of the standard atmosphere (ISO 2533) at an elevation, taken as geopotential altitude. A measured pressure is better: weather
 moves it by 3 % either way.

 elevation: [m] above mean sea level, -5000 to 11000; pressure: output [Pa]; error: may be null.
 Returns 0, 101, 103, 201, 202.
 */
int32_t moistair_pressure_at_elevation(double elevation,
                                       double *pressure,
                                       moistair_error *error);

/*
 A state from its dry bulb and any second property.

 dry_bulb: [°C], -80 to 150; property: selector of the second property, one that fixes a state (humidity ratio, relative humidity,
 wet bulb, dew point, specific enthalpy, …); value: its value in its unit; basis: pressure and formulation; state: output; error: may
 be null.
 Returns 0, 101, 102, 103, 201, 202, 203 (no state has the value here; the error holds the limits).
 */
int32_t moistair_from_dry_bulb(double dry_bulb,
                               int32_t property,
                               double value,
                               moistair_basis basis,
                               moistair_state *state,
                               moistair_error *error);

/*
 One property of a state.

 state: a state; property: selector below MOISTAIR_PROPERTY_COUNT; value: output in the unit of the property; error: may be null.
 Returns 0, 101, 102, 103, 31x (the property has no value at this state), 201, 202, 203 (the state is none).
 */
int32_t moistair_property(const moistair_state *state,
                          int32_t property,
                          double *value,
                          moistair_error *error);

/*
 Several properties of a state at once, cheaper than one by one.

 state: a state; mask: which properties, the bit 1 << selector for each; values: output, each property at the place of its selector in its
 unit, NaN where it has no value; places not asked for are left alone; have: output, the bits of mask that have a value, may be null;
 error: may be null.
 Returns 0 (also when a property has no value), 101, 102 (a bit that is no property), 103, 201, 202, 203 (the state is none).
 */
int32_t moistair_properties(const moistair_state *state,
                            uint64_t mask,
                            double *values,
                            uint64_t *have,
                            moistair_error *error);

/*
 Properties of many states at once: row by row the same results, bit for bit, as the calls for one state. A bad row costs only itself.

 rows: number of rows, 0 allowed; dry_bulb: [°C]; property: selector of the second property; second: its values; pressure: [Pa]; formulation: of
 all rows; mask: which properties, the bit 1 << selector for each; outputs: array with the output column of each property at the place
 of its selector (places not in mask are not read), each with room for rows doubles, NaN where there is no value; status: room for the
 status of each row, may be null; report: output, may be null; error: the detail of the first row that failed, may be null.
 Columns to be written may not overlap with any other memory of the call.
 Returns 0 when every row is good, else the status of the first row that is not (2xx, 3xx; all outputs are written then as well); 101, 102,
 103, 104, 105 when an argument is wrong (nothing is written).
 */
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

#ifdef __cplusplus
}  // extern "C"
#endif  // __cplusplus

#endif  /* MOISTAIR_H */
