"""Worksheet functions of the alternative procedure for diaphragms."""

from __future__ import annotations

from engine import diaphragm
from engine.tables import table
from xlbridge.catalogue.common import S_D1, S_DS, I_e, Omega_0
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
)

N = Argument("N", "none", "Stories above the base, a whole number", Span(1))
z_s = Argument("z_s", "none", "Mode shape factor", POSITIVE)
C_p0 = Argument("C_p0", "none", "Acceleration coefficient at the base", POSITIVE)
C_pi = Argument("C_pi", "none", "Acceleration coefficient at 0.8 h_n", POSITIVE)
C_pn = Argument("C_pn", "none", "Acceleration coefficient at the top", POSITIVE)
G_m1 = Argument("G_m1", "none", "First mode contribution factor", Span(1))
G_m2 = Argument("G_m2", "none", "Higher mode contribution factor", NOT_NEGATIVE)
C_s = Argument("C_s", "none", "Seismic response coefficient of 12.8 or 12.9", POSITIVE)
C_s2 = Argument("C_s2", "none", "Higher mode seismic response coefficient", NOT_NEGATIVE, symbol="C_s2")


def _looked_up(name: str, argument: str, column: str) -> str:
    rows = table(name).rows
    parts = (f'IF({{{argument}}}="{row[argument]}",{row[column]},' for row in rows)
    return f"{''.join(parts)}NA(){')' * len(rows)}"


_STRAIGHT = "{C_p0}+({C_pn}-{C_p0})*{h_x}/{h_n}"
_LOWER = "{C_p0}+({C_pi}-{C_p0})*{h_x}/{h_n}/0.8"
_UPPER = "{C_pi}+({C_pn}-{C_pi})*({h_x}/{h_n}-0.8)/(1-0.8)"

FUNCTIONS = (
    SheetFunction(
        name="ELF_ZS",
        summary="Mode shape factor of a seismic force-resisting system, for diaphragms.",
        category="Alternative diaphragm procedure",
        rule="z_s",
        arguments=(
            Argument(
                "system",
                "text",
                "Seismic force-resisting system",
                kind=Kind.CHOICE,
                choices=diaphragm.MODE_SHAPES,
            ),
        ),
        result=Result("z_s", "none", "mode shape factor"),
        function=diaphragm.mode_shape_factor,
        expression="table row {system}",
        native=_looked_up("mode_shape_factor", "system", "z_s"),
        example=Example({"system": "moment frame"}, "0.7"),
    ),
    SheetFunction(
        name="ELF_RS",
        summary="Design force reduction factor of a diaphragm; steel deck of 7-22 is your own entry.",
        category="Alternative diaphragm procedure",
        rule="R_s",
        arguments=(
            Argument("diaphragm", "text", "Diaphragm", kind=Kind.CHOICE, choices=diaphragm.DIAPHRAGM_TYPES),
        ),
        result=Result("R_s", "none", "design force reduction factor"),
        function=diaphragm.diaphragm_reduction,
        expression="table row {diaphragm}",
        native=_looked_up("diaphragm_reduction", "diaphragm", "R_s"),
        example=Example({"diaphragm": "cast-in-place concrete shear"}, "1.5"),
    ),
    SheetFunction(
        name="ELF_CP0",
        summary="Diaphragm acceleration coefficient at the base.",
        category="Alternative diaphragm procedure",
        rule="C_p0",
        arguments=(S_DS, I_e),
        result=Result("C_p0", "none", "coefficient at the base"),
        function=diaphragm.base_coefficient,
        expression="0.4·{S_DS}·{I_e}",
        native="0.4*{S_DS}*{I_e}",
        example=Example({"S_DS": 1.0, "I_e": 1.25}, "0.5"),
    ),
    SheetFunction(
        name="ELF_GM1",
        summary="First mode contribution factor; its coefficient is uncertain and an entry.",
        category="Alternative diaphragm procedure",
        rule="G_m1",
        arguments=(
            z_s,
            N,
            Argument(
                "c_m1", "none", "Coefficient, recalled as 0.5: confirm before you enter it", NOT_NEGATIVE
            ),
        ),
        result=Result("G_m1", "none", "first mode contribution factor"),
        function=diaphragm.first_mode_factor,
        expression="1 + {c_m1}·{z_s}·(1 - 1/{N})",
        native="1+{c_m1}*{z_s}*(1-1/{N})",
        example=Example({"z_s": 1.0, "N": 5.0, "c_m1": 0.5}, "1.4"),
    ),
    SheetFunction(
        name="ELF_GM2",
        summary="Higher mode contribution factor.",
        category="Alternative diaphragm procedure",
        rule="G_m2",
        arguments=(z_s, N),
        result=Result("G_m2", "none", "higher mode contribution factor"),
        function=diaphragm.higher_mode_factor,
        expression="0.9·{z_s}·(1 - 1/{N})²",
        native="0.9*{z_s}*(1-1/{N})^2",
        example=Example({"z_s": 1.0, "N": 5.0}, "0.576"),
    ),
    SheetFunction(
        name="ELF_CS_HIGHER",
        summary="Higher mode seismic response coefficient; 0 for one story.",
        category="Alternative diaphragm procedure",
        rule="C_s2",
        arguments=(N, S_DS, S_D1, I_e),
        result=Result("C_s2", "none", "higher mode seismic response coefficient"),
        function=diaphragm.higher_mode_coefficient,
        expression=(
            "min((0.15·{N} + 0.25)·{I_e}·{S_DS}; {I_e}·{S_DS}; {I_e}·{S_D1}/(0.03·({N} - 1))), "
            "0 for one story"
        ),
        native=(
            "IF({N}<2,0,MIN((0.15*{N}+0.25)*{I_e}*{S_DS},{I_e}*{S_DS},{I_e}*{S_D1}/(0.03*MAX({N}-1,1))))"
        ),
        example=Example({"N": 3.0, "S_DS": 1.0, "S_D1": 0.6, "I_e": 1.0}, "0.7"),
    ),
    SheetFunction(
        name="ELF_CPI",
        summary="Diaphragm acceleration coefficient at 0.8 h_n, and the least at the top.",
        category="Alternative diaphragm procedure",
        rule="C_pi",
        arguments=(C_p0, G_m1, Omega_0, C_s),
        result=Result("C_pi", "none", "coefficient at 0.8 h_n"),
        function=diaphragm.lower_coefficient,
        expression="max({C_p0}; 0.9·{G_m1}·{Omega_0}·{C_s})",
        native="MAX({C_p0},0.9*{G_m1}*{Omega_0}*{C_s})",
        example=Example({"C_p0": 0.4, "G_m1": 1.4, "Omega_0": 2.5, "C_s": 0.2}, "0.63"),
    ),
    SheetFunction(
        name="ELF_CPN",
        summary="Diaphragm acceleration coefficient at the top.",
        category="Alternative diaphragm procedure",
        rule="C_pn",
        arguments=(C_pi, G_m1, Omega_0, C_s, G_m2, C_s2),
        result=Result("C_pn", "none", "coefficient at the top"),
        function=diaphragm.top_coefficient,
        expression="max(√(({G_m1}·{Omega_0}·{C_s})² + ({G_m2}·{C_s2})²); {C_pi})",
        native="MAX(SQRT(({G_m1}*{Omega_0}*{C_s})^2+({G_m2}*{C_s2})^2),{C_pi})",
        example=Example(
            {"C_pi": 0.3, "G_m1": 1.5, "Omega_0": 2.0, "C_s": 0.1, "G_m2": 0.5, "C_s2": 0.8}, "0.5"
        ),
    ),
    SheetFunction(
        name="ELF_CPX",
        summary="Diaphragm acceleration coefficient of a level.",
        category="Alternative diaphragm procedure",
        rule="C_px",
        arguments=(
            Argument("h_x", "length", "Height of level x above the base, at most h_n", NOT_NEGATIVE),
            Argument("h_n", "length", "Structural height", POSITIVE),
            N,
            C_p0,
            C_pi,
            C_pn,
        ),
        result=Result("C_px", "none", "coefficient of the level"),
        function=diaphragm.coefficient_at_height,
        cases=(
            Case("{C_p0} + ({C_pn} - {C_p0})·{h_x}/{h_n}", "N = {N} ≤ 2", lambda N: N <= 2),
            Case(
                "{C_p0} + ({C_pi} - {C_p0})·{h_x}/{h_n}/0.8",
                "N = {N} ≥ 3 and {h_x}/{h_n} ≤ 0.8",
                lambda h_x, h_n: h_x / h_n <= 0.8,
            ),
            Case(
                "{C_pi} + ({C_pn} - {C_pi})·({h_x}/{h_n} - 0.8)/0.2",
                "N = {N} ≥ 3 and {h_x}/{h_n} > 0.8",
                lambda: True,
            ),
        ),
        native=f"IF({{N}}<=2,{_STRAIGHT},IF({{h_x}}/{{h_n}}<=0.8,{_LOWER},{_UPPER}))",
        example=Example({"h_x": 45.0, "h_n": 50.0, "N": 4.0, "C_p0": 0.4, "C_pi": 0.6, "C_pn": 0.8}, "0.7"),
    ),
    SheetFunction(
        name="ELF_FPX_ALT",
        summary="Diaphragm design force of a level by the alternative procedure.",
        category="Alternative diaphragm procedure",
        rule="F_px_alternative",
        arguments=(
            Argument("C_px", "none", "Acceleration coefficient of the level", POSITIVE),
            Argument("w_px", "force", "Weight tributary to the diaphragm at level x", NOT_NEGATIVE),
            Argument("R_s", "none", "Design force reduction factor of the diaphragm", POSITIVE),
            S_DS,
            I_e,
        ),
        result=Result("F_px", "force", "diaphragm design force"),
        function=diaphragm.alternative_force,
        expression="max({C_px}·{w_px}/{R_s}; 0.2·{S_DS}·{I_e}·{w_px})",
        native="MAX({C_px}*{w_px}/{R_s},0.2*{S_DS}*{I_e}*{w_px})",
        example=Example({"C_px": 0.7, "w_px": 500.0, "R_s": 2.0, "S_DS": 1.0, "I_e": 1.0}, "175"),
        note="Transfer forces are to be added.",
    ),
)
