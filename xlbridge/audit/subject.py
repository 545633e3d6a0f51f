"""The workbook under audit."""

from __future__ import annotations

import hashlib
import re
from collections.abc import Callable
from dataclasses import dataclass
from functools import cached_property
from pathlib import Path
from typing import Any, Final, TypeAlias

from engine.building import from_mapping, solve
from engine.errors import EngineError
from xlbridge.audit.align import Alignment, align
from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.book import Book
from xlbridge.headless.compute import FUNCTIONS
from xlbridge.headless.evaluate import Evaluator, Results

NO_INPUTS: Final = (
    "the workbook is not laid out as one of ours, so its inputs cannot be told from its results"
)

#: says what is known of a workbook of ours, and nothing of any other
Knows: TypeAlias = Callable[[Evaluator], OwnTemplate | None]


#: how the engine names a row of a table
_ROW: Final = re.compile(r'^(\w+) (\d+) \(".*"\): ')


class Unsolved(ValueError):
    """There is no package from the inputs alone; the message says why, ``path`` which entry is at fault."""

    def __init__(self, why: str, path: str = "") -> None:
        super().__init__(why)
        self.path = path


@dataclass(frozen=True)
class Subject:
    """A workbook file, read once, never changed."""

    path: Path
    evaluator: Evaluator
    own: OwnTemplate | None = None
    checked: Subject | None = None
    """The last issue of it that was checked."""

    @classmethod
    def open(cls, path: Path, knows: Knows, checked: Path | None = None) -> Subject:
        """Open a workbook file; ``knows`` tells whether it is one of ours."""
        evaluator = Evaluator(Book.open(path), FUNCTIONS)
        return cls(path, evaluator, knows(evaluator), cls.open(checked, knows) if checked else None)

    @property
    def book(self) -> Book:
        """Its content."""
        return self.evaluator.book

    @cached_property
    def results(self) -> Results:
        """Every formula cell evaluated."""
        return self.evaluator.evaluate_all()

    @cached_property
    def alignment(self) -> Alignment:
        """Which of its cells is which of its twin's; empty for a workbook of another make."""
        return align(self.book, self.own) if self.own else Alignment(())

    @cached_property
    def model(self) -> dict[str, Any]:
        """The package solved from the inputs alone; :class:`Unsolved` says why there is none."""
        if self.own is None or self.own.unread:
            raise Unsolved(self.own.unread if self.own else NO_INPUTS)
        try:
            return solve(from_mapping(self.own.inputs)).to_json()
        except EngineError as error:
            raise Unsolved(str(error), _path(error.argument)) from error

    @cached_property
    def sha256(self) -> str:
        """The hash of the file, in hexadecimal digits."""
        return hashlib.sha256(self.book.data).hexdigest()


def _path(argument: str) -> str:
    """The path of an entry that the engine refuses: ``level[3].weight`` of ``level 3 ("Roof"): weight``."""
    return _ROW.sub(r"\1[\2].", argument)
