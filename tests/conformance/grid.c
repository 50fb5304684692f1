/* Evaluates the seeded grid through the C interface: by the calls for one state, or by columns.
 *
 * usage: grid states|columns INPUT OUTPUT
 * INPUT holds per row five doubles: dry bulb, second property, pressure, selector, formulation.
 * OUTPUT gets per row the status of the state as a double, then the properties in the order of their selectors.
 */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "moistair.h"

#define INPUTS 5
#define RESULTS (1 + MOISTAIR_PROPERTY_COUNT)
#define ALL (MOISTAIR_BIT(MOISTAIR_PROPERTY_COUNT) - 1)

static void fail(const char *what) {
    fprintf(stderr, "grid: %s\n", what);
    exit(1);
}

static void *allocate(size_t count, size_t size) {
    void *memory = calloc(count, size);
    if (memory == NULL) {
        fail("out of memory");
    }
    return memory;
}

/* The one NaN of the library. */
static double no_value(void) {
    const uint64_t bits = UINT64_C(0x7ff8000000000000);
    double value;
    memcpy(&value, &bits, sizeof value);
    return value;
}

static void one_state(const double *input, double *result) {
    moistair_basis basis = {0.0, 0, 0};
    moistair_state state;
    int32_t status;
    int i;
    basis.pressure = input[2];
    basis.formulation = (int32_t)input[4];
    for (i = 1; i < RESULTS; ++i) {
        result[i] = no_value();
    }
    status = moistair_from_dry_bulb(input[0], (int32_t)input[3], input[1], basis, &state, NULL);
    if (status == MOISTAIR_OK) {
        uint64_t have = 0;
        status = moistair_properties(&state, ALL, result + 1, &have, NULL);
        for (i = 0; i < MOISTAIR_PROPERTY_COUNT; ++i) {
            if ((result[1 + i] == result[1 + i]) != ((have & MOISTAIR_BIT(i)) != 0)) {
                fail("a value and its bit in the mask of those that have one disagree");
            }
        }
    }
    result[0] = (double)status;
}

/* Rows `first` to `last` share their second property and formulation; every one of them is given to one call. */
static void one_run(const double *inputs, double *results, size_t rows, double **columns, int32_t *status) {
    moistair_column dry_bulb, second, pressure;
    moistair_column_report report;
    size_t row;
    int32_t code;
    int i;
    dry_bulb.values = inputs;
    second.values = inputs + 1;
    pressure.values = inputs + 2;
    dry_bulb.stride = second.stride = pressure.stride = INPUTS;
    code = moistair_state_columns(rows, dry_bulb, (int32_t)inputs[3], second, pressure, (int32_t)inputs[4], ALL,
                                  (double *const *)columns, status, &report, NULL);
    if (code != MOISTAIR_OK && code < 200) {
        fail("the column call refuses its arguments");
    }
    for (row = 0; row < rows; ++row) {
        double *result = results + row * RESULTS;
        double dry_bulb = columns[MOISTAIR_DRY_BULB][row];
        /* A property without a value does not spoil the state; a row without a state has no dry bulb either. */
        result[0] = dry_bulb == dry_bulb ? 0.0 : (double)status[row];
        for (i = 0; i < MOISTAIR_PROPERTY_COUNT; ++i) {
            result[1 + i] = columns[i][row];
        }
    }
}

static int same_run(const double *a, const double *b) {
    return a[3] == b[3] && a[4] == b[4];
}

int main(int argc, char **argv) {
    FILE *file;
    double *inputs, *results, *columns[MOISTAIR_PROPERTY_COUNT];
    int32_t *status;
    size_t rows, row, end;
    int i;
    if (argc != 4) {
        fail("usage: grid states|columns INPUT OUTPUT");
    }
    file = fopen(argv[2], "rb");
    if (file == NULL || fseek(file, 0, SEEK_END) != 0) {
        fail("cannot read the input");
    }
    rows = (size_t)ftell(file) / (INPUTS * sizeof(double));
    rewind(file);
    inputs = allocate(rows * INPUTS, sizeof(double));
    results = allocate(rows * RESULTS, sizeof(double));
    status = allocate(rows, sizeof(int32_t));
    for (i = 0; i < MOISTAIR_PROPERTY_COUNT; ++i) {
        columns[i] = allocate(rows, sizeof(double));
    }
    if (fread(inputs, INPUTS * sizeof(double), rows, file) != rows) {
        fail("the input is cut short");
    }
    fclose(file);
    if (strcmp(argv[1], "states") == 0) {
        for (row = 0; row < rows; ++row) {
            one_state(inputs + row * INPUTS, results + row * RESULTS);
        }
    } else {
        for (row = 0; row < rows; row = end) {
            end = row + 1;
            while (end < rows && same_run(inputs + row * INPUTS, inputs + end * INPUTS)) {
                ++end;
            }
            one_run(inputs + row * INPUTS, results + row * RESULTS, end - row, columns, status);
        }
    }
    file = fopen(argv[3], "wb");
    if (file == NULL || fwrite(results, RESULTS * sizeof(double), rows, file) != rows || fclose(file) != 0) {
        fail("cannot write the output");
    }
    return 0;
}
