"""What every sheet shares: title line with job and status, page set-up, entry rules, clause texts."""

from __future__ import annotations

import textwrap
from collections.abc import Iterable
from math import ceil
from typing import Final, cast

from openpyxl import Workbook
from openpyxl.formatting.rule import Rule
from openpyxl.utils import column_index_from_string, get_column_letter
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.datavalidation import DataValidation
from openpyxl.worksheet.worksheet import Worksheet

from engine.editions import Clause, rules
from workbook_templates.declare import Quantity
from workbook_templates.draw import style
from xlbridge.catalogue import CATALOGUE

CAUTION: Final = (
    "An aid to a licensed engineer's judgement. Confirm every value against the standard adopted by the "
    "authority having jurisdiction, its supplements and local amendments."
)
LINE: Final = 14.0  # points
EDGE: Final = 1e-9  # no operator says "above … and at most …"
#: the most doubtful first
MARKS: Final = {"U": "uncertain", "M": "from memory"}
PAPER: Final = {"us": 1, "si": 9}  # Letter, A4


def head(sheet: Worksheet, title: str, columns: Iterable[str] = "A") -> None:
    """Write the two lines on top of a sheet: what it is and for which job, and the state of the checks.

    ``columns`` are those where a printed page begins.
    """
    for column in columns:
        style.write(
            sheet[f"{column}1"], f'="{title}   |   "&job_title&"   |   Rev. "&job_revision', style.TITLE
        )
        style.write(sheet[f"{column}2"], "=workbook_status", style.BOLD)
        across = get_column_letter(column_index_from_string(column) + 2)
        flag_verdicts(sheet, f"{column}2:{across}2", f"${column}$2")
    sheet.row_dimensions[1].height = 22
    sheet.sheet_view.showGridLines = False


def name(sheet: Worksheet, word: str, address: str) -> None:
    """Give cells of a sheet a defined name in the workbook."""
    workbook = cast(Workbook, sheet.parent)
    workbook.defined_names[word] = DefinedName(word, attr_text=f"{sheet.title}!{address}")


def page(sheet: Worksheet, units: str, title_rows: str, landscape: bool = True) -> None:
    """Set up the printed page: one page wide, header rows repeated, file, date and page x of y below."""
    sheet.page_setup.paperSize = PAPER[units]
    sheet.page_setup.orientation = "landscape" if landscape else "portrait"
    sheet.page_setup.fitToWidth, sheet.page_setup.fitToHeight = 1, 0
    sheet.sheet_properties.pageSetUpPr.fitToPage = True
    sheet.print_title_rows = title_rows
    caution = "\n".join(textwrap.wrap(CAUTION, 190 if landscape else 95))
    sheet.oddHeader.left.text, sheet.oddHeader.right.text = f"&8{caution}", "&A"
    sheet.oddFooter.left.text, sheet.oddFooter.right.text = "&F", "&D   page &P of &N"
    sheet.page_margins.left = sheet.page_margins.right = 0.5
    sheet.page_margins.top, sheet.page_margins.bottom = 0.7, 0.85


def table_head(sheet: Worksheet, row: int, texts: Iterable[str], widths: Iterable[float]) -> None:
    """Write the header row of a plain table and set the widths of its columns."""
    for column, (text, width) in enumerate(zip(texts, widths, strict=True), 1):
        cell = sheet.cell(row, column)
        style.write(cell, text, style.HEADING, style.WRAP)
        cell.fill = style.BAND_FILL
        sheet.column_dimensions[get_column_letter(column)].width = width


def fit_row(sheet: Worksheet, row: int, widths: Iterable[float], least: int = 1) -> None:
    """Make a row as high as its longest wrapped text asks for, ``least`` lines at the least."""
    needed = (_lines(sheet.cell(row, column), width) for column, width in enumerate(widths, 1))
    sheet.row_dimensions[row].height = LINE * max(least, *needed)


def _lines(cell: style.AnyCell, width: float) -> int:
    """Estimate the lines that a text takes in a column; a formula counts as one."""
    text = str(cell.value or "")
    if text.startswith("="):
        return 1
    room = 1.12 * width * style.BODY.size / cell.font.size - 2
    return sum(max(1, ceil(len(part) / room)) for part in text.split("\n"))


def flag_verdicts(sheet: Worksheet, area: str, verdict: str = "") -> None:
    """Colour the verdicts of an area; the sign and the words say the same without colour.

    ``verdict`` is the cell that decides: each cell for itself if left out.
    """
    cell = verdict or area.split(":")[0]
    for sign, look in (("✗", style.FAIL), ("!", style.LOOK)):
        formula = f'LEFT({cell},1)="{sign}"'
        sheet.conditional_formatting.add(area, Rule(type="expression", dxf=look, formula=[formula]))


def validation(q: Quantity) -> DataValidation | None:
    """Return the entry rule of an input: a list of words, a range of numbers, or none for free text."""
    if q.choices:
        rule = DataValidation(type="list", formula1=f'"{",".join(q.choices)}"', allow_blank=q.starter is None)
        allowed = "one of: " + ", ".join(q.choices)
    elif q.listed_in:
        rule = DataValidation(type="list", formula1=f"={q.listed_in}", allow_blank=True)
        allowed = f"one of the list {q.listed_in}"
    elif q.span is not None:
        rule = _number_rule(q)
        allowed = f"a number, {q.span}"
    else:
        return None
    rule.error = f"{q.shown_symbol}: {allowed}."[:255]
    rule.errorTitle = q.text[:32]
    rule.prompt = f"{q.text}: {allowed}."[:255]
    rule.promptTitle = q.shown_symbol[:32]
    rule.showErrorMessage = rule.showInputMessage = True
    return rule


def _number_rule(q: Quantity) -> DataValidation:
    span = q.span
    assert span is not None
    low = -1e12 if span.low is None else span.low + (EDGE if span.high is not None and span.low_open else 0)
    if span.high is not None:
        return DataValidation(
            type="decimal", operator="between", formula1=f"{low:g}", formula2=f"{span.high:g}"
        )
    operator = "greaterThan" if span.low_open else "greaterThanOrEqual"
    return DataValidation(
        type="decimal", operator=operator, formula1=f"{low:g}", allow_blank=q.starter is None
    )


def clause_text(q: Quantity, edition: str) -> str:
    """Return the clause of a quantity as printed in its row."""
    found = _clause(q, edition)
    return str(found) if found else ""


def clause_note(q: Quantity, edition: str) -> str:
    """Return what the user must know of the clause: from memory, or the doubt in words."""
    found = _clause(q, edition)
    return found.note if found else ""


def clause_mark(q: Quantity, edition: str) -> str:
    """Return the short mark of a quantity where a clause that it goes by is not confirmed by a public source.

    Of several, the most doubtful: a formula may call functions of more rules than the one it is filed under.
    """
    called = (CATALOGUE[name].clauses.get(edition) for name in q.calls)
    found = {rule.confidence for rule in (_clause(q, edition), *called) if rule is not None}
    return next((mark for confidence, mark in MARKS.items() if confidence in found), "")


def _clause(q: Quantity, edition: str) -> Clause | None:
    """The clause of a quantity, its own or that of the function it calls; an edition may lack it."""
    if q.rule:
        return rules(edition).get(q.rule)
    return q.function.clauses.get(edition) if q.function else None
