"""Multi-period and site-specific spectra, Method 1 of C_s, and the S_DS of short regular buildings.

Values by hand from the clauses as CODE_FACTS of the project quotes them: 21.4, 12.8.1.1 and 12.8.1.3.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import FIGURES
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

#: invented MCE_R pairs, not in order: the peak lies at 0.1 s, left of 0.2 s
PAIRS = {
    **{1.0: 0.9, 0.0: 0.6, 0.1: 1.8, 0.2: 1.5, 0.3: 1.35, 0.5: 1.2, 0.75: 1.05, 1.5: 0.66, 2.0: 0.45},
    **{3.0: 0.27, 4.0: 0.18, 5.0: 0.12, 7.5: 0.06, 10.0: 0.03},
}
FRAME = {
    **{"system": "invented", "R": 5.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}
METHOD_1 = {"C_s_method": "method 1"}


def house(edition: str = "7-22", x: dict[str, Any] | None = None, **site: Any) -> dict[str, Any]:
    """Tables of a building of two levels on this spectrum; T_a = 0.19 s at 20 ft."""
    base = {"S_1": 0.4, "T_L": 8.0, "risk_category": "II", "v_s": 900.0}
    if edition == "7-16":
        base |= {"S_DS_mapped": 1.0, "S_D1_mapped": 0.5}
    return {
        **{"title": "House (invented)", "edition": edition, "units": "us"},
        "site": {key: value for key, value in (base | site).items() if value is not None},
        "direction": {"X": FRAME | (x or {}), "Y": dict(FRAME)},
        "multi_period": [{"T": T, "S_a": S_a} for T, S_a in PAIRS.items()],
        "level": [
            {"name": "Roof", "elevation": 20.0, "weight": 400.0, "source": "invented"},
            {"name": "Level 2", "elevation": 10.0, "weight": 600.0, "source": "invented"},
        ],
    }


class TestParameters:
    def test_the_later_edition(self, tmp_path: Path) -> None:
        """S_DS = 0.9 x 1.0; T S_a peaks at 1.5 s with 0.66; 0.9 x 0.66 < S_a(1 s) = 0.6."""
        package = solve(from_mapping(house()))
        found = {key: package.more[key] for key in ("S_DS", "S_D1", "S_MS", "S_M1")}
        assert found == pytest.approx({"S_DS": 0.9, "S_D1": 0.6, "S_MS": 1.35, "S_M1": 0.9}, rel=1e-14)
        assert package.more["S_ai"].tolist() == pytest.approx([2 / 3 * value for value in PAIRS.values()])
        assert_routes_agree(story_book(tmp_path, house()), 85)

    def test_the_earlier_edition_has_no_share_and_a_floor(self, tmp_path: Path) -> None:
        """S_D1 = 0.66 without the 0.9; the floor is 80 % of the mapped values."""
        tables = house("7-16")
        package = solve(from_mapping(tables))
        assert (package.more["S_DS"], package.more["S_D1"]) == pytest.approx((0.9, 0.66))
        floored = solve(from_mapping(house("7-16", S_DS_mapped=1.2, S_D1_mapped=0.9)))
        assert (floored.more["S_DS"], floored.more["S_D1"]) == pytest.approx((0.96, 0.72))
        assert_routes_agree(story_book(tmp_path, tables), 70)

    def test_ordinates_of_the_design_spectrum_are_taken_as_they_are(self, tmp_path: Path) -> None:
        tables = house(ordinates_given="design")
        assert solve(from_mapping(tables)).more["S_DS"] == pytest.approx(0.9 * 1.5)
        assert_routes_agree(story_book(tmp_path, tables), 85)


class TestMethods:
    @pytest.mark.parametrize(
        ("T_computed", "S_a", "C_s", "governs"),
        [
            (0.05, 1.2, 0.24, "spectrum S_a/(R/I_e), Eq. 12.8-2"),  # left of the peak at 0.1 s: the peak
            (0.15, 1.1, 0.22, "spectrum S_a/(R/I_e), Eq. 12.8-2"),  # between 1.2 and 1.0
            (None, 1.0 + (0.2 - 0.18915) * 2, None, "spectrum S_a/(R/I_e), Eq. 12.8-2"),
        ],
    )
    def test_method_1(
        self, tmp_path: Path, T_computed: float | None, S_a: float, C_s: float | None, governs: str
    ) -> None:
        tables = house(x=METHOD_1 | ({"T_computed": T_computed} if T_computed else {}))
        x = solve(from_mapping(tables)).direction["X"]
        assert x.more["S_a_method1"] == pytest.approx(S_a, rel=1e-4)
        assert x.C_s == pytest.approx(x.more["C_s_spectrum"])
        assert x.C_s == pytest.approx(C_s or S_a / 5, rel=1e-4)
        assert x.governing_bound == governs
        computed = assert_routes_agree(story_book(tmp_path, tables), 85)
        assert computed.evaluator.evaluate_text("=governing_bound_X") == governs

    def test_method_2_is_the_default_and_has_no_peak_of_the_spectrum(self) -> None:
        x = solve(from_mapping(house(x={"T_computed": 0.05}))).direction["X"]
        assert x.C_s == pytest.approx(0.9 / 5)
        assert x.governing_bound == "plateau S_DS/(R/I_e), Eq. 12.8-3"

    def test_a_minimum_governs_over_method_1(self) -> None:
        tables = house(x=METHOD_1 | {"R": 8.0}, S_1=1.2, ordinates_given="MCE_R")
        for row in tables["multi_period"]:
            row["S_a"] /= 3
        x = solve(from_mapping(tables)).direction["X"]
        assert x.C_s == pytest.approx(0.5 * 1.2 / 8)
        assert x.governing_bound == "minimum 0.5 S_1/(R/I_e), Eq. 12.8-7"


class TestWorkbook:
    def test_entries_come_back(self, tmp_path: Path) -> None:
        tables = house(x=METHOD_1)
        computed = assert_routes_agree(story_book(tmp_path, tables), 85)
        back = Reader(computed.evaluator.evaluate_text).inputs()
        assert back["multi_period"] == tables["multi_period"]
        assert back["direction"]["X"]["C_s_method"] == "method 1"
        assert {key: back["site"][key] for key in tables["site"]} == tables["site"]

    def test_the_figure_marks_both_directions(self, tmp_path: Path) -> None:
        book = openpyxl.load_workbook(story_book(tmp_path, house()))
        (chart,) = [c for c in book[FIGURES]._charts if len(c.series) == 4]
        assert [series.yVal.numRef.f for series in chart.series][-2:] == [
            book.defined_names[f"S_a_multi_{d}"].attr_text.replace("Criteria!", "'Criteria'!") for d in "XY"
        ]

    @pytest.mark.parametrize(
        ("change", "line"),
        [
            ({"C13": None}, "Every period has an ordinate"),
            ({"A13": 1.0}, "Periods that stand twice"),
        ],
    )
    def test_a_check_fails(self, tmp_path: Path, change: dict[str, Any], line: str) -> None:
        path = story_book(tmp_path, house())
        book = openpyxl.load_workbook(path)
        headings = {cell.value: cell.column_letter for cell in book["Motion"][6]}
        for address, value in change.items():
            column = headings["S_a, given"] if address.startswith("C") else headings["T_i"]
            book["Motion"][f"{column}{address[1:]}"].value = value
        book.save(path)
        computed = compute(path)
        row = next(row for row in book["Checks"].iter_rows(min_row=8) if row[1].value == line)[0].row
        assert str(computed.values["Checks", f"I{row}"]).startswith("✗")


ANSWERS = {"N": 5.0, "regular": True, "redundant": True, "soft_site": False}


class TestShortBuilding:
    def short(self, **site: Any) -> dict[str, Any]:
        tables = house(**{"v_s": None, "S_DS": 1.6, "S_D1": 0.8, **ANSWERS, **site})
        return {key: value for key, value in tables.items() if key != "multi_period"}

    @pytest.mark.parametrize(
        ("site", "used", "status"),
        [
            ({}, 1.12, "permitted"),
            ({"S_DS": 1.2}, 1.0, "permitted"),
            ({"S_DS": 0.8}, 0.8, "permitted"),
            ({"N": 6.0}, 1.6, "not permitted: more than 5 stories"),
            ({"regular": False}, 1.6, None),
            ({"redundant": False}, 1.6, None),
            ({"soft_site": True}, 1.6, None),
            ({"risk_category": "III"}, 1.6, None),
        ],
    )
    def test_the_cap_and_its_conditions(
        self, tmp_path: Path, site: dict[str, Any], used: float, status: str | None
    ) -> None:
        """Los Angeles County Code, Title 26, 1613.7.4: S_DS = 1.0, at least 70 % of S_DS."""
        tables = self.short(**site)
        package = solve(from_mapping(tables))
        x = package.direction["X"]
        assert x.more["S_DS_C"] == pytest.approx(used)
        assert x.C_s == pytest.approx(used * package.I_e / 5)
        assert x.C_s_min == pytest.approx(0.044 * used * package.I_e)
        assert x.more["S_DS_status"].startswith(status or "not permitted: ")
        assert_routes_agree(story_book(tmp_path, tables), 48)

    def test_a_longer_period_loses_the_cap_in_its_direction_alone(self, tmp_path: Path) -> None:
        tables = self.short()
        for level, z in zip(tables["level"], (70.0, 35.0), strict=True):
            level["elevation"] = z
        tables["direction"]["X"]["T_computed"] = 0.51  # T_a = 0.484 s
        package = solve(from_mapping(tables))
        assert [package.direction[d].more["S_DS_C"] for d in "XY"] == pytest.approx([1.6, 1.12])
        assert_routes_agree(story_book(tmp_path, tables), 48)

    def test_it_stands_beside_both_methods(self, tmp_path: Path) -> None:
        """Method 2 takes the capped S_DS; Method 1 takes it in its minimum alone."""
        tables = house(x=METHOD_1, **ANSWERS)
        for row in tables["multi_period"]:
            row["S_a"] *= 2
        package = solve(from_mapping(tables))
        x, y = package.direction["X"], package.direction["Y"]
        assert (package.more["S_DS"], y.more["S_DS_C"]) == pytest.approx((1.8, 1.26))
        assert y.C_s == pytest.approx(1.26 / 5)
        assert x.C_s == pytest.approx(x.more["S_a_method1"] / 5)
        assert_routes_agree(story_book(tmp_path, tables), 85)


@pytest.mark.parametrize(
    ("edition", "change", "words"),
    [
        ("7-22", {"v_s": None}, "site.v_s = blank: must be given beside rows of multi_period"),
        ("7-22", {"S_DS": 1.0, "S_D1": 0.5}, "site.v_s = 900: must be left out beside S_DS: one way only"),
        ("7-22", {"S_DS_mapped": 1.0}, "site.S_DS_mapped = 1: is an entry of 7-16"),
        ("7-16", {"S_D1_mapped": None}, "site.S_D1_mapped = blank: must be given: 80 % of it is a floor"),
        ("7-22", {"N": 2.5}, "site.N = 2.5: must be a whole number"),
    ],
)
def test_refusals(edition: str, change: dict[str, Any], words: str) -> None:
    with pytest.raises(EngineError) as refused:
        from_mapping(house(edition, **change))
    assert str(refused.value).startswith(words)


def test_method_1_needs_the_spectrum_and_the_later_edition() -> None:
    tables = house(x=METHOD_1, v_s=None, S_DS=1.0, S_D1=0.5)
    del tables["multi_period"]
    for given in (tables, house("7-16", x=METHOD_1)):
        with pytest.raises(EngineError, match=r"direction\.X\.C_s_method = 'method 1': needs 7-22 and rows"):
            from_mapping(given)


def test_a_spectrum_that_does_not_reach_far_enough_is_refused() -> None:
    tables = house()
    tables["multi_period"] = [row for row in tables["multi_period"] if row["T"] < 4]
    with pytest.raises(EngineError, match=r"must reach from 0\.2 s to 5 s"):
        solve(from_mapping(tables))
