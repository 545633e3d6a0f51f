"""The inputs of one building as frozen records; each field carries its own check.

Heights and weights in the unit system's length and force units, displacements in its displacement unit.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import MISSING, Field, dataclass, field, fields
from functools import partial
from typing import Any, Final

import numpy as np

from engine.drift import DRIFT_STRUCTURES
from engine.editions import EDITIONS
from engine.errors import ImpossibleValue, MissingValue, NotApplicable, WrongType
from engine.irregularity import DIAPHRAGMS
from engine.levels import MAX_LEVELS
from engine.occupancy import DESIGN_CATEGORIES, RISK_CATEGORIES
from engine.period import PERIOD_SYSTEMS
from engine.redundancy import CONFIGURATIONS
from engine.require import Array, above, at_least, choice, finite, within
from engine.units import SYSTEMS
from engine.vertical import EXPONENT_RULES

DIRECTIONS: Final = ("X", "Y")
Check = Callable[[str, Any], object]


def checked(check: Check, default: Any = MISSING) -> Any:
    """Declare a field with its check; a field with a default may be left out."""
    return field(default=default, metadata={"check": check})


def is_text(name: str, value: object) -> object:
    """Refuse anything but a text that says something."""
    if not isinstance(value, str):
        raise WrongType(name, value, "must be text")
    if not value.strip():
        raise MissingValue(name, None, "must be a text that is not blank")
    return value


def is_list_of_texts(name: str, value: object) -> object:
    """Refuse anything but a list of texts."""
    if not isinstance(value, list | tuple):
        raise WrongType(name, value, "must be a list of texts")
    return [is_text(name, word) for word in value]


def is_flag(name: str, value: object) -> object:
    """Refuse anything but true or false."""
    if not isinstance(value, bool):
        raise WrongType(name, value, "must be true or false")
    return value


def is_word(words: tuple[str, ...], name: str, value: object) -> object:
    """Refuse anything but one of the words."""
    return choice(name, value, words)


def one_number(check: Check, name: str, value: object) -> object:
    """Refuse anything but a single number that the check accepts."""
    if isinstance(value, list | tuple):
        raise WrongType(name, value, "must be a single number")
    return check(name, value)


def number(check: Check, default: Any = MISSING) -> Any:
    """Declare a field that holds one number."""
    return checked(partial(one_number, check), default)


def word(words: tuple[str, ...], default: Any = MISSING) -> Any:
    """Declare a field that holds one of the words."""
    return checked(partial(is_word, words), default)


@dataclass(frozen=True, slots=True, kw_only=True)
class Site:
    """Ground motion [g, s], Risk Category, the elevation of the base [ft or m], and what the plans show.

    ``diaphragms`` and the fields below it decide on irregularities.
    """

    S_DS: float = number(partial(above, 0))
    S_D1: float = number(partial(above, 0))
    S_1: float = number(partial(at_least, 0))
    T_L: float = number(partial(above, 0))
    risk_category: str = word(RISK_CATEGORIES)
    base_elevation: float = number(finite, 0.0)
    SDC: str | None = word(DESIGN_CATEGORIES, None)
    diaphragms: str = word(DIAPHRAGMS, DIAPHRAGMS[0])
    drift_exception: bool = checked(is_flag, False)
    reentrant_ratio: float | None = number(partial(at_least, 0), None)
    diaphragm_opening: float | None = number(partial(within, 0, 1), None)
    diaphragm_change: float | None = number(partial(at_least, 0), None)
    out_of_plane_offset: bool | None = checked(is_flag, None)
    nonparallel_system: bool | None = checked(is_flag, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class Direction:
    """The seismic force-resisting system of one plan direction.

    ``rho`` divides the allowable drift only where ``moment_frames_only`` is true. ``TIR_max`` is the largest
    torsional irregularity ratio, where the levels do not give the displacements of the edges.
    """

    system: str = checked(is_text)
    R: float = number(partial(at_least, 1))
    Omega_0: float = number(partial(at_least, 1))
    C_d: float = number(partial(at_least, 1))
    period_system: str = word(PERIOD_SYSTEMS)
    drift_structure: str = word(DRIFT_STRUCTURES)
    T_computed: float | None = number(partial(above, 0), None)
    k_rule: str = word(EXPONENT_RULES, "interpolate")
    rho: float = number(partial(within, 1, 1.3), 1.0)
    moment_frames_only: bool = checked(is_flag, False)
    beta: float = number(lambda name, value: above(0, name, within(0, 1, name, value)), 1.0)
    one_sided: bool = checked(is_flag, False)
    in_plane_discontinuity: bool | None = checked(is_flag, None)
    configuration: str = word(CONFIGURATIONS, CONFIGURATIONS[0])
    TIR_max: float | None = number(partial(at_least, 1), None)


@dataclass(frozen=True, slots=True, kw_only=True)
class Level:
    """One level: elevation [ft or m], weight and P_x [kip or kN], elastic displacements [in or mm].

    The weight is left out where rows of the take-off give it. ``d_1`` and ``d_2`` are those of opposite
    edges with A_x = 1; ``x_M`` and ``x_R`` the centres of mass and rigidity on one axis. ``K_x``,
    ``strength`` and ``L_sys`` belong to the story below the level. ``source`` says in words where the
    numbers come from.
    """

    name: str = checked(is_text)
    elevation: float = number(finite)
    weight: float | None = number(partial(at_least, 0), None)
    P_x: float | None = number(partial(at_least, 0), None)
    delta_xe_X: float | None = number(finite, None)
    delta_xe_Y: float | None = number(finite, None)
    w_px: float | None = number(partial(at_least, 0), None)
    L_perp_X: float | None = number(partial(above, 0), None)
    L_perp_Y: float | None = number(partial(above, 0), None)
    d_1_X: float | None = number(finite, None)
    d_1_Y: float | None = number(finite, None)
    d_2_X: float | None = number(finite, None)
    d_2_Y: float | None = number(finite, None)
    x_M_X: float | None = number(finite, None)
    x_M_Y: float | None = number(finite, None)
    x_R_X: float | None = number(finite, None)
    x_R_Y: float | None = number(finite, None)
    K_x_X: float | None = number(partial(above, 0), None)
    K_x_Y: float | None = number(partial(above, 0), None)
    strength_X: float | None = number(partial(above, 0), None)
    strength_Y: float | None = number(partial(above, 0), None)
    L_sys_X: float | None = number(partial(above, 0), None)
    L_sys_Y: float | None = number(partial(above, 0), None)
    source: str | None = checked(is_text, None)


WEIGHT_KINDS: Final = (
    *("dead", "partition", "storage", "garage storage", "snow", "equipment", "landscaping"),
)


@dataclass(frozen=True, slots=True, kw_only=True)
class WeightRow:
    """One row of the weight take-off: a load [psf or kN/m2] on an area [ft2 or m2], or an amount [kip or kN].

    An amount is entered as it counts; of a load the part counts that its kind says.
    """

    level: str = checked(is_text)
    what: str = checked(is_text)
    kind: str = word(WEIGHT_KINDS)
    area: float | None = number(partial(at_least, 0), None)
    load: float | None = number(partial(at_least, 0), None)
    amount: float | None = number(partial(at_least, 0), None)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class SpectrumRow:
    """One period [s] at which the spectrum is wanted."""

    T: float = number(partial(at_least, 0))


#: entries that stand at every level or at none
LEVEL_OPTIONS: Final = tuple(
    entry.name for entry in fields(Level) if entry.default is None and entry.name not in ("weight", "source")
)


@dataclass(frozen=True, slots=True, kw_only=True)
class Building:
    """Everything the equivalent lateral force procedure needs to know of one building.

    ``parts`` names parts of the workbook that are wanted although no entry of a level asks for them.
    """

    title: str = checked(is_text)
    edition: str = word(EDITIONS)
    units: str = word(SYSTEMS)
    site: Site
    direction: Mapping[str, Direction]
    level: tuple[Level, ...]
    weight: tuple[WeightRow, ...] = ()
    spectrum: tuple[SpectrumRow, ...] = ()
    job: Mapping[str, object] = field(default_factory=dict)
    sources: Mapping[str, str] = field(default_factory=dict)
    parts: tuple[str, ...] = checked(is_list_of_texts, ())

    def __post_init__(self) -> None:
        """Check every field of every record, then what fields say together."""
        check_fields("", self)
        check_fields("site.", self.site)
        if not self.direction:
            raise MissingValue("direction", None, "must have a table X or Y or both")
        for name, direction in self.direction.items():
            choice("direction", name, DIRECTIONS)
            check_fields(f"direction.{name}.", direction)
        _check_levels(self.level, self.site.base_elevation)
        for place, row in enumerate(self.spectrum, start=1):
            check_fields(f"spectrum {place}: ", row)
        if self.weight:
            _check_rows(self.weight, self.level)
        else:
            _check_weights(self.level)


def check_fields(prefix: str, record: Any) -> None:
    """Apply the check of each field that has one; a blank is allowed where blank is the default."""
    for entry in fields(record):
        value = getattr(record, entry.name)
        if "check" in entry.metadata and not (value is None and may_be_left_out(entry)):
            entry.metadata["check"](f"{prefix}{entry.name}", value)


def may_be_left_out(entry: Field[Any]) -> bool:
    """Tell whether a field has a default."""
    return entry.default is not MISSING or entry.default_factory is not MISSING


def level_label(place: int, name: object) -> str:
    """Name a level in a message, counted from 1 as listed."""
    return f'level {place} ("{name}")'


def level_values(building: Building, key: str) -> Array | None:
    """Return an entry of all levels as an array, ``None`` where it is not given."""
    if getattr(building.level[0], key) is None:
        return None
    return np.array([getattr(level, key) for level in building.level], dtype=np.float64)


def _check_levels(levels: tuple[Level, ...], base: float) -> None:
    if not 1 <= len(levels) <= MAX_LEVELS:
        raise ImpossibleValue("level", f"{len(levels)} levels", f"must be 1 to {MAX_LEVELS} levels")
    for place, level in enumerate(levels, start=1):
        label = level_label(place, level.name)
        check_fields(f"{label}: ", level)
        if level.elevation <= base:
            raise ImpossibleValue(
                f"{label}: elevation", level.elevation, f"must be above the base at {base:g}"
            )
        for optional in LEVEL_OPTIONS:
            if (getattr(level, optional) is None) != (getattr(levels[0], optional) is None):
                raise _half_filled(levels, optional)


def _check_weights(levels: tuple[Level, ...]) -> None:
    for place, level in enumerate(levels, start=1):
        if level.weight is None:
            raise MissingValue(f"{level_label(place, level.name)}: weight", None, "must be given")
    if not any(level.weight for level in levels):
        raise ImpossibleValue("level", "all weights 0", "at least one level must have a weight above 0")


def _check_rows(rows: tuple[WeightRow, ...], levels: tuple[Level, ...]) -> None:
    for place, level in enumerate(levels, start=1):
        if level.weight is not None:
            label = f"{level_label(place, level.name)}: weight"
            raise NotApplicable(label, level.weight, "must be left out where rows of weights are given")
    names = [level.name.casefold() for level in levels]
    for place, row in enumerate(rows, start=1):
        label = row_label(place, row.what)
        check_fields(f"{label}: ", row)
        if names.count(row.level.casefold()) != 1:
            raise NotApplicable(f"{label}: level", row.level, "must be the name of one level")
        _check_amount(label, row)


def _check_amount(label: str, row: WeightRow) -> None:
    given = [entry is not None for entry in (row.area, row.load, row.amount)]
    if given not in ([True, True, False], [False, False, True]):
        raise MissingValue(f"{label}: area", row.area, "must be given with load, or amount alone")


def row_label(place: int, what: object) -> str:
    """Name a row of the weight take-off in a message, counted from 1 as listed."""
    return f'weight {place} ("{what}")'


def _half_filled(levels: tuple[Level, ...], optional: str) -> MissingValue:
    place = next(i for i, level in enumerate(levels, start=1) if getattr(level, optional) is None)
    name = f"{level_label(place, levels[place - 1].name)}: {optional}"
    return MissingValue(name, None, "must be given at all levels or at none")
