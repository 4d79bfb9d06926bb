"""An .ods workbook is opened in the page like any other list."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

from make import open_document_macros, open_document_marks
from playwright.sync_api import expect

from site_server import SiteServer
from vitalroll.desk import Desk

ANSWER_MS = 30_000


def test_an_open_document_is_read_and_one_with_macros_refused(
    site: SiteServer, opened: Callable, tmp_path: Path
) -> None:
    content = open_document_marks()
    (tmp_path / "register.ods").write_bytes(content)
    (tmp_path / "macros.ods").write_bytes(open_document_macros())
    page = opened(site.address).page
    page.locator("#register-file").first.set_input_files(tmp_path / "macros.ods")
    expect(page.locator("#place-register .refusal")).to_contain_text("contains macros", timeout=ANSWER_MS)
    page.locator("#register-file").first.set_input_files(tmp_path / "register.ods")
    page.locator("#closing-date").wait_for(timeout=ANSWER_MS)
    native = Desk().answer("register.open", {"name": "register.ods", "content": content})["answer"]
    table = page.locator("table", has=page.locator("caption", has_text="The first rows"))
    shown = [
        [cell.inner_text() for cell in row.locator("th, td").all()] for row in table.locator("tbody tr").all()
    ]
    assert shown == [[str(row["line"]), *row["cells"]] for row in native["preview"]]
    assert page.locator("#source-sheet").input_value() == "Register"
    expect(page.locator("#place-register .cautions").first).to_contain_text("hidden sheets: Codes")
