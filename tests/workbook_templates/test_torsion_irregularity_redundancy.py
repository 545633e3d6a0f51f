"""Torsion, irregularities and redundancy: a crooked building through cells and model, each finding seen."""

from __future__ import annotations

from copy import deepcopy
from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import from_mapping, solve
from engine.errors import MissingValue
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import FIGURES
from workbook_templates.read import Reader
from xlbridge.headless.compute import Computed, compute

SYSTEM: dict[str, Any] = {
    "system": "invented",
    **{"R": 6.0, "Omega_0": 2.5, "C_d": 5.0},
    **{"period_system": "all other", "drift_structure": "all other"},
}
#: from the roof down: d_1, d_2 [in], K_x [kip/in], strength [kip], L_sys [ft], weight [kip]
STORIES = {
    "Roof": (2.30, 1.60, 700.0, 700.0, 60.0, 300.0),
    "Level 4": (1.80, 1.20, 720.0, 720.0, 60.0, 480.0),
    "Level 3": (1.20, 0.80, 740.0, 740.0, 60.0, 760.0),
    "Level 2": (0.70, 0.20, 430.0, 470.0, 80.0, 500.0),
}


def crooked(edition: str = "7-16") -> dict[str, Any]:
    """Tables of an invented building: X has every irregularity, Y none of the stories."""
    levels = []
    for n, (name, (d_1, d_2, K, strength, L, weight)) in enumerate(STORIES.items()):
        bent = {"d_1": d_1, "d_2": d_2, "K_x": K, "strength": strength, "L_sys": L}
        straight = {"d_1": d_1, "d_2": d_1, "K_x": 700.0, "strength": 700.0, "L_sys": 60.0}
        plan = {"L_perp": 80.0, "x_M": 40.0, "x_R": 31.0}
        level = {"name": name, "elevation": 13.0 * (4 - n), "weight": weight, "source": "invented"}
        level |= {f"{key}_X": value for key, value in (bent | plan).items()}
        level |= {f"{key}_Y": value for key, value in (straight | plan | {"x_R": 42.0}).items()}
        levels.append(level)
    site = {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II", "SDC": "D"}
    plan = {"reentrant_ratio": 0.18, "diaphragm_opening": 0.55, "diaphragm_change": 0.1}
    plan |= {"out_of_plane_offset": True, "nonparallel_system": False}
    x = {**SYSTEM, "in_plane_discontinuity": True, "configuration": "a: loss of one element"}
    return {
        **{"title": "Crooked building (invented)", "edition": edition, "units": "us"},
        "site": {**site, **plan},
        "direction": {"X": x, "Y": {**SYSTEM, "in_plane_discontinuity": False}},
        "parts": ["redundancy"],
        "level": levels,
    }


def cells(computed: Computed) -> dict[str, Any]:
    """Return the results in the cells by the keys of the model route."""
    return Reader(computed.evaluator.evaluate_text).results()


def verdicts(computed: Computed) -> dict[tuple[str, str], str]:
    """Return the verdict of each check line by its text and direction."""
    rows = {address for sheet, address in computed.values if sheet == "Checks" and address[0] == "I"}
    ask = computed.evaluator.evaluate_text
    return {
        (str(ask(f"=Checks!B{a[1:]}")), str(ask(f"=Checks!C{a[1:]}"))): str(ask(f"=Checks!{a}")) for a in rows
    }


@pytest.fixture(scope="module")
def older(tmp_path_factory: pytest.TempPathFactory) -> Computed:
    return assert_routes_agree(story_book(tmp_path_factory.mktemp("older"), crooked("7-16")), 265)


@pytest.fixture(scope="module")
def newer(tmp_path_factory: pytest.TempPathFactory) -> Computed:
    return assert_routes_agree(story_book(tmp_path_factory.mktemp("newer"), crooked("7-22")), 265)


def test_edge_drifts_and_amplification_by_plain_arithmetic(older: Computed) -> None:
    x = cells(older)["direction"]["X"]
    drifts = [(0.5, 0.4), (0.6, 0.4), (0.5, 0.6), (0.7, 0.2)]
    assert x["TIR"] == pytest.approx([2 * max(pair) / sum(pair) for pair in drifts])
    assert x["A_x"] == pytest.approx([1.0, 1.0, 1.0, (0.70 / (1.2 * 0.45)) ** 2])
    assert x["A_x_full"] == x["A_x"]
    shares = [0.05 * 80.0 * F * A for F, A in zip(x["F_x"], x["A_x"], strict=True)]
    assert x["M_ta"] == pytest.approx([sum(shares[: n + 1]) for n in range(4)])
    assert x["M_t"] == pytest.approx([9.0 * V for V in x["V_x"]])
    assert cells(older)["direction"]["Y"]["M_t"] == pytest.approx(
        [-2.0 * V for V in cells(older)["direction"]["Y"]["V_x"]]
    )


def test_every_irregularity_is_found_with_its_type_in_the_older_edition(older: Computed) -> None:
    found = cells(older)
    x, y = found["direction"]["X"], found["direction"]["Y"]
    assert x["torsion_status"] == ["✓ no irregularity"] * 3 + ["! Type 1b, extreme torsional"]
    assert x["soft_status"][-1] == "! Type 1b, extreme soft story"
    assert x["weak_status"][-1] == "! Type 5b, extreme weak story"
    assert x["geometric_status"][-1] == "! Type 3, geometric"
    assert found["weight_status"] == [
        *["✓ no irregularity"] * 2,
        *["! Type 2, weight", "✓ no irregularity"],
    ]
    assert found["reentrant_status"].startswith("! Type 2, re-entrant corner")
    assert found["discontinuity_status"] == "! Type 3, diaphragm discontinuity"
    assert found["out_of_plane_status"] == "! Type 4, out-of-plane offset"
    assert found["nonparallel_status"] == "✓ no irregularity"
    assert x["in_plane_status"] == "! Type 4, in-plane discontinuity"
    assert {y[f"{key}_entails"] for key in ("torsion", "soft", "weak", "geometric", "in_plane")} == {"-"}
    assert x["weak_entails"] == "12.3.3.1: not permitted (from memory)"
    assert found["nonparallel_entails"] == "-"


def test_the_newer_edition_numbers_and_judges_otherwise(newer: Computed) -> None:
    found = cells(newer)
    x = found["direction"]["X"]
    assert x["torsion_type"] == "Type 1, torsional, ratio above 1.4"
    assert "rho = 1.3 where the ratio is above 1.4 in both directions" in x["torsion_entails"]
    assert x["weak_status"][-1] == "! Type 4b, extreme weak story"
    assert set(found["weight_status"]) == {"✓ no type of 7-22"}
    assert found["reentrant_status"] == "✓ no irregularity: limit 20 % (uncertain)"


def test_the_checks_ask_for_a_look_at_each_finding(older: Computed) -> None:
    looks = {line for line, verdict in verdicts(older).items() if verdict == "! look"}
    assert looks == {
        ("Largest torsional irregularity ratio is not above 1.2", "X"),
        ("Levels with a weight irregularity, not exempt", "both"),
        ("Soft stories, not exempt", "X"),
        ("Weak stories", "X"),
        ("Stories with a geometric irregularity", "X"),
        ("In-plane discontinuity", "X"),
        ("Re-entrant corner", "both"),
        ("Diaphragm discontinuity", "both"),
        ("Out-of-plane offset", "both"),
        ("Redundancy factor as entered is that of the rule", "X"),
        ("Redundancy factor as entered is that of the rule", "Y"),
    }


def test_redundancy_follows_the_edition(older: Computed, newer: Computed) -> None:
    """Condition a is met in X alone; a ratio above 1.4 in one direction rules it out in 7-16 alone."""
    assert [cells(older)["direction"][d]["rho_rule"] for d in "XY"] == [1.3, 1.3]
    assert [cells(newer)["direction"][d]["rho_rule"] for d in "XY"] == [1.0, 1.3]
    assert cells(newer)["direction"]["X"]["rho_reason"] == "1.0: condition a of 12.3.4.2 is met"


def test_flexible_diaphragms_take_no_torsion(tmp_path: Path) -> None:
    tables = crooked()
    tables["site"]["diaphragms"] = "flexible"
    found = cells(assert_routes_agree(story_book(tmp_path, tables), 265))
    x = found["direction"]["X"]
    assert x["TIR_max"] == found["TIR_building"] == 1.0
    assert x["A_x"] == [1.0] * 4
    assert x["torsion_status"] == ["✓ not for flexible diaphragms"] * 4
    assert x["torsion_entails"] == "-"
    assert x["rho_reason"] == "1.0: condition a of 12.3.4.2 is met"


def test_exempt_stories_are_shown_but_entail_nothing(tmp_path: Path) -> None:
    tables = crooked()
    tables["site"]["drift_exception"] = True
    computed = assert_routes_agree(story_book(tmp_path, tables), 265)
    found = cells(computed)
    x = found["direction"]["X"]
    assert x["soft_status"][-1] == "! Type 1b, extreme soft story, exempt by story drift ratios (12.3.2.2)"
    assert (x["soft_type"], x["soft_entails"]) == ("none", "-")
    assert (found["weight_type"], found["weight_entails"]) == ("none", "-")
    assert x["weak_type"] == "extreme weak story"
    assert verdicts(computed)["Soft stories, not exempt", "X"] == "✓ holds"


def test_entries_come_back_and_bring_their_parts(older: Computed) -> None:
    tables = Reader(older.evaluator.evaluate_text).inputs()
    given = crooked()
    assert tables["level"] == given["level"]
    assert tables["site"] == given["site"] | {
        "diaphragms": "rigid or semirigid",
        "drift_exception": False,
    } | {"base_elevation": 0.0}
    assert tables["parts"] == ["redundancy"]
    assert tables["direction"]["X"].items() >= given["direction"]["X"].items()
    assert "TIR_max" not in tables["direction"]["X"]


def test_redundancy_without_edge_drifts_takes_the_entered_ratio(tmp_path: Path) -> None:
    tables = crooked("7-22")
    for level in tables["level"]:
        for key in [key for key in level if key not in ("name", "elevation", "weight", "source")]:
            del level[key]
    for direction, ratio in (("X", 1.45), ("Y", 1.41)):
        tables["direction"][direction]["TIR_max"] = ratio
    computed = assert_routes_agree(story_book(tmp_path, tables), 60)
    assert cells(computed)["direction"]["X"]["rho_reason"].startswith("1.3: torsional irregularity ratio")
    assert Reader(computed.evaluator.evaluate_text).inputs()["direction"]["Y"]["TIR_max"] == 1.41


@pytest.mark.parametrize("key", ["d_1", "L_sys", "x_R"])
def test_half_of_the_entries_of_a_part_are_refused(tmp_path: Path, key: str) -> None:
    tables = crooked()
    for level in tables["level"]:
        del level[f"{key}_Y"]
    with pytest.raises(MissingValue, match=f"{key}_Y = blank: is needed at every level"):
        story_book(tmp_path, tables)


def test_an_error_in_a_column_of_verdicts_reaches_what_counts_on_it(tmp_path: Path) -> None:
    """A story whose stiffness is blank must not read as a story without irregularity."""
    path = story_book(tmp_path, crooked())
    book = openpyxl.load_workbook(path)
    sheet = book["Levels"]
    heads = {cell.value: cell.column_letter for cell in sheet[6]}
    sheet[f"{heads['K_x X']}13"] = None
    book.save(path)
    computed = compute(path)
    ask = computed.evaluator.evaluate_text
    assert str(getattr(ask("=soft_type_X"), "code", "")) == "#VALUE!"
    assert str(getattr(ask("=soft_entails_X"), "code", "")) == "#VALUE!"
    assert ask("=soft_type_Y") == "none"
    assert str(ask("=workbook_status")).startswith("✗ checks that do not hold: ")


def test_the_model_route_needs_what_it_uses() -> None:
    """Without a category there is no amplification and no consequence; the ratios stay."""
    tables = deepcopy(crooked())
    del tables["site"]["SDC"]
    more = solve(from_mapping(tables)).direction["X"].more
    assert {"TIR", "TIR_max", "torsion_status", "weak_status", "M_t"} <= set(more)
    assert not {"A_x", "torsion_entails", "soft_status", "rho_rule"} & set(more)


def test_each_limited_figure_has_its_own_limit(older: Computed, tmp_path: Path) -> None:
    tables = crooked()
    for n, level in enumerate(tables["level"]):
        level |= {"P_x": 500.0 * (n + 1), "delta_xe_X": 2.0 - 0.5 * n, "delta_xe_Y": 1.0 - 0.2 * n}
    sheet = openpyxl.load_workbook(story_book(tmp_path, tables))[FIGURES]
    lines = {str(sheet.cell(row, 1).value): [sheet.cell(row, n).value for n in range(2, 6)] for row in (4, 5)}
    assert lines == {
        "Limit line, drift_over_limit: value, height": [1, 1, 0, "=h_n"],
        "Limit line, TIR: value, height": [1.2, 1.2, 0, "=h_n"],
    }
    series = [s.xVal.numRef.f for chart in sheet._charts for s in chart.series if getattr(s, "xVal", None)]
    assert {f for f in series if f.startswith("'Figures'")} == {"'Figures'!$B$4:$C$4", "'Figures'!$B$5:$C$5"}
