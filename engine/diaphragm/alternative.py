"""The alternative procedure for diaphragms (12.10.3), step by step. From memory throughout.

What is uncertain, the coefficient in G_m1, is an argument.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.diaphragm.force import minimum_force
from engine.errors import ImpossibleValue
from engine.require import Array, Result, above, at_least, finite, formula
from engine.tables import table

MODE_SHAPES: Final = table("mode_shape_factor").keys
DIAPHRAGM_TYPES: Final = table("diaphragm_reduction").keys
#: height of the knee of C_px in parts of h_n, for three stories and more
KNEE: Final = 0.8


def mode_shape_factor(system: str) -> np.float64:
    """Mode shape factor of a seismic force-resisting system.

    z_s = the row of the table

    Parameters
        system: one of MODE_SHAPES
    Returns
        z_s [-]
    Raises
        NotApplicable: another system
    Example
        >>> print(mode_shape_factor("moment frame"))
        0.7

    Reference
        rule z_s: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    return np.float64(table("mode_shape_factor").entry("system", system, "z_s"))


def diaphragm_reduction(diaphragm: str) -> np.float64:
    """Design force reduction factor of a diaphragm.

    R_s = the row of Table 12.10-1

    Parameters
        diaphragm: one of DIAPHRAGM_TYPES
    Returns
        R_s [-]
    Raises
        NotApplicable: another diaphragm
    Notes
        Steel deck of 7-22 is not in the table, since it is uncertain: enter R_s yourself.
    Example
        >>> print(diaphragm_reduction("cast-in-place concrete shear"))
        1.5

    Reference
        rule R_s: 7-16 12.10.3.5, Table 12.10-1; 7-22 12.10.3.5, Table 12.10-1
    """
    return np.float64(table("diaphragm_reduction").entry("diaphragm", diaphragm, "R_s"))


@formula
def base_coefficient(S_DS: ArrayLike, I_e: ArrayLike) -> Result:
    """Acceleration coefficient at the base.

    C_p0 = 0.4 S_DS I_e

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        I_e: importance factor [-], at least 1
    Returns
        C_p0 [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(base_coefficient(S_DS=1.0, I_e=1.25))
        0.5

    Reference
        rule C_p0: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    return 0.4 * above(0, "S_DS", S_DS) * at_least(1, "I_e", I_e)


@formula
def first_mode_factor(z_s: ArrayLike, N: ArrayLike, c_m1: ArrayLike) -> Result:
    """First mode contribution factor.

    G_m1 = 1 + c_m1 z_s (1 - 1/N)

    Parameters
        z_s: mode shape factor [-], above 0; any shape
        N: stories above the base [-], a whole number, at least 1
        c_m1: coefficient of the clause, recalled as 0.5 but uncertain [-], at least 0
    Returns
        G_m1 [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(first_mode_factor(z_s=1.0, N=5, c_m1=0.5))
        1.4

    Reference
        rule G_m1: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    return 1 + at_least(0, "c_m1", c_m1) * above(0, "z_s", z_s) * (1 - 1 / _stories(N))


@formula
def higher_mode_factor(z_s: ArrayLike, N: ArrayLike) -> Result:
    """Higher mode contribution factor.

    G_m2 = 0.9 z_s (1 - 1/N)^2

    Parameters
        z_s: mode shape factor [-], above 0; any shape
        N: stories above the base [-], a whole number, at least 1
    Returns
        G_m2 [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(higher_mode_factor(z_s=1.0, N=5))
        0.576

    Reference
        rule G_m2: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    return 0.9 * above(0, "z_s", z_s) * (1 - 1 / _stories(N)) ** 2


@formula
def higher_mode_coefficient(N: ArrayLike, S_DS: ArrayLike, S_D1: ArrayLike, I_e: ArrayLike) -> Result:
    """Higher mode seismic response coefficient.

    C_s2 = min((0.15 N + 0.25) I_e S_DS; I_e S_DS; I_e S_D1/(0.03 (N - 1))); 0 for N = 1

    Parameters
        N: stories above the base [-], a whole number, at least 1; any shape
        S_DS: design spectral acceleration at short periods [g], above 0
        S_D1: design spectral acceleration at 1 s [g], above 0
        I_e: importance factor [-], at least 1
    Returns
        C_s2 [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(higher_mode_coefficient(N=3, S_DS=1.0, S_D1=0.6, I_e=1.0))
        0.7

    Reference
        rule C_s2: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    N = _stories(N)
    by_stories = np.minimum(0.15 * N + 0.25, 1.0) * above(0, "S_DS", S_DS)
    by_period = above(0, "S_D1", S_D1) / (0.03 * np.maximum(N - 1, 1))
    return np.where(N > 1, np.minimum(by_stories, by_period), 0.0) * at_least(1, "I_e", I_e)


@formula
def lower_coefficient(C_p0: ArrayLike, G_m1: ArrayLike, Omega_0: ArrayLike, C_s: ArrayLike) -> Result:
    """Acceleration coefficient at 0.8 h_n, and the least at the top.

    C_pi = max(C_p0; 0.9 G_m1 Omega_0 C_s)

    Parameters
        C_p0: acceleration coefficient at the base [-], above 0; any shape
        G_m1: first mode contribution factor [-], at least 1
        Omega_0: overstrength factor [-], at least 1
        C_s: seismic response coefficient of 12.8 or 12.9 [-], above 0
    Returns
        C_pi [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(lower_coefficient(C_p0=0.4, G_m1=1.4, Omega_0=2.5, C_s=0.2))
        0.63

    Reference
        rule C_pi: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    return np.maximum(above(0, "C_p0", C_p0), 0.9 * _first_mode(G_m1, Omega_0, C_s))


@formula
def top_coefficient(
    C_pi: ArrayLike, G_m1: ArrayLike, Omega_0: ArrayLike, C_s: ArrayLike, G_m2: ArrayLike, C_s2: ArrayLike
) -> Result:
    """Acceleration coefficient at the top.

    C_pn = sqrt((G_m1 Omega_0 C_s)^2 + (G_m2 C_s2)^2), at least C_pi

    Parameters
        C_pi: acceleration coefficient at 0.8 h_n [-], above 0; any shape
        G_m1: first mode contribution factor [-], at least 1
        Omega_0: overstrength factor [-], at least 1
        C_s: seismic response coefficient of 12.8 or 12.9 [-], above 0
        G_m2: higher mode contribution factor [-], at least 0
        C_s2: higher mode seismic response coefficient [-], at least 0
    Returns
        C_pn [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(top_coefficient(C_pi=0.3, G_m1=1.5, Omega_0=2.0, C_s=0.1, G_m2=0.5, C_s2=0.8))
        0.5

    Reference
        rule C_pn: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    higher = at_least(0, "G_m2", G_m2) * at_least(0, "C_s2", C_s2)
    return np.maximum(np.hypot(_first_mode(G_m1, Omega_0, C_s), higher), above(0, "C_pi", C_pi))


@formula
def coefficient_at_height(
    h_x: ArrayLike, h_n: ArrayLike, N: ArrayLike, C_p0: ArrayLike, C_pi: ArrayLike, C_pn: ArrayLike
) -> Result:
    """Acceleration coefficient of a level.

    C_px, linear from C_p0 at the base to C_pn at h_n; for N >= 3 through C_pi at 0.8 h_n

    Parameters
        h_x: height of the level above the base [ft or m], at least 0, at most h_n; any shape
        h_n: structural height [ft or m], above 0
        N: stories above the base [-], a whole number, at least 1
        C_p0: coefficient at the base [-], above 0
        C_pi: coefficient at 0.8 h_n [-], above 0
        C_pn: coefficient at the top [-], above 0
    Returns
        C_px [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range, or h_x above h_n
    Example
        >>> print(coefficient_at_height(h_x=45, h_n=50, N=4, C_p0=0.4, C_pi=0.6, C_pn=0.8))
        0.7

    Reference
        rule C_px: 7-16 12.10.3.2; 7-22 12.10.3.2
    """
    place = at_least(0, "h_x", h_x) / above(0, "h_n", h_n)
    if (place > 1).any():
        raise ImpossibleValue("h_x", float(finite("h_x", h_x).max()), "must be at most h_n")
    base, knee, top = (above(0, n, c) for n, c in (("C_p0", C_p0), ("C_pi", C_pi), ("C_pn", C_pn)))
    straight = base + (top - base) * place
    lower = base + (knee - base) * place / KNEE
    upper = knee + (top - knee) * (place - KNEE) / (1 - KNEE)
    return np.where(_stories(N) <= 2, straight, np.where(place <= KNEE, lower, upper))


@formula
def alternative_force(
    C_px: ArrayLike, w_px: ArrayLike, R_s: ArrayLike, S_DS: ArrayLike, I_e: ArrayLike
) -> Result:
    """Diaphragm design force of a level by the alternative procedure.

    F_px = C_px w_px/R_s, at least 0.2 S_DS I_e w_px

    Parameters
        C_px: acceleration coefficient of the level [-], above 0; any shape
        w_px: weight tributary to the diaphragm [kip or kN], at least 0
        R_s: design force reduction factor of the diaphragm [-], above 0
        S_DS: design spectral acceleration at short periods [g], above 0
        I_e: importance factor [-], at least 1
    Returns
        F_px [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Transfer forces are to be added.
    Example
        >>> print(alternative_force(C_px=0.7, w_px=500, R_s=2.0, S_DS=1.0, I_e=1.0))
        175.0

    Reference
        rule F_px_alternative: 7-16 12.10.3.2, Eq. 12.10-4; 7-22 12.10.3.2, Eq. 12.10-4
    """
    part = above(0, "C_px", C_px) / above(0, "R_s", R_s)
    return np.maximum(part * at_least(0, "w_px", w_px), minimum_force(w_px, S_DS, I_e))


def _first_mode(G_m1: ArrayLike, Omega_0: ArrayLike, C_s: ArrayLike) -> Result:
    return at_least(1, "G_m1", G_m1) * at_least(1, "Omega_0", Omega_0) * above(0, "C_s", C_s)


def _stories(N: ArrayLike) -> Array:
    stories = at_least(1, "N", N)
    if (stories != np.floor(stories)).any():
        broken = stories[stories != np.floor(stories)].flat[0]
        raise ImpossibleValue("N", float(broken), "must be a whole number")
    return stories
