"""The methods of the audit, in the order of their findings."""

from __future__ import annotations

import inspect
import sys
from collections.abc import Callable
from typing import Final, TypeAlias

from xlbridge.audit import against, cells, columns, extent, hygiene, manifest, map, model, physical
from xlbridge.audit.finding import Checked
from xlbridge.audit.subject import Subject

Method: TypeAlias = Callable[[Subject], Checked]

METHODS: Final[tuple[Method, ...]] = (
    cells.check,
    extent.check,
    map.check,
    manifest.check,
    model.check,
    hygiene.check,
    columns.check,
    physical.check,
    against.check,
)


def summary(name: str) -> str:
    """Return what a method does, as its own module says it."""
    module = next(sys.modules[m.__module__] for m in METHODS if m.__module__.endswith(f".{name}"))
    return (inspect.getdoc(module) or name).splitlines()[0]
