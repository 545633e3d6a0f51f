"""Load effects: factors of the combinations of the edition, and the effects on members."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import load_effects
from engine.building.records import Building, MemberRow
from engine.building.results import Package

RULES: Final = ("E_h", "E_v", "E_v_spectrum", "E_mh", "E_cl", "combination")
ADDITIVE, COUNTERACTING = load_effects.COMBINATIONS[:2]


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the factors, and the effects on the members that are listed."""
    site = building.site
    asked = "load_effects" in building.parts or site.S_av is not None or site.vertical_case is not None
    if not (asked or building.member):
        return {}
    rows = [_effects(building, row) for row in building.member]
    members = {key: np.array([row[key] for row in rows]) for key in (rows[0] if rows else ())}
    return {**_factors(building), **members}


def _vertical(building: Building, D: float) -> float:
    """The vertical effect [the unit of D]: from the vertical spectrum where it is given."""
    site = building.site
    if site.S_av is not None:
        return float(load_effects.vertical_effect_spectrum(site.S_av, D))
    case = site.vertical_case or load_effects.VERTICAL_CASES[0]
    return float(load_effects.vertical_effect(site.S_DS, D, case))


def _factors(building: Building) -> dict[str, Any]:
    factors = {
        term: np.array(
            [
                float(load_effects.combination_factor(word, term, building.edition))
                for word in load_effects.COMBINATIONS
            ]
        )
        for term in load_effects.TERMS
    }
    unit = _vertical(building, 1.0)
    return {
        "E_v_unit": unit,
        "combination_name": load_effects.COMBINATIONS,
        **{f"c_{term}": values for term, values in factors.items()},
        "c_dead": factors["D"] + factors["E_v"] * unit,
    }


def _effects(building: Building, row: MemberRow) -> dict[str, float]:
    given = building.direction[row.direction]
    E_h = float(load_effects.horizontal_effect(given.rho, row.Q_E))
    E_v = _vertical(building, row.D)
    if row.E_cl is None:
        E_mh = float(load_effects.overstrength_effect(given.Omega_0, row.Q_E))
    else:
        E_mh = float(load_effects.limited_overstrength_effect(given.Omega_0, row.Q_E, row.E_cl))

    def sums(combination: str, effect: float) -> list[float]:
        loads = row.L, row.S, building.edition
        both = (effect, -effect)
        return [float(load_effects.combined_effect(combination, row.D, E_v, E, *loads)) for E in both]

    return {
        **{"E_h": E_h, "E_v": E_v, "E_mh": E_mh},
        "U_most": max(sums(ADDITIVE, E_h)),
        "U_least": min(sums(COUNTERACTING, E_h)),
        "U_m_most": max(sums(ADDITIVE, E_mh)),
        "U_m_least": min(sums(COUNTERACTING, E_mh)),
    }
