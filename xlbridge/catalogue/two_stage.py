"""Worksheet functions of the two-stage procedure for a flexible part on a rigid one."""

from __future__ import annotations

from engine import two_stage
from xlbridge.catalogue.common import question
from xlbridge.catalogue.entry import POSITIVE, Argument, Example, Kind, Result, SheetFunction, Span
from xlbridge.catalogue.systems import R_lower, R_upper


def _procedure(name: str, part: str) -> Argument:
    text = f"Procedure by which the {part} part is analysed"
    return Argument(name, "text", text, kind=Kind.CHOICE, choices=two_stage.PROCEDURES)


_ELF = two_stage.PROCEDURES[0]

FUNCTIONS = (
    SheetFunction(
        name="ELF_PART_STIFFNESS",
        summary="Stiffness of the upper or lower part: its base shear over the displacement at its own top.",
        category="Two-stage procedure",
        rule="two_stage_stiffness",
        arguments=(
            Argument("V", "force", "Base shear of the part (lower: with the upper reactions)", POSITIVE),
            Argument("delta", "displacement", "Elastic displacement at its top, base fixed", POSITIVE),
        ),
        result=Result("K", "stiffness", "stiffness of the part"),
        function=two_stage.part_stiffness,
        expression="{V}/{delta}",
        native="{V}/{delta}",
        example=Example({"V": 120.0, "delta": 0.8}, "150"),
    ),
    SheetFunction(
        name="ELF_STIFFNESS_RATIO",
        summary="Stiffness of the lower part over that of the upper part: at least 10.",
        category="Two-stage procedure",
        rule="two_stage_stiffness",
        arguments=(
            Argument("K_lower", "stiffness", "Stiffness of the lower part", POSITIVE),
            Argument("K_upper", "stiffness", "Stiffness of the upper part", POSITIVE),
        ),
        result=Result("ratio", "none", "stiffness ratio"),
        function=two_stage.stiffness_ratio,
        expression="{K_lower}/{K_upper}",
        native="{K_lower}/{K_upper}",
        example=Example({"K_lower": 1500.0, "K_upper": 120.0}, "12.5"),
    ),
    SheetFunction(
        name="ELF_PERIOD_RATIO",
        summary="Period of the whole over that of the upper part on a fixed base: at most 1.1.",
        category="Two-stage procedure",
        rule="two_stage_period",
        arguments=(
            Argument("T_whole", "time", "Period of the whole structure", POSITIVE),
            Argument("T_upper", "time", "Period of the upper part on a fixed base", POSITIVE),
        ),
        result=Result("ratio", "none", "period ratio"),
        function=two_stage.period_ratio,
        expression="{T_whole}/{T_upper}",
        native="{T_whole}/{T_upper}",
        example=Example({"T_whole": 0.63, "T_upper": 0.6}, "1.05"),
    ),
    SheetFunction(
        name="ELF_REACTION_FACTOR",
        summary="Factor on the reactions of the upper part as they act on the lower part, at least 1.",
        category="Two-stage procedure",
        rule="two_stage_reactions",
        arguments=(
            R_upper,
            Argument("rho_upper", "none", "Redundancy factor of the upper part", Span(1)),
            R_lower,
            Argument("rho_lower", "none", "Redundancy factor of the lower part", Span(1)),
        ),
        result=Result("factor", "none", "factor on the reactions"),
        function=two_stage.reaction_factor,
        expression="max(({R_upper}/{rho_upper})/({R_lower}/{rho_lower}); 1)",
        native="MAX(({R_upper}/{rho_upper})/({R_lower}/{rho_lower}),1)",
        example=Example({"R_upper": 6.5, "rho_upper": 1.3, "R_lower": 4.0, "rho_lower": 1.0}, "1.25"),
    ),
    SheetFunction(
        name="ELF_TWO_STAGE",
        summary="Whether the two-stage procedure may be used, and what fails.",
        category="Two-stage procedure",
        rule="two_stage",
        arguments=(
            Argument("stiffness_ratio", "none", "Stiffness ratio, lower to upper", POSITIVE),
            Argument("period_ratio", "none", "Period ratio, whole to upper", POSITIVE),
            _procedure("upper_procedure", "upper"),
            _procedure("lower_procedure", "lower"),
        ),
        result=Result("status", "text", "conditions of the procedure"),
        function=two_stage.two_stage_status,
        expression="{stiffness_ratio} ≥ 10, {period_ratio} ≤ 1.1, upper by {upper_procedure},"
        " lower by {lower_procedure}",
        example=Example(
            {
                **{"stiffness_ratio": 9.0, "period_ratio": 1.05},
                **{"upper_procedure": _ELF, "lower_procedure": _ELF},
            },
            "not permitted: stiffness ratio below 10 (item a)",
        ),
    ),
    SheetFunction(
        name="ELF_TWO_STAGE_TRANSITION",
        summary="What a discontinuity at the transition between the parts brings.",
        category="Two-stage procedure",
        rule="two_stage_transition",
        arguments=(
            question(
                "discontinuity", "Whether there is an out-of-plane or in-plane offset at the transition"
            ),
        ),
        result=Result("amplification", "text", "amplification at the transition"),
        function=two_stage.transition_amplification,
        expression="what is due for a discontinuity at the transition: {discontinuity}",
        native=f'IF({{discontinuity}}="yes","{two_stage.TRANSITION[1]}","{two_stage.TRANSITION[0]}")',
        example=Example({"discontinuity": "no"}, "none"),
    ),
)
