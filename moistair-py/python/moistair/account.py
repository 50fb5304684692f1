"""Totals over time: heat, water, means of states, counts, deviations, and how well the books close.

Sums are compensated, time is counted in whole microseconds, and what is not covered by trusted samples is never counted as
zero: a total carries its coverage. All classes can be pickled, copied and merged (hours into a day, channels into a plant).
"""

from __future__ import annotations

import enum

from ._core import BooksTotal, Counts, Deviation, Period, Periods, Residuals, Sum, Total

__all__ = [
    "Added",
    "BooksTotal",
    "Counts",
    "Deviation",
    "Period",
    "Periods",
    "Residuals",
    "Rule",
    "Sum",
    "Total",
]


class Rule(enum.IntEnum):
    """What a rate does between two samples."""

    STEP = 0
    """Step."""
    TRAPEZOID = 1
    """Trapezoid."""


class Added(enum.IntEnum):
    """What became of the time before a sample."""

    STARTED = 0
    """Started."""
    COUNTED = 1
    """Counted."""
    HOLE = 2
    """Hole."""
    GAP = 3
    """Gap."""
    TIME_REFUSED = 4
    """Time refused."""
    OVERFLOW = 5
    """Overflow."""
