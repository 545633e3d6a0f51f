"""The check of the bridge: a workbook that shows, function by function, whether cells reach the engine."""

from __future__ import annotations

import textwrap
from collections.abc import Iterator, Sequence
from typing import Any, Final, NamedTuple

from openpyxl import Workbook
from openpyxl.worksheet.worksheet import Worksheet

from engine.units import US
from engine.version import __version__
from workbook_templates.declare import Role
from workbook_templates.draw import sheets, style
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import SheetFunction

SHEET: Final = "Bridge check"
HEADERS: Final = ("What is asked", "Expected", "Actual", "Verdict", "Formula")
WIDTHS: Final = (52, 24, 24, 18, 70)
STATUS, HEADER = 3, 8
OK, WRONG, SILENT = "✓ ok", "✗ another value", "✗ no answer"
ADVICE: Final = (
    "Recalculate everything first: Ctrl+Alt+F9 in Excel, Ctrl+Shift+F9 in Calc. Every line ok: the functions "
    "work here. `no answer` in every line: the functions are not reached, see the troubleshooting table of "
    "the README. `another value`: do not use this installation, and report it."
)


class Line(NamedTuple):
    """One question to the bridge."""

    what: str
    expected: Any
    formula: str


def draw(versions: Sequence[Line] = ()) -> Workbook:
    """Return the workbook; ``versions`` are lines that only some front end can answer."""
    workbook = Workbook()
    sheet = workbook.worksheets[0]
    sheet.title = SHEET
    style.write(sheet["A1"], f"Check of the bridge   |   Storyledger {__version__}", style.TITLE)
    style.write(sheet["A2"], sheets.CAUTION, style.SMALL)
    for row, text in enumerate(textwrap.wrap(ADVICE, 150), 4):
        style.write(sheet.cell(row, 1), text)
    sheets.table_head(sheet, HEADER, HEADERS, WIDTHS)
    last = HEADER
    for last, line in enumerate((*versions, *_errors(), *_examples()), HEADER + 1):
        _draw_line(sheet, last, line)
    _draw_status(sheet, last)
    sheet.freeze_panes = f"B{HEADER + 1}"
    sheet.sheet_view.showGridLines = False
    sheets.page(sheet, US, f"1:{HEADER}")
    return workbook


def call_text(entry: SheetFunction) -> str:
    """Return the worked example of a function as a formula."""
    given = entry.example.arguments
    words = (_literal(given[a.name]) for a in entry.arguments if a.name in given)
    return f"={entry.name}({','.join(words)})"


def _literal(value: Any) -> str:
    if isinstance(value, list | tuple):
        return f"{{{';'.join(map(_literal, value))}}}"
    if isinstance(value, bool):
        return str(value).upper()
    if isinstance(value, str):
        doubled = value.replace('"', '""')
        return f'"{doubled}"'
    return repr(float(value)).removesuffix(".0")


def _examples() -> Iterator[Line]:
    for entry in CATALOGUE.values():
        found = entry.function(**entry.example.arguments)
        yield Line(entry.summary, found if isinstance(found, str) else float(found), call_text(entry))


def _errors() -> Iterator[Line]:
    """What must not give a number: cells never lie only if the bridge carries errors as errors."""
    yield Line("A period of 0 is refused with an error value", "#NUM!", "=ELF_EXPONENT(0)")
    yield Line("Text that looks like a number is no number", "#VALUE!", '=ELF_EXPONENT("0.43")')
    yield Line("A blank cell is an error, never zero", "#VALUE!", "=ELF_EXPONENT(F1:F1)")


#: as ERROR.TYPE numbers them
_ERROR_TYPES: Final = {
    "#NULL!": 1,
    "#DIV/0!": 2,
    "#VALUE!": 3,
    "#REF!": 4,
    "#NAME?": 5,
    "#NUM!": 6,
    "#N/A": 7,
}


def _draw_line(sheet: Worksheet, row: int, line: Line) -> None:
    style.write(sheet.cell(row, 1), line.what, style.BODY, style.WRAP)
    for column, content, role in ((2, line.expected, Role.FIXED), (3, line.formula, Role.RESULT)):
        cell = sheet.cell(row, column, content)
        cell.data_type = "s" if column == 2 and isinstance(content, str) else cell.data_type
        style.dress(cell, role)
    sheet.cell(row, 4, _verdict(row, str(line.expected)))
    style.dress(sheet.cell(row, 4), Role.VERDICT)
    formula = sheet.cell(row, 5)
    style.write(formula, line.formula, style.SMALL, style.WRAP)
    formula.data_type = "s"
    sheets.fit_row(sheet, row, WIDTHS)


def _verdict(row: int, expected: str) -> str:
    actual, wanted = f"C{row}", f"B{row}"
    if expected in _ERROR_TYPES:
        right = f"IF(ISERROR({actual}),ERROR.TYPE({actual})={_ERROR_TYPES[expected]},FALSE)"
        return f'=IF({right},"{OK}","{WRONG}")'
    close = f"ABS({actual}-{wanted})<=1E-12*ABS({wanted})"
    same = f"IF(AND(ISNUMBER({actual}),ISNUMBER({wanted})),{close},{actual}={wanted})"
    return f'=IF(ISERROR({actual}),"{SILENT}",IF({same},"{OK}","{WRONG}"))'


def _draw_status(sheet: Worksheet, last: int) -> None:
    verdicts = f"D{HEADER + 1}:D{last}"
    asked = f"ROWS({verdicts})"
    good = f'COUNTIF({verdicts},"{OK}")'
    sheet["A3"] = (
        f'=IF({good}={asked},"✓ the bridge works: "&{good}&" of "&{asked}&" ok",'
        f'"✗ the bridge does not work: "&({asked}-{good})&" of "&{asked}&" not ok")'
    )
    sheet["A3"].font = style.HEADING
    sheets.flag_verdicts(sheet, "A3", "$A$3")
    sheets.flag_verdicts(sheet, verdicts)
