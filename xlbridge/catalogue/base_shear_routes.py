"""Worksheet functions of C_s by the multi-period route and for drift alone, and of the S_DS cap."""

from __future__ import annotations

from engine import base_shear
from engine.base_shear import which
from xlbridge.catalogue.base_shear import (
    BOUNDS,
    CAP,
    INPUTS,
    LOWER,
    MINIMUM,
    MINIMUM_S1,
    NEAR_FAULT,
    PLATEAU,
    UPPER,
)
from xlbridge.catalogue.common import S_1, S_DS, I_e, R, T, question, risk_category
from xlbridge.catalogue.entry import POSITIVE, Argument, Example, Kind, Result, SheetFunction, Span, Term
from xlbridge.catalogue.governing import words

S_a = Argument(
    *("S_a", "acceleration", "Multi-period spectrum at T, no less than its peak left of the peak", POSITIVE)
)
edition = Argument(
    *("edition", "text", "Edition of ASCE/SEI 7 that has the method, as text"),
    kind=Kind.CHOICE,
    choices=base_shear.METHOD_1_EDITIONS,
)
_CS = Result("C_s", "none", "seismic response coefficient")
_GOVERNS = Result("governs", "text", "governing bound")
_PLATEAU, _CAP, _LEAST, _NEAR_FAULT = BOUNDS
_SPECTRUM = Term("spectrum", "C_s,spectrum", base_shear.coefficient_multi)
_MULTI = "{S_a}/({R}/{I_e})"
_SPECTRUM_BOUND = (which.SPECTRUM, _MULTI, "")
_C_S_MULTI = f"MAX({_MULTI},{MINIMUM},{MINIMUM_S1})"
_C_S_DRIFT = f"MAX(MIN({PLATEAU},{CAP}),{MINIMUM_S1})"
_C_S_DRIFT_MULTI = f"MAX({_MULTI},{MINIMUM_S1})"
_SITE = {"S_a": 0.6, "S_1": 0.6, "R": 8.0, "I_e": 1.0, "edition": "7-22"}
_DRIFT = {**_SITE, "S_DS": 1.0, "S_D1": 0.6, "T": 2.0, "T_L": 8.0}
del _DRIFT["S_a"]

_CONDITIONS = (
    Argument("N", "none", "Stories above the lower of base and grade plane, with mezzanines", Span(1)),
    T,
    question("regular", "Whether the structure is free of the irregularities of 12.3.2"),
    question("redundant", "Whether it qualifies for rho = 1.0"),
    question("soft_site", "Whether the site class is E or F (DE in 7-22: uncertain)"),
    risk_category,
)
_ANSWERS = {
    **{"N": 3.0, "T": 0.3, "regular": "yes", "redundant": "yes", "soft_site": "no"},
    "risk_category": "II",
}
_HOLD = (
    '{N}<=5,{T}<=0.5,{regular}="yes",{redundant}="yes",{soft_site}="no",'
    'OR({risk_category}="I",{risk_category}="II")'
)
_WORDS = (
    "{N} stories, T = {T}, regular: {regular}, redundant: {redundant}, soft site: {soft_site},"
    " Risk Category {risk_category}"
)

FUNCTIONS = (
    SheetFunction(
        name="ELF_CS_MULTI_BOUND",
        summary="Seismic response coefficient of the multi-period spectrum, before the minimums.",
        category="Base shear",
        rule="C_s_method1",
        arguments=(S_a, R, I_e),
        result=Result("C_s", "none", "bound of C_s"),
        function=base_shear.coefficient_multi,
        expression="{S_a}/({R}/{I_e})",
        native=_MULTI,
        example=Example({"S_a": 0.6, "R": 8.0, "I_e": 1.25}, "0.09375"),
    ),
    SheetFunction(
        name="ELF_CS_MULTI",
        summary="Governing seismic response coefficient of the multi-period spectrum.",
        category="Base shear",
        rule="C_s_method1",
        arguments=(S_a, S_DS, S_1, R, I_e, edition),
        result=_CS,
        function=base_shear.response_coefficient_multi,
        expression="max({spectrum}; {minimum}; {minimum_S1})",
        native=_C_S_MULTI,
        example=Example({**_SITE, "S_DS": 1.0}, "0.075"),
        terms=(_SPECTRUM, _LEAST, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_CS_MULTI_GOVERNS",
        summary="The bound that governs C_s of the multi-period spectrum, with its equation number.",
        category="Base shear",
        rule="C_s_method1",
        arguments=(S_a, S_DS, S_1, R, I_e, edition),
        result=_GOVERNS,
        function=base_shear.governing_bound_multi,
        expression="the bound that sets max({spectrum}; {minimum}; {minimum_S1})",
        native=words(_C_S_MULTI, _SPECTRUM_BOUND, *LOWER, NEAR_FAULT),
        example=Example({**_SITE, "S_DS": 1.0}, "spectrum S_a/(R/I_e), Eq. 12.8-2"),
        terms=(_SPECTRUM, _LEAST, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_CS_DRIFT",
        summary="C_s for drift alone, two-period spectrum: without the minimum 0.044 S_DS I_e.",
        category="Base shear",
        rule="drift_forces",
        arguments=INPUTS,
        result=_CS,
        function=base_shear.drift_coefficient,
        expression="max(min({plateau}; {cap}); {minimum_S1})",
        native=_C_S_DRIFT,
        example=Example(_DRIFT, "0.0375"),
        terms=(_PLATEAU, _CAP, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_CS_DRIFT_GOVERNS",
        summary="The bound that governs C_s for drift alone, two-period spectrum.",
        category="Base shear",
        rule="drift_forces",
        arguments=INPUTS,
        result=_GOVERNS,
        function=base_shear.drift_bound,
        expression="the bound that sets max(min({plateau}; {cap}); {minimum_S1})",
        native=words(_C_S_DRIFT, *UPPER, NEAR_FAULT),
        example=Example(_DRIFT, "cap S_D1/(T R/I_e), Eq. 12.8-4"),
        terms=(_PLATEAU, _CAP, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_CS_DRIFT_MULTI",
        summary="C_s for drift alone, multi-period spectrum: without the minimum 0.044 S_DS I_e.",
        category="Base shear",
        rule="C_s_method1",
        arguments=(S_a, S_1, R, I_e, edition),
        result=_CS,
        function=base_shear.drift_coefficient_multi,
        expression="max({spectrum}; {minimum_S1})",
        native=_C_S_DRIFT_MULTI,
        example=Example(_SITE, "0.075"),
        terms=(_SPECTRUM, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_CS_DRIFT_MULTI_GOVERNS",
        summary="The bound that governs C_s for drift alone, multi-period spectrum.",
        category="Base shear",
        rule="C_s_method1",
        arguments=(S_a, S_1, R, I_e, edition),
        result=_GOVERNS,
        function=base_shear.drift_bound_multi,
        expression="the bound that sets max({spectrum}; {minimum_S1})",
        native=words(_C_S_DRIFT_MULTI, _SPECTRUM_BOUND, NEAR_FAULT),
        example=Example(_SITE, "spectrum S_a/(R/I_e), Eq. 12.8-2"),
        terms=(_SPECTRUM, _NEAR_FAULT),
    ),
    SheetFunction(
        name="ELF_SDS_CAP",
        summary="S_DS for C_s and E_v: max(1.0, 0.7 S_DS) for a short regular building, where that is less.",
        category="Base shear",
        rule="S_DS_cap",
        arguments=(S_DS, *_CONDITIONS),
        result=Result("S_DS", "acceleration", "S_DS used for C_s and E_v"),
        function=base_shear.capped_S_DS,
        expression=f"min({{S_DS}}; max(1; 0.7·{{S_DS}})) where all hold ({_WORDS}); {{S_DS}} otherwise",
        native=f"IF(AND({_HOLD}),MIN({{S_DS}},MAX(1,0.7*{{S_DS}})),{{S_DS}})",
        example=Example({**_ANSWERS, "S_DS": 1.6}, "1.12"),
    ),
    SheetFunction(
        name="ELF_SDS_CAP_STATUS",
        summary="Whether S_DS may be capped for a short regular building, and what fails.",
        category="Base shear",
        rule="S_DS_cap",
        arguments=_CONDITIONS,
        result=Result("status", "text", "conditions of the cap"),
        function=base_shear.S_DS_cap_status,
        expression=_WORDS,
        example=Example({**_ANSWERS, "N": 6.0}, "not permitted: more than 5 stories"),
    ),
    SheetFunction(
        name="ELF_SSI_MIN",
        summary="Least base shear when it is reduced for soil-structure interaction.",
        category="Base shear",
        rule="interaction_minimum",
        arguments=(Argument("V", "force", "Base shear without interaction", POSITIVE), R),
        result=Result("V_min", "force", "least reduced base shear"),
        function=base_shear.interaction_minimum,
        expression="min(max(0.5 + {R}/15; 0.7); 0.9)·{V}",
        native="MIN(MAX(0.5+{R}/15,0.7),0.9)*{V}",
        example=Example({"V": 100.0, "R": 4.5}, "80"),
    ),
)
