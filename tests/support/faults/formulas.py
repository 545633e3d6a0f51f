"""Faults in formulas."""

from __future__ import annotations

import re
from functools import partial

from openpyxl.worksheet.formula import ArrayFormula

from tests.support.faults import formula_text as texts
from tests.support.faults.catalogue import fault
from tests.support.faults.scene import CHECKS, LEVELS, Scene
from xlbridge.headless.references import Cell, column_letters

#: what a formula may be found by where its form changed, or only what it refers to
FORM = ("formula_differs",)
ANY_FORM = ("formula_differs", "other_reference", "constant_changed", "range_shorter", "range_longer")


# formulas that are gone


@fault("formula", "constant_for_formula")
def same_value_pasted(scene: Scene) -> None:
    """A formula of a row is pasted as its value: nothing shows today."""
    cell = scene.pick(scene.rows)
    scene.write(cell, scene.value(cell))


@fault("formula", "constant_for_formula")
def tuned_by_hand(scene: Scene) -> None:
    """A formula of a row is typed over with a number that somebody liked better."""
    cell = scene.pick(scene.numeric(scene.rows))
    scene.write(cell, round(scene.value(cell) * 0.93, 3))


@fault("formula", "constant_for_formula")
def criterion_overwritten(scene: Scene) -> None:
    """A single result of the criteria sheet is typed over."""
    cell = scene.pick(scene.numeric(scene.criteria))
    scene.write(cell, scene.value(cell) * 0.9)


@fault("formula", "constant_for_formula")
def total_overwritten(scene: Scene) -> None:
    """A total of the story table is typed over."""
    cell = scene.pick(scene.numeric(scene.totals))
    scene.write(cell, float(round(scene.value(cell)) + 1))


@fault("formula", "constant_for_formula")
def headline_typed(scene: Scene) -> None:
    """A result on the cover is typed, so that the cover no longer follows."""
    cell = scene.pick(headline.cell for headline in scene.own.headlines)
    scene.write(cell, scene.value(cell))


@fault("formula", "constant_for_formula")
def column_pasted_as_values(scene: Scene) -> None:
    """A whole column of the table is pasted as values."""
    for cell in scene.column(scene.pick(scene.rows)):
        scene.write(cell, scene.value(cell))


@fault("formula", "formula_missing")
def formula_cleared(scene: Scene) -> None:
    """A formula of a row is cleared."""
    scene.write(scene.pick(scene.rows), None)


@fault("formula", "formula_missing")
def total_cleared(scene: Scene) -> None:
    """A total is cleared."""
    scene.write(scene.pick(scene.totals), None)


@fault("formula", "row_not_filled")
def row_never_filled_down(scene: Scene) -> None:
    """A level has its entries, but none of its formulas."""
    row = scene.pick(scene.level_rows).row
    for cell in [cell for cell in scene.level_rows if cell.row == row]:
        scene.write(cell, None)


@fault("formula", "constant_for_formula")
def formula_shown_as_text(scene: Scene) -> None:
    """A formula became a text: the cell shows the formula itself."""
    cell = scene.pick(scene.rows)
    scene.write(cell, scene.text(cell))
    scene.at(cell).data_type = "s"


@fault("formula", "constant_for_formula")
def word_for_a_result(scene: Scene) -> None:
    """A result is replaced by a remark."""
    scene.write(scene.pick(scene.criteria), "see calculation 12")


# ranges


def _ends(scene: Scene, cells: list[Cell], top: int = 0, bottom: int = 0) -> None:
    change = partial(texts.resized, top=top, bottom=bottom)
    scene.rewrite(cells, lambda text: texts.references(text, scene.random, change))


@fault("formula", "range_shorter")
def total_misses_the_lowest_level(scene: Scene) -> None:
    """A range of a total ends above the lowest level."""
    _ends(scene, scene.totals, bottom=-2)


@fault("formula", "range_shorter")
def total_misses_the_highest_level(scene: Scene) -> None:
    """A range of a total begins below the highest level."""
    _ends(scene, scene.totals, top=2)


@fault("formula", "range_shorter")
def total_misses_a_guard_row(scene: Scene) -> None:
    """A range of a total ends at the lowest level: the next one inserted below is not counted."""
    _ends(scene, scene.totals, bottom=-1)


@fault("formula", "range_shorter")
def row_formula_misses_a_level(scene: Scene) -> None:
    """A range in the formula of one row ends too early."""
    _ends(scene, scene.level_rows, bottom=-2)


@fault("formula", "range_longer")
def total_takes_the_base_in(scene: Scene) -> None:
    """A range of a total reaches over the base row."""
    _ends(scene, scene.totals, bottom=1)


@fault("formula", "range_longer")
def total_takes_the_heading_in(scene: Scene) -> None:
    """A range of a total begins in the headings, where a number may stand one day."""
    _ends(scene, scene.totals, top=-1)


@fault("formula", "other_reference", "range_shorter", "range_longer")
def range_slides_down(scene: Scene) -> None:
    """A range keeps its length, but begins and ends a row lower, as after a fill without dollars."""
    _ends(scene, scene.level_rows, top=1, bottom=1)


@fault("formula", "other_reference")
def range_of_the_next_column(scene: Scene) -> None:
    """A range reads the column beside the right one."""

    def beside(reference: str) -> str | None:
        found = re.fullmatch(r"\$([A-Z]+)(\$\d+):\$\1(\$\d+)", reference)
        if not found:
            return None
        letter = column_letters(scene.levels[f"{found[1]}1"].column + 1)
        return f"${letter}{found[2]}:${letter}{found[3]}"

    scene.rewrite(scene.level_rows, lambda text: texts.references(text, scene.random, beside))


# references


@fault("formula", "other_reference")
def row_slip(scene: Scene) -> None:
    """A formula reads the row below its own."""
    change = partial(texts.shifted, rows=1)
    cells = [cell for cell in scene.level_rows if cell.row != scene.table.rows[-1]]
    scene.rewrite(cells, lambda text: texts.references(text, scene.random, change))


@fault("formula", "other_reference")
def column_slip(scene: Scene) -> None:
    """A formula reads the column beside the right one."""
    change = partial(texts.shifted, columns=1)
    scene.rewrite(scene.level_rows, lambda text: texts.references(text, scene.random, change))


@fault("formula", "other_reference")
def other_directions_value(scene: Scene) -> None:
    """A formula for one direction takes a criterion of the other."""

    def other(name: str) -> str | None:
        return (
            f"{name[:-1]}{'Y' if name.endswith('X') else 'X'}"
            if re.search(r"[A-Za-z]_[XY]\Z", name)
            else None
        )

    scene.rewrite(scene.rows, lambda text: texts.references(text, scene.random, other))


@fault("formula", "formula_differs", "other_reference")
def name_replaced_by_its_number(scene: Scene) -> None:
    """A formula has today's number of a criterion for its name: it no longer follows."""
    numbers = {
        name: value
        for (scope, name), text in scene.before.book.names.items()
        if scope is None and isinstance(value := scene.before.evaluator.evaluate_text(f"={text}"), float)
    }

    def number(name: str) -> str | None:
        return f"{numbers[name.casefold()]:.6g}" if name.casefold() in numbers else None

    scene.rewrite(scene.formulas, lambda text: texts.references(text, scene.random, number))


@fault("formula", "anchor_changed")
def dollar_lost(scene: Scene) -> None:
    """A range loses the dollars of its rows: right here, wrong in the next row filled down."""
    cells = [cell for cell in scene.level_rows if ":$" in scene.text(cell)]
    change = lambda text: re.sub(r"\$([A-Z]+)\$(\d+):\$([A-Z]+)\$(\d+)", r"$\1\2:$\3\4", text, count=1)  # noqa: E731
    scene.rewrite(cells, change)


@fault("formula", *ANY_FORM)
def copied_from_the_other_direction(scene: Scene) -> None:
    """A column of direction Y holds the formula of direction X, names and all."""
    pairs = [
        (a, b) for a in scene.level_rows for b in scene.level_rows if a.row == b.row and a.column < b.column
    ]
    stripped = {cell: re.sub(r"\$?[A-Z]+\$?\d+|_[XY]\b", "", scene.text(cell)) for cell in scene.level_rows}
    first, second = scene.pick(
        (a, b) for a, b in pairs if stripped[a] == stripped[b] and "_X" in scene.text(a)
    )
    scene.write(second, scene.text(first))


@fault("formula", "other_reference", "formula_differs")
def rows_sorted_by_hand(scene: Scene) -> None:
    """Two formulas of a column change places, each still reading its old row."""
    scene.need(len(scene.table.rows) > 1)
    upper, lower = scene.random.sample(scene.column(scene.pick(scene.level_rows)), 2)
    scene.need(scene.text(upper) != scene.text(lower))
    scene.causes = 2
    scene.write(upper, scene.text(lower))
    scene.write(lower, scene.text(upper))


@fault("formula", *FORM)
def circular_reference(scene: Scene) -> None:
    """A formula reads its own cell."""
    cell = scene.pick(scene.numeric(scene.rows))
    scene.write(cell, f"{scene.text(cell)}+0*{cell.address}")


@fault("formula", *FORM, "external_link")
def external_link(scene: Scene) -> None:
    """A formula takes its value from another workbook."""
    scene.write(scene.pick(scene.rows), "=[1]Take_off!$C$14")


@fault("formula", "other_reference", *FORM)
def decoy_sheet(scene: Scene) -> None:
    """A formula reads an old copy of the story table, kept on a sheet of its own."""
    cell = scene.pick(scene.numeric(scene.criteria))
    scene.book.create_sheet("Levels (2)")[cell.address] = scene.value(cell) * 0.8
    scene.write(cell, f"='Levels (2)'!{cell.address}")


@fault("formula", *FORM)
def far_cell_added(scene: Scene) -> None:
    """A formula adds a cell far from everything that is printed."""
    cell = scene.pick(scene.numeric(scene.rows))
    scene.book[cell.sheet]["ZZ900"] = scene.value(cell) * -0.05
    scene.write(cell, f"{scene.text(cell)}+$ZZ$900")


@fault("formula", *FORM, "volatile_function")
def reference_made_of_text(scene: Scene) -> None:
    """A formula is wrapped in INDIRECT: the same value, but no level inserted moves it along."""
    cell = scene.pick(scene.column(scene.pick(scene.level_rows)))
    other = Cell(LEVELS, cell.row, cell.column)
    first = re.search(r"\b[A-Z]{1,2}\d+\b", scene.text(other))
    scene.need(first)
    assert first
    scene.write(other, scene.text(other).replace(first[0], f'INDIRECT("{first[0]}")', 1))


@fault("formula", *FORM)
def one_array_over_rows(scene: Scene) -> None:
    """One array formula fills two cells that had a formula each."""
    scene.need(len(scene.table.rows) > 1)
    column = sorted(scene.column(scene.pick(scene.numeric(scene.level_rows))), key=lambda cell: cell.row)
    first, second = column[:2]
    scene.need(second.row == first.row + 1)
    scene.write(second, None)
    array = ArrayFormula(f"{first.address}:{second.address}", f"=1*{scene.value(first):.6g}")
    scene.write(first, array)


@fault("formula", *ANY_FORM)
def checks_sheet_read_back(scene: Scene) -> None:
    """A criterion is taken from the checks sheet, where it stands for comparison only."""
    scene.write(scene.pick(scene.numeric(scene.criteria)), f"={CHECKS}!$E$18")
