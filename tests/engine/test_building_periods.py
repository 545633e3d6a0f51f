"""Periods in the model route: every formula and source, and what follows from the one that governs."""

from __future__ import annotations

from math import pi, sqrt
from typing import Any

import numpy as np
import pytest

from engine.building import Package, from_mapping, solve
from engine.errors import ImpossibleValue, MissingValue, NotApplicable
from engine.units import GRAVITY

FRAME = {"system": "frame", "R": 8, "Omega_0": 3, "C_d": 5.5, "drift_structure": "all other"}
STEEL = FRAME | {"period_system": "steel moment frame"}
OTHER = FRAME | {"period_system": "all other"}
SITE = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.5, "T_L": 8, "risk_category": "II"}
WALLS = [
    {"name": "A", "direction": "X", "area": 20.0, "length": 20.0},
    {"name": "B", "direction": "X", "area": 20.0, "length": 30.0},
]


def job(count: int = 7, story: float = 13.0, **more: Any) -> dict[str, Any]:
    levels = [{"name": f"L{n}", "elevation": n * story, "weight": 100.0} for n in range(1, count + 1)]
    return {
        "title": "A",
        "edition": "7-22",
        "units": "us",
        "site": SITE | {"N": count},
        "level": levels,
        "direction": {"X": STEEL},
    } | more


def solved(tables: dict[str, Any]) -> Package:
    return solve(from_mapping(tables))


def chosen(system: dict[str, Any] = STEEL, **entries: Any) -> dict[str, Any]:
    return {"direction": {"X": system | entries}}


def on_levels(tables: dict[str, Any], **columns: Any) -> dict[str, Any]:
    """The tables with further entries of each level, from the lowest up."""
    rows = [
        level | {key: float(values[place]) for key, values in columns.items()}
        for place, level in enumerate(tables["level"])
    ]
    return tables | {"level": rows}


def test_stories_give_a_tenth_of_a_second_each() -> None:
    found = solved(job(7, **chosen(T_a_rule="0.1 N")))
    X = found.direction["X"]
    assert pytest.approx(0.7) == X.T_a == X.T
    assert X.T_max == pytest.approx(1.4 * 0.7)  # C_u 1.4 where S_D1 is at least 0.4
    assert X.k == pytest.approx(1.1)  # 1 + (0.7 - 0.5)/2
    assert X.more["stories_status"] == "✓ permitted"
    assert X.more["T_a_stories"] == X.T_a
    assert X.more["T_a_height"] == pytest.approx(0.028 * 91**0.8)
    assert found.warnings == ()


def test_the_number_of_stories_is_that_entered_not_that_of_the_levels() -> None:
    found = solved(job(7, **chosen(T_a_rule="0.1 N"), site=SITE | {"N": 6}))
    assert found.direction["X"].T_a == pytest.approx(0.6)
    with pytest.raises(MissingValue, match=r"site\.N = blank: must be given where T_a_rule is 0\.1 N"):
        solved(job(7, **chosen(T_a_rule="0.1 N"), site=SITE))


@pytest.mark.parametrize(
    ("system", "story", "reason"),
    [
        (OTHER, 13.0, "not moment frames of concrete or steel alone"),
        (STEEL, 9.9, "average story height below 10 ft"),
    ],
)
def test_stories_where_they_are_not_permitted_are_a_warning(
    system: dict[str, Any], story: float, reason: str
) -> None:
    found = solved(job(7, story, **chosen(system, T_a_rule="0.1 N")))
    assert found.direction["X"].more["stories_status"] == f"✗ not permitted: {reason}"
    assert found.warnings == (f"direction X: T_a = 0.1 N not permitted: {reason}",)


def test_more_than_twelve_stories_are_refused() -> None:
    assert solved(job(12, **chosen(T_a_rule="0.1 N"))).direction["X"].T_a == pytest.approx(1.2)
    with pytest.raises(NotApplicable, match="N = 13: must be at most 12 stories"):
        solved(job(13, **chosen(T_a_rule="0.1 N")))


def test_walls_give_the_period_by_hand() -> None:
    """By hand: C_w = 100/4800 (20/(1 + 0.83 1.5^2) + 20/(1 + 0.83)), T_a = 0.0019 h_n/sqrt(C_w)."""
    tables = job(3, 10.0, **chosen(OTHER, T_a_rule="shear walls"), wall=WALLS, site=SITE | {"A_B": 4800.0})
    found = solved(tables)
    shares = [100 / 4800 * 20 / (1 + 0.83 * 2.25), 100 / 4800 * 20 / 1.83]
    assert found.more["C_w_wall"] == pytest.approx(shares)
    X = found.direction["X"]
    assert X.more["C_w"] == pytest.approx(sum(shares))
    assert X.T_a == pytest.approx(0.0019 * 30 / sqrt(sum(shares)))
    assert X.more["T_a_walls"] == X.T_a
    assert X.more["stories_status"] == "✓ not used"


def test_walls_need_rows_and_the_area_of_the_base() -> None:
    entries = chosen(OTHER, T_a_rule="shear walls")
    with pytest.raises(MissingValue, match=r"wall = blank: must have rows, and site\.A_B a value"):
        solved(job(3, 10.0, **entries))
    with pytest.raises(MissingValue, match=r"and site\.A_B a value"):
        solved(job(3, 10.0, **entries, wall=WALLS))


def test_a_direction_without_walls_has_no_period_by_walls() -> None:
    both = {"direction": {"X": OTHER, "Y": OTHER}, "wall": WALLS, "site": SITE | {"A_B": 4800.0}}
    assert (
        "C_w" not in solved(job(3, **both)).direction["Y"].more
    )  # no formula but that of the height is used
    both["direction"] = {"X": OTHER, "Y": OTHER | {"T_a_rule": "shear walls"}}
    with pytest.raises(ImpossibleValue, match="C_w = 0"):
        solved(job(3, 10.0, **both))


@pytest.mark.parametrize(
    ("wall", "message"),
    [
        ({"direction": "N"}, "wall 1 .*: direction = 'N': must be one of X, Y"),
        ({"area": 0.0}, "wall 1 .*: area = 0: must be above 0"),
        ({"length": -1.0}, "wall 1 .*: length = -1: must be above 0"),
    ],
)
def test_a_wall_that_cannot_be_is_refused(wall: dict[str, Any], message: str) -> None:
    with pytest.raises((ImpossibleValue, NotApplicable), match=message):
        from_mapping(job(wall=[WALLS[0] | wall]))


def test_rayleigh_with_one_level_by_hand() -> None:
    """By hand: T = 2 pi sqrt(w delta/(g F)) = 2 pi sqrt(100 0.5/(386.09 10)) = 0.715 s."""
    found = solved(on_levels(job(1, **chosen(T_source="Rayleigh")), f_x_X=[10.0], delta_f_X=[0.5]))
    X = found.direction["X"]
    assert X.more["T_rayleigh"] == pytest.approx(0.715, abs=5e-4)
    assert X.more["T_calculated"] == X.more["T_rayleigh"]
    assert pytest.approx(X.T_max) == X.T  # 1.4 x 0.028 x 13^0.8 = 0.305 s
    assert X.more["T_governs"] == "upper limit C_u T_a"


def test_story_stiffness_with_two_equal_stories() -> None:
    """Two equal masses on two equal stories: omega_1 = (sqrt(5) - 1)/2 sqrt(k/m), a closed form.

    A. K. Chopra, Dynamics of Structures, has the general two-story frame (chapter 10, from memory).
    """
    found = solved(on_levels(job(2, **chosen(T_source="story stiffness")), K_x_X=[200.0, 200.0]))
    X = found.direction["X"]
    omega = (sqrt(5) - 1) / 2 * sqrt(200 * GRAVITY["us"] / 100)
    assert X.more["T_stiffness"] == pytest.approx(2 * pi / omega, rel=1e-12)
    # the shape is 1 : golden ratio
    golden = (1 + sqrt(5)) / 2
    assert X.more["first_mode_share"] == pytest.approx((1 + golden) ** 2 / (2 * (1 + golden**2)))
    assert pytest.approx(min(2 * pi / omega, 1.4 * X.T_a)) == X.T


def test_rayleigh_with_the_forces_of_the_first_mode_is_its_period() -> None:
    """numpy's solver and a linear solve make forces and displacements; the routes must meet in one period."""
    K = np.array([900.0, 700.0, 650.0, 400.0])
    matrix = np.diag(K + np.append(K[1:], 0.0)) - np.diag(K[1:], 1) - np.diag(K[1:], -1)
    squares, shapes = np.linalg.eigh(matrix * GRAVITY["us"] / 100.0)  # all levels weigh 100 kip
    forces = 100.0 * np.abs(shapes[:, 0])
    columns = {"K_x_X": K, "f_x_X": forces, "delta_f_X": np.linalg.solve(matrix, forces)}
    by = {
        source: solved(on_levels(job(4, **chosen(T_source=source)), **columns)).direction["X"]
        for source in ("Rayleigh", "story stiffness")
    }
    expected = 2 * pi / sqrt(squares[0])
    for found in by.values():
        assert found.more["T_calculated"] == pytest.approx(expected, rel=1e-12)
    assert pytest.approx(by["story stiffness"].T) == by["Rayleigh"].T


def test_the_period_that_governs_runs_through_to_the_forces() -> None:
    stiff = on_levels(job(7, **chosen(T_source="story stiffness")), K_x_X=[150.0] * 7)
    T = solved(stiff).direction["X"].more["T_calculated"]
    X = solved(job(7, **chosen(T_computed=T))).direction["X"]
    found = solved(stiff).direction["X"]
    assert (found.T, found.C_s, found.k) == (X.T, X.C_s, X.k)
    assert X.T_a < T < X.T_max
    assert found.more["T_governs"] == "the computed period"
    np.testing.assert_array_equal(found.F_x, X.F_x)


def test_without_a_computed_period_the_approximate_one_governs() -> None:
    X = solved(job(7, parts=["periods"])).direction["X"]
    assert X.more["T_calculated"] == X.T_a == X.T
    assert X.more["T_governs"] == "approximate period T_a: none is computed"


@pytest.mark.parametrize(
    ("source", "entries"), [("Rayleigh", "f_x_X and delta_f_X"), ("story stiffness", "K_x_X")]
)
def test_a_source_without_its_entries_is_refused(source: str, entries: str) -> None:
    with pytest.raises(
        MissingValue, match=f"level: {entries} = blank: must be given where T_source is {source}"
    ):
        solved(job(**chosen(T_source=source)))


def test_a_job_that_does_not_ask_has_no_rows_of_periods() -> None:
    found = solved(job())
    assert found.more == {}
    assert not {"T_a_height", "T_calculated", "T_governs"} & set(found.direction["X"].more)


def test_stiffnesses_for_other_ends_are_no_period() -> None:
    found = solved(on_levels(job(2), K_x_X=[200.0, 200.0]))
    assert "T_stiffness" not in found.direction["X"].more


@pytest.mark.parametrize(
    ("tables", "message"),
    [
        (chosen(T_a_rule="0.1N"), "direction.X.T_a_rule = '0.1N': must be one of"),
        (chosen(T_source="computed"), "direction.X.T_source = 'computed': must be one of"),
        ({"site": SITE | {"N": 2.5}}, "site.N = 2.5: must be a whole number"),
        ({"site": SITE | {"A_B": 0.0}}, "site.A_B = 0: must be above 0"),
    ],
)
def test_entries_are_checked(tables: dict[str, Any], message: str) -> None:
    with pytest.raises((ImpossibleValue, NotApplicable), match=message):
        from_mapping(job(**tables))


def test_displacements_against_the_forces_are_refused_at_the_level() -> None:
    with pytest.raises(ImpossibleValue, match=r'level 1 \("L1"\): delta_f_X = -0.5: must be'):
        from_mapping(on_levels(job(1), f_x_X=[10.0], delta_f_X=[-0.5]))
