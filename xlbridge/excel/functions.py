"""Worksheet functions for xlwings.

Generated from the catalogue by ``python -m xlbridge.excel.generate``: not to be edited.
"""

# ruff: noqa: E501
from __future__ import annotations

from typing import Any

import xlwings as xw

from xlbridge.excel.cells import OMITTED, call


@xw.func(category="Storyledger: Seismic weight")
@xw.arg("area", "raw", doc="Area on plan, or of a wall [a area unit], at least 0.")
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
@xw.arg("areas", "raw", doc="Areas of the items [a area unit], one cell a item, at least 0.")
@xw.arg("unit_loads", "raw", doc="Loads that count, by item [a unit load unit], one cell a item, at least 0.")
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
@xw.arg("T_S", "raw", doc="Period at which the plateau ends [s], above 0.")
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
@xw.arg("S_DS", "raw", doc="Design spectral acceleration at short periods [g], above 0.")
@xw.arg("S_D1", "raw", doc="Design spectral acceleration at 1 s [g], above 0.")
@xw.arg("T_L", "raw", doc="Long-period transition period [s], above 0.")
@xw.arg(
    "exception",
    "raw",
    doc="Exception of 11.4.8 used: none, exception 2: C_s increased, exception 2 of Supplement 3: S_M1 up 50 %, exception 3: T at most T_S.",
)
@xw.ret("raw")
def ELF_CS_INCREASE(T: Any, S_DS: Any, S_D1: Any, T_L: Any, exception: Any) -> Any:
    """Factor on the upper bound of C_s where exception 2 is used as first printed; 1 otherwise. ASCE/SEI 7-16: 11.4.8, exception 2. Partly from memory: confirm."""
    return call("ELF_CS_INCREASE", T, S_DS, S_D1, T_L, exception)


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
    """Factor on combined drifts: up to the base shear by the minimum for S_1 ≥ 0.6, at least 1. ASCE/SEI 7-16: 12.9.1.4.2; 7-22: 12.9.1.4.2. Partly from memory: confirm."""
    return call("ELF_MODAL_DRIFT_SCALE", V_t, W, S_1, R, I_e)
