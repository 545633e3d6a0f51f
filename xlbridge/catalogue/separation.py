"""Worksheet functions of the separation of structures."""

from __future__ import annotations

from engine import separation
from engine.editions import value
from xlbridge.catalogue.common import C_d, I_e, R, edition
from xlbridge.catalogue.entry import NOT_NEGATIVE, Argument, Example, Result, SheetFunction, Term

delta_di = Argument(
    "delta_di", "displacement", "Diaphragm deflection at the design earthquake; 0 where none", NOT_NEGATIVE
)


def _counts(edition: str) -> float:
    return value(edition, "separation_diaphragm_term")


FUNCTIONS = (
    SheetFunction(
        name="ELF_DELTA_M",
        summary="Displacement that a separation has to take in; the set-back from a property line.",
        category="Separation",
        rule="delta_M",
        arguments=(
            Argument(
                "delta_max", "displacement", "Largest elastic displacement, torsion included", NOT_NEGATIVE
            ),
            delta_di,
            C_d,
            I_e,
            edition,
        ),
        result=Result("delta_M", "displacement", "displacement for separation"),
        function=separation.largest_displacement,
        expression="{C_d}·{delta_max}/{I_e} + {counts}·{delta_di}",
        native='{C_d}*{delta_max}/{I_e}+IF({edition}="7-22",1,0)*{delta_di}',
        example=Example(
            {"delta_max": 0.8, "delta_di": 0.3, "C_d": 5.0, "I_e": 1.0, "edition": "7-22"}, "4.3"
        ),
        terms=(Term("counts", "c", _counts),),
        note="c is 1 in 7-22 and 0 in 7-16.",
    ),
    SheetFunction(
        name="ELF_DELTA_MT",
        summary="Least gap between two structures on one property.",
        category="Separation",
        rule="delta_MT",
        arguments=(
            Argument("delta_M1", "displacement", "Displacement of one structure at the place", NOT_NEGATIVE),
            Argument("delta_M2", "displacement", "Displacement of the other at that height", NOT_NEGATIVE),
        ),
        result=Result("delta_MT", "displacement", "least gap"),
        function=separation.required_separation,
        expression="√({delta_M1}^2 + {delta_M2}^2)",
        native="SQRT({delta_M1}^2+{delta_M2}^2)",
        example=Example({"delta_M1": 3.0, "delta_M2": 4.0}, "5"),
    ),
    SheetFunction(
        name="ELF_GAP_STATUS",
        summary="Whether a gap is wide enough; to a property line, give delta_M as the least distance.",
        category="Separation",
        rule="delta_MT",
        arguments=(
            Argument("gap", "displacement", "Clear distance", NOT_NEGATIVE),
            Argument("delta_MT", "displacement", "Least distance", NOT_NEGATIVE),
        ),
        result=Result("status", "text", "wide enough or too narrow"),
        function=separation.separation_verdict,
        expression="{gap} against {delta_MT}",
        native=f'IF({{delta_MT}}>{{gap}}*(1+1E-12),"{separation.GAPS[1]}","{separation.GAPS[0]}")',
        example=Example({"gap": 5.0, "delta_MT": 5.0}, "wide enough"),
    ),
    SheetFunction(
        name="ELF_DELTA_MCE",
        summary="Displacement at the maximum considered earthquake, for members between structures.",
        category="Separation",
        rule="delta_MCE",
        arguments=(
            Argument("delta_e", "displacement", "Elastic displacement under the strength-level forces"),
            delta_di,
            R,
            I_e,
        ),
        result=Result("delta_MCE", "displacement", "displacement, a magnitude"),
        function=separation.mce_displacement,
        expression="1.5·({R}·|{delta_e}|/{I_e} + {delta_di})",
        native="1.5*({R}*ABS({delta_e})/{I_e}+{delta_di})",
        example=Example({"delta_e": 0.5, "delta_di": 0.4, "R": 8.0, "I_e": 1.0}, "6.6"),
    ),
)
