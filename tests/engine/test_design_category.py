"""Seismic Design Category: both sides of every limit, the rule on S_1, the relief and the permission.

The rows are those of Tables 11.6-1 and 11.6-2 as in FEMA P-2082-1 (2020), chapter 11.
"""

from __future__ import annotations

from itertools import product

import numpy as np
import pytest

from engine.errors import NotApplicable
from engine.occupancy import (
    RISK_CATEGORIES,
    category_A_permitted,
    category_one_second,
    category_short,
    design_category,
    design_category_reason,
    short_table_alone,
)

BELOW = 1 - 1e-9
LIMITS = [(0.167, "AB", "AC"), (0.33, "BC", "CD"), (0.50, "CD", "DD")]
LIMITS_1 = [(0.067, "AB", "AC"), (0.133, "BC", "CD"), (0.20, "CD", "DD")]


@pytest.mark.parametrize(
    ("table", "limit", "ordinary", "essential"),
    [
        *((category_short, *row) for row in LIMITS),
        *((category_one_second, *row) for row in LIMITS_1),
    ],
)
def test_limits_of_the_tables(table, limit, ordinary, essential):
    for category in ("I", "II", "III"):
        assert "".join(table(S, category) for S in (limit * BELOW, limit)) == ordinary
    assert "".join(table(S, "IV") for S in (limit * BELOW, limit)) == essential


def test_far_ends_of_the_tables():
    assert category_short([1e-6, 3.0], "I").tolist() == ["A", "D"]
    assert category_one_second([1e-6, 3.0], "IV").tolist() == ["A", "D"]


@pytest.mark.parametrize("limit", [0.167, 0.33, 0.50])
def test_a_value_that_misses_its_limit_by_round_off_reaches_it(limit):
    """A third of 0.99 times 1.0 may end up one unit of the last place below 0.33."""
    assert category_short(np.nextafter(limit, 0), "II") == category_short(limit, "II")
    assert category_short(limit * (1 - 1e-11), "II") != category_short(limit, "II")


@pytest.mark.parametrize(
    ("S_DS", "S_D1", "category", "reason"),
    [
        (0.10, 0.05, "A", "Tables 11.6-1 and 11.6-2 alike"),
        (0.40, 0.15, "C", "Tables 11.6-1 and 11.6-2 alike"),
        (0.30, 0.15, "C", "Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives B"),
        (0.55, 0.15, "D", "Table 11.6-1 (S_DS); Table 11.6-2 (S_D1) gives C"),
        (0.10, 0.20, "D", "Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives A"),
        (0.50, 0.05, "D", "Table 11.6-1 (S_DS); Table 11.6-2 (S_D1) gives A"),
    ],
)
def test_the_worse_table_governs(S_DS, S_D1, category, reason):
    assert design_category(S_DS, S_D1, 0.3, "II") == category
    assert design_category_reason(S_DS, S_D1, 0.3, "II") == reason


@pytest.mark.parametrize("risk_category", RISK_CATEGORIES)
def test_near_a_fault_the_tables_no_longer_decide(risk_category):
    worst = "F" if risk_category == "IV" else "E"
    for alone in ("yes", "no"):
        assert design_category(0.1, 0.05, 0.75, risk_category, alone) == worst
        assert design_category_reason(0.1, 0.05, 0.75, risk_category, alone) == "S_1 at least 0.75 g"
        assert design_category(2.0, 1.5, 0.75 * BELOW, risk_category, alone) == "D"


def test_the_short_table_alone():
    assert design_category(0.30, 0.25, 0.2, "II") == "D"
    assert design_category(0.30, 0.25, 0.2, "II", "yes") == "B"
    assert design_category_reason(0.30, 0.25, 0.2, "II", "yes") == "Table 11.6-1 (S_DS) alone"
    assert design_category(0.55, 0.05, 0.2, "II", "yes") == "D"


@pytest.mark.parametrize("answers", [*product(("yes", "no"), repeat=4)])
def test_every_condition_of_the_relief_is_needed(answers):
    names = ("T_a_below", "T_drift_below", "plateau_used", "rigid_diaphragms")
    given = dict(zip(names, answers, strict=True))
    assert short_table_alone(0.3, **given) == ("no" if "no" in answers else "yes")
    assert short_table_alone([0.75, 0.75 * BELOW], **given).tolist()[0] == "no"


@pytest.mark.parametrize(
    ("S_S", "S_1", "permitted"),
    [(0.15, 0.04, "yes"), (0.1501, 0.04, "no"), (0.15, 0.0401, "no"), (0.0, 0.0, "yes"), (1.0, 1.0, "no")],
)
def test_category_a_by_the_mapped_accelerations(S_S, S_1, permitted):
    assert category_A_permitted(S_S, S_1) == permitted


def test_columns_of_sites():
    found = design_category([0.1, 0.4, 0.9], [0.05, 0.1, 0.4], [0.1, 0.1, 0.8], "III")
    assert found.tolist() == ["A", "C", "E"]


def test_an_unknown_risk_category_is_refused_even_near_a_fault():
    with pytest.raises(NotApplicable, match="risk_category = 'V'"):
        design_category(0.3, 0.2, 0.9, "V")
