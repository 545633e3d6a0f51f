"""Ground motion from mapped values: the chain to C_s by hand, the exceptions of 11.4.8, every refusal."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest

from engine.building import Package, from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.read import Reader

FRAME = {"system": "invented", "R": 5.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"}
INCREASED, RAISED, SHORT = (
    "exception 2: C_s increased",
    "exception 2 of Supplement 3: S_M1 up 50 %",
    "exception 3: T at most T_S",
)


def tower(edition: str = "7-16", T: float | None = None, **site: Any) -> dict[str, Any]:
    """Tables of a building of two levels whose period is entered: C_u T_a is long at 200 ft."""
    base = {"S_1": 0.4, "T_L": 8.0, "risk_category": "II"}
    if not site:
        site = {"S_S": 1.0, "site_class": "D"}
    frame = FRAME | {"period_system": "all other"} | ({"T_computed": T} if T else {})
    return {
        **{"title": "Tower (invented)", "edition": edition, "units": "us"},
        "site": base | site,
        "direction": {"X": frame, "Y": FRAME | {"period_system": "all other", "T_computed": 0.3}},
        "level": [
            {"name": "Roof", "elevation": 200.0, "weight": 400.0, "source": "invented"},
            {"name": "Level 2", "elevation": 100.0, "weight": 600.0, "source": "invented"},
        ],
    }


def solved(**case: Any) -> Package:
    return solve(from_mapping(tower(**case)))


def test_the_chain_from_mapped_values_to_the_response_coefficient() -> None:
    """By hand from Tables 11.4-1 and 11.4-2 of 7-16 as remembered: F_a = 1.1, F_v = 1.9 for class D."""
    package = solved()
    found = {key: package.more[key] for key in ("F_a", "F_v", "S_MS", "S_M1", "S_DS", "S_D1")}
    assert found == pytest.approx(
        {"F_a": 1.1, "F_v": 1.9, "S_MS": 1.1, "S_M1": 0.76, "S_DS": 2.2 / 3, "S_D1": 1.52 / 3}, rel=1e-14
    )
    assert pytest.approx(0.76 / 1.1) == package.T_S
    assert package.direction["Y"].C_s == pytest.approx(2.2 / 3 / 5)
    assert package.more["hazard_status"] == "✗ class D or E with S_1 at least 0.2"
    assert package.more["SDC_A_permitted"] == "no"


def test_mapped_values_of_the_later_edition() -> None:
    package = solved(edition="7-22", S_MS=1.5, S_M1=0.9)
    assert pytest.approx((0.6, 0.12)) == (package.T_S, package.T_0)
    assert package.direction["Y"].C_s == pytest.approx(1.0 / 5)
    assert "hazard_status" not in package.more


@pytest.mark.parametrize(
    ("T", "factor", "text"),
    [
        (0.69, 1.0, "plateau S_DS/(R/I_e), Eq. 12.8-2"),  # below T_S = 0.6909
        (0.70, 0.70 / (0.76 / 1.1), "upper bound increased, exception 2 of 11.4.8"),
        (1.03, 1.03 / (0.76 / 1.1), "upper bound increased, exception 2 of 11.4.8"),  # below 1.5 T_S
        (1.04, 1.5, "upper bound increased, exception 2 of 11.4.8"),
    ],
)
def test_exception_2_as_first_printed(tmp_path: Path, T: float, factor: float, text: str) -> None:
    """11.4.8 of 7-16: the plateau up to 1.5 T_S, then 1.5 times the cap."""
    tables = tower(T=T, S_S=1.0, site_class="D", long_exception=INCREASED)
    package = solve(from_mapping(tables))
    x = package.direction["X"]
    assert x.T == T
    assert x.more["C_s_increase"] == pytest.approx(factor)
    plateau, cap = 2.2 / 3 / 5, 1.52 / 3 / (T * 5)
    assert x.C_s == pytest.approx(plateau if 1.5 * cap > plateau else 1.5 * cap)
    assert x.governing_bound == text
    assert package.more["hazard_status"] == "✓ none"
    computed = assert_routes_agree(story_book(tmp_path, tables), 60)
    assert computed.evaluator.evaluate_text("=governing_bound_X") == text


def test_a_minimum_still_governs_over_an_increased_bound(tmp_path: Path) -> None:
    """At S_1 = 0.75 and a long period the minimum 0.5 S_1/(R/I_e) is above 1.5 times the cap."""
    tables = tower(T=2.2, S_S=1.0, S_1=0.75, site_class="A", long_exception=INCREASED)
    tables["direction"]["X"]["period_system"] = "steel moment frame"
    x = solve(from_mapping(tables)).direction["X"]
    assert x.more["C_s_increase"] == 1.5
    assert x.C_s == pytest.approx(0.5 * 0.75 / 5)
    assert x.governing_bound == "minimum 0.5 S_1/(R/I_e), Eq. 12.8-6"
    assert_routes_agree(story_book(tmp_path, tables), 60)


def test_exception_2_of_supplement_3_raises_everything_after_it(tmp_path: Path) -> None:
    tables = tower(S_S=1.0, site_class="D", long_exception=RAISED)
    package = solve(from_mapping(tables))
    assert package.more["S_M1"] == pytest.approx(1.5 * 0.76)
    assert pytest.approx(1.5 * 0.76 / 1.1) == package.T_S
    assert package.direction["X"].more["C_s_increase"] == 1.0
    assert package.more["hazard_status"] == "✓ none"
    assert_routes_agree(story_book(tmp_path, tables), 60)


@pytest.mark.parametrize(("T", "status"), [(0.3, "✓ none"), (1.2, "✗ class D or E with S_1 at least 0.2")])
def test_exception_3_holds_to_T_S_in_both_directions(tmp_path: Path, T: float, status: str) -> None:
    tables = tower(T=T, S_S=0.6, S_1=0.1, site_class="E", long_exception=SHORT)
    tables["site"]["S_1"] = 0.2
    tables["site"]["site_class"] = "E"
    with pytest.raises(EngineError, match=r"11\.4\.8"):
        solve(from_mapping(tables))  # class E has no F_v from S_1 = 0.2 on
    tables["site"] |= {"S_1": 0.3, "site_class": "D"}
    package = solve(from_mapping(tables))
    assert package.more["hazard_status"] == "✗ class D or E with S_1 at least 0.2"  # it is one of class E


def test_an_open_trigger_fails_a_check(tmp_path: Path) -> None:
    computed = assert_routes_agree(story_book(tmp_path, tower()), 60)
    status = computed.evaluator.evaluate_text("=workbook_status")
    lifted = tower(S_S=1.0, site_class="D", long_exception=RAISED)
    other = assert_routes_agree(story_book(tmp_path, lifted, name="lifted.xlsx"), 60)
    assert str(status).startswith("✗ checks that do not hold: 1")
    assert not str(other.evaluator.evaluate_text("=workbook_status")).startswith("✗")


def test_entries_bring_the_part_along_and_come_back(tmp_path: Path) -> None:
    tables = tower(S_S=1.0, site_class="D", long_exception=RAISED, isolated=False)
    computed = assert_routes_agree(story_book(tmp_path, tables), 60)
    back = Reader(computed.evaluator.evaluate_text).inputs()
    assert "site_class" in back["parts"]
    assert {key: back["site"][key] for key in tables["site"]} == tables["site"]
    assert "S_DS" not in back["site"]


@pytest.mark.parametrize(
    ("edition", "site", "words"),
    [
        ("7-16", {"S_D1": 0.5}, "site.S_DS = blank: must be given beside S_D1"),
        ("7-16", {"S_S": 1.0}, "site.site_class = blank: must be given beside S_S"),
        ("7-22", {"S_MS": 1.0}, "site.S_M1 = blank: must be given beside S_MS"),
        (
            "7-16",
            {"base_elevation": 0.0},
            "site.S_DS = blank: must be given, or S_S and site_class",
        ),
        (
            "7-22",
            {"base_elevation": 0.0},
            "site.S_DS = blank: must be given, or S_MS and S_M1",
        ),
        (
            "7-22",
            {"S_S": 1.0, "site_class": "D"},
            "site.S_S = 1: is an entry of 7-16; give S_MS and S_M1",
        ),
        (
            "7-16",
            {"S_MS": 1.0, "S_M1": 0.5},
            "site.S_MS = 1: is an entry of 7-22; give S_S and site_class",
        ),
        (
            "7-22",
            {"S_DS": 1.0, "S_D1": 0.5, "S_MS": 1.0, "S_M1": 0.5},
            "site.S_MS = 1: must be left out beside S_DS: one way only",
        ),
        (
            "7-16",
            {"S_DS": 1.0, "S_D1": 0.5, "long_exception": INCREASED},
            "site.long_exception = 'exception 2: C_s increased': must be left out where S_S is not given",
        ),
        ("7-16", {"S_S": 1.0, "site_class": "F"}, "site.site_class = 'F': must be one of A, B"),
    ],
)
def test_refusals(edition: str, site: dict[str, Any], words: str) -> None:
    with pytest.raises(EngineError) as refused:
        from_mapping(tower(edition=edition, **site))
    assert words in str(refused.value)
