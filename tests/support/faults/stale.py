"""Faults in the values that a file stores: the formulas are right, what a reader sees is not."""

from __future__ import annotations

from tests.support.faults.catalogue import fault
from tests.support.faults.scene import Scene
from xlbridge.headless.references import Cell
from xlbridge.values import Scalar


def _keep(scene: Scene, cell: Cell, value: Scalar) -> None:
    scene.stored[cell] = value
    scene.touch(str(cell))


@fault("stale", "stale_value")
def stale_cell(scene: Scene) -> None:
    """One formula stores an earlier number."""
    cell = scene.pick(scene.numeric(scene.formulas))
    _keep(scene, cell, scene.value(cell) * 1.07)


@fault("stale", "stale_value")
def stale_by_a_hair(scene: Scene) -> None:
    """One formula stores a number that differs in the seventh digit."""
    cell = scene.pick(scene.numeric(scene.formulas))
    _keep(scene, cell, scene.value(cell) * (1 + 1e-7))


@fault("stale", "stale_value")
def stale_headline(scene: Scene) -> None:
    """A result on the cover stores an earlier number."""
    cell = scene.pick(headline.cell for headline in scene.own.headlines)
    _keep(scene, cell, scene.value(cell) * 0.95)


@fault("stale", "stale_value")
def stale_column(scene: Scene) -> None:
    """A column stores the numbers of an earlier run."""
    for cell in scene.column(scene.pick(scene.numeric(scene.rows))):
        _keep(scene, cell, scene.value(cell) * 1.1)


@fault("stale", "stale_value")
def stale_verdict(scene: Scene) -> None:
    """A verdict stores that it holds, and does not."""
    texts = [c for c in scene.rows if scene.value(c) == "✓ within limit"]
    _keep(scene, scene.pick(texts), "✗ above limit")


@fault("stale", "stale_value")
def stale_status(scene: Scene) -> None:
    """The status stores another verdict than the checks give."""
    cell = Cell("Checks", 8, 4)
    _keep(scene, cell, "✓ all checks hold, 2 warnings")


@fault("stale", "stale_value")
def number_stored_as_text(scene: Scene) -> None:
    """A formula that gives a number stores the same as a text."""
    cell = scene.pick(scene.numeric(scene.formulas))
    _keep(scene, cell, f"{scene.value(cell):.6g}")


@fault("stale", "stale_value")
def error_stored_as_zero(scene: Scene) -> None:
    """A formula stores 0 where it gives a number."""
    _keep(scene, scene.pick(scene.numeric(scene.formulas)), 0.0)


@fault("stale", "no_stored_value")
def value_not_stored(scene: Scene) -> None:
    """A formula stores no value: a reader that does not calculate sees nothing."""
    _keep(scene, scene.pick(scene.numeric(scene.formulas)), None)


@fault("stale", "stale_value")
def entry_changed_afterwards(scene: Scene) -> None:
    """A weight is changed after the last calculation: every result is an old one."""
    cell = scene.pick(scene.level_entries("weight"))
    scene.at(cell).value = scene.value(cell) * 1.2
    scene.recalculated = False
