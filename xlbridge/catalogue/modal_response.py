"""Worksheet functions of the modal response: one mode, the sum over the modes, and the scaling."""

from __future__ import annotations

from dataclasses import replace

from engine import base_shear, dynamics
from xlbridge.catalogue.common import S_1, I_e, R, h_at, h_x
from xlbridge.catalogue.dynamics import FIVE, MODAL, MODEL, PHI, mode
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
    Term,
)

C_sm = Argument("C_sm", "none", "Seismic response coefficient of the mode", POSITIVE)
w_x = Argument("w_x", "force", "Effective seismic weight of level x", NOT_NEGATIVE)
values = Argument(
    "values", "any", "Response in each mode, with its sign", kind=Kind.LEVELS, symbol="r_m", each="mode"
)
periods = Argument(
    "periods", "time", "Periods of the modes", POSITIVE, Kind.LEVELS, symbol="T_m", each="mode"
)
damping = Argument("damping", "none", "Damping ratio of the modes, 0.05 for 5 %", Span(0, 1, low_open=True))
T_i = Argument("T_i", "time", "Period of one mode", POSITIVE)
V_t = Argument("V_t", "force", "Combined base shear of the modes", POSITIVE)

PHI_X = Term("phi", "phi_xm", dynamics.mode_shape)
GAMMA = Term("Gamma", "Gamma_m", dynamics.mode_participation)
SHEAR = Term("shear", "V_xm", dynamics.modal_shear)

mode_numbers = Argument(
    "mode_numbers", "none", "Numbers of the modes, whole", Span(1), Kind.LEVELS, symbol="m", each="mode"
)
mode_coefficients = Argument(
    *("mode_coefficients", "none", "Seismic response coefficients of the modes", POSITIVE, Kind.LEVELS),
    symbol="C_sm",
    each="mode",
)
combination = Argument(
    "combination", "text", "Rule of combination", kind=Kind.CHOICE, choices=dynamics.COMBINATIONS
)
_TWO_MODES = {
    **{"mode_numbers": [1.0, 2.0], "mode_coefficients": [0.1, 0.2], **FIVE},
    **{"combination": "SRSS", "damping": 0.05},
}

FUNCTIONS = (
    SheetFunction(
        name="ELF_MODE_CS",
        summary="Seismic response coefficient of a mode: the spectrum at its period over R/I_e.",
        category=MODAL,
        rule="modal_response",
        arguments=(
            Argument("S_a", "acceleration", "Design spectral acceleration at the mode's period", POSITIVE),
            R,
            I_e,
        ),
        result=Result("C_sm", "none", "modal seismic response coefficient"),
        function=dynamics.modal_coefficient,
        expression="{S_a}/({R}/{I_e})",
        native="{S_a}/({R}/{I_e})",
        example=Example({"S_a": 0.8, "R": 8.0, "I_e": 1.25}, "0.125"),
    ),
    SheetFunction(
        name="ELF_MODE_FORCE",
        summary="Force at a level in a mode, with its sign.",
        category=MODAL,
        rule="modal_response",
        arguments=(mode, w_x, h_x, C_sm, *MODEL),
        result=Result("F_xm", "force", "modal force"),
        function=dynamics.modal_force,
        expression="{C_sm}·{Gamma}·{phi}·{w_x}",
        example=Example({"mode": 1.0, "w_x": 100.0, "h_x": 60.0, "C_sm": 0.1, **FIVE}, "12.5"),
        terms=(GAMMA, PHI_X),
    ),
    SheetFunction(
        name="ELF_MODE_SHEAR",
        summary="Story shear below a level in a mode, with its sign; at height 0 the base shear of the mode.",
        category=MODAL,
        rule="modal_response",
        arguments=(mode, h_at, C_sm, *MODEL),
        result=Result("V_xm", "force", "modal story shear"),
        function=dynamics.modal_shear,
        expression="{C_sm}·{Gamma}·Σ of {weights}·{phi} where {heights} ≥ {h_x}",
        example=Example({"mode": 1.0, "h_x": 12.0, "C_sm": 0.1, **FIVE}, "43.98"),
        terms=(GAMMA, PHI),
    ),
    SheetFunction(
        name="ELF_MODE_DISPLACEMENT",
        summary="Elastic displacement of a level in a mode, with its sign.",
        category=MODAL,
        rule="modal_response",
        arguments=(mode, h_x, C_sm, *MODEL),
        result=Result("delta_xem", "displacement", "modal elastic displacement"),
        function=dynamics.modal_displacement,
        expression="{C_sm}·{Gamma}·{phi}·g·(T_m/2π)²",
        example=Example({"mode": 1.0, "h_x": 60.0, "C_sm": 0.1, **FIVE}, "4.90"),
        terms=(GAMMA, PHI_X),
        note="Combine over the modes, then amplify by C_d/I_e.",
    ),
    SheetFunction(
        name="ELF_MODE_DRIFT",
        summary="Elastic drift of the story below a level in a mode, with its sign.",
        category=MODAL,
        rule="modal_response",
        arguments=(mode, h_x, C_sm, *MODEL),
        result=Result("Delta_xem", "displacement", "modal elastic story drift"),
        function=dynamics.modal_drift,
        expression="{shear}/k_x",
        example=Example({"mode": 1.0, "h_x": 12.0, "C_sm": 0.1, **FIVE}, "1.394"),
        terms=(SHEAR,),
        note="Combine over the modes, then amplify by C_d/I_e; never take it from combined displacements.",
    ),
    SheetFunction(
        name="ELF_MODAL_SHEAR",
        summary="Story shear combined over modes by SRSS or CQC; at 0, the base shear.",
        category=MODAL,
        rule="modal_combination",
        also=("modal_correlation",),
        arguments=(h_at, mode_numbers, mode_coefficients, *MODEL, combination, damping),
        result=Result("V_x", "force", "combined story shear"),
        function=dynamics.combined_shear,
        expression="{combination} of V_xm at {h_x} over the modes {mode_numbers} with C_sm = "
        "{mode_coefficients}, of {weights} on {stiffnesses} at {heights}, {damping} of critical",
        example=Example({"h_x": 12.0, **_TWO_MODES}, "44.83"),
    ),
    SheetFunction(
        name="ELF_MODAL_DRIFT",
        summary="Elastic drift of the story below a level combined over modes by SRSS or CQC.",
        category=MODAL,
        rule="modal_combination",
        also=("modal_correlation",),
        arguments=(h_x, mode_numbers, mode_coefficients, *MODEL, combination, damping),
        result=Result("Delta_xe", "displacement", "combined elastic story drift"),
        function=dynamics.combined_drift,
        expression="{combination} of Delta_xem at {h_x} over the modes {mode_numbers} with C_sm = "
        "{mode_coefficients}, of {weights} on {stiffnesses} at {heights}, {damping} of critical",
        example=Example({"h_x": 12.0, **_TWO_MODES}, "1.421"),
        note="Amplify it by C_d/I_e; never take a combined drift from combined displacements.",
    ),
    SheetFunction(
        name="ELF_SRSS",
        summary="Response combined over the modes: square root of the sum of the squares.",
        category=MODAL,
        rule="modal_combination",
        arguments=(values,),
        result=Result("r", "any", "combined response, in the unit of the values"),
        function=dynamics.square_root_of_squares,
        expression="(Σ({values}²))^0.5",
        native="SQRT(SUMSQ({values}))",
        example=Example({"values": [3.0, -4.0]}, "5"),
    ),
    SheetFunction(
        name="ELF_ABSSUM",
        summary="Absolute sum of the responses in the modes, a bound on every combination.",
        category=MODAL,
        rule="modal_combination",
        arguments=(values,),
        result=Result("r", "any", "absolute sum, in the unit of the values"),
        function=dynamics.absolute_sum,
        expression="Σ(abs({values}))",
        native="SUMPRODUCT(ABS({values}))",
        example=Example({"values": [3.0, -4.0]}, "7"),
    ),
    SheetFunction(
        name="ELF_CQC",
        summary="Response combined over the modes: complete quadratic combination, with signs and periods.",
        category=MODAL,
        rule="modal_correlation",
        arguments=(values, periods, damping),
        result=Result("r", "any", "combined response, in the unit of the values"),
        function=dynamics.complete_combination,
        expression="√(ΣΣ rho_ij·r_i·r_j) of r = {values} at T = {periods}, {damping} of critical",
        example=Example({"values": [3.0, 4.0], "periods": [1.0, 0.9], "damping": 0.05}, "6.03"),
    ),
    SheetFunction(
        name="ELF_MODE_CORRELATION",
        summary="Correlation coefficient of two modes of equal damping, as the complete combination uses it.",
        category=MODAL,
        rule="modal_correlation",
        arguments=(T_i, replace(T_i, name="T_j", symbol="T_j", text="Period of the other mode"), damping),
        result=Result("rho_ij", "none", "correlation coefficient"),
        function=dynamics.correlation,
        expression=(
            "8·{damping}^2·(1 + {beta})·{beta}^1.5/((1 - {beta}^2)^2 + 4·{damping}^2·{beta}·(1 + {beta})^2)"
        ),
        native=(
            "8*{damping}^2*(1+MIN({T_i}/{T_j},{T_j}/{T_i}))*MIN({T_i}/{T_j},{T_j}/{T_i})^1.5"
            "/((1-MIN({T_i}/{T_j},{T_j}/{T_i})^2)^2"
            "+4*{damping}^2*MIN({T_i}/{T_j},{T_j}/{T_i})*(1+MIN({T_i}/{T_j},{T_j}/{T_i}))^2)"
        ),
        example=Example({"T_i": 0.9, "T_j": 1.0, "damping": 0.05}, "0.473"),
        terms=(Term("beta", "beta", lambda T_i, T_j: min(T_i / T_j, T_j / T_i)),),
    ),
    SheetFunction(
        name="ELF_MODAL_SCALE",
        summary="Factor on combined forces: up to the equivalent lateral force base shear, at least 1.",
        category=MODAL,
        rule="modal_scaling",
        arguments=(
            Argument("V", "force", "Base shear of 12.8, its period at most C_u T_a", POSITIVE),
            V_t,
        ),
        result=Result("scale", "none", "factor on the forces"),
        function=dynamics.force_scale,
        expression="max({V}/{V_t}; 1)",
        native="MAX({V}/{V_t},1)",
        example=Example({"V": 100.0, "V_t": 80.0}, "1.25"),
    ),
    SheetFunction(
        name="ELF_MODAL_DRIFT_SCALE",
        summary="Factor on combined drifts: up to the shear by the minimum for S_1 from 0.6 on, at least 1.",
        category=MODAL,
        rule="modal_drift_scaling",
        arguments=(V_t, Argument("W", "force", "Effective seismic weight", POSITIVE), S_1, R, I_e),
        result=Result("scale", "none", "factor on the drifts"),
        function=dynamics.drift_scale,
        expression="max({C_s}·{W}/{V_t}; 1)",
        native="MAX(IF({S_1}>=0.6,0.5*{S_1}/({R}/{I_e}),0)*{W}/{V_t},1)",
        example=Example({"V_t": 50.0, "W": 2000.0, "S_1": 0.75, "R": 8.0, "I_e": 1.0}, "1.875"),
        terms=(Term("C_s", "C_s", base_shear.coefficient_minimum_near_fault),),
    ),
)
