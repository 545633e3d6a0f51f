"""Which period is used for strength and for drift, and the conditions of the formula by stories."""

from __future__ import annotations

import numpy as np
import pytest

from engine.period import (
    PERIOD_BOUNDS,
    design_period,
    drift_period,
    period_bound,
    stories_formula_status,
)

COMPUTED, LIMIT = PERIOD_BOUNDS
CAP = {"T_a": 1.0, "C_u": 1.4}


@pytest.mark.parametrize(("T_computed", "bound"), [(1.39, COMPUTED), (1.4, COMPUTED), (1.41, LIMIT)])
def test_strength_is_capped_and_drift_need_not_be(T_computed, bound):
    assert period_bound(**CAP, T_computed=T_computed) == bound
    strength = design_period(**CAP, T_computed=T_computed)
    assert drift_period(**CAP, T_computed=T_computed, cap="with the cap") == strength
    assert drift_period(**CAP, T_computed=T_computed, cap="without the cap") == T_computed


def test_a_tie_but_for_round_off_is_the_computed_period():
    limit = 1.7 * 0.43
    for T in (np.nextafter(limit, 0), np.nextafter(limit, 9)):
        assert period_bound(T_a=0.43, C_u=1.7, T_computed=T) == COMPUTED


def test_the_period_for_drift_takes_the_shape_of_all_its_arguments():
    given = {"C_u": 1.4, "T_a": [1.0, 2.0], "T_computed": 2.5}
    assert drift_period(**given, cap="without the cap").tolist() == [2.5, 2.5]
    assert drift_period(**given, cap="with the cap").tolist() == [1.4, 2.5]


@pytest.mark.parametrize(
    ("N", "h_n", "frames", "units", "fails"),
    [
        (12, 120.0, "yes", "us", ()),
        (12, 36.0, "yes", "si", ()),
        (13, 130.0, "yes", "us", ("more than 12 stories",)),
        (10, 99.9, "yes", "us", ("average story height below 10 ft",)),
        (10, 29.9, "yes", "si", ("average story height below 3 m",)),
        (3, 40.0, "no", "us", ("not moment frames of concrete or steel alone",)),
        (
            *(13, 39.0 - 0.1, "no", "si"),
            (
                "more than 12 stories",
                "average story height below 3 m",
                "not moment frames of concrete or steel alone",
            ),
        ),
    ],
)
def test_the_formula_by_stories(N, h_n, frames, units, fails):
    expected = f"not permitted: {'; '.join(fails)}" if fails else "permitted"
    assert stories_formula_status(N, h_n, frames, units) == expected


def test_an_average_that_is_10_ft_but_for_round_off():
    assert stories_formula_status(7, np.nextafter(70.0, 0), "yes", "us") == "permitted"
