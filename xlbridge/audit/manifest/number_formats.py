"""What a number format does to a value: scales, hides, rounds, adds words."""

from __future__ import annotations

import re
from dataclasses import dataclass
from functools import lru_cache
from typing import Final

_PART: Final = re.compile(r'"[^"]*"|\\.|[_*].|\[[^\]]*\]|.', re.DOTALL)
_SECTIONS: Final = re.compile(r'(?:"[^"]*"|\\.|[_*].|\[[^\]]*\]|[^;])*', re.DOTALL)
_SCALE: Final = re.compile(r"[0#?](,+)(?=\.|[^0#?,.]*$)")
_DECIMALS: Final = re.compile(r"\.([0#?]*)")
_SIGN: Final = "-(−–"


@dataclass(frozen=True, slots=True)
class Section:
    """One section of a number format."""

    codes: str
    """What is no literal text."""
    words: str
    """The literal text."""
    condition: bool

    @property
    def is_general(self) -> bool:
        """Whether the value shows as it is."""
        return "general" in self.codes.casefold() or "@" in self.codes

    @property
    def shows(self) -> bool:
        """Whether the value shows at all."""
        return self.is_general or any(mark in self.codes for mark in "0#?")

    @property
    def is_date(self) -> bool:
        """Whether the value shows as a date or a time."""
        return not self.shows and bool(re.search(r"[dmyhs]", self.codes, re.IGNORECASE))

    @property
    def decimals(self) -> int | None:
        """Digits behind the point; none where the value shows as it is."""
        if self.is_general:
            return None
        found = _DECIMALS.search(self.codes)
        return len(found[1]) if found else 0

    @property
    def has_exponent(self) -> bool:
        """Whether digits count from the first one of the value."""
        return bool(re.search(r"[eE][+-]", self.codes))

    @property
    def shift(self) -> int:
        """By how many powers of ten the shown number is larger than the value."""
        scale = _SCALE.search(self.codes)
        return 2 * self.codes.count("%") - 3 * len(scale[1] if scale else "")

    @property
    def blanks_zero(self) -> bool:
        """Whether a zero leaves nothing behind."""
        return not self.is_general and "0" not in self.codes


@lru_cache(maxsize=4096)
def sections(number_format: str) -> tuple[Section, ...]:
    """The sections of a format: positive, negative, zero, text."""
    found, position = [], 0
    while position <= len(number_format):
        match = _SECTIONS.match(number_format, position)
        assert match
        found.append(_section(match[0]))
        position = match.end() + 1
    return tuple(found)


def misleads(number_format: str, expected: str) -> str:
    """How a format shows another number than the expected one, in words; empty if it does not."""
    known, *_ = sections(expected)
    positive, *others = sections(number_format)
    negative, zero = (others[0] if others else None), (others[1] if len(others) > 1 else None)
    for section in filter(None, (positive, negative, zero)):
        if section.shift != known.shift:
            return f"it shows the value times 10^{section.shift}"
        if section.is_date:
            return "it shows a date"
        if set(re.findall(r"\w+", section.words)) - set(re.findall(r"\w+", known.words)):
            return f"it adds “{section.words.strip()}” to the value"
    if not positive.shows or (negative and not negative.shows):
        return "it hides the value"
    if zero and not zero.shows and not zero.words.strip():
        return "it hides a zero"
    if zero is None and positive.blanks_zero and not known.blanks_zero:
        return "it hides a zero"
    if negative and not negative.condition and not any(s in negative.codes + negative.words for s in _SIGN):
        return "it hides the minus sign"
    return ""


def hides_text(number_format: str) -> bool:
    """Whether a text shows nothing under a format."""
    found = sections(number_format)
    return len(found) > 3 and "@" not in found[3].codes and not found[3].is_general


def is_coarser(number_format: str, expected: str) -> bool:
    """Whether a format shows fewer digits than the expected one."""
    known, found = sections(expected)[0], sections(number_format)[0]
    if found.decimals is None or known.decimals is None:
        return False
    if known.has_exponent != found.has_exponent:
        return known.has_exponent
    return any(s.decimals is not None and s.decimals < known.decimals for s in sections(number_format)[:2])


def _section(text: str) -> Section:
    codes, words, condition = [], [], False
    for part in _PART.findall(text):
        if part[0] == '"':
            words.append(part[1:-1])
        elif part[0] == "\\":
            words.append(part[1:])
        elif part[0] == "[" and len(part) > 1:
            condition |= part[1:2] in tuple("<>=")
            codes.append(part if re.fullmatch(r"\[[hms]+\]", part, re.IGNORECASE) else "")
        elif part[0] not in "_*":
            codes.append(part)
    return Section("".join(codes), "".join(words), condition)
