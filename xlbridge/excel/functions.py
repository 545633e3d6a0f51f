"""Worksheet functions for xlwings.

Generated from the catalogue by ``python -m xlbridge.excel.generate``: not to be edited.
"""

# ruff: noqa: E501
from __future__ import annotations

from typing import Any

import xlwings as xw

from xlbridge.excel.cells import OMITTED, call


@xw.func(category="Storyledger: Seismic weight")
@xw.arg("area", "raw", doc="Area on plan, or of a wall [an area unit], at least 0.")
@xw.arg("unit_load", "raw", doc="Load that counts, on each unit of area [a unit load unit], at least 0.")
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_AREA_WEIGHT(area: Any, unit_load: Any, units: Any) -> Any:
    """Weight of a surface under a uniform load. ASCE/SEI 7-16: 12.7.2; 7-22: 12.7.2."""
    return call("ELF_AREA_WEIGHT", area, unit_load, units)


@xw.func(category="Storyledger: Seismic weight")
@xw.arg("live_load", "raw", doc="Floor live load of the storage area [a unit load unit], at least 0.")
@xw.arg(
    "storage",
    "raw",
    doc="Counted, or the exception used: counted, at most 5 % of the level, public garage or open parking.",
)
@xw.ret("raw")
def ELF_STORAGE_SHARE(live_load: Any, storage: Any) -> Any:
    """Part of a storage floor's live load that counts as seismic weight. ASCE/SEI 7-16: 12.7.2, item 1; 7-22: 12.7.2, item 1. Partly from memory: confirm."""
    return call("ELF_STORAGE_SHARE", live_load, storage)


@xw.func(category="Storyledger: Seismic weight")
@xw.arg(
    "w_storage",
    "raw",
    doc="Weight of storage at the level, 25 % of its live load [a force unit], at least 0.",
)
@xw.arg(
    "w_other", "raw", doc="Effective seismic weight of the level without storage [a force unit], above 0."
)
@xw.ret("raw")
def ELF_STORAGE_RATIO(w_storage: Any, w_other: Any) -> Any:
    """What a level's storage adds, in parts of its other weight: at most 0.05 need not count. ASCE/SEI 7-16: 12.7.2, item 1; 7-22: 12.7.2, item 1. Partly from memory: confirm."""
    return call("ELF_STORAGE_RATIO", w_storage, w_other)


@xw.func(category="Storyledger: Seismic weight")
@xw.arg(
    "partitions", "raw", doc="Actual weight of partitions over the floor area [a unit load unit], at least 0."
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_PARTITION_SHARE(partitions: Any, units: Any) -> Any:
    """Partition load that counts as seismic weight: the actual one, at least 10 psf (0.48 kN/m2). ASCE/SEI 7-16: 12.7.2, item 2; 7-22: 12.7.2, item 2."""
    return call("ELF_PARTITION_SHARE", partitions, units)


@xw.func(category="Storyledger: Seismic weight")
@xw.arg("p_f", "raw", doc="Flat roof snow load [a unit load unit], at least 0.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_SNOW_SHARE(p_f: Any, edition: Any, units: Any) -> Any:
    """Part of the flat roof snow load that counts as seismic weight. ASCE/SEI 7-16: 12.7.2, item 4; 7-22: 12.7.2, item 4."""
    return call("ELF_SNOW_SHARE", p_f, edition, units)


@xw.func(category="Storyledger: Seismic weight")
@xw.arg("areas", "raw", doc="Areas of the items [an area unit], one cell an item, at least 0.")
@xw.arg(
    "unit_loads", "raw", doc="Loads that count, by item [a unit load unit], one cell an item, at least 0."
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.arg(
    "equipment",
    "raw",
    doc="Permanent equipment, landscaping and whatever else counts in full; 0 if left out [a force unit], at least 0.",
)
@xw.ret("raw")
def ELF_LEVEL_WEIGHT(areas: Any, unit_loads: Any, units: Any, equipment: Any = OMITTED) -> Any:
    """Effective seismic weight of one level from its list of areas and unit loads. ASCE/SEI 7-16: 12.7.2; 7-22: 12.7.2."""
    return call("ELF_LEVEL_WEIGHT", areas, unit_loads, units, equipment)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_S", "raw", doc="Mapped MCE_R spectral acceleration at short periods [g], at least 0.")
@xw.arg("site_class", "raw", doc="Site class; F has no row: A, B, B not measured, C, D, D default, E.")
@xw.arg("exception", "raw", doc="Exception of 11.4.8 used: none, exception 1: F_a of class C.")
@xw.ret("raw")
def ELF_FA(S_S: Any, site_class: Any, exception: Any) -> Any:
    """Site coefficient at short periods, by class and mapped acceleration. ASCE/SEI 7-16: 11.4.4, Table 11.4-1. Partly from memory: confirm."""
    return call("ELF_FA", S_S, site_class, exception)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("site_class", "raw", doc="Site class; F has no row: A, B, B not measured, C, D, D default, E.")
@xw.ret("raw")
def ELF_FV(S_1: Any, site_class: Any) -> Any:
    """Site coefficient at long periods, by class and mapped acceleration. ASCE/SEI 7-16: 11.4.4, Table 11.4-2."""
    return call("ELF_FV", S_1, site_class)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_S", "raw", doc="Mapped MCE_R spectral acceleration at short periods [g], at least 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("site_class", "raw", doc="Site class: A, B, B not measured, C, D, D default, E, F.")
@xw.arg("isolated", "raw", doc="Isolated or with damping systems: yes, no.")
@xw.arg("short_exception", "raw", doc="Exception of 11.4.8 used: none, exception 1: F_a of class C.")
@xw.arg(
    "long_exception",
    "raw",
    doc="Exception of 11.4.8 used: none, exception 2: C_s increased, exception 2 of Supplement 3: S_M1 up 50 %, exception 3: T at most T_S.",
)
@xw.arg("T", "raw", doc="Longest period used in design, either direction [s], above 0.")
@xw.arg("T_S", "raw", doc="Period at which the plateau of the design spectrum ends [s], above 0.")
@xw.ret("raw")
def ELF_SITE_TRIGGER(
    S_S: Any,
    S_1: Any,
    site_class: Any,
    isolated: Any,
    short_exception: Any,
    long_exception: Any,
    T: Any,
    T_S: Any,
) -> Any:
    """What still demands a site-specific analysis after the exceptions used, or none. ASCE/SEI 7-16: 11.4.8. Partly from memory: confirm."""
    return call("ELF_SITE_TRIGGER", S_S, S_1, site_class, isolated, short_exception, long_exception, T, T_S)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_S", "raw", doc="Mapped MCE_R spectral acceleration at short periods [g], at least 0.")
@xw.arg("F_a", "raw", doc="Site coefficient at short periods [no unit], above 0.")
@xw.ret("raw")
def ELF_SMS(S_S: Any, F_a: Any) -> Any:
    """MCE_R spectral acceleration at short periods for the site class. ASCE/SEI 7-16: 11.4.4, Eq. 11.4-1."""
    return call("ELF_SMS", S_S, F_a)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("F_v", "raw", doc="Site coefficient at long periods [no unit], above 0.")
@xw.arg(
    "exception",
    "raw",
    doc="Exception of 11.4.8 used: none, exception 2: C_s increased, exception 2 of Supplement 3: S_M1 up 50 %, exception 3: T at most T_S.",
)
@xw.ret("raw")
def ELF_SM1(S_1: Any, F_v: Any, exception: Any) -> Any:
    """MCE_R spectral acceleration at 1 s for the site class. ASCE/SEI 7-16: 11.4.4, Eq. 11.4-2."""
    return call("ELF_SM1", S_1, F_v, exception)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_MS", "raw", doc="MCE_R spectral acceleration at short periods [g], above 0.")
@xw.ret("raw")
def ELF_SDS(S_MS: Any) -> Any:
    """Design spectral acceleration at short periods. ASCE/SEI 7-16: 11.4.5, Eq. 11.4-3; 7-22: 11.4.4, Eq. 11.4-1. Partly from memory: confirm."""
    return call("ELF_SDS", S_MS)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_M1", "raw", doc="MCE_R spectral acceleration at 1 s [g], above 0.")
@xw.ret("raw")
def ELF_SD1(S_M1: Any) -> Any:
    """Design spectral acceleration at 1 s. ASCE/SEI 7-16: 11.4.5, Eq. 11.4-4; 7-22: 11.4.4, Eq. 11.4-2. Partly from memory: confirm."""
    return call("ELF_SD1", S_M1)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("T_S", "raw", doc="Period at which the plateau of the design spectrum ends [s], above 0.")
@xw.arg(
    "exception",
    "raw",
    doc="Exception of 11.4.8 used: none, exception 2: C_s increased, exception 2 of Supplement 3: S_M1 up 50 %, exception 3: T at most T_S.",
)
@xw.ret("raw")
def ELF_CS_INCREASE(T: Any, T_S: Any, exception: Any) -> Any:
    """Factor on the upper bound of C_s where exception 2 is used as first printed; 1 otherwise. ASCE/SEI 7-16: 11.4.8, exception 2. Partly from memory: confirm."""
    return call("ELF_CS_INCREASE", T, T_S, exception)


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


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 85 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SYSTEM_R(system: Any, edition: Any) -> Any:
    """Response modification coefficient of a system. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_SYSTEM_R", system, edition)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 85 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SYSTEM_OMEGA(system: Any, edition: Any) -> Any:
    """Overstrength factor of a system. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_SYSTEM_OMEGA", system, edition)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 85 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SYSTEM_CD(system: Any, edition: Any) -> Any:
    """Deflection amplification factor of a system. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_SYSTEM_CD", system, edition)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 92 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SYSTEM_SOURCE(system: Any, edition: Any) -> Any:
    """What the row of a system in Table 12.2-1 rests on: seen, from memory or uncertain. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_SYSTEM_SOURCE", system, edition)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 92 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor as tabulated [no unit], at least 1.")
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SYSTEM_STATUS(system: Any, R: Any, Omega_0: Any, C_d: Any, edition: Any) -> Any:
    """Whether R, Omega_0 and C_d as entered are those of Table 12.2-1, and what differs. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_SYSTEM_STATUS", system, R, Omega_0, C_d, edition)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 92 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "increase",
    "raw",
    doc="Whether 12.2.5.4 is used: no extreme torsion, at most 60 % of the force in one plane: yes, no.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_HEIGHT_LIMIT(system: Any, SDC: Any, increase: Any, edition: Any, units: Any) -> Any:
    """Limit on the structural height of a system, in words: a height, NL or NP. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_HEIGHT_LIMIT", system, SDC, increase, edition, units)


@xw.func(category="Storyledger: Systems")
@xw.arg("h_n", "raw", doc="Structural height, in ft (us) or m (si) [a length unit], above 0.")
@xw.arg(
    "system",
    "raw",
    doc="Row of Table 12.2-1, after the letter of its group: 92 texts from 'A. Special reinforced concrete shear walls' to 'H. Steel systems not specifically detailed for seismic resistance, excluding cantilever column systems'.",
)
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "increase",
    "raw",
    doc="Whether 12.2.5.4 is used: no extreme torsion, at most 60 % of the force in one plane: yes, no.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_HEIGHT_STATUS(h_n: Any, system: Any, SDC: Any, increase: Any, edition: Any, units: Any) -> Any:
    """Whether the structural height keeps the limit of the system. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_HEIGHT_STATUS", h_n, system, SDC, increase, edition, units)


@xw.func(category="Storyledger: Systems")
@xw.arg("Omega_0", "raw", doc="Overstrength factor as tabulated [no unit], at least 1.")
@xw.arg("reduction", "raw", doc="Whether the reduction is taken: as tabulated, flexible diaphragms.")
@xw.ret("raw")
def ELF_OMEGA(Omega_0: Any, reduction: Any) -> Any:
    """Overstrength factor, less 0.5 where diaphragms are flexible and it is at least 2.5. ASCE/SEI 7-16: 12.2.1, Table 12.2-1; 7-22: 12.2.1, Table 12.2-1. Partly from memory: confirm."""
    return call("ELF_OMEGA", Omega_0, reduction)


@xw.func(category="Storyledger: Systems")
@xw.arg("upper", "raw", doc="The coefficient of the upper system [no unit], at least 1.")
@xw.arg("lower", "raw", doc="The same coefficient of the lower system [no unit], at least 1.")
@xw.arg("R_upper", "raw", doc="Response modification coefficient of the upper part [no unit], at least 1.")
@xw.arg("R_lower", "raw", doc="Response modification coefficient of the lower part [no unit], at least 1.")
@xw.ret("raw")
def ELF_LOWER_PART(upper: Any, lower: Any, R_upper: Any, R_lower: Any) -> Any:
    """R, Omega_0 or C_d for the lower part where one system stands on another. ASCE/SEI 7-16: 12.2.3.1; 7-22: 12.2.3.1. Partly from memory: confirm."""
    return call("ELF_LOWER_PART", upper, lower, R_upper, R_lower)


@xw.func(category="Storyledger: Systems")
@xw.arg("R_upper", "raw", doc="Response modification coefficient of the upper part [no unit], at least 1.")
@xw.arg("R_lower", "raw", doc="Response modification coefficient of the lower part [no unit], at least 1.")
@xw.ret("raw")
def ELF_TRANSFER_FACTOR(R_upper: Any, R_lower: Any) -> Any:
    """Factor on the forces that an upper system hands down to a lower one with a lower R. ASCE/SEI 7-16: 12.2.3.1; 7-22: 12.2.3.1. Partly from memory: confirm."""
    return call("ELF_TRANSFER_FACTOR", R_upper, R_lower)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "R_systems",
    "raw",
    doc="Response modification coefficients of the systems in one direction [no unit], one cell a system, at least 1.",
)
@xw.ret("raw")
def ELF_R_LEAST(R_systems: Any) -> Any:
    """R of several systems that act in one direction: the least. ASCE/SEI 7-16: 12.2.3.3; 7-22: 12.2.3.3. Partly from memory: confirm."""
    return call("ELF_R_LEAST", R_systems)


@xw.func(category="Storyledger: Systems")
@xw.arg(
    "coefficients", "raw", doc="Omega_0 or C_d of the same systems [no unit], one cell a system, at least 1."
)
@xw.arg(
    "R_systems",
    "raw",
    doc="Response modification coefficients of the systems in one direction [no unit], one cell a system, at least 1.",
)
@xw.ret("raw")
def ELF_LEAST_R_VALUE(coefficients: Any, R_systems: Any) -> Any:
    """Omega_0 or C_d of several systems in one direction: that of the system with the least R. ASCE/SEI 7-16: 12.2.3.3; 7-22: 12.2.3.3. Partly from memory: confirm."""
    return call("ELF_LEAST_R_VALUE", coefficients, R_systems)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T", "raw", doc="Period, 0 allowed [s], at least 0.")
@xw.arg("T_i", "raw", doc="Periods of the spectrum [s], one cell a period, at least 0.")
@xw.arg("S_ai", "raw", doc="Ordinates of the design spectrum [g], one cell a period, above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg("tail", "raw", doc="Beyond 10 s where T_L is below 10 s: as printed, continuous at 10 s.")
@xw.ret("raw")
def ELF_SA_MULTI(T: Any, T_i: Any, S_ai: Any, T_L: Any, tail: Any) -> Any:
    """Design spectral acceleration of the multi-period spectrum at a period. ASCE/SEI 7-22: 11.4.5.1. Partly from memory: confirm."""
    return call("ELF_SA_MULTI", T, T_i, S_ai, T_L, tail)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T", "raw", doc="Period, 0 allowed [s], at least 0.")
@xw.arg("T_i", "raw", doc="Periods of the spectrum [s], one cell a period, at least 0.")
@xw.arg("S_ai", "raw", doc="Ordinates of the design spectrum [g], one cell a period, above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg("tail", "raw", doc="Beyond 10 s where T_L is below 10 s: as printed, continuous at 10 s.")
@xw.ret("raw")
def ELF_SA_METHOD1(T: Any, T_i: Any, S_ai: Any, T_L: Any, tail: Any) -> Any:
    """Ordinate of the multi-period spectrum for Method 1: left of the peak, the peak. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_SA_METHOD1", T, T_i, S_ai, T_L, tail)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_a", "raw", doc="Design spectral acceleration [g], at least 0.")
@xw.ret("raw")
def ELF_SAM(S_a: Any) -> Any:
    """Ordinate or parameter of the MCE_R spectrum from that of the design spectrum. ASCE/SEI 7-16: 11.4.7; 7-22: 11.4.6. Partly from memory: confirm."""
    return call("ELF_SAM", S_a)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S_aM", "raw", doc="MCE_R spectral acceleration [g], at least 0.")
@xw.ret("raw")
def ELF_SA_DESIGN(S_aM: Any) -> Any:
    """Ordinate of the design spectrum from that of the MCE_R spectrum. ASCE/SEI 7-16: 21.3; 7-22: 11.4.5.1. Partly from memory: confirm."""
    return call("ELF_SA_DESIGN", S_aM)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T_i", "raw", doc="Periods of the spectrum [s], one cell a period, at least 0.")
@xw.arg("S_ai", "raw", doc="Ordinates of the design spectrum [g], one cell a period, above 0.")
@xw.ret("raw")
def ELF_SDS_MULTI(T_i: Any, S_ai: Any) -> Any:
    """Design spectral acceleration at short periods, taken from a spectrum. ASCE/SEI 7-16: 21.4; 7-22: 21.4. Partly from memory: confirm."""
    return call("ELF_SDS_MULTI", T_i, S_ai)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("T_i", "raw", doc="Periods of the spectrum [s], one cell a period, at least 0.")
@xw.arg("S_ai", "raw", doc="Ordinates of the design spectrum [g], one cell a period, above 0.")
@xw.arg("v_s", "raw", doc="Average shear wave velocity of the site [a velocity unit], above 0.")
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.arg("reading", "raw", doc="Where T S_a is read: listed periods, every period.")
@xw.ret("raw")
def ELF_SD1_MULTI(T_i: Any, S_ai: Any, v_s: Any, units: Any, edition: Any, reading: Any) -> Any:
    """Design spectral acceleration at 1 s, taken from a spectrum. ASCE/SEI 7-16: 21.4; 7-22: 21.4. Partly from memory: confirm."""
    return call("ELF_SD1_MULTI", T_i, S_ai, v_s, units, edition, reading)


@xw.func(category="Storyledger: Ground motion")
@xw.arg("S", "raw", doc="Parameter from the site-specific spectrum [g], above 0.")
@xw.arg("S_mapped", "raw", doc="The same parameter by the mapped procedure [g], above 0.")
@xw.ret("raw")
def ELF_SITE_FLOOR(S: Any, S_mapped: Any) -> Any:
    """A parameter from a site-specific spectrum, at least 80 % of the mapped procedure's. ASCE/SEI 7-16: 21.4. Partly from memory: confirm."""
    return call("ELF_SITE_FLOOR", S, S_mapped)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.ret("raw")
def ELF_SDC_SDS(S_DS: Any, risk_category: Any) -> Any:
    """Seismic Design Category by the acceleration at short periods alone. ASCE/SEI 7-16: 11.6, Table 11.6-1; 7-22: 11.6, Table 11.6-1."""
    return call("ELF_SDC_SDS", S_DS, risk_category)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.ret("raw")
def ELF_SDC_SD1(S_D1: Any, risk_category: Any) -> Any:
    """Seismic Design Category by the acceleration at 1 s alone. ASCE/SEI 7-16: 11.6, Table 11.6-2; 7-22: 11.6, Table 11.6-2."""
    return call("ELF_SDC_SD1", S_D1, risk_category)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("T_a_below", "raw", doc="T_a below 0.8 T_S in both directions: yes, no.")
@xw.arg("T_drift_below", "raw", doc="Period used for drift below T_S in both directions: yes, no.")
@xw.arg("plateau_used", "raw", doc="C_s taken as S_DS/(R/I_e): yes, no.")
@xw.arg(
    "rigid_diaphragms",
    "raw",
    doc="Diaphragms rigid, or vertical elements at most 40 ft (12.2 m) apart: yes, no.",
)
@xw.ret("raw")
def ELF_SDC_ALONE(
    S_1: Any, T_a_below: Any, T_drift_below: Any, plateau_used: Any, rigid_diaphragms: Any
) -> Any:
    """Whether the table at short periods may decide alone on the Seismic Design Category. ASCE/SEI 7-16: 11.6; 7-22: 11.6. Partly from memory: confirm."""
    return call("ELF_SDC_ALONE", S_1, T_a_below, T_drift_below, plateau_used, rigid_diaphragms)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.arg("alone", "raw", doc="Whether Table 11.6-1 decides alone; no if left out: yes, no.")
@xw.ret("raw")
def ELF_SDC(S_DS: Any, S_D1: Any, S_1: Any, risk_category: Any, alone: Any = OMITTED) -> Any:
    """Seismic Design Category. ASCE/SEI 7-16: 11.6; 7-22: 11.6."""
    return call("ELF_SDC", S_DS, S_D1, S_1, risk_category, alone)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.arg("alone", "raw", doc="Whether Table 11.6-1 decides alone; no if left out: yes, no.")
@xw.ret("raw")
def ELF_SDC_REASON(S_DS: Any, S_D1: Any, S_1: Any, risk_category: Any, alone: Any = OMITTED) -> Any:
    """The rule or table that gives the Seismic Design Category. ASCE/SEI 7-16: 11.6; 7-22: 11.6."""
    return call("ELF_SDC_REASON", S_DS, S_D1, S_1, risk_category, alone)


@xw.func(category="Storyledger: Seismic design category")
@xw.arg("S_S", "raw", doc="Mapped MCE_R spectral acceleration at short periods [g], at least 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.ret("raw")
def ELF_SDC_A_PERMITTED(S_S: Any, S_1: Any) -> Any:
    """Whether Seismic Design Category A is permitted by the mapped accelerations alone. ASCE/SEI 7-16: 11.4.2. Partly from memory: confirm."""
    return call("ELF_SDC_A_PERMITTED", S_S, S_1)


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


@xw.func(category="Storyledger: Period")
@xw.arg("N", "raw", doc="Number of stories above the base [no unit], at least 1.")
@xw.arg("h_n", "raw", doc="Structural height, in ft (us) or m (si) [a length unit], above 0.")
@xw.arg("frames", "raw", doc="Whether moment frames of concrete or steel alone resist the force: yes, no.")
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_TA_STORIES_STATUS(N: Any, h_n: Any, frames: Any, units: Any) -> Any:
    """Whether the approximate period may be taken as 0.1 N. ASCE/SEI 7-16: 12.8.2.1, Eq. 12.8-8; 7-22: 12.8.2.1, Eq. 12.8-9. Partly from memory: confirm."""
    return call("ELF_TA_STORIES_STATUS", N, h_n, frames, units)


@xw.func(category="Storyledger: Period")
@xw.arg("T_a", "raw", doc="Approximate fundamental period [s], above 0.")
@xw.arg("C_u", "raw", doc="Coefficient for the upper limit on the period [no unit], at least 1.")
@xw.arg("T_computed", "raw", doc="Period from a structural analysis [s], above 0.")
@xw.ret("raw")
def ELF_PERIOD_GOVERNS(T_a: Any, C_u: Any, T_computed: Any) -> Any:
    """Whether the computed period or its upper limit C_u T_a is used for strength. ASCE/SEI 7-16: 12.8.2; 7-22: 12.8.2."""
    return call("ELF_PERIOD_GOVERNS", T_a, C_u, T_computed)


@xw.func(category="Storyledger: Period")
@xw.arg("T_a", "raw", doc="Approximate fundamental period [s], above 0.")
@xw.arg("C_u", "raw", doc="Coefficient for the upper limit on the period [no unit], at least 1.")
@xw.arg("T_computed", "raw", doc="Period from a structural analysis [s], above 0.")
@xw.arg("cap", "raw", doc="Whether the relief for drift is used: without the cap, with the cap.")
@xw.ret("raw")
def ELF_PERIOD_DRIFT(T_a: Any, C_u: Any, T_computed: Any, cap: Any) -> Any:
    """Period for drift alone: the computed one, with or without its upper limit C_u T_a. ASCE/SEI 7-16: 12.8.6.2; 7-22: 12.8.6.2. Partly from memory: confirm."""
    return call("ELF_PERIOD_DRIFT", T_a, C_u, T_computed, cap)


@xw.func(category="Storyledger: Period")
@xw.arg("A_B", "raw", doc="Area of the base [an area unit], above 0.")
@xw.arg("h_n", "raw", doc="Structural height [a length unit], above 0.")
@xw.arg(
    "wall_areas",
    "raw",
    doc="Web areas of the shear walls in the direction [an area unit], one cell a wall, above 0.",
)
@xw.arg("wall_lengths", "raw", doc="Lengths of the same walls [a length unit], one cell a wall, above 0.")
@xw.ret("raw")
def ELF_CW(A_B: Any, h_n: Any, wall_areas: Any, wall_lengths: Any) -> Any:
    """Effective ratio of shear wall area to base area, in per cent, for the approximate period. ASCE/SEI 7-16: 12.8.2.1, Eq. 12.8-10; 7-22: 12.8.2.1, Eq. 12.8-11. Partly from memory: confirm."""
    return call("ELF_CW", A_B, h_n, wall_areas, wall_lengths)


@xw.func(category="Storyledger: Period")
@xw.arg(
    "h_n",
    "raw",
    doc="Structural height, in ft (us) or m (si, at most 36.6) [a length unit], above 0 and at most 120.",
)
@xw.arg("C_w", "raw", doc="Effective wall area ratio in per cent [no unit], above 0.")
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_TA_WALLS(h_n: Any, C_w: Any, units: Any) -> Any:
    """Approximate period of structures with masonry or concrete shear walls, to 120 ft (36.6 m). ASCE/SEI 7-16: 12.8.2.1, Eq. 12.8-9; 7-22: 12.8.2.1, Eq. 12.8-10. Partly from memory: confirm."""
    return call("ELF_TA_WALLS", h_n, C_w, units)


@xw.func(category="Storyledger: Period")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg("forces", "raw", doc="Lateral forces on all levels [a force unit], one cell a level, at least 0.")
@xw.arg(
    "displacements",
    "raw",
    doc="Elastic displacements under these forces, in in (us) or mm (si) [a displacement unit], one cell a level, at least 0.",
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_RAYLEIGH(weights: Any, forces: Any, displacements: Any, units: Any) -> Any:
    """Computed period from the displacements of all levels under lateral forces. ASCE/SEI 7-16: 12.8.2; 7-22: 12.8.2."""
    return call("ELF_RAYLEIGH", weights, forces, displacements, units)


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
    """Upper bound of the seismic response coefficient from the period, on either side of T_L. ASCE/SEI 7-16: 12.8.1.1, Eq. 12.8-3, 12.8-4; 7-22: 12.8.1.1, Eq. 12.8-4, 12.8-5. Partly from memory: confirm."""
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
    """Governing seismic response coefficient of the two-period spectrum. ASCE/SEI 7-16: 12.8.1.1; 7-22: 12.8.1.1. Partly from memory: confirm."""
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
    """The bound that governs the seismic response coefficient, with its equation number. ASCE/SEI 7-16: 12.8.1.1; 7-22: 12.8.1.1. Partly from memory: confirm."""
    return call("ELF_CS_GOVERNS", S_DS, S_D1, S_1, T, T_L, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("C_s", "raw", doc="Seismic response coefficient [no unit], above 0.")
@xw.arg("W", "raw", doc="Effective seismic weight of the building [a force unit], above 0.")
@xw.ret("raw")
def ELF_V(C_s: Any, W: Any) -> Any:
    """Seismic base shear. ASCE/SEI 7-16: 12.8.1, Eq. 12.8-1; 7-22: 12.8.1, Eq. 12.8-1."""
    return call("ELF_V", C_s, W)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_a", "raw", doc="Multi-period spectrum at T, no less than its peak left of the peak [g], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_MULTI_BOUND(S_a: Any, R: Any, I_e: Any) -> Any:
    """Seismic response coefficient of the multi-period spectrum, before the minimums. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_CS_MULTI_BOUND", S_a, R, I_e)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_a", "raw", doc="Multi-period spectrum at T, no less than its peak left of the peak [g], above 0.")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("edition", "raw", doc="Edition of ASCE/SEI 7 that has the method, as text: 7-22.")
@xw.ret("raw")
def ELF_CS_MULTI(S_a: Any, S_DS: Any, S_1: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """Governing seismic response coefficient of the multi-period spectrum. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_CS_MULTI", S_a, S_DS, S_1, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_a", "raw", doc="Multi-period spectrum at T, no less than its peak left of the peak [g], above 0.")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("edition", "raw", doc="Edition of ASCE/SEI 7 that has the method, as text: 7-22.")
@xw.ret("raw")
def ELF_CS_MULTI_GOVERNS(S_a: Any, S_DS: Any, S_1: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """The bound that governs C_s of the multi-period spectrum, with its equation number. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_CS_MULTI_GOVERNS", S_a, S_DS, S_1, R, I_e, edition)


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
def ELF_CS_DRIFT(S_DS: Any, S_D1: Any, S_1: Any, T: Any, T_L: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """C_s for drift alone, two-period spectrum: without the minimum 0.044 S_DS I_e. ASCE/SEI 7-16: 12.8.6.1; 7-22: 12.8.6.1. Partly from memory: confirm."""
    return call("ELF_CS_DRIFT", S_DS, S_D1, S_1, T, T_L, R, I_e, edition)


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
def ELF_CS_DRIFT_GOVERNS(
    S_DS: Any, S_D1: Any, S_1: Any, T: Any, T_L: Any, R: Any, I_e: Any, edition: Any
) -> Any:
    """The bound that governs C_s for drift alone, two-period spectrum. ASCE/SEI 7-16: 12.8.6.1; 7-22: 12.8.6.1. Partly from memory: confirm."""
    return call("ELF_CS_DRIFT_GOVERNS", S_DS, S_D1, S_1, T, T_L, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_a", "raw", doc="Multi-period spectrum at T, no less than its peak left of the peak [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("edition", "raw", doc="Edition of ASCE/SEI 7 that has the method, as text: 7-22.")
@xw.ret("raw")
def ELF_CS_DRIFT_MULTI(S_a: Any, S_1: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """C_s for drift alone, multi-period spectrum: without the minimum 0.044 S_DS I_e. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_CS_DRIFT_MULTI", S_a, S_1, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_a", "raw", doc="Multi-period spectrum at T, no less than its peak left of the peak [g], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("edition", "raw", doc="Edition of ASCE/SEI 7 that has the method, as text: 7-22.")
@xw.ret("raw")
def ELF_CS_DRIFT_MULTI_GOVERNS(S_a: Any, S_1: Any, R: Any, I_e: Any, edition: Any) -> Any:
    """The bound that governs C_s for drift alone, multi-period spectrum. ASCE/SEI 7-22: 12.8.1.1, Eq. 12.8-2. Partly from memory: confirm."""
    return call("ELF_CS_DRIFT_MULTI_GOVERNS", S_a, S_1, R, I_e, edition)


@xw.func(category="Storyledger: Base shear")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg(
    "N", "raw", doc="Stories above the lower of base and grade plane, with mezzanines [no unit], at least 1."
)
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("regular", "raw", doc="Whether the structure is free of the irregularities of 12.3.2: yes, no.")
@xw.arg("redundant", "raw", doc="Whether it qualifies for rho = 1.0: yes, no.")
@xw.arg("soft_site", "raw", doc="Whether the site class is E or F (DE in 7-22: uncertain): yes, no.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.ret("raw")
def ELF_SDS_CAP(
    S_DS: Any, N: Any, T: Any, regular: Any, redundant: Any, soft_site: Any, risk_category: Any
) -> Any:
    """S_DS for C_s and E_v: max(1.0, 0.7 S_DS) for a short regular building, where that is less. ASCE/SEI 7-16: 12.8.1.3; 7-22: 12.8.1.3. Partly from memory: confirm."""
    return call("ELF_SDS_CAP", S_DS, N, T, regular, redundant, soft_site, risk_category)


@xw.func(category="Storyledger: Base shear")
@xw.arg(
    "N", "raw", doc="Stories above the lower of base and grade plane, with mezzanines [no unit], at least 1."
)
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("regular", "raw", doc="Whether the structure is free of the irregularities of 12.3.2: yes, no.")
@xw.arg("redundant", "raw", doc="Whether it qualifies for rho = 1.0: yes, no.")
@xw.arg("soft_site", "raw", doc="Whether the site class is E or F (DE in 7-22: uncertain): yes, no.")
@xw.arg("risk_category", "raw", doc="Risk category: I, II, III, IV.")
@xw.ret("raw")
def ELF_SDS_CAP_STATUS(
    N: Any, T: Any, regular: Any, redundant: Any, soft_site: Any, risk_category: Any
) -> Any:
    """Whether S_DS may be capped for a short regular building, and what fails. ASCE/SEI 7-16: 12.8.1.3; 7-22: 12.8.1.3. Partly from memory: confirm."""
    return call("ELF_SDS_CAP_STATUS", N, T, regular, redundant, soft_site, risk_category)


@xw.func(category="Storyledger: Base shear")
@xw.arg("V", "raw", doc="Base shear without interaction [a force unit], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.ret("raw")
def ELF_SSI_MIN(V: Any, R: Any) -> Any:
    """Least base shear when it is reduced for soil-structure interaction. ASCE/SEI 7-16: 19.2; 7-22: 19.2. Partly from memory: confirm."""
    return call("ELF_SSI_MIN", V, R)


@xw.func(category="Storyledger: Vertical distribution")
@xw.arg("T", "raw", doc="Fundamental period [s], above 0.")
@xw.arg("rule", "raw", doc="Between 0.5 s and 2.5 s: interpolate, or the permitted two: interpolate, two.")
@xw.ret("raw")
def ELF_EXPONENT(T: Any, rule: Any = OMITTED) -> Any:
    """Exponent k of the vertical distribution. ASCE/SEI 7-16: 12.8.3; 7-22: 12.8.3. Partly from memory: confirm."""
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
@xw.arg("x_M", "raw", doc="Place of the centre of mass [a length unit], any number.")
@xw.arg("x_R", "raw", doc="Place of the centre of rigidity on the same axis [a length unit], any number.")
@xw.ret("raw")
def ELF_ECC(x_M: Any, x_R: Any) -> Any:
    """Eccentricity between the centre of mass and the centre of rigidity, signed. ASCE/SEI 7-16: 12.8.4.1; 7-22: 12.8.4.1."""
    return call("ELF_ECC", x_M, x_R)


@xw.func(category="Storyledger: Torsion")
@xw.arg("L_perp", "raw", doc="Plan dimension perpendicular to the force [a length unit], above 0.")
@xw.ret("raw")
def ELF_ECC_ACC(L_perp: Any) -> Any:
    """Accidental offset of the centre of mass, to either side. ASCE/SEI 7-16: 12.8.4.2; 7-22: 12.8.4.2."""
    return call("ELF_ECC_ACC", L_perp)


@xw.func(category="Storyledger: Torsion")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("x_R", "raw", doc="Place of the centre of rigidity of the story [a length unit], any number.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "centers",
    "raw",
    doc="Places of the centres of mass of all levels, or eccentricities with x_R = 0 [a length unit], one cell a level, any number.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MT(h_x: Any, x_R: Any, forces: Any, centers: Any, heights: Any) -> Any:
    """Inherent torsion of the story below a level, about the story's centre of rigidity. ASCE/SEI 7-16: 12.8.4.1; 7-22: 12.8.4.1."""
    return call("ELF_MT", h_x, x_R, forces, centers, heights)


@xw.func(category="Storyledger: Torsion")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "dimensions",
    "raw",
    doc="Plan dimensions of all levels perpendicular to the force [a length unit], one cell a level, above 0.",
)
@xw.arg(
    "amplifications",
    "raw",
    doc="Factors A_x of all levels, 1 where none applies [no unit], one cell a level, at least 1 and at most 3.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MTA(h_x: Any, forces: Any, dimensions: Any, amplifications: Any, heights: Any) -> Any:
    """Accidental torsion of the story below a level, to be taken with either sign. ASCE/SEI 7-16: 12.8.4.2; 7-22: 12.8.4.2."""
    return call("ELF_MTA", h_x, forces, dimensions, amplifications, heights)


@xw.func(category="Storyledger: Torsion")
@xw.arg("TIR", "raw", doc="Torsional irregularity ratio [no unit], at least 1.")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_MTA_SCOPE(TIR: Any, SDC: Any, edition: Any) -> Any:
    """Where accidental torsion counts: in the test of irregularity alone, or in forces too. ASCE/SEI 7-16: 12.8.4.2; 7-22: 12.8.4.2. Partly from memory: confirm."""
    return call("ELF_MTA_SCOPE", TIR, SDC, edition)


@xw.func(category="Storyledger: Torsion")
@xw.arg(
    "Delta_1", "raw", doc="Story drift at one edge, found with A_x = 1 [a displacement unit], any number."
)
@xw.arg(
    "Delta_2",
    "raw",
    doc="Story drift at the opposite edge, same sign convention [a displacement unit], any number.",
)
@xw.ret("raw")
def ELF_TIR(Delta_1: Any, Delta_2: Any) -> Any:
    """Torsional irregularity ratio of a story from the drifts at two opposite edges. ASCE/SEI 7-16: 12.3.2.1, Table 12.3-1; 7-22: 12.3.2.1, Table 12.3-1. Partly from memory: confirm."""
    return call("ELF_TIR", Delta_1, Delta_2)


@xw.func(category="Storyledger: Torsion")
@xw.arg(
    "d_max", "raw", doc="Largest displacement at level x, found with A_x = 1 [a displacement unit], above 0."
)
@xw.arg("d_avg", "raw", doc="Average of the extreme points at level x [a displacement unit], above 0.")
@xw.ret("raw")
def ELF_AX(d_max: Any, d_avg: Any) -> Any:
    """Torsional amplification factor of a level, between 1 and 3. ASCE/SEI 7-16: 12.8.4.3, Eq. 12.8-14; 7-22: 12.8.4.3, Eq. 12.8-15. Partly from memory: confirm."""
    return call("ELF_AX", d_max, d_avg)


@xw.func(category="Storyledger: Torsion")
@xw.arg(
    "d_max", "raw", doc="Largest displacement at level x, found with A_x = 1 [a displacement unit], above 0."
)
@xw.arg("d_avg", "raw", doc="Average of the extreme points at level x [a displacement unit], above 0.")
@xw.arg("TIR", "raw", doc="Torsional irregularity ratio [no unit], at least 1.")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.ret("raw")
def ELF_AX_APPLIED(d_max: Any, d_avg: Any, TIR: Any, SDC: Any) -> Any:
    """Torsional amplification factor where it applies, else 1. ASCE/SEI 7-16: 12.8.4.3, Eq. 12.8-14; 7-22: 12.8.4.3, Eq. 12.8-15. Partly from memory: confirm."""
    return call("ELF_AX_APPLIED", d_max, d_avg, TIR, SDC)


@xw.func(category="Storyledger: Torsion")
@xw.arg("rigidities", "raw", doc="Relative rigidities of the walls [no unit], one cell a wall, above 0.")
@xw.arg(
    "positions",
    "raw",
    doc="Places of the walls across the direction [a length unit], one cell a wall, any number.",
)
@xw.ret("raw")
def ELF_RIGIDITY_CENTER(rigidities: Any, positions: Any) -> Any:
    """Centre of rigidity of the walls that resist one direction. ASCE/SEI 7-16: 12.8.4; 7-22: 12.8.4."""
    return call("ELF_RIGIDITY_CENTER", rigidities, positions)


@xw.func(category="Storyledger: Torsion")
@xw.arg("rigidities", "raw", doc="Relative rigidities of the walls [no unit], one cell a wall, above 0.")
@xw.arg(
    "distances",
    "raw",
    doc="Distances of the walls from the centre of rigidity [a length unit], one cell a wall, any number.",
)
@xw.ret("raw")
def ELF_RIGIDITY_POLAR(rigidities: Any, distances: Any) -> Any:
    """Polar rigidity of the walls of both directions about the centre of rigidity. ASCE/SEI 7-16: 12.8.4; 7-22: 12.8.4."""
    return call("ELF_RIGIDITY_POLAR", rigidities, distances)


@xw.func(category="Storyledger: Torsion")
@xw.arg("V", "raw", doc="Story shear of the direction [a force unit], at least 0.")
@xw.arg("R_i", "raw", doc="Relative rigidity of the wall [no unit], above 0.")
@xw.arg("rigidities", "raw", doc="Relative rigidities of the walls [no unit], one cell a wall, above 0.")
@xw.ret("raw")
def ELF_WALL_DIRECT(V: Any, R_i: Any, rigidities: Any) -> Any:
    """Share of a wall in the story shear, without torsion. ASCE/SEI 7-16: 12.8.4; 7-22: 12.8.4."""
    return call("ELF_WALL_DIRECT", V, R_i, rigidities)


@xw.func(category="Storyledger: Torsion")
@xw.arg("M_t", "raw", doc="Torsion of the story [a moment unit], any number.")
@xw.arg("R_i", "raw", doc="Relative rigidity of the wall [no unit], above 0.")
@xw.arg("d_i", "raw", doc="Distance of the wall from the centre of rigidity [a length unit], any number.")
@xw.arg("J", "raw", doc="Polar rigidity of all walls [no unit], above 0.")
@xw.ret("raw")
def ELF_WALL_TORSION(M_t: Any, R_i: Any, d_i: Any, J: Any) -> Any:
    """Shear of a wall from torsion about the centre of rigidity, signed. ASCE/SEI 7-16: 12.8.4; 7-22: 12.8.4."""
    return call("ELF_WALL_TORSION", M_t, R_i, d_i, J)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Lateral stiffnesses of all stories [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_SOFT_RATIO(h_x: Any, stiffnesses: Any, heights: Any) -> Any:
    """Stiffness of a story over that of the story above; 1 at the top. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_SOFT_RATIO", h_x, stiffnesses, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Lateral stiffnesses of all stories [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_SOFT_RATIO_THREE(h_x: Any, stiffnesses: Any, heights: Any) -> Any:
    """Stiffness of a story over the mean of three stories above; 1 where fewer stand above. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_SOFT_RATIO_THREE", h_x, stiffnesses, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg("strengths", "raw", doc="Lateral strengths of all stories [a force unit], one cell a level, above 0.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_WEAK_RATIO(h_x: Any, strengths: Any, heights: Any) -> Any:
    """Strength of a story over that of the story above; 1 at the top. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_WEAK_RATIO", h_x, strengths, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_WEIGHT_RATIO(h_x: Any, weights: Any, heights: Any) -> Any:
    """Weight of a level over the lighter one of its neighbours; a lighter roof is left out. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2."""
    return call("ELF_WEIGHT_RATIO", h_x, weights, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "dimensions",
    "raw",
    doc="Dimensions of the force-resisting system, by story [a length unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_GEOMETRY_RATIO(h_x: Any, dimensions: Any, heights: Any) -> Any:
    """Dimension of the force-resisting system in a story over the smaller one of its neighbours. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_GEOMETRY_RATIO", h_x, dimensions, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "drift_ratios", "raw", doc="Story drift ratios, torsion left out [no unit], one cell a level, above 0."
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_DRIFT_RATIO_ABOVE(h_x: Any, drift_ratios: Any, heights: Any) -> Any:
    """Story drift ratio over that of the story above; 1 for the top two stories. ASCE/SEI 7-16: 12.3.2.2; 7-22: 12.3.2.2. Partly from memory: confirm."""
    return call("ELF_DRIFT_RATIO_ABOVE", h_x, drift_ratios, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg(
    "drift_ratios", "raw", doc="Story drift ratios, torsion left out [no unit], one cell a level, above 0."
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_DRIFT_EXCEPTION(drift_ratios: Any, heights: Any) -> Any:
    """Whether the exception by story drift ratios holds for the building: yes or no. ASCE/SEI 7-16: 12.3.2.2; 7-22: 12.3.2.2. Partly from memory: confirm."""
    return call("ELF_DRIFT_EXCEPTION", drift_ratios, heights)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("p_x", "raw", doc="Projection beyond the corner along x [a length unit], at least 0.")
@xw.arg("p_y", "raw", doc="Projection beyond the corner along y [a length unit], at least 0.")
@xw.arg("L_x", "raw", doc="Plan dimension along x [a length unit], above 0.")
@xw.arg("L_y", "raw", doc="Plan dimension along y [a length unit], above 0.")
@xw.ret("raw")
def ELF_REENTRANT_RATIO(p_x: Any, p_y: Any, L_x: Any, L_y: Any) -> Any:
    """Smaller one of both projections beyond a re-entrant corner, in parts of the plan dimension. ASCE/SEI 7-16: 12.3.2.1, Table 12.3-1; 7-22: 12.3.2.1, Table 12.3-1. Partly from memory: confirm."""
    return call("ELF_REENTRANT_RATIO", p_x, p_y, L_x, L_y)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("TIR", "raw", doc="Torsional irregularity ratio [no unit], at least 1.")
@xw.arg("diaphragm", "raw", doc="Diaphragm, by 12.3.1: rigid or semirigid, flexible.")
@xw.arg(
    "one_sided",
    "raw",
    doc="More than 75 % of a story's strength at or on one side of the centre of mass (7-22 alone): yes, no.",
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_TORSION_STATUS(TIR: Any, diaphragm: Any, one_sided: Any, edition: Any) -> Any:
    """Torsional irregularity of a story, with the type of the edition. ASCE/SEI 7-16: 12.3.2.1, Table 12.3-1; 7-22: 12.3.2.1, Table 12.3-1. Partly from memory: confirm."""
    return call("ELF_TORSION_STATUS", TIR, diaphragm, one_sided, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("ratio", "raw", doc="Smaller projection in parts of the plan dimension [no unit], at least 0.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_REENTRANT_STATUS(ratio: Any, edition: Any) -> Any:
    """Re-entrant corner irregularity, with its type and limit. ASCE/SEI 7-16: 12.3.2.1, Table 12.3-1; 7-22: 12.3.2.1, Table 12.3-1. Partly from memory: confirm."""
    return call("ELF_REENTRANT_STATUS", ratio, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg(
    "opening",
    "raw",
    doc="Open area over gross enclosed area of the diaphragm [no unit], at least 0 and at most 1.",
)
@xw.arg(
    "change", "raw", doc="Change of diaphragm stiffness from story to story, in parts [no unit], at least 0."
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_DIAPHRAGM_STATUS(opening: Any, change: Any, edition: Any) -> Any:
    """Diaphragm discontinuity by openings or a change of stiffness, with its type. ASCE/SEI 7-16: 12.3.2.1, Table 12.3-1; 7-22: 12.3.2.1, Table 12.3-1."""
    return call("ELF_DIAPHRAGM_STATUS", opening, change, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Lateral stiffnesses of all stories [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg(
    "drift_exception",
    "raw",
    doc="No story drift ratio above 1.3 times that of the story above (12.3.2.2): yes, no.",
)
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_SOFT_STATUS(
    h_x: Any, stiffnesses: Any, heights: Any, drift_exception: Any, SDC: Any, edition: Any
) -> Any:
    """Soft story irregularity, with its type and the exception that frees it. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_SOFT_STATUS", h_x, stiffnesses, heights, drift_exception, SDC, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg(
    "drift_exception",
    "raw",
    doc="No story drift ratio above 1.3 times that of the story above (12.3.2.2): yes, no.",
)
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_WEIGHT_STATUS(
    h_x: Any, weights: Any, heights: Any, drift_exception: Any, SDC: Any, edition: Any
) -> Any:
    """Weight irregularity, with its type and the exception that frees it; no type of 7-22. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2."""
    return call("ELF_WEIGHT_STATUS", h_x, weights, heights, drift_exception, SDC, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg(
    "dimensions",
    "raw",
    doc="Dimensions of the force-resisting system, by story [a length unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_GEOMETRY_STATUS(h_x: Any, dimensions: Any, heights: Any, edition: Any) -> Any:
    """Vertical geometric irregularity, with its type. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_GEOMETRY_STATUS", h_x, dimensions, heights, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("h_x", "raw", doc="Height of the level on top of the story, above the base [a length unit], above 0.")
@xw.arg("strengths", "raw", doc="Lateral strengths of all stories [a force unit], one cell a level, above 0.")
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_WEAK_STATUS(h_x: Any, strengths: Any, heights: Any, edition: Any) -> Any:
    """Weak story irregularity, with its type. ASCE/SEI 7-16: 12.3.2.2, Table 12.3-2; 7-22: 12.3.2.2, Table 12.3-2. Partly from memory: confirm."""
    return call("ELF_WEAK_STATUS", h_x, strengths, heights, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg(
    "irregularity",
    "raw",
    doc="Irregularity: out-of-plane offset, nonparallel system, in-plane discontinuity.",
)
@xw.arg("exists", "raw", doc="Whether it exists: yes, no.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_IRREGULARITY(irregularity: Any, exists: Any, edition: Any) -> Any:
    """An irregularity that is read off the plans, with its type. ASCE/SEI 7-16: 12.3.2; 7-22: 12.3.2."""
    return call("ELF_IRREGULARITY", irregularity, exists, edition)


@xw.func(category="Storyledger: Irregularity")
@xw.arg("irregularity", "raw", doc="Irregularity: 13 texts from 'torsional' to 'extreme weak story'.")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_CONSEQUENCE(irregularity: Any, SDC: Any, edition: Any) -> Any:
    """What an irregularity entails in a Seismic Design Category, clause by clause. ASCE/SEI 7-16: 12.3.3; 7-22: 12.3.3. Partly from memory: confirm."""
    return call("ELF_CONSEQUENCE", irregularity, SDC, edition)


@xw.func(category="Storyledger: Redundancy")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "configuration",
    "raw",
    doc="Condition of 12.3.4.2 that the direction meets: none, a: loss of one element, b: regular plan with two bays a side.",
)
@xw.arg("TIR_X", "raw", doc="Largest torsional irregularity ratio, forces along X [no unit], at least 1.")
@xw.arg("TIR_Y", "raw", doc="Largest torsional irregularity ratio, forces along Y [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_RHO(SDC: Any, configuration: Any, TIR_X: Any, TIR_Y: Any, edition: Any) -> Any:
    """Redundancy factor of one direction. ASCE/SEI 7-16: 12.3.4.2; 7-22: 12.3.4.2. Partly from memory: confirm."""
    return call("ELF_RHO", SDC, configuration, TIR_X, TIR_Y, edition)


@xw.func(category="Storyledger: Redundancy")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.arg(
    "configuration",
    "raw",
    doc="Condition of 12.3.4.2 that the direction meets: none, a: loss of one element, b: regular plan with two bays a side.",
)
@xw.arg("TIR_X", "raw", doc="Largest torsional irregularity ratio, forces along X [no unit], at least 1.")
@xw.arg("TIR_Y", "raw", doc="Largest torsional irregularity ratio, forces along Y [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_RHO_REASON(SDC: Any, configuration: Any, TIR_X: Any, TIR_Y: Any, edition: Any) -> Any:
    """Why the redundancy factor is what it is. ASCE/SEI 7-16: 12.3.4.2; 7-22: 12.3.4.2. Partly from memory: confirm."""
    return call("ELF_RHO_REASON", SDC, configuration, TIR_X, TIR_Y, edition)


@xw.func(category="Storyledger: Redundancy")
@xw.arg(
    "use",
    "raw",
    doc="What it is used for: strength, transfer forces, drift and P-delta, inertial diaphragm forces, overstrength, nonstructural components, nonbuilding structures, walls out of plane, damped structures.",
)
@xw.arg("rho", "raw", doc="Redundancy factor [no unit], at least 1 and at most 1.3.")
@xw.ret("raw")
def ELF_RHO_USE(use: Any, rho: Any) -> Any:
    """Redundancy factor that counts in a use: rho for strength and transfer forces, else 1.0. ASCE/SEI 7-16: 12.3.4.1; 7-22: 12.3.4.1."""
    return call("ELF_RHO_USE", use, rho)


@xw.func(category="Storyledger: Redundancy")
@xw.arg("L_w", "raw", doc="Length of the shear wall [a length unit], above 0.")
@xw.arg("h_sx", "raw", doc="Story height [a length unit], above 0.")
@xw.arg("light_frame", "raw", doc="Light-frame wall: yes, no.")
@xw.ret("raw")
def ELF_WALL_BAYS(L_w: Any, h_sx: Any, light_frame: Any) -> Any:
    """Bays that a shear wall counts for in condition b of the redundancy factor. ASCE/SEI 7-16: 12.3.4.2; 7-22: 12.3.4.2."""
    return call("ELF_WALL_BAYS", L_w, h_sx, light_frame)


@xw.func(category="Storyledger: Redundancy")
@xw.arg("V_x", "raw", doc="Story shear [a force unit], at least 0.")
@xw.arg("V", "raw", doc="Base shear [a force unit], above 0.")
@xw.ret("raw")
def ELF_RHO_STORY(V_x: Any, V: Any) -> Any:
    """Whether a story counts for the conditions of the redundancy factor: yes or no. ASCE/SEI 7-16: 12.3.4.2; 7-22: 12.3.4.2. Partly from memory: confirm."""
    return call("ELF_RHO_STORY", V_x, V)


@xw.func(category="Storyledger: Load effects")
@xw.arg("rho", "raw", doc="Redundancy factor [no unit], at least 1 and at most 1.3.")
@xw.arg(
    "Q_E",
    "raw",
    doc="Effect of the horizontal seismic forces, in any unit of an effect [a force unit], any number.",
)
@xw.ret("raw")
def ELF_EH(rho: Any, Q_E: Any) -> Any:
    """Horizontal seismic load effect. ASCE/SEI 7-16: 12.4.2.1, Eq. 12.4-3; 7-22: 12.4.2.1, Eq. 12.4-3."""
    return call("ELF_EH", rho, Q_E)


@xw.func(category="Storyledger: Load effects")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("D", "raw", doc="Effect of dead load, in any unit of an effect [a force unit], any number.")
@xw.arg(
    "taken",
    "raw",
    doc="How it is taken: counted, zero in Seismic Design Category B, zero at the foundation-soil interface.",
)
@xw.ret("raw")
def ELF_EV(S_DS: Any, D: Any, taken: Any) -> Any:
    """Vertical seismic load effect, or zero by one of the two cases of the clause. ASCE/SEI 7-16: 12.4.2.2, Eq. 12.4-4a; 7-22: 12.4.2.2, Eq. 12.4-4a. Partly from memory: confirm."""
    return call("ELF_EV", S_DS, D, taken)


@xw.func(category="Storyledger: Load effects")
@xw.arg("S_av", "raw", doc="Design vertical spectral acceleration by 11.9 [g], above 0.")
@xw.arg("D", "raw", doc="Effect of dead load, in any unit of an effect [a force unit], any number.")
@xw.ret("raw")
def ELF_EV_SPECTRUM(S_av: Any, D: Any) -> Any:
    """Vertical seismic load effect from the vertical response spectrum. ASCE/SEI 7-16: 12.4.2.2, Eq. 12.4-4b; 7-22: 12.4.2.2, Eq. 12.4-4b. Partly from memory: confirm."""
    return call("ELF_EV_SPECTRUM", S_av, D)


@xw.func(category="Storyledger: Load effects")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg(
    "Q_E",
    "raw",
    doc="Effect of the horizontal seismic forces, in any unit of an effect [a force unit], any number.",
)
@xw.ret("raw")
def ELF_EMH(Omega_0: Any, Q_E: Any) -> Any:
    """Horizontal seismic load effect with overstrength. ASCE/SEI 7-16: 12.4.3.1, Eq. 12.4-7; 7-22: 12.4.3.1, Eq. 12.4-7. Partly from memory: confirm."""
    return call("ELF_EMH", Omega_0, Q_E)


@xw.func(category="Storyledger: Load effects")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg(
    "Q_E",
    "raw",
    doc="Effect of the horizontal seismic forces, in any unit of an effect [a force unit], any number.",
)
@xw.arg(
    "E_cl", "raw", doc="Capacity-limited effect, a magnitude in the unit of Q_E [a force unit], at least 0."
)
@xw.ret("raw")
def ELF_EMH_LIMITED(Omega_0: Any, Q_E: Any, E_cl: Any) -> Any:
    """Horizontal seismic load effect with overstrength, at most the capacity-limited effect. ASCE/SEI 7-16: 12.4.3.2; 7-22: 12.4.3.2."""
    return call("ELF_EMH_LIMITED", Omega_0, Q_E, E_cl)


@xw.func(category="Storyledger: Load effects")
@xw.arg(
    "combination",
    "raw",
    doc="Load combination: 2.3.6 strength, 2.4.5 allowable stress: 2.3.6-6, 2.3.6-7, 2.4.5-8, 2.4.5-9, 2.4.5-10.",
)
@xw.arg("term", "raw", doc="Term: D, E_v, E_h, L, S.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_COMBINATION_FACTOR(combination: Any, term: Any, edition: Any) -> Any:
    """Factor on one term in a load combination; E_h stands for E_mh as well. ASCE/SEI 7-16: 2.3.6 and 2.4.5; 7-22: 2.3.6 and 2.4.5. Partly from memory: confirm."""
    return call("ELF_COMBINATION_FACTOR", combination, term, edition)


@xw.func(category="Storyledger: Load effects")
@xw.arg(
    "combination",
    "raw",
    doc="Load combination: 2.3.6 strength, 2.4.5 allowable stress: 2.3.6-6, 2.3.6-7, 2.4.5-8, 2.4.5-9, 2.4.5-10.",
)
@xw.arg("D", "raw", doc="Effect of dead load, in any unit of an effect [a force unit], any number.")
@xw.arg("E_v", "raw", doc="Vertical seismic effect, in the unit of D [a force unit], any number.")
@xw.arg("E_h", "raw", doc="Horizontal seismic effect, or E_mh, in the unit of D [a force unit], any number.")
@xw.arg("L", "raw", doc="Effect of live load, in the unit of D [a force unit], any number.")
@xw.arg("S", "raw", doc="Effect of snow load, in the unit of D [a force unit], any number.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_COMBINE(combination: Any, D: Any, E_v: Any, E_h: Any, L: Any, S: Any, edition: Any) -> Any:
    """Sum of a load combination; E_h acts both ways, so work it out with either sign. ASCE/SEI 7-16: 2.3.6 and 2.4.5; 7-22: 2.3.6 and 2.4.5. Partly from memory: confirm."""
    return call("ELF_COMBINE", combination, D, E_v, E_h, L, S, edition)


@xw.func(category="Storyledger: Load effects")
@xw.arg(
    "combination",
    "raw",
    doc="Load combination: 2.3.6 strength, 2.4.5 allowable stress: 2.3.6-6, 2.3.6-7, 2.4.5-8, 2.4.5-9, 2.4.5-10.",
)
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_DEAD_FACTOR(combination: Any, S_DS: Any, edition: Any) -> Any:
    """Factor on dead load in a combination, with the vertical seismic effect taken in. ASCE/SEI 7-16: 2.3.6 and 2.4.5; 7-22: 2.3.6 and 2.4.5. Partly from memory: confirm."""
    return call("ELF_DEAD_FACTOR", combination, S_DS, edition)


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
    """Allowable story drift; divided by rho where the clause on moment frames asks for it. ASCE/SEI 7-16: 12.12.1, Table 12.12-1; 12.12.1.1; 7-22: 12.12.1, Table 12.12-1; 12.12.1.1. Partly from memory: confirm."""
    return call("ELF_DRIFT_LIMIT", h_sx, structure, risk_category, rho)


@xw.func(category="Storyledger: Drift")
@xw.arg("TIR", "raw", doc="Torsional irregularity ratio [no unit], at least 1.")
@xw.arg("SDC", "raw", doc="Seismic Design Category: A, B, C, D, E, F.")
@xw.ret("raw")
def ELF_DRIFT_EDGES(TIR: Any, SDC: Any) -> Any:
    """Whether the design story drift is taken along the edges: yes or no. ASCE/SEI 7-16: 12.8.6; 7-22: 12.8.6."""
    return call("ELF_DRIFT_EDGES", TIR, SDC)


@xw.func(category="Storyledger: Drift")
@xw.arg(
    "Delta_cm", "raw", doc="Design story drift between the centres of mass [a displacement unit], any number."
)
@xw.arg("Delta_1", "raw", doc="Design story drift along one edge [a displacement unit], any number.")
@xw.arg("Delta_2", "raw", doc="Design story drift along the opposite edge [a displacement unit], any number.")
@xw.arg("edges", "raw", doc="Along the edges: yes, no.")
@xw.ret("raw")
def ELF_DRIFT_CHECKED(Delta_cm: Any, Delta_1: Any, Delta_2: Any, edges: Any) -> Any:
    """Design story drift that is compared with the allowable one: along the edges where due. ASCE/SEI 7-16: 12.8.6; 7-22: 12.8.6."""
    return call("ELF_DRIFT_CHECKED", Delta_cm, Delta_1, Delta_2, edges)


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
    """Diaphragm design force of a level, with its lower and upper limits. ASCE/SEI 7-16: 12.10.1.1, Eq. 12.10-1, 12.10-2, 12.10-3; 7-22: 12.10.1.1, Eq. 12.10-1, 12.10-2, 12.10-3."""
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
    """Which of the three diaphragm force equations governs at a level. ASCE/SEI 7-16: 12.10.1.1, Eq. 12.10-1, 12.10-2, 12.10-3; 7-22: 12.10.1.1, Eq. 12.10-1, 12.10-2, 12.10-3."""
    return call("ELF_FPX_GOVERNS", w_px, h_x, forces, weights, heights, S_DS, I_e)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg(
    "delta_MDD", "raw", doc="Largest in-plane deflection of the diaphragm [a displacement unit], at least 0."
)
@xw.arg("Delta_ADVE", "raw", doc="Mean drift of adjoining vertical elements [a displacement unit], above 0.")
@xw.ret("raw")
def ELF_FLEX_RATIO(delta_MDD: Any, Delta_ADVE: Any) -> Any:
    """Deflection of a diaphragm over the drift of the vertical elements beside it. ASCE/SEI 7-16: 12.3.1.3, Eq. 12.3-1; 7-22: 12.3.1.3, Eq. 12.3-1. Partly from memory: confirm."""
    return call("ELF_FLEX_RATIO", delta_MDD, Delta_ADVE)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg(
    "delta_MDD", "raw", doc="Largest in-plane deflection of the diaphragm [a displacement unit], at least 0."
)
@xw.arg("Delta_ADVE", "raw", doc="Mean drift of adjoining vertical elements [a displacement unit], above 0.")
@xw.ret("raw")
def ELF_FLEX_STATUS(delta_MDD: Any, Delta_ADVE: Any) -> Any:
    """Whether a diaphragm is flexible by calculation. ASCE/SEI 7-16: 12.3.1.3, Eq. 12.3-1; 7-22: 12.3.1.3, Eq. 12.3-1. Partly from memory: confirm."""
    return call("ELF_FLEX_STATUS", delta_MDD, Delta_ADVE)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("F_px", "raw", doc="Diaphragm design force of the level [a force unit], at least 0.")
@xw.arg("F_transfer", "raw", doc="Force transferred between vertical elements [a force unit], at least 0.")
@xw.arg("rho", "raw", doc="Redundancy factor [no unit], at least 1 and at most 1.3.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg("offset", "raw", doc="Transfer by an out-of-plane offset (horizontal Type 4): yes, no.")
@xw.ret("raw")
def ELF_FPX_TRANSFER(F_px: Any, F_transfer: Any, rho: Any, Omega_0: Any, offset: Any) -> Any:
    """Diaphragm force with the forces transferred through it. ASCE/SEI 7-16: 12.10.1.1; 7-22: 12.10.1.1. Partly from memory: confirm."""
    return call("ELF_FPX_TRANSFER", F_px, F_transfer, rho, Omega_0, offset)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg(
    "E_story", "raw", doc="Collector force under the story forces of 12.8 or 12.9 [a force unit], at least 0."
)
@xw.arg("E_sum", "raw", doc="Collector force under the forces of Eq. 12.10-1 [a force unit], at least 0.")
@xw.arg("E_low", "raw", doc="Collector force under the forces of Eq. 12.10-2 [a force unit], at least 0.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg("light_frame", "raw", doc="Braced by light-frame shear walls alone: yes, no.")
@xw.ret("raw")
def ELF_COLLECTOR(E_story: Any, E_sum: Any, E_low: Any, Omega_0: Any, light_frame: Any) -> Any:
    """Governing force of a collector, Seismic Design Category C to F. ASCE/SEI 7-16: 12.10.2.1; 7-22: 12.10.2.1. Partly from memory: confirm."""
    return call("ELF_COLLECTOR", E_story, E_sum, E_low, Omega_0, light_frame)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg(
    "E_story", "raw", doc="Collector force under the story forces of 12.8 or 12.9 [a force unit], at least 0."
)
@xw.arg("E_sum", "raw", doc="Collector force under the forces of Eq. 12.10-1 [a force unit], at least 0.")
@xw.arg("E_low", "raw", doc="Collector force under the forces of Eq. 12.10-2 [a force unit], at least 0.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg("light_frame", "raw", doc="Braced by light-frame shear walls alone: yes, no.")
@xw.ret("raw")
def ELF_COLLECTOR_GOVERNS(E_story: Any, E_sum: Any, E_low: Any, Omega_0: Any, light_frame: Any) -> Any:
    """Which force governs a collector. ASCE/SEI 7-16: 12.10.2.1; 7-22: 12.10.2.1. Partly from memory: confirm."""
    return call("ELF_COLLECTOR_GOVERNS", E_story, E_sum, E_low, Omega_0, light_frame)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg(
    "R_diaph",
    "raw",
    doc="Response modification coefficient of the diaphragm: confirm; recalled as 4.5 or 1.5 [no unit], at least 1.",
)
@xw.arg(
    "T_diaph",
    "raw",
    doc="Period of the diaphragm: confirm; recalled as 0.002 L_f (wood), 0.001 L_f (deck), L_f in ft [s], above 0.",
)
@xw.ret("raw")
def ELF_CS_DIAPH(S_DS: Any, S_D1: Any, I_e: Any, R_diaph: Any, T_diaph: Any) -> Any:
    """Response coefficient of a flexible diaphragm, one-story method: all of it uncertain. ASCE/SEI 7-22: 12.10.4. Partly from memory: confirm."""
    return call("ELF_CS_DIAPH", S_DS, S_D1, I_e, R_diaph, T_diaph)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("W_w", "raw", doc="Weight of the wall [a force unit], at least 0.")
@xw.ret("raw")
def ELF_FP_WALL(S_DS: Any, I_e: Any, W_w: Any) -> Any:
    """Force on a structural wall out of its plane. ASCE/SEI 7-16: 12.11.1; 7-22: 12.11.1. Partly from memory: confirm."""
    return call("ELF_FP_WALL", S_DS, I_e, W_w)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("L_f", "raw", doc="Span of the flexible diaphragm [a length unit], at least 0.")
@xw.arg("diaphragm", "raw", doc="Diaphragm: rigid, flexible.")
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_KA(L_f: Any, diaphragm: Any, units: Any) -> Any:
    """Amplification of the anchorage force by a flexible diaphragm. ASCE/SEI 7-16: 12.11.2.1, Eq. 12.11-2; 7-22: 12.11.2.1, Eq. 12.11-2. Partly from memory: confirm."""
    return call("ELF_KA", L_f, diaphragm, units)


@xw.func(category="Storyledger: Diaphragm")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("k_a", "raw", doc="Amplification by a flexible diaphragm [no unit], at least 1 and at most 2.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg("W_p", "raw", doc="Weight of the wall tributary to the anchor [a force unit], at least 0.")
@xw.ret("raw")
def ELF_FP_ANCHOR(S_DS: Any, k_a: Any, I_e: Any, W_p: Any) -> Any:
    """Anchorage force of a structural wall. ASCE/SEI 7-16: 12.11.2.1, Eq. 12.11-1; 7-22: 12.11.2.1, Eq. 12.11-1. Partly from memory: confirm."""
    return call("ELF_FP_ANCHOR", S_DS, k_a, I_e, W_p)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg(
    "system",
    "raw",
    doc="Seismic force-resisting system: buckling-restrained braced frame, moment frame, dual system with moment frame, all other.",
)
@xw.ret("raw")
def ELF_ZS(system: Any) -> Any:
    """Mode shape factor of a seismic force-resisting system, for diaphragms. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_ZS", system)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg(
    "diaphragm",
    "raw",
    doc="Diaphragm: cast-in-place concrete flexure, cast-in-place concrete shear, precast concrete elastic design, precast concrete basic design, precast concrete reduced design, wood sheathed.",
)
@xw.ret("raw")
def ELF_RS(diaphragm: Any) -> Any:
    """Design force reduction factor of a diaphragm; steel deck of 7-22 is your own entry. ASCE/SEI 7-16: 12.10.3.5, Table 12.10-1; 7-22: 12.10.3.5, Table 12.10-1. Partly from memory: confirm."""
    return call("ELF_RS", diaphragm)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CP0(S_DS: Any, I_e: Any) -> Any:
    """Diaphragm acceleration coefficient at the base. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_CP0", S_DS, I_e)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("z_s", "raw", doc="Mode shape factor [no unit], above 0.")
@xw.arg("N", "raw", doc="Stories above the base, a whole number [no unit], at least 1.")
@xw.arg("c_m1", "raw", doc="Coefficient, recalled as 0.5: confirm before you enter it [no unit], at least 0.")
@xw.ret("raw")
def ELF_GM1(z_s: Any, N: Any, c_m1: Any) -> Any:
    """First mode contribution factor; its coefficient is uncertain and an entry. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_GM1", z_s, N, c_m1)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("z_s", "raw", doc="Mode shape factor [no unit], above 0.")
@xw.arg("N", "raw", doc="Stories above the base, a whole number [no unit], at least 1.")
@xw.ret("raw")
def ELF_GM2(z_s: Any, N: Any) -> Any:
    """Higher mode contribution factor. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_GM2", z_s, N)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("N", "raw", doc="Stories above the base, a whole number [no unit], at least 1.")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_CS_HIGHER(N: Any, S_DS: Any, S_D1: Any, I_e: Any) -> Any:
    """Higher mode seismic response coefficient; 0 for one story. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_CS_HIGHER", N, S_DS, S_D1, I_e)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("C_p0", "raw", doc="Acceleration coefficient at the base [no unit], above 0.")
@xw.arg("G_m1", "raw", doc="First mode contribution factor [no unit], at least 1.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg("C_s", "raw", doc="Seismic response coefficient of 12.8 or 12.9 [no unit], above 0.")
@xw.ret("raw")
def ELF_CPI(C_p0: Any, G_m1: Any, Omega_0: Any, C_s: Any) -> Any:
    """Diaphragm acceleration coefficient at 0.8 h_n, and the least at the top. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_CPI", C_p0, G_m1, Omega_0, C_s)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("C_pi", "raw", doc="Acceleration coefficient at 0.8 h_n [no unit], above 0.")
@xw.arg("G_m1", "raw", doc="First mode contribution factor [no unit], at least 1.")
@xw.arg("Omega_0", "raw", doc="Overstrength factor [no unit], at least 1.")
@xw.arg("C_s", "raw", doc="Seismic response coefficient of 12.8 or 12.9 [no unit], above 0.")
@xw.arg("G_m2", "raw", doc="Higher mode contribution factor [no unit], at least 0.")
@xw.arg("C_s2", "raw", doc="Higher mode seismic response coefficient [no unit], at least 0.")
@xw.ret("raw")
def ELF_CPN(C_pi: Any, G_m1: Any, Omega_0: Any, C_s: Any, G_m2: Any, C_s2: Any) -> Any:
    """Diaphragm acceleration coefficient at the top. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_CPN", C_pi, G_m1, Omega_0, C_s, G_m2, C_s2)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("h_x", "raw", doc="Height of level x above the base, at most h_n [a length unit], at least 0.")
@xw.arg("h_n", "raw", doc="Structural height [a length unit], above 0.")
@xw.arg("N", "raw", doc="Stories above the base, a whole number [no unit], at least 1.")
@xw.arg("C_p0", "raw", doc="Acceleration coefficient at the base [no unit], above 0.")
@xw.arg("C_pi", "raw", doc="Acceleration coefficient at 0.8 h_n [no unit], above 0.")
@xw.arg("C_pn", "raw", doc="Acceleration coefficient at the top [no unit], above 0.")
@xw.ret("raw")
def ELF_CPX(h_x: Any, h_n: Any, N: Any, C_p0: Any, C_pi: Any, C_pn: Any) -> Any:
    """Diaphragm acceleration coefficient of a level. ASCE/SEI 7-16: 12.10.3.2; 7-22: 12.10.3.2. Partly from memory: confirm."""
    return call("ELF_CPX", h_x, h_n, N, C_p0, C_pi, C_pn)


@xw.func(category="Storyledger: Alternative diaphragm procedure")
@xw.arg("C_px", "raw", doc="Acceleration coefficient of the level [no unit], above 0.")
@xw.arg("w_px", "raw", doc="Weight tributary to the diaphragm at level x [a force unit], at least 0.")
@xw.arg("R_s", "raw", doc="Design force reduction factor of the diaphragm [no unit], above 0.")
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_FPX_ALT(C_px: Any, w_px: Any, R_s: Any, S_DS: Any, I_e: Any) -> Any:
    """Diaphragm design force of a level by the alternative procedure. ASCE/SEI 7-16: 12.10.3.2, Eq. 12.10-4; 7-22: 12.10.3.2, Eq. 12.10-4. Partly from memory: confirm."""
    return call("ELF_FPX_ALT", C_px, w_px, R_s, S_DS, I_e)


@xw.func(category="Storyledger: Separation")
@xw.arg(
    "delta_max",
    "raw",
    doc="Largest elastic displacement, torsion included [a displacement unit], at least 0.",
)
@xw.arg(
    "delta_di",
    "raw",
    doc="Diaphragm deflection at the design earthquake; 0 where none [a displacement unit], at least 0.",
)
@xw.arg("C_d", "raw", doc="Deflection amplification factor [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.arg(
    "edition",
    "raw",
    doc="Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date): 7-16, 7-22.",
)
@xw.ret("raw")
def ELF_DELTA_M(delta_max: Any, delta_di: Any, C_d: Any, I_e: Any, edition: Any) -> Any:
    """Displacement that a separation has to take in; the set-back from a property line. ASCE/SEI 7-16: 12.12.3, Eq. 12.12-1; 7-22: 12.12.3, Eq. 12.12-1. Partly from memory: confirm."""
    return call("ELF_DELTA_M", delta_max, delta_di, C_d, I_e, edition)


@xw.func(category="Storyledger: Separation")
@xw.arg(
    "delta_M1", "raw", doc="Displacement of one structure at the place [a displacement unit], at least 0."
)
@xw.arg("delta_M2", "raw", doc="Displacement of the other at that height [a displacement unit], at least 0.")
@xw.ret("raw")
def ELF_DELTA_MT(delta_M1: Any, delta_M2: Any) -> Any:
    """Least gap between two structures on one property. ASCE/SEI 7-16: 12.12.3, Eq. 12.12-2; 7-22: 12.12.3, Eq. 12.12-2. Partly from memory: confirm."""
    return call("ELF_DELTA_MT", delta_M1, delta_M2)


@xw.func(category="Storyledger: Separation")
@xw.arg("gap", "raw", doc="Clear distance [a displacement unit], at least 0.")
@xw.arg("delta_MT", "raw", doc="Least distance [a displacement unit], at least 0.")
@xw.ret("raw")
def ELF_GAP_STATUS(gap: Any, delta_MT: Any) -> Any:
    """Whether a gap is wide enough; to a property line, give delta_M as the least distance. ASCE/SEI 7-16: 12.12.3, Eq. 12.12-2; 7-22: 12.12.3, Eq. 12.12-2. Partly from memory: confirm."""
    return call("ELF_GAP_STATUS", gap, delta_MT)


@xw.func(category="Storyledger: Separation")
@xw.arg(
    "delta_e",
    "raw",
    doc="Elastic displacement under the strength-level forces [a displacement unit], any number.",
)
@xw.arg(
    "delta_di",
    "raw",
    doc="Diaphragm deflection at the design earthquake; 0 where none [a displacement unit], at least 0.",
)
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_DELTA_MCE(delta_e: Any, delta_di: Any, R: Any, I_e: Any) -> Any:
    """Displacement at the maximum considered earthquake, for members between structures. ASCE/SEI 7-16: 12.12.4; 7-22: 12.8.6, Eq. 12.8-17. Partly from memory: confirm."""
    return call("ELF_DELTA_MCE", delta_e, delta_di, R, I_e)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg("V", "raw", doc="Base shear of the part (lower: with the upper reactions) [a force unit], above 0.")
@xw.arg("delta", "raw", doc="Elastic displacement at its top, base fixed [a displacement unit], above 0.")
@xw.ret("raw")
def ELF_PART_STIFFNESS(V: Any, delta: Any) -> Any:
    """Stiffness of the upper or lower part: its base shear over the displacement at its own top. ASCE/SEI 7-16: 12.2.3.2, item a; 7-22: 12.2.3.2, item a. Partly from memory: confirm."""
    return call("ELF_PART_STIFFNESS", V, delta)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg("K_lower", "raw", doc="Stiffness of the lower part [a stiffness unit], above 0.")
@xw.arg("K_upper", "raw", doc="Stiffness of the upper part [a stiffness unit], above 0.")
@xw.ret("raw")
def ELF_STIFFNESS_RATIO(K_lower: Any, K_upper: Any) -> Any:
    """Stiffness of the lower part over that of the upper part: at least 10. ASCE/SEI 7-16: 12.2.3.2, item a; 7-22: 12.2.3.2, item a. Partly from memory: confirm."""
    return call("ELF_STIFFNESS_RATIO", K_lower, K_upper)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg("T_whole", "raw", doc="Period of the whole structure [s], above 0.")
@xw.arg("T_upper", "raw", doc="Period of the upper part on a fixed base [s], above 0.")
@xw.ret("raw")
def ELF_PERIOD_RATIO(T_whole: Any, T_upper: Any) -> Any:
    """Period of the whole over that of the upper part on a fixed base: at most 1.1. ASCE/SEI 7-16: 12.2.3.2, item b; 7-22: 12.2.3.2, item b. Partly from memory: confirm."""
    return call("ELF_PERIOD_RATIO", T_whole, T_upper)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg("R_upper", "raw", doc="Response modification coefficient of the upper part [no unit], at least 1.")
@xw.arg("rho_upper", "raw", doc="Redundancy factor of the upper part [no unit], at least 1.")
@xw.arg("R_lower", "raw", doc="Response modification coefficient of the lower part [no unit], at least 1.")
@xw.arg("rho_lower", "raw", doc="Redundancy factor of the lower part [no unit], at least 1.")
@xw.ret("raw")
def ELF_REACTION_FACTOR(R_upper: Any, rho_upper: Any, R_lower: Any, rho_lower: Any) -> Any:
    """Factor on the reactions of the upper part as they act on the lower part, at least 1. ASCE/SEI 7-16: 12.2.3.2, item d; 7-22: 12.2.3.2, item d. Partly from memory: confirm."""
    return call("ELF_REACTION_FACTOR", R_upper, rho_upper, R_lower, rho_lower)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg("stiffness_ratio", "raw", doc="Stiffness ratio, lower to upper [no unit], above 0.")
@xw.arg("period_ratio", "raw", doc="Period ratio, whole to upper [no unit], above 0.")
@xw.arg(
    "upper_procedure",
    "raw",
    doc="Procedure by which the upper part is analysed: equivalent lateral force, modal, another.",
)
@xw.arg(
    "lower_procedure",
    "raw",
    doc="Procedure by which the lower part is analysed: equivalent lateral force, modal, another.",
)
@xw.ret("raw")
def ELF_TWO_STAGE(stiffness_ratio: Any, period_ratio: Any, upper_procedure: Any, lower_procedure: Any) -> Any:
    """Whether the two-stage procedure may be used, and what fails. ASCE/SEI 7-16: 12.2.3.2; 7-22: 12.2.3.2. Partly from memory: confirm."""
    return call("ELF_TWO_STAGE", stiffness_ratio, period_ratio, upper_procedure, lower_procedure)


@xw.func(category="Storyledger: Two-stage procedure")
@xw.arg(
    "discontinuity",
    "raw",
    doc="Whether there is an out-of-plane or in-plane offset at the transition: yes, no.",
)
@xw.ret("raw")
def ELF_TWO_STAGE_TRANSITION(discontinuity: Any) -> Any:
    """What a discontinuity at the transition between the parts brings. ASCE/SEI 7-16: 12.2.3.2; 7-22: 12.2.3.2. Partly from memory: confirm."""
    return call("ELF_TWO_STAGE_TRANSITION", discontinuity)


@xw.func(category="Storyledger: Story stiffness")
@xw.arg("h_x", "raw", doc="Height of level x above the base, or 0 for the base [a length unit], at least 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_DELTA_XE(h_x: Any, forces: Any, stiffnesses: Any, heights: Any) -> Any:
    """Elastic displacement of a level of a shear building, from its story forces and stiffnesses. ASCE/SEI 7-16: 12.8.6; 7-22: 12.8.6. Partly from memory: confirm."""
    return call("ELF_DELTA_XE", h_x, forces, stiffnesses, heights)


@xw.func(category="Storyledger: Story stiffness")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("forces", "raw", doc="Story forces of all levels [a force unit], one cell a level, any number.")
@xw.arg(
    "displacements",
    "raw",
    doc="Elastic displacements of all levels under the forces [a displacement unit], one cell a level, any number.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_STORY_STIFFNESS(h_x: Any, forces: Any, displacements: Any, heights: Any) -> Any:
    """Stiffness of the story below a level, from story forces and the displacements they cause. ASCE/SEI 7-16: 12.8.6; 7-22: 12.8.6. Partly from memory: confirm."""
    return call("ELF_STORY_STIFFNESS", h_x, forces, displacements, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_MODE_PERIOD(mode: Any, weights: Any, stiffnesses: Any, heights: Any, units: Any) -> Any:
    """Period of a mode of the shear building. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODE_PERIOD", mode, weights, stiffnesses, heights, units)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_SHAPE(mode: Any, h_x: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Ordinate of a mode's shape at a level; the largest ordinate of the mode is 1. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODE_SHAPE", mode, h_x, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_PARTICIPATION(mode: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Participation factor of a mode, for its shape with 1 as the largest ordinate. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODE_PARTICIPATION", mode, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_MASS(mode: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Part of the total mass that moves in a mode (effective modal mass). ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODE_MASS", mode, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("modes", "raw", doc="How many modes, from the first on, whole [no unit], at least 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_MASS_SUM(modes: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Part of the total mass that moves in the first modes together. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODE_MASS_SUM", modes, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("share", "raw", doc="Part of the mass, 0.9 for 90 % [no unit], above 0 and at most 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODES_NEEDED(share: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """How many modes, from the first on, hold a given part of the mass. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODES_NEEDED", share, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("modes", "raw", doc="How many modes, from the first on, whole [no unit], at least 1.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("units", "raw", doc="Unit system: us (kip, ft, in) or si (kN, m, mm): us, si.")
@xw.ret("raw")
def ELF_MODES_STATUS(modes: Any, weights: Any, stiffnesses: Any, heights: Any, units: Any) -> Any:
    """Whether the first modes hold enough of the mass, in words. ASCE/SEI 7-16: 12.9.1.1; 7-22: 12.9.1.1. Partly from memory: confirm."""
    return call("ELF_MODES_STATUS", modes, weights, stiffnesses, heights, units)


@xw.func(category="Storyledger: Modal response")
@xw.arg("S_a", "raw", doc="Design spectral acceleration at the mode's period [g], above 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_MODE_CS(S_a: Any, R: Any, I_e: Any) -> Any:
    """Seismic response coefficient of a mode: the spectrum at its period over R/I_e. ASCE/SEI 7-16: 12.9.1.2; 7-22: 12.9.1.2. Partly from memory: confirm."""
    return call("ELF_MODE_CS", S_a, R, I_e)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg("w_x", "raw", doc="Effective seismic weight of level x [a force unit], at least 0.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("C_sm", "raw", doc="Seismic response coefficient of the mode [no unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_FORCE(
    mode: Any, w_x: Any, h_x: Any, C_sm: Any, weights: Any, stiffnesses: Any, heights: Any
) -> Any:
    """Force at a level in a mode, with its sign. ASCE/SEI 7-16: 12.9.1.2; 7-22: 12.9.1.2. Partly from memory: confirm."""
    return call("ELF_MODE_FORCE", mode, w_x, h_x, C_sm, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg("h_x", "raw", doc="Height of level x above the base, or 0 for the base [a length unit], at least 0.")
@xw.arg("C_sm", "raw", doc="Seismic response coefficient of the mode [no unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_SHEAR(mode: Any, h_x: Any, C_sm: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Story shear below a level in a mode, with its sign; at height 0 the base shear of the mode. ASCE/SEI 7-16: 12.9.1.2; 7-22: 12.9.1.2. Partly from memory: confirm."""
    return call("ELF_MODE_SHEAR", mode, h_x, C_sm, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("C_sm", "raw", doc="Seismic response coefficient of the mode [no unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_DISPLACEMENT(
    mode: Any, h_x: Any, C_sm: Any, weights: Any, stiffnesses: Any, heights: Any
) -> Any:
    """Elastic displacement of a level in a mode, with its sign. ASCE/SEI 7-16: 12.9.1.2; 7-22: 12.9.1.2. Partly from memory: confirm."""
    return call("ELF_MODE_DISPLACEMENT", mode, h_x, C_sm, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("mode", "raw", doc="Number of the mode, whole, 1 for the longest period [no unit], at least 1.")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("C_sm", "raw", doc="Seismic response coefficient of the mode [no unit], above 0.")
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.ret("raw")
def ELF_MODE_DRIFT(mode: Any, h_x: Any, C_sm: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    """Elastic drift of the story below a level in a mode, with its sign. ASCE/SEI 7-16: 12.9.1.2; 7-22: 12.9.1.2. Partly from memory: confirm."""
    return call("ELF_MODE_DRIFT", mode, h_x, C_sm, weights, stiffnesses, heights)


@xw.func(category="Storyledger: Modal response")
@xw.arg("h_x", "raw", doc="Height of level x above the base, or 0 for the base [a length unit], at least 0.")
@xw.arg("mode_numbers", "raw", doc="Numbers of the modes, whole [no unit], one cell a mode, at least 1.")
@xw.arg(
    "mode_coefficients",
    "raw",
    doc="Seismic response coefficients of the modes [no unit], one cell a mode, above 0.",
)
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("combination", "raw", doc="Rule of combination: SRSS, CQC.")
@xw.arg("damping", "raw", doc="Damping ratio of the modes, 0.05 for 5 % [no unit], above 0 and at most 1.")
@xw.ret("raw")
def ELF_MODAL_SHEAR(
    h_x: Any,
    mode_numbers: Any,
    mode_coefficients: Any,
    weights: Any,
    stiffnesses: Any,
    heights: Any,
    combination: Any,
    damping: Any,
) -> Any:
    """Story shear combined over modes by SRSS or CQC; at 0, the base shear. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call(
        "ELF_MODAL_SHEAR",
        h_x,
        mode_numbers,
        mode_coefficients,
        weights,
        stiffnesses,
        heights,
        combination,
        damping,
    )


@xw.func(category="Storyledger: Modal response")
@xw.arg("h_x", "raw", doc="Height of level x above the base [a length unit], above 0.")
@xw.arg("mode_numbers", "raw", doc="Numbers of the modes, whole [no unit], one cell a mode, at least 1.")
@xw.arg(
    "mode_coefficients",
    "raw",
    doc="Seismic response coefficients of the modes [no unit], one cell a mode, above 0.",
)
@xw.arg(
    "weights",
    "raw",
    doc="Effective seismic weights of all levels [a force unit], one cell a level, at least 0.",
)
@xw.arg(
    "stiffnesses",
    "raw",
    doc="Stiffness of the story below each level [a stiffness unit], one cell a level, above 0.",
)
@xw.arg(
    "heights", "raw", doc="Heights of all levels above the base [a length unit], one cell a level, above 0."
)
@xw.arg("combination", "raw", doc="Rule of combination: SRSS, CQC.")
@xw.arg("damping", "raw", doc="Damping ratio of the modes, 0.05 for 5 % [no unit], above 0 and at most 1.")
@xw.ret("raw")
def ELF_MODAL_DRIFT(
    h_x: Any,
    mode_numbers: Any,
    mode_coefficients: Any,
    weights: Any,
    stiffnesses: Any,
    heights: Any,
    combination: Any,
    damping: Any,
) -> Any:
    """Elastic drift of the story below a level combined over modes by SRSS or CQC. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call(
        "ELF_MODAL_DRIFT",
        h_x,
        mode_numbers,
        mode_coefficients,
        weights,
        stiffnesses,
        heights,
        combination,
        damping,
    )


@xw.func(category="Storyledger: Modal response")
@xw.arg(
    "values", "raw", doc="Response in each mode, with its sign [any one unit], one cell a mode, any number."
)
@xw.ret("raw")
def ELF_SRSS(values: Any) -> Any:
    """Response combined over the modes: square root of the sum of the squares. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call("ELF_SRSS", values)


@xw.func(category="Storyledger: Modal response")
@xw.arg(
    "values", "raw", doc="Response in each mode, with its sign [any one unit], one cell a mode, any number."
)
@xw.ret("raw")
def ELF_ABSSUM(values: Any) -> Any:
    """Absolute sum of the responses in the modes, a bound on every combination. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call("ELF_ABSSUM", values)


@xw.func(category="Storyledger: Modal response")
@xw.arg(
    "values", "raw", doc="Response in each mode, with its sign [any one unit], one cell a mode, any number."
)
@xw.arg("periods", "raw", doc="Periods of the modes [s], one cell a mode, above 0.")
@xw.arg("damping", "raw", doc="Damping ratio of the modes, 0.05 for 5 % [no unit], above 0 and at most 1.")
@xw.ret("raw")
def ELF_CQC(values: Any, periods: Any, damping: Any) -> Any:
    """Response combined over the modes: complete quadratic combination, with signs and periods. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call("ELF_CQC", values, periods, damping)


@xw.func(category="Storyledger: Modal response")
@xw.arg("T_i", "raw", doc="Period of one mode [s], above 0.")
@xw.arg("T_j", "raw", doc="Period of the other mode [s], above 0.")
@xw.arg("damping", "raw", doc="Damping ratio of the modes, 0.05 for 5 % [no unit], above 0 and at most 1.")
@xw.ret("raw")
def ELF_MODE_CORRELATION(T_i: Any, T_j: Any, damping: Any) -> Any:
    """Correlation coefficient of two modes of equal damping, as the complete combination uses it. ASCE/SEI 7-16: 12.9.1.3; 7-22: 12.9.1.3. Partly from memory: confirm."""
    return call("ELF_MODE_CORRELATION", T_i, T_j, damping)


@xw.func(category="Storyledger: Modal response")
@xw.arg("V", "raw", doc="Base shear of 12.8, its period at most C_u T_a [a force unit], above 0.")
@xw.arg("V_t", "raw", doc="Combined base shear of the modes [a force unit], above 0.")
@xw.ret("raw")
def ELF_MODAL_SCALE(V: Any, V_t: Any) -> Any:
    """Factor on combined forces: up to the equivalent lateral force base shear, at least 1. ASCE/SEI 7-16: 12.9.1.4.1; 7-22: 12.9.1.4.1. Partly from memory: confirm."""
    return call("ELF_MODAL_SCALE", V, V_t)


@xw.func(category="Storyledger: Modal response")
@xw.arg("V_t", "raw", doc="Combined base shear of the modes [a force unit], above 0.")
@xw.arg("W", "raw", doc="Effective seismic weight [a force unit], above 0.")
@xw.arg("S_1", "raw", doc="Mapped MCE_R spectral acceleration at 1 s [g], at least 0.")
@xw.arg("R", "raw", doc="Response modification coefficient [no unit], at least 1.")
@xw.arg("I_e", "raw", doc="Importance factor [no unit], at least 1.")
@xw.ret("raw")
def ELF_MODAL_DRIFT_SCALE(V_t: Any, W: Any, S_1: Any, R: Any, I_e: Any) -> Any:
    """Factor on combined drifts: up to the shear by the minimum for S_1 from 0.6 on, at least 1. ASCE/SEI 7-16: 12.9.1.4.2; 7-22: 12.9.1.4.2. Partly from memory: confirm."""
    return call("ELF_MODAL_DRIFT_SCALE", V_t, W, S_1, R, I_e)
