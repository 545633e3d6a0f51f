"""Draw the checks sheet: one line a check, and the status that heads every sheet."""

from __future__ import annotations

from openpyxl.worksheet.worksheet import Worksheet

from engine.units import symbol
from workbook_templates.declare import DIRECTIONS, STARTER, Check, Quantity, Role
from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import CHECKS as SHEET
from workbook_templates.layout import CRITERIA, Layout

HEADERS = ("", "Check", "Direction", "Left", "Right", "Difference", "Tolerance", "Unit", "Verdict")
WIDTHS = (3, 66, 10, 16, 16, 14, 11, 8, 20)
STARTERS, HOLD, LOOK, FAIL, STATUS, HEADER = 4, 5, 6, 7, 8, 10
HOLDS, FAILS, LOOKS = "✓ holds", "✗ does not hold", "! look"


def draw(sheet: Worksheet, layout: Layout, inputs: Inputs) -> None:
    """Fill the checks sheet."""
    sheets.head(sheet, "Checks")
    sheets.table_head(sheet, HEADER, HEADERS, WIDTHS)
    for column in (4, 5, 6, 7):
        sheet.cell(HEADER, column).alignment = style.RIGHT
    sheet.cell(HEADER, 8).alignment = style.CENTRE
    row = HEADER
    for check in (check for part in layout.parts for check in part.checks):
        for direction in DIRECTIONS if check.per_direction else (None,):
            row += 1
            _draw_line(sheet, layout, inputs, check, direction, row)
    _draw_summary(sheet, layout, row)
    sheets.flag_verdicts(sheet, f"I{HEADER + 1}:I{row}")
    sheet.freeze_panes = f"A{HEADER + 1}"
    sheets.page(sheet, inputs.units, f"1:{HEADER}")


def _draw_line(
    sheet: Worksheet, layout: Layout, inputs: Inputs, check: Check, direction: str | None, row: int
) -> None:
    counts = 0 if check.unit == "none" else None
    decimals = counts if check.decimals is None else check.decimals
    q = Quantity("", check.text, check.unit, Role.CALCULATION, decimals=decimals)
    number_format = style.number_format(q, inputs.units)
    style.write(sheet.cell(row, 1), style.letter(Role.VERDICT), style.SMALL)
    style.write(sheet.cell(row, 2), check.text, style.BODY, style.WRAP)
    style.write(sheet.cell(row, 3), direction or "both", style.BODY)
    style.write(sheet.cell(row, 8), symbol(check.unit, inputs.units), style.BODY, style.CENTRE)
    formulas = {
        4: layout.write(check.left, SHEET, direction),
        5: layout.write(check.right, SHEET, direction),
        6: f"=D{row}-E{row}",
    }
    for column, formula in formulas.items():
        sheet.cell(row, column, formula)
        style.dress(sheet.cell(row, column), Role.CALCULATION, number_format)
        sheet.cell(row, column).alignment = style.RIGHT
    sheet.cell(row, 7, check.tolerance)
    style.dress(sheet.cell(row, 7), Role.FIXED, "0.0E+00" if check.tolerance else "0")
    sheets.fit_row(sheet, row, WIDTHS)
    sheet.cell(row, 9, _verdict(check, row))
    style.dress(sheet.cell(row, 9), Role.VERDICT)


def _verdict(check: Check, row: int) -> str:
    """The verdict compares numbers; an error on either side stays an error and does not hold."""
    difference = f"ABS(F{row})" if check.test == "equal" else f"F{row}"
    otherwise = LOOKS if check.warning else FAILS
    return f'=IF({difference}<=G{row}*MAX(1,ABS(E{row})),"{HOLDS}","{otherwise}")'


def _draw_summary(sheet: Worksheet, layout: Layout, last: int) -> None:
    verdicts = f"I{HEADER + 1}:I{last}"
    sources = f"{CRITERIA}!$H$1:$H${max(layout.rows.values())}"
    rows = (q.key for g in layout.grids for c in g.columns if (q := c.quantity).stored_key(None) == "source")
    marks = (layout.write(f"{{{key}:all}}", SHEET, None) for key in rows)
    lines = {
        STARTERS: (
            "Entries that still hold a starter value (their source cell says so)",
            "=" + "+".join(f'COUNTIF({cells},"{STARTER}")' for cells in (sources, *marks)),
        ),
        HOLD: ("Checks that hold", f'=COUNTIF({verdicts},"{HOLDS}")'),
        LOOK: ("Warnings: to be looked at", f'=COUNTIF({verdicts},"{LOOKS}")'),
        FAIL: ("Checks that do not hold, errors included", f"=ROWS({verdicts})-D{HOLD}-D{LOOK}"),
        STATUS: ("Status of this workbook", _status(verdicts)),
    }
    for row, (text, formula) in lines.items():
        style.write(sheet.cell(row, 2), text, style.BOLD)
        sheet.cell(row, 4, formula)
        style.dress(sheet.cell(row, 4), Role.RESULT, "General")
        sheet.cell(row, 4).alignment = style.LEFT
    sheets.name(sheet, "workbook_status", f"$D${STATUS}")


def _status(verdicts: str) -> str:
    return (
        f'=IF(D{STARTERS}>0,"✗ STARTER VALUES, NOT A DESIGN: "&D{STARTERS}&" entries to fill in",'
        f'IF(D{FAIL}>0,"✗ checks that do not hold: "&D{FAIL}&" of "&ROWS({verdicts}),'
        f'IF(D{LOOK}>0,"! no check fails; to be looked at: "&D{LOOK},"✓ all checks hold")))'
    )
