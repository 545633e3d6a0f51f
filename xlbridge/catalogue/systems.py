"""Worksheet functions of the systems: coefficients, height limits, combinations."""

from __future__ import annotations

from engine import systems
from engine.editions import EDITIONS
from xlbridge.catalogue.common import SDC, C_d, R, edition, question, units
from xlbridge.catalogue.entry import POSITIVE, Argument, Case, Example, Kind, Result, SheetFunction, Span

_TEXT = "Row of Table 12.2-1, after the letter of its group"
system = Argument("system", "text", _TEXT, kind=Kind.CHOICE, choices=systems.SYSTEMS[EDITIONS[-1]])
#: rows without a doubt so large that no number is given
known_system = Argument("system", "text", _TEXT, kind=Kind.CHOICE, choices=systems.KNOWN)
Omega_0 = Argument("Omega_0", "none", "Overstrength factor as tabulated", Span(1))
R_upper = Argument("R_upper", "none", "Response modification coefficient of the upper part", Span(1))
R_lower = Argument("R_lower", "none", "Response modification coefficient of the lower part", Span(1))
increase = question(
    "increase", "Whether 12.2.5.4 is used: no extreme torsion, at most 60 % of the force in one plane"
)
R_systems = Argument(
    "R_systems",
    "none",
    "Response modification coefficients of the systems in one direction",
    Span(1),
    Kind.LEVELS,
    symbol="R_i",
    each="system",
)

_FRAME = "B. Steel special concentrically braced frames"
_LISTED = {"system": _FRAME, "edition": "7-22"}
_AT = {"system": _FRAME, "SDC": "D", "increase": "no", "edition": "7-22", "units": "us"}


def _coefficient(name: str, symbol: str, text: str, function: object, result: str) -> SheetFunction:
    return SheetFunction(
        name=name,
        summary=f"{text} of a system.",
        category="Systems",
        rule="system",
        arguments=(known_system, edition),
        result=Result(symbol, "none", text.lower()),
        function=function,  # type: ignore[arg-type]
        expression="that of {system} in Table 12.2-1 of {edition}",
        example=Example(_LISTED, result),
    )


FUNCTIONS = (
    _coefficient(
        "ELF_SYSTEM_R", "R", "Response modification coefficient", systems.response_modification, "6"
    ),
    _coefficient("ELF_SYSTEM_OMEGA", "Omega_0", "Overstrength factor", systems.overstrength, "2"),
    _coefficient(
        "ELF_SYSTEM_CD", "C_d", "Deflection amplification factor", systems.deflection_amplification, "5"
    ),
    SheetFunction(
        name="ELF_SYSTEM_SOURCE",
        summary="What the row of a system in Table 12.2-1 rests on: seen, from memory or uncertain.",
        category="Systems",
        rule="system",
        arguments=(system, edition),
        result=Result("source", "text", "source of the row"),
        function=systems.confidence,
        expression="that of the row {system} in edition {edition}",
        example=Example(
            {"system": "B. Detailed plain concrete shear walls", "edition": "7-22"},
            "coefficients from memory; height limits from memory; row of 7-16, from memory unchanged in 7-22",
        ),
    ),
    SheetFunction(
        name="ELF_SYSTEM_STATUS",
        summary="Whether R, Omega_0 and C_d as entered are those of Table 12.2-1, and what differs.",
        category="Systems",
        rule="system",
        arguments=(system, R, Omega_0, C_d, edition),
        result=Result("status", "text", "entry against the table"),
        function=systems.coefficients_status,
        expression="{R}, {Omega_0}, {C_d} against the row {system} in edition {edition}",
        example=Example(
            {**_LISTED, "R": 8.0, "Omega_0": 2.0, "C_d": 5.0}, "differs: table R = 6 (from memory: confirm)"
        ),
    ),
    SheetFunction(
        name="ELF_HEIGHT_LIMIT",
        summary="Limit on the structural height of a system, in words: a height, NL or NP.",
        category="Systems",
        rule="height_limit",
        arguments=(system, SDC, increase, edition, units),
        result=Result("limit", "text", "height limit"),
        function=systems.height_limit,
        expression="that of {system} in category {SDC}, edition {edition}, {units}, increased: {increase}",
        example=Example(_AT, "160 ft (from memory: confirm)"),
    ),
    SheetFunction(
        name="ELF_HEIGHT_STATUS",
        summary="Whether the structural height keeps the limit of the system.",
        category="Systems",
        rule="height_limit",
        arguments=(
            Argument("h_n", "length", "Structural height, in ft (us) or m (si)", POSITIVE),
            *(system, SDC, increase, edition, units),
        ),
        result=Result("status", "text", "height against its limit"),
        function=systems.height_status,
        expression="{h_n} against the limit of {system} in category {SDC}, edition {edition}, {units},"
        " increased: {increase}",
        example=Example({**_AT, "h_n": 93.0}, "within the limit: 160 ft (from memory: confirm)"),
    ),
    SheetFunction(
        name="ELF_OMEGA",
        summary="Overstrength factor, less 0.5 where diaphragms are flexible and it is at least 2.5.",
        category="Systems",
        rule="Omega_0_reduced",
        arguments=(
            Omega_0,
            Argument(
                "reduction",
                "text",
                "Whether the reduction is taken",
                kind=Kind.CHOICE,
                choices=systems.OVERSTRENGTH_RULES,
            ),
        ),
        result=Result("Omega_0", "none", "overstrength factor used"),
        function=systems.reduced_overstrength,
        cases=(
            Case(
                "{Omega_0} - 0.5",
                "{Omega_0} ≥ 2.5 with {reduction}",
                lambda Omega_0, reduction: reduction == "flexible diaphragms" and Omega_0 >= 2.5,
            ),
            Case(
                "{Omega_0}", "{Omega_0} < 2.5, or the diaphragms are not flexible: {reduction}", lambda: True
            ),
        ),
        native='{Omega_0}-IF(AND({reduction}="flexible diaphragms",{Omega_0}>=2.5),0.5,0)',
        example=Example({"Omega_0": 3.0, "reduction": "flexible diaphragms"}, "2.5"),
    ),
    SheetFunction(
        name="ELF_LOWER_PART",
        summary="R, Omega_0 or C_d for the lower part where one system stands on another.",
        category="Systems",
        rule="combination_vertical",
        arguments=(
            Argument("upper", "none", "The coefficient of the upper system", Span(1)),
            Argument("lower", "none", "The same coefficient of the lower system", Span(1)),
            R_upper,
            R_lower,
        ),
        result=Result("coefficient", "none", "coefficient for the lower part"),
        function=systems.lower_part_coefficient,
        cases=(
            Case("{lower}", "{R_lower} < {R_upper}", lambda R_lower, R_upper: R_lower < R_upper),
            Case("{upper}", "{R_lower} ≥ {R_upper}", lambda: True),
        ),
        native="IF({R_lower}<{R_upper},{lower},{upper})",
        example=Example({"upper": 4.0, "lower": 5.0, "R_upper": 6.5, "R_lower": 5.0}, "5.0"),
    ),
    SheetFunction(
        name="ELF_TRANSFER_FACTOR",
        summary="Factor on the forces that an upper system hands down to a lower one with a lower R.",
        category="Systems",
        rule="combination_vertical",
        arguments=(R_upper, R_lower),
        result=Result("factor", "none", "factor on the transferred forces"),
        function=systems.transferred_force_factor,
        expression="max({R_upper}/{R_lower}; 1)",
        native="MAX({R_upper}/{R_lower},1)",
        example=Example({"R_upper": 6.5, "R_lower": 5.0}, "1.3"),
    ),
    SheetFunction(
        name="ELF_R_LEAST",
        summary="R of several systems that act in one direction: the least.",
        category="Systems",
        rule="combination_horizontal",
        arguments=(R_systems,),
        result=Result("R", "none", "response modification coefficient"),
        function=systems.least_R,
        expression="min({R_systems})",
        native="MIN({R_systems})",
        example=Example({"R_systems": [6.5, 5.0, 8.0]}, "5.0"),
    ),
    SheetFunction(
        name="ELF_LEAST_R_VALUE",
        summary="Omega_0 or C_d of several systems in one direction: that of the system with the least R.",
        category="Systems",
        rule="combination_horizontal",
        arguments=(
            Argument(
                "coefficients",
                "none",
                "Omega_0 or C_d of the same systems",
                Span(1),
                Kind.LEVELS,
                each="system",
            ),
            R_systems,
        ),
        result=Result("coefficient", "none", "coefficient of the direction"),
        function=systems.coefficient_of_least_R,
        expression="the value of {coefficients} where {R_systems} is least, the larger of a tie",
        native="SUMPRODUCT(MAX(({R_systems}<=MIN({R_systems})*(1+1E-12))*{coefficients}))",
        example=Example({"coefficients": [4.0, 3.5, 5.5], "R_systems": [6.5, 5.0, 8.0]}, "3.5"),
    ),
)
