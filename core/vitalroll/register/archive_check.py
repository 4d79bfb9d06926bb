"""Whether a file is a workbook that may be opened, found out before any of it is parsed.

A workbook is a zip archive of XML parts. A few bytes of archive can unpack to gigabytes, and XML can
refer to entities that grow likewise; both are refused, as is what this reader cannot read.
"""

from __future__ import annotations

import io
import re
import struct
import zipfile
import zlib
from collections.abc import Iterator
from dataclasses import dataclass

from vitalroll.errors import Refusal

MOST_UNPACKED = 500_000_000
MOST_RATIO = 200
MOST_ENTRIES = 5_000
_SMALL = 1_000_000
"""Parts below this size may be packed as tightly as they like: they cannot do harm."""

_CHUNK = 1 << 20
_OPEN_DOCUMENT = b"application/vnd.oasis.opendocument.spreadsheet"
_OPEN_CONTENT = "content.xml"
_COMPOUND = b"\xd0\xcf\x11\xe0\xa1\xb1\x1a\xe1"
DAMAGED = (
    zipfile.BadZipFile,
    zlib.error,
    struct.error,
    ValueError,
    OSError,
    EOFError,
    NotImplementedError,
    KeyError,
    RuntimeError,
    OverflowError,
)
"""All that a damaged archive makes the standard library raise."""

_PARSED = (".xml", ".rels", ".vml")
_PREFIX = rb"(?:\w{1,20}:)?"
_ROW = re.compile(rb"<" + _PREFIX + rb"row\b([^>]{0,2000})>")
_ROW_NUMBER = re.compile(rb"\br=[\"'](\d{1,9})[\"']")
_HIDDEN = re.compile(rb"\bhidden=[\"'](?:1|true)[\"']")
_HIDDEN_COLUMNS = re.compile(rb"<" + _PREFIX + rb"col\b[^>]{0,500}\bhidden=[\"'](?:1|true)[\"']")
_MERGED = re.compile(rb"<" + _PREFIX + rb"mergeCell\b")
# A formula whose stored value is the empty text has t="str": that is a value.
_NO_VALUE = re.compile(
    rb"<PREc\b(?![^>]{0,500}\bt=[\"']str[\"'])[^>]{0,500}>\s{0,20}"
    rb"<PREf\b(?:[^>]{0,500}/>|[^>]{0,500}>[^<]{0,10000}</PREf>)\s{0,20}"
    rb"(?:<PREv\s?/>|<PREv>\s{0,20}</PREv>)?\s{0,20}</PREc>".replace(b"PRE", _PREFIX)
)


@dataclass(frozen=True)
class SheetMarks:
    """What stands in a sheet beside its values."""

    hidden_rows: int
    hidden_columns: int
    merged: int
    formulas_without_value: int


def refuse_by_signature(content: bytes) -> None:
    """Refuse what is known by its first bytes not to be readable.

    Raises
    ------
    Refusal
        ``workbook_encrypted``, ``workbook_old_form`` (.xls), ``compressed_file`` (gzip, bzip2, xz,
        7z, rar) or ``not_a_table`` (PDF, pictures, programs).
    """
    if content.startswith(_COMPOUND):
        if "EncryptedPackage".encode("utf-16-le") in content:
            raise Refusal("workbook_encrypted")
        if any(name.encode("utf-16-le") in content for name in ("Workbook", "Book")):
            raise Refusal("workbook_old_form")
        raise Refusal("not_a_table")
    if content.startswith((b"\x1f\x8b", b"BZh", b"\xfd7zXZ", b"7z\xbc\xaf", b"Rar!")):
        raise Refusal("compressed_file")
    if content.startswith((b"%PDF", b"\x89PNG", b"\xff\xd8\xff", b"GIF8", b"\x7fELF", b"MZ\x90", b"{\\rtf")):
        raise Refusal("not_a_table")


def is_archive(content: bytes) -> bool:
    """Return whether the content is a zip archive, as workbooks are."""
    return content.startswith((b"PK\x03\x04", b"PK\x05\x06"))


def checked_archive(content: bytes) -> zipfile.ZipFile:
    """Return the archive of a workbook whose parts have been counted, measured and looked through.

    Raises
    ------
    Refusal
        ``workbook_damaged``, ``workbook_encrypted``, ``workbook_macros``, ``workbook_binary``
        (.xlsb), ``not_a_table`` (another kind of archive),
        ``workbook_too_many_parts`` (``parts``, ``most``), ``workbook_too_large`` (``bytes``,
        ``most``), ``workbook_bomb`` (``ratio``, ``most``) and ``workbook_entities``.
    """
    try:
        archive = zipfile.ZipFile(io.BytesIO(content))
    except DAMAGED:
        raise Refusal("workbook_damaged") from None
    entries = archive.infolist()
    _check_kind(archive, {entry.filename for entry in entries})
    if len(entries) > MOST_ENTRIES:
        raise Refusal("workbook_too_many_parts", parts=len(entries), most=MOST_ENTRIES)
    if any(entry.flag_bits & 1 for entry in entries):
        raise Refusal("workbook_encrypted")
    unpacked = sum(entry.file_size for entry in entries)
    for entry in entries:
        _check_ratio(entry.file_size, entry.compress_size)
    _check_ratio(unpacked, len(content))
    if unpacked > MOST_UNPACKED:
        raise Refusal("workbook_too_large", bytes=unpacked, most=MOST_UNPACKED)
    for entry in entries:
        if entry.filename.lower().endswith(_PARSED):
            _look_through(archive, entry)
    return archive


def marks_of(archive: zipfile.ZipFile, path: str) -> SheetMarks:
    """Return what a sheet has beside its values.

    Raises
    ------
    Refusal
        ``workbook_damaged`` when its rows are not in order: some would be lost in reading.
    """
    hidden_rows = hidden_columns = merged = no_value = 0
    last = 0
    for piece in _whole_tags(archive, path):
        for row in _ROW.finditer(piece):
            inside = row.group(1)
            hidden_rows += bool(_HIDDEN.search(inside))
            number = _ROW_NUMBER.search(inside)
            if number:
                if int(number.group(1)) <= last:
                    raise Refusal("workbook_damaged")
                last = int(number.group(1))
            else:
                last += 1
        hidden_columns += len(_HIDDEN_COLUMNS.findall(piece))
        merged += len(_MERGED.findall(piece))
        no_value += len(_NO_VALUE.findall(piece))
    return SheetMarks(hidden_rows, hidden_columns, merged, no_value)


def _check_kind(archive: zipfile.ZipFile, names: set[str]) -> None:
    lower = {name.lower() for name in names}
    if "xl/workbook.xml" not in lower:
        if "xl/workbook.bin" in lower:
            raise Refusal("workbook_binary")
        if not is_open_document(archive):
            raise Refusal("not_a_table")
        _check_open_document(archive, lower)
    if any(name.endswith("vbaproject.bin") for name in lower):
        raise Refusal("workbook_macros")


def is_open_document(archive: zipfile.ZipFile) -> bool:
    """Return whether an archive says that it is an OpenDocument workbook (.ods), or a template of one."""
    names = archive.namelist()
    if "mimetype" not in names or _OPEN_CONTENT not in names:
        return False
    if archive.getinfo("mimetype").file_size > len(_OPEN_DOCUMENT) + 20:
        return False
    return b"".join(_pieces(archive, "mimetype")).startswith(_OPEN_DOCUMENT)


def _check_open_document(archive: zipfile.ZipFile, lower: set[str]) -> None:
    """Refuse an OpenDocument workbook with macros or a password: its parts are encrypted one by one."""
    if any(name.startswith("basic/") for name in lower):
        raise Refusal("workbook_macros")
    listed = "META-INF/manifest.xml"
    if listed in archive.namelist():
        if archive.getinfo(listed).file_size > _SMALL:
            raise Refusal("workbook_damaged")
        if b"encryption-data" in b"".join(_pieces(archive, listed)):
            raise Refusal("workbook_encrypted")


def _check_ratio(unpacked: int, packed: int) -> None:
    ratio = unpacked / max(packed, 1)
    if unpacked > _SMALL and ratio > MOST_RATIO:
        raise Refusal("workbook_bomb", ratio=round(ratio), most=MOST_RATIO)


def _pieces(archive: zipfile.ZipFile, name: str | zipfile.ZipInfo) -> Iterator[bytes]:
    """Unpack a part piece by piece; never more than the directory of the archive promised."""
    try:
        with archive.open(name) as part:
            while piece := part.read(_CHUNK):
                yield piece
    except DAMAGED:
        raise Refusal("workbook_damaged") from None


def _look_through(archive: zipfile.ZipFile, entry: zipfile.ZipInfo) -> None:
    """Refuse a part that declares entities, or hides what it declares in another encoding."""
    seen, tail = 0, b""
    for piece in _pieces(archive, entry):
        if not seen and (piece[:2] in (b"\xff\xfe", b"\xfe\xff") or b"\0" in piece[:4]):
            raise Refusal("workbook_damaged")
        joined = tail + piece
        if b"<!DOCTYPE" in joined or b"<!ENTITY" in joined:
            raise Refusal("workbook_entities")
        tail = joined[-16:]
        seen += len(piece)
    if seen != entry.file_size:
        raise Refusal("workbook_damaged")


def _whole_tags(archive: zipfile.ZipFile, path: str) -> Iterator[bytes]:
    """Give a part in pieces that end where a row ends, or at its very end."""
    rest = b""
    for piece in _pieces(archive, path):
        rest += piece
        cut = max(rest.rfind(b"row>"), rest.rfind(b"<sheetData>"))
        if cut > 0:
            yield rest[:cut]
            rest = rest[cut:]
    yield rest
