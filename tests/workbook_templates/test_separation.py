"""Separation and drift along the edges: by hand, through cells and model.

Separation as in ASCE/SEI 7-16, 12.12.3 (R. Wang, Primer: ASCE 7-16 Seismic Chapters, 2022): delta_M =
C_d delta_max/I_e, and the root of the sum of the squares between two structures.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import DirectionResult, from_mapping, solve
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import LEVELS
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

FRAME = {
    **{"system": "invented", "R": 8.0, "Omega_0": 3.0, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}


def pair(edition: str = "7-16", **site: Any) -> dict[str, Any]:
    """Tables of a building of three levels beside one of two: the roof stands free."""
    levels = [
        {"name": name, "elevation": z, "weight": 400.0, "P_x": 500.0 * n, "source": "invented"}
        | {"delta_xe_X": d, "delta_xe_Y": d / 2}
        for n, (name, z, d) in enumerate(
            (("Roof", 36.0, 0.9), ("Level 3", 24.0, 0.6), ("Level 2", 12.0, 0.3)), start=1
        )
    ]
    given = {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"}
    return {
        **{"title": "Two neighbours (invented)", "edition": edition, "units": "us"},
        "site": given | site,
        "direction": {"X": dict(FRAME), "Y": dict(FRAME)},
        "level": levels,
    }


def x(tables: dict[str, Any]) -> DirectionResult:
    return solve(from_mapping(tables)).direction["X"]


class TestSeparation:
    def neighbours(self, edition: str = "7-16", **more: float) -> dict[str, Any]:
        tables = pair(edition)
        for level, other, gap in zip(tables["level"], (None, 4.0, 2.0), (None, 5.0, 2.4), strict=True):
            level |= {"delta_M2_X": other, "gap_X": gap} if gap else {}
            level |= {f"{key}_X": value for key, value in more.items()}
        return tables

    def test_two_structures(self, tmp_path: Path) -> None:
        """delta_M = 5 x 0.6 = 3.0, with 4.0 of the other 5.0; below, 1.5 with 2.0 is 2.5 > 2.4."""
        tables = self.neighbours()
        more = x(tables).more
        assert more["delta_M"] == pytest.approx([4.5, 3.0, 1.5])
        assert more["delta_MT"] == pytest.approx([4.5, 5.0, 2.5])
        assert more["gap_status"] == ("-", "✓ wide enough", "✗ too narrow")
        computed = assert_routes_agree(story_book(tmp_path, tables), 110)
        assert str(computed.evaluator.evaluate_text("=workbook_status")).startswith("✗")

    def test_a_property_line_asks_for_the_own_displacement_alone(self, tmp_path: Path) -> None:
        tables = pair()
        for level in tables["level"]:
            level["gap_X"] = 4.5
        assert x(tables).more["gap_status"] == ("✓ wide enough",) * 3
        tables["level"][0]["gap_X"] = 4.4
        assert x(tables).more["gap_status"] == ("✗ too narrow", "✓ wide enough", "✓ wide enough")
        assert_routes_agree(story_book(tmp_path, tables), 110)

    def test_the_later_edition_counts_the_diaphragm(self, tmp_path: Path) -> None:
        """7-22, uncertain: delta_DE, with the deflection of the diaphragm added."""
        earlier, later = (self.neighbours(e, delta_di=0.2, delta_max=1.0) for e in ("7-16", "7-22"))
        assert x(earlier).more["delta_M"] == pytest.approx([5.0] * 3)
        assert x(later).more["delta_M"] == pytest.approx([5.2] * 3)
        assert x(later).more["delta_MCE"] == pytest.approx([1.5 * (8.0 * 1.0 + 0.2)] * 3)
        assert_routes_agree(story_book(tmp_path, later), 110)

    def test_entries_come_back_with_their_blanks(self, tmp_path: Path) -> None:
        tables = self.neighbours()
        computed = compute(story_book(tmp_path, tables))
        back = Reader(computed.evaluator.evaluate_text).inputs()
        assert "separation" in back["parts"]
        assert [level.get("gap_X") for level in back["level"]] == [None, 5.0, 2.4]
        assert [level.get("delta_M2_X") for level in back["level"]] == [None, 4.0, 2.0]

    def test_a_neighbour_without_a_clear_distance_fails_a_check(self, tmp_path: Path) -> None:
        tables = self.neighbours()
        tables["level"][1] |= {"gap_X": None}
        tables["level"][2] |= {"gap_X": 9.0}
        path = story_book(tmp_path, tables)
        computed = compute(path)
        rows = openpyxl.load_workbook(path)["Checks"].iter_rows(min_row=11)
        line = "Levels with another structure and no clear distance"
        found = [row[1].row for row in rows if row[1].value == line]
        verdicts = [str(computed.values["Checks", f"I{row}"])[0] for row in found]
        assert verdicts == ["✗", "✓"]


class TestEdgeDrift:
    def twisted(self, **site: Any) -> dict[str, Any]:
        tables = pair(**({"SDC": "D"} | site))
        tables["parts"] = ["edge_drift"]
        for level in tables["level"]:
            d = level["delta_xe_X"]
            level |= {"L_perp_X": 80.0, "L_perp_Y": 80.0, "d_1_X": 1.5 * d, "d_2_X": 0.5 * d}
            level |= {"d_1_Y": d / 2, "d_2_Y": d / 2}
        return tables

    def test_edges_count_with_an_irregularity(self, tmp_path: Path) -> None:
        """Ratio 1.5: the drift of edge 1, 1.5 times that of the centre, in the limit and in theta."""
        tables = self.twisted()
        found = x(tables)
        assert found.more["Delta_checked"] == pytest.approx([1.5 * 5 * 0.3] * 3)
        plain = tables | {"parts": []}
        assert found.theta == pytest.approx(1.5 * x(plain).theta)
        assert found.drift_over_limit is not None
        assert (found.drift_over_limit > 1.49 * x(plain).drift_over_limit).all()
        computed = assert_routes_agree(story_book(tmp_path, tables), 150)
        assert computed.evaluator.evaluate_text("=edges_due") == "yes"

    @pytest.mark.parametrize("change", [{"SDC": "B"}, {"diaphragms": "flexible"}])
    def test_else_the_centre_of_mass_does(self, tmp_path: Path, change: dict[str, str]) -> None:
        tables = self.twisted(**change)
        assert x(tables).more["Delta_checked"] == pytest.approx([5 * 0.3] * 3)
        assert_routes_agree(story_book(tmp_path, tables), 150)

    def test_the_column_says_so(self, tmp_path: Path) -> None:
        sheet = openpyxl.load_workbook(story_book(tmp_path, self.twisted()))[LEVELS]
        headings = {cell.value: cell.column_letter for cell in sheet[6]}
        assert headings["Delta, checked X"] in sheet[f"{headings['Delta, P-delta X']}12"].value
        assert headings["Delta, checked X"] in sheet[f"{headings['theta X']}12"].value
