"""A package rewritten as Excel writes one: string table, shared formulas, calculation chain, spans."""

from __future__ import annotations

import re
import zipfile
from collections.abc import Iterator
from pathlib import Path

from lxml import etree

from tests.support.packages import MAIN, OFFICE
from xlbridge.audit import notation
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import parse_address
from xlbridge.headless.shapes import parse

_N = f"{{{MAIN}}}"
_TYPES = "http://schemas.openxmlformats.org/package/2006/content-types"
_RELS = "http://schemas.openxmlformats.org/package/2006/relationships"
_EXCEL = "application/vnd.openxmlformats-officedocument.spreadsheetml"
_CELL_AREA = re.compile(r"[A-Z]+\d+")


def as_excel(source: Path, target: Path) -> Path:
    """Write the workbook anew: what it says is the same, how it says so is Excel's way."""
    with zipfile.ZipFile(source) as archive:
        parts = {name: archive.read(name) for name in archive.namelist()}
    strings: dict[str, int] = {}
    known = _strings(parts.pop("xl/sharedStrings.xml", b""))
    chain: list[tuple[str, int]] = []
    sheets = sorted(
        (n for n in parts if re.fullmatch(r"xl/worksheets/sheet\d+\.xml", n)),
        key=lambda name: int(re.sub(r"\D", "", name)),
    )
    for number, name in enumerate(sheets, 1):
        root = etree.fromstring(parts[name])
        for cell in root.iter(f"{_N}c"):
            _share_text(cell, known, strings)
            if cell.find(f"{_N}f") is not None:
                chain.append((cell.get("r", ""), number))
        _share_formulas(root)
        _say_spans(root)
        parts[name] = _bytes(root)
    parts["xl/sharedStrings.xml"] = _string_table(strings)
    parts["xl/calcChain.xml"] = _chain(reversed(chain))
    parts["[Content_Types].xml"] = _registered(parts["[Content_Types].xml"])
    parts["xl/_rels/workbook.xml.rels"] = _related(parts["xl/_rels/workbook.xml.rels"])
    with zipfile.ZipFile(target, "w", zipfile.ZIP_DEFLATED) as archive:
        for name, data in parts.items():
            archive.writestr(name, data)
    return target


def _strings(part: bytes) -> list[str]:
    if not part:
        return []
    return ["".join(item.itertext()) for item in etree.fromstring(part).iter(f"{_N}si")]


def _share_text(cell: etree._Element, known: list[str], strings: dict[str, int]) -> None:
    """Put a constant text into the table of strings; the text of a formula stays with its cell."""
    value, inline = cell.find(f"{_N}v"), cell.find(f"{_N}is")
    if cell.find(f"{_N}f") is not None or cell.get("t") not in ("s", "inlineStr") or not len(cell):
        return
    if inline is not None:
        text = "".join(inline.itertext())
        cell.remove(inline)
        value = etree.SubElement(cell, f"{_N}v")
    else:
        assert value is not None
        text = known[int(value.text or 0)]
    value.text = str(strings.setdefault(text, len(strings)))
    cell.set("t", "s")


def _share_formulas(root: etree._Element) -> None:
    """Write a formula that is filled down a column once, the cells below only name it."""
    columns: dict[int, list[tuple[int, etree._Element]]] = {}
    for cell in root.iter(f"{_N}c"):
        formula = cell.find(f"{_N}f")
        if formula is not None and not formula.attrib:
            row, column = parse_address(cell.get("r", ""))
            columns.setdefault(column, []).append((row, formula))
    number = 0
    for column in columns.values():
        for run in _runs(sorted(column, key=lambda item: item[0])):
            first, *others = (formula for _, formula in run)
            cells = [formula.getparent().get("r") for _, formula in run]
            first.attrib.update({"t": "shared", "ref": f"{cells[0]}:{cells[-1]}", "si": str(number)})
            for other in others:
                other.attrib.update({"t": "shared", "si": str(number)})
                other.text = None
            number += 1


def _runs(cells: list[tuple[int, etree._Element]]) -> Iterator[list[tuple[int, etree._Element]]]:
    """Cells below each other with copies of one formula."""
    run: list[tuple[int, etree._Element]] = []
    for row, formula in cells:
        if run and row == run[-1][0] + 1 and _is_copy(run[0], (row, formula)):
            run.append((row, formula))
            continue
        if len(run) > 1:
            yield run
        run = [(row, formula)]
    if len(run) > 1:
        yield run


def _is_copy(first: tuple[int, etree._Element], other: tuple[int, etree._Element]) -> bool:
    if not _CELL_AREA.search(first[1].text or ""):
        return False
    try:
        filled = notation.filled(f"={first[1].text}", other[0] - first[0], 0)
        return notation.canonical(parse(filled), "") == notation.canonical(parse(f"={other[1].text}"), "")
    except NotEvaluated:
        return False


def _say_spans(root: etree._Element) -> None:
    for row in root.iter(f"{_N}row"):
        columns = [parse_address(cell.get("r", ""))[1] for cell in row.iter(f"{_N}c")]
        if columns:
            row.set("spans", f"{min(columns)}:{max(columns)}")


def _string_table(strings: dict[str, int]) -> bytes:
    root = etree.Element(f"{_N}sst", nsmap={None: MAIN}, uniqueCount=str(len(strings)))
    for text in strings:
        item = etree.SubElement(etree.SubElement(root, f"{_N}si"), f"{_N}t")
        item.text = text
        item.set("{http://www.w3.org/XML/1998/namespace}space", "preserve")
    return _bytes(root)


def _chain(cells: Iterator[tuple[str, int]]) -> bytes:
    root = etree.Element(f"{_N}calcChain", nsmap={None: MAIN})
    for address, sheet in cells:
        etree.SubElement(root, f"{_N}c", r=address, i=str(sheet))
    return _bytes(root)


def _registered(part: bytes) -> bytes:
    root = etree.fromstring(part)
    names = {item.get("PartName") for item in root}
    for name, kind in (("/xl/calcChain.xml", "calcChain"), ("/xl/sharedStrings.xml", "sharedStrings")):
        if name not in names:
            etree.SubElement(root, f"{{{_TYPES}}}Override", PartName=name, ContentType=f"{_EXCEL}.{kind}+xml")
    return _bytes(root)


def _related(part: bytes) -> bytes:
    root = etree.fromstring(part)
    targets = {item.get("Target", "").rpartition("/")[2] for item in root}
    for kind in ("calcChain", "sharedStrings"):
        if f"{kind}.xml" not in targets:
            relation = etree.SubElement(root, f"{{{_RELS}}}Relationship", Id=f"rIdOf{kind}")
            relation.attrib.update({"Type": f"{OFFICE}/{kind}", "Target": f"{kind}.xml"})
    return _bytes(root)


def _bytes(root: etree._Element) -> bytes:
    return bytes(etree.tostring(root, xml_declaration=True, encoding="UTF-8", standalone=True))
