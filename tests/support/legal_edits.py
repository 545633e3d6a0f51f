"""What a user may do to a workbook without any harm: no audit may raise an alarm for it."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final

from openpyxl import Workbook
from openpyxl.comments import Comment
from openpyxl.formatting.rule import ColorScaleRule
from openpyxl.styles import Font, PatternFill
from openpyxl.utils import get_column_letter
from openpyxl.workbook.defined_name import DefinedName

from tests.support.office import Book
from workbook_templates.declare import Role
from workbook_templates.draw import style
from workbook_templates.layout import CHECKS, COVER, CRITERIA, FIRST_LEVEL, LEVELS, ROLE_ROW, TOP_GUARD

Edit = Callable[[Workbook], object]
OfficeEdit = Callable[[Book, int], object]
"""An edit in Calc; the number is that of the levels."""


def nothing(book: Workbook) -> None:
    """Only saved again."""


def project_data(book: Workbook) -> None:
    """The job is filled in, and the log."""
    texts = ("Invented Tower", "24-117", "A. Example", "B. Sample", "2", "2026-12-01")
    for row, text in enumerate(texts, 4):
        book[COVER].cell(row, 2, text)
    row = next(
        c.row
        for c in book[COVER]["A"]
        if c.value == "Revision" and book[COVER].cell(c.row, 2).value == "Date"
    )
    for column, text in enumerate(("2", "2026-12-01", "AE", "weights revised"), 1):
        book[COVER].cell(row + 1, column, text)


def own_sheet(book: Workbook) -> None:
    """A sheet of the user's with formulas of its own, in front of all others."""
    sheet = book.create_sheet("Hand calculation", 0)
    sheet.append(["Level", "w_x", "Roof"])
    sheet["A2"], sheet["B2"] = "Sum", f"=SUM({LEVELS}!C{FIRST_LEVEL}:C{FIRST_LEVEL + 1})"


def own_columns(book: Workbook) -> None:
    """Remarks and a check of the user's right of the table."""
    sheet = book[LEVELS]
    column = sheet.max_column + 2
    sheet.cell(6, column, "own remark")
    for row in range(FIRST_LEVEL, FIRST_LEVEL + 2):
        sheet.cell(row, column, f"seen, {row}")
        sheet.cell(row, column + 1, f"=B{row}*2")


def own_notes(book: Workbook) -> None:
    """Cell notes, and remarks far below the tables."""
    book[LEVELS].cell(FIRST_LEVEL, 3).comment = Comment("from the take-off of 12 May", "A. Example")
    for name in (CRITERIA, LEVELS, CHECKS):
        sheet = book[name]
        sheet.cell(sheet.max_row + 3, 2, "Remark: seen by the geotechnical engineer")


def own_colours(book: Workbook) -> None:
    """Other colours, larger text, wider columns, higher rows."""
    for name in (CRITERIA, LEVELS):
        for row in book[name].iter_rows(min_row=FIRST_LEVEL, max_row=FIRST_LEVEL + 3):
            for cell in row:
                cell.fill = PatternFill("solid", fgColor="FFF2CC")
                cell.font = Font(name="Arial", size=9, color="1F3A5F", italic=True)
        book[name].column_dimensions["C"].width = 40
        book[name].row_dimensions[FIRST_LEVEL].height = 33


def own_marks(book: Workbook) -> None:
    """A colour scale of the user's on the weights."""
    rule = ColorScaleRule(start_type="min", start_color="FFFFFF", end_type="max", end_color="F8CBAD")
    book[LEVELS].conditional_formatting.add(f"C{FIRST_LEVEL}:C{FIRST_LEVEL + 3}", rule)


def more_digits(book: Workbook) -> None:
    """More digits than the template shows."""
    for row in book[LEVELS].iter_rows(min_row=FIRST_LEVEL, max_row=FIRST_LEVEL + 3):
        for cell in row:
            if "0" in cell.number_format:
                cell.number_format = "0.00000"


def own_names(book: Workbook) -> None:
    """Names of the user's, and a page set-up of the user's."""

    book.defined_names["tower_height"] = DefinedName("tower_height", attr_text=f"{LEVELS}!$B${FIRST_LEVEL}")
    book[LEVELS].defined_names["here"] = DefinedName("here", attr_text=f"{LEVELS}!$A$1")
    book[LEVELS].page_setup.orientation = "portrait"
    book[LEVELS].oddFooter.center.text = "Invented office"


def renamed_levels(book: Workbook) -> None:
    """Every level has another name, wherever it is named."""
    sheet = book[LEVELS]
    names = {}
    for row in range(FIRST_LEVEL, sheet.max_row):
        if sheet.cell(row, 2).value is None:
            break
        names[sheet.cell(row, 1).value] = f"Deck {row}"
    for cell in (c for sheet in book for cells in sheet.iter_rows() for c in cells if c.value in names):
        cell.value = names[cell.value]


def sheets_moved(book: Workbook) -> None:
    """The sheets stand in another order, with other tabs."""
    book.move_sheet(LEVELS, -1)
    book.move_sheet(CHECKS, -1)
    book[LEVELS].sheet_properties.tabColor = "1F3A5F"
    book[LEVELS].protection.sheet = True


EDITS: Final[tuple[Edit, ...]] = (
    nothing,
    project_data,
    own_sheet,
    own_columns,
    own_notes,
    own_colours,
    own_marks,
    more_digits,
    own_names,
    renamed_levels,
    sheets_moved,
)


def saved(book: Book, levels: int) -> None:
    """Only opened and saved."""


def rows_above(book: Book, levels: int) -> None:
    """Rows of the user's above and inside the sheets."""
    book.insert_rows(LEVELS, 1, 2)
    book.set_value(LEVELS, "A1", "Invented office")
    book.insert_rows(CRITERIA, 7)
    book.insert_rows(CHECKS, 15, 2)
    book.set_value(CHECKS, "B15", "own remark between the checks")
    book.insert_rows(COVER, 4)


def columns_between(book: Book, levels: int) -> None:
    """Columns of the user's left of the table and inside it."""
    book.insert_columns(LEVELS, 9)
    book.insert_columns(LEVELS, 1, 2)
    book.set_value(LEVELS, f"A{FIRST_LEVEL}", "own remark")
    book.insert_columns(CRITERIA, 1)
    book.insert_columns(CHECKS, 4)
    book.set_value(CHECKS, "D12", 12.5)


def blank_rows(book: Book, levels: int) -> None:
    """Rows left blank next to both guard rows and between levels."""
    book.insert_rows(LEVELS, TOP_GUARD + levels + 1)
    book.insert_rows(LEVELS, FIRST_LEVEL + 1, 2)
    book.insert_rows(LEVELS, FIRST_LEVEL)


def sheets_renamed(book: Book, levels: int) -> None:
    """Sheets with other names, in another order, others between them."""
    book.rename_sheet(LEVELS, "Storeys & co")
    book.rename_sheet(CHECKS, "Prüfung")
    book.insert_sheet("Notes", 0)
    book.move_sheet(CRITERIA, 5)


def level_added(book: Book, levels: int) -> None:
    """A level put in as the cover says: a row inserted, filled down from its neighbour, entered."""
    row = FIRST_LEVEL + 1
    book.insert_rows(LEVELS, row)
    book.fill_down(LEVELS, f"A{row - 1}:{LAST_COLUMN}{row}")
    book.set_value(LEVELS, f"A{row}", "Mezzanine")
    roles, above, _, below = (
        book.read(LEVELS, f"A{n}:{LAST_COLUMN}{n}")[0] for n in (ROLE_ROW, row - 1, row, row + 1)
    )
    for column, (role, high, low) in enumerate(zip(roles, above, below, strict=True), 1):
        address = f"{get_column_letter(column)}{row}"
        typed = role == style.letter(Role.INPUT) and not book.formula(LEVELS, address).startswith("=")
        if typed and isinstance(high, float) and isinstance(low, float):
            book.set_value(LEVELS, address, (high + low) / 2)


def level_removed(book: Book, levels: int) -> None:
    """A level taken out with its row."""
    book.delete_rows(LEVELS, FIRST_LEVEL + 1)


#: far enough for every table
LAST_COLUMN: Final = "IZ"

OFFICE_EDITS: Final[tuple[OfficeEdit, ...]] = (
    saved,
    rows_above,
    columns_between,
    blank_rows,
    sheets_renamed,
    level_added,
    level_removed,
)
