"""Worksheet functions of torsion."""

from __future__ import annotations

from engine import torsion
from xlbridge.catalogue.entry import POSITIVE, Argument, Example, Result, SheetFunction

FUNCTIONS = (
    SheetFunction(
        name="ELF_AX",
        summary="Torsional amplification factor of a level, between 1 and 3.",
        category="Torsion",
        rule="A_x",
        arguments=(
            Argument(
                "d_max", "displacement", "Largest displacement at level x, found with A_x = 1", POSITIVE
            ),
            Argument("d_avg", "displacement", "Average of the extreme points at level x", POSITIVE),
        ),
        result=Result("A_x", "none", "torsional amplification factor"),
        function=torsion.amplification,
        expression="min(max(({d_max}/(1.2·{d_avg}))²; 1); 3)",
        native="MIN(MAX(({d_max}/(1.2*{d_avg}))^2,1),3)",
        example=Example({"d_max": 1.4, "d_avg": 1.0}, "1.361"),
    ),
)
