"""How the engine says no, and how it says "yes, but".

Both are data: a code and its parameters. The page turns them into sentences, so no
word meant for a person stands here.
"""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field
from typing import Any


@dataclass(frozen=True)
class Caution:
    """Something that must be shown beside a number.

    Parameters
    ----------
    code : str
        Lower-case words joined by underscores; the page's sentence is ``caution-<code>``.
    parameters : mapping
        JSON-safe values that the sentence names.
    """

    code: str
    parameters: Mapping[str, Any] = field(default_factory=dict)


class Refusal(Exception):
    """Why no answer is given.

    Parameters
    ----------
    code : str
        Lower-case words joined by underscores; the page's sentence is ``refusal-<code>``.
    field : str, optional
        The field of the request that is at fault, as a dotted path.
    line : int, optional
        The line of the person's own file, counted from 1.
    **parameters
        JSON-safe values that the sentence names.
    """

    def __init__(
        self, code: str, *, field: str | None = None, line: int | None = None, **parameters: Any
    ) -> None:
        super().__init__(code)
        self.code = code
        self.field = field
        self.line = line
        self.parameters = parameters
