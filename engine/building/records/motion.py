"""Where the ground motion of a building comes from: exactly one of the ways that its edition has."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Final

from engine.building.records.direction import METHODS
from engine.building.records.site import Site
from engine.editions import EDITIONS
from engine.errors import MissingValue, NotApplicable

ROWS: Final = ("rows of multi_period", "v_s")
#: entries that S_DS and S_D1 come from, and the editions in which they may
WAYS: Final[Mapping[tuple[str, str], tuple[str, ...]]] = MappingProxyType(
    {
        ("S_DS", "S_D1"): EDITIONS,
        ("S_S", "site_class"): ("7-16",),
        ("S_MS", "S_M1"): ("7-22",),
        ROWS: EDITIONS,
    }
)
FLOORS: Final = ("S_DS_mapped", "S_D1_mapped")


def check_motion(site: Site, edition: str, has_rows: bool) -> None:
    """Refuse a ground motion that is given in part, twice, or in the way of another edition."""
    given = {key: getattr(site, key, None) for keys in WAYS for key in keys}
    given[ROWS[0]] = has_rows or None
    begun = [keys for keys in WAYS if any(given[key] is not None for key in keys)]
    if not begun:
        raise MissingValue("site.S_DS", None, f"must be given, or {_others(edition)}")
    for keys in begun:
        missing = [key for key in keys if given[key] is None]
        if missing:
            raise MissingValue(f"site.{missing[0]}", None, f"must be given beside {keys[keys[0] in missing]}")
    _refuse_idle_exceptions(site)
    keys = begun[-1]
    key = keys[keys == ROWS]
    if len(begun) > 1:
        other = f"must be left out beside {begun[0][0]}: one way only"
        raise NotApplicable(f"site.{key}", given[key], other)
    if edition not in WAYS[keys]:
        raise NotApplicable(
            f"site.{key}", given[key], f"is an entry of {WAYS[keys][0]}; give {_others(edition)}"
        )
    if keys == ROWS:
        _check_floors(site, edition)


def check_method(name: str, method: str, edition: str, has_rows: bool) -> None:
    """Refuse Method 1 without a multi-period spectrum, and in the edition that has no such method."""
    if method == METHODS[1] and (edition == EDITIONS[0] or not has_rows):
        raise NotApplicable(f"direction.{name}.C_s_method", method, "needs 7-22 and rows of multi_period")


def _check_floors(site: Site, edition: str) -> None:
    """Require the mapped values in 7-16, where 80 % of them are a floor; refuse them in 7-22."""
    for key in FLOORS:
        if edition == EDITIONS[0] and getattr(site, key) is None:
            raise MissingValue(f"site.{key}", None, "must be given: 80 % of it is a floor")
        if edition != EDITIONS[0] and getattr(site, key) is not None:
            raise NotApplicable(f"site.{key}", getattr(site, key), "is an entry of 7-16")


def _refuse_idle_exceptions(site: Site) -> None:
    """Refuse an exception of 11.4.8 where no mapped value meets its trigger."""
    for key in ("isolated", "short_exception", "long_exception"):
        value = getattr(site, key)
        if site.S_S is None and value not in (False, "none"):
            raise NotApplicable(f"site.{key}", value, "must be left out where S_S is not given")


def _others(edition: str) -> str:
    """The other ways of an edition, in words."""
    return " or ".join(" and ".join(keys) for keys in [*WAYS][1:] if edition in WAYS[keys])
