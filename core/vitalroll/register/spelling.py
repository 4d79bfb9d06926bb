"""Text as it was written, and the form in which two spellings are the same.

What is shown keeps the writer's letters; what is matched forgets case, width, accents' encoding,
repeated spaces and characters that cannot be seen.
"""

from __future__ import annotations

import re
import unicodedata

_LONGEST_SHOWN = 80
_CONTROLS = dict.fromkeys((*range(0x20), *range(0x7F, 0xA0)), " ")
_WORD = re.compile(r"[^\W_]+")


def shown(text: str) -> str:
    """Return ``text`` with spaces tidied, unseen characters at its ends gone and no control characters."""
    if text.isascii() and text.isprintable():
        return " ".join(text.split(" ")) if "  " in text or text[:1] == " " or text[-1:] == " " else text
    tidy = " ".join(text.translate(_CONTROLS).split())
    while tidy and _unseen(tidy[0]):
        tidy = tidy[1:].lstrip()
    while tidy and _unseen(tidy[-1]):
        tidy = tidy[:-1].rstrip()
    return tidy


def excerpt(text: str) -> str:
    """Return ``text`` as shown, cut to a length that fits into a sentence."""
    tidy = shown(text)
    return tidy if len(tidy) <= _LONGEST_SHOWN else tidy[: _LONGEST_SHOWN - 1] + "…"


def same(text: str) -> str:
    """Return the form of ``text`` by which spellings are matched; empty for a blank cell."""
    if text.isascii():
        plain = text if text.isprintable() else text.translate(_CONTROLS)
        return " ".join(plain.split()).casefold()
    folded = unicodedata.normalize("NFKC", text).translate(_CONTROLS).casefold()
    seen = "".join(letter for letter in folded if not _unseen(letter))
    return " ".join(unicodedata.normalize("NFKC", seen).split())


def bare(text: str) -> str:
    """Return the words of ``text`` without accents or punctuation, one space between them.

    For recognising headings and values, where ``Décédé`` and ``DECEDE.`` are the same word.
    """
    apart = unicodedata.normalize("NFKD", same(text))
    plain = "".join(letter for letter in apart if not unicodedata.combining(letter))
    return " ".join(_WORD.findall(plain))


def _unseen(letter: str) -> bool:
    return unicodedata.category(letter) == "Cf"
