"""The cap on S_DS for short regular buildings (12.8.1.3)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.occupancy import RISK_CATEGORIES
from engine.require import Result, Words, above, choice, exceeds, formula, reasons, whole, yes

MAX_STORIES: Final = 5
LONGEST_PERIOD: Final = 0.5
LEAST_CAP: Final = 1.0
LEAST_PART: Final = 0.7
ORDINARY: Final = RISK_CATEGORIES[:2]
FAILURES: Final = (
    "structural irregularity",
    f"more than {MAX_STORIES} stories",
    f"T above {LONGEST_PERIOD:g} s",
    "rho is not 1.0",
    "Site Class E or F",
    "Risk Category III or IV",
)


@formula
def capped_S_DS(
    S_DS: ArrayLike,
    N: ArrayLike,
    T: ArrayLike,
    regular: str,
    redundant: str,
    soft_site: str,
    risk_category: str,
) -> Result:
    """S_DS that C_s and E_v may use: capped for a short regular building, else as it is.

    S_DS = min(S_DS, max(1.0, 0.7 S_DS)) where all conditions hold

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        N: number of stories above the lower of base and grade plane, mezzanines counted [-], at least 1,
            whole
        T: period by 12.8.2 [s], above 0
        regular: "yes" where the structure has no irregularity of 12.3.2, else "no"
        redundant: "yes" where it meets the requirements for rho = 1.0, else "no"
        soft_site: "yes" for Site Class E or F (in 7-22 also DE, which is uncertain), else "no"
        risk_category: "I", "II", "III" or "IV"
    Returns
        S_DS [g], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        The Seismic Design Category, and everything else, takes the uncapped value. Whether 7-22 ties the
        cap to the two-period route is uncertain.
    Example
        >>> building = {"N": 3, "T": 0.3, "regular": "yes", "redundant": "yes", "soft_site": "no"}
        >>> print(capped_S_DS(S_DS=1.6, **building, risk_category="II"))
        1.12

    Reference
        rule S_DS_cap: 7-16 12.8.1.3; 7-22 12.8.1.3
    """
    S_DS = above(0, "S_DS", S_DS)
    fails = np.logical_or.reduce(
        np.broadcast_arrays(*_failures(N, T, regular, redundant, soft_site, risk_category))
    )
    return np.where(fails, S_DS, np.minimum(S_DS, np.maximum(LEAST_CAP, LEAST_PART * S_DS)))


@formula
def S_DS_cap_status(
    N: ArrayLike, T: ArrayLike, regular: str, redundant: str, soft_site: str, risk_category: str
) -> Words:
    """Whether S_DS may be capped, in words: every condition that fails.

    permitted, or each of the conditions that do not hold

    Parameters
        N, T, regular, redundant, soft_site, risk_category: as for the capped S_DS
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Example
        >>> answers = {"regular": "yes", "redundant": "yes", "soft_site": "no"}
        >>> S_DS_cap_status(N=6, T=0.6, **answers, risk_category="II")
        'not permitted: more than 5 stories; T above 0.5 s'

    Reference
        rule S_DS_cap: 7-16 12.8.1.3; 7-22 12.8.1.3
    """
    fails = _failures(N, T, regular, redundant, soft_site, risk_category)
    return reasons(FAILURES, fails, "permitted", lead="not permitted: ")


def _failures(
    N: ArrayLike, T: ArrayLike, regular: str, redundant: str, soft_site: str, risk_category: str
) -> tuple[ArrayLike, ...]:
    """Return for each of FAILURES whether it holds."""
    return (
        not yes("regular", regular),
        whole("N", N) > MAX_STORIES,
        exceeds(above(0, "T", T), LONGEST_PERIOD),
        not yes("redundant", redundant),
        yes("soft_site", soft_site),
        choice("risk_category", risk_category, RISK_CATEGORIES) not in ORDINARY,
    )
