"""Edition data: complete, doubtful only in words, and its clauses repeated truly in the docstrings."""

from __future__ import annotations

import re
from inspect import signature

import pytest

from engine.editions import EDITIONS, Clause, clause, clauses, differences, rules, value
from engine.errors import NotApplicable
from tests.support.formulas import function, public_functions

REFERENCE = re.compile(r"rule (\w+): 7-16 (.+?); 7-22 (.+)")
ONLY_IN = {
    "7-16": {
        "weight_irregularity",
        "F_a",
        "F_v",
        "S_MS",
        "S_M1",
        "hazard_analysis",
        "C_s_increase",
        "S_floor",
        "SDC_A",
    },
    "7-22": {"C_s_diaph", "C_s_method1", "S_a_multi"},
}


def test_both_editions_have_the_same_rules_but_a_few():
    assert set(rules("7-22")) - set(rules("7-16")) == ONLY_IN["7-22"]
    assert set(rules("7-16")) - set(rules("7-22")) == ONLY_IN["7-16"]


def test_a_rule_of_no_edition_is_refused():
    with pytest.raises(NotApplicable, match="not a rule of any edition"):
        clauses("C_s_method3")


def test_equation_numbers_that_public_sources_confirm():
    """7-16: C_s, T_a, theta by published calculations to that edition; 7-22: F_x, C_vx, T_a likewise."""
    assert [clause("7-16", key).equation for key in ("C_s_plateau", "T_a", "delta_x", "theta")] == [
        *("12.8-2", "12.8-7", "12.8-15", "12.8-16")
    ]
    assert [clause("7-22", key).equation for key in ("T_a", "F_x", "C_vx")] == [
        "12.8-8",
        "12.8-12",
        "12.8-13",
    ]


def test_7_22_numbers_are_those_of_7_16_plus_one():
    for key in (
        "C_s_plateau",
        "C_s_cap",
        "C_s_cap_long",
        "C_s_min",
        "C_s_min_S1",
        "T_a",
        "T_a_stories",
        "V_x",
    ):
        older, newer = (int(clause(edition, key).equation.split("-")[1]) for edition in EDITIONS)
        assert newer == older + 1


def test_method_1_is_no_rule_of_7_16():
    with pytest.raises(NotApplicable, match="not a rule of edition 7-16"):
        clause("7-16", "C_s_method1")


def test_unknown_edition_is_refused():
    with pytest.raises(NotApplicable, match="edition = '7-10': must be one of 7-16, 7-22"):
        clause("7-10", "C_vx")


def test_unknown_value_is_refused():
    with pytest.raises(NotApplicable, match="not a value of edition"):
        value("7-22", "alpha")


def test_a_clause_reads_as_engineers_write_it():
    assert str(clause("7-22", "C_vx")) == "12.8.3, Eq. 12.8-13"
    assert str(clause("7-22", "I_e")) == "11.5.1, Table 1.5-2"
    assert str(clause("7-22", "T_max")) == "12.8.2"


def test_a_change_of_more_than_a_number_is_said():
    assert any("1.25/Omega_0" in note for note in differences("beta"))
    assert any("story stiffness" in note for note in differences("theta"))


@pytest.mark.parametrize(
    ("confidence", "note", "message"),
    [("M", "", "must say 'from memory'"), ("U", "", "in words"), ("X", "from memory", "confidence 'X'")],
)
def test_a_doubt_without_words_is_refused(confidence, note, message):
    with pytest.raises(ValueError, match=message):
        Clause("ASCE/SEI 7-22", "12.8.3", "", confidence, note)


@pytest.mark.parametrize("name", [name for name, _ in public_functions()])
def test_docstring_cites_the_edition_data(name):
    cited = REFERENCE.findall(function(name).__doc__)
    assert cited, f"{name} cites no rule"
    for key, older, newer in cited:
        where = clauses(key)
        assert (older, newer) == (str(where.get("7-16", "none")), str(where.get("7-22", "none")))


SECTIONS = ("Parameters", "Returns", "Raises", "Notes", "Example", "Reference")


@pytest.mark.parametrize("name", [name for name, _ in public_functions()])
def test_docstring_keeps_its_order_and_its_signature(name):
    text = function(name).__doc__
    found = re.findall(rf"^    ({'|'.join(SECTIONS)})$", text, re.MULTILINE)
    assert found == [section for section in SECTIONS if section in found]
    assert set(SECTIONS) - set(found) <= {"Notes"}
    arguments = re.search(r"    Parameters\n(.*?)    Returns\n", text, re.DOTALL)[1]
    described = [
        part
        for names in re.findall(r"^        (\S[\w, ]*):", arguments, re.MULTILINE)
        for part in names.split(", ")
    ]
    parameters = list(signature(function(name)).parameters)
    assert described == parameters, name
