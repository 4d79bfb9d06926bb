"""Choices kept from one list make the same cohort of the next, without choosing again."""

from __future__ import annotations

import json
from collections.abc import Callable
from pathlib import Path

from hard_reading import CLOSING, request_as_proposed
from playwright.sync_api import expect

from site_server import SiteServer
from vitalroll.desk import Desk

HARD_CASES = Path(__file__).parents[1] / "hard_cases"
FIRST = HARD_CASES / "files" / "misspelt_values.csv"
NEXT = HARD_CASES / "files" / "ragged_rows.csv"
ANSWER_MS = 30_000


def test_saved_from_one_list_and_applied_to_the_next(
    site: SiteServer, opened: Callable, tmp_path: Path
) -> None:
    page = opened(site.address).page
    page.locator("#register-file").first.set_input_files(FIRST)
    page.locator("#closing-date").wait_for(timeout=ANSWER_MS)
    assert page.locator("#settings-save").is_disabled()
    page.locator("#closing-date").fill(CLOSING)
    page.locator("#closing-date").blur()
    page.locator("#role-c2").select_option("none")
    page.locator("#silent-count").check()
    with page.expect_download() as waiting:
        page.locator("#settings-save").click()
    kept = tmp_path / "settings.json"
    waiting.value.save_as(kept)
    settings = json.loads(kept.read_text(encoding="utf-8"))
    desk = Desk()
    source = desk.answer("register.open", {"name": "x", "content": FIRST.read_bytes()})["answer"]
    request = request_as_proposed(desk, source, CLOSING) | {"repairs": {"unseen_for_long": []}}
    request["roles"]["c2"] = "none"
    # The engine and the page keep the same; the page also keeps orders of columns that are not used.
    expected = desk.answer("register.settings", request)["answer"]["settings"]
    for column in (*settings["columns"], *expected["columns"]):
        column.pop("order")
    assert settings == expected

    page.locator("#forget").click()
    page.locator("#columns-heading").wait_for(state="detached", timeout=ANSWER_MS)
    page.locator("#register-file").first.set_input_files(NEXT)
    page.locator("#settings-file").set_input_files(kept)
    page.locator("#settings-applied").wait_for(timeout=ANSWER_MS)
    assert page.locator("#closing-date").input_value() == CLOSING
    assert page.locator("#role-c2").input_value() == "none"
    assert page.locator("#silent-count").is_checked()
    page.locator("#place-register .cautions", has_text="is that of the earlier list").wait_for(
        timeout=ANSWER_MS
    )
    section = page.locator("section", has=page.locator("#settings-heading")).inner_text()
    assert "Severity" in section
    assert "Village – to group by" in section
    desk = Desk()
    source = desk.answer("register.open", {"name": "x", "content": NEXT.read_bytes()})["answer"]
    reading = desk.answer("register.apply_settings", {"text": kept.read_text(encoding="utf-8")})["answer"][
        "reading"
    ]
    proposed = request_as_proposed(desk, source, CLOSING)
    reading["meanings"] = proposed["meanings"] | reading["meanings"]
    cohort = desk.answer("register.build", reading)["answer"]
    sentence = page.locator("#understood-heading ~ .sentence")
    expect(sentence).to_contain_text(f"{cohort['n']} patients from {cohort['rows']} rows", timeout=ANSWER_MS)
    page.locator("#undo").click()
    expect(page.locator("#closing-date")).to_have_value("", timeout=ANSWER_MS)


def test_another_file_is_refused_in_words(site: SiteServer, opened: Callable) -> None:
    page = opened(site.address).page
    page.locator("#register-file").first.set_input_files(FIRST)
    page.locator("#settings-file").set_input_files(FIRST)
    page.get_by_text("This is not a file of choices kept by this page.").wait_for(timeout=ANSWER_MS)
