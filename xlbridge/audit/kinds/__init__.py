"""The closed catalogue of what the audit can find: one file a method, one entry a kind."""

from __future__ import annotations

import tomllib
from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from enum import StrEnum
from importlib.resources import files
from types import MappingProxyType
from typing import Final


class Severity(StrEnum):
    """How much a finding weighs, the worst first."""

    ERROR = "error"  # a result is wrong, or cannot be proved
    WARNING = "warning"  # it could mislead a reader or a later edit
    NOTE = "note"  # to be known


@dataclass(frozen=True, slots=True)
class Kind:
    """One kind of finding: what it means, and what to do about it."""

    key: str
    method: str
    """The method that finds it: the name of its file."""
    severity: Severity
    title: str
    meaning: str
    remedy: str


def _read() -> Iterator[Kind]:
    for file in sorted(files(__name__).iterdir(), key=lambda file: file.name):
        if file.name.endswith(".toml"):
            method = file.name.removesuffix(".toml")
            for key, entry in tomllib.loads(file.read_text(encoding="utf-8")).items():
                yield Kind(key, method, Severity(entry.pop("severity")), **entry)


def _catalogue() -> Mapping[str, Kind]:
    kinds: dict[str, Kind] = {}
    for kind in _read():
        if kind.key in kinds:
            raise ValueError(f"kind {kind.key} is declared twice: {kinds[kind.key].method}, {kind.method}")
        kinds[kind.key] = kind
    return MappingProxyType(kinds)


KINDS: Final = _catalogue()
