"""What the methods of the audit see and could not check, and the findings made of it."""

from __future__ import annotations

from dataclasses import dataclass, field

from xlbridge.audit.kinds import KINDS, Kind
from xlbridge.headless.references import Cell, quote_sheet
from xlbridge.values import Scalar


@dataclass(frozen=True, slots=True)
class Place:
    """Where something is: a cell, a range, a sheet (no address), or the workbook (neither)."""

    sheet: str = ""
    address: str = ""

    @classmethod
    def of(cls, cell: Cell) -> Place:
        """Return the place of one cell."""
        return cls(cell.sheet, cell.address)

    def __str__(self) -> str:
        if not self.sheet:
            return "workbook"
        return f"{quote_sheet(self.sheet)}!{self.address}" if self.address else quote_sheet(self.sheet)


@dataclass(frozen=True, slots=True)
class Observation:
    """What one method saw at one place.

    Observations of one kind with the same ``cause`` are one finding; without one each stands alone.
    ``expected`` and ``found`` are texts (formulas, labels, formats), ``stored`` and ``recomputed`` values.
    """

    kind: str
    place: Place
    words: str
    expected: str = ""
    found: str = ""
    stored: Scalar = None
    recomputed: Scalar = None
    cause: str = ""
    clause: str = ""

    def __post_init__(self) -> None:
        if self.kind not in KINDS:
            raise ValueError(f"{self.kind} is no kind of finding")


@dataclass(frozen=True, slots=True)
class NotChecked:
    """Something that could not be checked, and why: a result of its own."""

    what: str
    because: str
    place: Place = Place()


@dataclass(frozen=True, slots=True)
class Checked:
    """The outcome of one method: how many things it looked at, what it saw, what it could not check."""

    method: str
    looked_at: int
    observations: tuple[Observation, ...] = ()
    not_checked: tuple[NotChecked, ...] = ()


@dataclass(frozen=True, slots=True)
class Effect:
    """What a finding does to one headline result: the value as it is, and as it would be without it."""

    headline: str
    unit: str
    value: float
    without: float

    @property
    def change(self) -> float:
        """The difference that the finding makes, in the unit of the result."""
        return self.value - self.without

    @property
    def per_cent(self) -> float | None:
        """The same in per cent of the value without it; none where that is zero."""
        return 100 * self.change / self.without if self.without else None


@dataclass(frozen=True, slots=True)
class Finding:
    """One cause with all its places."""

    number: int
    kind: Kind
    observations: tuple[Observation, ...]
    effects: tuple[Effect, ...] = field(default=())
    accepted: str = ""
    """Who accepted it, when and why; it is listed all the same."""

    @property
    def places(self) -> tuple[Place, ...]:
        """Every place of it, in the order of the workbook."""
        return tuple(dict.fromkeys(o.place for o in self.observations))

    @property
    def words(self) -> str:
        """What was seen, in one sentence."""
        return self.observations[0].words
