"""Formulations by their names."""

from __future__ import annotations

from typing import Any, Literal, Union

__all__ = ["Formulation", "formulation_code"]

Formulation = Union[Literal["real_gas"], Literal["ideal_gas"], Literal["helmholtz"]]

_CODES = {"real_gas": 0, "ideal_gas": 1, "helmholtz": 2}


def formulation_code(name: Any) -> tuple[str, int]:
    """The label and code of a formulation, as a call of the core takes it."""
    if name not in _CODES:
        raise ValueError(f"formulation must be {' or '.join(repr(known) for known in _CODES)}, not {name!r}")
    return "formulation", _CODES[name]
