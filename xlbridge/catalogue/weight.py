"""Worksheet functions of the effective seismic weight: what counts of a load, and a level's weight."""

from __future__ import annotations

from engine import weight
from engine.units import UNIT_LOAD_AREA_PER_FORCE
from xlbridge.catalogue.common import edition, units
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Example,
    Kind,
    Result,
    SheetFunction,
    Term,
)

_SCALE = 'IF({units}="us",1000,1)'


def _scale(units: str) -> float:
    return UNIT_LOAD_AREA_PER_FORCE[units]


def _snow_share(p_f: float, edition: str, units: str) -> float:
    return float(weight.snow_unit_load(p_f, edition, units) / p_f) if p_f else 0.0


SCALE = Term("scale", "(1000 lb/kip, or 1 in si)", _scale)
_COUNTED = Result("q", "unit load", "unit load that counts as seismic weight")

FUNCTIONS = (
    SheetFunction(
        name="ELF_AREA_WEIGHT",
        summary="Weight of a surface under a uniform load.",
        category="Seismic weight",
        rule="W",
        arguments=(
            Argument("area", "area", "Area on plan, or of a wall", NOT_NEGATIVE),
            Argument("unit_load", "unit load", "Load that counts, on each unit of area", NOT_NEGATIVE),
            units,
        ),
        result=Result("w", "force", "weight"),
        function=weight.area_weight,
        expression="{area}·{unit_load}/{scale}",
        terms=(SCALE,),
        native=f"{{area}}*{{unit_load}}/{_SCALE}",
        example=Example({"area": 9600.0, "unit_load": 80.0, "units": "us"}, "768"),
    ),
    SheetFunction(
        name="ELF_STORAGE_SHARE",
        summary="Part of a storage floor's live load that counts as seismic weight.",
        category="Seismic weight",
        rule="W_storage",
        arguments=(
            Argument(
                "live_load", "unit load", "Floor live load of the storage area", NOT_NEGATIVE, symbol="L"
            ),
            Argument(
                "storage",
                "text",
                "Counted, or the exception used",
                kind=Kind.CHOICE,
                choices=weight.STORAGE_USES,
            ),
        ),
        result=_COUNTED,
        function=weight.storage_unit_load,
        expression="{share}·{live_load}",
        terms=(
            Term(
                "share",
                "share (0.25, or 0 by an exception)",
                lambda storage: weight.storage_unit_load(1.0, storage),
            ),
        ),
        native=f'IF({{storage}}="{weight.STORAGE_USES[0]}",0.25,0)*{{live_load}}',
        example=Example({"live_load": 125.0, "storage": "counted"}, "31.25"),
    ),
    SheetFunction(
        name="ELF_STORAGE_RATIO",
        summary="What a level's storage adds, in parts of its other weight: at most 0.05 need not count.",
        category="Seismic weight",
        rule="W_storage",
        arguments=(
            Argument(
                "w_storage", "force", "Weight of storage at the level, 25 % of its live load", NOT_NEGATIVE
            ),
            Argument("w_other", "force", "Effective seismic weight of the level without storage", POSITIVE),
        ),
        result=Result("ratio", "none", "ratio to compare with 0.05"),
        function=weight.storage_ratio,
        expression="{w_storage}/{w_other}",
        native="{w_storage}/{w_other}",
        example=Example({"w_storage": 30.0, "w_other": 600.0}, "0.05"),
        note="From memory: 5 % of the weight without storage, the stricter reading; the other is with it.",
    ),
    SheetFunction(
        name="ELF_PARTITION_SHARE",
        summary="Partition load that counts as seismic weight: the actual one, at least 10 psf (0.48 kN/m2).",
        category="Seismic weight",
        rule="W_partitions",
        arguments=(
            Argument(
                "partitions", "unit load", "Actual weight of partitions over the floor area", NOT_NEGATIVE
            ),
            units,
        ),
        result=_COUNTED,
        function=weight.partition_unit_load,
        expression="max({partitions}; {least})",
        terms=(Term("least", "10 psf or 0.48 kN/m2", lambda units: weight.partition_unit_load(0.0, units)),),
        native='MAX({partitions},IF({units}="us",10,0.48))',
        example=Example({"partitions": 8.0, "units": "us"}, "10"),
    ),
    SheetFunction(
        name="ELF_SNOW_SHARE",
        summary="Part of the flat roof snow load that counts as seismic weight.",
        category="Seismic weight",
        rule="W_snow",
        arguments=(
            Argument("p_f", "unit load", "Flat roof snow load", NOT_NEGATIVE),
            edition,
            units,
        ),
        result=_COUNTED,
        function=weight.snow_unit_load,
        expression="{share}·{p_f}",
        terms=(
            Term(
                "share",
                "share (7-16: 0.20 above 30 psf, 1.44 kN/m2; 7-22: 0.15 above 45 psf, 2.16 kN/m2; else 0)",
                _snow_share,
            ),
        ),
        native=(
            'IF({edition}="7-16",IF({p_f}>IF({units}="us",30,1.44),0.2*{p_f},0),'
            'IF({p_f}>IF({units}="us",45,2.16),0.15*{p_f},0))'
        ),
        example=Example({"p_f": 50.0, "edition": "7-22", "units": "us"}, "7.5"),
    ),
    SheetFunction(
        name="ELF_LEVEL_WEIGHT",
        summary="Effective seismic weight of one level from its list of areas and unit loads.",
        category="Seismic weight",
        rule="W",
        arguments=(
            Argument(
                "areas", "area", "Areas of the items", NOT_NEGATIVE, Kind.LEVELS, symbol="A_i", each="item"
            ),
            Argument(
                *("unit_loads", "unit load", "Loads that count, by item", NOT_NEGATIVE, Kind.LEVELS),
                symbol="q_i",
                each="item",
            ),
            units,
            Argument(
                "equipment",
                "force",
                "Permanent equipment, landscaping and whatever else counts in full; 0 if left out",
                NOT_NEGATIVE,
                optional=True,
            ),
        ),
        result=Result("w_x", "force", "effective seismic weight of the level"),
        function=weight.level_weight,
        expression="Σ({areas}·{unit_loads})/{scale} + {equipment}",
        terms=(SCALE,),
        native=f"SUMPRODUCT({{areas}}*{{unit_loads}})/{_SCALE}+{{equipment}}",
        example=Example(
            {"areas": [9600.0, 3300.0], "unit_loads": [80.0, 15.0], "units": "us", "equipment": 22.5}, "840.0"
        ),
    ),
)
