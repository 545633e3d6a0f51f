"""Worksheet functions of the redundancy factor."""

from __future__ import annotations

from dataclasses import replace

from engine import redundancy
from engine.require import YES_NO
from xlbridge.catalogue.common import SDC, TIR, edition, rho
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
)

_INPUTS = (
    SDC,
    Argument(
        "configuration",
        "text",
        "Condition of 12.3.4.2 that the direction meets",
        kind=Kind.CHOICE,
        choices=redundancy.CONFIGURATIONS,
    ),
    replace(TIR, name="TIR_X", symbol="TIR_X", text="Largest torsional irregularity ratio, forces along X"),
    replace(TIR, name="TIR_Y", symbol="TIR_Y", text="Largest torsional irregularity ratio, forces along Y"),
    edition,
)
_EXAMPLE = {
    "SDC": "D",
    "configuration": redundancy.CONFIGURATIONS[1],
    "TIR_X": 1.45,
    "TIR_Y": 1.1,
    "edition": "7-16",
}
_EXPRESSION = (
    "1.0 in A to C; else 1.3, or 1.0 where a or b is met and extreme torsion does not rule it out: category "
    "{SDC}, condition {configuration}, TIR = {TIR_X} and {TIR_Y}, {edition}"
)
_COUNTS = ",".join(f'{{use}}="{use}"' for use in redundancy.RHO_COUNTS)
_OVER_X, _OVER_Y = "{TIR_X}>1.4*(1+1E-12)", "{TIR_Y}>1.4*(1+1E-12)"

FUNCTIONS = (
    SheetFunction(
        name="ELF_RHO",
        summary="Redundancy factor of one direction.",
        category="Redundancy",
        rule="rho_value",
        arguments=_INPUTS,
        result=Result("rho", "none", "redundancy factor"),
        function=redundancy.redundancy_factor,
        expression=_EXPRESSION,
        native=(
            'IF(OR({SDC}="A",{SDC}="B",{SDC}="C"),1,IF(OR(AND({edition}="7-16",{SDC}="D",'
            f'OR({_OVER_X},{_OVER_Y})),AND({{edition}}="7-22",{_OVER_X},{_OVER_Y}),'
            '{configuration}="none"),1.3,1))'
        ),
        example=Example(_EXAMPLE, "1.3"),
    ),
    SheetFunction(
        name="ELF_RHO_REASON",
        summary="Why the redundancy factor is what it is.",
        category="Redundancy",
        rule="rho_value",
        arguments=_INPUTS,
        result=Result("reason", "text", "value and reason"),
        function=redundancy.redundancy_reason,
        expression=_EXPRESSION,
        example=Example(_EXAMPLE, "1.3: torsional irregularity ratio above 1.4 in one direction, 12.3.4.2"),
    ),
    SheetFunction(
        name="ELF_RHO_USE",
        summary="Redundancy factor that counts in a use: rho for strength and transfer forces, else 1.0.",
        category="Redundancy",
        rule="rho_one",
        arguments=(
            Argument("use", "text", "What it is used for", kind=Kind.CHOICE, choices=redundancy.USES),
            rho,
        ),
        result=Result("rho", "none", "redundancy factor in the use"),
        function=redundancy.redundancy_in_use,
        expression="{rho} for strength and transfer forces, else 1; here {use}",
        native=f"IF(OR({_COUNTS}),{{rho}},1)",
        example=Example({"use": "strength", "rho": 1.3}, "1.3"),
    ),
    SheetFunction(
        name="ELF_WALL_BAYS",
        summary="Bays that a shear wall counts for in condition b of the redundancy factor.",
        category="Redundancy",
        rule="rho_bays",
        arguments=(
            Argument("L_w", "length", "Length of the shear wall", POSITIVE),
            Argument("h_sx", "length", "Story height", POSITIVE),
            Argument("light_frame", "text", "Light-frame wall", kind=Kind.CHOICE, choices=YES_NO),
        ),
        result=Result("bays", "none", "number of bays"),
        function=redundancy.wall_bays,
        cases=(
            Case("2·{L_w}/{h_sx}", "light frame: {light_frame}", lambda light_frame: light_frame == "yes"),
            Case("{L_w}/{h_sx}", "light frame: {light_frame}", lambda: True),
        ),
        native='IF({light_frame}="yes",2,1)*{L_w}/{h_sx}',
        example=Example({"L_w": 24.0, "h_sx": 10.0, "light_frame": "no"}, "2.4"),
    ),
    SheetFunction(
        name="ELF_RHO_STORY",
        summary="Whether a story counts for the conditions of the redundancy factor: yes or no.",
        category="Redundancy",
        rule="rho_value",
        arguments=(
            Argument("V_x", "force", "Story shear", NOT_NEGATIVE),
            Argument("V", "force", "Base shear", POSITIVE),
        ),
        result=Result("counts", "text", "yes or no"),
        function=redundancy.counts_for_redundancy,
        expression="{V_x} > 0.35·{V}",
        example=Example({"V_x": 100.0, "V": 280.0}, "yes"),
    ),
)
