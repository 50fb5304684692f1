/*
 * A short tour: a state, its properties, an error, a day of readings as columns.
 *
 *     cargo build --release -p moistair-ffi
 *     gcc -std=c99 -I moistair-ffi/include moistair-ffi/examples/states.c target/release/libmoistair.a -o states && ./states
 *
 * The readings are invented.
 */
#include <stdio.h>

#include "moistair.h"

static int failed(const char *what, int32_t status, const moistair_error *error)
{
    printf("%s: %s", what, moistair_status_text(status));
    if (error->quantity >= 0)
        printf(" (%s %g [%s], allowed %g to %g)", moistair_quantity_name(error->quantity), error->value,
               moistair_quantity_unit(error->quantity), error->min, error->max);
    printf("\n");
    return 1;
}

/* Outdoor air at a site 1600 m up. */
static int one_state(moistair_basis *site)
{
    moistair_error error;
    moistair_state outdoor;
    double wet_bulb;
    int32_t status = moistair_pressure_at_elevation(1600.0, &site->pressure, &error);
    if (status != MOISTAIR_OK)
        return failed("pressure", status, &error);
    status = moistair_from_dry_bulb(34.0, MOISTAIR_RELATIVE_HUMIDITY, 0.38, *site, &outdoor, &error);
    if (status != MOISTAIR_OK)
        return failed("outdoor air", status, &error);
    status = moistair_property(&outdoor, MOISTAIR_WET_BULB, &wet_bulb, &error);
    if (status != MOISTAIR_OK)
        return failed("wet bulb", status, &error);
    printf("outdoor air: %.1f kJ/kg, %.2f g/kg, %.3f m3/kg, wet bulb %.2f C\n", outdoor.specific_enthalpy / 1000.0,
           outdoor.humidity_ratio * 1000.0, outdoor.specific_volume, wet_bulb);

    /* A percentage where a fraction is meant is refused. */
    status = moistair_from_dry_bulb(34.0, MOISTAIR_RELATIVE_HUMIDITY, 38.0, *site, &outdoor, &error);
    return status == MOISTAIR_OUT_OF_RANGE ? !failed("as a percentage", status, &error) : 1;
}

/* Records as a logger keeps them, read in place; one sensor was dead for one record. */
static int columns(const moistair_basis *site)
{
    enum { ROWS = 4 };
    static const struct {
        double hour, dry_bulb, relative_humidity;
    } records[ROWS] = {{0.0, 18.5, 0.81}, {6.0, 16.0, 0.93}, {12.0, 31.0, -0.01}, {18.0, 33.5, 0.36}};
    const size_t stride = sizeof records[0] / sizeof(double);
    const moistair_column dry_bulb = {&records[0].dry_bulb, stride};
    const moistair_column relative_humidity = {&records[0].relative_humidity, stride};
    const moistair_column pressure = {&site->pressure, 0};
    double enthalpy[ROWS], dew_point[ROWS], *outputs[MOISTAIR_PROPERTY_COUNT] = {0};
    int32_t status[ROWS];
    moistair_column_report report;
    int32_t row, first;

    outputs[MOISTAIR_SPECIFIC_ENTHALPY] = enthalpy;
    outputs[MOISTAIR_DEW_POINT] = dew_point;
    first = moistair_state_columns(ROWS, dry_bulb, MOISTAIR_RELATIVE_HUMIDITY, relative_humidity, pressure,
                                   site->formulation,
                                   MOISTAIR_BIT(MOISTAIR_SPECIFIC_ENTHALPY) | MOISTAIR_BIT(MOISTAIR_DEW_POINT),
                                   outputs, status, &report, NULL);
    for (row = 0; row < ROWS; row++) {
        if (status[row] == MOISTAIR_OK)
            printf("%02.0f:00  %.1f kJ/kg, dew point %.2f C\n", records[row].hour, enthalpy[row] / 1000.0,
                   dew_point[row]);
        else
            printf("%02.0f:00  %s\n", records[row].hour, moistair_status_text(status[row]));
    }
    printf("%d of %d records are not good\n", (int)report.failed, ROWS);
    return !(first == MOISTAIR_OUT_OF_RANGE && report.failed == 1);
}

int main(void)
{
    moistair_basis site = {0.0, MOISTAIR_REAL_GAS, 0};
    if (moistair_abi_version() != MOISTAIR_ABI_VERSION) {
        printf("library and header do not fit\n");
        return 1;
    }
    return one_state(&site) || columns(&site);
}
