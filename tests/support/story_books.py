"""Story workbooks for tests: invented buildings, workbooks made of them, both routes compared."""

from __future__ import annotations

from pathlib import Path
from typing import Any

from hypothesis import strategies as st

from engine.building import from_mapping, solve
from engine.drift import DRIFT_STRUCTURES
from engine.occupancy import RISK_CATEGORIES
from engine.period import PERIOD_SYSTEMS
from workbook_templates.build import build
from workbook_templates.read import Reader
from xlbridge.audit.routes import Agreement, compare
from xlbridge.headless.compute import Computed, compute


def story_book(folder: Path, given: dict[str, Any], level_count: int = 6, name: str = "story.xlsx") -> Path:
    """Write a story workbook without stored values."""
    path = folder / name
    path.write_bytes(build(given, level_count))
    return path


def routes(computed: Computed) -> Agreement:
    """Compare a computed workbook with the model route from the inputs read out of it."""
    reader = Reader(computed.evaluator.evaluate_text)
    return compare(reader.results(), solve(from_mapping(reader.inputs())).to_json())


def assert_routes_agree(path: Path, least: int) -> Computed:
    """Compute a workbook and require both routes to agree on at least so many results."""
    computed = compute(path)
    assert not computed.errors
    assert not computed.not_evaluated
    agreement = routes(computed)
    assert agreement.differences == ()
    assert agreement.compared >= least
    return computed


@st.composite
def buildings(draw: st.DrawFn, drift: bool = True, most: int = 100) -> dict[str, Any]:
    """Tables of a BUILDING.toml for invented buildings of 1 to ``most`` levels."""
    us = draw(st.booleans())
    count = draw(st.integers(1, most))
    heights = draw(st.lists(st.floats(8, 25) if us else st.floats(2.5, 8), min_size=count, max_size=count))
    base = draw(st.floats(-50, 500))
    tops = [base + sum(heights[: n + 1]) for n in range(count)]
    levels = [_level(draw, n, top, drift) for n, top in enumerate(tops)]
    return {
        "title": "Invented building",
        "edition": draw(st.sampled_from(("7-16", "7-22"))),
        "units": "us" if us else "si",
        "site": {
            "S_DS": draw(st.floats(0.2, 2.0)),
            "S_D1": draw(st.floats(0.1, 1.2)),
            "S_1": draw(st.floats(0.04, 1.0)),
            "T_L": draw(st.floats(4, 16)),
            "risk_category": draw(st.sampled_from(RISK_CATEGORIES)),
            "base_elevation": base,
        },
        "direction": {name: draw(_directions()) for name in ("X", "Y")},
        "level": draw(st.permutations(levels)),
    }


def _level(draw: st.DrawFn, number: int, elevation: float, drift: bool) -> dict[str, Any]:
    """A level whose loads and displacements keep theta well below 1, where a building is stable."""
    level = {"name": f"L{number}", "elevation": elevation, "weight": draw(st.floats(500, 2000))}
    if drift:
        level["P_x"] = draw(st.floats(0, 500))
        level |= {f"delta_xe_{d}": 0.1 * number + draw(st.integers(0, 100)) / 1000 for d in "XY"}
    return level


@st.composite
def _directions(draw: st.DrawFn) -> dict[str, Any]:
    direction = {
        "system": "invented",
        "R": draw(st.floats(1.5, 8)),
        "Omega_0": draw(st.floats(1.25, 3)),
        "C_d": draw(st.floats(1.25, 6.5)),
        "period_system": draw(st.sampled_from(PERIOD_SYSTEMS)),
        "drift_structure": draw(st.sampled_from(DRIFT_STRUCTURES)),
        "k_rule": draw(st.sampled_from(("interpolate", "two"))),
        "rho": draw(st.sampled_from((1.0, 1.3))),
        "moment_frames_only": draw(st.booleans()),
        "beta": draw(st.floats(0.1, 1.0)),
    }
    computed = draw(st.none() | st.floats(0.05, 8.0))
    return direction if computed is None else {**direction, "T_computed": computed}
