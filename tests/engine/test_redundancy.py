"""Redundancy factor: every case of both editions, both sides of each limit."""

from __future__ import annotations

from itertools import product

import pytest

from engine.redundancy import (
    CONFIGURATIONS,
    USES,
    counts_for_redundancy,
    redundancy_factor,
    redundancy_in_use,
    redundancy_reason,
    wall_bays,
)

NONE, A, B = CONFIGURATIONS
TORSION = "1.3: torsional irregularity ratio above 1.4 in"
RATIOS = (1.0, 1.4, 1.4 + 1e-9, 2.0)


def written_out(SDC, configuration, over_x, over_y, edition):
    """The clause of each edition in its own words, as a table of cases."""
    if SDC in ("A", "B", "C"):
        return 1.0
    if edition == "7-16" and SDC == "D" and (over_x or over_y):
        return 1.3
    if edition == "7-22" and over_x and over_y:
        return 1.3
    return 1.3 if configuration == NONE else 1.0


@pytest.mark.parametrize("edition", ["7-16", "7-22"])
@pytest.mark.parametrize("configuration", CONFIGURATIONS)
@pytest.mark.parametrize("SDC", "ABCDEF")
def test_every_case(SDC, configuration, edition):
    for x, y in product(RATIOS, RATIOS):
        given = {"SDC": SDC, "configuration": configuration, "TIR_X": x, "TIR_Y": y, "edition": edition}
        rho = written_out(SDC, configuration, x > 1.4, y > 1.4, edition)
        assert redundancy_factor(**given) == rho
        assert redundancy_reason(**given).startswith(f"{rho}: ")


@pytest.mark.parametrize(
    ("SDC", "configuration", "ratios", "edition", "reason"),
    [
        ("C", NONE, (1.5, 1.5), "7-16", "1.0: Seismic Design Category C, 12.3.4.1"),
        ("D", NONE, (1.0, 1.0), "7-16", "1.3: neither condition of 12.3.4.2 is met"),
        ("D", A, (1.0, 1.0), "7-16", "1.0: condition a of 12.3.4.2 is met"),
        ("E", B, (1.5, 1.0), "7-16", "1.0: condition b of 12.3.4.2 is met"),
        (
            "D",
            B,
            (1.5, 1.0),
            "7-16",
            f"{TORSION} one direction, 12.3.4.2",
        ),
        ("D", B, (1.5, 1.0), "7-22", "1.0: condition b of 12.3.4.2 is met"),
        (
            "E",
            A,
            (1.5, 1.5),
            "7-22",
            f"{TORSION} both directions, 12.3.4.2",
        ),
    ],
)
def test_reason(SDC, configuration, ratios, edition, reason):
    assert redundancy_reason(SDC, configuration, *ratios, edition) == reason


@pytest.mark.parametrize("use", USES)
def test_rho_counts_for_strength_and_transfer_alone(use):
    expected = 1.3 if use in ("strength", "transfer forces") else 1.0
    assert redundancy_in_use(use, 1.3) == expected


@pytest.mark.parametrize(("V_x", "answer"), [(35.0, "no"), (35.0 + 1e-9, "yes"), (0.0, "no"), (100.0, "yes")])
def test_stories_that_count(V_x, answer):
    assert counts_for_redundancy(V_x=V_x, V=100.0) == answer


def test_light_frame_counts_twice():
    assert wall_bays(30.0, 10.0, "yes") == 2 * wall_bays(30.0, 10.0, "no") == 6.0
