"""Faults in what a reader goes by: names, labels, units, cautions, sheets and figures."""

from __future__ import annotations

from openpyxl.utils import get_column_letter
from openpyxl.workbook.defined_name import DefinedName

from tests.support.faults.catalogue import fault
from tests.support.faults.scene import CHECKS, COVER, CRITERIA, LEVELS, NoPlace, Scene
from xlbridge.headless.references import Cell

BAND, TEXT, SYMBOL, UNIT, CLAUSE = range(4, 9)


def _criterion_names(scene: Scene) -> dict[str, str]:
    """The names of single cells of the criteria sheet that formulas use."""
    names = {name: d.attr_text or "" for name, d in scene.book.defined_names.items()}
    used = " ".join(scene.text(cell) for cell in scene.formulas)
    return {n: t for n, t in names.items() if t.startswith(f"{CRITERIA}!") and ":" not in t and n in used}


def _point(scene: Scene, name: str, text: str, sheet: str = "") -> None:
    home = scene.book[sheet] if sheet else scene.book
    home.defined_names[name] = DefinedName(name, attr_text=text)


@fault("structure", "name_moved")
def name_led_to_the_next_row(scene: Scene) -> None:
    """A name leads to the row below its own."""
    name, text = scene.pick(_criterion_names(scene).items())
    place, _, row = text.rpartition("$")
    _point(scene, name, f"{place}${int(row) + 1}")
    scene.touch_one_of("workbook", f"{place}${int(row) + 1}".replace("$", ""), text.replace("$", ""))


@fault("structure", "name_moved")
def name_of_the_other_direction(scene: Scene) -> None:
    """The name of a criterion in direction Y leads to that of direction X."""
    name, text = scene.pick((n, t) for n, t in _criterion_names(scene).items() if n.endswith("_Y"))
    _point(scene, name, text.replace("$E$", "$D$"))
    scene.touch_one_of("workbook", text.replace("$E$", "D"), text.replace("$", ""))


@fault("structure", "name_moved")
def name_made_a_constant(scene: Scene) -> None:
    """A name is a number of its own: the cell may say what it likes."""
    name, text = scene.pick(_criterion_names(scene).items())
    value = scene.before.evaluator.evaluate_text(f"={name}")
    scene.need(isinstance(value, float))
    _point(scene, name, f"{value}")
    scene.touch_one_of("workbook", text.replace("$", ""))


@fault("structure", "name_shadowed")
def name_hidden_by_one_of_a_sheet(scene: Scene) -> None:
    """A sheet has a name of its own that hides one of the workbook from its formulas."""
    name, text = scene.pick(_criterion_names(scene).items())
    scene.book[COVER]["H40"] = 0.7
    _point(scene, name, f"{COVER}!$H$40", LEVELS)
    scene.touch_one_of("workbook", LEVELS, text.replace("$", ""))


@fault("structure", "name_shadowed")
def name_hidden_on_the_checks(scene: Scene) -> None:
    """The checks sheet has a status of its own."""
    _point(scene, "workbook_status", f"{CHECKS}!$B$11", CHECKS)
    scene.touch_one_of("workbook", CHECKS)


@fault("structure", "name_missing")
def name_deleted(scene: Scene) -> None:
    """A name that formulas use is deleted."""
    name, text = scene.pick(_criterion_names(scene).items())
    del scene.book.defined_names[name]
    scene.touch_one_of("workbook", text.replace("$", ""))


@fault("structure", "name_moved", "check_disarmed")
def status_led_elsewhere(scene: Scene) -> None:
    """The name of the status leads to a cell that always says the same."""
    scene.book[CHECKS]["L40"] = "✓ all checks hold"
    _point(scene, "workbook_status", f"{CHECKS}!$L$40")
    scene.touch_one_of("workbook", f"{CHECKS}!L40", f"{CHECKS}!D8")


# words


def _heading(scene: Scene, row: int) -> Cell:
    """A cell of the headings that says something."""
    cells = (Cell(LEVELS, row, n) for n in range(1, scene.levels.max_column + 1))
    return scene.pick(cell for cell in cells if isinstance(scene.at(cell).value, str))


def _other_unit(unit: str) -> str:
    others = {"kip": "kN", "kN": "kip", "ft": "m", "m": "ft", "in": "mm", "mm": "in"}
    return others.get(unit, "t")


@fault("structure", "unit_changed")
def unit_of_a_column(scene: Scene) -> None:
    """The unit in a heading is another, the numbers stay."""
    cells = (Cell(LEVELS, UNIT, n) for n in range(1, scene.levels.max_column + 1))
    known = {"kip", "kN", "ft", "m", "in", "mm"}
    cell = scene.pick(cell for cell in cells if scene.at(cell).value in known)
    scene.write(cell, _other_unit(str(scene.at(cell).value)))


@fault("structure", "unit_changed")
def unit_of_a_criterion(scene: Scene) -> None:
    """The unit beside a criterion is another."""
    sheet = scene.book[CRITERIA]
    cells = [Cell(CRITERIA, row, 6) for row in range(5, sheet.max_row + 1)]
    cell = scene.pick(c for c in cells if scene.at(c).value in ("kip", "kN", "ft", "m", "s", "g"))
    scene.write(cell, _other_unit(str(scene.at(cell).value)))


@fault("structure", "unit_changed", "label_changed")
def unit_on_the_cover(scene: Scene) -> None:
    """The cover names another unit for the base shear."""
    cell = Cell(COVER, scene.own.headlines[0].cell.row, 1)
    text = str(scene.at(cell).value)
    scene.write(cell, text.replace("kip", "kN") if "kip" in text else text.replace("kN", "kip"))


@fault("structure", "label_changed")
def heading_reworded(scene: Scene) -> None:
    """A heading says something else than the column holds."""
    scene.write(_heading(scene, TEXT), "Story force, reduced")


@fault("structure", "label_changed")
def clause_changed(scene: Scene) -> None:
    """A column names another clause."""
    scene.write(_heading(scene, CLAUSE), "12.8.4.2")


@fault("structure", "label_changed")
def directions_of_the_headings_exchanged(scene: Scene) -> None:
    """The headings of direction X and direction Y change places over the numbers."""
    texts = {cell.value: cell for cell in scene.levels[BAND] if isinstance(cell.value, str)}
    pairs = [
        (texts[t], texts[t.replace("X", "Y")]) for t in texts if "X" in t and t.replace("X", "Y") in texts
    ]
    first, second = scene.pick(pairs)
    scene.causes = 2
    words = first.value, second.value
    for cell, word in zip((first, second), reversed(words), strict=True):
        scene.write(Cell(LEVELS, BAND, cell.column), word)


@fault("structure", "label_changed")
def criteria_labels_exchanged(scene: Scene) -> None:
    """Two neighbouring criteria change their labels, not their values."""
    rows = [
        n for n in range(6, scene.book[CRITERIA].max_row) if scene.book[CRITERIA].cell(n, 4).value is not None
    ]
    row = scene.pick(n for n in rows if n + 1 in rows)
    first, second = Cell(CRITERIA, row, 2), Cell(CRITERIA, row + 1, 2)
    texts = scene.at(first).value, scene.at(second).value
    scene.causes = 2
    scene.write(first, texts[1])
    scene.write(second, texts[0])


@fault("structure", "label_changed", "check_disarmed")
def check_line_renamed(scene: Scene) -> None:
    """A check line says that it checks something else."""
    row = scene.pick(scene.verdicts).row
    scene.write(Cell(CHECKS, row, 2), "Total of forces is the base shear")


@fault("structure", "caution_changed")
def caution_removed(scene: Scene) -> None:
    """A caution of the cover is cleared."""
    scene.write(scene.pick(sorted(scene.own.cautions)), None)


@fault("structure", "caution_changed")
def caution_reworded(scene: Scene) -> None:
    """A caution of the cover says the opposite."""
    scene.write(scene.pick(sorted(scene.own.cautions)), "Verified by the firm; no further check is needed.")


@fault("structure", "caution_changed")
def printed_caution_removed(scene: Scene) -> None:
    """The caution on the printed pages of a sheet is gone."""
    sheet = scene.pick([s for s in scene.book.worksheets if s.oddFooter or s.oddHeader])
    for part in (sheet.oddHeader, sheet.oddFooter):
        for side in (part.left, part.center, part.right):
            side.text = None
    scene.touch(sheet.title)


@fault("structure", "label_changed")
def note_of_doubt_removed(scene: Scene) -> None:
    """The note that a clause is from memory is cleared."""
    sheet = scene.book[CRITERIA]
    rows = [n for n in range(5, sheet.max_row + 1) if "memory" in str(sheet.cell(n, 9).value)]
    scene.write(Cell(CRITERIA, scene.pick(rows), 9), None)


@fault("structure", "made_for_changed")
def edition_on_the_cover(scene: Scene) -> None:
    """The cover names the other edition."""
    cell = next(Cell(COVER, n, 2) for n in range(4, 12) if "ASCE" in str(scene.book[COVER].cell(n, 2).value))
    text = str(scene.at(cell).value)
    scene.write(cell, text.replace("7-22", "7-16") if "7-22" in text else text.replace("7-16", "7-22"))


@fault("structure", "made_for_changed")
def edition_switched(scene: Scene) -> None:
    """The fixed edition of the criteria is typed over: the formulas stay those of the other."""
    cell = Cell(CRITERIA, 6, 4)
    scene.write(cell, "7-16" if scene.at(cell).value == "7-22" else "7-22")


@fault("structure", "made_for_changed")
def unit_system_switched(scene: Scene) -> None:
    """The fixed unit system is typed over: all numbers stay."""
    cell = Cell(CRITERIA, 7, 4)
    scene.write(cell, "us" if scene.at(cell).value == "si" else "si")


# sheets and figures


@fault("structure", "sheet_missing")
def sheet_deleted(scene: Scene) -> None:
    """The list of functions and clauses is deleted."""
    del scene.book["Functions"]
    scene.touch_one_of("workbook", "Functions")


@fault("structure", "figure_changed")
def figure_shows_another_column(scene: Scene) -> None:
    """A figure shows another column than its title says."""
    charts = [chart for chart in scene.book["Figures"]._charts if chart.series]
    series = scene.pick(charts).series[0]
    reference = series.val or series.yVal
    old = reference.numRef.f
    letter = old.split("$")[1]
    reference.numRef.f = old.replace(
        f"${letter}$", f"${get_column_letter(scene.levels[f'{letter}1'].column + 1)}$"
    )
    scene.touch("Figures")


@fault("structure", "figure_changed")
def figure_leaves_levels_out(scene: Scene) -> None:
    """A figure ends two rows too early."""
    series = scene.book["Figures"]._charts[0].series[0]
    reference = (series.val or series.yVal).numRef
    head, _, row = reference.f.rpartition("$")
    reference.f = f"{head}${int(row) - 2}"
    scene.touch("Figures")


@fault("structure", "figure_changed")
def figure_removed(scene: Scene) -> None:
    """A figure is deleted."""
    if not scene.book["Figures"]._charts:
        raise NoPlace
    scene.book["Figures"]._charts.pop(0)
    scene.touch("Figures")
