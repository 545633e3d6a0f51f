"""Worksheet functions of flexibility, transfer forces, collectors, the one-story method and walls."""

from __future__ import annotations

from engine import diaphragm
from engine.diaphragm.wall import WALL_DIAPHRAGMS
from engine.require import YES_NO
from xlbridge.catalogue.common import S_D1, S_DS, I_e, Omega_0, rho, units
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

_FLEXIBILITY = (
    Argument("delta_MDD", "displacement", "Largest in-plane deflection of the diaphragm", NOT_NEGATIVE),
    Argument("Delta_ADVE", "displacement", "Mean drift of adjoining vertical elements", POSITIVE),
)
_COLLECTOR = (
    Argument("E_story", "force", "Collector force under the story forces of 12.8 or 12.9", NOT_NEGATIVE),
    Argument("E_sum", "force", "Collector force under the forces of Eq. 12.10-1", NOT_NEGATIVE),
    Argument("E_low", "force", "Collector force under the forces of Eq. 12.10-2", NOT_NEGATIVE),
    Omega_0,
    Argument(
        "light_frame", "text", "Braced by light-frame shear walls alone", kind=Kind.CHOICE, choices=YES_NO
    ),
)
_COLLECTOR_EXAMPLE = {"E_story": 30.0, "E_sum": 34.0, "E_low": 40.0, "Omega_0": 2.0, "light_frame": "no"}
_COLLECTOR_EXPRESSION = (
    "max({Omega_0}·{E_story}; {Omega_0}·{E_sum}; {E_low}); with light frame ({light_frame}) "
    "E_sum from E_low to 2·E_low"
)

FUNCTIONS = (
    SheetFunction(
        name="ELF_FLEX_RATIO",
        summary="Deflection of a diaphragm over the drift of the vertical elements beside it.",
        category="Diaphragm",
        rule="flexible_diaphragm",
        arguments=_FLEXIBILITY,
        result=Result("delta_MDD/Delta_ADVE", "none", "ratio of deflections"),
        function=diaphragm.flexibility_ratio,
        expression="{delta_MDD}/{Delta_ADVE}",
        native="{delta_MDD}/{Delta_ADVE}",
        example=Example({"delta_MDD": 0.9, "Delta_ADVE": 0.4}, "2.25"),
    ),
    SheetFunction(
        name="ELF_FLEX_STATUS",
        summary="Whether a diaphragm is flexible by calculation.",
        category="Diaphragm",
        rule="flexible_diaphragm",
        arguments=_FLEXIBILITY,
        result=Result("status", "text", "flexible or not"),
        function=diaphragm.flexibility,
        expression="{delta_MDD}/{Delta_ADVE} > 2",
        native=(
            f'IF({{delta_MDD}}/{{Delta_ADVE}}>2*(1+1E-12),"{diaphragm.FLEXIBILITIES[1]}",'
            f'"{diaphragm.FLEXIBILITIES[0]}")'
        ),
        example=Example({"delta_MDD": 0.9, "Delta_ADVE": 0.4}, "flexible"),
    ),
    SheetFunction(
        name="ELF_FPX_TRANSFER",
        summary="Diaphragm force with the forces transferred through it.",
        category="Diaphragm",
        rule="F_px_transfer",
        arguments=(
            Argument("F_px", "force", "Diaphragm design force of the level", NOT_NEGATIVE),
            Argument("F_transfer", "force", "Force transferred between vertical elements", NOT_NEGATIVE),
            rho,
            Omega_0,
            Argument(
                "offset",
                "text",
                "Transfer by an out-of-plane offset (horizontal Type 4)",
                kind=Kind.CHOICE,
                choices=YES_NO,
            ),
        ),
        result=Result("F", "force", "diaphragm force with transfer"),
        function=diaphragm.total_force,
        cases=(
            Case(
                "{F_px} + {Omega_0}·{F_transfer}",
                "there is an offset: {offset}",
                lambda offset: offset == "yes",
            ),
            Case("{F_px} + {rho}·{F_transfer}", "there is an offset: {offset}", lambda: True),
        ),
        native='{F_px}+IF({offset}="yes",{Omega_0},{rho})*{F_transfer}',
        example=Example(
            {"F_px": 80.0, "F_transfer": 40.0, "rho": 1.3, "Omega_0": 2.5, "offset": "no"}, "132"
        ),
    ),
    SheetFunction(
        name="ELF_COLLECTOR",
        summary="Governing force of a collector, Seismic Design Category C to F.",
        category="Diaphragm",
        rule="collector",
        arguments=_COLLECTOR,
        result=Result("F", "force", "collector force"),
        function=diaphragm.collector_force,
        expression=_COLLECTOR_EXPRESSION,
        native=(
            'IF({light_frame}="yes",MIN(MAX({E_sum},{E_low}),2*{E_low}),'
            "MAX({Omega_0}*{E_story},{Omega_0}*{E_sum},{E_low}))"
        ),
        example=Example(_COLLECTOR_EXAMPLE, "68"),
    ),
    SheetFunction(
        name="ELF_COLLECTOR_GOVERNS",
        summary="Which force governs a collector.",
        category="Diaphragm",
        rule="collector",
        arguments=_COLLECTOR,
        result=Result("governs", "text", "governing force"),
        function=diaphragm.collector_bound,
        expression=f"the largest of {_COLLECTOR_EXPRESSION}",
        example=Example(_COLLECTOR_EXAMPLE, "Omega_0 times the effect of Eq. 12.10-1"),
    ),
    SheetFunction(
        name="ELF_CS_DIAPH",
        summary="Response coefficient of a flexible diaphragm, one-story method: all of it uncertain.",
        category="Diaphragm",
        rule="C_s_diaph",
        arguments=(
            S_DS,
            S_D1,
            I_e,
            Argument(
                "R_diaph",
                "none",
                "Response modification coefficient of the diaphragm: confirm; recalled as 4.5 or 1.5",
                Span(1),
            ),
            Argument(
                "T_diaph",
                "time",
                "Period of the diaphragm: confirm; recalled as 0.002 L_f (wood), 0.001 L_f (deck), L_f in ft",
                POSITIVE,
            ),
        ),
        result=Result("C_s-diaph", "none", "response coefficient of the diaphragm"),
        function=diaphragm.one_story_coefficient,
        expression="min({S_DS}; {S_D1}/{T_diaph})/({R_diaph}/{I_e})",
        native="MIN({S_DS},{S_D1}/{T_diaph})/({R_diaph}/{I_e})",
        example=Example({"S_DS": 1.0, "S_D1": 0.6, "I_e": 1.0, "R_diaph": 4.5, "T_diaph": 0.8}, "0.1667"),
        note="Amplified shear near the ends of long spans is left out.",
    ),
    SheetFunction(
        name="ELF_FP_WALL",
        summary="Force on a structural wall out of its plane.",
        category="Diaphragm",
        rule="F_p_wall",
        arguments=(S_DS, I_e, Argument("W_w", "force", "Weight of the wall", NOT_NEGATIVE)),
        result=Result("F_p", "force", "force out of plane"),
        function=diaphragm.wall_force,
        expression="max(0.4·{S_DS}·{I_e}; 0.1)·{W_w}",
        native="MAX(0.4*{S_DS}*{I_e},0.1)*{W_w}",
        example=Example({"S_DS": 1.0, "I_e": 1.0, "W_w": 50.0}, "20"),
    ),
    SheetFunction(
        name="ELF_KA",
        summary="Amplification of the anchorage force by a flexible diaphragm.",
        category="Diaphragm",
        rule="k_a",
        arguments=(
            Argument("L_f", "length", "Span of the flexible diaphragm", NOT_NEGATIVE),
            Argument("diaphragm", "text", "Diaphragm", kind=Kind.CHOICE, choices=WALL_DIAPHRAGMS),
            units,
        ),
        result=Result("k_a", "none", "amplification"),
        function=diaphragm.anchorage_factor,
        cases=(
            Case("1", "the diaphragm is {diaphragm}", lambda diaphragm: diaphragm == "rigid"),
            Case(
                "min(1 + {L_f}/100; 2)",
                "the diaphragm is {diaphragm}, lengths in ft",
                lambda units: units == "us",
            ),
            Case("min(1 + {L_f}/30.48; 2)", "the diaphragm is {diaphragm}, lengths in m", lambda: True),
        ),
        native='IF({diaphragm}="rigid",1,MIN(1+{L_f}/IF({units}="us",100,30.48),2))',
        example=Example({"L_f": 60.0, "diaphragm": "flexible", "units": "us"}, "1.6"),
    ),
    SheetFunction(
        name="ELF_FP_ANCHOR",
        summary="Anchorage force of a structural wall.",
        category="Diaphragm",
        rule="F_p_anchor",
        arguments=(
            S_DS,
            Argument("k_a", "none", "Amplification by a flexible diaphragm", Span(1, 2)),
            I_e,
            Argument("W_p", "force", "Weight of the wall tributary to the anchor", NOT_NEGATIVE),
        ),
        result=Result("F_p", "force", "anchorage force"),
        function=diaphragm.anchorage_force,
        expression="max(0.4·{S_DS}; 0.2)·{k_a}·{I_e}·{W_p}",
        native="MAX(0.4*{S_DS},0.2)*{k_a}*{I_e}*{W_p}",
        example=Example({"S_DS": 1.0, "k_a": 1.6, "I_e": 1.0, "W_p": 2.5}, "1.6"),
    ),
)
