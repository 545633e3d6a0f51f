"""Random buildings as the tables of a BUILDING.toml: invented, physical, 1 to 100 levels."""

from __future__ import annotations

from typing import Any

import numpy as np
from hypothesis import strategies as st

from engine.drift import DRIFT_STRUCTURES
from engine.editions import EDITIONS
from engine.occupancy import RISK_CATEGORIES
from engine.period import PERIOD_SYSTEMS
from engine.units import SYSTEMS, US
from engine.vertical import EXPONENT_RULES


def _number(low: float, high: float) -> st.SearchStrategy[float]:
    return st.floats(low, high).map(lambda value: round(value, 3))


@st.composite
def directions(draw: Any) -> dict[str, Any]:
    """The table of one plan direction; half of them leave out what may be left out."""
    table = {
        "system": "an invented system",
        "R": draw(_number(1.5, 8.0)),
        "Omega_0": draw(_number(1.5, 3.0)),
        "C_d": draw(_number(1.5, 6.5)),
        "period_system": draw(st.sampled_from(PERIOD_SYSTEMS)),
        "drift_structure": draw(st.sampled_from(DRIFT_STRUCTURES)),
    }
    if draw(st.booleans()):
        table |= {"T_computed": draw(_number(0.1, 6.0)), "k_rule": draw(st.sampled_from(EXPONENT_RULES))}
        table |= {"rho": draw(st.sampled_from([1.0, 1.3])), "moment_frames_only": draw(st.booleans())}
        table |= {"beta": draw(_number(0.2, 1.0))}
    return table


@st.composite
def buildings(draw: Any, most: int = 100) -> dict[str, Any]:
    """The tables of a building; the levels stand in any order, with or without displacements."""
    units = draw(st.sampled_from(SYSTEMS))
    base = draw(st.sampled_from([0.0, 100.0, -12.5]))
    site = {
        "S_DS": draw(_number(0.2, 1.6)),
        "S_D1": draw(_number(0.05, 1.0)),
        "S_1": draw(_number(0.05, 0.9)),
        "T_L": draw(st.sampled_from([4.0, 6.0, 8.0, 12.0])),
        "risk_category": draw(st.sampled_from(RISK_CATEGORIES)),
        "base_elevation": base,
    }
    return {
        "title": "Invented building",
        "edition": draw(st.sampled_from(EDITIONS)),
        "units": units,
        "site": site,
        "direction": {"X": draw(directions()), "Y": draw(directions())},
        "level": _levels(draw, units, base, draw(st.integers(1, most))),
    }


def _levels(draw: Any, units: str, base: float, count: int) -> list[dict[str, Any]]:
    """The levels: one generator makes all their numbers, so that tall buildings are drawn fast."""
    seed = np.random.default_rng(draw(st.integers(0, 2**32 - 1)))
    story, weight, sway = (13.0, 1200.0, 0.2) if units == US else (4.0, 5000.0, 5.0)
    # at the digits an engineer writes: a workbook file keeps 16 of them
    elevations = np.round(base + np.cumsum(story * seed.uniform(0.8, 1.4, count)), 3)
    weights = np.round(weight * seed.uniform(0.2, 1.5, count), 2)
    displacements = np.round(np.cumsum(sway * seed.uniform(0.2, 1.2, (2, count)), axis=1), 4)
    with_drift = draw(st.booleans())
    levels = [
        {"name": f"L{n + 1}", "elevation": float(elevations[n]), "weight": float(weights[n])}
        | (
            {
                "P_x": round(1.2 * float(weights[n:].sum()), 2),
                "delta_xe_X": float(displacements[0, n]),
                "delta_xe_Y": float(displacements[1, n]),
            }
            if with_drift
            else {}
        )
        for n in range(count)
    ]
    return [levels[n] for n in seed.permutation(count)]
