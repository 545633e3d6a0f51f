"""Worksheet functions of the multi-period spectrum, and of parameters taken from a spectrum."""

from __future__ import annotations

from engine import hazard
from xlbridge.catalogue.common import T_L, edition, units
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Example,
    Kind,
    Result,
    SheetFunction,
)

T = Argument("T", "time", "Period, 0 allowed", NOT_NEGATIVE)
T_i = Argument("T_i", "time", "Periods of the spectrum", NOT_NEGATIVE, Kind.LEVELS, each="period")
S_ai = Argument(
    "S_ai", "acceleration", "Ordinates of the design spectrum", POSITIVE, Kind.LEVELS, each="period"
)
tail = Argument("tail", "text", "Beyond 10 s where T_L is below 10 s", kind=Kind.CHOICE, choices=hazard.TAILS)
_PAIRS = {"T_i": [0.0, 0.2, 1.0, 2.0, 5.0, 10.0], "S_ai": [0.4, 1.0, 0.6, 0.3, 0.1, 0.04]}
_TAIL = "{S_ai} at 10 s·10/T·min(T_L/T; 1) beyond 10 s with T_L = {T_L}, tail {tail}"

_COUNT = "SUMPRODUCT(--({T_i}<=@))"
_LOW, _HIGH = f"SMALL({{T_i}},{_COUNT})", f"SMALL({{T_i}},MIN({_COUNT}+1,COUNT({{T_i}})))"
_AT_LOW, _AT_HIGH = (f"SUMPRODUCT(({{T_i}}={place})*{{S_ai}})" for place in (_LOW, _HIGH))
_LINE = f"({_AT_LOW}+(@-{_LOW})*({_AT_HIGH}-{_AT_LOW})/MAX({_HIGH}-{_LOW},1E-300))"
_BEYOND = (
    "IF(MAX({T_i})=10,SUMPRODUCT(({T_i}=10)*{S_ai})*10/{T}"
    f'*MIN(IF({{tail}}="{hazard.TAILS[0]}",{{T_L}},MAX({{T_L}},10))/{{T}},1),NA())'
)


def _between(place: str) -> str:
    """The ordinate between the pairs in built-in functions, whatever their order."""
    return _LINE.replace("@", place)


_ORDINATE = f"IF({{T}}>MAX({{T_i}}),{_BEYOND},{_between('{T}')})"

FUNCTIONS = (
    SheetFunction(
        name="ELF_SA_MULTI",
        summary="Design spectral acceleration of the multi-period spectrum at a period.",
        category="Ground motion",
        rule="S_a_multi",
        arguments=(T, T_i, S_ai, T_L, tail),
        result=Result("S_a", "acceleration", "design spectral acceleration"),
        function=hazard.multi_period_acceleration,
        expression=f"{{S_ai}} at {{T_i}}, linear between, at T = {{T}}; {_TAIL}",
        native=_ORDINATE,
        example=Example({"T": 0.6, **_PAIRS, "T_L": 12.0, "tail": "as printed"}, "0.80"),
    ),
    SheetFunction(
        name="ELF_SA_METHOD1",
        summary="Ordinate of the multi-period spectrum for Method 1: left of the peak, the peak.",
        category="Ground motion",
        rule="C_s_method1",
        arguments=(T, T_i, S_ai, T_L, tail),
        result=Result("S_a", "acceleration", "design spectral acceleration"),
        function=hazard.method_1_acceleration,
        expression=f"the largest of {{S_ai}} left of its period, else {{S_ai}} at {{T_i}}, linear between, "
        f"at T = {{T}}; {_TAIL}",
        native=(
            f"IF({{T}}<SUMPRODUCT(MAX(({{S_ai}}=MAX({{S_ai}}))*{{T_i}})),MAX({{S_ai}},{_ORDINATE}),{_ORDINATE})"
        ),
        example=Example({"T": 0.1, **_PAIRS, "T_L": 12.0, "tail": "as printed"}, "1.0"),
    ),
    SheetFunction(
        name="ELF_SAM",
        summary="Ordinate or parameter of the MCE_R spectrum from that of the design spectrum.",
        category="Ground motion",
        rule="S_aM",
        arguments=(Argument("S_a", "acceleration", "Design spectral acceleration", NOT_NEGATIVE),),
        result=Result("S_aM", "acceleration", "MCE_R spectral acceleration"),
        function=hazard.mce_ordinate,
        expression="1.5·{S_a}",
        native="1.5*{S_a}",
        example=Example({"S_a": 1.0}, "1.5"),
    ),
    SheetFunction(
        name="ELF_SA_DESIGN",
        summary="Ordinate of the design spectrum from that of the MCE_R spectrum.",
        category="Ground motion",
        rule="S_a_design",
        arguments=(Argument("S_aM", "acceleration", "MCE_R spectral acceleration", NOT_NEGATIVE),),
        result=Result("S_a", "acceleration", "design spectral acceleration"),
        function=hazard.design_ordinate,
        expression="2/3·{S_aM}",
        native="2/3*{S_aM}",
        example=Example({"S_aM": 1.5}, "1.0"),
    ),
    SheetFunction(
        name="ELF_SDS_MULTI",
        summary="Design spectral acceleration at short periods, taken from a spectrum.",
        category="Ground motion",
        rule="S_DS_spectrum",
        arguments=(T_i, S_ai),
        result=Result("S_DS", "acceleration", "design spectral acceleration"),
        function=hazard.short_period_from_spectrum,
        expression="0.90·the largest of {S_ai} for {T_i} from 0.2 s to 5 s",
        native=(
            f"0.9*MAX({_between('0.2')},{_between('5')},SUMPRODUCT(MAX(({{T_i}}>=0.2)*({{T_i}}<=5)*{{S_ai}})))"
        ),
        example=Example(_PAIRS, "0.90"),
    ),
    SheetFunction(
        name="ELF_SD1_MULTI",
        summary="Design spectral acceleration at 1 s, taken from a spectrum.",
        category="Ground motion",
        rule="S_D1_spectrum",
        arguments=(
            T_i,
            S_ai,
            Argument("v_s", "velocity", "Average shear wave velocity of the site", POSITIVE),
            units,
            edition,
            Argument("reading", "text", "Where T S_a is read", kind=Kind.CHOICE, choices=hazard.READINGS),
        ),
        result=Result("S_D1", "acceleration", "design spectral acceleration"),
        function=hazard.one_second_from_spectrum,
        expression=(
            "max(share·the largest {T_i}·{S_ai} from 1 s to 2 s or 5 s; S_a at 1 s); v_s = {v_s}, "
            "units {units}, edition {edition}, {reading}"
        ),
        example=Example(
            {**_PAIRS, "v_s": 900.0, "units": "us", "edition": "7-22", "reading": "listed periods"}, "0.60"
        ),
    ),
    SheetFunction(
        name="ELF_SITE_FLOOR",
        summary="A parameter from a site-specific spectrum, at least 80 % of the mapped procedure's.",
        category="Ground motion",
        rule="S_floor",
        arguments=(
            Argument("S", "acceleration", "Parameter from the site-specific spectrum", POSITIVE),
            Argument("S_mapped", "acceleration", "The same parameter by the mapped procedure", POSITIVE),
        ),
        result=Result("S", "acceleration", "parameter with its floor"),
        function=hazard.site_specific_minimum,
        expression="max({S}; 0.80·{S_mapped})",
        native="MAX({S},0.8*{S_mapped})",
        example=Example({"S": 0.70, "S_mapped": 1.0}, "0.80"),
    ),
)
