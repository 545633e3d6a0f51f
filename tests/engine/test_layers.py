"""The layers: who may import whom, read off the syntax trees of all three packages."""

from __future__ import annotations

import ast
from collections.abc import Iterator
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[2]
PACKAGES = ("engine", "xlbridge", "workbook_templates")

#: the concepts in the order of the standard's flow: each may import earlier ones only
FLOW = (
    *("weight", "hazard", "occupancy", "systems", "period", "base_shear", "vertical", "torsion"),
    *("irregularity", "redundancy", "load_effects", "drift", "stability", "diaphragm"),
    *("separation", "two_stage", "dynamics"),
)
CONCEPTS = tuple(f"engine.{name}" for name in FLOW)
GROUND = ("engine.errors", "engine.units", "engine.version")
DOOR = (*GROUND, "engine.require")
DATA = (*DOOR, "engine.tables", "engine.editions")
#: clauses are printed everywhere from the edition data
CATALOGUE = (*GROUND, "engine.editions", "xlbridge.values", "xlbridge.catalogue")
BRIDGE = (*CATALOGUE, "xlbridge.adapter", "xlbridge.work")
#: a template is computed when it is made; its reader meets cells that were not evaluated, and finds places
COMPUTED = tuple(f"xlbridge.headless.{name}" for name in ("compute", "operands", "book", "references"))

#: layer -> what it may import besides itself
MAY_IMPORT: dict[str, tuple[str, ...]] = {
    "engine.errors": (),
    "engine.units": (),
    "engine.version": (),
    "engine.require": ("engine.errors",),
    "engine.levels": DOOR,
    "engine.tables": DOOR,
    "engine.editions": DOOR,
    **{name: (*DATA, "engine.levels", *CONCEPTS[:place]) for place, name in enumerate(CONCEPTS)},
    "engine.building": (*DATA, "engine.levels", *CONCEPTS),
    "engine": (*DATA, *CONCEPTS, "engine.building"),
    "xlbridge": (),
    "xlbridge.values": (),
    "xlbridge.catalogue": (*DATA, *CONCEPTS, "xlbridge.values"),
    "xlbridge.adapter": CATALOGUE,
    "xlbridge.work": CATALOGUE,
    "xlbridge.excel": BRIDGE,
    "xlbridge.calc": BRIDGE,
    "xlbridge.headless": (*GROUND, "xlbridge.values"),
    # the one place where the evaluator, which knows no formula of the standard, is given the functions
    "xlbridge.headless.compute": (*BRIDGE, "xlbridge.headless"),
    # formulas taken apart and put together again without the functions
    "xlbridge.native": (*CATALOGUE, "xlbridge.headless"),
    "workbook_templates": (*CATALOGUE, "xlbridge.work", "xlbridge.native", *COMPUTED),
    "xlbridge.audit": (*BRIDGE, "engine.building", "xlbridge.headless"),
    "xlbridge.cli": (*PACKAGES,),
}


def layer(module: str) -> str:
    """Return the layer of a module: its longest known prefix; a package's own name is itself alone."""
    parts = module.split(".")
    for length in (3, 2, 1):
        name = ".".join(parts[:length])
        if name in MAY_IMPORT and (length > 1 or len(parts) == 1 or name == "workbook_templates"):
            return name
    raise AssertionError(f"{module} belongs to no layer")


def imported(source: str, module: str, is_package: bool) -> Iterator[str]:
    """Yield every module of ours that a source imports, wherever the import stands."""
    home = module.split(".") if is_package else module.split(".")[:-1]
    for node in ast.walk(ast.parse(source)):
        if isinstance(node, ast.Import):
            names = [alias.name for alias in node.names]
        elif isinstance(node, ast.ImportFrom):
            start = home[: len(home) - node.level + 1] if node.level else []
            base = ".".join([*start, *([node.module] if node.module else [])])
            names = [
                f"{base}.{alias.name}" if is_module(f"{base}.{alias.name}") else base for alias in node.names
            ]
        else:
            continue
        yield from (name for name in names if name.split(".")[0] in PACKAGES)


def is_module(name: str) -> bool:
    path = ROOT.joinpath(*name.split("."))
    return path.with_suffix(".py").exists() or (path / "__init__.py").exists()


def trespasses(source: str, module: str, is_package: bool = False) -> list[str]:
    """Return the imports that a module's layer does not allow."""
    own = layer(module)
    return [
        f"{module} imports {target}"
        for target in imported(source, module, is_package)
        if layer(target) != own and not any(is_within(target, allowed) for allowed in MAY_IMPORT[own])
    ]


def is_within(module: str, allowed: str) -> bool:
    """Tell whether a module belongs to what is allowed: a package allows its parts."""
    return module == allowed or module.startswith(f"{allowed}.")


SOURCES = [path for package in PACKAGES for path in sorted((ROOT / package).rglob("*.py"))]


@pytest.mark.parametrize("path", SOURCES, ids=[str(path.relative_to(ROOT)) for path in SOURCES])
def test_imports_go_one_way(path):
    parts = path.relative_to(ROOT).with_suffix("").parts
    is_package = parts[-1] == "__init__"
    module = ".".join(parts[:-1] if is_package else parts)
    assert trespasses(path.read_text(encoding="utf-8"), module, is_package) == []


@pytest.mark.parametrize(
    ("module", "source"),
    [
        ("engine.errors", "from engine import units"),
        ("engine.tables", "from engine.period import PERIOD_SYSTEMS"),
        ("engine.base_shear", "from engine import vertical"),
        ("engine.base_shear", "def f():\n    from .vertical import exponent"),
        ("engine.vertical", "from engine.building import solve"),
        ("engine.building.solve", "import xlbridge.catalogue"),
        ("xlbridge.adapter", "from engine.vertical import exponent"),
        ("xlbridge.excel.module", "from xlbridge.calc import names"),
        ("xlbridge.headless.parser", "from xlbridge.catalogue import CATALOGUE"),
        ("workbook_templates.story", "import engine.vertical"),
        ("workbook_templates.story", "from xlbridge.headless.evaluate import Evaluator"),
        ("xlbridge.audit.routes", "from engine.vertical import exponent"),
        ("xlbridge.headless.interpreter", "from xlbridge.headless.compute import compute"),
        ("xlbridge.audit.routes", "import workbook_templates"),
    ],
)
def test_a_trespass_is_seen(module, source):
    assert len(trespasses(source, module)) == 1


def test_a_module_without_a_layer_is_seen():
    with pytest.raises(AssertionError, match="no layer"):
        layer("xlbridge.shortcut")


THIRD_PARTY_OF_THE_ENGINE = {"numpy"}


def test_the_engine_needs_numpy_alone():
    from sys import stdlib_module_names

    found = {
        name.split(".")[0]
        for path in SOURCES
        if path.is_relative_to(ROOT / "engine")
        for node in ast.walk(ast.parse(path.read_text(encoding="utf-8")))
        for name in (
            [alias.name for alias in node.names]
            if isinstance(node, ast.Import)
            else [node.module or ""]
            if isinstance(node, ast.ImportFrom)
            else []
        )
    }
    assert found - set(stdlib_module_names) - {"engine"} == THIRD_PARTY_OF_THE_ENGINE
