"""Worksheet functions of the diaphragm design forces."""

from __future__ import annotations

from engine import diaphragm
from xlbridge.catalogue.common import S_DS, I_e, forces, h_x, heights, weights
from xlbridge.catalogue.entry import NOT_NEGATIVE, Argument, Example, Result, SheetFunction, Term

w_px = Argument("w_px", "force", "Weight tributary to the diaphragm at level x", NOT_NEGATIVE)
_INPUTS = (w_px, h_x, forces, weights, heights, S_DS, I_e)
_ABOVE = "({heights}>={h_x}*(1-1E-9))"
_EXAMPLE = {
    "w_px": 650.0,
    "h_x": 12.0,
    "forces": [26.0, 48.0, 60.1, 72.1, 80.1],
    "weights": [650.0, 600.0, 500.0, 450.0, 400.0],
    "heights": [12.0, 24.0, 36.0, 48.0, 60.0],
    "S_DS": 0.6,
    "I_e": 1.0,
}
_RAW = Term("raw", "w_px·ΣF_i/Σw_i", diaphragm.unlimited_force)
_EXPRESSION = "min(max({raw}; 0.2·{S_DS}·{I_e}·{w_px}); 0.4·{S_DS}·{I_e}·{w_px})"

FUNCTIONS = (
    SheetFunction(
        name="ELF_FPX",
        summary="Diaphragm design force of a level, with its lower and upper limits.",
        category="Diaphragm",
        rule="F_px",
        also=("F_px_min", "F_px_max"),
        arguments=_INPUTS,
        result=Result("F_px", "force", "diaphragm design force"),
        function=diaphragm.design_force,
        expression=_EXPRESSION,
        native=(
            f"IF({{w_px}}=0,0,MIN(MAX(SUMPRODUCT({_ABOVE}*{{forces}})/SUMPRODUCT({_ABOVE}*{{weights}})*{{w_px}},"
            "0.2*{S_DS}*{I_e}*{w_px}),0.4*{S_DS}*{I_e}*{w_px}))"
        ),
        example=Example(_EXAMPLE, "78.0"),
        terms=(_RAW,),
    ),
    SheetFunction(
        name="ELF_FPX_GOVERNS",
        summary="Which of the three diaphragm force equations governs at a level.",
        category="Diaphragm",
        rule="F_px",
        also=("F_px_min", "F_px_max"),
        arguments=_INPUTS,
        result=Result("governs", "text", "governing equation"),
        function=diaphragm.design_force_bound,
        expression=f"the bound that sets {_EXPRESSION}",
        example=Example(_EXAMPLE, "minimum 0.2 S_DS I_e w_px, Eq. 12.10-2"),
        terms=(_RAW,),
    ),
)
