"""The results of one building as records, and as plain data."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field, fields
from typing import Any, Final

import numpy as np

from engine.editions import rules
from engine.require import Array

#: the rules that every package applies, in the order of the work
RULES: Final = (
    *("I_e", "T_0", "T_S", "T_a", "C_u", "T_max", "T"),
    *("C_s_plateau", "C_s_cap", "C_s_cap_long", "C_s_min", "C_s_min_S1", "C_s", "V"),
    *("exponent", "exponent_two", "C_vx", "F_x", "V_x", "M_x", "story_height"),
    *("delta_x", "Delta", "Delta_a", "rho_drift"),
    *("theta", "theta_max", "beta", "theta_amplifier"),
)


@dataclass(frozen=True, slots=True, kw_only=True, eq=False)
class DirectionResult:
    """Every step of one plan direction; arrays hold the levels as listed, ``None`` what had no inputs.

    Drifts and their limits are in the displacement unit. ``Delta_amplified`` carries the factor for
    P-delta, where vertical loads are given. ``delta_xe`` is a result where story stiffness gives it. ``more``
    holds the results of further parts by their symbols.
    """

    T_a: float
    C_u: float
    T_max: float
    T: float
    C_s_plateau: float
    C_s_cap: float
    C_s_min: float
    C_s_min_S1: float
    C_s: float
    governing_bound: str
    V: float
    k: float
    C_vx: Array
    F_x: Array
    V_x: Array
    V_base: float
    M_x: Array
    M_base: float
    Delta_a: Array
    beta_used: float
    theta_max: float
    delta_xe: Array | None = None
    delta_x: Array | None = None
    Delta: Array | None = None
    drift_ratio: Array | None = None
    theta: Array | None = None
    theta_factor: Array | None = None
    theta_verdict: tuple[str, ...] | None = None
    Delta_amplified: Array | None = None
    drift_over_limit: Array | None = None
    more: Mapping[str, Any] = field(default_factory=dict)


@dataclass(frozen=True, slots=True, kw_only=True, eq=False)
class Package:
    """The results of one building: its levels as listed, and each plan direction."""

    title: str
    edition: str
    units: str
    I_e: float
    T_0: float
    T_S: float
    W: float
    h_n: float
    levels: tuple[str, ...]
    w_x: Array
    h_x: Array
    h_sx: Array
    direction: dict[str, DirectionResult]
    warnings: tuple[str, ...]
    rules: tuple[str, ...] = RULES
    more: Mapping[str, Any] = field(default_factory=dict)

    def to_json(self) -> dict[str, Any]:
        """Return plain numbers, texts and lists, with the clause and any doubt of every rule applied."""
        known = rules(self.edition)
        clauses = {key: known[key] for key in self.rules if key in known}
        return {
            **_plain(self),
            "direction": {name: _plain(result) for name, result in self.direction.items()},
            "clauses": {key: str(found) for key, found in clauses.items()},
            "notes": {key: found.note for key, found in clauses.items() if found.note},
        }


def texts(words: Any) -> tuple[str, ...]:
    """Return texts of levels as a tuple of plain texts."""
    return tuple(str(text) for text in np.atleast_1d(words))


def _plain(record: Any) -> dict[str, Any]:
    values = {entry.name: getattr(record, entry.name) for entry in fields(record) if entry.name != "rules"}
    values |= values.pop("more")
    return {key: _plain_value(value) for key, value in values.items() if value is not None}


def _plain_value(value: Any) -> Any:
    if isinstance(value, np.ndarray):
        return value.tolist()
    return list(value) if isinstance(value, tuple) else value
