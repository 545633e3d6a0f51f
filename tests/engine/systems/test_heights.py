"""Height limits of every row and category, the increase of 12.2.5.4, and both sides of a limit."""

from __future__ import annotations

import pytest

from engine.errors import EngineError, MissingValue, NotApplicable
from engine.systems import height_limit, height_status
from tests.support.system_rows import OLD, code

WALLS = {"system": "A.1", "edition": "7-16"}
RAISED = {"A.1", "B.1", "B.2", "B.4", "B.25", "B.26"}
NOT_DUE = "Table 12.2-1 does not apply in Seismic Design Category A"


@pytest.mark.parametrize("row", OLD, ids=code)
@pytest.mark.parametrize("SDC", ["B", "C", "D", "E", "F"])
def test_the_limit_of_a_row(row, SDC):
    words = {"NL": "no limit (NL)", "NP": "not permitted (NP)"}
    mark = "" if row["confidence_limits"] == "H" else " (from memory: confirm)"
    expected = words.get(row[SDC], f"{row[SDC]} ft") + mark
    assert height_limit(row["code"], SDC, "no", "7-16", "us") == expected


def test_seismic_design_category_a():
    assert height_limit(**WALLS, SDC="A", increase="no", units="us") == NOT_DUE
    assert height_status(900.0, **WALLS, SDC="A", increase="no", units="us") == NOT_DUE
    with pytest.raises(NotApplicable, match="units"):
        height_limit(**WALLS, SDC="A", increase="no", units="metric")


@pytest.mark.parametrize(
    ("SDC", "limit"),
    [("B", "no limit (NL)"), ("C", "no limit (NL)"), ("D", "240 ft"), ("E", "240 ft"), ("F", "160 ft")],
)
def test_the_increase(SDC, limit):
    mark = " (from memory: confirm)" if "ft" in limit else ""
    assert height_limit(**WALLS, SDC=SDC, increase="yes", units="us") == limit + mark


@pytest.mark.parametrize("row", OLD, ids=code)
def test_who_may_be_increased(row):
    call = {"system": row["code"], "SDC": "D", "increase": "yes", "edition": "7-16", "units": "us"}
    if row["code"] in RAISED:
        assert height_limit(**call).startswith("240 ft")
        return
    with pytest.raises(NotApplicable, match=r"12\.2\.5\.4 is not known to list this system"):
        height_limit(**call)


@pytest.mark.parametrize(
    ("h_n", "units", "words"),
    [
        (160.0, "us", "within the limit: 160 ft"),
        (160.001, "us", "above the limit: 160 ft"),
        (160 * 0.3048, "si", "within the limit: 48.768 m"),
        (48.77, "si", "above the limit: 48.768 m"),
    ],
)
def test_both_sides_of_the_limit(h_n, units, words):
    assert height_status(h_n, **WALLS, SDC="D", increase="no", units=units) == words


def test_several_heights():
    found = height_status([150.0, 170.0], **WALLS, SDC="D", increase="no", units="us")
    assert found.tolist() == ["within the limit: 160 ft", "above the limit: 160 ft"]


def test_a_system_without_limit_and_one_that_is_not_permitted():
    call = {"h_n": 900.0, "SDC": "D", "increase": "no", "edition": "7-16", "units": "us"}
    assert height_status(system="C.1", **call).startswith("no limit (NL)")
    assert height_status(system="A.2", **call) == "not permitted (NP)"


def test_a_doubtful_limit_says_so():
    timber = {"system": "A. Cross-laminated timber shear walls", "edition": "7-22"}
    words = height_status(70.0, **timber, SDC="D", increase="no", units="us")
    assert words == "above the limit: 65 ft (uncertain: take it from the standard)"


def test_a_blank_answer_is_missing():
    with pytest.raises(MissingValue, match="increase"):
        height_limit(**WALLS, SDC="D", increase="", units="us")
    with pytest.raises(EngineError, match="SDC = 'G'"):
        height_limit(**WALLS, SDC="G", increase="no", units="us")
