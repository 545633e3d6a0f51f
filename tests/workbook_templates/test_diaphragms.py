"""Diaphragms beside F_px: transfer, collectors, flexibility, the other procedures, walls out of plane.

By hand from 12.10 and 12.11; what the clauses say is partly from memory, as marked in the edition data.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest

from engine.building import DirectionResult, from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.read import Reader

FRAME = {
    **{"system": "invented", "R": 5.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}


def floors(
    edition: str = "7-22",
    count: int = 3,
    x: dict[str, Any] | None = None,
    **site: Any,
) -> dict[str, Any]:
    """Tables of a low building of equal floors: S_DS = 1.0, C_s = 0.2 on the plateau."""
    given = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"}
    level = {"weight": 100.0, "source": "invented"}
    return {
        **{"title": "Floors (invented)", "edition": edition, "units": "us"},
        "site": given | site,
        "direction": {"X": FRAME | (x or {}), "Y": dict(FRAME)},
        "level": [{"name": f"L{n}", "elevation": 12.0 * n, **level} for n in range(count, 0, -1)],
    }


def x(tables: dict[str, Any]) -> DirectionResult:
    return solve(from_mapping(tables)).direction["X"]


class TestTransfer:
    @pytest.mark.parametrize(("offset", "factor"), [(None, 1.3), ("no", 1.3), ("yes", 2.5)])
    def test_transfer_forces_take_rho_or_the_overstrength(
        self, tmp_path: Path, offset: str | None, factor: float
    ) -> None:
        tables = floors(x={"rho": 1.3})
        tables["level"][1] |= {"F_transfer_X": 10.0} | ({"offset_X": offset} if offset else {})
        found = x(tables).more
        assert found["F_px_transfer"] - found["F_px"] == pytest.approx([0.0, 10.0 * factor, 0.0])
        assert_routes_agree(story_book(tmp_path, tables), 60)

    def test_entries_come_back(self, tmp_path: Path) -> None:
        tables = floors()
        tables["level"][1] |= {"F_transfer_X": 10.0, "offset_X": "yes"}
        computed = assert_routes_agree(story_book(tmp_path, tables), 60)
        back = Reader(computed.evaluator.evaluate_text).inputs()["level"]
        assert [level["F_transfer_X"] for level in back] == [0.0, 10.0, 0.0]
        assert [level["offset_X"] for level in back] == ["no", "yes", "no"]


class TestCollectors:
    def loaded(self, E_story: float, E_sum: float, E_low: float, **change: Any) -> dict[str, Any]:
        tables = floors(x=change)
        for level in tables["level"]:
            for name in "XY":
                level |= {f"E_story_{name}": E_story, f"E_sum_{name}": E_sum, f"E_low_{name}": E_low}
        return tables

    @pytest.mark.parametrize(
        ("effects", "force"),
        [((30.0, 20.0, 40.0), 75.0), ((20.0, 30.0, 40.0), 75.0), ((10.0, 10.0, 40.0), 40.0)],
    )
    def test_the_largest_of_three(self, tmp_path: Path, effects: tuple[float, ...], force: float) -> None:
        tables = self.loaded(*effects)
        assert x(tables).more["F_collector"] == pytest.approx([force] * 3)
        assert_routes_agree(story_book(tmp_path, tables), 60)

    def test_light_frame_needs_no_overstrength(self, tmp_path: Path) -> None:
        tables = self.loaded(30.0, 50.0, 40.0, light_frame=True)
        assert x(tables).more["F_collector"] == pytest.approx([50.0] * 3)
        assert_routes_agree(story_book(tmp_path, tables), 60)

    def test_effects_of_one_kind_alone_are_refused(self, tmp_path: Path) -> None:
        tables = floors()
        for level in tables["level"]:
            level["E_story_X"] = 1.0
        with pytest.raises(EngineError, match="E_story_Y, E_sum_X"):
            story_book(tmp_path, tables)


@pytest.mark.parametrize(("deflection", "status"), [(0.81, "flexible"), (0.8, "not flexible by calculation")])
def test_a_diaphragm_is_flexible_above_twice_the_drift(
    tmp_path: Path,
    deflection: float,
    status: str,
) -> None:
    """12.3.1.3: more than two times the average drift of adjoining vertical elements."""
    tables = floors()
    for level in tables["level"]:
        for name in "XY":
            level |= {f"delta_MDD_{name}": deflection, f"Delta_ADVE_{name}": 0.4}
    assert x(tables).more["flex_status"] == (status,) * 3
    computed = assert_routes_agree(story_book(tmp_path, tables), 60)
    looked_at = "to be looked at" in str(computed.evaluator.evaluate_text("=workbook_status"))
    assert looked_at is (status == "flexible")


class TestAlternative:
    def walls(self, count: int, **change: Any) -> dict[str, Any]:
        given = {"mode_shape": "all other", "diaphragm_type": "cast-in-place concrete shear"}
        tables = floors(count=count, x=given | change, N=float(count))
        tables["direction"]["Y"] |= given
        return tables

    def test_every_factor_by_hand(self, tmp_path: Path) -> None:
        """N = 3, z_s = 1: G_m1 = 1 + 0.5 x 2/3, G_m2 = 0.9 x 4/9, C_s2 = 0.45 + 0.25 = 0.7, C_s = 0.2."""
        tables = self.walls(3)
        found = x(tables).more
        expected = {"z_s": 1.0, "R_s": 1.5, "G_m1": 4 / 3, "G_m2": 0.4, "C_s2": 0.7, "C_p0": 0.4, "C_pi": 0.6}
        assert {key: found[key] for key in expected} == pytest.approx(expected)
        C_pn = ((4 / 3 * 2.5 * 0.2) ** 2 + (0.4 * 0.7) ** 2) ** 0.5
        assert found["C_pn"] == pytest.approx(C_pn)
        roof, middle, low = C_pn, 0.4 + 0.2 * (2 / 3) / 0.8, 0.4 + 0.2 * (1 / 3) / 0.8
        assert found["C_px"] == pytest.approx([roof, middle, low])
        assert found["F_px_alt"] == pytest.approx([value * 100 / 1.5 for value in (roof, middle, low)])
        assert_routes_agree(story_book(tmp_path, tables), 90)

    def test_two_stories_are_a_straight_line(self) -> None:
        found = x(self.walls(2)).more
        assert found["C_px"][1] == pytest.approx((found["C_p0"] + found["C_pn"]) / 2)

    def test_an_entered_reduction_factor_and_the_minimum(self, tmp_path: Path) -> None:
        tables = self.walls(3, R_s_entered=3.0)
        found = x(tables).more
        assert found["R_s"] == 3.0
        assert found["F_px_alt"] == pytest.approx([found["C_pn"] * 100 / 3, 20.0, 20.0])
        assert found["F_px_alt_bound"] == ("C_px w_px/R_s", "the minimum", "the minimum")
        assert_routes_agree(story_book(tmp_path, tables), 90)

    def test_the_doubtful_factor_is_an_entry(self) -> None:
        assert x(self.walls(3, c_m1=0.4)).more["G_m1"] == pytest.approx(1 + 0.4 * 2 / 3)


class TestOneStory:
    def test_the_shear_of_the_diaphragm(self, tmp_path: Path) -> None:
        """C_s-diaph = min(1.0, 0.6/0.8)/(4.5/1), on 100 kip."""
        tables = floors(count=1, x={"R_diaph": 4.5, "T_diaph": 0.8})
        tables["direction"]["Y"] |= {"R_diaph": 1.5, "T_diaph": 0.3}
        found = x(tables).more
        assert (found["C_s_diaph"], found["V_diaph"]) == pytest.approx((0.75 / 4.5, 75 / 4.5))
        computed = assert_routes_agree(story_book(tmp_path, tables), 44)
        assert "to be looked at" not in str(computed.evaluator.evaluate_text("=workbook_status"))

    def test_more_than_one_story_asks_for_a_look(self, tmp_path: Path) -> None:
        tables = floors(count=2, x={"R_diaph": 4.5, "T_diaph": 0.8})
        tables["direction"]["Y"] |= {"R_diaph": 1.5, "T_diaph": 0.3}
        computed = assert_routes_agree(story_book(tmp_path, tables), 44)
        assert "to be looked at" in str(computed.evaluator.evaluate_text("=workbook_status"))

    def test_the_earlier_edition_has_no_such_procedure(self, tmp_path: Path) -> None:
        assert "C_s_diaph" not in x(floors("7-16", count=1, x={"R_diaph": 4.5, "T_diaph": 0.8})).more


def test_walls_out_of_plane(tmp_path: Path) -> None:
    """k_a = 1 + L_f/100 up to 2, 1 for a rigid one; F_p = 0.4 S_DS I_e W_w, and 0.4 S_DS k_a I_e W_p."""
    tables = floors()
    rows = (("flexible", 60.0), ("flexible", 150.0), ("rigid", 60.0))
    tables["anchor"] = [
        {"name": f"Wall {n}", "W_w": 10.0, "W_p": 5.0, "diaphragm": kind, "L_f": span}
        for n, (kind, span) in enumerate(rows, start=1)
    ]
    found = solve(from_mapping(tables)).more
    assert found["F_p_wall"] == pytest.approx([4.0] * 3)
    assert found["k_a"] == pytest.approx([1.6, 2.0, 1.0])
    assert found["F_p_anchor"] == pytest.approx([3.2, 4.0, 2.0])
    computed = assert_routes_agree(story_book(tmp_path, tables), 44)
    assert Reader(computed.evaluator.evaluate_text).inputs()["anchor"] == tables["anchor"]
