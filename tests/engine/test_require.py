"""The checks at the door: one bad value among good ones is found, and large numbers are numbers."""

from __future__ import annotations

from functools import partial

import numpy as np
import pytest

from engine.errors import ImpossibleValue, NotApplicable, WrongType, listed
from engine.require import above, agree, at_least, at_most, choice, finite, reasons, within

NAN, INF = float("nan"), float("inf")
CHECKS = {
    "finite": finite,
    "above": partial(above, 0),
    "at_least": partial(at_least, 1),
    "at_most": partial(at_most, 9),
    "within": partial(within, 1, 9),
}
OUTSIDE = {"finite": [], "above": [0.0, -1.0], "at_least": [0.9], "at_most": [9.1], "within": [0.9, 9.1]}


@pytest.mark.parametrize(("name", "bad"), [(name, bad) for name in CHECKS for bad in (NAN, INF, -INF)])
@pytest.mark.parametrize("place", [0, 1, 2])
def test_a_value_that_is_not_finite_is_found(name, bad, place):
    values = [2.0, 3.0, 4.0]
    values[place] = bad
    with pytest.raises(ImpossibleValue, match=f"x = {bad}: must be a finite number"):
        CHECKS[name]("x", values)


@pytest.mark.parametrize(
    ("name", "bad"), [(name, bad) for name, all_bad in OUTSIDE.items() for bad in all_bad]
)
@pytest.mark.parametrize("place", [0, 1, 2])
def test_a_value_outside_is_named(name, bad, place):
    values = [2.0, 3.0, 4.0]
    values[place] = bad
    with pytest.raises(ImpossibleValue, match=f"x = {bad:g}: must be (above|at)"):
        CHECKS[name]("x", values)


@pytest.mark.parametrize("name", CHECKS)
def test_values_inside_come_back_as_floats(name):
    found = CHECKS[name]("x", [1, 5, 9])
    assert found.dtype == np.float64
    assert found.tolist() == [1.0, 5.0, 9.0]


@pytest.mark.parametrize("name", CHECKS)
def test_nothing_is_nothing(name):
    assert CHECKS[name]("x", []).size == 0


@pytest.mark.parametrize("flag", [True, False, np.True_])
def test_a_flag_among_numbers_is_no_number(flag):
    for values in ([1.0, flag], (flag, 1.0), [[1.0], [flag]]):
        with pytest.raises(WrongType, match=r"x = .*: must be a number"):
            finite("x", values)


def test_large_numbers_are_finite():
    assert finite("x", [1e308, 1e308]).tolist() == [1e308, 1e308]


def test_agreement_but_for_round_off():
    assert agree(1.0, 1.0 + 5e-13)
    assert not agree(1.0, 1.0 + 5e-12)
    assert not agree(0.0, 1e-300)


def test_reasons_are_joined_in_their_order():
    assert reasons(("a", "b"), (True, True), "none") == "a; b"
    assert reasons(("a", "b"), (False, True), "none") == "b"
    assert reasons(("a", "b"), (False, False), "none") == "none"
    found = reasons(("a", "b"), ([[True, False]], [[False], [True]]), "none")
    assert found.tolist() == [["a", "none"], ["a; b", "b"]]


def test_a_long_list_of_words_is_named_by_its_ends():
    words = [f"word {n}" for n in range(60)]
    assert listed(words[:3]) == "word 0, word 1, word 2"
    with pytest.raises(NotApplicable, match="one of 60 texts from 'word 0' to 'word 59'"):
        choice("x", "word 60", words)
