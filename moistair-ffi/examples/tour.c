/* A short tour: a state of moist air, what can be read from it, and a coil that cools it. */
#include <stdio.h>

#include "moistair.h"

int main(void)
{
    moistair_basis site = {0.0, MOISTAIR_REAL_GAS, 0};
    moistair_state outdoor, leaving;
    moistair_stream entering;
    moistair_cooling cooling;
    double value[MOISTAIR_PROPERTY_COUNT], flow;
    int32_t status = moistair_pressure_at_elevation(1600.0, &site.pressure, NULL);

    if (status == MOISTAIR_OK)
        status = moistair_from_dry_bulb(34.0, MOISTAIR_RELATIVE_HUMIDITY, 0.38, site, &outdoor, NULL);
    if (status == MOISTAIR_OK)
        status = moistair_properties(&outdoor, MOISTAIR_BIT(MOISTAIR_WET_BULB) | MOISTAIR_BIT(MOISTAIR_DEW_POINT),
                                     value, NULL, NULL);
    if (status == MOISTAIR_OK)
        status = moistair_from_dry_bulb(13.0, MOISTAIR_RELATIVE_HUMIDITY, 0.95, site, &leaving, NULL);
    if (status == MOISTAIR_OK)
        status = moistair_stream_from_volume_flow(&outdoor, 5.0, &entering, NULL);
    if (status == MOISTAIR_OK)
        status = moistair_coil_to_state(&entering, &leaving, MOISTAIR_CONDENSATE_AT_LEAVING_AIR, 0.0, &cooling, NULL);
    if (status == MOISTAIR_OK)
        status = moistair_unit_from_core(MOISTAIR_UNIT_KILOGRAM_PER_HOUR, cooling.condensate, &flow, NULL);
    if (status != MOISTAIR_OK) {
        printf("%s\n", moistair_status_text(status));
        return 1;
    }
    printf("wet bulb   %.2f °C\n", value[MOISTAIR_WET_BULB]);
    printf("dew point  %.2f °C\n", value[MOISTAIR_DEW_POINT]);
    printf("enthalpy   %.2f kJ/kg\n", outdoor.specific_enthalpy / 1000.0);
    printf("load       %.2f kW\n", cooling.cooling_load / 1000.0);
    printf("condensate %.2f kg/h\n", flow);
    return 0;
}
