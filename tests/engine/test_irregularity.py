"""Irregularities: both sides of each limit, types of both editions, and the ratios worked story by story."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.editions import EDITIONS
from engine.errors import NotApplicable
from engine.irregularity import (
    IRREGULARITIES,
    JUDGED,
    consequence,
    diaphragm_irregularity,
    dimension_ratio,
    drift_comparison,
    drift_exception,
    geometric_irregularity,
    judged_irregularity,
    reentrant_irregularity,
    reentrant_ratio,
    soft_story,
    stiffness_ratio,
    stiffness_ratio_of_three,
    strength_ratio,
    torsional_irregularity,
    weak_story,
    weight_irregularity,
    weight_ratio,
)
from engine.irregularity.types import named
from engine.tables import table

FEW = settings(max_examples=60, deadline=None)
EPS = 1e-9
NO = {"drift_exception": "no", "SDC": "D"}
BY_DRIFT = ", exempt by story drift ratios (12.3.2.2)"
BY_STORIES = ", exempt by the number of stories (12.3.2.2)"


@pytest.mark.parametrize(
    ("stiffness", "verdict"),
    [
        *[(70.0, "no irregularity"), (70.0 - EPS, "Type 1a, soft story")],
        *[(60.0, "Type 1a, soft story"), (60.0 - EPS, "Type 1b, extreme soft story")],
    ],
)
@pytest.mark.parametrize("edition", EDITIONS)
def test_soft_story_against_the_story_above(stiffness, verdict, edition):
    given = {"stiffnesses": [stiffness, 100.0, 100.0], "heights": [12.0, 24.0, 36.0]}
    assert soft_story(h_x=12.0, **given, **NO, edition=edition) == verdict


@pytest.mark.parametrize(
    ("stiffness", "verdict"),
    [
        *[(80.0, "no irregularity"), (80.0 - EPS, "Type 1a, soft story")],
        *[(70.0, "Type 1a, soft story"), (70.0 - EPS, "Type 1b, extreme soft story")],
    ],
)
def test_soft_story_against_three_above(stiffness, verdict):
    given = {"stiffnesses": [stiffness, 90.0, 100.0, 110.0], "heights": [12.0, 24.0, 36.0, 48.0]}
    assert soft_story(h_x=12.0, **given, **NO, edition="7-16") == verdict


def test_70_of_100_but_for_round_off_is_not_soft():
    given = {"heights": [12.0, 24.0, 36.0], **NO, "edition": "7-22"}
    assert soft_story(h_x=12.0, stiffnesses=[0.7 * 3, 3.0, 3.0], **given) == "no irregularity"
    assert soft_story(h_x=12.0, stiffnesses=[np.nextafter(2.1, 0), 3.0, 3.0], **given) == "no irregularity"


@pytest.mark.parametrize(
    ("count", "SDC", "drift", "suffix"),
    [
        *[
            (3, "D", "no", ""),
            (3, "D", "yes", BY_DRIFT),
            (2, "B", "no", BY_STORIES),
            (2, "D", "no", BY_STORIES),
        ],
        *[(2, "A", "no", ""), (2, "E", "no", ""), (2, "E", "yes", BY_DRIFT), (2, "D", "yes", BY_STORIES)],
    ],
)
def test_exceptions_of_the_clause(count, SDC, drift, suffix):
    heights = [12.0, 24.0, 36.0][:count]
    given = {"heights": heights, "drift_exception": drift, "SDC": SDC, "edition": "7-16"}
    stiffnesses, weights = [50.0, 100.0, 100.0][:count], [200.0, 100.0, 100.0][:count]
    assert soft_story(h_x=12.0, stiffnesses=stiffnesses, **given) == f"Type 1b, extreme soft story{suffix}"
    assert soft_story(h_x=heights[-1], stiffnesses=stiffnesses, **given) == "no irregularity"
    weights[-1] += 1000.0
    found = weight_irregularity(h_x=heights[-1], weights=weights, **given)
    assert found == f"Type 2, weight{suffix}"


def test_two_roofs_at_one_height_are_one_story():
    given = {"stiffnesses": [50.0, 100.0, 100.0], "heights": [12.0, 24.0, 24.0]}
    assert soft_story(h_x=12.0, **given, **NO, edition="7-22").endswith(BY_STORIES)


def test_a_single_story_is_exempt_and_regular():
    given = {"h_x": 12.0, "heights": [12.0], "drift_exception": "no", "SDC": "F", "edition": "7-16"}
    assert soft_story(stiffnesses=[5.0], **given) == "no irregularity"
    assert weight_irregularity(weights=[5.0], **given) == "no irregularity"


@pytest.mark.parametrize(("weight", "verdict"), [(150.0, "no irregularity"), (150.0 + EPS, "Type 2, weight")])
def test_weight(weight, verdict):
    given = {"h_x": 24.0, "weights": [100.0, weight, 150.0], "heights": [12.0, 24.0, 36.0], **NO}
    assert weight_irregularity(**given, edition="7-16") == verdict
    assert weight_irregularity(**given, edition="7-22") == "no type of 7-22"


def test_a_lighter_roof_is_left_out_and_a_heavier_one_is_not():
    heights = [12.0, 24.0, 36.0]
    assert weight_ratio(24.0, [100.0, 120.0, 10.0], heights) == pytest.approx(1.2)
    assert weight_ratio(24.0, [100.0, 120.0, 130.0], heights) == pytest.approx(1.2)
    assert weight_ratio(36.0, [100.0, 120.0, 130.0], heights) == pytest.approx(130 / 120)
    assert weight_ratio(12.0, [100.0, 20.0, 130.0], heights) == pytest.approx(5.0)


def test_levels_without_weight_are_passed_over():
    heights = [12.0, 24.0, 36.0, 48.0]
    assert weight_ratio(12.0, [100.0, 0.0, 80.0, 50.0], heights) == pytest.approx(1.25)
    assert weight_ratio(24.0, [100.0, 0.0, 80.0, 50.0], heights) == 0.0
    assert weight_ratio(36.0, [100.0, 0.0, 80.0, 0.0], heights) == pytest.approx(0.8)
    assert weight_ratio(12.0, [100.0, 0.0, 0.0, 0.0], heights) == 1.0


@pytest.mark.parametrize(("size", "irregular"), [(78.0, False), (78.0 + 1e-6, True)])
@pytest.mark.parametrize(("edition", "number"), [("7-16", 3), ("7-22", 2)])
def test_geometry(size, irregular, edition, number):
    verdict = f"Type {number}, geometric" if irregular else "no irregularity"
    given = {"heights": [12.0, 24.0, 36.0], "edition": edition}
    assert geometric_irregularity(h_x=12.0, dimensions=[size, 60.0, 60.0], **given) == verdict
    assert geometric_irregularity(h_x=36.0, dimensions=[60.0, 60.0, size], **given) == verdict


@pytest.mark.parametrize(("strength", "state"), [(80.0, 0), (80.0 - EPS, 1), (65.0, 1), (65.0 - EPS, 2)])
@pytest.mark.parametrize(("edition", "number"), [("7-16", 5), ("7-22", 4)])
def test_weak_story(strength, state, edition, number):
    verdicts = ("no irregularity", f"Type {number}a, weak story", f"Type {number}b, extreme weak story")
    given = {"strengths": [strength, 100.0], "heights": [12.0, 24.0], "edition": edition}
    assert weak_story(h_x=12.0, **given) == verdicts[state]
    assert weak_story(h_x=24.0, **given) == "no irregularity"


@pytest.mark.parametrize(
    ("TIR", "older", "newer"),
    [
        (1.2, "no irregularity", "no irregularity"),
        (1.2 + EPS, "Type 1a, torsional", "Type 1, torsional"),
        (1.4, "Type 1a, torsional", "Type 1, torsional"),
        (1.4 + EPS, "Type 1b, extreme torsional", "Type 1, torsional, ratio above 1.4"),
    ],
)
def test_torsion(TIR, older, newer):
    given = {"TIR": TIR, "diaphragm": "rigid or semirigid", "one_sided": "no"}
    assert torsional_irregularity(**given, edition="7-16") == older
    assert torsional_irregularity(**given, edition="7-22") == newer


def test_strength_on_one_side_counts_in_7_22_alone():
    given = {"TIR": 1.0, "diaphragm": "rigid or semirigid", "one_sided": "yes"}
    assert torsional_irregularity(**given, edition="7-16") == "no irregularity"
    assert torsional_irregularity(**given, edition="7-22") == "Type 1, torsional"
    assert torsional_irregularity(**{**given, "TIR": 1.5}, edition="7-22").endswith("above 1.4")


@pytest.mark.parametrize("edition", EDITIONS)
def test_no_torsional_type_for_flexible_diaphragms(edition):
    given = {"TIR": 1.5, "diaphragm": "flexible", "one_sided": "no", "edition": edition}
    assert torsional_irregularity(**given) == "not for flexible diaphragms"


@pytest.mark.parametrize(
    ("ratio", "edition", "verdict"),
    [
        (0.15, "7-16", "no irregularity: limit 15 %"),
        (0.15 + EPS, "7-16", "Type 2, re-entrant corner: limit 15 %"),
        (0.2, "7-22", "no irregularity: limit 20 % (uncertain)"),
        (0.2 + EPS, "7-22", "Type 2, re-entrant corner: limit 20 % (uncertain)"),
    ],
)
def test_reentrant_corner(ratio, edition, verdict):
    assert reentrant_irregularity(ratio=ratio, edition=edition) == verdict


@pytest.mark.parametrize(("p_x", "p_y", "ratio"), [(30.0, 8.0, 0.1), (6.0, 40.0, 0.05), (0.0, 40.0, 0.0)])
def test_the_smaller_projection_decides(p_x, p_y, ratio):
    assert reentrant_ratio(p_x=p_x, p_y=p_y, L_x=120.0, L_y=80.0) == pytest.approx(ratio)


@pytest.mark.parametrize(
    ("opening", "change", "irregular"),
    [(0.5, 0.5, False), (0.5 + EPS, 0.0, True), (0.0, 0.5 + EPS, True), (0.6, 0.6, True), (0.0, 0.0, False)],
)
def test_diaphragm(opening, change, irregular):
    verdict = "Type 3, diaphragm discontinuity" if irregular else "no irregularity"
    assert diaphragm_irregularity(opening=opening, change=change, edition="7-22") == verdict


@pytest.mark.parametrize(
    ("irregularity", "older", "newer"),
    list(zip(JUDGED, ("4", "5", "4"), ("4", "5", "3"), strict=True)),
)
def test_judged(irregularity, older, newer):
    for edition, number in zip(EDITIONS, (older, newer), strict=True):
        found = judged_irregularity(irregularity=irregularity, exists="yes", edition=edition)
        assert found == f"Type {number}, {irregularity}"
        assert judged_irregularity(irregularity, "no", edition) == "no irregularity"


def test_weight_and_extreme_torsion_are_no_types_of_7_22():
    for irregularity in ("weight", "extreme torsional"):
        assert named(irregularity, "7-16").endswith(irregularity)
        with pytest.raises(NotApplicable, match="no type of edition 7-22"):
            named(irregularity, "7-22")


@pytest.mark.parametrize(("ratio", "answer"), [(0.013, "yes"), (0.013 + 1e-9, "no"), (0.002, "yes")])
def test_drift_exception_on_both_sides(ratio, answer):
    heights = [12.0, 24.0, 36.0, 48.0]
    assert drift_exception(drift_ratios=[ratio, 0.01, 0.009, 0.001], heights=heights) == answer
    mixed = [heights[n] for n in (2, 0, 3, 1)], [(ratio, 0.01, 0.009, 0.001)[n] for n in (2, 0, 3, 1)]
    assert drift_exception(drift_ratios=mixed[1], heights=mixed[0]) == answer


def test_drift_exception_leaves_the_top_two_stories_out():
    assert drift_exception(drift_ratios=[0.01, 0.01, 0.001], heights=[12.0, 24.0, 36.0]) == "yes"
    assert drift_exception(drift_ratios=[0.09, 0.01], heights=[12.0, 24.0]) == "yes"


@pytest.mark.parametrize("edition", EDITIONS)
def test_consequences_are_marked_with_their_confidence(edition):
    marks = {"H": "", "M": " (from memory)", "U": " (uncertain)"}
    for row in table("irregularity_consequences").rows:
        if row["edition"] == edition:
            text = f"{row['clause']}: {row['consequence']}{marks[row['confidence']]}"
            for SDC in "ABCDEF":
                parts = consequence(row["irregularity"], SDC, edition).split("; ")
                assert (text in parts) == (SDC in row["categories"])


def test_bans_and_limits_of_7_16():
    assert consequence("extreme torsional", "E", "7-16").startswith("12.3.3.1: not permitted (from memory)")
    assert "not permitted (" not in consequence("extreme torsional", "D", "7-16")
    assert "12.3.4.2: rho = 1.3 (from memory)" in consequence("extreme torsional", "D", "7-16")
    assert consequence("extreme weak story", "B", "7-16").startswith("12.3.3.2: not above two stories")
    assert consequence("weak story", "D", "7-16") == "none listed for Seismic Design Category D"
    assert consequence("weight", "D", "7-22") == "none listed for Seismic Design Category D"
    assert "no longer banned (uncertain)" in consequence("extreme torsional", "F", "7-22")


def test_every_irregularity_has_consequences_somewhere():
    for irregularity in IRREGULARITIES:
        assert any(":" in consequence(irregularity, SDC, "7-16") for SDC in "CDEF")


STORY = st.tuples(st.integers(1, 60), st.integers(1, 999), st.integers(0, 999))


def alone(number, neighbours):
    return number / min(neighbours) if neighbours else 1.0


@FEW
@given(st.lists(STORY, min_size=1, max_size=9, unique_by=lambda s: s[0]), st.randoms(use_true_random=False))
def test_ratios_story_by_story_in_any_order(stories, random):
    ordered = sorted(stories)
    random.shuffle(stories)
    heights, values, weights = (list(column) for column in zip(*stories, strict=True))
    for n, (place, value, _) in enumerate(ordered):
        above = [v for _, v, _ in ordered[n + 1 :]]
        below = [v for _, v, _ in ordered[:n]][-1:]
        expected = alone(value, above[:1])
        assert stiffness_ratio(place, values, heights) == pytest.approx(expected, rel=1e-14)
        assert strength_ratio(place, values, heights) == pytest.approx(expected, rel=1e-14)
        mean = [sum(above[:3]) / 3] if len(above) >= 3 else []
        found = stiffness_ratio_of_three(place, values, heights)
        assert found == pytest.approx(alone(value, mean), rel=1e-14)
        assert dimension_ratio(place, values, heights) == pytest.approx(alone(value, below + above[:1]))
        drift = alone(value, above[:1]) if len(above) > 1 else 1.0
        assert drift_comparison(place, values, heights) == pytest.approx(drift, rel=1e-14)
    if any(weights):
        weighty = [(h, w) for h, _, w in ordered if w]
        for n, (place, weight) in enumerate(weighty):
            near = [w for _, w in weighty[:n]][-1:]
            if n + 1 < len(weighty):
                is_lighter_roof = n + 2 == len(weighty) and weighty[-1][1] < weight
                near += [] if is_lighter_roof else [weighty[n + 1][1]]
            assert weight_ratio(place, weights, heights) == pytest.approx(alone(weight, near), rel=1e-14)
