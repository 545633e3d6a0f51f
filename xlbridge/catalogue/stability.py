"""Worksheet functions of P-delta effects."""

from __future__ import annotations

from dataclasses import replace

from engine import stability
from engine.editions import value
from xlbridge.catalogue.common import C_d, I_e, Omega_0, edition, h_sx
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Result,
    SheetFunction,
    Span,
    Term,
)

_SMALL = "{theta}<=0.1*(1+1E-12)"
beta = Argument("beta", "none", "Shear demand over shear capacity of the story", Span(0, 1, low_open=True))


def _floor(edition: str) -> float:
    return value(edition, "beta_floor_factor")


theta = Argument("theta", "none", "Stability coefficient", NOT_NEGATIVE)

FUNCTIONS = (
    SheetFunction(
        name="ELF_THETA",
        summary="Stability coefficient of a story.",
        category="Stability",
        rule="theta",
        arguments=(
            Argument("P_x", "force", "Vertical design load at and above level x", NOT_NEGATIVE),
            Argument("Delta", "displacement", "Design story drift", NOT_NEGATIVE),
            I_e,
            Argument("V_x", "force", "Story shear", POSITIVE),
            h_sx,
            C_d,
        ),
        result=Result("theta", "none", "stability coefficient"),
        function=stability.stability_coefficient,
        expression="{P_x}·{Delta}·{I_e}/({V_x}·{h_sx}·{C_d})",
        native="{P_x}*{Delta}*{I_e}/({V_x}*{h_sx}*{C_d})",
        example=Example(
            {"P_x": 257772.0, "Delta": 6.659, "I_e": 1.0, "V_x": 4579.0, "h_sx": 3200.0, "C_d": 5.5}, "0.0213"
        ),
    ),
    SheetFunction(
        name="ELF_BETA",
        summary="Ratio of shear demand to capacity that the stability limit may use.",
        category="Stability",
        rule="beta",
        arguments=(beta, Omega_0, edition),
        result=Result("beta", "none", "shear demand over shear capacity"),
        function=stability.demand_ratio,
        expression="max({beta}; {floor}/{Omega_0}), at most 1",
        native='MAX({beta},MIN(IF({edition}="7-22",1.25,0)/{Omega_0},1))',
        example=Example({"beta": 0.3, "Omega_0": 2.5, "edition": "7-22"}, "0.5"),
        terms=(Term("floor", "floor", _floor),),
    ),
    SheetFunction(
        name="ELF_THETA_MAX",
        summary="Upper limit of the stability coefficient.",
        category="Stability",
        rule="theta_max",
        arguments=(
            C_d,
            replace(beta, text=f"{beta.text}; 1 if left out", optional=True),
        ),
        result=Result("theta_max", "none", "upper limit of the stability coefficient"),
        function=stability.stability_limit,
        expression="min(0.5/({beta}·{C_d}); 0.25)",
        native="MIN(0.5/({beta}*{C_d}),0.25)",
        example=Example({"C_d": 5.5}, "0.0909"),
    ),
    SheetFunction(
        name="ELF_PDELTA_FACTOR",
        summary="Amplification of drifts and forces for P-delta: 1/(1 - theta) above 0.10, else 1.",
        category="Stability",
        rule="theta_amplifier",
        arguments=(replace(theta, span=Span(0, 1, high_open=True)),),
        result=Result("a_theta", "none", "P-delta amplification"),
        function=stability.second_order_factor,
        cases=(
            Case("1", "{theta} ≤ 0.10", lambda theta: theta <= 0.10 * (1 + 1e-12)),
            Case("1/(1 - {theta})", "{theta} > 0.10", lambda: True),
        ),
        native="IF({theta}<=0.1*(1+1E-12),1,1/(1-{theta}))",
        example=Example({"theta": 0.2}, "1.25"),
    ),
    SheetFunction(
        name="ELF_PDELTA_STATUS",
        summary="What the stability coefficient asks for, in words; both limits when they collide.",
        category="Stability",
        rule="theta_max",
        arguments=(
            theta,
            Argument("theta_max", "none", "Upper limit of the stability coefficient", POSITIVE),
        ),
        result=Result("status", "text", "consequence"),
        function=stability.stability_verdict,
        expression="{theta} against 0.10 and against theta_max = {theta_max}",
        native=(
            f"IF({{theta}}>{{theta_max}}*(1+1E-12),"
            f'IF({_SMALL},"{stability.VERDICTS[3]}","{stability.VERDICTS[2]}"),'
            f'IF({_SMALL},"{stability.VERDICTS[0]}","{stability.VERDICTS[1]}"))'
        ),
        example=Example({"theta": 0.15, "theta_max": 0.2}, "amplify by 1/(1 - theta)"),
    ),
)
