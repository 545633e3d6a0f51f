"""Forces for drift in the model route: by hand, and the stability coefficients of one set of forces."""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest

from engine.building import Package, from_mapping, solve
from engine.errors import NotApplicable

SITE = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.5, "T_L": 8, "risk_category": "II"}
FRAME = {"system": "frame", "R": 8, "Omega_0": 3, "C_d": 5.5, "drift_structure": "all other"}
FRAME |= {"period_system": "steel moment frame", "T_computed": 3.0}
HEIGHTS = np.array([13.0, 26.0, 39.0, 52.0])
PARTS = {"parts": ["drift_forces"]}


def job(
    frame: dict[str, Any] | None = None, delta: Any = (1.0, 2.0, 3.0, 4.0), **more: Any
) -> dict[str, Any]:
    levels = [
        {
            "name": f"L{n}",
            "elevation": float(h),
            "weight": 100.0,
            "P_x": 120.0 * (4 - n),
            "delta_xe_X": float(d),
        }
        for n, (h, d) in enumerate(zip(HEIGHTS, delta, strict=True))
    ]
    tables = {"title": "A", "edition": "7-22", "units": "us", "site": SITE, "level": levels}
    return tables | {"direction": {"X": FRAME | (frame or {})}} | more


def solved(*args: Any, **more: Any) -> Package:
    return solve(from_mapping(job(*args, **more)))


def test_by_hand() -> None:
    """12.8.6 by hand: C_s = S_D1/(T R/I_e) = 0.6/(3 x 8), k = 2 from 2.5 s on."""
    X = solved(**PARTS).direction["X"]
    assert X.more["T_drift"] == 3.0
    assert pytest.approx(1.4 * X.T_a) == X.T
    assert X.C_s == pytest.approx(0.6 / (X.T * 8))
    assert X.more["C_s_drift"] == pytest.approx(0.025)  # strength would stop at 0.044
    assert X.more["drift_bound"] == "cap S_D1/(T R/I_e), Eq. 12.8-4"
    assert X.more["V_drift"] == pytest.approx(0.025 * 400)
    assert X.more["k_drift"] == 2.0
    shares = np.array([1.0, 4.0, 9.0, 16.0]) / 30
    assert X.more["F_x_drift"] == pytest.approx(10 * shares)
    assert X.more["V_x_drift"] == pytest.approx(10 * np.cumsum(shares[::-1])[::-1])


@pytest.mark.parametrize(("edition", "equation"), [("7-16", "12.8-6"), ("7-22", "12.8-7")])
def test_the_minimum_of_high_S_1_stays(edition: str, equation: str) -> None:
    X = solved(**PARTS, site=SITE | {"S_1": 0.6}, edition=edition).direction["X"]
    assert X.more["C_s_drift"] == pytest.approx(0.5 * 0.6 / 8)
    assert X.more["drift_bound"].endswith(f"Eq. {equation}")


def test_the_cap_may_be_kept_and_the_minimum_is_waived_all_the_same() -> None:
    X = solved({"drift_cap": "with the cap"}, **PARTS).direction["X"]
    assert X.more["T_drift"] == X.T
    low = solved({"R": 25.0, "drift_cap": "with the cap"}, **PARTS).direction["X"]
    assert low.C_s == pytest.approx(0.044)
    assert low.more["C_s_drift"] == pytest.approx(0.6 / (low.T * 25))


def test_without_a_computed_period_the_approximate_one_serves() -> None:
    X = solved({"T_computed": None}, **PARTS).direction["X"]
    assert X.more["T_drift"] == X.T_a == X.T


def test_theta_takes_the_shears_of_the_forces_that_the_displacements_go_by() -> None:
    strength, relieved = (
        solved({"drift_basis": basis}, **PARTS).direction["X"]
        for basis in ("strength forces", "drift forces")
    )
    for X, V_x in ((strength, strength.V_x), (relieved, relieved.more["V_x_drift"])):
        assert X.more["V_x_used"] == pytest.approx(V_x)
        P_x, Delta = np.array([480.0, 360.0, 240.0, 120.0]), 5.5 * 1.0
        assert X.theta == pytest.approx(P_x * Delta / (V_x * 13 * 12 * 5.5))
    assert relieved.more["F_x_used"] == pytest.approx(relieved.more["F_x_drift"])
    assert strength.more["F_x_used"] == pytest.approx(strength.F_x)
    assert (np.asarray(relieved.theta) > np.asarray(strength.theta)).all()


def test_theta_of_an_elastic_building_is_the_same_under_either_set() -> None:
    """A linear shear building has theta = P_x/(K_x h_sx) whatever the forces, by mechanics."""
    K_x = np.array([90.0, 80.0, 60.0, 40.0])
    plain = solved(**PARTS).direction["X"]
    expected = np.array([480.0, 360.0, 240.0, 120.0]) / (K_x * 13 * 12)
    for basis, V_x in (("strength forces", plain.V_x), ("drift forces", plain.more["V_x_drift"])):
        delta = np.cumsum(V_x / K_x)
        X = solved({"drift_basis": basis}, delta, **PARTS).direction["X"]
        assert X.theta == pytest.approx(expected, rel=1e-12)


def test_displacements_by_drift_forces_bring_the_results_and_the_rules() -> None:
    found = solved({"drift_basis": "drift forces"})
    assert "V_drift" in found.direction["X"].more
    assert {"drift_forces", "drift_period"} <= set(found.rules)
    assert found.warnings[-1].startswith("direction X: drift and theta go by the forces for drift alone")
    plain = solved()
    assert not any("for drift alone" in text for text in plain.warnings)
    assert "V_drift" not in plain.direction["X"].more
    assert "drift_forces" not in plain.rules


@pytest.mark.parametrize(("key", "value"), [("drift_basis", "drift"), ("drift_cap", "uncapped")])
def test_another_word_is_refused(key: str, value: str) -> None:
    with pytest.raises(NotApplicable, match=rf"direction\.X\.{key} = '{value}': must be one of"):
        from_mapping(job({key: value}))
