"""The exception by story drift ratios of 12.3.2.2, worked out from the drifts of both directions."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest

from engine.building import from_mapping, solve
from tests.support.story_books import assert_routes_agree, story_book

FRAME = {
    **{"system": "invented", "R": 6.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}
#: elastic drifts of the stories from the top down [in]: the lowest is 1.25 or 1.4 times the next
EVEN, BENT = (0.10, 0.20, 0.20, 0.25), (0.10, 0.20, 0.20, 0.28)


def soft(x: tuple[float, ...] = EVEN, y: tuple[float, ...] = EVEN, **change: Any) -> dict[str, Any]:
    """Tables of a building whose first story is soft: below 80 % of the mean of the three above."""
    levels = []
    for n in range(4):
        level = {"name": f"L{4 - n}", "elevation": 12.0 * (4 - n), "weight": 100.0, "P_x": 100.0 * (n + 1)}
        level |= {"delta_xe_X": sum(x[n:]), "delta_xe_Y": sum(y[n:]), "source": "invented"}
        for name in "XY":
            level |= {f"K_x_{name}": 75.0 if n == 3 else 100.0}
            level |= {f"strength_{name}": 100.0, f"L_sys_{name}": 60.0}
        levels.append(level)
    return {
        **{"title": "Soft story (invented)", "edition": "7-16", "units": "us", "parts": ["drift_ratios"]},
        "site": {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II", "SDC": "D"},
        "direction": {"X": dict(FRAME), "Y": dict(FRAME)},
        "level": levels,
        **change,
    }


@pytest.mark.parametrize(
    ("x", "y", "exception", "soft_type"),
    [
        (EVEN, EVEN, "yes", "none"),
        (BENT, EVEN, "no", "soft story"),
        (EVEN, BENT, "no", "soft story"),
    ],
)
def test_the_exception_holds_only_in_both_directions(
    tmp_path: Path, x: tuple[float, ...], y: tuple[float, ...], exception: str, soft_type: str
) -> None:
    """Ratio 1.25 or 1.4 against 1.3; the top two stories are not compared, or the roof's 2.0 would count."""
    tables = soft(x, y)
    package = solve(from_mapping(tables))
    assert package.more["drift_exception"] == exception
    assert package.direction["X"].more["soft_type"] == soft_type
    assert package.direction["X"].more["drift_ratio_above"][-1] == pytest.approx(x[3] / x[2])
    computed = assert_routes_agree(story_book(tmp_path, tables), 200)
    assert computed.evaluator.evaluate_text("=drift_exception") == exception


def test_without_the_part_the_entry_rules(tmp_path: Path) -> None:
    tables = soft(BENT, BENT, parts=[])
    tables["site"]["drift_exception"] = True
    package = solve(from_mapping(tables))
    assert "drift_exception" not in package.more
    assert package.direction["X"].more["soft_type"] == "none"
    assert_routes_agree(story_book(tmp_path, tables), 200)
