"""What the package can do, clause by clause, and the categories of worksheet functions that do it."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Final

from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import SheetFunction


@dataclass(frozen=True, slots=True)
class Capability:
    """One capability with its clause in ASCE/SEI 7; every category belongs to one of them."""

    text: str
    clause: str
    categories: tuple[str, ...]

    @property
    def functions(self) -> tuple[SheetFunction, ...]:
        """Its worksheet functions, in the order of the catalogue."""
        return tuple(entry for entry in CATALOGUE.values() if entry.category in self.categories)


CAPABILITIES: Final = (
    Capability("effective seismic weight", "12.7.2", ("Seismic weight",)),
    Capability("ground motion and importance", "11.4, 11.5, 21.4", ("Ground motion",)),
    Capability("Seismic Design Category", "11.6", ("Seismic design category",)),
    Capability("systems, heights, combinations", "12.2", ("Systems",)),
    Capability("period", "12.8.2", ("Period",)),
    Capability("response coefficient and base shear", "12.8.1", ("Base shear",)),
    Capability("vertical distribution and overturning", "12.8.3 to 12.8.5", ("Vertical distribution",)),
    Capability("torsion", "12.8.4", ("Torsion",)),
    Capability("irregularities", "12.3.2, 12.3.3", ("Irregularity",)),
    Capability("redundancy", "12.3.4", ("Redundancy",)),
    Capability("load effects and combinations", "12.4", ("Load effects",)),
    Capability("drift", "12.8.6, 12.12.1", ("Drift",)),
    Capability("P-delta", "12.8.7", ("Stability",)),
    Capability("diaphragms and walls", "12.10, 12.11", ("Diaphragm", "Alternative diaphragm procedure")),
    Capability("separation", "12.12.3", ("Separation",)),
    Capability("two-stage procedure", "12.2.3.2", ("Two-stage procedure",)),
    Capability("displacements from story stiffness", "mechanics", ("Story stiffness",)),
    Capability("modal response", "12.9.1", ("Modal response",)),
)
