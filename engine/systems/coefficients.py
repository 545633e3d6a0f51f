"""R, Omega_0 and C_d of a system (Table 12.2-1), and an entry compared with the table.

Rows that no source settles are listed, but give no number: the engineer enters it, and the comparison says
what is remembered.
"""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import EDITIONS
from engine.errors import NotApplicable
from engine.require import Result, Words, agree, at_least, choice, formula, reasons
from engine.systems.rows import MARKS, TITLE, Row, added_in, row, rows, sureness

#: edition -> the names of its systems, group by group: a choice list
SYSTEMS: Final[Mapping[str, tuple[str, ...]]] = MappingProxyType({e: tuple(rows(e)) for e in EDITIONS})
#: the systems whose coefficients were seen or are remembered
KNOWN: Final = tuple(
    name for name, row in rows(EDITIONS[-1]).items() if row["confidence_coefficients"] != "U"
)

OVERSTRENGTH_RULES: Final = ("as tabulated", "flexible diaphragms")
REDUCIBLE: Final = 2.5
REDUCTION: Final = 0.5


def response_modification(system: str, edition: str) -> np.float64:
    """Response modification coefficient of a system.

    R = the row of Table 12.2-1

    Parameters
        system: one of SYSTEMS of the edition, or its code in 7-16 ("B.4")
        edition: "7-16" or "7-22"
    Returns
        R [-]
    Raises
        NotApplicable: another system, or one whose coefficients are uncertain; unknown edition
    Notes
        :func:`confidence` says what each row rests on.
    Example
        >>> print(response_modification("C. Steel special moment frames", "7-22"))
        8.0

    Reference
        rule system: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    return _coefficient(system, edition, "R")


def overstrength(system: str, edition: str) -> np.float64:
    """Overstrength factor of a system as tabulated.

    Omega_0 = the row of Table 12.2-1

    Parameters
        system: as for the response modification coefficient
        edition: "7-16" or "7-22"
    Returns
        Omega_0 [-]
    Raises
        NotApplicable: another system, or one whose coefficients are uncertain; unknown edition
    Example
        >>> print(overstrength("C. Steel special moment frames", "7-22"))
        3.0

    Reference
        rule system: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    return _coefficient(system, edition, "Omega0")


def deflection_amplification(system: str, edition: str) -> np.float64:
    """Deflection amplification factor of a system.

    C_d = the row of Table 12.2-1

    Parameters
        system: as for the response modification coefficient
        edition: "7-16" or "7-22"
    Returns
        C_d [-]
    Raises
        NotApplicable: another system, or one whose coefficients are uncertain; unknown edition
    Example
        >>> print(deflection_amplification("C. Steel special moment frames", "7-22"))
        5.5

    Reference
        rule system: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    return _coefficient(system, edition, "Cd")


def confidence(system: str, edition: str) -> Words:
    """What the row of a system rests on, in words.

    for the coefficients and for the height limits: seen (and where), from memory, or uncertain

    Parameters
        system: as for the response modification coefficient
        edition: "7-16" or "7-22"
    Returns
        a text
    Raises
        NotApplicable: another system or edition
    Example
        >>> confidence("B.6", "7-16")
        'coefficients from memory; height limits from memory'

    Reference
        rule system: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    found = row(system, edition)
    words = {"H": "seen in a public source", "M": "from memory", "U": "uncertain"}
    parts = [
        f"coefficients {words[found['confidence_coefficients']]}",
        f"height limits {words[found['confidence_limits']]}",
    ]
    if found["seen_in"] != "from memory":
        parts.append(f"source: {found['seen_in']}")
    if added_in(found) != edition and added_in(found) in EDITIONS:
        parts.append(f"row of {added_in(found)}, from memory unchanged in {edition}")
    return "; ".join([*parts, *([found["note"]] if found["note"] else [])])


@formula
def coefficients_status(system: str, R: ArrayLike, Omega_0: ArrayLike, C_d: ArrayLike, edition: str) -> Words:
    """Whether coefficients that were entered are those of the table, in words.

    as the table, or what the table has instead; with a mark where the row is from memory or uncertain

    Parameters
        system: as for the response modification coefficient
        R: response modification coefficient entered [-], at least 1; any shape
        Omega_0: overstrength factor entered [-], at least 1, before any reduction
        C_d: deflection amplification factor entered [-], at least 1
        edition: "7-16" or "7-22"
    Returns
        a text, or texts of the broadcast shape
    Raises
        NotApplicable: another system or edition. ImpossibleValue: a coefficient below 1
    Example
        >>> frame = "A. Special reinforced concrete shear walls"
        >>> coefficients_status(frame, R=6.0, Omega_0=2.5, C_d=5.0, edition="7-16")
        'differs: table R = 5'

    Reference
        rule system: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    found = row(system, edition)
    mark = MARKS[sureness(found, edition, "confidence_coefficients")]
    entered = {"R": ("R", R), "Omega_0": ("Omega0", Omega_0), "C_d": ("Cd", C_d)}
    texts = [f"table {symbol} = {found[column]}{mark}" for symbol, (column, _) in entered.items()]
    differs = [
        ~agree(at_least(1, symbol, number), float(found[column]))
        for symbol, (column, number) in entered.items()
    ]
    return reasons(texts, differs, f"as the table{mark}", lead="differs: ")


@formula
def reduced_overstrength(Omega_0: ArrayLike, reduction: str) -> Result:
    """Overstrength factor, reduced where the diaphragms are flexible and the engineer takes the permission.

    Omega_0 - 0.5 for flexible diaphragms where the tabulated Omega_0 is at least 2.5; Omega_0 otherwise

    Parameters
        Omega_0: overstrength factor as tabulated [-], at least 1; any shape
        reduction: "as tabulated", or "flexible diaphragms" where they are so and the reduction is taken
    Returns
        Omega_0 [-], the shape of the tabulated one
    Raises
        ImpossibleValue: Omega_0 below 1. NotApplicable: another reduction
    Notes
        The reduction is from memory.
    Example
        >>> print(reduced_overstrength(Omega_0=2.5, reduction="flexible diaphragms"))
        2.0

    Reference
        rule Omega_0_reduced: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
    """
    Omega_0 = at_least(1, "Omega_0", Omega_0)
    taken = choice("reduction", reduction, OVERSTRENGTH_RULES) != OVERSTRENGTH_RULES[0]
    return np.where(taken & (Omega_0 >= REDUCIBLE), Omega_0 - REDUCTION, Omega_0)


def _coefficient(system: str, edition: str, column: str) -> np.float64:
    found = row(system, edition)
    _refuse_uncertain(system, found, column)
    return np.float64(found[column])


def _refuse_uncertain(system: str, found: Row, column: str) -> None:
    if found["confidence_coefficients"] == "U":
        allowed = f"{column} = {found[column]} is uncertain here: enter the value that the standard prints"
        raise NotApplicable("system", system, allowed, TITLE)
