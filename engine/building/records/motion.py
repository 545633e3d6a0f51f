"""Where the ground motion of a building comes from: exactly one of the ways that its edition has."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Any, Final

from engine.building.records.site import Site
from engine.editions import EDITIONS
from engine.errors import MissingValue, NotApplicable

#: entries that S_DS and S_D1 come from, and the editions in which they may
WAYS: Final[Mapping[tuple[str, ...], tuple[str, ...]]] = MappingProxyType(
    {("S_DS", "S_D1"): EDITIONS, ("S_S", "site_class"): ("7-16",), ("S_MS", "S_M1"): ("7-22",)}
)


def check_motion(site: Site, edition: str) -> None:
    """Refuse a ground motion that is given in part, twice, or in the way of another edition."""
    begun = [keys for keys in WAYS if any(getattr(site, key) is not None for key in keys)]
    if not begun:
        raise MissingValue("site.S_DS", None, f"must be given, or {_others(edition)}")
    for keys in begun:
        missing = [key for key in keys if getattr(site, key) is None]
        if missing:
            raise MissingValue(f"site.{missing[0]}", None, f"must be given beside {keys[keys[0] in missing]}")
    _refuse_idle_exceptions(site)
    keys = begun[-1]
    value: Any = getattr(site, keys[0])
    if len(begun) > 1:
        raise NotApplicable(f"site.{keys[0]}", value, f"must be left out beside {begun[0][0]}: one way only")
    if edition not in WAYS[keys]:
        raise NotApplicable(
            f"site.{keys[0]}", value, f"is an entry of {WAYS[keys][0]}; give {_others(edition)}"
        )


def _refuse_idle_exceptions(site: Site) -> None:
    """Refuse an exception of 11.4.8 where no mapped value meets its trigger."""
    for key in ("isolated", "short_exception", "long_exception"):
        value = getattr(site, key)
        if site.S_S is None and value not in (False, "none"):
            raise NotApplicable(f"site.{key}", value, "must be left out where S_S is not given")


def _others(edition: str) -> str:
    """The other ways of an edition, in words."""
    return " or ".join(" and ".join(keys) for keys in [*WAYS][1:] if edition in WAYS[keys])
