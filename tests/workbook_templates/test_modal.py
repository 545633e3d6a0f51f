"""Modal comparison and the story stiffness route, through cells and model.

The building is the uniform five-story shear building of A. K. Chopra, Dynamics of Structures, 4th ed.,
sections 12.8 and 13.2.6: equal floors on equal stories, effective modal masses 87.95, 8.72, 2.42, 0.75 and
0.16 per cent of the whole as printed there.
"""

from __future__ import annotations

from math import pi, sin
from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import DirectionResult, from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import FIGURES
from workbook_templates.parts import together
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

FRAME = {
    **{"system": "invented", "R": 8.0, "Omega_0": 3.0, "C_d": 5.5, "drift_structure": "all other"},
    "period_system": "steel moment frame",
}
SHARES = (0.8795, 0.0872, 0.0242, 0.0075, 0.0016)
G = 386.089  # in/s2


def uniform(modes: int = 3, **change: Any) -> dict[str, Any]:
    """Tables of the building: 100 kip a floor, 31.54 kip/in a story, so that T_1 is 2 s."""
    level = {"weight": 100.0, "K_x_X": 31.54, "K_x_Y": 63.08, "source": "invented"}
    tables = {
        **{"title": "Uniform building (invented)", "edition": "7-22", "units": "us"},
        "site": {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"},
        "direction": {"X": dict(FRAME), "Y": dict(FRAME)},
        "mode": [{"number": float(n + 1)} for n in range(modes)],
        "level": [{"name": f"L{n}", "elevation": 12.0 * n, **level} for n in (5, 4, 3, 2, 1)],
    }
    tables["site"] |= change
    return tables


def x(tables: dict[str, Any]) -> DirectionResult:
    return solve(from_mapping(tables)).direction["X"]


class TestModes:
    def test_periods_and_shares_are_the_printed_ones(self, tmp_path: Path) -> None:
        """Natural frequencies 2 sqrt(k/m) sin((2n - 1) pi/22), in closed form."""
        tables = uniform(5)
        more = x(tables).more
        omega = [2 * (31.54 / (100 / G)) ** 0.5 * sin((2 * n - 1) * pi / 22) for n in range(1, 6)]
        assert more["T_m"] == pytest.approx([2 * pi / w for w in omega], rel=1e-6)
        assert more["mass_m"] == pytest.approx(SHARES, abs=5.1e-5)
        assert more["mass_sum"][-1] == pytest.approx(1.0)
        assert more["modes_needed"] == 2.0
        assert_routes_agree(story_book(tmp_path, tables), 120)

    def test_base_shears_and_both_combinations_by_hand(self) -> None:
        """V_m = W_m S_a/(R/I_e); two modes, SRSS."""
        tables = uniform(2, combination="SRSS")
        found = x(tables)
        T = found.more["T_m"]
        S_a = [0.6 / T[0], 0.6 / T[1]]
        V = [share * 500 * a / 8 for share, a in zip(SHARES, S_a, strict=False)]
        assert found.more["V_m"] == pytest.approx(V, rel=6e-4)
        assert found.more["V_t"] == pytest.approx((V[0] ** 2 + V[1] ** 2) ** 0.5, rel=6e-4)
        beta = float(T[1] / T[0])
        rho = 8 * 0.05**2 * (1 + beta) * beta**1.5
        rho /= (1 - beta**2) ** 2 + 4 * 0.05**2 * beta * (1 + beta) ** 2
        cqc = (V[0] ** 2 + V[1] ** 2 + 2 * rho * V[0] * V[1]) ** 0.5
        assert x(uniform(2)).more["V_t"] == pytest.approx(cqc, rel=6e-4)

    def test_forces_are_scaled_up_to_the_base_shear_and_never_down(self) -> None:
        found = x(uniform())
        assert found.more["modal_scale"] == pytest.approx(found.V / found.more["V_t"])
        assert found.more["V_modal"][-1] == pytest.approx(found.V)
        short = uniform()
        for level in short["level"]:
            level |= {"K_x_X": 500.0, "K_x_Y": 500.0}
        assert x(short).more["V_t"] > x(short).V
        assert x(short).more["modal_scale"] == 1.0

    def test_drifts_are_scaled_near_a_fault_alone(self) -> None:
        near, far = uniform(S_1=1.2), uniform()
        assert x(far).more["modal_drift_scale"] == 1.0
        assert x(near).more["modal_drift_scale"] == pytest.approx(0.5 * 1.2 / 8 * 500 / x(near).more["V_t"])
        assert x(near).more["modal_drift_scale"] > 1

    def test_the_drift_of_one_mode_by_hand(self) -> None:
        """Delta = C_d V/(k I_e) at the first story, one mode."""
        found = x(uniform(1))
        assert found.more["Delta_modal"][-1] == pytest.approx(5.5 * found.more["V_m"][0] / 31.54)


class TestWorkbook:
    @pytest.mark.parametrize("count", [1, 2, 7])
    def test_no_more_modes_than_levels_to_start_with(self, tmp_path: Path, count: int) -> None:
        given = {"edition": "7-16", "units": "si", "parts": sorted(together("7-16"))}
        computed = assert_routes_agree(story_book(tmp_path, given, count), 200)
        assert computed.evaluator.evaluate_text("=modes_used") == min(count, 6)

    def test_entries_come_back(self, tmp_path: Path) -> None:
        tables = uniform(2, combination="SRSS", damping=0.03)
        computed = assert_routes_agree(story_book(tmp_path, tables), 100)
        back = Reader(computed.evaluator.evaluate_text).inputs()
        assert back["mode"] == tables["mode"]
        assert (back["site"]["combination"], back["site"]["damping"]) == ("SRSS", 0.03)

    def test_one_figure_a_direction_with_three_lines(self, tmp_path: Path) -> None:
        book = openpyxl.load_workbook(story_book(tmp_path, uniform()))
        charts = [c for c in book[FIGURES]._charts if len(c.series) == 3]
        assert [[s.tx.v for s in chart.series] for chart in charts] == [["V_x", "V_x, SRSS", "V_x, CQC"]] * 2

    def test_the_multi_period_spectrum_is_read_where_it_is_given(self, tmp_path: Path) -> None:
        pairs = {0.0: 0.6, 0.2: 1.5, 1.0: 0.9, 2.0: 0.5, 5.0: 0.15, 10.0: 0.04}
        tables = uniform(v_s=900.0)
        tables["site"] = {k: v for k, v in tables["site"].items() if k not in ("S_DS", "S_D1")}
        tables["multi_period"] = [{"T": T, "S_a": S_a} for T, S_a in pairs.items()]
        found = x(tables)
        assert found.more["T_m"][0] == pytest.approx(2.0, abs=1e-3)
        assert found.more["S_am"][0] == pytest.approx(0.5 * 2 / 3, rel=1e-3)
        assert_routes_agree(story_book(tmp_path, tables), 120)

    @pytest.mark.parametrize(
        ("numbers", "line"),
        [((1.0, 3.0), "Modes are the first ones, each once"), ((1.0, 1.0, 3.0), "Modes that stand twice")],
    )
    def test_a_list_of_modes_with_a_gap_or_a_twin_fails_a_check(
        self, tmp_path: Path, numbers: tuple[float, ...], line: str
    ) -> None:
        tables = uniform() | {"mode": [{"number": number} for number in numbers]}
        path = story_book(tmp_path, tables)
        computed = compute(path)
        rows = openpyxl.load_workbook(path)["Checks"].iter_rows(min_row=11)
        row = next(row[1].row for row in rows if row[1].value == line)
        assert str(computed.values["Checks", f"I{row}"]).startswith("✗")

    def test_a_mode_that_the_building_does_not_have(self, tmp_path: Path) -> None:
        with pytest.raises(EngineError, match="must be at most 5, the number of modes"):
            solve(from_mapping(uniform(6)))
        errors = compute(story_book(tmp_path, uniform(6))).errors
        assert any("must be at most 5, the number of modes" in error["reason"] for error in errors)


class TestStiffnessRoute:
    def route(self) -> dict[str, Any]:
        tables = uniform(0) | {"parts": ["stiffness_route"]}
        del tables["mode"]
        for n, level in enumerate(tables["level"]):
            level["P_x"] = 120.0 * (n + 1)
        return tables

    def test_displacements_are_the_sums_of_the_story_drifts(self, tmp_path: Path) -> None:
        tables = self.route()
        found = x(tables)
        steps = [float(V) / 31.54 for V in found.V_x[::-1]]
        expected = [sum(steps[: n + 1]) for n in range(5)]
        assert found.delta_xe is not None
        assert found.Delta is not None
        assert found.delta_xe[::-1] == pytest.approx(expected)
        assert found.Delta[::-1] == pytest.approx([5.5 * step for step in steps])
        computed = assert_routes_agree(story_book(tmp_path, tables), 130)
        back = Reader(computed.evaluator.evaluate_text).inputs()
        assert "stiffness_route" in back["parts"]
        assert not any(key.startswith("delta") for level in back["level"] for key in level)

    def test_the_forces_for_drift_drive_them_where_they_are_chosen(self, tmp_path: Path) -> None:
        tables = self.route()
        tables["direction"]["X"] |= {"drift_basis": "drift forces", "T_computed": 2.0}
        found = x(tables)
        assert found.delta_xe is not None
        V = found.more["V_x_drift"]
        assert V[-1] < found.V_x[-1]
        assert found.delta_xe[-1] == pytest.approx(V[-1] / 31.54)
        assert_routes_agree(story_book(tmp_path, tables), 150)

    def test_displacements_given_as_well_are_refused(self) -> None:
        tables = self.route()
        for level in tables["level"]:
            level |= {"delta_xe_X": 0.1, "delta_xe_Y": 0.1}
        words = r"delta_xe_X = 0\.1: must be left out where the part stiffness_route"
        with pytest.raises(EngineError, match=words):
            from_mapping(tables)

    @pytest.mark.parametrize("key", ["K_x_X", "P_x"])
    def test_what_the_part_needs_is_named(self, tmp_path: Path, key: str) -> None:
        tables = self.route()
        for level in tables["level"]:
            del level[key]
        with pytest.raises(EngineError, match=f"{key}"):
            story_book(tmp_path, tables)
