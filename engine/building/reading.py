"""A building from and to plain mappings, as BUILDING.toml holds them."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import fields
from difflib import get_close_matches
from typing import Any, TypeVar, cast

from engine.building.records import (
    ROW_TABLES,
    Building,
    Direction,
    Level,
    Site,
    level_label,
    may_be_left_out,
    row_label,
)
from engine.errors import MissingValue, NotApplicable, WrongType

Record = TypeVar("Record")


def from_mapping(data: Mapping[str, Any]) -> Building:
    """Return the building that a mapping describes; an error names the field by its path.

    >>> from_mapping({"title": "A", "edition": "7-22", "units": "us", "level": [], "site": {"S_ds": 1.0}})
    Traceback (most recent call last):
    engine.errors.NotApplicable: site.S_ds = 1: unknown key, did you mean S_DS?
    """
    parts = dict(data)
    if "site" in parts:
        parts["site"] = _record(Site, "site.", parts["site"])
    if "direction" in parts:
        directions = _table("direction", parts["direction"])
        parts["direction"] = {
            name: _record(Direction, f"direction.{name}.", entry) for name, entry in directions.items()
        }
    if "level" in parts:
        parts["level"] = tuple(_rows(Level, "level", parts["level"]))
    for name, kind in ROW_TABLES.items():
        if name in parts:
            parts[name] = tuple(_rows(kind, name, parts[name]))
    if isinstance(parts.get("parts"), list):
        parts["parts"] = tuple(parts["parts"])
    for free in ("job", "sources"):
        parts[free] = dict(_table(free, parts.get(free, {})))
    return _record(Building, "", parts)


def to_mapping(building: Building) -> dict[str, Any]:
    """Return the plain mapping of a building; what has its default value is left out."""
    data = _plain(building)
    data["site"] = _plain(building.site)
    data["direction"] = {name: _plain(entry) for name, entry in building.direction.items()}
    data["level"] = [_plain(level) for level in building.level]
    for rows in ROW_TABLES:
        data[rows] = [_plain(row) for row in getattr(building, rows)]
    return {key: data[key] for key in data if data[key] not in ({}, [])}


def _rows(kind: type[Record], name: str, entries: object) -> list[Record]:
    if not isinstance(entries, list | tuple):
        raise WrongType(name, entries, "must be an array of tables")
    return [_record(kind, f"{_label(name, *row)}: ", row[1]) for row in enumerate(entries, start=1)]


def _label(name: str, place: int, entry: object) -> str:
    if not isinstance(entry, Mapping):
        return f"{name} {place}"
    if name == "level":
        return level_label(place, entry.get("name", ""))
    return row_label(name, place, entry)


def _record(kind: type[Record], prefix: str, data: object) -> Record:
    table = _table(prefix.rstrip(".: "), data)
    known = {entry.name: may_be_left_out(entry) for entry in fields(cast(Any, kind))}
    for key in table:
        if key not in known:
            raise NotApplicable(f"{prefix}{key}", table[key], _hint(key, tuple(known)))
    for key, optional in known.items():
        if key not in table and not optional:
            raise MissingValue(f"{prefix}{key}", None, "must be given")
    return kind(**table)


def _table(name: str, data: object) -> Mapping[str, Any]:
    if not isinstance(data, Mapping):
        raise WrongType(name, data, "must be a table")
    return data


def _hint(key: str, known: tuple[str, ...]) -> str:
    folded = {word.lower(): word for word in known}
    close = get_close_matches(key.lower(), folded, n=1)
    if close:
        return f"unknown key, did you mean {folded[close[0]]}?"
    return "unknown key; `storyledger entries` lists the known ones"


def _plain(record: Any) -> dict[str, Any]:
    values = {entry.name: getattr(record, entry.name) for entry in fields(record)}
    defaults = {entry.name: entry.default for entry in fields(record)}
    return {key: value for key, value in values.items() if value != defaults[key]}
