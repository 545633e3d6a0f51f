"""The comparison of two routes: what counts as the same, and that every kind of difference is seen."""

from __future__ import annotations

from copy import deepcopy
from typing import Any

import pytest

from xlbridge.audit.routes import Agreement, Difference, compare
from xlbridge.values import CellError

MODEL: dict[str, Any] = {
    "W": 2600.0,
    "h_x": [12.0, 24.0, 36.0],
    "levels": ["Level 2", "Level 3", "Roof"],
    "direction": {
        "X": {"V": 286.0, "governing_bound": "plateau", "F_x": [26.0, 48.0, 60.1]},
        "Y": {"V": 143.0, "governing_bound": "cap", "F_x": [13.0, 24.0, 30.05]},
    },
    "warnings": [],
}
LEAVES = 17


def changed(path: str, value: Any) -> dict[str, Any]:
    """The model's results with one of them replaced."""
    cells = deepcopy(MODEL)
    *way, last = [int(key) if key.isdigit() else key for key in path.split("/")]
    place: Any = cells
    for key in way:
        place = place[key]
    place[last] = value
    return cells


def test_equal_results_agree() -> None:
    assert compare(deepcopy(MODEL), MODEL) == Agreement(LEAVES, ())


@pytest.mark.parametrize(
    ("path", "value", "name", "model"),
    [
        ("W", 2600.1, "W", 2600.0),
        ("h_x/1", 24.5, "h_x[2]", 24.0),
        ("levels/2", "roof", "levels[3]", "Roof"),
        ("direction/X/V", 286.0 * (1 + 2e-12), "direction.X.V", 286.0),
        ("direction/Y/V", -143.0, "direction.Y.V", 143.0),
        ("direction/Y/governing_bound", "plateau", "direction.Y.governing_bound", "cap"),
        ("direction/X/F_x/0", 0.0, "direction.X.F_x[1]", 26.0),
        ("direction/X/F_x", [26.0, 48.0], "direction.X.F_x", [26.0, 48.0, 60.1]),
        ("direction/X/F_x", [], "direction.X.F_x", [26.0, 48.0, 60.1]),
        ("direction/X/F_x", [26.0, 48.0, 60.1, 0.0], "direction.X.F_x", [26.0, 48.0, 60.1]),
        ("direction/X/F_x", 26.0, "direction.X.F_x", [26.0, 48.0, 60.1]),
        ("direction/X", 286.0, "direction.X", MODEL["direction"]["X"]),
        ("W", "2600", "W", 2600.0),
        ("W", None, "W", 2600.0),
        ("W", float("nan"), "W", 2600.0),
        ("W", float("inf"), "W", 2600.0),
        ("W", CellError("#NUM!", "why"), "W", 2600.0),
        ("levels/0", 2.0, "levels[1]", "Level 2"),
        ("levels/0", None, "levels[1]", "Level 2"),
    ],
    ids=str,
)
def test_a_difference_is_named(path: str, value: Any, name: str, model: Any) -> None:
    agreement = compare(changed(path, value), MODEL)
    assert [d.path for d in agreement.differences] == [name]
    found = agreement.differences[0]
    assert found.model == model
    assert found.cell is value


@pytest.mark.parametrize("place", range(3))
def test_several_differences_are_all_named(place: int) -> None:
    cells = changed(f"direction/X/F_x/{place}", -1.0)
    cells["direction"]["Y"]["F_x"][place] = -2.0
    cells["W"] = 0.0
    assert [d.path for d in compare(cells, MODEL).differences] == [
        "W",
        f"direction.X.F_x[{place + 1}]",
        f"direction.Y.F_x[{place + 1}]",
    ]


def test_round_off_is_no_difference() -> None:
    assert compare({"V": 286.0 * (1 + 5e-13)}, {"V": 286.0}) == Agreement(1, ())
    assert compare({"V": 0.1 + 0.2}, {"V": 0.3}).differences == ()


def test_zero_agrees_with_zero_alone() -> None:
    assert compare({"M_x": 0.0}, {"M_x": 0.0}).differences == ()
    assert compare({"M_x": 1e-300}, {"M_x": 0.0}).differences == (Difference("M_x", 1e-300, 0.0),)


@pytest.mark.parametrize(("cell", "model"), [(1.0, True), (True, 1.0), (1.0, 1), ("1", 1), (None, False)])
def test_values_of_different_types_differ(cell: Any, model: Any) -> None:
    assert compare({"x": cell}, {"x": model}).differences == (Difference("x", cell, model),)


def test_two_error_values_agree_by_code_only_if_both_are_errors() -> None:
    assert compare({"x": CellError("#NUM!", "a")}, {"x": CellError("#NUM!", "b")}).differences == ()
    assert compare({"x": CellError("#NUM!")}, {"x": CellError("#N/A")}).differences != ()
    assert compare({"x": CellError("#NUM!")}, {"x": "#NUM!"}).differences != ()


def test_a_key_of_one_route_alone_is_not_counted() -> None:
    """Nothing to compare is nothing compared: the count says so."""
    assert compare({"V": 1.0, "mine": 2.0}, {"V": 1.0, "theirs": 3.0}) == Agreement(1, ())
    assert compare({}, MODEL) == Agreement(0, ())
    assert compare({"direction": {"X": {}}}, MODEL) == Agreement(0, ())
    assert compare({"warnings": []}, MODEL) == Agreement(0, ())


def test_the_order_of_the_keys_is_free() -> None:
    turned = {key: MODEL[key] for key in reversed(MODEL)}
    assert compare(turned, MODEL) == Agreement(LEAVES, ())
