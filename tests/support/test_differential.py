"""The comparison itself can fail."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest

from tests.support.differential import Refused, alike, differences, require_listed
from xlbridge.values import CellError

CELLS = {"=A1": [("Plain", "A1")], "{=A1:A2}": [("Arrays", "A3"), ("Arrays", "A4")]}
SAME = {("Plain", "A1"): 1.0, ("Arrays", "A3"): "x", ("Arrays", "A4"): True}
TABLE = """
[sums]
reason = "because"
[sums.ours]
'=A1' = '1'
"""


@pytest.mark.parametrize(
    ("left", "right", "same"),
    [
        (1.0, 1.0 + 1e-13, True),
        (1.0, 1.0 + 1e-11, False),
        (0.0, 1e-300, False),
        (1.0, True, False),
        ("1", 1.0, False),
        ("a", "A", False),
        (None, "", False),
        (CellError("#N/A"), CellError("#N/A", "why"), True),
        (CellError("#N/A"), CellError("#NUM!"), False),
        (Refused("why"), Refused("why"), False),
    ],
)
def test_alike(left: Any, right: Any, same: bool) -> None:
    assert alike(left, right) is same


def test_a_difference_is_found_in_any_cell_of_a_formula() -> None:
    assert differences(CELLS, SAME, SAME) == {}
    assert list(differences(CELLS, SAME, SAME | {("Arrays", "A4"): False})) == ["{=A1:A2}"]
    assert list(differences(CELLS, SAME, {("Plain", "A1"): 1.0})) == ["{=A1:A2}"]


def test_differences_must_be_listed_as_they_are(tmp_path: Path) -> None:
    table = tmp_path / "differences.toml"
    table.write_text(TABLE, encoding="utf-8")
    require_listed({"=A1": ([1.0], [2.0])}, table)
    with pytest.raises(AssertionError, match="ours 3, theirs #N/A"):
        require_listed({"=A1": ([1.0], [2.0]), "=A2": ([3.0], [CellError("#N/A")])}, table)
    with pytest.raises(AssertionError, match="no difference"):
        require_listed({}, table)
    with pytest.raises(AssertionError):
        require_listed({"=A1": ([1.5], [2.0])}, table)


def test_a_reason_is_due(tmp_path: Path) -> None:
    table = tmp_path / "differences.toml"
    table.write_text(TABLE.replace("because", " "), encoding="utf-8")
    with pytest.raises(AssertionError, match="sums"):
        require_listed({"=A1": ([1.0], [2.0])}, table)
