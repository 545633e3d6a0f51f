"""A workbook file as a ZIP archive: parts read with limits, copied raw, written atomically."""

from __future__ import annotations

import errno
import os
import stat
import uuid
import zipfile
import zlib
from collections.abc import Mapping
from copy import copy
from pathlib import Path
from typing import IO, Final

from lxml import etree

from xlbridge.headless import guard

_NO_SPACE: Final = (errno.ENOSPC, errno.EDQUOT, errno.EFBIG)
_DECLARATION: Final = b'<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\r\n'


class StoreError(ValueError):
    """A workbook that cannot be read, a value that cannot be stored, a file that cannot be written."""


def open_archive(source: Path | IO[bytes]) -> zipfile.ZipFile:
    """Open a workbook's archive (to be closed by the caller); say in one sentence why it is none."""
    try:
        archive = zipfile.ZipFile(source)
    except zipfile.BadZipFile as error:
        raise StoreError(
            f"{source}: not a readable .xlsx or .xlsm file ({error}); "
            "an encrypted workbook or one in the old .xls format must be saved as .xlsx first"
        ) from error
    except OSError as error:
        raise StoreError(f"{source}: cannot be read ({error.strerror or error})") from error
    if found := guard.same_name(archive.infolist()):
        archive.close()
        raise StoreError(f"{source}: {found}")
    return archive


def read_part(archive: zipfile.ZipFile, name: str) -> bytes:
    """Return a part's bytes; refuse a missing, oversized, encrypted or damaged one."""
    try:
        info = archive.getinfo(name)
        if info.file_size > guard.MAX_PART:
            raise StoreError(f"part {name} is larger than {guard.MAX_PART // guard.MIB} MB when unpacked")
        return archive.read(info)
    except KeyError as error:
        raise StoreError(f"the package has no part {name}") from error
    except (zipfile.BadZipFile, RuntimeError, EOFError, zlib.error) as error:
        raise StoreError(f"part {name} cannot be unpacked ({error})") from error


def parse_part(name: str, data: bytes) -> etree._ElementTree:
    """Parse a part as untrusted XML: no document type, no entities, no network, bounded sizes."""
    parser = etree.XMLParser(
        resolve_entities=False,
        no_network=True,
        load_dtd=False,
        huge_tree=False,
        strip_cdata=False,
        remove_blank_text=False,
    )
    try:
        tree = etree.fromstring(data, parser).getroottree()
    except etree.XMLSyntaxError as error:
        raise StoreError(f"part {name} is not well-formed XML ({error})") from error
    if tree.docinfo.internalDTD is not None:
        raise StoreError(f"part {name} declares a document type, which no spreadsheet program writes")
    return tree


def serialise(tree: etree._ElementTree) -> bytes:
    """Return a parsed part's bytes with the declaration that spreadsheet programs write."""
    return _DECLARATION + etree.tostring(tree, encoding="UTF-8", xml_declaration=False)


def drop_attributes(element: etree._Element, *names: str) -> None:
    """Remove the attributes that are there."""
    for name in names:
        if name in element.attrib:
            del element.attrib[name]


def rewrite(source: Path, target: Path, changed: Mapping[str, bytes], *, force: bool = False) -> None:
    """Copy the archive ``source`` to ``target`` with the parts in ``changed`` replaced.

    Every other part keeps its bytes, compressed as they were, and its place. The file appears under its
    name only when it is complete; an existing one is replaced only with ``force``.
    """
    check_target(source, target, force=force)
    temporary = target.with_name(f".{target.name}.{uuid.uuid4().hex[:12]}.tmp")
    try:
        with open_archive(source) as archive, open(temporary, "xb") as stream:
            copy_archive(archive, stream, changed)
            stream.flush()
            os.fsync(stream.fileno())
        check_target(source, target, force=force)
        os.replace(temporary, target)
    except OSError as error:
        raise StoreError(f"{target}: {_cause(error)}") from error
    finally:
        temporary.unlink(missing_ok=True)


def check_target(source: Path, target: Path, *, force: bool) -> None:
    """Refuse a target that is the source, that exists (without ``force``), or that is protected."""
    if not target.parent.is_dir():
        raise StoreError(f"{target}: the folder {target.parent} does not exist")
    if not target.exists():
        return
    if source.exists() and target.samefile(source):
        raise StoreError(f"{target}: this is the input itself, which is never changed; choose another name")
    if not target.is_file():
        raise StoreError(f"{target}: exists and is not a file; choose another name")
    if not force:
        raise StoreError(f"{target}: exists already; choose another name or use --force")
    if not target.stat().st_mode & stat.S_IWUSR:
        raise StoreError(f"{target}: is read-only; lift the protection or choose another name")


def copy_archive(archive: zipfile.ZipFile, stream: IO[bytes], changed: Mapping[str, bytes]) -> None:
    """Copy an archive with the parts in ``changed`` replaced; those it has not yet stand at its end."""
    ends = _ends(archive)
    with zipfile.ZipFile(stream, "w") as out:
        out.comment = archive.comment
        for info in archive.infolist():
            if info.filename in changed:
                out.writestr(copy(info), changed[info.filename])
            else:
                _copy_raw(archive, out, info, ends[info.header_offset])
        for name in (name for name in changed if name not in archive.NameToInfo):
            added = zipfile.ZipInfo(name)  # of the earliest day there is: two runs give the same bytes
            added.compress_type = zipfile.ZIP_DEFLATED
            out.writestr(added, changed[name])


def _ends(archive: zipfile.ZipFile) -> dict[int, int]:
    """Where each entry's bytes end: at the next entry, or at the directory."""
    starts = sorted({info.header_offset for info in archive.infolist()})
    return dict(zip(starts, [*starts[1:], archive.start_dir], strict=True))


def _copy_raw(archive: zipfile.ZipFile, out: zipfile.ZipFile, info: zipfile.ZipInfo, end: int) -> None:
    """Append one entry as it stands: local header, compressed bytes, data descriptor."""
    if archive.fp is None or out.fp is None:
        raise StoreError("the archive was closed while it was copied")
    entry = copy(info)
    out.fp.seek(out.start_dir)
    entry.header_offset = out.start_dir
    archive.fp.seek(info.header_offset)
    out.fp.write(archive.fp.read(end - info.header_offset))
    out.filelist.append(entry)
    out.NameToInfo[entry.filename] = entry
    out.start_dir = out.fp.tell()


def _cause(error: OSError) -> str:
    if error.errno in _NO_SPACE:
        return "the disk is full; free some space or choose another folder"
    if isinstance(error, PermissionError) or error.errno == errno.EROFS:
        return "cannot be written: open in another program or protected; close it or choose another name"
    return f"cannot be written ({error.strerror or error})"
