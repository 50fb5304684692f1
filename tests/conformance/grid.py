"""Evaluates the seeded grid through the installed Python package: a state at a time, or arrays.

usage: grid.py states|arrays INPUT OUTPUT
INPUT holds per row five doubles: dry bulb, second property, pressure, selector, formulation.
OUTPUT gets per row the status of the state as a double, then the properties in the order of their selectors.
"""

import sys

import numpy as np

import moistair

NAMES = moistair.PROPERTIES
FORMULATIONS = ("real_gas", "ideal_gas", "helmholtz")


def one_state(row, result):
    dry_bulb, value, pressure, selector, formulation = row.tolist()
    second = {NAMES[int(selector)]: value}
    try:
        air = moistair.MoistAir(
            dry_bulb=dry_bulb, pressure=pressure, formulation=FORMULATIONS[int(formulation)], **second
        )
    except moistair.MoistAirError as error:
        result[0] = error.code
        return
    result[0] = 0.0
    for place, name in enumerate(NAMES, start=1):
        try:
            result[place] = getattr(air, name)
        except moistair.NoValueError:
            pass


def one_array(rows, results):
    selector, formulation = (int(number) for number in rows[0, 3:])
    air = moistair.MoistAir(
        dry_bulb=rows[:, 0], pressure=rows[:, 2], formulation=FORMULATIONS[formulation], **{NAMES[selector]: rows[:, 1]}
    )
    results[:, 0] = air.status
    for place, name in enumerate(NAMES, start=1):
        results[:, place] = getattr(air, name)


def main(way, source, target):
    rows = np.fromfile(source, dtype="<f8").reshape(-1, 5)
    results = np.full((len(rows), 1 + len(NAMES)), np.nan)
    if way == "states":
        for row, result in zip(rows, results):
            one_state(row, result)
    else:
        for selectors in np.unique(rows[:, 3:], axis=0):
            chosen = (rows[:, 3:] == selectors).all(axis=1)
            part = results[chosen]
            one_array(rows[chosen], part)
            results[chosen] = part
    results.astype("<f8").tofile(target)


if __name__ == "__main__":
    main(*sys.argv[1:])
