"""The alternative diaphragm procedure, that of one-story buildings, and walls out of plane."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import base_shear, diaphragm
from engine.building.parts.diaphragm import tributary_weights
from engine.building.records import Building
from engine.building.results import DirectionResult, Package
from engine.editions import EDITIONS
from engine.require import ROUND_OFF

ALTERNATIVE_RULES: Final = (
    *("z_s", "R_s", "G_m1", "G_m2", "C_s2", "C_p0", "C_pi", "C_pn", "C_px", "F_px_alternative"),
)
ONE_STORY_RULES: Final = ("C_s_diaph",)
WALL_RULES: Final = ("F_p_wall", "k_a", "F_p_anchor")


def alternative(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return every factor and the forces, where system, diaphragm and number of stories are given."""
    given, N = building.direction[name], building.site.N
    if given.mode_shape is None or given.diaphragm_type is None or N is None:
        return {}
    z_s = float(diaphragm.mode_shape_factor(given.mode_shape))
    R_s = given.R_s_entered or float(diaphragm.diaphragm_reduction(given.diaphragm_type))
    factors = _factors(building, package, name, result, z_s, N)
    w_px = tributary_weights(building, package)
    coefficients = factors["C_p0"], factors["C_pi"], factors["C_pn"]
    C_px = np.asarray(diaphragm.coefficient_at_height(package.h_x, package.h_n, N, *coefficients))
    S_DS, I_e = building.site.S_DS, package.I_e
    F_px = np.asarray(diaphragm.alternative_force(C_px, w_px, R_s, S_DS, I_e))
    least = F_px > C_px * w_px / R_s * (1 + ROUND_OFF)
    return {
        **{"z_s": z_s, "R_s": R_s, **factors},
        "C_px": C_px,
        "F_px_alt": F_px,
        "F_px_alt_bound": tuple("the minimum" if low else "C_px w_px/R_s" for low in least),
    }


def _factors(
    building: Building, package: Package, name: str, result: DirectionResult, z_s: float, N: float
) -> dict[str, float]:
    site, given, I_e = building.site, building.direction[name], package.I_e
    G_m1 = float(diaphragm.first_mode_factor(z_s, N, given.c_m1))
    G_m2 = float(diaphragm.higher_mode_factor(z_s, N))
    C_s2 = float(diaphragm.higher_mode_coefficient(N, site.S_DS, site.S_D1, I_e))
    C_p0 = float(diaphragm.base_coefficient(site.S_DS, I_e))
    first = G_m1, given.Omega_0, result.C_s
    C_pi = float(diaphragm.lower_coefficient(C_p0, *first))
    C_pn = float(diaphragm.top_coefficient(C_pi, *first, G_m2, C_s2))
    return {"G_m1": G_m1, "G_m2": G_m2, "C_s2": C_s2, "C_p0": C_p0, "C_pi": C_pi, "C_pn": C_pn}


def one_story(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the shear of the flexible diaphragm of a one-story building of 7-22, where it is described."""
    given, site = building.direction[name], building.site
    if given.R_diaph is None or given.T_diaph is None or building.edition == EDITIONS[0]:
        return {}
    case = site.S_DS, site.S_D1, package.I_e, given.R_diaph, given.T_diaph
    C_s = float(diaphragm.one_story_coefficient(*case))
    return {"C_s_diaph": C_s, "V_diaph": float(base_shear.base_shear(C_s, package.W))}


def walls(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the forces of the walls and anchors that are listed."""
    if not building.anchor:
        return {}
    S_DS, I_e = building.site.S_DS, package.I_e
    k_a = [
        float(diaphragm.anchorage_factor(row.L_f, row.diaphragm, building.units)) for row in building.anchor
    ]
    W_w, W_p = (np.array([getattr(row, key) for row in building.anchor]) for key in ("W_w", "W_p"))
    return {
        "F_p_wall": diaphragm.wall_force(S_DS, I_e, W_w),
        "k_a": np.array(k_a),
        "F_p_anchor": diaphragm.anchorage_force(S_DS, k_a, I_e, W_p),
    }
