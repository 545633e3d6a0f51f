"""The generated modules are the catalogue's, to the byte, and read as Excel needs them."""

from __future__ import annotations

import ast
import re
import warnings
from dataclasses import replace
from pathlib import Path

import pytest

from xlbridge.catalogue import CATALOGUE
from xlbridge.excel import generate
from xlbridge.excel.cells import ERROR_NUMBERS
from xlbridge.excel.generate import FOLDER, MACRO_FILE, PYTHON_FILE, generated, main, outdated


@pytest.fixture(scope="module")
def macro_text() -> str:
    return (FOLDER / MACRO_FILE).read_bytes().decode("ascii")


def test_the_committed_files_are_those_that_would_be_generated() -> None:
    assert outdated() == []


@pytest.mark.parametrize("name", [PYTHON_FILE, MACRO_FILE])
def test_a_planted_difference_is_found_and_mended(name: str, tmp_path: Path) -> None:
    main(tmp_path)
    assert outdated(tmp_path) == []
    data = (tmp_path / name).read_bytes()
    (tmp_path / name).write_bytes(data.replace(b"ELF_CVX", b"ELF_CVY", 1))
    assert outdated(tmp_path) == [name]
    main(tmp_path)
    assert (tmp_path / name).read_bytes() == data
    (tmp_path / name).unlink()
    assert outdated(tmp_path) == [name]


def test_a_change_of_the_catalogue_changes_the_files() -> None:
    entry = CATALOGUE["ELF_FX"]
    changed = dict(CATALOGUE) | {"ELF_FX": replace(entry, summary="Another summary.")}
    assert generated(changed)[PYTHON_FILE] != generated()[PYTHON_FILE]
    fewer = {name: item for name, item in CATALOGUE.items() if name != "ELF_FX"}
    assert generated(fewer)[MACRO_FILE] != generated()[MACRO_FILE]


def test_a_name_that_excel_misreads_is_not_generated(monkeypatch: pytest.MonkeyPatch) -> None:
    entry = CATALOGUE["ELF_FX"]
    wrong = replace(entry, arguments=(replace(entry.arguments[0], name="Next"), *entry.arguments[1:]))
    with pytest.raises(ValueError, match=r"ELF_FX\(Next\): a word of the macro language"):
        generate.generated({"ELF_FX": wrong})
    with pytest.raises(ValueError, match="two functions of this name"):
        generate.generated({"a": entry, "b": entry})
    long = replace(entry, summary="x" * 255)
    with pytest.raises(ValueError, match="cut at 255"):
        generate.generated({"ELF_FX": long})


def test_each_function_forwards_its_own_arguments_in_order() -> None:
    tree = ast.parse((FOLDER / PYTHON_FILE).read_text(encoding="utf-8"))
    functions = {node.name: node for node in tree.body if isinstance(node, ast.FunctionDef)}
    assert list(functions) == list(CATALOGUE)
    for name, node in functions.items():
        names = [argument.arg for argument in node.args.args]
        assert names == [argument.name for argument in CATALOGUE[name].arguments]
        assert ast.unparse(node.body[-1]) == f"return call({', '.join([repr(name), *names])})"
        assert len(node.args.defaults) == sum(a.optional for a in CATALOGUE[name].arguments)
        assert {ast.unparse(default) for default in node.args.defaults} <= {"OMITTED"}


def test_no_function_has_a_second_name() -> None:
    from xlbridge.excel import functions

    bound = [
        name for name, value in vars(functions).items() if getattr(value, "__name__", "").startswith("ELF_")
    ]
    assert bound == list(CATALOGUE)


def test_the_macro_module_has_the_editors_line_ends_and_lengths(macro_text: str) -> None:
    assert re.search(r"(?<!\r)\n", macro_text) is None
    assert max(map(len, macro_text.splitlines())) <= 1023  # limit of a line in the macro editor
    assert macro_text.startswith('Attribute VB_Name = "storyledger"\r\n')


def test_every_block_of_the_macro_module_is_closed(macro_text: str) -> None:
    words = [line.strip() for line in macro_text.splitlines()]
    for opening, closing in (
        (r"(Public|Private) Function \w+\(", r"End Function"),
        (r"(Public|Private) Sub \w+\(", r"End Sub"),
        (r"If .* Then$", r"End If"),
        (r"Select Case ", r"End Select"),
        (r"For \w+ = ", r"Next \w+"),
    ):
        opened = sum(bool(re.match(opening, word)) for word in words)
        assert opened == sum(bool(re.fullmatch(closing, word)) for word in words) > 0


def test_every_error_value_has_its_case(macro_text: str) -> None:
    for number, code in ERROR_NUMBERS.items():
        assert f'    Case "{code}": WithError = CVErr({number})' in macro_text


def test_a_failed_call_is_an_error_value_not_a_text(macro_text: str) -> None:
    assert macro_text.count("failed:\r\n") == len(CATALOGUE) + 1  # the version is asked too
    assert len(re.findall(r"failed:\r\n    (ELF_\w+) = CVErr\(2015\)\r\nEnd Function", macro_text)) == len(
        CATALOGUE
    )
    assert "Err.Description" not in macro_text


def test_an_independent_reader_of_macros_finds_nothing_suspicious(macro_text: str) -> None:
    """oletools: no automatic start, no shell, no file access in the module."""
    with warnings.catch_warnings(action="ignore"):  # of the libraries that oletools uses
        from oletools.olevba import VBA_Parser
    parser = VBA_Parser(MACRO_FILE, data=macro_text.encode("ascii"))
    assert parser.detect_vba_macros()
    found = {word for kind, word, _ in parser.analyze_macros() if kind in ("AutoExec", "Suspicious")}
    assert found == {"system", "open"}  # words of help texts: the structural system, open parking
