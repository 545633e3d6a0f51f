"""``storyledger demo``: the demonstration building, from inputs to a computed workbook."""

from __future__ import annotations

import json
import tomllib
from pathlib import Path

import click

from engine.building import DirectionResult, Package, from_mapping, solve, to_mapping
from workbook_templates.build import write_workbook
from workbook_templates.demo import building_text
from workbook_templates.read import Reader
from xlbridge.audit.audit import audit
from xlbridge.audit.report.page import page, verdict
from xlbridge.audit.routes import Agreement, compare
from xlbridge.audit.subject import Subject
from xlbridge.cli.failure import FINDINGS
from xlbridge.cli.files import refuse_existing, write_new
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import Computed

INPUTS, BOOK, RESULTS, AUDIT = "building.toml", "story.xlsx", "results.json", "audit.html"


@click.command("demo")
@click.argument("directory", type=click.Path(path_type=Path, file_okay=False))
@click.option("--force", is_flag=True, help="Replace the files of an earlier demonstration.")
def command(directory: Path, force: bool) -> int:
    """Leave an invented building in DIRECTORY: its inputs, its workbook computed, its results, its audit.

    One story drift of the building is above its limit on purpose, so that you see what a check that does
    not hold looks like.
    """
    directory.mkdir(parents=True, exist_ok=True)
    for name in (INPUTS, BOOK, RESULTS, AUDIT):
        refuse_existing(directory / name, force)
    building = from_mapping(tomllib.loads(building_text()))
    package = solve(building)
    write_new(directory / INPUTS, building_text().encode(), force)
    computed = write_workbook(to_mapping(building), directory / BOOK, force=force)
    write_new(directory / RESULTS, json.dumps(package.to_json(), indent=1).encode(), force)
    agreement = compare(Reader(computed.evaluator.evaluate_text).results(), package.to_json())
    outcome = audit(Subject.open(directory / BOOK, own_template))
    write_new(directory / AUDIT, page(outcome).encode(), force)
    click.echo(_report(directory, computed, agreement, package))
    click.echo(f"  audit in {directory / AUDIT}: {verdict(outcome)}")
    return FINDINGS if agreement.differences or computed.not_evaluated or computed.errors else 0


def _report(directory: Path, computed: Computed, agreement: Agreement, package: Package) -> str:
    status = computed.evaluator.evaluate_text("=workbook_status")
    lines = [
        f"{package.title}, ASCE/SEI {package.edition}",
        f"  {directory / BOOK}: {len(computed.results.cells)} formula cells computed",
        f"  cells against the model route: {agreement.compared} results, {len(agreement.differences)} differ",
        f"  status in the workbook: {status}",
    ]
    lines += [_headline(name, result, package) for name, result in package.direction.items()]
    lines.append(f"  inputs in {directory / INPUTS}, results in {directory / RESULTS}")
    return "\n".join(lines)


def _headline(name: str, result: DirectionResult, package: Package) -> str:
    line = f"  {name}: V = {result.V:.1f}, T = {result.T:.3f} s, k = {result.k:.3f}"
    over = result.drift_over_limit
    if over is None:
        return line
    return f"{line}, largest drift over limit {over.max():.3f} at {package.levels[over.argmax()]}"
