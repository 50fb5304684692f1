/*
 * A day of an air handler and its cooling tower from a log of one-minute readings: states, loads, water, what coil and
 * tower should have done, and how far all of it can be trusted. It prints the same bytes as moistair-core/examples/plant_day.rs.
 *
 *     cargo build --release -p moistair-ffi
 *     gcc -std=c99 -I moistair-ffi/include moistair-ffi/examples/plant_day.c target/release/libmoistair.a -o plant_day
 *     ./plant_day moistair-core/examples/plant_day.csv
 *
 * The program reads, calls the library, and prints. It needs no heap.
 */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "moistair.h"

/* ---- What is known of the plant ---- */

static const char default_log[] = "moistair-core/examples/plant_day.csv";
/* Times in s. */
static const double interval = 60.0, longest_step = 90.0, hour_length = 3600.0, day_length = 86400.0;
/* Humidity ratios before and behind the coil that differ by less make no condensate, kg/kg. */
static const double dead_band = 0.0003;
/* Steam comes saturated at about atmospheric pressure, °C. */
static const double steam_temperature = 100.0;
static const moistair_water_treatment treatment = {0.0001, 4.0};
/* At this elevation, Pa. */
static const double site_pressure = 98500.0;
/* The coil on the day when it was handed over: what entered it, and how cold the air left. °C, kg/s. */
static const struct {
    double air, humidity, supply, leaving_air;
    moistair_coil_flows flows;
} commissioning = {27.0, 0.5, 7.0, 11.1, {5.8, 6.0}};
/* Conductance of the water side of the coil over that of its air side, from its data sheet. */
static const double conductance_ratio = 2.2;
static const moistair_flow_exponents flow_exponents = {0.6, 0.8};
/* The fill of the tower as its maker tested it, evaluated by Merkel's method: Merkel number at L/G = 1, and exponent. */
static const moistair_fill_law fill = {1.12, 0.6};
/* Standard uncertainties of thermometers, K, hygrometers, and flows of dry air, kg/s. */
static const double thermometer = 0.2, hygrometer = 0.01, air_flow = 0.05;
/* That of a share of outdoor air up to which it says something. */
static const double acceptable = 0.05;
/* What the coil is to make of any air, °C and relative humidity. */
static const double off_coil_celsius = 10.0, off_coil_humidity = 0.97;
/* The moisture of the rooms comes from people, as vapor of this temperature, °C. */
static const double people = 32.0;

/* The columns of the log after the time. */
enum channel {
    PRESSURE, OUTDOOR, OUTDOOR_RH, MIXED, MIXED_RH, COIL, COIL_RH, HEATER, SUPPLY, SUPPLY_RH, RETURN, RETURN_RH,
    SUPPLY_FLOW, OUTDOOR_FLOW, VALVE, STEAM, TOWER_WATER, TOWER_HOT, TOWER_COLD, TOWER_AIR,
    CHILLED_WATER, CHILLED_SUPPLY, CHILLED_RETURN,
    CHANNELS
};

/* What is added up over the hours and the day. */
enum rate {
    R_PRESSURE,
    R_OUTDOOR, R_OUTDOOR_RH, R_OUTDOOR_RATIO, R_OUTDOOR_ENTHALPY,
    R_SUPPLY, R_SUPPLY_RH, R_SUPPLY_RATIO, R_SUPPLY_ENTHALPY,
    R_RETURN, R_RETURN_RH, R_RETURN_RATIO, R_RETURN_ENTHALPY,
    R_MIXED, R_MIXED_RATIO, R_COIL, R_COIL_RATIO, R_SUPPLY_AIR, R_OUTDOOR_AIR, R_VALVE,
    R_SENSIBLE, R_LATENT, R_COOLING, R_CONDENSATE, R_HEATING, R_REHEAT, R_STEAM,
    R_TOWER_WATER, R_REJECTED, R_RANGE, R_APPROACH, R_EVAPORATION, R_DRIFT, R_BLOWDOWN, R_MAKE_UP,
    R_CHILLED_WATER, R_CHILLED_SUPPLY, R_CHILLED_RETURN, R_LOAD_BY_WATER, R_AIR_LESS_WATER,
    R_PREDICTED_LOAD, R_PREDICTED_COIL, R_PREDICTED_COIL_RATIO,
    R_SHARE_BY_FLOWS, R_SHARE_BY_TEMPERATURES, R_OUTDOOR_CHEAPER, R_ROOM_SENSIBLE, R_ROOM_MOISTURE,
    R_WATER_TO_AIR, R_MERKEL_NUMBER, R_MERKEL_NUMBER_BY_LAW, R_COLD_WATER, R_PREDICTED_COLD_WATER,
    RATES
};

/* The processes whose books are kept. */
enum process {
    P_MIXING, P_COIL, P_HEATER, P_HUMIDIFIER, P_TOWER, P_PREDICTED_COIL, P_PREDICTED_TOWER,
    PROCESSES
};

static const char *const process_names[PROCESSES] = {"mixing",        "cooling coil",    "fan and heater",  "humidifier",
                                                     "cooling tower", "coil, predicted", "tower, predicted"};

/* Where a measured value stands beside a computed one. */
enum check {
    C_MIXED, C_MIXED_RATIO, C_SUPPLY, C_SUPPLY_RATIO, C_COIL, C_COIL_RATIO, C_COIL_LOAD, C_MERKEL_NUMBER, C_COLD_WATER,
    CHECKS
};

/* A difference in °C is one in K. */
static const struct {
    const char *name, *unit;
    int32_t core;
} check_names[CHECKS] = {
    {"mixed air, dry bulb", "K", MOISTAIR_UNIT_CELSIUS},
    {"mixed air, humidity ratio", "g/kg", MOISTAIR_UNIT_GRAM_PER_KILOGRAM},
    {"supply air, dry bulb", "K", MOISTAIR_UNIT_CELSIUS},
    {"supply air, humidity ratio", "g/kg", MOISTAIR_UNIT_GRAM_PER_KILOGRAM},
    {"off coil, dry bulb", "K", MOISTAIR_UNIT_CELSIUS},
    {"off coil, humidity ratio", "g/kg", MOISTAIR_UNIT_GRAM_PER_KILOGRAM},
    {"coil load", "kW", MOISTAIR_UNIT_KILOWATT},
    {"tower, Merkel number", "1", MOISTAIR_UNIT_FRACTION},
    {"tower, cold water", "K", MOISTAIR_UNIT_CELSIUS},
};

/* Name and limits of each column, the limits in the unit of the library. */
struct column {
    const char *name;
    int32_t kind, unit;
    double min, max, hold;
};

static const struct column columns[CHANNELS] = {
    {"barometer", MOISTAIR_KIND_PRESSURE, MOISTAIR_UNIT_HECTOPASCAL, 93000.0, 104000.0, 3600.0},
    {"outdoor air", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, -25.0, 45.0, 300.0},
    {"outdoor air", MOISTAIR_KIND_RELATIVE_HUMIDITY, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 300.0},
    {"mixed air", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 45.0, 300.0},
    {"mixed air", MOISTAIR_KIND_RELATIVE_HUMIDITY, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 300.0},
    {"air off the coil", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 45.0, 300.0},
    {"air off the coil", MOISTAIR_KIND_RELATIVE_HUMIDITY, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 300.0},
    {"air off the heater", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 60.0, 300.0},
    {"supply air", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 60.0, 300.0},
    {"supply air", MOISTAIR_KIND_RELATIVE_HUMIDITY, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 300.0},
    {"return air", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 45.0, 300.0},
    {"return air", MOISTAIR_KIND_RELATIVE_HUMIDITY, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 300.0},
    {"supply air", MOISTAIR_KIND_VOLUME_FLOW, MOISTAIR_UNIT_CUBIC_METER_PER_HOUR, 0.0, 8.0, 0.0},
    {"outdoor air", MOISTAIR_KIND_VOLUME_FLOW, MOISTAIR_UNIT_CUBIC_METER_PER_HOUR, 0.0, 4.0, 0.0},
    {"coil valve", MOISTAIR_KIND_FRACTION, MOISTAIR_UNIT_PERCENT, 0.0, 1.0, 0.0},
    {"steam", MOISTAIR_KIND_MASS_FLOW, MOISTAIR_UNIT_KILOGRAM_PER_HOUR, 0.0, 0.03, 0.0},
    {"tower water", MOISTAIR_KIND_MASS_FLOW, MOISTAIR_UNIT_KILOGRAM_PER_SECOND, 0.0, 12.0, 0.0},
    {"tower water, hot", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 60.0, 300.0},
    {"tower water, cold", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 60.0, 300.0},
    {"tower air", MOISTAIR_KIND_VOLUME_FLOW, MOISTAIR_UNIT_CUBIC_METER_PER_HOUR, 0.0, 12.0, 0.0},
    {"chilled water", MOISTAIR_KIND_MASS_FLOW, MOISTAIR_UNIT_KILOGRAM_PER_SECOND, 0.0, 12.0, 0.0},
    {"chilled water supply", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 40.0, 300.0},
    {"chilled water return", MOISTAIR_KIND_TEMPERATURE, MOISTAIR_UNIT_CELSIUS, 0.0, 40.0, 300.0},
};

static int set_up(int i, moistair_channel *channel)
{
    const struct column *column = &columns[i];
    int32_t status = moistair_channel_new(column->kind, column->unit, column->min, column->max, channel, NULL);
    channel->interval = interval;
    channel->hold = column->hold;
    if (column->kind == MOISTAIR_KIND_RELATIVE_HUMIDITY) {
        /* Below the last digit of the log, so that any change counts; a living humidity moves within half an hour. */
        channel->resolution = 0.0004;
        channel->stuck_samples = 30;
    }
    if (i == VALVE)
        channel->slip_samples = 0;
    return status == MOISTAIR_OK;
}

/* The channels that a result rests on, ended by CHANNELS: it can be trusted as far as the worst of them. */
static const int outdoor_state[] = {PRESSURE, OUTDOOR, OUTDOOR_RH, CHANNELS};
static const int supply_state[] = {PRESSURE, SUPPLY, SUPPLY_RH, CHANNELS};
static const int return_state[] = {PRESSURE, RETURN, RETURN_RH, CHANNELS};
static const int mixed_state[] = {PRESSURE, MIXED, MIXED_RH, CHANNELS};
static const int coil_state[] = {PRESSURE, COIL, COIL_RH, CHANNELS};
static const int outdoor_stream[] = {PRESSURE, OUTDOOR, OUTDOOR_RH, OUTDOOR_FLOW, CHANNELS};
static const int supply_stream[] = {PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, CHANNELS};
static const int on_coil[] = {PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH, CHANNELS};
static const int on_heater[] = {PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH, HEATER,
                                CHANNELS};
static const int on_reheat[] = {PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, MIXED, MIXED_RH, COIL, COIL_RH, HEATER,
                                VALVE, CHANNELS};
static const int on_tower[] = {PRESSURE, OUTDOOR, OUTDOOR_RH, TOWER_WATER, TOWER_HOT, TOWER_COLD, TOWER_AIR, CHANNELS};
static const int air_flows[] = {PRESSURE, OUTDOOR, OUTDOOR_RH, OUTDOOR_FLOW, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, CHANNELS};
static const int dry_bulbs[] = {OUTDOOR, RETURN, MIXED, CHANNELS};
static const int on_economizer[] = {OUTDOOR, OUTDOOR_RH, RETURN, RETURN_RH, CHILLED_WATER, CHANNELS};
static const int on_rooms[] = {PRESSURE, SUPPLY, SUPPLY_RH, SUPPLY_FLOW, RETURN, RETURN_RH, CHANNELS};
static const int tower_inlets[] = {PRESSURE, OUTDOOR, OUTDOOR_RH, TOWER_WATER, TOWER_HOT, TOWER_AIR, CHANNELS};
static const int coil_inlets[] = {PRESSURE, SUPPLY,   SUPPLY_RH,     SUPPLY_FLOW,    MIXED,
                                  MIXED_RH, CHILLED_WATER, CHILLED_SUPPLY, CHANNELS};
static const int coil_sides[] = {PRESSURE, SUPPLY,  SUPPLY_RH,     SUPPLY_FLOW,    MIXED,          MIXED_RH,
                                 COIL,     COIL_RH, CHILLED_WATER, CHILLED_SUPPLY, CHILLED_RETURN, CHANNELS};

/* ---- The equipment ---- */

/* What the coil should be able to do. */
static moistair_coil_surface surface;

/* When outdoor air would cost it less than return air, and what that rests on. */
static moistair_economizer economizer;
static moistair_economizer_state economizer_state;

/* 0 if the settings make no sense. */
static int describe_economizer(void)
{
    moistair_basis basis = {0.0, MOISTAIR_REAL_GAS, 0};
    int32_t status;
    basis.pressure = site_pressure;
    status = moistair_economizer_new(MOISTAIR_ECONOMIZER_RULE_LEAST_COIL_ENERGY, basis, &economizer, NULL);
    economizer.supply_dry_bulb = off_coil_celsius;
    economizer.supply_coil_leaving = off_coil_humidity;
    return status == MOISTAIR_OK && moistair_economizer_check(&economizer, NULL) == MOISTAIR_OK;
}

/* Finds the coil in the point at which it was handed over; 0 if that fails. */
static int describe_coil(void)
{
    moistair_basis basis = {0.0, MOISTAIR_REAL_GAS, 0};
    moistair_state air;
    moistair_stream entering;
    moistair_coil_water water = {0.0, 0.0, 0.0};
    basis.pressure = site_pressure;
    water.flow = commissioning.flows.water;
    water.entering = commissioning.supply;
    return moistair_from_dry_bulb(commissioning.air, MOISTAIR_RELATIVE_HUMIDITY, commissioning.humidity, basis, &air,
                                  NULL) == MOISTAIR_OK &&
           moistair_stream_from_mass_flow(&air, commissioning.flows.air, &entering, NULL) == MOISTAIR_OK &&
           moistair_coil_surface_from_rating(&entering, &water, MOISTAIR_MEASURED_LEAVING_AIR, commissioning.leaving_air,
                                             conductance_ratio, MOISTAIR_COUNTERFLOW, &surface, NULL) == MOISTAIR_OK;
}

/* ---- One row of the log ---- */

/* How well the books close, and how far measured and computed states lie apart. Zero at first. */
struct checks {
    moistair_books_total books[PROCESSES];
    moistair_deviation deviations[CHECKS];
};

static void merge_checks(struct checks *checks, const struct checks *other)
{
    int i;
    for (i = 0; i < PROCESSES; i++)
        moistair_books_total_merge(&checks->books[i], &other->books[i], NULL);
    for (i = 0; i < CHECKS; i++)
        moistair_deviation_merge(&checks->deviations[i], &other->deviations[i], NULL);
}

/* Results that there may be none of. */
struct state {
    int known;
    moistair_state air;
};

struct stream {
    int known;
    moistair_stream air;
};

/* The plant at one moment: checked readings, and the rates that come of them, NaN where there is none. */
struct moment {
    moistair_checked readings[CHANNELS];
    double rates[RATES];
    int32_t qualities[RATES];
    struct checks checks;
};

static double value(const struct moment *moment, int channel)
{
    return moment->readings[channel].value;
}

static void set(struct moment *moment, int rate, double value, const int *channels)
{
    int32_t worst = MOISTAIR_QUALITY_GOOD;
    for (; *channels != CHANNELS; channels++) {
        int32_t quality = moment->readings[*channels].quality;
        worst = quality > worst ? quality : worst;
    }
    moment->rates[rate] = value;
    moment->qualities[rate] = worst;
}

static moistair_wet_stream wet(const moistair_stream *stream)
{
    moistair_wet_stream wet;
    memset(&wet, 0, sizeof wet);
    wet.mixture.air = stream->air;
    wet.dry_air_flow = stream->dry_air_flow;
    return wet;
}

/* Counts a process without a result. */
static void missing(struct moment *moment, int process)
{
    moistair_books none = {0};
    none.heat_residual = none.water_residual = NAN;
    moistair_books_total_record(&moment->checks.books[process], &none, NULL);
}

/* Adds the books of a process. */
static void record(struct moment *moment, int process, const moistair_wet_stream *entering, size_t count,
                   const moistair_wet_stream *leaving, const moistair_exchange *exchange)
{
    moistair_books books;
    if (moistair_books_balance(entering, count, leaving, exchange, &books, NULL) == MOISTAIR_OK)
        moistair_books_total_record(&moment->checks.books[process], &books, NULL);
    else
        missing(moment, process);
}

/* Adds a measured state beside a computed one, dry bulb and humidity ratio. */
static void compare(struct moment *moment, int dry_bulb, int ratio, const struct state *measured,
                    const moistair_state *computed)
{
    moistair_deviation *deviations = moment->checks.deviations;
    if (!measured->known)
        return;
    moistair_deviation_add(&deviations[dry_bulb], measured->air.dry_bulb, computed->dry_bulb, NULL);
    moistair_deviation_add(&deviations[ratio], measured->air.humidity_ratio, computed->humidity_ratio, NULL);
}

/* A state of two sensors and the barometer, with the rates that it gives. */
static struct state read_state(struct moment *moment, int dry_bulb, int humidity, int ratio, int enthalpy,
                               const int *channels)
{
    struct state state;
    moistair_basis basis = {0.0, MOISTAIR_REAL_GAS, 0};
    basis.pressure = value(moment, PRESSURE);
    state.known = moistair_from_dry_bulb(value(moment, dry_bulb), MOISTAIR_RELATIVE_HUMIDITY_OVER_LIQUID,
                                         value(moment, humidity), basis, &state.air, NULL) == MOISTAIR_OK;
    if (state.known) {
        set(moment, ratio, state.air.humidity_ratio, channels);
        if (enthalpy != RATES)
            set(moment, enthalpy, state.air.specific_enthalpy, channels);
    }
    return state;
}

/* The stream of air whose volume flow is measured. */
static struct stream read_stream(const struct moment *moment, const struct state *state, int flow)
{
    struct stream stream;
    stream.known = state->known && moistair_stream_from_volume_flow(&state->air, value(moment, flow), &stream.air,
                                                                    NULL) == MOISTAIR_OK;
    return stream;
}

/* Outdoor and recirculated air as the flows say, beside the state measured behind the mixing box. */
static void mix(struct moment *moment, const struct stream *outdoor, const struct state *room,
                const struct stream *supply, const struct state *measured)
{
    moistair_stream recirculated;
    moistair_wet_stream entering[2], mixed;
    const moistair_exchange none = {0.0, 0.0, 0.0};
    int known = outdoor->known && room->known && supply->known &&
                moistair_mixing_remainder(supply->air.dry_air_flow, &outdoor->air, &room->air, &recirculated, NULL) ==
                    MOISTAIR_OK;
    if (known) {
        entering[0] = wet(&outdoor->air);
        entering[1] = wet(&recirculated);
        known = moistair_mixing_adiabatic(entering, 2, &mixed, NULL) == MOISTAIR_OK;
    }
    if (!known) {
        missing(moment, P_MIXING);
        return;
    }
    record(moment, P_MIXING, entering, 2, &mixed, &none);
    compare(moment, C_MIXED, C_MIXED_RATIO, measured, &mixed.mixture.air);
}

static moistair_reading reading(const struct moment *moment, int channel, double uncertainty)
{
    moistair_reading reading = {0.0, 0.0, 0, 0};
    reading.value = value(moment, channel);
    reading.standard_uncertainty = uncertainty;
    reading.quality = moment->readings[channel].quality;
    return reading;
}

static moistair_reading flow_reading(const struct stream *stream)
{
    moistair_reading reading = {0.0, 0.0, MOISTAIR_QUALITY_GOOD, 0};
    reading.value = stream->air.dry_air_flow;
    reading.standard_uncertainty = air_flow;
    return reading;
}

/* The share of outdoor air in the supply air, by flows and by temperatures, where they are sure enough. */
static void compare_outdoor_air(struct moment *moment, const struct stream *outdoor, const struct stream *supply)
{
    moistair_outdoor_air_fraction found;
    moistair_reading part = flow_reading(outdoor), whole = flow_reading(supply);
    moistair_reading outside = reading(moment, OUTDOOR, thermometer), back = reading(moment, RETURN, thermometer);
    moistair_reading mixed = reading(moment, MIXED, thermometer);
    if (outdoor->known && supply->known &&
        moistair_outdoor_air_from_flows(&part, &whole, MOISTAIR_FLOW_TOTAL, acceptable, &found, NULL) == MOISTAIR_OK &&
        found.status == MOISTAIR_FRACTION_DETERMINED)
        set(moment, R_SHARE_BY_FLOWS, found.fraction, air_flows);
    if (moistair_outdoor_air_from_readings(MOISTAIR_DRY_BULB, &outside, &back, &mixed, acceptable, &found, NULL) ==
            MOISTAIR_OK &&
        found.status == MOISTAIR_FRACTION_DETERMINED)
        set(moment, R_SHARE_BY_TEMPERATURES, found.fraction, dry_bulbs);
}

static moistair_measured_air measured_air(const struct moment *moment, int dry_bulb, int humidity)
{
    moistair_measured_air air;
    memset(&air, 0, sizeof air);
    air.dry_bulb = reading(moment, dry_bulb, thermometer);
    air.humidity = reading(moment, humidity, hygrometer);
    air.humidity_quantity = MOISTAIR_RELATIVE_HUMIDITY;
    return air;
}

/* Whether the coil, while it works, would have had less to do with outdoor air than with return air: 1 or 0. */
static void decide(struct moment *moment, double time)
{
    moistair_decision decision;
    moistair_measured_air outdoor = measured_air(moment, OUTDOOR, OUTDOOR_RH);
    moistair_measured_air returned = measured_air(moment, RETURN, RETURN_RH);
    double flow = value(moment, CHILLED_WATER);
    if (moistair_economizer_decide(&economizer, &economizer_state, time, &outdoor, &returned, &decision, NULL) ==
            MOISTAIR_OK &&
        decision.quality != MOISTAIR_QUALITY_REFUSED && !isnan(flow))
        set(moment, R_OUTDOOR_CHEAPER, decision.enabled && flow > 0.0 ? 1.0 : 0.0, on_economizer);
}

/* What the rooms, and all that stores heat and water in them, give to the air. */
static void gain(struct moment *moment, const struct stream *supply, const struct state *room)
{
    moistair_room_gains gains;
    if (supply->known && room->known &&
        moistair_room_gains_between(&supply->air, &room->air, MOISTAIR_SOURCE_SATURATED_VAPOR, people, &gains, NULL) ==
            MOISTAIR_OK) {
        set(moment, R_ROOM_SENSIBLE, gains.sensible, on_rooms);
        set(moment, R_ROOM_MOISTURE, gains.moisture, on_rooms);
    }
}

/* The cooling coil between the two measured states. */
static struct stream cool(struct moment *moment, const struct state *mixed, const struct stream *supply,
                          const struct state *off_coil)
{
    struct stream leaving = {0};
    moistair_stream entering;
    moistair_wet_stream before, behind;
    moistair_cooling coil;
    leaving.known = mixed->known && supply->known && off_coil->known &&
                    moistair_stream_from_mass_flow(&mixed->air, supply->air.dry_air_flow, &entering, NULL) ==
                        MOISTAIR_OK &&
                    moistair_coil_between(&entering, &off_coil->air, MOISTAIR_CONDENSATE_AT_LEAVING_AIR, 0.0, dead_band,
                                          &coil, NULL) == MOISTAIR_OK;
    if (!leaving.known) {
        missing(moment, P_COIL);
        return leaving;
    }
    before = wet(&coil.entering);
    behind = wet(&coil.leaving);
    record(moment, P_COIL, &before, 1, &behind, &coil.exchange);
    set(moment, R_SENSIBLE, coil.sensible, on_coil);
    set(moment, R_LATENT, coil.latent, on_coil);
    set(moment, R_COOLING, coil.cooling_load, on_coil);
    set(moment, R_CONDENSATE, coil.condensate, on_coil);
    leaving.air = coil.leaving;
    return leaving;
}

/* Fan and heater, up to the temperature measured behind them. Heat counts as reheat while the valve is open. */
static struct stream heat(struct moment *moment, const struct stream *entering)
{
    struct stream leaving = {0};
    moistair_wet_stream before, behind;
    moistair_sensible heating;
    double valve = value(moment, VALVE);
    leaving.known = entering->known && moistair_sensible_to_temperature(&entering->air, value(moment, HEATER),
                                                                        &heating, NULL) == MOISTAIR_OK;
    if (!leaving.known) {
        missing(moment, P_HEATER);
        return leaving;
    }
    before = wet(&entering->air);
    behind = wet(&heating.leaving);
    record(moment, P_HEATER, &before, 1, &behind, &heating.exchange);
    set(moment, R_HEATING, heating.exchange.heat, on_heater);
    if (!isnan(valve))
        set(moment, R_REHEAT, valve > 0.0 ? heating.exchange.heat : 0.0, on_reheat);
    leaving.air = heating.leaving;
    return leaving;
}

/* The metered steam, beside the state measured in the supply air. */
static void humidify(struct moment *moment, const struct stream *entering, const struct state *measured)
{
    double enthalpy;
    moistair_wet_stream before;
    moistair_humidified humidified;
    if (!(entering->known && moistair_saturated_steam_enthalpy(steam_temperature, &enthalpy, NULL) == MOISTAIR_OK &&
          moistair_humidify_steam(&entering->air, value(moment, STEAM), enthalpy, &humidified, NULL) ==
              MOISTAIR_OK)) {
        missing(moment, P_HUMIDIFIER);
        return;
    }
    before = wet(&entering->air);
    record(moment, P_HUMIDIFIER, &before, 1, &humidified.leaving, &humidified.exchange);
    compare(moment, C_SUPPLY, C_SUPPLY_RATIO, measured, &humidified.leaving.mixture.air);
}

/* The cooling tower on outdoor air. */
static void reject(struct moment *moment, const struct state *outdoor)
{
    struct stream entering = read_stream(moment, outdoor, TOWER_AIR);
    moistair_wet_stream before, behind;
    moistair_tower_balance tower;
    moistair_tower_water water;
    water.flow = value(moment, TOWER_WATER);
    water.hot = value(moment, TOWER_HOT);
    water.cold = value(moment, TOWER_COLD);
    if (!(entering.known &&
          moistair_tower_with_air_flow(&entering.air, water, treatment, &tower, NULL) == MOISTAIR_OK)) {
        missing(moment, P_TOWER);
        return;
    }
    before = wet(&entering.air);
    behind = wet(&tower.leaving);
    record(moment, P_TOWER, &before, 1, &behind, &tower.exchange);
    set(moment, R_REJECTED, tower.heat_rejected, on_tower);
    set(moment, R_EVAPORATION, tower.water.evaporation, on_tower);
    set(moment, R_DRIFT, tower.water.drift, on_tower);
    set(moment, R_BLOWDOWN, tower.water.blowdown, on_tower);
    set(moment, R_MAKE_UP, tower.water.make_up, on_tower);
    if (water.flow > 0.0) {
        set(moment, R_RANGE, tower.range, on_tower);
        set(moment, R_APPROACH, tower.approach, on_tower);
    }
}

/* The load of the coil by its water, beside that by its air. */
static void meter_the_water(struct moment *moment, const struct stream *entering)
{
    static const int supply[] = {CHILLED_SUPPLY, CHANNELS}, back[] = {CHILLED_RETURN, CHANNELS};
    moistair_coil_water water = {0.0, 0.0, 0.0};
    moistair_load_by_water found;
    double leaving = value(moment, CHILLED_RETURN);
    water.flow = value(moment, CHILLED_WATER);
    water.entering = value(moment, CHILLED_SUPPLY);
    if (water.flow > 0.0) {
        set(moment, R_CHILLED_SUPPLY, water.entering, supply);
        set(moment, R_CHILLED_RETURN, leaving, back);
    }
    if (entering->known && moistair_coil_load_by_water(&entering->air, moment->rates[R_COOLING], &water, leaving,
                                                       &found, NULL) == MOISTAIR_OK) {
        set(moment, R_LOAD_BY_WATER, found.load, coil_sides);
        set(moment, R_AIR_LESS_WATER, found.air_less_water, coil_sides);
    }
}

/* What the coil should do with the air and the water that enter it, beside what it does. */
static void predict_coil(struct moment *moment, const struct stream *entering, const struct state *measured)
{
    moistair_coil_water water = {0.0, 0.0, 0.0};
    moistair_coil_flows flows;
    moistair_coil_surface now;
    moistair_water_coil coil;
    moistair_wet_stream before, behind;
    water.flow = value(moment, CHILLED_WATER);
    water.entering = value(moment, CHILLED_SUPPLY);
    flows.air = entering->known ? entering->air.dry_air_flow : NAN;
    flows.water = water.flow;
    if (!(entering->known &&
          moistair_coil_surface_at_flows(&surface, commissioning.flows, flows, flow_exponents, &now, NULL) ==
              MOISTAIR_OK &&
          moistair_coil_with_water(&entering->air, &now, &water, MOISTAIR_CONDENSATE_AT_LEAVING_AIR, 0.0, &coil,
                                   NULL) == MOISTAIR_OK)) {
        missing(moment, P_PREDICTED_COIL);
        return;
    }
    before = wet(&entering->air);
    behind = wet(&coil.air.leaving);
    record(moment, P_PREDICTED_COIL, &before, 1, &behind, &coil.air.exchange);
    set(moment, R_PREDICTED_LOAD, coil.air.cooling_load, coil_inlets);
    if (water.flow > 0.0) {
        const moistair_state *air = &coil.air.leaving.air;
        set(moment, R_PREDICTED_COIL, air->dry_bulb, coil_inlets);
        set(moment, R_PREDICTED_COIL_RATIO, air->humidity_ratio, coil_inlets);
        compare(moment, C_COIL, C_COIL_RATIO, measured, air);
        moistair_deviation_add(&moment->checks.deviations[C_COIL_LOAD], moment->rates[R_COOLING],
                               coil.air.cooling_load, NULL);
    }
}

/* What the tower should do with the air and the water that enter it, beside what it does; nothing while it rests. */
static void predict_tower(struct moment *moment, const struct state *outdoor)
{
    static const int on_cold_water[] = {TOWER_COLD, CHANNELS};
    struct stream entering = read_stream(moment, outdoor, TOWER_AIR);
    moistair_deviation *deviations = moment->checks.deviations;
    double water_to_air, number, cold = value(moment, TOWER_COLD);
    moistair_hot_water water;
    moistair_tower_rating rated;
    moistair_tower_balance tower;
    moistair_wet_stream before, behind;
    moistair_tower_water done;
    moistair_merkel_number found;
    water.flow = value(moment, TOWER_WATER);
    water.temperature = value(moment, TOWER_HOT);
    if (!(entering.known &&
          moistair_tower_water_to_air(&entering.air, water.flow, &water_to_air, NULL) == MOISTAIR_OK &&
          moistair_tower_fill_number(fill, water_to_air, &number, NULL) == MOISTAIR_OK &&
          moistair_tower_merkel_rate(&entering.air, water, number, &rated, NULL) == MOISTAIR_OK &&
          moistair_tower_with_air_flow(&entering.air, rated.water, treatment, &tower, NULL) == MOISTAIR_OK)) {
        missing(moment, P_PREDICTED_TOWER);
        return;
    }
    before = wet(&entering.air);
    behind = wet(&tower.leaving);
    record(moment, P_PREDICTED_TOWER, &before, 1, &behind, &tower.exchange);
    set(moment, R_WATER_TO_AIR, water_to_air, tower_inlets);
    set(moment, R_MERKEL_NUMBER_BY_LAW, number, tower_inlets);
    set(moment, R_PREDICTED_COLD_WATER, rated.water.cold, tower_inlets);
    if (isnan(cold))
        return;
    set(moment, R_COLD_WATER, cold, on_cold_water);
    moistair_deviation_add(&deviations[C_COLD_WATER], cold, rated.water.cold, NULL);
    done = rated.water;
    done.cold = cold;
    if (moistair_tower_merkel_number(&entering.air, done, MOISTAIR_QUADRATURE_GAUSS_LEGENDRE, &found, NULL) ==
        MOISTAIR_OK) {
        set(moment, R_MERKEL_NUMBER, found.number, on_tower);
        moistair_deviation_add(&deviations[C_MERKEL_NUMBER], found.number, number, NULL);
    }
}

static void copy_readings(struct moment *moment)
{
    static const int pairs[][2] = {
        {R_PRESSURE, PRESSURE}, {R_OUTDOOR, OUTDOOR},     {R_OUTDOOR_RH, OUTDOOR_RH}, {R_SUPPLY, SUPPLY},
        {R_SUPPLY_RH, SUPPLY_RH}, {R_RETURN, RETURN},     {R_RETURN_RH, RETURN_RH},   {R_MIXED, MIXED},
        {R_COIL, COIL},         {R_VALVE, VALVE},         {R_STEAM, STEAM},           {R_TOWER_WATER, TOWER_WATER},
        {R_CHILLED_WATER, CHILLED_WATER},
    };
    size_t i;
    for (i = 0; i < sizeof pairs / sizeof pairs[0]; i++) {
        int channels[] = {CHANNELS, CHANNELS};
        channels[0] = pairs[i][1];
        set(moment, pairs[i][0], value(moment, channels[0]), channels);
    }
}

static void evaluate(struct moment *moment, double time)
{
    struct state outdoor, supply, room, mixed, off_coil;
    struct stream outdoor_air, supply_air, on_the_coil, cooled, heated;
    int i;
    memset(&moment->checks, 0, sizeof moment->checks);
    for (i = 0; i < RATES; i++) {
        moment->rates[i] = NAN;
        moment->qualities[i] = MOISTAIR_QUALITY_REFUSED;
    }
    copy_readings(moment);
    outdoor = read_state(moment, OUTDOOR, OUTDOOR_RH, R_OUTDOOR_RATIO, R_OUTDOOR_ENTHALPY, outdoor_state);
    supply = read_state(moment, SUPPLY, SUPPLY_RH, R_SUPPLY_RATIO, R_SUPPLY_ENTHALPY, supply_state);
    room = read_state(moment, RETURN, RETURN_RH, R_RETURN_RATIO, R_RETURN_ENTHALPY, return_state);
    mixed = read_state(moment, MIXED, MIXED_RH, R_MIXED_RATIO, RATES, mixed_state);
    off_coil = read_state(moment, COIL, COIL_RH, R_COIL_RATIO, RATES, coil_state);
    outdoor_air = read_stream(moment, &outdoor, OUTDOOR_FLOW);
    supply_air = read_stream(moment, &supply, SUPPLY_FLOW);
    if (outdoor_air.known)
        set(moment, R_OUTDOOR_AIR, outdoor_air.air.dry_air_flow, outdoor_stream);
    if (supply_air.known)
        set(moment, R_SUPPLY_AIR, supply_air.air.dry_air_flow, supply_stream);
    compare_outdoor_air(moment, &outdoor_air, &supply_air);
    decide(moment, time);
    gain(moment, &supply_air, &room);
    mix(moment, &outdoor_air, &room, &supply_air, &mixed);
    cooled = cool(moment, &mixed, &supply_air, &off_coil);
    on_the_coil.known = mixed.known && supply_air.known &&
                        moistair_stream_from_mass_flow(&mixed.air, supply_air.air.dry_air_flow, &on_the_coil.air,
                                                       NULL) == MOISTAIR_OK;
    meter_the_water(moment, &on_the_coil);
    predict_coil(moment, &on_the_coil, &off_coil);
    heated = heat(moment, &cooled);
    humidify(moment, &heated, &supply);
    reject(moment, &outdoor);
    predict_tower(moment, &outdoor);
}

/* ---- The log ---- */

/* An hour, or the day. */
struct span {
    double start, length;
    moistair_total totals[RATES];
    struct checks checks;
};

enum { MOST_HOURS = 48, LONGEST_LINE = 1024 };

/* What the log holds. */
static struct {
    unsigned rows, not_in_time, unreadable;
    /* One for every row: what the rows cover. */
    moistair_total log;
    moistair_counts counts[CHANNELS];
    int hours;
    struct span hour[MOST_HOURS], day;
} summary;

/* A field that is no number is a missing reading. */
static double number(const char *field)
{
    char *end;
    double number = strtod(field, &end);
    return end != field && *end == '\0' ? number : NAN;
}

/* The time and the readings of a line; 0 if it is no row. */
static int parse(char *line, double fields[1 + CHANNELS])
{
    char *field = line;
    int count = 0, last;
    line[strcspn(line, "\r\n")] = '\0';
    for (;; line++) {
        if (*line != ',' && *line != '\0')
            continue;
        last = *line == '\0';
        *line = '\0';
        if (count > CHANNELS)
            return 0;
        fields[count] = number(field);
        count++;
        if (last)
            return count > CHANNELS;
        field = line;
        field++;
    }
}

/* Puts an hour away; 0 if there is no room for it. */
static int close_hour(const moistair_period periods[RATES], const struct checks *checks)
{
    int i;
    struct span *hour = &summary.hour[summary.hours];
    if (summary.hours == MOST_HOURS)
        return 0;
    hour->start = periods[0].start;
    hour->length = hour_length;
    for (i = 0; i < RATES; i++)
        hour->totals[i] = periods[i].total;
    hour->checks = *checks;
    summary.hours++;
    return 1;
}

static int read_log(FILE *file)
{
    static moistair_channel channels[CHANNELS];
    static moistair_channel_state states[CHANNELS];
    static moistair_periods periods[RATES];
    static moistair_period finished[RATES];
    static struct checks checks;
    static struct moment moment;
    char line[LONGEST_LINE];
    double fields[1 + CHANNELS];
    int32_t added, done = 0;
    int i, fine = 1;

    for (i = 0; i < CHANNELS; i++)
        fine = fine && set_up(i, &channels[i]);
    moistair_total_new(MOISTAIR_RULE_STEP, longest_step, &summary.log, NULL);
    summary.day.length = day_length;
    for (i = 0; i < RATES; i++) {
        moistair_periods_new(hour_length, MOISTAIR_RULE_STEP, longest_step, &periods[i], NULL);
        moistair_total_new(MOISTAIR_RULE_STEP, longest_step, &summary.day.totals[i], NULL);
    }
    fine = fine && fgets(line, sizeof line, file) != NULL;
    while (fine && fgets(line, sizeof line, file) != NULL) {
        summary.rows++;
        if (!parse(line, fields)) {
            summary.unreadable++;
            continue;
        }
        moistair_total_add(&summary.log, fields[0], 1.0, MOISTAIR_QUALITY_GOOD, &added, NULL);
        if (added == MOISTAIR_ADDED_TIME_REFUSED) {
            summary.not_in_time++;
            continue;
        }
        for (i = 0; i < CHANNELS; i++) {
            moistair_channel_check(&channels[i], &states[i], fields[0], fields[1 + i], &moment.readings[i], NULL);
            moistair_counts_record(&summary.counts[i], &moment.readings[i], NULL);
        }
        evaluate(&moment, fields[0]);
        for (i = 0; i < RATES; i++)
            moistair_periods_add(&periods[i], fields[0], moment.rates[i], moment.qualities[i], &finished[i], &done,
                                 NULL);
        /* All of them finish at the same time. */
        if (done) {
            fine = close_hour(finished, &checks);
            memset(&checks, 0, sizeof checks);
        }
        merge_checks(&checks, &moment.checks);
    }
    for (i = 0; i < RATES; i++)
        moistair_periods_unfinished(&periods[i], &finished[i], &done, NULL);
    if (fine && done)
        fine = close_hour(finished, &checks);
    for (i = 0; i < summary.hours; i++) {
        int rate;
        for (rate = 0; rate < RATES; rate++)
            moistair_total_merge(&summary.day.totals[rate], &summary.hour[i].totals[rate], NULL);
        merge_checks(&summary.day.checks, &summary.hour[i].checks);
    }
    return fine;
}

/* ---- The tables ---- */

static const char title[] =
    "Air handler and cooling tower: a day of one-minute readings\n"
    "\n";

static const char log_note[] =
    "\n"
    "Sums and means stand for the covered time only and are not extrapolated. cover: the share of the hour or of the\n"
    "day for which every reading that the result needs was there and plausible. rep.: minutes of it with a reading\n"
    "that was repaired, by the last good value or at saturation. Table 7 says what was refused, and why.\n";

static const char air_head[] =
    "\n"
    "1  Air: means of dry bulb, relative humidity over liquid water, humidity ratio, enthalpy; cover in %\n"
    "\n"
    "    pressure  --------- outdoor air ----------  ---------- supply air ----------  ---------- return air ----------\n"
    "hour     hPa      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover\n";

static const char handler_head[] =
    "\n"
    "2  Air handler: dry air, means before and behind the coil, heat and water\n"
    "\n"
    "     - dry air -  -- mixed --- - off coil -  valve ----- coil load ------ conden- fan and heater  steam  - cover - rep.\n"
    "hour supply outd.                                  sensible latent  total    sate   heat reheat\n"
    "       kg/s  kg/s     °C  g/kg     °C  g/kg     %      kWh    kWh    kWh     kg     kWh    kWh     kg  coil% heat%  min\n";

static const char *const handler_note[] = {
    "\n"
    "Peaks in kW and kg/h. Condensate leaves at the temperature of the air off the coil; humidity ratios that differ by\n"
    "less than ",
    " g/kg make none. Cooling at a closed valve: the thermometers differ, or the valve passes. Reheat: the heat\n"
    "of fan and heater while the coil valve is open.\n"};

static const char tower_head[] =
    "\n"
    "3  Cooling tower: heat and water\n"
    "\n"
    "        water  rejected   range  approach  evaporation   drift  blowdown   make-up    cover     rep.\n"
    "hour     kg/s       kWh       K         K           kg      kg        kg        kg        %      min\n";

static const char *const tower_note[] = {
    "\n"
    "Peaks in kW, K and kg/h. Range and approach: while water flows. The leaving air is taken as saturated, which\n"
    "over-predicts evaporation where it does not. Drift ",
    " % of the water, ",
    " cycles of concentration. Estimates: towers\n"
    "and humidifiers can spread Legionella; hygiene rules and licensed practice govern, not these numbers.\n"};

static const char coil_head[] =
    "\n"
    "4  Equipment: predicted beside measured\n"
    "\n"
    "      - chilled water --    --------- load of the coil ---------    ---- air off the coil -----  cover\n"
    "hour  flow supply return    by air by water difference predicted      predicted      difference\n"
    "      kg/s     °C     °C       kWh      kWh        kWh       kWh       °C  g/kg        K   g/kg      %\n";

static const char tower_rating_head[] =
    "\n"
    "     water     - Merkel number -     -- cold water of the tower ---   cover\n"
    "hour  /air    measured  fill law    measured  predicted  difference\n"
    "         1           1         1          °C         °C           K       %\n";

static const char *const equipment_note[] = {
    "\n"
    "Differences: the load by air less that by water, where both are there; else measured less predicted. Temperatures,\n"
    "humidity ratios and Merkel numbers: while water flows. The coil: ",
    " kW/K on the side of the air and ",
    " kW/K on\n"
    "that of the water explain the point at which it was handed over; they go with the powers ",
    " and ",
    " of the flows.\n"
    "Air and water should agree on the load within some per cent, or a meter is off. The tower: Merkel number ",
    "\n"
    "(L/G)^-",
    " as the fill was tested, by Merkel's method. What falls short of the prediction asks for a look at the\n"
    "meters first, then at flows, fouling and scale. A tower that scales or fouls is also a place where Legionella grows:\n"
    "hygiene rules govern its cleaning.\n"};

static const char rooms_head[] =
    "\n"
    "5  Outdoor air and rooms\n"
    "\n"
    "      ---- share of outdoor air ----    outdoor     --------- rooms ---------   cover\n"
    "hour  by flows  by dry bulbs    sure    cheaper    sensible  moisture   ratio\n"
    "             %             %       %        min         kWh        kg       1       %\n";

static const char *const rooms_note[] = {
    "\n"
    "Share of outdoor air in the dry air of the supply: by the flows, and by the dry bulbs of outdoor, return and mixed air\n"
    "for as much of the time as thermometers good to ",
    " K make sure of it to ",
    " %. Outdoor cheaper: while the coil works,\n"
    "to bring outdoor air to ",
    " °C would have cost it less than return air. Rooms: what they give to the air, with what\n"
    "walls and paper store; moisture as vapor of ",
    " °C. Ratio: sensible to all heat, by the means; where the two cancel it\n"
    "says nothing. How much outdoor air people need is a matter of ventilation codes.\n"};

static const char checks_head[] =
    "\n"
    "6  Checks: means of measured less computed; books of heat and water of all processes\n"
    "\n"
    "     -- mixed air -- --- supply air -- ------ books ----- largest residual\n"
    "hour        K    g/kg         K    g/kg  computed  closed     heat   water\n";

static const char deviations_head[] =
    "\n"
    "measured less computed      unit  samples     mean      rms   lowest  highest\n";

static const char books_head[] =
    "\n"
    "books                   computed  closed  no result  largest residual: heat   water\n";

static const char checks_note[] =
    "\n"
    "Mixed air is computed from the flows and states of outdoor and return air, supply air from the air off the heater\n"
    "and the metered steam. Residuals are in units of 2^-52 of the terms of a book; a book is closed within 8 of them\n"
    "and what the last bit of the temperatures is worth. No result: a reading was refused, no process does\n"
    "that, or the tower to predict was at rest.\n";

static const char channels_head[] =
    "\n"
    "7  Readings\n"
    "\n"
    "channel              unit     good repaired refused gaps  why\n";

/* A value with its width and decimals; "-" where there is none, and no minus before zero. */
static void cell(double value, int width, int decimals)
{
    char text[400];
    const char *shown = text;
    if (!isfinite(value)) {
        printf("%*s", width, "-");
        return;
    }
    snprintf(text, sizeof text, "%.*f", decimals, value);
    if (*shown == '-' && strpbrk(text, "123456789") == NULL)
        shown++;
    printf("%*s", width, shown);
}

/* Text of any language, filled up to a width; the bytes 10xxxxxx of UTF-8 continue a character. */
static void padded(const char *text, int width)
{
    fputs(text, stdout);
    for (; *text != '\0'; text++)
        if (((unsigned char)*text & 0xC0) != 0x80)
            width--;
    for (; width > 0; width--)
        putchar(' ');
}

static double shown(int32_t unit, double value)
{
    double converted = NAN;
    moistair_unit_from_core(unit, value, &converted, NULL);
    return converted;
}

static moistair_total_values totals(const struct span *span, int rate)
{
    moistair_total_values values = {0};
    moistair_total_read(&span->totals[rate], &values, NULL);
    return values;
}

static double mean(const struct span *span, int rate, int32_t unit)
{
    return shown(unit, totals(span, rate).mean);
}

static double highest(const struct span *span, int rate, int32_t unit)
{
    return shown(unit, totals(span, rate).highest);
}

/* In the unit of the rate times s. */
static double total(const struct span *span, int rate)
{
    moistair_total_values values = totals(span, rate);
    return values.covered_seconds > 0.0 ? values.total : NAN;
}

static double kilowatt_hours(const struct span *span, int rate)
{
    return shown(MOISTAIR_UNIT_KILOWATT_HOUR, total(span, rate));
}

static double cover(const moistair_total *total, double length)
{
    double coverage = NAN;
    moistair_total_coverage_of(total, length, &coverage, NULL);
    return shown(MOISTAIR_UNIT_PERCENT, coverage);
}

static double span_cover(const struct span *span, int rate)
{
    return cover(&span->totals[rate], span->length);
}

static double repaired(const struct span *span, int rate)
{
    return shown(MOISTAIR_UNIT_MINUTE, totals(span, rate).repaired_seconds);
}

/* A table with a row for each hour and one for the day. */
static void print_hours(void (*cells)(const struct span *))
{
    int i;
    for (i = 0; i < summary.hours; i++) {
        printf("%02.0f  ", shown(MOISTAIR_UNIT_HOUR, summary.hour[i].start));
        cells(&summary.hour[i]);
        printf("\n");
    }
    printf("day ");
    cells(&summary.day);
    printf("\n");
}

static void air_cells(const struct span *span)
{
    static const int states[][4] = {
        {R_OUTDOOR, R_OUTDOOR_RH, R_OUTDOOR_RATIO, R_OUTDOOR_ENTHALPY},
        {R_SUPPLY, R_SUPPLY_RH, R_SUPPLY_RATIO, R_SUPPLY_ENTHALPY},
        {R_RETURN, R_RETURN_RH, R_RETURN_RATIO, R_RETURN_ENTHALPY},
    };
    int i;
    cell(mean(span, R_PRESSURE, MOISTAIR_UNIT_HECTOPASCAL), 8, 1);
    for (i = 0; i < 3; i++) {
        cell(mean(span, states[i][0], MOISTAIR_UNIT_CELSIUS), 8, 1);
        cell(mean(span, states[i][1], MOISTAIR_UNIT_PERCENT), 6, 1);
        cell(mean(span, states[i][2], MOISTAIR_UNIT_GRAM_PER_KILOGRAM), 7, 2);
        cell(mean(span, states[i][3], MOISTAIR_UNIT_KILOJOULE_PER_KILOGRAM), 7, 1);
        cell(span_cover(span, states[i][2]), 6, 1);
    }
}

static void handler_cells(const struct span *span)
{
    cell(mean(span, R_SUPPLY_AIR, MOISTAIR_UNIT_KILOGRAM_PER_SECOND), 7, 2);
    cell(mean(span, R_OUTDOOR_AIR, MOISTAIR_UNIT_KILOGRAM_PER_SECOND), 6, 2);
    cell(mean(span, R_MIXED, MOISTAIR_UNIT_CELSIUS), 7, 1);
    cell(mean(span, R_MIXED_RATIO, MOISTAIR_UNIT_GRAM_PER_KILOGRAM), 6, 2);
    cell(mean(span, R_COIL, MOISTAIR_UNIT_CELSIUS), 7, 1);
    cell(mean(span, R_COIL_RATIO, MOISTAIR_UNIT_GRAM_PER_KILOGRAM), 6, 2);
    cell(mean(span, R_VALVE, MOISTAIR_UNIT_PERCENT), 6, 1);
    cell(kilowatt_hours(span, R_SENSIBLE), 9, 1);
    cell(kilowatt_hours(span, R_LATENT), 7, 1);
    cell(kilowatt_hours(span, R_COOLING), 7, 1);
    cell(total(span, R_CONDENSATE), 7, 1);
    cell(kilowatt_hours(span, R_HEATING), 8, 1);
    cell(kilowatt_hours(span, R_REHEAT), 7, 1);
    cell(total(span, R_STEAM), 7, 1);
    cell(span_cover(span, R_COOLING), 7, 1);
    cell(span_cover(span, R_HEATING), 6, 1);
    cell(repaired(span, R_HEATING), 5, 0);
}

static void tower_cells(const struct span *span)
{
    cell(mean(span, R_TOWER_WATER, MOISTAIR_UNIT_KILOGRAM_PER_SECOND), 9, 2);
    cell(kilowatt_hours(span, R_REJECTED), 10, 1);
    cell(mean(span, R_RANGE, MOISTAIR_UNIT_CELSIUS), 8, 2);
    cell(mean(span, R_APPROACH, MOISTAIR_UNIT_CELSIUS), 10, 2);
    cell(total(span, R_EVAPORATION), 13, 1);
    cell(total(span, R_DRIFT), 8, 2);
    cell(total(span, R_BLOWDOWN), 10, 1);
    cell(total(span, R_MAKE_UP), 10, 1);
    cell(span_cover(span, R_REJECTED), 9, 1);
    cell(repaired(span, R_REJECTED), 9, 0);
}

static moistair_deviation_values deviation(const struct span *span, int check)
{
    moistair_deviation_values values = {0};
    moistair_deviation_read(&span->checks.deviations[check], &values, NULL);
    return values;
}

/* Of the means of a span: of minutes in which hardly any heat comes in it says nothing. */
static double sensible_heat_ratio(const struct span *span)
{
    moistair_basis basis = {0.0, MOISTAIR_REAL_GAS, 0};
    moistair_state room;
    moistair_room_gains gains = {0.0, 0.0, 0.0, MOISTAIR_SOURCE_SATURATED_VAPOR, 0};
    double ratio;
    basis.pressure = totals(span, R_PRESSURE).mean;
    gains.sensible = totals(span, R_ROOM_SENSIBLE).mean;
    gains.moisture = totals(span, R_ROOM_MOISTURE).mean;
    gains.source_value = people;
    if (moistair_from_dry_bulb(totals(span, R_RETURN).mean, MOISTAIR_HUMIDITY_RATIO, totals(span, R_RETURN_RATIO).mean,
                               basis, &room, NULL) == MOISTAIR_OK &&
        moistair_room_sensible_heat_ratio(&room, &gains, &ratio, NULL) == MOISTAIR_OK)
        return ratio;
    return NAN;
}

static double mean_deviation(const struct span *span, int check)
{
    return shown(check_names[check].core, deviation(span, check).mean);
}

static moistair_books_total_values books(const moistair_books_total *total)
{
    moistair_books_total_values values;
    memset(&values, 0, sizeof values);
    moistair_books_total_read(total, &values, NULL);
    return values;
}

static void coil_cells(const struct span *span)
{
    cell(mean(span, R_CHILLED_WATER, MOISTAIR_UNIT_KILOGRAM_PER_SECOND), 6, 2);
    cell(mean(span, R_CHILLED_SUPPLY, MOISTAIR_UNIT_CELSIUS), 7, 1);
    cell(mean(span, R_CHILLED_RETURN, MOISTAIR_UNIT_CELSIUS), 7, 1);
    cell(kilowatt_hours(span, R_COOLING), 10, 1);
    cell(kilowatt_hours(span, R_LOAD_BY_WATER), 9, 1);
    cell(kilowatt_hours(span, R_AIR_LESS_WATER), 11, 1);
    cell(kilowatt_hours(span, R_PREDICTED_LOAD), 10, 1);
    cell(mean(span, R_PREDICTED_COIL, MOISTAIR_UNIT_CELSIUS), 9, 1);
    cell(mean(span, R_PREDICTED_COIL_RATIO, MOISTAIR_UNIT_GRAM_PER_KILOGRAM), 6, 2);
    cell(mean_deviation(span, C_COIL), 9, 2);
    cell(mean_deviation(span, C_COIL_RATIO), 7, 2);
    cell(span_cover(span, R_PREDICTED_LOAD), 7, 1);
}

static void tower_rating_cells(const struct span *span)
{
    cell(mean(span, R_WATER_TO_AIR, MOISTAIR_UNIT_FRACTION), 6, 2);
    cell(mean(span, R_MERKEL_NUMBER, MOISTAIR_UNIT_FRACTION), 12, 2);
    cell(mean(span, R_MERKEL_NUMBER_BY_LAW, MOISTAIR_UNIT_FRACTION), 10, 2);
    cell(mean(span, R_COLD_WATER, MOISTAIR_UNIT_CELSIUS), 12, 1);
    cell(mean(span, R_PREDICTED_COLD_WATER, MOISTAIR_UNIT_CELSIUS), 11, 1);
    cell(mean_deviation(span, C_COLD_WATER), 12, 2);
    cell(span_cover(span, R_PREDICTED_COLD_WATER), 8, 1);
}

static void room_cells(const struct span *span)
{
    cell(mean(span, R_SHARE_BY_FLOWS, MOISTAIR_UNIT_PERCENT), 10, 1);
    cell(mean(span, R_SHARE_BY_TEMPERATURES, MOISTAIR_UNIT_PERCENT), 14, 1);
    cell(span_cover(span, R_SHARE_BY_TEMPERATURES), 8, 1);
    cell(shown(MOISTAIR_UNIT_MINUTE, total(span, R_OUTDOOR_CHEAPER)), 11, 0);
    cell(kilowatt_hours(span, R_ROOM_SENSIBLE), 12, 1);
    cell(total(span, R_ROOM_MOISTURE), 10, 1);
    cell(sensible_heat_ratio(span), 8, 2);
    cell(span_cover(span, R_ROOM_SENSIBLE), 8, 1);
}

static void check_cells(const struct span *span)
{
    enum { SHOWN = 4 };
    static const int widths[SHOWN] = {9, 8, 10, 8}, decimals[SHOWN] = {2, 3, 2, 3};
    moistair_books_total all = {{0}};
    moistair_books_total_values values;
    int i;
    for (i = 0; i < SHOWN; i++)
        cell(mean_deviation(span, i), widths[i], decimals[i]);
    for (i = 0; i < PROCESSES; i++)
        moistair_books_total_merge(&all, &span->checks.books[i], NULL);
    values = books(&all);
    printf("%10llu%8llu", (unsigned long long)values.heat.samples, (unsigned long long)values.closed);
    cell(values.heat.largest_in_epsilons, 9, 2);
    cell(values.water.largest_in_epsilons, 8, 2);
}

static void print_log(void)
{
    fputs(title, stdout);
    printf("rows read          %6u\n", summary.rows);
    printf("time not increasing%6u  ignored\n", summary.not_in_time);
    printf("not a row          %6u  ignored\n", summary.unreadable);
    printf("day covered by rows");
    cell(cover(&summary.log, day_length), 6, 1);
    printf("  %%\n");
    fputs(log_note, stdout);
}

static void print_handler(void)
{
    const struct span *day = &summary.day;
    fputs(handler_head, stdout);
    print_hours(handler_cells);
    printf("peak");
    cell(highest(day, R_SENSIBLE, MOISTAIR_UNIT_KILOWATT), 54, 1);
    cell(highest(day, R_LATENT, MOISTAIR_UNIT_KILOWATT), 7, 1);
    cell(highest(day, R_COOLING, MOISTAIR_UNIT_KILOWATT), 7, 1);
    cell(highest(day, R_CONDENSATE, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 7, 1);
    cell(highest(day, R_HEATING, MOISTAIR_UNIT_KILOWATT), 8, 1);
    cell(highest(day, R_REHEAT, MOISTAIR_UNIT_KILOWATT), 7, 1);
    cell(highest(day, R_STEAM, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 7, 1);
    printf("\n");
    fputs(handler_note[0], stdout);
    cell(shown(MOISTAIR_UNIT_GRAM_PER_KILOGRAM, dead_band), 0, 1);
    fputs(handler_note[1], stdout);
}

static void print_tower(void)
{
    const struct span *day = &summary.day;
    fputs(tower_head, stdout);
    print_hours(tower_cells);
    printf("peak");
    cell(highest(day, R_REJECTED, MOISTAIR_UNIT_KILOWATT), 19, 1);
    cell(highest(day, R_RANGE, MOISTAIR_UNIT_CELSIUS), 8, 2);
    cell(highest(day, R_APPROACH, MOISTAIR_UNIT_CELSIUS), 10, 2);
    cell(highest(day, R_EVAPORATION, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 13, 1);
    cell(highest(day, R_DRIFT, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 8, 2);
    cell(highest(day, R_BLOWDOWN, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 10, 1);
    cell(highest(day, R_MAKE_UP, MOISTAIR_UNIT_KILOGRAM_PER_HOUR), 10, 1);
    printf("\n");
    fputs(tower_note[0], stdout);
    cell(shown(MOISTAIR_UNIT_PERCENT, treatment.drift_fraction), 0, 2);
    fputs(tower_note[1], stdout);
    cell(treatment.cycles_of_concentration, 0, 1);
    fputs(tower_note[2], stdout);
}

static void print_equipment(void)
{
    fputs(coil_head, stdout);
    print_hours(coil_cells);
    fputs(tower_rating_head, stdout);
    print_hours(tower_rating_cells);
    fputs(equipment_note[0], stdout);
    cell(shown(MOISTAIR_UNIT_KILOWATT, surface.air_side), 0, 1);
    fputs(equipment_note[1], stdout);
    cell(shown(MOISTAIR_UNIT_KILOWATT, surface.water_side), 0, 1);
    fputs(equipment_note[2], stdout);
    cell(flow_exponents.air_side, 0, 1);
    fputs(equipment_note[3], stdout);
    cell(flow_exponents.water_side, 0, 1);
    fputs(equipment_note[4], stdout);
    cell(fill.coefficient, 0, 2);
    fputs(equipment_note[5], stdout);
    cell(fill.exponent, 0, 1);
    fputs(equipment_note[6], stdout);
}

static void print_rooms(void)
{
    fputs(rooms_head, stdout);
    print_hours(room_cells);
    fputs(rooms_note[0], stdout);
    cell(thermometer, 0, 1);
    fputs(rooms_note[1], stdout);
    cell(shown(MOISTAIR_UNIT_PERCENT, acceptable), 0, 0);
    fputs(rooms_note[2], stdout);
    cell(off_coil_celsius, 0, 0);
    fputs(rooms_note[3], stdout);
    cell(people, 0, 0);
    fputs(rooms_note[4], stdout);
}

static void print_checks(void)
{
    int i;
    fputs(checks_head, stdout);
    print_hours(check_cells);
    fputs(deviations_head, stdout);
    for (i = 0; i < CHECKS; i++) {
        moistair_deviation_values values = deviation(&summary.day, i);
        int32_t unit = check_names[i].core;
        printf("%-28s%-4s%9llu", check_names[i].name, check_names[i].unit, (unsigned long long)values.samples);
        cell(shown(unit, values.mean), 9, 3);
        cell(shown(unit, values.root_mean_square), 9, 3);
        cell(shown(unit, values.lowest), 9, 3);
        cell(shown(unit, values.highest), 9, 3);
        printf("\n");
    }
    fputs(books_head, stdout);
    for (i = 0; i < PROCESSES; i++) {
        moistair_books_total_values values = books(&summary.day.checks.books[i]);
        printf("%-20s%12llu%8llu%11llu", process_names[i], (unsigned long long)values.heat.samples,
               (unsigned long long)values.closed, (unsigned long long)values.heat.refused);
        cell(values.heat.largest_in_epsilons, 24, 2);
        cell(values.water.largest_in_epsilons, 8, 2);
        printf("\n");
    }
    fputs(checks_note, stdout);
}

/* A reason with its count; on a line of its own unless it is the first. */
static void print_reason(uint64_t count, const char *held, int32_t reason, int *first)
{
    if (count == 0)
        return;
    printf("%*s%5llu %s%s\n", *first ? 0 : 56, "", (unsigned long long)count, held, moistair_reason_text(reason));
    *first = 0;
}

static void print_channels(void)
{
    int i;
    int32_t reason;
    fputs(channels_head, stdout);
    for (i = 0; i < CHANNELS; i++) {
        const moistair_counts *counts = &summary.counts[i];
        const uint64_t *quality = counts->by_quality;
        int first = 1;
        printf("%-20s ", columns[i].name);
        padded(moistair_unit_text(columns[i].unit), 5);
        printf("%8llu%9llu", (unsigned long long)quality[MOISTAIR_QUALITY_GOOD],
               (unsigned long long)quality[MOISTAIR_QUALITY_REPAIRED]);
        printf("%8llu%5llu", (unsigned long long)quality[MOISTAIR_QUALITY_REFUSED],
               (unsigned long long)counts->after_gap);
        for (reason = 0; reason < MOISTAIR_REASON_SLOTS; reason++) {
            if (reason != MOISTAIR_REASON_OK && reason != MOISTAIR_REASON_GAP && reason != MOISTAIR_REASON_HELD)
                print_reason(counts->by_reason[reason], "", reason, &first);
            print_reason(counts->held_by_cause[reason], "held: ", reason, &first);
        }
        if (first)
            printf("\n");
    }
}

int main(int argc, char **argv)
{
    const char *path = argc > 1 ? argv[1] : default_log;
    FILE *file = fopen(path, "r");
    int fine = file != NULL && describe_coil() && describe_economizer() && read_log(file);
    if (file == NULL)
        fprintf(stderr, "cannot read %s\n", path);
    else if (!fine)
        fprintf(stderr, "%s: no log, or more than %d hours\n", path, (int)MOST_HOURS);
    if (!fine)
        return 1;
    fclose(file);
    print_log();
    fputs(air_head, stdout);
    print_hours(air_cells);
    print_handler();
    print_tower();
    print_equipment();
    print_rooms();
    print_checks();
    print_channels();
    return 0;
}
