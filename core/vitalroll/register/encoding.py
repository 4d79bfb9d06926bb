"""The bytes of a text file become text: which encoding, and what could not be read."""

from __future__ import annotations

from dataclasses import dataclass

from vitalroll.errors import Caution, Refusal

_MARKS = (
    (b"\xef\xbb\xbf", "utf-8-sig", "UTF-8"),
    (b"\xff\xfe\x00\x00", "utf-32", "UTF-32"),
    (b"\x00\x00\xfe\xff", "utf-32", "UTF-32"),
    (b"\xff\xfe", "utf-16", "UTF-16"),
    (b"\xfe\xff", "utf-16", "UTF-16"),
)
_SAMPLE = 65_536
# Text has line ends and tabs, and hardly any other control character.
_MOST_CONTROLS = 0.02


@dataclass(frozen=True)
class Decoded:
    """The text of a file, the encoding it was in, and what to say about that."""

    text: str
    encoding: str
    cautions: tuple[Caution, ...]


def decode(content: bytes) -> Decoded:
    """Read bytes as text.

    A byte-order mark decides. Without one the text is taken as UTF-8 if it is that, as UTF-16 if
    every other byte is zero, and otherwise as Windows-1252, which is said.

    Raises
    ------
    Refusal
        ``not_text`` for what is not text in any of these.

    Cautions
    --------
    ``encoding_assumed`` (``encoding``), ``unreadable_characters`` (``n``), ``nul_bytes`` (``n``).
    """
    for mark, codec, name in _MARKS:
        if content.startswith(mark):
            return _clean(content.decode(codec, errors="replace"), name, ())
    wide = _unmarked_utf_16(content)
    if wide:
        return _clean(content.decode(wide, errors="replace"), "UTF-16", (_assumed("UTF-16"),))
    try:
        return _clean(content.decode("utf-8"), "UTF-8", ())
    except UnicodeDecodeError:
        pass
    text = content.decode("utf-8", errors="replace")
    spoilt, whole = text.count("\ufffd"), sum(1 for byte in content[:_SAMPLE] if byte >= 0xC2)
    # A long UTF-8 text with a few damaged bytes is still UTF-8; as Windows-1252 every accent would be lost.
    if spoilt * 10 < whole:
        return _clean(text, "UTF-8", ())
    text = content.decode("windows-1252", errors="replace")
    return _clean(text, "Windows-1252", (_assumed("Windows-1252"),))


def _assumed(encoding: str) -> Caution:
    return Caution("encoding_assumed", {"encoding": encoding})


def _unmarked_utf_16(content: bytes) -> str | None:
    sample = content[:_SAMPLE]
    if len(sample) < 4 or len(content) % 2:
        return None
    half = len(sample) // 2
    if sample[1::2].count(0) > 0.4 * half and sample[::2].count(0) < 0.05 * half:
        return "utf-16-le"
    if sample[::2].count(0) > 0.4 * half and sample[1::2].count(0) < 0.05 * half:
        return "utf-16-be"
    return None


def _clean(text: str, encoding: str, cautions: tuple[Caution, ...]) -> Decoded:
    nuls = text.count("\0")
    if nuls:
        text = text.replace("\0", "")
        cautions += (Caution("nul_bytes", {"n": nuls}),)
    sample = text[:_SAMPLE]
    controls = sum(1 for letter in sample if letter < " " and letter not in "\t\n\r\f\v\x1a")
    if controls > max(_MOST_CONTROLS * len(sample), 2):
        raise Refusal("not_text")
    spoilt = text.count("\ufffd")
    if spoilt:
        cautions += (Caution("unreadable_characters", {"n": spoilt}),)
    return Decoded(text.lstrip("\ufeff"), encoding, cautions)
