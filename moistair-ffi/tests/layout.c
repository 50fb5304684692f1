/* Layout of the structures as C sees them, and agreement of header and library. */
#include <stddef.h>
#include <stdio.h>
#include <string.h>

#include "moistair.h"

_Static_assert(sizeof(moistair_error) == 32, "moistair_error");
_Static_assert(offsetof(moistair_error, code) == 24, "moistair_error");
_Static_assert(offsetof(moistair_error, quantity) == 28, "moistair_error");
_Static_assert(sizeof(moistair_basis) == 16, "moistair_basis");
_Static_assert(offsetof(moistair_basis, formulation) == 8, "moistair_basis");
_Static_assert(sizeof(moistair_state) == 104, "moistair_state");
_Static_assert(offsetof(moistair_state, compressibility_factor) == 88, "moistair_state");
_Static_assert(offsetof(moistair_state, formulation) == 96, "moistair_state");
_Static_assert(sizeof(moistair_column) == 2 * sizeof(void *), "moistair_column");
_Static_assert(sizeof(moistair_column_report) == 2 * sizeof(size_t), "moistair_column_report");
_Static_assert(sizeof(moistair_field) == 192, "moistair_field");
_Static_assert(offsetof(moistair_field, unit) == 64, "moistair_field");
_Static_assert(sizeof(moistair_stream) == 112, "moistair_stream");
_Static_assert(offsetof(moistair_stream, dry_air_flow) == 104, "moistair_stream");
_Static_assert(sizeof(moistair_air_with_condensate) == 136, "moistair_air_with_condensate");
_Static_assert(sizeof(moistair_wet_stream) == 144, "moistair_wet_stream");
_Static_assert(sizeof(moistair_exchange) == 24, "moistair_exchange");
_Static_assert(sizeof(moistair_sensible) == 136, "moistair_sensible");
_Static_assert(sizeof(moistair_cooling) == 296, "moistair_cooling");
_Static_assert(offsetof(moistair_cooling, regime) == 288, "moistair_cooling");
_Static_assert(sizeof(moistair_apparatus) == 16, "moistair_apparatus");
_Static_assert(sizeof(moistair_apparatus_dew_points) == 48, "moistair_apparatus_dew_points");
_Static_assert(sizeof(moistair_coil_surface) == 24, "moistair_coil_surface");
_Static_assert(sizeof(moistair_coil_water) == 24, "moistair_coil_water");
_Static_assert(sizeof(moistair_coil_flows) == 16, "moistair_coil_flows");
_Static_assert(sizeof(moistair_flow_exponents) == 16, "moistair_flow_exponents");
_Static_assert(sizeof(moistair_load_by_water) == 16, "moistair_load_by_water");
_Static_assert(sizeof(moistair_water_coil) == 328, "moistair_water_coil");
_Static_assert(offsetof(moistair_water_coil, freezing) == 320, "moistair_water_coil");
_Static_assert(sizeof(moistair_reheat) == 440, "moistair_reheat");
_Static_assert(sizeof(moistair_room_gains) == 32, "moistair_room_gains");
_Static_assert(offsetof(moistair_room_gains, source) == 24, "moistair_room_gains");
_Static_assert(sizeof(moistair_room_air) == 280, "moistair_room_air");
_Static_assert(sizeof(moistair_room_dew_points) == 24, "moistair_room_dew_points");
_Static_assert(sizeof(moistair_coil_leaving) == 24, "moistair_coil_leaving");
_Static_assert(sizeof(moistair_limiting_line) == 32, "moistair_limiting_line");
_Static_assert(sizeof(moistair_least_reheat) == 264, "moistair_least_reheat");
_Static_assert(offsetof(moistair_least_reheat, cause) == 256, "moistair_least_reheat");
_Static_assert(sizeof(moistair_conditioned) == 720, "moistair_conditioned");
_Static_assert(sizeof(moistair_sorption) == 24, "moistair_sorption");
_Static_assert(sizeof(moistair_sorbed) == 160, "moistair_sorbed");
_Static_assert(sizeof(moistair_wheel) == 464, "moistair_wheel");
_Static_assert(offsetof(moistair_wheel, status) == 456, "moistair_wheel");
_Static_assert(sizeof(moistair_potentials) == 16, "moistair_potentials");
_Static_assert(sizeof(moistair_potential_wheel) == 312, "moistair_potential_wheel");
_Static_assert(offsetof(moistair_potential_wheel, correlation) == 308, "moistair_potential_wheel");
_Static_assert(sizeof(moistair_humidified) == 184, "moistair_humidified");
_Static_assert(sizeof(moistair_washer) == 40, "moistair_washer");
_Static_assert(sizeof(moistair_washed) == 216, "moistair_washed");
_Static_assert(sizeof(moistair_throttled_steam) == 32, "moistair_throttled_steam");
_Static_assert(sizeof(moistair_direct_cooled) == 240, "moistair_direct_cooled");
_Static_assert(sizeof(moistair_indirect_cooled) == 344, "moistair_indirect_cooled");
_Static_assert(sizeof(moistair_two_stage_cooled) == 592, "moistair_two_stage_cooled");
_Static_assert(sizeof(moistair_books) == 48, "moistair_books");
_Static_assert(sizeof(moistair_step) == 408, "moistair_step");
_Static_assert(offsetof(moistair_step, leaving_temperature) == 296, "moistair_step");
_Static_assert(offsetof(moistair_step, kind) == 392, "moistair_step");
_Static_assert(sizeof(moistair_loads) == 72, "moistair_loads");
_Static_assert(sizeof(moistair_step_result) == 440, "moistair_step_result");
_Static_assert(offsetof(moistair_step_result, regime) == 432, "moistair_step_result");
_Static_assert(sizeof(moistair_sequence_total) == 296, "moistair_sequence_total");
_Static_assert(sizeof(moistair_free) == 24, "moistair_free");
_Static_assert(sizeof(moistair_target) == 16, "moistair_target");
_Static_assert(sizeof(moistair_solved) == 368, "moistair_solved");
_Static_assert(offsetof(moistair_solved, status) == 352, "moistair_solved");
_Static_assert(sizeof(moistair_tower_water) == 24, "moistair_tower_water");
_Static_assert(sizeof(moistair_water_treatment) == 16, "moistair_water_treatment");
_Static_assert(sizeof(moistair_water_use) == 40, "moistair_water_use");
_Static_assert(sizeof(moistair_tower_balance) == 208, "moistair_tower_balance");
_Static_assert(sizeof(moistair_basin) == 16, "moistair_basin");
_Static_assert(sizeof(moistair_hot_water) == 16, "moistair_hot_water");
_Static_assert(sizeof(moistair_pinch) == 16, "moistair_pinch");
_Static_assert(sizeof(moistair_merkel_number) == 48, "moistair_merkel_number");
_Static_assert(sizeof(moistair_tower_rating) == 80, "moistair_tower_rating");
_Static_assert(offsetof(moistair_tower_rating, status) == 72, "moistair_tower_rating");
_Static_assert(sizeof(moistair_poppe_rating) == 248, "moistair_poppe_rating");
_Static_assert(offsetof(moistair_poppe_rating, status) == 240, "moistair_poppe_rating");
_Static_assert(sizeof(moistair_fill_law) == 16, "moistair_fill_law");
_Static_assert(sizeof(moistair_fill_test) == 16, "moistair_fill_test");
_Static_assert(sizeof(moistair_reading) == 24, "moistair_reading");
_Static_assert(sizeof(moistair_measured_air) == 56, "moistair_measured_air");
_Static_assert(sizeof(moistair_outdoor_air_fraction) == 24, "moistair_outdoor_air_fraction");
_Static_assert(sizeof(moistair_blend) == 160, "moistair_blend");
_Static_assert(offsetof(moistair_blend, fraction) == 144, "moistair_blend");
_Static_assert(sizeof(moistair_economizer) == 104, "moistair_economizer");
_Static_assert(offsetof(moistair_economizer, rule) == 96, "moistair_economizer");
_Static_assert(sizeof(moistair_economizer_state) == 48, "moistair_economizer_state");
_Static_assert(sizeof(moistair_decision) == 48, "moistair_decision");
_Static_assert(offsetof(moistair_decision, enabled) == 24, "moistair_decision");
_Static_assert(sizeof(moistair_coil_load) == 16, "moistair_coil_load");
_Static_assert(sizeof(moistair_channel) == 64, "moistair_channel");
_Static_assert(sizeof(moistair_channel_state) == 96, "moistair_channel_state");
_Static_assert(sizeof(moistair_checked) == 24, "moistair_checked");
_Static_assert(sizeof(moistair_counts) == 552, "moistair_counts");
_Static_assert(sizeof(moistair_total) == 120, "moistair_total");
_Static_assert(sizeof(moistair_total_values) == 80, "moistair_total_values");
_Static_assert(sizeof(moistair_period) == 128, "moistair_period");
_Static_assert(sizeof(moistair_periods) == 136, "moistair_periods");
_Static_assert(sizeof(moistair_books_total) == 120, "moistair_books_total");
_Static_assert(sizeof(moistair_residuals) == 56, "moistair_residuals");
_Static_assert(sizeof(moistair_books_total_values) == 120, "moistair_books_total_values");
_Static_assert(sizeof(moistair_deviation) == 64, "moistair_deviation");
_Static_assert(sizeof(moistair_deviation_values) == 48, "moistair_deviation_values");
_Static_assert(sizeof(moistair_limits) == 16, "moistair_limits");
_Static_assert(sizeof(moistair_property_derivatives) == 32, "moistair_property_derivatives");
_Static_assert(offsetof(moistair_property_derivatives, by_pressure) == 24, "moistair_property_derivatives");

/* What a selector at fault leaves in the error: a quantity by its name, any other as a number without one. */
static int selectors(void)
{
    moistair_basis basis = {101325.0, MOISTAIR_REAL_GAS, 0}, no_basis = {101325.0, 7, 0};
    moistair_state state;
    moistair_error error;
    int32_t status = moistair_from_dry_bulb(20.0, MOISTAIR_SATURATION_PRESSURE, 2000.0, basis, &state, &error);
    int good = status == MOISTAIR_UNKNOWN_SELECTOR && error.quantity == MOISTAIR_SATURATION_PRESSURE;
    status = moistair_from_dry_bulb(20.0, MOISTAIR_RELATIVE_HUMIDITY, 0.5, no_basis, &state, &error);
    return good && status == MOISTAIR_UNKNOWN_SELECTOR && error.quantity == -1 && error.value == 7.0;
}

static int check(int condition, const char *text)
{
    if (!condition)
        printf("FAILED: %s\n", text);
    return !condition;
}

int main(void)
{
    int failed = 0;
    failed += check(moistair_abi_version() == MOISTAIR_ABI_VERSION, "interface version");
    failed += check(moistair_version() == MOISTAIR_VERSION, "library version");
    failed += check(moistair_version() / 1000000 == MOISTAIR_VERSION_MAJOR, "major version");
    failed += check(moistair_version() / 1000 % 1000 == MOISTAIR_VERSION_MINOR, "minor version");
    failed += check(moistair_version() % 1000 == MOISTAIR_VERSION_PATCH, "patch version");
    failed += check(moistair_numerics_version() >= 1, "numerics version");
    failed += check(strcmp(moistair_quantity_name(MOISTAIR_DRY_AIR_MASS_FLOW), "dry_air_mass_flow") == 0, "name");
    failed += check(strcmp(moistair_quantity_unit(MOISTAIR_HUMIDITY_RATIO), "kg/kg") == 0, "unit");
    failed += check(strcmp(moistair_quantity_name(63), "") == 0, "no name");
    failed += check(strcmp(moistair_status_text(0), "success") == 0, "text of success");
    failed += check(strcmp(moistair_status_text(-7), "unknown status") == 0, "text of no status");
    failed += check(selectors(), "selectors at fault");
    if (failed == 0)
        printf("layout and version agree\n");
    return failed;
}
