/*
 * A C program's calls of moistair: state by state, and by columns. The library's functions are handed in by address, so that
 * what is timed is a call through a pointer, as into a shared library.
 */
#include "moistair.h"

typedef struct {
    int32_t (*from_dry_bulb)(double, int32_t, double, moistair_basis, moistair_state *, moistair_error *);
    int32_t (*properties)(const moistair_state *, uint64_t, double *, uint64_t *, moistair_error *);
    int32_t (*state_columns)(size_t, moistair_column, int32_t, moistair_column, moistair_column, int32_t, uint64_t,
                             double *const *, int32_t *, moistair_column_report *, moistair_error *);
} functions;

/* Inputs and outputs are those of plain_loop.c. Returns 0, or the status of the first call that failed. */
int32_t call_states(const functions *library, int32_t formulation, size_t rows, const double *dry_bulb,
                    const double *relative_humidity, const double *pressure, double *const outputs[8])
{
    const uint64_t mask = MOISTAIR_BIT(MOISTAIR_DEW_POINT) | MOISTAIR_BIT(MOISTAIR_WET_BULB) |
                          MOISTAIR_BIT(MOISTAIR_DEGREE_OF_SATURATION);
    for (size_t i = 0; i < rows; i++) {
        const moistair_basis basis = {pressure[i], formulation, 0};
        double values[MOISTAIR_PROPERTY_COUNT];
        moistair_state air;
        int32_t status = library->from_dry_bulb(dry_bulb[i], MOISTAIR_RELATIVE_HUMIDITY, relative_humidity[i], basis, &air, NULL);
        if (status == MOISTAIR_OK)
            status = library->properties(&air, mask, values, NULL, NULL);
        if (status != MOISTAIR_OK)
            return status;
        outputs[0][i] = air.vapor_pressure;
        outputs[1][i] = air.humidity_ratio;
        outputs[2][i] = air.specific_enthalpy;
        outputs[3][i] = air.specific_volume;
        outputs[4][i] = values[MOISTAIR_DEW_POINT];
        outputs[5][i] = values[MOISTAIR_WET_BULB];
        outputs[6][i] = values[MOISTAIR_DEGREE_OF_SATURATION];
        outputs[7][i] = air.density;
    }
    return MOISTAIR_OK;
}

int32_t call_columns(const functions *library, int32_t formulation, size_t rows, const double *dry_bulb,
                     const double *relative_humidity, const double *pressure, double *const outputs[8])
{
    static const int32_t order[8] = {MOISTAIR_VAPOR_PRESSURE, MOISTAIR_HUMIDITY_RATIO, MOISTAIR_SPECIFIC_ENTHALPY,
                                     MOISTAIR_SPECIFIC_VOLUME, MOISTAIR_DEW_POINT, MOISTAIR_WET_BULB,
                                     MOISTAIR_DEGREE_OF_SATURATION, MOISTAIR_DENSITY};
    const moistair_column t = {dry_bulb, 1}, rh = {relative_humidity, 1}, p = {pressure, 1};
    double *places[MOISTAIR_PROPERTY_COUNT] = {0};
    uint64_t mask = 0;
    for (int i = 0; i < 8; i++) {
        places[order[i]] = outputs[i];
        mask |= MOISTAIR_BIT(order[i]);
    }
    return library->state_columns(rows, t, MOISTAIR_RELATIVE_HUMIDITY, rh, p, formulation, mask, places, NULL, NULL, NULL);
}
