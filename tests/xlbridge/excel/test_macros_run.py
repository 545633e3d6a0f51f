"""The macro module's own logic, run by LibreOffice Basic in its VBA mode.

Python, the workbook and the calling cell are replaced by a function that hands its first argument back; the
rest is the module's text. This is no Excel: it shows that the text compiles and turns texts into errors.
"""

from __future__ import annotations

import json
import os
import subprocess
from pathlib import Path
from typing import Any

import pytest

from tests.support import office as offices
from tests.support.office import Office
from xlbridge.calc.office import Office as Product
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.validate import describe
from xlbridge.excel.cells import ERROR_NUMBERS
from xlbridge.excel.generate import FOLDER, MACRO_FILE
from xlbridge.excel.module import category, description

MACRO_OPTIONS = (
    "Application.MacroOptions Macro:=named, Description:=text, Category:=heading, ArgumentDescriptions:=help"
)
DRIVER = Path(__file__).with_name("basic_driver.py")
PROBES = """
Function HandBack(moduleName, functionName, arguments, book, caller)
    HandBack = arguments(0)
End Function

Function Probe(value)
    Probe = Described(ELF_IE(value))
End Function

Function ProbeColumn()
    Dim block(0 To 2, 0 To 0)
    block(0, 0) = 1.5
    block(1, 0) = "#NUM! T = -1: must be above 0"
    block(2, 0) = "roof"
    ProbeColumn = Described(ELF_IE(block))
End Function

Function ProbeBlank()
    Dim nothingAtAll
    ProbeBlank = Described(ELF_IE(nothingAtAll))
End Function

Function ProbeFailure()
    ProbeFailure = Described(ELF_IE(ThisComponent))
End Function

Dim recorded

Sub Record(named, text, heading, help)
    Dim i
    recorded = recorded & named & "|" & text & "|" & heading
    For i = LBound(help) To UBound(help)
        recorded = recorded & "|" & help(i)
    Next i
    recorded = recorded & Chr(10)
End Sub

Function ProbeHelp()
    recorded = ""
    StoryledgerHelp
    ProbeHelp = recorded
End Function

Function Described(value)
    Dim i, j, text
    Select Case Dimensions(value)
    Case 0: text = TypeName(value) & " " & CStr(value)
    Case 1
        For i = LBound(value) To UBound(value)
            text = text & TypeName(value(i)) & " " & CStr(value(i)) & ";"
        Next i
    Case 2
        For i = LBound(value, 1) To UBound(value, 1)
            For j = LBound(value, 2) To UBound(value, 2)
                text = text & TypeName(value(i, j)) & " " & CStr(value(i, j)) & ";"
            Next j
            text = text & "/"
        Next i
    End Select
    Described = text
End Function
"""
CALLS: dict[str, tuple[list[Any], str]] = {
    "number": (["Probe", 1.5], "Double 1.5"),
    "text": (["Probe", "roof"], "String roof"),
    "truth": (["Probe", True], "Boolean True"),
    "error of no known name": (["Probe", "#odd"], "Error Error 2015"),
    "row": (["Probe", [1.5, "#REF! w_x", "roof"]], "Double 1.5;Error Error 2023;String roof;"),
    "column": (["ProbeColumn"], "Double 1.5;/Error Error 2036;/String roof;/"),
    "blank": (["ProbeBlank"], "Error Error 2015"),
    "failed call": (["ProbeFailure"], "Error Error 2015"),
    **{code: (["Probe", f"{code} why"], f"Error Error {number}") for number, code in ERROR_NUMBERS.items()},
    "error without a reason": (["Probe", "#N/A"], "Error Error 2042"),
    "help": (
        ["ProbeHelp"],
        "".join(
            "|".join((entry.name, description(entry), category(entry), *map(describe, entry.arguments)))
            + "\n"
            for entry in CATALOGUE.values()
        ),
    ),
}


def module_text() -> str:
    lines = (FOLDER / MACRO_FILE).read_text(encoding="ascii").splitlines()
    text = "\n".join(["Option VBASupport 1", *lines[1:], PROBES])
    for ours, stand_in in (
        ("XLPy.CallUDF(", "HandBack("),
        ("ThisWorkbook, Application.Caller)", "0, 0)"),
        ("If TypeOf Application.Caller Is Range Then ", ""),
        (MACRO_OPTIONS, "Record named, text, heading, help"),
    ):
        assert ours in text
        text = text.replace(ours, stand_in)
    return text


@pytest.fixture(scope="module")
def results(office: Office) -> dict[str, str]:
    program, python = offices.installation() or pytest.fail("LibreOffice is gone")
    environment = {name: value for name, value in os.environ.items() if not name.startswith("PYTHON")}
    done = subprocess.run(
        [python, DRIVER, program, Product.driver.parent],
        input=json.dumps({"module": module_text(), "calls": [call for call, _ in CALLS.values()]}),
        env=environment,
        capture_output=True,
        text=True,
        timeout=180,
        check=False,
    )
    assert done.stdout, done.stderr
    return dict(zip(CALLS, json.loads(done.stdout), strict=True))


@pytest.mark.parametrize("name", CALLS)
def test_what_the_cell_gets(results: dict[str, str], name: str) -> None:
    assert results[name] == CALLS[name][1]
