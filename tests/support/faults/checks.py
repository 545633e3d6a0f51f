"""Faults in the workbook's own checks."""

from __future__ import annotations

import re
from itertools import pairwise

from tests.support.faults import formula_text as texts
from tests.support.faults.catalogue import fault
from tests.support.faults.scene import CHECKS, Scene
from xlbridge.headless.references import Cell

LEFT, RIGHT, DIFFERENCE, TOLERANCE, VERDICT = 4, 5, 6, 7, 9
STARTERS, HELD, FAILED, STATUS = (Cell(CHECKS, row, LEFT) for row in (4, 5, 7, 8))
DISARMED = "check_disarmed"


def _line(scene: Scene, column: int) -> Cell:
    """A cell of one check line."""
    return Cell(CHECKS, scene.pick(scene.verdicts).row, column)


@fault("checks", DISARMED)
def verdict_typed(scene: Scene) -> None:
    """The verdict of a line is typed."""
    scene.write(_line(scene, VERDICT), "✓ holds")


@fault("checks", DISARMED)
def verdict_turned(scene: Scene) -> None:
    """The verdict of a line says that it holds either way."""
    scene.rewrite(scene.verdicts, lambda text: re.sub('"[✗!][^"]*"', '"✓ holds"', text))


@fault("checks", DISARMED)
def tolerance_widened(scene: Scene) -> None:
    """The tolerance of a line is widened."""
    scene.write(_line(scene, TOLERANCE), 0.25)


@fault("checks", DISARMED)
def tolerance_computed(scene: Scene) -> None:
    """The tolerance of a line is whatever the difference needs."""
    cell = _line(scene, TOLERANCE)
    scene.write(cell, f"=ABS(F{cell.row})")


@fault("checks", DISARMED)
def compared_with_itself(scene: Scene) -> None:
    """The right side of a line reads its left side."""
    cell = _line(scene, RIGHT)
    scene.write(cell, f"=D{cell.row}")


@fault("checks", DISARMED)
def left_side_typed(scene: Scene) -> None:
    """The left side of a line is the number that it should be."""
    cell = _line(scene, LEFT)
    scene.write(cell, scene.value(Cell(CHECKS, cell.row, RIGHT)))


@fault("checks", DISARMED)
def difference_rounded(scene: Scene) -> None:
    """The difference of a line is rounded away."""
    cell = _line(scene, DIFFERENCE)
    scene.write(cell, f"=ROUND({scene.text(cell)[1:]},0)")


@fault("checks", DISARMED)
def one_side_only(scene: Scene) -> None:
    """A line looks at one sign of the difference only."""
    scene.rewrite(scene.verdicts, lambda text: text.replace("ABS(F", "(F", 1))


@fault("checks", DISARMED)
def line_cleared(scene: Scene) -> None:
    """A check line is cleared."""
    row = scene.pick(scene.verdicts).row
    for column in (LEFT, RIGHT, DIFFERENCE, TOLERANCE, VERDICT):
        scene.write(Cell(CHECKS, row, column), None)


@fault("checks", DISARMED)
def line_of_another(scene: Scene) -> None:
    """A check line repeats the line above it: its own quantity is not compared."""
    first = min(cell.row for cell in scene.verdicts)
    row = scene.pick(cell.row for cell in scene.verdicts if cell.row > first + 1)
    for column in (LEFT, RIGHT):
        above = scene.text(Cell(CHECKS, row - 1, column))
        if above != scene.text(Cell(CHECKS, row, column)):
            scene.write(Cell(CHECKS, row, column), above)
    scene.need(scene.touched)


@fault("checks", DISARMED)
def failures_not_counted(scene: Scene) -> None:
    """The number of failures is 0, typed."""
    scene.write(FAILED, 0)


@fault("checks", DISARMED)
def last_lines_not_counted(scene: Scene) -> None:
    """A count leaves the last lines out."""
    counts = [HELD, FAILED]
    end = lambda reference: texts.resized(reference, bottom=-2)  # noqa: E731
    scene.rewrite(counts, lambda text: texts.references(text, scene.random, end))


@fault("checks", DISARMED)
def starters_not_counted(scene: Scene) -> None:
    """The number of starter values is 0, typed."""
    scene.write(STARTERS, 0)


@fault("checks", DISARMED)
def status_typed(scene: Scene) -> None:
    """The status of the workbook is typed."""
    scene.write(STATUS, "✓ all checks hold")


@fault("checks", DISARMED)
def status_words_changed(scene: Scene) -> None:
    """The status says that all holds whatever is counted."""
    scene.write(STATUS, re.sub(r"D7>0", "D7>99", scene.text(STATUS)))


@fault("checks", DISARMED)
def status_line_typed(scene: Scene) -> None:
    """The status on top of one sheet is typed."""
    lines = [c for c in scene.own.checks if scene.text(c) == "=workbook_status"]
    scene.write(scene.pick(sorted(lines)), "✓ all checks hold")


@fault("checks", DISARMED)
def warnings_held(scene: Scene) -> None:
    """A warning counts as held."""
    scene.rewrite(scene.verdicts, lambda text: text.replace('"! look"', '"✓ holds"'))


@fault("checks", DISARMED)
def check_of_the_other_direction(scene: Scene) -> None:
    """The line of direction Y compares direction X once more."""
    rows = sorted(cell.row for cell in scene.verdicts)
    pairs = [(a, b) for a, b in pairwise(rows) if b == a + 1]
    y_lines = [(a, b) for a, b in pairs if scene.book[CHECKS].cell(b, 3).value == "Y"]
    upper, lower = scene.pick(y_lines)
    for column in (LEFT, RIGHT):
        if scene.text(Cell(CHECKS, upper, column)) != scene.text(Cell(CHECKS, lower, column)):
            scene.write(Cell(CHECKS, lower, column), scene.text(Cell(CHECKS, upper, column)))
    scene.need(scene.touched)
