"""Names that Excel or its macro language misreads.

Sources: Microsoft, "Rename a named range/names in formulas" (no cell references, no R or C), "Visual Basic
naming rules" and "Keywords" of the VBA language reference; limit of 60 parameters: common practice.
"""

from __future__ import annotations

import pytest

from xlbridge.catalogue import CATALOGUE
from xlbridge.excel.names import faults, repeated


@pytest.mark.parametrize(
    "name", ["ELF_A", "ELF_CVX", "XFE1", "ABCD1", "A1048577", "A0", "RCX", "CS", "META_1"]
)
def test_names_that_are_fine(name: str) -> None:
    assert faults(name, ["w_x", "h_x", "V", "T", "k"], ["x" * 255]) == []


@pytest.mark.parametrize(
    ("name", "words"),
    [
        ("ELF1", "cell address"),
        ("CS1", "cell address"),
        ("xfd1048576", "cell address"),
        ("R", "row and column"),
        ("c", "row and column"),
        ("RC", "row and column"),
        ("R1C1", "row and column"),
        ("_f", "not a name"),
        ("1f", "not a name"),
        ("é", "not a name"),
        ("a.b", "not a name"),
        ("", "not a name"),
        ("Function", "a word of the macro language"),
    ],
)
def test_function_names_that_are_misread(name: str, words: str) -> None:
    assert any(words in fault for fault in faults(name))


@pytest.mark.parametrize(
    ("arguments", "words"),
    [
        (["type"], "a word of the macro language"),
        (["End"], "a word of the macro language"),
        (["h", "H"], "the name is used twice"),
        (["elf_f"], "the name is used twice"),
        (["caller"], "filled by xlwings"),
        (["w-x"], "not a name"),
        ([f"a{number}" for number in range(61)], "61 parameters"),
    ],
)
def test_arguments_that_are_misread(arguments: list[str], words: str) -> None:
    assert any(words in fault for fault in faults("ELF_F", arguments))


def test_help_texts_that_excel_would_cut() -> None:
    assert faults("ELF_F", [], ["x" * 256]) == ["ELF_F: a text of 256 characters, cut at 255"]


def test_the_same_name_twice() -> None:
    assert len(repeated(["ELF_A", "ELF_B", "elf_a"])) == 1
    assert repeated(CATALOGUE) == []
