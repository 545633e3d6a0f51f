"""Worksheet functions of seismic load effects and load combinations."""

from __future__ import annotations

from engine import load_effects
from engine.editions import EDITIONS
from xlbridge.catalogue.common import S_DS, Omega_0, edition, rho
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
    Term,
)

Q_E = Argument("Q_E", "force", "Effect of the horizontal seismic forces, in any unit of an effect")
D = Argument("D", "force", "Effect of dead load, in any unit of an effect")
combination = Argument(
    "combination",
    "text",
    "Load combination: 2.3.6 strength, 2.4.5 allowable stress",
    kind=Kind.CHOICE,
    choices=load_effects.COMBINATIONS,
)


def _factor(combination: str, term: str, edition: str) -> str:
    return f"{load_effects.combination_factor(combination, term, edition):g}"


def _by_combination(formula: dict[tuple[str, str], str]) -> str:
    """One formula for each combination and edition, as a chain of conditions."""
    parts = [f'IF(AND({{combination}}="{c}",{{edition}}="{e}"),{text},' for (c, e), text in formula.items()]
    return f"{''.join(parts)}NA(){')' * len(parts)}"


_CASES = [(c, e) for e in EDITIONS for c in load_effects.COMBINATIONS]
_FACTORS = _by_combination(
    {
        (c, e): "".join(f'IF({{term}}="{t}",{_factor(c, t, e)},' for t in load_effects.TERMS)
        + f"NA(){')' * len(load_effects.TERMS)}"
        for c, e in _CASES
    }
)
_SUM = _by_combination(
    {(c, e): "+".join(f"{_factor(c, t, e)}*{{{t}}}" for t in load_effects.TERMS) for c, e in _CASES}
)
_DEAD = _by_combination(
    {(c, e): f"{_factor(c, 'D', e)}+{_factor(c, 'E_v', e)}*0.2*{{S_DS}}" for c, e in _CASES}
)


def _term_factor(name: str) -> Term:
    def compute(combination: str, edition: str) -> float:
        return float(load_effects.combination_factor(combination, name, edition))

    return Term(f"c_{name}", f"c({name})", compute)


_TERMS = tuple(map(_term_factor, load_effects.TERMS))

FUNCTIONS = (
    SheetFunction(
        name="ELF_EH",
        summary="Horizontal seismic load effect.",
        category="Load effects",
        rule="E_h",
        arguments=(rho, Q_E),
        result=Result("E_h", "force", "horizontal seismic load effect"),
        function=load_effects.horizontal_effect,
        expression="{rho}·{Q_E}",
        native="{rho}*{Q_E}",
        example=Example({"rho": 1.3, "Q_E": 50.0}, "65"),
    ),
    SheetFunction(
        name="ELF_EV",
        summary="Vertical seismic load effect, or zero by one of the two cases of the clause.",
        category="Load effects",
        rule="E_v",
        arguments=(
            S_DS,
            D,
            Argument(
                "taken", "text", "How it is taken", kind=Kind.CHOICE, choices=load_effects.VERTICAL_CASES
            ),
        ),
        result=Result("E_v", "force", "vertical seismic load effect"),
        function=load_effects.vertical_effect,
        cases=(
            Case(
                "0.2·{S_DS}·{D}",
                "E_v is {taken}",
                lambda taken: taken == load_effects.VERTICAL_CASES[0],
            ),
            Case("0", "E_v is {taken}", lambda: True),
        ),
        native=f'IF({{taken}}="{load_effects.VERTICAL_CASES[0]}",0.2*{{S_DS}}*{{D}},0)',
        example=Example({"S_DS": 1.0, "D": 120.0, "taken": "counted"}, "24"),
        note="S_DS capped by 12.8.1.3 may stand in its place where that clause allows it.",
    ),
    SheetFunction(
        name="ELF_EV_SPECTRUM",
        summary="Vertical seismic load effect from the vertical response spectrum.",
        category="Load effects",
        rule="E_v_spectrum",
        arguments=(
            Argument("S_av", "acceleration", "Design vertical spectral acceleration by 11.9", POSITIVE),
            D,
        ),
        result=Result("E_v", "force", "vertical seismic load effect"),
        function=load_effects.vertical_effect_spectrum,
        expression="0.3·{S_av}·{D}",
        native="0.3*{S_av}*{D}",
        example=Example({"S_av": 0.8, "D": 120.0}, "28.8"),
    ),
    SheetFunction(
        name="ELF_EMH",
        summary="Horizontal seismic load effect with overstrength.",
        category="Load effects",
        rule="E_mh",
        arguments=(Omega_0, Q_E),
        result=Result("E_mh", "force", "seismic load effect with overstrength"),
        function=load_effects.overstrength_effect,
        expression="{Omega_0}·{Q_E}",
        native="{Omega_0}*{Q_E}",
        example=Example({"Omega_0": 2.5, "Q_E": 50.0}, "125"),
    ),
    SheetFunction(
        name="ELF_EMH_LIMITED",
        summary="Horizontal seismic load effect with overstrength, at most the capacity-limited effect.",
        category="Load effects",
        rule="E_cl",
        arguments=(
            Omega_0,
            Q_E,
            Argument(
                "E_cl", "force", "Capacity-limited effect, a magnitude in the unit of Q_E", NOT_NEGATIVE
            ),
        ),
        result=Result("E_mh", "force", "seismic load effect with overstrength"),
        function=load_effects.limited_overstrength_effect,
        expression="min(max({Omega_0}·{Q_E}; -{E_cl}); {E_cl})",
        native="MIN(MAX({Omega_0}*{Q_E},-{E_cl}),{E_cl})",
        example=Example({"Omega_0": 2.5, "Q_E": -50.0, "E_cl": 110.0}, "-110"),
    ),
    SheetFunction(
        name="ELF_COMBINATION_FACTOR",
        summary="Factor on one term in a load combination; E_h stands for E_mh as well.",
        category="Load effects",
        rule="combination",
        arguments=(
            combination,
            Argument("term", "text", "Term", kind=Kind.CHOICE, choices=load_effects.TERMS),
            edition,
        ),
        result=Result("c", "none", "factor on the term"),
        function=load_effects.combination_factor,
        expression="factor on {term} in {combination}, {edition}",
        native=_FACTORS,
        example=Example({"combination": "2.4.5-9", "term": "S", "edition": "7-22"}, "0.1"),
    ),
    SheetFunction(
        name="ELF_COMBINE",
        summary="Sum of a load combination; E_h acts both ways, so work it out with either sign.",
        category="Load effects",
        rule="combination",
        arguments=(
            combination,
            D,
            Argument("E_v", "force", "Vertical seismic effect, in the unit of D"),
            Argument("E_h", "force", "Horizontal seismic effect, or E_mh, in the unit of D"),
            Argument("L", "force", "Effect of live load, in the unit of D"),
            Argument("S", "force", "Effect of snow load, in the unit of D"),
            edition,
        ),
        result=Result("sum", "force", "combined effect, in the unit of D"),
        function=load_effects.combined_effect,
        expression="{c_D}·{D} + {c_E_v}·{E_v} + {c_E_h}·{E_h} + {c_L}·{L} + {c_S}·{S}",
        native=_SUM,
        example=Example(
            {
                "combination": "2.3.6-6",
                "D": 100.0,
                "E_v": 20.0,
                "E_h": 60.0,
                "L": 40.0,
                "S": 30.0,
                "edition": "7-16",
            },
            "246",
        ),
        terms=_TERMS,
    ),
    SheetFunction(
        name="ELF_DEAD_FACTOR",
        summary="Factor on dead load in a combination, with the vertical seismic effect taken in.",
        category="Load effects",
        rule="combination",
        arguments=(combination, S_DS, edition),
        result=Result("c_D", "none", "factor on dead load"),
        function=load_effects.dead_load_factor,
        expression="{c_D} + {c_E_v}·0.2·{S_DS}",
        native=_DEAD,
        example=Example({"combination": "2.3.6-7", "S_DS": 1.0, "edition": "7-22"}, "0.7"),
        terms=_TERMS[:2],
    ),
)
