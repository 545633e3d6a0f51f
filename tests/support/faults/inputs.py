"""Faults in what the user enters: wrong, misplaced, mistaken in unit, or plausible and wrong all the same."""

from __future__ import annotations

from datetime import datetime
from random import Random

from tests.support.faults.catalogue import fault
from tests.support.faults.scene import LEVELS, Scene
from xlbridge.headless.references import Cell

#: plausible: it can be told only from the issue that was checked before
AGAINST = ("input_changed",)
#: out of the bounds of its quantity
PHYSICAL = ("implausible_value", "implausible_step", "implausible_order")
UNREADABLE = ("inputs_unreadable",)


def _beside(scene: Scene, cell: Cell) -> tuple[str, ...]:
    """An entry, or its row and the row above it: what follows directly from it stands there."""
    return str(cell), f"{cell.sheet}!A{cell.row - 1}:ZZ{cell.row}"


def _put(scene: Scene, cell: Cell, content: object) -> None:
    """Change an entry by which a value computed beside it becomes implausible."""
    scene.at(cell).value = content  # type: ignore[assignment]
    scene.touch_one_of(*_beside(scene, cell))


def _one(scene: Scene, key: str) -> Cell:
    return scene.pick(scene.level_entries(key))


def _two(scene: Scene, key: str) -> list[Cell]:
    scene.need(len(scene.table.rows) > 1)
    cells = scene.random.sample(scene.level_entries(key), 2)
    scene.need(scene.value(cells[0]) != scene.value(cells[1]))
    return cells


def _exchange(scene: Scene, key: str) -> None:
    first, second = _two(scene, key)
    scene.write(first, scene.value(second))
    scene.write(second, scene.value(first))


def _all(scene: Scene, key: str, factor: float) -> None:
    for cell in scene.level_entries(key):
        _put(scene, cell, round(scene.value(cell) * factor, 4))


def _is_si(scene: Scene) -> bool:
    return str(scene.own.inputs["units"]) == "si"


# entries of the levels


@fault("input", *AGAINST)
def elevations_exchanged(scene: Scene) -> None:
    """The elevations of two levels change places."""
    _exchange(scene, "elevation")


@fault("input", *AGAINST)
def elevation_twice(scene: Scene) -> None:
    """A level has the elevation of another."""
    first, second = _two(scene, "elevation")
    scene.write(first, scene.value(second))


@fault("input", *UNREADABLE)
def weight_blank(scene: Scene) -> None:
    """The weight of a level is left out."""
    scene.write(_one(scene, "weight"), None)


@fault("input", *UNREADABLE, "number_as_text")
def weight_as_text(scene: Scene) -> None:
    """The weight of a level is a text that looks like a number."""
    cell = _one(scene, "weight")
    scene.write(cell, f"{scene.value(cell):.0f}")


@fault("input", *UNREADABLE, "number_as_text")
def weight_with_a_comma(scene: Scene) -> None:
    """The weight of a level is typed with a decimal comma, and so is a text."""
    cell = _one(scene, "weight")
    scene.write(cell, f"{scene.value(cell):.1f}".replace(".", ","))


@fault("input", *UNREADABLE, "number_as_text")
def minus_sign_of_the_printer(scene: Scene) -> None:
    """An elevation is pasted with a typographic minus, and so is a text."""
    cell = _one(scene, "elevation")
    scene.write(cell, f"\N{MINUS SIGN}{scene.value(cell):.2f}")


@fault("input", *UNREADABLE)
def space_for_a_weight(scene: Scene) -> None:
    """The weight of a level is one space: it looks empty, and is a text."""
    scene.write(_one(scene, "weight"), " ")


@fault("input", *UNREADABLE)
def truth_for_a_weight(scene: Scene) -> None:
    """The weight of a level is TRUE."""
    scene.write(_one(scene, "weight"), True)


@fault("input", "format_misleads", *PHYSICAL)
def date_for_a_displacement(scene: Scene) -> None:
    """A displacement was taken for a date by the program that pasted it."""
    cell = _one(scene, "delta_xe_X")
    _put(scene, cell, datetime(2026, 3, 1))


@fault("input", *UNREADABLE, *PHYSICAL)
def negative_weight(scene: Scene) -> None:
    """The weight of a level is negative."""
    cell = _one(scene, "weight")
    _put(scene, cell, -scene.value(cell))


@fault("input", *PHYSICAL)
def zero_weight(scene: Scene) -> None:
    """The weight of a level is 0."""
    _put(scene, _one(scene, "weight"), 0)


@fault("input", *PHYSICAL)
def small_unit_in_one_row(scene: Scene) -> None:
    """One elevation is given in mm, or in inches."""
    cell = _one(scene, "elevation")
    _put(scene, cell, scene.value(cell) * (1000 if _is_si(scene) else 12))


@fault("input", *PHYSICAL)
def small_unit_in_all_rows(scene: Scene) -> None:
    """All elevations are given in mm, or in inches."""
    _all(scene, "elevation", 1000 if _is_si(scene) else 12)


@fault("input", *PHYSICAL)
def other_length_unit(scene: Scene) -> None:
    """All elevations are given in the other system's unit."""
    _all(scene, "elevation", 1 / 0.3048 if _is_si(scene) else 0.3048)


@fault("input", *AGAINST)
def mass_for_weight(scene: Scene) -> None:
    """All weights are masses."""
    _all(scene, "weight", 1 / 9.80665 if _is_si(scene) else 1 / 32.174)


@fault("input", *PHYSICAL)
def pounds_for_kip(scene: Scene) -> None:
    """All weights are given in the thousandth of their unit."""
    _all(scene, "weight", 1000)


@fault("input", *AGAINST, *PHYSICAL)
def displacements_in_the_large_unit(scene: Scene) -> None:
    """The displacements of one direction are given in m, or in ft."""
    _all(scene, scene.pick(["delta_xe_X", "delta_xe_Y"]), 0.001 if _is_si(scene) else 1 / 12)


@fault("input", *AGAINST, *PHYSICAL)
def decimal_point_slipped(scene: Scene) -> None:
    """The decimal point of a weight slips by a place."""
    cell = _one(scene, "weight")
    _put(scene, cell, scene.value(cell) * scene.pick([10, 0.1]))


@fault("input", *AGAINST)
def weights_exchanged(scene: Scene) -> None:
    """The weights of two levels change places."""
    _exchange(scene, "weight")


@fault("input", *AGAINST)
def digits_transposed(scene: Scene) -> None:
    """Two digits of a weight change places."""
    cell = _one(scene, "weight")
    scene.write(cell, _transposed(scene.value(cell), scene.random))


def _transposed(value: float, random: Random) -> float:
    digits = f"{value:.1f}"
    places = [n for n in range(1, len(digits) - 2) if "." not in digits[n : n + 2]]
    places = [n for n in places if digits[n] != digits[n + 1]]
    if not places:
        return value + 9
    n = random.choice(places)
    return float(digits[:n] + digits[n + 1] + digits[n] + digits[n + 2 :])


@fault("input", *AGAINST)
def column_sorted_alone(scene: Scene) -> None:
    """The weights are sorted, and nothing else."""
    cells = scene.level_entries("weight")
    values = sorted(scene.value(cell) for cell in cells)
    for cell, value in zip(cells, values, strict=True):
        if scene.value(cell) != value:
            scene.write(cell, value)
    scene.need(scene.touched)


@fault("input", *PHYSICAL)
def displacements_upside_down(scene: Scene) -> None:
    """The displacements of a direction stand in the order of another list."""
    scene.need(len(scene.table.rows) > 1)
    cells = scene.level_entries("delta_xe_Y")
    for cell, other in zip(cells, reversed(cells), strict=True):
        if cell != other:
            _put(scene, cell, scene.value(other))


@fault("input", *AGAINST)
def displacements_of_the_other_direction(scene: Scene) -> None:
    """The displacements of X and of Y change columns."""
    for first, second in zip(*(scene.level_entries(f"delta_xe_{d}") for d in "XY"), strict=True):
        scene.write(first, scene.value(second))
        scene.write(second, scene.value(first))


@fault("input", *AGAINST, *PHYSICAL)
def displacement_sign(scene: Scene) -> None:
    """The displacement of one level has the other sign."""
    cell = _one(scene, "delta_xe_X")
    _put(scene, cell, -scene.value(cell))


@fault("input", *PHYSICAL)
def gravity_load_of_one_story(scene: Scene) -> None:
    """P_x of the lowest level is the load of its own story, not what it carries."""
    scene.need(len(scene.table.rows) > 2)
    cells = scene.level_entries("P_x")
    _put(scene, cells[-1], scene.value(cells[0]))


@fault("input", *UNREADABLE)
def level_without_a_name(scene: Scene) -> None:
    """A level loses its name: the row looks unused, and no longer counts."""
    scene.write(_one(scene, "name"), None)


@fault("input", *AGAINST, "row_changed")
def name_twice(scene: Scene) -> None:
    """A level has the name of another."""
    first, second = _two(scene, "name")
    scene.write(first, scene.value(second))


@fault("input", *AGAINST, "row_changed")
def name_with_a_space(scene: Scene) -> None:
    """A level's name ends in a space: it will not be found by its name."""
    cell = _one(scene, "name")
    scene.write(cell, f"{scene.value(cell)} ")


@fault("input", "row_outside_table")
def level_below_the_table(scene: Scene) -> None:
    """A level is typed below the totals, where nothing counts it."""
    row = scene.levels.max_row + 1
    for key, value in (("name", "Annex"), ("elevation", 9.0), ("weight", 500.0)):
        scene.at(Cell(LEVELS, row, scene.level_entries(key)[0].column)).value = value
    scene.touch_one_of(*(f"{LEVELS}!{letter}{row}" for letter in "ABC"))


@fault("input", "stray_entry")
def weight_in_a_guard_row(scene: Scene) -> None:
    """A weight stands in a guard row, where the ranges count it."""
    rows = scene.table.rows
    row = scene.pick([min(rows) - 1, max(rows) + 1])
    scene.write(Cell(LEVELS, row, scene.level_entries("weight")[0].column), 300.0)


@fault("input", "entry_is_formula")
def weight_taken_from_its_neighbour(scene: Scene) -> None:
    """The weight of a level is a formula that repeats the level above it."""
    cells = scene.level_entries("weight")
    scene.need(len(cells) > 1)
    n = scene.random.randrange(1, len(cells))
    scene.write(cells[n], f"={cells[n - 1].address}")
