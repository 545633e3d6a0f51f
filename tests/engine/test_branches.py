"""Both sides of every printed limit."""

from __future__ import annotations

import numpy as np
import pytest

from engine import stability
from engine.base_shear import (
    base_shear,
    coefficient_cap,
    coefficient_minimum,
    coefficient_minimum_near_fault,
    governing_bound,
    response_coefficient,
)
from engine.diaphragm import design_force, design_force_bound, unlimited_force
from engine.drift import allowable_drift
from engine.errors import NotApplicable
from engine.hazard import spectral_acceleration
from engine.period import design_period, upper_limit_coefficient
from engine.stability import (
    VERDICTS,
    demand_ratio,
    second_order_factor,
    stability_limit,
    stability_verdict,
)
from engine.torsion import amplification
from engine.vertical import (
    distribution_factor,
    distribution_factors,
    exponent,
    overturning_moment,
    story_height,
    story_shear,
    value_below,
)

EPS = 1e-9


def test_spectrum_branches_meet_and_are_the_printed_ones():
    site = {"S_DS": 1.0, "S_D1": 0.5, "T_L": 4.0}
    assert spectral_acceleration(T=0.0, **site) == 0.4
    assert spectral_acceleration(T=0.05, **site) == pytest.approx(0.4 + 0.6 * 0.5)
    for corner, value in ((0.1, 1.0), (0.5, 1.0), (4.0, 0.125)):
        for T in (corner - EPS, corner, corner + EPS):
            assert spectral_acceleration(T=T, **site) == pytest.approx(value, rel=1e-7)
    assert spectral_acceleration(T=0.3, **site) == 1.0
    assert spectral_acceleration(T=2.0, **site) == 0.25
    assert spectral_acceleration(T=8.0, **site) == 0.5 * 4.0 / 64.0


def test_spectrum_with_an_early_T_L_follows_the_printed_order():
    assert spectral_acceleration(T=1.0, S_DS=1.0, S_D1=0.5, T_L=0.25) == 0.5 * 0.25


@pytest.mark.parametrize(
    ("T", "k"),
    [(0.2, 1), (0.5, 1), (0.5 + EPS, 1), (1.5, 1.5), (2.5 - EPS, 2), (2.5, 2), (4.0, 2)],
)
def test_exponent_interpolated(T, k):
    assert exponent(T=T) == pytest.approx(k, abs=1e-9)


@pytest.mark.parametrize(("T", "k"), [(0.2, 1), (0.5, 1), (0.5 + EPS, 2), (2.5, 2), (4.0, 2)])
def test_exponent_by_the_permitted_two(T, k):
    assert exponent(T=T, rule="two") == k


def test_cap_on_both_sides_of_T_L():
    given = {"S_D1": 0.6, "T_L": 4.0, "R": 6.0, "I_e": 1.0}
    assert coefficient_cap(T=3.0, **given) == pytest.approx(0.6 / 18.0)
    assert coefficient_cap(T=4.0, **given) == pytest.approx(0.025)
    assert coefficient_cap(T=8.0, **given) == pytest.approx(0.6 * 4.0 / (64.0 * 6.0))


def test_near_fault_minimum_begins_at_0_6():
    assert coefficient_minimum_near_fault(S_1=0.6 - EPS, R=5.0, I_e=1.0) == 0.0
    assert coefficient_minimum_near_fault(S_1=0.6, R=5.0, I_e=1.0) == pytest.approx(0.06)


def test_minimum_is_never_below_a_hundredth():
    assert coefficient_minimum(S_DS=0.22, I_e=1.0) == 0.01
    assert coefficient_minimum(S_DS=0.23, I_e=1.0) == pytest.approx(0.01012)


BASE = {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.3, "T": 0.4, "T_L": 4.0, "R": 5.0, "I_e": 1.0}


@pytest.mark.parametrize(
    ("changes", "C_s", "words", "numbers"),
    [
        ({}, 0.2, "plateau S_DS/(R/I_e)", ("12.8-2", "12.8-3")),
        ({"T": 0.5}, 0.2, "plateau S_DS/(R/I_e)", ("12.8-2", "12.8-3")),
        ({"T": 1.0}, 0.1, "cap S_D1/(T R/I_e)", ("12.8-3", "12.8-4")),
        ({"T": 4.0, "R": 2.0}, 0.0625, "cap S_D1/(T R/I_e)", ("12.8-3", "12.8-4")),
        ({"T": 5.0, "R": 1.0}, 0.08, "cap S_D1 T_L/(T^2 R/I_e)", ("12.8-4", "12.8-5")),
        ({"T": 3.0}, 0.044, "minimum 0.044 S_DS I_e", ("12.8-5", "12.8-6")),
        ({"T": 9.0, "S_DS": 0.1, "S_D1": 0.05}, 0.01, "minimum 0.01", ("12.8-5", "12.8-6")),
        ({"T": 3.0, "S_1": 0.75}, 0.075, "minimum 0.5 S_1/(R/I_e)", ("12.8-6", "12.8-7")),
    ],
)
@pytest.mark.parametrize(("edition", "place"), [("7-16", 0), ("7-22", 1)])
def test_governing_bound(changes, C_s, words, numbers, edition, place):
    given = {**BASE, **changes, "edition": edition}
    assert response_coefficient(**given) == pytest.approx(C_s)
    assert governing_bound(**given) == f"{words}, Eq. {numbers[place]}"


def test_a_tie_but_for_round_off_goes_to_the_plateau():
    """T = T_S = 0.7/0.9 is not exact in binary."""
    for T in (np.nextafter(0.7 / 0.9, 0), 0.7 / 0.9, np.nextafter(0.7 / 0.9, 1)):
        given = {**BASE, "S_DS": 0.9, "S_D1": 0.7, "T": T, "edition": "7-22"}
        assert governing_bound(**given).startswith("plateau")


def test_a_diaphragm_tie_but_for_round_off_goes_to_the_sums():
    given = {"w_px": 100.0, "h_x": 10.0, "weights": [100.0], "heights": [10.0], "S_DS": 1.0, "I_e": 1.0}
    for force in (np.nextafter(20.0, 0), np.nextafter(40.0, 99)):
        assert design_force_bound(forces=[force], **given).startswith("w_px sum")


def test_upper_limit_coefficient_is_linear_between_rows():
    assert upper_limit_coefficient(S_D1=[0.1, 0.125, 0.175, 0.25]).tolist() == pytest.approx(
        [1.7, 1.65, 1.55, 1.45]
    )


def test_design_period_is_capped():
    assert design_period(T_a=1.0, C_u=1.4, T_computed=1.39) == 1.39
    assert design_period(T_a=1.0, C_u=1.4, T_computed=1.41) == 1.4


@pytest.mark.parametrize(("ratio", "A_x"), [(1.0, 1.0), (1.2, 1.0), (1.21, 1.21**2 / 1.44), (2.1, 3.0)])
def test_torsional_amplification(ratio, A_x):
    assert amplification(d_max=ratio * 0.7, d_avg=0.7) == pytest.approx(A_x)


@pytest.mark.parametrize(("theta", "factor"), [(0.0, 1.0), (0.1, 1.0), (0.1 + EPS, 1 / 0.9), (0.25, 4 / 3)])
def test_second_order_factor(theta, factor):
    assert second_order_factor(theta=theta) == pytest.approx(factor)


@pytest.mark.parametrize(
    ("theta", "theta_max", "verdict"),
    [
        *[(0.05, 0.25, 0), (0.10, 0.25, 0), (0.09, 0.09, 0), (0.11, 0.25, 1), (0.25, 0.25, 1)],
        *[(0.26, 0.25, 2), (0.12, 0.0909, 2), (0.095, 0.0909, 3), (0.10, 0.0909, 3)],
    ],
)
def test_stability_verdict(theta, theta_max, verdict):
    assert stability_verdict(theta=theta, theta_max=theta_max) == VERDICTS[verdict]


def test_limits_collide_from_C_d_5_on():
    assert stability_limit(C_d=5.0) == pytest.approx(0.1)
    assert stability_limit(C_d=5.5) < 0.1
    assert stability_limit(C_d=2.0) == 0.25


@pytest.mark.parametrize(
    ("beta", "edition", "used"),
    [(0.3, "7-16", 0.3), (0.3, "7-22", 0.5), (0.6, "7-22", 0.6), (1.0, "7-22", 1.0)],
)
def test_demand_ratio(beta, edition, used):
    assert demand_ratio(beta=beta, Omega_0=2.5, edition=edition) == used


def test_floor_of_the_demand_ratio_stays_at_most_1():
    assert demand_ratio(beta=0.3, Omega_0=1.0, edition="7-22") == 1.0


def test_rho_tightens_the_drift_limit():
    given = {"h_sx": 10.0, "structure": "all other", "risk_category": "II"}
    assert allowable_drift(**given) == pytest.approx(0.2)
    assert allowable_drift(**given, rho=1.3) == pytest.approx(0.2 / 1.3)


@pytest.mark.parametrize(
    ("forces", "factor", "words"),
    [
        *[([1.0], 0.2, "minimum 0.2"), ([20.0], 0.2, "w_px sum(F_i)"), ([30.0], 0.3, "w_px sum(F_i)")],
        *[([40.0], 0.4, "w_px sum(F_i)"), ([41.0], 0.4, "maximum 0.4")],
    ],
)
def test_diaphragm_limits(forces, factor, words):
    given = {"w_px": 100.0, "h_x": 10.0, "weights": [100.0], "heights": [10.0], "S_DS": 1.0, "I_e": 1.0}
    assert design_force(forces=forces, **given) == pytest.approx(100 * factor)
    assert design_force_bound(forces=forces, **given).startswith(words)


def test_diaphragm_lighter_than_its_level():
    given = {"h_x": 12.0, "forces": [30.0], "weights": [100.0], "heights": [12.0]}
    assert unlimited_force(w_px=80.0, **given) == pytest.approx(24.0)


def test_diaphragm_without_weight_has_no_force():
    given = {"forces": [5.0, 0.0], "weights": [10.0, 0.0], "heights": [12.0, 15.0]}
    assert unlimited_force(w_px=[10.0, 0.0], h_x=[12.0, 15.0], **given).tolist() == [5.0, 0.0]


TWO_ROOFS = {"heights": [36.0, 12.0, 24.0, 36.0]}


def test_levels_at_one_height_act_together():
    forces = [4.0, 1.0, 2.0, 8.0]
    assert story_shear(h_x=[36.0, 24.0, 12.0, 0.0], forces=forces, **TWO_ROOFS).tolist() == [12, 14, 15, 15]
    assert overturning_moment(h_x=24.0, forces=forces, **TWO_ROOFS) == 144.0
    assert story_height(h_x=36.0, **TWO_ROOFS) == 12.0
    assert value_below(h_x=36.0, values=[9.0, 1.0, 3.0, 7.0], **TWO_ROOFS) == 3.0


def test_equal_values_at_one_height_are_one_value():
    assert value_below(h_x=36.0, values=[9.0, 3.0, 3.0], heights=[36.0, 24.0, 24.0]) == 3.0


def test_values_at_one_height_may_differ_by_round_off():
    heights = [36.0, 24.0, 24.0]
    assert value_below(h_x=36.0, values=[0.0, -3.0, -3.0 - 2e-9], heights=heights) == pytest.approx(-3.0)
    with pytest.raises(NotApplicable):
        value_below(h_x=36.0, values=[0.0, -3.0, -3.0 - 4e-9], heights=heights)
    with pytest.raises(NotApplicable):
        value_below(h_x=[24.0, 36.0], values=[0.0, 1.0, 2.0], heights=heights)


def test_small_numbers_are_no_zeros():
    assert base_shear(C_s=0.02, W=0.5) == 0.01


def test_noise_of_a_subtraction_drops_no_level():
    """16.1 - 4.1 is not 12.0 in binary; the level must still be found, and still count."""
    noisy = 16.1 - 4.1
    assert noisy != 12.0
    assert story_shear(h_x=12.0, forces=[5.0, 7.0], heights=[noisy, 24.0]) == 12.0
    assert distribution_factor(
        w_x=3.0, h_x=12.0, weights=[3.0, 3.0], heights=[noisy, 24.0], k=1
    ) == pytest.approx(1 / 3)


def test_heights_are_compared_to_a_billionth_of_the_highest():
    heights = [12.0, 1000.0]
    assert story_height(h_x=12.0 + 0.9e-6, heights=heights) == pytest.approx(12.0)
    with pytest.raises(NotApplicable):
        story_height(h_x=12.0 + 1.1e-6, heights=heights)
    assert story_height(h_x=1000.0, heights=[*heights, 1000.0 - 0.9e-6]) == 988.0
    assert story_height(h_x=1000.0, heights=[*heights, 1000.0 - 1.1e-6]) == pytest.approx(1.1e-6)


def test_weights_are_compared_to_a_billionth_of_themselves():
    given = {"h_x": 12.0, "weights": [50.0, 9.0], "heights": [12.0, 24.0], "k": 1}
    assert distribution_factor(w_x=50.0 + 4e-8, **given) > 0
    with pytest.raises(NotApplicable):
        distribution_factor(w_x=50.0 + 6e-8, **given)


def test_a_level_without_weight_has_no_force():
    assert distribution_factors(weights=[10.0, 0.0], heights=[12.0, 24.0], k=1).tolist() == [1.0, 0.0]
    assert distribution_factor(w_x=0.0, h_x=24.0, weights=[10.0, 0.0], heights=[12.0, 24.0], k=1) == 0.0


def test_one_level_equals_its_place_in_the_column():
    levels = {"weights": np.array([300.0, 250.0, 120.0]), "heights": np.array([11.0, 25.0, 38.0])}
    column = distribution_factors(**levels, k=1.3)
    assert distribution_factor(
        w_x=levels["weights"], h_x=levels["heights"], **levels, k=1.3
    ) == pytest.approx(column)


@pytest.mark.parametrize(("part", "amplified"), [(-1e-9, False), (5e-13, False), (1e-9, True)])
def test_theta_counts_from_its_thresholds_on_but_for_round_off(part, amplified):
    """12.8.7: ignored up to 0.10, unstable above theta_max."""
    theta = 0.10 * (1 + part)
    assert bool(stability.second_order_factor(theta) > 1) is amplified
    verdict = stability.stability_verdict(theta, 0.25)
    assert verdict == stability.VERDICTS[1 if amplified else 0]
    limit = 0.25 * (1 + part)
    assert stability.stability_verdict(limit, 0.25) == stability.VERDICTS[2 if amplified else 1]
