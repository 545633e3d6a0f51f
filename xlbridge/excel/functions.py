"""Worksheet functions for xlwings.

Generated from the catalogue by ``python -m xlbridge.excel.generate``: not to be edited.
"""

# ruff: noqa: E501
from __future__ import annotations

from typing import Any

import xlwings as xw

from xlbridge.excel.cells import OMITTED, call


@xw.func(category="Storyledger: Ground motion")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.ret("raw")
def ELF_IE(risk_category: Any) -> Any:
    """Importance factor of a risk category. ASCE/SEI 7-16: 11.5.1, Table 1.5-2; 7-22: 11.5.1, Table 1.5-2."""
    return call("ELF_IE", risk_category)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.ret("raw")
def ELF_T0(S_DS: Any, S_D1: Any) -> Any:
    """Period at which the plateau of the design spectrum begins. ASCE/SEI 7-16: 11.4.6; 7-22: 11.4.5.2. Partly from memory: confirm."""
    return call("ELF_T0", S_DS, S_D1)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.ret("raw")
def ELF_TS(S_DS: Any, S_D1: Any) -> Any:
    """Period at which the plateau of the design spectrum ends. ASCE/SEI 7-16: 11.4.6; 7-22: 11.4.5.2. Partly from memory: confirm."""
    return call("ELF_TS", S_DS, S_D1)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T", "raw", doc="Period, 0 allowed [s], at least 0.")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.ret("raw")
def ELF_SA(T: Any, S_DS: Any, S_D1: Any, T_L: Any) -> Any:
    """Design spectral acceleration of the two-period spectrum at a period. ASCE/SEI 7-16: 11.4.6, Eq. 11.4-5 to 11.4-7; 7-22: 11.4.5.2, Eq. 11.4-3 to 11.4-5. Partly from memory: confirm."""
    return call("ELF_SA", T, S_DS, S_D1, T_L)


@xw.func(category="Storyledger: Period")
@xw.arg("h_n", "raw", doc="Structural height, in ft (us) or m (si) [a length unit], above 0.")
@xw.arg(
    "system",
    "raw",
    doc="Row of the approximate period table: steel moment frame, concrete moment frame, steel eccentrically braced frame, steel buckling-restrained braced frame, all other.",
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_TA(h_n: Any, system: Any, units: Any) -> Any:
    """Approximate fundamental period from the height of the structure. ASCE/SEI 7-16: 12.8.2.1, Eq. 12.8-7; 7-22: 12.8.2.1, Eq. 12.8-8."""
    return call("ELF_TA", h_n, system, units)


@xw.func(category="Storyledger: Period")
@xw.arg("N", "raw", doc="Number of stories above the base [no unit], at least 1 and at most 12.")
@xw.ret("raw")
def ELF_TA_STORIES(N: Any) -> Any:
    """Approximate period 0.1 N of moment frames: at most 12 stories of 10 ft (3 m) on average. ASCE/SEI 7-16: 12.8.2.1, Eq. 12.8-8; 7-22: 12.8.2.1, Eq. 12.8-9. Partly from memory: confirm."""
    return call("ELF_TA_STORIES", N)


@xw.func(category="Storyledger: Period")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.ret("raw")
def ELF_CU(S_D1: Any) -> Any:
    """Coefficient for the upper limit on the calculated period. ASCE/SEI 7-16: 12.8.2, Table 12.8-1; 7-22: 12.8.2, Table 12.8-1. Partly from memory: confirm."""
    return call("ELF_CU", S_D1)


@xw.func(category="Storyledger: Period")
@xw.arg("T_a", "raw", doc="Approximate fundamental period [s], above 0.")
@xw.arg("C_u", "raw", doc="Coefficient for the upper limit on the period [no unit], at least 1.")
@xw.arg("T_computed", "raw", doc="Period from a structural analysis [s], above 0.")
@xw.ret("raw")
def ELF_PERIOD(T_a: Any, C_u: Any, T_computed: Any) -> Any:
    """Period used for strength: the computed period, at most C_u T_a. ASCE/SEI 7-16: 12.8.2; 7-22: 12.8.2."""
    return call("ELF_PERIOD", T_a, C_u, T_computed)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_PLATEAU(S_DS: Any, R: Any, I_e: Any) -> Any:
    """Seismic response coefficient on the plateau of the spectrum. ASCE/SEI 7-16: 12.8.1.1, Eq. 12.8-2; 7-22: 12.8.1.1, Eq. 12.8-3. Partly from memory: confirm."""
    return call("ELF_CS_PLATEAU", S_DS, R, I_e)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_CAP(S_D1: Any, T: Any, T_L: Any, R: Any, I_e: Any) -> Any:
    """Upper bound of the seismic response coefficient from the period, on either side of T_L. ASCE/SEI 7-16: 12.8.1.1, Eq. 12.8-3; 7-22: 12.8.1.1, Eq. 12.8-4. Partly from memory: confirm."""
    return call("ELF_CS_CAP", S_D1, T, T_L, R, I_e)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_MIN(S_DS: Any, I_e: Any) -> Any:
    """Lower bound of the seismic response coefficient, at least 0.01. ASCE/SEI 7-16: 12.8.1.1, Eq. 12.8-5; 7-22: 12.8.1.1, Eq. 12.8-6. Partly from memory: confirm."""
    return call("ELF_CS_MIN", S_DS, I_e)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_MIN_S1(S_1: Any, R: Any, I_e: Any) -> Any:
    """Lower bound of the seismic response coefficient where S_1 is at least 0.6 g; 0 elsewhere. ASCE/SEI 7-16: 12.8.1.1, Eq. 12.8-6; 7-22: 12.8.1.1, Eq. 12.8-7. Partly from memory: confirm."""
    return call("ELF_CS_MIN_S1", S_1, R, I_e)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_CS(S_DS: Any, S_D1: Any, S_1: Any, T: Any, T_L: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """Governing seismic response coefficient of the two-period spectrum. ASCE/SEI 7-16: 12.8.1.1; 7-22: 12.8.1.1."""
    return call("ELF_CS", S_DS, S_D1, S_1, T, T_L, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_CS_GOVERNS(S_DS: Any, S_D1: Any, S_1: Any, T: Any, T_L: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """The bound that governs the seismic response coefficient, with its equation number. ASCE/SEI 7-16: 12.8.1.1; 7-22: 12.8.1.1."""
    return call("ELF_CS_GOVERNS", S_DS, S_D1, S_1, T, T_L, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("C_s", "raw", doc="Seismic response coefficient [no unit], above 0.")
@xw.arg("W", "raw", doc="Effective seismic weight of the building [a force unit], above 0.")
@xw.ret("raw")
def ELF_V(C_s: Any, W: Any) -> Any:
    """Seismic base shear. ASCE/SEI 7-16: 12.8.1, Eq. 12.8-1; 7-22: 12.8.1, Eq. 12.8-1."""
    return call("ELF_V", C_s, W)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("rule", "raw", doc="Between 0.5 s and 2.5 s: interpolate, or the permitted two: interpolate, two.")
@xw.ret("raw")
def ELF_EXPONENT(T: Any, rule: Any = OMITTED) -> Any:
    """Exponent k of the vertical distribution. ASCE/SEI 7-16: 12.8.3; 7-22: 12.8.3."""
    return call("ELF_EXPONENT", T, rule)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("w_x", "raw", doc="Effective seismic weight of level x [a force unit], at least 0.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("k", "raw", doc="Distribution exponent [no unit], at least 1 and at most 2.")
@xw.ret("raw")
def ELF_CVX(w_x: Any, h_x: Any, weights: Any, heights: Any, k: Any) -> Any:
    """Vertical distribution factor of a level. ASCE/SEI 7-16: 12.8.3, Eq. 12.8-12; 7-22: 12.8.3, Eq. 12.8-13. Partly from memory: confirm."""
    return call("ELF_CVX", w_x, h_x, weights, heights, k)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("V", "raw", doc="Base shear [a force unit], above 0.")
@xw.arg("C_vx", "raw", doc="Vertical distribution factor [no unit], at least 0 and at most 1.")
@xw.ret("raw")
def ELF_FX(V: Any, C_vx: Any) -> Any:
    """Lateral seismic force of a level. ASCE/SEI 7-16: 12.8.3, Eq. 12.8-11; 7-22: 12.8.3, Eq. 12.8-12. Partly from memory: confirm."""
    return call("ELF_FX", V, C_vx)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("h_x", "raw", doc="Height of level x above the base, or 0 for the base [a length unit], at least 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_VX(h_x: Any, forces: Any, heights: Any) -> Any:
    """Story shear below a level: the forces at and above it; at height 0 the base shear. ASCE/SEI 7-16: 12.8.4, Eq. 12.8-13; 7-22: 12.8.4, Eq. 12.8-14. Partly from memory: confirm."""
    return call("ELF_VX", h_x, forces, heights)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("h_x", "raw", doc="Height of level x above the base, or 0 for the base [a length unit], at least 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MX(h_x: Any, forces: Any, heights: Any) -> Any:
    """Overturning moment at a level, or at the base at height 0. ASCE/SEI 7-16: 12.8.5; 7-22: 12.8.5. Partly from memory: confirm."""
    return call("ELF_MX", h_x, forces, heights)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("z_x", "raw", doc="Elevation of level x [a length unit], any number.")
@xw.arg("z_0", "raw", doc="Elevation of the base [a length unit], any number.")
@xw.ret("raw")
def ELF_HX(z_x: Any, z_0: Any) -> Any:
    """Height of a level above the base, from elevations; a level must lie above the base. ASCE/SEI 7-16: 12.8.3; 7-22: 12.8.3. Partly from memory: confirm."""
    return call("ELF_HX", z_x, z_0)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_HSX(h_x: Any, heights: Any) -> Any:
    """Story height below a level: down to the next lower level, or to the base. ASCE/SEI 7-16: 11.3; 7-22: 11.3. Partly from memory: confirm."""
    return call("ELF_HSX", h_x, heights)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("values", "raw", doc="Values at all levels [a displacement unit], one cell a level, any number.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_BELOW(h_x: Any, values: Any, heights: Any) -> Any:
    """The value at the next lower level (a displacement, say), 0 at the base. ASCE/SEI 7-16: 11.3; 7-22: 11.3. Partly from memory: confirm."""
    return call("ELF_BELOW", h_x, values, heights)


@xw.func(category="Storyledger: Torsion")
@xw.arg(
    "d_max", "raw", doc="Largest displacement at level x, found with A_x = 1 [a displacement unit], above 0."
)
@xw.arg("d_avg", "raw", doc="Average of the extreme points at level x [a displacement unit], above 0.")
@xw.ret("raw")
def ELF_AX(d_max: Any, d_avg: Any) -> Any:
    """Torsional amplification factor of a level, between 1 and 3. ASCE/SEI 7-16: 12.8.4.3, Eq. 12.8-14; 7-22: 12.8.4.3, Eq. 12.8-15. Partly from memory: confirm."""
    return call("ELF_AX", d_max, d_avg)


@xw.func(category="Storyledger: Drift")
@xw.arg(
    "delta_xe", "raw", doc="Elastic displacement under the design forces [a displacement unit], any number."
)
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_DEFLECTION(delta_xe: Any, C_d: Any, I_e: Any) -> Any:
    """Amplified deflection of a level from its elastic displacement. ASCE/SEI 7-16: 12.8.6, Eq. 12.8-15; 7-22: 12.8.6, Eq. 12.8-16. Partly from memory: confirm."""
    return call("ELF_DEFLECTION", delta_xe, C_d, I_e)


@xw.func(category="Storyledger: Drift")
@xw.arg(
    "d_upper", "raw", doc="Elastic displacement at the top of the story [a displacement unit], any number."
)
@xw.arg(
    "d_lower", "raw", doc="Elastic displacement at the bottom of the story [a displacement unit], any number."
)
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_DRIFT(d_upper: Any, d_lower: Any, C_d: Any, I_e: Any) -> Any:
    """Design story drift from the elastic displacements above and below the story. ASCE/SEI 7-16: 12.8.6; 7-22: 12.8.6."""
    return call("ELF_DRIFT", d_upper, d_lower, C_d, I_e)


@xw.func(category="Storyledger: Drift")
@xw.arg(
    "h_sx", "raw", doc="Story height below level x, in the unit of the drift [a displacement unit], above 0."
)
@xw.arg(
    "structure",
    "raw",
    doc="Row of the allowable drift table: low-rise with detailed finishes, masonry cantilever wall, masonry wall, all other.",
)
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.arg(
    "rho",
    "raw",
    doc="Redundancy factor, for moment-frame systems in SDC D to F; 1 if left out [no unit], at least 1 and at most 1.3.",
)
@xw.ret("raw")
def ELF_DRIFT_LIMIT(h_sx: Any, structure: Any, risk_category: Any, rho: Any = OMITTED) -> Any:
    """Allowable story drift; divided by rho where the clause on moment frames asks for it. ASCE/SEI 7-16: 12.12.1, Table 12.12-1; 7-22: 12.12.1, Table 12.12-1. Partly from memory: confirm."""
    return call("ELF_DRIFT_LIMIT", h_sx, structure, risk_category, rho)


@xw.func(category="Storyledger: Stability")
@xw.arg("P_x", "raw", doc="Vertical design load at and above level x [a force unit], at least 0.")
@xw.arg("Delta", "raw", doc="Design story drift [a displacement unit], at least 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("V_x", "raw", doc="Story shear [a force unit], above 0.")
@xw.arg(
    "h_sx", "raw", doc="Story height below level x, in the unit of the drift [a displacement unit], above 0."
)
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_THETA(P_x: Any, Delta: Any, I_e: Any, V_x: Any, h_sx: Any, C_d: Any) -> Any:
    """Stability coefficient of a story. ASCE/SEI 7-16: 12.8.7, Eq. 12.8-16; 7-22: 12.8.7, Eq. 12.8-18. Partly from memory: confirm."""
    return call("ELF_THETA", P_x, Delta, I_e, V_x, h_sx, C_d)


@xw.func(category="Storyledger: Stability")
@xw.arg("beta", "raw", doc="Shear demand over shear capacity of the story [no unit], above 0 and at most 1.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_BETA(beta: Any, Omega_0: Any, edition: Any) -> Any:
    """Ratio of shear demand to capacity that the stability limit may use. ASCE/SEI 7-16: 12.8.7; 7-22: 12.8.7. Partly from memory: confirm."""
    return call("ELF_BETA", beta, Omega_0, edition)


@xw.func(category="Storyledger: Stability")
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.arg(
    "beta",
    "raw",
    doc="Shear demand over shear capacity of the story; 1 if left out [no unit], above 0 and at most 1.",
)
@xw.ret("raw")
def ELF_THETA_MAX(C_d: Any, beta: Any = OMITTED) -> Any:
    """Upper limit of the stability coefficient. ASCE/SEI 7-16: 12.8.7, Eq. 12.8-17; 7-22: 12.8.7, Eq. 12.8-19. Partly from memory: confirm."""
    return call("ELF_THETA_MAX", C_d, beta)


@xw.func(category="Storyledger: Stability")
@xw.arg("theta", "raw", doc="Stability coefficient [no unit], at least 0 and below 1.")
@xw.ret("raw")
def ELF_PDELTA_FACTOR(theta: Any) -> Any:
    """Amplification of drifts and forces for P-delta: 1/(1 - theta) above 0.10, else 1. ASCE/SEI 7-16: 12.8.7; 7-22: 12.8.7. Partly from memory: confirm."""
    return call("ELF_PDELTA_FACTOR", theta)


@xw.func(category="Storyledger: Stability")
@xw.arg("theta", "raw", doc="Stability coefficient [no unit], at least 0.")
@xw.arg("theta_max", "raw", doc="Upper limit of the stability coefficient [no unit], above 0.")
@xw.ret("raw")
def ELF_PDELTA_STATUS(theta: Any, theta_max: Any) -> Any:
    """What the stability coefficient asks for, in words; both limits when they collide. ASCE/SEI 7-16: 12.8.7, Eq. 12.8-17; 7-22: 12.8.7, Eq. 12.8-19. Partly from memory: confirm."""
    return call("ELF_PDELTA_STATUS", theta, theta_max)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("w_px", "raw", doc="Weight tributary to the diaphragm at level x [a force unit], at least 0.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_FPX(w_px: Any, h_x: Any, forces: Any, weights: Any, heights: Any, S_DS: Any, I_e: Any) -> Any:
    """Diaphragm design force of a level, with its lower and upper limits. ASCE/SEI 7-16: 12.10.1.1, Eq. 12.10-1; 7-22: 12.10.1.1, Eq. 12.10-1."""
    return call("ELF_FPX", w_px, h_x, forces, weights, heights, S_DS, I_e)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("w_px", "raw", doc="Weight tributary to the diaphragm at level x [a force unit], at least 0.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_FPX_GOVERNS(w_px: Any, h_x: Any, forces: Any, weights: Any, heights: Any, S_DS: Any, I_e: Any) -> Any:
    """Which of the three diaphragm force equations governs at a level. ASCE/SEI 7-16: 12.10.1.1, Eq. 12.10-1; 7-22: 12.10.1.1, Eq. 12.10-1."""
    return call("ELF_FPX_GOVERNS", w_px, h_x, forces, weights, heights, S_DS, I_e)
