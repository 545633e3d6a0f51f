"""Faults in the entries of the criteria."""

from __future__ import annotations

from tests.support.faults.catalogue import fault
from tests.support.faults.inputs import AGAINST, PHYSICAL, UNREADABLE
from tests.support.faults.scene import Scene
from xlbridge.audit.align import first_cell


def _criterion(scene: Scene, path: str, value: object) -> None:
    cell = scene.entry(path)
    scene.need(scene.value(cell) != value)
    scene.write(cell, value)


@fault("input", *AGAINST)
def response_modification_slip(scene: Scene) -> None:
    """R of a direction is that of another system."""
    _criterion(scene, scene.pick(["direction.X.R", "direction.Y.R"]), 8.0)


@fault("input", *PHYSICAL)
def per_cent_of_gravity(scene: Scene) -> None:
    """S_DS is given in per cent of gravity."""
    _criterion(scene, "site.S_DS", 92.0)


@fault("input", *PHYSICAL)
def spectrum_exchanged(scene: Scene) -> None:
    """S_DS and S_D1 stand in each other's cells."""
    cells = [scene.entry("site.S_DS"), scene.entry("site.S_D1")]
    for cell, other in zip(cells, reversed(cells), strict=True):
        scene.at(cell).value = scene.value(other)
    scene.touch_one_of(*map(str, cells))


@fault("input", *AGAINST)
def directions_exchanged(scene: Scene) -> None:
    """R and C_d of the two directions change places."""
    for key in ("R", "C_d"):
        cells = [scene.entry(f"direction.{d}.{key}") for d in "XY"]
        for cell, other in zip(cells, reversed(cells), strict=True):
            scene.write(cell, scene.value(other))


@fault("input", *AGAINST)
def risk_category_lowered(scene: Scene) -> None:
    """The risk category is a lower one."""
    _criterion(scene, "site.risk_category", "II")


@fault("input", *AGAINST)
def period_row_of_another_system(scene: Scene) -> None:
    """The approximate period is that of another system."""
    _criterion(scene, "direction.X.period_system", "steel moment frame")


@fault("input", *UNREADABLE)
def choice_misspelt(scene: Scene) -> None:
    """A choice is no word of its list, by one space."""
    cell = scene.entry("direction.X.period_system")
    scene.write(cell, f"{scene.value(cell)} ".replace(" ", "  "))


@fault("input", *PHYSICAL)
def computed_period_in_the_wrong_unit(scene: Scene) -> None:
    """The computed period is a frequency, or given in milliseconds."""
    _criterion(scene, "direction.X.T_computed", scene.pick([850.0, 62.0]))


@fault("input", *AGAINST)
def base_moved(scene: Scene) -> None:
    """The base lies lower than the ground: the base of a basement."""
    _criterion(scene, "site.base_elevation", -3.0)


@fault("input", "content_changed")
def source_claimed(scene: Scene) -> None:
    """The source of an entry names something that it does not come from."""
    places = [text for (_, name), text in scene.before.book.names.items() if name.startswith("source_")]
    named = [found for text in sorted(set(places)) if (found := first_cell(text))]
    scene.write(scene.pick(c for c in named if scene.value(c)), "geotechnical report 7, table 2")
