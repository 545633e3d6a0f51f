"""The audit against peers in one run: the bare load of its file, the recalculation of another package."""

from __future__ import annotations

import resource
from pathlib import Path
from time import perf_counter
from typing import Any

import openpyxl

from tests.bench.test_calc import theirs
from tests.support import hostile
from tests.support.audited import audited, computed_book
from xlbridge.audit.many import many
from xlbridge.cli.own_template import own_template
from xlbridge.headless.book import Book
from xlbridge.headless.opening import BookError


def test_one_workbook(full: bool, figure: Any, best: Any, tmp_path: Path) -> None:
    levels = 60 if full else 4
    path = computed_book(tmp_path, level_count=levels)
    outcome = audited(path)
    assert outcome.findings == outcome.not_checked == ()
    ours, load = best(lambda: audited(path), lambda: openpyxl.load_workbook(path))
    (package,) = best(lambda: theirs(path), rounds=3)
    figure(f"audit over openpyxl's bare load, {levels} levels", ours / load, "target at most 8 times")
    figure(
        f"formulas package's recalculation over audit, {levels} levels", package / ours, "target at least 5"
    )
    figure(f"  audit, {levels} levels, {outcome.formula_cells} formula cells [s]", ours, "no target")


def test_many_workbooks(full: bool, figure: Any, tmp_path: Path) -> None:
    count = 200 if full else 4
    data = computed_book(tmp_path, level_count=20 if full else 3).read_bytes()
    paths = [tmp_path / f"tower-{n}.xlsx" for n in range(count)]
    for path in paths:
        path.write_bytes(data)
    times = {}
    for jobs in (1, 2):
        start = perf_counter()
        found = list(many(paths, own_template, jobs))
        times[jobs] = perf_counter() - start
        assert len(found) == count
        assert {outcome.verdict for outcome in found} == {"✓ clean"}
    figure(f"rate of two processes over one, {count} workbooks", times[1] / times[2], "target at least 1.7")
    before = resource.getrusage(resource.RUSAGE_SELF).ru_maxrss
    list(many(paths, own_template, 2))
    grown = resource.getrusage(resource.RUSAGE_SELF).ru_maxrss / before
    figure(f"memory of the parent after {count} more workbooks over before", grown, "target at most 1.1")
    child = resource.getrusage(resource.RUSAGE_CHILDREN).ru_maxrss / 1024
    figure(f"largest memory of a process after {count} workbooks [MB]", child, "no target")


def test_hostile_files(figure: Any, tmp_path: Path) -> None:
    times = {}
    for name in hostile.HOSTILE:
        path = hostile.write(tmp_path, name)
        start = perf_counter()
        try:
            Book.open(path)
        except BookError:
            times[name] = perf_counter() - start
        path.unlink()
    assert set(times) == set(hostile.HOSTILE)
    slowest = max(times, key=lambda name: times[name])
    figure(f"slowest of {len(times)} hostile files ({slowest}) [s]", times[slowest], "target below 1")
