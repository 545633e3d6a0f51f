"""The table of rates: what was found, in all and by each method, and every miss."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterable, Iterator, Sequence

from tests.support.faults.catalogue import GROUPS
from tests.support.faults.verdict import Verdict
from xlbridge.audit.kinds import KINDS


def table(verdicts: Sequence[Verdict]) -> str:
    """The table, as text."""
    return "\n".join([*_by_group(verdicts), "", *_by_method(verdicts), "", *_misses(verdicts)])


def _rate(values: Iterable[bool]) -> str:
    known = list(values)
    return f"{100 * sum(known) / len(known):9.1f} %" if known else f"{'-':>11}"


def _by_group(verdicts: Sequence[Verdict]) -> Iterator[str]:
    heads = ("faults", "found", "fitting kind", "right place", "one finding", "all of it")
    yield f"{'group':12}" + "".join(f"{head:>13}" for head in heads)
    for group in (*GROUPS, ""):
        some = [v for v in verdicts if group in ("", v.fault.group)]
        described = [v for v in some if v.described]
        cells = (
            _rate(v.found for v in some),
            _rate(v.described for v in some),
            _rate(v.located for v in described),
            _rate(v.single for v in described),
            _rate(v.good for v in some),
        )
        yield f"{group or 'all':12}{len(some):13}" + "".join(f"{cell:>13}" for cell in cells)


def _by_method(verdicts: Sequence[Verdict]) -> Iterator[str]:
    """How much each method finds, whatever it calls it."""
    methods = sorted({kind.method for kind in KINDS.values()})
    yield f"{'method':12}" + "".join(f"{group or 'all':>13}" for group in (*GROUPS, ""))
    for method in methods:
        some = ([v for v in verdicts if group in ("", v.fault.group)] for group in (*GROUPS, ""))
        yield f"{method:12}" + "".join(f"{_rate(method in v.methods for v in part):>13}" for part in some)


def _misses(verdicts: Sequence[Verdict]) -> Iterator[str]:
    """Every operator that was not found as it should be, with the number of times and an example."""
    total = Counter(v.fault.name for v in verdicts)
    bad = [v for v in verdicts if not v.good]
    yield f"{len(bad)} of {len(verdicts)} not as they should be:"
    for name, count in Counter(v.fault.name for v in bad).most_common():
        example = next(v for v in bad if v.fault.name == name)
        known = f" [{example.fault.missed}]" if example.fault.missed else ""
        yield f"  {count} of {total[name]}{known}: {example}"
