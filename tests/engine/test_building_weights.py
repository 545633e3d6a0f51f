"""Rows of the weight take-off in the model route: sums of the levels, what counts of each kind, refusals."""

from __future__ import annotations

from typing import Any

import pytest

from engine.building import from_mapping, solve, to_mapping
from engine.errors import ImpossibleValue, MissingValue, NotApplicable, WrongType

FRAME = {
    "system": "invented",
    "R": 5,
    "Omega_0": 2.5,
    "C_d": 5,
    "period_system": "all other",
    "drift_structure": "all other",
}


@pytest.fixture
def tables() -> dict[str, Any]:
    """Two levels with every kind of load; the loads are invented, in psf, ft2 and kip."""
    row = {"level": "Floor", "what": "a", "area": 10_000.0}
    return {
        "title": "Shed",
        "edition": "7-22",
        "units": "us",
        "site": {"S_DS": 0.6, "S_D1": 0.41, "S_1": 0.45, "T_L": 4, "risk_category": "II"},
        "direction": {"X": FRAME},
        "level": [{"name": "Roof", "elevation": 24.0}, {"name": "Floor", "elevation": 12.0}],
        "weight": [
            row | {"kind": "dead", "load": 80.0},
            row | {"kind": "partition", "load": 6.0},
            row | {"kind": "storage", "load": 120.0},
            row | {"kind": "garage storage", "load": 40.0},
            row | {"level": "Roof", "kind": "snow", "load": 60.0},
            row | {"level": "roof", "kind": "landscaping", "load": 20.0},
            {"level": "Roof", "what": "cooling tower", "kind": "equipment", "amount": 35.0},
        ],
    }


def test_rows_by_hand(tables: dict[str, Any]) -> None:
    """12.7.2 by hand: partitions at least 10 psf, a quarter of storage, 15 % of snow above 45 psf (7-22)."""
    package = solve(from_mapping(tables))
    assert package.more["load_counts"] == pytest.approx([80.0, 10.0, 30.0, 0.0, 9.0, 20.0, 0.0])
    assert package.more["row_weight"] == pytest.approx([800.0, 100.0, 300.0, 0.0, 90.0, 200.0, 35.0])
    assert package.w_x == pytest.approx([325.0, 1200.0])
    assert pytest.approx(1525.0) == package.W
    assert {"W_snow", "W_storage", "W_partitions"} <= set(package.rules)


def test_snow_counts_by_the_edition(tables: dict[str, Any]) -> None:
    """7-16: 20 % above 30 psf."""
    package = solve(from_mapping(tables | {"edition": "7-16"}))
    assert package.more["load_counts"][4] == pytest.approx(12.0)


def test_rows_and_typed_weights_give_the_same_forces(tables: dict[str, Any]) -> None:
    by_rows = solve(from_mapping(tables)).direction["X"]
    typed = {key: table for key, table in tables.items() if key != "weight"}
    for level, weight in zip(typed["level"], (325.0, 1200.0), strict=True):
        level["weight"] = weight
    assert solve(from_mapping(typed)).direction["X"].F_x == pytest.approx(by_rows.F_x, rel=1e-12)


def test_rows_come_back_as_plain_tables(tables: dict[str, Any]) -> None:
    assert to_mapping(from_mapping(tables))["weight"] == tables["weight"]


@pytest.mark.parametrize(
    ("row", "error", "match"),
    [
        (
            {"level": "Attic"},
            NotApplicable,
            r'weight 1 \("a"\): level = .Attic.: must be the name of one level',
        ),
        ({"kind": "live"}, NotApplicable, r'weight 1 \("a"\): kind'),
        ({"load": -1.0}, ImpossibleValue, r'weight 1 \("a"\): load = -1: must be at least 0'),
        (
            {"amount": 3.0},
            MissingValue,
            r'weight 1 \("a"\): area = .*: must be given with load, or amount alone',
        ),
        ({"load": None}, MissingValue, "must be given with load, or amount alone"),
        ({"loads": 3.0}, NotApplicable, r'weight 1 \("a"\): loads = 3: unknown key, did you mean load'),
    ],
)
def test_refusals_name_the_row(
    tables: dict[str, Any], row: dict[str, Any], error: type[Exception], match: str
) -> None:
    tables["weight"][0] |= row
    with pytest.raises(error, match=match):
        from_mapping(tables)


def test_a_weight_beside_rows_is_refused(tables: dict[str, Any]) -> None:
    tables["level"][1]["weight"] = 5.0
    with pytest.raises(NotApplicable, match=r'level 2 \("Floor"\): weight = 5: must be left out'):
        from_mapping(tables)


def test_two_levels_of_the_name_of_a_row_are_refused(tables: dict[str, Any]) -> None:
    tables["level"].append({"name": "floor", "elevation": 13.0})
    with pytest.raises(NotApplicable, match="must be the name of one level"):
        from_mapping(tables)


def test_rows_that_are_no_tables_are_refused(tables: dict[str, Any]) -> None:
    with pytest.raises(WrongType, match=r"weight = 5: must be an array of tables"):
        from_mapping(tables | {"weight": 5})
    with pytest.raises(WrongType, match=r"weight 1 = 5: must be a table"):
        from_mapping(tables | {"weight": [5]})


def test_rows_without_any_weight_are_refused(tables: dict[str, Any]) -> None:
    tables["weight"] = [{"level": "Roof", "what": "a", "kind": "equipment", "amount": 0.0}]
    with pytest.raises(ImpossibleValue, match="W = 0: must be above 0"):
        solve(from_mapping(tables))
