"""The extension's files: every function of the catalogue, well formed, the same bytes each time."""

from __future__ import annotations

import io
import re
import struct
import zipfile
from pathlib import Path

import pytest
from lxml import etree

from tests.support.command import python, run
from xlbridge.calc import extension, identity
from xlbridge.calc.bridge import CODES, call, error_number
from xlbridge.calc.log import AT_MOST
from xlbridge.catalogue import CATALOGUE
from xlbridge.values import ERROR_CODES

OOR = "{http://openoffice.org/2001/registry}name"
FILES = extension.files()


def nodes(name: str, root: etree._Element) -> dict[str, etree._Element]:
    found = next(node for node in root.iter("node") if node.get(OOR) == name)
    return {str(node.get(OOR)): node for node in found if node.tag == "node"}


def text(node: etree._Element, name: str) -> str:
    return str(next(prop for prop in node if prop.get(OOR) == name)[0].text)


def test_two_packages_are_the_same_and_hold_every_file() -> None:
    assert extension.package() == extension.package()
    with zipfile.ZipFile(io.BytesIO(extension.package())) as archive:
        assert set(archive.namelist()) == set(FILES)
        assert archive.testzip() is None
    assert not [name for name in FILES if "__pycache__" in name or name.endswith(".pyc")]


def test_every_function_is_declared_with_its_arguments_in_both_files() -> None:
    shown = nodes("AddInFunctions", etree.fromstring(FILES["CalcAddIns.xcu"]))
    declared = dict(re.findall(r"(elf\w+)\( (.*) \);", FILES["storyledger_addin.idl"].decode()))
    assert set(shown) == set(declared) == {identity.METHODS[name] for name in CATALOGUE}
    for name, entry in CATALOGUE.items():
        node, parameters = shown[identity.METHODS[name]], declared[identity.METHODS[name]].split(", ")
        assert text(node, "DisplayName") == text(node, "CompatibilityName") == name
        assert text(node, "Description") == entry.summary
        arguments = nodes("Parameters", node)
        assert [text(a, "DisplayName") for a in arguments.values()] == [a.name for a in entry.arguments]
        assert all(
            a.text in text(arguments[f"argument{n}"], "Description") for n, a in enumerate(entry.arguments, 1)
        )
        assert [p.split()[-1] for p in parameters] == list(arguments)
        assert [" any " in f"{p} " and "sequence" not in p for p in parameters] == [
            a.optional for a in entry.arguments
        ]


def test_methods_differ_whatever_the_case() -> None:
    assert len({name.upper() for name in identity.METHODS.values()}) == len(CATALOGUE)
    assert len(set(identity.PROGRAMMATIC.values())) == len(CATALOGUE)


@pytest.mark.parametrize("name", [name for name in FILES if name.endswith((".xml", ".xcu", ".components"))])
def test_the_xml_is_well_formed(name: str) -> None:
    etree.fromstring(FILES[name])


def test_the_manifest_lists_what_the_office_has_to_read() -> None:
    manifest = etree.fromstring(FILES["META-INF/manifest.xml"])
    listed = {value for entry in manifest for key, value in entry.attrib.items() if key.endswith("full-path")}
    assert listed == {"storyledger_addin.idl", "storyledger_addin.components", "CalcAddIns.xcu"}
    assert listed <= set(FILES)


def test_what_is_carried_along_needs_numpy_alone(tmp_path: Path) -> None:
    extension.unpack(tmp_path)
    code = (
        "import sys; sys.path.insert(0, 'pythonpath'); from xlbridge.calc.bridge import call; "
        "assert call('ELF_EXPONENT', [((1.0,),), None]) == ((1.25,),); "
        "loaded = {m.split('.')[0] for m in sys.modules}; "
        "print(sorted(loaded & {'openpyxl', 'lxml', 'click', 'xlwings', 'rich'}))"
    )
    done = python("-c", code, cwd=tmp_path, PYTHONPATH="")
    assert (done.returncode, done.stdout) == (0, "[]\n"), done.stderr


def test_the_command_writes_it(tmp_path: Path) -> None:
    outcome = run("calc-addin", tmp_path / "storyledger.oxt")
    assert outcome.code == 0
    assert (tmp_path / "storyledger.oxt").read_bytes() == extension.package()
    assert ".oxt" in run("calc-addin", tmp_path / "storyledger.zip").err


class TestBridge:
    def test_arguments_come_as_rows_and_go_as_rows(self) -> None:
        assert call("ELF_EXPONENT", [((0.4,),), None]) == ((1.0,),)
        assert call("ELF_EXPONENT", [((1.0,), (2.0,)), "two"]) == ((2.0,), (2.0,))

    def test_a_text_goes_alone_and_never_in_rows(self) -> None:
        assert call("ELF_GAP_STATUS", [((5.0,),), ((5.0,),)]) == "wide enough"
        assert number(call("ELF_GAP_STATUS", [((5.0,), (6.0,)), ((5.0,),)])) == CODES["#VALUE!"]

    def test_a_blank_is_not_zero(self) -> None:
        ((blank,),) = call("ELF_DRIFT", [(("",),), ((0.1,),), ((5.5,),), ((1.0,),)])
        ((zero,),) = call("ELF_DRIFT", [((0.0,),), ((0.1,),), ((5.5,),), ((1.0,),)])
        assert number(blank) == CODES["#VALUE!"]
        assert zero == pytest.approx(0.55)

    def test_a_bad_row_keeps_its_own_error(self) -> None:
        good, bad = call("ELF_EXPONENT", [((1.0,), (0.0,)), None])
        assert good == (1.25,)
        assert number(bad[0]) == CODES["#NUM!"]

    def test_every_error_code_but_that_of_an_empty_intersection_has_a_number(self) -> None:
        assert set(CODES) == set(ERROR_CODES) - {"#NULL!"}
        assert len({number(error_number(code)) for code in CODES}) == len(CODES)

    def test_failures_are_logged_once_with_their_reason(
        self, tmp_path: Path, monkeypatch: pytest.MonkeyPatch
    ) -> None:
        monkeypatch.setenv("STORYLEDGER_CALC_LOG", str(tmp_path / "deep" / "calc.log"))
        monkeypatch.setattr("xlbridge.calc.log._noted", set())
        for value in (-1.0, -1.0, -2.0):
            call("ELF_EXPONENT", [((value,),), None])
        lines = (tmp_path / "deep" / "calc.log").read_text().splitlines()
        assert [line.partition("  ")[2] for line in lines] == [
            "#NUM! because ELF_EXPONENT: T = -1: must be above 0",
            "#NUM! because ELF_EXPONENT: T = -2: must be above 0",
        ]

    def test_the_log_falls_silent_and_never_fails_a_cell(
        self, tmp_path: Path, monkeypatch: pytest.MonkeyPatch
    ) -> None:
        monkeypatch.setenv("STORYLEDGER_CALC_LOG", str(tmp_path))
        monkeypatch.setattr("xlbridge.calc.log._noted", set())
        assert number(call("ELF_EXPONENT", [((-1.0,),), None])[0][0]) == CODES["#NUM!"]
        monkeypatch.setenv("STORYLEDGER_CALC_LOG", str(tmp_path / "calc.log"))
        for place in range(AT_MOST + 10):
            call("ELF_EXPONENT", [((-float(place),),), None])
        assert len((tmp_path / "calc.log").read_text().splitlines()) < AT_MOST


def number(value: object) -> int:
    """The number of an error as Calc reads it: the low half of the bits."""
    assert isinstance(value, float)
    return int(struct.unpack("<Q", struct.pack("<d", value))[0] & 0xFFFFFFFF)
