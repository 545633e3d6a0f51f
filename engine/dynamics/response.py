"""Response of a shear building in one mode (12.9.1.2): forces, shears, displacements and story drifts.

The modal coefficient C_sm carries the spectrum and R/I_e. Displacements and drifts come out elastic, as
under the design forces: combine them over the modes first, then amplify them by C_d/I_e (12.8.6's
deflection). Every response keeps its sign; a combined drift comes from the drifts of the modes, never from
combined displacements.
"""

from __future__ import annotations

from numpy.typing import ArrayLike

from engine import levels
from engine.dynamics.eigen import solved
from engine.require import Result, above, at_least, finite, formula


@formula
def modal_coefficient(S_a: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Seismic response coefficient of a mode.

    C_sm = S_a/(R/I_e)

    Parameters
        S_a: design spectral acceleration at the period of the mode [g], above 0; any shape
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        C_sm [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(modal_coefficient(S_a=0.8, R=8.0, I_e=1.25))
        0.125

    Reference
        rule modal_response: 7-16 12.9.1.2; 7-22 12.9.1.2
    """
    return above(0, "S_a", S_a) / (at_least(1, "R", R) / at_least(1, "I_e", I_e))


@formula
def modal_force(
    mode: ArrayLike,
    w_x: ArrayLike,
    h_x: ArrayLike,
    C_sm: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
) -> Result:
    """Force at a level in a mode.

    F_xm = C_sm Gamma_m phi_xm w_x

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        w_x: weight of the level [kip or kN], at least 0; broadcast with mode
        h_x: height of the level above the base [ft or m]; broadcast with mode
        C_sm: seismic response coefficient of the mode [-], above 0; broadcast with mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        F_xm [kip or kN], signed, the broadcast shape; the forces of a mode add up to its base shear
    Raises
        NotApplicable: w_x and h_x are not one of the levels, or the mode's number is above that of the modes
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modal_force(mode=1, w_x=100, h_x=60, C_sm=0.1, **model))
        12.5

    Reference
        rule modal_response: 7-16 12.9.1.2; 7-22 12.9.1.2
    """
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    levels.refuse_stranger(w_x, levels.position(h_x, h, base=False), w, h)
    found = solved(w, stiffnesses, h)
    part = found.of(found.participation, mode) * found.at(found.shape, mode, h_x)
    return above(0, "C_sm", C_sm) * part * finite("w_x", w_x)


@formula
def modal_shear(
    mode: ArrayLike,
    h_x: ArrayLike,
    C_sm: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
) -> Result:
    """Story shear just below a level in a mode; at 0, the base shear of the mode.

    V_xm = sum(F_im) over the levels at and above h_x

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        h_x: height of a level, or 0 for the base [ft or m]; broadcast with mode
        C_sm: seismic response coefficient of the mode [-], above 0; broadcast with mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        V_xm [kip or kN], signed, the broadcast shape
    Raises
        NotApplicable: h_x is neither a level nor the base, or the mode's number is above that of the modes
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modal_shear(mode=1, h_x=0, C_sm=0.1, **model))
        43.98

    Reference
        rule modal_response: 7-16 12.9.1.2; 7-22 12.9.1.2
    """
    found = solved(weights, stiffnesses, heights)
    return above(0, "C_sm", C_sm) * found.at(found.shear, mode, h_x, base=True)


@formula
def modal_displacement(
    mode: ArrayLike,
    h_x: ArrayLike,
    C_sm: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
) -> Result:
    """Elastic displacement of a level in a mode.

    delta_xem = C_sm Gamma_m phi_xm g (T_m/(2 pi))^2

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        h_x: height of a level above the base [ft or m]; broadcast with mode
        C_sm: seismic response coefficient of the mode [-], above 0; broadcast with mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        delta_xem [in or mm], signed, the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or the mode's number is above that of the modes
    Notes
        Gravity cancels out: g (T_m/(2 pi))^2 is a weight over a stiffness.
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modal_displacement(mode=1, h_x=60, C_sm=0.1, **model))
        4.90

    Reference
        rule modal_response: 7-16 12.9.1.2; 7-22 12.9.1.2
    """
    found = solved(weights, stiffnesses, heights)
    part = found.of(found.participation, mode) * found.at(found.shape, mode, h_x)
    return above(0, "C_sm", C_sm) * part * found.of(found.extent, mode)


@formula
def modal_drift(
    mode: ArrayLike,
    h_x: ArrayLike,
    C_sm: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
) -> Result:
    """Elastic drift of the story below a level in a mode.

    Delta_xem = V_xm/k_x

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        h_x: height of a level above the base [ft or m]; broadcast with mode
        C_sm: seismic response coefficient of the mode [-], above 0; broadcast with mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        Delta_xem [in or mm], signed, the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or the mode's number is above that of the modes
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modal_drift(mode=1, h_x=12, C_sm=0.1, **model))
        1.394

    Reference
        rule modal_response: 7-16 12.9.1.2; 7-22 12.9.1.2
    """
    found = solved(weights, stiffnesses, heights)
    drift = found.shear * found.flexibility[..., None]
    return above(0, "C_sm", C_sm) * found.at(drift, mode, h_x)
