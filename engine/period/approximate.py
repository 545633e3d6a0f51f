"""Approximate periods from the height and from the number of stories (12.8.2.1)."""

from __future__ import annotations

from types import MappingProxyType
from typing import Final

from numpy.typing import ArrayLike

from engine.errors import NotApplicable
from engine.require import Result, Words, above, choice, formula, reasons, short_of, whole, yes
from engine.tables import table
from engine.units import SI, SYSTEMS, US, symbol

PERIOD_SYSTEMS: Final = table("period_coefficients").keys
#: rows of the table whose frames resist all of the force, as the formula for stories asks
MOMENT_FRAMES: Final = ("steel moment frame", "concrete moment frame")
#: the three formulas of 12.8.2.1, in words
PERIOD_FORMULAS: Final = ("C_t h_n^x", "0.1 N", "shear walls")
MAX_STORIES: Final = 12
LEAST_STORY: Final = MappingProxyType({US: 10.0, SI: 3.0})


@formula
def approximate_period(h_n: ArrayLike, system: str, units: str) -> Result:
    """Approximate fundamental period from the height.

    T_a = C_t h_n^x

    Parameters
        h_n: structural height above the base [ft or m], above 0; any shape
        system: one of PERIOD_SYSTEMS, the row of Table 12.8-2
        units: "us" (h_n in ft) or "si" (h_n in m)
    Returns
        T_a [s], the shape of h_n
    Raises
        ImpossibleValue: h_n at or below 0. NotApplicable: unknown system or units
    Notes
        The coefficients are printed in both unit systems; the rounded pairs agree to about 0.3 %.
    Example
        >>> print(approximate_period(h_n=60.0, system="all other", units="us"))
        0.43

    Reference
        rule T_a: 7-16 12.8.2.1, Eq. 12.8-7; 7-22 12.8.2.1, Eq. 12.8-8
    """
    C_t = table("period_coefficients").entry("system", system, f"C_t_{choice('units', units, SYSTEMS)}")
    x = table("period_coefficients").entry("system", system, "x")
    return C_t * above(0, "h_n", h_n) ** x


@formula
def approximate_period_stories(N: ArrayLike) -> Result:
    """Approximate fundamental period from the number of stories.

    T_a = 0.1 N

    Parameters
        N: number of stories above the base [-], whole, 1 to 12; any shape
    Returns
        T_a [s], the shape of N
    Raises
        ImpossibleValue: N below 1 or not whole. NotApplicable: more than 12 stories
    Notes
        For moment frames of concrete or steel alone, with an average story height of at least 10 ft (3 m):
        the caller judges that.
    Example
        >>> print(approximate_period_stories(N=7))
        0.7

    Reference
        rule T_a_stories: 7-16 12.8.2.1, Eq. 12.8-8; 7-22 12.8.2.1, Eq. 12.8-9
    """
    N = whole("N", N)
    if (N > MAX_STORIES).any():
        raise NotApplicable("N", float(N.max()), f"must be at most {MAX_STORIES} stories", "12.8.2.1")
    return 0.1 * N


@formula
def stories_formula_status(N: ArrayLike, h_n: ArrayLike, frames: str, units: str) -> Words:
    """Whether the approximate period may be taken from the number of stories, in words.

    permitted for at most 12 stories of on average at least 10 ft (3 m), moment frames alone

    Parameters
        N: number of stories above the base [-], at least 1, whole; any shape
        h_n: structural height above the base [ft or m], above 0
        frames: "yes" where the force is resisted by moment frames of concrete or steel alone, else "no"
        units: "us" (h_n in ft) or "si" (h_n in m)
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        The average story height is h_n/N.
    Example
        >>> stories_formula_status(N=14, h_n=126.0, frames="yes", units="us")
        'not permitted: more than 12 stories; average story height below 10 ft'

    Reference
        rule T_a_stories: 7-16 12.8.2.1, Eq. 12.8-8; 7-22 12.8.2.1, Eq. 12.8-9
    """
    N = whole("N", N)
    least = LEAST_STORY[choice("units", units, SYSTEMS)]
    texts = (
        f"more than {MAX_STORIES} stories",
        f"average story height below {least:g} {symbol('length', units)}",
        "not moment frames of concrete or steel alone",
    )
    low = short_of(above(0, "h_n", h_n) / N, least)
    fails = (N > MAX_STORIES, low, not yes("frames", frames))
    return reasons(texts, fails, "permitted", lead="not permitted: ")
