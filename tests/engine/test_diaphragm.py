"""Diaphragms, collectors, walls: both sides of each limit; the alternative procedure a second time."""

from __future__ import annotations

from fractions import Fraction as Q

import mpmath
import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.diaphragm import (
    COLLECTOR_BOUNDS,
    DIAPHRAGM_TYPES,
    FLEXIBILITIES,
    MODE_SHAPES,
    alternative_force,
    anchorage_factor,
    anchorage_force,
    base_coefficient,
    coefficient_at_height,
    collector_bound,
    collector_force,
    diaphragm_reduction,
    first_mode_factor,
    flexibility,
    higher_mode_coefficient,
    higher_mode_factor,
    lower_coefficient,
    maximum_force,
    minimum_force,
    mode_shape_factor,
    one_story_coefficient,
    top_coefficient,
    total_force,
    wall_force,
)

FEW = settings(max_examples=60, deadline=None)


@pytest.mark.parametrize(("delta", "word"), [(0.4, 0), (0.4 + 1e-9, 1), (0.0, 0), (3.0, 1)])
def test_flexible_above_twice_the_drift(delta, word):
    assert flexibility(delta_MDD=delta, Delta_ADVE=0.2) == FLEXIBILITIES[word]


def test_flexible_is_not_a_matter_of_round_off():
    assert flexibility(delta_MDD=np.nextafter(0.6, 1), Delta_ADVE=0.3) == FLEXIBILITIES[0]


@pytest.mark.parametrize(("offset", "force"), [("no", 100 + 1.3 * 50), ("yes", 100 + 2.5 * 50)])
def test_transfer_takes_rho_or_overstrength(offset, force):
    found = total_force(F_px=100.0, F_transfer=50.0, rho=1.3, Omega_0=2.5, offset=offset)
    assert found == pytest.approx(force)


@pytest.mark.parametrize(
    ("story", "total", "low", "force", "bound"),
    [
        *[(40.0, 30.0, 70.0, 80.0, 0), (30.0, 40.0, 70.0, 80.0, 1), (30.0, 34.0, 70.0, 70.0, 2)],
        *[(35.0, 35.0, 70.0, 70.0, 0), (30.0, 35.0, 70.0, 70.0, 1)],
    ],
)
def test_collector(story, total, low, force, bound):
    given = {"E_story": story, "E_sum": total, "E_low": low, "Omega_0": 2.0}
    assert collector_force(**given, light_frame="no") == force
    assert collector_bound(**given, light_frame="no") == COLLECTOR_BOUNDS[bound]
    assert collector_bound(**given, light_frame="yes") == COLLECTOR_BOUNDS[3]


def test_light_frame_collectors_keep_both_limits_of_the_diaphragm():
    """The limits of the diaphragm force itself, with 10 of weight: 0.2 and 0.4 of S_DS I_e w_px."""
    low, high = (float(rule(10.0, 0.9, 1.25)) for rule in (minimum_force, maximum_force))
    for total, force in ((low - 1, low), (low + 1, low + 1), (high - 0.1, high - 0.1), (high + 1, high)):
        given = {"E_story": 99.0, "E_sum": total, "E_low": low, "Omega_0": 2.0, "light_frame": "yes"}
        assert collector_force(**given) == pytest.approx(force)


@pytest.mark.parametrize(("S_DS", "part"), [(0.2, 0.1), (0.25, 0.1), (0.26, 0.104), (1.0, 0.4)])
def test_wall_force_has_a_floor(S_DS, part):
    assert wall_force(S_DS=S_DS, I_e=1.0, W_w=100.0) == pytest.approx(100 * part)


@pytest.mark.parametrize(("S_DS", "part"), [(0.2, 0.2), (0.5, 0.2), (0.51, 0.204), (1.0, 0.4)])
def test_anchorage_force_has_a_floor(S_DS, part):
    given = {"k_a": 1.5, "I_e": 1.25, "W_p": 10.0}
    assert anchorage_force(S_DS=S_DS, **given) == pytest.approx(part * 1.5 * 1.25 * 10)


@pytest.mark.parametrize(
    ("L_f", "diaphragm", "units", "k_a"),
    [
        *[(0.0, "flexible", "us", 1.0), (50.0, "flexible", "us", 1.5), (100.0, "flexible", "us", 2.0)],
        *[(150.0, "flexible", "us", 2.0), (150.0, "rigid", "us", 1.0), (15.24, "flexible", "si", 1.5)],
        *[(30.48, "flexible", "si", 2.0), (40.0, "flexible", "si", 2.0), (40.0, "rigid", "si", 1.0)],
    ],
)
def test_anchorage_factor(L_f, diaphragm, units, k_a):
    assert anchorage_factor(L_f, diaphragm, units) == pytest.approx(k_a)


def test_one_story_coefficient_on_both_sides_of_its_cap():
    given = {"S_DS": 1.0, "S_D1": 0.6, "I_e": 1.25, "R_diaph": 4.5}
    assert one_story_coefficient(**given, T_diaph=0.5) == pytest.approx(1.25 / 4.5)
    assert one_story_coefficient(**given, T_diaph=0.6) == pytest.approx(1.25 / 4.5)
    assert one_story_coefficient(**given, T_diaph=1.2) == pytest.approx(0.5 * 1.25 / 4.5)


HUNDREDTHS = st.integers(5, 250).map(lambda n: Q(n, 100))
SITE = st.fixed_dictionaries(
    {
        **{"S_DS": HUNDREDTHS, "S_D1": HUNDREDTHS, "C_s": st.integers(1, 60).map(lambda n: Q(n, 100))},
        **{"I_e": st.sampled_from([Q(1), Q(5, 4), Q(3, 2)]), "Omega_0": st.sampled_from([Q(1), Q(2), Q(3)])},
        **{"z_s": st.sampled_from([Q(3, 10), Q(7, 10), Q(1)]), "N": st.integers(1, 40)},
        **{
            "c_m1": st.sampled_from([Q(1, 2), Q(2, 5)]),
            "place": st.integers(0, 100).map(lambda n: Q(n, 100)),
        },
    }
)


def written_out(S_DS, S_D1, C_s, I_e, Omega_0, z_s, N, c_m1, place):
    """C_p0, C_pi, C_pn and C_px as the procedure is recalled, by fractions and fifty digits."""
    base = Q(2, 5) * S_DS * I_e
    first = (1 + c_m1 * z_s * (1 - Q(1, N))) * Omega_0 * C_s
    second = [(Q(3, 20) * N + Q(1, 4)) * I_e * S_DS, I_e * S_DS]
    second.append(I_e * S_D1 / (Q(3, 100) * (N - 1)) if N >= 2 else Q(0))
    higher = Q(9, 10) * z_s * (1 - Q(1, N)) ** 2 * min(second)
    knee = max(base, Q(9, 10) * first)
    with mpmath.workdps(50):
        square = first**2 + higher**2
        top = max(mpmath.sqrt(mpmath.mpf(square.numerator) / square.denominator), mpmath.mpf(float(knee)))
    points = ([0, 1], [base, top]) if N <= 2 else ([0, 0.8, 1], [base, knee, top])
    level = np.interp(float(place), [float(x) for x in points[0]], [float(y) for y in points[1]])
    return float(base), float(knee), float(top), float(level)


@FEW
@given(SITE)
def test_alternative_procedure_a_second_time(site):
    v = {name: float(value) for name, value in site.items()}
    C_p0 = base_coefficient(v["S_DS"], v["I_e"])
    G_m1, G_m2 = first_mode_factor(v["z_s"], v["N"], v["c_m1"]), higher_mode_factor(v["z_s"], v["N"])
    C_s2 = higher_mode_coefficient(v["N"], v["S_DS"], v["S_D1"], v["I_e"])
    C_pi = lower_coefficient(C_p0, G_m1, v["Omega_0"], v["C_s"])
    C_pn = top_coefficient(C_pi, G_m1, v["Omega_0"], v["C_s"], G_m2, C_s2)
    C_px = coefficient_at_height(60 * v["place"], 60.0, v["N"], C_p0, C_pi, C_pn)
    assert (C_p0, C_pi, C_pn, C_px) == pytest.approx(written_out(**site), rel=1e-12)
    assert C_p0 * (1 - 1e-12) <= C_px


def test_one_story_has_no_higher_modes():
    assert higher_mode_coefficient(N=1.0, S_DS=1.0, S_D1=0.6, I_e=1.0) == 0.0
    assert higher_mode_factor(z_s=1.0, N=1.0) == 0.0
    assert first_mode_factor(z_s=1.0, N=1.0, c_m1=0.5) == 1.0


@pytest.mark.parametrize(("N", "C_px"), [(1.0, 0.6), (2.0, 0.6), (3.0, 0.4 + 0.3 * 0.5 / 0.8)])
def test_the_knee_begins_with_three_stories(N, C_px):
    given = {"h_x": 25.0, "h_n": 50.0, "C_p0": 0.4, "C_pi": 0.7, "C_pn": 0.8}
    assert coefficient_at_height(N=N, **given) == pytest.approx(C_px)


@pytest.mark.parametrize(("C_px", "force"), [(0.5, 50.0), (0.4, 40.0), (0.39, 40.0), (0.1, 40.0)])
def test_alternative_force_keeps_its_lower_limit(C_px, force):
    assert alternative_force(C_px, w_px=200.0, R_s=2.0, S_DS=1.0, I_e=1.0) == pytest.approx(force)


def test_tables_as_recalled():
    assert [mode_shape_factor(system) for system in MODE_SHAPES] == [0.3, 0.7, 0.85, 1.0]
    assert [diaphragm_reduction(kind) for kind in DIAPHRAGM_TYPES] == [2.0, 1.5, 0.7, 1.0, 1.4, 3.0]
