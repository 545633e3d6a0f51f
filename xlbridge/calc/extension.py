"""The files of the extension, all but the carried engine made from the catalogue."""

from __future__ import annotations

import io
import zipfile
from collections.abc import Iterator
from pathlib import Path
from typing import Final
from xml.sax.saxutils import escape

from engine.version import __version__
from xlbridge.calc import identity
from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.validate import describe

TEMPLATE: Final = Path(__file__).with_name("storyledger_addin.py.txt")
COMPONENT: Final = "storyledger_addin.py"
#: the folder of the packages
PACKAGES: Final = Path(__file__).parents[2]
#: what the extension carries along: the engine, and of the bridge what a cell needs
CARRIED: Final = (
    "engine",
    *(f"xlbridge/{part}" for part in ("__init__.py", "values.py", "adapter.py", "catalogue", "calc")),
)
EPOCH: Final = (1980, 1, 1, 0, 0, 0)
HEAD: Final = '<?xml version="1.0" encoding="UTF-8"?>\n'
ANY: Final = "any"
ROWS: Final = "sequence< sequence< any > >"


def package() -> bytes:
    """Return the extension as an .oxt; two calls give the same bytes."""
    packed = io.BytesIO()
    with zipfile.ZipFile(packed, "w", zipfile.ZIP_DEFLATED) as archive:
        for name, data in sorted(files().items()):
            archive.writestr(zipfile.ZipInfo(name, EPOCH), data, zipfile.ZIP_DEFLATED)
    return packed.getvalue()


def unpack(folder: Path) -> None:
    """Write the extension as a folder of files, as Calc keeps it once it is installed."""
    for name, data in files().items():
        target = folder / name
        target.parent.mkdir(parents=True, exist_ok=True)
        target.write_bytes(data)


def files() -> dict[str, bytes]:
    """Return every file of the extension by its path."""
    texts = {
        "META-INF/manifest.xml": _manifest(),
        "description.xml": _description(),
        "storyledger_addin.idl": interface(),
        "storyledger_addin.components": _components(),
        "CalcAddIns.xcu": configuration(),
        COMPONENT: component(),
    }
    carried = {f"pythonpath/{name}": path.read_bytes() for name, path in _carried()}
    return {name: text.encode() for name, text in texts.items()} | carried


def interface() -> str:
    """Return the interface in UNO's IDL, which Calc reads as text: rows of cells in, rows of cells out.

    A text comes out alone: Calc compares texts by their place in a pool, and those in rows are not put there,
    so that ``="no"`` would be FALSE for the text no.
    """
    methods = "\n".join(
        f"    {ANY if e.is_text else ROWS} {identity.METHODS[e.name]}( {_parameters(e)} );"
        for e in CATALOGUE.values()
    )
    opening = " ".join(f"module {name} {{" for name in identity.MODULES)
    closing = "}; " * len(identity.MODULES)
    return f"{opening}\n\ninterface {identity.INTERFACE} {{\n{methods}\n}};\n\n{closing}\n"


def _parameters(entry: SheetFunction) -> str:
    """An argument that may be left out is an ``any``: the only kind that Calc lets a user leave out."""
    kinds = enumerate(ANY if a.optional else ROWS for a in entry.arguments)
    return ", ".join(f"[in] {kind} {_parameter(place)}" for place, kind in kinds)


def _parameter(place: int) -> str:
    """A parameter's name in IDL, where the standard's symbols can not stand."""
    return f"argument{place + 1}"


def component() -> str:
    """Return the UNO component."""
    places = {
        "IMPLEMENTATION": identity.IMPLEMENTATION,
        "SERVICE": identity.SERVICE,
        "MODULE": ".".join(identity.MODULES),
        "INTERFACE": identity.INTERFACE,
        "METHODS": repr(dict(identity.METHODS)),
        "TEXTS": repr(tuple(name for name, entry in CATALOGUE.items() if entry.is_text)),
    }
    text = TEMPLATE.read_text(encoding="utf-8")
    for name, value in places.items():
        text = text.replace(f"@{name}@", value)
    return text


def configuration() -> str:
    """Return what the function wizard shows: names, descriptions, arguments."""
    nodes = "\n".join(map(_function_node, CATALOGUE.values()))
    return (
        f'{HEAD}<oor:component-data xmlns:oor="http://openoffice.org/2001/registry" '
        'xmlns:xs="http://www.w3.org/2001/XMLSchema" oor:name="CalcAddIns" '
        'oor:package="org.openoffice.Office">\n'
        f'<node oor:name="AddInInfo"><node oor:name="{identity.SERVICE}" oor:op="replace">'
        f'<node oor:name="AddInFunctions">\n{nodes}\n</node></node></node>\n</oor:component-data>\n'
    )


def _function_node(entry: SheetFunction) -> str:
    arguments = "".join(
        f'<node oor:name="{_parameter(place)}" oor:op="replace">'
        f"{_property('DisplayName', a.name)}{_property('Description', describe(a))}</node>"
        for place, a in enumerate(entry.arguments)
    )
    return (
        f'<node oor:name="{identity.METHODS[entry.name]}" oor:op="replace">'
        f"{_property('DisplayName', entry.name)}{_property('Description', entry.summary)}"
        f"{_property('Category', 'Add-In')}{_property('CategoryDisplayName', 'Storyledger')}"
        f"{_property('CompatibilityName', entry.name)}"
        f'<node oor:name="Parameters">{arguments}</node></node>'
    )


def _property(name: str, text: str) -> str:
    language = "" if name == "Category" else ' xml:lang="en-US"'
    return f'<prop oor:name="{name}"><value{language}>{escape(text)}</value></prop>'


def _carried() -> Iterator[tuple[str, Path]]:
    for part in CARRIED:
        place = PACKAGES / part
        for path in sorted(place.rglob("*")) if place.is_dir() else [place]:
            if path.is_file() and "__pycache__" not in path.parts:
                yield path.relative_to(PACKAGES).as_posix(), path


def _components() -> str:
    return (
        f'{HEAD}<components xmlns="http://openoffice.org/2010/uno-components">\n'
        f'  <component loader="com.sun.star.loader.Python" uri="{COMPONENT}">\n'
        f'    <implementation name="{identity.IMPLEMENTATION}">'
        f'<service name="{identity.SERVICE}"/></implementation>\n'
        "  </component>\n</components>\n"
    )


def _description() -> str:
    return (
        f'{HEAD}<description xmlns="http://openoffice.org/extensions/description/2006" '
        'xmlns:d="http://openoffice.org/extensions/description/2006" '
        'xmlns:xlink="http://www.w3.org/1999/xlink">\n'
        f'  <identifier value="{identity.EXTENSION}"/>\n  <version value="{__version__}"/>\n'
        '  <display-name><name lang="en">Storyledger worksheet functions</name></display-name>\n'
        '  <dependencies><l:LibreOffice-minimal-version d:name="LibreOffice 7.0" value="7.0" '
        'xmlns:l="http://libreoffice.org/extensions/description/2011"/></dependencies>\n</description>\n'
    )


def _manifest() -> str:
    kinds = {
        "storyledger_addin.idl": "uno-typelibrary;type=RDB",
        "storyledger_addin.components": "uno-components",
        "CalcAddIns.xcu": "configuration-data",
    }
    rows = "".join(
        f'  <manifest:file-entry manifest:full-path="{path}" '
        f'manifest:media-type="application/vnd.sun.star.{kind}"/>\n'
        for path, kind in kinds.items()
    )
    opening = '<manifest:manifest xmlns:manifest="http://openoffice.org/2001/manifest">'
    return f"{HEAD}{opening}\n{rows}</manifest:manifest>\n"
