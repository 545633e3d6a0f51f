"""Worksheet functions of the seismic response coefficient, bound by bound, and the base shear."""

from __future__ import annotations

from engine import base_shear
from engine.base_shear import which
from xlbridge.catalogue.common import S_1, S_D1, S_DS, T_L, I_e, R, T, edition
from xlbridge.catalogue.entry import POSITIVE, Argument, Case, Example, Result, SheetFunction, Term
from xlbridge.catalogue.governing import words

CAP = "{S_D1}*IF({T}<={T_L},1,{T_L}/{T})/({T}*({R}/{I_e}))"
PLATEAU = "{S_DS}/({R}/{I_e})"
MINIMUM = "MAX(0.044*{S_DS}*{I_e},0.01)"
MINIMUM_S1 = "IF({S_1}>=0.6,0.5*{S_1}/({R}/{I_e}),0)"

C_S = f"MAX(MIN({PLATEAU},{CAP}),{MINIMUM},{MINIMUM_S1})"
UPPER = (
    (which.PLATEAU, PLATEAU, ""),
    (which.CAP, CAP, "{T}<={T_L}"),
    (which.CAP_LONG, CAP, "{T}>{T_L}"),
)
LOWER = ((which.MINIMUM, MINIMUM, "0.044*{S_DS}*{I_e}>0.01"), (which.FLOOR, MINIMUM, ""))
NEAR_FAULT = (which.NEAR_FAULT, MINIMUM_S1, "")

INPUTS = (S_DS, S_D1, S_1, T, T_L, R, I_e, edition)
BOUNDS = (
    Term("plateau", "C_s,plateau", base_shear.coefficient_plateau),
    Term("cap", "C_s,cap", base_shear.coefficient_cap),
    Term("minimum", "C_s,min", base_shear.coefficient_minimum),
    Term("minimum_S1", "C_s,min S_1", base_shear.coefficient_minimum_near_fault),
)
_EXAMPLE = {
    "S_DS": 1.0,
    "S_D1": 0.6,
    "S_1": 0.6,
    "T": 1.5,
    "T_L": 8.0,
    "R": 8.0,
    "I_e": 1.0,
    "edition": "7-22",
}

FUNCTIONS = (
    SheetFunction(
        name="ELF_CS_PLATEAU",
        summary="Seismic response coefficient on the plateau of the spectrum.",
        category="Base shear",
        rule="C_s_plateau",
        arguments=(S_DS, R, I_e),
        result=Result("C_s", "none", "bound of C_s"),
        function=base_shear.coefficient_plateau,
        expression="{S_DS}/({R}/{I_e})",
        native=PLATEAU,
        example=Example({"S_DS": 1.0, "R": 8.0, "I_e": 1.0}, "0.125"),
    ),
    SheetFunction(
        name="ELF_CS_CAP",
        summary="Upper bound of the seismic response coefficient from the period, on either side of T_L.",
        category="Base shear",
        rule="C_s_cap",
        also=("C_s_cap_long",),
        arguments=(S_D1, T, T_L, R, I_e),
        result=Result("C_s", "none", "bound of C_s"),
        function=base_shear.coefficient_cap,
        cases=(
            Case("{S_D1}/({T}·{R}/{I_e})", "{T} ≤ {T_L}", lambda T, T_L: T <= T_L),
            Case("{S_D1}·{T_L}/({T}²·{R}/{I_e})", "{T} > {T_L}", lambda: True),
        ),
        native=CAP,
        example=Example({"S_D1": 0.6, "T": 1.5, "T_L": 8.0, "R": 8.0, "I_e": 1.0}, "0.05"),
    ),
    SheetFunction(
        name="ELF_CS_MIN",
        summary="Lower bound of the seismic response coefficient, at least 0.01.",
        category="Base shear",
        rule="C_s_min",
        arguments=(S_DS, I_e),
        result=Result("C_s", "none", "bound of C_s"),
        function=base_shear.coefficient_minimum,
        expression="max(0.044·{S_DS}·{I_e}; 0.01)",
        native=MINIMUM,
        example=Example({"S_DS": 1.0, "I_e": 1.0}, "0.044"),
    ),
    SheetFunction(
        name="ELF_CS_MIN_S1",
        summary="Lower bound of the seismic response coefficient where S_1 is at least 0.6 g; 0 elsewhere.",
        category="Base shear",
        rule="C_s_min_S1",
        arguments=(S_1, R, I_e),
        result=Result("C_s", "none", "bound of C_s"),
        function=base_shear.coefficient_minimum_near_fault,
        cases=(
            Case("0.5·{S_1}/({R}/{I_e})", "{S_1} ≥ 0.6", lambda S_1: S_1 >= 0.6),
            Case("0", "{S_1} < 0.6", lambda: True),
        ),
        native=MINIMUM_S1,
        example=Example({"S_1": 0.6, "R": 8.0, "I_e": 1.0}, "0.0375"),
    ),
    SheetFunction(
        name="ELF_CS",
        summary="Governing seismic response coefficient of the two-period spectrum.",
        category="Base shear",
        rule="C_s",
        arguments=INPUTS,
        result=Result("C_s", "none", "seismic response coefficient"),
        function=base_shear.response_coefficient,
        expression="max(min({plateau}; {cap}); {minimum}; {minimum_S1})",
        native=C_S,
        example=Example(_EXAMPLE, "0.050"),
        terms=BOUNDS,
    ),
    SheetFunction(
        name="ELF_CS_GOVERNS",
        summary="The bound that governs the seismic response coefficient, with its equation number.",
        category="Base shear",
        rule="C_s",
        arguments=INPUTS,
        result=Result("governs", "text", "governing bound"),
        function=base_shear.governing_bound,
        expression="the bound that sets max(min({plateau}; {cap}); {minimum}; {minimum_S1})",
        native=words(C_S, *UPPER, *LOWER, NEAR_FAULT),
        example=Example(_EXAMPLE, "cap S_D1/(T R/I_e), Eq. 12.8-4"),
        terms=BOUNDS,
    ),
    SheetFunction(
        name="ELF_V",
        summary="Seismic base shear.",
        category="Base shear",
        rule="V",
        arguments=(
            Argument("C_s", "none", "Seismic response coefficient", POSITIVE),
            Argument("W", "force", "Effective seismic weight of the building", POSITIVE),
        ),
        result=Result("V", "force", "base shear"),
        function=base_shear.base_shear,
        expression="{C_s}·{W}",
        native="{C_s}*{W}",
        example=Example({"C_s": 0.11, "W": 2600.0}, "286"),
    ),
)
