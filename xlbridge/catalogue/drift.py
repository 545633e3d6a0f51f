"""Worksheet functions of deflections and story drifts."""

from __future__ import annotations

from engine import drift
from engine.occupancy import RISK_CATEGORIES
from engine.require import YES_NO
from engine.tables import table
from xlbridge.catalogue.common import SDC, TIR, C_d, I_e, h_sx, risk_category
from xlbridge.catalogue.entry import Argument, Case, Example, Kind, Result, SheetFunction, Span, Term


def _ratio(structure: str, risk_category: str) -> float:
    return table("allowable_drift").entry("structure", structure, risk_category)


def _limit_native() -> str:
    parts = [
        f'IF(AND({{structure}}="{s}",{{risk_category}}="{c}"),{_ratio(s, c):g},'
        for s in drift.DRIFT_STRUCTURES
        for c in RISK_CATEGORIES
    ]
    return f"{''.join(parts)}NA(){')' * len(parts)}*{{h_sx}}/{{rho}}"


FUNCTIONS = (
    SheetFunction(
        name="ELF_DEFLECTION",
        summary="Amplified deflection of a level from its elastic displacement.",
        category="Drift",
        rule="delta_x",
        arguments=(
            Argument("delta_xe", "displacement", "Elastic displacement under the design forces"),
            C_d,
            I_e,
        ),
        result=Result("delta_x", "displacement", "amplified deflection"),
        function=drift.amplified_deflection,
        expression="{C_d}·{delta_xe}/{I_e}",
        native="{C_d}*{delta_xe}/{I_e}",
        example=Example({"delta_xe": 0.8, "C_d": 5.5, "I_e": 1.0}, "4.4"),
    ),
    SheetFunction(
        name="ELF_DRIFT",
        summary="Design story drift from the elastic displacements above and below the story.",
        category="Drift",
        rule="Delta",
        arguments=(
            Argument("d_upper", "displacement", "Elastic displacement at the top of the story"),
            Argument("d_lower", "displacement", "Elastic displacement at the bottom of the story"),
            C_d,
            I_e,
        ),
        result=Result("Delta", "displacement", "design story drift"),
        function=drift.design_story_drift,
        expression="{C_d}·|{d_upper} - {d_lower}|/{I_e}",
        native="{C_d}*ABS({d_upper}-{d_lower})/{I_e}",
        example=Example({"d_upper": 0.8, "d_lower": 0.5, "C_d": 5.5, "I_e": 1.0}, "1.65"),
    ),
    SheetFunction(
        name="ELF_DRIFT_LIMIT",
        summary="Allowable story drift; divided by rho where the clause on moment frames asks for it.",
        category="Drift",
        rule="Delta_a",
        also=("rho_drift",),
        arguments=(
            h_sx,
            Argument(
                "structure",
                "text",
                "Row of the allowable drift table",
                kind=Kind.CHOICE,
                choices=drift.DRIFT_STRUCTURES,
            ),
            risk_category,
            Argument(
                "rho",
                "none",
                "Redundancy factor, for moment-frame systems in SDC D to F; 1 if left out",
                Span(1, 1.3),
                optional=True,
            ),
        ),
        result=Result("Delta_a", "displacement", "allowable story drift, in the unit of h_sx"),
        function=drift.allowable_drift,
        expression="{ratio}·{h_sx}/{rho}",
        native=_limit_native(),
        example=Example({"h_sx": 144.0, "structure": "all other", "risk_category": "II"}, "2.88"),
        terms=(Term("ratio", "ratio", _ratio),),
    ),
    SheetFunction(
        name="ELF_DRIFT_EDGES",
        summary="Whether the design story drift is taken along the edges: yes or no.",
        category="Drift",
        rule="edge_drift",
        arguments=(TIR, SDC),
        result=Result("edges", "text", "yes or no"),
        function=drift.edges_due,
        expression="{TIR} > 1.2 and Seismic Design Category {SDC} is C to F",
        native=('IF(AND({TIR}>1.2*(1+1E-12),OR({SDC}="C",{SDC}="D",{SDC}="E",{SDC}="F")),"yes","no")'),
        example=Example({"TIR": 1.3, "SDC": "D"}, "yes"),
    ),
    SheetFunction(
        name="ELF_DRIFT_CHECKED",
        summary="Design story drift that is compared with the allowable one: along the edges where due.",
        category="Drift",
        rule="edge_drift",
        arguments=(
            Argument("Delta_cm", "displacement", "Design story drift between the centres of mass"),
            Argument("Delta_1", "displacement", "Design story drift along one edge"),
            Argument("Delta_2", "displacement", "Design story drift along the opposite edge"),
            Argument("edges", "text", "Along the edges", kind=Kind.CHOICE, choices=YES_NO),
        ),
        result=Result("Delta", "displacement", "drift to check, a magnitude"),
        function=drift.drift_to_check,
        cases=(
            Case("max(|{Delta_1}|; |{Delta_2}|)", "the edges count: {edges}", lambda edges: edges == "yes"),
            Case("|{Delta_cm}|", "the edges count: {edges}", lambda: True),
        ),
        native='IF({edges}="yes",MAX(ABS({Delta_1}),ABS({Delta_2})),ABS({Delta_cm}))',
        example=Example({"Delta_cm": 1.0, "Delta_1": 1.4, "Delta_2": 0.6, "edges": "yes"}, "1.4"),
    ),
)
