"""What an untrusted workbook file may be, looked at before anything in it is parsed.

A package of a few kilobytes can unpack to gigabytes, hide a second part under the name of the first, or make
a reader fill every cell of a sheet. Sizes, names and counts are bounded here; what is refused is said in one
sentence. The bounds leave room for a workbook of 1,000 levels with all parts (common practice, and tried).
"""

from __future__ import annotations

import io
import posixpath
import re
import stat
import zipfile
import zlib
from collections.abc import Callable, Iterator, Mapping
from itertools import pairwise
from typing import Final

from xlbridge.headless.references import parse_bounds

MIB: Final = 2**20
MAX_FILE: Final = 64 * MIB
MAX_ENTRIES: Final = 2_000
MAX_PART: Final = 128 * MIB
MAX_TOTAL: Final = 256 * MIB
#: how far a part may unpack, once it is larger than what many honest parts are
MAX_RATIO: Final = 200
RATIO_FROM: Final = MIB
MAX_CELLS: Final = 1_000_000
MAX_MERGED: Final = 100_000
#: the limits of the file format itself
MAX_TEXT: Final = 32_767
MAX_FORMULA: Final = 8_192
_CHUNK: Final = 2**16

_XML: Final = (".xml", ".rels", ".vml")
_BYTE_ORDER: Final = b"\xef\xbb\xbf"
_ENCODING: Final = re.compile(rb"""<\?xml[^<>]*?\sencoding\s*=\s*["']([^"'<>]*)""")
_ENCODINGS: Final = (b"utf-8", b"us-ascii")
_DECLARED: Final = re.compile(rb"<!(DOCTYPE|ENTITY)")
#: no run goes past the next tag, so that the time grows with the size alone, whatever stands there
_MERGED: Final = re.compile(rb"""<(?:\w+:)?mergeCell\s(?:[^<>]*?\s)?ref\s*=\s*["']([^"'<>]*)""")
_LONG: Final = re.compile(rb"<(?:\w+:)?([tf])(?:\s[^<>]*)?>([^<]{%d,})" % (MAX_FORMULA + 1))
_RELATION: Final = re.compile(rb"<(?:\w+:)?Relationship\s[^<>]*>")
_ATTRIBUTE: Final = re.compile(rb"""\s(\w+)\s*=\s*["']([^"']*)""")
#: how many there may be of what a workbook lists, by the elements it is listed in
_COUNTED: Final[Mapping[str, tuple[int, tuple[bytes, ...]]]] = {
    "cells and rows": (MAX_CELLS, (b"c", b"row")),
    "defined names": (20_000, (b"definedName",)),
    "cell formats": (2 * 65_490, (b"xf",)),
    "rules of conditional formats": (20_000, (b"cfRule",)),
    "rules of entries": (20_000, (b"dataValidation",)),
    "sheets": (1_000, (b"sheet",)),
}
_ENDS: Final = (b" ", b">", b"/", b"\t", b"\n", b"\r")


def oversize(data: bytes) -> str:
    """Return what is said of a file that is too large, whatever it is."""
    return f"the file is larger than {MAX_FILE // MIB} MB" if len(data) > MAX_FILE else ""


def problem(data: bytes) -> str:
    """Return why a package must not be opened, or nothing. It is only unpacked, piece by piece."""
    try:
        with zipfile.ZipFile(io.BytesIO(data)) as archive:
            entries = archive.infolist()
            return _directory(entries) or next(_contents(archive, entries), "")
    except (zipfile.BadZipFile, NotImplementedError, RuntimeError, EOFError, zlib.error, OSError) as error:
        return f"the package is damaged ({error})"


def same_name(entries: list[zipfile.ZipInfo]) -> str:
    """Return what is said of two parts of one name, of which a reader may take either; names ignore case."""
    seen: set[str] = set()
    for entry in entries:
        if entry.filename.casefold() in seen:
            return f"two parts of the package have the same name, {entry.filename}"
        seen.add(entry.filename.casefold())
    return ""


def _directory(entries: list[zipfile.ZipInfo]) -> str:
    """What is wrong with the list of the parts, before one is unpacked."""
    if len(entries) > MAX_ENTRIES:
        return f"the package has {len(entries):,} parts, more than {MAX_ENTRIES:,}"
    if found := same_name(entries) or next(filter(None, map(_entry, entries)), ""):
        return found
    if sum(entry.file_size for entry in entries) > MAX_TOTAL:
        return f"the package unpacks to more than {MAX_TOTAL // MIB} MB"
    return _overlap(entries)


def _entry(entry: zipfile.ZipInfo) -> str:
    name = entry.filename
    if name.startswith(("/", "\\")) or ":" in name or ".." in re.split(r"[/\\]", name):
        return f"a part of the package lies outside of it, {name}"
    if entry.flag_bits & 1:
        return f"part {name} is encrypted; remove the password and save it as .xlsx"
    if entry.compress_type not in (zipfile.ZIP_STORED, zipfile.ZIP_DEFLATED):
        return f"part {name} is packed in a way that no spreadsheet program uses"
    if stat.S_ISLNK(entry.external_attr >> 16):
        return f"part {name} is a link to another file"
    return f"part {name} is larger than {MAX_PART // MIB} MB" if entry.file_size > MAX_PART else ""


def _overlap(entries: list[zipfile.ZipInfo]) -> str:
    placed = sorted(entries, key=lambda entry: entry.header_offset)
    for first, second in pairwise(placed):
        if first.header_offset + first.compress_size > second.header_offset:
            return f"parts {first.filename} and {second.filename} of the package overlap"
    return ""


def _contents(archive: zipfile.ZipFile, entries: list[zipfile.ZipInfo]) -> Iterator[str]:
    """Yield what is wrong with the parts, one after the other; counts run over all sheets."""
    names = {entry.filename for entry in entries}
    size = sum(entry.file_size for entry in entries)
    # a list that could not be too long if nothing else were in the file needs no counting
    counted = {
        what: (most, elements)
        for what, (most, elements) in _COUNTED.items()
        if size // (2 + min(map(len, elements))) > most
    }
    counts = dict.fromkeys(counted, 0)
    for entry in entries:
        part, found = _unpacked(archive, entry)
        if found:
            yield found
        if not (entry.filename.lower().endswith(_XML) or _begins_as_xml(part)):
            continue
        for what, (most, elements) in counted.items():
            counts[what] += sum(_elements(part, element) for element in elements)
            if counts[what] > most:
                yield f"the workbook has more than {most:,} {what}"
        yield from (found for rule in _RULES if (found := rule(entry.filename, part)))
        if entry.filename.endswith(".rels"):
            yield from _relations(entry.filename, part, names)


def _unpacked(archive: zipfile.ZipFile, entry: zipfile.ZipInfo) -> tuple[bytes, str]:
    """A part, unpacked no further than its bounds."""
    pieces, size = [], 0
    with archive.open(entry) as stream:
        while piece := stream.read(_CHUNK):
            size += len(piece)
            if size > MAX_PART or size > entry.file_size:
                return b"", f"part {entry.filename} unpacks to more than its size says"
            if size > RATIO_FROM and size > MAX_RATIO * max(1, entry.compress_size):
                return b"", f"part {entry.filename} unpacks to more than {MAX_RATIO} times its size"
            pieces.append(piece)
    return b"".join(pieces), ""


def _elements(part: bytes, name: bytes) -> int:
    """How many elements of a name a part has, at most: counting bytes is quick, parsing them is not."""
    starts = (b"<" + name, b":" + name)
    return sum(part.count(start + end) for start in starts if start in part for end in _ENDS)


def _begins_as_xml(part: bytes) -> bool:
    """Whether a part may be read as XML, whatever its name is."""
    return part.removeprefix(_BYTE_ORDER).lstrip().startswith(b"<")


def _encoded(name: str, part: bytes) -> str:
    """Texts are looked for as they are in UTF-8; in another encoding they would be overlooked."""
    if b"\0" in part:
        return f"part {name} is written in UTF-16 or is no XML, which no spreadsheet program does"
    if part and not _begins_as_xml(part):
        return f"part {name} is no XML"
    found = _ENCODING.match(part.removeprefix(_BYTE_ORDER))
    if found and found[1].lower() not in _ENCODINGS:
        return f"part {name} is written in {found[1].decode('ascii', 'replace')}; save it as .xlsx again"
    return ""


def _declares(name: str, part: bytes) -> str:
    found = _DECLARED.search(part)
    return f"part {name} declares a document type, which no spreadsheet program writes" if found else ""


def _merges(name: str, part: bytes) -> str:
    if b"mergeCell" not in part:  # quicker than the pattern, on the many parts without any
        return ""
    try:
        area = sum(parse_bounds(found[1].decode().upper()).size for found in _MERGED.finditer(part))
    except ValueError as error:
        return f"sheet part {name} merges what is no range ({error})"
    return f"sheet part {name} merges {area:,} cells, more than {MAX_MERGED:,}" if area > MAX_MERGED else ""


def _lengths(name: str, part: bytes) -> str:
    for kind, text in _LONG.findall(part):
        what, most = ("formula", MAX_FORMULA) if kind == b"f" else ("text", MAX_TEXT)
        if len(text.decode("utf-8", "replace")) > most:
            return f"part {name} has a {what} longer than {most:,} characters"
    return ""


_RULES: Final[tuple[Callable[[str, bytes], str], ...]] = (_encoded, _declares, _merges, _lengths)


def _relations(name: str, part: bytes, names: set[str]) -> Iterator[str]:
    """Yield what is wrong with the targets of a part's relations: in the package, or marked external."""
    home = posixpath.dirname(posixpath.dirname(name))
    for found in _RELATION.finditer(part):
        given = {key: value.decode("utf-8", "replace") for key, value in _ATTRIBUTE.findall(found[0])}
        target = given.get(b"Target", "")
        if given.get(b"TargetMode") == "External" or target.startswith("#"):
            continue
        path = posixpath.normpath(posixpath.join(home, target) if target[:1] != "/" else target[1:])
        if path.startswith(".."):
            yield f"part {name} points outside the package, {target}"
        elif path not in names:
            yield f"the package has no part {path}, which {name} points to"
