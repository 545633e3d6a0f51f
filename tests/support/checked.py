"""Write what each worksheet function is checked against: ``python -m tests.support.checked``."""

from __future__ import annotations

import csv
import io
from collections import Counter
from collections.abc import Iterator, Mapping
from importlib import import_module
from typing import Any

from engine import vertical
from tests.support.check_values import rows
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.checked import FILE


def _called(row: Mapping[str, Any]) -> Iterator[Any]:
    """The functions that a row calls: its own, and those that give its inputs."""
    module, name = row["function"].rsplit(".", 1)
    yield getattr(import_module(module), name)
    for value in row["inputs"].values():
        if isinstance(value, Mapping):
            yield from _called(value)


def text() -> str:
    """Return the file: function, kind, number of values, source, in the order of the catalogue."""
    found: Counter[tuple[str, str, str]] = Counter()
    names = {id(entry.function): name for name, entry in CATALOGUE.items()}
    names[id(vertical.distribution_factors)] = "ELF_CVX"  # the same rule for all levels at once
    for _, row in rows():
        expected = row["expected"]
        for function in _called(row):
            if (name := names.get(id(function))) is not None:
                found[name, row["kind"], row["source"]] += 1 if isinstance(expected, str) else len(expected)
    order = list(CATALOGUE)
    out = io.StringIO()
    writer = csv.writer(out, lineterminator="\n")
    writer.writerow(("function", "kind", "values", "source"))
    for name, kind, source in sorted(found, key=lambda key: (order.index(key[0]), key[1:])):
        writer.writerow((name, kind, found[name, kind, source], source))
    return out.getvalue()


if __name__ == "__main__":
    FILE.write_text(text(), encoding="utf-8")
