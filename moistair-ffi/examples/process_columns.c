/* A process on columns: what it takes and gives, and a heater over a log whose records are structures. */
#include <stdio.h>

#include "moistair.h"

#define ROWS 4

struct reading {
    double seconds, dry_bulb, humidity_ratio, heat;
};

int main(void)
{
    static const struct reading log[ROWS] = {
        {0.0, 5.0, 0.004, 10000.0}, {60.0, 5.2, 0.004, 12000.0}, {120.0, -300.0, 0.004, 12000.0}, {180.0, 5.1, 0.004, 0.0}};
    static const double pressure = 101325.0, flow = 1.2;
    const int32_t process = MOISTAIR_PROCESS_SENSIBLE_WITH_HEAT;
    const size_t stride = sizeof log[0] / sizeof(double);
    /* One field of each record, and one number for all rows. */
    const moistair_column inputs[5] = {
        {&log[0].dry_bulb, stride}, {&log[0].humidity_ratio, stride}, {&pressure, 0}, {&flow, 0}, {&log[0].heat, stride}};
    double dry_bulb[ROWS];
    double *outputs[8] = {NULL};
    int32_t status[ROWS];
    moistair_column_report report;
    moistair_field field;
    size_t i;

    printf("%s\n", moistair_process_name(process));
    for (i = 0; i < moistair_process_input_count(process); ++i)
        if (moistair_process_input(process, i, &field, NULL) == MOISTAIR_OK)
            printf("takes %s [%s]\n", field.name, field.unit);
    for (i = 0; i < moistair_process_output_count(process); ++i)
        if (moistair_process_output(process, i, &field, NULL) == MOISTAIR_OK)
            printf("gives %s [%s]\n", field.name, field.unit);

    /* Of the eight results one is wanted. */
    outputs[0] = dry_bulb;
    moistair_process_columns(ROWS, process, inputs, 5, MOISTAIR_REAL_GAS, outputs, 8, status, &report, NULL);
    for (i = 0; i < ROWS; ++i)
        if (status[i] == MOISTAIR_OK)
            printf("%3.0f s: %.2f °C\n", log[i].seconds, dry_bulb[i]);
        else
            printf("%3.0f s: %s\n", log[i].seconds, moistair_status_text(status[i]));
    return report.failed == 1 ? 0 : 1;
}
