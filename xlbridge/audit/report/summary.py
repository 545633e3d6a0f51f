"""The summary of many audits: as a page, as JSON, and as CSV in which nothing is taken for a formula."""

from __future__ import annotations

import csv
import io
import json
import re
from collections import Counter
from collections.abc import Sequence
from importlib.resources import files
from typing import Final

from jinja2 import Environment, StrictUndefined
from markupsafe import Markup

from engine.version import __version__
from xlbridge.audit.many import Outcome
from xlbridge.audit.report.page import CAUTIONS

COLUMNS: Final = {
    "path": "file",
    "verdict": "verdict",
    "checked": "checked",
    "formula_cells": "formula cells",
    "errors": "errors",
    "warnings": "warnings",
    "notes": "notes",
    "not_checked": "not checked",
    "failure": "why it was not audited",
    "sha256": "SHA-256",
}
#: a field that begins so can be taken for a formula, also where a program takes a semicolon for its end
_RISKY: Final = re.compile("^(?=[\\s\\0])|(?:^|(?<=[;\\t\\r\\n]))(?=[\\s\\0]*[-=+@＝＋－＠])")


def as_json(outcomes: Sequence[Outcome]) -> str:
    """Return the outcomes as JSON."""
    record = {"storyledger": __version__, "files": [outcome.record() for outcome in outcomes]}
    return json.dumps(record, indent=1, ensure_ascii=False)


def as_csv(outcomes: Sequence[Outcome]) -> str:
    """Return the outcomes as CSV; a text that could be taken for a formula has an apostrophe before it."""
    stream = io.StringIO()
    writer = csv.writer(stream, lineterminator="\r\n")
    writer.writerow(COLUMNS.values())
    for outcome in outcomes:
        record = outcome.record()
        writer.writerow([_field(record[key]) for key in COLUMNS])
    return stream.getvalue()


def as_html(outcomes: Sequence[Outcome]) -> str:
    """Return the outcomes as a page that needs no network."""
    here = files(__package__)
    environment = Environment(
        autoescape=True, trim_blocks=True, lstrip_blocks=True, undefined=StrictUndefined
    )
    template = environment.from_string(here.joinpath("summary.html").read_text(encoding="utf-8"))
    return template.render(
        css=Markup(here.joinpath("page.css").read_text(encoding="utf-8")),
        rows=[outcome.record() for outcome in outcomes],
        columns=COLUMNS,
        counts=Counter(outcome.verdict for outcome in outcomes),
        cautions=CAUTIONS[:2],
        version=__version__,
    )


def _field(value: object) -> object:
    return _RISKY.sub("'", value) if isinstance(value, str) else value
