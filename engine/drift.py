"""Deflection, design story drift and allowable drift (12.8.6, 12.12.1).

Displacements and heights in consistent units: a drift comes out in the unit of the displacements, an
allowable drift in the unit of the story height. The diaphragm term of 7-22's delta_DE is left out, as the
design story drift permits.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.occupancy import RISK_CATEGORIES
from engine.require import Result, Words, above, at_least, choice, finite, formula, within, worded, yes
from engine.tables import table
from engine.torsion.ratios import is_torsional

DRIFT_STRUCTURES: Final = table("allowable_drift").keys


@formula
def amplified_deflection(delta_xe: ArrayLike, C_d: ArrayLike, I_e: ArrayLike) -> Result:
    """Deflection of a level at the design earthquake.

    delta_x = C_d delta_xe/I_e

    Parameters
        delta_xe: elastic displacement under the strength-level forces [in or mm]; any shape
        C_d: deflection amplification factor [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        delta_x [in or mm, the unit of delta_xe], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        7-22 adds the diaphragm deflection delta_di; it may be left out of the design story drift.
    Example
        >>> print(amplified_deflection(delta_xe=0.74, C_d=5.5, I_e=1.25))
        3.256

    Reference
        rule delta_x: 7-16 12.8.6, Eq. 12.8-15; 7-22 12.8.6, Eq. 12.8-16
    """
    return at_least(1, "C_d", C_d) * finite("delta_xe", delta_xe) / at_least(1, "I_e", I_e)


@formula
def design_story_drift(d_upper: ArrayLike, d_lower: ArrayLike, C_d: ArrayLike, I_e: ArrayLike) -> Result:
    """Design story drift from the elastic displacements above and below the story.

    Delta = C_d |delta_upper - delta_lower|/I_e

    Parameters
        d_upper: elastic displacement at the top of the story [in or mm], signed; any shape
        d_lower: elastic displacement at the foot of the story [in or mm], signed
        C_d: deflection amplification factor [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        Delta [in or mm], the magnitude, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        The displacements keep their signs, so a story that sways back counts with the full difference.
    Example
        >>> print(design_story_drift(d_upper=0.74, d_lower=0.31, C_d=5.5, I_e=1.25))
        1.892

    Reference
        rule Delta: 7-16 12.8.6; 7-22 12.8.6
    """
    d_upper, d_lower = finite("d_upper", d_upper), finite("d_lower", d_lower)
    return np.abs(amplified_deflection(d_upper - d_lower, C_d, I_e))


@formula
def allowable_drift(h_sx: ArrayLike, structure: str, risk_category: str, rho: ArrayLike = 1.0) -> Result:
    """Allowable story drift.

    Delta_a = (part by Table 12.12-1) h_sx/rho

    Parameters
        h_sx: height of the story below level x [ft or m], above 0; any shape
        structure: one of DRIFT_STRUCTURES, the row of Table 12.12-1
        risk_category: "I", "II", "III" or "IV"
        rho: redundancy factor [-], 1 to 1.3; 1 unless the system is moment frames alone in Seismic
            Design Category D, E or F
    Returns
        Delta_a [the unit of h_sx], the broadcast shape
    Raises
        NotApplicable: another structure or category. ImpossibleValue: a value outside its range
    Notes
        The table is from memory except its last row. The row "low-rise with detailed finishes" is for
        structures of four stories or fewer, without masonry shear walls, whose finishes are detailed for
        the drift.
    Example
        >>> print(allowable_drift(h_sx=12.0, structure="all other", risk_category="III", rho=1.3))
        0.138

    Reference
        rule Delta_a: 7-16 12.12.1, Table 12.12-1; 7-22 12.12.1, Table 12.12-1
        rule rho_drift: 7-16 12.12.1.1; 7-22 12.12.1.1
    """
    category = choice("risk_category", risk_category, RISK_CATEGORIES)
    part = table("allowable_drift").entry("structure", structure, category)
    return part * above(0, "h_sx", h_sx) / within(1, 1.3, "rho", rho)


@formula
def edges_due(TIR: ArrayLike, SDC: str) -> Words:
    """Whether the design story drift is taken along the edges: "yes" or "no".

    TIR > 1.2 in Seismic Design Category C to F

    Parameters
        TIR: largest torsional irregularity ratio of the structure [-], at least 1; any shape
        SDC: Seismic Design Category, "A" to "F"
    Returns
        "yes" or "no", or texts of the shape of TIR
    Raises
        ImpossibleValue: TIR below 1. NotApplicable: another category
    Example
        >>> edges_due(TIR=1.3, SDC="D")
        'yes'

    Reference
        rule edge_drift: 7-16 12.8.6; 7-22 12.8.6
    """
    return worded(("no", "yes"), is_torsional(TIR, SDC))


@formula
def drift_to_check(Delta_cm: ArrayLike, Delta_1: ArrayLike, Delta_2: ArrayLike, edges: str) -> Result:
    """Design story drift that is compared with the allowable one.

    max(|Delta_1|, |Delta_2|) along the edges where they are due; else |Delta_cm| at the centres of mass

    Parameters
        Delta_cm: design story drift between the centres of mass [in or mm], signed; any shape
        Delta_1: design story drift along one edge, points above each other [in or mm], signed
        Delta_2: design story drift along the opposite edge [in or mm], signed
        edges: "yes" where a torsional irregularity exists in Seismic Design Category C to F, or "no"
    Returns
        the drift [in or mm], a magnitude, the broadcast shape
    Raises
        ImpossibleValue: a number that is not finite. NotApplicable: another word
    Example
        >>> given = {"Delta_cm": 1.0, "Delta_1": 1.4, "Delta_2": 0.6}
        >>> print(drift_to_check(**given, edges="yes"), drift_to_check(**given, edges="no"))
        1.4 1.0

    Reference
        rule edge_drift: 7-16 12.8.6; 7-22 12.8.6
    """
    center = np.abs(finite("Delta_cm", Delta_cm))
    one, other = np.abs(finite("Delta_1", Delta_1)), np.abs(finite("Delta_2", Delta_2))
    return np.where(yes("edges", edges), np.maximum(one, other), center)
