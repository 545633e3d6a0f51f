"""The methods of the audit, in the order of their findings."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final, TypeAlias

from xlbridge.audit import against, cells, manifest, map, model
from xlbridge.audit.finding import Checked
from xlbridge.audit.subject import Subject

Method: TypeAlias = Callable[[Subject], Checked]

METHODS: Final[tuple[Method, ...]] = (
    cells.check,
    model.check,
    map.check,
    manifest.check,
    against.check,
)
