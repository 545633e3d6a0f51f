"""Which cell of a workbook is which cell of its twin, whatever the user put in between.

Sheets, rows and columns are paired each on their own. What both workbooks have speaks for a pair: a text,
a defined name, a counted row of a table. Pairs that most speaks for are certain; what lies between two
certain ones is paired in its order where both have as many lines there, by likeness otherwise.
"""

from __future__ import annotations

from collections import Counter, defaultdict
from collections.abc import Iterable, Iterator, Mapping
from dataclasses import dataclass
from functools import cached_property
from itertools import pairwise
from typing import Final

from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.book import Book, Position
from xlbridge.headless.references import MAX_COLUMNS, MAX_ROWS, Bounds, Cell, parse_bounds
from xlbridge.headless.tokens import REFERENCE

#: how much a counted row of a table speaks for a pair of rows, against 1 of a text or a name
COUNTED: Final = 3
#: how much must speak for a pair that is out of order: a row or a column that was moved
MOVED: Final = 2

Pair = tuple[int, int]
Votes = Counter[Pair]
Tokens = Mapping[int, Counter[str]]


@dataclass(frozen=True)
class Axis:
    """The rows or the columns of a sheet: those of the twin with those of the workbook."""

    pairs: Mapping[int, int]

    @cached_property
    def back(self) -> Mapping[int, int]:
        """The same the other way round."""
        return {found: twin for twin, found in self.pairs.items()}

    @cached_property
    def is_identity(self) -> bool:
        """Whether every line stands where the twin has it."""
        return all(twin == found for twin, found in self.pairs.items())

    def place(self, line: int, last: int) -> int:
        """Where a line of the twin is or would be: an unpaired one keeps its distance from the one before."""
        if line in self.pairs or not self.pairs:
            return self.pairs.get(line, line)
        before = max((n for n in self.pairs if n < line), default=min(self.pairs))
        return min(max(1, self.pairs[before] + line - before), last)


@dataclass(frozen=True)
class SheetPair:
    """A sheet of the twin and the one that it is in the workbook."""

    twin: str
    title: str
    rows: Axis
    columns: Axis


@dataclass(frozen=True)
class Alignment:
    """The cells of a workbook and those of its twin."""

    pairs: tuple[SheetPair, ...]

    @cached_property
    def by_twin(self) -> Mapping[str, SheetPair]:
        """The pairs by the title in the twin."""
        return {pair.twin: pair for pair in self.pairs}

    @cached_property
    def by_title(self) -> Mapping[str, SheetPair]:
        """The pairs by the title in the workbook."""
        return {pair.title: pair for pair in self.pairs}

    @cached_property
    def is_identity(self) -> bool:
        """Whether every cell stands where the twin has it."""
        return all(p.twin == p.title and p.rows.is_identity and p.columns.is_identity for p in self.pairs)

    def to_twin(self, cell: Cell) -> Cell | None:
        """The cell of the twin that a cell is; none for what the user put in."""
        pair = self.by_title.get(cell.sheet)
        row = pair.rows.back.get(cell.row) if pair else None
        column = pair.columns.back.get(cell.column) if pair else None
        return Cell(pair.twin, row, column) if pair and row and column else None

    def from_twin(self, cell: Cell) -> Cell | None:
        """The cell that is one of the twin; none if it is gone."""
        pair = self.by_twin.get(cell.sheet)
        row = pair.rows.pairs.get(cell.row) if pair else None
        column = pair.columns.pairs.get(cell.column) if pair else None
        return Cell(pair.title, row, column) if pair and row and column else None

    def area_from_twin(self, sheet: str, bounds: Bounds) -> tuple[str, Bounds]:
        """The area that one of the twin has become: its corners where they are now."""
        pair = self.by_twin.get(sheet)
        if pair is None:
            return sheet, bounds
        rows = [n if n == MAX_ROWS else pair.rows.place(n, MAX_ROWS) for n in (bounds.top, bounds.bottom)]
        columns = [
            n if n == MAX_COLUMNS else pair.columns.place(n, MAX_COLUMNS) for n in (bounds.left, bounds.right)
        ]
        if (bounds.top, bounds.bottom) == (1, MAX_ROWS):
            rows = [1, MAX_ROWS]
        if (bounds.left, bounds.right) == (1, MAX_COLUMNS):
            columns = [1, MAX_COLUMNS]
        return pair.title, Bounds(min(rows), min(columns), max(rows), max(columns))


def align(book: Book, own: OwnTemplate) -> Alignment:
    """Pair the cells of a workbook of ours with those of its twin."""
    twin = own.twin or Book()
    sheets = dict(_sheets(book, twin))
    named = list(_named(book, twin, sheets))
    pairs = []
    for mine, title in sheets.items():
        rows, columns = _text_votes(twin, mine, book, title)
        for first, second in ((a, b) for a, b in named if a.sheet == mine):
            rows[first.row, second.row] += 1
            columns[first.column, second.column] += 1
        for table in (table for table in own.tables if table.sheet == mine):
            for number, row in enumerate(table.rows):
                rows[table.first + number, row] += COUNTED
        pairs.append(
            SheetPair(
                mine,
                title,
                _axis(rows, _Likeness(twin, mine, book, title, 0)),
                _axis(columns, _Likeness(twin, mine, book, title, 1)),
            )
        )
    return Alignment(tuple(pairs))


def _sheets(book: Book, twin: Book) -> Iterator[tuple[str, str]]:
    """Sheets of the same title first, if they share anything at all, then those that share most text."""
    texts = {(which, s): _said(b, s) for which, b in enumerate((twin, book)) for s in b.sheets}
    shared = {(t, s): len(texts[0, t] & texts[1, s]) for t in twin.sheets for s in book.sheets}
    order = sorted(shared, key=lambda pair: (pair[0].casefold() != pair[1].casefold(), -shared[pair]))
    taken: set[tuple[int, str]] = set()
    found = {}
    for mine, title in (pair for pair in order if shared[pair] or _same_numbers(twin, book, *pair)):
        if (0, mine) not in taken and (1, title) not in taken:
            taken |= {(0, mine), (1, title)}
            found[mine] = title
    return ((mine, found[mine]) for mine in twin.sheets if mine in found)


def _same_numbers(twin: Book, book: Book, mine: str, title: str) -> bool:
    """Whether two sheets of one title share a constant; sheets of numbers have no other sign."""
    alike = mine.casefold() == title.casefold()
    return alike and bool({*twin.constants[mine].values()} & {*book.constants[title].values()})


def _said(book: Book, sheet: str) -> set[str]:
    """The texts of a sheet; of one without any its formulas without their references."""
    formulas = book.formulas[sheet].values()
    return set(_texts(book, sheet)) or {REFERENCE.sub("", formula.text) for formula in formulas}


def _texts(book: Book, sheet: str) -> dict[str, list[Position]]:
    """The places of each text of a sheet, row by row."""
    found: dict[str, list[Position]] = defaultdict(list)
    for position, value in sorted(book.constants[sheet].items(), key=lambda item: item[0]):
        if isinstance(value, str) and value.strip():
            found[value].append(position)
    return found


def _text_votes(twin: Book, mine: str, book: Book, title: str) -> tuple[Votes, Votes]:
    """Every text speaks for the lines it stands in, the first with the first, if there are as many of it."""
    rows, columns = Votes(), Votes()
    there = _texts(book, title)
    for text, places in _texts(twin, mine).items():
        others = there.get(text, [])
        for first, second in zip(places, others, strict=True) if len(places) == len(others) else ():
            rows[first[0], second[0]] += 1
            columns[first[1], second[1]] += 1
    return rows, columns


def _named(book: Book, twin: Book, sheets: Mapping[str, str]) -> Iterator[tuple[Cell, Cell]]:
    """The first cells of the names that both have, where the name leads to the same sheet."""
    for (scope, name), text in twin.names.items():
        mine, found = first_cell(text), first_cell(book.names.get((scope, name), ""))
        if mine and found and sheets.get(mine.sheet) == book.sheet_named(found.sheet):
            yield mine, found


def first_cell(text: str) -> Cell | None:
    """The first cell of an area as a defined name writes it; none for anything else."""
    area = area_of(text)
    return Cell(area[0], area[1].top, area[1].left) if area else None


def area_of(text: str) -> tuple[str, Bounds] | None:
    """Sheet and bounds of an area as a defined name writes it; none for anything else."""
    sheet, mark, area = text.removeprefix("=").rpartition("!")
    try:
        bounds = parse_bounds(area.replace("$", ""))
    except ValueError:
        return None
    return (sheet.strip("'").replace("''", "'"), bounds) if mark else None


@dataclass(frozen=True)
class _Likeness:
    """How much two lines share: texts, formulas without their references, fills of empty cells."""

    twin: Book
    mine: str
    book: Book
    title: str
    axis: int

    @cached_property
    def last(self) -> int:
        """The last line of the twin."""
        cells = (*self.twin.constants[self.mine], *self.twin.formulas[self.mine])
        return max((position[self.axis] for position in cells), default=0)

    @cached_property
    def _tokens(self) -> tuple[Tokens, Tokens]:
        return self._of(self.twin, self.mine), self._of(self.book, self.title)

    def _of(self, book: Book, sheet: str) -> Tokens:
        found: dict[int, Counter[str]] = defaultdict(Counter)
        for position, value in book.constants[sheet].items():
            found[position[self.axis]][str(value)] += 1
        for position, formula in book.formulas[sheet].items():
            found[position[self.axis]][REFERENCE.sub("", formula.text)] += 1
        for position, cell in book.workbook[sheet]._cells.items() if book.workbook else ():
            if cell.value is None and cell.fill.fill_type == "solid":
                found[position[self.axis]][f"fill {str(cell.fill.fgColor.rgb)[-6:]}"] += 1
        return found

    def shared(self, line: int, found: int) -> int:
        mine, there = self._tokens
        return (mine[line] & there[found]).total() if line in mine and found in there else 0

    def pairs(self, lines: Iterable[int], spaces: Iterable[int]) -> Iterator[Pair]:
        """In their order, each line with the one of the spaces that shares most with it, if any shares."""
        free = list(spaces)
        for line in lines:
            shares = [self.shared(line, n) for n in free]
            if any(shares):
                found = shares.index(max(shares))
                yield line, free[found]
                free = free[found + 1 :]


def _axis(votes: Votes, likeness: _Likeness) -> Axis:
    """Pair lines: the certain ones in order, then those that were moved, then what lies between."""
    chosen = dict(_in_order(_best(votes)))
    taken = set(chosen.values())
    for (line, found), weight in votes.most_common():
        if weight >= MOVED and line not in chosen and found not in taken:
            chosen[line] = found
            taken.add(found)
    for (low, start), (high, end) in _gaps(chosen, likeness.last):
        lines = [n for n in range(low + 1, high) if n not in chosen]
        spaces = [n for n in range(start + 1, end) if n not in taken]
        same = len(lines) == len(spaces)
        for line, found in zip(lines, spaces, strict=True) if same else likeness.pairs(lines, spaces):
            chosen[line] = found
            taken.add(found)
    return Axis(dict(sorted(chosen.items())))


def _best(votes: Votes) -> dict[int, Pair]:
    """For each line of the twin the one that most speaks for, and how much; the nearest of equals."""
    best: dict[int, Pair] = {}
    for (line, found), weight in votes.items():
        known = best.get(line)
        if known is None or (weight, -abs(found - line)) > (known[1], -abs(known[0] - line)):
            best[line] = found, weight
    return best


def _in_order(best: Mapping[int, Pair]) -> Iterator[Pair]:
    """The heaviest set of pairs of which none crosses another."""
    lines = sorted(best)
    heaviest: list[tuple[int, int | None]] = []
    for n, line in enumerate(lines):
        found, weight = best[line]
        before = max(
            (m for m in range(n) if best[lines[m]][0] < found), key=lambda m: heaviest[m][0], default=None
        )
        heaviest.append((weight + (heaviest[before][0] if before is not None else 0), before))
    at: int | None = max(range(len(lines)), key=lambda n: heaviest[n][0], default=None)
    while at is not None:
        yield lines[at], best[lines[at]][0]
        at = heaviest[at][1]


def _gaps(chosen: Mapping[int, int], last: int) -> Iterator[tuple[Pair, Pair]]:
    """The spaces between pairs that follow each other, before the first and after the last."""
    ordered: list[Pair] = [(0, 0)]
    for line, found in sorted(chosen.items()):
        if found > ordered[-1][1]:
            ordered.append((line, found))
    line, found = ordered[-1]
    rest = max(0, last - line) + 1
    return pairwise([*ordered, (line + rest, found + rest)])
