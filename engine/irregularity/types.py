"""The names and type numbers of irregularities, those that the engineer judges, and their consequences."""

from __future__ import annotations

from typing import Final

from engine.editions import EDITIONS
from engine.errors import NotApplicable
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Words, choice, yes
from engine.tables import table

IRREGULARITIES: Final = table("irregularity_types").keys
#: the irregularities that are read off the plans, not off a ratio
JUDGED: Final = ("out-of-plane offset", "nonparallel system", "in-plane discontinuity")
NONE: Final = "no irregularity"
MARKS: Final = {"H": "", "M": " (from memory)", "U": " (uncertain)"}


def has_type(irregularity: str, edition: str) -> bool:
    """Tell whether an irregularity is a type of its own in an edition."""
    return _type(irregularity, edition) != "none"


def named(irregularity: str, edition: str) -> str:
    """Return an irregularity with its type number; refuse one that the edition does not have.

    >>> named("weak story", "7-16"), named("weak story", "7-22")
    ('Type 5a, weak story', 'Type 4a, weak story')
    """
    if not has_type(irregularity, edition):
        raise NotApplicable("irregularity", irregularity, f"no type of edition {edition}")
    return f"Type {_type(irregularity, edition)}, {irregularity}"


def judged_irregularity(irregularity: str, exists: str, edition: str) -> Words:
    """Verdict on an irregularity that the engineer reads off the plans.

    the type number where it exists

    Parameters
        irregularity: one of JUDGED
        exists: "yes" or "no"
        edition: "7-16" or "7-22"
    Returns
        the type in words, or "no irregularity"
    Raises
        NotApplicable: another irregularity, answer or edition
    Example
        >>> judged_irregularity(irregularity="in-plane discontinuity", exists="yes", edition="7-22")
        'Type 3, in-plane discontinuity'

    Reference
        rule judged_irregularity: 7-16 12.3.2; 7-22 12.3.2
    """
    name = named(choice("irregularity", irregularity, JUDGED), edition)
    return name if yes("exists", exists) else NONE


def consequence(irregularity: str, SDC: str, edition: str) -> Words:
    """What an irregularity entails in a Seismic Design Category, clause by clause.

    the rows of the table of consequences, joined

    Parameters
        irregularity: one of IRREGULARITIES; "extreme torsional" in 7-22 means a ratio above 1.4
        SDC: Seismic Design Category, "A" to "F"
        edition: "7-16" or "7-22"
    Returns
        the consequences in words, marked where they are from memory or uncertain
    Raises
        NotApplicable: another irregularity, category or edition
    Notes
        Collected from several clauses, most of them from memory; not every clause is looked through.
    Example
        >>> consequence(irregularity="extreme weak story", SDC="D", edition="7-16")
        '12.3.3.1: not permitted (from memory)'

    Reference
        rule consequence: 7-16 12.3.3; 7-22 12.3.3
    """
    choice("irregularity", irregularity, IRREGULARITIES)
    choice("SDC", SDC, DESIGN_CATEGORIES)
    choice("edition", edition, EDITIONS)
    found = [
        f"{row['clause']}: {row['consequence']}{MARKS[row['confidence']]}"
        for row in table("irregularity_consequences").rows
        if (row["irregularity"], row["edition"]) == (irregularity, edition) and SDC in row["categories"]
    ]
    return "; ".join(found) or f"none listed for Seismic Design Category {SDC}"


def _type(irregularity: str, edition: str) -> str:
    choice("edition", edition, EDITIONS)
    rows = {row["irregularity"]: row for row in table("irregularity_types").rows}
    return rows[irregularity][edition]
