"""The two-stage procedure: each condition on both sides, and the definition of 7-22 on a chain of stories."""

from __future__ import annotations

from itertools import product

import numpy as np
import pytest

from engine.two_stage import (
    PROCEDURES,
    TRANSITION,
    part_stiffness,
    period_ratio,
    reaction_factor,
    stiffness_ratio,
    transition_amplification,
    two_stage_status,
)

ELF, MODAL, OTHER = PROCEDURES
ITEMS = (
    "stiffness ratio below 10 (item a)",
    "period ratio above 1.1 (item b)",
    "upper part by neither equivalent lateral force nor modal procedure (item e)",
    "lower part not by the equivalent lateral force procedure (item e)",
)


@pytest.mark.parametrize(("upper", "lower"), list(product(PROCEDURES, PROCEDURES)))
@pytest.mark.parametrize(("stiffness", "period"), list(product((9.999, 10.0), (1.1, 1.101))))
def test_every_combination_of_conditions(stiffness, period, upper, lower):
    fails = (stiffness < 10, period > 1.1, upper == OTHER, lower != ELF)
    named = "; ".join(text for text, failing in zip(ITEMS, fails, strict=True) if failing)
    found = two_stage_status(stiffness, period, upper, lower)
    assert found == (f"not permitted: {named}" if named else "permitted")


def test_ratios_at_their_limits_but_for_round_off():
    assert stiffness_ratio(K_lower=3.0, K_upper=0.3) == pytest.approx(10.0)
    assert period_ratio(T_whole=0.33, T_upper=0.3) == pytest.approx(1.1)
    assert two_stage_status(np.nextafter(10.0, 0), np.nextafter(1.1, 2), ELF, ELF) == "permitted"


def test_several_at_once():
    found = two_stage_status([9.0, 11.0], 1.0, MODAL, ELF)
    assert found.tolist() == ["not permitted: stiffness ratio below 10 (item a)", "permitted"]


@pytest.mark.parametrize(
    ("upper", "lower", "factor"),
    [((6.5, 1.3), (4.0, 1.0), 1.25), ((6.5, 1.0), (6.5, 1.0), 1.0), ((6.5, 1.3), (6.5, 1.0), 1.0)],
)
def test_reactions_are_never_reduced(upper, lower, factor):
    assert reaction_factor(*upper, *lower) == pytest.approx(factor)


def test_redundancy_of_the_lower_part_raises_the_reactions():
    assert reaction_factor(6.5, 1.0, 5.0, 1.3) == pytest.approx(6.5 * 1.3 / 5.0)


def test_stiffness_of_a_part_of_two_springs():
    """A force P at each of two levels on springs of 400 and 200 kip/in: 2P/400 + P/200 at the top."""
    P = 30.0
    assert part_stiffness(V=2 * P, delta=2 * P / 400 + P / 200) == pytest.approx(200.0)


def test_transition():
    assert transition_amplification("no") == TRANSITION[0]
    assert "uncertain" in transition_amplification("yes")
