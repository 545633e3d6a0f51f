"""Systems: the table as a sheet and as a suggestion, height limits, combinations, through cells and model.

Values of Table 12.2-1 as in the project's table, whose rows carry source and confidence.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine import systems
from engine.building import DirectionResult, from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.parts.systems import SYSTEMS
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

BRACED = "B. Steel special concentrically braced frames"
FRAME = {
    **{"system": "braced frames", "R": 6.0, "Omega_0": 2.0, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}


def tower(height: float = 160.0, x: dict[str, Any] | None = None, **change: Any) -> dict[str, Any]:
    """Tables of a building of braced frames in Seismic Design Category D: limit 160 ft."""
    site = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.4, "T_L": 8.0, "risk_category": "II", "SDC": "D"}
    level = {"weight": 100.0, "source": "invented"}
    return {
        **{"title": "Braced tower (invented)", "edition": "7-16", "units": "us", "parts": ["systems"]},
        "site": site,
        "direction": {"X": FRAME | {"table_system": BRACED} | (x or {}), "Y": dict(FRAME)},
        "level": [{"name": f"L{n}", "elevation": height * n / 2, **level} for n in (2, 1)],
        **change,
    }


def x(tables: dict[str, Any]) -> DirectionResult:
    return solve(from_mapping(tables)).direction["X"]


def test_the_suggestion_beside_the_entries(tmp_path: Path) -> None:
    tables = tower()
    more = x(tables).more
    assert (more["table_R"], more["table_Omega"], more["table_C_d"]) == (6.0, 2.0, 5.0)
    assert more["system_status"] == "✓ as the table"
    assert solve(from_mapping(tables)).direction["Y"].more["table_R"] == "-"
    computed = assert_routes_agree(story_book(tmp_path, tables), 400)
    assert computed.evaluator.evaluate_text("=table_R_X") == 6.0
    assert computed.evaluator.evaluate_text("=table_R_Y") == "-"


def test_a_difference_is_shown_and_the_entry_rules(tmp_path: Path) -> None:
    tables = tower(x={"R": 5.0})
    found = x(tables)
    assert found.more["system_status"].startswith("! differs: table R = 6")
    assert found.C_s_plateau == pytest.approx(1.0 / 5.0)
    computed = assert_routes_agree(story_book(tmp_path, tables), 400)
    assert "to be looked at" in str(computed.evaluator.evaluate_text("=workbook_status"))


@pytest.mark.parametrize(
    ("height", "x_entries", "sign"),
    [
        (160.0, {}, "✓ within the limit: 160 ft"),
        (160.2, {}, "✗ above the limit: 160 ft"),
        (240.0, {"height_increase": True}, "✓ within the limit: 240 ft"),
        (240.2, {"height_increase": True}, "✗ above the limit: 240 ft"),
    ],
)
def test_height_limits(tmp_path: Path, height: float, x_entries: dict[str, Any], sign: str) -> None:
    tables = tower(height, x=x_entries)
    assert x(tables).more["height_status"].startswith(sign)
    computed = assert_routes_agree(story_book(tmp_path, tables), 400)
    failed = str(computed.evaluator.evaluate_text("=workbook_status")).startswith("✗")
    assert failed is sign.startswith("✗")


def test_the_reduction_of_the_overstrength_for_flexible_diaphragms() -> None:
    """Less 0.5 from 2.5 on: Omega_0 = 2.0 of this row is not reduced."""
    assert x(tower(x={"omega_reduction": "flexible diaphragms"})).more["Omega_permitted"] == 2.0
    walls = "A. Special reinforced concrete shear walls"
    more = x(tower(x={"table_system": walls, "omega_reduction": "flexible diaphragms"})).more
    assert more["Omega_permitted"] == more["table_Omega"] - 0.5


@pytest.mark.parametrize("edition", ["7-16", "7-22"])
def test_the_sheet_lists_the_edition_and_feeds_the_choice(tmp_path: Path, edition: str) -> None:
    path = story_book(tmp_path, tower(edition=edition))
    book = openpyxl.load_workbook(path)
    area = book.defined_names["system_list"].attr_text.rpartition("!")[2].replace("$", "")
    names = tuple(row[0].value for row in book["Systems"][area])
    assert names == SYSTEMS[edition]
    assert len(names) > 60
    rules = [
        rule for rule in book["Criteria"].data_validations.dataValidation if rule.formula1 == "=system_list"
    ]
    cell = book.defined_names["table_system_X"].attr_text.rpartition("!")[2].replace("$", "")
    assert any(cell in rule.sqref for rule in rules)


def test_systems_whose_numbers_are_uncertain_are_not_listed_and_give_none() -> None:
    """Those that 7-22 added: the numbers are the engineer's own entries, with no row of the table named."""
    added = set(systems.SYSTEMS["7-22"]) - set(systems.SYSTEMS["7-16"])
    assert added
    assert not added & set(SYSTEMS["7-22"])
    with pytest.raises(EngineError):
        x(tower(x={"table_system": min(added)}, edition="7-22"))


def test_a_named_system_without_a_design_category_is_refused() -> None:
    tables = tower(x={"table_system": SYSTEMS["7-16"][0]})
    del tables["site"]["SDC"]
    with pytest.raises(EngineError, match=r"site\.SDC.*table_system"):
        x(tables)


def test_a_word_that_is_not_listed_is_an_error_cell_and_a_refusal(tmp_path: Path) -> None:
    tables = tower(x={"table_system": "B. Bamboo frames"})
    with pytest.raises(EngineError, match="Bamboo"):
        x(tables)
    errors = compute(story_book(tmp_path, tables)).errors
    assert any("Bamboo" in error["reason"] for error in errors)


class TestCombinations:
    def together(self) -> dict[str, Any]:
        rows = ((8.0, 3.0, 5.5), (5.0, 2.5, 4.5), (6.0, 2.5, 5.0))
        tables = tower(x={"R": 5.0, "Omega_0": 2.5, "C_d": 4.5}, parts=[])
        tables["system"] = [
            {"name": f"System {n}"}
            | {f"system_{s}_X": value for s, value in zip(("R", "Omega_0", "C_d"), row, strict=True)}
            for n, row in enumerate(rows, start=1)
        ]
        return tables

    def test_the_least_R_with_its_other_coefficients(self, tmp_path: Path) -> None:
        """12.2.3.3: R is the least, C_d and Omega_0 those of the system with it."""
        tables = self.together()
        more = x(tables).more
        assert (more["R_least"], more["Omega_0_of_least"], more["C_d_of_least"]) == (5.0, 2.5, 4.5)
        assert solve(from_mapping(tables)).direction["Y"].more["R_least"] == "-"
        computed = assert_routes_agree(story_book(tmp_path, tables), 70)
        assert Reader(computed.evaluator.evaluate_text).inputs()["system"] == tables["system"]

    def test_the_coefficients_of_the_least_R_fail_no_check(self, tmp_path: Path) -> None:
        assert self.status(tmp_path).startswith("! no check fails")

    @pytest.mark.parametrize("entry", [{"R": 6.0}, {"Omega_0": 2.0}, {"C_d": 4.0}])
    def test_a_coefficient_on_the_unsafe_side_of_them_fails_a_check(
        self, tmp_path: Path, entry: dict[str, float]
    ) -> None:
        assert self.status(tmp_path, **entry).startswith("✗")

    def status(self, tmp_path: Path, **entries: float) -> str:
        tables = self.together()
        tables["direction"]["X"] |= entries
        computed = assert_routes_agree(story_book(tmp_path, tables), 70)
        return str(computed.evaluator.evaluate_text("=workbook_status"))

    @pytest.mark.parametrize(
        ("above", "below", "lower", "factor"),
        [
            ((6.5, 3.0, 4.0), (5.0, 2.5, 5.0), (5.0, 2.5, 5.0), 1.3),
            ((5.0, 2.5, 5.0), (6.5, 3.0, 4.0), (5.0, 2.5, 5.0), 1.0),
        ],
    )
    def test_one_above_another(
        self, tmp_path: Path, above: Any, below: Any, lower: tuple[float, ...], factor: float
    ) -> None:
        """12.2.3.1: the lower part takes the coefficients of the lower R; forces times R_upper/R_lower."""
        symbols = ("R", "Omega_0", "C_d")
        entries = {f"above_{s}": value for s, value in zip(symbols, above, strict=True)}
        entries |= {f"below_{s}": value for s, value in zip(symbols, below, strict=True)}
        tables = tower(x=entries, parts=["combinations"])
        more = x(tables).more
        assert tuple(more[f"lower_part_{s}"] for s in symbols) == lower
        assert more["transfer_factor"] == pytest.approx(factor)
        assert_routes_agree(story_book(tmp_path, tables), 70)

    def test_a_coefficient_alone_is_refused(self) -> None:
        tables = self.together()
        del tables["system"][1]["system_C_d_X"]
        with pytest.raises(
            EngineError,
            match=r'system 2 \("System 2"\): system_C_d_X = blank: must be given with',
        ):
            from_mapping(tables)
