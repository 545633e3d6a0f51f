"""Height limits of the systems by Seismic Design Category (Table 12.2-1), with the increase of 12.2.5.4."""

from __future__ import annotations

from math import inf
from types import MappingProxyType
from typing import Final

from numpy.typing import ArrayLike

from engine.errors import NotApplicable
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Words, above, choice, exceeds, formula, worded, yes
from engine.systems.rows import MARKS, Row, row, sureness
from engine.units import FOOT, SI, SYSTEMS

#: the limits of the systems that 12.2.5.4 lists [ft], where its conditions hold
INCREASED: Final = MappingProxyType({"D": 240.0, "E": 240.0, "F": 160.0})
WITHOUT: Final = "A"
NOT_DUE: Final = "Table 12.2-1 does not apply in Seismic Design Category A"


def height_limit(system: str, SDC: str, increase: str, edition: str, units: str) -> Words:
    """Limit on the structural height of a system, in words.

    the cell of Table 12.2-1, or with the increase 240 ft (D, E) and 160 ft (F)

    Parameters
        system: one of SYSTEMS of the edition, or its code in 7-16 ("B.4")
        SDC: Seismic Design Category, "A" to "F"
        increase: "yes" where 12.2.5.4 is used and its conditions hold: no extreme torsional irregularity,
            and the walls or frames in any one plane resist at most 60 % of the force in their direction
        edition: "7-16" or "7-22"
        units: "us" (ft) or "si" (m, from the printed feet)
    Returns
        "no limit (NL)", "not permitted (NP)" or a height; with a mark where it is from memory or uncertain
    Raises
        NotApplicable: another word, or an increase for a system that 12.2.5.4 does not list
    Example
        >>> height_limit("A. Special reinforced concrete shear walls", "D", "no", "7-16", "us")
        '160 ft'

    Reference
        rule height_limit: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
        rule height_increase: 7-16 12.2.5.4; 7-22 12.2.5.4
    """
    limit, mark = _limit(system, SDC, increase, edition)
    shown = f"{_shown(limit, units)}{mark}"
    return shown if SDC != WITHOUT else NOT_DUE


@formula
def height_status(h_n: ArrayLike, system: str, SDC: str, increase: str, edition: str, units: str) -> Words:
    """Whether the structural height keeps the limit of the system, in words.

    compares h_n with the height limit

    Parameters
        h_n: structural height above the base [ft or m], above 0; any shape
        system, SDC, increase, edition, units: as for the height limit
    Returns
        a text, or texts of the shape of h_n
    Raises
        ImpossibleValue: h_n at or below 0. NotApplicable: as for the height limit
    Notes
        The upper part of a two-stage analysis counts from its own base.
    Example
        >>> walls = "A. Special reinforced concrete shear walls"
        >>> height_status(h_n=170.0, system=walls, SDC="D", increase="no", edition="7-16", units="us")
        'above the limit: 160 ft'

    Reference
        rule height_limit: 7-16 12.2.1, Table 12.2-1; 7-22 12.2.1, Table 12.2-1
        rule height_increase: 7-16 12.2.5.4; 7-22 12.2.5.4
    """
    h_n = above(0, "h_n", h_n)
    limit, mark = _limit(system, SDC, increase, edition)
    shown = f"{_shown(limit, units)}{mark}"
    texts = (f"within the limit: {shown}", f"above the limit: {shown}")
    if SDC == WITHOUT:
        texts = (NOT_DUE, NOT_DUE)
    elif limit in (0.0, inf):
        texts = (shown, shown)
    return worded(texts, exceeds(h_n, limit * (FOOT if units == SI else 1.0)))


def _limit(system: str, SDC: str, increase: str, edition: str) -> tuple[float, str]:
    """Return the limit in ft (0 not permitted, infinite without limit), and the mark of a doubt."""
    found = row(system, edition)
    raised = yes("increase", increase)
    if raised and found["increase"] != "yes":
        allowed = "12.2.5.4 is not known to list this system: its height limit cannot be increased"
        raise NotApplicable("increase", increase, allowed)
    if choice("SDC", SDC, DESIGN_CATEGORIES) == WITHOUT:
        return inf, ""
    if raised and SDC in INCREASED:
        return INCREASED[SDC], MARKS["M"]
    return _printed(found, SDC), MARKS[sureness(found, edition, "confidence_limits")]


def _printed(found: Row, SDC: str) -> float:
    words = {"NL": inf, "NP": 0.0}
    cell = found[SDC]
    return words[cell] if cell in words else float(cell)


def _shown(limit: float, units: str) -> str:
    metric = choice("units", units, SYSTEMS) == SI
    if limit in (0.0, inf):
        return "no limit (NL)" if limit else "not permitted (NP)"
    return f"{round(limit * FOOT, 3):g} m" if metric else f"{limit:g} ft"
