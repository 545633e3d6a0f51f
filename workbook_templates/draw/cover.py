"""Draw the cover: the job, where the workbook stands, what it may be used for, how to read and change it."""

from __future__ import annotations

import textwrap

from openpyxl.worksheet.hyperlink import Hyperlink
from openpyxl.worksheet.worksheet import Worksheet

from engine.editions import rules
from engine.units import symbol
from engine.version import __version__
from workbook_templates import layout as places
from workbook_templates.declare import DIRECTIONS, Headline, Quantity, Role
from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import COVER, Layout

JOB = {
    "title": "Building",
    "number": "Job number",
    "engineer": "Engineer",
    "checker": "Checker",
    "revision": "Revision",
    "date": "Date",
}
CAUTIONS = (
    sheets.CAUTION,
    "Rows marked “from memory” could not be read in a public source; rows marked “uncertain” carry a doubt "
    "that their note puts in words. Look both up in the standard before use.",
)
ADDIN = (
    "Cells that call ELF_… functions need the Storyledger add-in to be recalculated. The numbers stored in "
    "a computed copy show without it. #NAME? in such cells means that the add-in is not loaded: the README "
    "says how to load it in Excel and in LibreOffice Calc, and `storyledger bridge-check` makes a workbook "
    "that shows whether it works. On a machine without it use an issue copy (`storyledger new --native`)."
)
ISSUE = (
    "An issue copy: its formulas are built-in functions only and compute without the add-in. Cells that "
    "could not be written so hold fixed values; the sheet Fixed values lists them, the checks count them."
)
#: the columns of the headline results
HEADLINE_COLUMN = dict(zip(DIRECTIONS, (3, 4), strict=True))
LEGEND = {
    Role.INPUT: "an entry of yours: value, and its source beside it",
    Role.FIXED: "fixed when the workbook is made; make a new one to change it",
    Role.LINK: "taken from another sheet",
    Role.CALCULATION: "calculated",
    Role.RESULT: "a result that the design uses",
    Role.VERDICT: "a verdict: ✓ holds, ✗ does not, ! to be looked at",
}
CONTENTS = {
    places.CRITERIA: "site, occupancy, systems and base shear of both directions",
    places.CHECKS: "what must hold, line by line",
    places.FIGURES: "forces, shears and drifts over the height",
    places.FUNCTIONS: "the worksheet functions called here, with equation and clause",
}
GUIDE = (
    "Insert a level: insert a row between the two grey guard rows of the story table, fill it down (or up) "
    "from a neighbour, then enter name, elevation, weight and the rest. Rows may stand in any order.",
    "Replace a starter value: type the value and write where it comes from into its source cell.",
)
LOG = ("Revision", "Date", "By", "What, and why")


def draw(sheet: Worksheet, layout: Layout, inputs: Inputs, issue: bool = False) -> None:
    """Fill the cover; ``issue`` says that the workbook is written in built-in functions."""
    sheets.head(sheet, "Seismic story forces")
    for letter, width in zip("ABCDE", (21, 47, 16, 16, 30), strict=True):
        sheet.column_dimensions[letter].width = width
    row = _draw_job(sheet, inputs, 4)
    row = _draw_headlines(sheet, layout, inputs, row + 1)
    row = _draw_texts(sheet, "Cautions", (*CAUTIONS, ISSUE if issue else ADDIN), row + 1)
    row = _draw_legend(sheet, row + 1)
    row = _draw_contents(sheet, layout, row + 1)
    row = _draw_texts(sheet, "Working with the table", GUIDE, row + 1)
    _draw_log(sheet, row + 1)
    sheets.page(sheet, inputs.units, "1:2", landscape=False)


def _draw_job(sheet: Worksheet, inputs: Inputs, row: int) -> int:
    for key, label in JOB.items():
        style.write(sheet.cell(row, 1), label, style.BOLD)
        cell = sheet.cell(row, 2, inputs.job(key))
        style.dress(cell, Role.INPUT, "@")
        sheets.name(sheet, f"job_{key}", f"$B${row}")
        row += 1
    style.write(sheet.cell(row, 1), "Made for", style.BOLD)
    style.write(sheet.cell(row, 2), f"{made_for(inputs.edition, inputs.units)}; template {__version__}")
    return row + 1


def made_for(edition: str, units: str) -> str:
    """Which edition and which units a workbook is made for, in the words of its cover."""
    standard = next(iter(rules(edition).values())).standard
    return f"{standard}, {symbol('force', units)} and {symbol('length', units)}"


def _draw_headlines(sheet: Worksheet, layout: Layout, inputs: Inputs, row: int) -> int:
    style.write(sheet.cell(row, 1), "Results", style.HEADING)
    for column, text in ((3, "Direction X"), (4, "Direction Y")):
        style.write(sheet.cell(row, column), text, style.BOLD, style.RIGHT)
    for line in (line for part in layout.parts for line in part.headlines):
        row += 1
        style.write(sheet.cell(row, 1), headline_text(line, inputs.units))
        number_format = style.number_format(Quantity("", "", line.unit, Role.LINK), inputs.units)
        for direction, column in HEADLINE_COLUMN.items():
            sheet.cell(row, column, layout.write(line.formula, COVER, direction))
            style.dress(sheet.cell(row, column), Role.LINK, number_format)
    return row + 1


def headline_text(line: Headline, units: str) -> str:
    """Return what stands beside a headline result."""
    return line.text if line.unit == "none" else f"{line.text} [{symbol(line.unit, units)}]"


def _draw_texts(sheet: Worksheet, title: str, texts: tuple[str, ...], row: int) -> int:
    """Write each text into one cell, broken over lines that fit the width of the page."""
    style.write(sheet.cell(row, 1), title, style.HEADING)
    for line in (line for text in texts for line in lines(text)):
        row += 1
        style.write(sheet.cell(row, 1), line)
    return row + 1


def lines(text: str) -> list[str]:
    """Return a text broken over the lines of the page."""
    return textwrap.wrap(text, 125)


def _draw_legend(sheet: Worksheet, row: int) -> int:
    style.write(sheet.cell(row, 1), "Letters, borders and fills", style.HEADING)
    for role, text in LEGEND.items():
        row += 1
        sample = sheet.cell(row, 1, f"{style.letter(role)}   {role.value}")
        style.dress(sample, role)
        style.write(sheet.cell(row, 2), text, style.BODY, style.INDENTED)
    return row + 1


def _draw_contents(sheet: Worksheet, layout: Layout, row: int) -> int:
    style.write(sheet.cell(row, 1), "Contents", style.HEADING)
    texts = CONTENTS | {grid.table.sheet: grid.table.text for grid in layout.grids}
    for name in layout.sheets[1:]:
        row += 1
        style.write(sheet.cell(row, 1), name, style.LINKED)
        sheet.cell(row, 1).hyperlink = Hyperlink(ref=f"A{row}", location=f"'{name}'!A1", display=name)
        style.write(sheet.cell(row, 2), texts[name])
    return row + 1


def _draw_log(sheet: Worksheet, row: int) -> None:
    style.write(sheet.cell(row, 1), "Issue log", style.HEADING)
    for column, text in enumerate(LOG, 1):
        style.write(sheet.cell(row + 1, column), text, style.BOLD)
        for line in range(row + 2, row + 6):
            style.dress(sheet.cell(line, column), Role.INPUT, "@")
