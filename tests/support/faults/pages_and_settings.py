"""Faults in what is hidden or covered, in what is printed, and in how the workbook calculates."""

from __future__ import annotations

from openpyxl.chart import BarChart

from tests.support.faults.appearance import shown
from tests.support.faults.catalogue import fault
from tests.support.faults.scene import CHECKS, LEVELS, Scene
from xlbridge.headless.references import column_letters

# rows, columns, sheets


@fault("structure", "cells_merged")
def cells_merged_over_results(scene: Scene) -> None:
    """Two cells of a column are merged: the lower one is lost."""
    scene.need(len(scene.table.rows) > 1)
    cells = sorted(scene.column(shown(scene)))
    upper, lower = cells[:2]
    scene.need(lower.row == upper.row + 1)
    scene.levels.merge_cells(f"{upper.address}:{lower.address}")
    scene.touch(f"{upper.sheet}!{upper.address}:{lower.address}")


@fault("structure", "line_hidden")
def level_row_hidden(scene: Scene) -> None:
    """The row of a level is hidden, and counts."""
    row = scene.pick(scene.table.rows)
    scene.levels.row_dimensions[row].hidden = True
    scene.touch(f"{LEVELS}!{row}:{row}")


@fault("structure", "column_squeezed")
def level_row_squeezed(scene: Scene) -> None:
    """The row of a level is one point high."""
    row = scene.pick(scene.table.rows)
    scene.levels.row_dimensions[row].height = 1
    scene.touch(f"{LEVELS}!{row}:{row}")


@fault("structure", "line_hidden")
def column_hidden(scene: Scene) -> None:
    """A column of results is hidden."""
    letter = column_letters(shown(scene).column)
    scene.levels.column_dimensions[letter].hidden = True
    scene.touch(f"{LEVELS}!{letter}:{letter}")


@fault("structure", "column_squeezed")
def column_squeezed(scene: Scene) -> None:
    """A column is too narrow for its numbers."""
    letter = column_letters(shown(scene).column)
    scene.levels.column_dimensions[letter].width = 1.5
    scene.touch(f"{LEVELS}!{letter}:{letter}")


@fault("structure", "line_hidden")
def check_lines_folded_away(scene: Scene) -> None:
    """Check lines are grouped and folded away."""
    rows = [cell.row for cell in scene.verdicts]
    first = scene.pick(rows[:-2])
    scene.book[CHECKS].row_dimensions.group(first, first + 2, hidden=True)
    scene.touch(f"{CHECKS}!{first}:{first + 2}")


@fault("structure", "line_hidden")
def check_lines_filtered(scene: Scene) -> None:
    """A filter hides the check lines that do not hold."""
    rows = [cell.row for cell in scene.verdicts]
    scene.book[CHECKS].auto_filter.ref = f"A10:I{max(rows)}"
    row = scene.pick(rows)
    scene.book[CHECKS].row_dimensions[row].hidden = True
    scene.touch(f"{CHECKS}!{row}:{row}")


@fault("structure", "sheet_hidden")
def checks_hidden(scene: Scene) -> None:
    """The checks sheet is hidden."""
    scene.book[CHECKS].sheet_state = "hidden"
    scene.touch(CHECKS)


@fault("structure", "sheet_hidden", "entry_is_formula")
def sheet_very_hidden(scene: Scene) -> None:
    """A sheet that feeds an entry cannot even be listed."""
    cell = scene.pick(scene.level_entries("weight"))
    scene.book.create_sheet("Basis").sheet_state = "veryHidden"
    scene.book["Basis"]["A1"] = scene.value(cell)
    scene.at(cell).value = "=Basis!A1"
    scene.causes = 2  # the sheet, and the entry that reads it
    scene.touch("Basis", str(cell))


@fault("structure", "view_blocked")
def sheet_scrolled_away(scene: Scene) -> None:
    """The panes are frozen so that the lower rows can never be reached."""
    scene.levels.freeze_panes = "A200"
    scene.touch(LEVELS)


@fault("structure", "drawing_over_cells")
def picture_over_results(scene: Scene) -> None:
    """An empty chart lies over results."""
    cell = shown(scene)
    scene.levels.add_chart(BarChart(), cell.address)
    scene.touch_one_of(
        LEVELS, str(cell), f"{LEVELS}!{cell.address}:{column_letters(cell.column + 12)}{cell.row + 25}"
    )


# pages


@fault("structure", "print_area_cuts")
def print_area_leaves_columns_out(scene: Scene) -> None:
    """The print area ends before the last columns."""
    scene.levels.print_area = f"A1:F{scene.levels.max_row}"
    scene.touch(LEVELS)


@fault("structure", "print_area_cuts")
def print_area_leaves_the_total_out(scene: Scene) -> None:
    """The print area ends before the totals."""
    last = column_letters(scene.levels.max_column)
    scene.levels.print_area = f"A1:{last}{scene.levels.max_row - 1}"
    scene.touch(LEVELS)


@fault("structure", "headings_not_printed")
def headings_not_printed(scene: Scene) -> None:
    """The headings are printed on the first page only."""
    scene.levels._print_rows = None
    scene.touch(LEVELS)


# settings of the calculation


@fault("structure", "calculation_manual")
def calculation_by_hand(scene: Scene) -> None:
    """The workbook calculates only when it is told to."""
    scene.book.calculation.calcMode = "manual"
    scene.touch("workbook")


@fault("structure", "iteration_on")
def iteration_on(scene: Scene) -> None:
    """Circular references are calculated silently."""
    scene.book.calculation.iterate = True
    scene.touch("workbook")


@fault("structure", "precision_as_displayed")
def precision_as_shown(scene: Scene) -> None:
    """The workbook calculates with the digits that it shows."""
    scene.book.calculation.fullPrecision = False
    scene.touch("workbook")
