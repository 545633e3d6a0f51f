"""Every row of Table 12.2-1 read a second time off its file, and what the engine says of its doubts."""

from __future__ import annotations

import numpy as np
import pytest

from engine.editions import EDITIONS
from engine.errors import NotApplicable
from engine.systems import (
    KNOWN,
    SYSTEMS,
    coefficients_status,
    confidence,
    deflection_amplification,
    overstrength,
    reduced_overstrength,
    response_modification,
)
from tests.support.system_rows import ADDED, OLD, ROWS, code, name

NUMBERS = {"R": response_modification, "Omega0": overstrength, "Cd": deflection_amplification}


@pytest.mark.parametrize("row", OLD, ids=code)
def test_the_numbers_of_a_row_in_both_editions_and_by_its_code(row):
    for column, rule in NUMBERS.items():
        for edition in EDITIONS:
            assert rule(name(row), edition) == float(row[column])
        assert rule(row["code"], "7-16") == float(row[column])


@pytest.mark.parametrize("row", ADDED, ids=code)
def test_a_row_in_doubt_gives_no_number_and_says_so(row):
    for column, rule in NUMBERS.items():
        with pytest.raises(NotApplicable, match=f"{column} = {row[column]} is uncertain here: enter"):
            rule(name(row), "7-22")
        with pytest.raises(NotApplicable, match="one of 85 texts"):
            rule(name(row), "7-16")
    assert name(row) not in KNOWN
    assert confidence(name(row), "7-22").startswith("coefficients uncertain; height limits uncertain")


def test_the_choice_lists():
    assert set(SYSTEMS) == set(EDITIONS)
    assert set(SYSTEMS["7-16"]) == set(KNOWN) == {name(row) for row in OLD}
    assert set(SYSTEMS["7-22"]) == {name(row) for row in ROWS}
    for names in SYSTEMS.values():
        assert len(set(names)) == len(names)
        letters = [words[0] for words in names]
        assert letters == sorted(letters)


def test_a_code_is_none_of_an_edition_that_moved_the_rows():
    with pytest.raises(NotApplicable, match=r"system = 'A\.15'"):
        response_modification("A.15", "7-22")


@pytest.mark.parametrize(
    ("row_code", "edition", "words"),
    [
        ("B.4", "7-16", "coefficients seen in a public source; height limits from memory; source: Primer"),
        ("B.6", "7-16", "coefficients from memory; height limits from memory"),
        ("A.7", "7-16", "coefficients seen in a public source; height limits seen in a public source"),
    ],
)
def test_confidence_in_words(row_code, edition, words):
    assert confidence(row_code, edition).startswith(words)


def test_a_row_carried_over_is_from_memory():
    walls = "A. Special reinforced concrete shear walls"
    assert "row of 7-16, from memory unchanged in 7-22" in confidence(walls, "7-22")
    assert "unchanged" not in confidence(walls, "7-16")
    entered = {"system": walls, "R": 5.0, "Omega_0": 2.5, "C_d": 5.0}
    assert coefficients_status(**entered, edition="7-16") == "as the table"
    assert coefficients_status(**entered, edition="7-22") == "as the table (from memory: confirm)"


def test_what_differs_is_named():
    entered = {"system": "C.1", "edition": "7-16"}
    words = coefficients_status(R=[8.0, 6.0, 6.0], Omega_0=3.0, C_d=[5.5, 5.5, 4.0], **entered)
    assert words.tolist() == [
        "as the table",
        "differs: table R = 8",
        "differs: table R = 8; table C_d = 5.5",
    ]
    assert coefficients_status(R=8.0, Omega_0=2.5, C_d=5.5, **entered) == "differs: table Omega_0 = 3"
    assert coefficients_status(R=np.nextafter(8.0, 9), Omega_0=3.0, C_d=5.5, **entered) == "as the table"


def test_an_entry_against_a_row_in_doubt():
    timber = {"system": "A. Cross-laminated timber shear walls", "edition": "7-22"}
    words = coefficients_status(R=[3.0, 4.0], Omega_0=3.0, C_d=3.0, **timber)
    doubt = "(uncertain: take it from the standard)"
    assert words.tolist() == [f"as the table {doubt}", f"differs: table R = 3 {doubt}"]


@pytest.mark.parametrize(("tabulated", "used"), [(2.0, 2.0), (2.499, 2.499), (2.5, 2.0), (3.0, 2.5)])
def test_overstrength_is_reduced_from_2_5_on(tabulated, used):
    assert reduced_overstrength(tabulated, "flexible diaphragms") == used
    assert reduced_overstrength(tabulated, "as tabulated") == tabulated
